package isowright.review;

import isowright.inference.ParameterDraws;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import java.util.List;

/** The ln of filed over least cost of every plant in one draw of the parameters. */
final class RatioRow {

  private RatioRow() {}

  /** One row; empty where some plant has no least cost in this draw. */
  static double[] of(
      List<Entrant> order, ParameterDraws draws, int r, Ordering.Simulation simulation) {
    ParameterDraws.Draw draw = draws.draw(r);
    double[] row = new double[order.size()];
    for (int i = 0; i < row.length; i++) {
      row[i] = order.get(i).logRatio();
    }
    switch (simulation) {
      case EXACT -> {}
      case FIRST_ORDER -> {
        for (int i = 0; i < row.length; i++) {
          row[i] -= draw.along(order.get(i).slopes());
        }
      }
      case SOLVED -> {
        LeastCost leastCost = Minimiser.of(draws.technology(draw));
        for (int i = 0; i < row.length; i++) {
          Entrant entrant = order.get(i);
          double cost = leastCost.plan(entrant.question(), entrant.plan()).cost();
          if (!(cost > 0) || Double.isInfinite(cost)) {
            return new double[0];
          }
          row[i] = Math.log(entrant.filed() / cost);
        }
      }
    }
    return row;
  }
}

package isowright.review;

import isowright.inference.ParameterDraws;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import java.util.List;

/** The ln of filed over least cost of every plant in a draw of the parameters. */
final class RatioRow {

  private final List<Entrant> order;
  private final ParameterDraws draws;
  private final Ordering.Simulation simulation;
  private final double[] logRatios;
  private final double[][] slopes;
  private final double[] yearSpreads;

  private RatioRow(List<Entrant> order, ParameterDraws draws, Ordering.Simulation simulation) {
    this.order = order;
    this.draws = draws;
    this.simulation = simulation;
    this.logRatios = order.stream().mapToDouble(Entrant::logRatio).toArray();
    this.slopes = order.stream().map(Entrant::slopes).toArray(double[][]::new);
    this.yearSpreads = order.stream().mapToDouble(Entrant::yearSpread).toArray();
  }

  /** For plants, and how their least cost moves with the parameters. */
  static RatioRow of(List<Entrant> order, ParameterDraws draws, Ordering.Simulation simulation) {
    return new RatioRow(order, draws, simulation);
  }

  int plants() {
    return logRatios.length;
  }

  Ordering.Simulation simulation() {
    return simulation;
  }

  /** One row; empty where some plant has no least cost in this draw. */
  double[] of(ParameterDraws.Draw draw) {
    double[] row = logRatios.clone();
    switch (simulation) {
      case EXACT -> {}
      case FIRST_ORDER -> {
        for (int i = 0; i < row.length; i++) {
          row[i] -= draw.along(slopes[i]);
        }
      }
      case SOLVED -> {
        LeastCost leastCost = Minimiser.of(draws.technology(draw));
        for (int i = 0; i < row.length; i++) {
          Entrant entrant = order.get(i);
          Entrant.Asked asked = entrant.asked().orElseThrow();
          double cost = leastCost.plan(asked.question(), asked.plan()).cost();
          if (!(cost > 0) || Double.isInfinite(cost)) {
            return new double[0];
          }
          row[i] = Math.log(entrant.filed() / cost);
        }
      }
    }
    return row;
  }

  /** Adds the chance of the year to every plant. */
  void addYear(double[] row, ParameterDraws.Draw draw) {
    Year.add(yearSpreads, row, draw);
  }
}

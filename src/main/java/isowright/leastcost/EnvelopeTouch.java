package isowright.leastcost;

import java.util.Optional;

/**
 * At what output does short-run cost, with one input held, touch long-run cost? Where the long run
 * takes just what is held. Elsewhere the short run costs more (the envelope of Viner and Wong).
 *
 * <p>Source: Viner, J. (1932), Cost Curves and Supply Curves, <i>Zeitschrift für
 * Nationalökonomie</i> 3, 23–46. Tested in {@code CostLawsTest} and {@code EfficientScaleTest}.
 */
public final class EnvelopeTouch {

  /** Outputs are looked for within a factor of e^3 of the given one. */
  private static final double FARTHEST = 3;

  private static final double STEP = 0.05;
  private static final int HALVINGS = 60;

  private EnvelopeTouch() {}

  /**
   * The output nearest a given one; NaN where none is found.
   *
   * @param longRun prices, and limits without the held input
   * @param input the held input
   * @param quantity what is held of it
   * @param output where to begin
   */
  public static double near(
      LeastCost leastCost, Question longRun, int input, double quantity, double output) {
    Climb climb = new Climb(leastCost, longRun, Optional.empty());
    double start = Math.log(output);
    climb.at(start);
    double here = excess(climb, input, quantity);
    if (Double.isNaN(here)) {
      return Double.NaN;
    }
    double direction = here < 0 ? STEP : -STEP;
    double last = start;
    for (double u = start + direction; Math.abs(u - start) <= FARTHEST; u += direction) {
      climb.at(u);
      double there = excess(climb, input, quantity);
      if (Double.isNaN(there)) {
        return Double.NaN;
      }
      if (there == 0 || (there < 0) != (here < 0)) {
        return Math.exp(root(climb, input, quantity, Math.min(last, u), Math.max(last, u)));
      }
      last = u;
    }
    return Double.NaN;
  }

  private static double root(Climb climb, int input, double quantity, double low, double high) {
    double below = low;
    double above = high;
    climb.at(below);
    double a = excess(climb, input, quantity);
    climb.at(above);
    double b = excess(climb, input, quantity);
    for (int k = 0; k < HALVINGS && above - below > 1e-14 * Math.max(1, Math.abs(below)); k++) {
      double secant = below - a * (above - below) / (b - a);
      double u = k % 3 != 2 && secant > below && secant < above ? secant : 0.5 * (below + above);
      climb.at(u);
      double here = excess(climb, input, quantity);
      if (Math.abs(here) < 1e-15) {
        return u;
      }
      if ((here < 0) == (a < 0)) {
        below = u;
        a = here;
      } else {
        above = u;
        b = here;
      }
    }
    return 0.5 * (below + above);
  }

  private static double excess(Climb climb, int input, double quantity) {
    return climb.plan.answered() ? Math.log(climb.plan.mix(input) / quantity) : Double.NaN;
  }
}

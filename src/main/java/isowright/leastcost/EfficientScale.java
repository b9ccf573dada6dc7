package isowright.leastcost;

import java.util.Optional;

/**
 * At what output is average cost least? Where d ln C/d ln Q = λ Q/C passes through one from below:
 * the minimum efficient scale, at which the scale elasticity along the expansion path is one.
 *
 * <p>Source: Christensen, L. R. and Greene, W. H. (1976), Economies of Scale in U.S. Electric Power
 * Generation, <i>Journal of Political Economy</i> 84, 655–676. Tested in {@code
 * EfficientScaleTest}.
 *
 * @param course how average cost runs over the outputs with an answer
 * @param from the least output examined that has an answer; NaN where none has
 * @param to the largest
 * @param output the output of least average cost; NaN unless the course is interior
 * @param plan the plan there; absent likewise
 */
public record EfficientScale(
    Course course, double from, double to, double output, Optional<Plan> plan) {

  /** How average cost runs. */
  public enum Course {
    /** It is least at an output inside. */
    INTERIOR,
    /** It falls throughout. */
    FALLING,
    /** It rises throughout. */
    RISING,
    /** It is the same throughout. */
    LEVEL,
    /** There is no answer at all. */
    NONE
  }

  /** Steps of the walk over the outputs, evenly spaced in logs. */
  private static final int STEPS = 60;

  /** Elasticities of cost this near to one are one. */
  private static final double LEVEL = 1e-9;

  private static final int HALVINGS = 60;

  /**
   * Looked for between two outputs.
   *
   * @param question prices and limits; its target is not used
   * @param from the least output, positive
   * @param to the largest
   */
  public static EfficientScale between(
      LeastCost leastCost, Question question, double from, double to) {
    Climb climb = new Climb(leastCost, question, Optional.empty());
    double first = Double.NaN;
    double last = Double.NaN;
    double before = Double.NaN;
    double at = Double.NaN;
    boolean falls = false;
    boolean rises = false;
    for (int k = 0; k <= STEPS; k++) {
      climb.at(Math.log(from) + (Math.log(to) - Math.log(from)) * k / STEPS);
      double elasticity = elasticity(climb);
      if (!climb.plan.answered() || Double.isNaN(elasticity)) {
        before = Double.NaN;
        continue;
      }
      first = Double.isNaN(first) ? Math.exp(climb.u) : first;
      last = Math.exp(climb.u);
      if (before < 1 - LEVEL && elasticity >= 1) {
        double u = passage(climb, at, climb.u);
        climb.at(u);
        return new EfficientScale(
            Course.INTERIOR, first, Math.max(last, to), Math.exp(u), Optional.of(climb.plan));
      }
      falls |= elasticity < 1 - LEVEL;
      rises |= elasticity > 1 + LEVEL;
      before = elasticity;
      at = climb.u;
    }
    Course course =
        Double.isNaN(first)
            ? Course.NONE
            : falls ? Course.FALLING : rises ? Course.RISING : Course.LEVEL;
    return new EfficientScale(course, first, last, Double.NaN, Optional.empty());
  }

  /** The output near a given one at which the elasticity is one; NaN where none is found. */
  public static double near(LeastCost leastCost, Question question, double output) {
    Climb climb = new Climb(leastCost, question, Optional.empty());
    double middle = Math.log(output);
    for (double width = 0.01; width < 3; width *= 2) {
      climb.at(middle - width);
      double below = elasticity(climb);
      climb.at(middle + width);
      double above = elasticity(climb);
      if (below < 1 && above >= 1) {
        return Math.exp(passage(climb, middle - width, middle + width));
      }
    }
    return Double.NaN;
  }

  private static double passage(Climb climb, double low, double high) {
    double below = low;
    double above = high;
    climb.at(below);
    double a = elasticity(climb) - 1;
    climb.at(above);
    double b = elasticity(climb) - 1;
    for (int k = 0; k < HALVINGS && above - below > 1e-14 * Math.max(1, Math.abs(below)); k++) {
      double secant = below - a * (above - below) / (b - a);
      double u = k % 3 != 2 && secant > below && secant < above ? secant : 0.5 * (below + above);
      climb.at(u);
      double here = elasticity(climb) - 1;
      if (Math.abs(here) < 1e-15) {
        return u;
      }
      if (here < 0) {
        below = u;
        a = here;
      } else {
        above = u;
        b = here;
      }
    }
    return 0.5 * (below + above);
  }

  /** d ln C/d ln Q. */
  private static double elasticity(Climb climb) {
    return climb.plan.marginalCost() * Math.exp(climb.u) / climb.plan.cost();
  }
}

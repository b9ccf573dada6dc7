package isowright.leastcost;

import isowright.technology.Technology;

/**
 * Does a plan stand up when it is examined without the search that found it? Each figure is a
 * departure that would be zero in exact arithmetic, save the second-order one.
 *
 * <p>From the technology's own output, elasticities e and second derivatives H in logs at the mix:
 *
 * <pre>
 *   output        max(0, 1 − f(x)/Q)
 *   first order   the largest |w_i x_i/(μ e_i) − 1| of the inputs that are free to move, μ from all
 *                 of them together; at limits only what breaks the inequality
 *   second order  the least curvature of isocost against isoquant: the smallest eigenvalue of
 *                 diag(e) − H on Σ e_i v_i = 0 among the free inputs, divided by Σ e_i; positive at
 *                 a minimum, 1 for Cobb-Douglas with equal elasticities </pre>
 *
 * From least cost asked again at other prices and targets (duality):
 *
 * <pre>
 *   Shephard      the largest |∂ln C/∂ln w_i − s_i|
 *   homogeneity   |C(k w)/(k C) − 1|
 *   marginal      |(∂C/∂Q)/λ − 1| </pre>
 *
 * NaN stands for a check that has nothing to examine (no two free inputs, no marginal cost). At a
 * corner that prices are about to leave, differences straddle the kink and the duality checks are
 * rough.
 *
 * <p>Sources: Shephard, R. W. (1953), <i>Cost and Production Functions</i>, Princeton; Diewert, W.
 * E. (1974), Applications of Duality Theory, in <i>Frontiers of Quantitative Economics II</i>.
 * Tested in {@code PlanChecksTest}.
 *
 * @param output how far the mix falls short of the target, relative
 * @param firstOrder the largest relative departure from the first-order conditions
 * @param secondOrder the least relative curvature; not positive where the mix is no minimum
 * @param shephard the largest departure of a price derivative of cost from its input, as a share
 * @param homogeneity the relative departure of cost from doubling with prices
 * @param marginalCost the relative departure of marginal cost from the multiplier
 */
public record PlanChecks(
    double output,
    double firstOrder,
    double secondOrder,
    double shephard,
    double homogeneity,
    double marginalCost) {

  /**
   * The step of the fourth-order differences, in logs: their error is 4e-15 times the fifth
   * derivative, which reaches 1e7 where a translog is about to cease being regular; rounding in ln
   * C adds some 1e-13 divided by the step.
   */
  private static final double STEP = 2.5e-4;

  /** Not a power of two, so that rounding is exercised. */
  private static final double MULTIPLE = 1.7;

  /** Examines a plan that answers a question with single prices. */
  public static PlanChecks of(Technology technology, Question question, Plan plan) {
    Local local = new Local(technology, question, plan);
    Minimiser minimiser = Minimiser.of(technology);
    return new PlanChecks(
        local.shortfall(),
        local.firstOrder(),
        local.secondOrder(),
        shephard(minimiser, question, plan),
        homogeneity(minimiser, question, plan),
        marginalCost(minimiser, question, plan));
  }

  private static double shephard(LeastCost leastCost, Question question, Plan plan) {
    double cost = Outputs.spending(question, plan.mix());
    double largest = 0;
    for (int i = 0; i < question.dimension(); i++) {
      double share = question.price(i) * plan.mix(i) / cost;
      int moved = i;
      double slope =
          slope(
              step -> {
                double[] prices = question.prices();
                prices[moved] *= Math.exp(step);
                return Math.log(leastCost.plan(question.at(prices), plan).cost());
              });
      largest = Math.max(largest, Math.abs(slope - share));
    }
    return largest;
  }

  private static double homogeneity(LeastCost leastCost, Question question, Plan plan) {
    double[] prices = question.prices();
    for (int i = 0; i < prices.length; i++) {
      prices[i] *= MULTIPLE;
    }
    double cost = Outputs.spending(question, plan.mix());
    double scaled = leastCost.plan(question.at(prices)).cost();
    return Math.abs(scaled / (MULTIPLE * cost) - 1);
  }

  private static double marginalCost(LeastCost leastCost, Question question, Plan plan) {
    if (!(plan.marginalCost() > 0) || Double.isInfinite(plan.marginalCost())) {
      return Double.NaN;
    }
    double cost = Outputs.spending(question, plan.mix());
    double slope =
        slope(
            step -> {
              Question other = question.at(question.target() * Math.exp(step));
              return Math.log(leastCost.plan(other, plan).cost());
            });
    return Math.abs(slope * cost / question.target() / plan.marginalCost() - 1);
  }

  private static double slope(java.util.function.DoubleUnaryOperator function) {
    double near = function.applyAsDouble(STEP) - function.applyAsDouble(-STEP);
    double far = function.applyAsDouble(2 * STEP) - function.applyAsDouble(-2 * STEP);
    return (8 * near - far) / (12 * STEP);
  }

  /** What can be seen at the mix alone. */
  private static final class Local {
    private final Technology technology;
    private final Question question;
    private final Plan plan;
    private final int n;
    private final double[] z;
    private final double[] e;
    private final boolean[] free;
    private int moving;

    Local(Technology technology, Question question, Plan plan) {
      this.technology = technology;
      this.question = question;
      this.plan = plan;
      n = question.dimension();
      z = Outputs.logs(plan.mix());
      e = new double[n];
      technology.logGradient(z, e);
      free = new boolean[n];
      for (int i = 0; i < n; i++) {
        double x = plan.mix(i);
        free[i] = x > question.low(i) && x < question.high(i) && x > 0;
        moving += free[i] ? 1 : 0;
      }
    }

    double shortfall() {
      return Math.max(0, -Math.expm1(technology.logOutput(z) - Math.log(question.target())));
    }

    double firstOrder() {
      double spent = 0;
      double sum = 0;
      for (int i = 0; i < n; i++) {
        spent += free[i] ? question.price(i) * plan.mix(i) : 0;
        sum += free[i] ? e[i] : 0;
      }
      if (moving == 0 || !(sum > 0)) {
        return plan.optimality();
      }
      double worst = 0;
      for (int i = 0; i < n; i++) {
        if (plan.mix(i) == 0 || question.held(i)) {
          continue;
        }
        double ratio = question.price(i) * plan.mix(i) * sum / (spent * e[i]) - 1;
        boolean high = plan.mix(i) >= question.high(i);
        double breach = free[i] ? Math.abs(ratio) : high ? ratio : -ratio;
        worst = Math.max(worst, breach);
      }
      return worst;
    }

    double secondOrder() {
      if (moving < 2) {
        return Double.NaN;
      }
      double[][] hessian = new double[n][n];
      technology.logHessian(z, hessian);
      int[] place = new int[moving];
      double[] normal = new double[moving];
      double sum = 0;
      for (int i = 0, k = 0; i < n; i++) {
        sum += e[i];
        if (free[i]) {
          normal[k] = e[i];
          place[k++] = i;
        }
      }
      double[][] form = new double[moving][moving];
      for (int k = 0; k < moving; k++) {
        for (int l = 0; l < moving; l++) {
          form[k][l] = (k == l ? normal[k] : 0) - hessian[place[k]][place[l]];
        }
      }
      double[] values = PlaneEigenvalues.of(form, normal);
      double least = Double.POSITIVE_INFINITY;
      for (double value : values) {
        least = Math.min(least, value);
      }
      return least / sum;
    }
  }
}

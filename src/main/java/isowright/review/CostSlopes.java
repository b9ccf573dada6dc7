package isowright.review;

import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Technology;

/**
 * How least cost and the radial contraction move with the parameters of a technology, in closed
 * form. With g_k = ∂ln f/∂θ_k, e = Σ ∂ln f/∂ln x_i and λ marginal cost:
 *
 * <pre>
 *   ∂C/∂θ_k   = −λ Q g_k(x*)              x* the least-cost mix (envelope theorem on the Lagrangian)
 *   ∂ln θ/∂θ_k = −g_k(θ x) / e(θ x)        from ln f(θ x) = ln Q along the ray
 * </pre>
 *
 * <p>So a gap with all its intervals costs two gradients instead of dozens of plans. Both hold
 * wherever the technology is smooth in its parameters at that mix; where a gradient is not finite
 * (an input that is not used at all) they are NaN.
 *
 * <p>Source: Shephard, R. W. (1953), <i>Cost and Production Functions</i>; envelope theorem:
 * Varian, H. R. (1992), <i>Microeconomic Analysis</i>, 3rd ed., chapter 27. Tested against
 * differences in {@code GapEstimatesTest}.
 */
final class CostSlopes {

  private final Technology technology;
  private final int parameters;

  CostSlopes(Technology technology) {
    this.technology = technology;
    this.parameters = technology.parameters().length;
  }

  /** The number of parameters, p. */
  int parameters() {
    return parameters;
  }

  /** ∂C/∂θ at a least-cost plan, shape p; NaN where the plan has no answer. */
  double[] ofCost(Question question, Plan plan) {
    double[] slopes = new double[parameters];
    if (!plan.answered()) {
      java.util.Arrays.fill(slopes, Double.NaN);
      return slopes;
    }
    double[] z = new double[question.dimension()];
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(plan.mix(i));
    }
    technology.parameterGradient(z, slopes);
    double worth = plan.marginalCost() * question.target();
    for (int k = 0; k < parameters; k++) {
      slopes[k] *= -worth;
    }
    return slopes;
  }

  /**
   * ∂ln θ/∂θ_k, shape p.
   *
   * @param mix the mix x
   * @param contraction θ
   */
  double[] ofContraction(double[] mix, double contraction) {
    double[] z = new double[mix.length];
    double[] elasticities = new double[mix.length];
    double shift = Math.log(contraction);
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(mix[i]) + shift;
    }
    technology.logGradient(z, elasticities);
    double scale = 0;
    for (double each : elasticities) {
      scale += each;
    }
    double[] slopes = new double[parameters];
    technology.parameterGradient(z, slopes);
    for (int k = 0; k < parameters; k++) {
      slopes[k] /= -scale;
    }
    return slopes;
  }
}

package isowright.cost;

import java.util.Arrays;

/**
 * What it saves to make several outputs together.
 *
 * <p>For outputs y and a part S of them, T the rest, the others zero,
 *
 * <pre>
 *   scope           (C(y_S) + C(y_T) − C(y)) / C(y):  above zero, apart costs more than together
 *  all apart       (Σ_k C(y_k) − C(y)) / C(y)
 *  complementarity ∂ln(∂C/∂y_k)/∂ln y_l:  below zero, more of l makes k cheaper at the margin
 * </pre>
 *
 * Each firm apart bears the fixed costs again. Complementarity is local and every cost function
 * tells it; scope asks what cost is at outputs of zero, which a function of their logs cannot tell.
 *
 * <p>Source: Baumol, W. J., Panzar, J. C. and Willig, R. D. (1982), <i>Contestable Markets and the
 * Theory of Industry Structure</i>, chapter 4 (definitions 4A1, 4B1). Tested in {@code
 * OutputsTogetherTest}.
 */
public final class OutputsTogether {

  private final GeneralisedCost function;
  private final double[] v;
  private final int first;
  private final int count;

  /**
   * At a point.
   *
   * @param v shape A; outputs that are made
   */
  public OutputsTogether(GeneralisedCost function, double[] v) {
    this.function = function;
    this.v = v.clone();
    this.first = function.arguments().inputs().size();
    this.count = function.arguments().outputs().size();
  }

  /** Scope of output k against all the others. */
  public double scope(int k) {
    boolean[] alone = new boolean[count];
    alone[k] = true;
    boolean[] rest = new boolean[count];
    Arrays.fill(rest, true);
    rest[k] = false;
    return (cost(alone) + cost(rest)) / together() - 1;
  }

  /** Every output apart. */
  public double allApart() {
    double sum = 0;
    for (int k = 0; k < count; k++) {
      boolean[] alone = new boolean[count];
      alone[k] = true;
      sum += cost(alone);
    }
    return sum / together() - 1;
  }

  private double together() {
    return Math.exp(function.logCost(v));
  }

  private double cost(boolean[] made) {
    double[] part = v.clone();
    for (int k = 0; k < count; k++) {
      part[first + k] = made[k] ? v[first + k] : Double.NEGATIVE_INFINITY;
    }
    return Math.exp(function.logCost(part));
  }

  /** The elasticity of the marginal cost of output k in output l, at outputs that are made. */
  public static double complementarity(CostFunction function, double[] v, int k, int l) {
    int size = function.arguments().size();
    int first = function.arguments().inputs().size();
    double[] gradient = new double[size];
    double[][] hessian = new double[size][size];
    function.gradient(v, gradient);
    function.hessian(v, hessian);
    double own = gradient[first + k];
    return hessian[first + k][first + l] / own + gradient[first + l] - (k == l ? 1 : 0);
  }
}

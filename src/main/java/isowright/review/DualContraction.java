package isowright.review;

import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import java.util.Optional;

/**
 * By which factor θ would a mix x shrink onto the isoquant of outputs y, seen from the cost
 * function? No technology is needed: θ x is on the isoquant where it is the least-cost mix of some
 * prices u,
 *
 * <pre>
 *   ln θ = max over u of ln C(u, y) − ln Σ u_i x_i,     s_i(u, y) = u_i x_i / Σ u_k x_k  at the most
 * </pre>
 *
 * <p>so the prices are sought at which the shares of least cost are those of the mix used. By the
 * envelope theorem ∂ln θ/∂β = ∂ln C(u, y)/∂β there. The last price is held, as only relative prices
 * matter; Newton's method on the conditions in logs, the step halved until they fall. Where the
 * function is no cost function at the prices found there is no answer.
 *
 * <p>Sources: Kopp, R. J. and Diewert, W. E. (1982), The Decomposition of Frontier Cost Function
 * Deviations into Measures of Technical and Allocative Efficiency, <i>Journal of Econometrics</i>
 * 19, 319–331, section 3 (from memory of the argument); the distance function as dual of cost:
 * Shephard, R. W. (1953), <i>Cost and Production Functions</i>. Tested in {@code
 * DualContractionTest}.
 *
 * @param theta θ
 * @param point the arguments of the cost function with the prices u
 */
record DualContraction(double theta, double[] point) {

  private static final int ITERATIONS = 100;
  private static final int HALVINGS = 30;

  /** Conditions met to this, in logs, are met to rounding. */
  private static final double NEAR = 1e-12;

  /**
   * The contraction of a mix; absent where no prices make it least cost.
   *
   * @param function the cost function
   * @param v its arguments; the prices are where the search begins
   * @param mix the quantities used, shape n, positive
   */
  static Optional<DualContraction> of(CostFunction function, double[] v, double[] mix) {
    return sought(function, v, mix)
        .filter(
            found -> {
              CostElasticities end = CostElasticities.at(function, found.point);
              return end.monotone() && end.concave();
            });
  }

  /** The same whether or not the function is a cost function there. */
  static Optional<DualContraction> sought(CostFunction function, double[] v, double[] mix) {
    double[] at = v.clone();
    double[] off = conditions(function, at, mix);
    for (int step = 0; step < ITERATIONS && largest(off) > NEAR; step++) {
      double[] move = newton(function, at, off);
      double[] next = at;
      double[] there = off;
      double by = 1;
      for (int halving = 0; halving < HALVINGS; halving++, by /= 2) {
        next = moved(at, move, by);
        there = conditions(function, next, mix);
        if (largest(there) < largest(off)) {
          break;
        }
      }
      if (!(largest(there) < largest(off))) {
        break;
      }
      at = next;
      off = there;
    }
    // a root that rounding keeps from the last digits is one to every printed digit
    if (!(largest(off) < 1e4 * NEAR)) {
      return Optional.empty();
    }
    double spent = 0;
    for (int i = 0; i < mix.length; i++) {
      spent += Math.exp(at[i]) * mix[i];
    }
    return Optional.of(new DualContraction(Math.exp(function.logCost(at)) / spent, at));
  }

  /** ln s_i − ln u_i x_i less the same of the last input; NaN where a share is not positive. */
  private static double[] conditions(CostFunction function, double[] v, double[] mix) {
    double[] gradient = new double[v.length];
    function.gradient(v, gradient);
    int last = mix.length - 1;
    double[] off = new double[last];
    double base = Math.log(gradient[last]) - v[last] - Math.log(mix[last]);
    for (int i = 0; i < last; i++) {
      off[i] = Math.log(gradient[i]) - v[i] - Math.log(mix[i]) - base;
    }
    return off;
  }

  /** The largest departure; infinite where one is not a number. */
  private static double largest(double[] off) {
    double largest = 0;
    for (double each : off) {
      largest = Double.isNaN(each) ? Double.POSITIVE_INFINITY : Math.max(largest, Math.abs(each));
    }
    return largest;
  }

  private static double[] moved(double[] at, double[] move, double by) {
    double[] next = at.clone();
    for (int i = 0; i < move.length; i++) {
      next[i] += by * move[i];
    }
    return next;
  }

  /** −J⁻¹ off with J_ij = H_ij/s_i − δ_ij − H_nj/s_n, by elimination with the largest pivot. */
  private static double[] newton(CostFunction function, double[] v, double[] off) {
    int m = off.length;
    double[] gradient = new double[v.length];
    double[][] hessian = new double[v.length][v.length];
    function.gradient(v, gradient);
    function.hessian(v, hessian);
    double[][] rows = new double[m][m + 1];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < m; j++) {
        rows[i][j] = hessian[i][j] / gradient[i] - (i == j ? 1 : 0) - hessian[m][j] / gradient[m];
      }
      rows[i][m] = -off[i];
    }
    for (int k = 0; k < m; k++) {
      int pivot = k;
      for (int i = k + 1; i < m; i++) {
        pivot = Math.abs(rows[i][k]) > Math.abs(rows[pivot][k]) ? i : pivot;
      }
      double[] top = rows[pivot];
      rows[pivot] = rows[k];
      rows[k] = top;
      for (int i = 0; i < m; i++) {
        double factor = i == k ? 0 : rows[i][k] / top[k];
        for (int j = k; j <= m && factor != 0; j++) {
          rows[i][j] -= factor * top[j];
        }
      }
    }
    double[] move = new double[m];
    for (int k = 0; k < m; k++) {
      move[k] = rows[k][m] / rows[k][k];
    }
    return move;
  }
}

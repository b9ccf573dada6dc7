package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Where is a smooth function of a few parameters greatest? Newton's method with the Hessian, damped
 * after Levenberg and Marquardt where the function is not concave or a step does not rise.
 *
 * <p>Stops where the step foreseen raises the function by less than {@link #LEAST_RISE} of its size
 * (Newton's decrement, which does not depend on units). Source: J. Nocedal and S. J. Wright,
 * <i>Numerical Optimization</i>, 2nd ed. 2006, sections 3.4 and 10.3. Tested in {@code
 * ComposedErrorsTest}.
 */
final class NewtonAscent {

  private static final int MOST_STEPS = 200;

  /** Half the decrement, relative to 1 + |value|: well under the rounding of a sum of logs. */
  private static final double LEAST_RISE = 1e-15;

  /** Beyond this damping no step of any length rises: rounding has the last word. */
  private static final double MOST_DAMPING = 1e12;

  private NewtonAscent() {}

  /** A function with its derivatives at a point. */
  interface Point {
    double value();

    double[] gradient();

    double[][] hessian();
  }

  /** A function to be raised. */
  @FunctionalInterface
  interface Objective {
    Point at(double[] parameters);
  }

  /**
   * Where the ascent ended.
   *
   * @param parameters the point
   * @param value the function there
   * @param decrement g′(−H)⁻¹g there, twice the rise that is left; infinite where −H is not
   *     positive definite
   * @param steps how many steps were taken
   * @param converged whether the rise left is negligible
   */
  record End(double[] parameters, double value, double decrement, int steps, boolean converged) {}

  /** Climbs from a start. */
  static End from(double[] start, Objective objective) {
    double[] at = start.clone();
    Point point = objective.at(at);
    double damping = 0;
    for (int step = 0; step < MOST_STEPS; step++) {
      double[] gradient = point.gradient();
      double[][] hessian = point.hessian();
      double decrement = decrement(gradient, hessian);
      if (decrement / 2 <= LEAST_RISE * (1 + Math.abs(point.value()))) {
        return new End(at, point.value(), decrement, step, true);
      }
      boolean risen = false;
      while (!risen && damping <= MOST_DAMPING) {
        double[] next = moved(at, gradient, hessian, damping);
        Point there = next.length == 0 ? point : objective.at(next);
        if (next.length > 0 && there.value() > point.value()) {
          at = next;
          point = there;
          damping = damping < 1e-3 ? 0 : damping / 10;
          risen = true;
        } else {
          damping = Math.max(1e-3, damping * 10);
        }
      }
      if (!risen) {
        // Not even the shortest step rises: converged to rounding if little was left to gain.
        boolean close = decrement <= 1e-9 * (1 + Math.abs(point.value()));
        return new End(at, point.value(), decrement, step, close);
      }
    }
    double left = decrement(point.gradient(), point.hessian());
    return new End(at, point.value(), left, MOST_STEPS, false);
  }

  private static double decrement(double[] gradient, double[][] hessian) {
    double[] step = moved(new double[gradient.length], gradient, hessian, 0);
    return step.length == 0 ? Double.POSITIVE_INFINITY : Math.abs(Matrices.dot(step, gradient));
  }

  /** The point after (−H + damping · diag|H|)⁻¹ g; empty where that matrix is not positive. */
  private static double[] moved(
      double[] at, double[] gradient, double[][] hessian, double damping) {
    int n = at.length;
    double[] scale = new double[n];
    for (int k = 0; k < n; k++) {
      double size = Math.abs(hessian[k][k]);
      scale[k] = size > 0 ? 1 / Math.sqrt(size) : 1;
    }
    RealMatrix matrix = new Array2DRowRealMatrix(n, n);
    double[] right = new double[n];
    for (int k = 0; k < n; k++) {
      right[k] = scale[k] * gradient[k];
      for (int l = 0; l < n; l++) {
        matrix.setEntry(k, l, -scale[k] * hessian[k][l] * scale[l] + (k == l ? damping : 0));
      }
    }
    if (!finite(right) || !finite(matrix)) {
      return new double[0];
    }
    try {
      double[] step =
          new CholeskyDecomposition(matrix, 1e-9, 1e-14)
              .getSolver()
              .solve(new ArrayRealVector(right, false))
              .toArray();
      double[] next = at.clone();
      for (int k = 0; k < n; k++) {
        next[k] += scale[k] * step[k];
      }
      return next;
    } catch (NonPositiveDefiniteMatrixException indefinite) {
      return new double[0];
    }
  }

  private static boolean finite(RealMatrix matrix) {
    return Arrays.stream(matrix.getData()).allMatch(NewtonAscent::finite);
  }

  private static boolean finite(double[] values) {
    return Arrays.stream(values).allMatch(Double::isFinite);
  }
}

package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;

/**
 * Which φ brings θ(φ) nearest to θ̂ in the metric V⁻¹? The least of ½ (θ(φ) − θ̂)′ V⁻¹ (θ(φ) − θ̂)
 * by Newton's method, the Hessian raised on its diagonal until it is positive definite and the step
 * goes down.
 *
 * <p>For least squares with weights that are given, this is the least of the sum of squares over φ:
 * sums of squares are quadratic in θ about their own least θ̂, with V the inverse cross-product.
 *
 * <p>The second derivatives of θ are part of the Hessian. Where φ is a factor of a matrix that the
 * rows would have indefinite, a column of it goes to zero, and the first derivatives with it; the
 * second do not, so that the search still ends quickly.
 *
 * <p>Source: J. Nocedal and S. J. Wright 2006, <i>Numerical Optimization</i>, section 3.4 (Hessians
 * modified on the diagonal). Tested in {@code QuantityEquationsTest}.
 */
final class NearestParameters {

  private static final int STEPS = 500;

  private static final int ATTEMPTS = 60;

  /** A step that promises less than this share of the value drowns in its rounding. */
  private static final double BLIND = 1e-13;

  /** Newton's method doubles its digits: from 1e-13 three steps are more than enough. */
  private static final int FINAL = 3;

  private final ParameterMap map;
  private final double[] target;
  private final double[][] metric;

  /**
   * The question.
   *
   * @param target θ̂
   * @param metric V⁻¹
   */
  NearestParameters(ParameterMap map, double[] target, double[][] metric) {
    this.map = map;
    this.target = target;
    this.metric = metric;
  }

  /** Where the search ended, and whether it was done. */
  record Found(double[] phi, boolean still) {}

  Found from(double[] start) {
    double[] phi = start.clone();
    double value = value(phi);
    double damping = 0;
    int blind = 0;
    for (int step = 0; step < STEPS; step++) {
      double[] pull = pull(phi);
      double[][] jacobian = map.jacobian(phi);
      double[] gradient = transposeTimes(jacobian, pull);
      double[][] hessian = hessian(phi, jacobian, pull);
      double[] scale = scale(hessian);
      double[] move = move(hessian, gradient, scale, 0);
      if (move.length > 0 && dot(move, gradient) <= BLIND * (1 + value)) {
        // the value can no longer tell a step from none, Newton's method still can
        phi = less(phi, move);
        if (++blind == FINAL) {
          return new Found(phi, true);
        }
        continue;
      }
      blind = 0;
      boolean down = false;
      for (int attempt = 0; attempt < ATTEMPTS && !down; attempt++) {
        move = move(hessian, gradient, scale, damping);
        double[] next = less(phi, move);
        double there = move.length > 0 ? value(next) : Double.POSITIVE_INFINITY;
        down = there < value;
        phi = down ? next : phi;
        value = down ? there : value;
        damping = down ? (damping < 1e-9 ? 0 : damping / 8) : Math.max(1e-8, damping * 6);
      }
      if (!down) {
        return new Found(phi, false);
      }
    }
    return new Found(phi, false);
  }

  private static double[] less(double[] phi, double[] move) {
    double[] next = phi.clone();
    for (int k = 0; k < move.length; k++) {
      next[k] -= move[k];
    }
    return next;
  }

  double value(double[] phi) {
    double[] off = off(phi);
    return 0.5 * dot(off, times(metric, off));
  }

  private double[] off(double[] phi) {
    double[] off = map.parameters(phi);
    for (int k = 0; k < off.length; k++) {
      off[k] -= target[k];
    }
    return off;
  }

  /** V⁻¹ (θ(φ) − θ̂). */
  private double[] pull(double[] phi) {
    return times(metric, off(phi));
  }

  private double[][] hessian(double[] phi, double[][] jacobian, double[] pull) {
    double[][] hessian = information(jacobian, metric);
    double[][] bend = map.curvature(phi, pull);
    for (int i = 0; i < bend.length; i++) {
      for (int j = 0; j < bend.length; j++) {
        hessian[i][j] += bend[i][j];
      }
    }
    return hessian;
  }

  /** What the diagonal is raised by: its own size. */
  private static double[] scale(double[][] hessian) {
    double[] scale = new double[hessian.length];
    double most = 0;
    for (int k = 0; k < scale.length; k++) {
      scale[k] = Math.abs(hessian[k][k]);
      most = Math.max(most, scale[k]);
    }
    for (int k = 0; k < scale.length; k++) {
      scale[k] = Math.max(scale[k], 1e-12 * most);
    }
    return scale;
  }

  /** The solution of (H + damping · scale) move = gradient; empty where that is not definite. */
  private static double[] move(
      double[][] hessian, double[] gradient, double[] scale, double damping) {
    int f = gradient.length;
    double[][] raised = new double[f][f];
    double[] right = new double[f];
    for (int i = 0; i < f; i++) {
      right[i] = gradient[i] / Math.sqrt(scale[i]);
      for (int j = 0; j < f; j++) {
        raised[i][j] = hessian[i][j] / Math.sqrt(scale[i] * scale[j]) + (i == j ? damping : 0);
      }
    }
    try {
      double[] move =
          new CholeskyDecomposition(new Array2DRowRealMatrix(raised, false), 1e-8, 1e-13)
              .getSolver()
              .solve(new ArrayRealVector(right, false))
              .toArray();
      for (int i = 0; i < f; i++) {
        move[i] /= Math.sqrt(scale[i]);
      }
      return move;
    } catch (NonPositiveDefiniteMatrixException indefinite) {
      return new double[0];
    }
  }

  /** J′ V⁻¹ J. */
  static double[][] information(double[][] jacobian, double[][] metric) {
    int k = metric.length;
    int f = jacobian[0].length;
    double[][] left = new double[k][f];
    for (int i = 0; i < k; i++) {
      for (int j = 0; j < k; j++) {
        double weight = metric[i][j];
        for (int a = 0; a < f; a++) {
          left[i][a] += weight * jacobian[j][a];
        }
      }
    }
    double[][] product = new double[f][f];
    for (int i = 0; i < k; i++) {
      for (int a = 0; a < f; a++) {
        for (int b = 0; b <= a; b++) {
          product[a][b] += jacobian[i][a] * left[i][b];
        }
      }
    }
    for (int a = 0; a < f; a++) {
      for (int b = 0; b < a; b++) {
        product[b][a] = product[a][b];
      }
    }
    return product;
  }

  private static double[] times(double[][] matrix, double[] x) {
    double[] y = new double[matrix.length];
    Arrays.setAll(y, i -> Matrices.dot(matrix[i], x));
    return y;
  }

  private static double[] transposeTimes(double[][] matrix, double[] x) {
    double[] y = new double[matrix[0].length];
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < y.length; j++) {
        y[j] += matrix[i][j] * x[i];
      }
    }
    return y;
  }

  private static double dot(double[] a, double[] b) {
    return Matrices.dot(a, b);
  }
}

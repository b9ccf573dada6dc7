package isowright.leastcost;

import isowright.technology.Technology;
import java.util.Locale;

/**
 * Is the technology regular at a mix: every marginal product positive, and isoquants convex to the
 * origin (f quasi-concave)? In logs, with output elasticities e and G the Hessian of ln f in ln x,
 * the second holds where diag(e) − G is positive definite on the plane e · dz = 0.
 */
final class Regular {

  /**
   * A pivot below this part of the largest diagonal entry is a straight isoquant to the precision
   * of the sums it comes from.
   */
  static final double FLAT = 1e-12;

  private Regular() {}

  /** What is irregular at ln x, in words; empty where nothing is. */
  static String complaint(Technology technology, double[] z) {
    int n = z.length;
    double[] e = new double[n];
    technology.logGradient(z, e);
    for (int i = 0; i < n; i++) {
      if (!(e[i] > 0)) {
        return String.format(
            Locale.ROOT,
            "more of %s would not add output there (output elasticity %.3g at %s)",
            technology.inputs().get(i),
            e[i],
            Wording.mix(technology.inputs(), z));
      }
    }
    double[][] matrix = new double[n][n];
    technology.logHessian(z, matrix);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        matrix[i][j] = (i == j ? e[i] : 0) - matrix[i][j];
      }
    }
    if (n > 1 && !DenseSystem.positiveOnPlane(matrix, e, FLAT)) {
      return "isoquants are not convex to the origin at " + Wording.mix(technology.inputs(), z);
    }
    return "";
  }
}

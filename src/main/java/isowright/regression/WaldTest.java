package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Are some coefficients all zero? The Wald statistic in its F form, F = b′ V⁻¹ b / q.
 *
 * @param f the statistic; NaN where the covariance of the q coefficients is singular
 * @param restrictions q
 * @param degreesOfFreedom of the covariance, the second of F
 */
public record WaldTest(double f, int restrictions, double degreesOfFreedom) {

  /**
   * Of some coefficients of a fit.
   *
   * @param tested true where a coefficient is zero under the null; columns that were not estimated
   *     are left out
   */
  static WaldTest of(LinearFit fit, Covariance covariance, boolean[] tested) {
    double[] all = fit.coefficients();
    boolean[] estimated = fit.estimated();
    int[] places = new int[all.length];
    int q = 0;
    for (int k = 0; k < all.length; k++) {
      if (tested[k] && estimated[k]) {
        places[q++] = k;
      }
    }
    places = Arrays.copyOf(places, q);
    double[][] matrix = covariance.matrix();
    double[] b = new double[q];
    double[][] v = new double[q][q];
    for (int i = 0; i < q; i++) {
      // In units of standard errors, so that the scales of the columns do not decide on the rank.
      double si = Math.sqrt(matrix[places[i]][places[i]]);
      b[i] = all[places[i]] / si;
      for (int j = 0; j < q; j++) {
        v[i][j] = matrix[places[i]][places[j]] / si / Math.sqrt(matrix[places[j]][places[j]]);
      }
    }
    return new WaldTest(statistic(b, v), q, covariance.degreesOfFreedom());
  }

  /** Of q numbers that are zero under the null, with their covariance. */
  static WaldTest of(double[] b, double[][] v, double degreesOfFreedom) {
    int q = b.length;
    double[] scaled = new double[q];
    double[][] correlations = new double[q][q];
    for (int i = 0; i < q; i++) {
      scaled[i] = b[i] / Math.sqrt(v[i][i]);
      for (int j = 0; j < q; j++) {
        correlations[i][j] = v[i][j] / Math.sqrt(v[i][i]) / Math.sqrt(v[j][j]);
      }
    }
    return new WaldTest(statistic(scaled, correlations), q, degreesOfFreedom);
  }

  private static double statistic(double[] b, double[][] v) {
    int q = b.length;
    for (double[] row : v) {
      for (double entry : row) {
        if (!Double.isFinite(entry)) {
          return Double.NaN;
        }
      }
    }
    if (q == 0) {
      return Double.NaN;
    }
    SingularValueDecomposition decomposition =
        new SingularValueDecomposition(new Array2DRowRealMatrix(v, false));
    if (decomposition.getRank() < q) {
      return Double.NaN;
    }
    ArrayRealVector vector = new ArrayRealVector(b, false);
    return decomposition.getSolver().solve(vector).dotProduct(vector) / q;
  }
}

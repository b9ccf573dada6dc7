package isowright.inference;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Linear restrictions R β = r on estimated parameters: the Wald statistic in its F form,
 *
 * <pre>  F = (R b − r)′ (R V R′)^-1 (R b − r) / q, </pre>
 *
 * with q and the degrees of freedom of V. With the classical covariance it equals the F test from
 * the sums of squares with and without the restrictions.
 *
 * <p>Source: Greene, W. H. (2003), <i>Econometric Analysis</i>, 5th ed., section 6.3, eq. 6-6.
 */
final class LinearRestrictions {

  private LinearRestrictions() {}

  /** The F statistic; NaN where R V R′ is singular. */
  static double statistic(double[][] r, double[] right, double[] b, double[][] v) {
    int q = r.length;
    double[] departure = new double[q];
    for (int i = 0; i < q; i++) {
      departure[i] = -right[i];
      for (int k = 0; k < b.length; k++) {
        departure[i] += r[i][k] * b[k];
      }
    }
    RealMatrix restriction = new Array2DRowRealMatrix(r, false);
    RealMatrix middle =
        restriction.multiply(new Array2DRowRealMatrix(v, false)).multiply(restriction.transpose());
    SingularValueDecomposition decomposition = new SingularValueDecomposition(middle);
    if (decomposition.getRank() < q) {
      return Double.NaN;
    }
    double[] solved =
        decomposition
            .getSolver()
            .solve(new org.apache.commons.math3.linear.ArrayRealVector(departure, false))
            .toArray();
    double sum = 0;
    for (int i = 0; i < q; i++) {
      sum += departure[i] * solved[i];
    }
    return sum / q;
  }
}

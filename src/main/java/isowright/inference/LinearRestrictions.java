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
    double[] departure = new double[r.length];
    for (int i = 0; i < r.length; i++) {
      departure[i] = -right[i];
      for (int k = 0; k < b.length; k++) {
        departure[i] += r[i][k] * b[k];
      }
    }
    return statistic(departure, r, v);
  }

  /**
   * The same from departures g(b) of any smooth kind and their Jacobian G in place of R.
   *
   * @param departure shape q
   * @param jacobian q × k
   */
  static double statistic(double[] departure, double[][] jacobian, double[][] v) {
    int q = departure.length;
    RealMatrix restriction = new Array2DRowRealMatrix(jacobian, false);
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

  /**
   * The independent restrictions among "these coefficients are zero", given how the coefficients
   * follow from free ones: where some are bound by others, fewer than there are coefficients.
   *
   * @param places the coefficients, counted without the constant
   * @param reported all parameters by the free ones, p × f, the constant first in both
   * @param columns how many parameters there are with those that follow
   */
  static double[][] independent(int[] places, double[][] reported, int columns) {
    double[][] free = new double[places.length][];
    for (int i = 0; i < places.length; i++) {
      free[i] = reported[1 + places[i]];
    }
    SingularValueDecomposition decomposition =
        new SingularValueDecomposition(new Array2DRowRealMatrix(free));
    int rank = decomposition.getRank();
    if (rank == places.length) {
      double[][] rows = new double[places.length][columns];
      for (int i = 0; i < places.length; i++) {
        rows[i][1 + places[i]] = 1;
      }
      return rows;
    }
    double[][] rows = new double[rank][columns];
    for (int q = 0; q < rank; q++) {
      for (int i = 0; i < places.length; i++) {
        rows[q][1 + places[i]] = decomposition.getU().getEntry(i, q);
      }
    }
    return rows;
  }
}

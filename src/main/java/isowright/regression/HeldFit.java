package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * How precise are coefficients that were held to inequalities? The linear fit that {@link
 * InequalityLeastSquares} comes to, in the shape of any other. Tested in {@code
 * RegularityImposedTest}.
 */
public final class HeldFit {

  private HeldFit() {}

  /**
   * The fit of the rows with the coefficients that were found. Its factor is that of the directions
   * in which no inequality binds: covariances made from it are those of least squares with the
   * binding inequalities held as equations (Judge and Takayama 1966, <i>Journal of the American
   * Statistical Association</i> 61, 166–181), and say nothing of which of them bind. Every column
   * counts as a parameter.
   */
  public static LinearFit of(LinearFit free, InequalityLeastSquares.Found found) {
    double variance = free.residualVariance();
    return new LinearFit(
        free.columns(),
        found.coefficients(),
        free.estimated(),
        triangular(projected(free.inverseFactor(), found.binding())),
        free.ssr() + found.distance() * (variance > 0 ? variance : 1),
        free.totalSumOfSquares(),
        free.rows(),
        free.absorbed(),
        free.rank(),
        free.collinearities(),
        free.rankRule(),
        free.pivots());
  }

  /** F (I − B), B the projection on the span of some rows. */
  private static double[][] projected(double[][] factor, double[][] rows) {
    List<double[]> basis = new ArrayList<>();
    for (double[] row : rows) {
      double[] rest = row.clone();
      double whole = Math.sqrt(Matrices.dot(row, row));
      for (int pass = 0; pass < 2; pass++) {
        basis.forEach(axis -> remove(axis, rest));
      }
      double length = Math.sqrt(Matrices.dot(rest, rest));
      if (length > 1e-7 * whole) {
        basis.add(Arrays.stream(rest).map(v -> v / length).toArray());
      }
    }
    for (double[] row : factor) {
      basis.forEach(axis -> remove(axis, row));
    }
    return factor;
  }

  private static void remove(double[] axis, double[] from) {
    double along = Matrices.dot(axis, from);
    for (int k = 0; k < from.length; k++) {
      from[k] -= along * axis[k];
    }
  }

  /** An upper triangle U with U U′ = A A′, by rotations of the columns of A. */
  private static double[][] triangular(double[][] a) {
    for (int i = a.length - 1; i > 0; i--) {
      for (int j = 0; j < i; j++) {
        double length = Math.hypot(a[i][j], a[i][i]);
        if (length > 0) {
          double sine = a[i][j] / length;
          double cosine = a[i][i] / length;
          for (int row = 0; row <= i; row++) {
            double left = a[row][j];
            double right = a[row][i];
            a[row][j] = cosine * left - sine * right;
            a[row][i] = sine * left + cosine * right;
          }
          a[i][j] = 0;
        }
      }
    }
    return a;
  }
}

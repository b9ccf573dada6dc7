package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularMatrixException;

/**
 * Does a system obey what a narrower one over the same columns supposes? The Wald test, with
 * whatever covariance the parameters have, such as the clustered one.
 *
 * <p>Both systems leave residuals o − Dθ of the same columns; so a narrower one with parameters φ
 * is the wider one at θ = c + Mφ, where D_wide M = D_narrow and D_wide c = o_wide − o_narrow. With
 * N a basis of what M does not reach, the restrictions are N′θ = N′c, and
 *
 * <pre>  F = (N′(θ̂ − c))′ (N′VN)⁻¹ (N′(θ̂ − c)) / q </pre>
 *
 * Tested in {@code SystemRestrictionsTest}.
 */
public final class SystemRestrictions {

  /** Eigenvalues of a projection are zero or one. */
  private static final double HALF = 0.5;

  private SystemRestrictions() {}

  /**
   * The test.
   *
   * @param wide the fit of the wider system
   * @param covariance of its parameters
   * @param degreesOfFreedom of that covariance
   * @param narrow the narrower system, over the columns of the same design
   * @return F is NaN where parameters of the wider system were not all estimated, or the covariance
   *     of what is restricted is singular (more restrictions than groups less one)
   */
  public static WaldTest test(
      SystemFit wide, double[][] covariance, double degreesOfFreedom, EquationSystem narrow) {
    double[][] unreached = unreached(wide.system(), narrow);
    int q = unreached.length;
    // a covariance of G groups has rank G − 1 at most; rounding would hide it
    boolean many = q > degreesOfFreedom;
    if (wide.rank() < wide.coefficients().length || q == 0 || many) {
      return new WaldTest(Double.NaN, q, degreesOfFreedom);
    }
    double[] away = wide.coefficients();
    double[] c = offset(wide.system(), narrow);
    for (int k = 0; k < away.length; k++) {
      away[k] -= c[k];
    }
    double[] b = new double[q];
    Arrays.setAll(b, i -> Matrices.dot(unreached[i], away));
    return WaldTest.of(b, sandwich(unreached, covariance), degreesOfFreedom);
  }

  private static double[][] sandwich(double[][] n, double[][] v) {
    RealMatrix rows = new Array2DRowRealMatrix(n, false);
    return rows.multiply(new Array2DRowRealMatrix(v, false)).multiply(rows.transpose()).getData();
  }

  /** A basis of the directions of θ that M does not reach, one a row. */
  private static double[][] unreached(EquationSystem wide, EquationSystem narrow) {
    int k = wide.parameters().size();
    RealMatrix m = solve(stacked(wide), stacked(narrow));
    RealMatrix outer = m.multiply(inverse(m.transpose().multiply(m))).multiply(m.transpose());
    double[][] rest = new double[k][k];
    for (int i = 0; i < k; i++) {
      for (int j = 0; j < k; j++) {
        rest[i][j] = (i == j ? 1 : 0) - 0.5 * (outer.getEntry(i, j) + outer.getEntry(j, i));
      }
    }
    EigenDecomposition eigen = new EigenDecomposition(new Array2DRowRealMatrix(rest, false));
    double[] values = eigen.getRealEigenvalues();
    double[][] basis = new double[k][];
    int count = 0;
    for (int e = 0; e < k; e++) {
      if (values[e] > HALF) {
        basis[count++] = eigen.getEigenvector(e).toArray();
      }
    }
    return Arrays.copyOf(basis, count);
  }

  private static double[] offset(EquationSystem wide, EquationSystem narrow) {
    int equations = wide.size();
    int columns = wide.equations().get(0).offsets().length;
    double[][] off = new double[equations * columns][1];
    for (int e = 0; e < equations; e++) {
      double[] a = wide.equations().get(e).offsets();
      double[] b = narrow.equations().get(e).offsets();
      for (int j = 0; j < columns; j++) {
        off[e * columns + j][0] = a[j] - b[j];
      }
    }
    return solve(stacked(wide), new Array2DRowRealMatrix(off, false)).getColumn(0);
  }

  private static RealMatrix stacked(EquationSystem system) {
    int columns = system.equations().get(0).offsets().length;
    double[][] all = new double[system.size() * columns][];
    for (int e = 0; e < system.size(); e++) {
      System.arraycopy(system.equations().get(e).loadings(), 0, all, e * columns, columns);
    }
    return new Array2DRowRealMatrix(all, false);
  }

  private static RealMatrix inverse(RealMatrix square) {
    return new QRDecomposition(square).getSolver().getInverse();
  }

  private static RealMatrix solve(RealMatrix left, RealMatrix right) {
    try {
      return new QRDecomposition(left, 1e-12).getSolver().solve(right);
    } catch (SingularMatrixException dependent) {
      throw new IllegalArgumentException(
          "a parameter of the wider system has no column", dependent);
    }
  }
}

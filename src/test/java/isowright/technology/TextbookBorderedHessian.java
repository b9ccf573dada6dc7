package isowright.technology;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * The textbook's bordered Hessian in the inputs' own units, with cofactors by determinants: another
 * road to the same elasticities, fit for inputs of order one only.
 */
final class TextbookBorderedHessian {

  private final double[] x;
  private final double[] f;
  private final double[][] second;
  private final double[][] bordered;

  TextbookBorderedHessian(Technology technology, double[] mix) {
    int n = mix.length;
    this.x = mix.clone();
    this.f = technology.gradient(mix);
    this.second = technology.hessian(mix);
    this.bordered = new double[n + 1][n + 1];
    for (int i = 0; i < n; i++) {
      bordered[0][i + 1] = f[i];
      bordered[i + 1][0] = f[i];
      System.arraycopy(second[i], 0, bordered[i + 1], 1, n);
    }
  }

  /** Allen (1938): A_ij = (Σ x_k f_k)/(x_i x_j) · F_ij/|F|. */
  double allen(int i, int j) {
    double sum = 0;
    for (int k = 0; k < x.length; k++) {
      sum += x[k] * f[k];
    }
    return sum / (x[i] * x[j]) * ratio(i, j);
  }

  /** Blackorby and Russell (1989): M_ij = (f_j/x_i) F_ij/|F| − (f_j/x_j) F_jj/|F|. */
  double morishima(int i, int j) {
    return f[j] / x[i] * ratio(i, j) - f[j] / x[j] * ratio(j, j);
  }

  /** Hicks: f_i f_j (x_i f_i + x_j f_j)/[x_i x_j (2 f_i f_j f_ij − f_i² f_jj − f_j² f_ii)]. */
  double hicks(int i, int j) {
    double bend =
        2 * f[i] * f[j] * second[i][j] - f[i] * f[i] * second[j][j] - f[j] * f[j] * second[i][i];
    return f[i] * f[j] * (x[i] * f[i] + x[j] * f[j]) / (x[i] * x[j] * bend);
  }

  /** (−1)^k |F_k| for the first k inputs; all positive from k = 2 on: strictly quasi-concave. */
  double signedMinor(int k) {
    RealMatrix leading = new Array2DRowRealMatrix(bordered).getSubMatrix(0, k, 0, k);
    return (k % 2 == 0 ? 1 : -1) * determinant(leading);
  }

  private double ratio(int i, int j) {
    int n = x.length;
    double[][] minor = new double[n][n];
    for (int r = 0; r < n; r++) {
      for (int c = 0; c < n; c++) {
        minor[r][c] = bordered[r <= i ? r : r + 1][c <= j ? c : c + 1];
      }
    }
    double sign = (i + j) % 2 == 0 ? 1 : -1;
    return sign
        * determinant(new Array2DRowRealMatrix(minor))
        / determinant(new Array2DRowRealMatrix(bordered));
  }

  private static double determinant(RealMatrix matrix) {
    return new LUDecomposition(matrix, 0).getDeterminant();
  }
}

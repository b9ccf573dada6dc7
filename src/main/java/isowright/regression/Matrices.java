package isowright.regression;

/** The few products of small square matrices, {@code [row][column]}, that this package needs. */
final class Matrices {

  private Matrices() {}

  static double[][] copy(double[][] matrix) {
    double[][] copy = new double[matrix.length][];
    for (int i = 0; i < matrix.length; i++) {
      copy[i] = matrix[i].clone();
    }
    return copy;
  }

  /** F F′, exactly symmetric. */
  static double[][] timesTranspose(double[][] f) {
    int n = f.length;
    double[][] product = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        product[i][j] = dot(f[i], f[j]);
        product[j][i] = product[i][j];
      }
    }
    return product;
  }

  /** F M F′ for symmetric M, exactly symmetric. */
  static double[][] sandwich(double[][] f, double[][] m) {
    int n = f.length;
    double[][] left = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        left[i][j] = dot(f[i], m[j]);
      }
    }
    double[][] product = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        product[i][j] = dot(left[i], f[j]);
        product[j][i] = product[i][j];
      }
    }
    return product;
  }

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }
}

package isowright.leastcost;

/**
 * The eigenvalues of a small symmetric form on a plane: those of Zᵀ A Z with the columns of Z an
 * orthonormal basis of normal · v = 0 (the last columns of a Householder reflection that turns the
 * normal to the first axis), by Jacobi rotations.
 */
final class PlaneEigenvalues {

  private static final int SWEEPS = 60;

  private PlaneEigenvalues() {}

  /**
   * The eigenvalues, in no particular order.
   *
   * @param form n × n, symmetric; read only
   * @param normal shape n, not all zero
   * @return shape n − 1
   */
  static double[] of(double[][] form, double[] normal) {
    int n = normal.length;
    double[][] reflected = reflected(form, normal);
    double[][] plane = new double[n - 1][n - 1];
    for (int i = 1; i < n; i++) {
      System.arraycopy(reflected[i], 1, plane[i - 1], 0, n - 1);
    }
    for (int sweep = 0; sweep < SWEEPS && offDiagonal(plane) > 0; sweep++) {
      for (int p = 0; p < n - 1; p++) {
        for (int q = p + 1; q < n - 1; q++) {
          rotate(plane, p, q);
        }
      }
    }
    double[] values = new double[n - 1];
    for (int i = 0; i < n - 1; i++) {
      values[i] = plane[i][i];
    }
    return values;
  }

  /** H A H with H = I − 2 u uᵀ/uᵀu, u = normal ± |normal| times the first axis. */
  private static double[][] reflected(double[][] form, double[] normal) {
    int n = normal.length;
    double length = 0;
    for (double each : normal) {
      length = Math.hypot(length, each);
    }
    double[] u = normal.clone();
    u[0] += normal[0] >= 0 ? length : -length;
    double square = 0;
    for (double each : u) {
      square += each * each;
    }
    double[] product = new double[n];
    double quadratic = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        product[i] += form[i][j] * u[j];
      }
      quadratic += u[i] * product[i];
    }
    double[][] reflected = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        reflected[i][j] =
            form[i][j]
                - 2 * (u[i] * product[j] + product[i] * u[j]) / square
                + 4 * quadratic * u[i] * u[j] / (square * square);
      }
    }
    return reflected;
  }

  private static double offDiagonal(double[][] matrix) {
    double off = 0;
    double size = 0;
    for (int i = 0; i < matrix.length; i++) {
      for (int j = 0; j < matrix.length; j++) {
        double square = matrix[i][j] * matrix[i][j];
        size += square;
        off += i == j ? 0 : square;
      }
    }
    return off > 1e-30 * size ? off : 0;
  }

  private static void rotate(double[][] a, int p, int q) {
    if (a[p][q] == 0) {
      return;
    }
    double theta = (a[q][q] - a[p][p]) / (2 * a[p][q]);
    double t = Math.signum(theta) / (Math.abs(theta) + Math.hypot(theta, 1));
    t = theta == 0 ? 1 : t;
    double c = 1 / Math.hypot(t, 1);
    double s = t * c;
    for (int k = 0; k < a.length; k++) {
      double first = a[k][p];
      double second = a[k][q];
      a[k][p] = c * first - s * second;
      a[k][q] = s * first + c * second;
    }
    for (int k = 0; k < a.length; k++) {
      double first = a[p][k];
      double second = a[q][k];
      a[p][k] = c * first - s * second;
      a[q][k] = s * first + c * second;
    }
  }
}

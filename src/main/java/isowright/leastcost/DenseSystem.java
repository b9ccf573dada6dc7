package isowright.leastcost;

/** Small dense linear systems in place, for a handful of inputs, where a library would allocate. */
final class DenseSystem {

  /** A pivot below this part of the largest entry of its column at the outset counts as zero. */
  private static final double SINGULAR = 1e-14;

  private DenseSystem() {}

  /**
   * Solves by Gaussian elimination with partial pivoting.
   *
   * @param augmented size rows of size + 1 numbers, matrix and right-hand side; overwritten
   * @param into shape size, overwritten
   * @return false where the matrix is singular to working precision
   */
  static boolean solve(double[][] augmented, int size, double[] into) {
    double largest = 0;
    for (int r = 0; r < size; r++) {
      for (int c = 0; c < size; c++) {
        largest = Math.max(largest, Math.abs(augmented[r][c]));
      }
    }
    for (int c = 0; c < size; c++) {
      int pivot = c;
      for (int r = c + 1; r < size; r++) {
        if (Math.abs(augmented[r][c]) > Math.abs(augmented[pivot][c])) {
          pivot = r;
        }
      }
      double[] swapped = augmented[pivot];
      augmented[pivot] = augmented[c];
      augmented[c] = swapped;
      if (!(Math.abs(swapped[c]) > SINGULAR * largest)) {
        return false;
      }
      for (int r = c + 1; r < size; r++) {
        double[] row = augmented[r];
        double factor = row[c] / swapped[c];
        if (factor != 0) {
          for (int k = c + 1; k <= size; k++) {
            row[k] -= factor * swapped[k];
          }
        }
      }
    }
    for (int r = size - 1; r >= 0; r--) {
      double sum = augmented[r][size];
      for (int c = r + 1; c < size; c++) {
        sum -= augmented[r][c] * into[c];
      }
      into[r] = sum / augmented[r][r];
    }
    return true;
  }

  /**
   * Whether a symmetric matrix is positive definite on the plane normal · d = 0, every pivot being
   * above {@code least} times the largest diagonal entry of the matrix.
   *
   * @param matrix n × n; read only
   * @param normal shape n, not all zero
   */
  static boolean positiveOnPlane(double[][] matrix, double[] normal, double least) {
    int n = normal.length;
    int k = 0;
    for (int i = 1; i < n; i++) {
      if (Math.abs(normal[i]) > Math.abs(normal[k])) {
        k = i;
      }
    }
    double size = 0;
    double[][] reduced = new double[n - 1][n - 1];
    for (int i = 0, r = 0; i < n; i++) {
      size = Math.max(size, Math.abs(matrix[i][i]));
      if (i == k) {
        continue;
      }
      double ri = normal[i] / normal[k];
      for (int j = 0, c = 0; j < n; j++) {
        if (j == k) {
          continue;
        }
        double rj = normal[j] / normal[k];
        reduced[r][c++] =
            matrix[i][j] - ri * matrix[k][j] - rj * matrix[i][k] + ri * rj * matrix[k][k];
      }
      r++;
    }
    return positive(reduced, least * size);
  }

  /** Whether every pivot of a symmetric matrix, eliminated in place, is above a bound. */
  private static boolean positive(double[][] matrix, double bound) {
    for (int c = 0; c < matrix.length; c++) {
      double pivot = matrix[c][c];
      if (!(pivot > bound)) {
        return false;
      }
      for (int r = c + 1; r < matrix.length; r++) {
        double factor = matrix[r][c] / pivot;
        for (int k = c; k < matrix.length; k++) {
          matrix[r][k] -= factor * matrix[c][k];
        }
      }
    }
    return true;
  }
}

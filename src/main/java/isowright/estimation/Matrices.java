package isowright.estimation;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.LUDecomposition;

/** Products of small dense matrices. */
final class Matrices {

  private Matrices() {}

  /** L V L′. */
  static double[][] sandwich(double[][] l, double[][] v) {
    int p = l.length;
    int k = v.length;
    double[][] left = new double[p][k];
    for (int i = 0; i < p; i++) {
      for (int a = 0; a < k; a++) {
        double weight = l[i][a];
        if (weight != 0) {
          for (int b = 0; b < k; b++) {
            left[i][b] += weight * v[a][b];
          }
        }
      }
    }
    double[][] product = new double[p][p];
    for (int i = 0; i < p; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int b = 0; b < k; b++) {
          sum += left[i][b] * l[j][b];
        }
        product[i][j] = sum;
        product[j][i] = sum;
      }
    }
    return product;
  }

  static double[][] identity(int n) {
    double[][] identity = new double[n][n];
    for (int i = 0; i < n; i++) {
      identity[i][i] = 1;
    }
    return identity;
  }

  /** The matrix with an identity of this size below and to the right of it. */
  static double[][] extended(double[][] matrix, int by) {
    int rows = matrix.length;
    int columns = matrix[0].length;
    double[][] extended = new double[rows + by][columns + by];
    for (int i = 0; i < rows; i++) {
      System.arraycopy(matrix[i], 0, extended[i], 0, columns);
    }
    for (int k = 0; k < by; k++) {
      extended[rows + k][columns + k] = 1;
    }
    return extended;
  }

  /** The solution of A x = b for a small square A; NaN where A is singular. */
  static double[] solve(double[][] a, double[] b) {
    DecompositionSolver solver =
        new LUDecomposition(new Array2DRowRealMatrix(a, false)).getSolver();
    if (!solver.isNonSingular()) {
      double[] nothing = new double[b.length];
      java.util.Arrays.fill(nothing, Double.NaN);
      return nothing;
    }
    return solver.solve(new ArrayRealVector(b, false)).toArray();
  }
}

package isowright.regression;

/**
 * Least squares from a packed matrix S = [A c; c′ e] near the identity (see {@link GroupProducts}):
 * the move d = A⁻¹ c by Cholesky's decomposition. Used by one thread.
 */
final class PackedSolver {

  /**
   * A pivot of A below this, where all rows together have one, means that the weighted rows do not
   * tell the columns apart: some direction has less than a hundred-thousandth of its usual length
   * left. Exact loss leaves rounding, some 1e-15.
   */
  static final double LEAST_PIVOT = 1e-10;

  private final int columns;
  private final double[] triangle;
  private final double[] move;
  private int lost;
  private double left;

  PackedSolver(int columns) {
    this.columns = columns;
    this.triangle = new double[(columns + 1) * (columns + 2) / 2];
    this.move = new double[columns];
  }

  /**
   * Solves; a direction that is lost is left where the fit of all rows has it.
   *
   * @param packed the lower triangle of S; not changed
   * @return whether no direction was lost
   */
  boolean solve(double[] packed) {
    lost = 0;
    for (int i = 0; i <= columns; i++) {
      int row = GroupProducts.place(0, i, 0);
      for (int j = 0; j <= i; j++) {
        int other = GroupProducts.place(0, j, 0);
        double sum = packed[row + j];
        for (int k = 0; k < j; k++) {
          sum -= triangle[row + k] * triangle[other + k];
        }
        if (j < i) {
          double pivot = triangle[other + j];
          triangle[row + j] = pivot > 0 ? sum / pivot : 0;
        } else if (i == columns) {
          left = sum;
        } else {
          boolean full = sum > LEAST_PIVOT;
          triangle[row + i] = full ? Math.sqrt(sum) : 0;
          lost += full ? 0 : 1;
        }
      }
    }
    int last = GroupProducts.place(0, columns, 0);
    for (int i = columns - 1; i >= 0; i--) {
      double sum = triangle[last + i];
      for (int k = i + 1; k < columns; k++) {
        sum -= triangle[GroupProducts.place(0, k, i)] * move[k];
      }
      double pivot = triangle[GroupProducts.place(0, i, i)];
      move[i] = pivot > 0 ? sum / pivot : 0;
    }
    return lost == 0;
  }

  /**
   * L⁻ᵀ of the last solution, A = L L′; a direction that was lost stands for itself. Upper
   * triangular.
   */
  double[][] inverseTransposed() {
    double[][] inverse = new double[columns][columns];
    for (int k = 0; k < columns; k++) {
      for (int i = k; i >= 0; i--) {
        double sum = i == k ? 1 : 0;
        for (int j = i + 1; j <= k; j++) {
          sum -= triangle[GroupProducts.place(0, j, i)] * inverse[j][k];
        }
        double pivot = triangle[GroupProducts.place(0, i, i)];
        inverse[i][k] = pivot > 0 ? sum / pivot : sum;
      }
    }
    return inverse;
  }

  /** How many directions were lost. */
  int lost() {
    return lost;
  }

  /** d of the last solution; valid until the next. */
  double[] move() {
    return move;
  }

  /** The sum of squares of the last solution, in units of that of all rows. */
  double sumOfSquares() {
    return Math.max(0, left);
  }
}

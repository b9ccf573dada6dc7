package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What the triangular factor R of [X y] says: which columns are estimated, the coefficients, and
 * the inverse factor. Works on (K + 1) × (K + 1) numbers; columns are divided by their length
 * first, so units do not matter.
 */
final class RankAnalysis {

  /** Columns with less than this share of the largest part are rounding, not part of the set. */
  private static final double LEAST_PART = 1e-6;

  private final List<String> names;
  private final int columns;
  private final RankRule rule;

  /** {@code work[j]}: column j of R, divided by its length; the response, undivided, at K. */
  private final double[][] work;

  private final double[] lengths;
  private final double[] pivots;
  private final int[] kept;
  private final List<Collinearity> collinearities = new ArrayList<>();
  private int rank;

  /**
   * @param squares the sum of squares of each column before anything was removed from it
   */
  RankAnalysis(
      List<String> names, OrthogonalDecomposition decomposition, double[] squares, RankRule rule) {
    this.names = names;
    this.columns = names.size();
    this.rule = rule;
    this.work = new double[columns + 1][columns + 1];
    this.lengths = new double[columns];
    this.pivots = new double[columns];
    this.kept = new int[columns];
    double[][] factor = decomposition.factor();
    for (int j = 0; j <= columns; j++) {
      for (int i = 0; i <= j; i++) {
        work[j][i] = factor[i][j];
      }
    }
    for (int j = 0; j < columns; j++) {
      take(j, Math.sqrt(squares[j]));
    }
  }

  /** Decides on column j, whose length before removal was {@code before}. */
  private void take(int j, double before) {
    double[] column = work[j];
    lengths[j] = Math.sqrt(OrthogonalDecomposition.sumOfSquares(column, 0, columns));
    double size = Math.max(before, lengths[j]);
    if (lengths[j] <= rule.smallestPivot() * size) {
      pivots[j] = size == 0 ? 0 : lengths[j] / size;
      List<String> among = size == 0 ? List.of() : List.of(Collinearity.GROUP_EFFECTS);
      collinearities.add(new Collinearity(names.get(j), among));
      return;
    }
    for (int i = 0; i < columns; i++) {
      column[i] /= lengths[j];
    }
    double left = Math.sqrt(OrthogonalDecomposition.sumOfSquares(column, rank, columns));
    pivots[j] = left * (lengths[j] / size);
    if (pivots[j] < rule.smallestPivot()) {
      collinearities.add(new Collinearity(names.get(j), among(column)));
      return;
    }
    if (rank < j) {
      reflect(j);
    }
    kept[rank++] = j;
  }

  /** Makes column j zero below row {@code rank}, after earlier columns were dropped. */
  private void reflect(int j) {
    double[] v = work[j].clone();
    double length = Math.sqrt(OrthogonalDecomposition.sumOfSquares(v, rank, columns));
    double top = v[rank];
    double end = top >= 0 ? -length : length;
    v[rank] = top - end;
    double scale = 1 / (length * (length + Math.abs(top)));
    for (int l = j + 1; l <= columns; l++) {
      double step = scale * OrthogonalDecomposition.product(v, work[l], rank, columns);
      for (int i = rank; i < columns; i++) {
        work[l][i] -= step * v[i];
      }
    }
    for (int i = rank + 1; i < columns; i++) {
      work[j][i] = 0;
    }
    work[j][rank] = end;
  }

  private List<String> among(double[] column) {
    double[] parts = new double[rank];
    System.arraycopy(column, 0, parts, 0, rank);
    solve(parts);
    double largest = 0;
    for (double part : parts) {
      largest = Math.max(largest, Math.abs(part));
    }
    List<String> among = new ArrayList<>();
    for (int p = 0; p < rank; p++) {
      if (Math.abs(parts[p]) > LEAST_PART * largest) {
        among.add(names.get(kept[p]));
      }
    }
    return among;
  }

  /** T⁻¹ b in place, T the triangle of the kept columns. */
  private void solve(double[] b) {
    for (int p = rank - 1; p >= 0; p--) {
      double sum = b[p];
      for (int q = p + 1; q < rank; q++) {
        sum -= work[kept[q]][p] * b[q];
      }
      b[p] = sum / work[kept[p]][p];
    }
  }

  /** T′⁻¹ b in place. */
  private void solveTransposed(double[] b) {
    for (int p = 0; p < rank; p++) {
      double[] column = work[kept[p]];
      double sum = b[p];
      for (int q = 0; q < p; q++) {
        sum -= column[q] * b[q];
      }
      b[p] = sum / column[p];
    }
  }

  /** The length of each column after removal; shape K. */
  double[] lengths() {
    return lengths;
  }

  int rank() {
    return rank;
  }

  List<Collinearity> collinearities() {
    return collinearities;
  }

  double[] pivots() {
    return pivots;
  }

  boolean[] estimated() {
    boolean[] estimated = new boolean[columns];
    for (int p = 0; p < rank; p++) {
      estimated[kept[p]] = true;
    }
    return estimated;
  }

  /** R⁻¹Q′y, zero where a column was dropped; shape K. */
  double[] coefficients() {
    double[] b = new double[rank];
    System.arraycopy(work[columns], 0, b, 0, rank);
    solve(b);
    return spread(b);
  }

  /** Q₁′y, the response along the kept columns: ‖Q₁′y‖² is the sum of squares they explain. */
  double explained() {
    return OrthogonalDecomposition.sumOfSquares(work[columns], 0, rank);
  }

  /**
   * The change of the coefficients that makes the residual orthogonal, from the inner products g of
   * the columns with the residual: (R′R)⁻¹ g.
   *
   * @param fall {@code fall[0]} is overwritten with the fall of the sum of squares, g′(R′R)⁻¹g
   */
  double[] correction(double[] g, double[] fall) {
    double[] b = new double[rank];
    for (int p = 0; p < rank; p++) {
      b[p] = g[kept[p]] / lengths[kept[p]];
    }
    solveTransposed(b);
    fall[0] = Matrices.dot(b, b);
    solve(b);
    return spread(b);
  }

  private double[] spread(double[] b) {
    double[] all = new double[columns];
    for (int p = 0; p < rank; p++) {
      all[kept[p]] = b[p] / lengths[kept[p]];
    }
    return all;
  }

  /** F = R⁻¹ over the kept columns, zero elsewhere; K × K. */
  double[][] inverseFactor() {
    double[][] inverse = new double[columns][columns];
    double[] unit = new double[rank];
    for (int q = 0; q < rank; q++) {
      Arrays.fill(unit, 0);
      unit[q] = 1;
      solve(unit);
      for (int p = 0; p <= q; p++) {
        inverse[kept[p]][kept[q]] = unit[p] / lengths[kept[p]];
      }
    }
    return inverse;
  }
}

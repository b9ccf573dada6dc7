package isowright.regression;

/** Rows in the orthogonal basis F′x, in which the leverage of a row is its squared length. */
final class Leverage {

  private Leverage() {}

  /**
   * Replaces the kept columns of a block by those of F′x.
   *
   * @param factor F, upper triangular over the kept columns
   * @param kept the kept columns, ascending
   */
  static void rotate(double[][] block, int rows, double[][] factor, int[] kept) {
    // From the last column back: column q needs only the columns before it, still untouched.
    for (int q = kept.length - 1; q >= 0; q--) {
      double[] column = block[kept[q]];
      double own = factor[kept[q]][kept[q]];
      for (int i = 0; i < rows; i++) {
        column[i] *= own;
      }
      for (int p = 0; p < q; p++) {
        double[] other = block[kept[p]];
        double weight = factor[kept[p]][kept[q]];
        for (int i = 0; i < rows; i++) {
          column[i] += weight * other[i];
        }
      }
    }
  }

  /** Leverages of rotated rows, with that of what was absorbed. */
  static void of(double[][] rotated, int from, int rows, int[] kept, Design design, double[] into) {
    boolean absorbs = design.absorbed() > 0;
    for (int i = 0; i < rows; i++) {
      into[i] = absorbs ? design.absorbedLeverage(from + i) : 0;
    }
    for (int k : kept) {
      double[] column = rotated[k];
      for (int i = 0; i < rows; i++) {
        into[i] += column[i] * column[i];
      }
    }
  }
}

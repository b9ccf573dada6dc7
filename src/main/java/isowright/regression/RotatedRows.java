package isowright.regression;

/** Rows of a design as a fit sees them: q = (F′x, r/s); see {@link GroupProducts}. */
final class RotatedRows {

  private final double[] coefficients;
  private final double[][] factor;
  private final int[] kept;
  private final double scale;
  private final Residuals residuals;
  private final double[][] rotated;

  /** For blocks of at most {@code longest} rows. */
  RotatedRows(LinearFit fit, int longest) {
    this.coefficients = fit.coefficients();
    this.factor = fit.inverseFactor();
    this.kept = fit.kept();
    this.scale = fit.ssr() > 0 ? 1 / Math.sqrt(fit.ssr()) : 1;
    this.residuals = new Residuals(longest);
    this.rotated = new double[kept.length + 1][];
  }

  /**
   * Reads a block.
   *
   * @param buffer K + 1 columns, overwritten
   * @return k + 1 columns, among them those of the buffer; valid until the next call
   */
  double[][] of(Design design, int from, int to, double[][] buffer) {
    int rows = to - from;
    design.fill(from, to, buffer);
    double[] r = residuals.of(buffer, rows, coefficients);
    double[] last = buffer[coefficients.length];
    for (int i = 0; i < rows; i++) {
      last[i] = r[i] * scale;
    }
    Leverage.rotate(buffer, rows, factor, kept);
    for (int p = 0; p < kept.length; p++) {
      rotated[p] = buffer[kept[p]];
    }
    rotated[kept.length] = last;
    return rotated;
  }
}

package isowright.regression;

/** The middle of the sandwich in the basis F′x, Σ u u′ over rows or groups. */
final class RowMiddle {
  private final double[][] factor;
  private final int[] kept;
  private final double[] coefficients;
  private final double[][] sum;
  private final Residuals residuals;
  private long exactRows;

  private RowMiddle(LinearFit fit, int longest) {
    factor = fit.inverseFactor();
    kept = fit.kept();
    coefficients = fit.coefficients();
    sum = new double[factor.length][factor.length];
    residuals = new Residuals(longest);
  }

  static RowMiddle of(Design design, LinearFit fit, Covariance.Kind kind) {
    Blocks blocks = Blocks.of(design.groups());
    return blocks.gather(
        fit.columns().size() + 1,
        () -> new RowMiddle(fit, blocks.longest()),
        (middle, from, to, buffer) -> {
          design.fill(from, to, buffer);
          if (kind == Covariance.Kind.CLUSTERED) {
            middle.addGroups(buffer, from, to, design.groups());
          } else {
            middle.addRows(buffer, from, to, design, kind == Covariance.Kind.HC3);
          }
        },
        RowMiddle::add);
  }

  private void addRows(double[][] block, int from, int to, Design design, boolean enlarged) {
    int rows = to - from;
    double[] weight = residuals.of(block, rows, coefficients);
    Leverage.rotate(block, rows, factor, kept);
    if (enlarged) {
      double[] leverage = block[coefficients.length];
      Leverage.of(block, from, rows, kept, design, leverage);
      for (int i = 0; i < rows; i++) {
        double left = 1 - leverage[i];
        if (left > Covariance.LEVERAGE_ONE) {
          weight[i] /= left;
        } else {
          weight[i] = 0;
          exactRows++;
        }
      }
    }
    for (int k : kept) {
      for (int i = 0; i < rows; i++) {
        block[k][i] *= weight[i];
      }
    }
    addProducts(block, rows);
  }

  private void addGroups(double[][] block, int from, int to, Groups groups) {
    double[] r = residuals.of(block, to - from, coefficients);
    int first = groups.of(from);
    int count = 0;
    for (int g = first; g < groups.count() && groups.start(g) < to; g++, count++) {
      int start = groups.start(g) - from;
      int end = groups.end(g) - from;
      for (int k : kept) {
        // Group g − first never lies behind its own rows, so the sums may overwrite the block.
        block[k][count] = OrthogonalDecomposition.product(r, block[k], start, end);
      }
    }
    Leverage.rotate(block, count, factor, kept);
    addProducts(block, count);
  }

  private void addProducts(double[][] block, int rows) {
    for (int k : kept) {
      for (int l : kept) {
        if (l <= k) {
          sum[k][l] += OrthogonalDecomposition.product(block[k], block[l], 0, rows);
        }
      }
    }
  }

  private void add(RowMiddle other) {
    for (int k = 0; k < sum.length; k++) {
      for (int l = 0; l <= k; l++) {
        sum[k][l] += other.sum[k][l];
      }
    }
    exactRows += other.exactRows;
  }

  long exactRows() {
    return exactRows;
  }

  double[][] matrix() {
    double[][] full = Matrices.copy(sum);
    for (int k = 0; k < full.length; k++) {
      for (int l = 0; l < k; l++) {
        full[l][k] = full[k][l];
      }
    }
    return full;
  }
}

package isowright.technology;

/**
 * The two stages of a nested technology and their derivatives for many rows at once: each nest by
 * {@link CesRows} into columns of its own, then the composites by {@link CesRows} again, then every
 * derivative of a nest times ν P_g.
 *
 * <p>Columns of derivatives, in this order: scale (where wanted), log ratios within the nests, log
 * ratios between groups, ρ between groups, ρ_g of the nests. An object belongs to one thread.
 */
final class NestedCesRows {

  private final Nests nests;
  private final double[][] within;
  private final double[] between;
  private final double scale;
  private final double[] curvatures;

  NestedCesRows(
      Nests nests, double[][] within, double[] between, double scale, double[] curvatures) {
    this.nests = nests;
    this.within = within;
    this.between = between;
    this.scale = scale;
    this.curvatures = curvatures;
  }

  /**
   * Writes ν M and its derivatives.
   *
   * @param scaleToo whether the first column of derivatives is that of the scale
   */
  void evaluate(double[][] z, int rows, double[] value, double[][] derivatives, boolean scaleToo) {
    int count = nests.count();
    int firstCurvature = derivatives.length - curvatures.length;
    double[][] composites = new double[count][];
    int at = scaleToo ? 1 : 0;
    int curvature = 1;
    for (int g = 0; g < count; g++) {
      int[] members = nests.members(g);
      if (!nests.nest(g)) {
        composites[g] = z[members[0]];
        continue;
      }
      double[][] part = new double[members.length][];
      double[][] slopes = new double[members.length + 1][];
      slopes[0] = new double[rows];
      for (int m = 0; m < members.length; m++) {
        part[m] = z[members[m]];
        slopes[m + 1] =
            m < members.length - 1 ? derivatives[at++] : derivatives[firstCurvature + curvature];
      }
      composites[g] = new double[rows];
      stage(part, rows, within[g], 1, -curvatures[curvature++], composites[g], slopes);
    }
    double[][] slopes = new double[count + 1][];
    slopes[0] = scaleToo ? derivatives[0] : new double[rows];
    for (int g = 0; g < count - 1; g++) {
      slopes[g + 1] = derivatives[at++];
    }
    slopes[count] = derivatives[firstCurvature];
    stage(composites, rows, between, scale, -curvatures[0], value, slopes);
    carry(composites, rows, derivatives, scaleToo ? 1 : 0, firstCurvature + 1);
  }

  private static void stage(
      double[][] z,
      int rows,
      double[] shares,
      double scale,
      double order,
      double[] value,
      double[][] slopes) {
    CesRows block = new CesRows(z, shares, scale, order, value, slopes);
    for (int from = 0; from < rows; from += CesRows.BLOCK) {
      block.evaluate(from, Math.min(CesRows.BLOCK, rows - from));
    }
  }

  /** Multiplies what belongs to a nest by ν P_g. */
  private void carry(
      double[][] composites, int rows, double[][] derivatives, int first, int curvature) {
    double[] y = new double[composites.length];
    double[] zeros = new double[composites.length];
    double[] tilted = new double[composites.length];
    for (int r = 0; r < rows; r++) {
      for (int g = 0; g < y.length; g++) {
        y[g] = composites[g][r];
      }
      PowerMean.tilted(y, zeros, between, -curvatures[0], tilted);
      int at = first;
      int own = curvature;
      for (int g : nests.nests()) {
        double factor = scale * tilted[g];
        for (int m = 1; m < nests.members(g).length; m++) {
          derivatives[at++][r] *= factor;
        }
        derivatives[own++][r] *= factor;
      }
    }
  }
}

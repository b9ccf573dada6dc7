package isowright.regression;

/**
 * What the group means of a design say once they are turned into the basis of a fit: with x̄_g the
 * mean of the regressors over the T_g rows of group g, m_g = F′x̄_g, and ē_g the mean residual,
 *
 * <pre>
 *   A = Σ_g T_g m_g m_g′ = F′X′PXF,   B = Σ_g T_g² m_g m_g′ = F′X′ZZ′XF,   a = Σ_g T_g m_g,
 *   Σ_g T_g ē_g²,   Σ_g T_g ē_g,   Σ_it (e_it − ē_g)²,
 * </pre>
 *
 * P the projection on the groups and Z their indicators. Gathered in one reading, in parallel.
 */
final class GroupMoments {

  private final double[][] factor;
  private final int[] kept;
  private final double[] coefficients;
  private final Residuals residuals;
  private final double[][] weighted;
  private final double[][] twice;
  private final double[] first;
  private double between;
  private double mean;
  private double within;

  private GroupMoments(LinearFit basis, double[] coefficients, int longest) {
    this.factor = basis.inverseFactor();
    this.kept = basis.kept();
    this.coefficients = coefficients;
    this.residuals = new Residuals(longest);
    int columns = factor.length;
    this.weighted = new double[columns][columns];
    this.twice = new double[columns][columns];
    this.first = new double[columns];
  }

  /**
   * @param basis the fit whose inverse factor F is used, over the columns of the design
   * @param coefficients those by which residuals are formed
   */
  static GroupMoments of(Design design, LinearFit basis, double[] coefficients) {
    Blocks blocks = Blocks.of(design.groups());
    return blocks.gather(
        coefficients.length + 1,
        () -> new GroupMoments(basis, coefficients, blocks.longest()),
        (moments, from, to, buffer) -> {
          design.fill(from, to, buffer);
          moments.add(buffer, from, to, design.groups());
        },
        GroupMoments::add);
  }

  private void add(double[][] block, int from, int to, Groups groups) {
    double[] r = residuals.of(block, to - from, coefficients);
    double[] means = new double[kept.length];
    for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
      int at = groups.start(g) - from;
      int size = groups.end(g) - groups.start(g);
      rotated(block, at, size, means);
      for (int p = 0; p < kept.length; p++) {
        first[p] += size * means[p];
        for (int q = 0; q <= p; q++) {
          double product = size * means[p] * means[q];
          weighted[p][q] += product;
          twice[p][q] += size * product;
        }
      }
      double level = BetweenGroups.mean(r, at, size);
      between += size * level * level;
      mean += size * level;
      for (int i = at; i < at + size; i++) {
        within += (r[i] - level) * (r[i] - level);
      }
    }
  }

  /** m_g over the kept columns. */
  private void rotated(double[][] block, int at, int size, double[] into) {
    double[] level = new double[kept.length];
    for (int p = 0; p < kept.length; p++) {
      level[p] = BetweenGroups.mean(block[kept[p]], at, size);
    }
    for (int q = 0; q < kept.length; q++) {
      double sum = 0;
      for (int p = 0; p <= q; p++) {
        sum += factor[kept[p]][kept[q]] * level[p];
      }
      into[q] = sum;
    }
  }

  private void add(GroupMoments other) {
    for (int p = 0; p < kept.length; p++) {
      first[p] += other.first[p];
      for (int q = 0; q <= p; q++) {
        weighted[p][q] += other.weighted[p][q];
        twice[p][q] += other.twice[p][q];
      }
    }
    between += other.between;
    mean += other.mean;
    within += other.within;
  }

  /** tr A. */
  double trace() {
    double sum = 0;
    for (int p = 0; p < kept.length; p++) {
      sum += weighted[p][p];
    }
    return sum;
  }

  /** tr B. */
  double traceOfTwice() {
    double sum = 0;
    for (int p = 0; p < kept.length; p++) {
      sum += twice[p][p];
    }
    return sum;
  }

  /** tr AB. */
  double traceOfProduct() {
    double sum = 0;
    for (int p = 0; p < kept.length; p++) {
      for (int q = 0; q <= p; q++) {
        sum += (p == q ? 1 : 2) * weighted[p][q] * twice[p][q];
      }
    }
    return sum;
  }

  /** tr A − ‖a‖²/N: the trace of A of regressors about their mean over N rows. */
  double traceAboutMean(int rows) {
    return trace() - OrthogonalDecomposition.sumOfSquares(first, 0, kept.length) / rows;
  }

  /** Σ_g T_g ē_g². */
  double between() {
    return between;
  }

  /** Σ_g T_g (ē_g − ē)², ē the mean residual over N rows. */
  double betweenAboutMean(int rows) {
    return Math.max(0, between - mean * mean / rows);
  }

  /** Σ_it (e_it − ē_g)². */
  double within() {
    return within;
  }
}

package isowright.regression;

/**
 * What each group of rows contributes to a linear fit: enough to fit again without some groups, or
 * with some of them several times, and never to read a row again.
 *
 * <p>Notation: F the inverse factor of the fit of all rows (F F′ = (X′X)⁻¹), r its residuals, s =
 * √SSR. A row becomes q = (F′x, r/s), and group g contributes S_g = Σ q q′ over its rows, (k + 1) ×
 * (k + 1) for k estimated columns. Over all rows Σ_g S_g is the identity, whatever the units and
 * the condition of X. Rows weighted n_g by group have S = Σ n_g S_g = [A c; c′ e], and the
 * coefficients of their fit are b + s F A⁻¹ c: a small move from b, found from a matrix A near the
 * identity. So the condition of X enters once, through F, as in the fit itself; it is not squared.
 * The only condition that is squared is that of the weighted rows as seen by all rows, that is, how
 * much thinner they lie in their thinnest direction.
 *
 * <p>Assumption: the rows of a group in the design do not depend on the rows of other groups. It
 * holds for plain rows and for deviations from the group's own means, also where a group stands
 * several times (each copy then has its own effect); not where something common to all groups was
 * removed or estimated.
 *
 * <p>Tested in {@code GroupProductsTest}, with an ill-conditioned design in {@code
 * ClusterBootstrapTest}.
 */
public final class GroupProducts {

  private final LinearFit fit;
  private final Groups groups;
  private final int[] kept;
  private final double[][] factor;
  private final double scale;
  private final double[] products;

  private GroupProducts(LinearFit fit, Groups groups) {
    this.fit = fit;
    this.groups = groups;
    this.kept = fit.kept();
    this.factor = fit.inverseFactor();
    this.scale = fit.ssr() > 0 ? Math.sqrt(fit.ssr()) : 1;
    this.products = new double[Math.multiplyExact(groups.count(), packed())];
  }

  /** The basis alone, with no groups. */
  static GroupProducts basis(LinearFit fit) {
    return new GroupProducts(fit, Groups.ofSingleRows(0));
  }

  /** Reads the design once, in parallel. */
  public static GroupProducts of(Design design, LinearFit fit) {
    GroupProducts all = new GroupProducts(fit, design.groups());
    Blocks blocks = Blocks.of(design.groups());
    blocks.gather(
        fit.columns().size() + 1,
        () -> new RotatedRows(fit, blocks.longest()),
        (rows, from, to, buffer) -> all.take(rows.of(design, from, to, buffer), from, to),
        (a, b) -> {});
    return all;
  }

  private void take(double[][] rotated, int from, int to) {
    int size = size();
    for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
      int start = groups.start(g) - from;
      int end = groups.end(g) - from;
      int at = g * packed();
      for (int p = 0; p < size; p++) {
        for (int q = 0; q <= p; q++) {
          products[at++] = OrthogonalDecomposition.product(rotated[p], rotated[q], start, end);
        }
      }
    }
  }

  /** The number of groups, G. */
  public int groups() {
    return groups.count();
  }

  /** The fit of all rows. */
  public LinearFit fit() {
    return fit;
  }

  /** k + 1. */
  int size() {
    return kept.length + 1;
  }

  /** Numbers kept for a group: the lower triangle of S_g, row by row. */
  int packed() {
    return size() * (size() + 1) / 2;
  }

  /** All groups, one after another, each {@link #packed()} long; not to be changed. */
  double[] packedProducts() {
    return products;
  }

  /** Σ_g S_g, packed. */
  double[] total() {
    double[] total = new double[packed()];
    for (int at = 0; at < products.length; ) {
      for (int p = 0; p < total.length; p++) {
        total[p] += products[at++];
      }
    }
    return total;
  }

  /**
   * The coefficients b + s F d that belong to a move d in the basis; shape K, into a flat array.
   */
  void coefficients(double[] move, double[] into, int offset) {
    double[] b = fit.coefficients();
    System.arraycopy(b, 0, into, offset, b.length);
    for (int p = 0; p < kept.length; p++) {
      double sum = 0;
      for (int q = p; q < kept.length; q++) {
        sum += factor[kept[p]][kept[q]] * move[q];
      }
      into[offset + kept[p]] += scale * sum;
    }
  }

  /**
   * s_e F L⁻ᵀ over all columns, s_e² the residual variance of the fit of all rows (one where it has
   * no error).
   *
   * @param inverse L⁻ᵀ over the estimated columns
   */
  double[][] factorOf(double[][] inverse) {
    double variance = fit.residualVariance();
    double error = variance > 0 ? Math.sqrt(variance) : 1;
    double[][] product = new double[factor.length][factor.length];
    for (int p = 0; p < kept.length; p++) {
      for (int q = p; q < kept.length; q++) {
        double sum = 0;
        for (int k = p; k <= q; k++) {
          sum += factor[kept[p]][kept[k]] * inverse[k][q];
        }
        product[kept[p]][kept[q]] = error * sum;
      }
    }
    return product;
  }

  /** s. */
  double scale() {
    return scale;
  }

  /**
   * Row i of the lower triangle, entry j ≤ i.
   *
   * @param at where the group begins
   */
  static int place(int at, int i, int j) {
    return at + i * (i + 1) / 2 + j;
  }
}

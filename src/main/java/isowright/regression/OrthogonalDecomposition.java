package isowright.regression;

/**
 * The orthogonal decomposition [X y] = Q R of a design, of which only the triangular factor R is
 * kept: (K + 1) × (K + 1) numbers that hold all that least squares needs, whatever the number of
 * rows.
 *
 * <p>Rows are taken in by Householder reflections: a run of rows is stacked under the R so far and
 * the stack is made triangular again, in place in the block it came in, so the data are never
 * copied. Two factors merge in the same way, one stacked under the other, so rows may be read in
 * parallel. Errors stay those of a reflection method: the computed R is exact for a design whose
 * columns differ from the given ones by a few units in the last place of their length; the
 * condition of X is not squared, as cross-products would.
 *
 * <p>Notation: R[i][j], i ≤ j; column K is the response, R[K][K]² the sum of squared residuals.
 * Signs of rows of R are not normalised. Lengths of columns must lie between about 1e-150 and
 * 1e150, so that their squares are numbers.
 *
 * <p>Source: G. H. Golub and C. F. Van Loan, <i>Matrix Computations</i>, 3rd ed. 1996, algorithm
 * 5.1.1 (reflections) and section 12.5.3 (appending rows). Tested in {@code
 * OrthogonalDecompositionTest}.
 */
public final class OrthogonalDecomposition {

  /** Rows reflected at once: a run of twenty columns then stays close to the first-level cache. */
  private static final int RUN = 256;

  /** What is left of a column below this length is rounding: its square would lose its digits. */
  private static final double SHORTEST = 1e-145;

  private final int size;

  /** {@code factor[j][i]} is R[i][j]: column by column, like the blocks. */
  private final double[][] factor;

  private final double[] products;

  OrthogonalDecomposition(int size) {
    this.size = size;
    this.factor = new double[size][size];
    this.products = new double[size];
  }

  /** The decomposition of a design, read once, in parallel. */
  public static OrthogonalDecomposition of(Design design) {
    return of(design, Blocks.of(design.groups()));
  }

  static OrthogonalDecomposition of(Design design, Blocks blocks) {
    int size = design.columns().size() + 1;
    return blocks.gather(
        size,
        () -> new OrthogonalDecomposition(size),
        (into, from, to, buffer) -> {
          design.fill(from, to, buffer);
          into.add(buffer, to - from);
        },
        OrthogonalDecomposition::add);
  }

  /** The number of columns with the response, K + 1. */
  public int size() {
    return size;
  }

  /** R, upper triangular, (K + 1) × (K + 1), {@code [row][column]}. */
  public double[][] factor() {
    double[][] copy = new double[size][size];
    for (int j = 0; j < size; j++) {
      for (int i = 0; i <= j; i++) {
        copy[i][j] = factor[j][i];
      }
    }
    return copy;
  }

  /** True where every entry of R is a finite number, that is, where every value read was. */
  boolean finite() {
    double sum = 0;
    for (double[] column : factor) {
      for (double entry : column) {
        sum += Math.abs(entry);
      }
    }
    return Double.isFinite(sum);
  }

  /** The decomposition of the rows of both; neither changes. */
  public OrthogonalDecomposition merged(OrthogonalDecomposition other) {
    OrthogonalDecomposition both = new OrthogonalDecomposition(size);
    both.add(this);
    both.add(other);
    return both;
  }

  /** Takes in the rows of another decomposition of the same columns. */
  void add(OrthogonalDecomposition other) {
    double[][] copy = new double[size][];
    for (int j = 0; j < size; j++) {
      copy[j] = other.factor[j].clone();
    }
    reflect(copy, 0, size);
  }

  /**
   * Takes in rows.
   *
   * @param block K + 1 columns; destroyed
   * @param rows how many rows of it to take
   */
  void add(double[][] block, int rows) {
    for (int from = 0; from < rows; from += RUN) {
      reflect(block, from, Math.min(rows, from + RUN));
    }
  }

  private void reflect(double[][] block, int from, int to) {
    for (int k = 0; k < size; k++) {
      double[] pivot = block[k];
      double below = sumOfSquares(pivot, from, to);
      double top = factor[k][k];
      double length = Math.sqrt(top * top + below);
      if (below == 0 || length < SHORTEST) {
        continue; // nothing to reflect, or so little that its square is no number to divide by
      }
      // The sign that adds, so that nothing cancels in the first entry of the reflection.
      double first = top >= 0 ? top + length : top - length;
      double scale = 1 / (length * (length + Math.abs(top)));
      factor[k][k] = top >= 0 ? -length : length;
      project(block, k, from, to);
      for (int j = k + 1; j < size; j++) {
        double step = scale * (first * factor[j][k] + products[j]);
        factor[j][k] -= step * first;
        subtract(block[j], pivot, step, from, to);
      }
    }
  }

  /** Inner products of column k with all later ones, four at a time. */
  private void project(double[][] block, int k, int from, int to) {
    int j = k + 1;
    for (; j + 3 < size; j += 4) {
      fourProducts(
          block[k], block[j], block[j + 1], block[j + 2], block[j + 3], from, to, products, j);
    }
    for (; j < size; j++) {
      products[j] = product(block[k], block[j], from, to);
    }
  }

  private static void fourProducts(
      double[] v,
      double[] a,
      double[] b,
      double[] c,
      double[] d,
      int from,
      int to,
      double[] into,
      int at) {
    // Two rows at a time: eight sums that do not wait for one another.
    double a0 = 0;
    double a1 = 0;
    double b0 = 0;
    double b1 = 0;
    double c0 = 0;
    double c1 = 0;
    double d0 = 0;
    double d1 = 0;
    int i = from;
    for (; i + 1 < to; i += 2) {
      double v0 = v[i];
      double v1 = v[i + 1];
      a0 += v0 * a[i];
      a1 += v1 * a[i + 1];
      b0 += v0 * b[i];
      b1 += v1 * b[i + 1];
      c0 += v0 * c[i];
      c1 += v1 * c[i + 1];
      d0 += v0 * d[i];
      d1 += v1 * d[i + 1];
    }
    if (i < to) {
      a0 += v[i] * a[i];
      b0 += v[i] * b[i];
      c0 += v[i] * c[i];
      d0 += v[i] * d[i];
    }
    into[at] = a0 + a1;
    into[at + 1] = b0 + b1;
    into[at + 2] = c0 + c1;
    into[at + 3] = d0 + d1;
  }

  /** Σ v_i a_i over rows from ≤ i &lt; to, in four sums that do not wait for one another. */
  static double product(double[] v, double[] a, int from, int to) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = from;
    for (; i + 3 < to; i += 4) {
      s0 += v[i] * a[i];
      s1 += v[i + 1] * a[i + 1];
      s2 += v[i + 2] * a[i + 2];
      s3 += v[i + 3] * a[i + 3];
    }
    for (; i < to; i++) {
      s0 += v[i] * a[i];
    }
    return (s0 + s1) + (s2 + s3);
  }

  /** Σ v_i² over rows from ≤ i &lt; to. */
  static double sumOfSquares(double[] v, int from, int to) {
    return product(v, v, from, to);
  }

  private static void subtract(double[] a, double[] v, double step, int from, int to) {
    for (int i = from; i < to; i++) {
      a[i] -= step * v[i];
    }
  }
}

package isowright.technology;

/**
 * Whether a technology is regular at a mix: every input adds to output, and isoquants are convex to
 * the origin. Only where both hold does a least-cost mix lie where marginal rates equal price
 * ratios, so elsewhere elasticities, plans and scores lose their meaning. One does not imply the
 * other: both are tested.
 *
 * <p><b>Monotone</b> in input i: e_i &gt; 0, strictly. The idle input of a Leontief technology is
 * not monotone: more of it adds nothing.
 *
 * <p><b>Quasi-concave</b>: the Hessian of f is negative semidefinite on the plane Σ f_i dx_i = 0.
 * In logs (dx_i = x_i v_i) that is: C = H − diag(e) is negative semidefinite on Σ e_i v_i = 0.
 * <b>Strictly quasi-concave</b>: negative definite there, which is the sign pattern of the bordered
 * minors (−1)^k |F_k| &gt; 0, k = 2 … n. The weak sense counts as quasi-concave because straight
 * isoquants, those of the linear technology (ρ = −1), still have a least-cost mix, though it is a
 * corner; the strict sense is there to be asked.
 *
 * <p><b>Method.</b> The plane is parametrised by leaving out the input of largest scaled e_k, v_k =
 * −Σ_{i≠k} (e_i/e_k) v_i, and the remaining (n − 1) × (n − 1) form is decomposed as L D Lᵀ with
 * diagonal pivoting. The form is scaled ({@code Bordered}) so that its entries are of order one; a
 * pivot within {@link #TOLERANCE} of zero counts as zero. Where no input adds or subtracts anything
 * (e = 0), or a derivative is not finite, the mix is not called quasi-concave.
 *
 * <p>Sources: Arrow, K. J. and Enthoven, A. C. (1961), Quasi-Concave Programming,
 * <i>Econometrica</i> 29, 779–800; Debreu, G. (1952), Definite and Semidefinite Quadratic Forms,
 * <i>Econometrica</i> 20, 295–300.
 */
public final class Regularity {

  /**
   * Pivots of the scaled form within this of zero count as zero: rounding in the derivatives is
   * some 1e−15 times the size of the log inputs (up to 30 or so), and the elimination passes on a
   * few times that; a curvature as small as this is that of σ = 1e12.
   */
  public static final double TOLERANCE = 1e-12;

  private final boolean[] monotone;
  private final boolean quasiConcave;
  private final boolean strictlyQuasiConcave;

  private Regularity(Checker checker) {
    this.monotone = new boolean[checker.bordered.size()];
    for (int i = 0; i < monotone.length; i++) {
      monotone[i] = checker.monotone(i);
    }
    this.quasiConcave = checker.quasiConcave();
    this.strictlyQuasiConcave = checker.strictlyQuasiConcave();
  }

  /** Regularity at ln x (shape n). */
  public static Regularity at(Technology technology, double[] logInputs) {
    Checker checker = new Checker(technology);
    checker.check(logInputs);
    return new Regularity(checker);
  }

  /**
   * Regularity counted over rows.
   *
   * @param logInputs {@code logInputs[i][row]}, natural logs of inputs in their own units, n
   *     columns
   * @param rows how many rows of each column
   */
  public static Count count(Technology technology, double[][] logInputs, int rows) {
    int n = logInputs.length;
    Checker checker = new Checker(technology);
    double[] row = new double[n];
    int[] nonMonotoneBy = new int[n];
    int monotone = 0;
    int quasiConcave = 0;
    int both = 0;
    for (int r = 0; r < rows; r++) {
      for (int i = 0; i < n; i++) {
        row[i] = logInputs[i][r];
      }
      checker.check(row);
      for (int i = 0; i < n; i++) {
        nonMonotoneBy[i] += checker.monotone(i) ? 0 : 1;
      }
      monotone += checker.monotone() ? 1 : 0;
      quasiConcave += checker.quasiConcave() ? 1 : 0;
      both += checker.regular() ? 1 : 0;
    }
    return new Count(rows, monotone, quasiConcave, both, nonMonotoneBy);
  }

  /** Whether more of input i adds to output. */
  public boolean monotone(int i) {
    return monotone[i];
  }

  /** Whether more of any input adds to output. */
  public boolean monotone() {
    for (boolean each : monotone) {
      if (!each) {
        return false;
      }
    }
    return true;
  }

  /** Whether the isoquant is convex to the origin or straight. */
  public boolean quasiConcave() {
    return quasiConcave;
  }

  /** Whether the isoquant is strictly convex to the origin. */
  public boolean strictlyQuasiConcave() {
    return strictlyQuasiConcave;
  }

  /** Monotone in every input and quasi-concave. */
  public boolean regular() {
    return quasiConcave && monotone();
  }

  /**
   * Regularity over rows.
   *
   * @param rows rows examined
   * @param monotone rows at which every input adds to output
   * @param quasiConcave rows at which the technology is quasi-concave
   * @param both rows at which both hold
   * @param nonMonotoneBy rows at which the input does not add to output, shape n
   */
  public record Count(int rows, int monotone, int quasiConcave, int both, int[] nonMonotoneBy) {

    /** Copies the array. */
    public Count {
      nonMonotoneBy = nonMonotoneBy.clone();
    }

    @Override
    public int[] nonMonotoneBy() {
      return nonMonotoneBy.clone();
    }
  }

  /**
   * Checks one mix after another without allocating. Belongs to one thread; the answers are those
   * of the last {@link #check}.
   */
  public static final class Checker {

    private final Technology technology;
    private final Bordered bordered;
    private final double[][] form;
    private boolean semidefinite;
    private boolean definite;

    /** A checker of this technology. */
    public Checker(Technology technology) {
      this.technology = technology;
      this.bordered = new Bordered(technology.dimension());
      int n = bordered.size();
      this.form = new double[n - 1][n - 1];
    }

    /** Checks at ln x (shape n, not modified). */
    public void check(double[] logInputs) {
      bordered.load(technology, logInputs);
      reduce();
      decompose();
    }

    /** Whether more of input i adds to output. */
    public boolean monotone(int i) {
      return bordered.gradient()[i] > 0;
    }

    /** Whether more of any input adds to output. */
    public boolean monotone() {
      for (double e : bordered.gradient()) {
        if (!(e > 0)) {
          return false;
        }
      }
      return true;
    }

    /** Whether the isoquant is convex to the origin or straight. */
    public boolean quasiConcave() {
      return semidefinite;
    }

    /** Whether the isoquant is strictly convex to the origin. */
    public boolean strictlyQuasiConcave() {
      return definite;
    }

    /** Monotone in every input and quasi-concave. */
    public boolean regular() {
      return semidefinite && monotone();
    }

    /** Minus the scaled form on the plane, without the input of the largest border entry. */
    private void reduce() {
      double[] border = bordered.border();
      double[][] c = bordered.block();
      int n = border.length;
      int k = 0;
      for (int i = 1; i < n; i++) {
        if (Math.abs(border[i]) > Math.abs(border[k])) {
          k = i;
        }
      }
      for (int i = 0; i < n - 1; i++) {
        int a = i < k ? i : i + 1;
        double ra = border[a] / border[k];
        for (int j = 0; j <= i; j++) {
          int b = j < k ? j : j + 1;
          double rb = border[b] / border[k];
          double entry = c[a][b] - ra * c[k][b] - rb * c[a][k] + ra * rb * c[k][k];
          form[i][j] = -entry;
          form[j][i] = -entry;
        }
      }
    }

    /** Decomposes the form in place; the signs of the pivots are those of its curvature. */
    private void decompose() {
      int m = form.length;
      definite = true;
      semidefinite = true;
      for (int k = 0; k < m; k++) {
        int pivot = k;
        for (int i = k + 1; i < m; i++) {
          if (form[i][i] > form[pivot][pivot]) {
            pivot = i;
          }
        }
        if (!(form[pivot][pivot] > TOLERANCE)) {
          definite = false;
          semidefinite = vanishes(k);
          return;
        }
        exchange(k, pivot);
        for (int i = k + 1; i < m; i++) {
          double ratio = form[i][k] / form[k][k];
          for (int j = k + 1; j < m; j++) {
            form[i][j] -= ratio * form[k][j];
          }
        }
      }
    }

    private boolean vanishes(int from) {
      for (int i = from; i < form.length; i++) {
        for (int j = from; j < form.length; j++) {
          if (!(Math.abs(form[i][j]) <= TOLERANCE)) {
            return false;
          }
        }
      }
      return true;
    }

    private void exchange(int k, int pivot) {
      if (pivot == k) {
        return;
      }
      double[] row = form[k];
      form[k] = form[pivot];
      form[pivot] = row;
      for (double[] each : form) {
        double entry = each[k];
        each[k] = each[pivot];
        each[pivot] = entry;
      }
    }
  }
}

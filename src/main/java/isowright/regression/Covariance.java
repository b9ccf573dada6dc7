package isowright.regression;

import java.util.Locale;
import java.util.OptionalInt;

/**
 * How uncertain are the coefficients? An estimate of the covariance matrix of β, and all that must
 * be said of how it was made.
 *
 * <p>Notation: N rows, K columns estimated, a absorbed parameters (group effects), G groups, r_i
 * residuals, h_i leverages (those of the absorbed parameters included), F F′ = (X′X)⁻¹.
 *
 * <ul>
 *   <li>Classical: SSR/N · (X′X)⁻¹ · N/(N − K − a).
 *   <li>HC1: (X′X)⁻¹ (Σ r_i² x_i x_i′) (X′X)⁻¹ · N/(N − K − a).
 *   <li>HC3: the same with r_i²/(1 − h_i)² and no factor. J. G. MacKinnon and H. White 1985,
 *       Journal of Econometrics 29, 305–325 (in the form of R. Davidson and J. G. MacKinnon 1993).
 *   <li>Clustered (CR1): Σ_g u_g u_g′ with u_g = Σ_{i∈g} r_i x_i in the middle, times G/(G − 1) ·
 *       (N − 1)/(N − K). Absorbed effects of the same groups are not counted in K, for they are
 *       nested in the clusters. K.-Y. Liang and S. L. Zeger 1986, Biometrika 73, 13–22; A. C.
 *       Cameron and D. L. Miller 2015, Journal of Human Resources 50, 317–372, sections II.B and
 *       III.B.
 *   <li>Clustered two ways, by group and by time: the sum of the two middles less that of the cells
 *       of both, each with its own G/(G − 1), times (N − 1)/(N − K) as above. What is negative in
 *       it is set to zero. A. C. Cameron, J. B. Gelbach and D. L. Miller 2011, Journal of Business
 *       and Economic Statistics 29, 238–249, equations 2.11 to 2.13.
 *   <li>Newey-West within groups: Σ over pairs of cells of one group up to m times apart, weighted
 *       1 − l/(m + 1), times N/(N − K − a). W. K. Newey and K. D. West 1987, Econometrica 55,
 *       703–708. With m = 0 and one row a cell it is HC1.
 *   <li>Driscoll-Kraay: the same with the sum over all rows of a time in place of a cell, times
 *       T/(T − 1) · (N − 1)/(N − K − a). J. C. Driscoll and A. C. Kraay 1998, Review of Economics
 *       and Statistics 80, 549–560. It rests on many times, not on many groups.
 * </ul>
 *
 * <p>The lag is m = ⌊4 (T/100)^(2/9)⌋ for T times (of the longest group, or of all), the rule of W.
 * K. Newey and K. D. West 1994, Review of Economic Studies 61, 631–653, as it is commonly put.
 *
 * <p>The middle matrix is gathered in the orthogonal basis F′x, so the condition of X enters once,
 * not twice. Tested in {@code CovarianceTest} and {@code CovarianceOverTimeTest} against dense
 * formulas, published values and R.
 *
 * @param kind the estimator
 * @param matrix K × K over all columns of the fit, zero where nothing was estimated, NaN where the
 *     rows cannot carry an estimate; copied in and out
 * @param factor the finite-sample factor, in the matrix already (two ways: the part common to all
 *     three middles)
 * @param degreesOfFreedom of the t distribution to use with it
 * @param clusters the number of independent clusters that the kind rests on: groups, the smaller of
 *     groups and times, or times; absent where it rests on rows
 * @param words one sentence: estimator, factor, degrees of freedom
 */
public record Covariance(
    Kind kind,
    double[][] matrix,
    double factor,
    int degreesOfFreedom,
    OptionalInt clusters,
    String words) {

  /** Which assumption about the residuals is made. */
  public enum Kind {
    /** Equal variance, independent rows. */
    CLASSICAL,
    /** Unequal variances, independent rows. */
    HC1,
    /** Unequal variances, independent rows, residuals enlarged for leverage. */
    HC3,
    /** Rows of the same group may depend on one another. */
    CLUSTERED,
    /** Rows of the same group, and rows of the same time, may depend on one another. */
    CLUSTERED_TWO_WAY,
    /** Rows of the same group may depend on one another, less so the further apart in time. */
    NEWEY_WEST,
    /** All rows may depend on one another, less so the further apart in time. */
    DRISCOLL_KRAAY;

    /** Whether the estimate needs the times of the rows. */
    public boolean needsTimes() {
      return this == CLUSTERED_TWO_WAY || this == NEWEY_WEST || this == DRISCOLL_KRAAY;
    }
  }

  /** A row whose leverage comes closer to one than this is fitted exactly, up to rounding. */
  static final double LEVERAGE_ONE = 1e-10;

  /** Copies the matrix. */
  public Covariance {
    matrix = Matrices.copy(matrix);
  }

  @Override
  public double[][] matrix() {
    return Matrices.copy(matrix);
  }

  /** The square root of entry k of the diagonal. */
  public double standardError(int k) {
    return Math.sqrt(matrix[k][k]);
  }

  /**
   * Estimates the covariance of the coefficients of a fit; reads the design once, in parallel (not
   * at all for the classical kind).
   *
   * @param design the design that was fitted, or the linearisation at the end of a nonlinear fit
   * @param fit its fit
   * @throws IllegalArgumentException for a kind that needs the times of the rows
   */
  public static Covariance estimate(Design design, LinearFit fit, Kind kind) {
    return switch (kind) {
      case CLASSICAL -> classical(fit);
      case HC1, HC3 -> heteroskedastic(design, fit, kind);
      case CLUSTERED -> clustered(design, fit);
      case CLUSTERED_TWO_WAY, NEWEY_WEST, DRISCOLL_KRAAY ->
          throw new IllegalArgumentException(kind + " needs the times of the rows");
    };
  }

  /**
   * The same, with the times of the rows for the kinds that need them.
   *
   * @param times when each row of the design was observed
   */
  public static Covariance estimate(Design design, LinearFit fit, Kind kind, Times times) {
    return kind.needsTimes()
        ? CovarianceOverTime.estimate(design, fit, kind, times)
        : estimate(design, fit, kind);
  }

  private static Covariance classical(LinearFit fit) {
    double factor = ratio(fit.rows(), fit.residualDegreesOfFreedom());
    double[][] matrix = fit.inverseCrossProduct();
    scale(matrix, fit, fit.residualVariance());
    String words =
        "Classical covariance (equal variance, independent rows): SSR/N times the factor "
            + residualFactor(fit)
            + "; "
            + freedom(fit.residualDegreesOfFreedom())
            + ".";
    return new Covariance(
        Kind.CLASSICAL, matrix, factor, fit.residualDegreesOfFreedom(), OptionalInt.empty(), words);
  }

  private static Covariance heteroskedastic(Design design, LinearFit fit, Kind kind) {
    RowMiddle middle = RowMiddle.of(design, fit, kind);
    int freedom = fit.residualDegreesOfFreedom();
    boolean third = kind == Kind.HC3;
    double factor = third ? (freedom > 0 ? 1 : Double.NaN) : ratio(fit.rows(), freedom);
    double[][] matrix = Matrices.sandwich(fit.inverseFactor(), middle.matrix());
    scale(matrix, fit, factor);
    String words =
        third
            ? "Heteroskedasticity-consistent covariance HC3: residuals divided by one minus their"
                + " leverage, no further factor"
                + exactRows(middle.exactRows())
                + "; "
                + freedom(freedom)
                + "."
            : "Heteroskedasticity-consistent covariance HC1: factor "
                + residualFactor(fit)
                + "; "
                + freedom(freedom)
                + ".";
    return new Covariance(kind, matrix, factor, freedom, OptionalInt.empty(), words);
  }

  private static Covariance clustered(Design design, LinearFit fit) {
    int clusters = design.groups().count();
    int rows = fit.rows();
    double factor = ratio(clusters, clusters - 1) * ratio(rows - 1, rows - fit.rank());
    double[][] matrix =
        Matrices.sandwich(fit.inverseFactor(), RowMiddle.of(design, fit, Kind.CLUSTERED).matrix());
    scale(matrix, fit, factor);
    String words =
        String.format(
            Locale.ROOT,
            "Covariance clustered by group (CR1): factor G/(G − 1) · (N − 1)/(N − K) = %d/%d ·"
                + " %d/%d = %.6g%s; %s.",
            clusters,
            clusters - 1,
            rows - 1,
            rows - fit.rank(),
            factor,
            fit.absorbed() > 0 ? ", group effects not counted in K" : "",
            freedom(clusters - 1));
    return new Covariance(
        Kind.CLUSTERED, matrix, factor, clusters - 1, OptionalInt.of(clusters), words);
  }

  static double ratio(double above, double below) {
    return below > 0 ? above / below : Double.NaN;
  }

  /** Multiplies what was estimated; what was not stays zero, even where the factor is NaN. */
  static void scale(double[][] matrix, LinearFit fit, double by) {
    boolean[] estimated = fit.estimated();
    for (int i = 0; i < matrix.length; i++) {
      for (int j = 0; j < matrix.length; j++) {
        matrix[i][j] = estimated[i] && estimated[j] ? matrix[i][j] * by : 0;
      }
    }
  }

  static String residualFactor(LinearFit fit) {
    return String.format(
        Locale.ROOT,
        "N/(N − K%s) = %d/%d",
        fit.absorbed() > 0 ? " − group effects" : "",
        fit.rows(),
        fit.residualDegreesOfFreedom());
  }

  static String freedom(int degrees) {
    return degrees > 0
        ? "t with " + degrees + (degrees == 1 ? " degree" : " degrees") + " of freedom"
        : "no degrees of freedom are left, so nothing can be said";
  }

  private static String exactRows(long rows) {
    return rows == 0
        ? ""
        : String.format(
            Locale.ROOT,
            " (%d %s leverage one, fitted exactly, and cannot contribute)",
            rows,
            rows == 1 ? "row has" : "rows have");
  }
}

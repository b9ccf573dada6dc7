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
 * </ul>
 *
 * <p>The middle matrix is gathered in the orthogonal basis F′x, so the condition of X enters once,
 * not twice. Tested in {@code CovarianceTest} against dense formulas and published values.
 *
 * @param kind the estimator
 * @param matrix K × K over all columns of the fit, zero where nothing was estimated, NaN where the
 *     rows cannot carry an estimate; copied in and out
 * @param factor the finite-sample factor, in the matrix already
 * @param degreesOfFreedom of the t distribution to use with it
 * @param clusters the number of clusters, for the clustered kind
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
    CLUSTERED
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
   */
  public static Covariance estimate(Design design, LinearFit fit, Kind kind) {
    return switch (kind) {
      case CLASSICAL -> classical(fit);
      case HC1, HC3 -> heteroskedastic(design, fit, kind);
      case CLUSTERED -> clustered(design, fit);
    };
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
    Middle middle = Middle.of(design, fit, kind);
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
        Matrices.sandwich(fit.inverseFactor(), Middle.of(design, fit, Kind.CLUSTERED).matrix());
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

  private static double ratio(double above, double below) {
    return below > 0 ? above / below : Double.NaN;
  }

  /** Multiplies what was estimated; what was not stays zero, even where the factor is NaN. */
  private static void scale(double[][] matrix, LinearFit fit, double by) {
    boolean[] estimated = fit.estimated();
    for (int i = 0; i < matrix.length; i++) {
      for (int j = 0; j < matrix.length; j++) {
        matrix[i][j] = estimated[i] && estimated[j] ? matrix[i][j] * by : 0;
      }
    }
  }

  private static String residualFactor(LinearFit fit) {
    return String.format(
        Locale.ROOT,
        "N/(N − K%s) = %d/%d",
        fit.absorbed() > 0 ? " − group effects" : "",
        fit.rows(),
        fit.residualDegreesOfFreedom());
  }

  private static String freedom(int degrees) {
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

  /** The middle of the sandwich in the basis F′x, Σ u u′ over rows or groups. */
  private static final class Middle {
    private final double[][] factor;
    private final int[] kept;
    private final double[] coefficients;
    private final double[][] sum;
    private final Residuals residuals;
    private long exactRows;

    private Middle(LinearFit fit, int longest) {
      factor = fit.inverseFactor();
      kept = fit.kept();
      coefficients = fit.coefficients();
      sum = new double[factor.length][factor.length];
      residuals = new Residuals(longest);
    }

    static Middle of(Design design, LinearFit fit, Kind kind) {
      Blocks blocks = Blocks.of(design.groups());
      return blocks.gather(
          fit.columns().size() + 1,
          () -> new Middle(fit, blocks.longest()),
          (middle, from, to, buffer) -> {
            design.fill(from, to, buffer);
            if (kind == Kind.CLUSTERED) {
              middle.addGroups(buffer, from, to, design.groups());
            } else {
              middle.addRows(buffer, from, to, design, kind == Kind.HC3);
            }
          },
          Middle::add);
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
          if (left > LEVERAGE_ONE) {
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

    private void add(Middle other) {
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
}

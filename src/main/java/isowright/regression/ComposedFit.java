package isowright.regression;

import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;

/**
 * A maximum-likelihood fit of {@link ComposedErrors}.
 *
 * @param model what was fitted
 * @param state what kind of answer it is
 * @param parameters β, ln σ_v, ln σ_w and, with decay, η; where {@link State#oneSided} does not
 *     hold, the least-squares β alone
 * @param logLikelihood at the parameters
 * @param leastSquares the fit without a one-sided error
 * @param leastSquaresLogLikelihood its log-likelihood, −N/2 (ln 2π + ln(SSR/N) + 1)
 * @param skewness of the least-squares residuals, m₃ / m₂^1.5
 * @param steps how many steps the ascent took
 */
public record ComposedFit(
    ComposedErrors model,
    State state,
    double[] parameters,
    double logLikelihood,
    LinearFit leastSquares,
    double leastSquaresLogLikelihood,
    double skewness,
    int steps) {

  /** What kind of answer a fit is. */
  public enum State {
    /** Estimated. */
    FOUND,
    /**
     * The least-squares residuals are skewed the other way: least squares without a one-sided error
     * is the maximum (D. M. Waldman 1982, Journal of Econometrics 18, 275–279).
     */
    WRONG_SKEW,
    /** No one-sided error of any size raises the likelihood above that of least squares. */
    NONE_FOUND,
    /** The likelihood still rises as the noise goes to zero. */
    ALL_ONE_SIDED,
    /** The ascent did not converge. */
    NOT_CONVERGED;

    /** Whether a one-sided error was estimated. */
    public boolean oneSided() {
      return this == FOUND;
    }
  }

  /** Copies the array. */
  public ComposedFit {
    parameters = parameters.clone();
  }

  @Override
  public double[] parameters() {
    return parameters.clone();
  }

  /** Fits; the design must have full rank and a column named {@code constant}. */
  public static ComposedFit of(ComposedErrors model) {
    return new ComposedSearch(model).fit();
  }

  /**
   * The same from one more start, and from the moments of least squares alone beside it: for rows
   * that are mostly those of another fit.
   *
   * @param start parameters of the other fit; not looked at where their number is another
   */
  public static ComposedFit of(ComposedErrors model, double[] start) {
    return new ComposedSearch(model).fit(start);
  }

  /** β. */
  public double[] coefficients() {
    return java.util.Arrays.copyOf(parameters, model.design().columns().size());
  }

  /** σ_v. */
  public double noise() {
    return state.oneSided()
        ? Math.exp(parameters[coefficients().length])
        : Math.sqrt(leastSquares.ssr() / leastSquares.rows());
  }

  /** σ_w; 0 where none was found. */
  public double scale() {
    return state.oneSided() ? Math.exp(parameters[coefficients().length + 1]) : 0;
  }

  /** η; 0 without decay. */
  public double decay() {
    int at = coefficients().length + 2;
    return at < parameters.length ? parameters[at] : 0;
  }

  /** 2 (ln L − ln L without a one-sided error), not below zero. */
  public double likelihoodRatio() {
    return Math.max(0, 2 * (logLikelihood - leastSquaresLogLikelihood));
  }

  /**
   * The covariance of the parameters: (−H)⁻¹, or with the squares of scores between, (−H)⁻¹ Σ u u′
   * (−H)⁻¹, over units (HC1) or groups (clustered). H. White 1982, Econometrica 50, 1–25.
   *
   * @throws IllegalArgumentException for another kind
   */
  public Covariance covariance(Covariance.Kind kind) {
    if (!state.oneSided()) {
      return Covariance.estimate(model.design(), leastSquares, kind);
    }
    ComposedLikelihood at = model.at(parameters);
    double[][] inverse = inverse(at.hessian());
    int rows = model.design().rows();
    int groups = model.design().groups().count();
    int free = rows - parameters.length;
    return switch (kind) {
      case CLASSICAL ->
          new Covariance(
              kind,
              inverse,
              1,
              free,
              OptionalInt.empty(),
              "Covariance of maximum likelihood: inverse of the negative Hessian; "
                  + Covariance.freedom(free)
                  + ".");
      case HC1, CLUSTERED -> {
        boolean clustered = kind == Covariance.Kind.CLUSTERED;
        boolean shared = model.sharing() != ComposedErrors.Sharing.NONE;
        int independent = clustered || shared ? groups : rows;
        double factor = Covariance.ratio(independent, independent - 1.0);
        double[][] matrix = Matrices.sandwich(inverse, at.scoreSquares(clustered || shared));
        for (double[] row : matrix) {
          for (int k = 0; k < row.length; k++) {
            row[k] *= factor;
          }
        }
        int degrees = clustered || shared ? groups - 1 : free;
        yield new Covariance(
            kind,
            matrix,
            factor,
            degrees,
            clustered || shared ? OptionalInt.of(groups) : OptionalInt.empty(),
            String.format(
                Locale.ROOT,
                "Covariance of maximum likelihood with the squares of scores %s between two inverse"
                    + " Hessians, factor %d/%d; %s.",
                clustered || shared ? "by group" : "by row",
                independent,
                independent - 1,
                Covariance.freedom(degrees)));
      }
      default -> throw new IllegalArgumentException(kind + " has no form for this likelihood");
    };
  }

  private static double[][] inverse(double[][] hessian) {
    int n = hessian.length;
    double[] scale = new double[n];
    for (int k = 0; k < n; k++) {
      scale[k] = 1 / Math.sqrt(Math.abs(hessian[k][k]));
    }
    double[][] scaled = new double[n][n];
    for (int k = 0; k < n; k++) {
      for (int l = 0; l < n; l++) {
        scaled[k][l] = -scale[k] * hessian[k][l] * scale[l];
      }
    }
    double[][] inverse =
        new CholeskyDecomposition(new Array2DRowRealMatrix(scaled, false), 1e-9, 1e-14)
            .getSolver()
            .getInverse()
            .getData();
    for (int k = 0; k < n; k++) {
      for (int l = 0; l < n; l++) {
        inverse[k][l] *= scale[k] * scale[l];
      }
    }
    return inverse;
  }

  /** The names of {@link #parameters()}. */
  public List<String> names() {
    return state.oneSided() ? model.names() : model.design().columns();
  }

  /** What is known of each row's one-sided error. */
  public ConditionalErrors conditional() {
    return ConditionalErrors.of(this);
  }

  /**
   * The same with the parameters uncertain, for intervals and probabilities.
   *
   * @param covariance of {@link #parameters()}
   */
  public ConditionalErrors conditional(double[][] covariance) {
    return ConditionalErrors.widened(this, covariance);
  }
}

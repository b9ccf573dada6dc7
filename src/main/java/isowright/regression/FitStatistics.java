package isowright.regression;

/**
 * How well does a fit describe its rows?
 *
 * <p>With N rows, K columns estimated, a absorbed effects, SSR the sum of squared residuals and p =
 * K + a + 1 parameters (the error variance is one of them): log-likelihood = −N/2 (ln 2π +
 * ln(SSR/N) + 1), that of normal errors at its maximum; AIC = −2 log-likelihood + 2p (H. Akaike
 * 1974); BIC = −2 log-likelihood + p ln N (G. Schwarz 1978). Tested in {@code FitStatisticsTest}.
 *
 * @param rSquared 1 − SSR / total sum of squares about the mean; for a design in deviations from
 *     group means, the share explained within groups; NaN where the response does not vary
 * @param residualStandardError √(SSR / (N − K − a)); NaN where no degrees of freedom are left
 * @param logLikelihood infinite where the fit is exact
 * @param parameters p
 * @param aic the Akaike criterion
 * @param bic the Schwarz criterion
 */
public record FitStatistics(
    double rSquared,
    double residualStandardError,
    double logLikelihood,
    int parameters,
    double aic,
    double bic) {

  /** The statistics of a linear fit. */
  public static FitStatistics of(LinearFit fit) {
    return of(fit, fit.totalSumOfSquares());
  }

  /**
   * The statistics of generalised least squares with one random effect a group, fitted on rows less
   * shares θ_g of their group means: the log-likelihood is that of the rows themselves, to which
   * that transformation adds Σ_g ln(1 − θ_g), and the variance of the effects is one more
   * parameter.
   */
  public static FitStatistics ofPartlyWithin(LinearFit fit, double[] shares) {
    FitStatistics rows = of(fit);
    double logLikelihood = rows.logLikelihood;
    for (double share : shares) {
      logLikelihood += Math.log1p(-share);
    }
    int parameters = rows.parameters + 1;
    return new FitStatistics(
        rows.rSquared,
        rows.residualStandardError,
        logLikelihood,
        parameters,
        -2 * logLikelihood + 2 * parameters,
        -2 * logLikelihood + parameters * Math.log(fit.rows()));
  }

  /**
   * The statistics of a fit whose response is not that of its design, such as the linearisation of
   * a nonlinear fit, whose response is the residual.
   *
   * @param totalSumOfSquares of the response itself about its mean
   */
  public static FitStatistics of(LinearFit fit, double totalSumOfSquares) {
    double rows = fit.rows();
    int parameters = fit.rank() + fit.absorbed() + 1;
    double logLikelihood = -rows / 2 * (Math.log(2 * Math.PI) + Math.log(fit.ssr() / rows) + 1);
    return new FitStatistics(
        totalSumOfSquares > 0 ? 1 - fit.ssr() / totalSumOfSquares : Double.NaN,
        Math.sqrt(fit.residualVariance()),
        logLikelihood,
        parameters,
        -2 * logLikelihood + 2 * parameters,
        -2 * logLikelihood + parameters * Math.log(rows));
  }

  /** The same where the response has another spread about its mean than that of the design. */
  public FitStatistics explaining(double ssr, double totalSumOfSquares) {
    return new FitStatistics(
        totalSumOfSquares > 0 ? 1 - ssr / totalSumOfSquares : Double.NaN,
        residualStandardError,
        logLikelihood,
        parameters,
        aic,
        bic);
  }
}

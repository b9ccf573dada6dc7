package isowright.inference;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.RowsUsed;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.regression.ArrayDesign;
import isowright.regression.Covariance;
import isowright.regression.Groups;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Are the errors of a plant correlated from one period to the next, once its lasting level is
 * removed?
 *
 * <p>Errors without serial correlation have first differences correlated by −½ with the ones
 * before. The residuals of the regression in differences are regressed on their own lags; the null
 * is that the coefficient is −½, tested by Student's law with a covariance clustered by plant
 * (CR1), printed as its square, an F with 1 and G − 1 degrees of freedom. No difference and no lag
 * reaches across a gap.
 *
 * <p>Source: Wooldridge, J. M. (2002), <i>Econometric Analysis of Cross Section and Panel Data</i>,
 * section 10.6.3, p. 282; clustered: Drukker, D. M. (2003), <i>Stata Journal</i> 3, 168–177.
 * Checked against R in {@code PanelHypothesesTest}.
 */
final class SerialCorrelation {

  /** The lag coefficient of differences of uncorrelated errors. */
  private static final double UNCORRELATED = -0.5;

  private SerialCorrelation() {}

  /** The test, where plants have three successive periods. */
  static Optional<Verdict> of(Fit fit) {
    Specification specification = fit.specification();
    Time time = specification.time() == Time.TWO_WAY ? Time.PERIOD_EFFECTS : specification.time();
    Fit differences =
        specification.plantEffects() == PlantEffects.DIFFERENCES
            ? fit
            : Estimation.fit(
                fit.panel(),
                specification.with(PlantEffects.DIFFERENCES, time, StandardErrors.CLASSICAL));
    return differences.state().usable() ? test(differences.numbers()) : Optional.empty();
  }

  private static Optional<Verdict> test(Solution numbers) {
    RowsUsed used = numbers.treatment().rows();
    Groups plants = numbers.design().groups();
    double[] residuals = LeastSquares.residuals(numbers.design(), numbers.linear());
    double[] response = new double[residuals.length];
    double[] lag = new double[residuals.length];
    int[] starts = new int[plants.count()];
    int rows = 0;
    int clusters = 0;
    for (int g = 0; g < plants.count(); g++) {
      int before = rows;
      for (int d = plants.start(g) + 1; d < plants.end(g); d++) {
        if (used.panelRow(d) == used.panelRow(d - 1) + 1) {
          response[rows] = residuals[d];
          lag[rows++] = residuals[d - 1];
        }
      }
      if (rows > before) {
        starts[clusters++] = before;
      }
    }
    if (clusters < 2) {
      return Optional.empty();
    }
    ArrayDesign design =
        ArrayDesign.of(
            List.of("lag"),
            new double[][] {Arrays.copyOf(lag, rows)},
            Arrays.copyOf(response, rows),
            Groups.startingAt(rows, Arrays.copyOf(starts, clusters)));
    LinearFit line = LeastSquares.fit(design);
    Covariance covariance = Covariance.estimate(design, line, Covariance.Kind.CLUSTERED);
    double t = (line.coefficients()[0] - UNCORRELATED) / covariance.standardError(0);
    return Optional.of(
        Verdict.of(
            "serial-correlation",
            "errors of a plant are not correlated from one period to the next",
            t * t,
            new Law.F(1, clusters - 1)));
  }
}

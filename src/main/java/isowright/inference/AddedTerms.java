package isowright.inference;

import isowright.estimation.Fit;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.GroupScores;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;

/**
 * Do further columns add anything to a regression? The test makes the same assumption about errors
 * as the covariance of the fit that is examined:
 *
 * <ul>
 *   <li>classical: F from the sums of squares with and without the columns;
 *   <li>robust, HC3, clustered: the score test of {@link GroupScores}, over rows or over plants;
 *   <li>kinds that reach over time: the Wald statistic, in its F form, with that covariance.
 * </ul>
 *
 * @param statistic F; NaN where the rows cannot carry the test
 * @param law its law
 */
record AddedTerms(double statistic, Law law) {

  /**
   * Tests the columns of a wider regression from one on; those that cannot be told from others are
   * left out.
   *
   * @param fit whose assumption about errors is made
   * @param narrow the regression without the columns
   * @param wider the design with the columns last
   * @param first the first of the columns tested
   */
  static AddedTerms of(Fit fit, Narrow narrow, Design wider, int first) {
    LinearFit linear = LeastSquares.fit(wider);
    int tested = 0;
    boolean[] estimated = linear.estimated();
    for (int k = first; k < estimated.length; k++) {
      tested += estimated[k] ? 1 : 0;
    }
    double left = linear.residualDegreesOfFreedom();
    if (tested == 0 || left < 1) {
      return new AddedTerms(Double.NaN, new Law.F(Math.max(tested, 1), Math.max(left, 1)));
    }
    return switch (fit.numbers().covarianceSource().kind()) {
      case CLASSICAL -> {
        double f = (narrow.ssr() - linear.ssr()) / tested / (linear.ssr() / left);
        yield new AddedTerms(f, new Law.F(tested, left));
      }
      case HC1, HC3 -> score(GroupScores.byRows(wider, linear, first, narrow.residuals()));
      case CLUSTERED -> score(GroupScores.of(wider, linear, first, narrow.residuals()));
      case CLUSTERED_TWO_WAY, NEWEY_WEST, DRISCOLL_KRAAY ->
          wald(linear, fit.covarianceOf(wider, linear), first, tested);
    };
  }

  /**
   * The regression without the columns.
   *
   * @param ssr its sum of squared residuals
   * @param residuals its residuals, by row of the design
   */
  record Narrow(double ssr, double[] residuals) {

    static Narrow of(Design design, LinearFit fit) {
      return new Narrow(fit.ssr(), LeastSquares.residuals(design, fit));
    }
  }

  private static AddedTerms score(GroupScores scores) {
    return new AddedTerms(
        scores.statistic(), new Law.F(scores.columns(), Math.max(1, scores.denominator())));
  }

  private static AddedTerms wald(LinearFit linear, Covariance covariance, int first, int tested) {
    boolean[] estimated = linear.estimated();
    double[][] rows = new double[tested][estimated.length];
    int row = 0;
    for (int k = first; k < estimated.length; k++) {
      if (estimated[k]) {
        rows[row++][k] = 1;
      }
    }
    double f =
        LinearRestrictions.statistic(
            rows, new double[tested], linear.coefficients(), covariance.matrix());
    return new AddedTerms(f, new Law.F(tested, Math.max(1, covariance.degreesOfFreedom())));
  }
}

package isowright.inference;

import isowright.estimation.Fit;
import isowright.estimation.PlantJackknife;
import java.util.Optional;

/**
 * Do several restrictions on the parameters of a fit hold at once? The Wald statistic over q, by
 * the covariance of the fit and the law F(q, degrees of freedom of the covariance).
 *
 * <p>Where standard errors are clustered by plant and q ≥ 2, plants being few makes such tests
 * reject true nulls far too often (with 14 plants and three restrictions, in 18 % of panels at 5
 * %). There the covariance is that of leaving out each plant ({@link PlantJackknife}) and the law
 * Hotelling's: with T² = g′(G V G′)⁻¹g,
 *
 * <pre>  T² (G − q)/(q (G − 1))  ~  F(q, G − q), </pre>
 *
 * G the plants. Source: Hotelling, H. (1931), The Generalization of Student's Ratio, <i>Annals of
 * Mathematical Statistics</i> 2, 360–378. A single restriction keeps the covariance of the
 * intervals, so that test and interval agree. Sizes in {@code FewPlantsSizeTest}.
 *
 * @param statistic F; NaN where the records cannot carry it
 * @param law its law
 */
record JointTest(double statistic, Law law) {

  /**
   * The test that departures g vanish.
   *
   * @param departure g, shape q
   * @param jacobian of g in the reported parameters, q × P
   * @param degrees of freedom of the covariance of the fit
   */
  static JointTest of(Fit fit, double[] departure, double[][] jacobian, double degrees) {
    int q = departure.length;
    Optional<PlantJackknife> jackknife =
        q < 2 ? Optional.empty() : PlantJackknife.of(fit).filter(j -> j.plants() > q);
    if (jackknife.isEmpty()) {
      double f = LinearRestrictions.statistic(departure, jacobian, fit.numbers().covariance());
      return new JointTest(f, new Law.F(q, degrees));
    }
    double plants = jackknife.get().plants();
    double f = LinearRestrictions.statistic(departure, jacobian, jackknife.get().covariance());
    return new JointTest(f * (plants - q) / (plants - 1), new Law.F(q, plants - q));
  }

  /** The probability of a statistic at least as large. */
  double p() {
    return law.p(statistic);
  }
}

package isowright.inference;

import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.technology.LinearForm;
import java.util.Optional;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;

/**
 * What does it cost in fit to hold a technology to regularity, and do the records speak against it?
 *
 * <p>The distance D = (SSR held − SSR free)/s², s² the residual variance of the free fit. Were the
 * technology regular, D would follow, in many independent rows of equal variance, a mixture of
 * chi-squared laws of 0 to k degrees of freedom, k the coefficients of the form. Its weights depend
 * on which inequalities truly bind, which is not known; so only bounds of the p-value are given:
 *
 * <pre>  ½ P(χ²_1 ≥ D)  ≤  p  ≤  ½ P(χ²_{k−1} ≥ D) + ½ P(χ²_k ≥ D). </pre>
 *
 * <p>Source: Kodde, D. A. and Palm, F. C. (1986), Wald Criteria for Jointly Testing Equality and
 * Inequality Restrictions, <i>Econometrica</i> 54, 1243–1248, equations of the bounds. With plants
 * whose rows depend on one another the law is another: the bounds are then a rough guide. Tested in
 * {@code RegularityPriceTest}.
 *
 * @param free the sum of squared residuals of the free fit
 * @param held that of the fit held to be regular
 * @param distance D
 * @param low the lower bound of the p-value; one where nothing had to be held
 * @param high the upper bound
 */
public record RegularityPrice(double free, double held, double distance, double low, double high) {

  /** The price of a fit; empty where it was not held to be regular. */
  public static Optional<RegularityPrice> of(Fit fit) {
    if (!fit.state().usable()
        || !(fit.numbers().particulars() instanceof Particulars.OfRegularity held)) {
      return Optional.empty();
    }
    LinearForm form = (LinearForm) fit.specification().form();
    int k = form.coefficientNames(fit.panel().inputs()).size();
    double d = held.distance();
    return Optional.of(
        new RegularityPrice(
            held.free().numbers().linear().ssr(),
            fit.numbers().linear().ssr(),
            d,
            d > 0 ? 0.5 * beyond(1, d) : 1,
            d > 0 ? atMost(k, d) : 1));
  }

  /** ½ P(χ²_{k−1} ≥ D) + ½ P(χ²_k ≥ D). */
  static double atMost(int k, double distance) {
    return 0.5 * beyond(k - 1, distance) + 0.5 * beyond(k, distance);
  }

  private static double beyond(int degrees, double distance) {
    return degrees == 0 ? 0 : ChiSquaredDistribution.of(degrees).survivalProbability(distance);
  }
}

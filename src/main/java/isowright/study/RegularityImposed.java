package isowright.study;

import java.util.Map;

/**
 * What was found of a fit that was held to be regular, beside the fit itself: where, what binds,
 * and what it costs.
 *
 * @param where {@code at-mean} or {@code everywhere}
 * @param held at how many mixes it was held
 * @param binding at how many of them something binds
 * @param withoutProduct at how many an input is held to add nothing
 * @param straight at how many the isoquant is held straight
 * @param freeSsr the sum of squared residuals of the free fit
 * @param ssr that of the fit held to be regular
 * @param distance their difference over the residual variance of the free fit
 * @param pLow lower bound of the p-value of the null that the technology is regular
 * @param pHigh upper bound
 * @param starts from how many starts the search was made
 * @param agreeing how many of them came to the best
 * @param free the parameters of the free fit, by name
 */
public record RegularityImposed(
    String where,
    int held,
    int binding,
    int withoutProduct,
    int straight,
    double freeSsr,
    double ssr,
    double distance,
    double pLow,
    double pHigh,
    int starts,
    int agreeing,
    Map<String, Figure> free) {

  /** Whether the free fit was regular there already, so that nothing changed. */
  public boolean idle() {
    return distance == 0;
  }

  /** By what share the sum of squared residuals rises. */
  public double rise() {
    return ssr / freeSsr - 1;
  }
}

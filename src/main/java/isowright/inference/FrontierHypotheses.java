package isowright.inference;

import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.regression.ComposedErrors;
import isowright.regression.ComposedFit;
import java.util.ArrayList;
import java.util.List;

/**
 * Is there any inefficiency, and does it change over time? Likelihood ratios of a frontier.
 *
 * <p>Against no inefficiency the null puts σ_u at its bound, so the ratio follows half a χ² of one
 * degree of freedom and is zero otherwise (5 % at 2.706); with decay, whose rate the null leaves
 * undetermined as well, half of one and half of two degrees are used (5 % at 5.138), the bound of
 * Kodde and Palm (1986, <i>Econometrica</i> 54, 1243–1248, table 1) after G. E. Battese and T. J.
 * Coelli 1992, <i>Journal of Productivity Analysis</i> 3, 153–169. Against no decay it follows χ²
 * with one degree of freedom. Tested in {@code FrontierHypothesesTest}, for size in {@code
 * FrontierCoverageTest}.
 */
final class FrontierHypotheses {

  private FrontierHypotheses() {}

  /** The tests of a frontier; none of other fits. */
  static List<Verdict> of(Fit fit) {
    if (!(fit.specification().estimator() instanceof Estimator.Frontier frontier)
        || fit.numbers().frontier().isEmpty()) {
      return List.of();
    }
    Particulars.OfFrontier own = fit.numbers().frontier().get();
    boolean decay = frontier.overTime() == Estimator.OverTime.DECAY;
    List<Verdict> verdicts = new ArrayList<>();
    Verdict none =
        Verdict.of(
            "no-inefficiency",
            "there is no inefficiency, so that least squares is enough",
            own.fit().likelihoodRatio(),
            new Law.MixedChiSquared(decay ? 1 : 0));
    boolean apart = frontier.overTime() == Estimator.OverTime.EACH_ROW && fit.panel().repeats();
    verdicts.add(
        decay
            ? none.noting(
                "Without inefficiency its rate of decay has no meaning, so the law is an"
                    + " approximation.")
            : apart
                ? none.noting(
                    "Rows are taken as independent here; where a plant's rows go together, its size"
                        + " is not known.")
                : none);
    if (decay && own.fit().state().oneSided()) {
      verdicts.add(noDecay(own.fit()));
    }
    return List.copyOf(verdicts);
  }

  private static Verdict noDecay(ComposedFit found) {
    ComposedErrors model = found.model();
    ComposedFit constant =
        ComposedFit.of(
            new ComposedErrors(
                model.design(), model.law(), ComposedErrors.Sharing.GROUP, new double[0]));
    double ratio = 2 * (found.logLikelihood() - constant.logLikelihood());
    return Verdict.of(
        "no-decay",
        "inefficiency of a plant stays what it is over time",
        Math.max(0, ratio),
        new Law.ChiSquared(1));
  }
}

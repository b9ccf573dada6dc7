package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Productivity;
import isowright.estimation.Solution;
import java.util.Locale;
import java.util.Optional;

/**
 * Against what filed costs are held: a productivity, and whether its output is the median (as a fit
 * in logs has it) or the mean.
 *
 * <p>The mean of output is the median times Duan's smearing factor, mean exp(residual) (Duan, N.
 * 1983, Smearing Estimate: A Nonparametric Retransformation Method, <i>Journal of the American
 * Statistical Association</i> 78, 605–610). The factor is taken as it is, without an uncertainty of
 * its own.
 *
 * @param against whose productivity
 * @param smearing whether output is the mean
 */
record ReviewReference(Study.Productivity against, boolean smearing) {

  static ReviewReference asked(Study.Filing filing) {
    return new ReviewReference(filing.against(), filing.smearing());
  }

  /** The technology of a candidate in a period by this reference. */
  EstimatedTechnology of(Candidate candidate, int period) {
    Productivity productivity = PlanCircumstances.productivity(against, Optional.empty());
    EstimatedTechnology estimated = candidate.at(period, productivity);
    return estimated.shifted(shift(candidate));
  }

  /** What the smearing factor adds to ln Q; 0 where there is none. */
  double shift(Candidate candidate) {
    return smearing && candidate.fit().isPresent() ? Math.log(factor(candidate)) : 0;
  }

  /** On the frontier noise alone is left, whose mean exponential is e^(σ²/2). */
  private double factor(Candidate candidate) {
    Solution numbers = candidate.fit().orElseThrow().numbers();
    if (against.kind() == Study.Productivity.Kind.FRONTIER && numbers.frontier().isPresent()) {
      double noise = numbers.frontier().get().fit().noise();
      return Math.exp(0.5 * noise * noise);
    }
    return numbers.smearing();
  }

  /** In words. */
  String words() {
    String whose =
        switch (against.kind()) {
          case BEST_QUARTER -> "the plant at the upper quartile of productivity";
          case FRONTIER -> "the frontier (no inefficiency)";
          default -> "the typical plant";
        };
    return whose
        + (smearing
            ? ", at the mean of its output (smearing factor)"
            : ", at the median of its output (no smearing factor)");
  }

  /** The smearing factor of a candidate in words. */
  String factorWords(Candidate candidate) {
    return String.format(Locale.ROOT, "%.4f", factor(candidate));
  }
}

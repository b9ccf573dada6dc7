package isowright.leastcost;

import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Can the target be reached within the limits at all, and if not, how far can one get? */
final class Feasibility {

  /** Output within this of the target, relative, is the target to the rounding of its logs. */
  static final double EXACT = 1e-11;

  private Feasibility() {}

  /**
   * The reason why a target is out of reach.
   *
   * @param logLargest the log of the largest output within the limits
   * @param attained whether that output is reached by a mix, not only approached
   */
  static String outOfReach(
      List<String> inputs, LogQuestion question, double logLargest, boolean attained) {
    List<String> limits = new ArrayList<>();
    for (int i = 0; i < question.n; i++) {
      if (question.capped(i)) {
        String place = question.asked.held(i) ? " held at " : " at most ";
        limits.add(inputs.get(i) + place + Wording.number(question.asked.high(i)));
      }
    }
    return String.format(
        Locale.ROOT,
        "the target %s is out of reach: with %s output %s %s",
        Wording.number(question.asked.target()),
        Wording.list(limits),
        attained ? "is at most" : "stays below",
        Wording.number(Math.exp(logLargest)));
  }

  /** Whether every output elasticity is positive at ln x, so that more of anything yields more. */
  static boolean monotone(Technology technology, double[] z) {
    double[] e = new double[z.length];
    technology.logGradient(z, e);
    for (double elasticity : e) {
      if (!(elasticity > 0)) {
        return false;
      }
    }
    return true;
  }
}

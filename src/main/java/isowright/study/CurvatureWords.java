package isowright.study;

import isowright.estimation.CurvatureProfile;
import isowright.estimation.Fit;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/** What a profile over the elasticity of substitution says, in a sentence. */
final class CurvatureWords {

  private CurvatureWords() {}

  static String of(Fit fit, CurvatureProfile profile) {
    String level = percent(fit.specification().confidence());
    return switch (profile.state()) {
      case INTERIOR ->
          String.format(
              Locale.ROOT,
              "The sum of squares has its minimum inside the economic region; the %s interval of"
                  + " %s is %.3g to %.3g.",
              level,
              subject(fit, profile),
              profile.substitutionLow(),
              profile.substitutionHigh());
      case FLAT -> flat(subject(fit, profile), profile, level);
      case BOUNDARY -> String.join(" ", fit.reasons()) + open(profile, level);
    };
  }

  /** A level without idle zeros: 95 %, 99.5 %. */
  private static String percent(double confidence) {
    return BigDecimal.valueOf(100 * confidence)
            .round(new MathContext(6))
            .stripTrailingZeros()
            .toPlainString()
        + " %";
  }

  /** Which elasticity the profile is of, where a form has several. */
  private static String subject(Fit fit, CurvatureProfile profile) {
    String elasticity = "the elasticity of substitution";
    if (fit.profiles().size() == 1) {
      return elasticity;
    }
    int colon = profile.name().indexOf(':');
    return elasticity
        + (colon < 0
            ? " between groups of inputs"
            : " within " + profile.name().substring(colon + 1).replace("+", " and "));
  }

  private static String flat(String subject, CurvatureProfile profile, String level) {
    String statement = set(profile);
    return "The sum of squares is flat along "
        + subject
        + ": at "
        + level
        + " the records say no more than that it is "
        + statement
        + ". Read the interval, not the point.";
  }

  private static String open(CurvatureProfile profile, String level) {
    return " At "
        + level
        + ", judged from the lowest point of the region, it is "
        + set(profile)
        + ".";
  }

  private static String set(CurvatureProfile profile) {
    boolean below = profile.substitutionLow() > 0;
    boolean above = !Double.isInfinite(profile.substitutionHigh());
    if (below && above) {
      return String.format(
          Locale.ROOT,
          "between %.3g and %.3g",
          profile.substitutionLow(),
          profile.substitutionHigh());
    }
    if (above) {
      return String.format(Locale.ROOT, "below %.3g", profile.substitutionHigh());
    }
    if (below) {
      return String.format(Locale.ROOT, "above %.3g", profile.substitutionLow());
    }
    return "anything at all";
  }
}

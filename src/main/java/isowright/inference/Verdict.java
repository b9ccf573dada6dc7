package isowright.inference;

/**
 * The result of a test.
 *
 * @param name a short, stable name, such as {@code constant-returns}
 * @param nullHypothesis the null in words
 * @param statistic the statistic
 * @param law its law under the null
 * @param p the probability under the null of a statistic at least as extreme
 * @param sentence the verdict in words, at the level of {@link #LEVEL}
 */
public record Verdict(
    String name, String nullHypothesis, double statistic, Law law, double p, String sentence) {

  /** The level at which a sentence says that the records speak against a null: common practice. */
  public static final double LEVEL = 0.05;

  /** A verdict with its p-value and sentence. */
  static Verdict of(String name, String nullHypothesis, double statistic, Law law) {
    double p = law.p(statistic);
    return new Verdict(
        name, nullHypothesis, statistic, law, p, Hypotheses.sentence(nullHypothesis, p));
  }

  /** The same with something more that must be known of it. */
  Verdict noting(String note) {
    return new Verdict(name, nullHypothesis, statistic, law, p, sentence + " " + note);
  }

  /**
   * The level of significance that belongs to a confidence: 0.05 to 0.95, without the rounding
   * error of the difference, which would reject at p = 0.05.
   */
  public static double level(double confidence) {
    return Math.rint((1 - confidence) * 1e9) / 1e9;
  }

  /** The verdict in words at the level that belongs to a confidence. */
  public String sentence(double confidence) {
    String common = Hypotheses.sentence(nullHypothesis, p);
    String noted = sentence.startsWith(common) ? sentence.substring(common.length()) : "";
    return Hypotheses.sentence(nullHypothesis, p, level(confidence)) + noted;
  }

  /** Whether the null is rejected at {@link #LEVEL}. */
  public boolean rejects() {
    return p < LEVEL;
  }
}

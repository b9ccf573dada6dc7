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

  /** Whether the null is rejected at {@link #LEVEL}. */
  public boolean rejects() {
    return p < LEVEL;
  }
}

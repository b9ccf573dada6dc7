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

  /** Whether the null is rejected at {@link #LEVEL}. */
  public boolean rejects() {
    return p < LEVEL;
  }
}

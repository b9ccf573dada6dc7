package isowright.inference;

/**
 * An estimated number with its uncertainty.
 *
 * @param value the point estimate
 * @param standardError its standard error; NaN where none could be had
 * @param low the lower end of the interval
 * @param high the upper end of the interval
 * @param level the confidence level of the interval, such as 0.95
 * @param method how the interval was obtained
 */
public record Estimate(
    double value, double standardError, double low, double high, double level, Method method) {

  /** How an interval was obtained. */
  public enum Method {
    /** First-order propagation of the parameter covariance. */
    DELTA("delta"),
    /** The set of values that a likelihood-ratio test does not reject. */
    PROFILE("profile"),
    /** Resampling of whole groups. */
    RESAMPLING("resampling");

    private final String word;

    Method(String word) {
      this.word = word;
    }

    /** The word used in files. */
    public String word() {
      return word;
    }
  }
}

package isowright.inference;

import java.util.Optional;

/**
 * An estimated number with its uncertainty.
 *
 * @param value the point estimate
 * @param standardError its standard error; NaN where none could be had
 * @param low the lower end of the interval
 * @param high the upper end of the interval
 * @param level the confidence level of the interval, such as 0.95
 * @param method how the interval was obtained
 * @param resampled what resampling found; absent where there was none
 * @param leftOut how the number moves without a plant or a period
 */
public record Estimate(
    double value,
    double standardError,
    double low,
    double high,
    double level,
    Method method,
    Optional<Resampled> resampled,
    LeftOut leftOut) {

  /** How an interval was obtained. */
  public enum Method {
    /** First-order propagation of the parameter covariance. */
    DELTA("delta"),
    /** The set of values that a likelihood-ratio test does not reject. */
    PROFILE("profile"),
    /** Resampling of whole groups. */
    RESAMPLING("resampling"),
    /** Draws of parameters from their estimated law. */
    SIMULATION("simulation"),
    /** The law of what is not observed given the rows, the parameters taken as known. */
    CONDITIONAL("conditional");

    private final String word;

    Method(String word) {
      this.word = word;
    }

    /** The word used in files. */
    public String word() {
      return word;
    }
  }

  /** Without refits. */
  public Estimate(
      double value, double standardError, double low, double high, double level, Method method) {
    this(value, standardError, low, high, level, method, Optional.empty(), LeftOut.NOTHING);
  }

  /** The same, with how it moves without a plant or a period. */
  public Estimate with(LeftOut moves) {
    return new Estimate(value, standardError, low, high, level, method, resampled, moves);
  }
}

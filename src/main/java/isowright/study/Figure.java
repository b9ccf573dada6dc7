package isowright.study;

import java.util.Optional;

/**
 * A number in the findings: an estimated one carries its uncertainty, an exact one does not.
 *
 * @param value the number
 * @param uncertainty standard error and interval; absent for an exact number
 */
public record Figure(double value, Optional<Uncertainty> uncertainty) {

  /**
   * How sure a figure is.
   *
   * @param standardError the standard error; NaN where none could be had
   * @param low the lower end of the interval
   * @param high the upper end of the interval
   * @param method how the interval was obtained: {@code delta}, {@code profile} or {@code
   *     resampling}
   */
  public record Uncertainty(double standardError, double low, double high, String method) {}

  /** An exact number. */
  public static Figure exact(double value) {
    return new Figure(value, Optional.empty());
  }

  /** An estimated number. */
  public static Figure estimated(
      double value, double standardError, double low, double high, String method) {
    return new Figure(value, Optional.of(new Uncertainty(standardError, low, high, method)));
  }
}

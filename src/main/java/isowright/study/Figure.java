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
   * @param refits what the figure is in refits
   */
  public record Uncertainty(
      double standardError, double low, double high, String method, Refits refits) {

    /** Without refits. */
    public Uncertainty(double standardError, double low, double high, String method) {
      this(standardError, low, high, method, Refits.NONE);
    }
  }

  /**
   * What a figure is when the technology is fitted to other rows.
   *
   * @param drawn to plants drawn with replacement
   * @param withoutPlant without the plant whose absence moves it most
   * @param withoutPeriod without the period whose absence moves it most
   */
  public record Refits(
      Optional<Drawn> drawn, Optional<Without> withoutPlant, Optional<Without> withoutPeriod) {

    /** It was fitted once. */
    public static final Refits NONE =
        new Refits(Optional.empty(), Optional.empty(), Optional.empty());

    /** Whether there are none. */
    public boolean none() {
      return drawn.isEmpty() && withoutPlant.isEmpty() && withoutPeriod.isEmpty();
    }
  }

  /**
   * A figure over draws of plants.
   *
   * @param draws how many draws
   * @param failed how many of them have no value
   * @param mean the mean of the values
   * @param standardError their standard deviation; NaN where too many failed, and all intervals
   *     then
   * @param percentile the percentile interval
   * @param corrected the bias-corrected interval
   * @param accelerated the bias-corrected and accelerated interval; NaN where it could not be had
   * @param analytic the standard error by propagation of the covariance
   * @param analyticInterval the interval by propagation
   */
  public record Drawn(
      int draws,
      int failed,
      double mean,
      double standardError,
      Span percentile,
      Span corrected,
      Span accelerated,
      double analytic,
      Span analyticInterval) {}

  /** The two ends of an interval. */
  public record Span(double low, double high) {}

  /**
   * A figure without a plant or a period.
   *
   * @param name which
   * @param value the figure without it
   * @param lost how many plants or periods cannot be left out, for the figure could not be had
   *     without them
   */
  public record Without(String name, double value, int lost) {}

  /** An exact number. */
  public static Figure exact(double value) {
    return new Figure(value, Optional.empty());
  }

  /** An estimated number. */
  public static Figure estimated(
      double value, double standardError, double low, double high, String method) {
    return new Figure(value, Optional.of(new Uncertainty(standardError, low, high, method)));
  }

  /** The same with what it is in refits; an exact number has none. */
  public Figure with(Refits refits) {
    return new Figure(
        value,
        uncertainty.map(
            u -> new Uncertainty(u.standardError(), u.low(), u.high(), u.method(), refits)));
  }

  /** The same divided by an exact positive number, such as cost by a target. */
  Figure per(double units) {
    return new Figure(
        value / units,
        uncertainty.map(
            u ->
                new Uncertainty(
                    u.standardError() / units, u.low() / units, u.high() / units, u.method())));
  }

  /** What it is in refits. */
  public Refits refits() {
    return uncertainty.map(Uncertainty::refits).orElse(Refits.NONE);
  }
}

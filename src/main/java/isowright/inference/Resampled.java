package isowright.inference;

/**
 * What the draws of a resampling say of one figure.
 *
 * <p>Where more than {@link #MOST_FAILED} of the draws have no value (rank lost, no optimum, an
 * irregular technology), those that have one are no sample of the rest, and no standard error and
 * no interval is given.
 *
 * @param draws how many draws were made
 * @param failed how many of them have no value
 * @param mean the mean of those that have one
 * @param standardError their standard deviation; NaN where too many failed
 * @param percentile the percentile interval
 * @param corrected the interval corrected for bias (BC)
 * @param accelerated the interval corrected for bias and skewness (BCa); NaN where the figure could
 *     not be had without some plant
 * @param analytic the standard error by propagation of the covariance, beside which to hold it
 * @param analyticInterval the interval by propagation
 */
public record Resampled(
    int draws,
    int failed,
    double mean,
    double standardError,
    Interval percentile,
    Interval corrected,
    Interval accelerated,
    double analytic,
    Interval analyticInterval) {

  /** The largest share of draws without a value with which an interval is given: our own rule. */
  public static final double MOST_FAILED = 0.10;

  /** The ends of an interval; NaN where there is none. */
  public record Interval(double low, double high) {
    /** No interval. */
    public static final Interval NONE = new Interval(Double.NaN, Double.NaN);
  }

  /** Whether enough draws have a value. */
  public boolean enough() {
    return failed <= MOST_FAILED * draws;
  }
}

package isowright.inference;

import isowright.inference.Resampled.Interval;
import java.util.Arrays;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * Intervals from the values that a figure takes over draws.
 *
 * <p>With B sorted values, Φ the normal law, z = Φ⁻¹((1 ∓ level)/2), z₀ = Φ⁻¹(share of values below
 * the estimate, ties by half) and a the acceleration:
 *
 * <ul>
 *   <li>percentile: the quantiles Φ(z);
 *   <li>bias-corrected (BC): the quantiles Φ(2 z₀ + z);
 *   <li>accelerated (BCa): the quantiles Φ(z₀ + (z₀ + z)/(1 − a (z₀ + z))), with a = Σ d³ / (6 (Σ
 *       d²)^(3/2)), d_i the mean of the values without one group less that without group i.
 * </ul>
 *
 * The quantile of order p is the value of rank (B + 1) p, between ranks on the scale of Φ⁻¹; beyond
 * the first or the last rank it is that value. Sources: B. Efron 1987, Journal of the American
 * Statistical Association 82, 171–185; A. C. Davison and D. V. Hinkley, <i>Bootstrap Methods and
 * their Application</i>, 1997, equations 5.8 and 5.22. Tested in {@code BootstrapIntervalsTest}
 * against R.
 */
final class BootstrapIntervals {

  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  private final double[] sorted;
  private final double estimate;
  private final double level;

  /**
   * @param values those that were had, all numbers
   */
  BootstrapIntervals(double[] values, double estimate, double level) {
    this.sorted = values.clone();
    Arrays.sort(sorted);
    this.estimate = estimate;
    this.level = level;
  }

  Interval percentile() {
    double tail = (1 - level) / 2;
    return new Interval(quantile(tail), quantile(1 - tail));
  }

  Interval corrected() {
    return accelerated(0);
  }

  /** The accelerated interval with acceleration a; none where all values lie on one side. */
  Interval accelerated(double acceleration) {
    double below = 0;
    for (double value : sorted) {
      below += value < estimate ? 1 : value == estimate ? 0.5 : 0;
    }
    double bias = NORMAL.inverseCumulativeProbability(below / sorted.length);
    if (Double.isInfinite(bias) || Double.isNaN(acceleration)) {
      return Interval.NONE;
    }
    double tail = (1 - level) / 2;
    return new Interval(
        quantile(shifted(bias, acceleration, tail)),
        quantile(shifted(bias, acceleration, 1 - tail)));
  }

  private static double shifted(double bias, double acceleration, double order) {
    double z = bias + NORMAL.inverseCumulativeProbability(order);
    return NORMAL.cumulativeProbability(bias + z / (1 - acceleration * z));
  }

  /** The acceleration from the values without each group; NaN where one is missing. */
  static double acceleration(double[] without) {
    double mean = Arrays.stream(without).sum() / without.length;
    double squares = 0;
    double cubes = 0;
    for (double value : without) {
      double d = mean - value;
      squares += d * d;
      cubes += d * d * d;
    }
    return squares > 0 ? cubes / (6 * Math.pow(squares, 1.5)) : Double.NaN;
  }

  private double quantile(double order) {
    double exact = (sorted.length + 1) * order;
    // A whole rank that rounding put beside itself is a value, not something between two.
    double rank = Math.abs(exact - Math.rint(exact)) < 1e-9 ? Math.rint(exact) : exact;
    int whole = (int) Math.floor(rank);
    if (whole < 1) {
      return sorted[0];
    }
    if (whole >= sorted.length) {
      return sorted[sorted.length - 1];
    }
    double low = sorted[whole - 1];
    if (rank == whole) {
      return low;
    }
    double before = NORMAL.inverseCumulativeProbability(whole / (sorted.length + 1.0));
    double after = NORMAL.inverseCumulativeProbability((whole + 1) / (sorted.length + 1.0));
    double part = (NORMAL.inverseCumulativeProbability(order) - before) / (after - before);
    return low + part * (sorted[whole] - low);
  }
}

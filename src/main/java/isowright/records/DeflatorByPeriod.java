package isowright.records;

import java.util.Arrays;

/**
 * The mean, least and greatest deflator of each period, over every row of the file that has one.
 */
final class DeflatorByPeriod {

  private final LongCodes periods = new LongCodes();
  private double[] sums = new double[16];
  private double[] least = new double[16];
  private double[] most = new double[16];
  private int[] counts = new int[16];

  void add(long period, double value) {
    int code = periods.codeOf(period);
    if (code == sums.length) {
      sums = Arrays.copyOf(sums, 2 * code);
      least = Arrays.copyOf(least, 2 * code);
      most = Arrays.copyOf(most, 2 * code);
      counts = Arrays.copyOf(counts, 2 * code);
    }
    if (counts[code] == 0) {
      least[code] = value;
      most[code] = value;
    }
    sums[code] += value;
    counts[code]++;
    least[code] = Math.min(least[code], value);
    most[code] = Math.max(most[code], value);
  }

  /** The periods met, as keys, ascending. */
  long[] periods() {
    long[] keys = new long[periods.size()];
    for (int p = 0; p < keys.length; p++) {
      keys[p] = periods.key(p);
    }
    Arrays.sort(keys);
    return keys;
  }

  /**
   * The deflator of the base, over the rows of all periods within it (a year may hold months).
   *
   * @return mean, least and greatest; a mean of NaN where no row is within the base
   */
  Base base(long base) {
    double sum = 0;
    int count = 0;
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int p = 0; p < periods.size(); p++) {
      if (Periods.within(periods.key(p), base, base)) {
        sum += sums[p];
        count += counts[p];
        low = Math.min(low, least[p]);
        high = Math.max(high, most[p]);
      }
    }
    return new Base(sum / count, low, high);
  }

  /**
   * The deflator of the base.
   *
   * @param mean its mean, NaN where there is none
   * @param least the least
   * @param most the greatest
   */
  record Base(double mean, double least, double most) {}
}

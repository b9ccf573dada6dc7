package isowright.charts;

import java.util.stream.IntStream;

/** Places along curves. */
final class Curves {

  private static final double[] SHARES = {
    0.93, 0.85, 0.77, 0.69, 0.61, 0.07, 0.15, 0.23, 0.31, 0.39
  };

  private Curves() {}

  /** Values at places where a label may stand: towards the end first, then the beginning. */
  static double[] ends(double[] values) {
    double[] some = new double[SHARES.length];
    for (int i = 0; i < some.length; i++) {
      some[i] = values[(int) Math.round(SHARES[i] * (values.length - 1))];
    }
    return some;
  }

  /** Indices of about {@code count} evenly spaced places among n, the first and last included. */
  static int[] spread(int n, int count) {
    int places = Math.min(n, count);
    return IntStream.range(0, places)
        .map(i -> places == 1 ? 0 : (int) Math.round((double) i * (n - 1) / (places - 1)))
        .toArray();
  }

  /** Both arrays, one after the other. */
  static double[] joined(double[] first, double[] second) {
    return IntStream.range(0, first.length + second.length)
        .mapToDouble(i -> i < first.length ? first[i] : second[i - first.length])
        .toArray();
  }

  /** The least finite value; NaN if there is none. */
  static double least(double[] values) {
    return java.util.Arrays.stream(values).filter(Double::isFinite).min().orElse(Double.NaN);
  }

  /** The greatest finite value; NaN if there is none. */
  static double most(double[] values) {
    return java.util.Arrays.stream(values).filter(Double::isFinite).max().orElse(Double.NaN);
  }
}

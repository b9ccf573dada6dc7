package isowright.records;

/** Medians, which a few wrong values cannot move. */
final class Robust {

  /**
   * Makes the median absolute deviation of normal values their standard deviation: 1 / Φ⁻¹(3/4)
   * (Hampel 1974, <i>Journal of the American Statistical Association</i> 69, 383–393).
   */
  static final double NORMAL = 1.4826;

  private Robust() {}

  /**
   * The median of the first {@code length} values, NaN where there are none; the array is
   * rearranged.
   */
  static double median(double[] values, int length) {
    if (length == 0) {
      return Double.NaN;
    }
    int upper = length / 2;
    select(values, length, upper);
    if (length % 2 == 1) {
      return values[upper];
    }
    double below = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < upper; i++) {
      below = Math.max(below, values[i]);
    }
    return below + (values[upper] - below) / 2;
  }

  /** Hoare's selection with the middle of three as pivot: puts the k-th smallest in its place. */
  private static void select(double[] values, int length, int k) {
    int from = 0;
    int to = length - 1;
    while (from < to) {
      double pivot = middleOfThree(values[from], values[(from + to) >>> 1], values[to]);
      int low = from;
      int high = to;
      while (low <= high) {
        while (values[low] < pivot) {
          low++;
        }
        while (values[high] > pivot) {
          high--;
        }
        if (low <= high) {
          double swapped = values[low];
          values[low++] = values[high];
          values[high--] = swapped;
        }
      }
      if (k <= high) {
        to = high;
      } else if (k >= low) {
        from = low;
      } else {
        return;
      }
    }
  }

  private static double middleOfThree(double a, double b, double c) {
    return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
  }
}

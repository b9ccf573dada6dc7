package isowright.technology;

/** The root of a rising function of one number. */
final class Rising {

  /** More steps than halving any bracket of doubles takes. */
  private static final int STEPS = 200;

  private Rising() {}

  /** A function with its slope. */
  @FunctionalInterface
  interface Sloped {
    /**
     * The value at x.
     *
     * @param slope {@code slope[0]} comes in as 0 and takes the slope
     */
    double at(double x, double[] slope);
  }

  /**
   * Newton's method, each step halved into the bracket that the signs met so far leave; ends where
   * a step no longer changes x.
   *
   * @param guess where to begin
   */
  static double root(double guess, Sloped function) {
    double low = Double.NEGATIVE_INFINITY;
    double high = Double.POSITIVE_INFINITY;
    double x = guess;
    double reach = 1;
    for (int step = 0; step < STEPS; step++) {
      double[] slope = new double[1];
      double value = function.at(x, slope);
      if (value == 0) {
        return x;
      }
      if (value < 0) {
        low = x;
      } else {
        high = x;
      }
      double next = x - value / slope[0];
      if (!(next > low && next < high)) {
        boolean open = Double.isInfinite(low) || Double.isInfinite(high);
        next = open ? x + (value < 0 ? reach : -reach) : low + (high - low) / 2;
        reach *= 2;
      }
      if (Math.abs(next - x) <= 2 * Math.ulp(Math.max(Math.abs(x), 1))) {
        return next;
      }
      x = next;
    }
    return x;
  }
}

package isowright.charts;

/**
 * An axis.
 *
 * @param title what it measures, with the unit
 * @param low its lower end
 * @param high its upper end
 * @param logarithmic whether equal ratios are equally far apart
 */
record Axis(String title, double low, double high, boolean logarithmic) {

  /** The title of an axis of periods. */
  static final String PERIOD = "period";

  /** How much room is left beside the outermost values, as a share of the range. */
  private static final double ROOM = 0.05;

  /** Values that differ by less than this share of their size are equal to the eye. */
  private static final double LEAST_SPAN = 1e-6;

  /** Sizes within these bounds are labelled as they are, … */
  private static final double SMALLEST = 1e-3;

  private static final double GREATEST = 1e10;

  /** Values further apart than this ratio ask for a logarithmic axis. */
  private static final double RATIO = 6;

  /** A linear axis between two ends. */
  static Axis between(String title, double low, double high) {
    return new Axis(title, low, high, false);
  }

  /** A linear axis from zero, with room above the greatest value. */
  static Axis fromZero(String title, double most) {
    return new Axis(title, 0, most > 0 ? most * (1 + ROOM) : 1, false);
  }

  /** A linear axis around values; about as wide as they are great where they are all but equal. */
  static Axis around(String title, double least, double most) {
    double span = most - least;
    double size = Math.max(Math.abs(least), Math.abs(most));
    double room = span > LEAST_SPAN * size ? ROOM * span : size > 0 ? ROOM * size : 1;
    return new Axis(title, least - room, most + room, false);
  }

  /** A logarithmic axis around positive values. */
  static Axis logarithmic(String title, double least, double most) {
    double room = most > least ? Math.pow(most / least, ROOM) : 1.1;
    return new Axis(title + ", log scale", least / room, most * room, true);
  }

  /** A logarithmic axis where positive values are far apart, else a linear one. */
  static Axis fitting(String title, double least, double most) {
    return least > 0 && most / least > RATIO
        ? logarithmic(title, least, most)
        : around(title, least, most);
  }

  /**
   * The power of ten, a multiple of three, in which the axis is labelled: 0 for ordinary sizes. A
   * logarithmic axis is labelled so that its lower end has an ordinary size.
   */
  int exponent() {
    double size = logarithmic ? low : Math.max(Math.abs(low), Math.abs(high));
    boolean ordinary = logarithmic ? size >= SMALLEST && high < GREATEST : size >= SMALLEST;
    return ordinary && size < GREATEST || !(size > 0)
        ? 0
        : 3 * (int) Math.floor(Math.log10(size) / 3);
  }

  /** A value in the power of ten of the axis. */
  double inPower(double value) {
    int exponent = exponent();
    return exponent == 0 ? value : value / Math.pow(10, exponent);
  }

  /** The title with the power of ten, where there is one: "labour (h), in 10⁻¹²". */
  String heading() {
    return exponent() == 0 ? title : title + ", in " + Numbers.powerOfTen(exponent());
  }

  /** Whether a value can be drawn on it. */
  boolean holds(double value) {
    return value >= low && value <= high;
  }

  /** Where a value lies between the ends: 0 at the lower, 1 at the upper. */
  double share(double value) {
    return logarithmic
        ? Math.log(value / low) / Math.log(high / low)
        : (value - low) / (high - low);
  }

  /** The value nearest to the given one that the axis holds. */
  double clamp(double value) {
    return Math.max(low, Math.min(high, value));
  }
}

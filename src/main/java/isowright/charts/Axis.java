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

  /** How much room is left beside the outermost values, as a share of the range. */
  private static final double ROOM = 0.05;

  /** Values further apart than this ratio ask for a logarithmic axis. */
  private static final double RATIO = 6;

  /** A linear axis between two ends. */
  static Axis between(String title, double low, double high) {
    return new Axis(title, low, high, false);
  }

  /** A linear axis from zero, with room above the greatest value. */
  static Axis fromZero(String title, double most) {
    return new Axis(title, 0, most * (1 + ROOM), false);
  }

  /** A linear axis around values. */
  static Axis around(String title, double least, double most) {
    double span = most - least;
    double room = span > 0 ? ROOM * span : Math.max(Math.abs(most), 1e-9) * ROOM;
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

package isowright.records;

import java.util.List;

/**
 * How many steps lie between two periods of a panel, so that a lag is a distance in time and not a
 * distance in rows: where a plant has no row one step before, its lag is unknown.
 *
 * <p>A step is the least distance between neighbouring periods of the records. Dates stand as years
 * and fractions of years, and months and quarters are not all of one length, so a least distance
 * close to a month, a quarter, a half year, a year, a week or a day is taken to be that. Periods
 * whose distance is no whole number of steps, to within a quarter of one, are no lag of each other.
 * Tested in {@code PeriodStepsTest}.
 */
public final class PeriodSteps {

  /** A least distance this close (as a share) to a usual one is taken to be it. */
  private static final double CLOSE = 0.12;

  /** How far from a whole number of steps a distance may be. */
  private static final double LEAST_WHOLE = 0.25;

  /** Half year, quarter, month, week, day in years. */
  private static final double[] USUAL = {1, 0.5, 0.25, 1 / 12.0, 7 / 365.25, 1 / 365.25};

  private final Panel panel;
  private final double step;

  private PeriodSteps(Panel panel, double step) {
    this.panel = panel;
    this.step = step;
  }

  /** The steps of a panel's periods. */
  public static PeriodSteps of(Panel panel) {
    List<Double> numbers = panel.periodNumbers();
    double least = Double.POSITIVE_INFINITY;
    for (int p = 1; p < numbers.size(); p++) {
      least = Math.min(least, numbers.get(p) - numbers.get(p - 1));
    }
    for (double usual : USUAL) {
      if (Math.abs(least / usual - 1) <= CLOSE) {
        return new PeriodSteps(panel, usual);
      }
    }
    return new PeriodSteps(panel, least);
  }

  /** The length of a step on the scale of the period numbers; infinite with a single period. */
  public double step() {
    return step;
  }

  /**
   * The row of the same plant a number of steps earlier.
   *
   * @param row a row of the panel
   * @param lag how many steps, at least 0
   * @return the row, or −1 where the plant has none then
   */
  public int before(int row, int lag) {
    if (lag == 0) {
      return row;
    }
    double now = number(row);
    int first = panel.plantStart(panel.plantOf(row));
    for (int r = row - 1; r >= first; r--) {
      double steps = (now - number(r)) / step;
      if (Math.abs(steps - lag) < LEAST_WHOLE) {
        return r;
      }
      if (steps > lag) {
        return -1;
      }
    }
    return -1;
  }

  private double number(int row) {
    return panel.periodNumbers().get(panel.rowPeriods().get(row));
  }
}

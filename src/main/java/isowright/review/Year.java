package isowright.review;

import isowright.inference.ParameterDraws;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;

/**
 * The chance of a single year in each plant's own cost, independent between plants, with the spread
 * that the entrant states and the law of the draw.
 */
final class Year {

  private Year() {}

  /**
   * Adds the chance of the year to every plant of a row.
   *
   * @param spreads the standard deviation of each plant's ln C
   */
  static void add(double[] spreads, double[] row, ParameterDraws.Draw draw) {
    RandomGenerator random = new SplittableRandom(draw.seed());
    for (int i = 0; i < row.length; i++) {
      row[i] += spreads[i] * draw.stretch() * random.nextGaussian();
    }
  }
}

package isowright.review;

import isowright.inference.ParameterDraws;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;

/**
 * The chance of a single year in each plant's own cost, independent between plants, with the spread
 * that the entrant states and the law of the draw.
 */
final class Year {

  private Year() {}

  /** A row with the chance of the year added to every plant. */
  static double[] added(List<Entrant> order, double[] row, ParameterDraws.Draw draw) {
    RandomGenerator random = new SplittableRandom(draw.seed());
    double[] with = row.clone();
    for (int i = 0; i < with.length; i++) {
      with[i] += order.get(i).yearSpread() * draw.stretch() * random.nextGaussian();
    }
    return with;
  }
}

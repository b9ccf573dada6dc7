package isowright.leastcost;

import isowright.technology.Technology;

/**
 * A plant that can take a part of a target.
 *
 * <p>Making nothing costs what is held or must be taken at least (that is paid in any case), not
 * the running cost.
 *
 * @param name its name
 * @param technology its technology, at its own level
 * @param question its prices and limits; the target is not used
 * @param capacity the most it can make; {@code +∞} where nothing but its limits bounds it
 * @param runningCost money due if it makes anything at all, zero or more
 */
public record PlantOption(
    String name, Technology technology, Question question, double capacity, double runningCost) {

  /** Checks the numbers. */
  public PlantOption {
    if (!(capacity > 0) || !(runningCost >= 0) || Double.isInfinite(runningCost)) {
      throw new IllegalArgumentException(
          name + ": a capacity of " + capacity + " and a running cost of " + runningCost);
    }
  }

  /** What it costs to make nothing. */
  double idle() {
    return Outputs.spending(question, question.low());
  }
}

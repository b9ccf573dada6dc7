package isowright.inference;

import java.util.Optional;

/**
 * How does a figure move without one plant, or without one period? The one whose absence moves it
 * most, by exact refits.
 *
 * @param plant absent where it was not worked out
 * @param period absent where it was not worked out
 */
public record LeftOut(Optional<Most> plant, Optional<Most> period) {

  /** Nothing was left out. */
  public static final LeftOut NOTHING = new LeftOut(Optional.empty(), Optional.empty());

  /**
   * The plant or period whose absence moves the figure most.
   *
   * @param name its name
   * @param value the figure without it
   * @param lost how many plants or periods cannot be left out, because without them the figure
   *     could not be had
   */
  public record Most(String name, double value, int lost) {}
}

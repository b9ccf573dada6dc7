package isowright.estimation;

/** Whose productivity an estimated technology is to have. */
public sealed interface Productivity {

  /** The plants of the records on average, each weighted by its rows. */
  record Typical() implements Productivity {}

  /** The plant at the upper quartile of plant levels. */
  record UpperQuartile() implements Productivity {}

  /** The frontier: no inefficiency. The same as typical where none was estimated. */
  record Frontier() implements Productivity {}

  /**
   * One plant.
   *
   * @param index its index in the panel
   */
  record Plant(int index) implements Productivity {}
}

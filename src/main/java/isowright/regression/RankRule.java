package isowright.regression;

/**
 * When a column counts as a combination of the columns before it.
 *
 * <p>Columns are taken in their order, which is the order of precedence: a constant or a
 * first-order term that stands first is kept, and the later column of a dependent set is dropped.
 * The relative pivot of a column is the length of what is left of it after projection on the
 * columns kept before it (and on effects removed beforehand), divided by its own length before
 * anything was removed: the sine of the angle between the column and the space of the others. It
 * does not depend on units. A column is dropped where its relative pivot is below {@code
 * smallestPivot}.
 *
 * @param smallestPivot the least relative pivot of a column that is kept, above 0 and below 1
 */
public record RankRule(double smallestPivot) {

  /**
   * The rule used unless another is asked for: 1e-11.
   *
   * <p>Reason: what rounding leaves of an exact combination was measured as some 2e-15 of the
   * column at a million rows, and grows with the size of the terms that cancel in the combination,
   * so a margin of thousands is wanted above it. The hardest of the reference polynomials (NIST
   * Filip, powers up to the tenth) has a least pivot of 5e-8, which a rule of 1e-7 would drop
   * although eleven coefficients are certified; the value leaves a margin of thousands below that
   * too. Tested in {@code RankTest}.
   */
  public static final RankRule STANDARD = new RankRule(1e-11);

  /** Checks the range. */
  public RankRule {
    if (!(smallestPivot > 0 && smallestPivot < 1)) {
      throw new IllegalArgumentException(
          "smallestPivot must lie between 0 and 1, not " + smallestPivot);
    }
  }
}

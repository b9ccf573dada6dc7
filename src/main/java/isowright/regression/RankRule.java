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
   * The rule used unless another is asked for: 1e-12.
   *
   * <p>Reason: an exact combination leaves rounding of about 1e-16 to 1e-15 of the column (measured
   * below 1e-14 for proportional columns at a million rows), while the hardest published polynomial
   * (NIST Filip, powers up to the tenth) still has a pivot of about 1e-10. The value stands between
   * the two, away from both. Tested in {@code RankTest}.
   */
  public static final RankRule STANDARD = new RankRule(1e-12);

  /** Checks the range. */
  public RankRule {
    if (!(smallestPivot > 0 && smallestPivot < 1)) {
      throw new IllegalArgumentException(
          "smallestPivot must lie between 0 and 1, not " + smallestPivot);
    }
  }
}

package isowright.review;

/** Being written. */
public final class FiledCost {
  private FiledCost() {}
}

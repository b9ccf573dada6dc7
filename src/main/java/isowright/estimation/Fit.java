package isowright.estimation;

/** Being written. */
public final class Fit {
  private Fit() {}
}

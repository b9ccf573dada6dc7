package isowright.technology;

/** Being written. */
public final class Regularity {
  private Regularity() {}
}

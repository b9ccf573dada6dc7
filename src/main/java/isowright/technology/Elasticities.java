package isowright.technology;

/** Being written. */
public final class Elasticities {
  private Elasticities() {}
}

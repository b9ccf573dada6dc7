package isowright.leastcost;

/** Being written. */
public final class Minimiser {
  private Minimiser() {}
}

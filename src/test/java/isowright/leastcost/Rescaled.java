package isowright.leastcost;

import isowright.technology.Technology;
import java.util.Arrays;

/** A technology whose base, in which its inputs are counted, is moved to a small number. */
final class Rescaled {

  private Rescaled() {}

  /** The same parameters about a base of the same number for every input. */
  static Technology of(Technology technology, double base) {
    double[] bases = new double[technology.dimension()];
    Arrays.fill(bases, base);
    return RandomTechnologies.withBase(technology, bases);
  }
}

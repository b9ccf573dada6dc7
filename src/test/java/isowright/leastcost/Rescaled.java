package isowright.leastcost;

import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.Arrays;

/** A technology whose base, in which its inputs are counted, is moved to a small number. */
final class Rescaled {

  private Rescaled() {}

  /** The same parameters about a base of the same number for every input. */
  static Technology of(Technology technology, double base) {
    double[] bases = new double[technology.dimension()];
    Arrays.fill(bases, base);
    if (technology instanceof CobbDouglas cobbDouglas) {
      return new CobbDouglas(
          technology.inputs(), bases, technology.parameters()[0], cobbDouglas.coefficients());
    }
    if (technology instanceof Ces ces) {
      return Ces.of(
          technology.inputs(),
          bases,
          technology.parameters()[0],
          ces.shares(),
          ces.rho(),
          ces.scale());
    }
    double[] all = technology.parameters();
    return new Translog(technology.inputs(), bases, all[0], Arrays.copyOfRange(all, 1, all.length));
  }
}

package isowright.leastcost;

import isowright.technology.Regularity;
import isowright.technology.Technology;
import java.util.Locale;

/** What is irregular at a mix, in words ({@link Regularity} decides). */
final class Regular {

  private Regular() {}

  /** What is irregular at ln x; empty where nothing is. */
  static String complaint(Technology technology, double[] z) {
    Regularity.Checker checker = new Regularity.Checker(technology);
    checker.check(z);
    if (checker.regular()) {
      return "";
    }
    double[] elasticities = new double[z.length];
    technology.logGradient(z, elasticities);
    for (int i = 0; i < z.length; i++) {
      if (!checker.monotone(i)) {
        return lack(technology, i, elasticities[i], z);
      }
    }
    return "isoquants are not convex to the origin at " + Wording.mix(technology.inputs(), z);
  }

  /** That more of an input does not add output. */
  static String lack(Technology technology, int i, double elasticity, double[] z) {
    return String.format(
        Locale.ROOT,
        "more of %s ceases to add output (output elasticity %.3g at %s)",
        technology.inputs().get(i),
        elasticity,
        Wording.mix(technology.inputs(), z));
  }
}

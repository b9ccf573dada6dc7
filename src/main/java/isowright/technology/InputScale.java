package isowright.technology;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/**
 * The names of a technology's inputs and the base by which each is divided before logs; the logs of
 * the base are taken once, because a technology is asked at millions of mixes.
 */
final class InputScale {

  private final List<String> names;
  private final double[] base;
  private final double[] logBase;

  /**
   * Names and base, checked.
   *
   * @param base shape n, positive and finite; copied
   */
  InputScale(List<String> names, double[] base) {
    if (names.isEmpty() || names.stream().distinct().count() != names.size()) {
      throw new IllegalArgumentException(
          "inputs " + names + ": name at least one input, and each only once");
    }
    if (base.length != names.size()) {
      throw new IllegalArgumentException(
          "base has " + base.length + " values for the " + names.size() + " inputs " + names);
    }
    for (int i = 0; i < base.length; i++) {
      if (!(base[i] > 0) || Double.isInfinite(base[i])) {
        throw new IllegalArgumentException(
            String.format(
                Locale.ROOT,
                "base of %s is %s: inputs can be divided by a positive number only",
                names.get(i),
                base[i]));
      }
    }
    this.names = List.copyOf(names);
    this.base = base.clone();
    this.logBase = new double[base.length];
    Arrays.setAll(logBase, i -> Math.log(base[i]));
  }

  /** Inputs in their own units: a base of ones. */
  static InputScale ownUnits(List<String> names) {
    double[] ones = new double[names.size()];
    Arrays.fill(ones, 1);
    return new InputScale(names, ones);
  }

  List<String> names() {
    return names;
  }

  /** The base; a copy, shape n. */
  double[] base() {
    return base.clone();
  }

  /** The logs of the base, shape n; the array itself, not to be modified. */
  double[] logBase() {
    return logBase;
  }

  int size() {
    return logBase.length;
  }

  /** Refuses an array that does not hold the number of values the form needs. */
  void require(double[] values, int needed, String what) {
    if (values.length != needed) {
      throw new IllegalArgumentException(
          what
              + ": "
              + values.length
              + " values where "
              + needed
              + " are needed for the inputs "
              + names);
    }
  }
}

package isowright.charts;

import java.util.List;

/** Stretches of a curve that lie outside the records, shaded over the whole height. */
final class Shades {

  private Shades() {}

  /** Shades the stretches whose points are not inside, and explains them in the key. */
  static void outside(Plot plot, double[] at, List<Boolean> inside) {
    boolean any = false;
    for (int i = 0; i < at.length; i++) {
      if (inside.get(i)) {
        continue;
      }
      int from = i;
      while (i + 1 < at.length && !inside.get(i + 1)) {
        i++;
      }
      double left = from == 0 ? plot.x().low() : (at[from - 1] + at[from]) / 2;
      double right = i + 1 == at.length ? plot.x().high() : (at[i] + at[i + 1]) / 2;
      plot.region("outside the records", left, right);
      any = true;
    }
    if (any) {
      plot.keyOfShade("outside the records");
    }
  }
}

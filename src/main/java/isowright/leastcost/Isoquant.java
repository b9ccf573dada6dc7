package isowright.leastcost;

import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;

/**
 * Which quantities of two inputs yield a target, the other inputs staying where they are?
 *
 * <p>Only the economic part of the isoquant is given, where more of either input never yields less:
 * a quantity of the first input for which there is no such quantity of the second is left out. Of a
 * vertical or horizontal stretch (fixed proportions) the corner is the point that matters; beyond
 * it the second input stays at what is needed.
 */
public final class Isoquant {

  /**
   * Where the elasticity of the second input is a smaller part than this, output is flat in it to
   * rounding (1e-16/1e-12 leaves four digits of the quantity), as at an asymptote.
   */
  private static final double FLAT = 1e-12;

  private Isoquant() {}

  /**
   * Points of the isoquant.
   *
   * @param target output Q, positive
   * @param first the input whose quantities are given
   * @param second the input that answers
   * @param at quantities of all inputs, shape n, positive; those of the two are only a start
   * @param quantities of the first input, positive, in any order
   * @return pairs (quantity of the first, quantity of the second), in the order given
   */
  public static List<double[]> of(
      Technology technology,
      double target,
      int first,
      int second,
      double[] at,
      double[] quantities) {
    if (first == second) {
      throw new IllegalArgumentException("an isoquant needs two inputs, not " + first + " twice");
    }
    double[] z = new double[at.length];
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(at[i]);
    }
    double logTarget = Math.log(target);
    double[] e = new double[z.length];
    List<double[]> pairs = new ArrayList<>(quantities.length);
    for (double quantity : quantities) {
      double[] here = z.clone();
      here[first] = Math.log(quantity);
      double tau = Crossing.along(technology, here, second, logTarget);
      if (Double.isNaN(tau)) {
        continue;
      }
      here[second] += tau;
      technology.logGradient(here, e);
      if (e[second] > FLAT * (e[first] + e[second]) && e[first] >= 0) {
        pairs.add(new double[] {quantity, Math.exp(here[second])});
      }
    }
    return pairs;
  }

  /**
   * Points of the isoquant around a mix, quantities of the first input being evenly spaced in logs
   * from 1/factor to factor times that of the mix. With an odd number of points the middle one is
   * the mix itself, if it lies on the isoquant.
   *
   * @param factor above one
   * @param points two or more
   */
  public static List<double[]> around(
      Technology technology,
      double target,
      int first,
      int second,
      double[] at,
      double factor,
      int points) {
    if (!(factor > 1) || points < 2) {
      throw new IllegalArgumentException(
          "factor " + factor + " and " + points + " points: give more than 1 and two or more");
    }
    double[] quantities = new double[points];
    for (int k = 0; k < points; k++) {
      quantities[k] = at[first] * Math.pow(factor, 2.0 * k / (points - 1) - 1);
    }
    return of(technology, target, first, second, at, quantities);
  }
}

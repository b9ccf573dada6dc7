package isowright.leastcost;

import isowright.technology.Technology;
import java.util.OptionalDouble;

/**
 * By what factor θ would a mix have to shrink, all inputs alike, to yield just the target? f(θ x) =
 * Q. Below one the mix yields more than the target by the technology, above one less.
 *
 * <p>Source: Farrell, M. J. (1957), The Measurement of Productive Efficiency, <i>Journal of the
 * Royal Statistical Society</i> A 120, 253–290 (the ratio OQ/OP of his figure 1); Debreu, G.
 * (1951), The Coefficient of Resource Utilization, <i>Econometrica</i> 19, 273–292.
 */
public final class Contraction {

  private Contraction() {}

  /**
   * The factor θ; empty where no multiple of the mix yields the target, or where more of everything
   * would yield less there.
   *
   * @param mix the inputs x, shape n, all positive
   * @param target output Q, positive
   */
  public static OptionalDouble onto(Technology technology, double[] mix, double target) {
    double[] z = new double[mix.length];
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(mix[i]);
    }
    double tau = Crossing.ray(technology, z, Math.log(target));
    if (Double.isNaN(tau)) {
      return OptionalDouble.empty();
    }
    double[] e = new double[z.length];
    for (int i = 0; i < z.length; i++) {
      z[i] += tau;
    }
    technology.logGradient(z, e);
    double scale = 0;
    for (double each : e) {
      scale += each;
    }
    return scale > 0 ? OptionalDouble.of(Math.exp(tau)) : OptionalDouble.empty();
  }
}

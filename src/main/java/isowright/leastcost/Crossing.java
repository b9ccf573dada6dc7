package isowright.leastcost;

import isowright.technology.Technology;
import java.util.Arrays;

/**
 * Where does ln f cross ln Q upwards as some inputs move together in logs? One equation in one
 * unknown: ln f(z + τ d) = ln Q with d zero or one for each input. Newton's method inside a
 * bracket, so that kinks, asymptotes and flat stretches do no harm; of a flat stretch at the target
 * the least τ is taken.
 */
final class Crossing {

  /** The first step of the search for a bracket; growing by half each time. */
  private static final double FIRST_STEP = 0.25;

  private static final double GROWTH = 1.5;

  /** Quantities are searched within a factor of e^230 (1e100) of where the search starts. */
  private static final double FARTHEST = 230;

  /** A bracket this narrow, in logs, pins a quantity down to rounding. */
  private static final double NARROW = 4e-16;

  private static final int ITERATIONS = 200;

  private final Technology technology;
  private final double[] z;
  private final boolean[] moving;
  private final double logTarget;
  private final double[] at;
  private final double[] elasticities;

  Crossing(Technology technology, double[] z, boolean[] moving, double logTarget) {
    this.technology = technology;
    this.z = z.clone();
    this.moving = moving.clone();
    this.logTarget = logTarget;
    this.at = z.clone();
    this.elasticities = new double[z.length];
  }

  /** τ for the input i alone. */
  static double along(Technology technology, double[] z, int i, double logTarget) {
    boolean[] moving = new boolean[z.length];
    moving[i] = true;
    return new Crossing(technology, z, moving, logTarget).find();
  }

  /** τ for all inputs together. */
  static double ray(Technology technology, double[] z, double logTarget) {
    boolean[] moving = new boolean[z.length];
    Arrays.fill(moving, true);
    return new Crossing(technology, z, moving, logTarget).find();
  }

  /** τ; NaN where there is no crossing. */
  double find() {
    double here = excess(0);
    if (Double.isNaN(here)) {
      return Double.NaN;
    }
    double direction = here >= 0 ? -1 : 1;
    double last = 0;
    double step = FIRST_STEP;
    while (last < FARTHEST) {
      double next = last + step;
      double there = excess(direction * next);
      if (Double.isNaN(there)) {
        return Double.NaN;
      }
      if (direction > 0 && there >= 0) {
        return refine(last, next);
      }
      if (direction < 0 && there < 0) {
        return refine(-next, -last);
      }
      last = next;
      step *= GROWTH;
    }
    return Double.NaN;
  }

  /** The crossing between a τ short of the target and one that reaches it. */
  private double refine(double low, double high) {
    double tau = 0.5 * (low + high);
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      double excess = excess(tau);
      if (excess >= 0) {
        high = tau;
      } else {
        low = tau;
      }
      double width = NARROW * Math.max(1, Math.abs(high));
      if (high - low <= width) {
        return high;
      }
      double newton = tau - excess / slope();
      boolean inside = newton > low && newton < high;
      // Every third step halves the bracket, so that a flat stretch cannot slow it down.
      double next = inside && iteration % 3 != 2 ? newton : 0.5 * (low + high);
      if (inside && Math.abs(next - tau) <= width) {
        return next;
      }
      tau = next;
    }
    return high;
  }

  private double excess(double tau) {
    for (int i = 0; i < z.length; i++) {
      at[i] = moving[i] ? z[i] + tau : z[i];
    }
    return technology.logOutput(at) - logTarget;
  }

  private double slope() {
    technology.logGradient(at, elasticities);
    double sum = 0;
    for (int i = 0; i < z.length; i++) {
      sum += moving[i] ? elasticities[i] : 0;
    }
    return sum;
  }
}

package isowright.regression;

import java.util.Arrays;

/**
 * Which values of the one-sided error's scale do the rows not speak against? Those at which twice
 * the log-likelihood, greatest over all other parameters, lies less than a threshold below its
 * maximum: {@code {low, high}}, low 0 where no one-sided error at all is among them and high
 * infinite where no bound was found.
 *
 * <p>Where a one-sided error is small beside the noise the likelihood is far from quadratic in any
 * scale of it, and this holds where propagation of the covariance says nothing. Source: D. R. Cox
 * and D. V. Hinkley 1974, <i>Theoretical Statistics</i>, section 9.3. Tested in {@code
 * ComposedErrorsTest}.
 */
public final class ComposedProfile {

  /** What is held. */
  public enum Held {
    /** σ_w. */
    SCALE,
    /** σ_w/σ_v. */
    RATIO
  }

  /** Steps outward, in logs: each multiplies by e. */
  private static final int MOST_STEPS = 12;

  /** Halvings of a step: an end is then good to a relative 1e-4. */
  private static final int HALVINGS = 13;

  private final ComposedFit fit;
  private final Held held;
  private final int noise;
  private double[] last;

  private ComposedProfile(ComposedFit fit, Held held) {
    this.fit = fit;
    this.held = held;
    this.noise = fit.coefficients().length;
    this.last = free(fit.parameters());
  }

  /**
   * The interval.
   *
   * @param fit with a one-sided error
   * @param threshold such as 3.84
   */
  public static double[] interval(ComposedFit fit, Held held, double threshold) {
    double[] all = fit.parameters();
    int noise = fit.coefficients().length;
    double centre = all[noise + 1] - (held == Held.RATIO ? all[noise] : 0);
    boolean none = fit.likelihoodRatio() < threshold;
    return new double[] {
      none ? 0 : Math.exp(new ComposedProfile(fit, held).end(centre, -1, threshold)),
      Math.exp(new ComposedProfile(fit, held).end(centre, 1, threshold))
    };
  }

  private double end(double centre, int sign, double threshold) {
    double inside = centre;
    double step = 1;
    double outside = Double.NaN;
    for (int k = 0; k < MOST_STEPS && Double.isNaN(outside); k++) {
      double next = inside + sign * step;
      if (below(next) > threshold) {
        outside = next;
      } else {
        inside = next;
      }
    }
    if (Double.isNaN(outside)) {
      return sign * Double.POSITIVE_INFINITY;
    }
    for (int k = 0; k < HALVINGS; k++) {
      double middle = 0.5 * (inside + outside);
      if (below(middle) > threshold) {
        outside = middle;
      } else {
        inside = middle;
      }
    }
    return 0.5 * (inside + outside);
  }

  /** Twice the distance of the profile from the maximum. */
  private double below(double value) {
    NewtonAscent.End end = NewtonAscent.from(last, parameters -> new Point(parameters, value));
    if (end.converged()) {
      last = end.parameters();
    }
    return 2 * (fit.logLikelihood() - end.value());
  }

  /** All but the held one. */
  private double[] free(double[] all) {
    double[] free = Arrays.copyOf(all, all.length - 1);
    System.arraycopy(all, noise + 2, free, noise + 1, all.length - noise - 2);
    return free;
  }

  /** The likelihood in the free parameters. */
  private final class Point implements NewtonAscent.Point {
    private final ComposedLikelihood whole;

    Point(double[] free, double value) {
      double[] all = Arrays.copyOf(free, free.length + 1);
      System.arraycopy(free, noise + 1, all, noise + 2, free.length - noise - 1);
      all[noise + 1] = value + (held == Held.RATIO ? free[noise] : 0);
      this.whole = fit.model().at(all);
    }

    @Override
    public double value() {
      return whole.value();
    }

    /** With the ratio held, σ_w moves with σ_v. */
    @Override
    public double[] gradient() {
      double[] gradient = whole.gradient().clone();
      if (held == Held.RATIO) {
        gradient[noise] += gradient[noise + 1];
      }
      return free(gradient);
    }

    @Override
    public double[][] hessian() {
      double[][] hessian = Matrices.copy(whole.hessian());
      if (held == Held.RATIO) {
        for (double[] row : hessian) {
          row[noise] += row[noise + 1];
        }
        for (int k = 0; k < hessian.length; k++) {
          hessian[noise][k] += hessian[noise + 1][k];
        }
      }
      double[][] free = new double[hessian.length - 1][];
      for (int k = 0; k < free.length; k++) {
        free[k] = free(hessian[k <= noise ? k : k + 1]);
      }
      return free;
    }
  }
}

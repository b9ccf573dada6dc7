package isowright.inference;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * First-order propagation of the covariance V of parameters θ̂ to functions of whatever they
 * describe: se² = ∇g′ V ∇g; the interval is g ± t se, or g exp(± t se/g) for a positive quantity, t
 * the quantile of Student's law.
 *
 * <p>The gradient is a fourth-order central difference in each parameter, with a step of a
 * hundredth of its standard error: small against the spread that matters, large against rounding. A
 * parameter without a standard error is taken as known.
 *
 * <p>Assumption: g is nearly linear over a few standard errors. Where the function cannot be
 * evaluated beside the estimate, the standard error is NaN and the interval with it.
 *
 * <p>Source: Oehlert, G. W. (1992), A note on the delta method, <i>American Statistician</i> 46,
 * 27–29; intervals on the log scale: common practice for positive quantities. Tested in {@code
 * DeltaMethodTest} and, for coverage, in {@code CoverageTest}.
 *
 * @param <T> what the parameters describe
 */
public final class Propagation<T> {

  /** The step in units of a parameter's standard error. */
  private static final double STEP = 0.01;

  private final double[] centre;
  private final double[][] covariance;
  private final Function<double[], T> build;
  private final double[] steps;
  private final double degreesOfFreedom;
  private final double quantile;
  private final double level;

  /**
   * Parameters with their covariance.
   *
   * @param centre θ̂, shape p
   * @param covariance p × p
   * @param degreesOfFreedom of Student's law; infinite for the normal law
   * @param level the confidence level
   * @param build what the parameters describe
   */
  public Propagation(
      double[] centre,
      double[][] covariance,
      double degreesOfFreedom,
      double level,
      Function<double[], T> build) {
    this.centre = centre.clone();
    this.covariance = covariance;
    this.build = build;
    this.level = level;
    this.degreesOfFreedom = degreesOfFreedom;
    this.quantile = student(1 - (1 - level) / 2);
    this.steps = new double[covariance.length];
    for (int k = 0; k < steps.length; k++) {
      steps[k] = STEP * Math.sqrt(Math.max(covariance[k][k], 0));
    }
  }

  /** Several functions at once, which share the work of evaluating them. */
  public List<Estimate> estimates(Function<T, double[]> functions, DeltaMethod.Scale scale) {
    double[] values = functions.apply(build.apply(centre.clone()));
    double[][] gradients = gradients(functions, values.length);
    List<Estimate> estimates = new ArrayList<>();
    for (int f = 0; f < values.length; f++) {
      estimates.add(estimate(values[f], Math.sqrt(variance(gradients[f])), scale));
    }
    return estimates;
  }

  /** An estimate from a value and its standard error. */
  public Estimate estimate(double value, double standardError, DeltaMethod.Scale scale) {
    double low;
    double high;
    if (scale == DeltaMethod.Scale.LOG && value > 0) {
      double factor = Math.exp(quantile * standardError / value);
      low = value / factor;
      high = value * factor;
    } else {
      low = value - quantile * standardError;
      high = value + quantile * standardError;
    }
    return new Estimate(value, standardError, low, high, level, Estimate.Method.DELTA);
  }

  /** √(∇g′ V ∇g) for a gradient known in closed form, shape p. */
  public double standardError(double[] gradient) {
    return Math.sqrt(variance(gradient));
  }

  /** The quantile of the sampling distribution on which the intervals rest. */
  public double quantile(
      double value, double standardError, DeltaMethod.Scale scale, double probability) {
    double t = standardError == 0 ? 0 : student(probability);
    return scale == DeltaMethod.Scale.LOG && value > 0
        ? value * Math.exp(t * standardError / value)
        : value + t * standardError;
  }

  private double student(double probability) {
    ContinuousDistribution law =
        Double.isInfinite(degreesOfFreedom)
            ? NormalDistribution.of(0, 1)
            : TDistribution.of(degreesOfFreedom);
    return probability > 0.5
        ? law.inverseSurvivalProbability(1 - probability)
        : law.inverseCumulativeProbability(probability);
  }

  /** ∇g′ V ∇g; NaN where the covariance holds one, whatever the gradient. */
  private double variance(double[] gradient) {
    double variance = 0;
    for (int k = 0; k < gradient.length; k++) {
      for (int l = 0; l < gradient.length; l++) {
        if (gradient[k] != 0 && gradient[l] != 0) {
          variance += gradient[k] * covariance[k][l] * gradient[l];
        }
      }
    }
    return Math.max(variance, 0) + 0 * variance;
  }

  /** The gradients of functions in the parameters; [function][parameter]. */
  public double[][] gradients(Function<T, double[]> functions) {
    return gradients(functions, functions.apply(build.apply(centre.clone())).length);
  }

  private double[][] gradients(Function<T, double[]> functions, int count) {
    double[][] gradients = new double[count][steps.length];
    for (int k = 0; k < steps.length; k++) {
      if (steps[k] == 0) {
        continue;
      }
      double[] far = functions.apply(moved(k, 2));
      double[] near = functions.apply(moved(k, 1));
      double[] back = functions.apply(moved(k, -1));
      double[] farBack = functions.apply(moved(k, -2));
      for (int f = 0; f < count; f++) {
        gradients[f][k] = (8 * (near[f] - back[f]) - (far[f] - farBack[f])) / (12 * steps[k]);
      }
    }
    return gradients;
  }

  private T moved(int k, int times) {
    double[] moved = centre.clone();
    moved[k] += times * steps[k];
    return build.apply(moved);
  }
}

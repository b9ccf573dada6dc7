package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * How sure is a number computed from an estimated technology? For g(θ̂) with covariance V of θ̂:
 * se² = ∇g′ V ∇g; the interval is g ± t se, or g exp(± t se/g) for a positive quantity, t the
 * quantile of Student's law at the fit's degrees of freedom.
 *
 * <p>The gradient is a fourth-order central difference in each parameter, with a step of a
 * hundredth of its standard error: small against the spread that matters, large against rounding.
 *
 * <p>Assumption: g is nearly linear over a few standard errors. Where the function cannot be
 * evaluated beside the estimate (an irregular technology, say), the standard error is NaN and the
 * interval with it.
 *
 * <p>Source: Oehlert, G. W. (1992), A note on the delta method, <i>American Statistician</i> 46,
 * 27–29; intervals on the log scale: common practice for positive quantities. Tested in {@code
 * DeltaMethodTest} and, for coverage, in {@code CoverageTest}.
 */
public final class DeltaMethod {

  /** The step in units of a parameter's standard error. */
  private static final double STEP = 0.01;

  private final EstimatedTechnology estimated;
  private final double[] steps;
  private final double quantile;
  private final double level;

  /** On which scale the interval is symmetric. */
  public enum Scale {
    /** Symmetric about the value. */
    LINEAR,
    /** Symmetric about its log; for positive quantities. */
    LOG
  }

  private DeltaMethod(EstimatedTechnology estimated, double level) {
    this.estimated = estimated;
    this.level = level;
    this.quantile =
        TDistribution.of(estimated.degreesOfFreedom()).inverseSurvivalProbability((1 - level) / 2);
    double[][] v = estimated.covariance();
    this.steps = new double[v.length];
    for (int k = 0; k < steps.length; k++) {
      steps[k] = STEP * Math.sqrt(Math.max(v[k][k], 0));
    }
  }

  /** For an estimated technology and a confidence level. */
  public static DeltaMethod of(EstimatedTechnology estimated, double level) {
    return new DeltaMethod(estimated, level);
  }

  /** A function of the technology with its uncertainty. */
  public Estimate estimate(ToDoubleFunction<Technology> function, Scale scale) {
    return estimates(t -> new double[] {function.applyAsDouble(t)}, scale).get(0);
  }

  /** Several functions at once, which share the work of evaluating them. */
  public List<Estimate> estimates(Function<Technology, double[]> functions, Scale scale) {
    double[] values = functions.apply(estimated.technology());
    double[][] gradients = gradients(functions, values.length);
    List<Estimate> estimates = new ArrayList<>();
    for (int f = 0; f < values.length; f++) {
      estimates.add(estimate(values[f], Math.sqrt(variance(gradients[f])), scale));
    }
    return estimates;
  }

  /** An estimate from a value and its standard error. */
  public Estimate estimate(double value, double standardError, Scale scale) {
    double low;
    double high;
    if (scale == Scale.LOG && value > 0) {
      double factor = Math.exp(quantile * standardError / value);
      low = value / factor;
      high = value * factor;
    } else {
      low = value - quantile * standardError;
      high = value + quantile * standardError;
    }
    return new Estimate(value, standardError, low, high, level, Estimate.Method.DELTA);
  }

  /** ∇g′ V ∇g. */
  private double variance(double[] gradient) {
    double[][] v = estimated.covariance();
    double variance = 0;
    for (int k = 0; k < gradient.length; k++) {
      for (int l = 0; l < gradient.length; l++) {
        if (gradient[k] != 0 && gradient[l] != 0) {
          variance += gradient[k] * v[k][l] * gradient[l];
        }
      }
    }
    return Math.max(variance, 0) + 0 * variance;
  }

  private double[][] gradients(Function<Technology, double[]> functions, int count) {
    double[] centre = estimated.technology().parameters();
    double[][] gradients = new double[count][centre.length];
    for (int k = 0; k < centre.length; k++) {
      if (steps[k] == 0) {
        continue;
      }
      double[] far = functions.apply(moved(centre, k, 2));
      double[] near = functions.apply(moved(centre, k, 1));
      double[] back = functions.apply(moved(centre, k, -1));
      double[] farBack = functions.apply(moved(centre, k, -2));
      for (int f = 0; f < count; f++) {
        gradients[f][k] = (8 * (near[f] - back[f]) - (far[f] - farBack[f])) / (12 * steps[k]);
      }
    }
    return gradients;
  }

  private Technology moved(double[] centre, int k, int times) {
    double[] moved = centre.clone();
    moved[k] += times * steps[k];
    return estimated.technology().withParameters(moved);
  }
}

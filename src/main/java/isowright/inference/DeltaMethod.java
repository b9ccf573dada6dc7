package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Technology;
import java.util.List;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;

/**
 * How sure is a number computed from an estimated technology? {@link Propagation} of the covariance
 * of its parameters, at the fit's degrees of freedom.
 *
 * <p>Where the function cannot be evaluated beside the estimate (an irregular technology, say), the
 * standard error is NaN and the interval with it. Tested in {@code DeltaMethodTest} and, for
 * coverage, in {@code CoverageTest}.
 */
public final class DeltaMethod implements Intervals {

  private final Propagation<Technology> propagation;

  /** On which scale the interval is symmetric. */
  public enum Scale {
    /** Symmetric about the value. */
    LINEAR,
    /** Symmetric about its log; for positive quantities. */
    LOG
  }

  private DeltaMethod(EstimatedTechnology estimated, double level) {
    this.propagation =
        new Propagation<>(
            estimated.technology().parameters(),
            estimated.covariance(),
            estimated.degreesOfFreedom(),
            level,
            estimated.technology()::withParameters);
  }

  /** For an estimated technology and a confidence level. */
  public static DeltaMethod of(EstimatedTechnology estimated, double level) {
    return new DeltaMethod(estimated, level);
  }

  /** A function of the technology with its uncertainty. */
  public Estimate estimate(ToDoubleFunction<Technology> function, Scale scale) {
    return estimates(t -> new double[] {function.applyAsDouble(t)}, scale).get(0);
  }

  @Override
  public List<Estimate> estimates(Function<Technology, double[]> functions, Scale scale) {
    return propagation.estimates(functions, scale);
  }

  /** The gradients of functions in the parameters of the technology; [function][parameter]. */
  double[][] gradients(Function<Technology, double[]> functions) {
    return propagation.gradients(functions);
  }

  @Override
  public Estimate estimate(double value, double standardError, Scale scale) {
    return propagation.estimate(value, standardError, scale);
  }

  /**
   * √(∇g′ V ∇g) where the gradient is known in closed form.
   *
   * @param gradient ∇g in the technology's parameters, shape p
   */
  public double standardError(double[] gradient) {
    return propagation.standardError(gradient);
  }

  /**
   * The quantile of the sampling distribution on which the intervals rest: value + t se, or value ·
   * exp(t se / value) for a positive quantity, t the quantile of Student's law.
   *
   * @param probability between 0 and 1
   */
  public double quantile(double value, double standardError, Scale scale, double probability) {
    return propagation.quantile(value, standardError, scale, probability);
  }
}

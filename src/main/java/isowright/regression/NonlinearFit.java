package isowright.regression;

import java.util.List;

/**
 * A nonlinear least-squares fit: where the search ended, why, and the linearisation there.
 *
 * @param parameters θ at the end, the best point met, held parameters included; copied in and out
 * @param ssr the sum of squared residuals there; NaN where the start itself was not finite
 * @param linearisation the linear fit of the linearisation at θ with its step left out: its
 *     residuals are those of the nonlinear fit, its columns all parameters, its matrices zero where
 *     a parameter was held. Give it to {@link Covariance#estimate} together with {@link
 *     NonlinearModel#linearisedAt} at θ. Rank loss shows here.
 * @param stop why the search ended
 * @param evaluations how often the rows were read during the search
 * @param orthogonality the cosine of the angle between the residual and the space of the Jacobian
 *     columns, the largest that any combination of columns has; zero at a least-squares solution
 * @param gaussNewtonStep the step the linearisation would still take, shape of θ: an estimate of
 *     the remaining error of each parameter; copied in and out
 */
public record NonlinearFit(
    double[] parameters,
    double ssr,
    LinearFit linearisation,
    Stop stop,
    int evaluations,
    double orthogonality,
    double[] gaussNewtonStep) {

  /** Why the search ended. */
  public enum Stop {
    /** The residual is orthogonal to the Jacobian: a stationary point. */
    CONVERGED,
    /** No step lowers the sum of squares any more, yet the residual is not orthogonal. */
    STALLED,
    /** The evaluations allowed were used up. */
    LIMIT,
    /** The model has no finite value at the start, or where the search had to go. */
    NOT_FINITE
  }

  /** Copies the arrays. */
  public NonlinearFit {
    parameters = parameters.clone();
    gaussNewtonStep = gaussNewtonStep.clone();
  }

  @Override
  public double[] parameters() {
    return parameters.clone();
  }

  @Override
  public double[] gaussNewtonStep() {
    return gaussNewtonStep.clone();
  }

  /** True only where the fit is a stationary point of the sum of squares. */
  public boolean converged() {
    return stop == Stop.CONVERGED;
  }

  /** The names of the parameters. */
  public List<String> names() {
    return linearisation.columns();
  }
}

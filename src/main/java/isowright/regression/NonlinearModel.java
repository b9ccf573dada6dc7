package isowright.regression;

import java.util.List;

/**
 * A regression nonlinear in its parameters, seen through its linearisation: at parameters θ, the
 * design whose regressors are ∂prediction/∂θ_k and whose response is the residual.
 *
 * <p>Whatever works on a design (decomposition, removal of group means, covariance estimators) so
 * works on a nonlinear model at its optimum.
 */
public interface NonlinearModel {

  /** The names of the parameters θ. */
  List<String> parameters();

  /** The linearisation at θ. */
  Design linearisedAt(double[] parameters);
}

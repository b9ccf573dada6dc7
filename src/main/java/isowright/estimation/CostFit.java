package isowright.estimation;

import isowright.cost.CostFunction;
import isowright.regression.Collinearity;
import isowright.regression.SystemFit;
import java.util.List;
import java.util.Optional;

/**
 * A cost function fitted to records of costs.
 *
 * @param specification how it was fitted
 * @param function the cost function at the estimates
 * @param names the names of the function's parameters and of the controls
 * @param values their estimates
 * @param covariance their covariance, singular where restrictions tie them
 * @param covarianceWords one sentence: estimator, factor, degrees of freedom
 * @param degreesOfFreedom of the t distribution for intervals
 * @param free how many parameters were free
 * @param system the fit of the equations, over the free parameters
 * @param imposed what it took to make cost concave, where that was asked for
 */
public record CostFit(
    CostSpecification specification,
    CostFunction function,
    List<String> names,
    double[] values,
    double[][] covariance,
    String covarianceWords,
    double degreesOfFreedom,
    int free,
    SystemFit system,
    Optional<Imposed> imposed) {

  /**
   * What it took to make cost concave.
   *
   * @param logLikelihood of the same equations fitted freely
   * @param bound how many entries of the factor are zero because the records would have the matrix
   *     indefinite; above zero, the fit is at the edge of what is concave
   */
  public record Imposed(double logLikelihood, int bound) {}

  /** Copies the list. */
  public CostFit {
    names = List.copyOf(names);
  }

  /** The parameters that the rows cannot tell from others. */
  public List<Collinearity> collinearities() {
    return system.collinearities();
  }

  /** The estimate of a parameter or control. */
  public double value(String name) {
    return values[names.indexOf(name)];
  }

  /** Its standard error. */
  public double standardError(String name) {
    int k = names.indexOf(name);
    return Math.sqrt(Math.max(0, covariance[k][k]));
  }
}

package isowright.estimation;

import isowright.cost.TranslogCost;
import isowright.regression.Collinearity;
import isowright.regression.SystemFit;
import java.util.List;

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
 */
public record CostFit(
    CostSpecification specification,
    TranslogCost function,
    List<String> names,
    double[] values,
    double[][] covariance,
    String covarianceWords,
    double degreesOfFreedom,
    int free,
    SystemFit system) {

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

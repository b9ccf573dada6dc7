package isowright.estimation;

import isowright.regression.Covariance;
import isowright.regression.GroupProducts;
import isowright.regression.LeaveOut;
import isowright.regression.Refits;
import isowright.technology.LinearForm;
import java.util.Optional;

/**
 * How do the reported parameters vary over plants, judged by leaving each plant out?
 *
 * <pre>  V = (G − 1)/G Σ_g (θ_(g) − θ)(θ_(g) − θ)′ </pre>
 *
 * θ_(g) the estimate without plant g. Where plants are few, the clustered covariance is too small
 * because residuals of plants that pull the fit are; this one errs on the other side. It is used
 * for tests of several restrictions at once, where the error of the first multiplies. The variances
 * of random effects stay those of all plants.
 *
 * <p>Sources: Bell, R. M. and McCaffrey, D. F. (2002), Bias Reduction in Standard Errors for Linear
 * Regression with Multi-Stage Samples, <i>Survey Methodology</i> 28, 169–181; MacKinnon, J. G.,
 * Nielsen, M. Ø. and Webb, M. D. (2023), Cluster-Robust Inference: A Guide to Empirical Practice,
 * <i>Journal of Econometrics</i> 232, 272–299, section on CV3 (both from memory). Sizes of tests
 * with it: {@code FewPlantsSizeTest}; its digits against refits of panels: {@code
 * PlantJackknifeTest}.
 *
 * @param covariance V, P × P; of a constant that is a mean of levels nothing is said (zero)
 * @param plants G
 */
public record PlantJackknife(double[][] covariance, int plants) {

  /** With more plants than this the clustered covariance is as good, and is used. */
  public static final int MOST_PLANTS = 500;

  /**
   * Of a fit with clustered standard errors and not too many plants; empty for others, and where a
   * refit lost rank.
   */
  public static Optional<PlantJackknife> of(Fit fit) {
    Solution numbers = fit.numbers();
    boolean fits =
        numbers.covarianceSource().kind() == Covariance.Kind.CLUSTERED
            && fit.specification().estimator() instanceof Estimator.LeastSquares
            && numbers.particulars() instanceof Particulars.None;
    int plants = numbers.design().groups().count();
    if (!fits
        || !(fit.specification().form() instanceof LinearForm form)
        || plants < 3
        || plants > MOST_PLANTS) {
      return Optional.empty();
    }
    Refits refits = LeaveOut.eachGroup(GroupProducts.of(numbers.design(), numbers.linear()));
    if (refits.failures() > 0) {
      return Optional.empty();
    }
    int size = numbers.parameters().length;
    double[] centre = LinearParameters.reported(fit, form, numbers.linear().coefficients());
    double[][] sum = new double[size][size];
    double factor = (plants - 1.0) / plants;
    for (int g = 0; g < plants; g++) {
      double[] without = LinearParameters.reported(fit, form, refits.coefficients(g));
      for (int i = 0; i < size; i++) {
        for (int j = 0; j < size; j++) {
          sum[i][j] += factor * (without[i] - centre[i]) * (without[j] - centre[j]);
        }
      }
    }
    return Optional.of(new PlantJackknife(sum, plants));
  }
}

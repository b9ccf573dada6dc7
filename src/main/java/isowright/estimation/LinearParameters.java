package isowright.estimation;

import isowright.technology.LinearForm;
import java.util.Arrays;

/** From the coefficients of a regression to the parameters that a fit reports. */
final class LinearParameters {

  private LinearParameters() {}

  /**
   * Reported parameters, in the order of {@link Solution#parameters()}; the constant is that of the
   * fit where the regression has none.
   *
   * @param fit a fit of the form
   * @param columns the coefficients of another regression with the columns of the fit's
   */
  static double[] reported(Fit fit, LinearForm form, double[] columns) {
    Solution numbers = fit.numbers();
    int own = numbers.technology().parameters().length;
    int beside = numbers.parameters().length - own;
    boolean constant = fit.specification().plantEffects().constant();
    double[] technology =
        form.technology(
                fit.panel().inputs(),
                fit.base(),
                constant ? columns[0] : numbers.parameters()[0],
                Arrays.copyOfRange(columns, constant ? 1 : 0, columns.length - beside))
            .parameters();
    double[] reported = Arrays.copyOf(technology, own + beside);
    System.arraycopy(columns, columns.length - beside, reported, own, beside);
    return reported;
  }
}

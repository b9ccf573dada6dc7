package isowright.estimation;

import isowright.regression.HuberRegression;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.Optional;

/**
 * A fit made again so that rows with large residuals count for less: a cross-check of least squares
 * for forms linear in their parameters.
 *
 * @param technology in the last period, its constant that of the fit by least squares
 * @param regression coefficients, scale, and how many rows count for less
 */
public record HuberFit(Technology technology, HuberRegression regression) {

  /** Above so many rows no few of them can turn the fit, and time is saved. */
  private static final int MOST_ROWS = 200_000;

  /**
   * The cross-check of a usable fit; absent where the form is not linear, plants do not stand for
   * themselves, there are too many rows, or no estimate was found.
   */
  public static Optional<HuberFit> of(Fit fit) {
    if (!fit.plantsStandAlone()
        || !(fit.specification().form() instanceof LinearForm form)
        || fit.panel().rows() > MOST_ROWS) {
      return Optional.empty();
    }
    Solution numbers = fit.numbers();
    HuberRegression huber = HuberRegression.fit(numbers.design(), numbers.linear());
    if (!huber.converged()) {
      return Optional.empty();
    }
    double[] reported = LinearParameters.reported(fit, form, huber.coefficients());
    int last = fit.panel().periods().size() - 1;
    return Optional.of(
        new HuberFit(fit.technologies(last, new Productivity.Typical()).apply(reported), huber));
  }
}

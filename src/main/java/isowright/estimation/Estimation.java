package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a technology form to a panel by ordinary or generalised least squares in logs.
 *
 * <p>The estimator knows the two kinds of {@link Form} and never a concrete form. What the records
 * cannot carry is a state of the {@link Fit}, with reasons in words, and not an exception.
 *
 * <p>Tested against published tables in {@code PublishedFitsTest} and by simulation in {@code
 * CoverageTest}.
 */
public final class Estimation {

  private Estimation() {}

  /** Fits the specification's form to the panel. */
  public static Fit fit(Panel panel, Specification specification) {
    return fit(panel, specification, base(panel, specification));
  }

  /** The same with inputs divided by a base of one's own, shape n. */
  static Fit fit(Panel panel, Specification specification, double[] base) {
    List<String> obstacles = Obstacles.of(panel, specification);
    if (!obstacles.isEmpty()) {
      return without(panel, specification, base, Fit.State.REFUSED, obstacles);
    }
    Form form = specification.form();
    if (form instanceof LinearForm linear) {
      return linear(panel, specification, base, linear);
    }
    return new ProfiledEstimation(panel, specification, base, (NonlinearForm) form).fit();
  }

  private static Fit linear(
      Panel panel, Specification specification, double[] base, LinearForm form) {
    if (specification.estimator() instanceof Estimator.Instruments instruments) {
      return new InstrumentedEstimation(panel, specification, base, form, instruments).fit();
    }
    if (specification.estimator() instanceof Estimator.Frontier frontier) {
      return new FrontierEstimation(panel, specification, base, form, frontier).fit();
    }
    if (specification.estimator() instanceof Estimator.Proxy proxy) {
      return new ControlFunctionEstimation(panel, specification, base, form, proxy).fit();
    }
    return new LinearEstimation(panel, specification, base, form).fit();
  }

  /**
   * Least squares on the very rows that a fit by instruments uses, so that the two differ in
   * nothing but the estimator.
   */
  public static Fit leastSquaresBeside(Fit fit) {
    Specification how = fit.specification();
    return new InstrumentedEstimation(
            fit.panel(),
            how.by(new Estimator.LeastSquares()),
            fit.base(),
            (LinearForm) how.form(),
            (Estimator.Instruments) how.estimator())
        .leastSquares();
  }

  /**
   * The least sum of squares of a nonlinear form with every curvature held at the same value, all
   * else as in the fit.
   */
  public static double ssrAt(Fit fit, double curvature) {
    NonlinearForm form = (NonlinearForm) fit.specification().form();
    return new ProfiledEstimation(fit.panel(), fit.specification(), fit.base(), form)
        .ssrAt(curvature);
  }

  /**
   * The least sum of squares of a specification on a panel, with nothing else worked out; NaN where
   * the records cannot carry it.
   */
  public static double leastSsr(Panel panel, Specification specification) {
    if (specification.form() instanceof NonlinearForm form) {
      return Obstacles.of(panel, specification).isEmpty()
          ? new ProfiledEstimation(panel, specification, base(panel, specification), form)
              .leastSsr()
          : Double.NaN;
    }
    Fit fit = fit(panel, specification);
    return fit.state().usable() ? fit.numbers().linear().ssr() : Double.NaN;
  }

  static double[] base(Panel panel, Specification specification) {
    if (specification.scaled()) {
      return panel.geometricMeans();
    }
    double[] ones = new double[panel.quantities().size()];
    Arrays.fill(ones, 1);
    return ones;
  }

  static Fit without(
      Panel panel,
      Specification specification,
      double[] base,
      Fit.State state,
      List<String> reasons) {
    return new Fit(specification, panel, base, state, reasons, Optional.empty(), List.of());
  }
}

package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a technology form to a panel by least squares in logs.
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
    double[] base = base(panel, specification);
    List<String> obstacles = obstacles(panel, specification);
    if (!obstacles.isEmpty()) {
      return without(panel, specification, base, Fit.State.REFUSED, obstacles);
    }
    Form form = specification.form();
    if (form instanceof LinearForm linear) {
      return new LinearEstimation(panel, specification, base, linear).fit();
    }
    return new ProfiledEstimation(panel, specification, base, (NonlinearForm) form).fit();
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
      return obstacles(panel, specification).isEmpty()
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

  /** What stands in the way of a specification whatever the form. */
  private static List<String> obstacles(Panel panel, Specification specification) {
    List<String> obstacles = new ArrayList<>();
    boolean within = specification.plantEffects() == Specification.PlantEffects.WITHIN;
    int plants = panel.plants().size();
    if (within && plants < 2) {
      obstacles.add(
          "Plant effects need at least two plants; the records have "
              + plants
              + ". Set plant-effects to none, or add records of other plants.");
    } else if (within && !panel.repeats()) {
      obstacles.add(
          "Plant effects need plants seen in more than one period; each of the "
              + plants
              + " plants has a single row. Set plant-effects to none, or add periods.");
    }
    Specification.StandardErrors errors = specification.standardErrors();
    if (errors.needsPlants() && plants < 2) {
      obstacles.add(
          "Standard errors clustered by plant need at least two plants; the records have "
              + plants
              + ". Set standard-errors to robust, or add records of other plants.");
    }
    if (errors.needsPeriods() && panel.periods().size() < 2) {
      obstacles.add(
          "Standard errors of the kind "
              + errors.word()
              + " need at least two periods; the records have one ("
              + panel.periods().get(0)
              + "). Set standard-errors to robust, or add periods.");
    } else if (errors == Specification.StandardErrors.NEWEY_WEST
        && !panel.repeats()
        && panel.periods().size() < panel.rows()) {
      obstacles.add(
          "Newey-West standard errors need plants seen in more than one period, or a single series"
              + " of one row a period; here every plant has one row and some share a period. Set"
              + " standard-errors to robust, or name the plant column.");
    }
    if (specification.time() != Specification.Time.NONE && panel.periods().size() < 2) {
      obstacles.add(
          (specification.time() == Specification.Time.TREND ? "A trend" : "Period effects")
              + " cannot be told from the constant in a single period ("
              + panel.periods().get(0)
              + "). Set time to none, or add periods.");
    }
    return obstacles;
  }
}

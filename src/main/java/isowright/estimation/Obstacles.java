package isowright.estimation;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.records.PeriodSteps;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/**
 * What stands in the way of a specification before anything is fitted: plants or periods that the
 * records do not have, and treatments that the form does not take. Each says what is lacking and
 * what to do.
 */
final class Obstacles {

  private final Panel panel;
  private final Specification specification;
  private final List<String> found = new ArrayList<>();

  /** The covariances that the likelihood of a frontier has here. */
  private static final Set<Specification.StandardErrors> FRONTIER_ERRORS =
      Set.of(
          Specification.StandardErrors.CLASSICAL,
          Specification.StandardErrors.ROBUST,
          Specification.StandardErrors.CLUSTERED);

  private Obstacles(Panel panel, Specification specification) {
    this.panel = panel;
    this.specification = specification;
  }

  static List<String> of(Panel panel, Specification specification) {
    Obstacles obstacles = new Obstacles(panel, specification);
    obstacles.form();
    obstacles.zeros();
    obstacles.estimator();
    obstacles.regularity();
    obstacles.plants();
    obstacles.time();
    obstacles.standardErrors();
    return List.copyOf(obstacles.found);
  }

  private void form() {
    Form form = specification.form();
    PlantEffects effects = specification.plantEffects();
    if (form instanceof LinearForm linear) {
      if (specification.time() == Time.BIASED_TREND
          && linear.firstOrder(panel.inputs().size()).length == 0) {
        found.add(
            "A biased trend works through the logs of inputs, which the form "
                + form.name()
                + " does not have as terms. Set time to trend or quadratic-trend.");
      }
      return;
    }
    if (!effects.anyForm()) {
      found.add(
          "The form "
              + form.name()
              + " is not linear in its parameters, and plant-effects: "
              + effects.word()
              + " is defined here for forms that are. Set plant-effects to within or none, or ask"
              + " for cobb-douglas or translog.");
    }
    if (specification.time() == Time.BIASED_TREND) {
      found.add(
          "The form "
              + form.name()
              + " is not linear in its parameters, and a biased trend is defined here for forms"
              + " that are. Set time to trend or quadratic-trend, or ask for cobb-douglas or"
              + " translog.");
    }
  }

  private void zeros() {
    List<String> unused = new ArrayList<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      if (panel.zeros(i) > 0) {
        unused.add(panel.inputs().get(i));
      }
    }
    if (unused.isEmpty()) {
      return;
    }
    Form form = specification.form();
    boolean logs =
        form instanceof LinearForm linear && linear.firstOrder(panel.inputs().size()).length > 0;
    if (!logs) {
      found.add(
          "The form "
              + form.name()
              + " says itself what is made without "
              + String.join(" or ", unused)
              + ", and a dummy in its place, which takes the part of a log, would contradict it."
              + " Set zeros to drop, or ask for cobb-douglas or translog.");
    }
    if (!(specification.estimator() instanceof Estimator.LeastSquares)) {
      found.add(
          "Rows without "
              + String.join(" or ", unused)
              + " are kept by a dummy, which is carried out for least squares and not for "
              + specification.estimator().word()
              + ". Set zeros to drop.");
    }
  }

  private void regularity() {
    if (specification.regularity() == Specification.RegularityImposed.FREE
        || specification.form().regularByForm()) {
      return;
    }
    String asked = "regularity: " + specification.regularity().word();
    if (!(specification.form() instanceof LinearForm)) {
      found.add(
          "The form "
              + specification.form().name()
              + " is not linear in its parameters, and "
              + asked
              + " is imposed on forms that are. Set regularity to free, or ask for translog.");
    }
    if (specification.time() == Time.BIASED_TREND) {
      found.add(
          "A biased trend moves the elasticities with time, and "
              + asked
              + " holds the same ones at every period. Set time to quadratic-trend.");
    }
    if (!(specification.estimator() instanceof Estimator.LeastSquares)) {
      found.add(
          "With "
              + specification.estimator().word()
              + ", "
              + asked
              + " is not carried out: it is imposed on least squares. Set regularity to free, or"
              + " take `"
              + specification.estimator().word()
              + "` out.");
    }
  }

  private void estimator() {
    Estimator estimator = specification.estimator();
    if (estimator instanceof Estimator.LeastSquares) {
      return;
    }
    if (!(specification.form() instanceof LinearForm)) {
      found.add(
          "The form "
              + specification.form().name()
              + " is not linear in its parameters, and "
              + estimator.word()
              + " is carried out for forms that are. Take `"
              + estimator.word()
              + "` out, or ask for cobb-douglas or translog.");
    }
    if (estimator instanceof Estimator.Frontier frontier) {
      frontier(frontier);
      return;
    }
    if (specification.time() == Time.BIASED_TREND) {
      found.add(
          "A biased trend makes products of inputs and time, which "
              + estimator.word()
              + " does not treat. Set time to quadratic-trend.");
    }
    if (estimator instanceof Estimator.Proxy proxy) {
      proxy(proxy);
    }
    PlantEffects effects = specification.plantEffects();
    if (estimator instanceof Estimator.Instruments
        && effects != PlantEffects.NONE
        && effects != PlantEffects.WITHIN
        && effects != PlantEffects.DIFFERENCES) {
      found.add(
          "Instruments are not carried out with plant-effects: "
              + effects.word()
              + ". Set plant-effects to none, within or differences.");
    }
  }

  private void frontier(Estimator.Frontier frontier) {
    PlantEffects effects = specification.plantEffects();
    if (effects != PlantEffects.NONE) {
      found.add(
          "A frontier draws inefficiency from a law, and plant-effects: "
              + effects.word()
              + " would take what lasts in a plant for its level. Set plant-effects to none; with"
              + " over-time: constant a frontier has one inefficiency a plant.");
    }
    boolean shared = frontier.overTime() != Estimator.OverTime.EACH_ROW;
    if (shared && !panel.repeats()) {
      found.add(
          "over-time: "
              + frontier.overTime().word()
              + " needs plants seen in more than one period; each of the "
              + panel.plants().size()
              + " plants has a single row. Take over-time out: every row then has its own"
              + " inefficiency.");
    }
    if (!FRONTIER_ERRORS.contains(specification.standardErrors())) {
      found.add(
          "Standard errors of the kind "
              + specification.standardErrors().word()
              + " are not carried out for the likelihood of a frontier. Set standard-errors to"
              + " classical, robust or clustered.");
    }
  }

  private void proxy(Estimator.Proxy proxy) {
    PlantEffects effects = specification.plantEffects();
    if (effects != PlantEffects.NONE) {
      found.add(
          "A control function lets productivity move from period to period, and is not carried out"
              + " with plant-effects: "
              + effects.word()
              + ". Set plant-effects to none.");
    }
    if (proxy.states().containsAll(panel.inputs())) {
      found.add(
          "Every input is named as a state, so none is chosen knowing productivity and least"
              + " squares does. Leave the free inputs out of `state`.");
    }
    if (panel.plants().size() < 2) {
      found.add(
          "A control function draws plants for its standard errors and needs at least two; the"
              + " records have "
              + panel.plants().size()
              + ". Add records of other plants, or take `proxy` out.");
    }
  }

  private void plants() {
    PlantEffects effects = specification.plantEffects();
    int plants = panel.plants().size();
    if (effects != PlantEffects.NONE) {
      if (plants < 2) {
        found.add(
            needs(effects)
                + " at least two plants; the records have "
                + plants
                + ". Set plant-effects to none, or add records of other plants.");
      } else if (!panel.repeats()) {
        found.add(
            needs(effects)
                + " plants seen in more than one period; each of the "
                + plants
                + " plants has a single row. Set plant-effects to none, or add periods.");
      } else if (effects == PlantEffects.DIFFERENCES) {
        successive();
      }
    }
  }

  private void standardErrors() {
    Specification.StandardErrors errors = specification.standardErrors();
    int plants = panel.plants().size();
    if (errors.needsPlants() && plants < 2) {
      found.add(
          "Standard errors clustered by plant need at least two plants; the records have "
              + plants
              + ". Set standard-errors to robust, or add records of other plants.");
    }
    if (errors.needsPeriods() && specification.plantEffects() == PlantEffects.BETWEEN) {
      found.add(
          "Standard errors of the kind "
              + errors.word()
              + " need rows of several periods, and the regression between plants has one row a"
              + " plant. Set standard-errors to robust.");
    } else if (errors.needsPeriods() && panel.periods().size() < 2) {
      found.add(
          "Standard errors of the kind "
              + errors.word()
              + " need at least two periods; the records have one ("
              + panel.periods().get(0)
              + "). Set standard-errors to robust, or add periods.");
    } else if (errors == Specification.StandardErrors.NEWEY_WEST
        && !panel.repeats()
        && panel.periods().size() < panel.rows()) {
      found.add(
          "Newey-West standard errors need plants seen in more than one period, or a single series"
              + " of one row a period; here every plant has one row and some share a period. Set"
              + " standard-errors to robust, or name the plant column.");
    }
  }

  private void successive() {
    PeriodSteps steps = PeriodSteps.of(panel);
    for (int p = 0; p < panel.plants().size(); p++) {
      for (int row = panel.plantStart(p) + 1; row < panel.plantEnd(p); row++) {
        if (steps.before(row, 1) == row - 1) {
          return;
        }
      }
    }
    found.add(
        "Differences need a plant with rows in two successive periods; no row comes one step (the"
            + " least distance between periods of the records) after another row of its plant, and"
            + " no difference is taken across a gap. Set plant-effects to within, or add the"
            + " missing periods.");
  }

  private static String needs(PlantEffects effects) {
    return switch (effects) {
      case NONE, WITHIN -> "Plant effects need";
      case BETWEEN -> "The regression between plants needs";
      case RANDOM -> "Random effects need";
      case DIFFERENCES -> "Differences need";
      case MUNDLAK -> "Random effects with plant means need";
    };
  }

  private void time() {
    Time time = specification.time();
    PlantEffects effects = specification.plantEffects();
    if (time == Time.NONE) {
      return;
    }
    int periods = panel.periods().size();
    if (time == Time.TWO_WAY && effects != PlantEffects.WITHIN) {
      found.add(
          "time: two-way means plant and period effects, so plant-effects must be within, not "
              + effects.word()
              + ". For period effects alone set time to period-effects.");
    }
    if (effects == PlantEffects.BETWEEN) {
      found.add(
          "The regression between plants uses the mean of each plant over its periods, in which no"
              + " change over time is left. Set time to none, or plant-effects to random or"
              + " within.");
    }
    if (periods < 2) {
      found.add(
          (time.byPeriod() ? "Period effects" : "A trend")
              + " cannot be told from the constant in a single period ("
              + panel.periods().get(0)
              + "). Set time to none, or add periods.");
    } else if (time.quadratic() && periods < 3) {
      found.add(
          "A trend with its square needs three periods; the records have "
              + periods
              + ". Set time to trend, or add periods.");
    }
  }
}

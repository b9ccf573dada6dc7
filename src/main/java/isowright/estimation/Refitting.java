package isowright.estimation;

import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import java.util.Optional;

/** How a fit is estimated again on other rows of its panel. */
interface Refitting {

  /** On as many plants as there are, drawn with replacement, whole. */
  RefittedParameters drawn(int draws, long seed);

  /** Without each plant in turn; empty where it would take too long. */
  Optional<RefittedParameters> withoutPlants();

  /**
   * Without each period in turn; empty where there are fewer than three or it would take too long.
   */
  Optional<RefittedParameters> withoutPeriods();

  /** Rows refitted in all, above which leaving out by fitting anew is not done. */
  long MOST_ROWS_REFITTED = 2_000_000;

  /** The way for a fit. */
  static Optional<Refitting> of(Fit fit) {
    Specification specification = fit.specification();
    if (fit.numbers().particulars() instanceof Particulars.OfProxy drawn) {
      return Optional.of(new DrawnAlready(fit, drawn));
    }
    boolean plain = fit.plantsStandAlone();
    if (plain && specification.form() instanceof LinearForm form) {
      return Optional.of(new LinearRefitting(fit, form));
    }
    if (plain
        && specification.form() instanceof NonlinearForm form
        && fit.numbers().searched().length > 0) {
      return Optional.of(new SearchedRefitting(fit, form));
    }
    return Optional.of(new PanelRefitting(fit));
  }
}

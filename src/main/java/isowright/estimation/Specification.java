package isowright.estimation;

import isowright.technology.Form;
import java.util.Locale;

/**
 * How a technology is to be fitted to a panel.
 *
 * @param form the technology form
 * @param plantEffects what is done about lasting differences between plants
 * @param time what is done about change over time
 * @param scaled whether inputs are divided by their geometric means before logs
 * @param standardErrors how the covariance of the parameters is estimated
 * @param confidence the level of all intervals, such as 0.95
 * @param estimator by which principle
 */
public record Specification(
    Form form,
    PlantEffects plantEffects,
    Time time,
    boolean scaled,
    StandardErrors standardErrors,
    double confidence,
    Estimator estimator) {

  /** By least squares. */
  public Specification(
      Form form,
      PlantEffects plantEffects,
      Time time,
      boolean scaled,
      StandardErrors standardErrors,
      double confidence) {
    this(
        form, plantEffects, time, scaled, standardErrors, confidence, new Estimator.LeastSquares());
  }

  /** The same by another principle. */
  public Specification by(Estimator other) {
    return new Specification(form, plantEffects, time, scaled, standardErrors, confidence, other);
  }

  /** What is done about lasting differences between plants. */
  public enum PlantEffects {
    /** One constant for all plants. */
    NONE,
    /** A constant for each plant, removed by taking deviations from plant means. */
    WITHIN;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  /** What is done about change over time. */
  public enum Time {
    /** Nothing. */
    NONE,
    /** A linear trend in the period. */
    TREND,
    /** A constant for each period but the first. */
    PERIOD_EFFECTS;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  /** How the covariance of the parameters is estimated. */
  public enum StandardErrors {
    /** Equal variance, independent rows. */
    CLASSICAL,
    /** Unequal variances (HC1). */
    ROBUST,
    /** Unequal variances, with leverage (HC3). */
    HC3,
    /** Rows of a plant may be dependent (CR1). */
    CLUSTERED,
    /** Rows of a plant, and rows of a period, may be dependent. */
    CLUSTERED_TWO_WAY,
    /** Rows of a plant may be dependent, less so the further apart in time. */
    NEWEY_WEST,
    /** All rows may be dependent, less so the further apart in time. */
    DRISCOLL_KRAAY;

    /** Whether plants have to be told apart. */
    public boolean needsPlants() {
      return this == CLUSTERED || this == CLUSTERED_TWO_WAY;
    }

    /** Whether periods have to be told apart. */
    public boolean needsPeriods() {
      return this == CLUSTERED_TWO_WAY || this == NEWEY_WEST || this == DRISCOLL_KRAAY;
    }

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  private static String words(Enum<?> value) {
    return value.name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}

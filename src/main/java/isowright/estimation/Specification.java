package isowright.estimation;

import isowright.regression.VarianceComponents;
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
 * @param components how the variances of random effects are estimated; of no meaning without them
 * @param estimator by which principle
 * @param regularity where the fit is held to be regular
 */
public record Specification(
    Form form,
    PlantEffects plantEffects,
    Time time,
    boolean scaled,
    StandardErrors standardErrors,
    double confidence,
    VarianceComponents.Method components,
    Estimator estimator,
    RegularityImposed regularity) {

  /** By least squares, variances of random effects (if any) estimated after Swamy and Arora. */
  public Specification(
      Form form,
      PlantEffects plantEffects,
      Time time,
      boolean scaled,
      StandardErrors standardErrors,
      double confidence) {
    this(
        form,
        plantEffects,
        time,
        scaled,
        standardErrors,
        confidence,
        VarianceComponents.Method.SWAMY_ARORA,
        new Estimator.LeastSquares(),
        RegularityImposed.FREE);
  }

  /** The same for another form. */
  public Specification withForm(Form other) {
    return new Specification(
        other,
        plantEffects,
        time,
        scaled,
        standardErrors,
        confidence,
        components,
        estimator,
        regularity);
  }

  /** The same by another principle. */
  public Specification by(Estimator other) {
    return new Specification(
        form,
        plantEffects,
        time,
        scaled,
        standardErrors,
        confidence,
        components,
        other,
        regularity);
  }

  /** The same with the variances of random effects estimated otherwise. */
  public Specification with(VarianceComponents.Method method) {
    return new Specification(
        form,
        plantEffects,
        time,
        scaled,
        standardErrors,
        confidence,
        method,
        estimator,
        regularity);
  }

  /** The same with regularity imposed otherwise. */
  public Specification with(RegularityImposed imposed) {
    return new Specification(
        form,
        plantEffects,
        time,
        scaled,
        standardErrors,
        confidence,
        components,
        estimator,
        imposed);
  }

  /** The same with another treatment of plants, of time, and of the covariance. */
  public Specification with(PlantEffects effects, Time change, StandardErrors errors) {
    return new Specification(
        form, effects, change, scaled, errors, confidence, components, estimator, regularity);
  }

  /** Where the fit is held to be regular: monotone and quasi-concave. */
  public enum RegularityImposed {
    /** Nowhere; it is tested afterwards. */
    FREE,
    /** At the geometric mean of the records. */
    AT_MEAN,
    /** At every row of the records. */
    EVERYWHERE;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  /** What is done about lasting differences between plants. */
  public enum PlantEffects {
    /** One constant for all plants. */
    NONE,
    /** A constant for each plant, removed by taking deviations from plant means. */
    WITHIN,
    /** Least squares on the means of plants, one row a plant. */
    BETWEEN,
    /** A random draw for each plant, independent of inputs: generalised least squares. */
    RANDOM,
    /** A constant for each plant, removed by taking differences of successive periods. */
    DIFFERENCES,
    /** A random draw for each plant whose mean moves with the plant's means of the inputs. */
    MUNDLAK;

    /** The word used in files. */
    public String word() {
      return words(this);
    }

    /** Whether one constant of all plants is estimated, beside which plants may differ. */
    public boolean constant() {
      return this != WITHIN && this != DIFFERENCES;
    }

    /** Whether plants are random draws. */
    public boolean random() {
      return this == RANDOM || this == MUNDLAK;
    }

    /** Whether a form that is not linear in its parameters can be fitted so. */
    public boolean anyForm() {
      return this == NONE || this == WITHIN;
    }
  }

  /** What is done about change over time. */
  public enum Time {
    /** Nothing. */
    NONE,
    /** A linear trend in the period. */
    TREND,
    /** A trend with its square. */
    QUADRATIC_TREND,
    /** A trend with its square that also works through each input. */
    BIASED_TREND,
    /** A constant for each period but the first. */
    PERIOD_EFFECTS,
    /** A constant for each period but the first, beside a constant for each plant. */
    TWO_WAY;

    /** The word used in files. */
    public String word() {
      return words(this);
    }

    /** Whether there is a trend of any kind. */
    public boolean trending() {
      return this == TREND || quadratic();
    }

    /** Whether the square of the trend is there. */
    public boolean quadratic() {
      return this == QUADRATIC_TREND || this == BIASED_TREND;
    }

    /** Whether each period has a constant. */
    public boolean byPeriod() {
      return this == PERIOD_EFFECTS || this == TWO_WAY;
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

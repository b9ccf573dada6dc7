package isowright.estimation;

import isowright.records.Panel;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A technology form fitted to a panel, or the reason why it could not be.
 *
 * @param specification how it was to be fitted
 * @param panel the records
 * @param base what inputs were divided by before logs, shape n
 * @param state what kind of answer this is
 * @param reasons in words, why there is no answer or what must be known of it; may be empty
 * @param solution the numbers; present where {@link State#usable()}
 * @param profiles the profile over each of the form's curvatures, in its order; empty for forms
 *     without one and where nothing could be tried
 */
public record Fit(
    Specification specification,
    Panel panel,
    double[] base,
    State state,
    List<String> reasons,
    Optional<Solution> solution,
    List<CurvatureProfile> profiles) {

  /** What kind of answer a fit is. */
  public enum State {
    /** Estimated. */
    ESTIMATED,
    /** Estimated, but the curvature is a set of values rather than a point. */
    FLAT,
    /** No optimum inside the economic region. */
    BOUNDARY,
    /** The search did not converge. */
    NOT_CONVERGED,
    /** Columns move together exactly. */
    RANK_DEFICIENT,
    /** The records cannot carry the specification. */
    REFUSED;

    /** Whether later stages may use the numbers. */
    public boolean usable() {
      return this == ESTIMATED || this == FLAT;
    }

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /** Copies the lists. */
  public Fit {
    reasons = List.copyOf(reasons);
    profiles = List.copyOf(profiles);
  }

  /** The profile of the only curvature, or of the first of several. */
  public Optional<CurvatureProfile> profile() {
    return profiles.stream().findFirst();
  }

  /** The numbers, where the state is usable. */
  public Solution numbers() {
    return solution.orElseThrow(
        () -> new IllegalStateException("a fit that is " + state.word() + " has no numbers"));
  }

  /**
   * The technology at a period for a productivity, controls at their means, with the covariance of
   * its parameters. The constant takes up what period, controls and productivity add to ln Q.
   *
   * @param period the index of the period in the panel
   */
  public EstimatedTechnology at(int period, Productivity productivity) {
    Solution numbers = numbers();
    double[] circumstances = Circumstances.of(panel, specification.time()).at(period);
    int p = numbers.technology().parameters().length;
    double[][] toTechnology = new double[p][numbers.parameters().length];
    for (int k = 0; k < p; k++) {
      toTechnology[k][k] = 1;
    }
    double shift = 0;
    for (int c = 0; c < circumstances.length; c++) {
      toTechnology[0][p + c] = circumstances[c];
      shift += circumstances[c] * numbers.parameters()[p + c];
    }
    double[][] covariance = numbers.covariance();
    boolean ownConstant =
        !(productivity instanceof Productivity.Typical)
            || specification.plantEffects() == Specification.PlantEffects.WITHIN;
    if (ownConstant) {
      double[] weights = numbers.levels().weights(productivity);
      shift += numbers.levels().shift(weights);
      covariance = numbers.levels().covariance(weights);
    }
    return new EstimatedTechnology(
        numbers.technology().shifted(shift),
        Matrices.sandwich(toTechnology, covariance),
        numbers.covarianceSource().degreesOfFreedom());
  }

  /** The technology of the typical plant in the last period. */
  public EstimatedTechnology typical() {
    return at(panel.periods().size() - 1, new Productivity.Typical());
  }

  /** The natural logs of the geometric means of the inputs over the records, shape n. */
  public double[] meanLogInputs() {
    return Arrays.stream(panel.geometricMeans()).map(Math::log).toArray();
  }
}

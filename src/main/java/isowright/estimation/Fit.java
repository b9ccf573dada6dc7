package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.LinearFit;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;

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

  /**
   * Whether the rows of each plant stand for themselves in the regression, whatever other plants
   * there are: least squares, pooled or within plants.
   */
  public boolean plantsStandAlone() {
    return specification.estimator() instanceof Estimator.LeastSquares
        && (specification.plantEffects() == Specification.PlantEffects.NONE
            || specification.plantEffects() == Specification.PlantEffects.WITHIN);
  }

  /**
   * The fit whose regression tests and diagnostics look at: the free one where this one is held to
   * be regular, else this one.
   */
  public Fit examined() {
    return solution
        .filter(s -> s.particulars() instanceof Particulars.OfRegularity)
        .map(s -> ((Particulars.OfRegularity) s.particulars()).free())
        .orElse(this);
  }

  /** The numbers, where the state is usable. */
  public Solution numbers() {
    return solution.orElseThrow(
        () -> new IllegalStateException("a fit that is " + state.word() + " has no numbers"));
  }

  /**
   * The technology at a period for a productivity, controls at their means, with the covariance of
   * its parameters. The constant takes up what period, controls and productivity add to ln Q; a
   * biased trend also moves the coefficients of the inputs' logs to where they are at that period.
   *
   * @param period the index of the period in the panel
   */
  public EstimatedTechnology at(int period, Productivity productivity) {
    Solution numbers = numbers();
    boolean levels = levelsGiveTheConstant(productivity);
    double[][] covariance =
        levels
            ? numbers.levels().covariance(numbers.levels().weights(productivity))
            : numbers.covariance();
    return new EstimatedTechnology(
        technology(period, productivity),
        Matrices.sandwich(toTechnology(period, productivity), covariance),
        numbers.covarianceSource().degreesOfFreedom());
  }

  /** The technology of {@link #at} alone. */
  Technology technology(int period, Productivity productivity) {
    Solution numbers = numbers();
    boolean levels = levelsGiveTheConstant(productivity);
    Technology technology = technologies(period, productivity).apply(numbers.parameters());
    return levels
        ? technology.shifted(numbers.levels().shift(numbers.levels().weights(productivity)))
        : technology;
  }

  /**
   * What it takes to have {@link #at} without the records.
   *
   * @param plants the levels of so many plants, from the first
   */
  public SavedTechnology saved(int plants) {
    return SavedTechnology.of(this, plants);
  }

  /** Whether the constant is a mean of plants' levels rather than a parameter of the fit. */
  boolean levelsGiveTheConstant(Productivity productivity) {
    boolean common =
        productivity instanceof Productivity.Typical
            || productivity instanceof Productivity.Frontier;
    return !common || !specification.plantEffects().constant();
  }

  /**
   * The technology at a period, controls at their means, that reported parameters (in the order of
   * {@link Solution#parameters()}: the estimate, or a refit) describe.
   *
   * @param productivity whose; the constant of a mean of levels is not yet put in
   */
  Function<double[], Technology> technologies(int period, Productivity productivity) {
    Technology first = numbers().technology();
    double[] own = first.parameters();
    double[][] to = toTechnology(period, productivity);
    int law = numbers().lawOfErrors();
    double since = sinceLast(panel, period);
    return reported -> {
      double[] moved = Arrays.copyOf(reported, own.length);
      int circumstances = reported.length - law;
      double shift = 0;
      if (law > 0 && productivity instanceof Productivity.Typical) {
        double[] laws = Arrays.copyOfRange(reported, circumstances, reported.length);
        shift -= numbers().frontier().orElseThrow().mean(laws, since);
      }
      for (int j = own.length; j < circumstances; j++) {
        shift += to[0][j] * reported[j];
        for (int k = 1; k < own.length; k++) {
          moved[k] += to[k][j] * reported[j];
        }
      }
      return (Arrays.equals(moved, own) ? first : first.withParameters(moved)).shifted(shift);
    };
  }

  /**
   * The derivatives of the technology's parameters at a period in all reported ones, p × P. For the
   * typical plant, plant means that were added stand at their means over the rows and inefficiency
   * at its mean; a plant's own constant holds its own.
   */
  double[][] toTechnology(int period, Productivity productivity) {
    Solution numbers = numbers();
    int p = numbers.technology().parameters().length;
    double[][] to = new double[p][numbers.parameters().length];
    for (int k = 0; k < p; k++) {
      to[k][k] = 1;
    }
    Circumstances circumstances = Circumstances.of(panel, specification.time());
    System.arraycopy(circumstances.at(period), 0, to[0], p, circumstances.count());
    if (specification.time() == Specification.Time.BIASED_TREND
        && specification.form() instanceof LinearForm linear) {
      int[] places = linear.firstOrder(panel.inputs().size());
      for (int i = 0; i < places.length; i++) {
        to[1 + places[i]][p + circumstances.bias(i)] = circumstances.since(period);
      }
    }
    double[] means = numbers.treatment().plantMeans();
    if (!levelsGiveTheConstant(productivity)) {
      System.arraycopy(means, 0, to[0], p + circumstances.count(), means.length);
    }
    int law = numbers.lawOfErrors();
    if (law > 0 && productivity instanceof Productivity.Typical) {
      double[] all = numbers.parameters();
      double[] slopes =
          numbers
              .frontier()
              .orElseThrow()
              .slopes(
                  Arrays.copyOfRange(all, all.length - law, all.length), sinceLast(panel, period));
      for (int k = 0; k < law; k++) {
        to[0][all.length - law + k] = -slopes[k];
      }
    }
    return to;
  }

  /** The distance of a period from the last one of a panel, in the unit of the periods. */
  static double sinceLast(Panel panel, int period) {
    int last = panel.periods().size() - 1;
    return panel.periodNumbers().get(period) - panel.periodNumbers().get(last);
  }

  /**
   * The covariance, of the kind that this fit uses, of another regression on the same rows.
   *
   * @param design the other regression, of as many rows as {@link Solution#design}
   * @param linear its fit
   */
  public Covariance covarianceOf(Design design, LinearFit linear) {
    return Covariance.estimate(
        design,
        linear,
        LinearEstimation.kind(specification.standardErrors()),
        PanelRows.of(panel, base).times(numbers().treatment().rows()));
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

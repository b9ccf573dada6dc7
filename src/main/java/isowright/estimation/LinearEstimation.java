package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Collinearity;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.FitStatistics;
import isowright.regression.HeldFit;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.VarianceComponents;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a form that is linear in its parameters: ordinary least squares on the rows as they are, on
 * what varies within plants, on means of plants, on differences, or on rows less a share of the
 * means of their plant (random effects).
 */
final class LinearEstimation {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final boolean constant;
  private final Circumstances circumstances;

  LinearEstimation(Panel panel, Specification specification, double[] base, LinearForm form) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.constant = specification.plantEffects().constant();
    this.circumstances = Circumstances.of(panel, specification.time());
  }

  Fit fit() {
    LinearDesign raw =
        new LinearDesign(PanelRows.of(panel, base), form, panel.inputs(), circumstances, constant);
    PlantTreatment treatment = PlantTreatment.of(panel, specification, raw);
    if (!treatment.lacking().isEmpty()) {
      return Estimation.without(panel, specification, base, Fit.State.REFUSED, treatment.lacking());
    }
    LinearFit fit = LeastSquares.fit(treatment.design());
    Optional<Fit> lacking =
        lacking(panel, specification, base, fit, treatment.outcome().rows().kind());
    return lacking.orElseGet(
        () ->
            specification.regularity() == Specification.RegularityImposed.FREE
                ? solved(treatment, fit, new Particulars.None())
                : regular(treatment, fit));
  }

  /** The fit held to be regular; the free one goes with it. */
  private Fit regular(PlantTreatment treatment, LinearFit fit) {
    Specification freely = specification.with(Specification.RegularityImposed.FREE);
    Fit free =
        new LinearEstimation(panel, freely, base, form)
            .solved(treatment, fit, new Particulars.None());
    ImposedRegularity imposed =
        ImposedRegularity.of(panel, specification, base, form, fit.columns().size());
    Optional<ImposedRegularity.Best> best = imposed.best(fit);
    if (best.isEmpty()) {
      return Estimation.without(
          panel,
          specification,
          base,
          Fit.State.NOT_CONVERGED,
          List.of(
              "No technology that is regular "
                  + (specification.regularity() == Specification.RegularityImposed.AT_MEAN
                      ? "at the geometric mean"
                      : "at every row")
                  + " was reached from any start. Set regularity to free to see what the records"
                  + " say, or ask for a form with fewer parameters."));
    }
    return solved(
        treatment,
        HeldFit.of(fit, best.get().found()),
        Particulars.OfRegularity.of(free, specification.regularity(), imposed, best.get()));
  }

  /** The fit that says what the rows lack, if anything. */
  static Optional<Fit> lacking(
      Panel panel, Specification specification, double[] base, LinearFit fit, RowsUsed.Kind kind) {
    int parameters = fit.columns().size() + fit.absorbed();
    if (fit.rows() <= parameters) {
      String rows =
          switch (kind) {
            case EACH -> fit.rows() + " rows";
            case PLANT_MEANS -> fit.rows() + " plants (one mean each)";
            case DIFFERENCES ->
                fit.rows() + (fit.rows() == 1 ? " difference" : " differences") + " of rows";
          };
      String reason =
          rows
              + " cannot carry "
              + parameters
              + " parameters"
              + (fit.absorbed() > 0 ? " (plant effects among them)" : "")
              + ": add records, or ask for a form with fewer parameters"
              + (kind == RowsUsed.Kind.EACH ? "." : ", or set plant-effects to within.");
      return Optional.of(
          Estimation.without(panel, specification, base, Fit.State.REFUSED, List.of(reason)));
    }
    if (!fit.fullRank()) {
      List<String> reasons = new ArrayList<>();
      for (Collinearity collinearity : fit.collinearities()) {
        reasons.add(
            collinearity.column()
                + " cannot be told apart from "
                + among(collinearity)
                + ": in these records it is an exact combination of them. Leave one of them out,"
                + " add records in which they move apart, or ask for a simpler form.");
      }
      return Optional.of(
          Estimation.without(panel, specification, base, Fit.State.RANK_DEFICIENT, reasons));
    }
    return Optional.empty();
  }

  private static String among(Collinearity collinearity) {
    return collinearity.among().isEmpty()
        ? "zero"
        : String.join(", ", collinearity.among())
            .replace(Collinearity.GROUP_EFFECTS, "the plant effects");
  }

  /**
   * The fit that a solved regression is.
   *
   * @param fit of {@code treatment.design()}, over the columns of its levels
   */
  Fit solved(PlantTreatment treatment, LinearFit fit, Particulars particulars) {
    Covariance covariance =
        Covariance.estimate(
            treatment.design(),
            fit,
            kind(specification.standardErrors()),
            PanelRows.of(panel, base).times(treatment.outcome().rows()));
    return solved(treatment, fit, particulars, covariance);
  }

  /** The same with a covariance, over the columns of the fit, that was had otherwise. */
  Fit solved(
      PlantTreatment treatment, LinearFit fit, Particulars particulars, Covariance covariance) {
    Design design = treatment.design();
    Treatment outcome = treatment.outcome();
    int columns = fit.columns().size();
    int first = constant ? 0 : 1;
    int beside = circumstances.count() + outcome.plantMeans().length;
    double[][] toReported = Matrices.extended(form.reported(panel.inputs()), beside);
    double[] residuals = residuals(treatment, fit);
    PlantLevels levels =
        new PlantLevels(
            treatment.levels(),
            fit.coefficients(),
            covariance.matrix(),
            PlantLevels.level(columns, constant, outcome.plantMeans().length),
            size -> outcome.components().map(c -> c.shrinkage(size)).orElse(1.0),
            rowVariance(treatment, fit, residuals),
            toReported);
    double[] free = new double[columns + first];
    System.arraycopy(fit.coefficients(), 0, free, first, columns);
    if (!constant) {
      free[0] = levels.typical();
    }
    double[][] full =
        constant
            ? Matrices.sandwich(toReported, covariance.matrix())
            : levels.covariance(levels.weights(new Productivity.Typical()));
    Technology technology =
        form.technology(
            panel.inputs(), base, free[0], Arrays.copyOfRange(free, 1, free.length - beside));
    double[] own = technology.parameters();
    double[] parameters = Arrays.copyOf(own, own.length + beside);
    System.arraycopy(free, free.length - beside, parameters, own.length, beside);
    List<String> names = new ArrayList<>(technology.parameterNames());
    names.addAll(fit.columns().subList(columns - beside, columns));
    Solution solution =
        new Solution(
            technology,
            List.copyOf(names),
            parameters,
            full,
            covariance,
            statistics(treatment, fit),
            design,
            fit,
            residuals,
            levels,
            outcome,
            new double[0],
            particulars);
    return new Fit(
        specification,
        panel,
        base,
        Fit.State.ESTIMATED,
        List.of(),
        Optional.of(solution),
        List.of());
  }

  /**
   * What is left of ln Q, row by row, once the level of the plant is taken off where it has one.
   */
  private double[] residuals(PlantTreatment treatment, LinearFit fit) {
    Design levels = treatment.levels();
    return switch (specification.plantEffects()) {
      case NONE, BETWEEN -> LeastSquares.residuals(levels, fit);
      case WITHIN, DIFFERENCES -> LeastSquares.residuals(Effects.within(levels), fit);
      case RANDOM, MUNDLAK -> {
        double[] residuals = LeastSquares.residuals(levels, fit);
        VarianceComponents components = treatment.outcome().components().orElseThrow();
        for (int g = 0; g < levels.groups().count(); g++) {
          int start = levels.groups().start(g);
          int end = levels.groups().end(g);
          double mean = 0;
          for (int r = start; r < end; r++) {
            mean += residuals[r] / (end - start);
          }
          double effect = components.shrinkage(end - start) * mean;
          for (int r = start; r < end; r++) {
            residuals[r] -= effect;
          }
        }
        yield residuals;
      }
    };
  }

  /** The variance of a row's error about the level of its plant. */
  private double rowVariance(PlantTreatment treatment, LinearFit fit, double[] residuals) {
    return switch (specification.plantEffects()) {
      case NONE, WITHIN -> fit.residualVariance();
      case RANDOM, MUNDLAK -> treatment.outcome().components().orElseThrow().row();
      case BETWEEN -> withinSsr(treatment.levels(), fit) / (residuals.length - fit.rows());
      case DIFFERENCES -> {
        int groups = treatment.levels().groups().count();
        yield withinSsr(treatment.levels(), fit) / (residuals.length - groups - fit.rank());
      }
    };
  }

  private static double withinSsr(Design levels, LinearFit fit) {
    double sum = 0;
    for (double residual : LeastSquares.residuals(Effects.within(levels), fit)) {
      sum += residual * residual;
    }
    return sum;
  }

  private FitStatistics statistics(PlantTreatment treatment, LinearFit fit) {
    FitStatistics statistics =
        treatment
            .outcome()
            .components()
            .map(c -> FitStatistics.ofPartlyWithin(fit, c.shares(treatment.levels().groups())))
            .orElseGet(() -> FitStatistics.of(fit));
    if (form.unrestricted() == form) {
      return statistics;
    }
    // A restriction may have taken something off the response; its spread is that of ln Q itself.
    LinearDesign whole =
        new LinearDesign(
            PanelRows.of(panel, base),
            form.unrestricted(),
            panel.inputs(),
            circumstances,
            constant);
    Design treated = treatment.again(panel, specification, whole);
    return statistics.explaining(fit.ssr(), LeastSquares.fit(treated).totalSumOfSquares());
  }

  static Covariance.Kind kind(Specification.StandardErrors standardErrors) {
    return switch (standardErrors) {
      case CLASSICAL -> Covariance.Kind.CLASSICAL;
      case ROBUST -> Covariance.Kind.HC1;
      case HC3 -> Covariance.Kind.HC3;
      case CLUSTERED -> Covariance.Kind.CLUSTERED;
      case CLUSTERED_TWO_WAY -> Covariance.Kind.CLUSTERED_TWO_WAY;
      case NEWEY_WEST -> Covariance.Kind.NEWEY_WEST;
      case DRISCOLL_KRAAY -> Covariance.Kind.DRISCOLL_KRAAY;
    };
  }
}

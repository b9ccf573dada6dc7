package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.ComposedErrors;
import isowright.regression.ComposedFit;
import isowright.regression.Covariance;
import isowright.regression.FitStatistics;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a form that is linear in its parameters as a frontier, by maximum likelihood: ln Q = x′β + v
 * − u, noise v normal with standard deviation σ_v, inefficiency u ≥ 0 of the law and sharing asked
 * (see {@link ComposedErrors}).
 *
 * <p>Reported are β (the constant is that of the frontier, where u = 0), σ_v ({@code
 * frontier:noise}), σ_u ({@code frontier:inefficiency}) and, with decay, η ({@code
 * frontier:decay}), their covariance carried over from that of the logs. Residuals are those about
 * the typical plant, whose inefficiency is at its mean: ln Q − x′β + E u. Where no inefficiency is
 * found, the answer is that of least squares. Levels of plants hold both their inefficiency and the
 * mean of their noise. Tested in {@code FrontierEstimationTest}.
 */
final class FrontierEstimation {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final Estimator.Frontier asked;
  private final Circumstances circumstances;
  private final double[] start;

  FrontierEstimation(
      Panel panel,
      Specification specification,
      double[] base,
      LinearForm form,
      Estimator.Frontier asked) {
    this(panel, specification, base, form, asked, new double[0]);
  }

  private FrontierEstimation(
      Panel panel,
      Specification specification,
      double[] base,
      LinearForm form,
      Estimator.Frontier asked,
      double[] start) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.asked = asked;
    this.circumstances = Circumstances.of(panel, specification.time());
    this.start = start;
  }

  /** The same on other rows, searched for from where this fit ended. */
  static Fit again(Fit fit, Panel other, Specification specification) {
    List<String> obstacles = Obstacles.of(other, specification);
    if (!obstacles.isEmpty()) {
      return Estimation.without(other, specification, fit.base(), Fit.State.REFUSED, obstacles);
    }
    return new FrontierEstimation(
            other,
            specification,
            fit.base(),
            (LinearForm) specification.form(),
            (Estimator.Frontier) specification.estimator(),
            fit.numbers().searched())
        .fit();
  }

  Fit fit() {
    LinearDesign design =
        new LinearDesign(PanelRows.of(panel, base), form, panel.inputs(), circumstances, true);
    ComposedErrors model = new ComposedErrors(design, asked.law(), sharing(), since());
    LinearFit least = LeastSquares.fit(design);
    Optional<Fit> lacking =
        LinearEstimation.lacking(panel, specification, base, least, RowsUsed.Kind.EACH)
            .or(() -> tooFew(model));
    if (lacking.isPresent()) {
      return lacking.get();
    }
    ComposedFit found = start.length > 0 ? ComposedFit.of(model, start) : ComposedFit.of(model);
    return switch (found.state()) {
      case FOUND, WRONG_SKEW, NONE_FOUND -> solved(design, found);
      case ALL_ONE_SIDED ->
          Estimation.without(panel, specification, base, Fit.State.BOUNDARY, List.of(ALL));
      case NOT_CONVERGED ->
          Estimation.without(
              panel,
              specification,
              base,
              Fit.State.NOT_CONVERGED,
              List.of(
                  "The likelihood of the frontier was climbed from several starts for "
                      + found.steps()
                      + " steps without coming to rest: the records do not tell noise from"
                      + " inefficiency. Ask for the other law of inefficiency, for a form with"
                      + " fewer parameters, or take `frontier` out."));
    };
  }

  private static final String ALL =
      "The likelihood of the frontier still rises as the noise goes to zero (gamma at 1, its"
          + " bound): the records would be described by inefficiency alone, and no standard errors"
          + " exist there. Ask for the other law of inefficiency, add records, or take `frontier`"
          + " out.";

  private ComposedErrors.Sharing sharing() {
    return switch (asked.overTime()) {
      case EACH_ROW -> ComposedErrors.Sharing.NONE;
      case CONSTANT -> ComposedErrors.Sharing.GROUP;
      case DECAY -> ComposedErrors.Sharing.GROUP_WITH_DECAY;
    };
  }

  /** t − T of each row, T the last period of the records (Battese and Coelli 1992). */
  private double[] since() {
    if (asked.overTime() != Estimator.OverTime.DECAY) {
      return new double[0];
    }
    double[] since = new double[panel.rows()];
    Arrays.setAll(since, r -> Fit.sinceLast(panel, panel.rowPeriods().get(r)));
    return since;
  }

  private Optional<Fit> tooFew(ComposedErrors model) {
    if (panel.rows() > model.parameters()) {
      return Optional.empty();
    }
    return Optional.of(
        Estimation.without(
            panel,
            specification,
            base,
            Fit.State.REFUSED,
            List.of(
                panel.rows()
                    + " rows cannot carry the "
                    + model.parameters()
                    + " parameters of a frontier (those of noise and inefficiency among them): add"
                    + " records, or ask for a form with fewer parameters.")));
  }

  private Fit solved(LinearDesign design, ComposedFit found) {
    Covariance covariance = found.covariance(LinearEstimation.kind(specification.standardErrors()));
    Particulars.OfFrontier own = new Particulars.OfFrontier(found, asked.law().mean(1));
    double[] law = law(found);
    int columns = design.columns().size();
    int beside = circumstances.count();
    double[][] natural = natural(covariance.matrix(), columns, law);
    double[][] toReported = Matrices.extended(form.reported(panel.inputs()), beside + law.length);
    double[] residuals = residuals(design, found, own, law);
    LinearFit linear = linear(found, residuals, own, law);
    double[] free = found.coefficients();
    Technology technology =
        form.technology(
            panel.inputs(), base, free[0], Arrays.copyOfRange(free, 1, free.length - beside));
    List<String> names = new ArrayList<>(technology.parameterNames());
    names.addAll(design.columns().subList(columns - beside, columns));
    names.addAll(Particulars.OfFrontier.NAMES.subList(0, law.length));
    double[] parameters = Arrays.copyOf(technology.parameters(), names.size());
    int first = technology.parameters().length;
    System.arraycopy(free, free.length - beside, parameters, first, beside);
    System.arraycopy(law, 0, parameters, first + beside, law.length);
    PlantLevels levels =
        new PlantLevels(
            design,
            free,
            leading(natural, columns),
            PlantLevels.level(columns, true, 0),
            size -> 1,
            found.noise() * found.noise(),
            narrowed(toReported, columns));
    Solution solution =
        new Solution(
            technology,
            List.copyOf(names),
            parameters,
            Matrices.sandwich(toReported, natural),
            covariance,
            statistics(found, linear),
            design,
            linear,
            residuals,
            levels,
            Treatment.none(design),
            found.parameters(),
            own);
    return new Fit(
        specification,
        panel,
        base,
        Fit.State.ESTIMATED,
        List.of(),
        Optional.of(solution),
        List.of());
  }

  /** σ_v, σ_u and η, as far as they were estimated. */
  private static double[] law(ComposedFit found) {
    int columns = found.coefficients().length;
    double[] all = found.parameters();
    double[] law = Arrays.copyOfRange(all, columns, all.length);
    for (int k = 0; k < Math.min(2, law.length); k++) {
      law[k] = Math.exp(law[k]);
    }
    return law;
  }

  /** The covariance with standard deviations in the place of their logs. */
  private static double[][] natural(double[][] covariance, int columns, double[] law) {
    double[][] to = Matrices.identity(covariance.length);
    for (int k = 0; k < Math.min(2, law.length); k++) {
      to[columns + k][columns + k] = law[k];
    }
    return Matrices.sandwich(to, covariance);
  }

  private double[] residuals(
      LinearDesign design, ComposedFit found, Particulars.OfFrontier own, double[] law) {
    double[] residuals =
        LeastSquares.residuals(design, with(found.leastSquares(), found.coefficients(), 0));
    for (int r = 0; r < residuals.length; r++) {
      residuals[r] += own.mean(law, Fit.sinceLast(panel, panel.rowPeriods().get(r)));
    }
    return residuals;
  }

  /** The least-squares fit with the coefficients of the typical plant and its residuals. */
  private LinearFit linear(
      ComposedFit found, double[] residuals, Particulars.OfFrontier own, double[] law) {
    double[] coefficients = found.coefficients();
    double mean = 0;
    double ssr = 0;
    for (int r = 0; r < residuals.length; r++) {
      mean += own.mean(law, Fit.sinceLast(panel, panel.rowPeriods().get(r))) / residuals.length;
      ssr += residuals[r] * residuals[r];
    }
    coefficients[0] -= mean;
    return with(found.leastSquares(), coefficients, ssr);
  }

  private static LinearFit with(LinearFit fit, double[] coefficients, double ssr) {
    return new LinearFit(
        fit.columns(),
        coefficients,
        fit.estimated(),
        fit.inverseFactor(),
        ssr,
        fit.totalSumOfSquares(),
        fit.rows(),
        fit.absorbed(),
        fit.rank(),
        fit.collinearities(),
        fit.rankRule(),
        fit.pivots());
  }

  /** With the log-likelihood of the frontier, every parameter of the law of errors counted. */
  private static FitStatistics statistics(ComposedFit found, LinearFit linear) {
    FitStatistics rows = FitStatistics.of(linear);
    int parameters = found.state().oneSided() ? found.parameters().length : rows.parameters();
    return new FitStatistics(
        rows.rSquared(),
        rows.residualStandardError(),
        found.logLikelihood(),
        parameters,
        -2 * found.logLikelihood() + 2 * parameters,
        -2 * found.logLikelihood() + parameters * Math.log(linear.rows()));
  }

  private static double[][] leading(double[][] matrix, int size) {
    double[][] leading = new double[size][];
    Arrays.setAll(leading, k -> Arrays.copyOf(matrix[k], size));
    return leading;
  }

  private static double[][] narrowed(double[][] matrix, int columns) {
    double[][] narrowed = new double[matrix.length][];
    Arrays.setAll(narrowed, k -> Arrays.copyOf(matrix[k], columns));
    return narrowed;
  }
}

package isowright.inference;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.SeparateFits;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The tests of what a fit assumes about plants and periods. Which are made depends on what the fit
 * does about plants:
 *
 * <ul>
 *   <li>{@code plant-effects}, within: F of the regressions with and without plant effects.
 *   <li>{@code plant-variance}, pooled and random: Lagrange multiplier of a variance between
 *       plants, N²/2 · (Σ_i (Σ_t û_it)² / Σ û² − 1)² / (Σ T_i² − N), chi-squared with 1 degree of
 *       freedom. Breusch, T. S. and Pagan, A. R. (1980), <i>Review of Economic Studies</i> 47,
 *       239–253; plants of unequal length: Baltagi, B. H. and Li, Q. (1990), <i>Econometric
 *       Theory</i> 6, 283–284.
 *   <li>{@code random-against-within}, within and random: see {@link RandomAgainstWithin}.
 *   <li>{@code plant-means}, random and Mundlak, and within where the test before it is in doubt:
 *       Wald test, in its F form and with the covariance of the fit, that the plant means of inputs
 *       and controls add nothing (Mundlak, Y. (1978), <i>Econometrica</i> 46, 69–85). Unlike the
 *       one before it needs no equal variances.
 *   <li>{@code poolability}, pooled and within: F of the regression against one regression a plant
 *       (Chow 1960; Baltagi, <i>Econometric Analysis of Panel Data</i>, section 4.1), with trends
 *       of their own where there is a trend.
 *   <li>{@code serial-correlation}, all but between: see {@link SerialCorrelation}.
 *   <li>{@code period-effects}: F that no period differs from the first.
 *   <li>{@code neutral-technical-change}, biased trend: Wald test, in its F form, that the trend
 *       works through no input.
 * </ul>
 *
 * <p>The F tests and the Lagrange multiplier assume independent errors of equal variance. Checked
 * against R in {@code PanelHypothesesTest}; size in {@code TestSizeTest}.
 */
final class PanelHypotheses {

  private final Fit fit;
  private final Solution numbers;
  private final Specification specification;
  private final Panel panel;
  private final PlantEffects effects;

  private PanelHypotheses(Fit fit) {
    this.fit = fit;
    this.numbers = fit.numbers();
    this.specification = fit.specification();
    this.panel = fit.panel();
    this.effects = specification.plantEffects();
  }

  /** The tests of a usable fit. */
  static List<Verdict> of(Fit fit) {
    if (!(fit.specification().estimator() instanceof Estimator.LeastSquares)) {
      return List.of(); // the sums of squares of other principles do not compare
    }
    PanelHypotheses hypotheses = new PanelHypotheses(fit);
    List<Verdict> verdicts = new ArrayList<>();
    boolean linear = fit.specification().form() instanceof LinearForm;
    boolean plants = fit.panel().repeats() && fit.panel().plants().size() > 1;
    if (plants) {
      hypotheses.plantEffects().ifPresent(verdicts::add);
      hypotheses.plantVariance().ifPresent(verdicts::add);
      if (linear) {
        Optional<RandomAgainstWithin.Outcome> compared = RandomAgainstWithin.of(fit);
        compared.ifPresent(outcome -> verdicts.add(outcome.verdict()));
        boolean doubtful = compared.isPresent() && !compared.get().definite();
        hypotheses.plantMeans(doubtful).ifPresent(verdicts::add);
        hypotheses.poolability().ifPresent(verdicts::add);
      }
    }
    hypotheses.periodEffects().ifPresent(verdicts::add);
    if (plants && linear && fit.specification().plantEffects() != PlantEffects.BETWEEN) {
      SerialCorrelation.of(fit).ifPresent(verdicts::add);
    }
    hypotheses.neutrality().ifPresent(verdicts::add);
    return List.copyOf(verdicts);
  }

  private Optional<Verdict> plantEffects() {
    if (effects != PlantEffects.WITHIN) {
      return Optional.empty();
    }
    double held =
        Estimation.leastSsr(
            panel,
            specification.with(
                PlantEffects.NONE, withoutPlants(specification.time()), StandardErrors.CLASSICAL));
    if (Double.isNaN(held)) {
      return Optional.empty();
    }
    double free = numbers.linear().ssr();
    double restrictions = panel.plants().size() - 1;
    double degrees = numbers.linear().residualDegreesOfFreedom();
    double f = (held - free) / restrictions / (free / degrees);
    return Optional.of(
        Verdict.of(
            "plant-effects", "all plants share one constant", f, new Law.F(restrictions, degrees)));
  }

  private static Time withoutPlants(Time time) {
    return time == Time.TWO_WAY ? Time.PERIOD_EFFECTS : time;
  }

  private Optional<Verdict> plantVariance() {
    if (effects != PlantEffects.NONE && effects != PlantEffects.RANDOM) {
      return Optional.empty();
    }
    double[] residuals =
        effects == PlantEffects.NONE
            ? numbers.residuals()
            : LeastSquares.residuals(
                numbers.treatment().levels(), LeastSquares.fit(numbers.treatment().levels()));
    double between = 0;
    double all = 0;
    double squares = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      double sum = 0;
      for (int r = panel.plantStart(p); r < panel.plantEnd(p); r++) {
        sum += residuals[r];
        all += residuals[r] * residuals[r];
      }
      double size = panel.plantEnd(p) - panel.plantStart(p);
      between += sum * sum;
      squares += size * size;
    }
    double rows = panel.rows();
    double departure = between / all - 1;
    double multiplier = rows * rows / 2 * departure * departure / (squares - rows);
    return Optional.of(
        Verdict.of(
            "plant-variance",
            "plants do not differ beyond the errors of their rows (no variance between them)",
            multiplier,
            new Law.ChiSquared(1)));
  }

  /**
   * @param always whether the test is wanted for a fit without random effects too
   */
  private Optional<Verdict> plantMeans(boolean always) {
    if (!effects.random() && !always) {
      return Optional.empty();
    }
    Fit with =
        effects == PlantEffects.MUNDLAK
            ? fit
            : Estimation.fit(
                panel,
                specification.with(
                    PlantEffects.MUNDLAK,
                    withoutPlants(specification.time()),
                    specification.standardErrors()));
    if (!with.state().usable()) {
      return Optional.empty();
    }
    Solution solution = with.numbers();
    int[] places =
        places(solution.names(), name -> name.startsWith("mean:") && !ofTime(name.substring(5)));
    return joint(
        "plant-means",
        "plant means of inputs and controls add nothing, so that plant effects may be taken as"
            + " unrelated to them",
        places,
        with);
  }

  private Optional<Verdict> poolability() {
    boolean asked = effects == PlantEffects.NONE || effects == PlantEffects.WITHIN;
    if (!asked || specification.time().byPeriod()) {
      return Optional.empty();
    }
    LinearFit held = numbers.linear();
    SeparateFits free = SeparateFits.of(numbers.treatment().levels());
    double restrictions = free.parameters() - held.rank() - held.absorbed();
    double degrees = held.rows() - free.parameters();
    if (degrees < 1 || restrictions < 1) {
      return Optional.empty();
    }
    double f = (held.ssr() - free.ssr()) / restrictions / (free.ssr() / degrees);
    return Optional.of(
        Verdict.of(
            "poolability",
            effects == PlantEffects.NONE
                ? "one technology, constant and coefficients, serves every plant"
                : "one set of coefficients serves every plant, levels apart",
            f,
            new Law.F(restrictions, degrees)));
  }

  private Optional<Verdict> periodEffects() {
    if (!specification.time().byPeriod()) {
      return Optional.empty();
    }
    LinearFit linear = numbers.linear();
    double[][] classical = linear.inverseCrossProduct();
    for (double[] row : classical) {
      for (int k = 0; k < row.length; k++) {
        row[k] *= linear.residualVariance();
      }
    }
    return wald(
        "period-effects",
        "no period differs from the first at equal inputs",
        places(linear.columns(), name -> name.startsWith("period:")),
        // A profiled form's linearisation has its step left out; the parameters stand in the fit.
        IntStream.range(0, linear.columns().size())
            .mapToDouble(k -> parameter(linear.columns().get(k)))
            .toArray(),
        classical,
        linear.residualDegreesOfFreedom());
  }

  private double parameter(String name) {
    int at = numbers.index(name);
    return at < 0 ? 0 : numbers.parameters()[at];
  }

  private Optional<Verdict> neutrality() {
    if (specification.time() != Time.BIASED_TREND) {
      return Optional.empty();
    }
    return joint(
        "neutral-technical-change",
        "technical change is neutral: it leaves every output elasticity as it was",
        places(
            numbers.names(),
            name -> name.endsWith("*trend") && panel.inputs().contains(input(name))),
        fit);
  }

  private static String input(String name) {
    return name.substring(0, name.length() - "*trend".length());
  }

  /** Whether a column is a matter of time alone: the same for all plants in a period. */
  static boolean ofTime(String column) {
    return column.equals("trend") || column.equals("trend*trend") || column.startsWith("period:");
  }

  private static int[] places(List<String> names, java.util.function.Predicate<String> wanted) {
    return IntStream.range(0, names.size()).filter(k -> wanted.test(names.get(k))).toArray();
  }

  /** That some parameters of a fit are zero. */
  private static Optional<Verdict> joint(String name, String null0, int[] places, Fit of) {
    if (places.length == 0) {
      return Optional.empty();
    }
    Solution solution = of.numbers();
    double[][] rows = new double[places.length][solution.parameters().length];
    double[] departure = new double[places.length];
    for (int i = 0; i < places.length; i++) {
      rows[i][places[i]] = 1;
      departure[i] = solution.parameters()[places[i]];
    }
    JointTest test =
        JointTest.of(of, departure, rows, solution.covarianceSource().degreesOfFreedom());
    return Optional.of(Verdict.of(name, null0, test.statistic(), test.law()));
  }

  private static Optional<Verdict> wald(
      String name,
      String null0,
      int[] places,
      double[] parameters,
      double[][] covariance,
      double degrees) {
    if (places.length == 0) {
      return Optional.empty();
    }
    double[][] rows = new double[places.length][parameters.length];
    for (int i = 0; i < places.length; i++) {
      rows[i][places[i]] = 1;
    }
    double f =
        LinearRestrictions.statistic(rows, new double[places.length], parameters, covariance);
    return Optional.of(Verdict.of(name, null0, f, new Law.F(places.length, degrees)));
  }
}

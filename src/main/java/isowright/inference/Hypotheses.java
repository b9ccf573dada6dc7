package isowright.inference;

import isowright.estimation.CurvatureProfile;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import isowright.technology.Restriction;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * The tests that belong to a fit: constant returns, unit elasticity of substitution, Cobb-Douglas
 * within a richer form, and those of plants and periods. Each states its null in words, its
 * statistic and law, p, and a verdict.
 *
 * <p>Checked against Greene (2003), example 6.2 (F(3, 21) = 1.7678; constant returns F(1, 24) =
 * .1158) and Baltagi's table of the US states (plant effects F(47, 764) = 75.82) in {@code
 * HypothesesTest}.
 */
public final class Hypotheses {

  private final Fit fit;
  private final Solution numbers;
  private final double returnsToScale;
  private final double substitution;

  private Hypotheses(Fit fit, double returnsToScale, double substitution) {
    this.fit = fit;
    this.numbers = fit.numbers();
    this.returnsToScale = returnsToScale;
    this.substitution = substitution;
  }

  /**
   * The tests of a usable fit.
   *
   * @param returnsToScale the degree of homogeneity under the null
   * @param substitution the elasticity of substitution under the null
   */
  public static List<Verdict> of(Fit fit, double returnsToScale, double substitution) {
    Hypotheses hypotheses = new Hypotheses(fit, returnsToScale, substitution);
    List<Verdict> verdicts = new ArrayList<>();
    verdicts.addAll(hypotheses.restrictions());
    hypotheses.substitution().ifPresent(verdicts::add);
    hypotheses.oneSubstitution().ifPresent(verdicts::add);
    hypotheses.cobbDouglas().map(hypotheses::verdict).ifPresent(verdicts::add);
    verdicts.addAll(PanelHypotheses.of(fit));
    verdicts.addAll(FrontierHypotheses.of(fit));
    return List.copyOf(verdicts);
  }

  /**
   * A null of a fit: how far the estimate departs from it, and how the departure moves with the
   * reported parameters.
   *
   * @param departure g, shape q; zero under the null
   * @param jacobian G, q × P
   */
  record Null(String name, String nullHypothesis, double[] departure, double[][] jacobian) {}

  /**
   * The headline nulls that are linear in the parameters, by a form that is: constant returns, and
   * Cobb-Douglas within a richer form.
   */
  static List<Null> linear(Fit fit, double returnsToScale) {
    Hypotheses hypotheses = new Hypotheses(fit, returnsToScale, 1);
    List<Null> nulls = new ArrayList<>();
    if (fit.specification().form() instanceof LinearForm) {
      hypotheses.constantReturns().ifPresent(nulls::add);
      hypotheses.cobbDouglas().ifPresent(nulls::add);
    }
    return nulls;
  }

  private Verdict verdict(Null tested) {
    JointTest test = JointTest.of(fit, tested.departure(), tested.jacobian(), degrees());
    return Verdict.of(tested.name(), tested.nullHypothesis(), test.statistic(), test.law());
  }

  /** The form's restrictions that it does not obey by itself, from the strongest to the weakest. */
  private List<Verdict> restrictions() {
    List<Verdict> verdicts = new ArrayList<>();
    constantReturns().map(this::verdict).ifPresent(verdicts::add);
    restriction(
            Restriction.HOMOGENEOUS,
            "the scale elasticity is the same at every mix, so that the technology is homogeneous",
            0)
        .map(this::verdict)
        .ifPresent(verdicts::add);
    restriction(
            Restriction.HOMOTHETIC,
            "the cheapest proportions of inputs do not change with scale (homothetic to the second"
                + " order at the base point)",
            0)
        .map(this::verdict)
        .ifPresent(verdicts::add);
    return verdicts;
  }

  private Optional<Null> constantReturns() {
    String subject =
        returnsToScale == 1
            ? "returns to scale are constant at every mix"
            : "the degree of homogeneity is " + plain(returnsToScale) + " at every mix";
    return restriction(Restriction.CONSTANT_RETURNS, subject, returnsToScale - 1);
  }

  /**
   * The null of a restriction; none where the form obeys it at any parameters.
   *
   * @param less what is taken off the first departure
   */
  private Optional<Null> restriction(Restriction restriction, String subject, double less) {
    Form form = fit.specification().form();
    if (form.obeys(restriction)) {
      return Optional.empty();
    }
    double[] own = numbers.technology().parameters();
    Form.Departure departure = form.departure(restriction, fit.panel().inputs(), own);
    boolean biased =
        restriction == Restriction.CONSTANT_RETURNS
            && fit.specification().time() == Specification.Time.BIASED_TREND;
    int count = departure.value().length + (biased ? 1 : 0);
    double[] value = Arrays.copyOf(departure.value(), count);
    value[0] -= less;
    double[][] jacobian = new double[count][numbers.parameters().length];
    for (int i = 0; i < departure.value().length; i++) {
      System.arraycopy(departure.jacobian()[i], 0, jacobian[i], 0, own.length);
    }
    if (biased) {
      // Returns stay what they are only if what time adds to the elasticities sums to nothing.
      for (String input : fit.panel().inputs()) {
        int place = numbers.index(input + "*trend");
        jacobian[count - 1][place] = 1;
        value[count - 1] += numbers.parameters()[place];
      }
    }
    return Optional.of(new Null(restriction.word(), subject, value, jacobian));
  }

  private Optional<Verdict> substitution() {
    if (!(fit.specification().form() instanceof NonlinearForm form) || fit.profile().isEmpty()) {
      return Optional.empty();
    }
    double free = numbers.linear().ssr();
    double held = Estimation.ssrAt(fit, form.curvature(substitution));
    double ratio = numbers.residuals().length * Math.log(held / free) / scaling();
    int count = fit.profiles().size();
    String null0 =
        (count == 1
                ? "the elasticity of substitution is "
                : "every elasticity of substitution, within nests and between them, is ")
            + plain(substitution)
            + (substitution == 1 ? " (Cobb-Douglas)" : "");
    return Optional.of(
        Verdict.of("unit-substitution", null0, Math.max(ratio, 0), new Law.ChiSquared(count)));
  }

  /**
   * One elasticity of substitution within nests and between them: a likelihood ratio, divided like
   * the profiles for a covariance other than the classical one.
   */
  private Optional<Verdict> oneSubstitution() {
    int count = fit.profiles().size();
    if (count < 2 || !(fit.specification().form() instanceof NonlinearForm form)) {
      return Optional.empty();
    }
    double held =
        Estimation.leastSsr(fit.panel(), fit.specification().withForm(form.withOneCurvature()));
    double ratio = numbers.residuals().length * Math.log(held / numbers.linear().ssr()) / scaling();
    return Optional.of(
        Verdict.of(
            "one-substitution",
            "one elasticity of substitution serves within nests and between them, so that CES"
                + " without nests is enough",
            Math.max(ratio, 0),
            new Law.ChiSquared(count - 1)));
  }

  /**
   * By how much a likelihood ratio is divided for a covariance other than the classical one: the
   * mean over the curvatures of what their profiles are divided by, which for a single one is exact
   * (Kent 1982) and for several the first-order correction of Rao and Scott (1981, <i>Journal of
   * the American Statistical Association</i> 76, 221–230) but for correlations.
   */
  private double scaling() {
    return fit.profiles().stream().mapToDouble(CurvatureProfile::scaling).average().orElse(1);
  }

  private Optional<Null> cobbDouglas() {
    int n = fit.panel().inputs().size();
    if (!(fit.specification().form() instanceof LinearForm linear)
        || linear.secondOrder(n).length == 0) {
      return Optional.empty();
    }
    int[] places = linear.secondOrder(n);
    double[][] rows =
        LinearRestrictions.independent(
            places, linear.reported(fit.panel().inputs()), numbers.parameters().length);
    double[] departure = new double[rows.length];
    for (int i = 0; i < rows.length; i++) {
      for (int k = 0; k < rows[i].length; k++) {
        departure[i] += rows[i][k] * numbers.parameters()[k];
      }
    }
    return Optional.of(
        new Null(
            "cobb-douglas-in-translog",
            "all second-order terms are zero, so that Cobb-Douglas is enough",
            departure,
            rows));
  }

  private double degrees() {
    return numbers.covarianceSource().degreesOfFreedom();
  }

  /** A verdict in words at the level of common practice. */
  static String sentence(String null0, double p) {
    return sentence(null0, p, Verdict.LEVEL);
  }

  /** A verdict in words that cannot contradict its p-value. */
  static String sentence(String null0, double p, double level) {
    String claim = "the claim that " + null0;
    if (Double.isNaN(p)) {
      return "The test of " + claim + " could not be made: its covariance cannot be inverted.";
    }
    String at = "At the " + percent(level) + " level the records ";
    return p < level
        ? at + "speak against " + claim + " (" + chance(p, level) + ")."
        : at
            + "do not speak against "
            + claim
            + " ("
            + chance(p, level)
            + "); that is not proof of it.";
  }

  private static String percent(double level) {
    return BigDecimal.valueOf(level).movePointRight(2).stripTrailingZeros().toPlainString() + " %";
  }

  /** Three decimals, or as many as keep p on its side of the level. */
  private static String chance(double p, double level) {
    if (p < 0.001 && level >= 0.001) {
      return "p < 0.001";
    }
    BigDecimal exact = new BigDecimal(p);
    BigDecimal shown = exact.setScale(3, RoundingMode.HALF_EVEN);
    while (shown.compareTo(exact) != 0
        && (shown.signum() == 0 || (shown.doubleValue() < level) != (p < level))) {
      shown = exact.setScale(shown.scale() + 1, RoundingMode.HALF_EVEN);
    }
    return "p = " + shown.toPlainString();
  }

  private static String plain(double value) {
    return value == Math.rint(value)
        ? String.format(Locale.ROOT, "%.0f", value)
        : Double.toString(value);
  }
}

package isowright.inference;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
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
    verdicts.add(hypotheses.constantReturns());
    hypotheses.substitution().ifPresent(verdicts::add);
    hypotheses.cobbDouglas().ifPresent(verdicts::add);
    verdicts.addAll(PanelHypotheses.of(fit));
    return List.copyOf(verdicts);
  }

  private Verdict constantReturns() {
    int n = fit.panel().inputs().size();
    String subject =
        returnsToScale == 1
            ? "returns to scale are constant at every mix"
            : "the degree of homogeneity is " + plain(returnsToScale) + " at every mix";
    double[][] rows = restrictions(n);
    double[] right = new double[rows.length];
    right[0] = returnsToScale;
    double f =
        LinearRestrictions.statistic(rows, right, numbers.parameters(), numbers.covariance());
    return Verdict.of("constant-returns", subject, f, new Law.F(rows.length, degrees()));
  }

  /** The restrictions of constant returns over the reported parameters. */
  private double[][] restrictions(int n) {
    int all = numbers.parameters().length;
    if (fit.specification().form() instanceof LinearForm linear) {
      double[][] own = linear.constantReturns(n);
      boolean biased = fit.specification().time() == Specification.Time.BIASED_TREND;
      double[][] rows = new double[own.length + (biased ? 1 : 0)][all];
      for (int i = 0; i < own.length; i++) {
        System.arraycopy(own[i], 0, rows[i], 1, own[i].length - 1);
      }
      if (biased) {
        // Returns stay what they are only if what time adds to the elasticities sums to nothing.
        for (String input : fit.panel().inputs()) {
          rows[own.length][numbers.index(input + "*trend")] = 1;
        }
      }
      return rows;
    }
    double[][] row = new double[1][all];
    row[0][numbers.index("scale")] = 1;
    return row;
  }

  private Optional<Verdict> substitution() {
    if (!(fit.specification().form() instanceof NonlinearForm form) || fit.profile().isEmpty()) {
      return Optional.empty();
    }
    double free = numbers.linear().ssr();
    double held = Estimation.ssrAt(fit, form.curvature(substitution));
    double scaling = fit.profile().get().scaling();
    double ratio = numbers.residuals().length * Math.log(held / free) / scaling;
    String null0 =
        "the elasticity of substitution is "
            + plain(substitution)
            + (substitution == 1 ? " (Cobb-Douglas)" : "");
    return Optional.of(
        Verdict.of("unit-substitution", null0, Math.max(ratio, 0), new Law.ChiSquared(1)));
  }

  private Optional<Verdict> cobbDouglas() {
    int n = fit.panel().inputs().size();
    if (!(fit.specification().form() instanceof LinearForm linear)
        || linear.secondOrder(n).length == 0) {
      return Optional.empty();
    }
    int[] places = linear.secondOrder(n);
    double[][] rows = new double[places.length][numbers.parameters().length];
    for (int i = 0; i < places.length; i++) {
      rows[i][1 + places[i]] = 1;
    }
    double f =
        LinearRestrictions.statistic(
            rows, new double[places.length], numbers.parameters(), numbers.covariance());
    return Optional.of(
        Verdict.of(
            "cobb-douglas-in-translog",
            "all second-order terms are zero, so that Cobb-Douglas is enough",
            f,
            new Law.F(places.length, degrees())));
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

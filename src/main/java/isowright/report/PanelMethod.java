package isowright.report;

import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Tested;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/** How plants and time were treated, for the method section. */
final class PanelMethod {

  private PanelMethod() {}

  /** Cites sources, which then stand in the list of references. */
  interface Citing {
    String cite(Source... sources);
  }

  static List<Text> points(Material material, Citing citing) {
    Set<String> words = new LinkedHashSet<>();
    Set<String> tests = new LinkedHashSet<>();
    for (Fitted fit : material.findings().fits()) {
      words.add(fit.endogeneity().estimator());
      words.add(fit.how().plantEffects());
      words.add(fit.how().time());
      fit.panel().components().ifPresent(c -> words.add(c.method()));
      fit.tests().stream().map(Tested::name).forEach(tests::add);
      fit.frontier().ifPresent(f -> words.addAll(List.of("frontier", f.law(), f.overTime())));
    }
    List<Text> points = new ArrayList<>();
    for (String word : words) {
      String point = point(word, citing);
      if (!point.isEmpty()) {
        points.add(Text.of(point));
      }
    }
    for (String test : tests) {
      String point = test(test, citing);
      if (!point.isEmpty()) {
        points.add(Text.of(point));
      }
    }
    return points;
  }

  private static String point(String word, Citing citing) {
    return switch (word) {
      case "instruments" ->
          "Inputs chosen knowing productivity by two-stage least squares, standard errors from y −"
              + " Xβ with the inputs themselves "
              + citing.cite(Source.BASMANN)
              + "; every second-order column of such an input has the same column of its"
              + " instruments. Instruments are called weak below F = 10 "
              + citing.cite(Source.STAIGER)
              + ", by effective F "
              + citing.cite(Source.MONTIEL)
              + " or, for several columns, conditional F "
              + citing.cite(Source.SANDERSON)
              + "; the values not rejected however weak they are after "
              + citing.cite(Source.ANDERSON_RUBIN)
              + ".";
      case "proxy" ->
          "Inputs chosen knowing productivity by a control function "
              + citing.cite(Source.ACKERBERG)
              + ", which goes back to "
              + citing.cite(Source.OLLEY, Source.LEVINSOHN)
              + ": a polynomial in inputs and proxy frees output of its error; the innovations of"
              + " what it leaves beside the technology are unrelated to inputs fixed beforehand and"
              + " to free inputs of the period before, solved with as many moments as coefficients."
              + " Errors are the spread over draws of whole plants. Cross-check by joint moments in"
              + " their one-step form "
              + citing.cite(Source.WOOLDRIDGE_JOINT)
              + ", two-stage least squares with the proxy and states of the period before.";
      case "within" -> "Plant effects by deviations from plant means.";
      case "two-way" ->
          "Plant effects by deviations from plant means, period effects as a constant for each"
              + " period but the first; exact for plants of unequal length too.";
      case "between" -> "Least squares on the means of plants, each plant counting once.";
      case "differences" ->
          "Least squares on differences of successive periods; none is taken across a gap.";
      case "random" ->
          "Random effects by generalised least squares: a share θ = 1 − √(σ²_e/(σ²_e + T σ²_u)) of"
              + " a plant’s mean is taken off its rows. A plant’s level is its best linear"
              + " prediction.";
      case "mundlak" ->
          "Random effects with plant means of all columns added, which makes slopes those within"
              + " plants "
              + citing.cite(Source.MUNDLAK)
              + "; the typical plant has mean plant means.";
      case "swamy-arora" ->
          "Variances of random effects from the regressions within and between plants "
              + citing.cite(Source.SWAMY, Source.BALTAGI_CHANG)
              + ".";
      case "wallace-hussain" ->
          "Variances of random effects from the residuals of ordinary least squares "
              + citing.cite(Source.WALLACE, Source.BALTAGI_CHANG)
              + ".";
      case "amemiya" ->
          "Variances of random effects from the residuals within plants "
              + citing.cite(Source.AMEMIYA, Source.BALTAGI_CHANG)
              + ".";
      case "frontier" ->
          "Frontier by maximum likelihood, ln Q = x′β + v − u with noise v normal and inefficiency"
              + " u ≥ 0 "
              + citing.cite(Source.AIGNER)
              + "; a row’s inefficiency is its mean given the residuals "
              + citing.cite(Source.JONDROW, Source.BATTESE_COELLI_1988)
              + ", with intervals "
              + citing.cite(Source.HORRACE)
              + ", widened by the uncertainty of the parameters. Covariance from the inverse"
              + " Hessian; where it is robust or clustered, with the squares of scores of rows or"
              + " plants between two of them, times G/(G − 1). The typical plant has mean"
              + " inefficiency; the constant is that of the frontier. Where the residuals of least"
              + " squares are skewed the other way, least squares is the maximum "
              + citing.cite(Source.WALDMAN)
              + ".";
      case "half-normal" -> "Inefficiency half-normal: the absolute value of a normal variable.";
      case "exponential" ->
          "Inefficiency exponential " + citing.cite(Source.AIGNER, Source.MEEUSEN) + ".";
      case "constant" ->
          "One inefficiency a plant, the same in all its periods "
              + citing.cite(Source.BATTESE_COELLI_1988)
              + "; beside it, from plant effects within plants, the greatest level less the plant’s"
              + " "
              + citing.cite(Source.SCHMIDT_SICKLES)
              + ".";
      case "decay" ->
          "One inefficiency a plant, in period t that of the last period T times e^(−η (t − T)) "
              + citing.cite(Source.BATTESE_COELLI_1992)
              + "; beside it, from plant effects within plants, the greatest level less the plant’s"
              + " "
              + citing.cite(Source.SCHMIDT_SICKLES)
              + ".";
      case "biased-trend" ->
          "A biased trend adds τ t + ½ τ₂ t² + Σ τ_i z_i t; its bias is what it does to shares in"
              + " cost at a given mix.";
      default -> "";
    };
  }

  private static String test(String name, Citing citing) {
    return switch (name) {
      case "no-inefficiency" ->
          "No inefficiency by the likelihood ratio, whose law at the bound of a variance is a"
              + " mixture of chi-squared laws "
              + citing.cite(Source.KODDE)
              + ".";
      case "plant-variance" ->
          "Variance between plants by Lagrange multiplier "
              + citing.cite(Source.BREUSCH, Source.BALTAGI_LI)
              + ".";
      case "instruments-agree" ->
          "Over-identification by the moments at the efficient estimate, or by R² of residuals on"
              + " instruments where variances are taken as equal "
              + citing.cite(Source.HANSEN, Source.SARGAN)
              + ".";
      case "inputs-exogenous" ->
          "Whether instruments were needed by first-stage residuals added to the regression "
              + citing.cite(Source.WU, Source.HAUSMAN)
              + ".";
      case "random-against-within" ->
          "Random effects against within by the difference of their slopes, with classical"
              + " covariances of both "
              + citing.cite(Source.HAUSMAN)
              + ".";
      case "plant-means" ->
          "The same question by plant means added to the regression, with the covariance of the fit"
              + " "
              + citing.cite(Source.MUNDLAK)
              + ".";
      case "poolability" ->
          "Poolability by F against one regression a plant " + citing.cite(Source.CHOW) + ".";
      case "serial-correlation" ->
          "Serial correlation by the lag of residuals of first differences, which is −½ without it "
              + citing.cite(Source.WOOLDRIDGE)
              + ".";
      default -> "";
    };
  }
}

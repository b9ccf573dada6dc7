package isowright.report;

import isowright.study.FitFindings.Curvature;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Pair;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Point;
import isowright.study.FitFindings.Summary;
import isowright.study.FitFindings.Tested;
import java.io.IOException;
import java.util.List;
import java.util.Optional;

/** Fits and technologies taken as known, as they stand in the findings file. */
final class FitJson {

  /** So many fitted points are written for each fit; {@code pointsLeftOut} counts the rest. */
  static final int MOST_POINTS = 10_000;

  private FitJson() {}

  static void write(JsonFile file, Fitted fit) throws IOException {
    file.text("technology", fit.technology());
    file.text("estimator", fit.frontier().isPresent() ? "frontier" : fit.endogeneity().estimator());
    file.text("plantEffects", fit.how().plantEffects());
    file.text("time", fit.how().time());
    file.text("standardErrors", fit.how().standardErrors());
    if (fit.how().scaling().isEmpty()) {
      file.nothing("scaling");
    } else {
      file.numbersByName("scaling", fit.how().scaling());
    }
    file.whole("rows", fit.how().rows());
    file.whole("plants", fit.how().plants());
    file.truth("converged", fit.usable());
    file.text("state", fit.state());
    file.text("covarianceWords", fit.how().covarianceWords());
    file.number("degreesOfFreedom", fit.how().degreesOfFreedom());
    parameters(file, fit.parameters());
    file.matrix("covariance", fit.covariance());
    summary(file, fit.summary());
    file.figures("outputElasticity", fit.outputElasticity());
    file.figure("returnsToScale", fit.returnsToScale());
    pairs(file, "substitution", fit.substitution());
    pairs(file, "demandElasticity", fit.demandElasticity());
    regularity(file, fit);
    RegularityBlocks.write(file, fit);
    curvature(file, "curvature", fit.curvature());
    file.list(
        "nestCurvatures",
        fit.curvature().map(Curvature::further).orElse(List.of()),
        false,
        nest -> curvature(file, nest));
    tests(file, fit.tests());
    file.numbersByName("plantLevels", fit.plantLevels());
    PanelJson.write(file, fit.panel());
    FrontierJson.write(file, fit.frontier());
    EndogeneityJson.write(file, fit.endogeneity());
    file.number("smearing", fit.smearing().orElse(Double.NaN));
    rows(file, fit);
    RefitJson.write(file, fit);
    file.remarks("remarks", fit.remarks());
  }

  static void parameters(JsonFile file, List<Parameter> parameters) throws IOException {
    file.list(
        "parameters",
        parameters,
        true,
        (Parameter parameter) -> {
          file.text("name", parameter.name());
          file.uncertain(parameter.name(), parameter.figure());
          file.number("p", parameter.p());
        });
    List<String> without =
        parameters.stream()
            .filter(parameter -> !Double.isFinite(parameter.p()))
            .map(Parameter::name)
            .toList();
    if (!without.isEmpty()) {
      file.remember(
          "p is null for "
              + Phrases.list(without)
              + ": zero is no value of interest there, or could not be tested.");
    }
  }

  private static void summary(JsonFile file, Optional<Summary> summary) throws IOException {
    if (summary.isEmpty()) {
      file.nothing("summary");
      return;
    }
    Summary s = summary.get();
    file.object(
        "summary",
        () -> {
          file.number("ssr", s.ssr());
          file.number("rSquared", s.rSquared());
          file.number("residualStandardError", s.residualStandardError());
          file.number("logLikelihood", s.logLikelihood());
          file.number("aic", s.aic());
          file.number("bic", s.bic());
          file.number("degreesOfFreedom", s.degreesOfFreedom());
        });
  }

  static void pairs(JsonFile file, String key, List<Pair> pairs) throws IOException {
    file.list(
        key,
        pairs,
        true,
        pair -> {
          file.texts("pair", List.of(pair.first(), pair.second()));
          file.text("measure", pair.measure());
          file.uncertain(
              pair.measure() + " of " + pair.first() + " and " + pair.second(), pair.figure());
        });
  }

  private static void regularity(JsonFile file, Fitted fit) throws IOException {
    if (fit.regularity().isEmpty()) {
      file.nothing("regularity");
      return;
    }
    var regular = fit.regularity().get();
    file.line(
        "regularity",
        () -> {
          file.whole("rows", regular.rows());
          file.whole("monotone", regular.monotone());
          file.whole("quasiConcave", regular.quasiConcave());
          file.whole("both", regular.both());
          file.line(
              "nonMonotoneBy",
              () -> {
                for (var entry : regular.nonMonotoneBy().entrySet()) {
                  file.whole(entry.getKey(), entry.getValue());
                }
              });
        });
  }

  private static void curvature(JsonFile file, String key, Optional<Curvature> curvature)
      throws IOException {
    if (curvature.isEmpty()) {
      file.nothing(key);
      return;
    }
    file.object(key, () -> curvature(file, curvature.get()));
  }

  private static void curvature(JsonFile file, Curvature c) throws IOException {
    file.text("name", c.name());
    file.text("state", c.state());
    file.text("words", c.words());
    file.number("substitutionLow", c.substitutionLow());
    file.number("substitutionHigh", c.substitutionHigh());
    file.remember("the elasticity of substitution", 0, c.substitutionHigh());
    file.number("threshold", c.threshold());
    file.list(
        "curve",
        c.curve(),
        true,
        point -> {
          file.number("curvature", point.curvature());
          file.number("substitution", point.substitution());
          file.number("ssr", point.ssr());
        });
  }

  static void tests(JsonFile file, List<Tested> tests) throws IOException {
    file.list(
        "tests",
        tests,
        false,
        test -> {
          file.text("name", test.name());
          file.text("null", test.nullHypothesis());
          file.number("statistic", test.statistic());
          file.text("distribution", test.distribution());
          file.numbers(
              "df", test.degreesOfFreedom().stream().mapToDouble(Double::doubleValue).toArray());
          file.number("p", test.p());
          file.text("verdict", test.verdict());
        });
  }

  private static void rows(JsonFile file, Fitted fit) throws IOException {
    List<Point> points = fit.points();
    int written = Math.min(points.size(), MOST_POINTS);
    file.list(
        "points",
        points.subList(0, written),
        true,
        point -> {
          file.whole("row", point.row());
          file.text("plant", point.plant());
          file.text("period", point.period());
          file.number("actual", point.actual());
          file.number("fitted", point.fitted());
          file.number("residual", point.residual());
        });
    file.whole("pointsLeftOut", points.size() - written);
    file.list(
        "influence",
        fit.influence(),
        true,
        row -> {
          file.whole("row", row.row());
          file.text("plant", row.plant());
          file.text("period", row.period());
          file.number("leverage", row.leverage());
          file.number("cook", row.cook());
          if (Double.isFinite(row.dffits())) {
            file.number("deletedResidual", row.deletedResidual());
            file.number("dffits", row.dffits());
            file.number("covarianceRatio", row.covarianceRatio());
            file.number("dfbetas", row.dfbetas());
            file.text("dfbetasOf", row.parameter());
            file.whole("beyond", row.beyond());
          }
        });
  }

  static void write(JsonFile file, Given given) throws IOException {
    file.text("name", given.name());
    file.text("technology", given.technology());
    file.numbersByName("parameters", given.parameters());
    file.numbersByName("outputElasticity", given.outputElasticity());
    file.number("returnsToScale", given.returnsToScale());
    file.list(
        "substitution",
        given.substitution(),
        true,
        pair -> {
          file.texts("pair", List.of(pair.first(), pair.second()));
          file.text("measure", pair.measure());
          file.number("value", pair.figure().value());
        });
    file.remarks("remarks", given.remarks());
  }
}

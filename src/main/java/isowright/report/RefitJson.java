package isowright.report;

import isowright.study.Figure;
import isowright.study.Figure.Drawn;
import isowright.study.Figure.Span;
import isowright.study.Figure.Without;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.RobustnessFindings;
import isowright.study.RobustnessFindings.Beyond;
import isowright.study.RobustnessFindings.Huber;
import isowright.study.RobustnessFindings.Resampling;
import isowright.study.RobustnessFindings.Wild;
import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * What figures are in refits, and how far a fit stands when looked at in other ways, as they stand
 * in the findings file. What could not be had is left out here; the owner's remarks say why.
 */
final class RefitJson {

  private RefitJson() {}

  static void write(JsonFile file, Fitted fit) throws IOException {
    Map<String, Figure> figures = new LinkedHashMap<>();
    fit.returnsToScale().ifPresent(figure -> figures.put("returnsToScale", figure));
    fit.outputElasticity()
        .forEach((input, figure) -> figures.put("outputElasticity." + input, figure));
    for (Pair pair : fit.substitution()) {
      figures.put(
          "substitution." + pair.measure() + "." + pair.first() + "." + pair.second(),
          pair.figure());
    }
    refits(file, figures);
    robustness(file, fit.robustness());
  }

  static void write(JsonFile file, Planned plan) throws IOException {
    Map<String, Figure> figures = new LinkedHashMap<>();
    plan.cost().ifPresent(figure -> figures.put("cost", figure));
    plan.marginalCost().ifPresent(figure -> figures.put("marginalCost", figure));
    plan.averageCost().ifPresent(figure -> figures.put("averageCost", figure));
    plan.mix().forEach((input, figure) -> figures.put("mix." + input, figure));
    plan.shares().forEach((input, figure) -> figures.put("shares." + input, figure));
    refits(file, figures);
  }

  static void write(JsonFile file, Reviewed review) throws IOException {
    Map<String, Figure> figures = new LinkedHashMap<>();
    review.leastCost().ifPresent(figure -> figures.put("leastCost", figure));
    review.gap().ifPresent(figure -> figures.put("gap", figure));
    review.technical().ifPresent(figure -> figures.put("technical", figure));
    review.mix().ifPresent(figure -> figures.put("mix", figure));
    refits(file, figures);
  }

  private static void refits(JsonFile file, Map<String, Figure> figures) throws IOException {
    List<Map.Entry<String, Figure>> refitted = new ArrayList<>(figures.entrySet());
    refitted.removeIf(entry -> entry.getValue().refits().none());
    file.list(
        "refits",
        refitted,
        true,
        entry -> {
          file.text("figure", entry.getKey());
          Figure.Refits refits = entry.getValue().refits();
          if (refits.drawn().isPresent()) {
            Drawn drawn = refits.drawn().get();
            file.line("drawn", () -> drawn(file, drawn));
          }
          if (refits.withoutPlant().isPresent()) {
            Without without = refits.withoutPlant().get();
            file.line("withoutPlant", () -> without(file, without));
          }
          if (refits.withoutPeriod().isPresent()) {
            Without without = refits.withoutPeriod().get();
            file.line("withoutPeriod", () -> without(file, without));
          }
        });
  }

  private static void drawn(JsonFile file, Drawn drawn) throws IOException {
    file.whole("draws", drawn.draws());
    file.whole("failed", drawn.failed());
    known(file, "mean", drawn.mean());
    known(file, "se", drawn.standardError());
    known(file, "percentile", drawn.percentile());
    known(file, "biasCorrected", drawn.corrected());
    known(file, "accelerated", drawn.accelerated());
    known(file, "analyticSe", drawn.analytic());
    known(file, "analytic", drawn.analyticInterval());
  }

  private static void without(JsonFile file, Without without) throws IOException {
    file.text("name", without.name());
    file.number("value", without.value());
    file.whole("lost", without.lost());
  }

  private static void known(JsonFile file, String key, double value) throws IOException {
    if (Double.isFinite(value)) {
      file.number(key, value);
    }
  }

  private static void known(JsonFile file, String key, Span span) throws IOException {
    if (Double.isFinite(span.low()) && Double.isFinite(span.high())) {
      file.numbers(key, new double[] {span.low(), span.high()});
    }
  }

  private static void robustness(JsonFile file, RobustnessFindings found) throws IOException {
    file.object(
        "robustness",
        () -> {
          if (found.resampling().isPresent()) {
            Resampling resampling = found.resampling().get();
            file.line("resampling", () -> resampling(file, resampling));
          }
          file.list("wild", found.wild(), true, wild -> wild(file, wild));
          if (found.influence().isPresent()) {
            Beyond beyond = found.influence().get();
            file.line("influence", () -> beyond(file, beyond));
          }
          if (found.huber().isPresent()) {
            Huber huber = found.huber().get();
            file.object("huber", () -> huber(file, huber));
          }
        });
  }

  private static void resampling(JsonFile file, Resampling resampling) throws IOException {
    file.whole("draws", resampling.draws());
    file.whole("seed", resampling.seed());
    file.text("units", resampling.units());
    file.whole("count", resampling.count());
    file.whole("lostRank", resampling.lostRank());
    file.whole("withoutOptimum", resampling.withoutOptimum());
  }

  private static void wild(JsonFile file, Wild wild) throws IOException {
    file.text("name", wild.name());
    file.text("null", wild.nullHypothesis());
    known(file, "statistic", wild.statistic());
    file.whole("draws", wild.draws());
    file.text("weights", wild.weights());
    known(file, "p", wild.p());
    file.text("verdict", wild.verdict());
  }

  private static void beyond(JsonFile file, Beyond beyond) throws IOException {
    file.number("leverage", beyond.leverage());
    file.number("deletedResidual", beyond.deletedResidual());
    file.number("dffits", beyond.dffits());
    file.number("dfbetas", beyond.dfbetas());
    file.number("covarianceRatio", beyond.covarianceRatio());
    file.whole("several", beyond.several());
    file.whole("rows", beyond.rows());
  }

  private static void huber(JsonFile file, Huber huber) throws IOException {
    file.number("scale", huber.scale());
    file.whole("lessened", huber.lessened());
    file.whole("rows", huber.rows());
    file.list(
        "compared",
        huber.compared(),
        true,
        compared -> {
          file.text("figure", compared.figure());
          file.number("leastSquares", compared.value());
          file.number("huber", compared.huber());
          known(file, "apart", compared.apart());
        });
  }
}

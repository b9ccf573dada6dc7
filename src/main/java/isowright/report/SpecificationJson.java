package isowright.report;

import isowright.study.SpecificationFindings;
import isowright.study.SpecificationFindings.Predicted;
import java.io.IOException;

/** The specification as a whole, as it stands in the findings file. */
final class SpecificationJson {

  private SpecificationJson() {}

  static void write(JsonFile file, SpecificationFindings found) throws IOException {
    file.object("specification", () -> specification(file, found));
    file.list(
        "expectations",
        found.expectations(),
        false,
        expected -> {
          file.text("figure", expected.figure());
          file.texts("of", expected.of());
          file.text("technology", expected.technology());
          file.number("expectedLow", expected.low());
          file.number("expectedHigh", expected.high());
          file.remember("what was expected", expected.low(), expected.high());
          file.figure("found", expected.found());
          file.text("verdict", expected.agreement().word());
        });
    file.list(
        "decisions",
        found.decisions(),
        false,
        decision -> {
          file.text("date", decision.date());
          file.text("by", decision.by());
          file.text("what", decision.what());
          file.text("why", decision.why());
        });
    if (found.simultaneity().isPresent()) {
      file.object("beforeFitting", () -> SimultaneityJson.write(file, found.simultaneity().get()));
    }
    if (found.zeros().isPresent()) {
      file.object("zeros", () -> MatrixJson.zeros(file, found.zeros().get()));
    }
    if (found.matrix().isPresent()) {
      file.object("matrix", () -> MatrixJson.write(file, found.matrix().get()));
    }
  }

  private static void specification(JsonFile file, SpecificationFindings found) throws IOException {
    file.list(
        "varianceInflation",
        found.inflation(),
        true,
        factor -> {
          file.text("technology", factor.technology());
          file.text("parameter", factor.parameter());
          file.number("raw", factor.raw());
          file.number("centred", factor.centred());
        });
    file.list(
        "comparisons",
        found.comparisons(),
        false,
        comparison -> {
          file.text("first", comparison.first());
          file.text("second", comparison.second());
          FitJson.tests(file, comparison.tests());
          file.text("words", comparison.words());
        });
    file.list("predictions", found.predictions(), false, p -> predicted(file, p));
  }

  private static void predicted(JsonFile file, Predicted predicted) throws IOException {
    file.text("technology", predicted.technology());
    file.text("judged", predicted.judged());
    file.number("error", predicted.error());
    if (predicted.levelError().isPresent()) {
      file.number("levelError", predicted.levelError().get());
    }
    if (predicted.spread().isPresent()) {
      file.number("spread", predicted.spread().get());
    }
    if (predicted.difference().isPresent()) {
      file.figure("difference", predicted.difference());
    }
    file.whole("plants", predicted.plants());
    file.whole("folds", predicted.folds());
    file.whole("failed", predicted.failed());
    file.text("verdict", predicted.verdict());
  }
}

package isowright.report;

import isowright.study.SpecificationFindings;
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
  }
}

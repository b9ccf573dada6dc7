package isowright.report;

import isowright.study.EndogeneityFindings;
import isowright.study.EndogeneityFindings.Beside;
import java.io.IOException;
import java.util.Optional;

/** What a fit found about inputs chosen knowing productivity, as it stands in the findings file. */
final class EndogeneityJson {

  private EndogeneityJson() {}

  /** Nothing where nothing was asked. */
  static void write(JsonFile file, EndogeneityFindings found) throws IOException {
    if (found.asked()) {
      file.object("endogeneity", () -> asked(file, found));
    }
  }

  private static void asked(JsonFile file, EndogeneityFindings found) throws IOException {
    file.texts("inputs", found.inputs());
    file.texts("standIns", found.standIns());
    file.whole("rowsUnknown", found.rowsUnknown());
    file.text("expected", found.expected());
    file.text("shifts", found.shifts());
    if (!found.firstStages().isEmpty()) {
      firstStages(file, found);
    }
    if (found.anywhere().isPresent()) {
      EndogeneityFindings.Anywhere set = found.anywhere().get();
      file.object(
          "andersonRubin",
          () -> {
            file.text("column", set.column());
            file.list(
                "pieces",
                set.pieces(),
                true,
                piece -> {
                  // An end that is left out is open.
                  if (Double.isFinite(piece.low())) {
                    file.number("low", piece.low());
                  }
                  if (Double.isFinite(piece.high())) {
                    file.number("high", piece.high());
                  }
                });
          });
    }
    file.list("estimators", found.beside(), false, beside -> beside(file, beside));
    file.texts("words", found.words());
  }

  private static void firstStages(JsonFile file, EndogeneityFindings found) throws IOException {
    file.list(
        "firstStages",
        found.firstStages(),
        true,
        stage -> {
          file.text("column", stage.column());
          file.number("partialRSquared", stage.partialShare());
          file.number("f", stage.f());
          file.numbers("df", new double[] {stage.numerator(), stage.denominator()});
          file.number("effectiveF", stage.effective());
          if (stage.conditional().isPresent()) {
            file.number("conditionalF", stage.conditional().get());
          }
          file.truth("weak", stage.weak());
        });
  }

  private static void beside(JsonFile file, Beside beside) throws IOException {
    file.text("estimator", beside.estimator());
    file.text("note", beside.note());
    file.whole("rows", beside.rows());
    if (!beside.elasticity().isEmpty()) {
      file.figures("outputElasticity", beside.elasticity());
      file.figure("returnsToScale", Optional.of(beside.scale().orElseThrow()));
    }
  }
}

package isowright.report;

import isowright.study.Findings;
import isowright.study.Findings.Records;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Regular;
import java.io.IOException;
import java.util.List;

/**
 * The technology file: the technologies with what it takes to ask them later, without the records.
 *
 * <p>It holds every usable fit with its parameters, their covariance, the point by which inputs are
 * divided, the plants' levels, the ranges of the records and how far the technology is regular, and
 * the technologies taken as known; and the hashes of the files from which all that came.
 *
 * <p>Tested in {@code TechnologyJsonTest}.
 */
public final class TechnologyJson {

  private TechnologyJson() {}

  /** The technology file, UTF-8. */
  public static byte[] write(Findings findings) {
    return JsonFile.of(file -> write(file, findings));
  }

  private static void write(JsonFile file, Findings findings) throws IOException {
    FindingsJson.program(file, findings);
    file.object(
        "study",
        () -> {
          file.text("title", findings.run().title());
          file.text("file", findings.run().studyFile());
          file.text("sha256", findings.run().studySha256());
        });
    file.number("confidence", findings.confidence());
    FindingsJson.units(file, findings.units());
    records(file, findings);
    List<Fitted> usable = findings.fits().stream().filter(Fitted::usable).toList();
    file.list("technologies", usable, false, fit -> fitted(file, findings, fit));
    file.list("given", findings.given(), false, given -> given(file, findings, given));
    HandoverJson.write(file, findings.handover(), List.copyOf(findings.units().inputs().keySet()));
  }

  private static void records(JsonFile file, Findings findings) throws IOException {
    if (findings.records().isEmpty()) {
      file.nothing("records");
      return;
    }
    Records records = findings.records().get();
    file.object(
        "records",
        () -> {
          file.text("file", records.file());
          file.text("sha256", records.sha256());
          file.whole("used", records.used());
          file.text("firstPeriod", records.firstPeriod());
          file.text("lastPeriod", records.lastPeriod());
          file.list(
              "ranges",
              records.columns(),
              true,
              column -> {
                file.text("column", column.column());
                file.text("role", column.role());
                file.text("unit", column.unit());
                file.number("least", column.least());
                file.number("most", column.most());
              });
        });
  }

  private static void fitted(JsonFile file, Findings findings, Fitted fit) throws IOException {
    file.text("technology", fit.technology());
    file.text("state", fit.state());
    file.texts("inputs", List.copyOf(findings.units().inputs().keySet()));
    file.text("plantEffects", fit.how().plantEffects());
    file.text("time", fit.how().time());
    if (fit.how().scaling().isEmpty()) {
      file.nothing("scaling");
    } else {
      file.numbersByName("scaling", fit.how().scaling());
    }
    file.list(
        "parameters",
        fit.parameters(),
        true,
        parameter -> {
          file.text("name", parameter.name());
          file.number("value", parameter.figure().value());
        });
    file.text("standardErrors", fit.how().standardErrors());
    file.text("covarianceWords", fit.how().covarianceWords());
    file.number("degreesOfFreedom", fit.how().degreesOfFreedom());
    file.matrix("covariance", fit.covariance());
    file.numbersByName("plantLevels", fit.plantLevels());
    FrontierJson.technology(file, fit.frontier());
    file.number("smearing", fit.smearing().orElse(Double.NaN));
    file.list(
        "productivity",
        findings.plans().stream()
            .filter(plan -> plan.technology().equals(fit.technology()))
            .toList(),
        true,
        plan -> {
          file.text("question", plan.question());
          file.text("words", plan.productivity());
        });
    regularity(file, fit);
  }

  private static void regularity(JsonFile file, Fitted fit) throws IOException {
    if (fit.regularity().isEmpty()) {
      file.nothing("regularity");
      return;
    }
    Regular regular = fit.regularity().get();
    file.line(
        "regularity",
        () -> {
          file.whole("rows", regular.rows());
          file.whole("monotone", regular.monotone());
          file.whole("quasiConcave", regular.quasiConcave());
          file.whole("both", regular.both());
        });
  }

  private static void given(JsonFile file, Findings findings, Given given) throws IOException {
    file.text("name", given.name());
    file.text("technology", given.technology());
    file.texts("inputs", List.copyOf(findings.units().inputs().keySet()));
    file.numbersByName("parameters", given.parameters());
  }
}

package isowright.report;

import isowright.study.Findings;
import isowright.study.Findings.Described;
import isowright.study.Findings.Records;
import isowright.study.Findings.Units;
import java.io.IOException;
import java.util.List;

/**
 * The findings file: every figure at full precision, for programs.
 *
 * <p>A contract. An estimated figure is an object {@code {value, se, low, high, method}}, an exact
 * one a plain number, one that could not be had {@code null}, and the nearest remarks say why. Keys
 * are added in later versions, never renamed or dropped. The same findings give the same bytes.
 *
 * <p>Tested in {@code FindingsJsonTest}.
 */
public final class FindingsJson {

  /** The version of the format. */
  static final int FORMAT = 1;

  private FindingsJson() {}

  /** The findings file, UTF-8. */
  public static byte[] write(Findings findings) {
    return JsonFile.of(file -> write(file, findings));
  }

  private static void write(JsonFile file, Findings findings) throws IOException {
    program(file, findings);
    study(file, findings);
    file.number("confidence", findings.confidence());
    units(file, findings.units());
    records(file, findings);
    file.list("fits", findings.fits(), false, fit -> FitJson.write(file, fit));
    file.list("given", findings.given(), false, given -> FitJson.write(file, given));
    file.list("leastCost", findings.plans(), false, plan -> PlanJson.write(file, plan));
    file.list("filing", findings.reviews(), false, review -> PlanJson.write(file, review));
    ReviewJson.write(file, findings.review());
    SpecificationJson.write(file, findings.specification());
    CostJson.write(file, findings.costs());
    file.remarks("remarks", findings.remarks());
  }

  static void program(JsonFile file, Findings findings) throws IOException {
    file.object(
        "isowright",
        () -> {
          file.text("version", findings.run().version());
          file.whole("format", FORMAT);
        });
  }

  private static void study(JsonFile file, Findings findings) throws IOException {
    file.object(
        "study",
        () -> {
          file.text("title", findings.run().title());
          file.text("file", findings.run().studyFile());
          file.text("sha256", findings.run().studySha256());
          file.textsByName("settings", findings.run().settings());
        });
  }

  static void units(JsonFile file, Units units) throws IOException {
    file.object(
        "units",
        () -> {
          file.text("output", units.output());
          file.textsByName("inputs", units.inputs());
          file.text("money", units.money());
        });
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
          file.whole("rows", records.rows());
          file.whole("used", records.used());
          file.whole("plants", records.plants());
          file.whole("periods", records.periods());
          file.text("firstPeriod", records.firstPeriod());
          file.text("lastPeriod", records.lastPeriod());
          file.textsByName("facts", records.facts());
          columns(file, records);
          file.list(
              "setAside",
              records.setAside(),
              false,
              aside -> {
                file.text("reason", aside.reason());
                file.whole("count", aside.count());
                file.wholes("rows", aside.rows());
              });
          file.remarks("remarks", records.remarks());
        });
  }

  private static void columns(JsonFile file, Records records) throws IOException {
    file.list(
        "columns",
        records.columns(),
        false,
        column -> {
          file.text("column", column.column());
          file.text("role", column.role());
          file.text("unit", column.unit());
          file.whole("count", column.count());
          file.number("mean", column.mean());
          file.number("standardDeviation", column.standardDeviation());
          file.number("least", column.least());
          file.number("most", column.most());
          file.number("withinShare", column.withinShare().orElse(Double.NaN));
        });
    List<String> without =
        records.columns().stream()
            .filter(column -> column.withinShare().isEmpty())
            .map(Described::column)
            .toList();
    if (!without.isEmpty()) {
      file.remember(
          "withinShare is null for "
              + Phrases.list(without)
              + ": no plant is seen twice there, or the column does not vary.");
    }
  }
}

package isowright.report;

import isowright.runs.Comparison;
import isowright.runs.Comparison.Change;
import isowright.runs.RowChanges;
import isowright.runs.StoredRun;
import java.io.IOException;
import java.util.Optional;

/** What changed between two runs, as a file for programs: {@code compare.json}. */
public final class ComparisonJson {

  /** The file's name. */
  public static final String NAME = "compare.json";

  private ComparisonJson() {}

  /** The file of a comparison; what does not exist on one side is left out there. */
  public static byte[] write(Comparison comparison) {
    return JsonFile.of(file -> whole(file, comparison));
  }

  private static void whole(JsonFile file, Comparison comparison) throws IOException {
    run(file, "earlier", comparison.before());
    run(file, "later", comparison.after());
    file.truth("sameRecords", comparison.sameRecords());
    file.truth("sameStudy", comparison.sameStudy());
    if (comparison.rows().isPresent()) {
      file.object("rows", () -> rows(file, comparison.rows().get()));
    }
    file.list(
        "settings",
        comparison.settings(),
        true,
        setting -> {
          file.text("key", setting.key());
          text(file, "earlier", setting.before());
          text(file, "later", setting.after());
        });
    file.list("figures", comparison.changes(), false, change -> change(file, change));
    file.texts("remarks", comparison.remarks());
  }

  private static void run(JsonFile file, String key, StoredRun run) throws IOException {
    file.object(
        key,
        () -> {
          file.text("title", run.title());
          file.text("version", run.record().version());
          file.text("study", run.record().study().sha256());
          text(file, "records", run.record().records().map(entry -> entry.sha256()));
          file.text("made", run.record().end().toString());
        });
  }

  private static void rows(JsonFile file, RowChanges rows) throws IOException {
    file.whole("same", rows.same());
    file.whole("corrected", rows.correctedRows());
    file.list("added", rows.added(), true, row -> row(file, row));
    file.list("removed", rows.removed(), true, row -> row(file, row));
    file.list(
        "cells",
        rows.corrected(),
        true,
        cell -> {
          row(file, cell.row());
          file.text("column", cell.column());
          number(file, "earlier", cell.before());
          number(file, "later", cell.after());
        });
  }

  private static void row(JsonFile file, RowChanges.Row row) throws IOException {
    file.text("plant", row.plant());
    file.text("period", row.period());
    file.whole("row", row.fileRow());
  }

  private static void change(JsonFile file, Change change) throws IOException {
    file.text("part", change.kind().words());
    file.text("of", change.of());
    file.text("figure", change.figure());
    if (change.before().isPresent()) {
      file.figure("earlier", change.before());
    }
    if (change.after().isPresent()) {
      file.figure("later", change.after());
    }
    number(file, "change", change.difference());
    number(file, "fromRecords", change.fromRecords());
    number(file, "fromSettings", change.fromSettings());
  }

  private static void number(JsonFile file, String key, Optional<Double> value) throws IOException {
    if (value.isPresent()) {
      file.number(key, value.get());
    }
  }

  private static void text(JsonFile file, String key, Optional<String> value) throws IOException {
    if (value.isPresent()) {
      file.text(key, value.get());
    }
  }
}

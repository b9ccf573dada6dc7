package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Column;
import isowright.report.Document.Definitions;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.Findings.Run;
import java.util.ArrayList;
import java.util.List;

/** The run record: version, hashes, every setting in force. */
final class RunSection {

  static final String ID = "run";

  private RunSection() {}

  static Section of(Material material) {
    Run run = material.findings().run();
    List<Entry> entries = new ArrayList<>();
    entries.add(Entry.of("Isowright", run.version()));
    boolean handed = material.handedOver();
    String read = handed ? "technology file" : "study";
    entries.add(Entry.of(handed ? "Technology file" : "Study file", run.studyFile()));
    entries.add(new Entry(Text.of("SHA-256 of the " + read), Text.typed(run.studySha256())));
    material
        .findings()
        .records()
        .ifPresent(
            records -> {
              entries.add(Entry.of("Records file", records.file()));
              entries.add(
                  new Entry(Text.of("SHA-256 of the records"), Text.typed(records.sha256())));
            });
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "The same version given the same files gives the same figures. The findings file beside"
                + " this report holds every figure at full precision."));
    blocks.add(new Definitions(entries));
    List<Row> rows = new ArrayList<>();
    run.settings()
        .forEach(
            (key, value) -> rows.add(new Row(Text.typed(key), List.of(Document.Cell.of(value)))));
    if (!rows.isEmpty()) {
      blocks.add(
          new Table(
              "Settings in force, defaults included",
              "Key of the study file",
              List.of(Column.ofWords("Value")),
              List.of(Group.of(rows)),
              List.of()));
    }
    return new Section(ID, "Run record", blocks);
  }
}

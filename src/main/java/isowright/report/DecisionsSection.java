package isowright.report;

import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.Protocol.Decision;
import java.util.List;
import java.util.Optional;

/** The decisions that were taken about records and methods, as the study file states them. */
final class DecisionsSection {

  static final String ID = "decisions";

  private DecisionsSection() {}

  /** The section; absent where no decision is stated. */
  static Optional<Section> of(Material material) {
    List<Decision> decisions = material.findings().specification().decisions();
    if (decisions.isEmpty()) {
      return Optional.empty();
    }
    List<Row> rows =
        decisions.stream().map(d -> Row.of(d.date(), List.of(d.by(), d.what(), d.why()))).toList();
    return Optional.of(
        new Section(
            ID,
            "Decisions",
            List.of(
                Paragraph.of(
                    "Decisions taken by people, as stated in the study file; they are printed and not"
                        + " carried out. What was done follows from the settings in the run record."),
                new Table(
                    "Decisions",
                    "Date",
                    List.of(Column.ofWords("By"), Column.ofWords("What"), Column.ofWords("Why")),
                    List.of(Group.of(rows)),
                    List.of()))));
  }
}

package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.runs.Comparison;
import isowright.runs.RowChanges;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What changed in the records, row by row and cell by cell. */
final class ComparedRecords {

  /** Rows and cells shown on the page; the file has all. */
  private static final int MOST = 60;

  private ComparedRecords() {}

  static Section section(Comparison comparison) {
    List<Block> blocks = new ArrayList<>();
    Optional<RowChanges> rows = comparison.rows();
    if (comparison.sameRecords()) {
      blocks.add(Paragraph.of("Both runs read the same file, byte for byte."));
    } else if (rows.isEmpty()) {
      blocks.add(
          Paragraph.of(
              "The files differ, but they could not both be read again, so rows are not"
                  + " compared."));
    } else {
      blocks.add(Paragraph.of(words(rows.get())));
      rows("Rows added", rows.get().added()).ifPresent(blocks::add);
      rows("Rows removed", rows.get().removed()).ifPresent(blocks::add);
      cells(rows.get().corrected()).ifPresent(blocks::add);
    }
    return new Section("records", "Records", blocks);
  }

  /** The counts in a sentence. */
  static String words(RowChanges rows) {
    return "Of the rows that both studies use, "
        + rows.same()
        + (rows.same() == 1 ? " is" : " are")
        + " the same and "
        + rows.correctedRows()
        + " corrected"
        + (rows.correctedRows() > 0
            ? " (in " + Phrases.count(rows.corrected().size(), "cell") + ")"
            : "")
        + "; "
        + Phrases.count(rows.added().size(), "row was", "rows were")
        + " added and "
        + rows.removed().size()
        + " removed.";
  }

  private static Optional<Block> rows(String caption, List<RowChanges.Row> rows) {
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    List<Row> lines =
        rows.stream()
            .limit(MOST)
            .map(
                row ->
                    new Row(
                        Text.of(row.plant()),
                        List.of(Cell.of(row.period()), Cell.of(Numbers.count(row.fileRow())))))
            .toList();
    return Optional.of(
        new Table(
            caption,
            "Plant",
            List.of(Column.ofWords("Period"), Column.ofNumbers("Row of its file", "")),
            List.of(Group.of(lines)),
            shortened(rows.size())));
  }

  private static Optional<Block> cells(List<RowChanges.Cell> cells) {
    if (cells.isEmpty()) {
      return Optional.empty();
    }
    List<Row> lines =
        cells.stream()
            .limit(MOST)
            .map(
                cell ->
                    new Row(
                        Text.of(cell.row().plant()),
                        List.of(
                            Cell.of(cell.row().period()),
                            Cell.of(cell.column()),
                            Cell.of(amount(cell.before())),
                            Cell.of(amount(cell.after())))))
            .toList();
    return Optional.of(
        new Table(
            "Cells corrected",
            "Plant",
            List.of(
                Column.ofWords("Period"),
                Column.ofWords("Column"),
                Column.ofNumbers("Earlier", ""),
                Column.ofNumbers("Later", "")),
            List.of(Group.of(lines)),
            shortened(cells.size())));
  }

  private static List<Text> shortened(int all) {
    return all > MOST
        ? List.of(Text.of("The first " + MOST + " of " + all + "; compare.json has all."))
        : List.of();
  }

  private static String amount(Optional<Double> value) {
    return value.map(Numbers::amount).orElse("blank");
  }
}

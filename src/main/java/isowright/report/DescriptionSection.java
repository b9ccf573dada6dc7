package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.Findings.Described;
import java.util.ArrayList;
import java.util.List;

/** Descriptive statistics: what each column looks like, and how its spread is divided. */
final class DescriptionSection {

  static final String ID = "description";

  /** Below this share of variance within plants, plant effects leave little to learn from. */
  private static final double LITTLE_WITHIN = 0.05;

  private static final int SPREAD_DIGITS = 3;

  private DescriptionSection() {}

  static Section of(Material material) {
    List<Described> columns = material.findings().records().orElseThrow().columns();
    List<Block> blocks = new ArrayList<>();
    boolean repeated = columns.stream().anyMatch(column -> column.withinShare().isPresent());
    blocks.add(
        Paragraph.of(
            repeated
                ? "The spread of a column is divided into what differs between plants and what moves"
                    + " within a plant over time. Estimates with plant effects learn from the second"
                    + " part alone."
                : "Plants are not seen repeatedly, so that all spread lies between plants."));
    blocks.add(table(columns, repeated));
    warn(columns, blocks);
    return new Section(ID, "What the records look like", blocks);
  }

  private static Table table(List<Described> columns, boolean repeated) {
    List<Column> heads = new ArrayList<>();
    heads.add(Column.ofWords("Role"));
    for (String head : List.of("Values", "Mean", "Standard deviation", "Least", "Greatest")) {
      heads.add(Column.ofNumbers(head, ""));
    }
    if (repeated) {
      heads.add(Column.ofNumbers("Spread within plants", ""));
      heads.add(Column.ofNumbers("Spread between plants", ""));
    }
    List<Row> rows = new ArrayList<>();
    for (Described column : columns) {
      rows.add(new Row(Text.of(named(column)), cells(column, repeated)));
    }
    return new Table(
        "Columns used",
        "Column",
        heads,
        List.of(Group.of(rows)),
        repeated
            ? List.of(
                Text.of(
                    "Spread is the share of the variance, of logs where all values are positive."))
            : List.of());
  }

  private static String named(Described column) {
    return column.unit().isEmpty() ? column.column() : column.column() + " (" + column.unit() + ")";
  }

  private static List<Cell> cells(Described column, boolean repeated) {
    List<Cell> cells = new ArrayList<>();
    cells.add(Cell.of(column.role()));
    cells.add(Cell.of(Numbers.count(column.count())));
    cells.add(Cell.of(Numbers.besideSpread(column.mean(), column.standardDeviation())));
    cells.add(Cell.of(Numbers.significant(column.standardDeviation(), SPREAD_DIGITS)));
    cells.add(Cell.of(Numbers.whole(column.least())));
    cells.add(Cell.of(Numbers.whole(column.most())));
    if (repeated) {
      cells.add(column.withinShare().map(w -> Cell.of(Numbers.percent(w))).orElse(Cell.none()));
      cells.add(column.withinShare().map(w -> Cell.of(Numbers.percent(1 - w))).orElse(Cell.none()));
    }
    return cells;
  }

  private static void warn(List<Described> columns, List<Block> blocks) {
    List<String> still =
        columns.stream()
            .filter(column -> column.withinShare().orElse(1.0) < LITTLE_WITHIN)
            .map(Described::column)
            .toList();
    if (!still.isEmpty()) {
      blocks.add(
          new Notice(
              Weight.WARNING,
              Text.of(
                  Phrases.list(still)
                      + (still.size() == 1 ? " hardly moves" : " hardly move")
                      + " within plants (less than "
                      + Numbers.level(LITTLE_WITHIN)
                      + " of the spread). An estimate with plant effects has little to learn from"
                      + (still.size() == 1 ? " it" : " them")
                      + ", and may be far off.")));
    }
  }
}

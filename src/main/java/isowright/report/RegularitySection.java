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
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Regular;
import java.util.ArrayList;
import java.util.List;

/** Regularity at every row, with what follows from it. */
final class RegularitySection {

  static final String ID = "regularity";

  private RegularitySection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "A technology makes economic sense at a mix of inputs only if more of any input gives"
                + " more output (every marginal product is positive) and its isoquants bend toward"
                + " the origin (it is quasi-concave). One does not imply the other, so both are"
                + " examined at every row of the records."));
    List<Row> rows = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      fit.regularity()
          .ifPresent(r -> rows.add(new Row(Text.of(Terms.technology(fit.technology())), cells(r))));
    }
    if (rows.isEmpty()) {
      blocks.add(
          Paragraph.of("No fitted technology has a result whose regularity could be examined."));
    } else {
      blocks.add(table(rows));
      for (Fitted fit : material.usable()) {
        fit.regularity().ifPresent(regular -> consequence(fit, regular, blocks));
      }
      blocks.addAll(RegularityBlocks.of(material.usable()));
    }
    return new Section(ID, "Regularity", blocks);
  }

  private static List<Cell> cells(Regular regular) {
    return List.of(
        Cell.of(Numbers.count(regular.rows())),
        Cell.of(Numbers.count(regular.monotone())),
        Cell.of(Numbers.count(regular.quasiConcave())),
        Cell.of(Numbers.count(regular.both())));
  }

  private static Table table(List<Row> rows) {
    return new Table(
        "Rows at which each technology is regular",
        "Technology",
        List.of(
            Column.ofNumbers("Rows examined", ""),
            Column.ofNumbers("Marginal products positive", ""),
            Column.ofNumbers("Quasi-concave", ""),
            Column.ofNumbers("Both", "")),
        List.of(Group.of(rows)),
        List.of());
  }

  private static void consequence(Fitted fit, Regular regular, List<Block> blocks) {
    String name = Terms.technology(fit.technology());
    Text words = Text.strong(name + ". ").then(Phrases.regularity(regular));
    List<String> where = new ArrayList<>();
    regular
        .nonMonotoneBy()
        .forEach(
            (input, rows) -> {
              if (rows > 0) {
                where.add(input + " at " + Phrases.count(rows, "row"));
              }
            });
    if (!where.isEmpty()) {
      words = words.then(" The marginal product is not positive for " + Phrases.list(where) + ".");
    }
    if (regular.imposable() && regular.both() < regular.rows()) {
      words =
          words.then(
              " Remedy: `estimation: {regularity: everywhere}` fits the form held to be regular at"
                  + " every row, and states the price in fit.");
    }
    boolean regularEverywhere = regular.rows() > 0 && regular.both() == regular.rows();
    blocks.add(regularEverywhere ? new Paragraph(words) : new Notice(Weight.WARNING, words));
  }
}

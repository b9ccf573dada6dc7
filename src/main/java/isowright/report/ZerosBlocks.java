package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.MatrixFindings;
import isowright.study.MatrixFindings.Headline;
import isowright.study.ZerosFindings;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** The policies for zeros and missing values in words, and what the other one would do. */
final class ZerosBlocks {

  private ZerosBlocks() {}

  /** The headline figures under both policies; nothing where no row does without an input. */
  static List<Block> of(Material material) {
    return material.findings().specification().zeros().map(ZerosBlocks::of).orElse(List.of());
  }

  private static List<Block> of(ZerosFindings zeros) {
    List<String> rows = new ArrayList<>();
    for (Map.Entry<String, Integer> input : zeros.rows().entrySet()) {
      rows.add(input.getKey() + " in " + Phrases.count(input.getValue(), "row"));
    }
    boolean dummy = zeros.policy().equals(ZerosFindings.DUMMY);
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "Some rows do without an input ("
                + Phrases.list(rows)
                + "). In force is the policy "
                + zeros.policy()
                + (dummy
                    ? ": the rows are kept, the input’s log is replaced by that of its base, and a"
                        + " dummy says where (Battese 1997). Elasticities and plans hold for"
                        + " mixes in which every input is used; a form other than Cobb-Douglas"
                        + " also depends on what the log is replaced by."
                    : ": the rows are set aside.")
                + " The table shows what the other policy would say."));
    blocks.add(table(zeros));
    List<Text> reasons = new ArrayList<>();
    for (MatrixFindings.Cell cell : zeros.cells()) {
      cell.reasons()
          .forEach(reason -> reasons.add(Text.strong(name(cell, zeros) + ": ").then(reason)));
    }
    if (!reasons.isEmpty()) {
      blocks.add(new Points(false, reasons));
    }
    return blocks;
  }

  private static String name(MatrixFindings.Cell cell, ZerosFindings zeros) {
    return Terms.technology(cell.technology())
        + ", "
        + cell.sample()
        + (cell.sample().equals(zeros.policy()) ? " (in force)" : "");
  }

  private static Table table(ZerosFindings zeros) {
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofNumbers("Rows", ""));
    for (Headline headline : zeros.headlines()) {
      columns.add(Column.ofNumbers(Phrases.sentence(headline.words()), headline.unit()));
    }
    List<Row> rows = new ArrayList<>();
    for (MatrixFindings.Cell cell : zeros.cells()) {
      List<Cell> cells = new ArrayList<>();
      cells.add(
          cell.estimated()
              ? Cell.of(Numbers.count(cell.rows()))
              : Cell.of(Terms.state(cell.state())));
      for (Headline headline : zeros.headlines()) {
        cells.add(
            Cells.figure(cell.figure(headline.name()).filter(f -> Double.isFinite(f.value()))));
      }
      rows.add(new Row(Text.of(name(cell, zeros)), cells));
    }
    return new Table(
        "Headline figures by the policy for zeros",
        "Technology, policy",
        columns,
        List.of(Group.of(rows)),
        List.of());
  }
}

package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.MatrixFindings;
import isowright.study.MatrixFindings.Headline;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Annex: the headline figures under every combination of a specification matrix, ordered, with the
 * one that the criteria laid down beforehand choose; and the line of the main text that sums it up.
 */
final class MatrixSection {

  static final String ID = "matrix";

  private MatrixSection() {}

  /** The annex; absent where no matrix was asked for. */
  static Optional<Section> of(Material material) {
    return material.findings().specification().matrix().map(m -> section(material, m));
  }

  /** What the annex comes to, for the main text. */
  static Optional<Text> line(Material material) {
    return material.findings().specification().matrix().map(m -> line(m));
  }

  private static Text line(MatrixFindings matrix) {
    List<String> ranges = new ArrayList<>();
    for (Headline headline : matrix.headlines()) {
      if (!headline.order().isEmpty()) {
        ranges.add(range(matrix, headline));
      }
    }
    String over =
        "Over the "
            + matrix.estimated()
            + " of "
            + Phrases.count(matrix.cells().size(), "specification")
            + " that could be estimated, ";
    return Text.of(ranges.isEmpty() ? "No specification of the matrix could be estimated" : over)
        .then(String.join("; ", ranges))
        .then(" ")
        .thenReference("(annex)", ID)
        .then(".");
  }

  /** "returns to scale run from 0.98 to 1.1, 1.06 in the chosen one". */
  private static String range(MatrixFindings matrix, Headline headline) {
    List<Integer> order = headline.order();
    String low = value(matrix, headline, order.get(0));
    String high = value(matrix, headline, order.get(order.size() - 1));
    String chosen =
        matrix.chosen().isPresent()
            ? matrix
                .cells()
                .get(matrix.chosen().getAsInt())
                .figure(headline.name())
                .map(f -> ", " + Numbers.value(f) + " in the chosen one")
                .orElse("")
            : "";
    return "the "
        + headline.words()
        + (headline.name().equals(MatrixFindings.SCALE) ? " run" : " runs")
        + " from "
        + low
        + " to "
        + high
        + (headline.unit().isEmpty() ? "" : " " + headline.unit())
        + chosen;
  }

  private static String value(MatrixFindings matrix, Headline headline, int cell) {
    return Numbers.value(matrix.cells().get(cell).figure(headline.name()).orElseThrow());
  }

  private static Section section(Material material, MatrixFindings matrix) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "Every combination of the forms, treatments of plants and of time, and samples that the"
                + " study file lists was fitted whole, and asked for the same figures. Where the"
                + " figures differ by more than their intervals, what was chosen decides as much as"
                + " the records. Prices, targets and filings are the same in every combination."));
    blocks.add(
        new Paragraph(
            Text.strong(
                    matrix.chooseBy().isEmpty()
                        ? "No choice. "
                        : "Chosen by " + String.join(", then ", matrix.chooseBy()) + ". ")
                .then(matrix.choice())
                .then(chosen(matrix))));
    blocks.add(table(matrix));
    blocks.addAll(material.drawings(Chart.Kind.SPECIFICATIONS));
    MatrixGaps.of(material, matrix).ifPresent(blocks::add);
    List<Text> lacking = lacking(matrix);
    if (!lacking.isEmpty()) {
      blocks.add(Paragraph.of("What is lacking, and why:"));
      blocks.add(new Points(false, lacking));
    }
    return new Section(ID, "Annex: other specifications side by side", blocks);
  }

  private static String chosen(MatrixFindings matrix) {
    return matrix.chosen().isPresent()
        ? " Chosen: " + name(matrix, matrix.chosen().getAsInt()) + "."
        : "";
  }

  static String name(MatrixFindings matrix, int cell) {
    MatrixFindings.Cell found = matrix.cells().get(cell);
    String rest = matrix.circumstances(found);
    return Terms.technology(found.technology()) + (rest.isEmpty() ? "" : ", " + rest);
  }

  private static Table table(MatrixFindings matrix) {
    List<Column> columns = new ArrayList<>();
    for (Headline headline : matrix.headlines()) {
      columns.add(Column.ofNumbers(Phrases.sentence(headline.words()), headline.unit()));
    }
    columns.add(Column.ofNumbers("Regular rows", ""));
    columns.add(Column.ofNumbers("BIC", ""));
    columns.add(Column.ofWords("By the criteria"));
    List<Row> rows = new ArrayList<>();
    for (int cell : matrix.order()) {
      rows.add(row(matrix, cell));
    }
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "In order of the first column. Samples: "
                + Phrases.list(
                    matrix.samples().stream()
                        .map(
                            s ->
                                s.name()
                                    + " ("
                                    + s.words()
                                    + "; "
                                    + Phrases.count(s.rows(), "row")
                                    + ", "
                                    + Phrases.count(s.plants(), "plant")
                                    + ")")
                        .toList())
                + ". Returns to scale and substitution stand at the geometric mean of the"
                + " sample."));
    notes.add(
        Text.of(
            "BIC = −2 ln L + p ln N can be compared only where the likelihood is of the same"
                + " numbers: the rows of one sample, and one response. The mean of a plant and the"
                + " difference of two periods are other numbers than rows, and other rows are other"
                + " numbers, whatever the fit. Plant effects are counted among p, each one."));
    return new Table(
        "Headline figures, specification by specification",
        "Specification",
        columns,
        List.of(Group.of(rows)),
        notes);
  }

  private static Row row(MatrixFindings matrix, int cell) {
    MatrixFindings.Cell found = matrix.cells().get(cell);
    List<Cell> cells = new ArrayList<>();
    for (Headline headline : matrix.headlines()) {
      cells.add(
          Cells.figure(found.figure(headline.name()).filter(f -> Double.isFinite(f.value()))));
    }
    cells.add(
        found
            .regular()
            .map(r -> Cell.of(Numbers.count(r.both()) + " of " + Numbers.count(r.rows())))
            .orElse(Cell.none()));
    cells.add(
        found
            .criteria()
            .map(
                c ->
                    c.of().equals("rows")
                        ? Cell.of(Numbers.fixed(c.bic(), 1))
                        : Cell.of(Numbers.fixed(c.bic(), 1), "of " + c.of()))
            .orElse(Cell.none()));
    String standing =
        found.estimated() ? found.standing() : Phrases.sentence(Terms.state(found.state()));
    cells.add(matrix.isChosen(cell) ? new Cell(List.of(Text.strong("Chosen"))) : Cell.of(standing));
    Text heading = Text.of(name(matrix, cell));
    if (matrix.isChosen(cell)) {
      heading = Text.strong(name(matrix, cell));
    }
    return new Row(found.asAsked() ? heading.then(" (as asked)") : heading, cells);
  }

  /** Reasons, each with the combinations that it concerns. */
  private static List<Text> lacking(MatrixFindings matrix) {
    Map<String, List<String>> byReason = new LinkedHashMap<>();
    for (int c = 0; c < matrix.cells().size(); c++) {
      MatrixFindings.Cell found = matrix.cells().get(c);
      String name = name(matrix, c);
      found.reasons().forEach(reason -> note(byReason, reason, name));
      found
          .without()
          .forEach(
              (headline, why) ->
                  note(
                      byReason,
                      Phrases.sentence(words(matrix, headline)) + " is not there: " + why + ".",
                      name));
    }
    List<Text> texts = new ArrayList<>();
    byReason.forEach(
        (reason, names) -> texts.add(Text.strong(String.join("; ", names) + ": ").then(reason)));
    return texts;
  }

  private static void note(Map<String, List<String>> byReason, String reason, String name) {
    byReason.computeIfAbsent(reason, r -> new ArrayList<>()).add(name);
  }

  private static String words(MatrixFindings matrix, String headline) {
    return matrix.headlines().stream()
        .filter(h -> h.name().equals(headline))
        .map(Headline::words)
        .findFirst()
        .orElse(headline);
  }
}

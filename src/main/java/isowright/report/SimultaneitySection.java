package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.SimultaneityFindings;
import isowright.study.SimultaneityFindings.Input;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Before fitting: which way least squares is expected to lean, and what shifts the inputs. */
final class SimultaneitySection {

  static final String ID = "before-fitting";

  private SimultaneitySection() {}

  /** The section; absent where nothing is fitted to records. */
  static Optional<Section> of(Material material) {
    return material.findings().specification().simultaneity().map(SimultaneitySection::section);
  }

  private static Section section(SimultaneityFindings found) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        new Paragraph(
            Text.of(found.expectation())
                .then(" Which input answers to a good year is for the reader to judge (")
                .then(Source.MARSCHAK.cited() + "). ")
                .then(found.treatment())));
    blocks.add(Paragraph.of(shifted(found)));
    blocks.add(table(found));
    return new Section(ID, "Before fitting: what is expected of least squares", blocks);
  }

  private static String shifted(SimultaneityFindings found) {
    List<String> by =
        found.inputs().stream().filter(i -> i.shifted().equals("yes")).map(Input::name).toList();
    boolean free = by.contains(found.free());
    String rest =
        found.inputs().stream()
            .filter(i -> i.name().equals(found.free()))
            .map(i -> ": " + i.words())
            .findFirst()
            .orElse("");
    return free
        ? "Something in the records shifts "
            + found.free()
            + " for reasons of its own: its price. It could serve as an instrument, if it is set"
            + " outside the plant."
        : "Nothing in the records is seen to shift "
            + found.free()
            + " for reasons of its own"
            + rest
            + "."
            + (by.isEmpty() ? "" : " Its own price does shift " + Phrases.list(by) + ".");
  }

  private static Table table(SimultaneityFindings found) {
    List<Row> rows = new ArrayList<>();
    for (Input input : found.inputs()) {
      rows.add(
          new Row(
              Text.of(input.name()),
              List.of(
                  cell(input.withinShare().map(Numbers::percent)),
                  Cell.of(
                      input.direction(),
                      input.perFree().map(v -> Numbers.significant(v, 2)).orElse("not told apart")),
                  cell(input.priceSpread().map(Numbers::percent)),
                  cell(input.priceShare().map(Numbers::percent)),
                  cell(input.correlation().map(v -> Numbers.fixed(v, 2))),
                  Cells.figure(input.response()),
                  Cell.of(input.shifted()))));
    }
    return new Table(
        "Inputs before fitting",
        "Input",
        List.of(
            Column.ofNumbers("Spread within plants", "share of variance"),
            Column.ofNumbers(
                "Coefficient leans", "beneath: for an error of one in that of " + found.free()),
            Column.ofNumbers("Price moves by itself", "standard deviation"),
            Column.ofNumbers("which is", "share of its variance"),
            Column.ofNumbers("Correlation with quantity", ""),
            Column.ofNumbers("Quantity answers", "per cent for one per cent"),
            Column.ofWords("Shifted by its price")),
        List.of(Group.of(rows)),
        List.of(
            Text.of(
                "In logs. By itself: plants and periods taken out. The leaning supposes that a good"
                    + " year moves "
                    + found.free()
                    + " alone and a Cobb-Douglas technology: minus the coefficient of each other"
                    + " input in the regression of "
                    + found.free()
                    + " on them.")));
  }

  private static Cell cell(Optional<String> words) {
    return words.map(Cell::of).orElse(Cell.none());
  }
}

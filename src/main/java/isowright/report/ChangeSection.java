package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.PanelFindings.Bias;
import isowright.study.PanelFindings.Change;
import isowright.study.PanelFindings.Rate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Technical change: how fast output grows at the same inputs, and which input that uses or saves.
 */
final class ChangeSection {

  static final String ID = "technical-change";

  private ChangeSection() {}

  /** The section; absent where nothing about time was estimated. */
  static Optional<Section> of(Material material) {
    List<Fitted> fits =
        material.usable().stream().filter(fit -> fit.panel().change().isPresent()).toList();
    if (fits.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    List<Group> rates = new ArrayList<>();
    List<Group> biases = new ArrayList<>();
    for (Fitted fit : fits) {
      Change change = fit.panel().change().orElseThrow();
      String name = Terms.technology(fit.technology());
      blocks.add(Paragraph.of(name + ". " + change.words()));
      rates.add(new Group(Optional.of(name), rates(change)));
      if (!change.biases().isEmpty()) {
        biases.add(
            new Group(
                Optional.of(name), change.biases().stream().map(ChangeSection::bias).toList()));
      }
    }
    String unit = fits.get(0).panel().change().orElseThrow().unit();
    blocks.add(
        new Table(
            "Growth of output at the same inputs",
            "Where",
            List.of(Column.ofNumbers("Percent a " + unit, material.interval() + " beneath")),
            rates,
            List.of()));
    if (!biases.isEmpty()) {
      blocks.add(
          new Table(
              "Bias of technical change",
              "Input",
              List.of(
                  Column.ofNumbers(
                      "Share in cost, percentage points a " + unit,
                      material.interval() + " beneath"),
                  Column.ofWords("At a given mix the change")),
              biases,
              List.of(
                  Text.of(
                      "At the mean of the records, as the output elasticities imply. The test whether"
                          + " the change is neutral stands among the tests."))));
    }
    return Optional.of(new Section(ID, "Technical change", blocks));
  }

  /** A plain trend is the same everywhere, and one row says so. */
  private static List<Row> rates(Change change) {
    List<Rate> rates = change.rates();
    if (rates.size() == 2 && rates.get(0).percent().equals(rates.get(1).percent())) {
      return List.of(row("everywhere", rates.get(0)));
    }
    return rates.stream().map(rate -> row(rate.when(), rate)).toList();
  }

  private static Row row(String when, Rate rate) {
    return new Row(Text.of(Phrases.sentence(when)), List.of(Cells.figure(rate.percent())));
  }

  private static Row bias(Bias bias) {
    String words =
        switch (bias.verdict()) {
          case "uses" -> "uses it";
          case "saves" -> "saves it";
          default -> "cannot be told to use or save it";
        };
    return new Row(Text.of(bias.input()), List.of(Cells.figure(bias.points()), Cell.of(words)));
  }
}

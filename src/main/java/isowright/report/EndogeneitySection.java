package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.EndogeneityFindings;
import isowright.study.EndogeneityFindings.Anywhere;
import isowright.study.EndogeneityFindings.Beside;
import isowright.study.EndogeneityFindings.FirstStage;
import isowright.study.Figure;
import isowright.study.FitFindings.Fitted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Inputs chosen knowing productivity: how least squares was expected to err, what was put in its
 * place and whether that can be relied on, and what each way gives.
 */
final class EndogeneitySection {

  static final String ID = "endogenous-inputs";

  private EndogeneitySection() {}

  /** The section; absent where nothing was asked. */
  static Optional<Section> of(Material material) {
    List<Fitted> asked =
        material.findings().fits().stream().filter(fit -> fit.endogeneity().asked()).toList();
    if (asked.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    EndogeneityFindings first = asked.get(0).endogeneity();
    blocks.add(Paragraph.of("Expected before fitting: " + first.expected()));
    for (Fitted fit : asked) {
      if (!fit.endogeneity().shifts().isEmpty()) {
        blocks.add(
            Paragraph.of(Terms.technology(fit.technology()) + ". " + fit.endogeneity().shifts()));
      }
    }
    beside(material, asked).ifPresent(blocks::add);
    firstStages(asked).ifPresent(blocks::add);
    for (Fitted fit : asked) {
      String name = Terms.technology(fit.technology());
      fit.endogeneity().anywhere().ifPresent(set -> blocks.add(anywhere(material, name, set)));
      if (!fit.endogeneity().words().isEmpty()) {
        blocks.add(Paragraph.of(name + ". " + String.join(" ", fit.endogeneity().words())));
      }
    }
    return Optional.of(new Section(ID, "Inputs chosen knowing productivity", blocks));
  }

  private static Optional<Block> beside(Material material, List<Fitted> asked) {
    List<Group> groups = new ArrayList<>();
    List<Column> columns = new ArrayList<>();
    List<Text> notes = new ArrayList<>();
    for (Fitted fit : asked) {
      List<Row> rows = new ArrayList<>();
      for (Beside beside : fit.endogeneity().beside()) {
        String name = Terms.estimator(beside.estimator());
        if (beside.elasticity().isEmpty()) {
          notes.add(Text.of(name + " has no figures. " + beside.note()));
          continue;
        }
        if (columns.isEmpty()) {
          beside
              .elasticity()
              .keySet()
              .forEach(
                  input -> columns.add(Column.ofNumbers(input, material.interval() + " beneath")));
          columns.add(Column.ofNumbers("Returns to scale", material.interval() + " beneath"));
          columns.add(Column.ofNumbers("Rows", ""));
        }
        List<Cell> cells = new ArrayList<>();
        for (Figure figure : beside.elasticity().values()) {
          cells.add(Cells.figure(figure));
        }
        cells.add(Cells.figure(beside.scale()));
        cells.add(Cell.of(Numbers.count(beside.rows())));
        String note = beside.note().isEmpty() ? "" : ", " + beside.note();
        rows.add(new Row(Text.of(name + note), cells));
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Output elasticities at the geometric mean, by estimator",
                "Estimator",
                columns,
                groups,
                notes));
  }

  private static Optional<Block> firstStages(List<Fitted> asked) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : asked) {
      List<Row> rows = new ArrayList<>();
      for (FirstStage stage : fit.endogeneity().firstStages()) {
        rows.add(
            Row.of(
                Terms.parameter(stage.column()),
                List.of(
                    Numbers.share(stage.partialShare()),
                    Numbers.statistic(stage.f())
                        + " ("
                        + Numbers.degrees(stage.numerator())
                        + ", "
                        + Numbers.degrees(stage.denominator())
                        + ")",
                    Numbers.statistic(stage.effective()),
                    stage.conditional().map(Numbers::statistic).orElse("—"),
                    stage.weak() ? "weak" : "not weak")));
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "How strongly the instruments move each column they stand in for",
                "Column",
                List.of(
                    Column.ofNumbers("Partial R²", ""),
                    Column.ofNumbers("F", "degrees of freedom in parentheses"),
                    Column.ofNumbers("Effective F", ""),
                    Column.ofNumbers("Conditional F", ""),
                    Column.ofWords("Against 10")),
                groups,
                List.of(
                    Text.of(
                        "F uses the covariance of the fit. Effective F measures what weak"
                            + " instruments do to the estimate where rows are not independent;"
                            + " conditional F, where several columns are stood in for, whether the"
                            + " instruments move a column once they have moved the others. The"
                            + " lesser of the two decides."))));
  }

  private static Paragraph anywhere(Material material, String name, Anywhere set) {
    String column = set.column();
    String level = Numbers.level(material.confidence());
    if (set.pieces().isEmpty()) {
      return Paragraph.of(
          name
              + ". No value of the coefficient of "
              + column
              + " agrees with all instruments at once: they contradict one another, or the form"
              + " does not fit.");
    }
    List<String> pieces =
        set.pieces().stream()
            .map(piece -> "from " + end(piece.low()) + " to " + end(piece.high()))
            .toList();
    return Paragraph.of(
        name
            + ". However weak the instruments, values of the coefficient of "
            + column
            + " "
            + String.join(" and ", pieces)
            + " are not rejected at "
            + level
            + " (Anderson and Rubin).");
  }

  private static String end(double value) {
    return Double.isFinite(value)
        ? Numbers.significant(value, 3)
        : value < 0 ? "any low value" : "any high value";
  }
}

package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.CostFindings.Side;
import isowright.study.Figure;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** The same figures from quantities and from costs, side by side, and why they may differ. */
final class CostSidesBlocks {

  private CostSidesBlocks() {}

  /** Absent where the study has one side only. */
  static Optional<Section> section(Material material) {
    List<Side> sides = material.findings().costs().sides();
    if (sides.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(table(material, sides));
    blocks.add(Paragraph.of("Why the two sides may differ although they describe one technology:"));
    blocks.add(new Points(false, reasons(material)));
    return Optional.of(new Section(CostsSection.ID + "-sides", "Quantities and costs", blocks));
  }

  /** What both sides say together. */
  static String inWords(List<Side> sides) {
    List<String> apart =
        sides.stream().filter(Side::apart).map(CostSidesBlocks::words).map(Text::plain).toList();
    return apart.isEmpty()
        ? "Quantities and costs tell the same: of "
            + Phrases.count(sides.size(), "figure")
            + " found from both, no two intervals fail to meet."
        : "Of "
            + Phrases.count(sides.size(), "figure")
            + " found from quantities and from costs, these lie further apart than their intervals:"
            + " "
            + Phrases.list(apart)
            + ".";
  }

  private static Text words(Side side) {
    return Text.of(heading(side.measure()) + (side.of().isEmpty() ? "" : ", " + side.of()));
  }

  private static String heading(String measure) {
    return switch (measure) {
      case "scale" -> "Scale economies";
      case "allen" -> "Allen-Uzawa elasticity of substitution";
      case "demand" -> "Own price elasticity of demand";
      case "least-cost" -> "Least cost";
      case "marginal-cost" -> "Marginal cost";
      default -> measure;
    };
  }

  private static Table table(Material material, List<Side> sides) {
    Set<String> made = new LinkedHashSet<>();
    Set<String> cost = new LinkedHashSet<>();
    sides.forEach(side -> made.addAll(side.production().keySet()));
    sides.forEach(side -> cost.addAll(side.cost().keySet()));
    List<Column> columns = new ArrayList<>();
    made.forEach(t -> columns.add(Column.ofNumbers(Terms.technology(t), "from quantities")));
    cost.forEach(t -> columns.add(Column.ofNumbers(Terms.technology(t), "from costs")));
    columns.add(Column.ofWords("Intervals"));
    List<Group> groups = new ArrayList<>();
    for (String measure : sides.stream().map(Side::measure).distinct().toList()) {
      List<Row> rows = new ArrayList<>();
      for (Side side : sides) {
        if (side.measure().equals(measure)) {
          List<Cell> cells = new ArrayList<>();
          made.forEach(t -> cells.add(cell(side, Side::production, t)));
          cost.forEach(t -> cells.add(cell(side, Side::cost, t)));
          cells.add(Cell.of(side.apart() ? "apart" : "meet"));
          rows.add(
              new Row(
                  Text.of(side.of().isEmpty() ? "At the mean of the records" : side.of()), cells));
        }
      }
      groups.add(new Group(Optional.of(heading(measure) + unit(material, measure)), rows));
    }
    return new Table(
        "Production and cost side by side",
        "Figure",
        columns,
        groups,
        List.of(
            Text.of(
                "Elasticities at the mean of the records. Both sides rest on the same plants, so"
                    + " that their errors go together: intervals that meet are no proof of"
                    + " agreement, and those apart no test.")));
  }

  private static String unit(Material material, String measure) {
    return switch (measure) {
      case "least-cost" -> ", " + material.money();
      case "marginal-cost" -> ", " + material.moneyPerOutput();
      default -> "";
    };
  }

  private static Cell cell(Side side, Function<Side, Map<String, Figure>> of, String technology) {
    return Cells.figure(Optional.ofNullable(of.apply(side).get(technology)));
  }

  private static List<Text> reasons(Material material) {
    List<Text> reasons = new ArrayList<>();
    for (Said said : material.findings().costs().remarks()) {
      if (said.code().equals("sides-differ")) {
        reasons.add(Text.of(said.message()));
      }
    }
    reasons.add(
        Text.of(
            "The cost side holds what plants spent against prices: a lasting departure from the"
                + " least-cost mix is in its costs, while the production side asks what the best"
                + " mix would cost."));
    reasons.add(
        Text.of(
            "Chance stands elsewhere: in output on the production side, where inputs chosen knowing"
                + " it bias least squares; in cost on the cost side, where output measured with"
                + " chance biases scale towards economies."));
    reasons.add(
        Text.of(
            "Prices that plants pay are taken as given; where a plant moves its own prices, or pays"
                + " less for more, the cost side mistakes it for scale or substitution."));
    return reasons;
  }
}

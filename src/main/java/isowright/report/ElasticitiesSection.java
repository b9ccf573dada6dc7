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
import isowright.study.Figure;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Elasticities at stated points: output, scale, substitution, demand, each with its interval. */
final class ElasticitiesSection {

  static final String ID = "elasticities";

  private ElasticitiesSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    List<Fitted> fits = material.usable();
    List<Given> given = material.findings().given();
    if (fits.isEmpty() && given.isEmpty()) {
      blocks.add(
          Paragraph.of("No technology has a result from which elasticities could be taken."));
      return new Section(ID, "Elasticities", blocks);
    }
    blocks.add(Paragraph.of(points(fits, given)));
    blocks.add(new Points(false, scaleSentences(material)));
    blocks.add(output(material));
    blocks.addAll(material.drawings(Chart.Kind.ELASTICITIES));
    substitution(material)
        .ifPresent(table -> blocks.add(section("substitution", "Substitution", table)));
    demand(material).ifPresent(table -> blocks.add(section("demand", "Demand for inputs", table)));
    return new Section(ID, "Elasticities", blocks);
  }

  private static String points(List<Fitted> fits, List<Given> given) {
    String fitted = "at the geometric mean of the records for a fitted technology";
    String known = "at its base point for a technology taken as known";
    String where = fits.isEmpty() ? known : given.isEmpty() ? fitted : fitted + ", " + known;
    return "An output elasticity is the percentage by which output rises when one input rises by one"
        + " percent; their sum is the scale elasticity. All stand "
        + where
        + "; elsewhere they may differ.";
  }

  private static Section section(String id, String title, Table table) {
    return new Section(ID + "-" + id, title, List.of(table));
  }

  /** One sentence on returns to scale for each technology. */
  static List<Text> scaleSentences(Material material) {
    List<Text> sentences = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      fit.returnsToScale()
          .ifPresent(
              scale ->
                  sentences.add(
                      Text.strong(Terms.technology(fit.technology()))
                          .then(
                              ": " + Phrases.returnsToScale(scale, material.confidence()) + ".")));
    }
    for (Given given : material.findings().given()) {
      Figure scale = Figure.exact(given.returnsToScale());
      sentences.add(
          Text.strong(given.name())
              .then(": " + Phrases.returnsToScale(scale, material.confidence()) + "."));
    }
    return sentences;
  }

  private static Table output(Material material) {
    List<Row> rows = new ArrayList<>();
    for (String input : material.inputs()) {
      List<Cell> cells = new ArrayList<>();
      for (Fitted fit : material.usable()) {
        cells.add(Cells.figure(Optional.ofNullable(fit.outputElasticity().get(input))));
      }
      for (Given given : material.findings().given()) {
        cells.add(Cells.exact(Optional.ofNullable(given.outputElasticity().get(input))));
      }
      rows.add(new Row(Text.of(input), cells));
    }
    List<Cell> scale = new ArrayList<>();
    material.usable().forEach(fit -> scale.add(Cells.figure(fit.returnsToScale())));
    material
        .findings()
        .given()
        .forEach(given -> scale.add(Cells.exact(Optional.of(given.returnsToScale()))));
    rows.add(new Row(Text.strong("Scale (sum)"), scale));
    return new Table(
        "Output elasticities and returns to scale",
        "Input",
        Cells.technologies(material),
        List.of(Group.of(rows)),
        List.of(Text.of(Phrases.sentence(material.interval()) + "s beneath.")));
  }

  private static Optional<Table> substitution(Material material) {
    Map<String, Set<String>> pairsByMeasure = new LinkedHashMap<>();
    all(material)
        .forEach(
            pair ->
                pairsByMeasure
                    .computeIfAbsent(pair.measure(), measure -> new LinkedHashSet<>())
                    .add(pairName(pair)));
    if (pairsByMeasure.isEmpty()) {
      return Optional.empty();
    }
    List<Group> groups = new ArrayList<>();
    pairsByMeasure.forEach(
        (measure, pairs) -> {
          List<Row> rows = new ArrayList<>();
          for (String pair : pairs) {
            List<Cell> cells = new ArrayList<>();
            material.usable().forEach(fit -> cells.add(find(fit.substitution(), measure, pair)));
            material
                .findings()
                .given()
                .forEach(given -> cells.add(find(given.substitution(), measure, pair)));
            rows.add(new Row(Text.of(pair), cells));
          }
          groups.add(new Group(Optional.of(Terms.measure(measure)), rows));
        });
    return Optional.of(
        new Table(
            "Elasticities of substitution",
            "Pair",
            Cells.technologies(material),
            groups,
            List.of(
                Text.of(
                    "One is the Cobb-Douglas case; nearer zero, inputs are needed in fixed proportions."
                        + " Morishima elasticities have a direction: the price of the second input"
                        + " moves and the ratio of the first to the second answers."))));
  }

  private static List<Pair> all(Material material) {
    List<Pair> pairs = new ArrayList<>();
    material.usable().forEach(fit -> pairs.addAll(fit.substitution()));
    material.findings().given().forEach(given -> pairs.addAll(given.substitution()));
    return pairs;
  }

  private static String pairName(Pair pair) {
    return pair.measure().equals("morishima")
        ? pair.first() + " to " + pair.second()
        : pair.first() + " and " + pair.second();
  }

  private static Cell find(List<Pair> pairs, String measure, String name) {
    return Cells.figure(
        pairs.stream()
            .filter(pair -> pair.measure().equals(measure) && pairName(pair).equals(name))
            .map(Pair::figure)
            .findFirst());
  }

  private static Optional<Table> demand(Material material) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      if (fit.demandElasticity().isEmpty()) {
        continue;
      }
      List<Row> rows = new ArrayList<>();
      for (String quantity : material.inputs()) {
        List<Cell> cells = new ArrayList<>();
        for (String price : material.inputs()) {
          cells.add(
              Cells.figure(
                  fit.demandElasticity().stream()
                      .filter(p -> p.first().equals(quantity) && p.second().equals(price))
                      .map(Pair::figure)
                      .findFirst()));
        }
        rows.add(new Row(Text.of("Quantity of " + quantity), cells));
      }
      groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
    }
    if (groups.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            "Price elasticities of demand for inputs at constant output",
            "Answers",
            material.inputs().stream()
                .map(input -> Column.ofNumbers("Price of " + input, ""))
                .toList(),
            groups,
            List.of(
                Text.of(
                    "Percent by which a quantity changes when a price rises by one percent; own prices"
                        + " on the diagonal."))));
  }
}

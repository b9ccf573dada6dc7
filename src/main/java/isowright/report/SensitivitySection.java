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
import isowright.study.Figure;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Sensitivity: the headline figures of every technology side by side. */
final class SensitivitySection {

  static final String ID = "sensitivity";

  private SensitivitySection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    List<Fitted> fits = material.findings().fits();
    List<Given> given = material.findings().given();
    blocks.add(
        Paragraph.of(
            fits.size() + given.size() < 2
                ? "One technology was asked, so that no other form stands beside it. An answer that"
                    + " rests on one form alone should be asked again of another."
                : "Each row is one figure, each column one technology. Where a row differs by more"
                    + " than its intervals, the answer rests on the form chosen as much as on the"
                    + " records."));
    blocks.add(table(material, fits, given));
    List<Text> lines =
        material.usable().stream().map(RobustnessSection::line).flatMap(Optional::stream).toList();
    if (!lines.isEmpty()) {
      blocks.add(new Points(false, lines));
    }
    MatrixSection.line(material).ifPresent(line -> blocks.add(new Paragraph(line)));
    blocks.addAll(ZerosBlocks.of(material));
    blocks.addAll(FormsBlocks.brief(material));
    blocks.addAll(Material.notices(material.findings().remarks()));
    return new Section(ID, "Sensitivity to the technology", blocks);
  }

  private static Table table(Material material, List<Fitted> fits, List<Given> given) {
    List<Column> columns = new ArrayList<>();
    fits.forEach(
        fit ->
            columns.add(
                Column.ofNumbers(Terms.technology(fit.technology()), Terms.state(fit.state()))));
    given.forEach(g -> columns.add(Column.ofNumbers(g.name(), "taken as known")));
    List<Group> groups = new ArrayList<>();
    groups.add(new Group(Optional.of("Technology"), technology(material, fits, given)));
    for (String question : material.questions()) {
      groups.add(new Group(Optional.of(question), question(material, question, fits, given)));
    }
    return new Table(
        "Headline figures, technology by technology", "Figure", columns, groups, List.of());
  }

  private static List<Row> technology(Material material, List<Fitted> fits, List<Given> given) {
    List<Row> rows = new ArrayList<>();
    List<Cell> scale = new ArrayList<>();
    fits.forEach(fit -> scale.add(usable(fit, fit.returnsToScale())));
    given.forEach(g -> scale.add(Cells.exact(Optional.of(g.returnsToScale()))));
    rows.add(new Row(Text.of("Returns to scale"), scale));
    for (String input : material.inputs()) {
      List<Cell> cells = new ArrayList<>();
      fits.forEach(
          fit -> cells.add(usable(fit, Optional.ofNullable(fit.outputElasticity().get(input)))));
      given.forEach(
          g -> cells.add(Cells.exact(Optional.ofNullable(g.outputElasticity().get(input)))));
      rows.add(new Row(Text.of("Output elasticity of " + input), cells));
    }
    return rows;
  }

  private static Cell usable(Fitted fit, Optional<Figure> figure) {
    return fit.usable() ? Cells.figure(figure) : Cell.none();
  }

  private static List<Row> question(
      Material material, String question, List<Fitted> fits, List<Given> given) {
    List<String> names = new ArrayList<>();
    fits.forEach(fit -> names.add(fit.technology()));
    given.forEach(g -> names.add(g.name()));
    List<Row> rows = new ArrayList<>();
    rows.add(
        new Row(
            Text.of("Least cost, " + material.money()),
            names.stream().map(name -> cost(material, question, name)).toList()));
    rows.add(
        new Row(
            Text.of("Marginal cost, " + material.moneyPerOutput()),
            names.stream().map(name -> marginal(material, question, name)).toList()));
    return rows;
  }

  private static Cell cost(Material material, String question, String technology) {
    return find(material, question, technology)
        .map(
            plan ->
                plan.answered()
                    ? withStatus(plan, Cells.figure(plan.cost()))
                    : Cell.of(Terms.status(plan.status())))
        .orElse(Cell.of("not asked"));
  }

  private static Cell marginal(Material material, String question, String technology) {
    return find(material, question, technology)
        .filter(Planned::answered)
        .map(plan -> Cells.figure(plan.marginalCost()))
        .orElse(Cell.none());
  }

  private static Cell withStatus(Planned plan, Cell cell) {
    if (!Terms.cautionary(plan.status())) {
      return cell;
    }
    List<Text> lines = new ArrayList<>(cell.lines());
    lines.add(Text.of(Terms.status(plan.status())));
    return new Cell(lines);
  }

  private static Optional<Planned> find(Material material, String question, String technology) {
    return material.plans(question).stream()
        .filter(plan -> plan.technology().equals(technology))
        .findFirst();
  }
}

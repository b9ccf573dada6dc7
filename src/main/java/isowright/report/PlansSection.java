package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Definitions;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** Least-cost plans: one part a question, technologies side by side, then curves and drawings. */
final class PlansSection {

  static final String ID = "plans";

  /** So many points of a cost curve are printed; the chart's table has them all. */
  private static final int CURVE_ROWS = 9;

  private PlansSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "The mix of inputs that reaches a target at least cost, at given prices. Marginal cost"
                + " is what one more unit of output costs; at the least-cost mix the price of every"
                + " input in use equals marginal cost times its marginal product."));
    int number = 1;
    for (String question : material.questions()) {
      blocks.add(question(material, question, number++));
    }
    return new Section(ID, "Least-cost plans", blocks);
  }

  private static Section question(Material material, String question, int number) {
    List<Planned> plans = material.plans(question);
    List<Block> blocks = new ArrayList<>();
    blocks.add(asked(material, plans));
    plans.forEach(plan -> status(plan, blocks));
    plans.forEach(
        plan ->
            blocks.addAll(Material.notices(Terms.technology(plan.technology()), plan.remarks())));
    blocks.add(answers(material, question, plans));
    for (Planned plan : plans) {
      String subject = question + ", " + plan.technology();
      blocks.addAll(material.drawings(Chart.Kind.ISOQUANT, subject));
      blocks.addAll(material.drawings(Chart.Kind.EXPANSION_PATH, subject));
      blocks.addAll(material.drawings(Chart.Kind.COST_CURVES, subject));
      if (!plan.curve().isEmpty()) {
        blocks.add(curve(material, plan));
      }
    }
    return new Section(ID + "-" + number, question, blocks);
  }

  private static Definitions asked(Material material, List<Planned> plans) {
    Planned first = plans.get(0);
    List<Entry> entries = new ArrayList<>();
    entries.add(
        Entry.of("Target", Numbers.unit(Numbers.amount(first.target()), material.outputUnit())));
    entries.add(Entry.of("Prices", Phrases.sentence(prices(material, first))));
    entries.add(Entry.of("Productivity", first.productivity()));
    List<String> limits = limits(plans);
    entries.add(Entry.of("Limits", limits.isEmpty() ? "none" : String.join("; ", limits)));
    return new Definitions(entries);
  }

  /** "in EUR of 2020: labour 34 per h, machines 74 per h and energy 10.5 per GJ". */
  static String prices(Material material, Planned plan) {
    List<String> prices = new ArrayList<>();
    plan.prices()
        .forEach(
            (input, price) -> {
              String unit = material.unit(input).isEmpty() ? "unit" : material.unit(input);
              prices.add(input + " " + Numbers.unit(Numbers.amount(price), "per " + unit));
            });
    return "in " + material.money() + ": " + Phrases.list(prices);
  }

  /** "machines held at 42,000 h", of all technologies, each once. */
  static List<String> limits(List<Planned> plans) {
    return plans.stream()
        .flatMap(plan -> plan.limits().entrySet().stream())
        .map(limit -> limit.getKey() + " " + limit.getValue())
        .distinct()
        .toList();
  }

  private static void status(Planned plan, List<Block> blocks) {
    if (Terms.cautionary(plan.status())) {
      blocks.add(
          new Notice(
              plan.answered() ? Weight.WARNING : Weight.ERROR,
              Text.strong(
                      Terms.technology(plan.technology())
                          + ": "
                          + Terms.status(plan.status())
                          + ". ")
                  .then(Terms.statusMeaning(plan.status()))));
    }
  }

  private static Table answers(Material material, String question, List<Planned> plans) {
    List<Column> columns =
        plans.stream()
            .map(
                plan ->
                    Column.ofNumbers(
                        Terms.technology(plan.technology()), Terms.status(plan.status())))
            .toList();
    List<Row> totals = new ArrayList<>();
    totals.add(row("Least cost, " + material.money(), plans, p -> Cells.figure(p.cost())));
    totals.add(
        row(
            "Marginal cost, " + material.moneyPerOutput(),
            plans,
            p -> Cells.figure(p.marginalCost())));
    totals.add(
        row(
            "Average cost, " + material.moneyPerOutput(),
            plans,
            p -> Cells.figure(p.averageCost())));
    List<Row> mix = new ArrayList<>();
    List<Row> shares = new ArrayList<>();
    for (String input : inputs(material, plans)) {
      mix.add(
          row(
              material.inputAndUnit(input),
              plans,
              p -> Cells.figure(Optional.ofNullable(p.mix().get(input)))));
      shares.add(row(input, plans, p -> Cells.figure(Optional.ofNullable(p.shares().get(input)))));
    }
    List<Row> check =
        List.of(
            row(
                "Departure from the first-order conditions",
                plans,
                p ->
                    Double.isNaN(p.optimality())
                        ? Cell.none()
                        : Cell.of(Numbers.small(p.optimality()))));
    return new Table(
        "Least-cost plan: " + question,
        "Figure",
        columns,
        List.of(
            new Group(Optional.of("Cost"), totals),
            new Group(Optional.of("Mix"), mix),
            new Group(Optional.of("Share of cost"), shares),
            new Group(Optional.of("Check"), check)),
        List.of(
            Text.of(
                Phrases.sentence(material.interval())
                    + "s beneath; figures of a technology taken as known carry none. The check is"
                    + " the largest relative departure, found again from the technology and not"
                    + " taken from the search.")));
  }

  /** The inputs of the study, then those that only some answers have. */
  static List<String> inputs(Material material, List<Planned> plans) {
    List<String> all = new ArrayList<>(material.inputs());
    plans.stream()
        .flatMap(plan -> plan.mix().keySet().stream())
        .filter(input -> !material.inputs().contains(input))
        .distinct()
        .forEach(all::add);
    return all;
  }

  private static Row row(String heading, List<Planned> plans, Function<Planned, Cell> cell) {
    return new Row(Text.of(heading), plans.stream().map(cell).toList());
  }

  private static Table curve(Material material, Planned plan) {
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofNumbers("Least cost", material.money()));
    columns.add(Column.ofNumbers("Marginal cost", material.moneyPerOutput()));
    columns.add(Column.ofNumbers("Average cost", material.moneyPerOutput()));
    for (String input : inputs(material, List.of(plan))) {
      columns.add(Column.ofNumbers(Phrases.sentence(input), material.unit(input)));
    }
    columns.add(Column.ofWords("Inside the records"));
    List<Row> rows = new ArrayList<>();
    for (CurvePoint point : thinned(plan.curve())) {
      rows.add(
          new Row(
              Text.of(Numbers.amount(point.target())),
              cells(material, point, inputs(material, List.of(plan)))));
    }
    String unit = material.outputUnit().isEmpty() ? "" : " (" + material.outputUnit() + ")";
    return new Table(
        "Cost curve and expansion path, "
            + Terms.technology(plan.technology())
            + ": "
            + plan.question(),
        "Target" + unit,
        columns,
        List.of(Group.of(rows)),
        rows.size() < plan.curve().size()
            ? List.of(
                Text.of(
                    Numbers.count(rows.size())
                        + " of "
                        + Phrases.count(plan.curve().size(), "point")
                        + "; the findings file has them all."))
            : List.of());
  }

  private static List<Cell> cells(Material material, CurvePoint point, List<String> inputs) {
    List<Cell> cells = new ArrayList<>();
    cells.add(Cells.figure(point.cost()));
    cells.add(Cells.figure(point.marginalCost()));
    cells.add(Cells.figure(point.averageCost()));
    for (String input : inputs) {
      Double quantity = point.mix().get(input);
      cells.add(quantity == null ? Cell.none() : Cell.of(Numbers.significant(quantity, 4)));
    }
    cells.add(Cell.of(point.inside() ? "yes" : "outside"));
    return cells;
  }

  /** Evenly chosen points, the first and the last among them. */
  static List<CurvePoint> thinned(List<CurvePoint> curve) {
    if (curve.size() <= CURVE_ROWS) {
      return curve;
    }
    List<CurvePoint> chosen = new ArrayList<>();
    for (int i = 0; i < CURVE_ROWS; i++) {
      chosen.add(curve.get((int) Math.round(i * (curve.size() - 1.0) / (CURVE_ROWS - 1))));
    }
    return chosen;
  }
}

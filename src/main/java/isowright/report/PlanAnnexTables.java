package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.Figure;
import isowright.study.PlanDetail.Change;
import isowright.study.PlanDetail.Checks;
import isowright.study.PlanDetail.EfficientScale;
import isowright.study.PlanDetail.End;
import isowright.study.PlanDetail.PlantPart;
import isowright.study.PlanDetail.Proved;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The tables of the annex on least-cost plans. */
final class PlanAnnexTables {

  /** So many points of a cost curve are printed; the chart's table has them all. */
  private static final int CURVE_ROWS = 9;

  private PlanAnnexTables() {}

  /** The plans examined without the search that found them. */
  static Optional<Table> checks(Material material) {
    List<Group> groups = new ArrayList<>();
    for (List<Planned> asked : PlansSection.asked(material)) {
      List<Row> rows = new ArrayList<>();
      for (Planned plan : asked) {
        if (plan.answered() && PlanAnnexSection.checked(plan)) {
          rows.add(
              new Row(
                  Text.of(PlanWording.column(material, plan, PlansSection.several(asked))),
                  checks(plan)));
        }
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(PlanWording.asked(asked.get(0))), rows));
      }
    }
    if (groups.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            "Checks of every plan, found again from the technology",
            "Plan",
            List.of(
                Column.ofNumbers("Output missed", ""),
                Column.ofNumbers("First order", ""),
                Column.ofNumbers("Second order", ""),
                Column.ofNumbers("Shephard", ""),
                Column.ofNumbers("Homogeneity", ""),
                Column.ofNumbers("Marginal cost", ""),
                Column.ofWords("Best of")),
            groups,
            List.of(
                Text.of(
                    "Relative departures, 0 where a law holds exactly: of output from the target;"
                        + " of the first-order conditions; of the change of cost with each price"
                        + " from the cost share (Shephard’s lemma); of cost from rising in"
                        + " proportion with all prices; of the change of cost with output from"
                        + " marginal cost. Second order is the least curvature of isoquant against"
                        + " isocost, positive at a minimum. A dash: nothing to examine, since no"
                        + " input is free or the target is split. The last column says among which"
                        + " mixes the plan is proved best."))));
  }

  private static List<Cell> checks(Planned plan) {
    Checks none =
        new Checks(Double.NaN, plan.optimality(), Double.NaN, Double.NaN, Double.NaN, Double.NaN);
    Checks checks = plan.detail().checks().orElse(none);
    return List.of(
        small(checks.output()),
        small(checks.firstOrder()),
        small(checks.secondOrder()),
        small(checks.shephard()),
        small(checks.homogeneity()),
        small(checks.marginalCost()),
        plan.detail().proof().map(PlanAnnexTables::proof).orElse(Cell.none()));
  }

  private static Cell proof(Proved proof) {
    String parts = proof.parts() > 1 ? Phrases.count(proof.parts(), "part") + " examined" : "";
    return Cell.of(proof.scope().equals("global") ? "all mixes" : "mixes nearby", parts);
  }

  private static Cell small(double value) {
    return Double.isNaN(value) ? Cell.none() : Cell.of(Numbers.small(value));
  }

  /** By how many per cent cost rises with each price, with output and with productivity. */
  static Optional<Table> costElasticities(Material material) {
    List<Group> groups = new ArrayList<>();
    List<String> of = new ArrayList<>(PlansSection.inputs(material, material.findings().plans()));
    of.add("output");
    of.add("productivity");
    for (List<Planned> asked : PlansSection.asked(material)) {
      List<Row> rows = new ArrayList<>();
      for (Planned plan : asked) {
        Map<String, Figure> all = plan.detail().costElasticities();
        if (!all.isEmpty()) {
          rows.add(
              new Row(
                  Text.of(PlanWording.column(material, plan, PlansSection.several(asked))),
                  of.stream().map(o -> Cells.figure(Optional.ofNullable(all.get(o)))).toList()));
        }
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(PlanWording.asked(asked.get(0))), rows));
      }
    }
    List<Column> columns = new ArrayList<>();
    for (String each : of) {
      boolean price = material.inputs().contains(each);
      columns.add(Column.ofNumbers(price ? "Price of " + each : Phrases.sentence(each), ""));
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Elasticities of least cost",
                "Plan",
                columns,
                groups,
                List.of(
                    Text.of(
                        "By how many per cent least cost rises when a price, output or productivity"
                            + " rises by one per cent and all else stays; "
                            + material.interval()
                            + "s beneath. That of a price is the input’s share of cost."))));
  }

  /** Where average cost is least. */
  static Optional<Table> efficientScale(Material material) {
    List<Group> groups = new ArrayList<>();
    for (List<Planned> asked : PlansSection.asked(material)) {
      List<Row> rows = new ArrayList<>();
      for (Planned plan : PlanAnnexSection.firsts(asked)) {
        plan.detail()
            .efficientScale()
            .ifPresent(
                scale ->
                    rows.add(new Row(Text.of(Terms.technology(plan.technology())), cells(scale))));
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(PlanWording.asked(asked.get(0))), rows));
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Output of least average cost (efficient scale) under the limits of each question",
                "Plan",
                List.of(
                    Column.ofWords("Average cost"),
                    Column.ofNumbers("Efficient scale", material.outputUnit()),
                    Column.ofNumbers("Average cost there", material.moneyPerOutput()),
                    Column.ofWords("Examined"),
                    Column.ofWords("Inside the records")),
                groups,
                List.of(
                    Text.of(
                        "Intervals of the efficient scale are found on the log scale, so they are"
                            + " not symmetric."))));
  }

  private static List<Cell> cells(EfficientScale scale) {
    return List.of(
        Cell.of(PlanAnnexSection.course(scale)),
        Cells.figure(scale.output()),
        Cells.figure(scale.averageCost()),
        Cell.of(Numbers.significant(scale.from(), 3) + " to " + Numbers.significant(scale.to(), 3)),
        scale.output().isEmpty() ? Cell.none() : Cell.of(scale.inside() ? "yes" : "outside"));
  }

  /** What each plant makes of a split target. */
  static Optional<Table> plants(Material material, List<Planned> plans) {
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofNumbers("Output", material.outputUnit()));
    columns.add(Column.ofNumbers("Cost", material.money()));
    columns.add(Column.ofNumbers("Marginal cost", material.moneyPerOutput()));
    material
        .inputs()
        .forEach(i -> columns.add(Column.ofNumbers(Phrases.sentence(i), material.unit(i))));
    columns.add(Column.ofWords("Inside the records"));
    List<Group> groups = new ArrayList<>();
    for (Planned plan : plans) {
      List<Row> rows = new ArrayList<>();
      for (PlantPart part : plan.detail().across()) {
        List<Cell> cells = new ArrayList<>();
        cells.add(part.runs() ? Cells.figure(part.output()) : Cell.of("does not run"));
        cells.add(Cells.figure(part.cost()));
        cells.add(Cells.figure(part.marginalCost()));
        for (String input : material.inputs()) {
          cells.add(Cells.figure(Optional.ofNullable(part.mix().get(input))));
        }
        cells.add(part.runs() ? Cell.of(part.inside() ? "yes" : "outside") : Cell.none());
        rows.add(new Row(Text.of(part.plant()), cells));
      }
      if (!rows.isEmpty()) {
        String technology = Terms.technology(plan.technology());
        groups.add(new Group(Optional.of(technology), rows));
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "What each plant makes", "Plant", columns, groups, List.of(Text.of(RUNNING))));
  }

  private static final String RUNNING =
      "Cost includes what is due for running a plant at all. Where costs are convex, plants that"
          + " are neither at capacity nor idle share one marginal cost.";

  /** What moving one thing changes, technologies side by side. */
  static Optional<Table> changes(Material material, List<Planned> plans) {
    List<Planned> with = plans.stream().filter(plan -> !plan.detail().changes().isEmpty()).toList();
    if (with.isEmpty()) {
      return Optional.empty();
    }
    List<Row> tenth = new ArrayList<>();
    List<Row> observed = new ArrayList<>();
    for (Change change : with.get(0).detail().changes()) {
      boolean ten = change.span().equals("ten-per-cent");
      String what = Phrases.sentence(what(change));
      String span =
          ten
              ? what
              : what
                  + ", "
                  + Numbers.significant(change.low().at(), 3)
                  + " to "
                  + Numbers.significant(change.high().at(), 3);
      Row row = new Row(Text.of(span), with.stream().map(plan -> moved(plan, change)).toList());
      (ten ? tenth : observed).add(row);
    }
    List<Group> groups = new ArrayList<>();
    groups.add(new Group(Optional.of("Ten per cent down and up"), tenth));
    if (!observed.isEmpty()) {
      groups.add(new Group(Optional.of("Over what the records hold"), observed));
    }
    String result =
        switch (with.get(0).detail().goal()) {
          case "budget" -> "output";
          case "profit" -> "profit";
          default -> "cost";
        };
    boolean several = PlansSection.several(plans);
    return Optional.of(
        new Table(
            "What if: change of " + result + ", per cent",
            "What moves",
            with.stream()
                .map(plan -> Column.ofNumbers(PlanWording.column(material, plan, several), "%"))
                .toList(),
            groups,
            List.of(
                Text.of(
                    "All else as asked; the question is answered anew each time. Intervals stand in"
                        + " the findings file and in the table of the chart."))));
  }

  /** "price of labour", "target", "productivity". */
  static String what(Change change) {
    return switch (change.what()) {
      case "price" -> "price of " + change.input();
      case "output-price" -> "price of output";
      default -> change.what();
    };
  }

  private static Cell moved(Planned plan, Change like) {
    return plan.detail().changes().stream()
        .filter(c -> c.what().equals(like.what()) && c.input().equals(like.input()))
        .filter(c -> c.span().equals(like.span()))
        .findFirst()
        .map(c -> Cell.of(percent(c.low()) + " / " + percent(c.high())))
        .orElse(Cell.none());
  }

  private static String percent(End end) {
    return end.relative()
        .map(f -> (f.value() < 0 ? "−" : "+") + Numbers.fixed(Math.abs(100 * f.value()), 1))
        .orElse("no plan");
  }

  /** How quantities answer to prices at the same output. */
  static Optional<Table> demandElasticities(Material material, List<Planned> plans) {
    List<Group> groups = new ArrayList<>();
    for (Planned plan : plans) {
      Map<String, Map<String, Figure>> all = plan.detail().demandElasticities();
      List<Row> rows = new ArrayList<>();
      all.forEach(
          (input, row) ->
              rows.add(
                  new Row(
                      Text.of(input),
                      material.inputs().stream()
                          .map(price -> Cells.figure(Optional.ofNullable(row.get(price))))
                          .toList())));
      if (!rows.isEmpty()) {
        String column = PlanWording.column(material, plan, PlansSection.several(plans));
        groups.add(new Group(Optional.of(column), rows));
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Elasticities of demand at the same output",
                "Quantity of",
                material.inputs().stream()
                    .map(price -> Column.ofNumbers("Price of " + price, ""))
                    .toList(),
                groups,
                List.of(
                    Text.of(
                        "By how many per cent the quantity in the row rises when the price in the"
                            + " column rises by one per cent, limits as in the question."))));
  }

  /** Some points of a cost curve. */
  static Table curve(Material material, Planned plan) {
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofNumbers("Least cost", material.money()));
    columns.add(Column.ofNumbers("Marginal cost", material.moneyPerOutput()));
    columns.add(Column.ofNumbers("Average cost", material.moneyPerOutput()));
    for (String input : PlansSection.inputs(material, List.of(plan))) {
      columns.add(Column.ofNumbers(Phrases.sentence(input), material.unit(input)));
    }
    columns.add(Column.ofWords("Inside the records"));
    columns.add(Column.ofWords("Regular"));
    List<Row> rows = new ArrayList<>();
    for (CurvePoint point : thinned(plan.curve())) {
      rows.add(
          new Row(
              Text.of(Numbers.amount(point.target())),
              cells(point, PlansSection.inputs(material, List.of(plan)))));
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

  private static List<Cell> cells(CurvePoint point, List<String> inputs) {
    List<Cell> cells = new ArrayList<>();
    cells.add(Cells.figure(point.cost()));
    cells.add(Cells.figure(point.marginalCost()));
    cells.add(Cells.figure(point.averageCost()));
    for (String input : inputs) {
      Double quantity = point.mix().get(input);
      cells.add(quantity == null ? Cell.none() : Cell.of(Numbers.significant(quantity, 4)));
    }
    cells.add(Cell.of(point.inside() ? "yes" : "outside"));
    cells.add(Cell.of(point.regular() ? "yes" : "no"));
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

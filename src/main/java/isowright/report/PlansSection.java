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
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * Least-cost plans: one part a question, technologies side by side, what its limits are worth, then
 * the drawings on which a decision rests. The annex has the rest.
 */
final class PlansSection {

  static final String ID = "plans";

  private PlansSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "The mix of inputs that meets a question at the given prices. Marginal cost is what one"
                + " more unit of output costs; at the least-cost mix the price of every input in"
                + " use that is free to change equals marginal cost times its marginal product."));
    int number = 1;
    for (List<Planned> plans : asked(material)) {
      blocks.add(question(material, plans, number++));
    }
    return new Section(ID, "Least-cost plans", blocks);
  }

  /** The answers to each question of the study file, all its targets together. */
  static List<List<Planned>> asked(Material material) {
    Map<String, List<Planned>> asked = new LinkedHashMap<>();
    for (Planned plan : material.findings().plans()) {
      asked.computeIfAbsent(PlanWording.asked(plan), name -> new ArrayList<>()).add(plan);
    }
    return List.copyOf(asked.values());
  }

  /** Whether a question has several targets. */
  static boolean several(List<Planned> plans) {
    return plans.stream().map(Planned::question).distinct().count() > 1;
  }

  private static Section question(Material material, List<Planned> plans, int number) {
    List<Block> blocks = new ArrayList<>();
    boolean several = several(plans);
    blocks.add(asked(material, plans));
    plans.forEach(plan -> status(material, plan, several, blocks));
    plans.forEach(
        plan ->
            blocks.addAll(
                Material.notices(
                    PlanWording.column(material, plan, several),
                    plan.remarks().stream()
                        .filter(said -> !said.code().equals("corner")) // told with its worth
                        .toList())));
    blocks.add(answers(material, plans, several));
    List<Text> worths = PlanWording.worths(material, plans, several);
    if (!worths.isEmpty()) {
      blocks.add(Paragraph.of("What the limits are worth:"));
      blocks.add(new Points(false, worths));
    }
    PlanWording.proof(plans).ifPresent(words -> blocks.add(Paragraph.of(words)));
    for (Planned plan : plans) {
      String subject = plan.question() + ", " + plan.technology();
      blocks.addAll(material.drawings(Chart.Kind.SPLIT, subject));
      blocks.addAll(material.drawings(Chart.Kind.ISOQUANT, subject));
      blocks.addAll(material.drawings(Chart.Kind.COST_CURVES, subject));
      blocks.addAll(material.drawings(Chart.Kind.ENVELOPE, subject));
      blocks.addAll(material.drawings(Chart.Kind.CHANGES, subject));
    }
    return new Section(ID + "-" + number, PlanWording.asked(plans.get(0)), blocks);
  }

  private static Definitions asked(Material material, List<Planned> plans) {
    Planned first = plans.get(0);
    List<Entry> entries = new ArrayList<>();
    entries.add(PlanWording.goal(material, plans));
    if (first.prices().isEmpty()) {
      entries.add(Entry.of("Prices", "each plant its own"));
    } else {
      entries.add(Entry.of("Prices", Phrases.sentence(prices(material, first))));
    }
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

  /** States that change what the figures are worth; a limit that binds is told with its worth. */
  private static void status(Material material, Planned plan, boolean several, List<Block> blocks) {
    if (!plan.status().equals("solved")) {
      Weight answered = Terms.cautionary(plan.status()) ? Weight.WARNING : Weight.NOTE;
      blocks.add(
          new Notice(
              plan.answered() ? answered : Weight.ERROR,
              Text.strong(
                      PlanWording.column(material, plan, several)
                          + ": "
                          + Terms.status(plan.status())
                          + ". ")
                  .then(Terms.statusMeaning(plan.status()))));
    }
  }

  private static Table answers(Material material, List<Planned> plans, boolean several) {
    List<Column> columns =
        plans.stream()
            .map(
                plan ->
                    Column.ofNumbers(
                        PlanWording.column(material, plan, several), Terms.status(plan.status())))
            .toList();
    List<Group> groups = new ArrayList<>();
    if (!plans.get(0).detail().goal().equals("target")) {
      groups.add(new Group(Optional.of(PlanWording.best(plans.get(0))), best(material, plans)));
    }
    groups.add(new Group(Optional.of("Cost"), totals(material, plans)));
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
    groups.add(new Group(Optional.of("Mix"), mix));
    groups.add(new Group(Optional.of("Share of cost"), shares));
    return new Table(
        (plans.get(0).detail().goal().equals("target") ? "Least-cost plan: " : "Plan: ")
            + PlanWording.asked(plans.get(0)),
        "Figure",
        columns,
        groups,
        List.of(note(material)));
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

  private static Text note(Material material) {
    Text note =
        Text.of(
            Phrases.sentence(material.interval())
                + "s beneath; figures of a technology taken as known carry none.");
    return PlanAnnexSection.exists(material)
        ? note.then(" Every plan was checked again from the technology; the checks are ")
            .thenReference("in the annex", PlanAnnexSection.ID)
            .then(".")
        : note;
  }

  private static List<Row> best(Material material, List<Planned> plans) {
    List<Row> rows = new ArrayList<>();
    if (plans.get(0).detail().goal().equals("profit")) {
      rows.add(row("Profit, " + material.money(), plans, p -> Cells.figure(p.detail().profit())));
    }
    String unit = material.outputUnit().isEmpty() ? "" : ", " + material.outputUnit();
    rows.add(row("Output" + unit, plans, p -> Cells.figure(p.detail().output())));
    return rows;
  }

  private static List<Row> totals(Material material, List<Planned> plans) {
    String cost = plans.get(0).detail().goal().equals("target") ? "Least cost, " : "Cost, ";
    return List.of(
        row(cost + material.money(), plans, p -> Cells.figure(p.cost())),
        row(
            "Marginal cost, " + material.moneyPerOutput(),
            plans,
            p -> Cells.figure(p.marginalCost())),
        row(
            "Average cost, " + material.moneyPerOutput(),
            plans,
            p -> Cells.figure(p.averageCost())));
  }

  private static Row row(String heading, List<Planned> plans, Function<Planned, Cell> cell) {
    return new Row(Text.of(heading), plans.stream().map(cell).toList());
  }
}

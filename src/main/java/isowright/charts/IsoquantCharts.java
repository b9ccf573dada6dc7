package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.PlanFindings.Mix;
import isowright.study.PlanFindings.Planned;
import java.util.List;
import java.util.Optional;

/**
 * The isoquant of a target with the isocost line through the least-cost mix, and the plants' mixes.
 * The first input is on the horizontal axis; the others are as in the plan.
 */
final class IsoquantCharts {

  /** A plant is "near" the target if its output differs by no more than this share of it. */
  private static final double NEAR = 0.25;

  /** The frame goes to this multiple of the plan's quantities at least, … */
  private static final double LEAST_FRAME = 1.9;

  /** … and at most. */
  private static final double MOST_FRAME = 4;

  private final Planned plan;
  private final Setting setting;
  private final String first;
  private final String second;
  private final double planFirst;
  private final double planSecond;
  private final List<Mix> plants;

  private IsoquantCharts(Planned plan, Setting setting) {
    this.plan = plan;
    this.setting = setting;
    first = Answers.inputs(plan).get(0);
    second = Answers.inputs(plan).get(1);
    planFirst = Answers.value(plan, first);
    planSecond = Answers.value(plan, second);
    plants = Sample.of(plan.plants());
  }

  /** The chart of an answer; none where there is no answer, no isoquant, or an input unused. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    if (!plan.answered() || plan.isoquant().size() < 2 || plan.prices().size() < 2) {
      return Optional.empty();
    }
    IsoquantCharts chart = new IsoquantCharts(plan, setting);
    return chart.planFirst > 0 && chart.planSecond > 0
        ? Optional.of(chart.chart())
        : Optional.empty();
  }

  private Chart chart() {
    String title =
        Answers.who(plan)
            + ": "
            + Answers.finding(plan, setting)
            + ", with "
            + Answers.mix(plan, setting);
    return Drawn.chart(
        Chart.Kind.ISOQUANT,
        new Said(
            Answers.subject(plan),
            setting.names().of("isoquant", plan.question(), plan.technology()),
            title,
            caption(),
            alternative(title)),
        table(),
        this::plot);
  }

  private String caption() {
    StringBuilder words = new StringBuilder();
    words.append(
        plan.status().equals("solved") || plan.status().equals("outside-records")
            ? "The isocost line touches the isoquant at the least-cost mix."
            : "The isocost line runs through the least-cost mix; a limit keeps it from touching the"
                + " isoquant there.");
    words.append(Answers.limits(plan));
    List<String> others = Answers.inputs(plan).subList(2, Answers.inputs(plan).size());
    for (String other : others) {
      words.append(' ').append(Words.sentence(other)).append(" as in the plan, ");
      words.append(Answers.quantity(other, Answers.value(plan, other), setting)).append('.');
    }
    if (!plants.isEmpty()) {
      words.append(
          " Dots are mixes in the records, filled where output is within a quarter of the");
      words.append(" target.");
      long beyond = plants.stream().filter(m -> !inFrame(m)).count();
      if (beyond > 0) {
        words.append(' ').append(beyond).append(beyond == 1 ? " lies" : " lie");
        words.append(" outside the frame.");
      }
      words.append(Sample.words(plan.plants().size()));
    }
    return words.toString();
  }

  private String alternative(String title) {
    double spent = price(first) * planFirst + price(second) * planSecond;
    return title
        + ". The isoquant falls from "
        + Words.list(
            List.of(
                Answers.quantity(second, isoquantAt(0)[1], setting) + " of " + second,
                Answers.quantity(first, isoquantAt(0)[0], setting) + " of " + first))
        + " to "
        + Words.list(
            List.of(
                Answers.quantity(second, isoquantAt(-1)[1], setting) + " of " + second,
                Answers.quantity(first, isoquantAt(-1)[0], setting) + " of " + first))
        + "; the isocost line stands for "
        + Numbers.money(spent, setting.units().money())
        + " spent on the two inputs.";
  }

  private double[] isoquantAt(int index) {
    return plan.isoquant().get(index < 0 ? plan.isoquant().size() - 1 : index);
  }

  private double price(String input) {
    return plan.prices().getOrDefault(input, Double.NaN);
  }

  private Table table() {
    Table table =
        Table.of(
            "item",
            Answers.heading(first, setting),
            Answers.heading(second, setting),
            Words.output(setting.units()));
    String target = Numbers.tabular(plan.target());
    table.row("least-cost mix", Numbers.tabular(planFirst), Numbers.tabular(planSecond), target);
    for (double[] point : plan.isoquant()) {
      table.row("isoquant", Numbers.tabular(point[0]), Numbers.tabular(point[1]), target);
    }
    for (Mix mix : plants) {
      table.row(
          mix.plant() + ", " + mix.period(),
          Numbers.tabular(mix.first()),
          Numbers.tabular(mix.second()),
          Numbers.tabular(mix.output()));
    }
    return table;
  }

  private double frameFirst() {
    double most = plants.stream().mapToDouble(Mix::first).max().orElse(0);
    return Math.min(MOST_FRAME * planFirst, Math.max(LEAST_FRAME * planFirst, most));
  }

  private double frameSecond() {
    double most = plants.stream().mapToDouble(Mix::second).max().orElse(0);
    return Math.min(MOST_FRAME * planSecond, Math.max(LEAST_FRAME * planSecond, most));
  }

  private boolean inFrame(Mix mix) {
    return mix.first() <= frameFirst() && mix.second() <= frameSecond();
  }

  private boolean near(Mix mix) {
    return Math.abs(mix.output() - plan.target()) <= NEAR * plan.target();
  }

  private Plot plot() {
    Axis x = Axis.fromZero(Answers.heading(first, setting), frameFirst());
    Axis y = Axis.fromZero(Answers.heading(second, setting), frameSecond());
    Plot plot = new Plot(x, y);
    cloud(plot, "plants far from the target", false, Dot.FAR);
    cloud(plot, "plants near the target", true, Dot.NEAR);
    double[][] isocost = isocost(x, y);
    plot.line("isocost line", isocost[0], isocost[1], Pen.SECOND);
    List<double[]> inside =
        plan.isoquant().stream().filter(p -> x.holds(p[0]) && y.holds(p[1])).toList();
    double[] isoquantX = column(inside, 0);
    double[] isoquantY = column(inside, 1);
    if (isoquantX.length > 0) {
      plot.line("isoquant", isoquantX, isoquantY, Pen.MAIN);
    }
    double[] atFirst = {planFirst};
    double[] atSecond = {planSecond};
    plot.dots("least-cost mix", atFirst, atSecond, Dot.ANSWER);
    plot.label(
        "least-cost mix", planFirst, planSecond, Style.WARM, Side.NORTH_EAST, Side.SOUTH_WEST);
    if (isoquantX.length > 0) {
      plot.labelAlong(
          "isoquant, " + Answers.planned(plan, setting),
          Curves.ends(isoquantX),
          Curves.ends(isoquantY),
          Style.DEEP,
          Side.NORTH_EAST,
          Side.EAST,
          Side.NORTH);
    }
    plot.labelAlong(
        "isocost line",
        Curves.ends(isocost[0]),
        Curves.ends(isocost[1]),
        Style.WARM,
        Side.SOUTH_WEST,
        Side.NORTH_EAST,
        Side.EAST);
    if (!plants.isEmpty()) {
      plot.key(Dot.NEAR, "plants within a quarter of the target");
      plot.key(Dot.FAR, "other plants");
    }
    return plot;
  }

  private void cloud(Plot plot, String name, boolean near, Dot dot) {
    List<Mix> some = plants.stream().filter(m -> inFrame(m) && near(m) == near).toList();
    plot.dots(
        name,
        some.stream().mapToDouble(Mix::first).toArray(),
        some.stream().mapToDouble(Mix::second).toArray(),
        dot);
  }

  /** The part of the isocost line w₁x₁ + w₂x₂ = const. that lies in the frame, in small steps. */
  private double[][] isocost(Axis x, Axis y) {
    double slope = -price(first) / price(second);
    double from = Math.max(0, planFirst + (y.high() - planSecond) / slope);
    double to = Math.min(x.high(), planFirst - planSecond / slope);
    int steps = 40;
    double[] xs = new double[steps + 1];
    double[] ys = new double[steps + 1];
    for (int i = 0; i <= steps; i++) {
      xs[i] = from + (to - from) * i / steps;
      ys[i] = Math.max(0, planSecond + slope * (xs[i] - planFirst));
    }
    return new double[][] {xs, ys};
  }

  private static double[] column(List<double[]> points, int column) {
    return points.stream().mapToDouble(p -> p[column]).toArray();
  }
}

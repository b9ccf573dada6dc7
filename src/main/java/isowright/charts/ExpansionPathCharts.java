package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Mix;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The least-cost mix of the first two inputs as the target grows. */
final class ExpansionPathCharts {

  private final Planned plan;
  private final Setting setting;
  private final String first;
  private final String second;
  private final List<CurvePoint> path;
  private final List<Mix> plants;

  private ExpansionPathCharts(Planned plan, Setting setting) {
    this.plan = plan;
    this.setting = setting;
    first = Answers.inputs(plan).get(0);
    second = Answers.inputs(plan).get(1);
    path =
        plan.curve().stream()
            .filter(p -> Double.isFinite(at(p, first)) && Double.isFinite(at(p, second)))
            .toList();
    plants = Sample.of(plan.plants());
  }

  /** The chart of an answer; none where there is no curve. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    if (!plan.answered() || plan.prices().size() < 2) {
      return Optional.empty();
    }
    ExpansionPathCharts chart = new ExpansionPathCharts(plan, setting);
    return chart.path.size() < 2 ? Optional.empty() : Optional.of(chart.chart());
  }

  private static double at(CurvePoint point, String input) {
    return point.mix().getOrDefault(input, Double.NaN);
  }

  private CurvePoint start() {
    return path.get(0);
  }

  private CurvePoint end() {
    return path.get(path.size() - 1);
  }

  private Chart chart() {
    String title = Words.sentence(Words.technology(plan.technology())) + ": " + finding();
    String caption =
        "Least-cost mixes at the prices of the question, output beside the path."
            + Answers.limits(plan)
            + (path.stream().allMatch(CurvePoint::inside)
                ? ""
                : " The path is dotted where a mix lies outside the records.")
            + (plants.isEmpty() ? "" : " Circles are mixes in the records.")
            + Sample.words(plan.plants().size());
    return Drawn.chart(
        Chart.Kind.EXPANSION_PATH,
        new Said(
            Answers.subject(plan),
            setting.names().of("expansion", plan.question(), plan.technology()),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  /** What happens to the proportion of the first two inputs between the ends of the path. */
  private String finding() {
    double from = at(start(), first) / at(start(), second);
    double to = at(end(), first) / at(end(), second);
    String span =
        Answers.output(start().target(), setting)
            + " to "
            + Answers.output(end().target(), setting);
    if (!Double.isFinite(from) || !Double.isFinite(to)) {
      return "least-cost mix of " + first + " and " + second + " from " + span;
    }
    String unit = Words.unit(setting.units(), first);
    String per = Words.unit(setting.units(), second);
    String proportion = first + " for each " + (per.isEmpty() ? "unit of " : per + " of ") + second;
    String before = Words.with(Numbers.brief(from), unit);
    String after = Words.with(Numbers.brief(to), unit);
    if (before.equals(after)) {
      return proportion + " stays at " + before + " from " + span;
    }
    return proportion
        + (to > from ? " rises" : " falls")
        + " from "
        + before
        + " at "
        + Answers.output(start().target(), setting)
        + " to "
        + after
        + " at "
        + Answers.output(end().target(), setting);
  }

  private String alternative(String title) {
    return title
        + ". The path runs from "
        + point(start())
        + " at "
        + Answers.output(start().target(), setting)
        + " to "
        + point(end())
        + " at "
        + Answers.output(end().target(), setting)
        + ".";
  }

  private String point(CurvePoint point) {
    return first
        + " "
        + Answers.quantity(first, at(point, first), setting)
        + " and "
        + second
        + " "
        + Answers.quantity(second, at(point, second), setting);
  }

  private Table table() {
    List<String> header = new ArrayList<>(List.of(Words.output(setting.units())));
    for (String input : Answers.inputs(plan)) {
      header.add(Answers.heading(input, setting));
    }
    header.add("inside the records");
    Table table = Table.of(header);
    for (CurvePoint point : path) {
      List<String> row = new ArrayList<>(List.of(Numbers.tabular(point.target())));
      for (String input : Answers.inputs(plan)) {
        row.add(Numbers.tabular(at(point, input)));
      }
      row.add(point.inside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    double frameFirst = frame(path.stream().mapToDouble(p -> at(p, first)).toArray(), first);
    double frameSecond = frame(path.stream().mapToDouble(p -> at(p, second)).toArray(), second);
    Plot plot =
        new Plot(
            Axis.fromZero(Answers.heading(first, setting), frameFirst),
            Axis.fromZero(Answers.heading(second, setting), frameSecond));
    List<Mix> inside =
        plants.stream().filter(m -> m.first() <= frameFirst && m.second() <= frameSecond).toList();
    plot.dots(
        "plants",
        inside.stream().mapToDouble(Mix::first).toArray(),
        inside.stream().mapToDouble(Mix::second).toArray(),
        Dot.FAR);
    path(plot, true, Pen.MAIN);
    path(plot, false, Pen.MAIN_BEYOND);
    steps(plot);
    if (!plants.isEmpty()) {
      plot.key(Dot.FAR, "mixes in the records");
    }
    return plot;
  }

  /** Room for the path and the plan, and for the plants as long as the path stays readable. */
  private double frame(double[] along, String input) {
    double most = Math.max(Curves.most(along), Answers.value(plan, input));
    double plant =
        plants.stream()
            .mapToDouble(m -> input.equals(first) ? m.first() : m.second())
            .max()
            .orElse(0);
    return Math.max(1.15 * most, Math.min(plant, 2 * most));
  }

  /** The stretches of the path inside (or outside) the records, each with the point after it. */
  private void path(Plot plot, boolean inside, Pen pen) {
    double[] xs = new double[path.size()];
    double[] ys = new double[path.size()];
    boolean any = false;
    for (int i = 0; i < xs.length; i++) {
      boolean belongs =
          path.get(i).inside() == inside || (i > 0 && path.get(i - 1).inside() == inside);
      xs[i] = at(path.get(i), first);
      ys[i] = belongs ? at(path.get(i), second) : Double.NaN;
      any |= belongs;
    }
    if (any) {
      plot.line(inside ? "expansion path" : "expansion path outside the records", xs, ys, pen);
    }
  }

  private void steps(Plot plot) {
    int[] at = Curves.spread(path.size(), 4);
    double[] xs = new double[at.length];
    double[] ys = new double[at.length];
    for (int i = 0; i < at.length; i++) {
      CurvePoint point = path.get(at[i]);
      xs[i] = at(point, first);
      ys[i] = at(point, second);
    }
    plot.dots("steps", xs, ys, Dot.STEP);
    double[] answerX = {Answers.value(plan, first)};
    double[] answerY = {Answers.value(plan, second)};
    plot.dots("target", answerX, answerY, Dot.ANSWER);
    plot.label(
        Answers.aim(plan, setting),
        answerX[0],
        answerY[0],
        Style.WARM,
        Side.NORTH_WEST,
        Side.SOUTH_EAST);
    for (int i = 0; i < at.length; i++) {
      plot.label(
          Answers.output(path.get(at[i]).target(), setting),
          xs[i],
          ys[i],
          Style.DEEP,
          Side.SOUTH_EAST,
          Side.NORTH_WEST,
          Side.EAST,
          Side.WEST);
    }
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanDetail.PlantPart;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What each plant makes of a target that is split, with its interval and its capacity. */
final class SplitCharts {

  private static final int ROW_HEIGHT = 27;
  private static final int FRAME_HEIGHT = 92;

  private final Planned plan;
  private final List<PlantPart> parts;
  private final Setting setting;

  private SplitCharts(Planned plan, Setting setting) {
    this.plan = plan;
    this.parts = plan.detail().across();
    this.setting = setting;
  }

  /** The chart of an answer; none where the target is not split. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    return plan.detail().across().isEmpty()
        ? Optional.empty()
        : Optional.of(new SplitCharts(plan, setting).chart());
  }

  private Chart chart() {
    List<PlantPart> running = parts.stream().filter(PlantPart::runs).toList();
    String title =
        Words.sentence(Words.technology(plan.technology()))
            + ": "
            + Answers.planned(plan, setting)
            + (running.size() == 1
                ? " cost least when " + running.get(0).plant() + " makes all of it"
                : " cost least when split over "
                    + Words.list(
                        running.stream().map(p -> p.plant() + " (" + amount(p) + ")").toList()));
    String caption =
        (parts.stream().anyMatch(p -> p.output().uncertainty().isPresent())
                ? "Thin lines are " + setting.level() + " intervals. "
                : "")
            + "Diamonds mark capacities; the bar of a plant that runs full ends at its diamond.";
    return Drawn.chart(
        Chart.Kind.SPLIT,
        new Said(
            Answers.subject(plan),
            setting.names().of("split", plan.question(), plan.technology()),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  private String amount(PlantPart part) {
    return Words.with(Numbers.brief(part.output().value()), setting.units().output());
  }

  private String alternative(String title) {
    return title
        + ". "
        + String.join(
            "; ",
            parts.stream()
                .map(
                    p ->
                        p.plant()
                            + (p.runs()
                                ? " makes "
                                    + Words.with(
                                        Words.interval(p.output()), setting.units().output())
                                : " does not run"))
                .toList())
        + ".";
  }

  private Table table() {
    String money = setting.units().money();
    Table table =
        Table.of(
            "plant",
            "runs",
            Words.output(setting.units()),
            "output, low",
            "output, high",
            "capacity",
            "cost (" + money + ")",
            "cost, low",
            "cost, high",
            "marginal cost (" + Words.perOutput(setting.units()) + ")",
            "inside the records");
    for (PlantPart part : parts) {
      List<String> row = new ArrayList<>(List.of(part.plant(), part.runs() ? "yes" : "no"));
      row.addAll(Words.cells(part.output()));
      row.add(Double.isFinite(part.capacity()) ? Numbers.tabular(part.capacity()) : "not stated");
      row.addAll(Words.cells(part.cost()));
      row.add(Numbers.tabular(part.marginalCost().map(Figure::value)));
      row.add(part.inside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    List<Row> rows =
        parts.stream()
            .map(
                p ->
                    new Row(
                        p.plant(), false, p.runs() ? Words.interval(p.output()) : "does not run"))
            .toList();
    double most = 0;
    for (PlantPart part : parts) {
      most = Math.max(most, part.output().uncertainty().map(u -> u.high()).orElse(0.0));
      most = Math.max(most, Math.max(part.output().value(), finite(part.capacity())));
    }
    Plot plot =
        new Plot(
            Axis.fromZero(Words.output(setting.units()), most),
            Axis.between("", 0, rows.size()),
            Style.WIDTH,
            FRAME_HEIGHT + ROW_HEIGHT * rows.size());
    plot.rows(rows);
    for (int i = 0; i < parts.size(); i++) {
      add(plot, parts.get(i), new double[] {Plot.rowAt(i, rows.size())});
    }
    return plot;
  }

  private static double finite(double capacity) {
    return Double.isFinite(capacity) ? capacity : 0;
  }

  private static void add(Plot plot, PlantPart part, double[] at) {
    if (part.runs()) {
      double[] none = {0};
      plot.intervals("output", none, new double[] {part.output().value()}, at, Pen.BAR);
    }
    part.output()
        .uncertainty()
        .filter(u -> part.runs() && Double.isFinite(u.low()) && Double.isFinite(u.high()))
        .ifPresent(
            u ->
                plot.intervals(
                    "interval",
                    new double[] {u.low()},
                    new double[] {u.high()},
                    at,
                    Pen.BAR_INTERVAL));
    if (Double.isFinite(part.capacity())) {
      plot.dots("capacity", new double[] {part.capacity()}, at, Dot.MARKED);
    }
  }
}

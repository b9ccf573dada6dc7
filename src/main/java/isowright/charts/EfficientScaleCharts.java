package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanDetail.EfficientScale;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** The outputs of least average cost with their intervals, on a log scale. */
final class EfficientScaleCharts {

  private static final int ROW_HEIGHT = 27;
  private static final int FRAME_HEIGHT = 92;

  /** A factor beyond the intervals, so that a log scale has numbers to read. */
  private static final double ROOM = 2;

  /** An answer whose average cost has its least inside what was examined. */
  private record Item(Planned plan, EfficientScale scale, Figure output) {}

  private EfficientScaleCharts() {}

  /** The chart of a study; none where average cost has a least nowhere. */
  static Optional<Chart> of(List<Planned> plans, Setting setting) {
    List<Item> items = new ArrayList<>();
    Set<String> seen = new HashSet<>();
    for (Planned plan : plans) {
      plan.detail()
          .efficientScale()
          .filter(scale -> scale.course().equals("interior"))
          .filter(scale -> seen.add(QuestionCharts.asked(plan) + "\0" + plan.technology()))
          .flatMap(scale -> scale.output().map(output -> new Item(plan, scale, output)))
          .filter(item -> item.output().value() > 0)
          .ifPresent(items::add);
    }
    return items.isEmpty() ? Optional.empty() : Optional.of(chart(items, setting));
  }

  private static Chart chart(List<Item> items, Setting setting) {
    double[] values = items.stream().mapToDouble(i -> i.output().value()).toArray();
    String title =
        "Average cost is least at "
            + Words.with(span(Curves.least(values), Curves.most(values)), setting.units().output());
    String caption =
        "Output of least average cost at the prices and limits of each question."
            + (Bands.uncertain(items.stream().map(Item::output).toList())
                ? " Bars are " + setting.level() + " intervals, found on the log scale."
                : "");
    return Drawn.chart(
        Chart.Kind.EFFICIENT_SCALE,
        new Said(
            "",
            setting.names().of("efficient scale of plans"),
            title,
            caption,
            alternative(title, items)),
        table(items, setting),
        () -> plot(items, setting));
  }

  private static String span(double least, double most) {
    String from = Numbers.brief(least);
    String to = Numbers.brief(most);
    return from.equals(to) ? from : from + " to " + to;
  }

  private static String name(Item item) {
    return QuestionCharts.asked(item.plan()) + ", " + Words.technology(item.plan().technology());
  }

  private static String alternative(String title, List<Item> items) {
    return title
        + ". "
        + String.join(
            "; ", items.stream().map(i -> name(i) + " " + Words.interval(i.output())).toList())
        + ".";
  }

  private static Table table(List<Item> items, Setting setting) {
    Table table =
        Table.of(
            "question and technology",
            "efficient scale, " + Words.output(setting.units()),
            "low",
            "high",
            "average cost (" + Words.perOutput(setting.units()) + ")",
            "average cost, low",
            "average cost, high",
            "inside the records");
    for (Item item : items) {
      List<String> row = new ArrayList<>(List.of(name(item)));
      row.addAll(Words.cells(item.output()));
      row.addAll(Words.cells(item.scale().averageCost().orElse(Figure.exact(Double.NaN))));
      row.add(item.scale().inside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private static Plot plot(List<Item> items, Setting setting) {
    List<Row> rows = new ArrayList<>();
    List<Optional<Item>> drawn = new ArrayList<>();
    String group = "";
    for (Item item : items) {
      String asked = QuestionCharts.asked(item.plan());
      if (!asked.equals(group)) {
        group = asked;
        rows.add(new Row(asked, true, ""));
        drawn.add(Optional.empty());
      }
      rows.add(
          new Row(
              Words.technology(item.plan().technology()), false, Words.interval(item.output())));
      drawn.add(Optional.of(item));
    }
    List<Figure> figures = items.stream().map(Item::output).toList();
    double least = Curves.least(Bands.ends(figures, true));
    Plot plot =
        new Plot(
            Axis.logarithmic(
                Words.output(setting.units()),
                least / ROOM,
                ROOM * Curves.most(Bands.ends(figures, false))),
            Axis.between("", 0, rows.size()),
            Style.WIDTH,
            FRAME_HEIGHT + ROW_HEIGHT * rows.size());
    plot.rows(rows);
    for (int i = 0; i < rows.size(); i++) {
      double[] at = {Plot.rowAt(i, rows.size())};
      drawn
          .get(i)
          .ifPresent(
              item -> {
                List<Figure> one = List.of(item.output());
                plot.intervals(
                    "interval", Bands.ends(one, true), Bands.ends(one, false), at, Pen.INTERVAL);
                plot.dots("efficient scale", Bands.values(one), at, Dot.ESTIMATE);
              });
    }
    return plot;
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanDetail.Change;
import isowright.study.PlanDetail.End;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * What each price, the goal and productivity change in the result, the greatest change on top: by
 * ten per cent as bars, over what the records hold as a line.
 */
final class ChangeCharts {

  private static final int ROW_HEIGHT = 30;
  private static final int FRAME_HEIGHT = 92;
  private static final int KEY_HEIGHT = 22;

  /** Changes over the records are followed to so many times the greatest by ten per cent. */
  private static final double FOLLOWED = 4;

  private static final String TENTH = "ten-per-cent";

  /** One thing that is moved, with its changes by ten per cent and over the records. */
  private record Moved(String name, Change tenth, Optional<Change> observed) {

    double reach() {
      return Math.abs(percent(tenth.high()) - percent(tenth.low()));
    }
  }

  private final Planned plan;
  private final Setting setting;
  private final List<Moved> moved;

  private ChangeCharts(Planned plan, List<Moved> moved, Setting setting) {
    this.plan = plan;
    this.moved = moved;
    this.setting = setting;
  }

  /** The chart of an answer; none where nothing was moved. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    List<Moved> moved = new ArrayList<>();
    for (Change change : plan.detail().changes()) {
      boolean both = change.low().relative().isPresent() && change.high().relative().isPresent();
      if (change.span().equals(TENTH) && both) {
        moved.add(new Moved(Answers.moved(change), change, observed(plan, change)));
      }
    }
    moved.sort(Comparator.comparingDouble(Moved::reach).reversed());
    return moved.isEmpty()
        ? Optional.empty()
        : Optional.of(new ChangeCharts(plan, moved, setting).chart());
  }

  private static Optional<Change> observed(Planned plan, Change like) {
    return plan.detail().changes().stream()
        .filter(c -> !c.span().equals(TENTH))
        .filter(c -> c.what().equals(like.what()) && c.input().equals(like.input()))
        .findFirst();
  }

  /** The change of the result in per cent; NaN where there is none. */
  private static double percent(End end) {
    return 100 * end.relative().map(Figure::value).orElse(Double.NaN);
  }

  private Chart chart() {
    Moved first = moved.get(0);
    String result = Answers.result(plan);
    String title =
        Words.sentence(Words.technology(plan.technology()))
            + ": "
            + first.name()
            + " matters most: ten per cent less and more of it change "
            + result
            + " by "
            + ends(first.tenth());
    String caption =
        "Change of "
            + result
            + " when one thing moves and all else stays as asked: thick bars ten per cent down,"
            + " thin ones ten per cent up."
            + (moved.stream().anyMatch(m -> m.observed().isPresent())
                ? " Lines: over what the records hold; one that reaches the frame goes on beyond"
                    + " it."
                : "")
            + Answers.limits(plan);
    return Drawn.chart(
        Chart.Kind.CHANGES,
        new Said(
            Answers.subject(plan),
            setting.names().of("what if", plan.question(), plan.technology()),
            title,
            caption,
            alternative(title)),
        table(result),
        () -> plot(result));
  }

  private String alternative(String title) {
    List<String> parts = moved.stream().map(m -> m.name() + " " + ends(m.tenth())).toList();
    return title + ". Ten per cent down and up: " + String.join("; ", parts) + ".";
  }

  private static String ends(Change change) {
    return signed(percent(change.low())) + " and " + signed(percent(change.high()));
  }

  private static String signed(double percent) {
    String size = Numbers.decimals(Math.abs(percent), 1);
    return (percent < 0 ? "−" : "+") + size + " %";
  }

  private Table table(String result) {
    String ends = setting.level();
    Table table =
        Table.of(
            "what moves",
            "to",
            result + " there",
            result + " there, " + ends + " low",
            result + " there, " + ends + " high",
            "relative change",
            "relative change, low",
            "relative change, high");
    for (Moved each : moved) {
      row(table, each.name() + ", 10 % down", each.tenth().low());
      row(table, each.name() + ", 10 % up", each.tenth().high());
      each.observed()
          .ifPresent(
              seen -> {
                row(table, each.name() + ", least in the records", seen.low());
                row(table, each.name() + ", most in the records", seen.high());
              });
    }
    return table;
  }

  private static void row(Table table, String what, End end) {
    Figure none = Figure.exact(Double.NaN);
    List<String> row = new ArrayList<>(List.of(what, Numbers.tabular(end.at())));
    row.addAll(Words.cells(end.result().orElse(none)));
    row.addAll(Words.cells(end.relative().orElse(none)));
    table.row(row);
  }

  private Plot plot(String result) {
    List<Row> rows =
        moved.stream()
            .map(
                m ->
                    new Row(
                        m.name(),
                        false,
                        signed(percent(m.tenth().low()))
                            + " / "
                            + signed(percent(m.tenth().high()))))
            .toList();
    double[] ends = extent();
    Plot plot =
        new Plot(
            Axis.around("change of " + result + " (%)", ends[0], ends[1]),
            Axis.between("", 0, rows.size()),
            Style.WIDTH,
            FRAME_HEIGHT + KEY_HEIGHT + ROW_HEIGHT * rows.size());
    plot.rows(rows).vertical("as planned", 0, Pen.REFERENCE);
    plot.key(Pen.BAR, "ten per cent down").key(Pen.SECOND_BAR, "ten per cent up");
    if (moved.stream().anyMatch(m -> m.observed().isPresent())) {
      plot.key(Pen.THIN_INTERVAL, "over the records");
    }
    for (int i = 0; i < moved.size(); i++) {
      Moved each = moved.get(i);
      double at = Plot.rowAt(i, rows.size());
      each.observed()
          .ifPresent(
              seen -> bar(plot, percent(seen.low()), percent(seen.high()), at, Pen.THIN_INTERVAL));
      bar(plot, 0, percent(each.tenth().low()), at, Pen.BAR);
      bar(plot, 0, percent(each.tenth().high()), at, Pen.SECOND_BAR);
    }
    return plot;
  }

  /** The least and greatest change; what the records hold is followed only so far. */
  private double[] extent() {
    double least = 0;
    double most = 0;
    for (Moved each : moved) {
      for (End end : List.of(each.tenth().low(), each.tenth().high())) {
        least = Math.min(least, percent(end));
        most = Math.max(most, percent(end));
      }
    }
    double room = FOLLOWED * Math.max(-least, most);
    double low = least;
    double high = most;
    for (Moved each : moved) {
      for (Change change : each.observed().stream().toList()) {
        for (End end : List.of(change.low(), change.high())) {
          double value = percent(end);
          low = Double.isFinite(value) ? Math.min(low, Math.max(value, -room)) : low;
          high = Double.isFinite(value) ? Math.max(high, Math.min(value, room)) : high;
        }
      }
    }
    return new double[] {low, high};
  }

  private static void bar(Plot plot, double from, double to, double at, Pen pen) {
    if (Double.isFinite(from) && Double.isFinite(to)) {
      plot.intervals(
          "span",
          new double[] {Math.min(from, to)},
          new double[] {Math.max(from, to)},
          new double[] {at},
          pen);
    }
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanDetail.Envelope;
import isowright.study.PlanDetail.EnvelopePoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Average cost with inputs held beside average cost with all inputs free, which lies beneath it and
 * touches it where what is held is what the long run would have.
 */
final class EnvelopeCharts {

  private final Planned plan;
  private final Envelope envelope;
  private final Setting setting;
  private final double[] targets;
  private final List<Figure> shortRun;
  private final List<Figure> longRun;

  private EnvelopeCharts(Planned plan, Envelope envelope, Setting setting) {
    this.plan = plan;
    this.envelope = envelope;
    this.setting = setting;
    targets = envelope.points().stream().mapToDouble(EnvelopePoint::target).toArray();
    shortRun = envelope.points().stream().map(EnvelopePoint::shortRunAverage).toList();
    longRun = envelope.points().stream().map(EnvelopePoint::longRunAverage).toList();
  }

  /** The chart of an answer; none where nothing is held. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    return plan.detail()
        .envelope()
        .filter(envelope -> envelope.points().size() >= 2)
        .map(envelope -> new EnvelopeCharts(plan, envelope, setting).chart());
  }

  private Chart chart() {
    String title =
        Words.sentence(Words.technology(plan.technology()))
            + ": with "
            + held()
            + ", average cost "
            + envelope
                .touch()
                .map(
                    t ->
                        "is that of the long run at "
                            + Words.with(Numbers.brief(t.value()), setting.units().output())
                            + " and lies above it elsewhere")
                .orElse("lies above that of the long run");
    return Drawn.chart(
        Chart.Kind.ENVELOPE,
        new Said(
            Answers.subject(plan),
            setting.names().of("short run", plan.question(), plan.technology()),
            title,
            caption(),
            alternative(title)),
        table(),
        this::plot);
  }

  private String held() {
    List<String> parts = new ArrayList<>();
    envelope
        .held()
        .forEach(
            (input, quantity) ->
                parts.add(input + " held at " + Answers.quantity(input, quantity, setting)));
    return Words.list(parts);
  }

  private String caption() {
    return "Money axis in "
        + Words.perOutput(setting.units())
        + ". In the long run every input is free to change."
        + (Bands.uncertain(shortRun)
            ? " Bands are pointwise " + setting.level() + " intervals."
            : "")
        + (envelope.points().stream().allMatch(EnvelopePoint::shortRunInside)
            ? ""
            : " Shaded: the mix of the short run lies outside the records.");
  }

  private String alternative(String title) {
    int last = targets.length - 1;
    return title
        + ". Short-run average cost "
        + at(shortRun, 0)
        + ", "
        + at(shortRun, last)
        + "; long-run average cost "
        + at(longRun, 0)
        + ", "
        + at(longRun, last)
        + ".";
  }

  private String at(List<Figure> figures, int k) {
    return Numbers.brief(figures.get(k).value()) + " at " + Answers.output(targets[k], setting);
  }

  private Table table() {
    List<String> header = new ArrayList<>(List.of(Words.output(setting.units())));
    String per = " (" + Words.perOutput(setting.units()) + ")";
    for (String run : List.of("short run", "long run")) {
      for (String what : List.of("average", "marginal")) {
        String name = run + ", " + what + " cost";
        header.addAll(List.of(name + per, name + ", low", name + ", high"));
      }
    }
    header.addAll(List.of("short run inside the records", "long run inside the records"));
    Table table = Table.of(header);
    for (EnvelopePoint point : envelope.points()) {
      List<String> row = new ArrayList<>(List.of(Numbers.tabular(point.target())));
      row.addAll(Words.cells(point.shortRunAverage()));
      row.addAll(Words.cells(point.shortRunMarginal()));
      row.addAll(Words.cells(point.longRunAverage()));
      row.addAll(Words.cells(point.longRunMarginal()));
      row.add(point.shortRunInside() ? "yes" : "no");
      row.add(point.longRunInside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    Plot plot =
        new Plot(
            Axis.around(Words.output(setting.units()), targets[0], targets[targets.length - 1]),
            Bands.axis(
                Words.perOutput(setting.units()),
                Stream.concat(shortRun.stream(), longRun.stream()).toList()));
    Shades.outside(
        plot, targets, envelope.points().stream().map(EnvelopePoint::shortRunInside).toList());
    Bands.add(plot, "interval of the long run", targets, longRun, Style.DEEP, Pen.MAIN_EDGE);
    Bands.add(plot, "interval of the short run", targets, shortRun, Style.WARM, Pen.SECOND_EDGE);
    plot.line("long run", targets, Bands.values(longRun), Pen.MAIN);
    plot.line("short run", targets, Bands.values(shortRun), Pen.SECOND);
    plot.key(Pen.SECOND, "average cost, short run");
    plot.key(Pen.MAIN, "average cost, long run");
    envelope.touch().map(Figure::value).filter(plot.x()::holds).ifPresent(t -> touch(plot, t));
    if (plot.x().holds(plan.target())) {
      plot.vertical("target", plan.target(), Pen.REFERENCE);
      plot.label(
          Answers.aim(plan, setting),
          plan.target(),
          plot.y().high(),
          Style.QUIET_TEXT,
          Side.SOUTH_EAST,
          Side.SOUTH_WEST);
    }
    return plot;
  }

  /** Marks where both touch, on the long-run curve between its points. */
  private void touch(Plot plot, double target) {
    double value = Double.NaN;
    for (int k = 1; k < targets.length; k++) {
      if (targets[k - 1] <= target && target <= targets[k]) {
        double share = (target - targets[k - 1]) / (targets[k] - targets[k - 1]);
        value = (1 - share) * longRun.get(k - 1).value() + share * longRun.get(k).value();
      }
    }
    if (Double.isFinite(value)) {
      double[] x = {target};
      double[] y = {value};
      plot.dots("touch", x, y, Dot.STEP);
      plot.label("they touch", target, value, Style.DEEP, Side.SOUTH, Side.SOUTH_WEST, Side.NORTH);
    }
  }
}

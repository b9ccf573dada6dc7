package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.CostFindings.Efficient;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows.AveragePoint;
import isowright.study.CostRows.Row;
import isowright.study.Figure;
import java.awt.Color;
import java.util.List;
import java.util.Optional;

/** Average cost along output with the plants about it, and where it is least. */
final class AverageCostCharts {

  private final Fitted fit;
  private final Setting setting;
  private final List<Row> seen;
  private final List<Row> drawn;
  private final double[] outputs;
  private final double[] costs;

  private AverageCostCharts(Fitted fit, Setting setting) {
    this.fit = fit;
    this.setting = setting;
    this.seen = fit.rows().rows().stream().filter(r -> r.averageCost() > 0).toList();
    this.drawn = Sample.of(seen);
    this.outputs = fit.rows().average().stream().mapToDouble(AveragePoint::output).toArray();
    this.costs = fit.rows().average().stream().mapToDouble(p -> p.cost().value()).toArray();
  }

  /** The chart of a cost function; none where there is no curve. */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    return fit.rows().average().size() < 2
        ? Optional.empty()
        : Optional.of(new AverageCostCharts(fit, setting).chart());
  }

  private Chart chart() {
    String title = Words.sentence(Words.technology(fit.technology())) + ": " + finding();
    String caption =
        "Line: the typical plant at mean prices, with its pointwise "
            + setting.level()
            + " interval. Dots: the rows, carried to the same prices."
            + (fit.efficient().isPresent()
                ? " Shaded: the "
                    + setting.level()
                    + " interval of the output at which average cost is least."
                : "")
            + Sample.words(seen.size());
    return Drawn.chart(
        Chart.Kind.AVERAGE_COST,
        new Said(
            fit.technology(),
            setting.names().of("average-cost", fit.technology()),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  /** "average cost", or that of a short run. */
  private String what() {
    return fit.rows().fixed().isEmpty() ? "average cost" : "average variable cost";
  }

  private String finding() {
    if (fit.efficient().isPresent()) {
      Efficient efficient = fit.efficient().get();
      return what()
          + " is least at "
          + Words.with(Words.interval(efficient.output()), setting.units().output())
          + "; "
          + Numbers.brief(100 * efficient.below())
          + " % of the rows produce less";
    }
    int last = costs.length - 1;
    return what()
        + (fit.rows().fixed().isEmpty()
            ? " "
            : " with " + Words.list(fit.rows().fixed()) + " at the mean ")
        + (costs[last] < costs[0] ? "falls" : "rises")
        + " from "
        + Numbers.brief(costs[0])
        + " at "
        + Answers.output(rounded(outputs[0]), setting)
        + " to "
        + Numbers.brief(costs[last])
        + " "
        + Words.perOutput(setting.units())
        + " at "
        + Answers.output(rounded(outputs[last]), setting);
  }

  /** Three digits of an output that is only the end of a curve. */
  private static double rounded(double output) {
    double unit = Math.pow(10, Math.floor(Math.log10(output)) - 2);
    return Math.round(output / unit) * unit;
  }

  private String alternative(String title) {
    int last = costs.length - 1;
    return title
        + ". The curve runs from "
        + Numbers.brief(costs[0])
        + " to "
        + Numbers.brief(costs[last])
        + " "
        + Words.perOutput(setting.units())
        + ", the least along it is "
        + Numbers.brief(Curves.least(costs))
        + "; "
        + Numbers.stated(seen.size())
        + " rows lie about it.";
  }

  private Table table() {
    String per = Words.perOutput(setting.units());
    Table table =
        Table.of(
            Words.output(setting.units()),
            what() + " (" + per + ")",
            what() + ", low",
            what() + ", high");
    for (AveragePoint point : fit.rows().average()) {
      table.row(
          java.util.stream.Stream.concat(
                  java.util.stream.Stream.of(Numbers.tabular(point.output())),
                  Words.cells(point.cost()).stream())
              .toList());
    }
    return table;
  }

  private Plot plot() {
    double[] x = drawn.stream().mapToDouble(Row::output).toArray();
    double[] y = drawn.stream().mapToDouble(Row::averageCost).toArray();
    double[] all = Curves.joined(y, costs);
    Plot plot =
        new Plot(
            Axis.fitting(Words.output(setting.units()), outputs[0], outputs[outputs.length - 1]),
            Axis.fitting(
                what() + " (" + Words.perOutput(setting.units()) + ")",
                Curves.least(all),
                Curves.most(all)));
    fit.efficient().map(Efficient::output).ifPresent(output -> efficient(plot, output));
    plot.dots("rows", x, y, Dot.FAR);
    band(plot);
    plot.line("average cost", outputs, costs, Pen.MAIN);
    plot.key(Pen.MAIN, "typical plant at mean prices");
    plot.key(Dot.FAR, "rows at mean prices");
    return plot;
  }

  private void efficient(Plot plot, Figure output) {
    output
        .uncertainty()
        .filter(u -> Double.isFinite(u.low()) && Double.isFinite(u.high()))
        .ifPresent(u -> plot.region("efficient scale", u.low(), u.high()));
    if (plot.x().holds(output.value())) {
      plot.vertical("efficient scale", output.value(), Pen.REFERENCE);
      plot.label(
          "least at " + Numbers.brief(output.value()),
          output.value(),
          plot.y().high(),
          Style.QUIET_TEXT,
          Side.SOUTH_EAST,
          Side.SOUTH_WEST);
    }
  }

  private void band(Plot plot) {
    List<AveragePoint> known =
        fit.rows().average().stream()
            .filter(p -> p.cost().uncertainty().isPresent())
            .filter(p -> Double.isFinite(p.cost().uncertainty().get().high()))
            .toList();
    if (known.size() < 2) {
      return;
    }
    Color faint =
        new Color(
            Style.DEEP.getRed(), Style.DEEP.getGreen(), Style.DEEP.getBlue(), Style.BAND_ALPHA);
    plot.band(
        "interval",
        known.stream().mapToDouble(AveragePoint::output).toArray(),
        known.stream()
            .mapToDouble(p -> plot.y().clamp(p.cost().uncertainty().orElseThrow().low()))
            .toArray(),
        known.stream()
            .mapToDouble(p -> plot.y().clamp(p.cost().uncertainty().orElseThrow().high()))
            .toArray(),
        faint,
        Pen.MAIN_EDGE);
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Pen;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows.Row;
import isowright.study.CostRows.Told;
import isowright.study.Figure;
import java.awt.Color;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** Scale economies of all rows in ascending order, with their intervals and a line at one. */
final class ScaleEconomiesCharts {

  private final Fitted fit;
  private final Setting setting;
  private final List<Row> ordered;
  private final List<Row> drawn;

  private ScaleEconomiesCharts(Fitted fit, Setting setting) {
    this.fit = fit;
    this.setting = setting;
    this.ordered =
        fit.rows().rows().stream()
            .filter(row -> row.scale().filter(f -> Double.isFinite(f.value())).isPresent())
            .sorted(
                Comparator.comparingDouble(ScaleEconomiesCharts::value)
                    .thenComparing(Row::plant)
                    .thenComparing(Row::period))
            .toList();
    this.drawn = Sample.of(ordered);
  }

  /** The chart of a cost function; none where scale economies are the same in every row. */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    ScaleEconomiesCharts chart = new ScaleEconomiesCharts(fit, setting);
    int n = chart.ordered.size();
    boolean one =
        n < 3 || value(chart.ordered.get(n - 1)) - value(chart.ordered.get(0)) < CostShape.NOTHING;
    return one ? Optional.empty() : Optional.of(chart.chart());
  }

  private static double value(Row row) {
    return row.scale().map(Figure::value).orElse(Double.NaN);
  }

  private static double end(Row row, boolean low) {
    return row.scale()
        .flatMap(Figure::uncertainty)
        .map(u -> low ? u.low() : u.high())
        .filter(Double::isFinite)
        .orElse(value(row));
  }

  private Chart chart() {
    Told told = fit.rows().told();
    String title =
        Words.sentence(Words.technology(fit.technology()))
            + ": economies of scale in "
            + Numbers.stated(told.economies())
            + " of "
            + Numbers.stated(told.known())
            + " rows, with the whole interval above one in "
            + Numbers.stated(told.above());
    String caption =
        "Rows in ascending order. Above one, a per cent more output costs less than a per cent"
            + " more. Band: "
            + setting.level()
            + " intervals. Below one with the whole interval: "
            + Numbers.stated(told.below())
            + "; cannot be told from one: "
            + Numbers.stated(told.unclear())
            + "."
            + Sample.words(ordered.size());
    String alternative =
        title
            + ". The least is "
            + Numbers.brief(value(ordered.get(0)))
            + ", the median "
            + Numbers.brief(value(ordered.get(ordered.size() / 2)))
            + ", the greatest "
            + Numbers.brief(value(ordered.get(ordered.size() - 1)))
            + ".";
    return Drawn.chart(
        Chart.Kind.SCALE_ECONOMIES,
        new Said(
            fit.technology(),
            setting.names().of("scale-economies", fit.technology()),
            title,
            caption,
            alternative),
        table(),
        this::plot);
  }

  private Table table() {
    Table table =
        Table.of(
            "plant",
            "period",
            Words.output(setting.units()),
            "scale economies",
            setting.level() + " low",
            setting.level() + " high");
    for (Row row : drawn) {
      table.row(
          row.plant(),
          row.period(),
          Numbers.tabular(row.output()),
          Numbers.tabular(value(row)),
          Numbers.tabular(end(row, true)),
          Numbers.tabular(end(row, false)));
    }
    return table;
  }

  private Plot plot() {
    int n = drawn.size();
    double[] x = IntStream.range(0, n).mapToDouble(k -> 100.0 * (k + 0.5) / n).toArray();
    double[] y = drawn.stream().mapToDouble(ScaleEconomiesCharts::value).toArray();
    double[] low = drawn.stream().mapToDouble(row -> end(row, true)).toArray();
    double[] high = drawn.stream().mapToDouble(row -> end(row, false)).toArray();
    // An interval that explodes must not flatten the others: it may leave the frame.
    double span = Math.max(Curves.most(y) - Curves.least(y), 0.05);
    double least = Math.max(Curves.least(low), Curves.least(y) - span);
    double most = Math.min(Curves.most(high), Curves.most(y) + span);
    Plot plot =
        new Plot(
            Axis.between("share of rows, in ascending order (%)", 0, 100),
            Axis.around("scale economies", Math.min(1, least), Math.max(1, most)));
    Color faint =
        new Color(
            Style.DEEP.getRed(), Style.DEEP.getGreen(), Style.DEEP.getBlue(), Style.BAND_ALPHA);
    plot.band("interval", x, clamped(plot, low), clamped(plot, high), faint, Pen.MAIN_EDGE);
    plot.horizontal("one", 1, Pen.REFERENCE);
    plot.line("scale economies", x, y, Pen.MAIN);
    plot.label("one: constant returns", 2, 1, Style.QUIET_TEXT, Side.SOUTH_EAST, Side.NORTH_EAST);
    return plot;
  }

  private static double[] clamped(Plot plot, double[] values) {
    return java.util.Arrays.stream(values).map(plot.y()::clamp).toArray();
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Point;
import java.util.List;
import java.util.Optional;

/** Actual against fitted output, with the line on which both are equal. */
final class ActualPredictedCharts {

  /** Square, so that the line of equality runs at 45 degrees. */
  static final int SQUARE = 560;

  private ActualPredictedCharts() {}

  /** The chart of a fit; none where there are no fitted values. */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    List<Point> points = Observed.points(fit);
    return points.size() < 2 ? Optional.empty() : Optional.of(chart(fit, points, setting));
  }

  private static Chart chart(Fitted fit, List<Point> points, Setting setting) {
    List<Point> influential = Observed.influential(fit, points);
    List<Point> drawn = Observed.drawn(points, influential);
    String title =
        Words.sentence(Words.technology(fit.technology()))
            + ": actual against fitted output"
            + fit.summary().map(s -> ", R² of ln output " + share(s.rSquared())).orElse("");
    String caption =
        "On the line both are equal. Fitted output is the exponential of fitted ln output, the"
            + " middle and not the mean of what is to be expected."
            + Sample.words(points.size());
    double[] actual = points.stream().mapToDouble(p -> Math.exp(p.actual())).toArray();
    String alternative =
        title
            + ". "
            + Numbers.stated(points.size())
            + " rows, actual output "
            + Words.with(Numbers.brief(Curves.least(actual)), setting.units().output())
            + " to "
            + Words.with(Numbers.brief(Curves.most(actual)), setting.units().output())
            + "; "
            + Numbers.stated(points.stream().filter(p -> p.actual() > p.fitted()).count())
            + " rows lie above the line.";
    return Drawn.chart(
        Chart.Kind.ACTUAL_PREDICTED,
        new Said(
            fit.technology(),
            setting.names().of("actual-predicted", fit.technology()),
            title,
            caption,
            alternative),
        table(drawn, setting),
        () -> plot(drawn, influential, setting));
  }

  /** A share that rounding must not turn into one: 0.9996 stays 0.9996. */
  static String share(double value) {
    String brief = Numbers.brief(value);
    return brief.equals("1") && value < 1 ? Numbers.stated(value) : brief;
  }

  private static Table table(List<Point> drawn, Setting setting) {
    Table table =
        Table.of(
            "row",
            "plant",
            "period",
            "fitted " + Words.output(setting.units()),
            "actual " + Words.output(setting.units()));
    for (Point p : drawn) {
      table.row(
          Integer.toString(p.row()),
          p.plant(),
          p.period(),
          Numbers.tabular(Math.exp(p.fitted())),
          Numbers.tabular(Math.exp(p.actual())));
    }
    return table;
  }

  private static Plot plot(List<Point> drawn, List<Point> influential, Setting setting) {
    double[] fitted = drawn.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray();
    double[] actual = drawn.stream().mapToDouble(p -> Math.exp(p.actual())).toArray();
    double[] both = Curves.joined(fitted, actual);
    double least = Curves.least(both);
    double most = Curves.most(both);
    Axis x = Axis.fitting("fitted " + Words.output(setting.units()), least, most);
    Axis y = Axis.fitting("actual " + Words.output(setting.units()), least, most);
    Plot plot = new Plot(x, y, ActualPredictedCharts.SQUARE, ActualPredictedCharts.SQUARE);
    equality(plot, "equal");
    List<Point> others = drawn.stream().filter(p -> !influential.contains(p)).toList();
    plot.dots(
        "rows",
        others.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray(),
        others.stream().mapToDouble(p -> Math.exp(p.actual())).toArray(),
        Dot.NEAR);
    for (Point p : influential) {
      double[] at = {Math.exp(p.fitted())};
      double[] value = {Math.exp(p.actual())};
      plot.dots("influential rows", at, value, Dot.MARKED);
      plot.label(
          Observed.name(p.plant(), p.period()),
          at[0],
          value[0],
          Style.WARM,
          Side.NORTH_WEST,
          Side.SOUTH_EAST,
          Side.WEST,
          Side.EAST);
    }
    return plot;
  }

  /** The line on which both axes, which have the same ends, are equal. */
  static void equality(Plot plot, String words) {
    double[] ends = {plot.x().low(), plot.x().high()};
    plot.line("equality", ends, ends, Pen.MAIN_EDGE);
    double[] places = new double[4];
    for (int i = 0; i < places.length; i++) {
      double share = 0.95 - 0.07 * i;
      places[i] =
          plot.x().logarithmic()
              ? ends[0] * Math.pow(ends[1] / ends[0], share)
              : ends[0] + share * (ends[1] - ends[0]);
    }
    plot.labelAlong(words, places, places, Style.DEEP, Side.WEST, Side.SOUTH_EAST);
  }
}

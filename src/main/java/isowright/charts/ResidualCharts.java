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

/** Residuals of ln output against fitted output, with a line at zero. */
final class ResidualCharts {

  private ResidualCharts() {}

  /** The chart of a fit; none where there are no residuals. */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    List<Point> points = Observed.points(fit);
    return points.size() < 2 ? Optional.empty() : Optional.of(chart(fit, points, setting));
  }

  private static Chart chart(Fitted fit, List<Point> points, Setting setting) {
    List<Point> influential = Observed.influential(fit, points);
    List<Point> drawn = Observed.drawn(points, influential);
    String span = span(points);
    String title =
        Words.sentence(Words.technology(fit.technology()))
            + ": residuals of ln output "
            + span
            + fit.summary()
                .map(s -> ", standard error " + Numbers.brief(s.residualStandardError()))
                .orElse("");
    String caption =
        "A residual of 0.1 means that output was about 10 % above what the technology gives."
            + " Look for a pattern about the line at zero: a bend speaks against the form, a"
            + " funnel against equal variances."
            + (influential.isEmpty()
                ? ""
                : " Diamonds: the rows that weigh most (Cook's distance).")
            + Sample.words(points.size());
    String alternative =
        title
            + ". "
            + Numbers.stated(points.size())
            + " rows, fitted output "
            + outputs(points, setting)
            + "; "
            + above(points)
            + " residuals lie above zero.";
    return Drawn.chart(
        Chart.Kind.RESIDUALS,
        new Said(
            fit.technology(),
            setting.names().of("residuals", fit.technology()),
            title,
            caption,
            alternative),
        table(drawn, setting),
        () -> plot(drawn, influential, setting));
  }

  private static String span(List<Point> points) {
    double[] residuals = points.stream().mapToDouble(Point::residual).toArray();
    return "from "
        + Numbers.brief(Curves.least(residuals))
        + " to "
        + Numbers.brief(Curves.most(residuals));
  }

  private static String outputs(List<Point> points, Setting setting) {
    double[] fitted = points.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray();
    return Words.with(Numbers.brief(Curves.least(fitted)), setting.units().output())
        + " to "
        + Words.with(Numbers.brief(Curves.most(fitted)), setting.units().output());
  }

  private static String above(List<Point> points) {
    return Numbers.stated(points.stream().filter(p -> p.residual() > 0).count());
  }

  private static Table table(List<Point> drawn, Setting setting) {
    Table table =
        Table.of(
            "row",
            "plant",
            "period",
            "fitted " + Words.output(setting.units()),
            "residual of ln output");
    for (Point p : drawn) {
      table.row(
          Integer.toString(p.row()),
          p.plant(),
          p.period(),
          Numbers.tabular(Math.exp(p.fitted())),
          Numbers.tabular(p.residual()));
    }
    return table;
  }

  private static Plot plot(List<Point> drawn, List<Point> influential, Setting setting) {
    double[] x = drawn.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray();
    double[] y = drawn.stream().mapToDouble(Point::residual).toArray();
    double reach = Math.max(Math.abs(Curves.least(y)), Math.abs(Curves.most(y)));
    Plot plot =
        new Plot(
            Axis.fitting(
                "fitted " + Words.output(setting.units()), Curves.least(x), Curves.most(x)),
            Axis.around("residual of ln output", -reach, reach));
    plot.horizontal("zero", 0, Pen.MAIN_EDGE);
    List<Point> others = drawn.stream().filter(p -> !influential.contains(p)).toList();
    plot.dots(
        "rows",
        others.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray(),
        others.stream().mapToDouble(Point::residual).toArray(),
        Dot.NEAR);
    plot.dots(
        "influential rows",
        influential.stream().mapToDouble(p -> Math.exp(p.fitted())).toArray(),
        influential.stream().mapToDouble(Point::residual).toArray(),
        Dot.MARKED);
    for (Point p : influential) {
      plot.label(
          Observed.name(p.plant(), p.period()),
          Math.exp(p.fitted()),
          p.residual(),
          Style.WARM,
          Side.EAST,
          Side.WEST,
          Side.NORTH,
          Side.SOUTH);
    }
    return plot;
  }
}

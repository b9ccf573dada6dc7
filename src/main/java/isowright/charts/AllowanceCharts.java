package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Year;
import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/** The glide path of an allowance, all plants together, year by year; a chart a technology. */
final class AllowanceCharts {

  private final Allowed sum;
  private final int plants;
  private final Setting setting;

  private AllowanceCharts(Allowed sum, int plants, Setting setting) {
    this.sum = sum;
    this.plants = plants;
    this.setting = setting;
  }

  /** A chart for each technology by which allowances were worked out. */
  static List<Chart> of(List<Allowed> allowances, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    for (Allowed sum : allowances) {
      if (sum.plant().isEmpty() && sum.years().size() > 1) {
        int plants =
            (int)
                allowances.stream()
                    .filter(a -> a.technology().equals(sum.technology()) && !a.plant().isEmpty())
                    .count();
        charts.add(new AllowanceCharts(sum, plants, setting).chart());
      }
    }
    return charts;
  }

  private Chart chart() {
    String title = title();
    return Drawn.chart(
        Chart.Kind.ALLOWANCE_PATH,
        new Said(
            sum.technology(),
            setting.names().of("allowance", sum.technology()),
            title,
            "What "
                + (plants == 1 ? "the plant" : "all " + Numbers.stated(plants) + " plants together")
                + " would be allowed by the terms of the study: arithmetic, not advice. The"
                + " difference of the two lines is the index. The vertical axis does not begin at"
                + " zero.",
            title
                + ". Removed of the gap by the last year: "
                + Numbers.money(last().removed(), setting.units().money())
                + "; frontier shift "
                + Numbers.money(last().shift(), setting.units().money())
                + "; index "
                + Numbers.money(last().index(), setting.units().money())
                + "."),
        table(),
        this::plot);
  }

  private Year last() {
    return sum.years().get(sum.years().size() - 1);
  }

  private String title() {
    String money = setting.units().money();
    return Words.sentence(Words.technology(sum.technology()))
        + ": the allowance goes from "
        + Numbers.money(sum.years().get(0).allowance(), money)
        + " as filed to "
        + Numbers.money(last().allowance(), money)
        + " in year "
        + last().year();
  }

  private Table table() {
    String money = " (" + setting.units().money() + ")";
    Table table =
        Table.of(
            "year",
            "rest" + money,
            "gap removed" + money,
            "controllable" + money,
            "frontier shift" + money,
            "index" + money,
            "allowance" + money);
    for (Year year : sum.years()) {
      table.row(
          Integer.toString(year.year()),
          Numbers.tabular(year.rest()),
          Numbers.tabular(year.removed()),
          Numbers.tabular(year.controllable()),
          Numbers.tabular(year.shift()),
          Numbers.tabular(year.index()),
          Numbers.tabular(year.allowance()));
    }
    return table;
  }

  private double[] by(ToDoubleFunction<Year> figure) {
    return sum.years().stream().mapToDouble(figure).toArray();
  }

  private Plot plot() {
    double[] years = by(Year::year);
    double[] allowance = by(Year::allowance);
    double[] before = by(y -> y.allowance() - y.index());
    double least = Math.min(sum.filed(), Math.min(Curves.least(allowance), Curves.least(before)));
    double most = Math.max(sum.filed(), Math.max(Curves.most(allowance), Curves.most(before)));
    Plot plot =
        new Plot(
            Axis.around("year after the filing", 0, years[years.length - 1]),
            Axis.around("money a year (" + setting.units().money() + ")", least, most));
    plot.horizontal("as filed", sum.filed(), Pen.REFERENCE);
    plot.line("before the index", years, before, Pen.SECOND);
    plot.line("allowance", years, allowance, Pen.MAIN);
    plot.dots("allowance", years, allowance, Dot.STEP);
    plot.labelAlong(
        "as filed",
        new double[] {years[years.length - 1] / 2, years[years.length - 1]},
        new double[] {sum.filed(), sum.filed()},
        Style.QUIET_TEXT,
        Side.NORTH,
        Side.SOUTH,
        Side.NORTH_WEST,
        Side.SOUTH_WEST);
    label(plot, "allowance", years, allowance, Style.DEEP);
    label(plot, "before the index", years, before, Style.WARM);
    return plot;
  }

  private static void label(Plot plot, String text, double[] x, double[] y, java.awt.Color color) {
    plot.labelAlong(
        text,
        x,
        y,
        color,
        Side.NORTH_WEST,
        Side.NORTH,
        Side.SOUTH_WEST,
        Side.SOUTH,
        Side.NORTH_EAST,
        Side.SOUTH_EAST);
  }
}

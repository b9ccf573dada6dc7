package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.FitFindings.Fitted;
import isowright.study.FrontierFindings;
import isowright.study.FrontierFindings.Plant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Inefficiency of plants in order, with interval bars, the mean marked and the distance from the
 * plant of greatest level beside it: a row a plant while there are few, else a curve with names at
 * both ends.
 */
final class InefficiencyCharts {

  private static final int MOST_ROWS = 40;
  private static final int ROW_HEIGHT = 24;
  private static final int FRAME_HEIGHT = 132;
  private static final int TALL = 620;

  /** How many are named at either end where not all are. */
  private static final int NAMED = 3;

  private final String technology;
  private final FrontierFindings found;
  private final double mean;
  private final List<Plant> all;
  private final List<Plant> drawn;
  private final Setting setting;

  private InefficiencyCharts(
      String technology, FrontierFindings found, double mean, Setting setting) {
    this.technology = technology;
    this.found = found;
    this.mean = mean;
    this.all =
        found.plants().stream()
            .sorted(Comparator.comparingDouble((Plant p) -> p.last().inefficiency().value()))
            .toList();
    this.drawn = Sample.of(all);
    this.setting = setting;
  }

  /** The chart of a fit; absent where it found no inefficiency. */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    return fit.frontier()
        .filter(found -> !found.plants().isEmpty())
        .flatMap(
            found ->
                found
                    .variances()
                    .map(
                        v ->
                            new InefficiencyCharts(
                                    fit.technology(), found, v.mean().value(), setting)
                                .chart()));
  }

  private Chart chart() {
    Plant first = all.get(0);
    Plant last = all.get(all.size() - 1);
    String title =
        Words.sentence(Words.technology(technology))
            + ": inefficiency in ln output runs from "
            + Numbers.brief(first.last().inefficiency().value())
            + " ("
            + first.last().plant()
            + ") to "
            + Numbers.brief(last.last().inefficiency().value())
            + " ("
            + last.last().plant()
            + ")";
    String caption =
        "Bars are "
            + setting.level()
            + " intervals given the residuals. "
            + (found.overTime().equals("constant")
                ? "A plant has the same in all its periods."
                : "Each plant at its last period.")
            + (effects() ? " Circles: distance from the best plant by plant effects." : "")
            + " What is measured includes all that the records do not hold; it is not waste."
            + Sample.words(all.size());
    String alternative =
        title
            + ". In order: "
            + all.stream()
                .limit(MOST_ROWS)
                .map(p -> p.last().plant() + " " + Words.interval(p.last().inefficiency()))
                .collect(Collectors.joining("; "))
            + (all.size() > MOST_ROWS ? "; and " + (all.size() - MOST_ROWS) + " more." : ".");
    return Drawn.chart(
        Chart.Kind.INEFFICIENCY,
        new Said(
            technology,
            setting.names().of("inefficiency", technology),
            title,
            caption,
            alternative),
        table(),
        this::plot);
  }

  private boolean effects() {
    return all.stream().anyMatch(p -> p.byEffects().isPresent());
  }

  private Table table() {
    List<String> header =
        new ArrayList<>(
            List.of(
                "plant",
                "period",
                "inefficiency (ln output)",
                setting.level() + " low",
                setting.level() + " high",
                "probability above the mean"));
    if (effects()) {
      header.add("from plant effects");
    }
    Table table = Table.of(header);
    for (Plant plant : drawn) {
      List<String> row = new ArrayList<>(List.of(plant.last().plant(), plant.last().period()));
      row.addAll(Words.cells(plant.last().inefficiency()));
      row.add(Numbers.tabular(plant.last().aboveMean()));
      if (effects()) {
        row.add(plant.byEffects().map(f -> Numbers.tabular(f.value())).orElse(""));
      }
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    int n = drawn.size();
    boolean rows = n <= MOST_ROWS;
    double[] value = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    double[] at = new double[n];
    double most = mean;
    for (int i = 0; i < n; i++) {
      Figure figure = drawn.get(i).last().inefficiency();
      value[i] = figure.value();
      low[i] = figure.uncertainty().map(Figure.Uncertainty::low).orElse(figure.value());
      high[i] = figure.uncertainty().map(Figure.Uncertainty::high).orElse(figure.value());
      at[i] = rows ? Plot.rowAt(i, n) : i + 0.5;
      double beside = drawn.get(i).byEffects().map(Figure::value).orElse(0.0);
      most = Math.max(most, Math.max(high[i], beside));
    }
    Plot plot =
        new Plot(
            Axis.between("inefficiency (ln output)", 0, 1.04 * most),
            rows
                ? Axis.between("", 0, n)
                : new Axis(
                    n < all.size() ? "place among the plants drawn" : "place in the order",
                    0,
                    n,
                    false),
            Style.WIDTH,
            rows ? FRAME_HEIGHT + ROW_HEIGHT * n : TALL);
    if (rows) {
      plot.rows(
          drawn.stream()
              .map(p -> new Row(p.last().plant(), false, Words.interval(p.last().inefficiency())))
              .toList());
    }
    plot.vertical("mean", mean, Pen.REFERENCE);
    plot.key(Pen.REFERENCE, "mean inefficiency");
    plot.intervals("interval", low, high, at, rows ? Pen.INTERVAL : Pen.THIN_INTERVAL);
    beside(plot, at);
    plot.dots("inefficiency", value, at, rows ? Dot.ESTIMATE : Dot.TOTAL);
    plot.key(rows ? Dot.ESTIMATE : Dot.TOTAL, "from the frontier");
    if (effects()) {
      plot.key(Dot.FAR, "from plant effects");
    }
    if (!rows) {
      names(plot, value, at);
    }
    return plot;
  }

  /** Beneath the bars where each plant has a row, so that neither dot covers the other. */
  private void beside(Plot plot, double[] at) {
    List<double[]> points = new ArrayList<>();
    double below = drawn.size() <= MOST_ROWS ? 0.26 : 0;
    for (int i = 0; i < at.length; i++) {
      if (drawn.get(i).byEffects().isPresent()) {
        points.add(new double[] {drawn.get(i).byEffects().get().value(), at[i] - below});
      }
    }
    if (!points.isEmpty()) {
      plot.dots(
          "from plant effects",
          points.stream().mapToDouble(p -> p[0]).toArray(),
          points.stream().mapToDouble(p -> p[1]).toArray(),
          Dot.FAR);
    }
  }

  private void names(Plot plot, double[] value, double[] at) {
    for (int i = 0; i < at.length; i++) {
      boolean first = i < NAMED;
      if (first || i >= at.length - NAMED) {
        plot.label(
            drawn.get(i).last().plant(),
            value[i],
            at[i],
            Style.TEXT,
            first ? Side.EAST : Side.WEST,
            Side.NORTH,
            Side.SOUTH);
      }
    }
  }
}

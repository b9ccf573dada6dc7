package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows.Row;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Cost shares as recorded and as fitted: over time where each period has one row, else one against
 * the other with the line on which both are equal.
 */
final class CostShareCharts {

  /** A recorded share this near to the fitted one is called near. */
  private static final double NEAR = 0.05;

  /** How inputs differ; an eye tells no more apart. */
  private static final List<Dot> DOTS =
      List.of(Dot.MARKED, Dot.FAR, Dot.TOTAL, Dot.NEAR, Dot.EXACT);

  private final Fitted fit;
  private final Setting setting;
  private final List<Row> rows;
  private final List<Row> drawn;
  private final List<String> inputs;
  private final boolean overTime;

  private CostShareCharts(Fitted fit, List<Row> rows, Setting setting) {
    this.fit = fit;
    this.setting = setting;
    this.rows = rows;
    this.drawn = Sample.of(rows);
    this.inputs = List.copyOf(rows.get(0).fitted().keySet());
    this.overTime = rows.stream().map(Row::period).distinct().count() == rows.size();
  }

  /**
   * The chart of a cost function; none where shares are not recorded, do not move, or are of too
   * many inputs.
   */
  static Optional<Chart> of(Fitted fit, Setting setting) {
    List<Row> rows = fit.rows().rows().stream().filter(row -> !row.seen().isEmpty()).toList();
    boolean moving =
        rows.stream().anyMatch(row -> Math.abs(moved(row, rows.get(0))) > CostShape.NOTHING);
    return rows.size() < 3 || !moving || rows.get(0).fitted().size() > DOTS.size()
        ? Optional.empty()
        : Optional.of(new CostShareCharts(fit, rows, setting).chart());
  }

  /** The largest difference of a fitted share between two rows. */
  private static double moved(Row row, Row other) {
    return row.fitted().keySet().stream()
        .mapToDouble(input -> Math.abs(fitted(row, input) - fitted(other, input)))
        .max()
        .orElse(0);
  }

  private static double fitted(Row row, String input) {
    return row.fitted().getOrDefault(input, Double.NaN);
  }

  private static double seen(Row row, String input) {
    return row.seen().getOrDefault(input, Double.NaN);
  }

  private long near() {
    return rows.stream()
        .filter(
            row -> inputs.stream().allMatch(i -> Math.abs(fitted(row, i) - seen(row, i)) <= NEAR))
        .count();
  }

  private Chart chart() {
    String title =
        Words.sentence(Words.technology(fit.technology()))
            + ": every recorded share lies within "
            + Numbers.brief(NEAR)
            + " of the fitted one in "
            + Numbers.stated(near())
            + " of "
            + Numbers.stated(rows.size())
            + " rows";
    String caption =
        (overTime
                ? "Lines: fitted shares. Dots: recorded ones. A stretch on one side of a line is"
                    + " what the cost function does not explain."
                : "On the line the recorded share equals the fitted one. A cloud across the line"
                    + " says that an input's share answers to prices and output otherwise than"
                    + " fitted.")
            + Sample.words(rows.size());
    return Drawn.chart(
        Chart.Kind.COST_SHARES,
        new Said(
            fit.technology(),
            setting.names().of("cost-shares", fit.technology()),
            title,
            caption,
            alternative(title)),
        table(),
        overTime ? this::series : this::cloud);
  }

  private String alternative(String title) {
    List<String> parts = new ArrayList<>();
    for (String input : inputs) {
      double[] shares = rows.stream().mapToDouble(row -> seen(row, input)).toArray();
      parts.add(
          input
              + " between "
              + Numbers.brief(Curves.least(shares))
              + " and "
              + Numbers.brief(Curves.most(shares)));
    }
    return title + ". Recorded shares: " + Words.list(parts) + ".";
  }

  private Table table() {
    List<String> header = new ArrayList<>(List.of("plant", "period"));
    for (String input : inputs) {
      header.add(input + ", recorded share");
      header.add(input + ", fitted share");
    }
    Table table = Table.of(header);
    for (Row row : drawn) {
      List<String> cells = new ArrayList<>(List.of(row.plant(), row.period()));
      for (String input : inputs) {
        cells.add(Numbers.tabular(seen(row, input)));
        cells.add(Numbers.tabular(fitted(row, input)));
      }
      table.row(cells);
    }
    return table;
  }

  private double most() {
    return drawn.stream()
        .flatMap(row -> inputs.stream().map(i -> Math.max(seen(row, i), fitted(row, i))))
        .mapToDouble(Double::doubleValue)
        .max()
        .orElse(1);
  }

  private double least() {
    return drawn.stream()
        .flatMap(row -> inputs.stream().map(i -> Math.min(seen(row, i), fitted(row, i))))
        .mapToDouble(Double::doubleValue)
        .min()
        .orElse(0);
  }

  private Plot cloud() {
    double low = Math.min(0, least());
    Plot plot =
        new Plot(
            Axis.around("fitted share", low, most()),
            Axis.around("recorded share", low, most()),
            ActualPredictedCharts.SQUARE,
            ActualPredictedCharts.SQUARE);
    ActualPredictedCharts.equality(plot, "recorded = fitted");
    for (int i = 0; i < inputs.size(); i++) {
      String input = inputs.get(i);
      plot.dots(
          input,
          drawn.stream().mapToDouble(row -> fitted(row, input)).toArray(),
          drawn.stream().mapToDouble(row -> seen(row, input)).toArray(),
          DOTS.get(i));
      plot.key(DOTS.get(i), input);
    }
    return plot;
  }

  private Plot series() {
    double[] time = time();
    Plot plot =
        new Plot(
            Axis.around(Axis.PERIOD, time[0], time[time.length - 1]),
            Axis.around("share in cost", Math.min(0, least()), most()));
    for (String input : inputs) {
      double[] line = drawn.stream().mapToDouble(row -> fitted(row, input)).toArray();
      plot.line(input, time, line, Pen.MAIN);
      plot.dots(
          input, time, drawn.stream().mapToDouble(row -> seen(row, input)).toArray(), Dot.MARKED);
      plot.labelAlong(
          input, Curves.ends(time), Curves.ends(line), Style.DEEP, Side.NORTH, Side.SOUTH);
    }
    plot.key(Pen.MAIN, "fitted");
    plot.key(Dot.MARKED, "recorded");
    return plot;
  }

  /** Periods as numbers, or their order where they are none. */
  private double[] time() {
    boolean numbers = drawn.stream().allMatch(row -> row.period().matches("\\d{1,4}"));
    return IntStream.range(0, drawn.size())
        .mapToDouble(k -> numbers ? Double.parseDouble(drawn.get(k).period()) : k + 1)
        .toArray();
  }
}

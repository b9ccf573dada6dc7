package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.ReviewFindings.Band;
import isowright.study.ReviewFindings.Groups;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Placed;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Plants in order of filed over least cost, with interval bars and brackets around those that
 * cannot be told apart: a row a plant while there are few, else a curve of dots with names at both
 * ends. One chart a technology, of the last period.
 */
final class RatioCharts {

  /** Up to so many plants have a row and a name. */
  static final int MOST_ROWS = 40;

  /** More brackets side by side than this cannot be told apart themselves. */
  static final int MOST_LANES = 8;

  private static final int ROW_HEIGHT = 24;
  private static final int FRAME_HEIGHT = 116;
  private static final int TALL = 620;

  /** How many are named at either end where not all are. */
  private static final int NAMED = 3;

  /** The longest name of a plant in a sentence or beside a dot, in pixels. */
  private static final double LONGEST_NAME = 220;

  /** Room for a bracket, as a share of the range. */
  private static final double LANE = 0.022;

  private final Order order;
  private final List<Placed> all;
  private final List<Placed> drawn;
  private final List<List<String>> groups;
  private final Lanes lanes;
  private final Setting setting;

  private RatioCharts(Order order, Setting setting) {
    this.order = order;
    this.all = order.plants().stream().filter(p -> p.ratio().value() > 0).toList();
    this.drawn = Sample.of(all);
    this.groups =
        order.groupsWithYear().orElse(order.groups()).plants().stream()
            .filter(group -> group.size() > 1)
            .toList();
    this.lanes = Lanes.of(groups, all.stream().map(Placed::plant).toList());
    this.setting = setting;
  }

  /** A chart for each technology. */
  static List<Chart> of(List<Order> orders, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    for (String technology : orders.stream().map(Order::technology).distinct().toList()) {
      List<Order> own = orders.stream().filter(o -> o.technology().equals(technology)).toList();
      RatioCharts chart = new RatioCharts(own.get(own.size() - 1), setting);
      if (!chart.all.isEmpty()) {
        charts.add(chart.chart());
      }
    }
    return charts;
  }

  private Chart chart() {
    String title = title();
    return Drawn.chart(
        Chart.Kind.ORDERED_RATIOS,
        new Said(
            order.technology(),
            setting.names().of("ordered ratios", order.technology()),
            title,
            caption(),
            alternative(title)),
        table(),
        this::plot);
  }

  private String title() {
    String head =
        Words.sentence(Words.technology(order.technology()))
            + Words.inPeriod(order.period())
            + ": filed over least cost ";
    Placed first = all.get(0);
    Placed last = all.get(all.size() - 1);
    return all.size() == 1
        ? head + "is " + Words.interval(first.ratio()) + " in " + name(first)
        : head
            + "runs from "
            + Numbers.brief(first.ratio().value())
            + " ("
            + name(first)
            + ") to "
            + Numbers.brief(last.ratio().value())
            + " ("
            + name(last)
            + ")"
            + told();
  }

  private static String name(Placed placed) {
    return Letters.shortened(placed.plant(), LONGEST_NAME, Style.LETTERS, false);
  }

  private String told() {
    if (compared().isEmpty()) {
      return "";
    }
    if (groups.isEmpty()) {
      return "; every plant is told apart from every other";
    }
    boolean one = groups.stream().anyMatch(group -> group.size() == all.size());
    if (one) {
      return "; no two plants can be told apart";
    }
    return together() == all.size()
        ? "; no plant is told apart from all others"
        : "; "
            + Numbers.stated(all.size() - together())
            + " of "
            + Numbers.stated(all.size())
            + " are told apart from all others";
  }

  private Optional<Double> compared() {
    return order.groupsWithYear().orElse(order.groups()).critical();
  }

  /** How many plants cannot be told apart from some other. */
  private int together() {
    return (int) groups.stream().flatMap(List::stream).distinct().count();
  }

  private String caption() {
    boolean uncertain = all.stream().anyMatch(p -> p.ratio().uncertainty().isPresent());
    String brackets =
        groups.isEmpty()
            ? ""
            : lanes.drawn()
                ? " Brackets at the right join plants that cannot be told apart, all pairs compared"
                    + " at once"
                    + (order.groupsWithYear().isPresent()
                        ? " and the chance of a single year counted."
                        : ".")
                : " The groups that cannot be told apart overlap too much to be drawn; the table"
                    + " names them.";
    return "The line marks filed cost equal to least cost."
        + (uncertain ? " Bars are " + setting.level() + " intervals of the technology alone." : "")
        + brackets
        + (compared().isEmpty() && all.size() > 1
            ? " Pairs were not compared, the plants being many."
            : "")
        + Sample.words(all.size());
  }

  private String alternative(String title) {
    String list =
        all.stream()
            .limit(MOST_ROWS)
            .map(p -> p.plant() + " " + Words.interval(p.ratio()))
            .collect(Collectors.joining("; "));
    return title
        + ". In order: "
        + list
        + (all.size() > MOST_ROWS ? "; and " + (all.size() - MOST_ROWS) + " more." : ".");
  }

  private Table table() {
    Table table =
        Table.of(
            "plant",
            "rank",
            "filed over least cost",
            setting.level() + " low",
            setting.level() + " high",
            "ranks, technology alone",
            "ranks, with the year's chance",
            "probability of its rank",
            "groups not told apart");
    Groups named = new Groups(compared(), groups);
    for (Placed placed : drawn) {
      List<String> row = new ArrayList<>();
      row.add(placed.plant());
      row.add(Integer.toString(placed.rank()));
      row.addAll(Words.cells(placed.ratio()));
      row.add(band(placed.band()));
      row.add(placed.bandWithYear().map(RatioCharts::band).orElse(""));
      row.add(
          placed.probabilities().isEmpty()
              ? ""
              : Numbers.tabular(placed.probabilities().get(placed.rank() - 1)));
      row.add(
          named.of(placed.plant()).stream().map(String::valueOf).collect(Collectors.joining(" ")));
      table.row(row);
    }
    return table;
  }

  private static String band(Band band) {
    return band.low() == band.high()
        ? Integer.toString(band.low())
        : band.low() + " to " + band.high();
  }

  private Plot plot() {
    int n = drawn.size();
    Axis y =
        rows()
            ? Axis.between("", 0, n)
            : new Axis(
                n < all.size() ? "place among the plants drawn" : "place in the order",
                0,
                n,
                false);
    Extent extent = Extent.of(drawn, lanes.drawn() ? lanes.count() : 0);
    Plot plot =
        new Plot(extent.axis(), y, Style.WIDTH, rows() ? FRAME_HEIGHT + ROW_HEIGHT * n : TALL);
    if (rows()) {
      plot.rows(
          drawn.stream().map(p -> new Row(p.plant(), false, Words.interval(p.ratio()))).toList());
    }
    plot.vertical("filed = least", 1, Pen.REFERENCE);
    plot.key(Pen.REFERENCE, "filed = least");
    dots(plot);
    if (lanes.drawn() && n == all.size()) {
      brackets(plot, extent);
    }
    if (!rows()) {
      names(plot);
    }
    return plot;
  }

  private boolean rows() {
    return drawn.size() <= MOST_ROWS;
  }

  /** Rows begin at the top, a curve at the bottom. */
  private double place(int i) {
    return rows() ? Plot.rowAt(i, drawn.size()) : i + 0.5;
  }

  private void dots(Plot plot) {
    int n = drawn.size();
    double[] value = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    double[] at = new double[n];
    for (int i = 0; i < n; i++) {
      Figure ratio = drawn.get(i).ratio();
      value[i] = ratio.value();
      low[i] = Extent.low(ratio);
      high[i] = Extent.high(ratio);
      at[i] = place(i);
    }
    boolean exact = drawn.stream().allMatch(p -> p.ratio().uncertainty().isEmpty());
    plot.intervals("interval", low, high, at, rows() ? Pen.INTERVAL : Pen.THIN_INTERVAL);
    plot.dots("ratio", value, at, rows() ? (exact ? Dot.EXACT : Dot.ESTIMATE) : Dot.TOTAL);
  }

  private void brackets(Plot plot, Extent extent) {
    double foot = 0.28;
    for (Lanes.Run run : lanes.runs()) {
      double x = extent.lane(run.lane());
      double inward = extent.lane(run.lane() - 0.5);
      double first = place(run.from()) + (rows() ? foot : -foot);
      double last = place(run.to()) + (rows() ? -foot : foot);
      plot.line(
          "not told apart",
          new double[] {inward, x, x, inward},
          new double[] {first, first, last, last},
          Pen.BRACKET);
    }
    plot.key(Pen.BRACKET, "not told apart");
  }

  private void names(Plot plot) {
    int n = drawn.size();
    for (int i = 0; i < n; i++) {
      boolean first = i < NAMED;
      if (first || i >= n - NAMED) {
        plot.label(
            name(drawn.get(i)),
            first ? Extent.high(drawn.get(i).ratio()) : Extent.low(drawn.get(i).ratio()),
            place(i),
            Style.TEXT,
            first ? Side.EAST : Side.WEST,
            first ? Side.SOUTH_EAST : Side.NORTH_WEST,
            first ? Side.WEST : Side.EAST,
            Side.NORTH,
            Side.SOUTH);
      }
    }
  }

  /** The axis of ratios, with room for brackets at its right. */
  private record Extent(Axis axis, double end) {

    static Extent of(List<Placed> drawn, int lanes) {
      double least = 1;
      double most = 1;
      for (Placed placed : drawn) {
        least = Math.min(least, low(placed.ratio()));
        most = Math.max(most, high(placed.ratio()));
      }
      Axis plain = Axis.fitting("filed over least cost", least, most);
      Extent bare = new Extent(plain, plain.high());
      return lanes == 0
          ? bare
          : new Extent(
              new Axis(plain.title(), plain.low(), bare.lane(lanes + 0.5), plain.logarithmic()),
              plain.high());
    }

    /** Where a bracket stands, half-lanes included. */
    double lane(double lane) {
      double low = axis.low();
      return axis.logarithmic()
          ? end * Math.pow(end / low, LANE * lane)
          : end + LANE * lane * (end - low);
    }

    static double low(Figure ratio) {
      return ratio
          .uncertainty()
          .map(Figure.Uncertainty::low)
          .filter(v -> v > 0 && Double.isFinite(v))
          .orElse(ratio.value());
    }

    static double high(Figure ratio) {
      return ratio
          .uncertainty()
          .map(Figure.Uncertainty::high)
          .filter(Double::isFinite)
          .orElse(ratio.value());
    }
  }

  /**
   * Runs of the order side by side, so that none covers another.
   *
   * @param runs each with its lane
   * @param count how many lanes
   */
  private record Lanes(List<Run> runs, int count) {

    /** A run from one place of the order to another, in a lane. */
    record Run(int from, int to, int lane) {}

    static Lanes of(List<List<String>> groups, List<String> plants) {
      List<Run> runs = new ArrayList<>();
      List<Integer> ends = new ArrayList<>();
      for (List<String> group : groups) {
        int from = plants.indexOf(group.get(0));
        int to = plants.indexOf(group.get(group.size() - 1));
        if (from < 0 || to < from) {
          continue;
        }
        int lane = 0;
        while (lane < ends.size() && ends.get(lane) >= from) {
          lane++;
        }
        if (lane == ends.size()) {
          ends.add(to);
        } else {
          ends.set(lane, to);
        }
        runs.add(new Run(from, to, lane + 1));
      }
      return new Lanes(runs, ends.size());
    }

    boolean drawn() {
      return count > 0 && count <= MOST_LANES;
    }
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanFindings.Reviewed;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/** Filed cost against least cost, with the line on which both are equal; a chart a technology. */
final class FilingCharts {

  private static final Figure NONE = Figure.exact(Double.NaN);

  /** How many plants are named. */
  private static final int NAMED = 4;

  /** A filing with a least cost to hold it against. */
  private record Pair(Reviewed filing, double least, double low, double high) {

    static Optional<Pair> of(Reviewed filing) {
      return filing
          .leastCost()
          .filter(f -> f.value() > 0 && Double.isFinite(f.value()) && filing.filed() > 0)
          .map(f -> of(filing, f.value()));
    }

    /** The ends are where least cost would lie if the gap were at an end of its interval. */
    private static Pair of(Reviewed filing, double least) {
      Optional<Figure.Uncertainty> gap = filing.gap().flatMap(Figure::uncertainty);
      return new Pair(
          filing,
          least,
          gap.map(u -> filing.filed() - u.high()).filter(Double::isFinite).orElse(least),
          gap.map(u -> filing.filed() - u.low()).filter(Double::isFinite).orElse(least));
    }

    /** Told by the whole interval of the gap, as everywhere. */
    boolean above() {
      return filing.filed() > high;
    }

    boolean below() {
      return filing.filed() < low;
    }

    boolean within() {
      return !above() && !below();
    }
  }

  private final String technology;
  private final List<Reviewed> filings;
  private final List<Pair> pairs;
  private final List<Pair> drawn;
  private final Setting setting;

  private FilingCharts(String technology, List<Reviewed> filings, Setting setting) {
    this.technology = technology;
    this.filings = filings;
    this.setting = setting;
    pairs = filings.stream().flatMap(f -> Pair.of(f).stream()).toList();
    drawn = Sample.of(pairs);
  }

  /** A chart for each technology against which costs were reviewed. */
  static List<Chart> of(List<Reviewed> reviews, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    for (String technology : reviews.stream().map(Reviewed::technology).distinct().toList()) {
      List<Reviewed> own = reviews.stream().filter(r -> r.technology().equals(technology)).toList();
      FilingCharts chart = new FilingCharts(technology, own, setting);
      if (!chart.pairs.isEmpty()) {
        charts.add(chart.chart());
      }
    }
    return charts;
  }

  private Chart chart() {
    String title =
        Words.sentence(Words.technology(technology))
            + ": filed cost lies above least cost "
            + (uncertain() ? "with its whole " + setting.level() + " interval " : "")
            + "in "
            + Numbers.stated(count(Pair::above))
            + " of "
            + Numbers.stated(pairs.size())
            + (pairs.size() == 1 ? " filing" : " filings");
    int without = filings.size() - pairs.size();
    String caption =
        "On the line filed cost equals least cost."
            + (uncertain()
                ? " Bars are " + setting.level() + " intervals of the gap, drawn about least cost."
                : "")
            + " Cost above least cost is unexplained here; that is not the same as waste."
            + (without == 0
                ? ""
                : " Left out: "
                    + Numbers.stated(without)
                    + (without == 1 ? " filing" : " filings")
                    + " without a least cost.")
            + Sample.words(pairs.size());
    return Drawn.chart(
        Chart.Kind.FILING,
        new Said(
            technology,
            setting.names().of("filing", technology),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  private boolean uncertain() {
    return pairs.stream().anyMatch(p -> p.low() < p.high());
  }

  private long count(Predicate<Pair> which) {
    return pairs.stream().filter(which).count();
  }

  private String alternative(String title) {
    String money = setting.units().money();
    double filed = pairs.stream().mapToDouble(p -> p.filing().filed()).sum();
    double least = pairs.stream().mapToDouble(Pair::least).sum();
    return title
        + ", "
        + Numbers.stated(count(Pair::within))
        + (uncertain() ? " cannot be told apart from it and " : " equal it and ")
        + Numbers.stated(count(Pair::below))
        + (count(Pair::below) == 1 ? " lies below. Together " : " lie below. Together ")
        + Numbers.money(filed, money)
        + " were filed against a least cost of "
        + Numbers.money(least, money)
        + ".";
  }

  private Table table() {
    String money = setting.units().money();
    Table table =
        Table.of(
            "plant",
            "period",
            "filed cost (" + money + ")",
            "least cost (" + money + ")",
            "least cost, low",
            "least cost, high",
            "gap (" + money + ")",
            "gap, low",
            "gap, high",
            "filed against least cost");
    for (Pair pair : drawn) {
      List<String> row = new ArrayList<>(List.of(pair.filing().plant(), pair.filing().period()));
      row.add(Numbers.tabular(pair.filing().filed()));
      row.addAll(Words.cells(pair.filing().leastCost().orElse(NONE)));
      row.addAll(Words.cells(pair.filing().gap().orElse(NONE)));
      row.add(
          pair.above()
              ? "above"
              : pair.below() ? "below" : uncertain() ? "cannot be told apart" : "equal");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (Pair pair : drawn) {
      double low = pair.low() > 0 ? pair.low() : pair.least();
      double high = Double.isFinite(pair.high()) ? pair.high() : pair.least();
      least = Math.min(least, Math.min(low, pair.filing().filed()));
      most = Math.max(most, Math.max(high, pair.filing().filed()));
    }
    String money = " (" + setting.units().money() + ")";
    Plot plot =
        new Plot(
            Axis.fitting("least cost" + money, least, most),
            Axis.fitting("filed cost" + money, least, most),
            ActualPredictedCharts.SQUARE,
            ActualPredictedCharts.SQUARE);
    ActualPredictedCharts.equality(plot, "filed = least");
    if (uncertain()) {
      plot.intervals(
          "interval of the gap",
          drawn.stream().mapToDouble(p -> Math.max(p.low(), plot.x().low())).toArray(),
          drawn.stream().mapToDouble(Pair::high).toArray(),
          drawn.stream().mapToDouble(p -> p.filing().filed()).toArray(),
          Pen.THIN_INTERVAL);
    }
    dots(plot, "within", Pair::within, Dot.NEAR);
    dots(plot, "below", Pair::below, Dot.FAR);
    dots(plot, "above", Pair::above, Dot.MARKED);
    key(plot);
    names(plot);
    return plot;
  }

  private void dots(Plot plot, String name, Predicate<Pair> which, Dot dot) {
    List<Pair> some = drawn.stream().filter(which).toList();
    plot.dots(
        name,
        some.stream().mapToDouble(Pair::least).toArray(),
        some.stream().mapToDouble(p -> p.filing().filed()).toArray(),
        dot);
  }

  private void key(Plot plot) {
    if (count(Pair::above) > 0) {
      plot.key(Dot.MARKED, "above least cost");
    }
    if (count(Pair::within) > 0) {
      plot.key(Dot.NEAR, uncertain() ? "cannot be told apart" : "equal");
    }
    if (count(Pair::below) > 0) {
      plot.key(Dot.FAR, "below least cost");
    }
  }

  /** Names the filings furthest above their least cost, in proportion. */
  private void names(Plot plot) {
    drawn.stream()
        .filter(Pair::above)
        .sorted(
            Comparator.comparingDouble((Pair p) -> p.filing().filed() / p.least())
                .reversed()
                .thenComparing(p -> p.filing().plant())
                .thenComparing(p -> p.filing().period()))
        .limit(NAMED)
        .forEach(
            p ->
                plot.label(
                    Observed.name(p.filing().plant(), p.filing().period()),
                    p.least(),
                    p.filing().filed(),
                    Style.WARM,
                    Side.NORTH_WEST,
                    Side.WEST,
                    Side.NORTH,
                    Side.SOUTH_EAST));
  }
}

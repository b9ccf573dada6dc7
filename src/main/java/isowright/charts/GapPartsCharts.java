package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Reviewed;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The gaps of a technology's last period in parts, laid end to end from zero: what adds to the gap
 * to the right, what takes from it to the left. Beneath each bar the gap itself with its interval.
 * The part of scale is in the table alone, as it is no part of a gap.
 */
final class GapPartsCharts {

  /** More bars cannot be read. */
  static final int MOST_ROWS = 30;

  /** So many of them are the lowest gaps where not all are drawn. */
  private static final int LOWEST = 10;

  private static final int ROW_HEIGHT = 30;
  private static final int FRAME_HEIGHT = 92;

  /** How far above the middle of a row its bar lies, and the gap below it, in rows. */
  private static final double BAR = 0.17;

  private static final double GAP = 0.28;

  /** A part of the gap, in the order of drawing. */
  enum Part {
    /** What the filing holds beyond price times quantity. */
    UNRECONCILED("unreconciled", Pen.PART_THIRD),
    /** What a proportional cut of all inputs would save. */
    TECHNICAL("technical", Pen.PART_FIRST),
    /** What another mix would save. */
    MIX("mix", Pen.PART_SECOND),
    /** What is left undivided. */
    REMAINDER("remainder", Pen.PART_FOURTH);

    private final String word;
    private final Pen pen;

    Part(String word, Pen pen) {
      this.word = word;
      this.pen = pen;
    }

    Optional<Figure> of(Reviewed review) {
      return switch (this) {
        case UNRECONCILED -> Optional.of(Figure.exact(review.unreconciled()));
        case TECHNICAL -> review.technical();
        case MIX -> review.mix();
        case REMAINDER -> review.detail().map(Detail::remainder);
      };
    }

    /** Its size; nothing where it is not known. */
    double size(Reviewed review) {
      return of(review).map(Figure::value).filter(Double::isFinite).orElse(0.0);
    }
  }

  private final String technology;
  private final String period;
  private final List<Reviewed> all;
  private final List<Reviewed> drawn;
  private final Setting setting;

  private GapPartsCharts(String technology, String period, List<Reviewed> all, Setting setting) {
    this.technology = technology;
    this.period = period;
    this.all =
        all.stream()
            .filter(r -> r.gap().filter(g -> Double.isFinite(g.value())).isPresent())
            .sorted(
                Comparator.comparingDouble(GapPartsCharts::gap)
                    .reversed()
                    .thenComparing(Reviewed::plant))
            .toList();
    this.setting = setting;
    this.drawn = ends(this.all);
  }

  /** All of them, or the highest and the lowest. */
  private static List<Reviewed> ends(List<Reviewed> ordered) {
    int n = ordered.size();
    return n <= MOST_ROWS
        ? ordered
        : Stream.concat(
                ordered.subList(0, MOST_ROWS - LOWEST).stream(),
                ordered.subList(n - LOWEST, n).stream())
            .toList();
  }

  /** A chart for each technology against which costs were reviewed, of the last period. */
  static List<Chart> of(List<Reviewed> reviews, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    for (String technology : reviews.stream().map(Reviewed::technology).distinct().toList()) {
      List<Reviewed> own = reviews.stream().filter(r -> r.technology().equals(technology)).toList();
      String period = own.get(own.size() - 1).period();
      GapPartsCharts chart =
          new GapPartsCharts(
              technology,
              period,
              own.stream().filter(r -> r.period().equals(period)).toList(),
              setting);
      if (!chart.all.isEmpty()) {
        charts.add(chart.chart());
      }
    }
    return charts;
  }

  private static double gap(Reviewed review) {
    return review.gap().map(Figure::value).orElse(Double.NaN);
  }

  private Chart chart() {
    String title = title();
    return Drawn.chart(
        Chart.Kind.GAP_PARTS,
        new Said(
            technology,
            setting.names().of("gap parts", technology),
            title,
            caption(),
            alternative(title)),
        table(),
        this::plot);
  }

  /** Which part is the largest, all plants taken together. */
  private String title() {
    double gap = all.stream().mapToDouble(GapPartsCharts::gap).sum();
    Part largest = Part.UNRECONCILED;
    for (Part part : Part.values()) {
      if (Math.abs(sum(part)) > Math.abs(sum(largest))) {
        largest = part;
      }
    }
    return Words.sentence(Words.technology(technology))
        + Words.inPeriod(period)
        + ": of a gap of "
        + Numbers.money(gap, setting.units().money())
        + " the "
        + (largest == Part.REMAINDER ? "" : largest.word + " ")
        + (largest == Part.REMAINDER ? "undivided remainder" : "part")
        + " is the largest, "
        + Numbers.money(sum(largest), setting.units().money());
  }

  private double sum(Part part) {
    return all.stream().mapToDouble(part::size).sum();
  }

  private String caption() {
    String rest =
        drawn.size() < all.size()
            ? " Of "
                + Numbers.stated(all.size())
                + " filings the "
                + (MOST_ROWS - LOWEST)
                + " highest and the "
                + LOWEST
                + " lowest gaps are drawn."
            : "";
    return "Parts laid end to end from zero: to the right what adds to the gap, to the left what"
        + " takes from it. The dot beneath is the gap, their sum"
        + (uncertain() ? ", with its " + setting.level() + " interval" : "")
        + ". A part is not a verdict: unexplained is not the same as waste."
        + rest
        + Sample.words(all.size());
  }

  private boolean uncertain() {
    return all.stream().anyMatch(r -> r.gap().flatMap(Figure::uncertainty).isPresent());
  }

  private String alternative(String title) {
    List<String> parts = new ArrayList<>();
    for (Part part : shown(all)) {
      parts.add(part.word + " " + Numbers.money(sum(part), setting.units().money()));
    }
    return title
        + ". Of all "
        + Numbers.stated(all.size())
        + (all.size() == 1 ? " filing: " : " filings together: ")
        + Words.list(parts)
        + ".";
  }

  /** The parts that some filing has. */
  private static List<Part> shown(List<Reviewed> reviews) {
    List<Part> parts = new ArrayList<>();
    for (Part part : Part.values()) {
      if (reviews.stream().anyMatch(r -> part.size(r) != 0)) {
        parts.add(part);
      }
    }
    return parts.isEmpty() ? List.of(Part.UNRECONCILED) : parts;
  }

  private Table table() {
    String money = " (" + setting.units().money() + ")";
    List<String> header = new ArrayList<>(List.of("plant", "period"));
    header.addAll(List.of("gap" + money, "gap, low", "gap, high"));
    for (Part part : Part.values()) {
      header.add(part.word + money);
      if (part != Part.UNRECONCILED) {
        header.addAll(List.of(part.word + ", low", part.word + ", high"));
      }
    }
    header.add("scale, for information" + money);
    Table table = Table.of(header);
    for (Reviewed review : Sample.of(all)) {
      List<String> row = new ArrayList<>(List.of(review.plant(), review.period()));
      row.addAll(cells(review.gap()));
      for (Part part : Part.values()) {
        List<String> cells = cells(part.of(review));
        row.addAll(part == Part.UNRECONCILED ? cells.subList(0, 1) : cells);
      }
      row.add(cells(review.detail().flatMap(Detail::scale).flatMap(scale -> scale.part())).get(0));
      table.row(row);
    }
    return table;
  }

  private static List<String> cells(Optional<Figure> figure) {
    return figure.map(Words::cells).orElse(List.of("", "", ""));
  }

  private Plot plot() {
    int n = drawn.size();
    Plot plot =
        new Plot(extent(), Axis.between("", 0, n), Style.WIDTH, FRAME_HEIGHT + ROW_HEIGHT * n);
    plot.rows(drawn.stream().map(r -> new Row(r.plant(), false, Numbers.brief(gap(r)))).toList());
    for (Part part : shown(drawn)) {
      bars(plot, part);
      plot.key(part.pen, part.word);
    }
    gaps(plot);
    plot.vertical("no gap", 0, Pen.REFERENCE);
    return plot;
  }

  /** One part of every plant: it begins where the parts before it with its sign end. */
  private void bars(Plot plot, Part part) {
    int n = drawn.size();
    double[] low = new double[n];
    double[] high = new double[n];
    double[] at = new double[n];
    for (int i = 0; i < n; i++) {
      double size = part.size(drawn.get(i));
      double from = 0;
      for (Part before : Part.values()) {
        double other = before.size(drawn.get(i));
        from += before.compareTo(part) < 0 && other * size > 0 ? other : 0;
      }
      low[i] = Math.min(from, from + size);
      high[i] = Math.max(from, from + size);
      at[i] = Plot.rowAt(i, n) + BAR;
    }
    plot.intervals(part.word, low, high, at, part.pen);
  }

  private void gaps(Plot plot) {
    int n = drawn.size();
    double[] value = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    double[] at = new double[n];
    for (int i = 0; i < n; i++) {
      value[i] = gap(drawn.get(i));
      Optional<Figure.Uncertainty> ends = ends(drawn.get(i).gap());
      low[i] = ends.map(Figure.Uncertainty::low).orElse(value[i]);
      high[i] = ends.map(Figure.Uncertainty::high).orElse(value[i]);
      at[i] = Plot.rowAt(i, n) - GAP;
    }
    plot.intervals("interval of the gap", low, high, at, Pen.FINE_INTERVAL);
    plot.dots("gap", value, at, Dot.TOTAL);
    plot.key(Dot.TOTAL, uncertain() ? "gap, with interval" : "gap");
  }

  private static Optional<Figure.Uncertainty> ends(Optional<Figure> figure) {
    return figure
        .flatMap(Figure::uncertainty)
        .filter(u -> Double.isFinite(u.low()) && Double.isFinite(u.high()));
  }

  /** From the least to the greatest end of any bar or interval, zero included. */
  private Axis extent() {
    double least = 0;
    double most = 0;
    for (Reviewed review : drawn) {
      double negative = 0;
      double positive = 0;
      for (Part part : Part.values()) {
        negative += Math.min(part.size(review), 0);
        positive += Math.max(part.size(review), 0);
      }
      double value = gap(review);
      Optional<Figure.Uncertainty> ends = ends(review.gap());
      double low = ends.map(Figure.Uncertainty::low).orElse(value);
      double high = ends.map(Figure.Uncertainty::high).orElse(value);
      least = Math.min(least, Math.min(negative, Math.min(low, value)));
      most = Math.max(most, Math.max(positive, Math.max(high, value)));
    }
    return Axis.around("filed cost less least cost (" + setting.units().money() + ")", least, most);
  }
}

package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.MatrixFindings;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Headline;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A headline figure across the combinations of a specification matrix, from the least to the
 * greatest, with intervals; the combination that the criteria choose is marked. A chart a figure.
 */
final class MatrixCharts {

  private static final int ROW_HEIGHT = 22;
  private static final int FRAME_HEIGHT = 110;

  /** The names of specifications are long. */
  private static final double LABELS = 0.42;

  /** More rows cannot be read on one picture. */
  private static final int MOST = 60;

  private final MatrixFindings matrix;
  private final Headline headline;
  private final Setting setting;
  private final List<Integer> shown;

  private MatrixCharts(MatrixFindings matrix, Headline headline, Setting setting) {
    this.matrix = matrix;
    this.headline = headline;
    this.setting = setting;
    this.shown = shown();
  }

  static List<Chart> of(MatrixFindings matrix, Setting setting) {
    return matrix.headlines().stream()
        .filter(headline -> !headline.order().isEmpty())
        .map(headline -> new MatrixCharts(matrix, headline, setting).chart())
        .toList();
  }

  /** All, or so many spread over the order, the ends, the chosen and the asked among them. */
  private List<Integer> shown() {
    List<Integer> order = headline.order();
    if (order.size() <= MOST) {
      return order;
    }
    List<Integer> some = new ArrayList<>();
    int every = (order.size() + MOST - 1) / MOST;
    for (int i = 0; i < order.size(); i++) {
      int cell = order.get(i);
      if (i % every == 0
          || i == order.size() - 1
          || matrix.isChosen(cell)
          || matrix.cells().get(cell).asAsked()) {
        some.add(cell);
      }
    }
    return some;
  }

  private Figure figure(int cell) {
    return matrix.cells().get(cell).figure(headline.name()).orElseThrow();
  }

  private Chart chart() {
    List<Integer> order = headline.order();
    double least = figure(order.get(0)).value();
    double most = figure(order.get(order.size() - 1)).value();
    String title =
        Words.sentence(headline.words())
            + ": "
            + Numbers.brief(least)
            + " to "
            + Numbers.brief(most)
            + (headline.unit().isEmpty() ? "" : " " + headline.unit())
            + " over "
            + order.size()
            + (order.size() == 1 ? " specification" : " specifications");
    String caption =
        "One row a specification, from the least figure to the greatest. Bars are "
            + setting.level()
            + " intervals, cut where they leave the picture."
            + chosenWords()
            + (shown.size() < order.size()
                ? " Shown are " + shown.size() + " of " + order.size() + ", spread over the order."
                : "");
    return Drawn.chart(
        Chart.Kind.SPECIFICATIONS,
        new Said(
            headline.name(),
            setting.names().of("specifications", headline.name()),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  private String chosenWords() {
    if (matrix.chosen().isEmpty()) {
      return " No specification is marked as chosen.";
    }
    int cell = matrix.chosen().getAsInt();
    boolean there = matrix.cells().get(cell).figure(headline.name()).isPresent();
    return " The criteria laid down beforehand choose "
        + name(cell)
        + (there ? ", marked by a diamond." : ", which has no such figure.");
  }

  private String alternative(String title) {
    List<Integer> order = headline.order();
    int low = order.get(0);
    int high = order.get(order.size() - 1);
    return title
        + ". Least: "
        + name(low)
        + " "
        + Words.interval(figure(low))
        + "; greatest: "
        + name(high)
        + " "
        + Words.interval(figure(high))
        + "."
        + chosenWords();
  }

  private String name(int cell) {
    Cell found = matrix.cells().get(cell);
    String rest = matrix.circumstances(found);
    return Words.sentence(Words.technology(found.technology()))
        + (rest.isEmpty() ? "" : ", " + rest);
  }

  private Table table() {
    Table table =
        Table.of(
            "specification",
            Words.heading(headline.words(), headline.unit()),
            setting.level() + " low",
            setting.level() + " high",
            "mark");
    for (int cell : headline.order()) {
      List<String> row = new ArrayList<>(List.of(name(cell)));
      row.addAll(Words.cells(figure(cell)));
      row.add(mark(cell));
      table.row(row);
    }
    return table;
  }

  private String mark(int cell) {
    boolean asked = matrix.cells().get(cell).asAsked();
    return matrix.isChosen(cell) ? asked ? "chosen, as asked" : "chosen" : asked ? "as asked" : "";
  }

  private Plot plot() {
    List<Row> rows = new ArrayList<>();
    for (int cell : shown) {
      String mark = mark(cell);
      rows.add(
          new Row(
              name(cell),
              false,
              Numbers.brief(figure(cell).value()) + (mark.isEmpty() ? "" : ", " + mark)));
    }
    Plot plot =
        new Plot(
            extent(),
            Axis.between("", 0, rows.size()),
            Style.WIDTH,
            FRAME_HEIGHT + ROW_HEIGHT * rows.size());
    plot.rows(rows).rowShare(LABELS);
    reference().ifPresent(at -> plot.vertical("reference", at, Pen.REFERENCE));
    for (int i = 0; i < rows.size(); i++) {
      add(plot, shown.get(i), Plot.rowAt(i, rows.size()));
    }
    if (matrix.chosen().isPresent()) {
      plot.key(Dot.CHOSEN, "chosen by the criteria").key(Dot.ESTIMATE, "other specifications");
    }
    return plot;
  }

  private void add(Plot plot, int cell, double at) {
    Figure figure = figure(cell);
    double[] y = {at};
    ends(figure)
        .ifPresent(
            u ->
                plot.intervals(
                    "interval", new double[] {u.low()}, new double[] {u.high()}, y, Pen.INTERVAL));
    plot.dots(
        "estimate",
        new double[] {figure.value()},
        y,
        matrix.isChosen(cell) ? Dot.CHOSEN : Dot.ESTIMATE);
  }

  /** The interval with open ends taken far out, where the picture cuts them. */
  private static Optional<Figure.Uncertainty> ends(Figure figure) {
    return figure.uncertainty().filter(u -> !Double.isNaN(u.low()) && !Double.isNaN(u.high()));
  }

  private OptionalDouble reference() {
    return switch (headline.name()) {
      case MatrixFindings.SCALE, MatrixFindings.SUBSTITUTION -> OptionalDouble.of(1);
      case MatrixFindings.GAP -> OptionalDouble.of(0);
      default -> OptionalDouble.empty();
    };
  }

  /**
   * From the least to the greatest value, the line of reference included, and as much of the
   * intervals as adds no more than that span again on either side: one wide interval must not press
   * all others together.
   */
  private Axis extent() {
    double least = figure(headline.order().get(0)).value();
    double most = figure(headline.order().get(headline.order().size() - 1)).value();
    if (reference().isPresent()) {
      least = Math.min(least, reference().getAsDouble());
      most = Math.max(most, reference().getAsDouble());
    }
    double span = Math.max(most - least, 0.05 * Math.abs(most));
    double low = least;
    double high = most;
    for (int cell : shown) {
      Optional<Figure.Uncertainty> u = ends(figure(cell));
      low = Math.min(low, Math.max(u.map(Figure.Uncertainty::low).orElse(least), least - span));
      high = Math.max(high, Math.min(u.map(Figure.Uncertainty::high).orElse(most), most + span));
    }
    String unit = headline.unit();
    return Axis.around(Words.heading(headline.words(), unit), low, high);
  }
}

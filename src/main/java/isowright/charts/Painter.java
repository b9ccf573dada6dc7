package isowright.charts;

import isowright.charts.Picture.Anchor;
import isowright.charts.Plot.Band;
import isowright.charts.Plot.Dots;
import isowright.charts.Plot.Key;
import isowright.charts.Plot.Layer;
import isowright.charts.Plot.Line;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Pen;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.Optional;
import org.knowm.xchart.XYChart;

/**
 * Draws a {@link Plot}: the chart library draws axes, grid, bands, lines and dots; letters are set
 * here, where they can be kept from covering one another.
 */
final class Painter implements Placement.Screen {

  private static final int ROW_OF_LETTERS = 24;
  private static final int EDGE = 12;

  /** Room below the library's part; its own margin comes on top. */
  private static final int BELOW = 16;

  /** How much of the width the values at the end of rows may take. */
  private static final double ROW_SHARE = 0.34;

  private final Plot plot;
  private final Recording recording = new Recording();
  private final Rectangle2D area;
  private final XYChart chart;

  private Painter(Plot plot) {
    this.plot = plot;
    this.area = area(plot);
    this.chart = Library.chart(plot, (int) area.getWidth(), (int) area.getHeight());
  }

  /** The picture of a plot under a heading. */
  static Picture picture(Plot plot, String title) {
    return new Painter(plot).paint(title);
  }

  private Picture paint(String title) {
    TickLabels ticks = new TickLabels(plot.x(), plot.y());
    Canvas canvas = new Canvas(recording, ticks);
    canvas.translate(area.getX(), area.getY());
    Library.label(chart, ticks, plot.rows().isEmpty());
    chart.paint(canvas, (int) area.getWidth(), (int) area.getHeight());
    Library.locate(chart);
    ticks.write(recording, plot.width());
    axisLines();
    axisTitles();
    key();
    rows();
    labels();
    return new Picture(
        plot.width(),
        plot.height(),
        Letters.wrap(title, plot.width() - 2.0 * EDGE, Style.HEADING_LETTERS, true),
        recording.marks());
  }

  /** The part of the picture left to the chart library. */
  private static Rectangle2D area(Plot plot) {
    double top =
        (plot.keys().isEmpty() ? 0 : ROW_OF_LETTERS) + (hasTitle(plot) ? ROW_OF_LETTERS : 4);
    double left = 0;
    double right = 0;
    for (Row row : plot.rows()) {
      String text = text(plot, row);
      left = Math.max(left, indent(row) + Letters.width(text, Style.LETTERS, row.heading()));
      right = Math.max(right, Letters.width(value(plot, row), Style.LETTERS, false) + 4);
    }
    return new Rectangle2D.Double(
        Math.rint(left), top, Math.rint(plot.width() - left - right), plot.height() - top - BELOW);
  }

  /** The label of a row, as much of it as leaves room for the plot. */
  private static String text(Plot plot, Row row) {
    double room = plot.rowShare() * plot.width() - indent(row);
    return Letters.shortened(row.text(), room, Style.LETTERS, row.heading());
  }

  private static String value(Plot plot, Row row) {
    return Letters.shortened(row.value(), ROW_SHARE * plot.width(), Style.LETTERS, false);
  }

  private static boolean hasTitle(Plot plot) {
    return !plot.y().title().isEmpty();
  }

  private static double indent(Row row) {
    return row.heading() ? EDGE : 2.0 * EDGE;
  }

  @Override
  public double x(double value) {
    double low = chart.getScreenXFromChart(plot.x().inPower(plot.x().low()));
    double high = chart.getScreenXFromChart(plot.x().inPower(plot.x().high()));
    return area.getX() + low + plot.x().share(value) * (high - low);
  }

  @Override
  public double y(double value) {
    double low = chart.getScreenYFromChart(plot.y().inPower(plot.y().low()));
    double high = chart.getScreenYFromChart(plot.y().inPower(plot.y().high()));
    return area.getY() + low + plot.y().share(value) * (high - low);
  }

  private void axisLines() {
    double left = x(plot.x().low());
    double bottom = y(plot.y().low());
    Path2D.Double corner = new Path2D.Double();
    corner.moveTo(left, plot.rows().isEmpty() ? y(plot.y().high()) : bottom);
    corner.lineTo(left, bottom);
    corner.lineTo(x(plot.x().high()), bottom);
    recording.outline(
        corner, new AffineTransform(), Style.AXIS, new BasicStroke(1.2f), Optional.empty());
  }

  private void axisTitles() {
    if (hasTitle(plot)) {
      quiet(fitted(plot.y().heading(), EDGE), EDGE, area.getY() + 3, Anchor.START);
    }
    String title = fitted(plot.x().heading(), EDGE);
    double half = Letters.width(title, Style.LETTERS, false) / 2;
    double middle = (x(plot.x().low()) + x(plot.x().high())) / 2;
    double inside = Math.max(EDGE + half, Math.min(plot.width() - EDGE - half, middle));
    quiet(title, inside, plot.height() - 8.0, Anchor.MIDDLE);
  }

  /** Words that begin at a column and end within the picture. */
  private String fitted(String text, double from) {
    return Letters.shortened(text, plot.width() - EDGE - from, Style.LETTERS, false);
  }

  private void key() {
    double x = EDGE;
    double y = ROW_OF_LETTERS - 8.0;
    double middle = y - 4.5;
    for (Key key : plot.keys()) {
      if (key.dot().isPresent()) {
        Canvas canvas = new Canvas(recording, (shape, at, color) -> false);
        canvas.setColor(new Ink(key.dot().get().color(), "key"));
        new Dotted(key.dot().get()).paint(canvas, x + 6, middle, 0);
        x += 18;
      } else if (key.pen().isPresent()) {
        Pen pen = key.pen().get();
        recording.outline(
            new Line2D.Double(x, middle, x + 30, middle),
            new AffineTransform(),
            new Ink(pen.color(), "key"),
            pen.stroke(),
            Optional.empty());
        x += 37;
      } else {
        recording.filling(
            new Rectangle2D.Double(x, middle - 6, 18, 12),
            new AffineTransform(),
            new Ink(Style.SHADE, "key"),
            Optional.empty());
        x += 25;
      }
      String text = fitted(key.text(), x);
      quiet(text, x, y, Anchor.START);
      x += Letters.width(text, Style.LETTERS, false) + 22;
    }
  }

  private void rows() {
    int count = plot.rows().size();
    for (int i = 0; i < count; i++) {
      Row row = plot.rows().get(i);
      double y = y(Plot.rowAt(i, count)) + 4.5;
      letters(text(plot, row), indent(row), y, Anchor.START, row.heading(), Style.TEXT, false);
      if (!row.value().isEmpty()) {
        quiet(value(plot, row), plot.width() - 8.0, y, Anchor.END);
      }
    }
  }

  private void labels() {
    double left = x(plot.x().low());
    double top = y(plot.y().high());
    Placement placement =
        new Placement(
            new Rectangle2D.Double(left, top, x(plot.x().high()) - left, y(plot.y().low()) - top));
    for (Layer layer : plot.layers()) {
      avoid(placement, layer);
    }
    for (Plot.Label label : plot.labels()) {
      placement
          .place(label, this)
          .ifPresent(
              placed ->
                  letters(
                      placed.text(),
                      placed.x(),
                      placed.baseline(),
                      Anchor.START,
                      label.bold(),
                      label.color(),
                      true));
    }
  }

  private void avoid(Placement placement, Layer layer) {
    if (layer instanceof Line line) {
      placement.avoidLine(screen(line.x(), true), screen(line.y(), false));
    } else if (layer instanceof Dots dots) {
      for (int i = 0; i < dots.x().length; i++) {
        placement.avoidDot(x(dots.x()[i]), y(dots.y()[i]));
      }
    } else if (layer instanceof Band) {
      // Bands may be written upon: their edges are lines, and are avoided as such.
      return;
    }
  }

  private double[] screen(double[] values, boolean horizontal) {
    double[] screen = new double[values.length];
    for (int i = 0; i < values.length; i++) {
      screen[i] = horizontal ? x(values[i]) : y(values[i]);
    }
    return screen;
  }

  private void quiet(String text, double x, double y, Anchor anchor) {
    letters(text, x, y, anchor, false, Style.QUIET_TEXT, false);
  }

  private void letters(
      String text, double x, double y, Anchor anchor, boolean bold, Color color, boolean halo) {
    recording.lettering(text, x, y, anchor, Style.LETTERS, bold, color, halo);
  }
}

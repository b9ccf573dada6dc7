package isowright.charts;

import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What a chart shows, in the units of its axes: bands, lines, dots, labels. It says nothing of
 * pixels; {@link Painter} draws it.
 */
final class Plot {

  /** Something drawn in the units of the axes. */
  sealed interface Layer permits Band, Line, Dots {
    /** What it is. */
    String name();
  }

  /** The region between a lower and an upper curve. */
  record Band(String name, double[] x, double[] low, double[] high, Color color) implements Layer {}

  /** A line; a y that is not a number parts it. */
  record Line(String name, double[] x, double[] y, Pen pen) implements Layer {}

  /** Dots. */
  record Dots(String name, double[] x, double[] y, Dot dot) implements Layer {}

  /**
   * Letters beside one of several points, whichever leaves them most legible.
   *
   * @param text what they say
   * @param x the points' x
   * @param y the points' y
   * @param color their colour
   * @param bold whether bold
   * @param sides the sides at which they may stand, the preferred first
   */
  record Label(String text, double[] x, double[] y, Color color, boolean bold, List<Side> sides) {}

  /** On which side of its point a label stands. */
  enum Side {
    /** Right. */
    EAST(1, 0),
    /** Right above. */
    NORTH_EAST(1, -1),
    /** Above. */
    NORTH(0, -1),
    /** Left above. */
    NORTH_WEST(-1, -1),
    /** Left. */
    WEST(-1, 0),
    /** Left below. */
    SOUTH_WEST(-1, 1),
    /** Below. */
    SOUTH(0, 1),
    /** Right below. */
    SOUTH_EAST(1, 1);

    private final int right;
    private final int down;

    Side(int right, int down) {
      this.right = right;
      this.down = down;
    }

    int right() {
      return right;
    }

    int down() {
      return down;
    }
  }

  /** An entry of the key above the plot; without dot and pen it explains a shaded region. */
  record Key(Optional<Dot> dot, Optional<Pen> pen, String text) {}

  /**
   * A row of a chart of intervals.
   *
   * @param text its label, left of the plot
   * @param heading whether it is the heading of the rows that follow
   * @param value what stands right of the plot
   */
  record Row(String text, boolean heading, String value) {}

  private final Axis x;
  private final Axis y;
  private final int width;
  private final int height;
  private final List<Layer> layers = new ArrayList<>();
  private final List<Label> labels = new ArrayList<>();
  private final List<Key> keys = new ArrayList<>();
  private final List<Row> rows = new ArrayList<>();
  private double rowShare = 0.34;

  /** An empty plot of the usual size. */
  Plot(Axis x, Axis y) {
    this(x, y, Style.WIDTH, Style.HEIGHT);
  }

  /** An empty plot of another size. */
  Plot(Axis x, Axis y, int width, int height) {
    this.x = x;
    this.y = y;
    this.width = width;
    this.height = height;
  }

  /** Adds a band with thin edges. */
  Plot band(String name, double[] at, double[] low, double[] high, Color color, Pen edge) {
    layers.add(new Band(name, at, low, high, color));
    layers.add(new Line(name + " edge", at, low, edge));
    layers.add(new Line(name + " edge", at, high, edge));
    return this;
  }

  /** Shades the whole height between two places. */
  Plot region(String name, double from, double to) {
    double[] at = {x.clamp(from), x.clamp(to)};
    layers.add(
        new Band(
            name,
            at,
            new double[] {y.low(), y.low()},
            new double[] {y.high(), y.high()},
            Style.SHADE));
    return this;
  }

  /** Adds a line. */
  Plot line(String name, double[] at, double[] values, Pen pen) {
    layers.add(new Line(name, at, values, pen));
    return this;
  }

  /** Adds a vertical line through the whole height. */
  Plot vertical(String name, double at, Pen pen) {
    return line(name, new double[] {at, at}, new double[] {y.low(), y.high()}, pen);
  }

  /** Adds a horizontal line through the whole width. */
  Plot horizontal(String name, double at, Pen pen) {
    return line(name, new double[] {x.low(), x.high()}, new double[] {at, at}, pen);
  }

  /** Adds horizontal intervals. */
  Plot intervals(String name, double[] low, double[] high, double[] at, Pen pen) {
    double[] xs = new double[3 * at.length];
    double[] ys = new double[3 * at.length];
    for (int i = 0; i < at.length; i++) {
      xs[3 * i] = x.clamp(low[i]);
      xs[3 * i + 1] = x.clamp(high[i]);
      xs[3 * i + 2] = x.clamp(high[i]);
      ys[3 * i] = at[i];
      ys[3 * i + 1] = at[i];
      ys[3 * i + 2] = Double.NaN;
    }
    return line(name, xs, ys, pen);
  }

  /** Adds dots. */
  Plot dots(String name, double[] at, double[] values, Dot dot) {
    layers.add(new Dots(name, at, values, dot));
    return this;
  }

  /** Adds a label beside a point. */
  Plot label(String text, double atX, double atY, Color color, Side... sides) {
    labels.add(
        new Label(text, new double[] {atX}, new double[] {atY}, color, false, List.of(sides)));
    return this;
  }

  /** Adds a label somewhere along a curve. */
  Plot labelAlong(String text, double[] atX, double[] atY, Color color, Side... sides) {
    labels.add(new Label(text, atX, atY, color, false, List.of(sides)));
    return this;
  }

  /** Adds an entry to the key. */
  Plot key(Dot dot, String text) {
    keys.add(new Key(Optional.of(dot), Optional.empty(), text));
    return this;
  }

  /** Adds an entry to the key. */
  Plot key(Pen pen, String text) {
    keys.add(new Key(Optional.empty(), Optional.of(pen), text));
    return this;
  }

  /** Explains the shaded regions in the key. */
  Plot keyOfShade(String text) {
    keys.add(new Key(Optional.empty(), Optional.empty(), text));
    return this;
  }

  /** Adds rows, from the top, in place of a vertical axis that measures. */
  Plot rows(List<Row> value) {
    rows.addAll(value);
    return this;
  }

  /** Lets the labels of rows take so much of the width, where they are long. */
  Plot rowShare(double share) {
    rowShare = share;
    return this;
  }

  /** How much of the width the labels of rows may take. */
  double rowShare() {
    return rowShare;
  }

  /** Where row i lies on the vertical axis of n rows, which runs from 0 to n. */
  static double rowAt(int i, int n) {
    return n - i - 0.5;
  }

  Axis x() {
    return x;
  }

  Axis y() {
    return y;
  }

  int width() {
    return width;
  }

  int height() {
    return height;
  }

  List<Layer> layers() {
    return List.copyOf(layers);
  }

  List<Label> labels() {
    return List.copyOf(labels);
  }

  List<Key> keys() {
    return List.copyOf(keys);
  }

  List<Row> rows() {
    return List.copyOf(rows);
  }
}

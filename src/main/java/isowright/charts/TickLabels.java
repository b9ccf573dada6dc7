package isowright.charts;

import isowright.charts.Picture.Anchor;
import java.awt.Color;
import java.awt.Font;
import java.awt.Shape;
import java.awt.font.FontRenderContext;
import java.awt.font.TextLayout;
import java.awt.geom.AffineTransform;
import java.awt.geom.PathIterator;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The labels of the ticks of both axes.
 *
 * <p>The chart library asks for the words of each tick and paints them as outlines of glyphs. Here
 * those outlines are recognised again and become text, right-aligned to the vertical axis and
 * centred under the horizontal one, with as many decimals as their neighbours.
 */
final class TickLabels implements Canvas.Reader {

  /** The colour in which the library paints labels of the horizontal axis, and of nothing else. */
  static final Color HORIZONTAL = new Color(0x010203);

  /** The colour in which the library paints labels of the vertical axis, and of nothing else. */
  static final Color VERTICAL = new Color(0x030201);

  private static final FontRenderContext METRICS = new FontRenderContext(null, true, false);

  /** Height of a digit in em: half of it lies below the middle of the line. */
  private static final double DIGIT_HEIGHT = 0.73;

  /** Beyond so many decades, labels are powers of ten, and no more than so many. */
  private static final int MANY_DECADES = 6;

  private record Seen(double value, double x, double y, Anchor anchor) {}

  private final Font font = Style.font(Style.LETTERS, false);
  private final Axis horizontal;
  private final Axis vertical;
  private final Map<String, Double> asked = new LinkedHashMap<>();
  private final Map<List<Double>, Double> outlines = new HashMap<>();
  private final List<Seen> seen = new ArrayList<>();

  /** For a horizontal and a vertical axis. */
  TickLabels(Axis horizontal, Axis vertical) {
    this.horizontal = horizontal;
    this.vertical = vertical;
  }

  /** The words of a tick of the horizontal axis, empty where it goes without. */
  String ofHorizontal(double value) {
    return words(horizontal, value);
  }

  /** The words of a tick of the vertical axis, empty where it goes without. */
  String ofVertical(double value) {
    return words(vertical, value);
  }

  private String words(Axis axis, double value) {
    double span = axis.inPower(axis.high()) - axis.inPower(axis.low());
    double clean = Math.abs(value) < 1e-9 * span ? 0 : value;
    if (axis.logarithmic() && !labelled(axis, clean)) {
      return "";
    }
    String words = print(axis, clean, Numbers.decimalsOf(clean));
    asked.put(words, clean);
    return words;
  }

  /** A label as a number, or as a power of ten on an axis of many decades. */
  private static String print(Axis axis, double value, int decimals) {
    if (axis.title().equals(Axis.PERIOD)) {
      return Numbers.decimals(value, decimals).replace(",", ""); // years are not set off
    }
    return axis.logarithmic() && decades(axis) > MANY_DECADES
        ? Numbers.powerOfTen((int) Math.round(Math.log10(value)))
        : Numbers.decimals(value, decimals);
  }

  private static double decades(Axis axis) {
    return Math.log10(axis.high() / axis.low());
  }

  /** On a logarithmic axis, 1, 2, 5, 10, … or fewer over many decades, more within one. */
  private static boolean labelled(Axis axis, double value) {
    double decades = decades(axis);
    double power = Math.pow(10, Math.floor(Math.log10(value) + 1e-9));
    long digit = Math.round(value / power);
    if (decades > 4) {
      int step = (int) Math.ceil(decades / MANY_DECADES);
      return digit == 1 && Math.floorMod(Math.round(Math.log10(value)), step) == 0;
    }
    return digit == 1 || digit == 2 || digit == 5 || (decades < 1.3 && digit == 3);
  }

  @Override
  public boolean recognises(Shape shape, AffineTransform transform, Color color) {
    boolean isVertical = color.equals(VERTICAL);
    if (!isVertical && !color.equals(HORIZONTAL)) {
      return false;
    }
    Double value = outlines.get(key(shape));
    if (value == null) {
      asked.forEach(
          (words, number) ->
              outlines.put(key(new TextLayout(words, font, METRICS).getOutline(null)), number));
      asked.clear();
      value = outlines.get(key(shape));
    }
    if (value == null) {
      return false;
    }
    Rectangle2D box = transform.createTransformedShape(shape).getBounds2D();
    if (isVertical) {
      // The library puts the lower edge of the outline, commas included, half its height below the
      // tick; letters are put so that digits straddle the tick.
      double tick = transform.getTranslateY() - box.getHeight() / 2;
      double y = tick + DIGIT_HEIGHT * Style.LETTERS / 2;
      seen.add(new Seen(value, box.getMaxX(), y, Anchor.END));
    } else {
      seen.add(new Seen(value, box.getCenterX(), transform.getTranslateY(), Anchor.MIDDLE));
    }
    return true;
  }

  /**
   * Puts the labels seen into a recording, decimals alike on each axis; a label of the horizontal
   * axis that would leave the picture is moved inside.
   *
   * @param width the width of the picture
   */
  void write(Recording recording, double width) {
    Map<Anchor, Integer> decimals = new TreeMap<>();
    for (Seen s : seen) {
      decimals.merge(s.anchor(), Numbers.decimalsOf(s.value()), Math::max);
    }
    double lowest = seen.stream().mapToDouble(Seen::y).max().orElse(0);
    for (Seen s : seen) {
      boolean isVertical = s.anchor() == Anchor.END;
      Axis axis = isVertical ? vertical : horizontal;
      int places =
          axis.logarithmic() ? Numbers.decimalsOf(s.value()) : decimals.getOrDefault(s.anchor(), 0);
      String words = print(axis, s.value(), places);
      double half = Letters.width(words, Style.LETTERS, false) / 2;
      recording.lettering(
          words,
          isVertical ? s.x() : Math.max(half, Math.min(width - half, s.x())),
          isVertical ? s.y() : lowest,
          s.anchor(),
          Style.LETTERS,
          false,
          Style.QUIET_TEXT,
          false);
    }
  }

  /** The coordinates of an outline. */
  private static List<Double> key(Shape shape) {
    List<Double> key = new ArrayList<>();
    double[] c = new double[6];
    for (PathIterator i = shape.getPathIterator(null); !i.isDone(); i.next()) {
      int kind = i.currentSegment(c);
      int count =
          switch (kind) {
            case PathIterator.SEG_CLOSE -> 0;
            case PathIterator.SEG_QUADTO -> 4;
            case PathIterator.SEG_CUBICTO -> 6;
            default -> 2;
          };
      key.add((double) kind);
      for (int k = 0; k < count; k++) {
        key.add(c[k]);
      }
    }
    return key;
  }
}

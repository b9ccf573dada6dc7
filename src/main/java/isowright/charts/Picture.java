package isowright.charts;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Shape;
import java.awt.geom.Rectangle2D;
import java.util.List;
import java.util.Optional;

/**
 * A drawing as a list of marks, painted once and written as SVG or as PNG.
 *
 * @param width its width
 * @param height its height without heading
 * @param heading the lines of the heading, above the drawing
 * @param marks what is drawn, from the back to the front
 */
record Picture(int width, int height, List<String> heading, List<Mark> marks) {

  /** Copies the lists. */
  Picture {
    heading = List.copyOf(heading);
    marks = List.copyOf(marks);
  }

  /** The height of the heading. */
  int headingHeight() {
    return heading.isEmpty() ? 0 : heading.size() * Style.HEADING_LEADING + 14;
  }

  /** The baseline of a line of the heading, above the drawing, where y = 0 is its upper edge. */
  double headingBaseline(int line) {
    return -headingHeight() + Style.HEADING_LEADING * (line + 1.0);
  }

  /** Something drawn. */
  sealed interface Mark permits Outline, Filling, Lettering {}

  /** A line along a shape. */
  record Outline(Shape shape, Color color, BasicStroke stroke, Optional<Rectangle2D> clip)
      implements Mark {}

  /** A shape filled. */
  record Filling(Shape shape, Color color, Optional<Rectangle2D> clip) implements Mark {}

  /**
   * Letters.
   *
   * @param text what they say
   * @param x where they are anchored
   * @param y their baseline
   * @param anchor which part of them lies at x
   * @param size the size
   * @param bold whether bold
   * @param color the colour
   * @param halo whether a rim of paper keeps them off what lies behind
   */
  record Lettering(
      String text,
      double x,
      double y,
      Anchor anchor,
      float size,
      boolean bold,
      Color color,
      boolean halo)
      implements Mark {}

  /** Which part of a line of letters lies at its x. */
  enum Anchor {
    /** Its beginning. */
    START,
    /** Its middle. */
    MIDDLE,
    /** Its end. */
    END
  }
}

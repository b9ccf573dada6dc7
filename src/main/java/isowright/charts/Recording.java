package isowright.charts;

import isowright.charts.Picture.Anchor;
import isowright.charts.Picture.Filling;
import isowright.charts.Picture.Lettering;
import isowright.charts.Picture.Mark;
import isowright.charts.Picture.Outline;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Point2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * Marks as they are drawn. Segments drawn one after another become one line, so that dashes run on
 * through them.
 */
final class Recording {

  private final List<Mark> marks = new ArrayList<>();
  private Path2D.@Nullable Double open;
  private Color openColor = Color.BLACK;
  private BasicStroke openStroke = new BasicStroke();
  private Optional<Rectangle2D> openClip = Optional.empty();

  /** The marks so far. */
  List<Mark> marks() {
    close();
    return List.copyOf(marks);
  }

  /** A line along a shape. */
  void outline(
      Shape shape,
      AffineTransform transform,
      Color color,
      BasicStroke stroke,
      Optional<Rectangle2D> clip) {
    if (shape instanceof Line2D line) {
      segment(line, transform, color, stroke, clip);
    } else {
      close();
      marks.add(new Outline(placed(shape, transform), color, stroke, clip));
    }
  }

  /** A shape filled; shapes drawn with a wholly transparent colour leave no mark. */
  void filling(Shape shape, AffineTransform transform, Color color, Optional<Rectangle2D> clip) {
    close();
    if (color.getAlpha() > 0) {
      marks.add(new Filling(placed(shape, transform), color, clip));
    }
  }

  /** Letters. */
  void lettering(
      String text,
      double x,
      double y,
      Anchor anchor,
      float size,
      boolean bold,
      Color color,
      boolean halo) {
    close();
    marks.add(new Lettering(text, x, y, anchor, size, bold, color, halo));
  }

  private void segment(
      Line2D line,
      AffineTransform transform,
      Color color,
      BasicStroke stroke,
      Optional<Rectangle2D> clip) {
    Point2D from = transform.transform(line.getP1(), null);
    Point2D to = transform.transform(line.getP2(), null);
    Path2D.Double path = open;
    boolean same = color.equals(openColor) && stroke.equals(openStroke) && clip.equals(openClip);
    if (path == null || !same) {
      close();
      path = new Path2D.Double();
      open = path;
      openColor = color;
      openStroke = stroke;
      openClip = clip;
    }
    Point2D end = path.getCurrentPoint();
    if (end == null || !end.equals(from)) {
      path.moveTo(from.getX(), from.getY());
    }
    path.lineTo(to.getX(), to.getY());
  }

  private void close() {
    if (open != null) {
      marks.add(new Outline(open, openColor, openStroke, openClip));
      open = null;
    }
  }

  /** The shape where it lies; circles and rectangles stay what they are when only shifted. */
  private static Shape placed(Shape shape, AffineTransform transform) {
    double dx = transform.getTranslateX();
    double dy = transform.getTranslateY();
    boolean shifted = (transform.getType() & ~AffineTransform.TYPE_TRANSLATION) == 0;
    if (shifted && shape instanceof Ellipse2D e) {
      return new Ellipse2D.Double(e.getX() + dx, e.getY() + dy, e.getWidth(), e.getHeight());
    }
    if (shifted && shape instanceof Rectangle2D r) {
      return new Rectangle2D.Double(r.getX() + dx, r.getY() + dy, r.getWidth(), r.getHeight());
    }
    return new Path2D.Double(shape, transform);
  }
}

package isowright.charts;

import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Composite;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.Paint;
import java.awt.Rectangle;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.Stroke;
import java.awt.font.FontRenderContext;
import java.awt.geom.AffineTransform;
import java.awt.geom.Area;
import java.awt.geom.NoninvertibleTransformException;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** What every canvas of Java 2D must keep: colour, stroke, font, hints, transform and clip. */
abstract class CanvasState extends Graphics2D {

  private Color color = Color.BLACK;
  private Paint paint = Color.BLACK;
  private Color background = Color.WHITE;
  private Stroke stroke = new BasicStroke();
  private Font font = Style.font(Style.LETTERS, false);
  private Composite composite = AlphaComposite.SrcOver;
  private AffineTransform transform = new AffineTransform();
  private final RenderingHints hints = new RenderingHints(Map.of());

  /** In device space, as the transform may change after it was set. */
  private @Nullable Shape clip;

  CanvasState() {}

  CanvasState(CanvasState other) {
    color = other.color;
    paint = other.paint;
    background = other.background;
    stroke = other.stroke;
    font = other.font;
    composite = other.composite;
    transform = new AffineTransform(other.transform);
    hints.putAll(other.hints);
    clip = other.clip;
  }

  /** The colour in force. */
  final Color color() {
    return color;
  }

  /** The transform in force. */
  final AffineTransform transform() {
    return transform;
  }

  /** The clip in device space. */
  final @Nullable Shape userClip() {
    return clip;
  }

  // colour, stroke, font

  @Override
  public Color getColor() {
    return color;
  }

  @Override
  public void setColor(Color value) {
    color = value;
    paint = value;
  }

  @Override
  public Paint getPaint() {
    return paint;
  }

  @Override
  public void setPaint(Paint value) {
    paint = value;
    if (value instanceof Color plain) {
      color = plain;
    }
  }

  @Override
  public Color getBackground() {
    return background;
  }

  @Override
  public void setBackground(Color value) {
    background = value;
  }

  @Override
  public Stroke getStroke() {
    return stroke;
  }

  @Override
  public void setStroke(Stroke value) {
    stroke = value;
  }

  @Override
  public Composite getComposite() {
    return composite;
  }

  @Override
  public void setComposite(Composite value) {
    composite = value;
  }

  @Override
  public void setPaintMode() {}

  @Override
  public Font getFont() {
    return font;
  }

  @Override
  public void setFont(Font value) {
    font = value;
  }

  @Override
  public FontRenderContext getFontRenderContext() {
    // The library measures with this one everywhere else, so that outlines agree.
    return new FontRenderContext(null, true, false);
  }

  @Override
  public void setRenderingHint(RenderingHints.Key key, Object value) {
    // Hints speak of pixels, of which a recording has none; they are kept only to be given back.
    hints.put(key, value);
  }

  @Override
  public @Nullable Object getRenderingHint(RenderingHints.Key key) {
    return hints.get(key);
  }

  @Override
  public void setRenderingHints(Map<?, ?> values) {
    hints.clear();
    hints.putAll(values);
  }

  @Override
  public void addRenderingHints(Map<?, ?> values) {
    hints.putAll(values);
  }

  @Override
  public RenderingHints getRenderingHints() {
    return (RenderingHints) hints.clone();
  }

  // transform

  @Override
  public void translate(int x, int y) {
    transform.translate(x, y);
  }

  @Override
  public void translate(double x, double y) {
    transform.translate(x, y);
  }

  @Override
  public void rotate(double angle) {
    transform.rotate(angle);
  }

  @Override
  public void rotate(double angle, double x, double y) {
    transform.rotate(angle, x, y);
  }

  @Override
  public void scale(double x, double y) {
    transform.scale(x, y);
  }

  @Override
  public void shear(double x, double y) {
    transform.shear(x, y);
  }

  @Override
  public void transform(AffineTransform value) {
    transform.concatenate(value);
  }

  @Override
  public void setTransform(AffineTransform value) {
    transform = new AffineTransform(value);
  }

  @Override
  public AffineTransform getTransform() {
    return new AffineTransform(transform);
  }

  // clip

  @Override
  public @Nullable Shape getClip() {
    if (clip == null) {
      return null;
    }
    try {
      return transform.createInverse().createTransformedShape(clip);
    } catch (NoninvertibleTransformException e) {
      throw new IllegalStateException("the canvas was scaled to nothing", e);
    }
  }

  @Override
  public void setClip(@Nullable Shape value) {
    clip = value == null ? null : transform.createTransformedShape(value);
  }

  @Override
  public void setClip(int x, int y, int width, int height) {
    setClip(new Rectangle(x, y, width, height));
  }

  @Override
  public void clip(Shape value) {
    Shape now = getClip();
    if (now == null) {
      setClip(value);
    } else {
      Area both = new Area(now);
      both.intersect(new Area(value));
      setClip(both);
    }
  }

  @Override
  public void clipRect(int x, int y, int width, int height) {
    clip(new Rectangle(x, y, width, height));
  }

  @Override
  public @Nullable Rectangle getClipBounds() {
    Shape now = getClip();
    return now == null ? null : now.getBounds();
  }

  @Override
  public void dispose() {}
}

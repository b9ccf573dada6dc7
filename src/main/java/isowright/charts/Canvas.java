package isowright.charts;

import isowright.charts.Picture.Anchor;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.Rectangle2D;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * A canvas on which the chart library paints, and which records what was painted instead of
 * colouring pixels. Letters, which the library paints as outlines of glyphs, are handed to a reader
 * that may recognise them and turn them back into text.
 */
final class Canvas extends CanvasShapes {

  /** Recognises letters among filled shapes. */
  interface Reader {
    /**
     * Whether a shape was recognised (and is dealt with).
     *
     * @param shape the shape, its baseline at the origin
     * @param transform where it is painted
     * @param color its colour
     */
    boolean recognises(Shape shape, AffineTransform transform, Color color);
  }

  private final Recording recording;
  private final Reader reader;

  /** A canvas over a recording. */
  Canvas(Recording recording, Reader reader) {
    this.recording = recording;
    this.reader = reader;
  }

  private Canvas(Canvas other) {
    super(other);
    this.recording = other.recording;
    this.reader = other.reader;
  }

  @Override
  public Canvas create() {
    return new Canvas(this);
  }

  @Override
  public void draw(Shape shape) {
    recording.outline(shape, transform(), color(), stroke(), clipped());
  }

  @Override
  public void fill(Shape shape) {
    if (!reader.recognises(shape, transform(), color())) {
      recording.filling(shape, transform(), color(), clipped());
    }
  }

  @Override
  public void drawString(String text, float x, float y) {
    double[] at = {x, y};
    transform().transform(at, 0, at, 0, 1);
    recording.lettering(
        text,
        at[0],
        at[1],
        Anchor.START,
        getFont().getSize2D(),
        getFont().isBold(),
        color(),
        false);
  }

  private Optional<Rectangle2D> clipped() {
    @Nullable Shape clip = userClip();
    return clip == null ? Optional.empty() : Optional.of(clip.getBounds2D());
  }

  private BasicStroke stroke() {
    return getStroke() instanceof BasicStroke basic ? basic : new BasicStroke();
  }
}

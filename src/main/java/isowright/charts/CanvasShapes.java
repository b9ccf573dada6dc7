package isowright.charts;

import java.awt.Color;
import java.awt.Font;
import java.awt.FontMetrics;
import java.awt.GraphicsConfiguration;
import java.awt.Image;
import java.awt.Polygon;
import java.awt.Rectangle;
import java.awt.Shape;
import java.awt.font.GlyphVector;
import java.awt.geom.AffineTransform;
import java.awt.geom.Arc2D;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.RoundRectangle2D;
import java.awt.image.BufferedImage;
import java.awt.image.BufferedImageOp;
import java.awt.image.ImageObserver;
import java.awt.image.RenderedImage;
import java.awt.image.renderable.RenderableImage;
import java.text.AttributedCharacterIterator;
import org.jspecify.annotations.Nullable;

/**
 * The many ways of drawing of Java 2D, reduced to three: an outline, a filling, a line of letters.
 * What charts never draw (images, exclusive-or mode) is refused, so that it cannot go missing
 * silently.
 */
abstract class CanvasShapes extends CanvasState {

  CanvasShapes() {}

  CanvasShapes(CanvasShapes other) {
    super(other);
  }

  @Override
  public void drawLine(int x1, int y1, int x2, int y2) {
    draw(new Line2D.Double(x1, y1, x2, y2));
  }

  @Override
  public void fillRect(int x, int y, int width, int height) {
    fill(new Rectangle(x, y, width, height));
  }

  @Override
  public void clearRect(int x, int y, int width, int height) {
    Color before = color();
    setColor(getBackground());
    fillRect(x, y, width, height);
    setColor(before);
  }

  @Override
  public void drawRoundRect(int x, int y, int width, int height, int arcWidth, int arcHeight) {
    draw(new RoundRectangle2D.Double(x, y, width, height, arcWidth, arcHeight));
  }

  @Override
  public void fillRoundRect(int x, int y, int width, int height, int arcWidth, int arcHeight) {
    fill(new RoundRectangle2D.Double(x, y, width, height, arcWidth, arcHeight));
  }

  @Override
  public void drawOval(int x, int y, int width, int height) {
    draw(new Ellipse2D.Double(x, y, width, height));
  }

  @Override
  public void fillOval(int x, int y, int width, int height) {
    fill(new Ellipse2D.Double(x, y, width, height));
  }

  @Override
  public void drawArc(int x, int y, int width, int height, int start, int angle) {
    draw(new Arc2D.Double(x, y, width, height, start, angle, Arc2D.OPEN));
  }

  @Override
  public void fillArc(int x, int y, int width, int height, int start, int angle) {
    fill(new Arc2D.Double(x, y, width, height, start, angle, Arc2D.PIE));
  }

  @Override
  public void drawPolyline(int[] xs, int[] ys, int count) {
    if (count > 0) {
      Path2D.Double path = new Path2D.Double();
      path.moveTo(xs[0], ys[0]);
      for (int i = 1; i < count; i++) {
        path.lineTo(xs[i], ys[i]);
      }
      draw(path);
    }
  }

  @Override
  public void drawPolygon(int[] xs, int[] ys, int count) {
    draw(new Polygon(xs, ys, count));
  }

  @Override
  public void fillPolygon(int[] xs, int[] ys, int count) {
    fill(new Polygon(xs, ys, count));
  }

  @Override
  public void drawString(String text, int x, int y) {
    drawString(text, (float) x, (float) y);
  }

  @Override
  public void drawString(AttributedCharacterIterator letters, int x, int y) {
    drawString(letters, (float) x, (float) y);
  }

  @Override
  public void drawString(AttributedCharacterIterator letters, float x, float y) {
    StringBuilder text = new StringBuilder();
    for (char c = letters.first(); c != AttributedCharacterIterator.DONE; c = letters.next()) {
      text.append(c);
    }
    drawString(text.toString(), x, y);
  }

  @Override
  public void drawGlyphVector(GlyphVector glyphs, float x, float y) {
    fill(glyphs.getOutline(x, y));
  }

  // refused

  @Override
  public void setXORMode(Color value) {
    throw refused("exclusive-or mode");
  }

  @Override
  public FontMetrics getFontMetrics(Font value) {
    throw refused("font metrics");
  }

  @Override
  public void copyArea(int x, int y, int width, int height, int dx, int dy) {
    throw refused("copying an area");
  }

  @Override
  public boolean hit(Rectangle rectangle, Shape shape, boolean onStroke) {
    throw refused("hit detection");
  }

  @Override
  public GraphicsConfiguration getDeviceConfiguration() {
    throw refused("a device");
  }

  @Override
  public void drawImage(BufferedImage image, BufferedImageOp op, int x, int y) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(Image image, AffineTransform at, @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public void drawRenderedImage(RenderedImage image, AffineTransform at) {
    throw refused("an image");
  }

  @Override
  public void drawRenderableImage(RenderableImage image, AffineTransform at) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(Image image, int x, int y, @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(
      Image image, int x, int y, int width, int height, @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(
      Image image, int x, int y, Color background, @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(
      Image image,
      int x,
      int y,
      int width,
      int height,
      Color background,
      @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(
      Image image,
      int dx1,
      int dy1,
      int dx2,
      int dy2,
      int sx1,
      int sy1,
      int sx2,
      int sy2,
      @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  @Override
  public boolean drawImage(
      Image image,
      int dx1,
      int dy1,
      int dx2,
      int dy2,
      int sx1,
      int sy1,
      int sx2,
      int sy2,
      Color background,
      @Nullable ImageObserver observer) {
    throw refused("an image");
  }

  private static UnsupportedOperationException refused(String what) {
    return new UnsupportedOperationException("charts draw lines, shapes and letters, not " + what);
  }
}

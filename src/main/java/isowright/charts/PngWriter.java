package isowright.charts;

import isowright.charts.Picture.Anchor;
import isowright.charts.Picture.Filling;
import isowright.charts.Picture.Lettering;
import isowright.charts.Picture.Mark;
import isowright.charts.Picture.Outline;
import java.awt.BasicStroke;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.font.GlyphVector;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.awt.image.DataBufferInt;
import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Optional;
import java.util.zip.CRC32;
import java.util.zip.Deflater;

/**
 * Writes a {@link Picture} as PNG at twice its size, 8 bits a channel, 192 dots to the inch. The
 * same picture gives the same bytes on the same machine. Source: Portable Network Graphics (PNG)
 * Specification, 2nd edition, W3C, 2003.
 */
final class PngWriter {

  private static final int SCALE = 2;

  /** 96 dots to the inch, the size of a CSS pixel, twice. */
  private static final int DOTS_PER_METRE = 7559;

  /** Fast: pictures are mostly paper, and higher levels save little. */
  private static final int LEVEL = Deflater.BEST_SPEED;

  private static final byte[] SIGNATURE = {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10};

  private PngWriter() {}

  /** A picture as PNG. */
  static byte[] write(Picture picture) {
    BufferedImage image = pixels(picture);
    int width = image.getWidth();
    int height = image.getHeight();
    ByteArrayOutputStream out = new ByteArrayOutputStream(100_000);
    out.writeBytes(SIGNATURE);
    byte truecolour = 2;
    chunk(
        out,
        "IHDR",
        ByteBuffer.allocate(13)
            .putInt(width)
            .putInt(height)
            .put(new byte[] {8, truecolour, 0, 0, 0})
            .array());
    chunk(
        out,
        "pHYs",
        ByteBuffer.allocate(9).putInt(DOTS_PER_METRE).putInt(DOTS_PER_METRE).put((byte) 1).array());
    chunk(out, "IDAT", compressed(image));
    chunk(out, "IEND", new byte[0]);
    return out.toByteArray();
  }

  private static void chunk(ByteArrayOutputStream out, String type, byte[] data) {
    byte[] name = type.getBytes(StandardCharsets.US_ASCII);
    CRC32 sum = new CRC32();
    sum.update(name);
    sum.update(data);
    out.writeBytes(ByteBuffer.allocate(4).putInt(data.length).array());
    out.writeBytes(name);
    out.writeBytes(data);
    out.writeBytes(ByteBuffer.allocate(4).putInt((int) sum.getValue()).array());
  }

  private static byte[] compressed(BufferedImage image) {
    int width = image.getWidth();
    int[] pixels = ((DataBufferInt) image.getRaster().getDataBuffer()).getData();
    byte[] line = new byte[1 + 3 * width]; // its first byte names the filter: 0, none
    Deflater deflater = new Deflater(LEVEL);
    ByteArrayOutputStream out = new ByteArrayOutputStream(100_000);
    byte[] buffer = new byte[16_384];
    for (int row = 0; row < image.getHeight(); row++) {
      for (int x = 0, at = 1; x < width; x++) {
        int rgb = pixels[row * width + x];
        line[at++] = (byte) (rgb >> 16);
        line[at++] = (byte) (rgb >> 8);
        line[at++] = (byte) rgb;
      }
      deflater.setInput(line);
      while (!deflater.needsInput()) {
        out.write(buffer, 0, deflater.deflate(buffer));
      }
    }
    deflater.finish();
    while (!deflater.finished()) {
      out.write(buffer, 0, deflater.deflate(buffer));
    }
    deflater.end();
    return out.toByteArray();
  }

  private static BufferedImage pixels(Picture picture) {
    int heading = picture.headingHeight();
    BufferedImage image =
        new BufferedImage(
            SCALE * picture.width(),
            SCALE * (picture.height() + heading),
            BufferedImage.TYPE_INT_RGB);
    Graphics2D g = image.createGraphics();
    g.setColor(Style.PAPER);
    g.fillRect(0, 0, image.getWidth(), image.getHeight());
    g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
    g.setRenderingHint(
        RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
    g.setRenderingHint(
        RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
    g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
    g.scale(SCALE, SCALE);
    g.translate(0, heading);
    for (int i = 0; i < picture.heading().size(); i++) {
      letters(
          g,
          new Lettering(
              picture.heading().get(i),
              12,
              picture.headingBaseline(i),
              Anchor.START,
              Style.HEADING_LETTERS,
              true,
              Style.TEXT,
              false));
    }
    for (Mark mark : picture.marks()) {
      paint(g, mark);
    }
    g.dispose();
    return image;
  }

  private static void paint(Graphics2D g, Mark mark) {
    if (mark instanceof Lettering lettering) {
      letters(g, lettering);
    } else if (mark instanceof Outline line) {
      clip(g, line.clip());
      g.setColor(line.color());
      g.setStroke(line.stroke());
      g.draw(line.shape());
    } else if (mark instanceof Filling filling) {
      clip(g, filling.clip());
      g.setColor(filling.color());
      g.fill(filling.shape());
    }
  }

  private static void clip(Graphics2D g, Optional<Rectangle2D> clip) {
    g.setClip(clip.orElse(null));
  }

  private static void letters(Graphics2D g, Lettering letters) {
    g.setClip(null);
    Font font = Style.font(letters.size(), letters.bold());
    double width = Letters.width(letters.text(), letters.size(), letters.bold());
    double x =
        switch (letters.anchor()) {
          case START -> letters.x();
          case MIDDLE -> letters.x() - width / 2;
          case END -> letters.x() - width;
        };
    if (letters.halo()) {
      GlyphVector glyphs = font.createGlyphVector(g.getFontRenderContext(), letters.text());
      g.setColor(Style.PAPER);
      g.setStroke(new BasicStroke(3f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND));
      g.draw(glyphs.getOutline((float) x, (float) letters.y()));
    }
    g.setColor(letters.color());
    g.setFont(font);
    g.drawString(letters.text(), (float) x, (float) letters.y());
  }
}

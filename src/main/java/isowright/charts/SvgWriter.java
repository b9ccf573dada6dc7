package isowright.charts;

import isowright.charts.Picture.Anchor;
import isowright.charts.Picture.Filling;
import isowright.charts.Picture.Lettering;
import isowright.charts.Picture.Mark;
import isowright.charts.Picture.Outline;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.PathIterator;
import java.awt.geom.Rectangle2D;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Writes a {@link Picture} as SVG 1.1: title and description for those who do not see it, real
 * letters, coordinates of two decimals, no width or height so that it fills its container. The same
 * picture gives the same characters. Source: Scalable Vector Graphics (SVG) 1.1, W3C, 2011.
 */
final class SvgWriter {

  private final Picture picture;
  private final String id;
  private final StringBuilder out = new StringBuilder(32_000);
  private final Map<Rectangle2D, String> clips = new LinkedHashMap<>();
  private String group = "";

  private SvgWriter(Picture picture, String id) {
    this.picture = picture;
    this.id = id;
  }

  /**
   * A picture as SVG.
   *
   * @param picture the picture
   * @param id what its ids begin with, unique on a page
   * @param title the title
   * @param description the text alternative
   * @param withHeading whether the heading is drawn
   */
  static String write(
      Picture picture, String id, String title, String description, boolean withHeading) {
    return new SvgWriter(picture, id).write(title, description, withHeading);
  }

  private String write(String title, String description, boolean withHeading) {
    int heading = withHeading ? picture.headingHeight() : 0;
    int height = picture.height() + heading;
    out.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 ")
        .append(-heading)
        .append(' ')
        .append(picture.width())
        .append(' ')
        .append(height)
        .append("\" role=\"img\" aria-labelledby=\"")
        .append(id)
        .append("-title ")
        .append(id)
        .append("-desc\" font-family=\"")
        .append(Style.FAMILIES)
        .append("\" font-size=\"")
        .append(number(Style.LETTERS))
        .append("\">\n");
    element("title", title);
    element("desc", description);
    out.append("<rect y=\"").append(-heading).append("\" width=\"").append(picture.width());
    out.append("\" height=\"").append(height).append("\" fill=\"#ffffff\"/>\n");
    clipPaths();
    if (withHeading) {
      heading();
    }
    for (Mark mark : picture.marks()) {
      mark(mark);
    }
    enter("");
    return out.append("</svg>\n").toString();
  }

  private void element(String name, String text) {
    out.append('<').append(name).append(" id=\"").append(id).append('-').append(name).append("\">");
    out.append(escaped(text)).append("</").append(name).append(">\n");
  }

  private void heading() {
    for (int i = 0; i < picture.heading().size(); i++) {
      lettering(
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
  }

  private void clipPaths() {
    for (Mark mark : picture.marks()) {
      clipOf(mark).ifPresent(c -> clips.putIfAbsent(c, id + "-clip" + (clips.size() + 1)));
    }
    clips.forEach(
        (clip, name) -> {
          out.append("<clipPath id=\"").append(name).append("\">");
          rectangle(clip);
          out.append("</clipPath>\n");
        });
  }

  /** The clip that a mark needs; none if it lies inside. */
  private static Optional<Rectangle2D> clipOf(Mark mark) {
    if (mark instanceof Outline line) {
      return line.clip().filter(c -> !c.contains(line.shape().getBounds2D()));
    }
    if (mark instanceof Filling filling) {
      return filling.clip().filter(c -> !c.contains(filling.shape().getBounds2D()));
    }
    return Optional.empty();
  }

  private void mark(Mark mark) {
    if (mark instanceof Lettering letters) {
      lettering(letters);
      return;
    }
    String clip = clipOf(mark).map(c -> " clip-path=\"url(#" + clips.get(c) + ")\"").orElse("");
    if (mark instanceof Outline line) {
      enter(series(line.color()) + " fill=\"none\"" + stroke(line.color(), line.stroke()) + clip);
      shape(line.shape());
    } else if (mark instanceof Filling filling) {
      enter(series(filling.color()) + paint("fill", filling.color()) + clip);
      shape(filling.shape());
    }
  }

  /** Goes on in a group with these attributes: the same one if it is open. */
  private void enter(String attributes) {
    if (!group.equals(attributes)) {
      if (!group.isEmpty()) {
        out.append("</g>\n");
      }
      if (!attributes.isEmpty()) {
        out.append("<g").append(attributes).append(">\n");
      }
      group = attributes;
    }
  }

  private static String series(Color color) {
    String series = Ink.series(color);
    return series.isEmpty() ? "" : " data-series=\"" + escaped(series) + "\"";
  }

  private static String stroke(Color color, BasicStroke stroke) {
    StringBuilder text = new StringBuilder(paint("stroke", color));
    text.append(" stroke-width=\"").append(number(stroke.getLineWidth())).append('"');
    if (stroke.getLineJoin() == BasicStroke.JOIN_ROUND) {
      text.append(" stroke-linejoin=\"round\"");
    }
    float[] dashes = stroke.getDashArray();
    if (dashes != null) {
      text.append(" stroke-dasharray=\"");
      for (int i = 0; i < dashes.length; i++) {
        text.append(i == 0 ? "" : " ").append(number(dashes[i]));
      }
      text.append('"');
    }
    return text.toString();
  }

  private static String paint(String attribute, Color color) {
    String text = " " + attribute + "=\"" + hex(color) + "\"";
    return color.getAlpha() == 255
        ? text
        : text + " " + attribute + "-opacity=\"" + number(color.getAlpha() / 255.0) + "\"";
  }

  private static String hex(Color color) {
    return "#" + Integer.toHexString(0x1000000 | (color.getRGB() & 0xffffff)).substring(1);
  }

  private void shape(Shape shape) {
    if (shape instanceof Ellipse2D e && e.getWidth() == e.getHeight()) {
      out.append("<circle cx=\"").append(number(e.getCenterX()));
      out.append("\" cy=\"").append(number(e.getCenterY()));
      out.append("\" r=\"").append(number(e.getWidth() / 2)).append("\"/>\n");
    } else if (shape instanceof Rectangle2D r) {
      rectangle(r);
      out.append('\n');
    } else {
      out.append("<path d=\"");
      path(shape);
      out.append("\"/>\n");
    }
  }

  private void rectangle(Rectangle2D r) {
    out.append("<rect x=\"").append(number(r.getX())).append("\" y=\"").append(number(r.getY()));
    out.append("\" width=\"").append(number(r.getWidth()));
    out.append("\" height=\"").append(number(r.getHeight())).append("\"/>");
  }

  private void path(Shape shape) {
    double[] c = new double[6];
    for (PathIterator i = shape.getPathIterator(null); !i.isDone(); i.next()) {
      switch (i.currentSegment(c)) {
        case PathIterator.SEG_MOVETO -> points('M', c, 1);
        case PathIterator.SEG_LINETO -> points('L', c, 1);
        case PathIterator.SEG_QUADTO -> points('Q', c, 2);
        case PathIterator.SEG_CUBICTO -> points('C', c, 3);
        default -> out.append('Z');
      }
    }
  }

  private void points(char command, double[] c, int count) {
    out.append(command);
    for (int i = 0; i < 2 * count; i++) {
      out.append(i == 0 ? "" : " ").append(number(c[i]));
    }
  }

  private void lettering(Lettering letters) {
    String anchor =
        switch (letters.anchor()) {
          case START -> "";
          case MIDDLE -> " text-anchor=\"middle\"";
          case END -> " text-anchor=\"end\"";
        };
    String size =
        letters.size() == Style.LETTERS ? "" : " font-size=\"" + number(letters.size()) + "\"";
    String halo =
        letters.halo()
            ? " stroke=\"#ffffff\" stroke-width=\"3\" stroke-linejoin=\"round\""
                + " paint-order=\"stroke\""
            : "";
    enter(
        paint("fill", letters.color())
            + anchor
            + size
            + (letters.bold() ? " font-weight=\"bold\"" : "")
            + halo);
    out.append("<text x=\"").append(number(letters.x()));
    out.append("\" y=\"").append(number(letters.y())).append("\">");
    out.append(escaped(letters.text())).append("</text>\n");
  }

  /** A coordinate with at most two decimals. */
  private static String number(double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalStateException("a mark lies nowhere: " + value);
    }
    long hundredths = Math.round(value * 100);
    long whole = Math.abs(hundredths) / 100;
    long rest = Math.abs(hundredths) % 100;
    String sign = hundredths < 0 ? "-" : "";
    if (rest == 0) {
      return sign + whole;
    }
    return sign + whole + (rest % 10 == 0 ? "." + rest / 10 : rest < 10 ? ".0" + rest : "." + rest);
  }

  /** Text as it may stand in XML; characters that XML 1.0 forbids are left out. */
  static String escaped(String text) {
    StringBuilder safe = new StringBuilder(text.length() + 16);
    text.codePoints()
        .filter(c -> c == '\t' || c == '\n' || (c >= ' ' && c != 0xfffe && c != 0xffff))
        .filter(c -> c < 0xd800 || c > 0xdfff)
        .forEach(
            c -> {
              switch (c) {
                case '<' -> safe.append("&lt;");
                case '>' -> safe.append("&gt;");
                case '&' -> safe.append("&amp;");
                case '"' -> safe.append("&quot;");
                case '\'' -> safe.append("&#39;");
                default -> safe.appendCodePoint(c);
              }
            });
    return safe.toString();
  }
}

package isowright.charts;

import java.awt.geom.Rectangle2D;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.xml.parsers.DocumentBuilderFactory;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** A picture read back from its SVG: what it says, and where its letters stand. */
final class Drawing {

  /** Letters reach so far above and below their baseline, in em. */
  private static final double ASCENT = 0.74;

  private static final double DESCENT = 0.2;

  /**
   * A line of letters.
   *
   * @param text what it says
   * @param box about where it stands
   */
  record Letters(String text, Rectangle2D box) {}

  private final Element root;

  private Drawing(Element root) {
    this.root = root;
  }

  /** A picture, which must be well-formed XML. */
  static Drawing of(String svg) {
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setNamespaceAware(true);
      return new Drawing(
          factory
              .newDocumentBuilder()
              .parse(new InputSource(new StringReader(svg)))
              .getDocumentElement());
    } catch (Exception e) {
      throw new AssertionError("not well-formed: " + e.getMessage(), e);
    }
  }

  Element root() {
    return root;
  }

  /** All elements of a kind. */
  List<Element> all(String name) {
    List<Element> all = new ArrayList<>();
    NodeList nodes = root.getElementsByTagNameNS("*", name);
    for (int i = 0; i < nodes.getLength(); i++) {
      all.add((Element) nodes.item(i));
    }
    return all;
  }

  /** All elements. */
  List<Element> elements() {
    return all("*");
  }

  /** The element with an id. */
  Optional<Element> withId(String id) {
    return elements().stream().filter(e -> e.getAttribute("id").equals(id)).findFirst();
  }

  /** The part of the plane that is shown. */
  Rectangle2D view() {
    String[] box = root.getAttribute("viewBox").split(" ");
    return new Rectangle2D.Double(
        Double.parseDouble(box[0]),
        Double.parseDouble(box[1]),
        Double.parseDouble(box[2]),
        Double.parseDouble(box[3]));
  }

  /** The lines of letters, with the box each takes, about. */
  List<Letters> letters() {
    List<Letters> letters = new ArrayList<>();
    for (Element text : all("text")) {
      double size = Double.parseDouble(inherited(text, "font-size"));
      boolean bold = inherited(text, "font-weight").equals("bold");
      double width = isowright.charts.Letters.width(text.getTextContent(), (float) size, bold);
      double x = Double.parseDouble(text.getAttribute("x"));
      double left =
          switch (inherited(text, "text-anchor")) {
            case "middle" -> x - width / 2;
            case "end" -> x - width;
            default -> x;
          };
      double baseline = Double.parseDouble(text.getAttribute("y"));
      letters.add(
          new Letters(
              text.getTextContent(),
              new Rectangle2D.Double(
                  left, baseline - ASCENT * size, width, (ASCENT + DESCENT) * size)));
    }
    return letters;
  }

  private static String inherited(Element element, String attribute) {
    for (Node node = element; node instanceof Element e; node = node.getParentNode()) {
      if (e.hasAttribute(attribute)) {
        return e.getAttribute(attribute);
      }
    }
    return "";
  }
}

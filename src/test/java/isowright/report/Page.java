package isowright.report;

import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import javax.xml.parsers.DocumentBuilderFactory;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** A report page read as a browser reads it: a tree of elements. */
final class Page {

  private final Element root;

  private Page(Element root) {
    this.root = root;
  }

  /** A page, which must be well-formed. */
  static Page of(String html) {
    try {
      var builder = DocumentBuilderFactory.newInstance().newDocumentBuilder();
      return new Page(builder.parse(new InputSource(new StringReader(html))).getDocumentElement());
    } catch (Exception e) {
      throw new AssertionError("the page is not well-formed: " + e.getMessage(), e);
    }
  }

  /** All elements, in the order of the page. */
  List<Element> elements() {
    List<Element> all = new ArrayList<>();
    collect(root, all);
    return all;
  }

  private static void collect(Element element, List<Element> all) {
    all.add(element);
    for (Element child : children(element)) {
      collect(child, all);
    }
  }

  /** All elements of a kind. */
  List<Element> all(String... names) {
    return elements().stream().filter(e -> List.of(names).contains(e.getTagName())).toList();
  }

  /** The only element with an id. */
  Element withId(String id) {
    List<Element> found = elements().stream().filter(e -> e.getAttribute("id").equals(id)).toList();
    if (found.size() != 1) {
      throw new AssertionError(found.size() + " elements have the id " + id);
    }
    return found.get(0);
  }

  /** The elements within one that carry a class. */
  static List<Element> withClass(Element within, String name) {
    return inside(within, e -> List.of(e.getAttribute("class").split(" ")).contains(name));
  }

  /** The elements within one that are of a kind. */
  static List<Element> named(Element within, String name) {
    return inside(within, e -> e.getTagName().equals(name));
  }

  private static List<Element> inside(Element within, Predicate<Element> which) {
    List<Element> all = new ArrayList<>();
    collect(within, all);
    return all.stream().filter(which).toList();
  }

  /** The child elements. */
  static List<Element> children(Element element) {
    List<Element> children = new ArrayList<>();
    NodeList nodes = element.getChildNodes();
    for (int i = 0; i < nodes.getLength(); i++) {
      if (nodes.item(i) instanceof Element child) {
        children.add(child);
      }
    }
    return children;
  }

  /** What an element says, white space of any kind as one space. */
  static String text(Node node) {
    return spaced(node.getTextContent());
  }

  /** White space of any kind as one space. */
  static String spaced(String text) {
    return text.replace('\u00a0', ' ').replaceAll("\\s+", " ").strip();
  }
}

package isowright.report;

/**
 * Writes markup that is HTML and well-formed XML at once. The one place where text is escaped:
 * whatever comes through {@link #text} or as an attribute's value appears as text, never as markup.
 */
final class Markup {

  private final StringBuilder written;

  Markup(int expected) {
    this.written = new StringBuilder(expected);
  }

  /** Opens an element; attributes as name, value, name, value. */
  Markup open(String element, String... attributes) {
    tag(element, attributes);
    written.append('>');
    return this;
  }

  /** Closes an element. */
  Markup close(String element) {
    written.append("</").append(element).append('>');
    return this;
  }

  /** An element without content. */
  Markup empty(String element, String... attributes) {
    tag(element, attributes);
    written.append(" />");
    return this;
  }

  /** An element that holds text alone. */
  Markup element(String element, String text, String... attributes) {
    return open(element, attributes).text(text).close(element);
  }

  /** Text. */
  Markup text(String text) {
    escape(text);
    return this;
  }

  /** A new line, for people who read the source. */
  Markup line() {
    written.append('\n');
    return this;
  }

  /** Markup that this program itself made: a style sheet, a drawing. */
  Markup trusted(String markup) {
    written.append(markup);
    return this;
  }

  @Override
  public String toString() {
    return written.toString();
  }

  private void tag(String element, String[] attributes) {
    written.append('<').append(element);
    for (int i = 0; i < attributes.length; i += 2) {
      written.append(' ').append(attributes[i]).append("=\"");
      escape(attributes[i + 1]);
      written.append('"');
    }
  }

  private void escape(String text) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '&' -> written.append("&amp;");
        case '<' -> written.append("&lt;");
        case '>' -> written.append("&gt;");
        case '"' -> written.append("&quot;");
        case '\'' -> written.append("&#39;");
        default -> plain(text, i, c);
      }
    }
  }

  /** A character as it is, or U+FFFD where XML has no place for it. */
  private void plain(String text, int at, char c) {
    boolean paired =
        Character.isHighSurrogate(c)
            ? at + 1 < text.length() && Character.isLowSurrogate(text.charAt(at + 1))
            : !Character.isLowSurrogate(c)
                || (at > 0 && Character.isHighSurrogate(text.charAt(at - 1)));
    boolean control = c < ' ' && c != '\t' && c != '\n' && c != '\r';
    written.append(!paired || control || c == '\ufffe' || c == '\uffff' ? '\ufffd' : c);
  }
}

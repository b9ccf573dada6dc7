package isowright.report;

import java.util.HashSet;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * An SVG picture made fit to stand within a page: without the declarations of a file of its own,
 * and with identifiers that no other picture of the page has.
 */
final class InlineDrawing {

  private static final Pattern IDENTIFIER = Pattern.compile("\\sid=\"([^\"]+)\"");
  private static final Pattern REFERENCE =
      Pattern.compile(
          "(\\sid=\"|url\\(#|href=\"#|aria-labelledby=\"|aria-describedby=\")([^\")]+)");

  private InlineDrawing() {}

  /** The picture, its identifiers begun with a prefix. */
  static String of(String svg, String prefix) {
    int from = svg.indexOf("<svg");
    String picture = from > 0 ? svg.substring(from) : svg;
    Set<String> identifiers = new HashSet<>();
    Matcher identifier = IDENTIFIER.matcher(picture);
    while (identifier.find()) {
      identifiers.add(identifier.group(1));
    }
    if (identifiers.isEmpty()) {
      return picture;
    }
    StringBuilder renamed = new StringBuilder(picture.length() + 1024);
    Matcher reference = REFERENCE.matcher(picture);
    while (reference.find()) {
      reference.appendReplacement(
          renamed,
          Matcher.quoteReplacement(
              reference.group(1) + renamed(reference.group(2), identifiers, prefix)));
    }
    return reference.appendTail(renamed).toString();
  }

  /** One identifier, or several parted by spaces. */
  private static String renamed(String words, Set<String> identifiers, String prefix) {
    StringBuilder renamed = new StringBuilder();
    for (String word : words.split(" ", -1)) {
      if (renamed.length() > 0) {
        renamed.append(' ');
      }
      renamed.append(identifiers.contains(word) ? prefix + word : word);
    }
    return renamed.toString();
  }
}

package isowright.charts;

import java.awt.font.FontRenderContext;
import java.util.ArrayList;
import java.util.List;

/** How wide letters are, and where a sentence breaks into lines. */
final class Letters {

  private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);

  private Letters() {}

  /** The width of a line of letters. */
  static double width(String text, float size, boolean bold) {
    return text.isEmpty() ? 0 : Style.font(size, bold).getStringBounds(text, METRICS).getWidth();
  }

  /** A sentence in lines no wider than {@code width}; a word that is wider still is divided. */
  static List<String> wrap(String sentence, double width, float size, boolean bold) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : sentence.strip().split("\\s+")) {
      String rest = word;
      String joined = line.isEmpty() ? rest : line + " " + rest;
      if (width(joined, size, bold) <= width) {
        line.setLength(0);
        line.append(joined);
        continue;
      }
      if (!line.isEmpty()) {
        lines.add(line.toString());
        line.setLength(0);
      }
      while (width(rest, size, bold) > width) {
        int end = fitting(rest, width, size, bold);
        lines.add(rest.substring(0, end));
        rest = rest.substring(end);
      }
      line.append(rest);
    }
    if (!line.isEmpty()) {
      lines.add(line.toString());
    }
    return lines;
  }

  /** Where the longest beginning that fits ends; at least one letter. */
  private static int fitting(String word, double width, float size, boolean bold) {
    int end = word.offsetByCodePoints(0, 1);
    while (end < word.length()) {
      int next = word.offsetByCodePoints(end, 1);
      if (width(word.substring(0, next), size, bold) > width) {
        break;
      }
      end = next;
    }
    return end;
  }
}

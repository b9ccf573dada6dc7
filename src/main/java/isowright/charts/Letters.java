package isowright.charts;

import java.awt.font.FontRenderContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/** How wide letters are, and where a sentence breaks into lines. */
final class Letters {

  private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);

  /** By how much lines are made narrower, step by step, until they would be one more. */
  private static final double NARROWING = 20;

  /** Short words that are no units. */
  private static final Set<String> SMALL_WORDS =
      Set.of("to", "at", "is", "of", "in", "on", "and", "for", "the", "not", "or", "as", "R²");

  private Letters() {}

  /** The width of a line of letters. */
  static double width(String text, float size, boolean bold) {
    return text.isEmpty() ? 0 : Style.font(size, bold).getStringBounds(text, METRICS).getWidth();
  }

  /** Words that are no wider than {@code width}: their beginning and an ellipsis where need be. */
  static String shortened(String text, double width, float size, boolean bold) {
    if (width(text, size, bold) <= width) {
      return text;
    }
    double left = Math.max(0, width - width("…", size, bold));
    return text.substring(0, fitting(text, left, size, bold)).stripTrailing() + "…";
  }

  /**
   * A sentence in as few lines as are no wider than {@code width}, all about equally long. A number
   * is not parted from its unit; a word that is wider than a line is divided.
   */
  static List<String> wrap(String sentence, double width, float size, boolean bold) {
    List<String> words = words(sentence);
    List<String> lines = lines(words, width, size, bold);
    for (double narrower = width - NARROWING; narrower > 0; narrower -= NARROWING) {
      List<String> tried = lines(words, narrower, size, bold);
      if (tried.size() > lines.size() || divided(tried, words)) {
        break;
      }
      lines = tried;
    }
    return lines;
  }

  private static boolean divided(List<String> lines, List<String> words) {
    return !String.join(" ", lines).equals(String.join(" ", words));
  }

  /** The words of a sentence, a number and the unit after it taken as one. */
  private static List<String> words(String sentence) {
    List<String> words = new ArrayList<>();
    for (String word : sentence.strip().split("\\s+")) {
      int last = words.size() - 1;
      if (last >= 0 && isUnit(word) && Character.isDigit(end(words.get(last)))) {
        words.set(last, words.get(last) + " " + word);
      } else {
        words.add(word);
      }
    }
    return words;
  }

  private static boolean isUnit(String word) {
    String bare = word.replaceAll("[,.:;]$", "");
    return bare.length() <= 3 && !SMALL_WORDS.contains(bare);
  }

  private static char end(String word) {
    return word.isEmpty() ? ' ' : word.charAt(word.length() - 1);
  }

  private static List<String> lines(List<String> words, double width, float size, boolean bold) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : words) {
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

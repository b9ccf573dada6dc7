package isowright.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * A question asked with options, in the words of a question file: each option becomes the key of
 * its name, so that both are checked in one place.
 */
final class QuestionWords {

  private static final Set<String> LISTS = Set.of("technology", "target", "whole");
  private static final Set<String> PAIRS = Set.of("prices", "hold", "take-at-least");
  private static final Pattern NUMBER =
      Pattern.compile("[-+]?(\\d+(\\.\\d*)?|\\.\\d+)([eE][-+]?\\d+)?");
  private static final String SPAN = "..";

  private QuestionWords() {}

  /** The question file that these options stand for. */
  static String of(Map<String, String> options) {
    StringBuilder text = new StringBuilder("least-cost:\n  - name: Plan\n");
    options.forEach((name, value) -> text.append("    ").append(line(name, value)).append('\n'));
    return text.toString();
  }

  private static String line(String name, String value) {
    if (LISTS.contains(name)) {
      List<String> items = List.of(value.split(",", -1));
      boolean one = items.size() == 1 && !name.equals("whole");
      return name + ": " + (one ? scalar(value) : list(items));
    }
    if (name.equals("limits")) {
      return name + ": " + spans(value);
    }
    return name + ": " + (PAIRS.contains(name) ? pairs(value) : scalar(value));
  }

  private static String list(List<String> items) {
    return "[" + String.join(", ", items.stream().map(QuestionWords::scalar).toList()) + "]";
  }

  /** "labour=34,machines=74" as a mapping; what has no equals sign is left for the check. */
  private static String pairs(String value) {
    List<String> pairs = new ArrayList<>();
    for (String pair : value.split(",", -1)) {
      int at = pair.indexOf('=');
      pairs.add(
          at < 0
              ? quoted(pair) + ": \"\""
              : quoted(pair.substring(0, at)) + ": " + scalar(pair.substring(at + 1)));
    }
    return "{" + String.join(", ", pairs) + "}";
  }

  /** "labour=0..60000" as a mapping of lists; an end left out is nothing or without end. */
  private static String spans(String value) {
    List<String> spans = new ArrayList<>();
    for (String span : value.split(",", -1)) {
      int at = span.indexOf('=');
      String input = at < 0 ? span : span.substring(0, at);
      String ends = at < 0 ? "" : span.substring(at + 1);
      int dots = ends.indexOf(SPAN);
      String both =
          dots < 0
              ? scalar(ends)
              : "["
                  + (dots == 0 ? "0" : scalar(ends.substring(0, dots)))
                  + ", "
                  + (dots + SPAN.length() == ends.length()
                      ? ".inf"
                      : scalar(ends.substring(dots + SPAN.length())))
                  + "]";
      spans.add(quoted(input) + ": " + both);
    }
    return "{" + String.join(", ", spans) + "}";
  }

  private static String scalar(String value) {
    String word = value.strip();
    return NUMBER.matcher(word).matches() ? word : quoted(word);
  }

  private static String quoted(String value) {
    return '"' + value.strip().replace("\\", "\\\\").replace("\"", "\\\"") + '"';
  }
}

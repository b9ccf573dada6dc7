package isowright.workbench;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The sections of a study's text by their keys at the margin; text before the first stays with it.
 * Nothing is understood here: whether it is a study is for the study's reader to say.
 */
final class Sections {

  private static final Pattern KEY = Pattern.compile("^([A-Za-z][A-Za-z0-9-]*)\\s*:(?:\\s.*)?$");
  private static final String BEFORE = "";

  private final Map<String, String> byKey;

  private Sections(Map<String, String> byKey) {
    this.byKey = byKey;
  }

  static Sections of(String text) {
    Map<String, String> byKey = new LinkedHashMap<>();
    String key = BEFORE;
    for (String line : text.split("\\R", -1)) {
      Matcher begins = KEY.matcher(line);
      if (begins.matches()) {
        key = begins.group(1);
      }
      byKey.merge(key, line + "\n", String::concat);
    }
    return new Sections(byKey);
  }

  /** These sections with others in place of those of the same key, new ones at the end. */
  Sections with(Sections others) {
    Map<String, String> all = new LinkedHashMap<>(byKey);
    all.putAll(others.byKey);
    return new Sections(all);
  }

  String text() {
    return String.join("", byKey.values()).stripTrailing() + "\n";
  }
}

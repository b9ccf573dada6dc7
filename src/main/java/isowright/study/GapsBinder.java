package isowright.study;

import java.util.List;

/**
 * Reads the policies for what the records lack: {@code zeros} and {@code missing-values}, under
 * {@code estimation}.
 */
final class GapsBinder {

  private static final String DROP = "drop";

  private static final String DUMMY = "dummy";

  private GapsBinder() {}

  /**
   * Whether rows in which an input is not used are kept; the policies are dropping where absent.
   */
  static boolean keepsZeros(YamlSection root, Declared declared) {
    if (root.get("estimation").filter(YamlValue::isMapping).isEmpty()) {
      return false;
    }
    YamlSection section = root.section("estimation").orElseThrow();
    section
        .get("missing-values")
        .ifPresent(value -> value.word(List.of(DROP), List.of("impute", "mean", "interpolate")));
    boolean keeps =
        section
            .get("zeros")
            .flatMap(value -> value.word(List.of(DROP, DUMMY), List.of()))
            .map(DUMMY::equals)
            .orElse(false);
    if (keeps && !declared.present()) {
      section.refuse("zeros", "`dummy` keeps rows of records, but there is no `records`");
    }
    return keeps;
  }
}

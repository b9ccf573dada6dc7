package isowright.records;

import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/** How values and counts stand in messages: always short, always the same on every machine. */
final class Shown {

  /** A cell may hold a million characters; a message shows the first of them. */
  private static final int LONGEST = 40;

  private Shown() {}

  /** Text on one line, shortened when long. */
  static String shortened(String text) {
    StringBuilder line = new StringBuilder();
    int end = Math.min(text.length(), LONGEST);
    for (int i = 0; i < end; i++) {
      char c = text.charAt(i);
      line.append(Character.isISOControl(c) ? ' ' : c);
    }
    return text.length() > LONGEST
        ? line + "… (" + count(text.length()) + " characters)"
        : line.toString();
  }

  /** A whole number with commas between groups of three digits. */
  static String count(long number) {
    return String.format(Locale.ROOT, "%,d", number);
  }

  /** "1 row" or "12 rows". */
  static String count(long number, String thing) {
    return count(number) + " " + thing + (number == 1 ? "" : "s");
  }

  /** A value to six significant digits, without an exponent where that is readable. */
  static String value(double value) {
    if (!Double.isFinite(value)) {
      return String.valueOf(value);
    }
    double size = Math.abs(value);
    if (size != 0 && (size < 1e-4 || size >= 1e15)) {
      return String.format(Locale.ROOT, "%.5e", value);
    }
    int whole = size < 1 ? 0 : (int) Math.floor(Math.log10(size)) + 1;
    int decimals = size < 1 ? 8 : Math.max(6 - whole, 0);
    String pattern = decimals == 0 ? "0" : "0." + "#".repeat(decimals);
    return new DecimalFormat(pattern, DecimalFormatSymbols.getInstance(Locale.ROOT)).format(value);
  }

  /** "rows 3, 7 and 12", the first few, with "and n more" when there are more. */
  static String rows(List<Integer> first, long all) {
    String numbers = first.stream().map(String::valueOf).collect(Collectors.joining(", "));
    String more = all > first.size() ? " and " + count(all - first.size()) + " more" : "";
    return (all == 1 ? "row " : "rows ") + numbers + more;
  }
}

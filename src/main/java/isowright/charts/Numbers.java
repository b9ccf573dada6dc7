package isowright.charts;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/**
 * Numbers in print: thousands separated by commas, a point before decimals, whatever the machine's
 * language; no powers of ten for ordinary sizes.
 */
final class Numbers {

  private static final String MINUS = "\u2212";

  private Numbers() {}

  /** For sentences and labels: three significant digits, so 41,297.3 becomes 41,300. */
  static String brief(double value) {
    return typographic(rounded(value, 3));
  }

  /** Two numbers with as many decimals as the greater needs for three digits: 0.420 to 0.437. */
  static String span(double least, double most) {
    int decimals = decimalsFor(Math.max(Math.abs(least), Math.abs(most)));
    String from = decimals(least, decimals);
    String to = decimals(most, decimals);
    return from.equals(to) ? from : from + " to " + to;
  }

  /** An estimate with its interval, decimals alike: 0.420 (0.292 to 0.548). */
  static String interval(double value, double low, double high) {
    if (!(high > low) || Double.isInfinite(low) || Double.isInfinite(high)) {
      return brief(value);
    }
    int decimals = decimalsFor(high - low);
    return decimals(value, decimals)
        + " ("
        + decimals(low, decimals)
        + " to "
        + decimals(high, decimals)
        + ")";
  }

  /** The decimals that show three significant digits of a size. */
  private static int decimalsFor(double size) {
    return size > 0 ? Math.max(0, Math.min(9, 2 - (int) Math.floor(Math.log10(size)))) : 0;
  }

  /** For numbers stated by the reader, such as a target: up to eight significant digits. */
  static String stated(double value) {
    return typographic(rounded(value, 8));
  }

  /** For tables: six significant digits and an ASCII minus sign, ready to be copied. */
  static String tabular(double value) {
    return Double.isNaN(value) ? "" : rounded(value, 6);
  }

  /** For tables, of a number that may be absent. */
  static String tabular(java.util.Optional<Double> value) {
    return value.map(Numbers::tabular).orElse("");
  }

  /** With a fixed number of decimals, for labels of an axis. */
  static String decimals(double value, int decimals) {
    return typographic(grouped(value, decimals));
  }

  /** Money in a sentence: 2.99 million EUR, 412,000 EUR. */
  static String money(double value, String unit) {
    double size = Math.abs(value);
    if (size >= 999.5e6 && size < 999.5e12) {
      return brief(value / 1e9) + " billion " + unit;
    }
    if (size >= 999.5e3 && size < 999.5e6) {
      return brief(value / 1e6) + " million " + unit;
    }
    return brief(value) + " " + unit;
  }

  /** The fewest decimals with which a number is exact, up to nine. */
  static int decimalsOf(double value) {
    BigDecimal exact = new BigDecimal(value).round(new MathContext(10)).stripTrailingZeros();
    return Math.max(0, Math.min(9, exact.scale()));
  }

  private static String rounded(double value, int digits) {
    if (Double.isNaN(value)) {
      return "not known";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "unbounded" : "-unbounded";
    }
    if (value == 0) {
      return "0";
    }
    double size = Math.abs(value);
    if (size >= 1e15 || size < 1e-6) {
      return String.format(Locale.ROOT, "%." + (digits - 1) + "e", value);
    }
    BigDecimal shortened =
        new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_UP));
    return grouped(shortened.doubleValue(), Math.max(0, shortened.stripTrailingZeros().scale()));
  }

  private static String grouped(double value, int decimals) {
    return String.format(Locale.ROOT, "%,." + decimals + "f", value);
  }

  private static String typographic(String number) {
    return number.replace("-", MINUS);
  }
}

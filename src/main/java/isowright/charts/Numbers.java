package isowright.charts;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers in print: thousands separated by commas, a point before decimals, whatever the machine's
 * language; powers of ten only for sizes that nobody writes out.
 */
final class Numbers {

  private static final String MINUS = "\u2212";
  private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

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

  /** "10⁻¹²". */
  static String powerOfTen(int exponent) {
    StringBuilder text = new StringBuilder(exponent < 0 ? "10⁻" : "10");
    for (char digit : Integer.toString(Math.abs(exponent)).toCharArray()) {
      text.append(SUPERSCRIPTS.charAt(digit - '0'));
    }
    return text.toString();
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
    BigDecimal shortened =
        new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_UP));
    double size = Math.abs(value);
    if (size >= 1e15 || size < 1e-6) {
      int exponent = shortened.precision() - shortened.scale() - 1;
      BigDecimal mantissa = shortened.scaleByPowerOfTen(-exponent).stripTrailingZeros();
      return mantissa.toPlainString() + " × " + powerOfTen(exponent);
    }
    BigDecimal plain = shortened.stripTrailingZeros();
    return grouped(plain.setScale(Math.max(0, plain.scale())));
  }

  private static String grouped(double value, int decimals) {
    return grouped(BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_UP));
  }

  /** A decimal number with commas between thousands. */
  private static String grouped(BigDecimal number) {
    String digits = number.toPlainString();
    int first = digits.startsWith("-") ? 1 : 0;
    int point = digits.indexOf('.');
    int whole = point < 0 ? digits.length() : point;
    if (whole - first <= 3) {
      return digits;
    }
    StringBuilder text = new StringBuilder(digits);
    for (int i = whole - 3; i > first; i -= 3) {
      text.insert(i, ',');
    }
    return text.toString();
  }

  private static String typographic(String number) {
    return number.replace("-", MINUS);
  }
}

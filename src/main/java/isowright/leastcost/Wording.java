package isowright.leastcost;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;

/** Quantities in words, for the reasons that plans carry. */
final class Wording {

  private static final MathContext DIGITS = new MathContext(6);

  private Wording() {}

  /** A number with six significant digits, without exponent where it is neither tiny nor huge. */
  static String number(double value) {
    if (!Double.isFinite(value)) {
      return Double.toString(value);
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
    double size = Math.abs(value);
    return size >= 1e-4 && size < 1e12 ? rounded.toPlainString() : rounded.toString();
  }

  /** A number with three significant digits, for what carries no interval. */
  static String brief(double value) {
    return number(new BigDecimal(value).round(new MathContext(3)).doubleValue());
  }

  /** A mix such as {@code labour 120, machines 33.5}. */
  static String mix(List<String> inputs, double[] logMix) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < logMix.length; i++) {
      text.append(i == 0 ? "" : ", ").append(inputs.get(i)).append(' ');
      text.append(number(Math.exp(logMix[i])));
    }
    return text.toString();
  }

  /** A list such as {@code a, b and c}. */
  static String list(List<String> parts) {
    int last = parts.size() - 1;
    if (last < 1) {
      return String.join("", parts);
    }
    return String.join(", ", parts.subList(0, last)) + " and " + parts.get(last);
  }
}

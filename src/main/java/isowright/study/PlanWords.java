package isowright.study;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers in the sentences about plans. */
final class PlanWords {

  private static final MathContext SIX = new MathContext(6);

  private PlanWords() {}

  /** A number as a person writes it: no exponent, no trailing zeros. */
  static String plain(double value) {
    return Double.isFinite(value)
        ? new BigDecimal(Double.toString(value)).stripTrailingZeros().toPlainString()
        : Double.toString(value);
  }

  /** A number with six significant digits, thousands marked by commas. */
  static String number(double value) {
    if (!Double.isFinite(value)) {
      return value > 0 ? "without end" : "not known";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded = new BigDecimal(value).round(SIX).stripTrailingZeros();
    double size = Math.abs(value);
    if (size < 1e-4 || size >= 1e15) {
      return rounded.toString();
    }
    String plain = rounded.toPlainString();
    int point = plain.indexOf('.');
    String whole = point < 0 ? plain : plain.substring(0, point);
    String marked = whole.replaceAll("(?<=[0-9])(?=(?:[0-9]{3})+$)", ",");
    return point < 0 ? marked : marked + plain.substring(point);
  }

  /** A number with its unit: "1,200 h"; the number alone where the unit is not stated. */
  static String number(double value, String unit) {
    return unit.isEmpty() ? number(value) : number(value) + " " + unit;
  }
}

package isowright.report;

import isowright.study.Figure;
import isowright.study.Figure.Uncertainty;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * How is a number printed? The one place where numbers become words.
 *
 * <p>An estimated figure is rounded by its uncertainty: the standard error to two significant
 * digits and the value to the same decimal place (<i>Guide to the Expression of Uncertainty in
 * Measurement</i>, JCGM 100:2008, 7.2.6); the ends of its interval likewise, except that an end
 * never rounds to 0 or 1 unless it is 0 or 1, so that an interval that leaves out the value of a
 * null never seems to touch it. Where there is no standard error, a quarter of the interval's width
 * takes its place. Ties go to the even digit.
 *
 * <p>Thousands are set off by commas, the decimal mark is a point, the minus sign is U+2212.
 *
 * <p>Tested in {@code NumbersTest}.
 */
public final class Numbers {

  /** What stands where a figure could not be had. */
  public static final String NOT_AVAILABLE = "not available";

  /** What stands where an estimated figure has no interval. */
  static final String NO_INTERVAL = "no interval";

  /** A space that keeps a number and its unit on one line. */
  static final String BOUND = "\u00a0";

  private static final int UNCERTAINTY_DIGITS = 2;
  private static final int EXACT_DIGITS = 6;
  private static final int LONGEST_WHOLE = 15;
  private static final int DEEPEST_PLACE = 6;
  private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

  private Numbers() {}

  /** The value of a figure, rounded by its uncertainty. */
  public static String value(Figure figure) {
    double v = figure.value();
    if (!Double.isFinite(v)) {
      return amount(v);
    }
    double u = spread(figure);
    return u > 0 ? atPlace(v, place(u)) : amount(v);
  }

  /** The interval of a figure, "low to high"; empty where the figure is exact. */
  public static String interval(Figure figure) {
    if (figure.uncertainty().isEmpty() || !Double.isFinite(figure.value())) {
      return "";
    }
    Uncertainty u = figure.uncertainty().get();
    if (Double.isNaN(u.low()) || Double.isNaN(u.high())) {
      return NO_INTERVAL;
    }
    boolean below = Double.isInfinite(u.low());
    boolean above = Double.isInfinite(u.high());
    if (below && above) {
      return "not bounded by the records";
    }
    int place = endPlace(figure, below ? u.high() : u.low());
    if (above) {
      return end(u.low(), place) + " or more";
    }
    return below
        ? end(u.high(), place) + " or less"
        : end(u.low(), place) + " to " + end(u.high(), place);
  }

  /** Value and interval, "0.60 (0.45 to 0.75)"; the value alone where the figure is exact. */
  public static String valueAndInterval(Figure figure) {
    String interval = interval(figure);
    return interval.isEmpty() ? value(figure) : value(figure) + " (" + interval + ")";
  }

  /** The standard error, two significant digits; empty where the figure is exact. */
  public static String standardError(Figure figure) {
    if (figure.uncertainty().isEmpty()) {
      return "";
    }
    double u = figure.uncertainty().get().standardError();
    return Double.isFinite(u) && u > 0 ? atPlace(u, place(u)) : "no standard error";
  }

  /**
   * A number taken as it stands: at least six significant digits, never fewer than its whole part,
   * no trailing zeros.
   */
  public static String amount(double value) {
    if (Double.isNaN(value)) {
      return NOT_AVAILABLE;
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "without bound" : "without bound below";
    }
    int whole = wholeDigits(value);
    if (value == 0 || whole > LONGEST_WHOLE || whole <= -DEEPEST_PLACE) {
      return value == 0 ? "0" : powerOfTen(round(value, EXACT_DIGITS).stripTrailingZeros());
    }
    BigDecimal rounded =
        BigDecimal.valueOf(value)
            .setScale(Math.max(0, EXACT_DIGITS - whole), RoundingMode.HALF_EVEN);
    return plain(rounded.stripTrailingZeros());
  }

  /** A number to some significant digits, but never fewer than its whole part. */
  public static String significant(double value, int digits) {
    if (!Double.isFinite(value) || value == 0) {
      return amount(value);
    }
    return atPlace(value, Math.min(0, place(Math.abs(value), digits)));
  }

  /**
   * A mean, rounded to the place of three significant digits of the standard deviation beside it.
   */
  public static String besideSpread(double mean, double standardDeviation) {
    return Double.isFinite(mean) && standardDeviation > 0 && Double.isFinite(standardDeviation)
        ? atPlace(mean, Math.min(0, place(standardDeviation, 3)))
        : amount(mean);
  }

  /** Exact money: whole from a thousand on, else as {@link #amount}. */
  public static String whole(double value) {
    return Double.isFinite(value) && Math.abs(value) >= 1000 ? atPlace(value, 0) : amount(value);
  }

  /** A number of which only the size matters, such as a departure: two significant digits. */
  public static String small(double value) {
    if (value == 0 || !Double.isFinite(value)) {
      return amount(value);
    }
    return Math.abs(value) < 0.001
        ? scientific(value, UNCERTAINTY_DIGITS)
        : significant(value, UNCERTAINTY_DIGITS);
  }

  /**
   * An interval of a positive quantity, open where it begins at 0: "1.6 or more", "0.5 or less".
   */
  public static String positiveInterval(double low, double high) {
    double from = low <= 0 ? Double.NEGATIVE_INFINITY : low;
    return interval(Figure.estimated(1, Double.NaN, from, high, ""));
  }

  /** A number to a fixed number of decimals. */
  public static String fixed(double value, int decimals) {
    return Double.isFinite(value) ? atPlace(value, -decimals) : amount(value);
  }

  /**
   * A share such as R²: four decimals, and more where it would otherwise seem to be exactly 0 or 1.
   */
  public static String share(double value) {
    return Double.isFinite(value) ? end(value, -4) : amount(value);
  }

  /** A proportion as a percentage, to a tenth. */
  public static String percent(double proportion) {
    if (!Double.isFinite(proportion)) {
      return NOT_AVAILABLE;
    }
    return plain(
            BigDecimal.valueOf(proportion).movePointRight(2).setScale(1, RoundingMode.HALF_EVEN))
        + BOUND
        + "%";
  }

  /** A level such as 0.95 as "95 %". */
  public static String level(double level) {
    return plain(BigDecimal.valueOf(level).movePointRight(2).stripTrailingZeros()) + BOUND + "%";
  }

  /** A count. */
  public static String count(long count) {
    return plain(BigDecimal.valueOf(count));
  }

  /** A statistic: three significant digits, never fewer than its whole part. */
  public static String statistic(double value) {
    return significant(value, 3);
  }

  /** Degrees of freedom: whole where they are whole. */
  public static String degrees(double value) {
    return Double.isFinite(value) && value == Math.rint(value)
        ? count((long) value)
        : fixed(value, 1);
  }

  /** A p-value as a phrase, at the level of common practice, 5 %. */
  public static String p(double p) {
    return p(p, 0.05);
  }

  /**
   * A p-value as a phrase: "p = 0.184", "p &lt; 0.001". Three significant digits; more where
   * rounding would carry it over the level of significance or onto it, so that "p = 0.0500" never
   * stands beside a rejection at 5 %.
   */
  public static String p(double p, double level) {
    if (Double.isNaN(p)) {
      return "p " + NOT_AVAILABLE;
    }
    if (p < 0.001 && level >= 0.001) {
      return "p" + BOUND + "<" + BOUND + "0.001";
    }
    if (p > 0.999) {
      return "p" + BOUND + ">" + BOUND + "0.999";
    }
    if (p <= 0) {
      return "p" + BOUND + "=" + BOUND + "0";
    }
    BigDecimal exact = BigDecimal.valueOf(p);
    BigDecimal mark = BigDecimal.valueOf(level);
    int digits = 3;
    BigDecimal shown = round(p, digits);
    while (shown.compareTo(mark) != exact.compareTo(mark)) {
      digits++;
      shown = round(p, digits);
    }
    return "p" + BOUND + "=" + BOUND + plain(shown);
  }

  /** A number and its unit, kept on one line; the number alone where there is no unit. */
  public static String unit(String number, String unit) {
    return unit.isEmpty() ? number : number + BOUND + unit.replace(" ", BOUND);
  }

  /**
   * The decimal place, as a power of ten, of the last of two significant digits of an uncertainty.
   */
  static int place(double uncertainty) {
    return place(uncertainty, UNCERTAINTY_DIGITS);
  }

  /** A number rounded to a decimal place, given as a power of ten. */
  static String atPlace(double value, int place) {
    int whole = value == 0 ? 0 : wholeDigits(value);
    boolean small = whole <= -DEEPEST_PLACE && place < -DEEPEST_PLACE;
    if (small || whole > LONGEST_WHOLE) {
      return scientific(value, Math.max(1, whole - place));
    }
    return plain(BigDecimal.valueOf(value).setScale(-place, RoundingMode.HALF_EVEN));
  }

  private static int place(double size, int digits) {
    return -round(size, digits).scale();
  }

  private static BigDecimal round(double value, int digits) {
    return BigDecimal.valueOf(value)
        .round(new MathContext(digits, RoundingMode.HALF_EVEN))
        .setScale(scaleFor(value, digits), RoundingMode.HALF_EVEN);
  }

  /** The scale at which a number, once rounded, has so many significant digits. */
  private static int scaleFor(double value, int digits) {
    BigDecimal rounded =
        BigDecimal.valueOf(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
    return digits - (rounded.precision() - rounded.scale());
  }

  /** The uncertainty by which a figure is rounded; 0 where there is none. */
  private static double spread(Figure figure) {
    if (figure.uncertainty().isEmpty()) {
      return 0;
    }
    Uncertainty u = figure.uncertainty().get();
    if (Double.isFinite(u.standardError()) && u.standardError() > 0) {
      return u.standardError();
    }
    double quarter = (u.high() - u.low()) / 4;
    return Double.isFinite(quarter) && quarter > 0 ? quarter : 0;
  }

  private static int endPlace(Figure figure, double finiteEnd) {
    double u = spread(figure);
    if (u > 0) {
      return place(u);
    }
    return finiteEnd == 0 ? -2 : place(Math.abs(finiteEnd), 3);
  }

  /** An end of an interval: at a place, or deeper if it would else round to 0 or 1 falsely. */
  private static String end(double value, int place) {
    int deepest = Math.min(place, 0) - DEEPEST_PLACE;
    for (int at = place; at >= deepest; at--) {
      BigDecimal rounded = BigDecimal.valueOf(value).setScale(-at, RoundingMode.HALF_EVEN);
      boolean mark = rounded.signum() == 0 || rounded.compareTo(BigDecimal.ONE) == 0;
      if (!mark || rounded.doubleValue() == value) {
        return atPlace(value, at);
      }
    }
    boolean besideOne = Math.abs(value) > 0.5;
    return besideOne ? plain(BigDecimal.valueOf(value)) : scientific(value, UNCERTAINTY_DIGITS);
  }

  /** The number of digits before the decimal point; 0 or less for numbers below one. */
  private static int wholeDigits(double value) {
    BigDecimal exact = BigDecimal.valueOf(Math.abs(value));
    return exact.precision() - exact.scale();
  }

  private static String scientific(double value, int digits) {
    return powerOfTen(round(value, digits));
  }

  /** A number with all its digits, as a number between one and ten and a power of ten. */
  private static String powerOfTen(BigDecimal number) {
    int exponent = number.precision() - number.scale() - 1;
    StringBuilder text = new StringBuilder(plain(number.scaleByPowerOfTen(-exponent)));
    text.append(BOUND).append('×').append(BOUND).append("10");
    if (exponent < 0) {
      text.append('⁻');
    }
    for (char digit : Integer.toString(Math.abs(exponent)).toCharArray()) {
      text.append(SUPERSCRIPTS.charAt(digit - '0'));
    }
    return text.toString();
  }

  private static String plain(BigDecimal number) {
    String digits = number.abs().toPlainString();
    int point = digits.indexOf('.');
    int whole = point < 0 ? digits.length() : point;
    StringBuilder text = new StringBuilder();
    if (number.signum() < 0) {
      text.append('\u2212');
    }
    for (int i = 0; i < whole; i++) {
      if (i > 0 && (whole - i) % 3 == 0) {
        text.append(',');
      }
      text.append(digits.charAt(i));
    }
    return text.append(digits, whole, digits.length()).toString();
  }
}

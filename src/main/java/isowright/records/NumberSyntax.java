package isowright.records;

/**
 * Reads numbers written in one format, exactly.
 *
 * <p>A number is an optional sign, digits with at most one decimal mark, and an optional exponent.
 * Where a mark between groups is given, the whole part may be written in groups of three digits;
 * nothing else is a number: no unit, no percent sign, no words.
 *
 * <p>Exactness: up to 15 significant digits make a whole number m below 2⁵³ and a power of ten up
 * to 10²² is a double without rounding, so m·10^k or m/10^k is rounded once and is the double
 * nearest to what is written (Clinger 1990, <i>How to read floating point numbers accurately</i>,
 * section 3). Everything else is left to {@link Double#parseDouble}, which is exact and slower.
 */
final class NumberSyntax {

  /** No mark between groups. */
  private static final char NONE = '\0';

  private static final int MOST_EXACT_DIGITS = 15;
  private static final double[] POWERS_OF_TEN = {
    1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16,
    1e17, 1e18, 1e19, 1e20, 1e21, 1e22
  };

  private final char decimal;
  private final char group;

  NumberSyntax(NumberFormat format) {
    this.decimal = format.decimal();
    this.group = format.group().orElse(NONE);
  }

  /**
   * The number written in these characters.
   *
   * @return NaN where they are not a number in this format; infinite where the number is too large
   *     for a double
   */
  double parse(char[] text, int from, int length) {
    int at = from;
    int end = from + length;
    boolean negative = at < end && text[at] == '-';
    if (negative || (at < end && text[at] == '+')) {
      at++;
    }
    long digits = 0;
    int significant = 0;
    int seen = 0;
    int decimals = 0;
    boolean fraction = false;
    for (; at < end; at++) {
      int digit = text[at] - '0';
      if (digit >= 0 && digit <= 9) {
        if (significant > 0 || digit > 0) {
          significant++;
        }
        if (significant <= MOST_EXACT_DIGITS) {
          digits = digits * 10 + digit;
        }
        seen++;
        decimals += fraction ? 1 : 0;
      } else if (text[at] == decimal && !fraction) {
        fraction = true;
      } else {
        break;
      }
    }
    if (at < end || seen == 0) {
      return seen == 0 && !fraction ? Double.NaN : rare(text, from, length);
    }
    if (significant > MOST_EXACT_DIGITS || decimals >= POWERS_OF_TEN.length) {
      return rare(text, from, length);
    }
    double value = decimals == 0 ? digits : digits / POWERS_OF_TEN[decimals];
    return negative ? -value : value;
  }

  /** Groups, exponents and long numbers. */
  private double rare(char[] text, int from, int length) {
    StringBuilder plain = new StringBuilder(length);
    int at = from;
    int end = from + length;
    if (at < end && (text[at] == '-' || text[at] == '+')) {
      plain.append(text[at++]);
    }
    int wholeFrom = at;
    int digits = 0;
    while (at < end && (isDigit(text[at]) || isGroup(text, at, wholeFrom, end))) {
      if (isDigit(text[at])) {
        plain.append(text[at]);
        digits++;
      }
      at++;
    }
    if (hasGroup(text, wholeFrom, at) && !grouped(text, wholeFrom, at)) {
      return Double.NaN;
    }
    if (at < end && text[at] == decimal) {
      plain.append('.');
      for (at++; at < end && isDigit(text[at]); at++) {
        plain.append(text[at]);
        digits++;
      }
    }
    if (digits == 0) {
      return Double.NaN;
    }
    if (at < end && (text[at] == 'e' || text[at] == 'E')) {
      at = exponent(text, at, end, plain);
    }
    return at == end ? Double.parseDouble(plain.toString()) : Double.NaN;
  }

  /** Appends an exponent; the place after it, or the place of the e where it is none. */
  private static int exponent(char[] text, int from, int end, StringBuilder plain) {
    int at = from + 1;
    StringBuilder exponent = new StringBuilder("e");
    if (at < end && (text[at] == '-' || text[at] == '+')) {
      exponent.append(text[at++]);
    }
    int digitsFrom = at;
    while (at < end && isDigit(text[at])) {
      exponent.append(text[at++]);
    }
    if (at == digitsFrom) {
      return from;
    }
    plain.append(exponent);
    return at;
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private boolean isGroup(char[] text, int at, int from, int end) {
    return group != NONE && sameMark(text[at], group) && at > from && at + 1 < end;
  }

  private boolean hasGroup(char[] text, int from, int to) {
    for (int i = from; i < to; i++) {
      if (!isDigit(text[i])) {
        return true;
      }
    }
    return false;
  }

  /** One to three digits, then groups of exactly three. */
  private static boolean grouped(char[] text, int from, int to) {
    int run = 0;
    boolean first = true;
    for (int i = from; i < to; i++) {
      if (isDigit(text[i])) {
        run++;
      } else {
        if (first ? run < 1 || run > 3 : run != 3) {
          return false;
        }
        first = false;
        run = 0;
      }
    }
    return run == 3;
  }

  /** Every kind of space is the same mark: files mix the plain, the fixed and the narrow one. */
  static boolean sameMark(char found, char declared) {
    return found == declared || (isSpace(found) && isSpace(declared));
  }

  static boolean isSpace(char c) {
    return c == ' ' || c == '\u00a0' || c == '\u202f' || c == '\u2009';
  }
}

package isowright.records;

import java.util.Arrays;
import java.util.Optional;

/**
 * Which decimal mark do the numbers of a file have?
 *
 * <p>Each number is put in a {@link Shape}. A mark that cannot stand between groups of three digits
 * is a decimal mark for certain ({@code 12.5}, {@code 0,250}); of two different marks the last is
 * the decimal mark; a mark that stands twice groups digits. A single mark with one to three digits
 * before it and exactly three after it ({@code 1,234}) says nothing.
 */
final class NumberEvidence {

  /** What the way in which a number is written says about the marks. */
  enum Shape {
    /** Not digits and marks. */
    NO_NUMBER,
    /** Digits alone. */
    DIGITS,
    /** The point is the decimal mark. */
    DECIMAL_POINT,
    /** The comma is the decimal mark. */
    DECIMAL_COMMA,
    /** A point that may stand between groups. */
    POINT_OR_GROUP,
    /** A comma that may stand between groups. */
    COMMA_OR_GROUP,
    /** Groups of digits separated by a space or an apostrophe, no decimal mark. */
    OTHER_GROUPS
  }

  private long points;
  private long commas;
  private long groupedByPoint;
  private long groupedByComma;
  private final long[] eitherPoint;
  private final long[] eitherComma;
  private final long[] ungrouped;
  private char otherGroup;

  NumberEvidence(int slots) {
    eitherPoint = new long[slots];
    eitherComma = new long[slots];
    ungrouped = new long[slots];
  }

  /** Puts a number in its shape. */
  static Shape shape(char[] text, int from, int length) {
    int point = 0;
    int comma = 0;
    int other = 0;
    int digits = 0;
    int lastMark = -1;
    int firstMark = -1;
    int end = from + length;
    int start = from < end && (text[from] == '-' || text[from] == '+') ? from + 1 : from;
    boolean exponent = false;
    for (int i = start; i < end && !exponent; i++) {
      char c = text[i];
      if (c >= '0' && c <= '9') {
        digits++;
      } else if (c == '.' || c == ',') {
        point += c == '.' ? 1 : 0;
        comma += c == ',' ? 1 : 0;
        lastMark = i;
        firstMark = firstMark < 0 ? i : firstMark;
      } else if (isOtherGroup(c) && lastMark < 0) {
        other++;
      } else if ((c == 'e' || c == 'E') && digits > 0) {
        exponent = true;
      } else {
        return Shape.NO_NUMBER;
      }
    }
    if (digits == 0) {
      return Shape.NO_NUMBER;
    }
    if (lastMark < 0) {
      return other > 0 ? Shape.OTHER_GROUPS : Shape.DIGITS;
    }
    boolean lastIsPoint = text[lastMark] == '.';
    if (point > 0 && comma > 0) {
      return lastIsPoint ? Shape.DECIMAL_POINT : Shape.DECIMAL_COMMA;
    }
    if (point > 1 || comma > 1) {
      boolean groups = inGroups(text, start, end);
      return !groups ? Shape.NO_NUMBER : point > 1 ? Shape.DECIMAL_COMMA : Shape.DECIMAL_POINT;
    }
    boolean mayGroup =
        other == 0
            && !exponent
            && end - lastMark == 4
            && firstMark - start >= 1
            && firstMark - start <= 3
            && text[start] != '0';
    if (mayGroup) {
      return lastIsPoint ? Shape.POINT_OR_GROUP : Shape.COMMA_OR_GROUP;
    }
    return lastIsPoint ? Shape.DECIMAL_POINT : Shape.DECIMAL_COMMA;
  }

  /** Whether every mark is followed by exactly three digits; a date such as 1.5.2024 is not. */
  private static boolean inGroups(char[] text, int start, int end) {
    int run = 0;
    boolean first = true;
    for (int i = start; i < end; i++) {
      if (text[i] >= '0' && text[i] <= '9') {
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

  private static boolean isOtherGroup(char c) {
    return NumberSyntax.isSpace(c) || c == '\'' || c == '’';
  }

  /** Takes one number of a slot into account. */
  void weigh(int slot, char[] text, int from, int length) {
    Shape shape = shape(text, from, length);
    switch (shape) {
      case DECIMAL_POINT -> {
        points++;
        groupedByComma += contains(text, from, length, ',') ? 1 : 0;
      }
      case DECIMAL_COMMA -> {
        commas++;
        groupedByPoint += contains(text, from, length, '.') ? 1 : 0;
      }
      case POINT_OR_GROUP -> eitherPoint[slot]++;
      case COMMA_OR_GROUP -> eitherComma[slot]++;
      case DIGITS, OTHER_GROUPS, NO_NUMBER -> {}
    }
    if (shape != Shape.NO_NUMBER) {
      ungrouped[slot] += wholeDigits(text, from, length) > 3 ? 1 : 0;
      noteOtherGroup(text, from, length);
    }
  }

  private static int wholeDigits(char[] text, int from, int length) {
    int at = from;
    int digits = 0;
    while (at < from + length && (text[at] == '-' || text[at] == '+')) {
      at++;
    }
    while (at < from + length && text[at] >= '0' && text[at] <= '9') {
      at++;
      digits++;
    }
    return digits;
  }

  private void noteOtherGroup(char[] text, int from, int length) {
    for (int i = from; i < from + length; i++) {
      if (isOtherGroup(text[i])) {
        otherGroup = NumberSyntax.isSpace(text[i]) ? ' ' : text[i];
      }
    }
  }

  private static boolean contains(char[] text, int from, int length, char mark) {
    for (int i = from; i < from + length; i++) {
      if (text[i] == mark) {
        return true;
      }
    }
    return false;
  }

  /**
   * The format that the numbers have; where both marks were met as decimal marks, the one met more
   * often, so that the others are reported as errors.
   *
   * @return absent where no number says which mark is the decimal mark
   */
  Optional<NumberFormat> format() {
    long either = sum(eitherPoint) + sum(eitherComma);
    if (points == 0 && commas == 0) {
      return either > 0 ? Optional.empty() : Optional.of(new NumberFormat('.', other()));
    }
    boolean point = points >= commas;
    long certainGroups = point ? groupedByComma : groupedByPoint;
    boolean groups =
        certainGroups > 0
            || (Math.min(points, commas) == 0
                && groupsThroughout(point ? eitherComma : eitherPoint));
    Optional<Character> group = groups ? Optional.of(point ? ',' : '.') : other();
    return Optional.of(new NumberFormat(point ? '.' : ',', group));
  }

  /**
   * Whether a lone mark may be taken to group digits: not in a column that writes most of its long
   * numbers without it, where it is rather a decimal mark mistyped.
   */
  private boolean groupsThroughout(long[] either) {
    boolean any = false;
    for (int slot = 0; slot < either.length; slot++) {
      if (either[slot] > 0 && ungrouped[slot] >= either[slot]) {
        return false;
      }
      any |= either[slot] > 0;
    }
    return any;
  }

  /** The mark of which nothing says what it is. */
  char ambiguousMark() {
    return sum(eitherComma) > 0 ? ',' : '.';
  }

  private static long sum(long[] counts) {
    return Arrays.stream(counts).sum();
  }

  private Optional<Character> other() {
    return otherGroup == '\0' ? Optional.empty() : Optional.of(otherGroup);
  }
}

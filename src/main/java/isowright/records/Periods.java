package isowright.records;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.Locale;

/**
 * Periods as they may be written: an integer, a month {@code yyyy-MM} or a day {@code yyyy-MM-dd}
 * (ISO 8601). A year of ISO 8601 is an integer.
 *
 * <p>A period is held as one whole number, its key: four times the integer, {@code yyyyMM} or
 * {@code yyyyMMdd}, plus its {@link #kind}. Within a kind, keys ascend with time.
 */
final class Periods {

  /** Not a period. */
  static final long NONE = Long.MIN_VALUE;

  static final int INTEGER = 0;
  static final int MONTH = 1;
  static final int DAY = 2;

  /** Longer integers are no periods, and would not be held exactly beside fractions of years. */
  private static final int MOST_DIGITS = 9;

  private Periods() {}

  /** The key of the period written in these characters, or {@link #NONE}. */
  static long parse(char[] text, int from, int length) {
    boolean negative = length > 1 && text[from] == '-';
    int start = negative ? from + 1 : from;
    int digits = digitsAt(text, start, from + length);
    if (start + digits == from + length) {
      if (digits == 0 || digits > MOST_DIGITS) {
        return NONE;
      }
      long value = number(text, start, digits);
      return 4 * (negative ? -value : value) + INTEGER;
    }
    boolean month = length == 7 && !negative && digits == 4 && text[from + 4] == '-';
    boolean day = length == 10 && !negative && digits == 4 && text[from + 4] == '-';
    if ((!month && !day) || digitsAt(text, from + 5, from + 7) != 2) {
      return NONE;
    }
    int y = (int) number(text, from, 4);
    int m = (int) number(text, from + 5, 2);
    if (month) {
      return m >= 1 && m <= 12 ? 4L * (100 * y + m) + MONTH : NONE;
    }
    if (text[from + 7] != '-' || digitsAt(text, from + 8, from + 10) != 2) {
      return NONE;
    }
    return day(y, m, (int) number(text, from + 8, 2));
  }

  static long parse(String text) {
    return parse(text.toCharArray(), 0, text.length());
  }

  /** The key of a day, or {@link #NONE} where the calendar has no such day. */
  static long day(int year, int month, int day) {
    try {
      LocalDate.of(year, month, day);
    } catch (DateTimeException e) {
      return NONE;
    }
    return 4L * (10_000L * year + 100L * month + day) + DAY;
  }

  private static int digitsAt(char[] text, int from, int to) {
    int at = from;
    while (at < to && text[at] >= '0' && text[at] <= '9') {
      at++;
    }
    return at - from;
  }

  private static long number(char[] text, int from, int digits) {
    long value = 0;
    for (int i = from; i < from + digits; i++) {
      value = 10 * value + (text[i] - '0');
    }
    return value;
  }

  /** Integer, month or day. */
  static int kind(long key) {
    return (int) (key & 3);
  }

  /** What a kind is called. */
  static String kindWords(int kind) {
    return switch (kind) {
      case INTEGER -> "integers";
      case MONTH -> "months";
      default -> "days";
    };
  }

  /** The period as it is written. */
  static String text(long key) {
    long value = key >> 2;
    return switch (kind(key)) {
      case INTEGER -> Long.toString(value);
      case MONTH -> String.format(Locale.ROOT, "%04d-%02d", value / 100, value % 100);
      default ->
          String.format(
              Locale.ROOT, "%04d-%02d-%02d", value / 10_000, value / 100 % 100, value % 100);
    };
  }

  /** The period on a common scale: integers as they are, dates as years and fractions of years. */
  static double number(long key) {
    long value = key >> 2;
    return switch (kind(key)) {
      case INTEGER -> value;
      case MONTH -> value / 100 + (value % 100 - 1) / 12.0;
      default -> {
        LocalDate date =
            LocalDate.of((int) (value / 10_000), (int) (value / 100 % 100), (int) (value % 100));
        yield date.getYear() + (date.getDayOfYear() - 1.0) / date.lengthOfYear();
      }
    };
  }

  /** Whether a period lies within the span from one period to another, both included. */
  static boolean within(long key, long first, long last) {
    return firstDay(key) >= firstDay(first) && lastDay(key) <= lastDay(last);
  }

  /** The first day as yyyyMMdd, an integer taken as a year. */
  static long firstDay(long key) {
    long value = key >> 2;
    return switch (kind(key)) {
      case INTEGER -> value * 10_000 + 101;
      case MONTH -> value * 100 + 1;
      default -> value;
    };
  }

  private static long lastDay(long key) {
    long value = key >> 2;
    return switch (kind(key)) {
      case INTEGER -> value * 10_000 + 1231;
      case MONTH -> value * 100 + 31;
      default -> value;
    };
  }
}

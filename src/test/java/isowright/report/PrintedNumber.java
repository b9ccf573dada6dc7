package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads numbers back as they were printed, so that tests can hold print against double. */
final class PrintedNumber {

  private static final Pattern NUMBER =
      Pattern.compile("\u2212?\\d[\\d,]*(?:\\.\\d+)?(?:\u00a0×\u00a010⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)?");
  private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

  private PrintedNumber() {}

  /** The numbers in a text, in order. */
  static List<BigDecimal> allIn(String text) {
    Matcher matcher = NUMBER.matcher(text);
    return matcher.results().map(m -> of(m.group())).toList();
  }

  /** A text that is one number. */
  static BigDecimal of(String text) {
    assertThat(text).matches(NUMBER);
    String plain = text.replace(",", "").replace('\u2212', '-');
    int power = plain.indexOf("\u00a0×");
    if (power < 0) {
      return new BigDecimal(plain);
    }
    String exponent = plain.substring(plain.indexOf("10", power) + 2);
    int size = 0;
    for (char digit : exponent.replace("⁻", "").toCharArray()) {
      size = 10 * size + SUPERSCRIPTS.indexOf(digit);
    }
    return new BigDecimal(plain.substring(0, power))
        .scaleByPowerOfTen(exponent.startsWith("⁻") ? -size : size);
  }
}

package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Numbers are read exactly, or not at all. */
class NumberSyntaxTest {

  private static final NumberSyntax POINT =
      new NumberSyntax(new NumberFormat('.', Optional.empty()));
  private static final NumberSyntax GROUPED =
      new NumberSyntax(new NumberFormat('.', Optional.of(',')));

  private static double parse(NumberSyntax syntax, String text) {
    return syntax.parse(("x" + text + "y").toCharArray(), 1, text.length());
  }

  @Test
  void agreesWithTheJdkToTheLastBit() {
    Random random = new Random(17);
    for (int i = 0; i < 20_000; i++) {
      String text =
          switch (i % 5) {
            case 0 -> Double.toString(Double.longBitsToDouble(random.nextLong()));
            case 1 -> Long.toString(random.nextLong());
            case 2 -> random.nextInt(1_000_000_000) + "." + random.nextInt(1_000_000);
            case 3 -> String.format(Locale.ROOT, "%.9e", random.nextGaussian());
            default -> "0." + "0".repeat(random.nextInt(30)) + random.nextInt(100_000);
          };
      double expected = Double.parseDouble(text);
      if (Double.isFinite(expected)) {
        assertThat(parse(POINT, text)).as(text).isEqualTo(expected);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "-",
        "+",
        ".",
        "-.",
        "e5",
        "1e",
        "1e+",
        "1.2.3",
        "1..2",
        "1-2",
        "--1",
        "+-1",
        "1d",
        "1f",
        "0x10",
        "1_000",
        "1,000",
        "NaN",
        "Infinity",
        "1 ",
        " 1",
        "١٢",
        "1.5e3.2",
        "1e5,0"
      })
  void whatIsNoNumberIsNotRead(String text) {
    assertThat(parse(POINT, text)).isNaN();
  }

  @ParameterizedTest
  @CsvSource({
    "5., 5",
    ".5, 0.5",
    "-.5, -0.5",
    "+7, 7",
    "007, 7",
    "1e3, 1000",
    "1.5E-2, 0.015",
    "-0, -0.0",
    "123456789012345678901234567890, 123456789012345678901234567890",
    "0.000000000000000000000000000001, 1e-30"
  })
  void theFormsOfANumber(String text, double value) {
    assertThat(parse(POINT, text)).isEqualTo(value);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {"1,234|1234", "12,345,678.5|12345678.5", "1234|1234", "-1,000|-1000", "1,000e2|1e5"})
  void groupsOfThree(String text, double value) {
    assertThat(parse(GROUPED, text)).isEqualTo(value);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"1,23", "1,2345", "12,34,567", "1234,567", ",123", "1,", "1,,234", "1.234,567"})
  void groupsOfAnythingElseAreNoNumber(String text) {
    assertThat(parse(GROUPED, text)).isNaN();
  }

  @Test
  void aNumberTooLargeIsInfiniteAndOneTooSmallIsZero() {
    assertThat(parse(POINT, "1e400")).isInfinite();
    assertThat(parse(POINT, "1e-400")).isZero();
  }
}

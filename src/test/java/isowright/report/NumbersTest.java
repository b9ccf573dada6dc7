package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Figure;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Numbers are rounded by their uncertainty, after the <i>Guide to the Expression of Uncertainty in
 * Measurement</i>, JCGM 100:2008, 7.2.6, and no rounding tells an untruth.
 */
class NumbersTest {

  private static final int DRAWS = 20_000;
  private static final double[] REFERENCES = {0, 1};

  private static Figure figure(double value, double error) {
    return Figure.estimated(value, error, value - 2 * error, value + 2 * error, "delta");
  }

  /** Magnitudes of 1e-12 to 1e12, errors from a millionth of the value to a thousand times it. */
  private static Figure drawn(Random random) {
    double size = Math.pow(10, 24 * random.nextDouble() - 12);
    double error = size * Math.pow(10, 9 * random.nextDouble() - 6);
    return figure(random.nextBoolean() ? size : -size, error);
  }

  /** The guide's example: 10.047 62 Ω with u = 27 mΩ is to be rounded to 10.048 Ω. */
  @Test
  void theExampleOfTheGuide() {
    assertThat(Numbers.value(figure(10.04762, 0.027))).isEqualTo("10.048");
    assertThat(Numbers.standardError(figure(10.04762, 0.027))).isEqualTo("0.027");
  }

  @ParameterizedTest
  @CsvSource({
    "9353017.2, 91700, '9,353,000', '92,000'",
    "0.68744, 0.0567, 0.687, 0.057",
    "0.68744, 0.567, 0.69, 0.57",
    "0.68744, 5.67, 0.7, 5.7",
    "0.68744, 56.7, 1, 57",
    "-0.0262, 0.029, \u22120.026, 0.029",
    "1.5, 0.0996, 1.50, 0.10",
    "123456.7, 0.099, '123,456.700', 0.099",
    "2e-9, 3.21e-11, '2.000\u00a0×\u00a010⁻⁹', '3.2\u00a0×\u00a010⁻¹¹'"
  })
  void twoDigitsOfTheErrorAndTheValueToTheSamePlace(
      double value, double error, String printed, String printedError) {
    assertThat(Numbers.value(figure(value, error))).isEqualTo(printed);
    assertThat(Numbers.standardError(figure(value, error))).isEqualTo(printedError);
  }

  @Test
  void theErrorHasTwoSignificantDigitsAndTheValueItsPlace() {
    Random random = new Random(20_261_201);
    for (int i = 0; i < DRAWS; i++) {
      Figure figure = drawn(random);
      double error = figure.uncertainty().orElseThrow().standardError();
      BigDecimal rounded =
          BigDecimal.valueOf(error).round(new MathContext(2, RoundingMode.HALF_EVEN));
      assertThat(PrintedNumber.of(Numbers.standardError(figure))).isEqualByComparingTo(rounded);
      BigDecimal unit = BigDecimal.ONE.scaleByPowerOfTen(rounded.precision() - rounded.scale() - 2);
      BigDecimal off =
          PrintedNumber.of(Numbers.value(figure))
              .subtract(BigDecimal.valueOf(figure.value()))
              .abs();
      assertThat(off).as(figure.toString()).isLessThanOrEqualTo(unit.divide(BigDecimal.valueOf(2)));
    }
  }

  /** An interval that leaves out 0 or 1 leaves it out in print, and one that holds it holds it. */
  @Test
  void anIntervalLiesInPrintWhereItLies() {
    Random random = new Random(7);
    for (int i = 0; i < DRAWS; i++) {
      double near = REFERENCES[random.nextInt(2)];
      double error = Math.pow(10, 12 * random.nextDouble() - 10);
      double aside = error * Math.pow(10, 4 * random.nextDouble() - 6);
      double low = random.nextBoolean() ? near + aside : near - aside;
      Figure figure = Figure.estimated(low + 2 * error, error, low, low + 4 * error, "delta");
      BigDecimal printed = PrintedNumber.allIn(Numbers.interval(figure)).get(0);
      for (double reference : REFERENCES) {
        assertThat(printed.compareTo(BigDecimal.valueOf(reference)))
            .as(figure + " as " + Numbers.interval(figure) + " against " + reference)
            .isEqualTo(Double.compare(low, reference));
      }
    }
  }

  @Test
  void openAndMissingIntervalsAreWords() {
    double infinity = Double.POSITIVE_INFINITY;
    assertThat(Numbers.interval(Figure.exact(3))).isEmpty();
    assertThat(Numbers.interval(interval(0.5, infinity))).isEqualTo("0.50 or more");
    assertThat(Numbers.interval(interval(-infinity, 0.5))).isEqualTo("0.50 or less");
    assertThat(Numbers.interval(interval(-infinity, infinity)))
        .isEqualTo("not bounded by the records");
    assertThat(Numbers.interval(interval(Double.NaN, 1))).isEqualTo("no interval");
    assertThat(Numbers.value(Figure.exact(Double.NaN))).isEqualTo("not available");
    assertThat(Numbers.value(Figure.estimated(1.23456, Double.NaN, Double.NaN, Double.NaN, "")))
        .isEqualTo("1.23456");
  }

  private static Figure interval(double low, double high) {
    return Figure.estimated(1, 0.1, low, high, "profile");
  }

  /** No size of a number is printed as NaN, as Infinity, with an E, or with a plain hyphen. */
  @ParameterizedTest
  @ValueSource(
      doubles = {0, -0.0, 1e-300, -1e-12, 1e-7, 0.1, 1, 999999.5, 1e12, -1e15, 1e17, 1e300})
  void everySizeIsPrintedForPeople(double value) {
    for (String printed :
        new String[] {
          Numbers.amount(value),
          Numbers.significant(value, 3),
          Numbers.whole(value),
          Numbers.small(value),
          Numbers.share(value),
          Numbers.statistic(value),
          Numbers.value(figure(value, Math.abs(value) / 100))
        }) {
      assertThat(printed).matches("\u2212?[\\d,.]+(\u00a0×\u00a010⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)?");
    }
  }

  @Test
  void aShareThatIsNotOneIsNotPrintedAsOne() {
    assertThat(Numbers.share(0.99999)).isEqualTo("0.99999");
    assertThat(Numbers.share(1)).isEqualTo("1.0000");
    assertThat(Numbers.share(0.00001)).isEqualTo("0.00001");
  }

  @ParameterizedTest
  @CsvSource({
    "0.0499999, 0.05, p = 0.0499999",
    "0.05, 0.05, p = 0.0500",
    "0.0500001, 0.05, p = 0.0500001",
    "0.02499, 0.025, p = 0.02499",
    "0.184, 0.05, p = 0.184",
    "0.00099, 0.05, p < 0.001",
    "0.00049, 0.0005, p = 0.000490",
    "0.9999, 0.05, p > 0.999",
    "0, 0.05, p < 0.001",
    "1, 0.05, p > 0.999",
    "NaN, 0.05, p not available"
  })
  void pIsPrintedOnItsSideOfTheLevel(double p, double level, String printed) {
    assertThat(Numbers.p(p, level).replace('\u00a0', ' ')).isEqualTo(printed);
  }
}

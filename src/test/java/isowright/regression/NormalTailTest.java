package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The tail functions keep their digits where the normal law is zero in double precision. */
class NormalTailTest {

  /**
   * ln Φ(q) from R 4.2.2, {@code sprintf("%.17g", pnorm(q, log.p = TRUE))}; its own error is a few
   * units in the last place.
   */
  @ParameterizedTest
  @CsvSource({
    "2, -0.023012909328963492",
    "0, -0.69314718055994529",
    "-5, -15.064998393988727",
    "-2.9999, -6.6073979162920544",
    "-3.0001, -6.6080545360230527",
    "-20, -203.91715537109727",
    "-40, -804.6084420137538",
    "-1000, -500007.82669481216"
  })
  void logProbability(double q, double expected) {
    assertThat(NormalTail.logProbability(q))
        .isCloseTo(expected, within(2e-14 * Math.max(1, Math.abs(expected))));
  }

  @Test
  void derivativesAreThoseOfTheFunction() {
    for (double q : new double[] {4, 1, 0, -2.9, -3.1, -6, -15, -60}) {
      double h = 1e-4;
      double first =
          (8 * (NormalTail.logScaled(q + h) - NormalTail.logScaled(q - h))
                  - (NormalTail.logScaled(q + 2 * h) - NormalTail.logScaled(q - 2 * h)))
              / (12 * h);
      double second =
          (8 * (NormalTail.excess(q + h) - NormalTail.excess(q - h))
                  - (NormalTail.excess(q + 2 * h) - NormalTail.excess(q - 2 * h)))
              / (12 * h);
      // Differences of values of size up to ten carry some 1e-15 / 1e-4 of rounding.
      assertThat(NormalTail.excess(q)).isCloseTo(first, within(1e-10));
      assertThat(NormalTail.curvature(q)).isCloseTo(second, within(1e-10));
      assertThat(NormalTail.excess(q)).isPositive();
    }
  }

  @Test
  void noSeamWhereTheContinuedFractionBegins() {
    double above = NormalTail.excess(-3);
    double below = NormalTail.excess(Math.nextDown(-3.0));
    assertThat(below).isCloseTo(above, within(1e-13 * above));
    assertThat(NormalTail.logScaled(Math.nextDown(-3.0)))
        .isCloseTo(NormalTail.logScaled(-3), within(1e-14));
  }

  /** What is exceeded with a probability is exceeded with that probability. */
  @Test
  void exceededInvertsTheTail() {
    for (double mean : new double[] {1, 0, -0.5, -3, -30, -400}) {
      for (double probability : new double[] {0.975, 0.5, 0.025}) {
        double deviation = 0.7;
        double x = NormalTail.exceeded(probability, mean, deviation);
        double tail =
            NormalTail.logProbability((mean - x) / deviation)
                - NormalTail.logProbability(mean / deviation);
        assertThat(x).isPositive();
        // Logs of size q² / 2 lose what their size takes from sixteen digits.
        double size = Math.max(1, mean * mean / (deviation * deviation));
        assertThat(tail).isCloseTo(Math.log(probability), within(1e-13 * size));
      }
    }
  }
}

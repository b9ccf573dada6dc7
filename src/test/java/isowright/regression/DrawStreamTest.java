package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.HashSet;
import java.util.Set;
import java.util.SplittableRandom;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.junit.jupiter.api.Test;

class DrawStreamTest {

  /** The library's generator of that name starts from the seed and steps by the same constant. */
  @Test
  void isTheGeneratorOfTheLibrary() {
    SplittableRandom random = new SplittableRandom(1234567);
    DrawStream stream = DrawStream.from(1234567);
    for (int i = 0; i < 1000; i++) {
      assertThat(stream.next()).isEqualTo(random.nextLong());
    }
  }

  @Test
  void seedsDrawsAndPurposesShareNothing() {
    Set<Long> seen = new HashSet<>();
    for (long seed = 0; seed < 20; seed++) {
      for (long draw = 0; draw < 20; draw++) {
        for (long purpose = 0; purpose < 5; purpose++) {
          DrawStream stream = new DrawStream(seed, draw, purpose);
          for (int i = 0; i < 10; i++) {
            seen.add(stream.next());
          }
        }
      }
    }
    assertThat(seen).hasSize(20 * 20 * 5 * 10);
  }

  /** Chi-squared over 100,000 numbers in 7 cells, and over the counts of many samples. */
  @Test
  void numbersAreUniform() {
    DrawStream stream = new DrawStream(3, 1, 4);
    int[] below = new int[7];
    int[] uniform = new int[7];
    for (int i = 0; i < 100_000; i++) {
      below[stream.below(7)]++;
      uniform[(int) (7 * stream.uniform())]++;
    }
    int[] counts = new int[7];
    byte[] sample = new byte[7];
    for (int i = 0; i < 100_000; i++) {
      stream.multinomial(sample);
      int sum = 0;
      for (int g = 0; g < 7; g++) {
        sum += sample[g];
      }
      assertThat(sum).isEqualTo(7);
      counts[sample[0]]++;
    }
    assertUniform(below);
    assertUniform(uniform);
    double statistic = 0;
    double chance = Math.pow(6 / 7.0, 7);
    for (int n = 0; n < 4; n++) {
      double expected = 100_000 * chance;
      statistic += Math.pow(counts[n] - expected, 2) / expected;
      chance *= (7 - n) / (n + 1.0) / 6;
    }
    // Four of eight cells of the binomial law; each square is below its chi-squared share.
    assertThat(statistic).isLessThan(ChiSquaredDistribution.of(4).inverseSurvivalProbability(.001));
  }

  private static void assertUniform(int[] cells) {
    double expected = 100_000.0 / cells.length;
    double statistic = 0;
    for (int cell : cells) {
      statistic += Math.pow(cell - expected, 2) / expected;
    }
    assertThat(statistic)
        .isLessThan(ChiSquaredDistribution.of(cells.length - 1).inverseSurvivalProbability(.001));
  }
}

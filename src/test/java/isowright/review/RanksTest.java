package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Ranks against those of a plain sort. */
class RanksTest {

  /** The rank is one more than how many values are less. */
  private static int[] counted(double[] values) {
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    return Arrays.stream(values)
        .mapToInt(v -> 1 + (int) Arrays.stream(sorted).takeWhile(s -> s < v).count())
        .toArray();
  }

  @Test
  void areThoseOfASort() {
    SplittableRandom random = new SplittableRandom(3);
    for (int n : new int[] {1, 2, 3, 14, 200, 777}) {
      Ranks ranks = new Ranks(n);
      for (int trial = 0; trial < 20; trial++) {
        double spread = Math.pow(10, random.nextInt(-12, 12));
        double[] values = new double[n];
        for (int i = 0; i < n; i++) {
          // every fifth value is one of a few, so that some are equal; one is far from all others
          values[i] = i % 5 == 0 ? random.nextInt(3) * spread : 1 + random.nextGaussian() * spread;
        }
        values[n - 1] = trial % 2 == 0 ? 1e9 * spread : values[n - 1];
        assertThat(ranks.of(values)).isEqualTo(counted(values));
      }
    }
  }

  @Test
  void allEqualShareTheFirst() {
    assertThat(new Ranks(4).of(new double[] {2, 2, 2, 2})).containsExactly(1, 1, 1, 1);
  }

  /** The middle 80 % of ten draws leaves out one at either end. */
  @Test
  void bandsLeaveOutTheEnds() {
    int[][] draws = new int[10][];
    for (int r = 0; r < 10; r++) {
      draws[r] = r == 0 ? new int[] {2, 1} : new int[] {1, 2};
    }
    RankBands bands = RankBands.of(draws, .8);
    assertThat(bands.band(0)).isEqualTo(new RankBands.Band(1, 1));
    assertThat(RankBands.of(draws, .95).band(0)).isEqualTo(new RankBands.Band(1, 2));
    assertThat(bands.probabilities(0)).containsExactly(.9, .1);
  }
}

package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.inference.Resampled.Interval;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

class BootstrapIntervalsTest {

  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  /** Against package boot of R ({@code reference/bootstrap-intervals.R}), fourteen digits. */
  @Test
  void agreesWithTheReference() throws IOException {
    List<double[]> rows =
        Files.readAllLines(Path.of("src/test/resources/reference/bootstrap-intervals.csv")).stream()
            .skip(2)
            .map(l -> Arrays.stream(l.split(",")).mapToDouble(Double::parseDouble).toArray())
            .toList();
    assertThat(rows).hasSize(4);
    for (double[] row : rows) {
      boolean first = row[0] == 1;
      BootstrapIntervals intervals =
          new BootstrapIntervals(values(first ? 199 : 998), first ? 1.25 : 0.9, row[1]);
      assertClose(intervals.percentile(), row[2], row[3]);
      assertClose(intervals.corrected(), row[4], row[5]);
      assertClose(
          intervals.accelerated(BootstrapIntervals.acceleration(without())), row[6], row[7]);
    }
  }

  private static void assertClose(Interval interval, double low, double high) {
    // Quantiles of the normal law agree to some 1e-12; a rank is a hundred times as steep.
    assertThat(interval.low()).isCloseTo(low, within(1e-10));
    assertThat(interval.high()).isCloseTo(high, within(1e-10));
  }

  private static double[] values(int n) {
    double[] values = new double[n];
    for (int i = 1; i <= n; i++) {
      double order = (i * 97 % n + 0.5) / n;
      values[i - 1] =
          Math.exp(NORMAL.inverseCumulativeProbability(order) * 0.4 + 0.05 * Math.sin(i));
    }
    return values;
  }

  /** Values without each of 25 groups: the more a group adds, the less is left without it. */
  private static double[] without() {
    double[] without = new double[25];
    for (int i = 1; i <= 25; i++) {
      double z = NORMAL.inverseCumulativeProbability((i - 0.3) / 25.7);
      without[i - 1] = 7 - (z * z * z + 0.4 * Math.cos(i) + 0.2 * Math.pow(i / 10.0, 2)) / 24;
    }
    return without;
  }

  /** 999 values: the ends of the 95 % interval are the 25th and the 975th. */
  @Test
  void percentilesAreValuesWhereRanksAreWhole() {
    double[] values = new double[999];
    Arrays.setAll(values, i -> (i * 7) % 999);
    Interval interval = new BootstrapIntervals(values, 400, .95).percentile();
    assertThat(interval).isEqualTo(new Interval(24, 974));
  }

  @Test
  void withoutBiasAndSkewnessAllThreeAgree() {
    double[] values = new double[999];
    Arrays.setAll(values, i -> i);
    BootstrapIntervals intervals = new BootstrapIntervals(values, 499, .95);
    assertThat(intervals.corrected()).isEqualTo(intervals.percentile());
    assertThat(BootstrapIntervals.acceleration(new double[] {1, 2, 3})).isZero();
  }

  @Test
  void whereAllValuesLieOnOneSideThereIsNoCorrection() {
    BootstrapIntervals intervals = new BootstrapIntervals(new double[] {1, 2, 3, 4}, 9, .9);
    assertThat(intervals.corrected()).isEqualTo(Interval.NONE);
    assertThat(intervals.percentile()).isEqualTo(new Interval(1, 4));
    assertThat(intervals.accelerated(Double.NaN)).isEqualTo(Interval.NONE);
    assertThat(BootstrapIntervals.acceleration(new double[] {1, Double.NaN, 3})).isNaN();
  }
}

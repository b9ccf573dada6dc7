package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Translog;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Isoquants and contractions: every point yields the target, and what does not exist is left out.
 */
class IsoquantTest {

  private static final List<String> LK = List.of("labour", "capital");
  private static final double[] ONES = {1, 1};
  private static final double[] HALVES = {.5, .5};

  /** Roots are pinned to rounding in logs of the size of 10. */
  private static final double ROUNDING = 1e-12;

  @Test
  void everyPointYieldsTheTargetAndSlopesDown() {
    RandomTechnologies random = new RandomTechnologies(41);
    int points = 0;
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      double target = planted.question().target();
      List<double[]> pairs =
          Isoquant.around(planted.technology(), target, 0, 1, planted.mix(), 3, 21);
      double last = Double.POSITIVE_INFINITY;
      for (double[] pair : pairs) {
        double[] mix = planted.mix().clone();
        mix[0] = pair[0];
        mix[1] = pair[1];
        double output = planted.technology().output(mix);
        assertThat(output).isCloseTo(target, within(1e-11 * target));
        // Beyond the bend of a near-Leontief isoquant nothing changes within rounding.
        assertThat(pair[1]).as("%d: %s", k, planted).isLessThan(last * (1 + ROUNDING));
        last = pair[1];
        points++;
      }
      assertThat(pairs)
          .anySatisfy(
              pair ->
                  assertThat(pair[1]).isCloseTo(planted.mix()[1], within(1e-9 * planted.mix()[1])));
    }
    assertThat(points).isGreaterThan(600 * 12);
  }

  @Test
  void hyperbola() {
    CobbDouglas technology = CobbDouglas.of(LK, 0, .5, .5);
    double[] labour = {1, 4, 1e-9, 1e12};
    List<double[]> pairs = Isoquant.of(technology, 10, 0, 1, new double[] {10, 10}, labour);
    for (int k = 0; k < labour.length; k++) {
      double capital = 100 / labour[k];
      assertThat(pairs.get(k)[1]).isCloseTo(capital, within(ROUNDING * 10 * capital));
    }
  }

  @Test
  void asymptoteOfPoorSubstitution() {
    Ces technology = Ces.of(LK, ONES, 0, HALVES, 1, 1);
    double[] labour = {4.9, 5, 5.001, 10, 1e6};
    List<double[]> pairs = Isoquant.of(technology, 10, 0, 1, new double[] {10, 10}, labour);
    // 2/(1/L + 1/K) = 10: K = 1/(1/5 − 1/L), which exists above L = 5.
    assertThat(pairs).hasSize(3);
    assertThat(pairs.get(0)[1]).isCloseTo(1 / (.2 - 1 / 5.001), within(1e-6 * 25_005));
    assertThat(pairs.get(1)[1]).isCloseTo(10, within(10 * ROUNDING));
  }

  @Test
  void cornerOfFixedProportions() {
    Ces technology = Ces.of(LK, ONES, 0, HALVES, Double.POSITIVE_INFINITY, 1);
    double[] labour = {9, 10.5, 20};
    List<double[]> pairs = Isoquant.of(technology, 10, 0, 1, new double[] {40, 40}, labour);
    assertThat(pairs).hasSize(2);
    assertThat(pairs).allSatisfy(pair -> assertThat(pair[1]).isCloseTo(10, within(1e-11)));
  }

  @Test
  void straightLine() {
    Ces technology = Ces.of(LK, ONES, Math.log(2), HALVES, -1, 1);
    double[] labour = {1, 5, 9.5, 11};
    List<double[]> pairs = Isoquant.of(technology, 10, 0, 1, new double[] {5, 5}, labour);
    assertThat(pairs).hasSize(3);
    assertThat(pairs.get(2)[1]).isCloseTo(.5, within(1e-11));
  }

  /** ln Q = ln L + ln K − ½ ln²L: beyond L = e more labour yields less, and is left out. */
  @Test
  void uneconomicPartIsLeftOut() {
    Translog technology = new Translog(LK, ONES, 0, new double[] {1, 1, -1, 0, 0});
    double[] labour = {1, 2, 2.7, 2.8, 10};
    List<double[]> pairs = Isoquant.of(technology, 3, 0, 1, new double[] {1, 1}, labour);
    assertThat(pairs).hasSize(3);
    // The other way round, labour answers capital on the rising branch only.
    List<double[]> rising =
        Isoquant.of(technology, 3, 1, 0, new double[] {1, 1}, new double[] {3, 2, 1.5});
    assertThat(rising).hasSize(2);
    assertThat(rising).allSatisfy(pair -> assertThat(pair[1]).isLessThan(Math.E));
  }

  @Test
  void contractionMeetsTheTarget() {
    RandomTechnologies random = new RandomTechnologies(42);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      double[] used = planted.mix();
      double factor = random.between(.9, 1.2);
      for (int i = 0; i < used.length; i++) {
        used[i] *= factor;
      }
      OptionalDouble theta =
          Contraction.onto(planted.technology(), used, planted.question().target());
      assertThat(theta.orElseThrow()).isCloseTo(1 / factor, within(1e-11));
    }
  }

  @Test
  void impossibleQuestionsAreRefused() {
    CobbDouglas technology = CobbDouglas.of(LK, 0, .5, .5);
    assertThatThrownBy(() -> Isoquant.of(technology, 1, 1, 1, ONES, ONES))
        .hasMessageContaining("two inputs");
    assertThatThrownBy(() -> Isoquant.around(technology, 1, 0, 1, ONES, 1, 3))
        .hasMessageContaining("more than 1");
    Translog humped = new Translog(LK, ONES, 0, new double[] {.5, .5, -1, 0, -1});
    assertThat(Contraction.onto(humped, ONES, 100)).isEmpty();
  }
}

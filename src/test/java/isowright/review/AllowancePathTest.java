package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.review.AllowancePath.Terms;
import isowright.review.AllowancePath.Year;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The glide path by hand, and its laws on random cases. */
class AllowancePathTest {

  /**
   * F 1000, gap 200 of which 150 is used, c .6, 3 years, f 1 %, i 2 %. Removable .6 · 150 = 90, 30
   * a year; rest 400. Year 1: 570, shift −5.70, sum 964.30, index 19.286, allowance 983.586. Year
   * 2: 540, shift −540 · .0199 = −10.746, sum 929.254, index · .0404 = 37.5418616, allowance
   * 966.7958616. Year 3: 510, shift −510 · .029701 = −15.14751, sum 894.85249, index · .061208 =
   * 54.77213121, allowance 949.62462121.
   */
  @Test
  void byHand() {
    AllowancePath path = AllowancePath.of(1000, 200, 150, new Terms(.6, 3, .01, .02));
    assertThat(path.margin()).isEqualTo(50);
    assertThat(path.controllableGap()).isCloseTo(90, within(1e-12));
    assertThat(path.years()).hasSize(4);
    Year start = path.years().get(0);
    assertThat(start.allowance()).isEqualTo(1000);
    assertThat(start.shift() + start.index() + start.removed()).isZero();
    double[] allowances = {983.586, 966.7958616, 949.624621208};
    double[] shifts = {-5.7, -10.746, -15.14751};
    for (int t = 1; t <= 3; t++) {
      Year year = path.years().get(t);
      assertThat(year.rest()).isCloseTo(400, within(1e-12));
      assertThat(year.removed()).isCloseTo(30 * t, within(1e-12));
      assertThat(year.controllable()).isCloseTo(600 - 30 * t, within(1e-12));
      // Worked to nine decimals.
      assertThat(year.shift()).isCloseTo(shifts[t - 1], within(5e-9));
      assertThat(year.allowance()).isCloseTo(allowances[t - 1], within(5e-9));
    }
  }

  @Test
  void nothingIsRemovedWhereTheQuantileIsNotPositive() {
    AllowancePath path = AllowancePath.of(1000, 20, -15, new Terms(1, 4, 0, 0));
    assertThat(path.controllableGap()).isZero();
    assertThat(path.margin()).isEqualTo(35);
    assertThat(path.years()).allSatisfy(year -> assertThat(year.allowance()).isEqualTo(1000));
  }

  @Test
  void everyLineAddsUpAndTheLastHasTheGapRemoved() {
    SplittableRandom random = new SplittableRandom(3);
    for (int k = 0; k < 5000; k++) {
      double filed = 1 + 1e6 * random.nextDouble();
      double gap = filed * (random.nextDouble() - .3);
      double used = gap - .2 * filed * random.nextDouble();
      Terms terms =
          new Terms(
              random.nextDouble(),
              1 + random.nextInt(12),
              .05 * random.nextDouble() - .01,
              .1 * random.nextDouble() - .02);
      AllowancePath path = AllowancePath.of(filed, gap, used, terms);
      assertThat(path.gapUsed() + path.margin()).isCloseTo(gap, within(1e-9 * filed));
      for (Year year : path.years()) {
        double sum = year.rest() + year.controllable() + year.shift() + year.index();
        assertThat(year.allowance()).isCloseTo(sum, within(1e-12 * filed));
        assertThat(year.rest() + year.controllable() + year.removed())
            .isCloseTo(filed, within(1e-12 * filed));
        assertThat(year.controllable()).isGreaterThanOrEqualTo(-1e-9 * filed);
      }
      Year last = path.years().get(terms.years());
      assertThat(last.removed()).isEqualTo(path.controllableGap());
    }
  }
}

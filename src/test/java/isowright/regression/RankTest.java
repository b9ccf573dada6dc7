package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RankTest {

  @Test
  void standardRuleStandsBetweenFilipAndRounding() {
    Design filip = NistSet.read("Filip").linearDesign();
    double least = Arrays.stream(LeastSquares.fit(filip).pivots()).min().orElseThrow();
    assertThat(least).isGreaterThan(1000 * RankRule.STANDARD.smallestPivot());
    assertThat(LeastSquares.fit(filip).rank()).isEqualTo(11);

    int rows = 1_000_000;
    SplittableRandom random = new SplittableRandom(4);
    double[][] x = new double[4][rows];
    double[] y = new double[rows];
    for (int i = 0; i < rows; i++) {
      x[0][i] = 1;
      x[1][i] = random.nextDouble(3, 9);
      x[2][i] = x[1][i] * 0.1;
      x[3][i] = 7 * x[1][i] / 3 + 0.3;
      y[i] = random.nextDouble();
    }
    LinearFit fit = LeastSquares.fit(ArrayDesign.of(List.of("one", "a", "b", "c"), x, y));
    assertThat(fit.rank()).isEqualTo(2);
    assertThat(fit.pivots()[2]).isLessThan(RankRule.STANDARD.smallestPivot() / 1000);
    assertThat(fit.pivots()[3]).isLessThan(RankRule.STANDARD.smallestPivot() / 1000);
    assertThat(fit.collinearities())
        .containsExactly(
            new Collinearity("b", List.of("a")), new Collinearity("c", List.of("one", "a")));
  }

  @Test
  void theLaterColumnIsDroppedAndTheFitIsThatWithoutIt() {
    SplittableRandom random = new SplittableRandom(8);
    for (int trial = 0; trial < 50; trial++) {
      int rows = 30 + random.nextInt(100);
      double[][] x = new double[6][rows];
      double[] y = new double[rows];
      for (int i = 0; i < rows; i++) {
        x[0][i] = 1;
        x[1][i] = random.nextDouble(-1, 1);
        x[2][i] = random.nextDouble(10, 12);
        x[3][i] = 2 * x[1][i] - x[2][i] + 4;
        x[4][i] = random.nextDouble(0, 1000);
        x[5][i] = x[4][i] - x[1][i];
        y[i] = random.nextDouble() + x[1][i];
      }
      List<String> names = List.of("one", "a", "b", "c", "d", "e");
      LinearFit fit = LeastSquares.fit(ArrayDesign.of(names, x, y));
      assertThat(fit.fullRank()).isFalse();
      assertThat(fit.estimated()).containsExactly(true, true, true, false, true, false);
      assertThat(fit.collinearities())
          .containsExactly(
              new Collinearity("c", List.of("one", "a", "b")),
              new Collinearity("e", List.of("a", "d")));
      LinearFit less =
          LeastSquares.fit(
              ArrayDesign.of(
                  List.of("one", "a", "b", "d"), new double[][] {x[0], x[1], x[2], x[4]}, y));
      assertThat(fit.coefficient("c")).isZero();
      assertThat(fit.inverseCrossProduct()[3]).containsOnly(0);
      assertThat(fit.residualDegreesOfFreedom()).isEqualTo(less.residualDegreesOfFreedom());
      // The condition is about 1e4, so twelve digits remain and ten are asked.
      assertThat(fit.ssr()).isCloseTo(less.ssr(), within(1e-10 * less.ssr()));
      assertThat(fit.coefficient("d"))
          .isCloseTo(less.coefficient("d"), within(1e-10 * (1 + Math.abs(less.coefficient("d")))));
      assertThat(fit.inverseCrossProduct()[4][4])
          .isCloseTo(
              less.inverseCrossProduct()[3][3], within(1e-10 * less.inverseCrossProduct()[3][3]));
    }
  }

  @Test
  void fewerRowsThanColumnsIsRankLoss() {
    double[][] x = {{1, 1}, {2, 3}, {5, 4}};
    LinearFit fit =
        LeastSquares.fit(ArrayDesign.of(List.of("one", "a", "b"), x, new double[] {3, 7}));
    assertThat(fit.rank()).isEqualTo(2);
    assertThat(fit.coefficients()[1]).isCloseTo(4, within(1e-12));
    assertThat(fit.residualDegreesOfFreedom()).isZero();
    assertThat(fit.residualVariance()).isNaN();
    assertThat(fit.collinearities().get(0).words()).isEqualTo("b is a combination of one, a");
  }

  @Test
  void zeroColumnsAndNoRowsAreStates() {
    LinearFit zero =
        LeastSquares.fit(
            ArrayDesign.of(
                List.of("one", "zero"),
                new double[][] {{1, 1, 1}, {0, 0, 0}},
                new double[] {1, 2, 6}));
    assertThat(zero.collinearities()).containsExactly(new Collinearity("zero", List.of()));
    assertThat(zero.collinearities().get(0).words()).isEqualTo("zero is zero in every row");
    assertThat(zero.coefficients()[0]).isCloseTo(3, within(1e-14));
    LinearFit none =
        LeastSquares.fit(ArrayDesign.of(List.of("a"), new double[1][0], new double[0]));
    assertThat(none.rank()).isZero();
    assertThat(none.ssr()).isZero();
  }

  @Test
  void theRuleIsASettingThatIsReported() {
    double[][] x = {{1, 1, 1, 1}, {1, 1 + 1e-7, 1 - 1e-7, 1}};
    ArrayDesign design = ArrayDesign.of(List.of("one", "near"), x, new double[] {1, 2, 3, 5});
    assertThat(LeastSquares.fit(design).rank()).isEqualTo(2);
    LinearFit strict = LeastSquares.fit(design, new RankRule(1e-6));
    assertThat(strict.rank()).isEqualTo(1);
    assertThat(strict.rankRule().smallestPivot()).isEqualTo(1e-6);
    // The sine of the angle between the columns: √(2/4) · 1e-7.
    assertThat(strict.pivots()[1]).isCloseTo(Math.sqrt(0.5) * 1e-7, within(1e-13));
    assertThatThrownBy(() -> new RankRule(0)).hasMessageContaining("smallestPivot");
  }

  @Test
  void valuesThatAreNotFiniteAreNamed() {
    double[][] x = {{1, 1, 1}, {1, Double.NaN, 3}};
    ArrayDesign design = ArrayDesign.of(List.of("one", "a"), x, new double[] {1, 2, 3});
    assertThatThrownBy(() -> LeastSquares.fit(design))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("column a is NaN at row 1");
  }
}

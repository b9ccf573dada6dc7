package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** What a change of units, of the order of rows or of the response must do to a fit. */
class LeastSquaresTest {

  /** The designs have a condition of some hundreds, so thirteen digits remain; eleven are asked. */
  private static final double ROUNDING = 1e-11;

  @Test
  void unitsOfColumnsScaleCoefficientsAndErrors() {
    SplittableRandom random = new SplittableRandom(41);
    for (int trial = 0; trial < 30; trial++) {
      ArrayDesign design = RandomDesigns.grouped(random, 200, 4, 3);
      double[][] rows = RandomDesigns.rows(design);
      double[] units = new double[5];
      for (int k = 0; k < 5; k++) {
        units[k] = Math.pow(10, random.nextInt(-60, 60));
        for (int i = 0; i < 200; i++) {
          rows[k][i] *= units[k];
        }
      }
      ArrayDesign scaled = RandomDesigns.design(design.columns(), rows, design.groups());
      int[] place = new int[200];
      for (int i = 0; i < 200; i++) {
        place[i] = i - design.groups().start(design.groups().of(i));
      }
      Times times = Times.of(3, place);
      LinearFit before = LeastSquares.fit(design);
      LinearFit after = LeastSquares.fit(scaled);
      assertThat(after.rank()).isEqualTo(4);
      for (Covariance.Kind kind : Covariance.Kind.values()) {
        Covariance first = Covariance.estimate(design, before, kind, times);
        Covariance second = Covariance.estimate(scaled, after, kind, times);
        for (int k = 0; k < 4; k++) {
          double unit = units[4] / units[k];
          assertClose(after.coefficients()[k] / unit, before.coefficients()[k]);
          assertClose(second.standardError(k) / unit, first.standardError(k));
        }
      }
    }
  }

  @Test
  void theOrderOfRowsDoesNotMatter() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(42), 5000, 4, 1);
    double[][] rows = RandomDesigns.rows(design);
    List<Integer> order = new ArrayList<>();
    for (int i = 0; i < 5000; i++) {
      order.add(i);
    }
    Collections.shuffle(order, new Random(7));
    double[][] shuffled = new double[5][5000];
    for (int i = 0; i < 5000; i++) {
      for (int k = 0; k < 5; k++) {
        shuffled[k][i] = rows[k][order.get(i)];
      }
    }
    LinearFit before = LeastSquares.fit(design);
    LinearFit after =
        LeastSquares.fit(
            RandomDesigns.design(design.columns(), shuffled, Groups.ofSingleRows(5000)));
    assertClose(after.ssr(), before.ssr());
    assertClose(after.totalSumOfSquares(), before.totalSumOfSquares());
    for (int k = 0; k < 4; k++) {
      assertClose(after.coefficients()[k], before.coefficients()[k]);
    }
  }

  @Test
  void residualsAreOrthogonalAndSumToTheirSquares() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(43), 7000, 5, 4);
    double[][] rows = RandomDesigns.rows(design);
    LinearFit fit = LeastSquares.fit(design);
    double[] residuals = LeastSquares.residuals(design, fit);
    assertClose(OrthogonalDecomposition.sumOfSquares(residuals, 0, 7000), fit.ssr());
    for (int k = 0; k < 5; k++) {
      double inner = OrthogonalDecomposition.product(residuals, rows[k], 0, 7000);
      double size = Math.sqrt(fit.ssr() * OrthogonalDecomposition.sumOfSquares(rows[k], 0, 7000));
      assertThat(inner / size).isCloseTo(0, within(1e-13));
    }
  }

  @Test
  void addingAMultipleOfAColumnAddsToItsCoefficientAlone() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(44), 300, 4, 2);
    double[][] rows = RandomDesigns.rows(design);
    LinearFit before = LeastSquares.fit(design);
    for (int i = 0; i < 300; i++) {
      rows[4][i] += 2.5 * rows[2][i];
    }
    LinearFit after =
        LeastSquares.fit(RandomDesigns.design(design.columns(), rows, design.groups()));
    assertClose(after.ssr(), before.ssr());
    assertClose(after.coefficient("x2") - 2.5, before.coefficient("x2"));
    assertClose(after.coefficient("x3"), before.coefficient("x3"));
  }

  @Test
  void theTotalIsAboutTheMean() {
    double[] y = {1e9 + 1, 1e9 + 2, 1e9 + 6};
    LinearFit fit = LeastSquares.fit(ArrayDesign.of(List.of("one"), new double[][] {{1, 1, 1}}, y));
    assertThat(fit.totalSumOfSquares()).isEqualTo(14);
    assertThat(fit.ssr()).isEqualTo(14);
    assertThat(fit.coefficient("one")).isEqualTo(1e9 + 3);
  }

  @Test
  void arraysAreCopiedOut() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(45), 50, 2, 2);
    LinearFit fit = LeastSquares.fit(design);
    double kept = fit.coefficients()[1];
    fit.coefficients()[1] = 99;
    fit.inverseFactor()[0][0] = 99;
    assertThat(fit.coefficients()[1]).isEqualTo(kept);
    assertThat(fit.inverseFactor()[0][0]).isNotEqualTo(99);
  }

  private static void assertClose(double actual, double expected) {
    assertThat(actual).isCloseTo(expected, within(ROUNDING * (1 + Math.abs(expected))));
  }
}

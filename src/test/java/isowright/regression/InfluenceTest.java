package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class InfluenceTest {

  @Test
  void cooksDistanceIsTheMoveOfTheFitWithoutTheRow() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(61), 60, 4, 3);
    LinearFit fit = LeastSquares.fit(design);
    List<Influence> all = Influence.most(design, fit, 100);
    assertThat(all).hasSize(60);
    assertThat(all)
        .isSortedAccordingTo(Comparator.comparingDouble(Influence::cooksDistance).reversed());
    double leverages = 0;
    for (Influence one : all) {
      leverages += one.leverage();
      // Differences of fits: twelve digits less the two or three that the difference loses.
      assertThat(one.cooksDistance())
          .isCloseTo(moved(design, fit, one.row()), within(1e-9 + 1e-8 * one.cooksDistance()));
    }
    assertThat(leverages).isCloseTo(4, within(1e-12));
  }

  @Test
  void groupEffectsCountAsDummiesDo() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(62), 90, 3, 6);
    Design within = Effects.within(design);
    Design dummies = EffectsTest.dummies(design);
    List<Influence> mine = Influence.most(within, LeastSquares.fit(within), 5);
    List<Influence> theirs =
        Influence.most(dummies, LeastSquares.fit(dummies), 90).stream()
            .filter(one -> Double.isFinite(one.cooksDistance()))
            .limit(5)
            .toList();
    for (int i = 0; i < 5; i++) {
      assertThat(mine.get(i).row()).isEqualTo(theirs.get(i).row());
      assertThat(mine.get(i).cooksDistance())
          .isCloseTo(theirs.get(i).cooksDistance(), within(1e-9));
      assertThat(mine.get(i).studentisedResidual())
          .isCloseTo(theirs.get(i).studentisedResidual(), within(1e-9));
    }
  }

  @Test
  void manyRowsKeepTheMost() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(63), 20_000, 3, 2);
    LinearFit fit = LeastSquares.fit(design);
    List<Influence> ten = Influence.most(design, fit, 10);
    assertThat(ten).hasSize(10);
    assertThat(Influence.most(design, fit, 20_000).subList(0, 10)).isEqualTo(ten);
  }

  @Test
  void aRowOfLeverageOneStandsFirst() {
    double[][] x = {{1, 1, 1, 1}, {0, 0, 0, 1}};
    ArrayDesign design = ArrayDesign.of(List.of("one", "only"), x, new double[] {1, 2, 4, 9});
    Influence first = Influence.most(design, LeastSquares.fit(design), 1).get(0);
    assertThat(first.row()).isEqualTo(3);
    assertThat(first.cooksDistance()).isInfinite();
    assertThat(first.studentisedResidual()).isNaN();
  }

  @Test
  void noFreedomNoInfluence() {
    ArrayDesign design = ArrayDesign.of(List.of("one"), new double[][] {{1}}, new double[] {4});
    assertThat(Influence.most(design, LeastSquares.fit(design), 3)).isEmpty();
  }

  /** Σ (fitted − fitted without the row)² / (p s²). */
  private static double moved(ArrayDesign design, LinearFit fit, int row) {
    double[][] rows = RandomDesigns.rows(design);
    int n = rows[0].length;
    double[][] less = new double[rows.length][n - 1];
    for (int k = 0; k < rows.length; k++) {
      System.arraycopy(rows[k], 0, less[k], 0, row);
      System.arraycopy(rows[k], row + 1, less[k], row, n - 1 - row);
    }
    LinearFit without =
        LeastSquares.fit(RandomDesigns.design(design.columns(), less, Groups.ofSingleRows(n - 1)));
    double sum = 0;
    for (int i = 0; i < n; i++) {
      double difference = 0;
      for (int k = 0; k < fit.columns().size(); k++) {
        difference += rows[k][i] * (fit.coefficients()[k] - without.coefficients()[k]);
      }
      sum += difference * difference;
    }
    return sum / (fit.columns().size() * fit.residualVariance());
  }
}

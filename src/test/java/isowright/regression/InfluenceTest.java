package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

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
    assertThat(Influence.most(design, fit, 20_000).subList(0, 10))
        .usingRecursiveComparison()
        .isEqualTo(ten);
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

  /** The definitions, with the row left out. */
  @Test
  void measuresOfBelsleyKuhAndWelschAreThoseOfTheFitWithoutTheRow() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(64), 40, 4, 3);
    double[][] rows = RandomDesigns.rows(design);
    LinearFit fit = LeastSquares.fit(design);
    for (Influence one : Influence.most(design, fit, 40)) {
      LinearFit without = LeastSquares.fit(ResampledDesigns.kept(design, r -> r != one.row()));
      double s = Math.sqrt(without.residualVariance());
      double[] x = {rows[0][one.row()], rows[1][one.row()], rows[2][one.row()], rows[3][one.row()]};
      double change = 0;
      for (int k = 0; k < 4; k++) {
        double moved = fit.coefficients()[k] - without.coefficients()[k];
        change += x[k] * moved;
        assertThat(one.dfbetas()[k])
            .isCloseTo(moved / (s * Math.sqrt(fit.inverseCrossProduct()[k][k])), within(1e-9));
      }
      assertThat(one.dffits()).isCloseTo(change / (s * Math.sqrt(one.leverage())), within(1e-9));
      assertThat(one.covarianceRatio())
          .isCloseTo(
              determinant(without.inverseCrossProduct(), without.residualVariance())
                  / determinant(fit.inverseCrossProduct(), fit.residualVariance()),
              within(1e-8));
    }
  }

  private static double determinant(double[][] inverse, double variance) {
    return new LUDecomposition(new Array2DRowRealMatrix(inverse).scalarMultiply(variance))
        .getDeterminant();
  }

  /** Of 48 US states, pooled and with a constant for each; fourteen digits of R. */
  @ParameterizedTest
  @ValueSource(strings = {"pooled", "within"})
  void agreesWithTheReferenceOnTheStates(String model) throws IOException {
    ArrayDesign raw = PublishedDesigns.states();
    boolean inGroups = model.equals("within");
    Design design = inGroups ? Effects.within(raw) : raw;
    List<Influence> all = Influence.most(design, LeastSquares.fit(design), raw.rows());
    List<double[]> rows =
        Files.readAllLines(Path.of("src/test/resources/reference/influence.csv")).stream()
            .filter(line -> line.startsWith(model + ","))
            .map(line -> Arrays.stream(line.split(",")).skip(1).mapToDouble(Double::parseDouble))
            .map(java.util.stream.DoubleStream::toArray)
            .toList();
    assertThat(rows).hasSize(10);
    for (int place = 0; place < 10; place++) {
      double[] expected = rows.get(place);
      if (place < 8) {
        assertThat(all.get(place).row()).isEqualTo((int) expected[0]);
      }
      Influence one =
          all.stream().filter(i -> i.row() == (int) expected[0]).findFirst().orElseThrow();
      double[] b = one.dfbetas();
      double[] actual = {
        one.row(),
        one.cooksDistance(),
        one.leverage(),
        one.studentisedResidual(),
        one.deletedResidual(),
        one.dffits(),
        one.covarianceRatio(),
        b[1],
        b[2],
        b[3],
        b[4]
      };
      // R orthogonalises columns of condition 1e3 once: eleven digits of the largest measure.
      assertThat(actual).containsExactly(expected, within(1e-10));
    }
  }

  @Test
  void rowsBeyondSeveralCutoffsAreCountedAndTheWorstNamed() {
    ArrayDesign clean = RandomDesigns.grouped(new SplittableRandom(65), 4000, 4, 3);
    double[][] rows = RandomDesigns.rows(clean);
    rows[4][1234] += 60;
    rows[2][77] += 40;
    ArrayDesign design = RandomDesigns.design(clean.columns(), rows, clean.groups());
    LinearFit fit = LeastSquares.fit(design);
    Influence.Survey survey = Influence.survey(design, fit, 3);
    Influence.Cutoffs cutoffs = Influence.Cutoffs.of(fit);
    assertThat(cutoffs.leverage()).isEqualTo(2 * 4 / 4000.0);
    assertThat(cutoffs.dffits()).isEqualTo(2 * Math.sqrt(.001));
    assertThat(cutoffs.covarianceRatio()).isEqualTo(3 * 4 / 4000.0);
    assertThat(cutoffs.dfbetas()).isEqualTo(2 / Math.sqrt(4000));
    assertThat(survey.worst()).hasSize(3);
    assertThat(survey.worst()).extracting(Influence::row).contains(1234, 77);
    assertThat(survey.worst().get(0).largestColumn()).isBetween(0, 3);
    long count =
        Influence.most(design, fit, 4000).stream()
            .filter(one -> cutoffs.beyond(one) >= Influence.Cutoffs.SEVERAL)
            .count();
    assertThat(survey.beyondSeveral()).isEqualTo((int) count);
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

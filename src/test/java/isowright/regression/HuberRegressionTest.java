package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class HuberRegressionTest {

  /**
   * 48 US states against {@code MASS::rlm} of R, with a constant for each state in the second model
   * ({@code reference/influence.R}, which names the version). Both stop when residuals stand still
   * to 1e-11 or better; the steps shrink by some three quarters a round, so that four times that is
   * left, times the condition of 1e3.
   */
  @ParameterizedTest
  @ValueSource(strings = {"pooled", "within"})
  void agreesWithTheReferenceOnTheStates(String model) throws IOException {
    ArrayDesign raw = PublishedDesigns.states();
    Design design = model.equals("within") ? Effects.within(raw) : raw;
    HuberRegression huber = HuberRegression.fit(design, LeastSquares.fit(design));
    String[] expected =
        Files.readAllLines(Path.of("src/test/resources/reference/influence.csv")).stream()
            .filter(line -> line.startsWith("huber-" + model))
            .findFirst()
            .orElseThrow()
            .split(",");
    assertThat(huber.converged()).isTrue();
    assertThat(huber.scale()).isCloseTo(Double.parseDouble(expected[2]), within(1e-8));
    assertThat(huber.lessened()).isEqualTo(Integer.parseInt(expected[3]));
    for (int k = 1; k < 5; k++) {
      assertThat(huber.coefficients()[k])
          .isCloseTo(Double.parseDouble(expected[3 + k]), within(1e-8));
    }
  }

  @Test
  void outlyingResponsesHardlyMatter() {
    ArrayDesign clean = RandomDesigns.grouped(new SplittableRandom(121), 2000, 3, 10);
    double[][] rows = RandomDesigns.rows(clean);
    for (int i = 0; i < 2000; i += 20) {
      rows[3][i] += 40 * rows[2][i];
    }
    ArrayDesign bad = RandomDesigns.design(clean.columns(), rows, clean.groups());
    LinearFit before = LeastSquares.fit(Effects.within(clean));
    LinearFit after = LeastSquares.fit(Effects.within(bad));
    HuberRegression huber = HuberRegression.fit(Effects.within(bad), after);
    double moved = Math.abs(after.coefficients()[2] - before.coefficients()[2]);
    double left = Math.abs(huber.coefficients()[2] - before.coefficients()[2]);
    assertThat(huber.lessened()).isGreaterThanOrEqualTo(100);
    assertThat(left).isLessThan(moved / 10);
  }

  /** More than half of the residuals are zero: there is no scale, and it says so. */
  @Test
  void withoutAScaleThereIsNoAnswer() {
    double[][] x = {{1, 1, 1, 1, 1, 1}};
    ArrayDesign design = ArrayDesign.of(List.of("one"), x, new double[6]);
    HuberRegression huber = HuberRegression.fit(design, LeastSquares.fit(design));
    assertThat(huber.converged()).isFalse();
    assertThat(huber.coefficients()).containsExactly(0);
  }

  @Test
  void digitsDoNotDependOnTheNumberOfThreads() throws ExecutionException, InterruptedException {
    Design design = Effects.within(RandomDesigns.grouped(new SplittableRandom(122), 20_000, 3, 8));
    LinearFit fit = LeastSquares.fit(design);
    double[] one = withThreads(1, design, fit);
    assertThat(withThreads(2, design, fit)).isEqualTo(one);
    assertThat(withThreads(5, design, fit)).isEqualTo(one);
  }

  private static double[] withThreads(int threads, Design design, LinearFit fit)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(() -> HuberRegression.fit(design, fit).coefficients()).get();
    } finally {
      pool.shutdown();
    }
  }
}

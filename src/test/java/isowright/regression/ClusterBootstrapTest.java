package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;

class ClusterBootstrapTest {

  @Test
  void aDrawIsTheFitToTheGroupsDrawn() {
    SplittableRandom random = new SplittableRandom(91);
    for (int trial = 0; trial < 6; trial++) {
      ArrayDesign raw = RandomDesigns.grouped(random, 200 + random.nextInt(900), 4, 9);
      assertDrawsAreRefits(raw, false, 12, 1e-10);
      assertDrawsAreRefits(raw, true, 12, 1e-10);
    }
  }

  /**
   * An unscaled translog of three regressors that move together, far from the origin: the condition
   * of its columns is above 1e7, so that of their cross-products is beyond double precision, yet
   * draws agree with refits by reflections to a millionth of a standard error.
   */
  @Test
  void anIllConditionedTranslogKeepsItsDigits() {
    ArrayDesign translog = translog(new SplittableRandom(92), 120, 10);
    LinearFit fit = LeastSquares.fit(translog);
    double smallest = 1;
    for (double pivot : fit.pivots()) {
      smallest = Math.min(smallest, pivot);
    }
    assertThat(smallest).isLessThan(1e-7);
    assertDrawsAreRefits(translog, false, 20, 1e-6);
    assertDrawsAreRefits(translog, true, 20, 1e-6);
  }

  private static ArrayDesign translog(SplittableRandom random, int groups, int size) {
    int rows = groups * size;
    double[][] x = new double[10][rows];
    double[] y = new double[rows];
    int[] starts = new int[groups];
    for (int g = 0; g < groups; g++) {
      starts[g] = g * size;
      double level = random.nextDouble(-1, 1);
      for (int i = g * size; i < (g + 1) * size; i++) {
        double[] z = new double[3];
        double common = 12 + .1 * level + random.nextDouble(-.02, .02);
        for (int k = 0; k < 3; k++) {
          z[k] = common + random.nextDouble(-.003, .003);
        }
        x[0][i] = 1;
        int at = 1;
        for (int k = 0; k < 3; k++) {
          x[at++][i] = z[k];
          y[i] += .3 * z[k];
        }
        for (int k = 0; k < 3; k++) {
          for (int l = k; l < 3; l++) {
            x[at++][i] = (k == l ? .5 : 1) * z[k] * z[l];
          }
        }
        y[i] += random.nextDouble(-.1, .1);
      }
    }
    List<String> names = new ArrayList<>();
    for (int k = 0; k < 10; k++) {
      names.add("c" + k);
    }
    return ArrayDesign.of(names, x, y, Groups.startingAt(rows, starts));
  }

  /** The difference of each coefficient as a part of its standard error in the refit. */
  private static void assertDrawsAreRefits(
      ArrayDesign raw, boolean inGroups, int draws, double part) {
    Design design = inGroups ? Effects.within(raw) : raw;
    LinearFit fit = LeastSquares.fit(design);
    Refits refits = ClusterBootstrap.draw(GroupProducts.of(design, fit), draws, 17);
    for (int d = 0; d < draws; d++) {
      int[] counts = ClusterBootstrap.counts(raw.groups().count(), d, 17);
      ArrayDesign drawn = ResampledDesigns.counted(raw, counts);
      Design again = inGroups ? Effects.within(drawn) : drawn;
      LinearFit expected = LeastSquares.fit(again);
      Covariance errors = Covariance.estimate(again, expected, Covariance.Kind.CLASSICAL);
      for (int k = 0; k < expected.columns().size(); k++) {
        assertThat(refits.coefficient(d, k))
            .isCloseTo(expected.coefficients()[k], within(part * errors.standardError(k) + 1e-300));
      }
      assertThat(refits.ssr(d)).isCloseTo(expected.ssr(), within(1e-9 * expected.ssr()));
      assertThat(refits.failed(d)).isFalse();
    }
  }

  @Test
  void digitsDoNotDependOnThreadsOrOnTheNumberOfDraws()
      throws ExecutionException, InterruptedException {
    Design design = Effects.within(RandomDesigns.grouped(new SplittableRandom(93), 20_000, 4, 5));
    LinearFit fit = LeastSquares.fit(design);
    double[] one = withThreads(1, design, fit, 300);
    assertThat(withThreads(2, design, fit, 300)).isEqualTo(one);
    assertThat(withThreads(5, design, fit, 300)).isEqualTo(one);
    assertThat(withThreads(2, design, fit, 301)).startsWith(one);
  }

  private static double[] withThreads(int threads, Design design, LinearFit fit, int draws)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(
              () -> {
                Refits refits = ClusterBootstrap.draw(GroupProducts.of(design, fit), draws, 5);
                double[] all = new double[draws * 4];
                for (int d = 0; d < draws; d++) {
                  System.arraycopy(refits.coefficients(d), 0, all, d * 4, 4);
                }
                return all;
              })
          .get();
    } finally {
      pool.shutdown();
    }
  }

  @Test
  void seedsDiffer() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(94), 300, 3, 4);
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    assertThat(ClusterBootstrap.draw(products, 1, 1).coefficients(0))
        .isNotEqualTo(ClusterBootstrap.draw(products, 1, 2).coefficients(0));
    assertThatThrownBy(() -> ClusterBootstrap.draw(products, 0, 1)).hasMessage("draws is 0");
  }

  /** A column that only one of six groups has is lost in (5/6)^6 = 33 % of the draws. */
  @Test
  void drawsThatLoseRankAreCounted() {
    SplittableRandom random = new SplittableRandom(95);
    double[][] x = new double[2][60];
    double[] y = new double[60];
    int[] starts = {0, 10, 20, 30, 40, 50};
    for (int i = 0; i < 60; i++) {
      x[0][i] = 1;
      x[1][i] = i < 10 ? random.nextDouble() : 0;
      y[i] = random.nextDouble();
    }
    ArrayDesign design =
        ArrayDesign.of(List.of("one", "only"), x, y, Groups.startingAt(60, starts));
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    Refits refits = ClusterBootstrap.draw(products, 2000, 3);
    int without = 0;
    for (int d = 0; d < 2000; d++) {
      boolean lost = ClusterBootstrap.counts(6, d, 3)[0] == 0;
      without += lost ? 1 : 0;
      assertThat(refits.failed(d)).isEqualTo(lost);
      assertThat(Double.isNaN(refits.coefficient(d, 0))).isEqualTo(lost);
    }
    assertThat(refits.failures()).isEqualTo(without).isBetween(600, 750);
  }

  /**
   * 48 US states (see {@link PublishedPanelTest}): standard deviations over 999 draws against the
   * analytic standard errors clustered by state. The standard deviation of B nearly normal draws
   * has the relative error 1/√(2B), which is the Monte-Carlo error; three are allowed. With 48
   * groups the bootstrap and the sandwich also differ by terms of the order 1/48, more so where few
   * states weigh much: in the pooled model the constant and pc come out 8 % above. There the
   * bootstrap must lie between the sandwich and the jackknife over states, which errs on the large
   * side (J. G. MacKinnon, M. Ø. Nielsen and M. D. Webb 2023, Journal of Econometrics 232,
   * 272–299).
   */
  @Test
  void standardErrorsAgreeWithTheClusteredOnes() throws IOException {
    double monteCarlo = 1 / Math.sqrt(2 * 999);
    for (Design design :
        List.of(PublishedDesigns.states(), Effects.within(PublishedDesigns.states()))) {
      LinearFit fit = LeastSquares.fit(design);
      Covariance clustered = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED);
      GroupProducts products = GroupProducts.of(design, fit);
      Refits draws = ClusterBootstrap.draw(products, 999, 1);
      Refits without = LeaveOut.eachGroup(products);
      int close = 0;
      for (int k = fit.estimated()[0] ? 0 : 1; k < 5; k++) {
        double sandwich = clustered.standardError(k);
        double jackknife = 47 / Math.sqrt(48) * standardDeviation(without, k);
        double ratio = standardDeviation(draws, k) / sandwich;
        assertThat(ratio)
            .isBetween(
                Math.min(1, jackknife / sandwich) - 3 * monteCarlo,
                Math.max(1, jackknife / sandwich) + 3 * monteCarlo);
        close += Math.abs(ratio - 1) < 3 * monteCarlo ? 1 : 0;
      }
      assertThat(close).isEqualTo(fit.estimated()[0] ? 3 : 4);
    }
  }

  /** With 3,000 groups what is of the order 1/G is far below the Monte-Carlo error. */
  @Test
  void standardErrorsAgreeWithTheClusteredOnesWhereGroupsAreMany() {
    ArrayDesign raw = RandomDesigns.grouped(new SplittableRandom(96), 9000, 4, 5);
    for (Design design : List.of(raw, Effects.within(raw))) {
      LinearFit fit = LeastSquares.fit(design);
      Covariance clustered = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED);
      Refits draws = ClusterBootstrap.draw(GroupProducts.of(design, fit), 1999, 2);
      for (int k = 1; k < 4; k++) {
        assertThat(standardDeviation(draws, k) / clustered.standardError(k))
            .isCloseTo(1, within(3 / Math.sqrt(2 * 1999)));
      }
    }
  }

  private static double standardDeviation(Refits refits, int k) {
    double mean = 0;
    for (int d = 0; d < refits.count(); d++) {
      mean += refits.coefficient(d, k) / refits.count();
    }
    double squares = 0;
    for (int d = 0; d < refits.count(); d++) {
      squares += Math.pow(refits.coefficient(d, k) - mean, 2);
    }
    return Math.sqrt(squares / (refits.count() - 1));
  }
}

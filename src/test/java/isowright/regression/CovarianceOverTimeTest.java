package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.Covariance.Kind;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class CovarianceOverTimeTest {

  /** Against dense formulas with an explicit inverse of cross-products, condition about 1e4. */
  private static final double ROUNDING = 1e-9;

  /**
   * Against R ({@code reference/covariances.R}, which names the versions), fifteen digits printed;
   * R solves cross-products of columns whose condition is about 1e3, which leaves ten.
   */
  private static final double REFERENCE = 1e-9;

  @ParameterizedTest
  @CsvSource({
    "pooled, HC3",
    "within, HC3",
    "pooled, CLUSTERED_TWO_WAY",
    "within, CLUSTERED_TWO_WAY",
    "pooled, NEWEY_WEST",
    "within, NEWEY_WEST",
    "pooled, DRISCOLL_KRAAY",
    "within, DRISCOLL_KRAAY"
  })
  void agreesWithTheReferenceOnTheStates(String model, Kind kind) throws IOException {
    boolean inGroups = model.equals("within");
    ArrayDesign raw = PublishedDesigns.states();
    Design design = inGroups ? Effects.within(raw) : raw;
    LinearFit fit = LeastSquares.fit(design);
    Covariance covariance = Covariance.estimate(design, fit, kind, PublishedDesigns.years());
    assertReference(model, covariance, inGroups ? 1 : 0);
    assertThat(covariance.degreesOfFreedom())
        .isEqualTo(
            switch (kind) {
              case CLUSTERED_TWO_WAY, DRISCOLL_KRAAY -> 16;
              default -> inGroups ? 764 : 811;
            });
  }

  @Test
  void neweyWestOfASingleSeries() throws IOException {
    Design design = PublishedDesigns.manufacturing();
    int[] years = new int[24];
    Arrays.setAll(years, t -> t);
    Covariance covariance =
        Covariance.estimate(design, LeastSquares.fit(design), Kind.NEWEY_WEST, Times.of(24, years));
    assertReference("series", covariance, 0);
    assertThat(covariance.words())
        .isEqualTo(
            "Newey-West covariance of a single series: weights 1 − l/(m + 1) up to lag m = 2, the"
                + " whole part of 4(T/100)^(2/9) with T = 24 times; factor N/(N − K) = 24/21; t with"
                + " 21 degrees of freedom.");
  }

  /** The reference holds no factor but G/(G − 1) of each of the three parts of the two-way kind. */
  private static void assertReference(String model, Covariance covariance, int offset)
      throws IOException {
    List<String[]> rows =
        Files.readAllLines(Path.of("src/test/resources/reference/covariances.csv")).stream()
            .filter(line -> line.startsWith(model + "," + covariance.kind() + ","))
            .map(line -> line.split(","))
            .toList();
    assertThat(rows).isNotEmpty();
    double[][] actual = covariance.matrix();
    double[] errors = new double[actual.length];
    for (String[] row : rows) {
      int i = Integer.parseInt(row[2]);
      if (row[2].equals(row[3])) {
        errors[i] = Math.sqrt(Double.parseDouble(row[4]));
      }
    }
    for (String[] row : rows) {
      int i = Integer.parseInt(row[2]);
      int j = Integer.parseInt(row[3]);
      assertThat(actual[i + offset][j + offset] / covariance.factor())
          .isCloseTo(Double.parseDouble(row[4]), within(REFERENCE * errors[i] * errors[j]));
    }
  }

  @ParameterizedTest
  @EnumSource(
      value = Kind.class,
      names = {"CLUSTERED_TWO_WAY", "NEWEY_WEST", "DRISCOLL_KRAAY"})
  void agreesWithTheFormulasWrittenOutDensely(Kind kind) {
    SplittableRandom random = new SplittableRandom(71);
    for (int trial = 0; trial < 10; trial++) {
      int count = 30 + random.nextInt(60);
      ArrayDesign design =
          RandomDesigns.grouped(random, 200 + random.nextInt(800), 2 + random.nextInt(4), 12);
      Times times = times(random, design.groups(), count);
      LinearFit fit = LeastSquares.fit(design);
      double[][] actual = Covariance.estimate(design, fit, kind, times).matrix();
      double[][] expected = dense(design, fit, kind, times);
      for (int k = 0; k < expected.length; k++) {
        for (int l = 0; l < expected.length; l++) {
          double size = Math.sqrt(expected[k][k] * expected[l][l]);
          assertThat(actual[k][l]).isCloseTo(expected[k][l], within(ROUNDING * size));
          assertThat(actual[k][l]).isEqualTo(actual[l][k]);
        }
      }
    }
  }

  /** Ascending times with gaps; now and then two rows of a group at one time. */
  private static Times times(SplittableRandom random, Groups groups, int count) {
    int[] times = new int[groups.rows()];
    for (int g = 0; g < groups.count(); g++) {
      for (int row = groups.start(g); row < groups.end(g); row++) {
        times[row] = random.nextInt(count);
      }
      Arrays.sort(times, groups.start(g), groups.end(g));
    }
    return Times.of(count, times);
  }

  /** The sum over all pairs of rows of weight × r_i r_j x_i x_j′, pair by pair. */
  private static double[][] dense(Design design, LinearFit fit, Kind kind, Times times) {
    double[][] rows = RandomDesigns.rows(design);
    int columns = rows.length - 1;
    int n = rows[0].length;
    Groups groups = design.groups();
    RealMatrix x = new Array2DRowRealMatrix(n, columns);
    double[] r = rows[columns].clone();
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < columns; k++) {
        x.setEntry(i, k, rows[k][i]);
        r[i] -= rows[k][i] * fit.coefficients()[k];
      }
    }
    double cells = 0;
    int longest = 0;
    for (int g = 0; g < groups.count(); g++) {
      long own = 0;
      for (int i = groups.start(g); i < groups.end(g); i++) {
        own += i == groups.start(g) || times.of(i) != times.of(i - 1) ? 1 : 0;
      }
      cells += own;
      longest = Math.max(longest, (int) own);
    }
    double ofGroups = groups.count() / (groups.count() - 1.0);
    double ofTimes = times.count() / (times.count() - 1.0);
    int lag =
        (int)
            Math.floor(
                4 * Math.pow((kind == Kind.NEWEY_WEST ? longest : times.count()) / 100.0, 2.0 / 9));
    RealMatrix middle = new Array2DRowRealMatrix(columns, columns);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        boolean group = groups.of(i) == groups.of(j);
        int apart = Math.abs(times.of(i) - times.of(j));
        double bartlett = Math.max(0, 1 - apart / (lag + 1.0));
        double weight =
            switch (kind) {
              case NEWEY_WEST -> group ? bartlett : 0;
              case DRISCOLL_KRAAY -> bartlett;
              default ->
                  (group ? ofGroups : 0)
                      + (apart == 0 ? ofTimes : 0)
                      - (group && apart == 0 ? cells / (cells - 1) : 0);
            };
        for (int k = 0; weight != 0 && k < columns; k++) {
          for (int l = 0; l < columns; l++) {
            middle.addToEntry(k, l, weight * r[i] * r[j] * x.getEntry(i, k) * x.getEntry(j, l));
          }
        }
      }
    }
    RealMatrix inverse = new LUDecomposition(x.transpose().multiply(x)).getSolver().getInverse();
    double factor =
        switch (kind) {
          case NEWEY_WEST -> n / (double) (n - columns);
          case DRISCOLL_KRAAY -> ofTimes * (n - 1) / (n - columns);
          default -> (n - 1.0) / (n - columns);
        };
    return inverse.multiply(middle).multiply(inverse).scalarMultiply(factor).getData();
  }

  /**
   * With no lag and one row at a time, only rows are left: 4 (T/100)^(2/9) is below one at T = 1.
   */
  @Test
  void neweyWestWithoutLagIsHc1() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(72), 300, 3, 1);
    LinearFit fit = LeastSquares.fit(design);
    double[][] mine =
        Covariance.estimate(design, fit, Kind.NEWEY_WEST, Times.of(1, new int[300])).matrix();
    double[][] rows = Covariance.estimate(design, fit, Kind.HC1).matrix();
    for (int k = 0; k < 3; k++) {
      // Sums in another order.
      assertThat(mine[k]).containsExactly(rows[k], within(1e-14 * Math.abs(rows[0][0])));
    }
  }

  /**
   * Two groups of ten at two times: the difference of middles has negative parts, which must go,
   * and in such a way that the units of the columns do not matter.
   */
  @Test
  void whatIsNegativeIsSetToZeroWhateverTheUnits() {
    SplittableRandom random = new SplittableRandom(73);
    int corrected = 0;
    for (int trial = 0; trial < 40; trial++) {
      double[][] x = new double[4][20];
      double[] y = new double[20];
      int[] times = new int[20];
      for (int i = 0; i < 20; i++) {
        x[0][i] = 1;
        for (int k = 1; k < 4; k++) {
          x[k][i] = random.nextDouble(-1, 1);
        }
        y[i] = random.nextDouble(-1, 1);
        times[i] = i % 4;
      }
      Groups groups = Groups.startingAt(20, new int[] {0, 4, 8, 12, 16});
      Covariance first = twoWay(x, y, groups, Times.of(4, times));
      boolean negative = first.words().contains("not positive semi-definite");
      corrected += negative ? 1 : 0;
      double[] values =
          new EigenDecomposition(new Array2DRowRealMatrix(first.matrix())).getRealEigenvalues();
      double most = Arrays.stream(values).max().orElseThrow();
      assertThat(Arrays.stream(values).min().orElseThrow()).isGreaterThan(-1e-12 * most);
      double[][] scaled = x.clone();
      scaled[2] = Arrays.stream(x[2]).map(v -> 1000 * v).toArray();
      Covariance second = twoWay(scaled, y, groups, Times.of(4, times));
      for (int k = 0; k < 4; k++) {
        assertThat(second.standardError(k) * (k == 2 ? 1000 : 1))
            .isCloseTo(first.standardError(k), within(1e-10));
      }
    }
    assertThat(corrected).isBetween(5, 39);
  }

  private static Covariance twoWay(double[][] x, double[] y, Groups groups, Times times) {
    ArrayDesign design = ArrayDesign.of(List.of("one", "a", "b", "c"), x, y, groups);
    return Covariance.estimate(design, LeastSquares.fit(design), Kind.CLUSTERED_TWO_WAY, times);
  }

  @Test
  void wordsStateEstimatorFactorAndFreedom() throws IOException {
    Design states = Effects.within(PublishedDesigns.states());
    LinearFit fit = LeastSquares.fit(states);
    Times years = PublishedDesigns.years();
    assertThat(Covariance.estimate(states, fit, Kind.CLUSTERED_TWO_WAY, years).words())
        .isEqualTo(
            "Covariance clustered by group and by time: by group, plus by time, less by cells of"
                + " both, factors G/(G − 1) = 48/47, 17/16 and 816/815, in common (N − 1)/(N − K) ="
                + " 815/812, group effects not counted in K; t with 16 degrees of freedom (the"
                + " smaller number of clusters less one).");
    assertThat(Covariance.estimate(states, fit, Kind.NEWEY_WEST, years).words())
        .isEqualTo(
            "Newey-West covariance by group: weights 1 − l/(m + 1) up to lag m = 2, the whole part of"
                + " 4(T/100)^(2/9) with T = 17 times of the longest group; factor N/(N − K − group"
                + " effects) = 816/764; t with 764 degrees of freedom.");
    assertThat(Covariance.estimate(states, fit, Kind.DRISCOLL_KRAAY, years).words())
        .isEqualTo(
            "Driscoll-Kraay covariance (rows of all groups may move together): weights 1 − l/(m + 1)"
                + " up to lag m = 2, the whole part of 4(T/100)^(2/9) with T = 17 times; factor T/(T"
                + " − 1) · (N − 1)/(N − K − group effects) = 17/16 · 815/764 = 1.13343; t with 16"
                + " degrees of freedom.");
  }

  @Test
  void digitsDoNotDependOnTheNumberOfThreads() throws ExecutionException, InterruptedException {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(74), 30_000, 4, 9);
    Times times = times(new SplittableRandom(75), design.groups(), 20);
    LinearFit fit = LeastSquares.fit(design);
    for (Kind kind : List.of(Kind.CLUSTERED_TWO_WAY, Kind.NEWEY_WEST, Kind.DRISCOLL_KRAAY)) {
      double[][] one = withThreads(1, design, fit, kind, times);
      assertThat(withThreads(2, design, fit, kind, times)).isDeepEqualTo(one);
      assertThat(withThreads(5, design, fit, kind, times)).isDeepEqualTo(one);
    }
  }

  private static double[][] withThreads(
      int threads, Design design, LinearFit fit, Kind kind, Times times)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(() -> Covariance.estimate(design, fit, kind, times).matrix()).get();
    } finally {
      pool.shutdown();
    }
  }

  @Test
  void timesMustBelongToTheRows() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(76), 30, 2, 5);
    LinearFit fit = LeastSquares.fit(design);
    assertThatThrownBy(() -> Covariance.estimate(design, fit, Kind.NEWEY_WEST))
        .hasMessage("NEWEY_WEST needs the times of the rows");
    assertThatThrownBy(
            () -> Covariance.estimate(design, fit, Kind.NEWEY_WEST, Times.of(1, new int[29])))
        .hasMessage("there are times of 29 rows, the design has 30");
    int[] backwards = new int[30];
    backwards[0] = 1;
    assertThatThrownBy(
            () ->
                Covariance.estimate(
                    RandomDesigns.design(
                        design.columns(),
                        RandomDesigns.rows(design),
                        Groups.startingAt(30, new int[] {0})),
                    fit,
                    Kind.NEWEY_WEST,
                    Times.of(2, backwards)))
        .hasMessageContaining("row 1 is earlier");
    assertThatThrownBy(() -> Times.of(2, 0, 2)).hasMessage("row 1 has time 2");
  }
}

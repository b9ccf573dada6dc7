package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

class WildBootstrapTest {

  private static final double[][] ONE = {{0, 1, 1, 0}};
  private static final double[][] TWO = {{0, 1, 1, 0}, {0, 0, 2, -1}};

  @Test
  void statisticIsWaldsWithTheClusteredCovariance() {
    SplittableRandom random = new SplittableRandom(111);
    for (int trial = 0; trial < 10; trial++) {
      ArrayDesign raw = RandomDesigns.grouped(random, 200, 4, 12);
      for (Design design : List.of(raw, Effects.within(raw))) {
        LinearFit fit = LeastSquares.fit(design);
        double[][] v = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED).matrix();
        GroupProducts products = GroupProducts.of(design, fit);
        double[] values = {0.9, 0.3};
        assertThat(WildBootstrap.test(products, ONE, values, 1, 1).statistic())
            .isCloseTo(wald(ONE, values, fit.coefficients(), v), relative(1e-9, products, ONE));
        assertThat(WildBootstrap.test(products, TWO, values, 1, 1).statistic())
            .isCloseTo(wald(TWO, values, fit.coefficients(), v), relative(1e-9, products, TWO));
      }
    }
  }

  private static org.assertj.core.data.Offset<Double> relative(
      double part, GroupProducts products, double[][] restrictions) {
    double statistic =
        WildBootstrap.test(products, restrictions, new double[] {0.9, 0.3}, 1, 1).statistic();
    return within(part * statistic);
  }

  private static double wald(double[][] restrictions, double[] values, double[] b, double[][] v) {
    RealMatrix r = new Array2DRowRealMatrix(restrictions);
    double[] gap = r.operate(b);
    for (int i = 0; i < gap.length; i++) {
      gap[i] -= values[i];
    }
    RealMatrix middle = r.multiply(new Array2DRowRealMatrix(v)).multiply(r.transpose());
    double[] solved = new LUDecomposition(middle).getSolver().getInverse().operate(gap);
    double sum = 0;
    for (int i = 0; i < gap.length; i++) {
      sum += gap[i] * solved[i];
    }
    return sum / gap.length;
  }

  /** The long way: the restricted fit, residuals times weights, a new response, a new fit. */
  @Test
  void aDrawIsAFitToWeightedResiduals() {
    SplittableRandom random = new SplittableRandom(112);
    for (int groups : new int[] {8, 15}) {
      double[][] rows = few(random, groups, 7, 4);
      ArrayDesign design = design(rows, groups, 7);
      LinearFit fit = LeastSquares.fit(design);
      GroupProducts products = GroupProducts.of(design, fit);
      double[][] v = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED).matrix();
      double[] values = {1.2};
      double observed = wald(ONE, values, fit.coefficients(), v);
      int draws = 199;
      int extreme = 0;
      for (int d = 0; d < draws; d++) {
        extreme += drawn(rows, groups, values[0], d) >= observed * (1 - 1e-9) ? 1 : 0;
      }
      WildBootstrap test = WildBootstrap.test(products, ONE, values, draws, 33);
      assertThat(test.p()).isCloseTo((1 + extreme) / 200.0, within(1e-15));
      assertThat(test.sixPoint()).isEqualTo(groups == 8);
      assertThat(test.draws()).isEqualTo(draws);
    }
  }

  /** Imposes b1 + b2 = value by putting value − b1 for b2. */
  private static double drawn(double[][] rows, int groups, double value, int draw) {
    int n = rows[0].length;
    double[][] less = {rows[0], new double[n], rows[3], new double[n]};
    for (int i = 0; i < n; i++) {
      less[1][i] = rows[1][i] - rows[2][i];
      less[3][i] = rows[4][i] - value * rows[2][i];
    }
    ArrayDesign restricted =
        RandomDesigns.design(List.of("one", "a", "c"), less, Groups.ofSingleRows(n));
    LinearFit fit = LeastSquares.fit(restricted);
    double[] residuals = LeastSquares.residuals(restricted, fit);
    DrawStream stream = new DrawStream(33, draw, 2);
    double[][] again = {rows[0], rows[1], rows[2], rows[3], rows[4].clone()};
    double weight = 0;
    for (int i = 0; i < n; i++) {
      if (i % 7 == 0) {
        weight =
            groups < 12
                ? new double[] {
                      -Math.sqrt(1.5), -1, -Math.sqrt(.5), Math.sqrt(.5), 1, Math.sqrt(1.5)
                    }
                    [stream.below(6)]
                : 2 * stream.below(2) - 1;
      }
      again[4][i] += (weight - 1) * residuals[i];
    }
    ArrayDesign design = design(again, groups, 7);
    LinearFit free = LeastSquares.fit(design);
    double[][] v = Covariance.estimate(design, free, Covariance.Kind.CLUSTERED).matrix();
    return wald(ONE, new double[] {value}, free.coefficients(), v);
  }

  /** One, three regressors that vary mostly between groups, a response with group effects. */
  private static double[][] few(SplittableRandom random, int groups, int size, int columns) {
    double[][] rows = new double[columns + 1][groups * size];
    for (int g = 0; g < groups; g++) {
      double effect = normal(random);
      double[] level = new double[columns];
      for (int k = 1; k < columns; k++) {
        level[k] = normal(random);
      }
      for (int i = g * size; i < (g + 1) * size; i++) {
        rows[0][i] = 1;
        rows[columns][i] = effect + normal(random);
        for (int k = 1; k < columns; k++) {
          rows[k][i] = level[k] + .5 * normal(random);
          rows[columns][i] += .6 * rows[k][i];
        }
      }
    }
    return rows;
  }

  private static double normal(SplittableRandom random) {
    return Math.sqrt(-2 * Math.log(1 - random.nextDouble()))
        * Math.cos(2 * Math.PI * random.nextDouble());
  }

  private static ArrayDesign design(double[][] rows, int groups, int size) {
    int[] starts = new int[groups];
    for (int g = 0; g < groups; g++) {
      starts[g] = g * size;
    }
    return RandomDesigns.design(
        List.of("one", "a", "b", "c").subList(0, rows.length - 1),
        rows,
        Groups.startingAt(groups * size, starts));
  }

  /**
   * Ten groups, the null b1 + b2 = 1.2 true: at the nominal 5 % the wild bootstrap rejects in 3 to
   * 7 % of 2,000 samples (its own binomial error is .5 %), where t with G − 1 degrees of freedom
   * rejects in more.
   */
  @Test
  @Tag("slow")
  void sizeIsRightWithTenGroups() {
    SplittableRandom random = new SplittableRandom(113);
    int rejected = 0;
    int byStudent = 0;
    double critical = Math.pow(2.262157, 2); // t, 9 degrees of freedom, 97.5 %
    for (int sample = 0; sample < 2000; sample++) {
      ArrayDesign design = design(few(random, 10, 8, 4), 10, 8);
      LinearFit fit = LeastSquares.fit(design);
      WildBootstrap test =
          WildBootstrap.test(GroupProducts.of(design, fit), ONE, new double[] {1.2}, 399, sample);
      rejected += test.p() <= .05 ? 1 : 0;
      byStudent += test.statistic() > critical ? 1 : 0;
    }
    assertThat(rejected / 2000.0).isBetween(.03, .07);
    assertThat(byStudent).isGreaterThan(rejected);
  }

  @Test
  void powerWhereTheNullIsFarOff() {
    ArrayDesign design = design(few(new SplittableRandom(114), 20, 8, 4), 20, 8);
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    assertThat(WildBootstrap.test(products, ONE, new double[] {5}, 999, 1).p()).isLessThan(.01);
  }

  @Test
  void moreRestrictionsThanGroupsHaveNoOutcome() {
    ArrayDesign design = design(few(new SplittableRandom(115), 2, 9, 4), 2, 9);
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    WildBootstrap test = WildBootstrap.test(products, TWO, new double[] {1, 0}, 99, 1);
    assertThat(test.statistic()).isNaN();
    assertThat(test.p()).isNaN();
  }

  @Test
  void digitsDoNotDependOnTheNumberOfThreads() throws ExecutionException, InterruptedException {
    ArrayDesign design = design(few(new SplittableRandom(116), 14, 9, 4), 14, 9);
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    WildBootstrap one = withThreads(1, products);
    assertThat(withThreads(2, products)).isEqualTo(one);
    assertThat(withThreads(5, products)).isEqualTo(one);
  }

  private static WildBootstrap withThreads(int threads, GroupProducts products)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(() -> WildBootstrap.test(products, TWO, new double[] {1.2, .6}, 499, 8))
          .get();
    } finally {
      pool.shutdown();
    }
  }
}

package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.VarianceComponents.Method;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.apache.commons.math3.distribution.MultivariateNormalDistribution;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Variances of random effects against what they are defined by. (Against R, and against the
 * published table of the US states: {@code PanelEstimatorsTest}, {@code UsStatesTest}.)
 */
class VarianceComponentsTest {

  private static final Groups UNEQUAL = Groups.startingAt(15, new int[] {0, 4, 5, 8, 13});

  /** A constant, a regressor, and y with the effect of each group. */
  private static ArrayDesign drawn(Groups groups, double spread, RandomGenerator random) {
    int rows = groups.rows();
    double[][] x = new double[2][rows];
    double[] y = new double[rows];
    Arrays.fill(x[0], 1);
    for (int g = 0; g < groups.count(); g++) {
      double effect = spread * random.nextGaussian();
      double size = random.nextGaussian();
      for (int i = groups.start(g); i < groups.end(g); i++) {
        x[1][i] = size + random.nextGaussian();
        y[i] = 2 + .5 * x[1][i] + effect + random.nextGaussian();
      }
    }
    return ArrayDesign.of(List.of("constant", "x"), x, y, groups);
  }

  /** Groups of 1 to 9 rows. */
  private static Groups many(int groups) {
    int[] starts = new int[groups];
    for (int g = 1; g < groups; g++) {
      starts[g] = starts[g - 1] + 1 + (g * 7) % 9;
    }
    return Groups.startingAt(starts[groups - 1] + 3, starts);
  }

  /** With 20,000 groups of unequal size σ²_u = .49 and σ²_e = 1 are met to some two percent. */
  @ParameterizedTest
  @EnumSource(Method.class)
  void theTruthIsFoundInManyGroups(Method method) {
    ArrayDesign design = drawn(many(20_000), .7, new SplittableRandom(81));
    VarianceComponents components = VarianceComponents.estimate(design, method);
    // standard errors: some √(2/80,000) of σ²_e and √(2/20,000) (σ²_u + σ²_e/T) of σ²_u
    assertThat(components.row()).isCloseTo(1, within(.02));
    assertThat(components.group()).isCloseTo(.49, within(.04));
  }

  /**
   * On a regressor held fixed, the mean of each estimate over many draws of the errors is the
   * truth: Swamy and Arora's, and with unequal groups the others', are unbiased before negative
   * ones are set to zero (Baltagi and Chang 1994). With groups this few, an estimate that used the
   * wrong traces would be off by tens of percent.
   */
  @ParameterizedTest
  @EnumSource(Method.class)
  void unequalGroupsAreUnbiased(Method method) {
    int draws = 20_000;
    RandomGenerator random = new SplittableRandom(82);
    double[][] fixed = RandomDesigns.rows(drawn(UNEQUAL, 0, random));
    double row = 0;
    double group = 0;
    for (int d = 0; d < draws; d++) {
      double[] y = new double[15];
      for (int g = 0; g < UNEQUAL.count(); g++) {
        double effect = 3 * random.nextGaussian();
        for (int i = UNEQUAL.start(g); i < UNEQUAL.end(g); i++) {
          y[i] = effect + random.nextGaussian();
        }
      }
      VarianceComponents components =
          VarianceComponents.estimate(
              ArrayDesign.of(
                  List.of("constant", "x"), new double[][] {fixed[0], fixed[1]}, y, UNEQUAL),
              method);
      row += components.row() / draws;
      group += components.group() / draws;
    }
    // σ²_u = 9 is far from zero, so next to none is negative; the mean of 20,000 draws of a
    // variance
    // with 3 to 4 degrees of freedom is known to √(2/3/20,000) ≈ .6 percent, of which three are
    // asked.
    assertThat(row).isCloseTo(1, within(.02));
    assertThat(group).isCloseTo(9, within(.2));
  }

  /** Means that differ less than the errors of their rows let expect: zero, and said. */
  @ParameterizedTest
  @EnumSource(Method.class)
  void aNegativeVarianceIsSetToZeroAndSaid(Method method) {
    for (int[] starts : new int[][] {{0, 3, 6, 9, 12}, {0, 4, 6, 9, 12}}) {
      Groups groups = Groups.startingAt(15, starts);
      double[][] rows = RandomDesigns.rows(drawn(groups, 0, new SplittableRandom(83)));
      double[] y = rows[2].clone();
      for (int g = 0; g < groups.count(); g++) {
        double mean = Arrays.stream(y, groups.start(g), groups.end(g)).average().orElseThrow();
        double x = Arrays.stream(rows[1], groups.start(g), groups.end(g)).average().orElseThrow();
        for (int i = groups.start(g); i < groups.end(g); i++) {
          y[i] += .5 * x - mean;
        }
      }
      ArrayDesign design =
          ArrayDesign.of(List.of("constant", "x"), new double[][] {rows[0], rows[1]}, y, groups);
      VarianceComponents components = VarianceComponents.estimate(design, method);
      assertThat(components.truncated()).isTrue();
      assertThat(components.group()).isZero();
      assertThat(components.row()).isPositive();
      assertThat(components.share(3)).isZero();
      assertThat(components.shrinkage(3)).isZero();
    }
  }

  @Test
  void withoutDegreesOfFreedomThereIsNone() {
    ArrayDesign singles = drawn(Groups.ofSingleRows(12), 1, new SplittableRandom(84));
    assertThat(VarianceComponents.estimate(singles, Method.SWAMY_ARORA).row()).isNaN();
    ArrayDesign two = drawn(Groups.startingAt(12, new int[] {0, 6}), 1, new SplittableRandom(85));
    VarianceComponents components = VarianceComponents.estimate(two, Method.SWAMY_ARORA);
    assertThat(components.row()).isPositive();
    assertThat(components.group()).isNaN();
  }

  /**
   * Generalised least squares by partial deviations is that of the dense covariance Ω: the same
   * coefficients, the same cross-product, and the log-likelihood of a normal law.
   */
  @Test
  void partialDeviationsAreGeneralisedLeastSquares() {
    ArrayDesign design = drawn(UNEQUAL, 2, new SplittableRandom(86));
    VarianceComponents components = new VarianceComponents(Method.SWAMY_ARORA, 1.3, 2.1, false);
    double[] shares = components.shares(UNEQUAL);
    LinearFit fit = LeastSquares.fit(Effects.partlyWithin(design, shares));
    double[][] rows = RandomDesigns.rows(design);
    RealMatrix omega = new Array2DRowRealMatrix(15, 15);
    for (int i = 0; i < 15; i++) {
      for (int j = 0; j < 15; j++) {
        double same = UNEQUAL.of(i) == UNEQUAL.of(j) ? components.group() : 0;
        omega.setEntry(i, j, same + (i == j ? components.row() : 0));
      }
    }
    RealMatrix inverse = new LUDecomposition(omega).getSolver().getInverse();
    RealMatrix x = new Array2DRowRealMatrix(new double[][] {rows[0], rows[1]}).transpose();
    RealMatrix crossed = x.transpose().multiply(inverse).multiply(x);
    RealMatrix solved = new LUDecomposition(crossed).getSolver().getInverse();
    double[] beta = solved.multiply(x.transpose()).multiply(inverse).operate(rows[2]);
    for (int k = 0; k < 2; k++) {
      assertThat(fit.coefficients()[k]).isCloseTo(beta[k], within(1e-12));
      assertThat(components.row() * fit.inverseCrossProduct()[k][k])
          .isCloseTo(solved.getEntry(k, k), within(1e-12));
    }
    // The likelihood at those shares is greatest with σ²_e = SSR/N.
    double scale = fit.ssr() / 15 / components.row();
    double[] mean = x.operate(beta);
    double logDensity =
        Math.log(
            new MultivariateNormalDistribution(mean, omega.scalarMultiply(scale).getData())
                .density(rows[2]));
    FitStatistics statistics = FitStatistics.ofPartlyWithin(fit, shares);
    assertThat(statistics.logLikelihood()).isCloseTo(logDensity, within(1e-10));
    assertThat(statistics.parameters()).isEqualTo(4);
    assertThat(statistics.aic()).isCloseTo(8 - 2 * logDensity, within(1e-9));
  }
}

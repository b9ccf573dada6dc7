package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CesTest extends TechnologyContract {

  private static final List<String> TWO = List.of("labour", "machines");
  private static final double[] ONES = {1, 1};
  private static final double[] SHARES = {0.4, 0.6};

  @Override
  List<Technology> technologies() {
    List<String> three = List.of("labour", "machines", "energy");
    double[] base = {41000, 20500, 1e-3};
    double[] shares = {0.5, 0.3, 0.2};
    return List.of(
        Ces.of(TWO, new double[] {41000, 20500}, 0.1, SHARES, 0.8, 1.02),
        Ces.of(three, base, -2, shares, -0.6, 0.9),
        Ces.of(three, base, 0, shares, 0, 1.1),
        Ces.of(three, base, 0, shares, 1e-6, 1.1),
        Ces.of(three, base, 0, shares, -1, 1),
        Ces.of(TWO, ONES, 0, SHARES, 9, 1.3),
        RandomTechnologies.ces(new Random(3), 4, 2.5));
  }

  @Override
  double curvature(Technology technology) {
    return Math.abs(((Ces) technology).rho());
  }

  @Test
  void parametersInOrder() {
    Ces ces = Ces.of(TWO, ONES, 0.1, SHARES, 0.8, 1.02);
    assertThat(ces.parameterNames())
        .containsExactly("constant", "share:labour", "share:machines", "rho", "scale");
    assertThat(ces.parameters()).containsExactly(0.1, 0.4, 0.6, 0.8, 1.02);
    assertThat(ces.shares()).containsExactly(0.4, 0.6);
    assertThat(ces.rho()).isEqualTo(0.8);
    assertThat(ces.scale()).isEqualTo(1.02);
    assertThat(ces.substitution()).isEqualTo(1 / 1.8);
  }

  @Test
  void sharesAreDividedByTheirSum() {
    Ces ces = Ces.of(TWO, ONES, 0.1, SHARES, 0.8, 1.02);
    double[] shares = ces.withParameters(new double[] {0.1, 0.5, 0.6, 0.8, 1.02}).shares();
    assertThat(shares[0]).isCloseTo(5 / 11.0, within(1e-16));
    assertThat(shares[1]).isCloseTo(6 / 11.0, within(1e-16));
  }

  /** The gradient of a function that does not change when all shares are multiplied. */
  @Test
  void shareGradientWeightedBySharesIsZero() {
    Random random = new Random(2);
    for (int k = 0; k < 2000; k++) {
      int n = 2 + random.nextInt(3);
      Ces ces = RandomTechnologies.ces(random, n, -1 + 8 * random.nextDouble());
      double[] gradient = new double[n + 3];
      ces.parameterGradient(RandomTechnologies.logInputs(random, ces, 1), gradient);
      double[] shares = ces.shares();
      double sum = 0;
      double size = 0;
      for (int i = 0; i < n; i++) {
        sum += gradient[1 + i] * shares[i];
        size += Math.abs(gradient[1 + i] * shares[i]);
      }
      assertThat(sum).isCloseTo(0, within(1e-13 * Math.max(1, size)));
    }
  }

  @Test
  void userValuesOutsideTheRegionAreRefusedWithValueAndRemedy() {
    refused(() -> Ces.of(TWO, ONES, 0, new double[] {-0.4, 1.4}, 0.8, 1), "labour", "-0.4");
    refused(() -> Ces.of(TWO, ONES, 0, new double[] {0.4, 0.5}, 0.8, 1), "sum", "0.9");
    refused(() -> Ces.of(TWO, ONES, 0, SHARES, -1.1, 1), "rho", "-1.1");
    refused(() -> Ces.of(TWO, ONES, 0, SHARES, Double.NaN, 1), "rho", "NaN");
    refused(() -> Ces.of(TWO, ONES, 0, SHARES, 1, 0), "scale", "0.0");
    refused(() -> Ces.of(TWO, ONES, Double.NaN, SHARES, 1, 1), "constant", "NaN");
    refused(() -> Ces.of(TWO, ONES, 0, new double[] {1}, 1, 1), "shares", "2");
  }

  private static void refused(Runnable attempt, String what, String value) {
    assertThatThrownBy(attempt::run)
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining(what)
        .hasMessageContaining(value);
  }

  @Test
  void slightlyOutsideTheRegionIsComputedAsTheFormulaHasIt() {
    Ces ces = Ces.of(TWO, ONES, 0, SHARES, -1, 1);
    Technology outside = ces.withParameters(new double[] {0, 0.4, 0.6, -1.2, 1});
    double x = 2;
    double y = 0.7;
    double direct = Math.pow(0.4 * Math.pow(x, 1.2) + 0.6 * Math.pow(y, 1.2), 1 / 1.2);
    assertThat(outside.output(new double[] {x, y})).isCloseTo(direct, within(1e-14));
    Technology negativeShare = ces.withParameters(new double[] {0, -0.01, 1.01, -1, 1});
    assertThat(negativeShare.output(new double[] {x, y}))
        .isCloseTo(1.01 * y - 0.01 * x, within(1e-14));
  }

  @Test
  void linearTechnologyNeedsNoMoreThanOneInput() {
    Technology linear = Ces.of(TWO, ONES, Math.log(2), new double[] {0.5, 0.5}, -1, 1);
    assertThat(linear.output(new double[] {3, 4})).isCloseTo(7, within(1e-14));
    assertThat(linear.output(new double[] {0, 4})).isCloseTo(4, within(1e-14));
    assertThat(linear.output(new double[] {3, 0})).isCloseTo(3, within(1e-14));
    Technology cobbDouglas = Ces.of(TWO, ONES, 0, SHARES, 0, 1);
    assertThat(cobbDouglas.output(new double[] {0, 4})).isZero();
    assertThat(cobbDouglas.output(new double[] {4, 0})).isZero();
    assertThat(Ces.of(TWO, ONES, 0, SHARES, 2, 1).output(new double[] {0, 4})).isZero();
  }

  /** min(4 L, 7 K): base of 1/4 and 1/7. */
  @Test
  void leontiefIsTheScarcestInput() {
    double[] base = {0.25, 1 / 7.0};
    Technology leontief = Ces.of(TWO, base, 0, SHARES, Double.POSITIVE_INFINITY, 1);
    assertThat(leontief.output(new double[] {5, 2})).isCloseTo(14, within(1e-13));
    assertThat(leontief.output(new double[] {3, 2})).isCloseTo(12, within(1e-13));
    double[] e = new double[2];
    leontief.logGradient(new double[] {Math.log(3), Math.log(2)}, e);
    assertThat(e).containsExactly(1, 0);
    double[][] h = new double[2][2];
    leontief.logHessian(new double[] {Math.log(3), Math.log(2)}, h);
    assertThat(h).isDeepEqualTo(new double[2][2]);
    double[] gradient = new double[5];
    leontief.parameterGradient(new double[] {Math.log(3), Math.log(2)}, gradient);
    assertThat(gradient[1]).isZero();
    assertThat(gradient[2]).isZero();
    assertThat(gradient[3]).isZero();
  }

  @Test
  void onTheRidgeLeontiefSplitsByShares() {
    Technology leontief = Ces.of(TWO, ONES, 0, SHARES, Double.POSITIVE_INFINITY, 2);
    double[] e = new double[2];
    leontief.logGradient(new double[] {1.5, 1.5}, e);
    assertThat(e[0]).isCloseTo(0.8, within(1e-15));
    assertThat(e[1]).isCloseTo(1.2, within(1e-15));
    double[][] h = new double[2][2];
    leontief.logHessian(new double[] {1.5, 1.5}, h);
    assertThat(h[0]).containsExactly(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
    assertThat(h[1]).containsExactly(Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY);
  }

  /** ln f differs from Leontief's by at most ln(1/smallest share) ν/ρ. */
  @Test
  void risingCurvatureTendsToLeontief() {
    Random random = new Random(4);
    for (int k = 0; k < 500; k++) {
      Ces limit = RandomTechnologies.ces(random, 3, Double.POSITIVE_INFINITY);
      double[] z = RandomTechnologies.logInputs(random, limit, 1);
      double least = Arrays.stream(limit.shares()).min().orElseThrow();
      for (double rho : new double[] {10, 1e3, 1e6, 1e12}) {
        double[] parameters = limit.parameters();
        parameters[4] = rho;
        double gap = limit.withParameters(parameters).logOutput(z) - limit.logOutput(z);
        assertThat(gap).isBetween(-1e-13, limit.scale() * Math.log(1 / least) / rho + 1e-13);
      }
    }
  }

  /** A base is a choice of words, not of technology. */
  @Test
  void anotherBaseIsTheSameTechnology() {
    Random random = new Random(6);
    for (int k = 0; k < 500; k++) {
      int n = 2 + random.nextInt(3);
      Ces ces = RandomTechnologies.ces(random, n, -1 + 3 * random.nextDouble());
      double[] other = ces.base();
      for (int i = 0; i < n; i++) {
        other[i] *= Math.exp(0.5 * random.nextGaussian());
      }
      Ces restated = ces.rebased(other);
      double[] z = RandomTechnologies.logInputs(random, ces, 1);
      assertThat(restated.base()).containsExactly(other);
      assertThat(restated.logOutput(z)).isCloseTo(ces.logOutput(z), within(1e-12));
    }
  }

  @Test
  void leontiefCannotBeRestatedAtAnotherBase() {
    Ces leontief = Ces.of(TWO, ONES, 0, SHARES, Double.POSITIVE_INFINITY, 1);
    refused(() -> leontief.rebased(new double[] {1, 2}), "machines", "0.0");
  }
}

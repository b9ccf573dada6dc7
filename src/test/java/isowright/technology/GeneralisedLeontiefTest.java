package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class GeneralisedLeontiefTest extends TechnologyContract {

  private static final List<String> TWO = List.of("labour", "machines");
  private static final List<String> THREE = List.of("labour", "machines", "energy");
  private static final double[] ONES = {1, 1, 1};

  @Override
  List<Technology> technologies() {
    return List.of(
        GeneralisedLeontief.of(
            TWO, new double[] {41000, 20500}, 1, new double[] {0.3, 0.2, 0.3}, 1),
        GeneralisedLeontief.of(TWO, new double[] {1, 3}, 1, new double[] {0.6, -0.05, 0.5}, 1.2),
        RandomTechnologies.generalisedLeontief(new Random(1), 3),
        RandomTechnologies.generalisedLeontief(new Random(2), 4));
  }

  @Override
  double curvature(Technology technology) {
    return 1;
  }

  @Test
  void parametersInOrder() {
    Technology technology =
        GeneralisedLeontief.of(THREE, ONES, 0.5, new double[] {0.2, 0.1, 0.05, 0.1, 0.1, 0.2}, 0.9);
    assertThat(technology.parameterNames())
        .containsExactly(
            "constant",
            "weight:labour",
            "weight:labour*machines",
            "weight:labour*energy",
            "weight:machines",
            "weight:machines*energy",
            "weight:energy",
            "scale");
    assertThat(technology.parameters()).containsExactly(0.5, 0.2, 0.1, 0.05, 0.1, 0.1, 0.2, 0.9);
  }

  /** ΣΣ b_ij √(x_i x_j) with every cross term counted twice, by roots. */
  @Test
  void valueByTheDefinition() {
    Technology technology =
        GeneralisedLeontief.of(THREE, ONES, 0, new double[] {0.2, 0.1, 0.05, 0.1, 0.1, 0.2}, 0.9);
    double direct =
        0.2 * 2
            + 0.1 * 3
            + 0.2 * 5
            + 2 * (0.1 * Math.sqrt(6) + 0.05 * Math.sqrt(10) + 0.1 * Math.sqrt(15));
    assertThat(technology.output(new double[] {2, 3, 5}))
        .isCloseTo(Math.pow(direct, 0.9), within(1e-14 * direct));
  }

  @Test
  void withoutCrossTermsItIsLinear() {
    Random random = new Random(3);
    Technology found =
        GeneralisedLeontief.of(THREE, ONES, 0.2, new double[] {0.5, 0, 0, 0.3, 0, 0.2}, 1.3);
    Technology linear = Ces.of(THREE, ONES, 0.2, new double[] {0.5, 0.3, 0.2}, -1, 1.3);
    same(random, found, linear);
  }

  /** b_ij = δ_i δ_j makes S the square of Σ δ_i √x_i. */
  @Test
  void withProductsOfSharesItIsCesOfElasticityTwo() {
    Random random = new Random(4);
    double[] d = {0.5, 0.3, 0.2};
    double[] weights = {
      d[0] * d[0], d[0] * d[1], d[0] * d[2], d[1] * d[1], d[1] * d[2], d[2] * d[2]
    };
    same(
        random,
        GeneralisedLeontief.of(THREE, ONES, -1, weights, 0.8),
        Ces.of(THREE, ONES, -1, d, -0.5, 0.8));
  }

  private static void same(Random random, Technology found, Technology expected) {
    for (int k = 0; k < 300; k++) {
      double[] z = RandomTechnologies.logInputs(random, found, 1);
      assertThat(found.logOutput(z)).isCloseTo(expected.logOutput(z), within(1e-14 * 5));
      double[] e = new double[3];
      double[] other = new double[3];
      found.logGradient(z, e);
      expected.logGradient(z, other);
      double[][] h = new double[3][3];
      double[][] second = new double[3][3];
      found.logHessian(z, h);
      expected.logHessian(z, second);
      for (int i = 0; i < 3; i++) {
        assertThat(e[i]).isCloseTo(other[i], within(1e-14));
        for (int j = 0; j < 3; j++) {
          assertThat(h[i][j]).isCloseTo(second[i][j], within(1e-14));
        }
      }
    }
  }

  @Test
  void nonNegativeWeightsAreRegularEverywhere() {
    Random random = new Random(5);
    for (int k = 0; k < 500; k++) {
      int n = 2 + random.nextInt(3);
      double[] weights = random.doubles(n * (n + 1) / 2).toArray();
      double sum = 0;
      for (int i = 0; i < n; i++) {
        for (int j = i; j < n; j++) {
          sum += (i == j ? 1 : 2) * weights[GeneralisedLeontief.place(n, i, j)];
        }
      }
      for (int w = 0; w < weights.length; w++) {
        weights[w] /= sum;
      }
      double[] base = RandomTechnologies.base(random, n);
      Technology technology =
          GeneralisedLeontief.of(RandomTechnologies.inputs(n), base, 0, weights, 1);
      double[] z = RandomTechnologies.logInputs(random, technology, 2);
      assertThat(Regularity.at(technology, z).regular()).isTrue();
    }
  }

  /** √(L K) taken away from L + K: far from the diagonal more of the scarce input lowers output. */
  @Test
  void whereThereIsNoOutputNothingIsANumberAndNothingIsRegular() {
    Technology technology =
        GeneralisedLeontief.of(TWO, new double[] {1, 1}, 0, new double[] {-1, 1.5, -1}, 1);
    double[] far = {0, 5};
    assertThat(technology.logOutput(far)).isNaN();
    assertThat(Regularity.at(technology, far).monotone()).isFalse();
    assertThat(Regularity.at(technology, far).quasiConcave()).isFalse();
    assertThat(Regularity.at(technology, new double[] {0, 0.1}).regular()).isTrue();
  }

  @Test
  void inadmissibleValuesAreRefusedByName() {
    double[] weights = {0.3, 0.2, 0.3};
    double[] base = {1, 1};
    refused(() -> GeneralisedLeontief.of(TWO, base, 0, new double[] {0.3, 0.2, 0.4}, 1), "sum");
    refused(() -> GeneralisedLeontief.of(TWO, base, 0, weights, -1), "scale is -1");
    refused(() -> GeneralisedLeontief.of(TWO, base, Double.NaN, weights, 1), "constant");
    refused(() -> GeneralisedLeontief.of(TWO, base, 0, new double[] {1}, 1), "weights");
  }

  private static void refused(Runnable attempt, String what) {
    assertThatThrownBy(attempt::run)
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining(what);
  }
}

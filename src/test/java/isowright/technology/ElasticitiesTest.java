package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Forms whose elasticities are known beforehand, and mixes at which there are none. */
class ElasticitiesTest {

  private static final int DRAWS = 2000;

  @Test
  void allMeasuresOfConstantElasticityAreOneOverOnePlusRho() {
    Random random = new Random(7);
    for (int k = 0; k < DRAWS; k++) {
      double rho =
          k % 3 == 0 ? 1e-4 * random.nextGaussian() : Math.pow(10, 3 * random.nextDouble() - 1) - 1;
      Ces ces = RandomTechnologies.ces(random, 2 + random.nextInt(3), rho);
      Elasticities found = Elasticities.at(ces, RandomTechnologies.logInputs(random, ces, 0.5));
      double sigma = 1 / (1 + rho);
      for (int i = 0; i < ces.dimension(); i++) {
        for (int j = 0; j < ces.dimension(); j++) {
          if (i != j) {
            // Whatever the shares, down to 1e−100: the scaling keeps every digit.
            assertThat(found.allen(i, j)).isCloseTo(sigma, within(1e-12 * sigma));
            assertThat(found.morishima(i, j)).isCloseTo(sigma, within(1e-12 * sigma));
            assertThat(found.hicks(i, j)).isCloseTo(sigma, within(1e-12 * sigma));
          }
        }
      }
    }
  }

  @Test
  void allMeasuresOfCobbDouglasAreOne() {
    Random random = new Random(8);
    for (int k = 0; k < DRAWS; k++) {
      Technology technology = RandomTechnologies.cobbDouglas(random, 2 + random.nextInt(3));
      Elasticities found =
          Elasticities.at(technology, RandomTechnologies.logInputs(random, technology, 2));
      for (int i = 0; i < technology.dimension(); i++) {
        for (int j = 0; j < technology.dimension(); j++) {
          if (i != j) {
            assertThat(found.allen(i, j)).isCloseTo(1, within(1e-13));
            assertThat(found.morishima(i, j)).isCloseTo(1, within(1e-13));
            assertThat(found.hicks(i, j)).isCloseTo(1, within(1e-13));
          }
        }
        // ε_ii = s_i − 1.
        assertThat(found.demand(i, i)).isCloseTo(found.share(i) - 1, within(1e-13));
      }
    }
  }

  @Test
  void constantElasticityTendsToCobbDouglas() {
    Random random = new Random(9);
    for (int k = 0; k < 500; k++) {
      int n = 2 + random.nextInt(3);
      Ces ces = RandomTechnologies.ces(random, n, 0);
      double[] beta = ces.shares();
      for (int i = 0; i < n; i++) {
        beta[i] *= ces.scale();
      }
      Technology limit = new CobbDouglas(ces.inputs(), ces.base(), ces.constant(), beta);
      double[] z = RandomTechnologies.logInputs(random, ces, 1);
      double[] parameters = ces.parameters();
      for (double rho : new double[] {0, 1e-12, -1e-9, 1e-6}) {
        parameters[n + 1] = rho;
        Technology near = ces.withParameters(parameters);
        // Differences are of first order in ρ: νρ/2 times a variance under 25.
        double room = 25 * Math.abs(rho) + 1e-13;
        assertThat(near.logOutput(z)).isCloseTo(limit.logOutput(z), within(room));
        Elasticities found = Elasticities.at(near, z);
        Elasticities expected = Elasticities.at(limit, z);
        for (int i = 0; i < n; i++) {
          assertThat(found.output(i)).isCloseTo(expected.output(i), within(room));
          assertThat(found.demand(i, 0)).isCloseTo(expected.demand(i, 0), within(room));
        }
      }
    }
  }

  @Test
  void whatDoesNotExistIsNotANumber() {
    List<String> two = List.of("labour", "machines");
    double[] ones = {1, 1};
    double[] half = {0.5, 0.5};
    Technology linear = Ces.of(two, ones, 0, half, -1, 1);
    nothing(Elasticities.atMix(linear, new double[] {2, 3}));
    assertThat(Elasticities.atMix(linear, new double[] {2, 3}).marginalRate(0, 1))
        .isCloseTo(1, within(1e-15));
    Technology leontief = Ces.of(two, ones, 0, half, Double.POSITIVE_INFINITY, 1);
    nothing(Elasticities.atMix(leontief, new double[] {2, 3}));
    nothing(Elasticities.atMix(leontief, new double[] {2, 2}));
    Technology idle = CobbDouglas.of(two, 1, 0, 0);
    nothing(Elasticities.atMix(idle, new double[] {2, 2}));
    nothing(Elasticities.at(linear, new double[] {Double.NaN, 0}));
  }

  private static void nothing(Elasticities found) {
    assertThat(found.substitutionExists()).isFalse();
    assertThat(found.allen(0, 1)).isNaN();
    assertThat(found.morishima(0, 1)).isNaN();
    assertThat(found.demand(1, 1)).isNaN();
    assertThat(found.hicks(0, 1)).isNaN();
  }

  @Test
  void nearlyStraightIsoquantsKeepTheirDigitsInProportion() {
    for (double distance : new double[] {1e-3, 1e-6, 1e-9}) {
      Ces ces =
          Ces.of(
              List.of("a", "b", "c"),
              new double[] {1, 1, 1},
              0,
              new double[] {0.5, 0.3, 0.2},
              distance - 1,
              1);
      Elasticities found = Elasticities.atMix(ces, new double[] {2, 3, 4});
      // 1 + ρ itself carries 1e−16/distance.
      assertThat(found.allen(0, 1) * distance).isCloseTo(1, within(1e-14 / distance));
    }
  }

  @Test
  void tablesAreCopies() {
    Technology technology = CobbDouglas.of(List.of("a", "b"), 0, 0.4, 0.6);
    Elasticities found = Elasticities.atBase(technology);
    found.output()[0] = 9;
    found.allen()[0][1] = 9;
    found.demand()[0][1] = 9;
    found.morishima()[0][1] = 9;
    assertThat(found.output(0)).isEqualTo(0.4);
    assertThat(found.allen()[0][1]).isCloseTo(1, within(1e-14));
    assertThat(found.demand()[0][1]).isCloseTo(0.6, within(1e-14));
    assertThat(found.morishima()[0][1]).isCloseTo(1, within(1e-14));
  }
}

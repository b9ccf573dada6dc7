package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class TranslogTest extends TechnologyContract {

  private static final List<String> TWO = List.of("labour", "machines");
  private static final List<String> THREE = List.of("labour", "machines", "energy");

  @Override
  List<Technology> technologies() {
    return List.of(
        new Translog(TWO, new double[] {1, 1}, 0.2, new double[] {0.55, 0.47, -0.05, 0.05, -0.04}),
        new Translog(TWO, new double[] {41000, 20500}, 3, new double[] {0.4, 0.7, 0.1, -0.2, 0.15}),
        new Translog(
            THREE,
            new double[] {1e-5, 1, 1e8},
            0,
            new double[] {0.3, 0.4, 0.2, -0.05, 0.02, 0.01, -0.03, 0.01, -0.02}),
        RandomTechnologies.translog(new Random(5), 4));
  }

  @Override
  double curvature(Technology technology) {
    return 0;
  }

  @Test
  void secondOrderParametersAreNamedAndPlacedRowByRow() {
    assertThat(Translog.FORM.coefficientNames(THREE))
        .containsExactly(
            "labour",
            "machines",
            "energy",
            "labour*labour",
            "labour*machines",
            "labour*energy",
            "machines*machines",
            "machines*energy",
            "energy*energy");
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        String name = THREE.get(Math.min(i, j)) + "*" + THREE.get(Math.max(i, j));
        assertThat(Translog.FORM.coefficientNames(THREE).get(Translog.place(3, i, j)))
            .isEqualTo(name);
      }
    }
    assertThat(Translog.FORM.secondOrder(3)).containsExactly(3, 4, 5, 6, 7, 8);
  }

  /** ½ β_LL z_L² + β_LK z_L z_K + ½ β_KK z_K² with z = (2, 3): worked by hand. */
  @Test
  void squaresCarryTheHalfAndProductsDoNot() {
    Technology technology =
        new Translog(TWO, new double[] {1, 1}, 1, new double[] {10, 100, 0.1, 0.01, 0.001});
    assertThat(technology.logOutput(new double[] {2, 3}))
        .isCloseTo(1 + 20 + 300 + 0.2 + 0.06 + 0.0045, within(1e-12));
  }

  @Test
  void regressorsTimesCoefficientsAreLogOutput() {
    Random random = new Random(7);
    Translog technology = RandomTechnologies.translog(random, 4);
    double[] parameters = technology.parameters();
    int rows = 50;
    double[][] z = RandomTechnologies.columns(random, 4, rows, 1);
    double[][] regressors = new double[14][rows];
    Translog.FORM.regressors(z, rows, regressors, 0);
    double[] base = technology.base();
    for (int r = 0; r < rows; r++) {
      double sum = parameters[0];
      double[] at = new double[4];
      for (int i = 0; i < 4; i++) {
        at[i] = z[i][r] + Math.log(base[i]);
      }
      for (int k = 0; k < 14; k++) {
        sum += parameters[k + 1] * regressors[k][r];
      }
      assertThat(technology.logOutput(at)).isCloseTo(sum, within(1e-12));
    }
  }

  @Test
  void constantReturnsRestrictionsMakeTheScaleElasticityOneEverywhere() {
    // β sums to one and every row of second-order coefficients to zero.
    double[] coefficients = {0.3, 0.5, 0.2, -0.06, 0.04, 0.02, -0.07, 0.03, -0.05};
    for (double[] row : Translog.FORM.restrictions(Restriction.CONSTANT_RETURNS, THREE)) {
      double sum = 0;
      for (int k = 0; k < coefficients.length; k++) {
        sum += row[k] * coefficients[k];
      }
      assertThat(sum).isCloseTo(row[coefficients.length], within(1e-15));
    }
    Technology technology = new Translog(THREE, new double[] {1, 2, 3}, 0, coefficients);
    Random random = new Random(11);
    for (int k = 0; k < 100; k++) {
      double[] z = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
      assertThat(Elasticities.at(technology, z).scale()).isCloseTo(1, within(1e-14));
    }
  }

  @Test
  void withoutSecondOrderItIsCobbDouglas() {
    Random random = new Random(13);
    for (int k = 0; k < 500; k++) {
      int n = 2 + random.nextInt(3);
      double[] coefficients = new double[n + n * (n + 1) / 2];
      double[] beta = new double[n];
      for (int i = 0; i < n; i++) {
        beta[i] = 0.1 + random.nextDouble();
        coefficients[i] = beta[i];
      }
      double[] base = RandomTechnologies.base(random, n);
      List<String> inputs = RandomTechnologies.inputs(n);
      Technology translog = new Translog(inputs, base, 0.7, coefficients);
      Technology cobbDouglas = new CobbDouglas(inputs, base, 0.7, beta);
      double[] z = RandomTechnologies.logInputs(random, translog, 1);
      assertThat(translog.logOutput(z)).isCloseTo(cobbDouglas.logOutput(z), within(1e-13));
      assertThat(Elasticities.at(translog, z).allen())
          .isDeepEqualTo(Elasticities.at(cobbDouglas, z).allen());
    }
  }

  /**
   * The translog with β = νδ and β_ij = −ρν(δ_i [i = j] − δ_i δ_j) is the second-order expansion of
   * CES at its base (for two inputs Kmenta 1967, <i>International Economic Review</i> 8, 180–189),
   * so value, gradient and Hessian agree there, and nearby the difference falls with the cube of
   * the distance.
   */
  @Test
  void secondOrderExpansionOfConstantElasticity() {
    Random random = new Random(17);
    for (int k = 0; k < 500; k++) {
      Ces ces =
          RandomTechnologies.ces(random, 2 + random.nextInt(3), -0.9 + 3 * random.nextDouble());
      int n = ces.dimension();
      double[] delta = ces.shares();
      double[] coefficients = new double[n + n * (n + 1) / 2];
      for (int i = 0; i < n; i++) {
        coefficients[i] = ces.scale() * delta[i];
        for (int j = i; j < n; j++) {
          coefficients[Translog.place(n, i, j)] =
              -ces.rho() * ces.scale() * ((i == j ? delta[i] : 0) - delta[i] * delta[j]);
        }
      }
      Technology translog = new Translog(ces.inputs(), ces.base(), ces.constant(), coefficients);
      double[] origin = RandomTechnologies.logInputs(random, ces, 0);
      Elasticities expected = Elasticities.at(ces, origin);
      Elasticities found = Elasticities.at(translog, origin);
      for (int i = 0; i < n; i++) {
        assertThat(found.output(i)).isCloseTo(expected.output(i), within(1e-12));
        for (int j = 0; j < n; j++) {
          assertThat(found.demand(i, j)).isCloseTo(expected.demand(i, j), within(1e-10));
        }
      }
      double[] nearby = RandomTechnologies.logInputs(random, ces, 0.1);
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (int i = 0; i < n; i++) {
        low = Math.min(low, nearby[i] - origin[i]);
        high = Math.max(high, nearby[i] - origin[i]);
      }
      // The third derivative of ln f in direction v is νρ² times the third cumulant of v, which for
      // values r apart is at most r³/(6√3); 1e−13 is rounding of logs up to 21.
      double third = ces.scale() * Math.pow(ces.rho(), 2) * Math.pow(high - low, 3);
      assertThat(translog.logOutput(nearby))
          .isCloseTo(ces.logOutput(nearby), within(third / (36 * Math.sqrt(3)) + 1e-13));
    }
  }
}

package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealVector;
import org.junit.jupiter.api.Test;

/** Laws that hold for every form, on two thousand technologies and mixes drawn at random. */
class ElasticityLawsTest {

  private static final int DRAWS = 2000;

  /**
   * How far laws may be missed, relative to the largest elasticity at hand. Draws are kept only
   * where that is under {@link #LARGEST}: then the bordered Hessian is no nearer to singular than
   * 1e−3 or so, and rounding of logs (1e−14 at inputs of 1e9) is amplified by less than 1e4.
   */
  private static final double LAW = 1e-10;

  private static final double LARGEST = 200;

  private interface Law {
    void of(Technology technology, double[] z, Elasticities elasticities);
  }

  /** At regular mixes of random technologies. */
  private static void everywhere(long seed, Law law) {
    Random random = new Random(seed);
    int kept = 0;
    for (int k = 0; k < DRAWS; k++) {
      Technology technology = RandomTechnologies.any(random);
      double[] z = RandomTechnologies.logInputs(random, technology, 0.5);
      Elasticities elasticities = Elasticities.at(technology, z);
      if (Regularity.at(technology, z).regular() && largest(elasticities.allen()) < LARGEST) {
        law.of(technology, z, elasticities);
        kept++;
      }
    }
    assertThat(kept).isGreaterThan(DRAWS / 2);
  }

  private static double largest(double[][] table) {
    return Arrays.stream(table).flatMapToDouble(Arrays::stream).map(Math::abs).max().orElseThrow();
  }

  @Test
  void eulersTheoremForHomogeneousForms() {
    everywhere(
        1,
        (technology, z, found) -> {
          if (technology instanceof Translog) {
            return;
          }
          double degree =
              technology instanceof CobbDouglas cobbDouglas
                  ? Arrays.stream(cobbDouglas.coefficients()).sum()
                  : technology.parameters()[technology.parameters().length - 1];
          assertThat(found.scale()).isCloseTo(degree, within(1e-14 * degree));
          double[] x = Arrays.stream(z).map(Math::exp).toArray();
          double[] gradient = technology.gradient(x);
          double sum = 0;
          for (int i = 0; i < x.length; i++) {
            sum += gradient[i] * x[i];
          }
          double output = technology.output(x);
          assertThat(sum / output).isCloseTo(degree, within(1e-12));
        });
  }

  @Test
  void scaleIsTheSlopeAlongARay() {
    everywhere(
        2,
        (technology, z, found) -> {
          double[] along = {0};
          double slope =
              TechnologyContract.derivative(
                  s -> technology.logOutput(Arrays.stream(z).map(zi -> zi + s[0]).toArray()),
                  along,
                  0,
                  1e-3);
          // Rounding of ln f, of size up to 20, over the step.
          assertThat(found.scale()).isCloseTo(slope, within(1e-10));
        });
  }

  @Test
  void allenIsSymmetricAndDemandRowsSumToZero() {
    everywhere(
        3,
        (technology, z, found) -> {
          int n = z.length;
          double size = largest(found.allen());
          for (int i = 0; i < n; i++) {
            double sum = 0;
            for (int j = 0; j < n; j++) {
              assertThat(found.allen(i, j)).isCloseTo(found.allen(j, i), within(LAW * size));
              assertThat(found.demand(i, j))
                  .isCloseTo(found.share(j) * found.allen(i, j), within(LAW * size));
              if (i != j) {
                assertThat(found.hicks(i, j)).isEqualTo(found.hicks(j, i));
              }
              sum += found.demand(i, j);
            }
            assertThat(sum).isCloseTo(0, within(LAW * size));
          }
        });
  }

  @Test
  void ownPriceElasticitiesAreNotPositive() {
    everywhere(
        4,
        (technology, z, found) -> {
          for (int i = 0; i < z.length; i++) {
            assertThat(found.demand(i, i)).isLessThanOrEqualTo(0);
            assertThat(found.morishima(i, i)).isZero();
          }
        });
  }

  @Test
  void theTextbooksCofactorsGiveTheSame() {
    Random random = new Random(5);
    int kept = 0;
    for (int k = 0; k < 500; k++) {
      Technology drawn = RandomTechnologies.any(random);
      Technology technology = inUnitsOfOrderOne(drawn);
      double[] z = RandomTechnologies.logInputs(random, technology, 0.3);
      double[] x = Arrays.stream(z).map(Math::exp).toArray();
      Elasticities found = Elasticities.atMix(technology, x);
      double size = largest(found.allen());
      if (!(size < LARGEST)) {
        continue;
      }
      kept++;
      TextbookBorderedHessian textbook = new TextbookBorderedHessian(technology, x);
      for (int i = 0; i < x.length; i++) {
        for (int j = 0; j < x.length; j++) {
          assertThat(found.allen(i, j)).isCloseTo(textbook.allen(i, j), within(LAW * size));
          assertThat(found.morishima(i, j)).isCloseTo(textbook.morishima(i, j), within(LAW * size));
          if (i != j) {
            double hicks = textbook.hicks(i, j);
            assertThat(found.hicks(i, j))
                .isCloseTo(hicks, within(LAW * Math.max(size, Math.abs(hicks))));
          }
        }
      }
    }
    assertThat(kept).isGreaterThan(300);
  }

  private static Technology inUnitsOfOrderOne(Technology drawn) {
    double[] base = new double[drawn.dimension()];
    Arrays.setAll(base, i -> 1 + 0.5 * i);
    return RandomTechnologies.withBase(drawn, base);
  }

  /**
   * ε_ij against what it means: prices that make the mix the cheapest are moved, the first-order
   * conditions solved again for the same output, and ln x_i compared.
   */
  @Test
  void demandAnswersToPricesAsTheCheapestMixDoes() {
    Random random = new Random(6);
    int kept = 0;
    for (int k = 0; k < 150; k++) {
      Technology technology = RandomTechnologies.any(random);
      double[] z = RandomTechnologies.logInputs(random, technology, 0.3);
      Elasticities found = Elasticities.at(technology, z);
      double size = largest(found.allen());
      if (!Regularity.at(technology, z).regular() || !(size < 20)) {
        continue;
      }
      kept++;
      double[] prices = new double[z.length];
      Arrays.setAll(prices, i -> Math.log(found.output(i)) - z[i]);
      double target = technology.logOutput(z);
      for (int i = 0; i < z.length; i++) {
        for (int j = 0; j < z.length; j++) {
          int which = i;
          double numerical =
              TechnologyContract.derivative(
                  w -> cheapest(technology, w, target, z)[which], prices, j, 1e-3);
          // Fourth order in a step of 1e−3, with derivatives growing as powers of the elasticity.
          assertThat(found.demand(i, j)).isCloseTo(numerical, within(1e-8 * Math.max(1, size)));
        }
      }
    }
    assertThat(kept).isGreaterThan(75);
  }

  /** ln w_i + z_i = ln e_i(z) + μ and ln f(z) = target, by Newton's method. */
  private static double[] cheapest(
      Technology technology, double[] logPrices, double target, double[] start) {
    int n = start.length;
    double[] z = start.clone();
    double mu = 0;
    double[] e = new double[n];
    double[][] h = new double[n][n];
    for (int step = 0; step < 8; step++) {
      technology.logGradient(z, e);
      technology.logHessian(z, h);
      double[][] jacobian = new double[n + 1][n + 1];
      RealVector miss = new ArrayRealVector(n + 1);
      for (int i = 0; i < n; i++) {
        miss.setEntry(i, logPrices[i] + z[i] - Math.log(e[i]) - mu);
        jacobian[i][n] = -1;
        jacobian[n][i] = e[i];
        for (int j = 0; j < n; j++) {
          jacobian[i][j] = (i == j ? 1 : 0) - h[i][j] / e[i];
        }
      }
      miss.setEntry(n, technology.logOutput(z) - target);
      RealVector move =
          new LUDecomposition(new Array2DRowRealMatrix(jacobian)).getSolver().solve(miss);
      for (int i = 0; i < n; i++) {
        z[i] -= move.getEntry(i);
      }
      mu -= move.getEntry(n);
    }
    return z;
  }

  /** Hours instead of minutes, tonnes instead of grams: nothing that has no unit may change. */
  @Test
  void unitsOfInputsDoNotMatter() {
    Random random = new Random(10);
    everywhere(
        11,
        (technology, z, found) -> {
          int n = z.length;
          double[] unit = random.doubles(n, -9, 9).map(p -> Math.pow(10, p)).toArray();
          double[] base = technology.base();
          double[] moved = z.clone();
          for (int i = 0; i < n; i++) {
            base[i] *= unit[i];
            moved[i] += Math.log(unit[i]);
          }
          Elasticities other =
              Elasticities.at(RandomTechnologies.withBase(technology, base), moved);
          double size = largest(found.allen());
          assertThat(other.scale()).isCloseTo(found.scale(), within(LAW));
          for (int i = 0; i < n; i++) {
            assertThat(other.output(i)).isCloseTo(found.output(i), within(LAW));
            for (int j = 0; j < n; j++) {
              assertThat(other.allen(i, j)).isCloseTo(found.allen(i, j), within(LAW * size));
              // A rate is in units of j for one of i.
              double rate = other.marginalRate(i, j) * unit[i] / unit[j];
              assertThat(rate / found.marginalRate(i, j)).isCloseTo(1, within(LAW));
            }
          }
        });
  }

  @Test
  void marginalRateIsTheRatioOfMarginalProducts() {
    everywhere(
        12,
        (technology, z, found) -> {
          double[] f = technology.gradient(Arrays.stream(z).map(Math::exp).toArray());
          assertThat(found.marginalRate(0, 1) * f[1] / f[0]).isCloseTo(1, within(1e-12));
          assertThat(found.marginalRate(0, 1) * found.marginalRate(1, 0))
              .isCloseTo(1, within(1e-14));
        });
  }
}

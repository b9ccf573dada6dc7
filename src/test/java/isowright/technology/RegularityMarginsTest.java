package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.junit.jupiter.api.Test;

/** Margins of regularity against another decomposition, differences, and the yes or no of them. */
class RegularityMarginsTest {

  private static Translog drawn(RandomGenerator random, int n) {
    List<String> names = IntStream.range(0, n).mapToObj(i -> "input " + i).toList();
    double[] base = new double[n];
    Arrays.fill(base, 1);
    double[] coefficients = new double[n + n * (n + 1) / 2];
    for (int k = 0; k < coefficients.length; k++) {
      coefficients[k] = k < n ? .1 + .6 * random.nextDouble() : .2 * random.nextGaussian();
    }
    return new Translog(names, base, 0, coefficients);
  }

  /** The eigenvalues of P C P with P = I − ee′/e′e, less the zero that belongs to e. */
  @Test
  void curvaturesAreEigenvaluesOfTheProjectedForm() {
    RandomGenerator random = new SplittableRandom(11);
    for (int draw = 0; draw < 200; draw++) {
      int n = 2 + draw % 4;
      Translog technology = drawn(random, n);
      double[] z = random.doubles(n, -1, 1).toArray();
      RegularityMargins margins = new RegularityMargins(n);
      margins.at(technology, z);
      double[] e = new double[n];
      double[][] h = new double[n][n];
      technology.logGradient(z, e);
      technology.logHessian(z, h);
      RealVector normal = MatrixUtils.createRealVector(e).unitVector();
      RealMatrix p = MatrixUtils.createRealIdentityMatrix(n).subtract(normal.outerProduct(normal));
      RealMatrix c = new Array2DRowRealMatrix(h).subtract(MatrixUtils.createRealDiagonalMatrix(e));
      // A multiple of ee′ moves the eigenvalue of e out of the way, to 1000.
      RealMatrix projected =
          p.multiply(c).multiply(p).add(normal.outerProduct(normal).scalarMultiply(1000));
      double[] expected =
          Arrays.stream(
                  new EigenDecomposition(projected.add(projected.transpose()).scalarMultiply(.5))
                      .getRealEigenvalues())
              .filter(v -> v < 500)
              .sorted()
              .toArray();
      double[] found = IntStream.range(0, n - 1).mapToDouble(margins::curvature).sorted().toArray();
      // Rounding of 1000, some 1e-13, times a few operations.
      assertThat(found).containsExactly(expected, within(1e-11));
      Regularity regularity = Regularity.at(technology, z);
      boolean monotone = IntStream.range(0, n).allMatch(i -> margins.elasticity(i) > 0);
      assertThat(regularity.monotone()).isEqualTo(monotone);
      if (Math.abs(margins.largestCurvature()) > 1e-9) {
        assertThat(regularity.quasiConcave()).isEqualTo(margins.largestCurvature() < 0);
      }
    }
  }

  /** Central differences: steps of 1e-5 leave some 1e-10 relative, curvatures apart. */
  @Test
  void slopesAreThoseOfDifferences() {
    RandomGenerator random = new SplittableRandom(12);
    for (int draw = 0; draw < 100; draw++) {
      int n = 2 + draw % 4;
      Translog technology = drawn(random, n);
      double[] z = random.doubles(n, -1, 1).toArray();
      RegularityMargins margins = new RegularityMargins(n);
      margins.at(technology, z);
      double[] parameters = technology.parameters();
      double[] curvatures = IntStream.range(0, n - 1).mapToDouble(margins::curvature).toArray();
      double[][] v =
          IntStream.range(0, n - 1).mapToObj(margins::direction).toArray(double[][]::new);
      double[] kappa = Arrays.stream(v).mapToDouble(margins::multiplier).toArray();
      double[] own = new double[n];
      double[][] bent = new double[n][n];
      for (int k = 1; k < parameters.length; k++) {
        double[] unit = new double[parameters.length];
        unit[k] = 1;
        technology.withParameters(unit).logGradient(z, own);
        technology.withParameters(unit).logHessian(z, bent);
        for (int j = 0; j < n - 1; j++) {
          double slope = RegularityMargins.slope(v[j], kappa[j], own, bent);
          double difference =
              (at(technology, z, k, 1e-5, curvatures[j])
                      - at(technology, z, k, -1e-5, curvatures[j]))
                  / 2e-5;
          assertThat(slope).isCloseTo(difference, within(1e-6 * (1 + Math.abs(slope))));
        }
      }
    }
  }

  /** The curvature nearest to a value, with a parameter moved. */
  private static double at(Translog technology, double[] z, int k, double step, double near) {
    double[] moved = technology.parameters();
    moved[k] += step;
    RegularityMargins margins = new RegularityMargins(z.length);
    margins.at(technology.withParameters(moved), z);
    return IntStream.range(0, z.length - 1)
        .mapToDouble(margins::curvature)
        .boxed()
        .min((a, b) -> Double.compare(Math.abs(a - near), Math.abs(b - near)))
        .orElseThrow();
  }
}

package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.junit.jupiter.api.Test;

/** Nearest points under inequalities, linear and curved. */
class InequalityLeastSquaresTest {

  /** The conditions of Karush, Kuhn and Tucker, which are sufficient here, by seeded draws. */
  @Test
  void nearestPointsMeetTheirConditions() {
    RandomGenerator random = new SplittableRandom(5);
    for (int draw = 0; draw < 300; draw++) {
      int k = 1 + draw % 6;
      int m = 1 + random.nextInt(20);
      double[] given = random.doubles(k, -2, 2).toArray();
      double[] inside = random.doubles(k, -2, 2).toArray();
      double[][] normals = new double[m][];
      double[] bounds = new double[m];
      for (int j = 0; j < m; j++) {
        normals[j] = j % 5 == 4 ? normals[j - 1].clone() : random.doubles(k, -1, 1).toArray();
        bounds[j] = Matrices.dot(normals[j], inside) - random.nextDouble();
      }
      NearestPoint.Found found = NearestPoint.to(given, normals, bounds).orElseThrow();
      double[] left = found.point().clone();
      for (int i = 0; i < k; i++) {
        left[i] -= given[i];
      }
      for (int j = 0; j < m; j++) {
        double slack = Matrices.dot(normals[j], found.point()) - bounds[j];
        double u = found.multipliers()[j];
        assertThat(slack).isGreaterThan(-1e-10);
        assertThat(u).isNotNegative();
        // Zero but for rounding: one of the two is.
        assertThat(u * slack).isCloseTo(0, within(1e-8));
        for (int i = 0; i < k; i++) {
          left[i] -= u * normals[j][i];
        }
      }
      assertThat(Math.sqrt(Matrices.dot(left, left))).isLessThan(1e-9);
    }
  }

  @Test
  void whatCannotBeMetIsFoundOut() {
    double[][] normals = {{1, 0}, {-1, 0}};
    assertThat(NearestPoint.to(new double[2], normals, new double[] {1, 0})).isEmpty();
    assertThat(NearestPoint.to(new double[2], normals, new double[] {1, -1})).isPresent();
  }

  /** The point of the circle of radius one about (3, 4) nearest to the origin: (2.4, 3.2). */
  @Test
  void aCurvedInequality() {
    Inequalities circle =
        new Inequalities() {
          @Override
          public int count() {
            return 1;
          }

          @Override
          public void at(double[] x, double[] values, double[][] gradients) {
            values[0] = 1 - (x[0] - 3) * (x[0] - 3) - (x[1] - 4) * (x[1] - 4);
            gradients[0][0] = -2 * (x[0] - 3);
            gradients[0][1] = -2 * (x[1] - 4);
          }
        };
    double[][] identity = {{1, 0}, {0, 1}};
    for (double[] start : new double[][] {{0, 0}, {3, 4}, {6, 1}, {-5, 9}}) {
      var found =
          new InequalityLeastSquares(new double[2], identity, circle).from(start).orElseThrow();
      assertThat(found.coefficients()).containsExactly(new double[] {2.4, 3.2}, within(1e-8));
      assertThat(found.distance()).isCloseTo(16, within(1e-7));
      // 2x = u · 2 (3 − x) at x = 2.4, in the problem of half the distance.
      assertThat(found.multipliers()[0]).isCloseTo(2, within(1e-6));
    }
  }
}

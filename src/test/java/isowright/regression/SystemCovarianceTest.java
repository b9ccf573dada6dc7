package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * A system of one equation is a regression: its clustered covariance is that of {@link Covariance}.
 */
class SystemCovarianceTest {

  @Test
  void oneEquationIsARegression() {
    Random random = new Random(5);
    int rows = 60;
    double[][] x = new double[2][rows];
    double[] y = new double[rows];
    int[] starts = new int[12];
    for (int g = 0; g < 12; g++) {
      starts[g] = 5 * g;
    }
    for (int i = 0; i < rows; i++) {
      x[0][i] = 1;
      x[1][i] = random.nextGaussian() + i / 5;
      y[i] = 2 - x[1][i] + random.nextGaussian();
    }
    ArrayDesign design = ArrayDesign.of(List.of("one", "x"), x, y, Groups.startingAt(rows, starts));
    double[][] loadings = {{1, 0}, {0, 1}, {0, 0}};
    EquationSystem system =
        new EquationSystem(
            List.of("one", "x"),
            List.of(new EquationSystem.Equation("y", new double[] {0, 0, 1}, loadings, false)));
    SystemFit fit = SeeminglyUnrelated.fit(design, system);
    SystemCovariance clustered = SystemCovariance.clustered(design, fit);
    Covariance known =
        Covariance.estimate(design, LeastSquares.fit(design), Covariance.Kind.CLUSTERED);
    for (int k = 0; k < 2; k++) {
      for (int l = 0; l < 2; l++) {
        // the same sums in another order
        double expected = known.matrix()[k][l];
        assertThat(clustered.matrix()[k][l]).isCloseTo(expected, within(1e-9 * Math.abs(expected)));
      }
    }
  }
}

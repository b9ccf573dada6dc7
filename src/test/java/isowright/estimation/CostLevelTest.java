package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostArguments;
import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.Groups;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Whose cost it is: levels of plants, with and without plant effects, controls at their means. */
class CostLevelTest {

  private static final int PLANTS = 9;
  private static final int PERIODS = 6;
  private static final double CONTROL = 0.2;

  /** ln C = 1 + 0.1 p + 0.7 ln w + 0.3 ln v + 0.9 ln Q + 0.2 c + e. */
  private static CostData data(double noise, boolean control) {
    Random random = new Random(5);
    int rows = PLANTS * PERIODS;
    double[][] points = new double[3][rows];
    double[] cost = new double[rows];
    double[] controlled = new double[rows];
    int[] starts = new int[PLANTS];
    for (int r = 0; r < rows; r++) {
      int plant = r / PERIODS;
      starts[plant] = plant * PERIODS;
      for (double[] point : points) {
        point[r] = random.nextGaussian();
      }
      controlled[r] = control ? 3 + random.nextGaussian() : 0;
      cost[r] =
          (1 + 0.1 * plant)
              + (0.7 * points[0][r] + 0.3 * points[1][r])
              + 0.9 * points[2][r]
              + CONTROL * controlled[r]
              + noise * random.nextGaussian();
    }
    CostArguments arguments =
        CostArguments.ownUnits(List.of("labour", "capital"), List.of("q"), List.of(), false);
    return new CostData(
        arguments,
        points,
        cost,
        new double[0][],
        control ? new double[][] {controlled} : new double[0][],
        control ? List.of("age") : List.of(),
        Groups.startingAt(rows, starts));
  }

  private static CostFit fit(CostData data, boolean within) {
    return CostEstimation.fit(
        data,
        new CostSpecification(
            CostForm.COBB_DOUGLAS, Equations.COST, true, List.of(), within, false, 1, 0.95));
  }

  private static double logCost(CostData data, CostFit fit, Productivity productivity) {
    return EstimatedCost.of(data, fit, productivity).function().logCost(new double[] {0, 0, 0});
  }

  /** Without chance every level is found, to rounding of least squares on fifty rows. */
  @Test
  void levelsWithPlantEffects() {
    CostData data = data(0, true);
    CostFit fit = fit(data, true);
    double control = 0;
    for (double c : data.controls()[0]) {
      control += CONTROL * c / data.rows();
    }
    assertThat(logCost(data, fit, new Productivity.Typical()))
        .isCloseTo(1 + 0.1 * 4 + control, within(1e-12));
    assertThat(logCost(data, fit, new Productivity.Plant(7)))
        .isCloseTo(1.7 + control, within(1e-12));
    // the lower quartile of nine equally spaced plants is the third
    assertThat(logCost(data, fit, new Productivity.UpperQuartile()))
        .isCloseTo(1.2 + control, within(1e-12));
  }

  /**
   * At the mean of the records the typical plant's ln C is the mean of ln C whatever the slopes, so
   * that its variance is s²/N: what is left of chance in a mean.
   */
  @Test
  void varianceAtTheMean() {
    CostData data = data(0.1, true);
    CostFit fit = fit(data, true);
    EstimatedCost typical = EstimatedCost.of(data, fit, new Productivity.Typical());
    double[] mean = new double[3];
    for (int k = 0; k < 3; k++) {
      mean[k] = java.util.Arrays.stream(data.points()[k]).average().orElse(0);
    }
    double[] centre = typical.centre();
    double[][] covariance = typical.covariance();
    double[] gradient = new double[centre.length];
    for (int k = 0; k < centre.length; k++) {
      double[] up = centre.clone();
      double[] down = centre.clone();
      up[k] += 1e-3;
      down[k] -= 1e-3;
      gradient[k] = (typical.at(up).logCost(mean) - typical.at(down).logCost(mean)) / 2e-3;
    }
    double variance = 0;
    for (int k = 0; k < gradient.length; k++) {
      for (int l = 0; l < gradient.length; l++) {
        variance += gradient[k] * covariance[k][l] * gradient[l];
      }
    }
    double squares = fit.system().residualCovariance()[0][0] * data.rows();
    // two slopes, one control, nine plants
    double expected = squares / (data.rows() - 3 - PLANTS) / data.rows();
    // slopes' gradients vanish up to rounding of differences, 1e-13 over 1e-3
    assertThat(variance).isCloseTo(expected, within(1e-8 * expected));
  }

  /** Without plant effects the constant is the level, and controls are at their means. */
  @Test
  void levelWithoutPlantEffects() {
    CostData data = data(0.1, true);
    CostFit fit = fit(data, false);
    double mean = java.util.Arrays.stream(data.controls()[0]).average().orElse(0);
    assertThat(logCost(data, fit, new Productivity.Typical()))
        .isCloseTo(fit.value("constant") + fit.value("control:age") * mean, within(1e-12));
  }
}

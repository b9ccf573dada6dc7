package isowright.estimation;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;

/**
 * Plants' productivity and the constant that belongs to any of them.
 *
 * <p>The level of plant i is the mean over its rows of ln Q less what slopes, inputs and
 * circumstances explain: c_i = ȳ_i − h̄_i(θ). For weights ω over plants the constant is c_ω = Σ ω_i
 * c_i, with
 *
 * <pre>
 *   cov(c_ω, θ) = −m_ω′ V,   var(c_ω) = m_ω′ V m_ω + s² Σ ω_i² / T_i,
 * </pre>
 *
 * m_ω the weighted means of the regressors (∂h/∂θ), V the covariance of the slopes, s² the residual
 * variance, T_i the rows of plant i. The levels are those of the plants in the records over the
 * periods recorded, not of a wider population of plants.
 */
public final class PlantLevels {

  private final GroupMeans means;
  private final double[][] slopeCovariance;
  private final double residualVariance;
  private final double[][] toReported;
  private final int firstSlope;

  /**
   * @param means group means of the design before plant means are removed, with the estimated
   *     coefficients
   * @param slopeCovariance V, over the columns of that design from {@code firstSlope} on
   * @param firstSlope 1 where the design has a constant, else 0
   * @param toReported reported parameters by free ones (constant, slopes)
   */
  PlantLevels(
      GroupMeans means,
      double[][] slopeCovariance,
      int firstSlope,
      double residualVariance,
      double[][] toReported) {
    this.means = means;
    this.slopeCovariance = slopeCovariance;
    this.firstSlope = firstSlope;
    this.residualVariance = residualVariance;
    this.toReported = toReported;
  }

  /**
   * The constant of the typical plant on the scale of the levels: 0 where the design has a
   * constant.
   */
  double typical() {
    return means.weighted(means.byRows());
  }

  /** Log output of plant p relative to the typical plant. */
  public double relative(int plant) {
    return means.get(plant) - typical();
  }

  /** Log output of every plant relative to the typical one. */
  public double[] relative() {
    double typical = typical();
    return IntStream.range(0, means.count()).mapToDouble(p -> means.get(p) - typical).toArray();
  }

  /** The weights over plants that stand for a productivity. */
  double[] weights(Productivity productivity) {
    if (productivity instanceof Productivity.Plant plant) {
      double[] weights = new double[means.count()];
      weights[plant.index()] = 1;
      return weights;
    }
    if (productivity instanceof Productivity.UpperQuartile) {
      return upperQuartile();
    }
    return means.byRows();
  }

  /** The constant's distance from the typical one, Σ ω_i c_i − c. */
  double shift(double[] weights) {
    return means.weighted(weights) - typical();
  }

  /** The covariance of the reported parameters with the constant of these weights. */
  double[][] covariance(double[] weights) {
    int slopes = slopeCovariance.length;
    double[] all = means.regressors(weights);
    double[] m = Arrays.copyOfRange(all, firstSlope, firstSlope + slopes);
    double[][] free = new double[slopes + 1][slopes + 1];
    double variance = residualVariance * means.unitVariance(weights);
    for (int k = 0; k < slopes; k++) {
      double product = 0;
      for (int l = 0; l < slopes; l++) {
        product += slopeCovariance[k][l] * m[l];
        free[k + 1][l + 1] = slopeCovariance[k][l];
      }
      free[0][k + 1] = -product;
      free[k + 1][0] = -product;
      variance += m[k] * product;
    }
    free[0][0] = variance;
    return Matrices.sandwich(toReported, free);
  }

  /** The linear interpolation between order statistics that R calls type 7. */
  private double[] upperQuartile() {
    int plants = means.count();
    int[] order =
        IntStream.range(0, plants)
            .boxed()
            .sorted(Comparator.comparingDouble(means::get))
            .mapToInt(Integer::intValue)
            .toArray();
    double position = 0.75 * (plants - 1);
    int below = (int) Math.floor(position);
    double[] weights = new double[plants];
    weights[order[below]] = 1 - (position - below);
    if (below + 1 < plants) {
      weights[order[below + 1]] = position - below;
    }
    return weights;
  }
}

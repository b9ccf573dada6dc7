package isowright.estimation;

import isowright.regression.Design;
import java.util.Arrays;
import java.util.Comparator;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;

/**
 * Plants' productivity and the constant that belongs to any of them.
 *
 * <p>Notation: θ the estimates over the columns of the regression in levels, V their covariance,
 * x̄_i the means of the columns over the T_i rows of plant i, r̄_i its mean residual ȳ_i − x̄_i′θ,
 * z_i the part of x̄_i that is level rather than slope (the constant, plant means that were added;
 * zero elsewhere), s² the variance of a row's error. The constant of plant i is
 *
 * <pre>  c_i = z_i′θ + λ_i r̄_i. </pre>
 *
 * With λ_i = 1 it is the plant's own mean; with λ_i = T_i σ²_u / (T_i σ²_u + σ²_e) it is the best
 * linear prediction of a random effect (Henderson 1975, <i>Biometrics</i> 31, 423–447; Baltagi,
 * <i>Econometric Analysis of Panel Data</i>, section on prediction). For weights ω over plants, c_ω
 * = Σ ω_i c_i and d = Σ ω_i (z_i − λ_i x̄_i),
 *
 * <pre>  cov(c_ω, θ) = V d,   var(c_ω) = d′V d + s² Σ ω_i² λ_i / T_i, </pre>
 *
 * the second term being that of the error of the rows, and of the effect as far as it is not known
 * (λ² σ²_e/T + (1 − λ)² σ²_u = λ σ²_e/T). The levels are those of the plants in the records over
 * the periods recorded, not of a wider population of plants. Tested in {@code PlantLevelsTest}.
 */
public final class PlantLevels {

  private final GroupMeans means;
  private final double[] own;
  private final double[] shrinkage;
  private final double[][] covariance;
  private final boolean[] level;
  private final boolean constant;
  private final double rowVariance;
  private final double[][] toReported;

  /**
   * @param levels the regression in levels, before anything is removed
   * @param coefficients θ; zeros where the response is a residual
   * @param covariance V
   * @param level the columns that are level rather than slope
   * @param shrinkage λ_i by the number of rows of the plant
   * @param rowVariance s²
   * @param toReported reported parameters by free ones (constant, slopes)
   */
  PlantLevels(
      Design levels,
      double[] coefficients,
      double[][] covariance,
      boolean[] level,
      IntToDoubleFunction shrinkage,
      double rowVariance,
      double[][] toReported) {
    this.means = GroupMeans.of(levels, coefficients);
    this.covariance = covariance;
    this.level = level;
    this.constant = level.length > 0 && level[0];
    this.rowVariance = rowVariance;
    this.toReported = toReported;
    this.own = own(levels, coefficients);
    this.shrinkage = new double[means.count()];
    Arrays.setAll(this.shrinkage, g -> shrinkage.applyAsDouble(means.size(g)));
  }

  /** z_i′θ without the constant, by plant. */
  private double[] own(Design levels, double[] coefficients) {
    double[] own = new double[means.count()];
    double[] others = coefficients.clone();
    boolean any = false;
    for (int k = 1; k < level.length; k++) {
      if (level[k]) {
        others[k] = 0;
        any = true;
      }
    }
    if (any) {
      GroupMeans without = GroupMeans.of(levels, others);
      Arrays.setAll(own, g -> without.get(g) - means.get(g));
    }
    return own;
  }

  /** Which columns are level: a constant that stands first, and those after the others. */
  static boolean[] level(int columns, boolean constant, int last) {
    boolean[] level = new boolean[columns];
    Arrays.fill(level, columns - last, columns, true);
    if (constant) {
      level[0] = true;
    }
    return level;
  }

  /** c_i, less the constant of the regression where it has one. */
  private double get(int plant) {
    return own[plant] + shrinkage[plant] * means.get(plant);
  }

  /** The typical plant on that scale: the mean over rows of what is level. */
  double typical() {
    double sum = 0;
    double[] weights = means.byRows();
    for (int g = 0; g < weights.length; g++) {
      sum += weights[g] * (constant ? own[g] : get(g));
    }
    return sum;
  }

  /** Log output of plant p relative to the typical plant, at equal inputs. */
  public double relative(int plant) {
    return get(plant) - typical();
  }

  /** Log output of every plant relative to the typical one, at equal inputs. */
  public double[] relative() {
    double typical = typical();
    return IntStream.range(0, means.count()).mapToDouble(p -> get(p) - typical).toArray();
  }

  /** The standard error of the difference between the levels of two plants. */
  public double deviationApart(int plant, int other) {
    double[] weights = new double[means.count()];
    weights[plant] += 1;
    weights[other] -= 1;
    double[] d = direction(weights);
    double variance = ownVariance(weights);
    for (int k = 0; k < d.length; k++) {
      for (int l = 0; l < d.length; l++) {
        variance += d[k] * covariance[k][l] * d[l];
      }
    }
    return Math.sqrt(Math.max(0, variance));
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

  /** The distance of c_ω from the reported constant. */
  double shift(double[] weights) {
    double sum = 0;
    for (int g = 0; g < weights.length; g++) {
      sum += weights[g] * get(g);
    }
    return constant ? sum : sum - typical();
  }

  /** s² Σ ω_i² λ_i / T_i: how a constant of these weights varies although θ is known. */
  double ownVariance(double[] weights) {
    return rowVariance * means.unitVariance(weights, shrinkage);
  }

  /** The covariance of the reported parameters with c_ω in the place of the constant. */
  double[][] covariance(double[] weights) {
    int columns = covariance.length;
    int first = constant ? 0 : 1;
    double[] d = direction(weights);
    double[][] free = new double[columns + first][columns + first];
    for (int k = 0; k < columns; k++) {
      System.arraycopy(covariance[k], 0, free[k + first], first, columns);
    }
    double variance = rowVariance * means.unitVariance(weights, shrinkage);
    double[] with = new double[columns];
    for (int k = 0; k < columns; k++) {
      for (int l = 0; l < columns; l++) {
        with[k] += covariance[k][l] * d[l];
      }
      variance += d[k] * with[k];
    }
    for (int k = 1 - first; k < columns; k++) {
      free[0][k + first] = with[k];
      free[k + first][0] = with[k];
    }
    free[0][0] = variance;
    return Matrices.sandwich(toReported, free);
  }

  /** d, by the columns of the regression: ∂c_ω/∂θ. */
  double[] direction(double[] weights) {
    double[] shrunk = new double[weights.length];
    Arrays.setAll(shrunk, g -> weights[g] * shrinkage[g]);
    double[] d = means.regressors(shrunk);
    double[] whole = means.regressors(weights);
    for (int k = 0; k < d.length; k++) {
      d[k] = (level[k] ? whole[k] : 0) - d[k];
    }
    return d;
  }

  /** The linear interpolation between order statistics that R calls type 7. */
  private double[] upperQuartile() {
    int plants = means.count();
    int[] order =
        IntStream.range(0, plants)
            .boxed()
            .sorted(Comparator.comparingDouble(this::get))
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

  /** The upper quartile of levels by the same rule; NaN of none. */
  static double upperQuartile(double[] levels) {
    if (levels.length == 0) {
      return Double.NaN;
    }
    double[] sorted = levels.clone();
    Arrays.sort(sorted);
    double position = 0.75 * (sorted.length - 1);
    int below = (int) Math.floor(position);
    int above = Math.min(below + 1, sorted.length - 1);
    return sorted[below] + (position - below) * (sorted[above] - sorted[below]);
  }
}

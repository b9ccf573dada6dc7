package isowright.estimation;

import isowright.cost.CostFunction;
import isowright.cost.LevelledCost;
import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;

/**
 * A fitted cost function at the level of the plant that is meant, with all that is needed to carry
 * uncertainty to anything computed from it.
 *
 * <p>With plant effects a fitted cost function has no constant, and controls move it beside its
 * arguments. What is added to ln C for weights ω over rows is
 *
 * <pre>  L = Σ_r ω_r (ln C_r − f(v_r; θ) − β′c_r) + β′c̄ </pre>
 *
 * controls at their means c̄ over the records: for the typical plant every row weighs alike
 * (without plant effects the constant says it, and L = β′c̄); for one plant its own rows do; the
 * best quarter is the plant at the lower quartile of plants' mean residuals. L moves with θ and β,
 * to first order, and by the chance s² Σ_g ω_g²/T_g of the residuals averaged, which joins the
 * parameters as one more of mean zero.
 *
 * <p>Assumption: the chances of rows are independent of one another in that last term. Tested in
 * {@code CostLevelTest}.
 */
public final class EstimatedCost {

  /** The step of differences in units of a parameter's standard error. */
  private static final double STEP = 0.01;

  private final CostFit fit;
  private final CostData data;
  private final double[] controls;
  private final double[] weights;
  private final double level;
  private final double[] slopes;
  private final double variance;

  private EstimatedCost(CostData data, CostFit fit, Productivity productivity) {
    this.fit = fit;
    this.data = data;
    this.controls = new double[data.controls().length];
    for (int c = 0; c < controls.length; c++) {
      controls[c] = Arrays.stream(data.controls()[c]).average().orElse(0);
    }
    boolean within = fit.specification().plantEffects();
    boolean constant = productivity instanceof Productivity.Typical && !within;
    double[] centre = fit.values();
    double[] residuals = constant ? new double[0] : residuals(centre);
    this.weights = constant ? new double[0] : weights(productivity, residuals);
    this.level = level(centre, residuals);
    this.slopes = new double[centre.length];
    int parameters = fit.function().parameters().length;
    for (int k = 0; k < centre.length; k++) {
      double step = STEP * Math.sqrt(Math.max(0, fit.covariance()[k][k]));
      if (step > 0 && (weights.length > 0 || k >= parameters)) {
        double[] up = centre.clone();
        double[] down = centre.clone();
        up[k] += step;
        down[k] -= step;
        slopes[k] = (level(up) - level(down)) / (2 * step);
      }
    }
    this.variance = variance(residuals, within);
  }

  /** A fit at the level of this productivity. */
  public static EstimatedCost of(CostData data, CostFit fit, Productivity productivity) {
    return new EstimatedCost(data, fit, productivity);
  }

  /** What the parameters are estimated to be: those of the fit, then the chance in the level. */
  public double[] centre() {
    return Arrays.copyOf(fit.values(), fit.values().length + 1);
  }

  /** Their covariance. */
  public double[][] covariance() {
    int p = fit.values().length;
    double[][] covariance = new double[p + 1][p + 1];
    for (int k = 0; k < p; k++) {
      System.arraycopy(fit.covariance()[k], 0, covariance[k], 0, p);
    }
    covariance[p][p] = variance;
    return covariance;
  }

  /** The cost function of these parameters. */
  public CostFunction at(double[] parameters) {
    double there = level + parameters[parameters.length - 1];
    double[] centre = fit.values();
    for (int k = 0; k < centre.length; k++) {
      there += slopes[k] * (parameters[k] - centre[k]);
    }
    double[] own = Arrays.copyOf(parameters, fit.function().parameters().length);
    return new LevelledCost(fit.function().withParameters(own), there);
  }

  /** The cost function at the estimate. */
  public CostFunction function() {
    return at(centre());
  }

  /**
   * The chance in each row: ln C_r less what the fit says of it, with plant effects less the mean
   * of its plant.
   */
  public double[] chances() {
    double[] all = residuals(fit.values());
    if (fit.specification().plantEffects()) {
      for (int g = 0; g < data.groups().count(); g++) {
        double mean = mean(all, g);
        for (int r = data.groups().start(g); r < data.groups().end(g); r++) {
          all[r] -= mean;
        }
      }
    }
    return all;
  }

  private double level(double[] parameters) {
    return level(parameters, weights.length > 0 ? residuals(parameters) : new double[0]);
  }

  private double level(double[] parameters, double[] residuals) {
    int first = fit.function().parameters().length;
    double sum = 0;
    for (int c = 0; c < controls.length && first + c < parameters.length; c++) {
      sum += parameters[first + c] * controls[c];
    }
    for (int g = 0; g < weights.length; g++) {
      if (weights[g] != 0) {
        sum += weights[g] * mean(residuals, g);
      }
    }
    return sum;
  }

  private double mean(double[] values, int group) {
    double sum = 0;
    for (int r = data.groups().start(group); r < data.groups().end(group); r++) {
      sum += values[r];
    }
    return sum / size(group);
  }

  private int size(int group) {
    return data.groups().end(group) - data.groups().start(group);
  }

  /** ln C_r − f(v_r) − β′c_r. */
  private double[] residuals(double[] parameters) {
    int own = fit.function().parameters().length;
    CostFunction function = fit.function().withParameters(Arrays.copyOf(parameters, own));
    double[] residuals = new double[data.rows()];
    for (int r = 0; r < residuals.length; r++) {
      residuals[r] = data.logCost()[r] - function.logCost(data.point(r));
      for (int c = 0; c < controls.length && own + c < parameters.length; c++) {
        residuals[r] -= parameters[own + c] * data.controls()[c][r];
      }
    }
    return residuals;
  }

  private double[] weights(Productivity productivity, double[] residuals) {
    int groups = data.groups().count();
    double[] all = new double[groups];
    if (productivity instanceof Productivity.Plant plant) {
      all[plant.index()] = 1;
    } else if (productivity instanceof Productivity.UpperQuartile) {
      double[] means = new double[groups];
      Arrays.setAll(means, g -> mean(residuals, g));
      int[] order =
          IntStream.range(0, groups)
              .boxed()
              .sorted(Comparator.comparingDouble(g -> means[g]))
              .mapToInt(Integer::intValue)
              .toArray();
      // the linear interpolation between order statistics that is used for plants' output levels
      double position = 0.25 * (groups - 1);
      int below = (int) Math.floor(position);
      all[order[below]] = 1 - (position - below);
      if (below + 1 < groups) {
        all[order[below + 1]] = position - below;
      }
    } else {
      Arrays.setAll(all, g -> (double) size(g) / data.rows());
    }
    return all;
  }

  private double variance(double[] residuals, boolean within) {
    if (weights.length == 0) {
      return 0;
    }
    double squares = 0;
    double unit = 0;
    for (int g = 0; g < weights.length; g++) {
      double mean = within ? mean(residuals, g) : 0;
      for (int r = data.groups().start(g); r < data.groups().end(g); r++) {
        squares += (residuals[r] - mean) * (residuals[r] - mean);
      }
      unit += weights[g] * weights[g] / size(g);
    }
    double left = (double) data.rows() - fit.free() - (within ? weights.length : 0);
    return left > 0 ? squares / left * unit : Double.NaN;
  }
}

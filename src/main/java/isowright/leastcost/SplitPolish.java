package isowright.leastcost;

import java.util.List;
import java.util.function.DoubleFunction;

/**
 * Newton's method for a split near a good one: marginal costs of the plants that can move are made
 * equal while their outputs keep their sum.
 *
 * <pre>  dq_p = (λ − c_p)/c_p′,   λ = Σ (c_p/c_p′)/Σ (1/c_p′) </pre>
 *
 * with c_p marginal cost. Plants at an end of their range stay there unless the step leads inside;
 * steps are halved until total cost falls.
 */
final class SplitPolish {

  private static final int ITERATIONS = 40;
  private static final int HALVINGS = 20;

  /** Marginal costs are compared this far apart, relative, for their slope. */
  private static final double BESIDE = 1e-5;

  /** A slope of marginal cost below this part of c/q is as good as none: constant returns. */
  private static final double LEVEL = 1e-10;

  /** An elasticity of marginal cost below this does not fix a split to any digit that matters. */
  private static final double FLAT = 1e-3;

  /** Marginal costs this close, relative, are equal: they carry the rounding of a solved mix. */
  private static final double EQUAL = 1e-12;

  private final List<DoubleFunction<CostTable.Point>> costs;
  private final double[] low;
  private final double[] high;
  private final int n;

  /** The outputs reached. */
  final double[] outputs;

  private final double[] marginal;
  private final double[] slope;

  /**
   * @param costs what each plant's cost is at an output
   * @param low the least output of each plant that runs; plants that do not have low and high 0
   */
  SplitPolish(
      List<DoubleFunction<CostTable.Point>> costs, double[] outputs, double[] low, double[] high) {
    this.costs = costs;
    this.outputs = outputs.clone();
    this.low = low;
    this.high = high;
    n = outputs.length;
    marginal = new double[n];
    slope = new double[n];
  }

  /** Moves to where marginal costs are equal, as far as cost falls. */
  void polish() {
    double cost = cost(outputs);
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      double[] step = step();
      double longest = 0;
      for (int p = 0; p < n; p++) {
        longest = Math.max(longest, Math.abs(step[p]) / Math.max(outputs[p], 1e-300));
      }
      if (!(longest > EQUAL)) {
        return;
      }
      double t = 1;
      boolean fell = false;
      for (int halving = 0; halving < HALVINGS && !fell; halving++) {
        double[] trial = new double[n];
        for (int p = 0; p < n; p++) {
          trial[p] = Math.min(Math.max(outputs[p] + t * step[p], low[p]), high[p]);
        }
        double lower = cost(trial);
        if (lower < cost) {
          System.arraycopy(trial, 0, outputs, 0, n);
          cost = lower;
          fell = true;
        }
        t /= 2;
      }
      if (!fell) {
        return;
      }
    }
  }

  /**
   * Newton's method to the end from a start that is nearly there, whether cost falls or not.
   *
   * @return false where marginal costs do not move with output, so that nothing fixes the split
   */
  boolean converge() {
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      double[] step = step();
      double longest = 0;
      for (int p = 0; p < n; p++) {
        boolean level = high[p] > low[p] && Math.abs(slope[p]) * outputs[p] < FLAT * marginal[p];
        if (level) {
          return false;
        }
        longest = Math.max(longest, Math.abs(step[p]) / Math.max(outputs[p], 1e-300));
        outputs[p] += step[p];
      }
      if (!(longest > EQUAL)) {
        return true;
      }
    }
    return true;
  }

  /** Newton's step with plants that would leave their range held at its end. */
  private double[] step() {
    boolean[] held = new boolean[n];
    for (int p = 0; p < n; p++) {
      held[p] = !(high[p] > low[p]) || !examine(p);
    }
    double[] step = new double[n];
    for (int round = 0; round <= n; round++) {
      double weight = 0;
      double sum = 0;
      double left = 0;
      for (int p = 0; p < n; p++) {
        if (held[p]) {
          left -= step[p];
        } else {
          weight += 1 / slope[p];
          sum += marginal[p] / slope[p];
        }
      }
      if (weight == 0) {
        return new double[n];
      }
      double lambda = (sum + left) / weight;
      boolean again = false;
      for (int p = 0; p < n; p++) {
        if (!held[p]) {
          double wanted = (lambda - marginal[p]) / slope[p];
          double allowed = Math.min(Math.max(wanted, low[p] - outputs[p]), high[p] - outputs[p]);
          step[p] = allowed;
          if (allowed != wanted) {
            held[p] = true;
            again = true;
          }
        }
      }
      if (!again) {
        return step;
      }
    }
    return new double[n];
  }

  /** Marginal cost and its slope at a plant's output; false where it has none. */
  private boolean examine(int p) {
    double q = outputs[p];
    if (!(q > 0)) {
      return false; // driven to a stop: it stays there
    }
    double above = Math.min(q * (1 + BESIDE), high[p]);
    double below = Math.max(q * (1 - BESIDE), low[p]);
    CostTable.Point here = costs.get(p).apply(q);
    CostTable.Point up = costs.get(p).apply(above);
    CostTable.Point down = costs.get(p).apply(below);
    marginal[p] = here.marginal();
    slope[p] = (up.marginal() - down.marginal()) / (above - below);
    if (!Double.isFinite(marginal[p]) || !Double.isFinite(slope[p])) {
      return false;
    }
    double level = LEVEL * marginal[p] / q;
    slope[p] = Math.abs(slope[p]) < level ? level : slope[p];
    return true;
  }

  private double cost(double[] at) {
    double sum = 0;
    for (int p = 0; p < n; p++) {
      if (high[p] > 0) {
        double cost = costs.get(p).apply(at[p]).cost();
        if (Double.isNaN(cost)) {
          return Double.POSITIVE_INFINITY;
        }
        sum += cost;
      }
    }
    return sum;
  }
}

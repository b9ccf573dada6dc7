package isowright.cost;

import java.util.Arrays;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;

/**
 * How much of the fixed inputs would be bought if they could be chosen: from the short run to the
 * long run.
 *
 * <p>With variable cost V(w, y, k), quantities k of the fixed inputs and their prices p, long-run
 * cost is C(w, y, p) = min_k V(w, y, k) + p′k, where −∂V/∂k_f = p_f: a unit of a fixed input is
 * worth what it saves of variable cost. The minimum is looked for in κ = ln k by Newton's method
 * from several starts, with
 *
 * <pre>  T(κ) = V + Σ p_f e^{κ_f},   ∂T/∂κ_f = V g_f + p_f k_f,
 *  ∂²T/∂κ_f∂κ_h = V (g_f g_h + H_fh) + [f = h] p_f k_f </pre>
 *
 * where g and H are gradient and Hessian of ln V. By the envelope theorem long-run marginal cost is
 * ∂V/∂y at the minimum, and long-run cost never exceeds short-run cost V + p′k at any other k.
 *
 * <p>A fitted V need not be convex in k, so there may be no minimum: the search stays within bounds
 * and says where it ended.
 *
 * <p>Sources: Samuelson, P. A. (1947), <i>Foundations of Economic Analysis</i> (envelope); Brown,
 * R. S. and Christensen, L. R. (1981), Estimating elasticities of substitution in a model of
 * partial static equilibrium, in Berndt and Field (eds), <i>Modeling and Measuring Natural Resource
 * Substitution</i>, 209–229 (long run from a variable cost function). Tested in {@code
 * LongRunCostTest}.
 */
public final class LongRunCost {

  /** Relative departure from the first-order conditions at which the search has arrived. */
  private static final double ARRIVED = 1e-11;

  /** Newton halves its distance at worst; with steps of at most one in logs this is ample. */
  private static final int STEPS = 200;

  private static final int ACROSS = 9;
  private static final int MOST_STARTS = 81;

  private final CostFunction variable;
  private final double[] v;
  private final int[] free;
  private final double[] prices;

  /**
   * How the search ended.
   *
   * @param logs κ, the logs of the free quantities
   * @param total V + p′k there
   * @param departure the largest of |V g_f + p_f k_f| relative to V
   */
  public record Best(double[] logs, double total, double departure) {

    /** Copies. */
    public Best {
      logs = logs.clone();
    }

    @Override
    public double[] logs() {
      return logs.clone();
    }
  }

  /**
   * The question.
   *
   * @param variable variable cost
   * @param v the point, shape A; its logs of the free quantities do not matter
   * @param free the places among the arguments of the fixed inputs that may be chosen, shape F
   * @param prices their prices, shape F, positive, in units of the cost that {@code variable} gives
   */
  public LongRunCost(CostFunction variable, double[] v, int[] free, double[] prices) {
    this.variable = variable;
    this.v = v.clone();
    this.free = free.clone();
    this.prices = prices.clone();
  }

  /**
   * The least total cost with κ between bounds; absent where the least lies on a bound, so that
   * there is no minimum of the kind sought.
   */
  public Optional<Best> between(double[] low, double[] high) {
    int across = ACROSS;
    while (Math.pow(across, free.length) > MOST_STARTS && across > 2) {
      across--;
    }
    int starts = (int) Math.round(Math.pow(across, free.length));
    Optional<Best> best = Optional.empty();
    double edge = Double.POSITIVE_INFINITY;
    for (int s = 0; s < starts; s++) {
      double[] start = new double[free.length];
      boolean onEdge = false;
      for (int f = 0, rest = s; f < free.length; f++, rest /= across) {
        int step = rest % across;
        start[f] = low[f] + (high[f] - low[f]) * step / (across - 1);
        onEdge |= step == 0 || step == across - 1;
      }
      if (onEdge) {
        edge = Math.min(edge, total(start));
        continue;
      }
      Optional<Best> found = search(start, low, high);
      if (found.isPresent() && best.map(b -> found.get().total() < b.total()).orElse(true)) {
        best = found;
      }
    }
    double least = edge;
    return best.filter(b -> b.total() <= least);
  }

  /** The minimum near a known one, for a function that differs little; NaN where it is lost. */
  public double[] near(double[] start) {
    double[] low = new double[start.length];
    double[] high = new double[start.length];
    for (int f = 0; f < start.length; f++) {
      low[f] = start[f] - 1;
      high[f] = start[f] + 1;
    }
    double[] lost = new double[start.length];
    Arrays.fill(lost, Double.NaN);
    return search(start, low, high).map(Best::logs).orElse(lost);
  }

  /** V + p′k. */
  public double total(double[] logs) {
    double total = Math.exp(variable.logCost(at(logs)));
    for (int f = 0; f < free.length; f++) {
      total += prices[f] * Math.exp(logs[f]);
    }
    return total;
  }

  private double[] at(double[] logs) {
    double[] point = v.clone();
    for (int f = 0; f < free.length; f++) {
      point[free[f]] = logs[f];
    }
    return point;
  }

  private Optional<Best> search(double[] start, double[] low, double[] high) {
    double[] logs = start.clone();
    double total = total(logs);
    double[] gradient = new double[free.length];
    double[][] hessian = new double[free.length][free.length];
    for (int step = 0; step < STEPS && Double.isFinite(total); step++) {
      double cost = derivatives(logs, gradient, hessian);
      double departure = Arrays.stream(gradient).map(Math::abs).max().orElse(0) / cost;
      EigenDecomposition parts = new EigenDecomposition(new Array2DRowRealMatrix(hessian));
      double least = Arrays.stream(parts.getRealEigenvalues()).min().orElse(0);
      if (departure <= ARRIVED) {
        return least > 0 ? Optional.of(new Best(logs, total, departure)) : Optional.empty();
      }
      double[] move = move(parts, gradient);
      double shrink = 1;
      double[] next = moved(logs, move, shrink);
      double there = total(next);
      while (!(there <= total + rounding(total)) && shrink > 1e-12) {
        shrink /= 2;
        next = moved(logs, move, shrink);
        there = total(next);
      }
      for (int f = 0; f < free.length; f++) {
        if (next[f] < low[f] || next[f] > high[f]) {
          return Optional.empty();
        }
      }
      logs = next;
      total = there;
    }
    return Optional.empty();
  }

  /** Sums of this size carry rounding errors of about this much. */
  private static double rounding(double total) {
    return 8 * Math.ulp(total);
  }

  private double derivatives(double[] logs, double[] gradient, double[][] hessian) {
    double[] point = at(logs);
    double[] g = new double[point.length];
    double[][] h = new double[point.length][point.length];
    variable.gradient(point, g);
    variable.hessian(point, h);
    double cost = Math.exp(variable.logCost(point));
    for (int a = 0; a < free.length; a++) {
      double bought = prices[a] * Math.exp(logs[a]);
      gradient[a] = cost * g[free[a]] + bought;
      for (int b = 0; b < free.length; b++) {
        hessian[a][b] =
            cost * (g[free[a]] * g[free[b]] + h[free[a]][free[b]]) + (a == b ? bought : 0);
      }
    }
    return cost;
  }

  /** Newton's step with curvatures made positive, no longer than one in logs. */
  private static double[] move(EigenDecomposition parts, double[] gradient) {
    RealMatrix vectors = parts.getV();
    RealVector along = vectors.transpose().operate(new ArrayRealVector(gradient));
    double[] values = parts.getRealEigenvalues();
    double largest = Arrays.stream(values).map(Math::abs).max().orElse(1);
    for (int k = 0; k < values.length; k++) {
      along.setEntry(k, -along.getEntry(k) / Math.max(Math.abs(values[k]), 1e-8 * largest));
    }
    double[] move = vectors.operate(along).toArray();
    double longest = Arrays.stream(move).map(Math::abs).max().orElse(0);
    for (int k = 0; k < move.length && longest > 1; k++) {
      move[k] /= longest;
    }
    return move;
  }

  private static double[] moved(double[] logs, double[] move, double shrink) {
    double[] next = logs.clone();
    for (int f = 0; f < next.length; f++) {
      next[f] += shrink * move[f];
    }
    return next;
  }
}

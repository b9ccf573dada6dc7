package isowright.cost;

import java.util.Arrays;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.SingularMatrixException;

/**
 * What output costs while some inputs are held at given quantities, told from the cost function of
 * the long run: the short run by virtual prices.
 *
 * <p>At the virtual prices w̄ of the held inputs h the quantities held would be bought of one's own
 * accord, x_h(w̄) = x̄_h; the other inputs, the prices of which stay, are then as in the short run,
 * so that
 *
 * <pre>  short-run cost  = C(w̄, y) + Σ_h (w_h − w̄_h) x̄_h,   marginal cost = ∂C(w̄, y)/∂y </pre>
 *
 * Short-run cost exceeds C(w, y) and touches it where x̄ = x(w, y). Solved by Newton's method on ln
 * x_h(w̄) = ln x̄_h, whose Jacobian is the price elasticities of demand. Assumes that C is a cost
 * function (concave) between w and w̄; the caller examines it at w̄.
 *
 * <p>Source: Neary, J. P. and Roberts, K. W. S. (1980), The theory of household behaviour under
 * rationing, <i>European Economic Review</i> 13, 25–42. Tested in {@code RationedCostTest}.
 */
public final class RationedCost {

  /** Relative departure of the quantities held. */
  private static final double ARRIVED = 1e-12;

  private static final int STEPS = 200;

  /** Virtual prices are looked for within e^±12, some 160,000 times, of those paid. */
  private static final double FARTHEST = 12;

  private final CostFunction function;
  private final double[] v;
  private final int[] held;
  private final double[] logQuantities;

  /**
   * The question.
   *
   * @param function long-run cost
   * @param v the point, shape A, at the prices paid
   * @param held the places of the inputs held
   * @param logQuantities the logs of their quantities
   */
  public RationedCost(CostFunction function, double[] v, int[] held, double[] logQuantities) {
    this.function = function;
    this.v = v.clone();
    this.held = held.clone();
    this.logQuantities = logQuantities.clone();
  }

  /** The point at virtual prices; absent where no such prices were found. */
  public Optional<double[]> point() {
    double[] point = v.clone();
    double[] off = departures(point);
    for (int step = 0; step < STEPS; step++) {
      double distance = largest(off);
      if (distance <= ARRIVED) {
        return Optional.of(point);
      }
      Optional<double[]> move = move(point, off);
      if (move.isEmpty()) {
        return Optional.empty();
      }
      double shrink = 1;
      double[] next = moved(point, move.get(), shrink);
      double[] there = departures(next);
      while (!(largest(there) < distance) && shrink > 1e-9) {
        shrink /= 2;
        next = moved(point, move.get(), shrink);
        there = departures(next);
      }
      if (!(largest(there) < distance)) {
        // rounding of logs of order ten leaves departures of this size
        return distance <= 1e-10 ? Optional.of(point) : Optional.empty();
      }
      point = next;
      off = there;
      for (int h : held) {
        if (Math.abs(point[h] - v[h]) > FARTHEST) {
          return Optional.empty();
        }
      }
    }
    return Optional.empty();
  }

  /** Short-run cost over C at the virtual prices: 1 + Σ_h (w_h/w̄_h − 1) s_h. */
  public double factor(double[] virtual) {
    double[] shares = CostElasticities.at(function, virtual).shares();
    double factor = 1;
    for (int h : held) {
      factor += (Math.exp(v[h] - virtual[h]) - 1) * shares[h];
    }
    return factor;
  }

  private double[] departures(double[] point) {
    double[] demands = CostElasticities.at(function, point).demands();
    double[] off = new double[held.length];
    for (int h = 0; h < held.length; h++) {
      off[h] = Math.log(demands[held[h]]) - logQuantities[h];
    }
    return off;
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double value : values) {
      if (Double.isNaN(value)) {
        return Double.POSITIVE_INFINITY;
      }
      largest = Math.max(largest, Math.abs(value));
    }
    return largest;
  }

  private Optional<double[]> move(double[] point, double[] off) {
    CostElasticities at = CostElasticities.at(function, point);
    double[][] slopes = new double[held.length][held.length];
    for (int h = 0; h < held.length; h++) {
      for (int l = 0; l < held.length; l++) {
        slopes[h][l] = at.demand(held[h], held[l]);
      }
    }
    try {
      double[] move =
          new LUDecomposition(new Array2DRowRealMatrix(slopes))
              .getSolver()
              .solve(new ArrayRealVector(off))
              .toArray();
      double longest = Math.max(1, Arrays.stream(move).map(Math::abs).max().orElse(0));
      return Optional.of(Arrays.stream(move).map(m -> -m / longest).toArray());
    } catch (SingularMatrixException still) {
      return Optional.empty(); // demand does not answer to prices
    }
  }

  private double[] moved(double[] point, double[] move, double shrink) {
    double[] next = point.clone();
    for (int h = 0; h < held.length; h++) {
      next[held[h]] += shrink * move[h];
    }
    return next;
  }
}

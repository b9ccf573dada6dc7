package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;

/**
 * Which coefficients θ make the innovations of a state unrelated to instruments, where the state is
 * what a smoothed response leaves beside the regressors and follows a first-order process?
 *
 * <p>First step: y on the columns of a basis, by weighted least squares; Φ is its fitted value.
 * Second step: with ω(θ) = Φ − Xθ and the process ω_t = g(ω_{t−1}) + ξ_t, g a polynomial with
 * columns of its own beside it, θ solves
 *
 * <pre>  Σ w z_t ξ_t(θ) = 0,   ξ(θ) the least-squares residual of ω_t on g's columns, </pre>
 *
 * with as many instruments as coefficients. The equations are solved by Newton's method with the
 * exact derivative (g is concentrated out), steps halved until they bring the moments down. They
 * may have several solutions; which is found depends on where the search begins.
 *
 * <p>Rows carry the weight of their group, so that a draw of groups needs no copy of anything. The
 * procedure is that of D. A. Ackerberg, K. Caves and G. Frazer 2015, Econometrica 83, 2411–2451,
 * section 4.3. Tested in {@code ControlFunctionTest} against R.
 */
public final class InnovationMoments {

  private static final int MOST_STEPS = 60;

  private static final int MOST_HALVINGS = 25;

  /** Steps go no further in any coefficient, lest a search leaps to a solution elsewhere. */
  private static final double LONGEST_STEP = 0.1;

  /** Moments this small beside the sizes of instrument and state are rounding. */
  private static final double ZERO = 1e-10;

  private final double[][] basis;
  private final double[] y;
  private final double[][] x;
  private final double[][] z;
  private final double[][] own;
  private final int[] current;
  private final int[] before;
  private final int[] group;
  private final int degree;
  private double centre;
  private double spread = 1;

  /**
   * Takes over the arrays.
   *
   * @param basis columns of the first step over all N rows, those that others contain already left
   *     out; orthogonal columns keep draws well conditioned
   * @param y the response, N
   * @param x the K regressors, K × N
   * @param z the K instruments, one row a pair, K × n
   * @param own columns of the process beside the polynomial, n each
   * @param current the later row of each pair
   * @param before the earlier row of each pair
   * @param group the group of each row, N
   * @param degree of the polynomial g
   */
  public InnovationMoments(
      double[][] basis,
      double[] y,
      double[][] x,
      double[][] z,
      double[][] own,
      int[] current,
      int[] before,
      int[] group,
      int degree) {
    this.basis = basis;
    this.y = y;
    this.x = x;
    this.z = z;
    this.own = own;
    this.current = current;
    this.before = before;
    this.group = group;
    this.degree = degree;
  }

  /**
   * A solution, or where the search ended without one.
   *
   * @param theta the coefficients
   * @param solved whether the moments are zero
   * @param smoothed Φ, by row
   * @param slope the weighted mean of g′: how much of the state lasts
   */
  public record Solution(double[] theta, boolean solved, double[] smoothed, double slope) {}

  /** Φ under the weights of the groups; NaN where they cannot carry the basis. */
  public double[] smoothed(double[] weights) {
    int r = basis.length;
    double[][] products = new double[r][r];
    double[] right = new double[r];
    for (int i = 0; i < y.length; i++) {
      double w = weights[group[i]];
      if (w == 0) {
        continue;
      }
      for (int a = 0; a < r; a++) {
        double wa = w * basis[a][i];
        right[a] += wa * y[i];
        for (int b = 0; b <= a; b++) {
          products[a][b] += wa * basis[b][i];
        }
      }
    }
    for (int a = 0; a < r; a++) {
      for (int b = a + 1; b < r; b++) {
        products[a][b] = products[b][a];
      }
    }
    double[] fitted = new double[y.length];
    LUDecomposition lu = new LUDecomposition(new Array2DRowRealMatrix(products, false));
    if (!lu.getSolver().isNonSingular()) {
      Arrays.fill(fitted, Double.NaN);
      return fitted;
    }
    double[] pi = lu.getSolver().solve(new ArrayRealVector(right, false)).toArray();
    for (int a = 0; a < r; a++) {
      for (int i = 0; i < fitted.length; i++) {
        fitted[i] += pi[a] * basis[a][i];
      }
    }
    return fitted;
  }

  /**
   * Sets the origin and unit in which the state enters powers, so that they are well conditioned;
   * changes no solution.
   */
  public void scaleAt(double[] smoothed, double[] theta) {
    double sum = 0;
    double squares = 0;
    for (int row : before) {
      double omega = state(smoothed, theta, row);
      sum += omega;
      squares += omega * omega;
    }
    centre = sum / before.length;
    spread = Math.sqrt(Math.max(squares / before.length - centre * centre, 1e-30));
  }

  private double state(double[] smoothed, double[] theta, int row) {
    double omega = smoothed[row];
    for (int k = 0; k < theta.length; k++) {
      omega -= theta[k] * x[k][row];
    }
    return omega;
  }

  /** Searches from a start, under the weights of the groups. */
  public Solution solve(double[] weights, double[] start) {
    double[] smoothed = smoothed(weights);
    double[] theta = start.clone();
    if (Double.isNaN(smoothed[0])) {
      return new Solution(theta, false, smoothed, Double.NaN);
    }
    Moments at = new Moments(weights, smoothed, theta);
    for (int step = 0; step < MOST_STEPS && !at.zero(); step++) {
      LUDecomposition lu = new LUDecomposition(at.jacobian);
      if (!lu.getSolver().isNonSingular()) {
        return new Solution(theta, false, smoothed, Double.NaN);
      }
      double[] move = lu.getSolver().solve(at.moments).toArray();
      double longest = 0;
      for (double part : move) {
        longest = Math.max(longest, Math.abs(part));
      }
      double share = Math.min(1, LONGEST_STEP / longest);
      Moments next = at;
      double[] moved = theta;
      for (int h = 0; h < MOST_HALVINGS; h++, share /= 2) {
        moved = theta.clone();
        for (int k = 0; k < moved.length; k++) {
          moved[k] -= share * move[k];
        }
        next = new Moments(weights, smoothed, moved);
        if (next.merit < at.merit) {
          break;
        }
      }
      if (!(next.merit < at.merit)) {
        break;
      }
      theta = moved;
      at = next;
    }
    return new Solution(theta, at.zero(), smoothed, at.slope);
  }

  /** The moments at a value of θ, with their derivative. */
  private final class Moments {
    private final RealVector moments;
    private final RealMatrix jacobian;
    private final double merit;
    private final double slope;
    private final boolean zero;

    Moments(double[] weights, double[] smoothed, double[] theta) {
      int count = theta.length;
      int h = 1 + degree + own.length;
      int n = current.length;
      double[][] columns = new double[h][n];
      double[] omega = new double[n];
      double[] w = new double[n];
      RealMatrix a = new Array2DRowRealMatrix(h, h);
      RealMatrix c = new Array2DRowRealMatrix(count, h);
      double[] right = new double[h];
      double[] zOmega = new double[count];
      double[] sizes = new double[count];
      double total = 0;
      for (int i = 0; i < n; i++) {
        w[i] = weights[group[current[i]]];
        omega[i] = state(smoothed, theta, current[i]) - centre;
        double u = (state(smoothed, theta, before[i]) - centre) / spread;
        columns[0][i] = 1;
        for (int p = 1; p <= degree; p++) {
          columns[p][i] = columns[p - 1][i] * u;
        }
        for (int s = 0; s < own.length; s++) {
          columns[1 + degree + s][i] = own[s][i];
        }
        if (w[i] == 0) {
          continue;
        }
        total += w[i];
        for (int p = 0; p < h; p++) {
          double wp = w[i] * columns[p][i];
          right[p] += wp * omega[i];
          for (int q = 0; q <= p; q++) {
            a.addToEntry(p, q, wp * columns[q][i]);
          }
          for (int k = 0; k < count; k++) {
            c.addToEntry(k, p, wp * z[k][i]);
          }
        }
        for (int k = 0; k < count; k++) {
          zOmega[k] += w[i] * z[k][i] * omega[i];
          sizes[k] += w[i] * z[k][i] * z[k][i];
        }
      }
      for (int p = 0; p < h; p++) {
        for (int q = p + 1; q < h; q++) {
          a.setEntry(p, q, a.getEntry(q, p));
        }
      }
      LUDecomposition lu = new LUDecomposition(a);
      if (!lu.getSolver().isNonSingular()) {
        moments = new ArrayRealVector(count, Double.NaN);
        jacobian = new Array2DRowRealMatrix(count, count);
        merit = Double.POSITIVE_INFINITY;
        slope = Double.NaN;
        zero = false;
        return;
      }
      double[] b = lu.getSolver().solve(new ArrayRealVector(right, false)).toArray();
      moments = new ArrayRealVector(zOmega).subtract(c.operate(new ArrayRealVector(b)));
      RealMatrix left = new Array2DRowRealMatrix(h, count);
      RealMatrix direct = new Array2DRowRealMatrix(count, count);
      double slopes = 0;
      for (int i = 0; i < n; i++) {
        if (w[i] == 0) {
          continue;
        }
        double xi = omega[i];
        double derivative = 0;
        for (int p = 0; p < h; p++) {
          xi -= b[p] * columns[p][i];
        }
        for (int p = 1; p <= degree; p++) {
          derivative += b[p] * p * columns[p - 1][i] / spread;
        }
        slopes += w[i] * derivative;
        for (int j = 0; j < count; j++) {
          double lagged = x[j][before[i]];
          double v = w[i] * (derivative * lagged - x[j][current[i]]);
          for (int p = 0; p < h; p++) {
            left.addToEntry(p, j, v * columns[p][i]);
          }
          for (int p = 1; p <= degree; p++) {
            left.addToEntry(p, j, -w[i] * xi * p * columns[p - 1][i] * lagged / spread);
          }
          for (int k = 0; k < count; k++) {
            direct.addToEntry(k, j, v * z[k][i]);
          }
        }
      }
      jacobian = direct.subtract(c.multiply(lu.getSolver().solve(left)));
      slope = slopes / total;
      double squares = 0;
      boolean small = true;
      for (int k = 0; k < count; k++) {
        double scaled = moments.getEntry(k) / Math.sqrt(sizes[k] * total) / spread;
        squares += scaled * scaled;
        small &= Math.abs(scaled) < ZERO;
      }
      merit = squares;
      zero = small;
    }

    boolean zero() {
      return zero;
    }
  }
}

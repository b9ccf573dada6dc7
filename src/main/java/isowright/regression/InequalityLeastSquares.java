package isowright.regression;

import java.util.Arrays;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Which coefficients make the sum of squares least among those that meet smooth inequalities g_j(β)
 * ≥ 0?
 *
 * <p>The rows enter through the free fit alone. With F its inverse factor (F F′ = (X′X)⁻¹), b its
 * coefficients and s² its residual variance, β = b + s F γ gives SSR(β) = SSR(b) + s² ‖γ‖²: the
 * coefficients wanted are those of the shortest γ, whatever the units and the condition of X.
 *
 * <p><b>Method.</b> Sequential quadratic programming: at each step the inequalities are made
 * linear, the curvature of the Lagrangian is built up from the slopes seen (Powell's damped
 * update), the nearest point is found ({@link NearestPoint}), and the step is shortened until ½‖γ‖²
 * + ρ Σ max(0, −g_j) falls; a step that is refused is first bent once toward the curved
 * inequalities. What is found is a local optimum; where the inequalities are not convex, several
 * starts are for the caller to try.
 *
 * <p>Sources: Powell, M. J. D. (1978), A Fast Algorithm for Nonlinearly Constrained Optimization
 * Calculations, in G. A. Watson (ed.), <i>Numerical Analysis</i> (Dundee 1977), 144–157; Nocedal,
 * J. and Wright, S. J. (2006), <i>Numerical Optimization</i>, 2nd ed., algorithm 18.3 and section
 * 15.6 (second-order correction). Tested in {@code InequalityLeastSquaresTest} and, against an
 * independent solution, in {@code RegularityImposedTest}.
 */
public final class InequalityLeastSquares {

  private static final int MOST_STEPS = 300;

  /** A step this short, in units of standard errors, ends the search. */
  private static final double STEP = 1e-9;

  /** An inequality counts as met when missed by no more than this. */
  static final double MISSED = 1e-9;

  /** Shares of what is missed that a step tries to make up, where all of it cannot be. */
  private static final double[] SHARES = {1, 0.5, 0.1, 0.02};

  private final double[] centre;
  private final double[][] factor;
  private final Inequalities inequalities;
  private final int size;

  /**
   * What was found.
   *
   * @param coefficients β, shape K
   * @param move γ, shape K
   * @param distance ‖γ‖²: the rise of the sum of squares in units of s²
   * @param multipliers of the inequalities in the problem of ½‖γ‖², shape m; zero where an
   *     inequality does not bind
   * @param departure ‖γ − Σ u_j ∂g_j/∂γ‖, zero at an optimum
   * @param binding ∂g_j/∂γ of the inequalities that bind, one row each
   * @param steps how many steps it took
   */
  public record Found(
      double[] coefficients,
      double[] move,
      double distance,
      double[] multipliers,
      double departure,
      double[][] binding,
      int steps) {}

  /**
   * About the centre b.
   *
   * @param centre b, shape K
   * @param factor s F, K × K
   */
  public InequalityLeastSquares(double[] centre, double[][] factor, Inequalities inequalities) {
    this.centre = centre;
    this.factor = factor;
    this.inequalities = inequalities;
    this.size = centre.length;
  }

  /** s F of a fit; s is one where the fit has no error. */
  public static double[][] scaledFactor(LinearFit fit) {
    double variance = fit.residualVariance();
    double s = variance > 0 ? Math.sqrt(variance) : 1;
    double[][] scaled = fit.inverseFactor();
    for (double[] row : scaled) {
      for (int k = 0; k < row.length; k++) {
        row[k] *= s;
      }
    }
    return scaled;
  }

  /** A point of the search with everything known there. */
  private final class Point {
    final double[] move;
    final double[] values = new double[inequalities.count()];
    final double[][] slopes;

    Point(double[] move) {
      this.move = move;
      double[][] gradients = new double[values.length][size];
      inequalities.at(coefficients(move), values, gradients);
      this.slopes = gradients;
      for (double[] gradient : gradients) {
        turn(gradient);
      }
    }

    double missed() {
      double sum = 0;
      for (double value : values) {
        sum += Math.max(0, -value);
      }
      return sum;
    }

    double merit(double penalty) {
      double merit = 0.5 * Matrices.dot(move, move) + penalty * missed();
      return Double.isNaN(merit) ? Double.POSITIVE_INFINITY : merit;
    }

    /** γ − Σ u_j a_j. */
    double[] lagrangian(double[] multipliers) {
      double[] gradient = move.clone();
      for (int j = 0; j < values.length; j++) {
        for (int k = 0; multipliers[j] != 0 && k < size; k++) {
          gradient[k] -= multipliers[j] * slopes[j][k];
        }
      }
      return gradient;
    }
  }

  private double[] coefficients(double[] move) {
    double[] beta = centre.clone();
    for (int i = 0; i < size; i++) {
      beta[i] += Matrices.dot(factor[i], move);
    }
    return beta;
  }

  /** From ∂g/∂β to ∂g/∂γ, in place. */
  private void turn(double[] gradient) {
    double[] turned = new double[size];
    for (int i = 0; i < size; i++) {
      for (int k = 0; gradient[i] != 0 && k < size; k++) {
        turned[k] += factor[i][k] * gradient[i];
      }
    }
    System.arraycopy(turned, 0, gradient, 0, size);
  }

  /**
   * Searches.
   *
   * @param start γ to start from, shape K; need not meet the inequalities
   * @return empty where the search came to no optimum
   */
  public Optional<Found> from(double[] start) {
    Point here = new Point(start.clone());
    double[][] curvature = identity(size);
    double penalty = 1;
    for (int step = 1; step <= MOST_STEPS; step++) {
      double[][] lower = cholesky(curvature);
      Optional<NearestPoint.Found> solved = subproblem(here, lower, here.values);
      if (solved.isEmpty()) {
        return Optional.empty();
      }
      double[] d = backward(lower, solved.get().point());
      double[] u = solved.get().multipliers();
      double length = Math.sqrt(Matrices.dot(d, d));
      double reach = 1 + Math.sqrt(Matrices.dot(here.move, here.move));
      if (length <= STEP * reach && here.missed() <= MISSED) {
        return Optional.of(found(here, u, step));
      }
      penalty = Math.max(penalty, 2 * Arrays.stream(u).max().orElse(0));
      Optional<Point> next = walk(here, d, penalty, lower);
      if (next.isEmpty()) {
        // No fall is left in the digits; near enough if the step was short and nothing is missed.
        boolean near = length <= 1e-6 * reach && here.missed() <= MISSED;
        return near ? Optional.of(found(here, u, step)) : Optional.empty();
      }
      update(curvature, here, next.get(), u);
      here = next.get();
    }
    return Optional.empty();
  }

  private Found found(Point here, double[] u, int steps) {
    double[] left = here.lagrangian(u);
    return new Found(
        coefficients(here.move),
        here.move,
        Matrices.dot(here.move, here.move),
        u,
        Math.sqrt(Matrices.dot(left, left)),
        IntStream.range(0, u.length)
            .filter(j -> u[j] > 0)
            .mapToObj(j -> here.slopes[j].clone())
            .toArray(double[][]::new),
        steps);
  }

  /** The step in the units in which the curvature is the identity. */
  private Optional<NearestPoint.Found> subproblem(Point here, double[][] lower, double[] values) {
    int m = values.length;
    double[] target = forward(lower, here.move);
    for (int k = 0; k < size; k++) {
      target[k] = -target[k];
    }
    double[][] normals = new double[m][];
    for (int j = 0; j < m; j++) {
      normals[j] = forward(lower, here.slopes[j]);
    }
    for (double share : SHARES) {
      double[] bounds = new double[m];
      for (int j = 0; j < m; j++) {
        bounds[j] = values[j] < 0 ? -share * values[j] : -values[j];
      }
      Optional<NearestPoint.Found> found = NearestPoint.to(target, normals, bounds);
      if (found.isPresent()) {
        return found;
      }
    }
    return Optional.empty();
  }

  /** The first point along a step at which the merit has fallen enough. */
  private Optional<Point> walk(Point here, double[] d, double penalty, double[][] lower) {
    double merit = here.merit(penalty);
    double slope = Matrices.dot(here.move, d) - penalty * here.missed();
    for (double share = 1; share > 1e-8; share /= 2) {
      Point there = new Point(along(here.move, d, share));
      double enough = merit + 1e-4 * share * Math.min(slope, 0);
      if (there.merit(penalty) <= enough) {
        return Optional.of(there);
      }
      if (share == 1) {
        Optional<Point> bent = bent(here, there, d, lower);
        if (bent.isPresent() && bent.get().merit(penalty) <= enough) {
          return bent;
        }
      }
    }
    return Optional.empty();
  }

  /** The full step, bent toward the inequalities as they are at its end. */
  private Optional<Point> bent(Point here, Point there, double[] d, double[][] lower) {
    double[] values = new double[there.values.length];
    for (int j = 0; j < values.length; j++) {
      values[j] = there.values[j] - Matrices.dot(here.slopes[j], d);
      if (!Double.isFinite(values[j])) {
        return Optional.empty();
      }
    }
    return subproblem(here, lower, values)
        .map(found -> new Point(along(here.move, backward(lower, found.point()), 1)));
  }

  private static double[] along(double[] from, double[] d, double share) {
    double[] to = from.clone();
    for (int k = 0; k < to.length; k++) {
      to[k] += share * d[k];
    }
    return to;
  }

  /** Powell's damped update of the curvature of the Lagrangian. */
  private void update(double[][] curvature, Point from, Point to, double[] u) {
    double[] before = from.lagrangian(u);
    double[] change = to.lagrangian(u);
    double[] step = new double[size];
    double[] bent = new double[size];
    for (int k = 0; k < size; k++) {
      step[k] = to.move[k] - from.move[k];
      change[k] -= before[k];
    }
    for (int k = 0; k < size; k++) {
      bent[k] = Matrices.dot(curvature[k], step);
    }
    double own = Matrices.dot(step, bent);
    double seen = Matrices.dot(step, change);
    double weight = seen >= 0.2 * own ? 1 : 0.8 * own / (own - seen);
    double denominator = weight * seen + (1 - weight) * own;
    if (!(own > 0) || !(denominator > 0) || !Double.isFinite(seen)) {
      return;
    }
    for (int k = 0; k < size; k++) {
      change[k] = weight * change[k] + (1 - weight) * bent[k];
    }
    for (int k = 0; k < size; k++) {
      for (int l = 0; l < size; l++) {
        curvature[k][l] += change[k] * change[l] / denominator - bent[k] * bent[l] / own;
      }
    }
  }

  private static double[][] identity(int size) {
    double[][] identity = new double[size][size];
    for (int k = 0; k < size; k++) {
      identity[k][k] = 1;
    }
    return identity;
  }

  /** L with L L′ the matrix; a pivot that rounding has spent is given a small one. */
  private static double[][] cholesky(double[][] matrix) {
    int n = matrix.length;
    double[][] lower = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = matrix[i][j];
        for (int k = 0; k < j; k++) {
          sum -= lower[i][k] * lower[j][k];
        }
        lower[i][j] = i == j ? Math.sqrt(Math.max(sum, 1e-10)) : sum / lower[j][j];
      }
    }
    return lower;
  }

  private static double[] forward(double[][] lower, double[] right) {
    double[] x = right.clone();
    for (int i = 0; i < x.length; i++) {
      for (int k = 0; k < i; k++) {
        x[i] -= lower[i][k] * x[k];
      }
      x[i] /= lower[i][i];
    }
    return x;
  }

  private static double[] backward(double[][] lower, double[] right) {
    double[] x = right.clone();
    for (int i = x.length - 1; i >= 0; i--) {
      for (int k = i + 1; k < x.length; k++) {
        x[i] -= lower[k][i] * x[k];
      }
      x[i] /= lower[i][i];
    }
    return x;
  }
}

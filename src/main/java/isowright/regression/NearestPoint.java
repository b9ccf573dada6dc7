package isowright.regression;

import java.util.Arrays;
import java.util.Optional;

/**
 * Which point that meets linear inequalities n_j′x ≥ b_j is nearest to a given point?
 *
 * <p>The dual method of Goldfarb and Idnani for a quadratic objective whose matrix is the identity:
 * it starts at the given point, takes in the inequality that is missed by most, moves to the
 * nearest point that meets it together with those taken in before, and lets go of those whose
 * multiplier would turn negative. The optimum is reached after finitely many steps, or no point
 * meets all.
 *
 * <p>Sizes: a few dozen unknowns, some hundred inequalities. Those taken in are decomposed afresh
 * at each step by repeated orthogonalisation, which at this size costs nothing and forgets no
 * digits.
 *
 * <p>Source: Goldfarb, D. and Idnani, A. (1983), A Numerically Stable Dual Method for Solving
 * Strictly Convex Quadratic Programs, <i>Mathematical Programming</i> 27, 1–33. Tested in {@code
 * InequalityLeastSquaresTest}.
 */
final class NearestPoint {

  /** An inequality missed by less than this, its normal of length one, counts as met. */
  private static final double MISSED = 1e-12;

  /** A normal of length one of which less than this is new depends on those taken in. */
  private static final double DEPENDENT = 1e-9;

  private final double[][] normals;
  private final double[] bounds;
  private final double[] lengths;
  private final double[] point;
  private final int[] active;
  private final double[] multipliers;
  private final double[][] basis;
  private final double[][] triangle;
  private int count;

  /**
   * @param point the point found
   * @param multipliers u_j ≥ 0 with point − given = Σ u_j n_j
   */
  record Found(double[] point, double[] multipliers) {}

  private NearestPoint(double[] given, double[][] normals, double[] bounds) {
    int size = given.length;
    this.point = given.clone();
    this.normals = new double[normals.length][];
    this.bounds = new double[normals.length];
    this.lengths = new double[normals.length];
    for (int j = 0; j < normals.length; j++) {
      lengths[j] = Math.sqrt(Matrices.dot(normals[j], normals[j]));
      double scale = lengths[j] > 0 ? 1 / lengths[j] : 1;
      this.normals[j] = Arrays.stream(normals[j]).map(v -> v * scale).toArray();
      this.bounds[j] = bounds[j] * scale;
    }
    this.active = new int[size + 1];
    this.multipliers = new double[size + 1];
    this.basis = new double[size + 1][size];
    this.triangle = new double[size + 1][size + 1];
  }

  /**
   * The nearest point; empty where no point meets all inequalities.
   *
   * @param normals n_j, shape m × k
   * @param bounds b_j, shape m
   */
  static Optional<Found> to(double[] given, double[][] normals, double[] bounds) {
    NearestPoint search = new NearestPoint(given, normals, bounds);
    int most = 50 * (given.length + normals.length + 1);
    for (int step = 0; step < most; step++) {
      int missed = search.mostMissed();
      if (missed < 0) {
        return Optional.of(search.found());
      }
      if (!search.takeIn(missed)) {
        return Optional.empty();
      }
    }
    return Optional.empty();
  }

  private Found found() {
    double[] all = new double[normals.length];
    for (int a = 0; a < count; a++) {
      all[active[a]] = multipliers[a] / lengths[active[a]];
    }
    return new Found(point, all);
  }

  private int mostMissed() {
    double size = 1 + Math.sqrt(Matrices.dot(point, point));
    double worst = -MISSED * size;
    int which = -1;
    for (int j = 0; j < normals.length; j++) {
      double slack = Matrices.dot(normals[j], point) - bounds[j];
      if (slack < worst) {
        worst = slack;
        which = j;
      }
    }
    return which;
  }

  /** Whether the inequality could be met together with those that had to be kept. */
  private boolean takeIn(int missed) {
    double[] normal = normals[missed];
    double own = 0;
    while (true) {
      double[] weights = new double[count];
      double[] rest = apart(normal, weights);
      double length = Matrices.dot(rest, rest);
      int first = -1;
      double partial = Double.POSITIVE_INFINITY;
      for (int a = 0; a < count; a++) {
        if (weights[a] > 0 && multipliers[a] / weights[a] < partial) {
          partial = multipliers[a] / weights[a];
          first = a;
        }
      }
      boolean free = length > DEPENDENT * DEPENDENT;
      double slack = Matrices.dot(normal, point) - bounds[missed];
      double full = free ? -slack / length : Double.POSITIVE_INFINITY;
      double step = Math.min(partial, full);
      if (Double.isInfinite(step) || Double.isNaN(step)) {
        return false;
      }
      for (int a = 0; a < count; a++) {
        multipliers[a] -= step * weights[a];
      }
      own += step;
      for (int k = 0; free && k < point.length; k++) {
        point[k] += step * rest[k];
      }
      if (full <= partial) {
        active[count] = missed;
        multipliers[count] = own;
        count++;
        decompose(count - 1);
        return true;
      }
      letGo(first);
    }
  }

  /** The part of a normal that those taken in do not span; the weights of the part they do. */
  private double[] apart(double[] normal, double[] weights) {
    double[] rest = normal.clone();
    for (int pass = 0; pass < 2; pass++) {
      for (int a = 0; a < count; a++) {
        double along = Matrices.dot(basis[a], rest);
        weights[a] += along;
        for (int k = 0; k < rest.length; k++) {
          rest[k] -= along * basis[a][k];
        }
      }
    }
    for (int a = count - 1; a >= 0; a--) {
      for (int b = a + 1; b < count; b++) {
        weights[a] -= triangle[a][b] * weights[b];
      }
      weights[a] /= triangle[a][a];
    }
    return rest;
  }

  private void letGo(int which) {
    for (int a = which; a + 1 < count; a++) {
      active[a] = active[a + 1];
      multipliers[a] = multipliers[a + 1];
    }
    count--;
    for (int a = which; a < count; a++) {
      decompose(a);
    }
  }

  /** Column a of the decomposition of the normals taken in: basis · triangle. */
  private void decompose(int a) {
    double[] rest = normals[active[a]].clone();
    for (int b = 0; b < a; b++) {
      triangle[b][a] = 0;
    }
    for (int pass = 0; pass < 2; pass++) {
      for (int b = 0; b < a; b++) {
        double along = Matrices.dot(basis[b], rest);
        triangle[b][a] += along;
        for (int k = 0; k < rest.length; k++) {
          rest[k] -= along * basis[b][k];
        }
      }
    }
    double length = Math.sqrt(Matrices.dot(rest, rest));
    triangle[a][a] = length;
    for (int k = 0; k < rest.length; k++) {
      basis[a][k] = rest[k] / length;
    }
  }
}

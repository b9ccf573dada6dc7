package isowright.estimation;

import java.util.ArrayList;
import java.util.List;

/**
 * The columns that smooth output before a control function looks at it: every product of powers of
 * some variables up to a degree, and columns beside them, made orthonormal over the rows (so that
 * sums over any draw of plants are well conditioned) and without those that others contain.
 */
final class Smoothing {

  /** A column of which the others leave less than this share of its length says nothing new. */
  private static final double NOTHING_NEW = 1e-7;

  private Smoothing() {}

  /** All products of powers of degree 1 to {@code degree}, of centred and scaled variables. */
  static List<double[]> powers(List<double[]> variables, int degree) {
    List<double[]> scaled = variables.stream().map(Smoothing::scaled).toList();
    List<double[]> all = new ArrayList<>();
    grow(scaled, 0, degree, new double[0], all);
    return all;
  }

  private static void grow(
      List<double[]> variables, int from, int left, double[] product, List<double[]> all) {
    if (left == 0) {
      return;
    }
    for (int v = from; v < variables.size(); v++) {
      double[] next = variables.get(v).clone();
      for (int r = 0; r < product.length; r++) {
        next[r] *= product[r];
      }
      all.add(next);
      grow(variables, v, left - 1, next, all);
    }
  }

  private static double[] scaled(double[] column) {
    double mean = 0;
    for (double value : column) {
      mean += value / column.length;
    }
    double squares = 0;
    for (double value : column) {
      squares += (value - mean) * (value - mean);
    }
    double spread = Math.sqrt(squares / column.length);
    double[] moved = new double[column.length];
    for (int r = 0; r < moved.length; r++) {
      moved[r] = spread > 0 ? (column[r] - mean) / spread : 0;
    }
    return moved;
  }

  /** The span of a constant and these columns, as orthogonal columns of mean square one. */
  static double[][] orthonormal(List<double[]> columns, int rows) {
    List<double[]> kept = new ArrayList<>();
    double[] ones = new double[rows];
    java.util.Arrays.fill(ones, 1);
    kept.add(ones);
    for (double[] column : columns) {
      double[] left = column.clone();
      double before = Math.sqrt(dot(left, left));
      // Twice is enough: W. Kahan, in B. N. Parlett 1980, The Symmetric Eigenvalue Problem, 6.9.
      for (int pass = 0; pass < 2; pass++) {
        for (double[] other : kept) {
          double share = dot(left, other) / rows;
          for (int r = 0; r < rows; r++) {
            left[r] -= share * other[r];
          }
        }
      }
      double after = Math.sqrt(dot(left, left));
      if (after > NOTHING_NEW * before) {
        for (int r = 0; r < rows; r++) {
          left[r] *= Math.sqrt(rows) / after;
        }
        kept.add(left);
      }
    }
    return kept.toArray(double[][]::new);
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int r = 0; r < a.length; r++) {
      sum += a[r] * b[r];
    }
    return sum;
  }
}

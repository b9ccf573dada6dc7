package isowright.technology;

import java.util.ArrayList;
import java.util.List;

/**
 * Shares that sum to one, as a function of the log ratios of all but the last to the last: δ =
 * softmax(θ, 0). Whatever step a search takes in θ, the shares stay positive; a share that wants to
 * be zero shows as a ratio without bound.
 */
final class LogRatios {

  /** A share under this says that what it weighs adds nothing: the log ratio has run away. */
  private static final double SMALLEST_SHARE = 1e-6;

  private LogRatios() {}

  /** The names of the ratios for shares of these things. */
  static List<String> names(List<String> things) {
    int last = things.size() - 1;
    List<String> names = new ArrayList<>();
    for (String thing : things.subList(0, last)) {
      names.add("ln(share:" + thing + "/share:" + things.get(last) + ")");
    }
    return List.copyOf(names);
  }

  /**
   * The shares, shape n, relative to the largest so that nothing overflows.
   *
   * @param inner holds the n − 1 ratios from {@code from} on
   */
  static double[] shares(double[] inner, int from, int n) {
    double largest = 0;
    for (int i = 0; i < n - 1; i++) {
      largest = Math.max(largest, inner[from + i]);
    }
    double[] shares = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      shares[i] = Math.exp((i < n - 1 ? inner[from + i] : 0) - largest);
      sum += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= sum;
    }
    return shares;
  }

  /** Whether every share is large enough to be one. */
  static boolean admissible(double[] shares) {
    for (double share : shares) {
      if (!(share >= SMALLEST_SHARE)) {
        return false;
      }
    }
    return true;
  }

  /**
   * ∂δ_j/∂θ_i = δ_j ([i = j] − δ_i), one row for each share.
   *
   * @param columns the width of the rows
   * @param at the column of the first ratio
   */
  static List<double[]> slopes(double[] shares, int columns, int at) {
    List<double[]> rows = new ArrayList<>();
    for (int j = 0; j < shares.length; j++) {
      double[] row = new double[columns];
      for (int i = 0; i < shares.length - 1; i++) {
        row[at + i] = shares[j] * ((i == j ? 1 : 0) - shares[i]);
      }
      rows.add(row);
    }
    return rows;
  }
}

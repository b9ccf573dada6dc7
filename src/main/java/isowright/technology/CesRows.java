package isowright.technology;

import java.util.Arrays;

/**
 * h = ν M(t) and its derivatives for a block of rows at once, by the formulas of {@link PowerMean}:
 * loops over rows inside loops over inputs, so that what can be done several rows at a time is.
 *
 * <p>The columns of derivatives serve as room for e^{x_i} − 1 until the row's sums are known. An
 * object belongs to one thread.
 */
final class CesRows {

  /** Rows at a time: the columns in use stay in the nearest cache. */
  static final int BLOCK = 256;

  private final double[][] z;
  private final double[] shares;
  private final double scale;
  private final double order;
  private final double[] value;
  private final double[] byScale;
  private final double[] byRho;

  /** Columns 1 … n − 1 hold e^{x_i} − 1 of the block at first. */
  private final double[][] derivatives;

  private final double[] centre = new double[BLOCK];
  private final double[] reach = new double[BLOCK];
  private final double[] x = new double[BLOCK];
  private final double[] excess = new double[BLOCK];
  private final double[] drift = new double[BLOCK];

  /** One row, for the formulas that take a row. */
  private final double[] row;

  private final double[] zeros;
  private final double[] slopes;

  /**
   * An evaluation of all rows at one set of parameters.
   *
   * @param z {@code z[i][row]}, n columns
   * @param shares δ, shape n
   * @param order t = −ρ
   * @param value {@code value[row]}
   * @param derivatives {@code derivatives[k][row]}: scale, n − 1 log ratios, ρ
   */
  CesRows(
      double[][] z,
      double[] shares,
      double scale,
      double order,
      double[] value,
      double[][] derivatives) {
    int n = shares.length;
    this.z = z;
    this.shares = shares;
    this.scale = scale;
    this.order = order;
    this.value = value;
    this.byScale = derivatives[0];
    this.byRho = derivatives[n];
    this.derivatives = derivatives;
    this.row = new double[n];
    this.zeros = new double[n];
    this.slopes = new double[n];
  }

  /** Rows {@code from} to {@code from + length − 1}; at most {@link #BLOCK}. */
  void evaluate(int from, int length) {
    if (Math.abs(order) < PowerMean.NEGLIGIBLE || Double.isInfinite(order)) {
      for (int r = from; r < from + length; r++) {
        alone(r);
      }
      return;
    }
    centre(from, length);
    Arrays.fill(reach, 0, length, 0);
    Arrays.fill(excess, 0, length, 0);
    Arrays.fill(drift, 0, length, 0);
    for (int i = 0; i < shares.length; i++) {
      powers(i, from, length);
    }
    finish(from, length);
    for (int r = 0; r < length; r++) {
      if (!(reach[r] <= PowerMean.NEAR)) {
        alone(from + r);
      }
    }
  }

  /** Σ δ_i (z_i − z_0), row by row. */
  private void centre(int from, int length) {
    Arrays.fill(centre, 0, length, 0);
    double[] first = z[0];
    for (int i = 1; i < shares.length; i++) {
      double[] zi = z[i];
      double share = shares[i];
      for (int r = 0; r < length; r++) {
        centre[r] += share * (zi[from + r] - first[from + r]);
      }
    }
  }

  /** Adds input i to the sums w and a of every row. */
  private void powers(int i, int from, int length) {
    double[] zi = z[i];
    double[] first = z[0];
    double share = shares[i];
    double t = order;
    for (int r = 0; r < length; r++) {
      double xr = t * (zi[from + r] - first[from + r] - centre[r]);
      x[r] = xr;
      reach[r] = Math.max(reach[r], Math.abs(xr));
    }
    // The last input has no log ratio of its own; its column is overwritten at the end.
    double[] less = i < shares.length - 1 ? derivatives[1 + i] : byRho;
    for (int r = 0; r < length; r++) {
      double xr = x[r];
      double phi = PowerMean.phi(xr);
      double lessOne = xr + phi;
      less[from + r] = lessOne;
      excess[r] += share * phi;
      drift[r] += share * xr * lessOne;
    }
  }

  /** From the sums of a row to its value and derivatives. */
  private void finish(int from, int length) {
    int n = shares.length;
    double[] first = z[0];
    for (int r = 0; r < length; r++) {
      double w = excess[r];
      double inverse = 1 / (1 + w);
      double log = PowerMean.logOnePlus(w);
      double mean = first[from + r] + centre[r] + log / order;
      value[from + r] = scale * mean;
      byScale[from + r] = mean;
      byRho[from + r] = -scale * (drift[r] * inverse - log) / order / order;
      x[r] = inverse / order;
    }
    for (int i = 0; i < n - 1; i++) {
      double[] byRatio = derivatives[1 + i];
      double factor = scale * shares[i];
      for (int r = 0; r < length; r++) {
        byRatio[from + r] = factor * (byRatio[from + r] - excess[r]) * x[r];
      }
    }
  }

  /** One row by the formulas that hold everywhere. */
  private void alone(int r) {
    int n = shares.length;
    for (int i = 0; i < n; i++) {
      row[i] = z[i][r];
    }
    double mean = PowerMean.log(row, zeros, shares, order);
    value[r] = scale * mean;
    PowerMean.shareSlopes(row, zeros, shares, order, slopes, 0);
    for (int i = 0; i < n - 1; i++) {
      derivatives[1 + i][r] = scale * shares[i] * slopes[i];
    }
    derivatives[0][r] = mean;
    byRho[r] = -scale * PowerMean.orderSlope(row, zeros, shares, order);
  }
}

package isowright.regression;

import java.util.Arrays;

/**
 * Coefficients of one linear model fitted again and again, to samples of its groups or without some
 * of its rows.
 *
 * <p>A refit that lost rank has no coefficients (NaN); that is a state to be counted, not an error.
 */
public final class Refits {

  private final int columns;
  private final double[] coefficients;
  private final double[] sums;
  private final boolean[] failed;

  Refits(int count, int columns) {
    this.columns = columns;
    this.coefficients = new double[Math.multiplyExact(count, columns)];
    this.sums = new double[count];
    this.failed = new boolean[count];
  }

  /** How many refits there are. */
  public int count() {
    return failed.length;
  }

  /** Whether refit i lost rank: its rows cannot tell the columns apart. */
  public boolean failed(int i) {
    return failed[i];
  }

  /** How many refits lost rank. */
  public int failures() {
    int count = 0;
    for (boolean one : failed) {
      count += one ? 1 : 0;
    }
    return count;
  }

  /** The coefficients of refit i, shape K; NaN where it failed. */
  public double[] coefficients(int i) {
    return Arrays.copyOfRange(coefficients, i * columns, (i + 1) * columns);
  }

  /** Coefficient k of refit i. */
  public double coefficient(int i, int k) {
    return coefficients[i * columns + k];
  }

  /** The sum of squared residuals of refit i. */
  public double ssr(int i) {
    return sums[i];
  }

  /** Writes a refit; called once for each, by any thread. */
  void set(int i, GroupProducts products, PackedSolver solver, boolean usable) {
    if (usable) {
      products.coefficients(solver.move(), coefficients, i * columns);
      sums[i] = solver.sumOfSquares() * products.scale() * products.scale();
    } else {
      failed[i] = true;
      sums[i] = Double.NaN;
      Arrays.fill(coefficients, i * columns, (i + 1) * columns, Double.NaN);
    }
  }
}

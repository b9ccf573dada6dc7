package isowright.regression;

import java.util.Arrays;
import java.util.Optional;

/**
 * Coefficients of one linear model fitted again and again, to samples of its groups or without some
 * of its rows.
 *
 * <p>A refit that lost rank has no coefficients (NaN); that is a state to be counted, not an error.
 */
public final class Refits {

  /** What is done with a refit before it is kept. */
  @FunctionalInterface
  public interface Revision {

    /**
     * Other coefficients in place of those of least squares; called from several threads.
     *
     * @param coefficients b of the refit, shape K
     * @param factor G, upper triangular, K × K: b + G γ has a sum of squares larger by s² ‖γ‖², s²
     *     the residual variance of the fit of all rows
     * @return empty where there are none
     */
    Optional<double[]> revised(double[] coefficients, double[][] factor);
  }

  /** Refits are kept as they are. */
  static final Revision AS_THEY_ARE = (coefficients, factor) -> Optional.of(coefficients);

  private final Revision revision;
  private final int columns;
  private final double[] coefficients;
  private final double[] sums;
  private final boolean[] failed;
  private final boolean[] notRevised;

  Refits(int count, int columns, Revision revision) {
    this.revision = revision;
    this.columns = columns;
    this.coefficients = new double[Math.multiplyExact(count, columns)];
    this.sums = new double[count];
    this.failed = new boolean[count];
    this.notRevised = new boolean[count];
  }

  /** How many refits there are. */
  public int count() {
    return failed.length;
  }

  /** Whether refit i lost rank: its rows cannot tell the columns apart. */
  public boolean failed(int i) {
    return failed[i];
  }

  /** Whether refit i failed because nothing could be put in place of its coefficients. */
  public boolean notRevised(int i) {
    return notRevised[i];
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
      if (revision != AS_THEY_ARE) {
        revise(i, products, solver);
      }
    } else {
      failed[i] = true;
      sums[i] = Double.NaN;
      Arrays.fill(coefficients, i * columns, (i + 1) * columns, Double.NaN);
    }
  }

  private void revise(int i, GroupProducts products, PackedSolver solver) {
    Optional<double[]> revised =
        revision.revised(coefficients(i), products.factorOf(solver.inverseTransposed()));
    notRevised[i] = revised.isEmpty();
    failed[i] = notRevised[i];
    double[] kept = revised.orElseGet(() -> new double[columns]);
    System.arraycopy(kept, 0, coefficients, i * columns, columns);
  }
}

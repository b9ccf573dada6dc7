package isowright.regression;

import java.util.List;

/**
 * Rows of a regression: K regressors and a response, handed over block by block so that no
 * estimator needs a copy of the data. A design may be computed on the fly (logs, products,
 * deviations from group means, derivatives of a nonlinear model); it must give the same numbers
 * each time and be safe to read from several threads.
 */
public interface Design {

  /** The number of rows, N. */
  int rows();

  /** The names of the K regressors, in order. A constant, where there is one, is a regressor. */
  List<String> columns();

  /** The groups of rows (contiguous); one group a row where rows are independent. */
  Groups groups();

  /**
   * Writes rows {@code from} (inclusive) to {@code to} (exclusive).
   *
   * @param from a group boundary
   * @param to a group boundary
   * @param into K + 1 columns, each at least {@code to − from} long: {@code into[k][row − from]} is
   *     regressor k, {@code into[K][row − from]} the response; overwritten
   */
  void fill(int from, int to, double[][] into);

  /**
   * Writes the same rows as {@link #fill(int, int, double[][])} and says how large they were before
   * anything was removed from them: what is left of a column can only be called zero against that.
   *
   * <p>A design that removes something from another one (group means, say), or that wraps such a
   * design, overrides this; for all others nothing is removed and the default is right.
   *
   * @param squares K + 1 sums, one a column; the sum of squares of the column over these rows
   *     before removal is added to it
   */
  default void fill(int from, int to, double[][] into, double[] squares) {
    fill(from, to, into);
    for (int k = 0; k < squares.length; k++) {
      squares[k] += OrthogonalDecomposition.sumOfSquares(into[k], 0, to - from);
    }
  }

  /**
   * How many parameters were removed from the rows beforehand (group means, say); none by default.
   */
  default int absorbed() {
    return 0;
  }

  /** The design before anything was removed from its rows; itself where nothing was. */
  default Design before() {
    return this;
  }

  /**
   * What was done to the rows of {@link #before()}, done to those of another design of the same
   * rows and groups; the other design itself where nothing was done.
   */
  default Design likewise(Design other) {
    return other;
  }

  /**
   * The leverage that the removed parameters have at a row, on top of that of the regressors; zero
   * by default.
   */
  default double absorbedLeverage(int row) {
    return 0;
  }
}

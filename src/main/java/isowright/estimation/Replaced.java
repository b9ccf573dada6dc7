package isowright.estimation;

import isowright.regression.LinearFit;

/** A least-squares fit with other coefficients in place of its own. */
final class Replaced {

  private Replaced() {}

  static LinearFit coefficients(LinearFit least, double[] coefficients, double ssr) {
    return new LinearFit(
        least.columns(),
        coefficients,
        least.estimated(),
        least.inverseFactor(),
        ssr,
        least.totalSumOfSquares(),
        least.rows(),
        least.absorbed(),
        least.rank(),
        least.collinearities(),
        least.rankRule(),
        least.pivots());
  }
}

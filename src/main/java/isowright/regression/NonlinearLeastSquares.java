package isowright.regression;

import java.util.Arrays;

/**
 * Nonlinear least squares: which parameters θ make Σ (y − f(θ))² least?
 *
 * <p>The method of Levenberg and Marquardt in the form of J. J. Moré ("The Levenberg-Marquardt
 * algorithm: implementation and theory", 1978), with the exact Jacobian. A step of it depends on
 * the rows only through J′J, J′r and ‖r‖; so at each θ the rows of [J r] are streamed through
 * {@link OrthogonalDecomposition}, and the search sees the (K + 1) × (K + 1) factor instead of the
 * N × K Jacobian. After the search a few Gauss-Newton steps sharpen the answer beyond what the sum
 * of squares can resolve, as long as each at least halves the angle.
 *
 * <p>Whether it has converged is decided afterwards and apart from the search, by the angle between
 * the residual and the space of the Jacobian columns (D. M. Bates and D. G. Watts 1981, "A relative
 * offset orthogonality convergence criterion for nonlinear least squares", Technometrics 23,
 * 179–183): a cosine c means that no parameter is further from the solution than about c √(N − K)
 * of its standard errors. Where the fit is exact the residual is rounding and has no direction;
 * then the remaining Gauss-Newton step must be negligible for every parameter instead. A Jacobian
 * that lost rank on the way is never called converged.
 *
 * <p>Tested with the certified nonlinear problems of NIST in {@code NistNonlinearTest}.
 */
public final class NonlinearLeastSquares {

  private NonlinearLeastSquares() {}

  /**
   * How to search.
   *
   * @param mostEvaluations how often the rows may be read, at least 1
   * @param orthogonality the largest cosine between residual and Jacobian at which a point counts
   *     as a solution
   * @param held which parameters stay at their start, shape of θ; empty where none does; copied
   * @param rankRule when a Jacobian column counts as a combination of others
   */
  public record Settings(
      int mostEvaluations, double orthogonality, boolean[] held, RankRule rankRule) {

    /**
     * 1,000 evaluations; cosine 1e-8, so that parameters are right to better than 1e-5 of a
     * standard error at a million rows, and yet above what rounding of the residual leaves; nothing
     * held.
     */
    public static final Settings STANDARD =
        new Settings(1000, 1e-8, new boolean[0], RankRule.STANDARD);

    /** Checks the ranges. */
    public Settings {
      held = held.clone();
      if (mostEvaluations < 1) {
        throw new IllegalArgumentException("mostEvaluations is " + mostEvaluations);
      }
      if (!(orthogonality > 0 && orthogonality < 1)) {
        throw new IllegalArgumentException("orthogonality is " + orthogonality);
      }
    }

    @Override
    public boolean[] held() {
      return held.clone();
    }

    /** The same with these parameters held at their start. */
    public Settings holding(boolean... which) {
      return new Settings(mostEvaluations, orthogonality, which, rankRule);
    }

    /** The same with another limit. */
    public Settings withMostEvaluations(int most) {
      return new Settings(most, orthogonality, held, rankRule);
    }
  }

  /** Fits from a start with {@link Settings#STANDARD}. */
  public static NonlinearFit fit(NonlinearModel model, double[] start) {
    return fit(model, start, Settings.STANDARD);
  }

  /**
   * Fits from a start.
   *
   * @param start θ to begin with, held parameters at their values; not modified
   * @throws IllegalArgumentException if the number of values does not fit the model
   */
  public static NonlinearFit fit(NonlinearModel model, double[] start, Settings settings) {
    int count = model.parameters().size();
    boolean[] held = settings.held();
    if (start.length != count || (held.length != 0 && held.length != count)) {
      throw new IllegalArgumentException(
          "the model has "
              + count
              + " parameters, the start "
              + start.length
              + ", the marks of those held "
              + held.length);
    }
    NonlinearSearch search =
        new NonlinearSearch(model, start, held.length == 0 ? new boolean[count] : held, settings);
    return search.run();
  }

  /** Spreads values of the free parameters over all, leaving the others. */
  static double[] spread(double[] free, boolean[] held, double[] others) {
    double[] all = Arrays.copyOf(others, others.length);
    int at = 0;
    for (int k = 0; k < held.length; k++) {
      if (!held[k]) {
        all[k] = free[at++];
      }
    }
    return all;
  }
}

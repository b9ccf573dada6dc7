package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/**
 * Two-stage least squares: which coefficients β make the error y − Xβ unrelated to the instruments
 * Z, where some regressors are related to it?
 *
 * <p>First stages: every endogenous regressor by least squares on Z, X̂ = Z (Z′Z)⁻¹ Z′X. Second
 * stage:
 *
 * <pre>  β = (X̂′X̂)⁻¹ X̂′y,   residuals u = y − Xβ (with X, not X̂). </pre>
 *
 * Both stages go through {@link LeastSquares}, so nothing of the size of the data is stored and
 * columns that the rows cannot tell apart are named: an outside instrument that the others already
 * contain is dropped in the first stages; a regressor that the instruments do not move apart from
 * the others is dropped in the second, and then the coefficients are not identified.
 *
 * <p>Sources: R. L. Basmann 1957, Econometrica 25, 77–83; H. Theil 1953; W. H. Greene,
 * <i>Econometric Analysis</i>, 5th ed. 2003, section 5.4, eq. 5-15. Tested in {@code
 * TwoStageLeastSquaresTest} against R.
 */
public final class TwoStageLeastSquares {

  private TwoStageLeastSquares() {}

  /** Fits. */
  public static InstrumentedFit fit(InstrumentedDesign instrumented) {
    int[] instruments = instrumented.instrumentColumns();
    int[] endogenous = instrumented.endogenousColumns();
    List<LinearFit> stages = new ArrayList<>();
    double[][] weights = new double[endogenous.length][];
    for (int e = 0; e < endogenous.length; e++) {
      Design first = new ChosenColumns(instrumented.design(), instruments, endogenous[e]);
      LinearFit stage = LeastSquares.fit(first);
      stages.add(stage);
      weights[e] = stage.coefficients();
    }
    double[] none = new double[instrumented.regressors()];
    LinearFit start = LeastSquares.fit(new ProjectedDesign(instrumented, weights, none));
    Design second = new ProjectedDesign(instrumented, weights, start.coefficients());
    LinearFit end = LeastSquares.fit(second);
    return new InstrumentedFit(instrumented, stages, second, of(end, start.totalSumOfSquares()));
  }

  /** The fit with the spread of the response itself. */
  private static LinearFit of(LinearFit fit, double totalSumOfSquares) {
    return new LinearFit(
        fit.columns(),
        fit.coefficients(),
        fit.estimated(),
        fit.inverseFactor(),
        fit.ssr(),
        totalSumOfSquares,
        fit.rows(),
        fit.absorbed(),
        fit.rank(),
        fit.collinearities(),
        fit.rankRule(),
        fit.pivots());
  }
}

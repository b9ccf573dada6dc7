package isowright.regression;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * How strongly do the outside instruments move an endogenous regressor?
 *
 * <p>Notation: b the q coefficients of the outside instruments in its first stage, V their
 * covariance, A the same block of (Z′Z)⁻¹, k the number of endogenous regressors.
 *
 * <ul>
 *   <li>F = b′V⁻¹b/q, with V of the kind that the fit uses.
 *   <li>The share of its variation, net of the exogenous regressors, that they explain.
 *   <li>Effective F = b′A⁻¹b / tr(V A⁻¹), which stays a measure of the bias of the estimate where
 *       variances are unequal or rows of a group depend on one another; for equal variances it is
 *       F. J. L. Montiel Olea and C. Pflueger 2013, Journal of Business and Economic Statistics 31,
 *       358–369.
 *   <li>Conditional F, where k is two or more: whether they move it once they have moved the
 *       others. What two-stage least squares of it on the other regressors leaves is regressed on
 *       all instruments; q F/(q − k + 1). E. Sanderson and F. Windmeijer 2016, Journal of
 *       Econometrics 190, 212–221.
 * </ul>
 *
 * <p>Tested in {@code FirstStageTest} against R.
 *
 * @param column the endogenous regressor
 * @param joint the F test that no outside instrument moves it
 * @param partialShare the share of its variation
 * @param effective the effective F
 * @param conditional the conditional F; NaN where it is the only endogenous regressor
 */
public record FirstStage(
    String column, WaldTest joint, double partialShare, double effective, double conditional) {

  /**
   * The statistic that says whether the estimate can be relied on: the lesser of the effective F
   * and, where there is one, the conditional F, which few groups can inflate.
   */
  public double decisive() {
    return Double.isNaN(conditional) ? effective : Math.min(effective, conditional);
  }

  /**
   * The first stages of a fit.
   *
   * @param kind the covariance that the tests use
   * @param times when each row was observed, for the kinds that need it
   */
  public static List<FirstStage> of(InstrumentedFit fit, Covariance.Kind kind, Times times) {
    InstrumentTests tests = new InstrumentTests(fit, kind, times);
    List<FirstStage> all = new ArrayList<>();
    for (int e = 0; e < fit.firstStages().size(); e++) {
      all.add(
          new FirstStage(
              fit.endogenous().get(e),
              tests.strength(e),
              tests.partialShare(e),
              effective(fit, e, kind, times),
              fit.firstStages().size() == 1 ? Double.NaN : conditional(fit, e, kind, times)));
    }
    return List.copyOf(all);
  }

  private static double effective(InstrumentedFit fit, int e, Covariance.Kind kind, Times times) {
    InstrumentedDesign of = fit.of();
    LinearFit stage = fit.firstStages().get(e);
    Design first =
        new ChosenColumns(of.design(), of.instrumentColumns(), of.endogenousColumns()[e]);
    double[][] v = Covariance.estimate(first, stage, kind, times).matrix();
    int[] places = outside(of, stage);
    int q = places.length;
    double[][] f = stage.inverseFactor();
    RealMatrix a = new Array2DRowRealMatrix(q, q);
    RealMatrix covariance = new Array2DRowRealMatrix(q, q);
    ArrayRealVector b = new ArrayRealVector(q);
    for (int i = 0; i < q; i++) {
      b.setEntry(i, stage.coefficients()[places[i]]);
      for (int j = 0; j < q; j++) {
        double sum = 0;
        for (int k = 0; k < f[places[i]].length; k++) {
          sum += f[places[i]][k] * f[places[j]][k];
        }
        a.setEntry(i, j, sum);
        covariance.setEntry(i, j, v[places[i]][places[j]]);
      }
    }
    QRDecomposition solver = new QRDecomposition(a);
    if (q == 0 || !solver.getSolver().isNonSingular()) {
      return Double.NaN;
    }
    double trace = solver.getSolver().solve(covariance).getTrace();
    return solver.getSolver().solve(b).dotProduct(b) / trace;
  }

  private static double conditional(InstrumentedFit fit, int e, Covariance.Kind kind, Times times) {
    InstrumentedDesign of = fit.of();
    int own = of.endogenousColumns()[e];
    int[] others =
        IntStream.concat(
                IntStream.range(0, of.regressors()).filter(k -> k != own),
                IntStream.range(of.regressors(), of.design().columns().size()))
            .toArray();
    boolean[] endogenous = new boolean[of.regressors() - 1];
    for (int k = 0; k < endogenous.length; k++) {
      endogenous[k] = of.endogenous()[others[k]];
    }
    InstrumentedDesign ofOthers =
        new InstrumentedDesign(new ChosenColumns(of.design(), others, own), endogenous);
    InstrumentedFit explained = TwoStageLeastSquares.fit(ofOthers);
    Design left = ResidualResponse.of(ofOthers, explained.fit().coefficients());
    LinearFit onAll = LeastSquares.fit(left);
    boolean[] tested = new boolean[left.columns().size()];
    for (int place : outside(ofOthers, onAll)) {
      tested[place] = true;
    }
    WaldTest test = WaldTest.of(onAll, Covariance.estimate(left, onAll, kind, times), tested);
    int q = test.restrictions();
    int free = q - of.endogenousColumns().length + 1;
    return free < 1 ? Double.NaN : test.f() * q / free;
  }

  /** The places of the outside instruments that were used, among all instruments. */
  private static int[] outside(InstrumentedDesign of, LinearFit stage) {
    int[] instruments = of.instrumentColumns();
    boolean[] used = stage.estimated();
    return IntStream.range(0, instruments.length)
        .filter(l -> instruments[l] >= of.regressors() && used[l])
        .toArray();
  }
}

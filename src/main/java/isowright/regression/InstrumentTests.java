package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Can the instruments of a two-stage fit be relied on, and were they needed?
 *
 * <ul>
 *   <li>Strength: in the first stage of an endogenous regressor, are the coefficients of the
 *       outside instruments all zero? Below about 10 the estimate is biased towards least squares
 *       and its intervals are too narrow: D. Staiger and J. H. Stock 1997, Econometrica 65,
 *       557–586.
 *   <li>Over-identification: do the instruments agree with one another? With equal variances N R²
 *       of the residuals on the instruments (J. D. Sargan 1958, Econometrica 26, 393–415), else
 *       g′S⁻¹g at the efficient two-step estimate, g = Z′u and S the sum of its squares over rows
 *       or groups (L. P. Hansen 1982, Econometrica 50, 1029–1054). Both are χ² with L − K degrees
 *       of freedom.
 *   <li>Endogeneity: do the first-stage residuals explain the response beside the regressors? J.
 *       Durbin 1954; D.-M. Wu 1973, Econometrica 41, 733–750; J. A. Hausman 1978, Econometrica 46,
 *       1251–1271, in the form of a regression, so that any covariance can be used.
 * </ul>
 *
 * <p>Tested in {@code TwoStageLeastSquaresTest} against R.
 */
public final class InstrumentTests {

  private final InstrumentedFit fit;
  private final Covariance.Kind kind;
  private final Times times;

  /**
   * @param kind the covariance that the tests use
   * @param times when each row was observed, for the kinds that need it
   */
  public InstrumentTests(InstrumentedFit fit, Covariance.Kind kind, Times times) {
    this.fit = fit;
    this.kind = kind;
    this.times = times;
  }

  /**
   * The strength of the instruments of an endogenous regressor.
   *
   * @param e its place among the endogenous regressors
   */
  public WaldTest strength(int e) {
    return strength(e, kind);
  }

  /**
   * The share of an endogenous regressor's variation, net of the exogenous regressors, that the
   * outside instruments explain: q F / (q F + N − L − a) with the classical F.
   */
  public double partialShare(int e) {
    WaldTest classical = strength(e, Covariance.Kind.CLASSICAL);
    double explained = classical.restrictions() * classical.f();
    return explained / (explained + classical.degreesOfFreedom());
  }

  private WaldTest strength(int e, Covariance.Kind with) {
    InstrumentedDesign of = fit.of();
    int[] instruments = of.instrumentColumns();
    Design first = new ChosenColumns(of.design(), instruments, of.endogenousColumns()[e]);
    LinearFit stage = fit.firstStages().get(e);
    boolean[] outside = new boolean[instruments.length];
    for (int l = 0; l < instruments.length; l++) {
      outside[l] = instruments[l] >= of.regressors();
    }
    return WaldTest.of(stage, Covariance.estimate(first, stage, with, times), outside);
  }

  /** Whether the endogenous regressors are related to the error. */
  public WaldTest endogeneity() {
    AugmentedDesign augmented = new AugmentedDesign(fit);
    LinearFit with = LeastSquares.fit(augmented);
    return WaldTest.of(
        with, Covariance.estimate(augmented, with, kind, times), augmented.residualColumns());
  }

  /**
   * Whether the instruments agree with one another.
   *
   * @return NaN where there are no more instruments than regressors, or where the sum of squares of
   *     the moments is singular (fewer groups than instruments)
   */
  public double overidentification() {
    if (fit.overidentifying() <= 0) {
      return Double.NaN;
    }
    return kind == Covariance.Kind.CLASSICAL ? sargan() : hansen();
  }

  private double sargan() {
    Design residuals = residualsOnInstruments();
    double ssr = fit.fit().ssr();
    double explained = ssr - LeastSquares.fit(residuals).ssr();
    return (fit.fit().rows() - fit.fit().absorbed()) * explained / ssr;
  }

  private double hansen() {
    LinearFit stage = fit.firstStages().get(0);
    int[] kept = stage.kept();
    Covariance.Kind middle =
        kind == Covariance.Kind.HC1 || kind == Covariance.Kind.HC3
            ? Covariance.Kind.HC1
            : Covariance.Kind.CLUSTERED;
    double[][] wide =
        RowMiddle.of(residualsOnInstruments(), withoutCoefficients(stage), middle).matrix();
    RealMatrix s = new Array2DRowRealMatrix(kept.length, kept.length);
    for (int i = 0; i < kept.length; i++) {
      for (int j = 0; j < kept.length; j++) {
        s.setEntry(i, j, wide[kept[i]][kept[j]]);
      }
    }
    RealMatrix lower;
    try {
      lower = new CholeskyDecomposition(s.scalarMultiply(1 / s.getNorm()), 1e-10, 1e-10).getL();
    } catch (NonPositiveDefiniteMatrixException singular) {
      return Double.NaN;
    }
    RealMatrix whitener = new QRDecomposition(lower).getSolver().getInverse();
    RealMatrix regressors = whitener.multiply(rotatedRegressors(stage, kept));
    ArrayRealVector response =
        new ArrayRealVector(whitener.operate(rotated(stage, kept, responseWeights())), false);
    QRDecomposition solver = new QRDecomposition(regressors);
    ArrayRealVector left =
        new ArrayRealVector(
            response.subtract(regressors.operate(solver.getSolver().solve(response))));
    return left.dotProduct(left) / s.getNorm();
  }

  /** Z as regressors, the residuals y − Xβ as response. */
  private Design residualsOnInstruments() {
    return ResidualResponse.of(fit.of(), fit.fit().coefficients());
  }

  private static LinearFit withoutCoefficients(LinearFit stage) {
    return new LinearFit(
        stage.columns(),
        new double[stage.columns().size()],
        stage.estimated(),
        stage.inverseFactor(),
        stage.ssr(),
        stage.totalSumOfSquares(),
        stage.rows(),
        stage.absorbed(),
        stage.rank(),
        stage.collinearities(),
        stage.rankRule(),
        stage.pivots());
  }

  /** Q′X with Z = QR: for each regressor that was estimated R times its coefficients on Z. */
  private RealMatrix rotatedRegressors(LinearFit stage, int[] kept) {
    InstrumentedDesign of = fit.of();
    int[] instruments = of.instrumentColumns();
    int[] endogenous = of.endogenousColumns();
    int[] estimated = fit.fit().kept();
    RealMatrix rotated = new Array2DRowRealMatrix(kept.length, estimated.length);
    for (int p = 0; p < estimated.length; p++) {
      int e = Arrays.binarySearch(endogenous, estimated[p]);
      double[] weights = new double[instruments.length];
      if (e >= 0) {
        weights = fit.firstStages().get(e).coefficients();
      } else {
        // The exogenous regressors are the first instruments, in their order.
        weights[Arrays.binarySearch(instruments, estimated[p])] = 1;
      }
      rotated.setColumn(p, rotated(stage, kept, weights));
    }
    return rotated;
  }

  private double[] responseWeights() {
    InstrumentedDesign of = fit.of();
    Design response =
        new ChosenColumns(of.design(), of.instrumentColumns(), of.design().columns().size());
    return LeastSquares.fit(response).coefficients();
  }

  /** R w over the kept columns, by solving F x = w. */
  private static double[] rotated(LinearFit stage, int[] kept, double[] weights) {
    double[][] factor = stage.inverseFactor();
    double[] x = new double[kept.length];
    for (int i = kept.length - 1; i >= 0; i--) {
      double sum = weights[kept[i]];
      for (int j = i + 1; j < kept.length; j++) {
        sum -= factor[kept[i]][kept[j]] * x[j];
      }
      x[i] = sum / factor[kept[i]][kept[i]];
    }
    return x;
  }
}

package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * What the rows say of the one-sided error of each: w given the unit's rows is normal with mean μ
 * and standard deviation σ, cut off at zero; a row's error is g w.
 *
 * <p>Sources: J. Jondrow, C. A. K. Lovell, I. S. Materov and P. Schmidt 1982, Journal of
 * Econometrics 19, 233–238 (the conditional mean); G. E. Battese and T. J. Coelli 1988, Journal of
 * Econometrics 38, 387–399, eq. 12 (the mean of e^−w); W. C. Horrace and P. Schmidt 1996, Journal
 * of Productivity Analysis 7, 257–282 (its quantiles). The parameters are taken as known, unless
 * {@link #widened} says otherwise. Tested in {@code ConditionalErrorsTest} against quadrature.
 */
public final class ConditionalErrors {

  /** The step of differences in standard errors: small against their spread, large for rounding. */
  private static final double STEP = 0.01;

  private final double[] means;
  private final double[] deviations;
  private final double[] shares;

  private ConditionalErrors(double[] means, double[] deviations, double[] shares) {
    this.means = means;
    this.deviations = deviations;
    this.shares = shares;
  }

  static ConditionalErrors of(ComposedFit fit) {
    if (!fit.state().oneSided()) {
      int rows = fit.model().design().rows();
      return new ConditionalErrors(new double[rows], new double[rows], new double[rows]);
    }
    return of(fit, fit.parameters());
  }

  private static ConditionalErrors of(ComposedFit fit, double[] parameters) {
    ComposedErrors model = fit.model();
    int rows = model.design().rows();
    int columns = fit.coefficients().length;
    double[] means = new double[rows];
    double[] deviations = new double[rows];
    double[] shares = new double[rows];
    double decay = parameters.length > columns + 2 ? parameters[columns + 2] : 0;
    double[] errors = LeastSquares.residuals(model.design(), at(fit, parameters));
    ComposedUnit unit = new ComposedUnit(model.law(), parameters[columns], parameters[columns + 1]);
    Groups groups = model.design().groups();
    int end;
    for (int start = 0; start < rows; start = end) {
      end =
          model.sharing() == ComposedErrors.Sharing.NONE ? start + 1 : groups.end(groups.of(start));
      double sum = 0;
      double squares = 0;
      for (int r = start; r < end; r++) {
        shares[r] = Math.exp(-decay * model.since(r));
        sum += shares[r] * errors[r];
        squares += shares[r] * shares[r];
      }
      unit.place(sum, squares);
      for (int r = start; r < end; r++) {
        means[r] = unit.mean();
        deviations[r] = unit.deviation();
      }
    }
    return new ConditionalErrors(means, deviations, shares);
  }

  /** The least-squares fit with other coefficients, for its residuals alone. */
  private static LinearFit at(ComposedFit fit, double[] parameters) {
    LinearFit start = fit.leastSquares();
    return new LinearFit(
        start.columns(),
        Arrays.copyOf(parameters, fit.coefficients().length),
        start.estimated(),
        start.inverseFactor(),
        start.ssr(),
        start.totalSumOfSquares(),
        start.rows(),
        start.absorbed(),
        start.rank(),
        start.collinearities(),
        start.rankRule(),
        start.pivots());
  }

  /**
   * The same with the parameters uncertain, to first order: μ + e in the place of μ, e normal with
   * variance ∇μ′ V ∇μ, so that σ² + ∇μ′ V ∇μ stands in the place of σ². Means so widened are not
   * estimates; the widened law is for intervals and probabilities. The slope of μ along each
   * principal direction of V is a central difference.
   *
   * @param covariance V, of {@link ComposedFit#parameters()}
   */
  static ConditionalErrors widened(ComposedFit fit, double[][] covariance) {
    ConditionalErrors known = of(fit);
    if (!fit.state().oneSided()) {
      return known;
    }
    double[] variances = new double[known.means.length];
    for (int r = 0; r < variances.length; r++) {
      variances[r] = known.deviations[r] * known.deviations[r];
    }
    EigenDecomposition directions =
        new EigenDecomposition(new Array2DRowRealMatrix(covariance, true));
    for (int k = 0; k < covariance.length; k++) {
      double size = Math.sqrt(Math.max(0, directions.getRealEigenvalue(k)));
      double[] ahead = fit.parameters();
      double[] behind = fit.parameters();
      for (int l = 0; l < ahead.length; l++) {
        double step = STEP * size * directions.getEigenvector(k).getEntry(l);
        ahead[l] += step;
        behind[l] -= step;
      }
      double[] further = of(fit, ahead).means;
      double[] nearer = of(fit, behind).means;
      for (int r = 0; size > 0 && r < variances.length; r++) {
        double slope = (further[r] - nearer[r]) / (2 * STEP);
        variances[r] += slope * slope;
      }
    }
    double[] deviations = new double[variances.length];
    Arrays.setAll(deviations, r -> Math.sqrt(variances[r]));
    return new ConditionalErrors(known.means, deviations, known.shares);
  }

  /** E[g w | rows] of a row; 0 where no one-sided error was found. */
  public double mean(int row) {
    if (deviations[row] == 0) {
      return 0;
    }
    // μ + σ λ(μ/σ), without the cancellation far out.
    return shares[row] * deviations[row] * NormalTail.excess(means[row] / deviations[row]);
  }

  /** The standard deviation of g w of a row, given its rows; 0 where none was found. */
  public double deviation(int row) {
    if (deviations[row] == 0) {
      return 0;
    }
    // Of a normal variable cut off at zero: σ² (1 − λ(q) (q + λ(q))), q = μ/σ.
    double q = means[row] / deviations[row];
    return shares[row] * deviations[row] * Math.sqrt(Math.max(0, NormalTail.curvature(q)));
  }

  /** E[e^(−g w) | rows] of a row; 1 where no one-sided error was found. */
  public double survival(int row) {
    return survival(row, 1);
  }

  /** E[e^(−2 g w) | rows] of a row; 1 where no one-sided error was found. */
  public double survivalSquared(int row) {
    return survival(row, 2);
  }

  private double survival(int row, int power) {
    if (deviations[row] == 0) {
      return 1;
    }
    double q = means[row] / deviations[row];
    double moved = q - power * shares[row] * deviations[row];
    // −g μ + ½ g² σ² is ½ moved² − ½ q².
    return Math.exp(NormalTail.logScaled(moved) - NormalTail.logScaled(q));
  }

  /** The probability that g w of a row exceeds a value, given its rows; 0 where none was found. */
  public double probabilityAbove(int row, double value) {
    if (deviations[row] == 0) {
      return 0;
    }
    double q = means[row] / deviations[row];
    double moved = q - Math.max(0, value) / shares[row] / deviations[row];
    return Math.exp(NormalTail.logProbability(moved) - NormalTail.logProbability(q));
  }

  /** The value that g w of a row exceeds with this probability, given its rows. */
  public double exceeded(int row, double probability) {
    if (deviations[row] == 0) {
      return 0;
    }
    return shares[row] * NormalTail.exceeded(probability, means[row], deviations[row]);
  }
}

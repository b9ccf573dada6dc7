package isowright.regression;

/**
 * What the rows say of the one-sided error of each: w given the unit's rows is normal with mean μ
 * and standard deviation σ, cut off at zero; a row's error is g w.
 *
 * <p>Sources: J. Jondrow, C. A. K. Lovell, I. S. Materov and P. Schmidt 1982, Journal of
 * Econometrics 19, 233–238 (the conditional mean); G. E. Battese and T. J. Coelli 1988, Journal of
 * Econometrics 38, 387–399, eq. 12 (the mean of e^−w); W. C. Horrace and P. Schmidt 1996, Journal
 * of Productivity Analysis 7, 257–282 (its quantiles). The parameters are taken as known: their own
 * uncertainty is not in these intervals. Tested in {@code ConditionalErrorsTest} against
 * quadrature.
 */
public final class ConditionalErrors {

  private final double[] means;
  private final double[] deviations;
  private final double[] shares;

  private ConditionalErrors(double[] means, double[] deviations, double[] shares) {
    this.means = means;
    this.deviations = deviations;
    this.shares = shares;
  }

  static ConditionalErrors of(ComposedFit fit) {
    ComposedErrors model = fit.model();
    int rows = model.design().rows();
    double[] means = new double[rows];
    double[] deviations = new double[rows];
    double[] shares = new double[rows];
    if (!fit.state().oneSided()) {
      return new ConditionalErrors(means, deviations, shares);
    }
    double[] errors = LeastSquares.residuals(model.design(), at(fit));
    ComposedUnit unit = new ComposedUnit(model.law(), Math.log(fit.noise()), Math.log(fit.scale()));
    Groups groups = model.design().groups();
    int end;
    for (int start = 0; start < rows; start = end) {
      end =
          model.sharing() == ComposedErrors.Sharing.NONE ? start + 1 : groups.end(groups.of(start));
      double sum = 0;
      double squares = 0;
      for (int r = start; r < end; r++) {
        shares[r] = Math.exp(-fit.decay() * model.since(r));
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

  /** The least-squares fit with the coefficients of maximum likelihood, for its residuals alone. */
  private static LinearFit at(ComposedFit fit) {
    LinearFit start = fit.leastSquares();
    return new LinearFit(
        start.columns(),
        fit.coefficients(),
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

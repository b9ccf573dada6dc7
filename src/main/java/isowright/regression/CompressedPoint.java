package isowright.regression;

import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresProblem;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;

/**
 * All rows at one θ, compressed to the triangular factor of [J r]: what a search by
 * Levenberg-Marquardt sees as a problem of K + 1 rows with the same J′J, J′r and ‖r‖.
 */
final class CompressedPoint implements LeastSquaresProblem.Evaluation {

  private final double[] free;
  private final Reading reading;
  private final List<String> names;
  private final RankRule rule;
  private final double worse;
  private final double[][] factor;
  private final double ssr;
  private Optional<RankAnalysis> analysis = Optional.empty();

  /**
   * @param free the free parameters; not copied
   * @param worse the length of residual to show where the model has no finite value
   */
  CompressedPoint(double[] free, Reading reading, List<String> names, RankRule rule, double worse) {
    this.free = free;
    this.reading = reading;
    this.names = names;
    this.rule = rule;
    this.worse = worse;
    this.factor = reading.decomposition().factor();
    double sum = 0;
    for (double[] row : factor) {
      sum += row[free.length] * row[free.length];
    }
    this.ssr = sum;
  }

  double[] free() {
    return free;
  }

  double ssr() {
    return ssr;
  }

  boolean finite() {
    return reading.finite() && Double.isFinite(ssr);
  }

  RankAnalysis analysis() {
    if (analysis.isEmpty()) {
      analysis = Optional.of(reading.analysis(names, rule));
    }
    return analysis.orElseThrow();
  }

  /** The cosine of the angle between the residual and the space of the Jacobian columns. */
  double cosine() {
    return ssr == 0 ? 0 : Math.min(1, Math.sqrt(analysis().explained() / ssr));
  }

  /**
   * The fit of the linearisation with its step left out, so that its residuals are those of the
   * nonlinear model.
   */
  LinearFit atRest(Design design) {
    return LeastSquares.fit(
        design, analysis(), rule, new double[free.length], ssr, reading.responseSumOfSquares());
  }

  @Override
  public RealMatrix getJacobian() {
    double[][] rows = new double[free.length + 1][free.length];
    for (int i = 0; i <= free.length; i++) {
      System.arraycopy(factor[i], 0, rows[i], 0, free.length);
    }
    return new Array2DRowRealMatrix(rows, false);
  }

  @Override
  public RealVector getResiduals() {
    double[] column = new double[free.length + 1];
    if (finite()) {
      for (int i = 0; i <= free.length; i++) {
        column[i] = factor[i][free.length];
      }
    } else {
      // A point without a value is worse than any other, so that the search steps back from it; NaN
      // would make it step further out.
      column[0] = worse;
    }
    return new ArrayRealVector(column, false);
  }

  @Override
  public double getCost() {
    return finite() ? Math.sqrt(ssr) : worse;
  }

  @Override
  public RealVector getPoint() {
    return new ArrayRealVector(free);
  }

  @Override
  public double getRMS() {
    return getCost() / Math.sqrt(free.length + 1);
  }

  @Override
  public RealMatrix getCovariances(double threshold) {
    return new Array2DRowRealMatrix(Matrices.timesTranspose(analysis().inverseFactor()), false);
  }

  @Override
  public RealVector getSigma(double threshold) {
    RealMatrix covariances = getCovariances(threshold);
    double[] sigma = new double[free.length];
    for (int k = 0; k < sigma.length; k++) {
      sigma[k] = Math.sqrt(covariances.getEntry(k, k));
    }
    return new ArrayRealVector(sigma, false);
  }
}

package isowright.regression;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Which values of a single endogenous coefficient do the records not speak against, however weak
 * the instruments?
 *
 * <p>If the coefficient is β, then y − βx is explained by the exogenous regressors alone; the F
 * test that the q outside instruments add nothing to it has its size whether or not they move x.
 * Its coefficients are a − βb, with a and b those of y and of x, and their covariance is a
 * quadratic in β, had from three regressions. The set of β that are not rejected is an interval, or
 * open on one or both sides, or what lies outside an interval, or empty where the instruments
 * contradict one another.
 *
 * <p>Source: T. W. Anderson and H. Rubin 1949, Annals of Mathematical Statistics 20, 46–63. Tested
 * in {@code FirstStageTest}: every end has the F statistic of its regression.
 *
 * @param pieces the set, as intervals in ascending order; ends may be infinite
 */
public record AndersonRubin(List<Piece> pieces) {

  /** Points looked at on either side of the estimate, spaced evenly in asinh. */
  private static final int POINTS = 400;

  /** How far the search goes, in standard errors of the estimate. */
  private static final double FARTHEST = 1e5;

  private static final int HALVINGS = 60;

  /** An interval of values. */
  public record Piece(double low, double high) {}

  /** Copies the list. */
  public AndersonRubin {
    pieces = List.copyOf(pieces);
  }

  /**
   * The set for a fit with one endogenous regressor.
   *
   * @param error the standard error of its coefficient, the unit of the search
   * @param critical the critical value of F, by its two degrees of freedom
   */
  public static AndersonRubin of(
      InstrumentedFit fit, Covariance.Kind kind, Times times, double error, Critical critical) {
    int column = fit.of().endogenousColumns()[0];
    double centre = fit.fit().coefficients()[column];
    Restated at0 = restated(fit, kind, times, centre);
    Restated up = restated(fit, kind, times, centre + error);
    Restated down = restated(fit, kind, times, centre - error);
    double allowed = critical.of(at0.coefficients.getDimension(), at0.degreesOfFreedom);
    DoubleUnaryOperator excess = t -> statistic(at0, up, down, t) - allowed;
    List<Piece> pieces = new ArrayList<>();
    double[] points = points();
    double start = excess.applyAsDouble(points[0]) <= 0 ? Double.NEGATIVE_INFINITY : Double.NaN;
    for (int i = 1; i < points.length; i++) {
      boolean inside = excess.applyAsDouble(points[i]) <= 0;
      if (inside && Double.isNaN(start)) {
        start = centre + error * root(excess, points[i - 1], points[i]);
      } else if (!inside && !Double.isNaN(start)) {
        pieces.add(new Piece(start, centre + error * root(excess, points[i - 1], points[i])));
        start = Double.NaN;
      }
    }
    if (!Double.isNaN(start)) {
      pieces.add(new Piece(start, Double.POSITIVE_INFINITY));
    }
    return new AndersonRubin(pieces);
  }

  /** The critical value of an F statistic. */
  @FunctionalInterface
  public interface Critical {
    /** By the degrees of freedom of numerator and denominator. */
    double of(double numerator, double denominator);
  }

  /** y − βx on all instruments: the outside coefficients with their covariance. */
  private record Restated(
      ArrayRealVector coefficients, RealMatrix covariance, double degreesOfFreedom) {}

  private static Restated restated(
      InstrumentedFit fit, Covariance.Kind kind, Times times, double beta) {
    InstrumentedDesign of = fit.of();
    double[] moved = new double[of.regressors()];
    moved[of.endogenousColumns()[0]] = beta;
    Design design = ResidualResponse.of(of, moved);
    LinearFit linear = LeastSquares.fit(design);
    Covariance covariance = Covariance.estimate(design, linear, kind, times);
    int[] instruments = of.instrumentColumns();
    boolean[] used = linear.estimated();
    int[] places =
        IntStream.range(0, instruments.length)
            .filter(l -> instruments[l] >= of.regressors() && used[l])
            .toArray();
    int q = places.length;
    ArrayRealVector b = new ArrayRealVector(q);
    RealMatrix v = new Array2DRowRealMatrix(q, q);
    for (int i = 0; i < q; i++) {
      b.setEntry(i, linear.coefficients()[places[i]]);
      for (int j = 0; j < q; j++) {
        v.setEntry(i, j, covariance.matrix()[places[i]][places[j]]);
      }
    }
    return new Restated(b, v, covariance.degreesOfFreedom());
  }

  /** F at t standard errors from the estimate, by the quadratic through three covariances. */
  private static double statistic(Restated at0, Restated up, Restated down, double t) {
    ArrayRealVector b =
        at0.coefficients.add(up.coefficients.subtract(down.coefficients).mapMultiply(t / 2));
    RealMatrix slope = up.covariance.subtract(down.covariance).scalarMultiply(t / 2);
    RealMatrix bend =
        up.covariance
            .add(down.covariance)
            .subtract(at0.covariance.scalarMultiply(2))
            .scalarMultiply(t * t / 2);
    QRDecomposition v = new QRDecomposition(at0.covariance.add(slope).add(bend));
    return v.getSolver().isNonSingular()
        ? v.getSolver().solve(b).dotProduct(b) / b.getDimension()
        : Double.NaN;
  }

  private static double[] points() {
    double last = Math.log(2 * FARTHEST);
    double[] points = new double[2 * POINTS + 1];
    for (int i = 0; i <= POINTS; i++) {
      double t = Math.sinh(last * i / POINTS);
      points[POINTS + i] = t;
      points[POINTS - i] = -t;
    }
    return points;
  }

  private static double root(DoubleUnaryOperator excess, double from, double to) {
    boolean inside = excess.applyAsDouble(from) <= 0;
    double low = from;
    double high = to;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = (low + high) / 2;
      if (excess.applyAsDouble(middle) <= 0 == inside) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return (low + high) / 2;
  }
}

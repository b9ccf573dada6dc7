package isowright.inference;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.regression.Effects;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * May plant effects be taken as random draws unrelated to the inputs? The difference d of the
 * slopes within plants (b_W, consistent in any case) and of random effects (b_R, efficient if they
 * are unrelated) is held against its variance under the null,
 *
 * <pre>  d′ (V_W − V_R)^-1 d,  chi-squared with as many degrees of freedom as slopes. </pre>
 *
 * <p>V_W and V_R are the classical covariances of the two, each with its own error variance,
 * whatever the covariance of the fit: the argument that the difference of the two is a variance
 * holds for those only. Compared are the slopes that both have, but not those of trend and periods:
 * what is the same for all plants in a period tells nothing of differences between plants.
 *
 * <p>In small samples V_W − V_R need not be positive definite. The generalised inverse is taken
 * then (of the directions whose variance can be told from zero in units of the standard errors
 * within plants; the degrees of freedom are their number), as published values do; the verdict says
 * so, no p-value is given where the statistic comes out negative, and the test of plant means,
 * which has no such trouble, is set beside it.
 *
 * <p>Source: Hausman, J. A. (1978), Specification Tests in Econometrics, <i>Econometrica</i> 46,
 * 1251–1271, eq. 2.7. Checked against Baltagi's table of the US states (9.5254) in {@code
 * PanelHypothesesTest}.
 */
final class RandomAgainstWithin {

  /**
   * Directions whose variance is below this share of that within plants are rounding: covariances
   * are known to some ten digits, and the difference of two equal ones to no digit at all.
   */
  private static final double SMALLEST = 1e-7;

  private RandomAgainstWithin() {}

  /**
   * The test of a fit within plants or of random effects.
   *
   * @param verdict the verdict
   * @param definite whether the difference of the covariances is positive definite
   */
  record Outcome(Verdict verdict, boolean definite) {}

  /** The test, for a fit within plants or of random effects. */
  static Optional<Outcome> of(Fit fit) {
    Specification specification = fit.specification();
    PlantEffects effects = specification.plantEffects();
    if (effects != PlantEffects.WITHIN && effects != PlantEffects.RANDOM) {
      return Optional.empty();
    }
    Time time = specification.time() == Time.TWO_WAY ? Time.PERIOD_EFFECTS : specification.time();
    Fit random =
        effects == PlantEffects.RANDOM
            ? fit
            : Estimation.fit(
                fit.panel(),
                specification.with(PlantEffects.RANDOM, time, StandardErrors.CLASSICAL));
    if (!random.state().usable()) {
      return Optional.empty();
    }
    LinearFit outside = random.numbers().linear();
    LinearFit inside = LeastSquares.fit(Effects.within(random.numbers().treatment().levels()));
    if (inside.residualDegreesOfFreedom() < 1) {
      return Optional.empty();
    }
    List<String> columns = outside.columns();
    boolean[] estimated = inside.estimated();
    int[] shared =
        IntStream.range(0, columns.size())
            .filter(k -> estimated[k] && !PanelHypotheses.ofTime(columns.get(k)))
            .toArray();
    return shared.length == 0 ? Optional.empty() : Optional.of(test(inside, outside, shared));
  }

  private static Outcome test(LinearFit inside, LinearFit outside, int[] shared) {
    int q = shared.length;
    double[][] within = inside.inverseCrossProduct();
    double[][] between = outside.inverseCrossProduct();
    double[] scaled = new double[q];
    double[][] difference = new double[q][q];
    for (int i = 0; i < q; i++) {
      double size = Math.sqrt(inside.residualVariance() * within[shared[i]][shared[i]]);
      scaled[i] = (inside.coefficients()[shared[i]] - outside.coefficients()[shared[i]]) / size;
      for (int j = 0; j < q; j++) {
        double other = Math.sqrt(inside.residualVariance() * within[shared[j]][shared[j]]);
        difference[i][j] =
            (inside.residualVariance() * within[shared[i]][shared[j]]
                    - outside.residualVariance() * between[shared[i]][shared[j]])
                / (size * other);
      }
    }
    EigenDecomposition directions =
        new EigenDecomposition(new Array2DRowRealMatrix(difference, false));
    double statistic = 0;
    int kept = 0;
    boolean definite = true;
    for (int k = 0; k < q; k++) {
      double variance = directions.getRealEigenvalue(k);
      definite &= variance > SMALLEST;
      if (Math.abs(variance) > SMALLEST) {
        double along = directions.getEigenvector(k).dotProduct(new ArrayRealVector(scaled, false));
        statistic += along * along / variance;
        kept++;
      }
    }
    boolean usable = kept > 0 && statistic >= 0;
    return new Outcome(verdict(usable ? statistic : Double.NaN, kept, q, definite), definite);
  }

  private static Verdict verdict(double statistic, int kept, int q, boolean definite) {
    String note = "Both covariances are classical, each with its own error variance.";
    if (!definite) {
      note +=
          " Their difference is not positive definite, so its generalised inverse was taken ("
              + kept
              + " of "
              + q
              + " directions)"
              + (Double.isNaN(statistic) ? " and gives no statistic" : "")
              + ": read the test of plant means, which asks the same without that trouble.";
    }
    return Verdict.of(
            "random-against-within",
            "plant effects are unrelated to inputs and controls, so that random effects may be used",
            statistic,
            new Law.ChiSquared(Math.max(kept, 1)))
        .noting(note);
  }
}

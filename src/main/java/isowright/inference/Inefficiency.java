package isowright.inference;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.estimation.PlantLevels;
import isowright.estimation.Specification;
import isowright.regression.ComposedFit;
import isowright.regression.ComposedProfile;
import isowright.regression.ConditionalErrors;
import isowright.regression.Covariance;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * What a frontier says of inefficiency: how much there is, and where.
 *
 * <p>With σ_v and σ_u of noise and inefficiency: λ = σ_u/σ_v; γ = σ_u²/(σ_u² + σ_v²) (G. E. Battese
 * and G. S. Corra 1977, <i>Australian Journal of Agricultural Economics</i> 21, 169–179); the share
 * of the variance, var u/(var u + σ_v²), with var u = (1 − 2/π) σ_u² under the half-normal law and
 * σ_u² under the exponential one, which is what γ is often taken for. Intervals are symmetric in
 * logs (σ, λ) and so in log odds (γ, share), and stay within their bounds; where the half-length in
 * the log exceeds one they are read off the profile of the likelihood instead, its threshold
 * widened as the covariance in force is wider than that of the likelihood (Kent, J. T. 1982,
 * <i>Biometrika</i> 69, 19–27).
 *
 * <p>A row's inefficiency given its residuals: see {@link ConditionalErrors} (Jondrow, Lovell,
 * Materov and Schmidt 1982; Battese and Coelli 1988; intervals of Horrace and Schmidt 1996, widened
 * by the uncertainty of the parameters to first order).
 *
 * <p>Beside it, without any law: the greatest plant level of the fit within plants less that of the
 * plant (P. Schmidt and R. C. Sickles 1984, <i>Journal of Business and Economic Statistics</i> 2,
 * 367–374). Tested in {@code InefficiencyTest}.
 *
 * @param variances how much there is; absent where none was found
 * @param known what the rows say, the parameters taken as known; empty where none was found
 * @param widened the same with the parameters uncertain; that of {@code known} where the likelihood
 *     is too far from quadratic to propagate their covariance
 * @param mean E u in the last period of the records
 * @param byEffects beside it, from the fit within plants
 */
public record Inefficiency(
    Optional<Variances> variances,
    Optional<ConditionalErrors> known,
    Optional<ConditionalErrors> widened,
    double mean,
    Optional<ByEffects> byEffects) {

  /**
   * How much inefficiency there is.
   *
   * @param noise σ_v
   * @param inefficiency σ_u
   * @param ratio λ
   * @param gamma γ
   * @param share the share of var u in the variance of both
   * @param mean E u, in the last period of the records where there is decay
   * @param decay η
   */
  public record Variances(
      Estimate noise,
      Estimate inefficiency,
      Estimate ratio,
      Estimate gamma,
      Estimate share,
      Estimate mean,
      Optional<Estimate> decay) {}

  /**
   * Inefficiency as the distance from the plant of greatest level.
   *
   * @param best that plant, by index
   * @param plants by plant; that of the best is zero by construction
   */
  public record ByEffects(int best, List<Estimate> plants) {
    /** Copies the list. */
    public ByEffects {
      plants = List.copyOf(plants);
    }
  }

  /** Of a usable fit; absent where it is no frontier. */
  public static Optional<Inefficiency> of(Fit fit) {
    return fit.numbers().frontier().map(own -> of(fit, own));
  }

  /** Half-length of an interval of a log beyond which the log is no longer near to normal. */
  private static final double QUADRATIC = 1;

  private static Inefficiency of(Fit fit, Particulars.OfFrontier own) {
    Optional<Variances> variances = variances(fit);
    Optional<ConditionalErrors> known = variances.map(v -> own.fit().conditional());
    return new Inefficiency(
        variances,
        known,
        variances.map(Inefficiency::quadratic).orElse(false)
            ? Optional.of(own.fit().conditional(fit.numbers().covarianceSource().matrix()))
            : known,
        own.scale() * own.fit().scale(),
        byEffects(fit));
  }

  /** How much inefficiency there is, by a usable fit; absent where none was found. */
  public static Optional<Variances> variances(Fit fit) {
    return fit.numbers()
        .frontier()
        .filter(own -> own.fit().state().oneSided())
        .map(own -> variances(fit, own));
  }

  private static Variances variances(Fit fit, Particulars.OfFrontier own) {
    ComposedFit found = own.fit();
    Covariance source = fit.numbers().covarianceSource();
    int first = found.coefficients().length;
    double[][] v = source.matrix();
    double level = fit.specification().confidence();
    Errors errors = new Errors(source.degreesOfFreedom(), level);
    double noise = Math.sqrt(v[first][first]);
    double inefficiency = Math.sqrt(v[first + 1][first + 1]);
    double ratio = Math.sqrt(Math.max(0, ratioVariance(v, first)));
    double lambda = found.scale() / found.noise();
    double part = found.model().law().variance(1);
    Estimate scale = errors.positive(found.scale(), inefficiency);
    Estimate of = errors.positive(lambda, ratio);
    if (errors.quantile() * Math.max(inefficiency, ratio) > QUADRATIC) {
      double[][] plain = found.covariance(Covariance.Kind.CLASSICAL).matrix();
      double wider = v[first + 1][first + 1] / plain[first + 1][first + 1];
      double wide = ratioVariance(v, first) / ratioVariance(plain, first);
      scale = errors.profiled(scale, found, ComposedProfile.Held.SCALE, wider);
      of = errors.profiled(of, found, ComposedProfile.Held.RATIO, wide);
    }
    return new Variances(
        errors.positive(found.noise(), noise),
        scale,
        of,
        share(of, 1, 2 * ratio),
        share(of, part, 2 * ratio),
        times(scale, own.scale()),
        v.length > first + 2
            ? Optional.of(errors.plain(found.decay(), Math.sqrt(v[first + 2][first + 2])))
            : Optional.empty());
  }

  /** The variance of ln λ. */
  private static double ratioVariance(double[][] v, int noise) {
    return v[noise][noise] + v[noise + 1][noise + 1] - 2 * v[noise][noise + 1];
  }

  /** part λ²/(1 + part λ²), with the ends that λ has. */
  private static Estimate share(Estimate lambda, double part, double error) {
    double value = share(lambda.value(), part);
    return new Estimate(
        value,
        value * (1 - value) * error,
        share(lambda.low(), part),
        share(lambda.high(), part),
        lambda.level(),
        lambda.method());
  }

  private static double share(double lambda, double part) {
    return 1 - 1 / (1 + part * lambda * lambda);
  }

  private static Estimate times(Estimate scale, double by) {
    return new Estimate(
        by * scale.value(),
        by * scale.standardError(),
        by * scale.low(),
        by * scale.high(),
        scale.level(),
        scale.method());
  }

  private static Optional<ByEffects> byEffects(Fit fit) {
    if (!fit.panel().repeats() || fit.panel().plants().size() < 2) {
      return Optional.empty();
    }
    Specification how = fit.specification();
    Fit within =
        Estimation.fit(
            fit.panel(),
            how.with(Specification.PlantEffects.WITHIN, how.time(), how.standardErrors())
                .by(new Estimator.LeastSquares()));
    if (!within.state().usable()) {
      return Optional.empty();
    }
    PlantLevels levels = within.numbers().levels();
    double[] relative = levels.relative();
    int best = 0;
    for (int p = 1; p < relative.length; p++) {
      best = relative[p] > relative[best] ? p : best;
    }
    Errors errors =
        new Errors(within.numbers().covarianceSource().degreesOfFreedom(), how.confidence());
    List<Estimate> plants = new ArrayList<>();
    for (int p = 0; p < relative.length; p++) {
      double error = p == best ? 0 : levels.deviationApart(best, p);
      plants.add(errors.plain(relative[best] - relative[p], error));
    }
    return Optional.of(new ByEffects(best, plants));
  }

  /** Whether the covariance of the parameters may be propagated. */
  public static boolean quadratic(Variances v) {
    return v.inefficiency().method() == Estimate.Method.DELTA;
  }

  /** What the rows say of the inefficiency of one row, in ln Q; of a fit that found some. */
  public Estimate ofRow(int row, double level) {
    ConditionalErrors wide = widened.orElseThrow();
    return new Estimate(
        known.orElseThrow().mean(row),
        wide.deviation(row),
        wide.exceeded(row, (1 + level) / 2),
        wide.exceeded(row, (1 - level) / 2),
        level,
        Estimate.Method.CONDITIONAL);
  }

  /** The same as the share of the frontier's output that is reached: E e^(−u). */
  public Estimate efficiency(int row, double level) {
    ConditionalErrors wide = widened.orElseThrow();
    double mean = wide.survival(row);
    double square = wide.survivalSquared(row);
    return new Estimate(
        known.orElseThrow().survival(row),
        Math.sqrt(Math.max(0, square - mean * mean)),
        Math.exp(-wide.exceeded(row, (1 - level) / 2)),
        Math.exp(-wide.exceeded(row, (1 + level) / 2)),
        level,
        Estimate.Method.CONDITIONAL);
  }

  /** The probability that the inefficiency of a row exceeds a value. */
  public double probabilityAbove(int row, double value) {
    return widened.orElseThrow().probabilityAbove(row, value);
  }

  /** Intervals by Student's law. */
  private record Errors(double degrees, double level) {

    private double quantile() {
      return TDistribution.of(degrees).inverseSurvivalProbability((1 - level) / 2);
    }

    Estimate plain(double value, double error) {
      double half = error == 0 ? 0 : quantile() * error;
      return new Estimate(value, error, value - half, value + half, level, Estimate.Method.DELTA);
    }

    /** From the standard error of the log. */
    Estimate positive(double value, double error) {
      double factor = Math.exp(quantile() * error);
      return new Estimate(
          value, value * error, value / factor, value * factor, level, Estimate.Method.DELTA);
    }

    /**
     * The ends of the profile of the likelihood in the place of those of the log.
     *
     * @param wider by how much the covariance in force is wider than that of the likelihood alone
     */
    Estimate profiled(Estimate estimate, ComposedFit fit, ComposedProfile.Held held, double wider) {
      double threshold = quantile() * quantile() * (wider > 0 ? wider : 1);
      double[] ends = ComposedProfile.interval(fit, held, threshold);
      return new Estimate(
          estimate.value(),
          estimate.standardError(),
          ends[0],
          ends[1],
          level,
          Estimate.Method.PROFILE);
    }
  }
}

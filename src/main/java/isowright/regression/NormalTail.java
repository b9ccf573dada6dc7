package isowright.regression;

import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * Functions of the standard normal law that keep their digits far out in its tails, where the law
 * itself is zero in double precision.
 *
 * <p>With φ and Φ its density and distribution and λ(q) = φ(q)/Φ(q): for q below {@link #FAR} the
 * continued fraction λ = x + 1/(x + 2/(x + 3/(x + …))), x = −q, is used (P.-S. Laplace; M.
 * Abramowitz and I. A. Stegun 1964, formula 26.2.14). Tested in {@code NormalTailTest}.
 */
final class NormalTail {

  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  private static final double HALF_LOG_TWO_PI = 0.5 * Math.log(2 * Math.PI);

  /**
   * Below this the continued fraction gives all digits in {@link #TERMS} terms, and q + λ(q) would
   * lose some by cancellation.
   */
  private static final double FAR = -3;

  private static final int TERMS = 60;

  private NormalTail() {}

  /** q + λ(q), which is positive: the first derivative of {@link #logScaled}. */
  static double excess(double q) {
    if (q >= FAR) {
      return q + NORMAL.density(q) / NORMAL.cumulativeProbability(q);
    }
    double x = -q;
    double tail = x;
    for (int k = TERMS; k >= 2; k--) {
      tail = x + k / tail;
    }
    return 1 / tail;
  }

  /** 1 − λ(q) (q + λ(q)), between 0 and 1: the second derivative of {@link #logScaled}. */
  static double curvature(double q) {
    double excess = excess(q);
    return 1 - (excess - q) * excess;
  }

  /** ½ q² + ln Φ(q), which stays finite where Φ(q) is zero in double precision. */
  static double logScaled(double q) {
    return q >= FAR
        ? 0.5 * q * q + Math.log(NORMAL.cumulativeProbability(q))
        : -HALF_LOG_TWO_PI - Math.log(excess(q) - q);
  }

  /** ln Φ(q). */
  static double logProbability(double q) {
    return far(q) ? logScaled(q) - 0.5 * q * q : Math.log(NORMAL.cumulativeProbability(q));
  }

  /** Whether q lies so far out that Φ(q) is better had from its tail. */
  static boolean far(double q) {
    return q < FAR;
  }

  /**
   * The value x ≥ 0 that a normal variable with mean μ and standard deviation s, known to be
   * positive, exceeds with a probability: 1 − Φ((x − μ)/s) = probability × Φ(μ/s).
   */
  static double exceeded(double probability, double mean, double deviation) {
    double q = mean / deviation;
    double logTail = Math.log(probability) + logProbability(q);
    if (logTail > -600) {
      return Math.max(0, mean + deviation * NORMAL.inverseSurvivalProbability(Math.exp(logTail)));
    }
    // So far out the law beyond zero is exponential with rate (λ(q) − …)/s ≈ −q/s; one Newton step
    // on the logarithm of the tail makes it exact to rounding.
    double x = -deviation * Math.log(probability) / (excess(q) - q);
    for (int step = 0; step < 4; step++) {
      double at = (mean - x) / deviation;
      double error = logProbability(at) - logTail;
      x = Math.max(0, x + deviation * error / (excess(at) - at));
    }
    return x;
  }
}

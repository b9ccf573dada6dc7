package isowright.technology;

/**
 * The log of a weighted power mean, M(t) = (1/t) ln Σ_i δ_i e^{t z_i} with Σ_i δ_i = 1, and its
 * derivatives, without loss of digits at any order t.
 *
 * <p>With order t = −ρ this is the bracket of a constant-elasticity technology. Three limits make
 * the formula useless as it stands: 0/0 at t = 0 (where M is the weighted mean, Cobb-Douglas),
 * overflow far out, and t → −∞ (the smallest z, Leontief). Each is met as follows.
 *
 * <p><b>Near.</b> Let m = Σ δ_i z_i and x_i = t (z_i − m), so that Σ δ_i x_i = 0, and let φ(x) =
 * e^x − 1 − x. Then
 *
 * <pre>  w = Σ δ_i φ(x_i),   a = Σ δ_i x_i (e^{x_i} − 1),   E = 1 + w
 *  M     = m + ln(1 + w)/t
 *  p_i   = δ_i e^{x_i}/E                                  the tilted shares, ∂M/∂z_i
 *  t² M′ = a/E − ln(1 + w)                                (= Σ p_i ln(p_i/δ_i) ≥ 0)
 *  (p_i/δ_i − 1)/t = (e^{x_i} − 1 − w)/(E t) </pre>
 *
 * w and a are sums of terms none of which is negative, and the two terms of t²M′ stand in the ratio
 * 2 : 1 for small t, so nothing cancels: centring at m has removed the first-order terms that
 * would. All that is needed is φ to full precision, by its series for small x.
 *
 * <p><b>Far</b> (the x_i reach beyond {@link #NEAR}). The sum is taken relative to its largest
 * term, at s = the z_i for which t z_i is largest, which also holds for t = ±∞ and for an input of
 * zero (z = −∞): M = s + ln S/t, S = Σ δ_i e^{t(z_i − s)}, t² M′ = Σ p_i t(z_i − s) − ln S.
 *
 * <p>The two branches agree to rounding where they meet. Shares outside (0, 1) are accepted as long
 * as E stays positive, so that numerical derivatives at a bound can be taken.
 */
final class PowerMean {

  /**
   * Beyond this |t| times the spread of z the far formula is used; e^300 and its products with x
   * stay well inside double range.
   */
  static final double NEAR = 300;

  /** Below this |t| the limit t = 0 is exact to double precision at any z a double log can have. */
  static final double NEGLIGIBLE = 1e-100;

  /**
   * Where φ passes from its series to e^x − 1 − x: there φ = 0.034, so the subtraction costs a
   * factor of 1.3/0.034 ≈ 40 in rounding, 1e-14 at most, while eleven terms of the series leave
   * less than 1e-16.
   */
  static final double SERIES = 0.25;

  private PowerMean() {}

  /**
   * M(t) at z_i = logInputs_i − logBase_i.
   *
   * @param shares δ, shape n, sum one
   * @param order t, any number including ±∞
   */
  static double log(double[] logInputs, double[] logBase, double[] shares, double order) {
    double first = logInputs[0] - logBase[0];
    if (Math.abs(order) < NEGLIGIBLE) {
      return mean(logInputs, logBase, shares);
    }
    if (Math.abs(order) * spread(logInputs, logBase) <= NEAR) {
      double centre = centre(logInputs, logBase, shares);
      double w = excess(logInputs, logBase, shares, order, centre);
      return first + centre + logOnePlus(w) / order;
    }
    double s = dominant(logInputs, logBase, order);
    if (Double.isInfinite(s)) {
      return s;
    }
    return s + Math.log(relativeSum(logInputs, logBase, shares, order, s)) / order;
  }

  /**
   * The tilted shares p_i = ∂M/∂z_i; they sum to one.
   *
   * @param into shape n, overwritten
   */
  static void tilted(
      double[] logInputs, double[] logBase, double[] shares, double order, double[] into) {
    int n = shares.length;
    boolean near = Math.abs(order) * spread(logInputs, logBase) <= NEAR;
    // Relative to any point the shares are the same; the dominant one keeps every power below one.
    double s = near ? logInputs[0] - logBase[0] : dominant(logInputs, logBase, order);
    double sum = 0;
    for (int i = 0; i < n; i++) {
      into[i] = shares[i] * Math.exp(product(order, logInputs[i] - logBase[i] - s));
      sum += into[i];
    }
    for (int i = 0; i < n; i++) {
      into[i] /= sum;
    }
  }

  /**
   * (p_i/δ_i − 1)/t: the derivative of M in an unnormalised share at a sum of one, the shares being
   * divided by their sum.
   *
   * @param into {@code into[offset + i]}, overwritten
   */
  static void shareSlopes(
      double[] logInputs,
      double[] logBase,
      double[] shares,
      double order,
      double[] into,
      int offset) {
    int n = shares.length;
    double first = logInputs[0] - logBase[0];
    boolean limit = Math.abs(order) < NEGLIGIBLE;
    if (limit || Math.abs(order) * spread(logInputs, logBase) <= NEAR) {
      double centre = centre(logInputs, logBase, shares);
      double w = limit ? 0 : excess(logInputs, logBase, shares, order, centre);
      for (int i = 0; i < n; i++) {
        double y = logInputs[i] - logBase[i] - first - centre;
        double x = order * y;
        into[offset + i] = limit ? y : (x + phi(x) - w) / ((1 + w) * order);
      }
      return;
    }
    double s = dominant(logInputs, logBase, order);
    double sum = relativeSum(logInputs, logBase, shares, order, s);
    for (int i = 0; i < n; i++) {
      double power = Math.exp(product(order, logInputs[i] - logBase[i] - s));
      into[offset + i] = (power / sum - 1) / order;
    }
  }

  /** M′(t), never negative for positive shares; 0 at t = ±∞. */
  static double orderSlope(double[] logInputs, double[] logBase, double[] shares, double order) {
    int n = shares.length;
    double first = logInputs[0] - logBase[0];
    boolean limit = Math.abs(order) < NEGLIGIBLE;
    if (limit || Math.abs(order) * spread(logInputs, logBase) <= NEAR) {
      double centre = centre(logInputs, logBase, shares);
      double a = 0;
      for (int i = 0; i < n; i++) {
        double y = logInputs[i] - logBase[i] - first - centre;
        double x = order * y;
        a += shares[i] * (limit ? 0.5 * y * y : x * (x + phi(x)));
      }
      if (limit) {
        return a;
      }
      double w = excess(logInputs, logBase, shares, order, centre);
      return (a / (1 + w) - logOnePlus(w)) / order / order;
    }
    double s = dominant(logInputs, logBase, order);
    double sum = relativeSum(logInputs, logBase, shares, order, s);
    double drift = 0;
    for (int i = 0; i < n; i++) {
      double x = product(order, logInputs[i] - logBase[i] - s);
      double power = shares[i] * Math.exp(x);
      drift += power == 0 ? 0 : power * x;
    }
    return (drift / sum - Math.log(sum)) / order / order;
  }

  /** φ(x) = e^x − 1 − x to full relative precision. */
  static double phi(double x) {
    return Math.abs(x) < SERIES ? x * x * phiSeries(x) : Math.exp(x) - 1 - x;
  }

  /** Σ_{k ≤ 10} x^k/(k + 2)!, which is φ(x)/x² for |x| below {@link #SERIES}. */
  static double phiSeries(double x) {
    double tail = 1 / 3628800.0 + x * (1 / 39916800.0 + x * (1 / 479001600.0));
    tail = 1 / 5040.0 + x * (1 / 40320.0 + x * (1 / 362880.0 + x * tail));
    return 0.5 + x * (1 / 6.0 + x * (1 / 24.0 + x * (1 / 120.0 + x * (1 / 720.0 + x * tail))));
  }

  /**
   * ln(1 + w) for w above −1: {@link Math#log} of the rounded sum, corrected by the ratio of w to
   * what the rounding left of it. Several times faster than {@link Math#log1p}, which the virtual
   * machine does not compile inline.
   */
  static double logOnePlus(double w) {
    double sum = 1 + w;
    double kept = sum - 1;
    return kept == 0 || Double.isInfinite(sum) ? w : Math.log(sum) * (w / kept);
  }

  /** t y, with 0 for y = 0 also at infinite t. */
  private static double product(double order, double y) {
    return y == 0 ? 0 : order * y;
  }

  /** Σ δ_i (z_i − z_0): the weighted mean relative to the first, precise where all z are close. */
  private static double centre(double[] logInputs, double[] logBase, double[] shares) {
    double first = logInputs[0] - logBase[0];
    double sum = 0;
    for (int i = 1; i < shares.length; i++) {
      sum += shares[i] * (logInputs[i] - logBase[i] - first);
    }
    return sum;
  }

  private static double mean(double[] logInputs, double[] logBase, double[] shares) {
    double mean = logInputs[0] - logBase[0] + centre(logInputs, logBase, shares);
    if (!Double.isNaN(mean)) {
      return mean;
    }
    double sum = 0;
    for (int i = 0; i < shares.length; i++) {
      sum += shares[i] * (logInputs[i] - logBase[i]);
    }
    return sum;
  }

  private static double excess(
      double[] logInputs, double[] logBase, double[] shares, double order, double centre) {
    double first = logInputs[0] - logBase[0];
    double w = 0;
    for (int i = 0; i < shares.length; i++) {
      w += shares[i] * phi(order * (logInputs[i] - logBase[i] - first - centre));
    }
    return w;
  }

  private static double spread(double[] logInputs, double[] logBase) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < logBase.length; i++) {
      double z = logInputs[i] - logBase[i];
      low = Math.min(low, z);
      high = Math.max(high, z);
    }
    return high - low;
  }

  /** The z_i for which t z_i is largest. */
  private static double dominant(double[] logInputs, double[] logBase, double order) {
    double extreme = logInputs[0] - logBase[0];
    for (int i = 1; i < logBase.length; i++) {
      double z = logInputs[i] - logBase[i];
      extreme = order > 0 ? Math.max(extreme, z) : Math.min(extreme, z);
    }
    return extreme;
  }

  private static double relativeSum(
      double[] logInputs, double[] logBase, double[] shares, double order, double s) {
    double sum = 0;
    for (int i = 0; i < shares.length; i++) {
      sum += shares[i] * Math.exp(product(order, logInputs[i] - logBase[i] - s));
    }
    return sum;
  }
}

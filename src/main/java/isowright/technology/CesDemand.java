package isowright.technology;

import java.util.Optional;

/**
 * Conditional demand of a constant-elasticity technology in closed form. With y_i = ln x_i − ln
 * base_i, prices of base quantities ω_i = ln w_i + ln base_i and σ = 1/(1 + ρ), the first-order
 * conditions w_i x_i ∝ δ_i e^{−ρ y_i} and the target T = (ln Q − constant)/ν give
 *
 * <pre>  y_i = T − σ (v_i − ln c),   v_i = ω_i − ln δ_i,   ln c = M(1 − σ; v, δ) </pre>
 *
 * ln c being the log of the least cost of one unit of e^T and M the log of the weighted power mean
 * ({@link PowerMean}), which is exact through σ = 1 (Cobb-Douglas) and far out. Prices enter
 * relative to the cheapest, whose quantity therefore keeps its digits however large σ is.
 *
 * <p>Where some inputs are fixed at y_j, the others form a constant-elasticity technology of their
 * own, with shares d_i = δ_i/D, D = Σ_free δ_i, and the target
 *
 * <pre>  T + ln[1 − Σ_fixed δ_j (e^{−ρ(y_j − T)} − 1)/D]/(−ρ) </pre>
 *
 * Where the bracket is not positive the fixed inputs alone yield the target or more (σ &gt; 1), or
 * no quantity of the others is enough (σ &lt; 1).
 *
 * <p>Source of the dual form: Arrow, Chenery, Minhas and Solow (1961), Capital-Labor Substitution
 * and Economic Efficiency, <i>Review of Economics and Statistics</i> 43, 225–250; n inputs: Uzawa
 * (1962), <i>Review of Economic Studies</i> 29, 291–299.
 */
final class CesDemand implements ConditionalDemand.Smooth {

  private final double[] logBase;
  private final double[] shares;
  private final double[] logShares;
  private final double constant;
  private final double rho;
  private final double scale;
  private final double[] zeros;

  private CesDemand(double[] logBase, double constant, double[] shares, double rho, double scale) {
    this.logBase = logBase.clone();
    this.shares = shares.clone();
    this.constant = constant;
    this.rho = rho;
    this.scale = scale;
    this.zeros = new double[shares.length];
    this.logShares = new double[shares.length];
    for (int i = 0; i < shares.length; i++) {
      logShares[i] = Math.log(shares[i]);
    }
  }

  /** The shape that belongs to the parameters; empty outside the economic region. */
  static Optional<ConditionalDemand> of(
      double[] logBase, double constant, double[] shares, double rho, double scale) {
    boolean admissible = rho >= -1 && scale > 0;
    for (double share : shares) {
      admissible &= share > 0;
    }
    if (!admissible) {
      return Optional.empty();
    }
    int n = shares.length;
    double[] each = new double[n];
    if (rho == -1) {
      for (int i = 0; i < n; i++) {
        each[i] = Math.exp(constant / scale - logBase[i]) * shares[i];
      }
      return Optional.of(new PerfectSubstitutes(each, scale));
    }
    if (rho == Double.POSITIVE_INFINITY) {
      for (int i = 0; i < n; i++) {
        each[i] = logBase[i] - constant / scale;
      }
      return Optional.of(new FixedProportions(each, scale));
    }
    return Optional.of(new CesDemand(logBase, constant, shares, rho, scale));
  }

  @Override
  public Reach logMix(double logTarget, double[] logPrices, boolean[] fixed, double[] logMix) {
    int n = shares.length;
    int free = 0;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      if (!fixed[i]) {
        free++;
        sum += shares[i];
      }
    }
    double target = (logTarget - constant) / scale;
    if (free == n) {
      write(target, logPrices, shares, zeros, fixed, logMix);
      return Reach.REACHED;
    }
    double left = left(target, sum, fixed, logMix);
    if (Double.isNaN(left)) {
      return rho < 0 ? Reach.TOO_MUCH : Reach.TOO_LITTLE;
    }
    double[] weights = new double[free];
    for (int i = 0, k = 0; i < n; i++) {
      if (!fixed[i]) {
        weights[k++] = shares[i] / sum;
      }
    }
    // Shares relative to D shift every v_i and ln c alike, so v may keep the ln δ_i.
    write(target + left, logPrices, weights, new double[free], fixed, logMix);
    return Reach.REACHED;
  }

  /**
   * What the fixed inputs leave to the others, relative to T; NaN where there is no such target.
   */
  private double left(double target, double sum, boolean[] fixed, double[] logMix) {
    double order = -rho;
    boolean limit = Math.abs(order) < PowerMean.NEGLIGIBLE;
    double excess = 0;
    for (int i = 0; i < shares.length; i++) {
      if (fixed[i]) {
        double relative = logMix[i] - logBase[i] - target;
        excess += shares[i] * (limit ? relative : Math.expm1(order * relative));
      }
    }
    if (limit) {
      return -excess / sum;
    }
    return excess < sum ? Math.log1p(-excess / sum) / order : Double.NaN;
  }

  private void write(
      double target,
      double[] logPrices,
      double[] weights,
      double[] zero,
      boolean[] fixed,
      double[] logMix) {
    double sigma = 1 / (1 + rho);
    double[] v = new double[weights.length];
    double cheapest = Double.POSITIVE_INFINITY;
    for (int i = 0, k = 0; i < shares.length; i++) {
      if (!fixed[i]) {
        v[k] = logPrices[i] + logBase[i] - logShares[i];
        cheapest = Math.min(cheapest, v[k++]);
      }
    }
    for (int k = 0; k < v.length; k++) {
      v[k] -= cheapest;
    }
    double logUnitCost = PowerMean.log(v, zero, weights, rho * sigma);
    for (int i = 0, k = 0; i < shares.length; i++) {
      if (!fixed[i]) {
        logMix[i] = target - sigma * (v[k++] - logUnitCost) + logBase[i];
      }
    }
  }
}

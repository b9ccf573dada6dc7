package isowright.technology;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * Constant elasticity of substitution straight from its definition, ln Σ δ_i e^{t z_i} / t, in
 * decimal arithmetic of 80 digits: so many that the cancellation at small t, some 35 digits here,
 * does not matter. No series, no centring, nothing shared with the formulas under test.
 */
final class PreciseCes {

  private static final MathContext DIGITS = new MathContext(80);
  private static final BigDecimal TWO = BigDecimal.valueOf(2);
  private static final BigDecimal SMALL = new BigDecimal("1e-6");

  private final BigDecimal[] powers;
  private final BigDecimal[] shares;
  private final BigDecimal[] z;
  private final BigDecimal t;
  private final BigDecimal sum;
  private final BigDecimal logMean;

  PreciseCes(double[] shares, double[] z, double order) {
    int n = shares.length;
    this.t = new BigDecimal(order);
    this.powers = new BigDecimal[n];
    this.shares = new BigDecimal[n];
    this.z = new BigDecimal[n];
    BigDecimal total = BigDecimal.ZERO;
    for (int i = 0; i < n; i++) {
      this.z[i] = new BigDecimal(z[i]);
      powers[i] = exp(t.multiply(this.z[i]));
      total = total.add(new BigDecimal(shares[i]));
    }
    BigDecimal weighted = BigDecimal.ZERO;
    for (int i = 0; i < n; i++) {
      // Shares that sum to one exactly, not only to double precision.
      this.shares[i] = new BigDecimal(shares[i]).divide(total, DIGITS);
      weighted = weighted.add(this.shares[i].multiply(powers[i]));
    }
    this.sum = weighted;
    this.logMean = ln(sum).divide(t, DIGITS);
  }

  /** M(t). */
  double logMean() {
    return logMean.doubleValue();
  }

  /** p_i = ∂M/∂z_i. */
  double tilted(int i) {
    return shares[i].multiply(powers[i]).divide(sum, DIGITS).doubleValue();
  }

  /** t p_i (1 − p_i) for i = j, −t p_i p_j otherwise: ∂²M/∂z_i∂z_j. */
  double second(int i, int j) {
    BigDecimal others = BigDecimal.ZERO;
    for (int k = 0; k < z.length; k++) {
      // 1 − p_i as the sum of the others: p_i may differ from one by less than the last digit.
      others = k == i ? others : others.add(shares[k].multiply(powers[k]));
    }
    BigDecimal second = i == j ? others : shares[j].multiply(powers[j]).negate();
    return second
        .multiply(shares[i])
        .multiply(powers[i])
        .multiply(t)
        .divide(sum.multiply(sum), DIGITS)
        .doubleValue();
  }

  /** (e^{t z_i}/Σ − 1)/t: the derivative in a share before division by the sum. */
  double shareSlope(int i) {
    return powers[i].divide(sum, DIGITS).subtract(BigDecimal.ONE).divide(t, DIGITS).doubleValue();
  }

  /** M′(t) = (Σ p_i z_i − M)/t. */
  double orderSlope() {
    BigDecimal mean = BigDecimal.ZERO;
    for (int i = 0; i < z.length; i++) {
      mean = mean.add(shares[i].multiply(powers[i]).multiply(z[i]));
    }
    return mean.divide(sum, DIGITS).subtract(logMean).divide(t, DIGITS).doubleValue();
  }

  /** e^x: x halved until it is small, Taylor's series, squared back. */
  static BigDecimal exp(BigDecimal x) {
    int halvings = 0;
    BigDecimal small = x.round(DIGITS);
    while (small.abs().compareTo(SMALL) > 0) {
      small = small.divide(TWO, DIGITS);
      halvings++;
    }
    BigDecimal sum = BigDecimal.ONE;
    BigDecimal term = BigDecimal.ONE;
    for (int k = 1; k <= 12; k++) {
      term = term.multiply(small, DIGITS).divide(BigDecimal.valueOf(k), DIGITS);
      sum = sum.add(term);
    }
    for (int k = 0; k < halvings; k++) {
      sum = sum.multiply(sum, DIGITS);
    }
    return sum.round(DIGITS);
  }

  /** ln v by Newton's steps on e^y = v, each doubling the digits. */
  static BigDecimal ln(BigDecimal v) {
    int exponent = v.precision() - v.scale() - 1;
    double mantissa = v.movePointLeft(exponent).doubleValue();
    BigDecimal y = new BigDecimal(Math.log(mantissa) + exponent * Math.log(10));
    for (int k = 0; k < 3; k++) {
      y = y.add(v.divide(exp(y), DIGITS).subtract(BigDecimal.ONE), DIGITS);
    }
    return y;
  }
}

package isowright.technology;

/**
 * Conditional demand of a Cobb-Douglas technology in closed form. With R = ln Q − constant −
 * Σ_fixed β_i z_i left for the free inputs and B = Σ_free β_i, the first-order conditions w_i x_i =
 * μ β_i give
 *
 * <pre>
 *   ln μ = [R − Σ_free β_i (ln β_i − ln w_i − ln base_i)] / B,   ln x_i = ln μ + ln β_i − ln w_i
 * </pre>
 *
 * <p>Every positive target is reached, because ln Q has no bounds in any input.
 */
final class CobbDouglasDemand implements ConditionalDemand.Smooth {

  private final double[] coefficients;
  private final double[] logCoefficients;
  private final double[] logBase;
  private final double constant;

  /**
   * Takes the logs once.
   *
   * @param coefficients β, shape n, positive
   */
  CobbDouglasDemand(double[] logBase, double constant, double[] coefficients) {
    int n = coefficients.length;
    this.coefficients = coefficients.clone();
    this.constant = constant;
    this.logCoefficients = new double[n];
    this.logBase = logBase.clone();
    for (int i = 0; i < n; i++) {
      logCoefficients[i] = Math.log(coefficients[i]);
    }
  }

  @Override
  public Reach logMix(double logTarget, double[] logPrices, boolean[] fixed, double[] logMix) {
    double left = logTarget - constant;
    double sum = 0;
    for (int i = 0; i < coefficients.length; i++) {
      if (fixed[i]) {
        left -= coefficients[i] * (logMix[i] - logBase[i]);
      } else {
        left -= coefficients[i] * (logCoefficients[i] - logPrices[i] - logBase[i]);
        sum += coefficients[i];
      }
    }
    double logMultiplier = left / sum;
    for (int i = 0; i < coefficients.length; i++) {
      if (!fixed[i]) {
        logMix[i] = logMultiplier + logCoefficients[i] - logPrices[i];
      }
    }
    return Reach.REACHED;
  }
}

package isowright.demo;

/**
 * What is true of the invented brickworks: the constants from which their records are drawn.
 *
 * <p>Notation: inputs i = labour (h), kilns (h), energy (GJ); x̄ the base mix; Q output (t).
 *
 * <pre>
 *   η₀ z + ½ η₁ z² = −(1/ρ) ln Σ δ_i (x_i/x̄_i)^−ρ + level of the works + noise,  z = ln(Q/30000)
 * </pre>
 *
 * <p>A CES core (Arrow, Chenery, Minhas and Solow 1961; several inputs: Uzawa 1962) whose yield
 * tires with output: the scale elasticity is 1/(η₀ + η₁ z), so that average cost falls up to the
 * output at which it is one and rises beyond. The cost function follows in closed form,
 *
 * <pre>
 *   ln C = ln c(w) + η₀ z + ½ η₁ z² − level,
 *   c(w) = Σ w_i x̄_i u_i,  u_i ∝ (δ_i/(w_i x̄_i))^σ,  Σ δ_i u_i^−ρ = 1
 * </pre>
 */
final class BrickworksTruth {

  /** ρ; the elasticity of substitution is 1/(1 + ρ) = 0.5. */
  static final double RHO = 1;

  /** σ = 1/(1 + ρ). */
  static final double SUBSTITUTION = 1 / (1 + RHO);

  /** η₀: the elasticity of cost in output at the base output. */
  static final double COST_ELASTICITY = 0.9;

  /** Q*, the output of least average cost. */
  static final double EFFICIENT = 60_000;

  /** η₁ = (1 − η₀)/ln(Q* / 30000). */
  static final double TIRING = (1 - COST_ELASTICITY) / StrictMath.log(EFFICIENT / 30_000);

  static final double BASE_OUTPUT = 30_000;
  static final int INPUTS = 3;

  /** δ. */
  private static final double[] SHARES = {0.4, 0.25, 0.35};

  /** x̄: hours of labour, hours of kilns, GJ of energy. */
  private static final double[] BASE_MIX = {40_000, 8_000, 90_000};

  private BrickworksTruth() {}

  /** 1/(∂ln C/∂ln Q) = 1/(η₀ + η₁ z). */
  static double scaleEconomies(double output) {
    return 1 / (COST_ELASTICITY + TIRING * StrictMath.log(output / BASE_OUTPUT));
  }

  /** The least-cost mix for an output at prices w by works of this level. */
  static double[] leastCostMix(double output, double[] prices, double level) {
    double[] mix = new double[INPUTS];
    for (int i = 0; i < INPUTS; i++) {
      mix[i] = BASE_MIX[i] * StrictMath.pow(SHARES[i] / (prices[i] * BASE_MIX[i]), SUBSTITUTION);
    }
    double factor = StrictMath.exp(index(output) - level - logCore(mix));
    for (int i = 0; i < INPUTS; i++) {
      mix[i] *= factor;
    }
    return mix;
  }

  /** C(w, Q). */
  static double leastCost(double output, double[] prices, double level) {
    double[] mix = leastCostMix(output, prices, level);
    double cost = 0;
    for (int i = 0; i < INPUTS; i++) {
      cost += prices[i] * mix[i];
    }
    return cost;
  }

  /** What a mix makes: the upper root of the square in z. */
  static double output(double[] mix, double level) {
    double aim = logCore(mix) + level;
    double root = StrictMath.sqrt(COST_ELASTICITY * COST_ELASTICITY + 2 * TIRING * aim);
    return BASE_OUTPUT * StrictMath.exp((root - COST_ELASTICITY) / TIRING);
  }

  /** η₀ z + ½ η₁ z². */
  private static double index(double output) {
    double z = StrictMath.log(output / BASE_OUTPUT);
    return COST_ELASTICITY * z + TIRING * z * z / 2;
  }

  /** −(1/ρ) ln Σ δ_i u_i^−ρ. */
  private static double logCore(double[] mix) {
    double sum = 0;
    for (int i = 0; i < INPUTS; i++) {
      sum += SHARES[i] * StrictMath.pow(mix[i] / BASE_MIX[i], -RHO);
    }
    return -StrictMath.log(sum) / RHO;
  }
}

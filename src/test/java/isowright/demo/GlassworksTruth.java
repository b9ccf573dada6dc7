package isowright.demo;

import java.util.List;

/**
 * What is true of the invented glassworks: the constants from which their records are drawn.
 *
 * <p>Notation: inputs i = labour (h), machines (h), energy (GJ); x̄ the base mix; Q output (t).
 *
 * <pre>
 *   ln Q = ln 30000 − (ν/ρ) ln Σ δ_i (x_i/x̄_i)^−ρ + τ (year − 2018)
 *          + productivity of the plant + γ (breakdown rate − 0.05) + noise
 * </pre>
 *
 * <p>A CES technology (Arrow, Chenery, Minhas and Solow 1961; several inputs: Uzawa 1962) of degree
 * ν, normalised at the base mix. The noise is unknown when inputs are chosen; the productivity is
 * known to the plant, and the more productive plants are on the whole the larger ones, so that
 * estimates which ignore plant effects overstate returns to scale.
 */
final class GlassworksTruth {

  /** ρ; the elasticity of substitution is 1/(1 + ρ) = 0.625. */
  static final double RHO = 0.6;

  /** σ = 1/(1 + ρ). */
  static final double SUBSTITUTION = 1 / (1 + RHO);

  /** ν, returns to scale. */
  static final double SCALE = 1.05;

  /** τ, growth of log output a year at unchanged inputs. */
  static final double TREND = 0.008;

  /** γ: a rate higher by 0.01 costs 0.9 % of output. */
  static final double BREAKDOWN = -0.9;

  /** Standard deviation of the noise in log output. */
  static final double NOISE = 0.03;

  /** δ: at the base mix the output elasticity of input i is ν δ_i. */
  private static final double[] SHARES = {0.36, 0.34, 0.30};

  /** x̄: hours of labour, hours of machines, GJ of energy. */
  private static final double[] BASE_MIX = {75_000, 36_000, 210_000};

  /** Tonnes from the base mix in the base year at productivity 0. */
  static final double BASE_OUTPUT = 30_000;

  static final int BASE_YEAR = 2018;
  static final double USUAL_BREAKDOWN = 0.05;
  static final int FIRST_YEAR = 2012;
  static final int LAST_YEAR = 2024;
  static final int YEARS = LAST_YEAR - FIRST_YEAR + 1;
  static final int INPUTS = 3;

  /**
   * A plant.
   *
   * @param name its name
   * @param region where it buys its inputs
   * @param usualOutput tonnes a year in a middling year
   * @param productivity log output relative to a plant at 0 with the same inputs
   * @param heavyIn the input of which it habitually uses more than the least-cost mix; −1: none
   * @param excess the habitual log excess of that input before the mix is scaled to the target
   * @param rebuilt the years in which its furnace was rebuilt, ascending
   */
  record Plant(
      String name,
      String region,
      double usualOutput,
      double productivity,
      int heavyIn,
      double excess,
      List<Integer> rebuilt) {}

  /** The plants. Their productivity levels add up to zero; standard deviation 0.107. */
  static final List<Plant> PLANTS =
      List.of(
          new Plant("GW-01", "north", 42_000, 0.08, -1, 0, List.of(2009, 2021)),
          new Plant("GW-02", "river", 18_000, -0.11, -1, 0, List.of(2004, 2017)),
          new Plant("GW-03", "hills", 27_000, -0.02, 0, 0.25, List.of(2011)),
          new Plant("GW-04", "coast", 60_000, 0.13, -1, 0, List.of(2006, 2018)),
          new Plant("GW-05", "north", 14_500, -0.06, -1, 0, List.of(2012, 2024)),
          new Plant("GW-06", "river", 33_000, 0.04, -1, 0, List.of(2003, 2015)),
          new Plant("GW-07", "hills", 21_000, -0.14, -1, 0, List.of(2008, 2020)),
          new Plant("GW-08", "coast", 47_000, 0.02, 1, 0.30, List.of(2010, 2022)),
          new Plant("GW-09", "north", 24_000, 0.10, -1, 0, List.of(2005, 2016)),
          new Plant("GW-10", "river", 54_000, 0.17, -1, 0, List.of(2007, 2019)),
          new Plant("GW-11", "hills", 12_000, -0.09, -1, 0, List.of(2002, 2014)),
          new Plant("GW-12", "coast", 30_000, -0.05, -1, 0, List.of(2010, 2023)),
          new Plant("GW-13", "north", 38_000, -0.17, 2, 0.25, List.of(2001, 2013)),
          new Plant("GW-14", "river", 16_000, 0.10, -1, 0, List.of(2009, 2021)));

  private GlassworksTruth() {}

  /** ln Q without noise. */
  static double logOutput(double[] mix, int year, double productivity, double breakdownRate) {
    double sum = 0;
    for (int i = 0; i < INPUTS; i++) {
      sum += SHARES[i] * StrictMath.pow(mix[i] / BASE_MIX[i], -RHO);
    }
    return StrictMath.log(BASE_OUTPUT)
        - SCALE / RHO * StrictMath.log(sum)
        + TREND * (year - BASE_YEAR)
        + productivity
        + BREAKDOWN * (breakdownRate - USUAL_BREAKDOWN);
  }

  /**
   * The least-cost mix for a level of output at prices w, from the first-order conditions: with u_i
   * = x_i/x̄_i the ratio of two inputs is u_i/u_j = (δ_i w_j x̄_j / δ_j w_i x̄_i)^σ, and the level
   * follows from homogeneity of degree ν.
   */
  static double[] leastCostMix(double logTarget, double[] prices, int year, double productivity) {
    double[] mix = new double[INPUTS];
    for (int i = 0; i < INPUTS; i++) {
      mix[i] = BASE_MIX[i] * StrictMath.pow(SHARES[i] / (prices[i] * BASE_MIX[i]), SUBSTITUTION);
    }
    return scaledTo(logTarget, mix, year, productivity);
  }

  /** The same proportions at the level that yields the target at the usual breakdown rate. */
  static double[] scaledTo(double logTarget, double[] mix, int year, double productivity) {
    double logGap = logTarget - logOutput(mix, year, productivity, USUAL_BREAKDOWN);
    double factor = StrictMath.exp(logGap / SCALE);
    double[] scaled = new double[INPUTS];
    for (int i = 0; i < INPUTS; i++) {
      scaled[i] = mix[i] * factor;
    }
    return scaled;
  }

  /** Output elasticities ν δ_i u_i^−ρ / Σ δ_j u_j^−ρ at a mix. */
  static double[] outputElasticities(double[] mix) {
    double[] parts = new double[INPUTS];
    double sum = 0;
    for (int i = 0; i < INPUTS; i++) {
      parts[i] = SHARES[i] * StrictMath.pow(mix[i] / BASE_MIX[i], -RHO);
      sum += parts[i];
    }
    for (int i = 0; i < INPUTS; i++) {
      parts[i] *= SCALE / sum;
    }
    return parts;
  }
}

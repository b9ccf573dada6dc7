package isowright.review;

import isowright.leastcost.Plan;

/**
 * A filed cost held against least cost, in parts that add up: gap = unreconciled + technical + mix,
 * exactly as the numbers stand.
 *
 * <p>What could not be had is NaN, and {@code reason} says why: without a least cost there is no
 * gap and no mix part, without a contraction no technical and no mix part.
 *
 * @param filed the filed cost
 * @param atPrices Σ w_i x_i of the mix used
 * @param leastCost C(w, Q), the least cost of the same output at the same prices
 * @param gap filed cost less least cost
 * @param unreconciled filed cost less Σ w_i x_i
 * @param technical Σ w_i x_i less the cost of the same mix drawn onto the isoquant, Σ w_i θ x_i;
 *     negative where the plant does better than the reference
 * @param mix the cost of that mix less least cost
 * @param contraction θ, with f(θ x) = Q
 * @param status the status of the least-cost plan
 * @param reason in words: what must be said of the plan, of the contraction; empty where nothing
 */
public record Gap(
    double filed,
    double atPrices,
    double leastCost,
    double gap,
    double unreconciled,
    double technical,
    double mix,
    double contraction,
    Plan.Status status,
    String reason) {

  /** A contraction this near to one is one to the rounding of the logs it comes from. */
  static final double EVEN = 1e-12;

  /** Whether every part could be had. */
  public boolean complete() {
    return !Double.isNaN(gap) && !Double.isNaN(technical) && !Double.isNaN(mix);
  }

  /** Technical efficiency in Farrell's sense: θ, at most one where the reference is a frontier. */
  public double technicalRatio() {
    return contraction;
  }

  /** Efficiency of the mix in Farrell's sense: least cost over the cost of the contracted mix. */
  public double mixRatio() {
    return leastCost / (contraction * atPrices);
  }

  /** Least cost over the cost of the mix used, the product of the two. */
  public double costRatio() {
    return leastCost / atPrices;
  }
}

package isowright.review;

import isowright.leastcost.Plan;

/**
 * A filed cost held against least cost, in parts that add up: gap = unreconciled + technical + mix
 * + remainder, exactly as the numbers stand.
 *
 * <p>What could not be had is NaN, and {@code reason} says why: without a least cost there is no
 * gap, no mix part and no remainder, without a contraction no technical and no mix part. What the
 * parts that could be had leave of the gap is the remainder: zero where the gap is split, the whole
 * of Σ w_i x_i − C where it could not be.
 *
 * @param filed the filed cost
 * @param atPrices Σ w_i x_i of the mix used
 * @param leastCost C(w, Q), the least cost of the same output at the same prices
 * @param gap filed cost less least cost
 * @param unreconciled filed cost less Σ w_i x_i
 * @param technical Σ w_i x_i less the cost of the same mix drawn onto the isoquant, Σ w_i θ x_i;
 *     negative where the plant does better than the reference
 * @param mix the cost of that mix less least cost
 * @param remainder what of the gap is left undivided
 * @param contraction θ, with f(θ x) = Q
 * @param mixRatioAtOwnOutput C(w, f(x)) / Σ w_i x_i: the efficiency of the mix judged at the output
 *     which the inputs would yield by the reference, not at the output recorded; NaN without an
 *     answer there
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
    double remainder,
    double contraction,
    double mixRatioAtOwnOutput,
    Plan.Status status,
    String reason) {

  /** A contraction this near to one is one to the rounding of the logs it comes from. */
  static final double EVEN = 1e-12;

  /** Ratios of the mix that differ by less than this are the same to every printed digit. */
  static final double SAME_RATIO = 1e-6;

  /** Whether there is a gap at all. */
  public boolean answered() {
    return !Double.isNaN(gap);
  }

  /** Whether every part could be had. */
  public boolean complete() {
    return !Double.isNaN(gap) && !Double.isNaN(technical) && !Double.isNaN(mix);
  }

  /**
   * Whether the split into technical and mix depends on the direction in which the mix is brought
   * onto the isoquant. A homothetic technology has parallel isoquants: the mix is equally efficient
   * along the whole ray, and the split as ratios is the same whether inputs shrink to the recorded
   * output or output grows to what the inputs would yield. Otherwise the split is that of input
   * contraction at the recorded output, and another direction would give another one; the gap
   * itself would be the same (Kopp and Diewert 1982, section 2).
   */
  public boolean splitDependsOnDirection() {
    return complete()
        && !Double.isNaN(mixRatioAtOwnOutput)
        && Math.abs(mixRatioAtOwnOutput / mixRatio() - 1) > SAME_RATIO;
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

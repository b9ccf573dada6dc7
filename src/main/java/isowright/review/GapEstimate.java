package isowright.review;

import isowright.inference.Estimate;
import isowright.leastcost.Plan;

/**
 * A gap with its uncertainty. The filing is taken as it stands, so the unreconciled part is exact;
 * what is uncertain is the technology.
 *
 * @param gap the gap and its parts
 * @param plan the least-cost plan behind it
 * @param leastCost least cost, interval on the log scale
 * @param difference the gap; its interval is that of least cost turned round
 * @param technical the technical part
 * @param mix the mix part
 * @param remainder what is left undivided
 * @param ratio filed over least cost, interval on the log scale
 * @param efficiency the same as ratios of costs in Farrell's sense
 * @param slopes ∂ln C/∂θ_k, shape p: how the log of least cost moves with the parameters
 */
public record GapEstimate(
    Gap gap,
    Plan plan,
    Estimate leastCost,
    Estimate difference,
    Estimate technical,
    Estimate mix,
    Estimate remainder,
    Estimate ratio,
    Efficiency efficiency,
    double[] slopes) {

  /**
   * Ratios of costs (Farrell 1957); technical × mix = cost.
   *
   * @param technical θ, below one where the plant does worse than the reference
   * @param mix least cost over the cost of the contracted mix, at most one
   * @param cost least cost over the cost of the mix used
   */
  public record Efficiency(Estimate technical, Estimate mix, Estimate cost) {}

  /** Copies the slopes. */
  public GapEstimate {
    slopes = slopes.clone();
  }

  @Override
  public double[] slopes() {
    return slopes.clone();
  }
}

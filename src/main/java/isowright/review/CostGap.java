package isowright.review;

import isowright.inference.Estimate;
import java.util.Optional;

/**
 * A filed cost held against a cost function at the same outputs and prices, with its uncertainty.
 *
 * <p>The gap is what the filing holds beyond recorded cost (unreconciled, exact) and what recorded
 * cost holds beyond least cost. Where shares are recorded, and so quantities, and prices can be
 * found at which the mix used is least cost, the second divides into a technical and a mix part;
 * else it stands as remainder.
 *
 * @param filed the filed cost
 * @param recorded the cost that was recorded and explained
 * @param leastCost least cost, interval on the log scale; NaN where the function is no cost
 *     function at the point
 * @param difference filed less least cost; its interval is that of least cost turned round
 * @param beyond recorded less least cost, likewise
 * @param parts that in parts; absent where it cannot be divided
 * @param ratio filed over least cost, interval on the log scale
 * @param slopes ∂ln C/∂θ_k, shape p
 */
public record CostGap(
    double filed,
    double recorded,
    Estimate leastCost,
    Estimate difference,
    Estimate beyond,
    Optional<Parts> parts,
    Estimate ratio,
    double[] slopes) {

  /**
   * Recorded less least cost in parts.
   *
   * @param technical recorded cost less that of the same mix drawn onto the isoquant
   * @param mix the cost of that mix less least cost, never negative
   * @param efficiency the same as ratios of costs
   */
  public record Parts(Estimate technical, Estimate mix, GapEstimate.Efficiency efficiency) {}

  /** Copies the slopes. */
  public CostGap {
    slopes = slopes.clone();
  }

  @Override
  public double[] slopes() {
    return slopes.clone();
  }

  /** What is left undivided: nothing, or the whole of recorded less least cost. */
  public Estimate remainder() {
    return parts.isPresent() ? new Estimate(0, 0, 0, 0, beyond.level(), beyond.method()) : beyond;
  }

  /** Filed less recorded cost. */
  public double unreconciled() {
    return filed - recorded;
  }
}

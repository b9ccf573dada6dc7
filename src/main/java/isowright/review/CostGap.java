package isowright.review;

import isowright.inference.Estimate;

/**
 * A filed cost held against a cost function at the same outputs and prices, with its uncertainty.
 *
 * <p>Without quantities of inputs technical and mix parts cannot be told apart: the gap is what the
 * filing holds beyond recorded cost (exact) and the remainder, recorded less least cost.
 *
 * @param filed the filed cost
 * @param recorded the cost that was recorded and explained
 * @param leastCost least cost, interval on the log scale; NaN where the function is no cost
 *     function at the point
 * @param difference filed less least cost; its interval is that of least cost turned round
 * @param remainder recorded less least cost, likewise
 * @param ratio filed over least cost, interval on the log scale
 * @param slopes ∂ln C/∂θ_k, shape p
 */
public record CostGap(
    double filed,
    double recorded,
    Estimate leastCost,
    Estimate difference,
    Estimate remainder,
    Estimate ratio,
    double[] slopes) {

  /** Copies the slopes. */
  public CostGap {
    slopes = slopes.clone();
  }

  @Override
  public double[] slopes() {
    return slopes.clone();
  }

  /** Filed less recorded cost. */
  public double unreconciled() {
    return filed - recorded;
  }
}

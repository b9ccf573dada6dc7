package isowright.leastcost;

/**
 * The answer to a {@link Question}.
 *
 * <p>Shapes: n. Where the status is {@link Status#INFEASIBLE} or {@link Status#IRREGULAR} there is
 * no mix: the arrays are empty and the numbers NaN, and {@code reason} says why.
 *
 * @param status what kind of answer this is
 * @param mix the inputs x
 * @param cost C = Σ w_i x_i
 * @param marginalCost λ, the multiplier of the target: what one more unit of output costs; +∞ where
 *     no input can give more, NaN where there is no answer
 * @param shares s_i = w_i x_i / C
 * @param limitValues what one more unit of the limit on each input would save (a binding upper
 *     limit or a held input: λ f_i − w_i; a binding lower limit: negative); 0 where nothing binds
 * @param optimality the largest relative departure from the first-order conditions, recomputed from
 *     the technology and not taken from the solver
 * @param reason in words: what binds, what is irregular, how far the target is from feasible; empty
 *     for a plain solved plan
 */
public record Plan(
    Status status,
    double[] mix,
    double cost,
    double marginalCost,
    double[] shares,
    double[] limitValues,
    double optimality,
    String reason) {

  /** What kind of answer a plan is. */
  public enum Status {
    /** The least-cost mix, with every first-order condition met. */
    SOLVED,
    /** The least-cost mix lies at a corner: an input is not used, or a limit binds. */
    CORNER,
    /** The technology is not regular where the answer would lie, so no mix is given. */
    IRREGULAR,
    /** No mix within the limits reaches the target. */
    INFEASIBLE
  }

  /** Copies the arrays. */
  public Plan {
    mix = mix.clone();
    shares = shares.clone();
    limitValues = limitValues.clone();
  }

  /** Whether there is a mix. */
  public boolean answered() {
    return status == Status.SOLVED || status == Status.CORNER;
  }

  /** The same with something more to be said of it. */
  Plan because(String more) {
    String both = reason.isEmpty() ? more : reason + "; " + more;
    return new Plan(status, mix, cost, marginalCost, shares, limitValues, optimality, both);
  }

  @Override
  public double[] mix() {
    return mix.clone();
  }

  @Override
  public double[] shares() {
    return shares.clone();
  }

  @Override
  public double[] limitValues() {
    return limitValues.clone();
  }

  /** The quantity of input i. */
  public double mix(int i) {
    return mix[i];
  }
}

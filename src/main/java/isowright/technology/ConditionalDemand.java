package isowright.technology;

import java.util.function.Function;

/**
 * What a form can write down of its own least-cost mix, so that nobody need search for it: the
 * inputs demanded at given prices conditional on an output.
 *
 * <p>Three shapes, because a question with limits is answered differently in each: smooth isoquants
 * (any mix of inputs may be the cheapest), fixed proportions (kinked isoquants, prices do not
 * matter) and perfect substitutes (straight isoquants, only the cheapest is taken). A form offers
 * the shape that its parameters have, through {@link Technology#conditionalDemand()}.
 *
 * <p>Immutable; safe to share between threads.
 */
public sealed interface ConditionalDemand {

  /** Whether a mix with some inputs fixed can yield the target. */
  enum Reach {
    /** The mix written down yields it. */
    REACHED,
    /** However much is taken of the free inputs, the target is not reached. */
    TOO_LITTLE,
    /** The fixed inputs alone yield the target or more. */
    TOO_MUCH
  }

  /** Applies the function that belongs to the shape; the compiler demands one for every shape. */
  <T> T fold(
      Function<Smooth, T> smooth,
      Function<FixedProportions, T> fixed,
      Function<PerfectSubstitutes, T> perfect);

  /** Smooth isoquants, convex to the origin: every input used has w_i = λ f_i. */
  non-sealed interface Smooth extends ConditionalDemand {

    /**
     * The least-cost quantities of the free inputs, the others staying where they are.
     *
     * @param logTarget ln Q
     * @param logPrices ln w, shape n
     * @param fixed which inputs stay, shape n; at least one does not
     * @param logMix ln x, shape n: read where fixed, overwritten where free and the target is
     *     reached
     */
    Reach logMix(double logTarget, double[] logPrices, boolean[] fixed, double[] logMix);

    @Override
    default <T> T fold(
        Function<Smooth, T> smooth,
        Function<FixedProportions, T> fixed,
        Function<PerfectSubstitutes, T> perfect) {
      return smooth.apply(this);
    }
  }

  /**
   * ln Q = ν min_i (ln x_i − ln need_i): every input is needed in proportion.
   *
   * @param logNeed the log of each input that one unit of output needs, shape n
   * @param scale ν
   */
  record FixedProportions(double[] logNeed, double scale) implements ConditionalDemand {

    /** Copies the array. */
    public FixedProportions {
      logNeed = logNeed.clone();
    }

    @Override
    public double[] logNeed() {
      return logNeed.clone();
    }

    @Override
    public <T> T fold(
        Function<Smooth, T> smooth,
        Function<FixedProportions, T> fixed,
        Function<PerfectSubstitutes, T> perfect) {
      return fixed.apply(this);
    }
  }

  /**
   * Q = (Σ worth_i x_i)^ν: a unit of one input always replaces the same quantity of another.
   *
   * @param worth what a unit of each input adds to the sum, shape n, positive
   * @param scale ν
   */
  record PerfectSubstitutes(double[] worth, double scale) implements ConditionalDemand {

    /** Copies the array. */
    public PerfectSubstitutes {
      worth = worth.clone();
    }

    @Override
    public double[] worth() {
      return worth.clone();
    }

    @Override
    public <T> T fold(
        Function<Smooth, T> smooth,
        Function<FixedProportions, T> fixed,
        Function<PerfectSubstitutes, T> perfect) {
      return perfect.apply(this);
    }
  }
}

package isowright.leastcost;

/**
 * What is one more unit of a constraint worth? The change in what the plan is to achieve when the
 * bound is moved by one unit, to first order, everything else staying within its limits.
 *
 * @param kind which constraint
 * @param input the input it concerns; −1 where it concerns none
 * @param bound where it stands: the target, the budget, a quantity
 * @param value for a target at least cost: the money saved by one more unit (for the target itself
 *     the money that one more unit costs); for a budget: the output gained; for profit: the money
 *     gained; negative where one unit less is worth that much
 */
public record Multiplier(Kind kind, int input, double bound, double value) {

  /** Which constraint. */
  public enum Kind {
    /** The output to be reached: marginal cost. */
    TARGET,
    /** The money to be spent: output per unit of money. */
    BUDGET,
    /** An input that cannot change. */
    HELD,
    /** The most of an input. */
    UPPER,
    /** The least of an input. */
    LOWER,
    /** What must be paid for of an input whether used or not. */
    COMMITMENT,
    /** The end of a band of prices: one more unit at the price before it. */
    BAND,
    /** Whole units: what is lost because inputs come in them, not per unit. */
    WHOLE
  }

  /** The word used in files. */
  public String word() {
    return kind.name().toLowerCase(java.util.Locale.ROOT);
  }
}

package isowright.leastcost;

import java.util.function.Function;

/** What is a plan to achieve: a target at least cost, the most for a budget, or the most profit? */
public sealed interface Goal {

  /** Applies the function that belongs to the goal; the compiler demands one for each. */
  <T> T fold(Function<Target, T> target, Function<Budget, T> budget, Function<Profit, T> profit);

  /**
   * An output at least cost: min S(x) subject to f(x) ≥ output.
   *
   * @param output Q, positive
   */
  record Target(double output) implements Goal {
    /** Refuses what is not positive. */
    public Target {
      positive(output, "output");
    }

    @Override
    public <T> T fold(Function<Target, T> target, Function<Budget, T> b, Function<Profit, T> p) {
      return target.apply(this);
    }
  }

  /**
   * The most output for a budget: max f(x) subject to S(x) ≤ money.
   *
   * @param money positive
   */
  record Budget(double money) implements Goal {
    /** Refuses what is not positive. */
    public Budget {
      positive(money, "budget");
    }

    @Override
    public <T> T fold(Function<Target, T> t, Function<Budget, T> budget, Function<Profit, T> p) {
      return budget.apply(this);
    }
  }

  /**
   * The most profit: max price f(x) − S(x).
   *
   * @param price money per unit of output, positive
   */
  record Profit(double price) implements Goal {
    /** Refuses what is not positive. */
    public Profit {
      positive(price, "price of output");
    }

    @Override
    public <T> T fold(Function<Target, T> t, Function<Budget, T> b, Function<Profit, T> profit) {
      return profit.apply(this);
    }
  }

  private static void positive(double value, String what) {
    if (!(value > 0) || Double.isInfinite(value)) {
      throw new IllegalArgumentException(
          "a " + what + " of " + value + " is not a positive number");
    }
  }
}

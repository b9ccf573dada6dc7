package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.Technology;
import java.util.Optional;

/**
 * The most output for a budget B: the largest Q whose least cost C(Q) does not exceed B.
 *
 * <p>C rises with Q, so the answer solves ln C(e^u) = ln B. Newton's method in u = ln Q, with d ln
 * C/du = λ Q/C, inside a bracket; where C has no answer beyond some output (a capacity), the
 * bracket closes on that output and the budget is not used up. At the answer one more unit of money
 * yields 1/λ more output.
 *
 * <p>Source: the indirect production function, Shephard, R. W. (1970), <i>Theory of Cost and
 * Production Functions</i>, Princeton. Tested in {@code BudgetTest}.
 */
final class BudgetPursuit implements Pursuit {

  /** The budget is met to this part: ln C is a log of sums of exponentials of logs up to 30. */
  private static final double MET = 3e-14;

  /** What is left of a budget is called unused from this part of it. */
  private static final double UNUSED = 1e-9;

  /** A bracket this narrow in ln Q pins output down to the rounding of the log. */
  private static final double NARROW = 1e-15;

  /** No step is longer than a factor of e^3. */
  private static final double LONGEST = 3;

  private static final int ITERATIONS = 200;

  private final Technology technology;
  private final LeastCost leastCost;
  private final double budget;
  private final double usual;

  BudgetPursuit(Technology technology, LeastCost leastCost, double budget) {
    this.technology = technology;
    this.leastCost = leastCost;
    this.budget = budget;
    this.usual = Outputs.usual(technology);
  }

  @Override
  public Found pursue(Question question, double fixedMoney, Optional<Plan> near) {
    double money = budget - fixedMoney;
    double least = Outputs.spending(question, question.low());
    if (!(least < money)) {
      String reason =
          "the budget of "
              + Wording.number(budget)
              + " does not pay for what must be taken, which costs "
              + Wording.number(least + fixedMoney);
      return Found.none(Answer.none(Status.INFEASIBLE, reason));
    }
    double most = Outputs.spending(question, question.high());
    if (most <= money && Feasibility.monotone(technology, Outputs.logs(question.high()))) {
      return everything(question, most + fixedMoney);
    }
    return search(question, money, near);
  }

  /** All that can be had, where the budget pays for it. */
  private Found everything(Question question, double cost) {
    double output = technology.output(question.high());
    Plan plan = leastCost.plan(question.at(output));
    String reason =
        "all that can be had costs " + Wording.number(cost) + ", which the budget exceeds";
    return plan.answered()
        ? new Found(State.FOUND, plan.because(reason), output, -output)
        : Found.none(plan);
  }

  private Found search(Question question, double money, Optional<Plan> near) {
    Climb climb = new Climb(leastCost, question, near);
    if (!climb.begin(usual)) {
      return Found.none(climb.plan);
    }
    double low = Double.NEGATIVE_INFINITY;
    double high = Double.POSITIVE_INFINITY;
    Plan none = Answer.none(Status.INFEASIBLE, "");
    Plan lowPlan = none;
    Plan highPlan = none;
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      boolean answered = climb.plan.answered();
      double excess = answered ? Math.log(climb.plan.cost() / money) : Double.NaN;
      if (Math.abs(excess) <= MET) {
        return found(climb.plan, climb.u);
      }
      // Where there is no answer below an output that costs too much, the gap is on the low side.
      boolean tooLittle = answered ? excess < 0 : !lowPlan.answered() && highPlan.answered();
      if (tooLittle) {
        low = climb.u;
        lowPlan = climb.plan;
      } else {
        high = climb.u;
        highPlan = climb.plan;
      }
      if (high - low <= NARROW * Math.max(1, Math.abs(climb.u))) {
        break;
      }
      climb.at(next(climb, excess, low, high, iteration));
    }
    return ended(money, low, lowPlan, highPlan);
  }

  /** The bracket has closed on an output where cost meets the budget or answers end. */
  private static Found ended(double money, double low, Plan lowPlan, Plan highPlan) {
    if (!lowPlan.answered()) {
      return Found.none(lowPlan.reason().isEmpty() ? highPlan : lowPlan);
    }
    boolean used = lowPlan.cost() >= money * (1 - UNUSED);
    if (!used && highPlan.status() == Status.IRREGULAR) {
      return Found.none(highPlan);
    }
    Plan answer = used ? lowPlan : lowPlan.because("the budget exceeds what capacity can cost");
    return found(answer, low);
  }

  private static double next(Climb climb, double excess, double low, double high, int iteration) {
    double slope = climb.plan.marginalCost() * Math.exp(climb.u) / climb.plan.cost();
    double step = -excess / slope;
    boolean usable = Double.isFinite(step) && iteration % 4 != 3;
    double bounded = Math.max(-LONGEST, Math.min(LONGEST, step));
    double newton = climb.u + bounded;
    if (usable && newton > low && newton < high) {
      return newton;
    }
    if (high == Double.POSITIVE_INFINITY) {
      return low + LONGEST;
    }
    return low == Double.NEGATIVE_INFINITY ? high - LONGEST : 0.5 * (low + high);
  }

  private static Found found(Plan plan, double u) {
    double output = Math.exp(u);
    return new Found(State.FOUND, plan, output, -output);
  }
}

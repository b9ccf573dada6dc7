package isowright.leastcost;

import java.util.Optional;

/** How one goal is pursued where every input has a single price: the step that is repeated. */
interface Pursuit {

  /** How it went. */
  enum State {
    /** A best plan exists. */
    FOUND,
    /** No mix within the limits achieves the goal, or the technology is not regular there. */
    NO_PLAN,
    /** The goal can be pursued without end. */
    UNBOUNDED,
    /** Every output is worse than none. */
    NOTHING
  }

  /**
   * What was found.
   *
   * @param state how it went
   * @param plan the plan; where there is none, it says why
   * @param output the output of the plan; NaN where there is none
   * @param objective what is minimised: cost, or minus output, or minus profit; NaN likewise
   */
  record Found(State state, Plan plan, double output, double objective) {
    /** No plan, and why. */
    static Found none(Plan plan) {
      return new Found(State.NO_PLAN, plan, Double.NaN, Double.NaN);
    }
  }

  /**
   * Pursues the goal.
   *
   * @param question prices and limits; its target is not used
   * @param fixedMoney money due besides price times quantity
   * @param near the plan of a similar question, if at hand
   */
  Found pursue(Question question, double fixedMoney, Optional<Plan> near);

  /** The pursuit of a target at least cost. */
  static Pursuit target(LeastCost leastCost, double target) {
    return (question, fixedMoney, near) -> {
      Question asked = question.at(target);
      Plan plan = near.map(n -> leastCost.plan(asked, n)).orElseGet(() -> leastCost.plan(asked));
      return plan.answered()
          ? new Found(State.FOUND, plan, target, plan.cost() + fixedMoney)
          : Found.none(plan);
    };
  }
}

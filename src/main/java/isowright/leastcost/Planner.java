package isowright.leastcost;

import isowright.leastcost.BranchAndBound.Ended;
import isowright.leastcost.BranchAndBound.Settled;
import isowright.leastcost.PlanOutcome.State;
import isowright.leastcost.Pursuit.Found;
import isowright.technology.Technology;
import java.util.List;
import java.util.Optional;

/**
 * What plan achieves a goal best, with prices in bands, whole units, commitments and limits?
 *
 * <p>With single prices and without whole units the goal is pursued directly ({@link Minimiser} for
 * a target); otherwise by branch and bound over bands and whole units. What the plan says of itself
 * (multipliers, proof) is found from the settled question: the bands the plan lies in, whole units
 * held.
 *
 * <p>A plan is proved the best of all where the technology is regular at every mix; where it is not
 * (a translog), a stationary point at which it is regular is proved a local best, other starts are
 * tried, and the outcome says so.
 *
 * <p>Immutable, safe to share between threads. Tested in {@code WholeUnitsTest}, {@code
 * PriceBandsTest}, {@code BudgetTest}, {@code ProfitTest}.
 */
public final class Planner {

  private final Technology technology;
  private final LeastCost leastCost;

  /** The same, trying other starts where the technology is not regular throughout. */
  private final LeastCost thorough;

  private Planner(Technology technology, LeastCost leastCost, LeastCost thorough) {
    this.technology = technology;
    this.leastCost = leastCost;
    this.thorough = thorough;
  }

  /** Plans by this technology. */
  public static Planner of(Technology technology) {
    Minimiser minimiser = Minimiser.of(technology);
    return new Planner(
        technology,
        minimiser,
        technology.regularThroughout() ? minimiser : new OtherStarts(technology, minimiser));
  }

  /**
   * The best plan.
   *
   * @throws IllegalArgumentException where the task has another number of inputs
   */
  public PlanOutcome plan(PlanTask task) {
    if (task.dimension() != technology.dimension()) {
      throw new IllegalArgumentException(
          "the task has " + task.dimension() + " inputs, not those of " + technology.inputs());
    }
    Optional<Integer> crossed = task.crossed();
    if (crossed.isPresent()) {
      return none(State.INFEASIBLE, crossedWords(task, crossed.get()));
    }
    PlanOutcome outcome = task.plain() ? direct(task) : divided(task);
    return task.goal()
        .fold(
            target -> outcome,
            budget -> outcome,
            profit -> new ShutDown(technology, task, profit.price()).compared(outcome));
  }

  /**
   * The plan that a settled question has by this technology, which may differ a little from the one
   * that settled it.
   *
   * @param near the outcome by a technology nearby
   */
  public PlanOutcome again(PlanTask task, PlanOutcome near) {
    Found found =
        task.goal()
            .fold(
                target -> Optional.<Found>empty(),
                budget -> Optional.<Found>empty(),
                profit ->
                    new ProfitPursuit(technology, leastCost, profit.price())
                        .near(near.settled(), near.fixedMoney(), near.output(), near.plan()))
            .orElseGet(
                () ->
                    pursuit(task.goal(), leastCost)
                        .pursue(near.settled(), near.fixedMoney(), Optional.of(near.plan())));
    return found.state() == Pursuit.State.FOUND
        ? outcome(task, new Settled(near.settled(), near.fixedMoney(), found), near.proof())
        : none(found);
  }

  private Pursuit pursuit(Goal goal, LeastCost by) {
    return goal.fold(
        target -> Pursuit.target(by, target.output()),
        budget -> new BudgetPursuit(technology, by, budget.money()),
        profit -> new ProfitPursuit(technology, by, profit.price()));
  }

  private PlanOutcome direct(PlanTask task) {
    int n = task.dimension();
    double[] prices = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    for (int i = 0; i < n; i++) {
      prices[i] = task.schedules().get(i).price(0);
      low[i] = task.least(i);
      high[i] = task.most(i);
    }
    Question question = new Question(1, prices, low, high);
    Found found = pursuit(task.goal(), thorough).pursue(question, 0, Optional.empty());
    return found.state() == Pursuit.State.FOUND
        ? outcome(task, new Settled(question, 0, found), proof(1, 0, false))
        : none(found);
  }

  private PlanOutcome divided(PlanTask task) {
    Ended ended = new BranchAndBound(task, pursuit(task.goal(), leastCost)).search();
    if (ended.best().isEmpty()) {
      return ended.root().state() == Pursuit.State.FOUND
          ? none(State.INFEASIBLE, "no whole units within the limits achieve the goal")
          : none(ended.root());
    }
    Proof proof = proof(ended.parts(), ended.gap(), ended.doubtful());
    return outcome(task, fromOtherStarts(task, ended.best().get()), proof);
  }

  /** The settled question once more where the technology may have several stationary points. */
  private Settled fromOtherStarts(PlanTask task, Settled settled) {
    if (technology.regularThroughout()) {
      return settled;
    }
    Found other =
        pursuit(task.goal(), thorough)
            .pursue(settled.question(), settled.fixedMoney(), Optional.empty());
    boolean better =
        other.state() == Pursuit.State.FOUND && other.objective() < settled.found().objective();
    return better ? new Settled(settled.question(), settled.fixedMoney(), other) : settled;
  }

  private Proof proof(int parts, double gap, boolean doubtful) {
    if (technology.regularThroughout() && gap == 0) {
      return new Proof(true, 0, parts, "");
    }
    StringBuilder reason = new StringBuilder();
    if (!technology.regularThroughout()) {
      reason.append(
          "the technology is regular at this mix but not at every mix, so a cheaper mix far from"
              + " it cannot be ruled out; "
              + OtherStarts.words(technology));
    }
    if (doubtful) {
      reason
          .append("; some combinations of bands or whole units were left out because the")
          .append(" technology is not regular there");
    }
    if (gap > 0) {
      reason.append(reason.length() > 0 ? "; " : "");
      reason
          .append("the search was ended after ")
          .append(parts)
          .append(" parts; a plan better by ");
      reason.append(Wording.number(100 * gap)).append(" % may exist");
    }
    return new Proof(false, gap, parts, reason.toString());
  }

  private PlanOutcome outcome(PlanTask task, Settled settled, Proof proof) {
    Found found = settled.found();
    Plan plan = new TruePlan(task, settled).plan();
    double profit =
        task.goal()
            .fold(
                target -> Double.NaN,
                budget -> Double.NaN,
                price -> price.price() * found.output() - plan.cost());
    Question question = settled.question().at(found.output());
    List<Multiplier> multipliers = new Multipliers(technology, task, question, found).all();
    return new PlanOutcome(
        State.PLANNED,
        plan,
        found.output(),
        profit,
        question,
        settled.fixedMoney(),
        multipliers,
        proof);
  }

  private static PlanOutcome none(Found found) {
    State state =
        switch (found.state()) {
          case UNBOUNDED -> State.UNBOUNDED;
          case NOTHING -> State.NOTHING;
          default ->
              found.plan().status() == Plan.Status.IRREGULAR ? State.IRREGULAR : State.INFEASIBLE;
        };
    return none(state, found.plan().reason());
  }

  static PlanOutcome none(State state, String reason) {
    Plan.Status status = state == State.IRREGULAR ? Plan.Status.IRREGULAR : Plan.Status.INFEASIBLE;
    return new PlanOutcome(
        state,
        Answer.none(status, reason),
        Double.NaN,
        Double.NaN,
        Question.of(1, 1),
        0,
        List.of(),
        Proof.GLOBAL);
  }

  private String crossedWords(PlanTask task, int i) {
    return technology.inputs().get(i)
        + ": there is no "
        + (task.whole()[i] ? "whole number" : "quantity")
        + " between "
        + Wording.number(Math.max(task.low()[i], task.committed()[i]))
        + " and "
        + Wording.number(Math.min(task.high()[i], task.schedules().get(i).most()));
  }
}

package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.Multiplier.Kind;
import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The most output for a budget: duality with least cost, worked examples, limits. */
class BudgetTest {

  private static final List<String> LK = List.of("labour", "capital");

  private static PlanOutcome most(Technology technology, double budget, Question question) {
    return Planner.of(technology).plan(PlanTask.of(new Goal.Budget(budget), question));
  }

  /**
   * A printed answer that is wrong: 4 √(LK) at prices 3 and 5, budget 200, printed output 104.40;
   * it is 4 · 200/(2 √15) = 103.2796 (textbook-style question, solved again).
   */
  @Test
  void wrongPrintedAnswer() {
    Technology technology = CobbDouglas.of(LK, Math.log(4), .5, .5);
    PlanOutcome outcome = most(technology, 200, Question.of(1, 3, 5));
    assertThat(outcome.output()).isCloseTo(103.2796, within(5e-5));
    assertThat(outcome.output()).isCloseTo(4 * 200 / (2 * Math.sqrt(15)), within(1e-11));
    assertThat(outcome.plan().mix()[0]).isCloseTo(100 / 3.0, within(1e-10));
    assertThat(outcome.plan().mix()[1]).isCloseTo(20, within(1e-10));
    // One more unit of money: 4/(2 √15).
    Multiplier budget = outcome.multipliers().get(0);
    assertThat(budget.kind()).isEqualTo(Kind.BUDGET);
    assertThat(budget.value()).isCloseTo(2 / Math.sqrt(15), within(1e-12));
  }

  /** With the budget that the least cost of a target is, the most output is the target. */
  @Test
  void dualToLeastCost() {
    RandomTechnologies random = new RandomTechnologies(61);
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k);
      Question question = planted.question();
      if (k % 2 == 0) {
        int i = random.below(planted.mix().length);
        question = question.limiting(i, 0, planted.mix()[i] * random.between(.6, 1.2));
      }
      Plan plan = Minimiser.of(planted.technology()).plan(question);
      if (!plan.answered()) {
        continue;
      }
      PlanOutcome outcome = most(planted.technology(), plan.cost(), question);
      assertThat(outcome.planned()).as("%d %s", k, outcome.plan().reason()).isTrue();
      // Cost is met to 1e-14 and d ln Q/d ln C is below 10 here, logs of 30 carry 1e-15 each.
      assertThat(outcome.output() / question.target()).as("%d", k).isCloseTo(1, within(1e-11));
    }
  }

  @Test
  void budgetThatCapacityCannotUse() {
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    Question capped = Question.of(1, 1, 1).limiting(0, 0, 4).limiting(1, 0, 9);
    PlanOutcome outcome = most(technology, 100, capped);
    assertThat(outcome.output()).isCloseTo(6, within(1e-12));
    assertThat(outcome.plan().reason()).contains("all that can be had costs 13");
    Ces leontief =
        Ces.of(LK, new double[] {1, 1}, 0, new double[] {.5, .5}, Double.POSITIVE_INFINITY, 1);
    PlanOutcome limited = most(leontief, 100, Question.of(1, 1, 1).limiting(0, 0, 4));
    assertThat(limited.output()).isCloseTo(4, within(1e-9));
    assertThat(limited.plan().reason()).contains("the budget exceeds what capacity can cost");
  }

  @Test
  void budgetBelowWhatMustBeTaken() {
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    PlanOutcome outcome = most(technology, 100, Question.of(1, 1, 1).holding(0, 120));
    assertThat(outcome.state()).isEqualTo(PlanOutcome.State.INFEASIBLE);
    assertThat(outcome.plan().reason())
        .contains("budget of 100 does not pay for what must be taken, which costs 120");
  }

  /** Whole units: every pair of numbers that the budget pays for. */
  @Test
  void wholeUnitsAgainstEveryPair() {
    RandomTechnologies random = new RandomTechnologies(62);
    for (int k = 0; k < 1000; k++) {
      double share = random.between(.2, .8);
      Technology technology =
          k % 2 == 0
              ? CobbDouglas.of(LK, 0, random.between(.2, .8), random.between(.2, .8))
              : Ces.of(
                  LK,
                  new double[] {1, 1},
                  0,
                  new double[] {share, 1 - share},
                  random.between(.1, 4),
                  random.between(.6, 1.4));
      double[] prices = {random.between(1, 5), random.between(1, 5)};
      double budget = random.between(15, 90);
      PlanTask task =
          PlanTask.of(new Goal.Budget(budget), Question.of(1, prices)).inWholes(0).inWholes(1);
      PlanOutcome outcome = Planner.of(technology).plan(task);
      double best = 0;
      for (int a = 1; a * prices[0] <= budget; a++) {
        for (int b = 1; a * prices[0] + b * prices[1] <= budget; b++) {
          best = Math.max(best, technology.output(new double[] {a, b}));
        }
      }
      assertThat(outcome.output()).as("%d %s", k, outcome).isCloseTo(best, within(1e-10 * best));
      assertThat(outcome.plan().cost()).isLessThanOrEqualTo(budget * (1 + 1e-12));
    }
  }
}

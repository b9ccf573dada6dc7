package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.PlanOutcome.State;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The most profit: closed forms, capacity, increasing returns, shut-down. */
class ProfitTest {

  private static final List<String> LK = List.of("labour", "capital");

  /** λ is solved to 1e-15 in ln Q, and ln λ moves by (1/ν − 1) of that. */
  private static final double EXACT = 1e-10;

  private static PlanOutcome best(Technology technology, double price, Question question) {
    return Planner.of(technology).plan(PlanTask.of(new Goal.Profit(price), question));
  }

  /** 2 L^¼ K^¼, w 2, r 32: C = ½ Q² · 8 (MIT OpenCourseWare 14.01), so p = 8Q and profit p²/16. */
  @Test
  void decreasingReturns() {
    Technology technology = CobbDouglas.of(LK, Math.log(2), .25, .25);
    for (double price : new double[] {1, 64, 5000}) {
      PlanOutcome outcome = best(technology, price, Question.of(1, 2, 32));
      assertThat(outcome.output()).isCloseTo(price / 8, within(EXACT * price));
      assertThat(outcome.profit()).isCloseTo(price * price / 16, within(EXACT * price * price));
      assertThat(outcome.plan().marginalCost()).isCloseTo(price, within(EXACT * price));
      assertThat(outcome.proof().global()).isTrue();
    }
  }

  @Test
  void noBestOutputWhereReturnsDoNotDecrease() {
    for (double each : new double[] {.5, .6}) {
      Technology technology = CobbDouglas.of(LK, 0, each, each);
      PlanOutcome outcome = best(technology, 10, Question.of(1, 1, 1));
      assertThat(outcome.state()).isEqualTo(State.UNBOUNDED);
      assertThat(outcome.plan().reason())
          .contains("no output is best")
          .contains("returns to scale do not decrease");
    }
  }

  /** Constant returns, price above cost, both inputs capped: capacity is the best output. */
  @Test
  void capacityBinds() {
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    Question capped = Question.of(1, 1, 1).limiting(0, 0, 4).limiting(1, 0, 9);
    PlanOutcome outcome = best(technology, 10, capped);
    assertThat(outcome.output()).isCloseTo(6, within(1e-9));
    assertThat(outcome.profit()).isCloseTo(60 - 13, within(1e-8));
    assertThat(outcome.plan().reason()).contains("largest that the limits allow");
    // One more of each: p f_i − w_i = 10 · ½ Q/x_i − 1.
    assertThat(outcome.multipliers().get(0).value()).isCloseTo(10 * .5 * 6 / 4 - 1, within(1e-8));
    assertThat(outcome.multipliers().get(1).value()).isCloseTo(10 * .5 * 6 / 9 - 1, within(1e-8));
  }

  /** √(KL) with K = 80, v 3, w 12 (example 16): short-run marginal cost is 24 Q/80. */
  @Test
  void shortRunAndShutDown() {
    Technology technology = CobbDouglas.of(List.of("capital", "labour"), 0, .5, .5);
    Question held = Question.of(1, 3, 12).holding(0, 80);
    PlanOutcome outcome = best(technology, 15, held);
    assertThat(outcome.output()).isCloseTo(50, within(1e-8));
    assertThat(outcome.profit()).isCloseTo(50 * 15 - 615, within(1e-7));
    // Average variable cost is 12 Q/80 and tends to nothing: production pays at any price.
    assertThat(best(technology, .3, held).planned()).isTrue();
    PlanOutcome never = best(technology, 5, Question.of(1, 3, 12));
    assertThat(never.state()).isEqualTo(State.NOTHING);
    assertThat(never.plan().reason()).contains("to make nothing loses nothing");
  }

  /** Returns that first increase and then decrease: only the far passage is a maximum. */
  @Test
  void minimumIsNotTakenForMaximum() {
    Technology technology =
        new Translog(LK, new double[] {1, 1}, 0, new double[] {.6, .6, -.04, .005, -.04});
    Question question = Question.of(1, 1, 1);
    double price = 1.8;
    PlanOutcome outcome = best(technology, price, question);
    assertThat(outcome.planned()).as(outcome.plan().reason()).isTrue();
    assertThat(outcome.proof().global()).isFalse();
    assertThat(outcome.proof().reason()).contains("not at every mix");
    double most = Double.NEGATIVE_INFINITY;
    for (double u = -2; u < 9; u += .01) {
      Plan plan = Minimiser.of(technology).plan(question.at(Math.exp(u)));
      if (plan.answered()) {
        most = Math.max(most, price * Math.exp(u) - plan.cost());
      }
    }
    // The walk misses the best output by 5e-3 in its log at most, where profit is flat.
    assertThat(outcome.profit()).isBetween(most, most * (1 + 1e-4));
  }

  /** Whole machines: every number in turn. */
  @Test
  void wholeUnitsAgainstEveryNumber() {
    RandomTechnologies random = new RandomTechnologies(71);
    for (int k = 0; k < 40; k++) {
      double share = random.between(.3, .7);
      Technology technology =
          Ces.of(
              LK,
              new double[] {1, 1},
              1,
              new double[] {share, 1 - share},
              random.between(-.3, 2),
              random.between(.5, .85));
      Question question = Question.of(1, random.between(.5, 1), random.between(.5, 1));
      double price = random.between(.8, 1.5);
      PlanOutcome outcome =
          Planner.of(technology).plan(PlanTask.of(new Goal.Profit(price), question).inWholes(1));
      double best = 0;
      for (int count = 1; count <= 60; count++) {
        PlanOutcome held = best(technology, price, question.holding(1, count));
        best = held.planned() ? Math.max(best, held.profit()) : best;
      }
      double profit = outcome.planned() ? outcome.profit() : 0;
      if (!outcome.planned() || outcome.plan().mix(1) <= 60) {
        assertThat(profit).as("%d %s", k, outcome).isCloseTo(best, within(1e-9 * best + 1e-9));
      }
    }
  }

  /** Overtime bounds what single prices leave without bound only if returns decrease in the end. */
  @Test
  void bandsDoNotHideThatThereIsNoEnd() {
    Technology technology = CobbDouglas.of(LK, 0, .6, .6);
    PriceSchedule overtime =
        PriceSchedule.of(
            List.of(
                PriceSchedule.Band.of(10, 1), PriceSchedule.Band.of(Double.POSITIVE_INFINITY, 2)));
    PlanTask task = PlanTask.of(new Goal.Profit(10), Question.of(1, 1, 1)).banded(0, overtime);
    assertThat(Planner.of(technology).plan(task).state()).isEqualTo(State.UNBOUNDED);
    PlanOutcome whole = Planner.of(technology).plan(task.inWholes(1));
    assertThat(whole.state()).isEqualTo(State.UNBOUNDED);
  }
}

package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Whole units by branch and bound against every whole number in turn. */
class WholeUnitsTest {

  /** Both solve the same continuous questions, to some 1e-13; SAME of the search is 1e-11. */
  private static final double AGREE = 1e-10;

  /** √(LK), w 12, v 3, target 40: K 80 and L 20 are whole already. */
  @Test
  void wholeAlready() {
    Technology technology = CobbDouglas.of(List.of("capital", "labour"), 0, .5, .5);
    PlanTask task = PlanTask.of(Question.of(40, 3, 12)).inWholes(0).inWholes(1);
    PlanOutcome outcome = Planner.of(technology).plan(task);
    assertThat(outcome.planned()).isTrue();
    assertThat(outcome.plan().mix()).containsExactly(80, 20);
    assertThat(outcome.plan().cost()).isEqualTo(480);
    assertThat(outcome.proof().global()).isTrue();
  }

  /** One input in whole units: every number of it, the other free. */
  @Test
  void oneInputAgainstEveryNumber() {
    RandomTechnologies random = new RandomTechnologies(41);
    int moved = 0;
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      int n = planted.mix().length;
      int i = random.below(n);
      Technology technology = inSmallUnits(planted, random.between(.3, 12));
      double[] mix = small(planted, technology);
      Question question = priced(technology, mix, random.between(.5, 20));
      PlanOutcome outcome = Planner.of(technology).plan(PlanTask.of(question).inWholes(i));
      double best = Double.POSITIVE_INFINITY;
      for (int count = 1; count <= 60; count++) {
        Plan plan = Minimiser.of(technology).plan(question.holding(i, count));
        best = plan.answered() ? Math.min(best, plan.cost()) : best;
      }
      if (!Double.isFinite(best)) {
        continue;
      }
      moved++;
      double cost = outcome.planned() ? outcome.plan().cost() : Double.POSITIVE_INFINITY;
      // Numbers beyond 60 and zero were not tried, so the search may do better, never worse.
      assertThat(cost).as("%d %s %s", k, technology, outcome).isLessThan(best * (1 + AGREE));
      double number = outcome.plan().mix(i);
      assertThat(number).isEqualTo(Math.rint(number));
      if (number >= 1 && number <= 60) {
        assertThat(cost).isCloseTo(best, within(AGREE * best));
      }
    }
    assertThat(moved).isGreaterThan(500);
  }

  /** All inputs in whole units: every pair of numbers that yields the target. */
  @Test
  void twoInputsAgainstEveryPair() {
    RandomTechnologies random = new RandomTechnologies(42);
    for (int k = 0; k < 1500; k++) {
      Technology technology = two(random, k);
      double[] mix = {random.between(1, 25), random.between(1, 25)};
      Question question = priced(technology, mix, random.between(.5, 20));
      PlanOutcome outcome =
          Planner.of(technology).plan(PlanTask.of(question).inWholes(0).inWholes(1));
      double best = Double.POSITIVE_INFINITY;
      for (int a = 1; a <= 160; a++) {
        for (int b = 1; b <= 160; b++) {
          double cost = a * question.price(0) + b * question.price(1);
          if (cost < best
              && technology.output(new double[] {a, b}) >= question.target() * (1 - 1e-12)) {
            best = cost;
          }
        }
      }
      assertThat(outcome.planned()).as("%d %s", k, outcome).isTrue();
      double cost = outcome.plan().cost();
      assertThat(cost).isLessThan(best * (1 + AGREE));
      if (outcome.plan().mix(0) >= 1 && outcome.plan().mix(1) >= 1) {
        assertThat(cost).as("%d %s", k, outcome).isCloseTo(best, within(AGREE * best));
      }
    }
  }

  /** With easy substitution nothing of an input can be best: zero is a whole number. */
  @Test
  void noneIsAWholeNumber() {
    Ces ces = Ces.of(List.of("a", "b"), new double[] {1, 1}, 0, new double[] {.5, .5}, -.8, 1);
    PlanTask task = PlanTask.of(Question.of(3, 1, 4)).inWholes(1);
    PlanOutcome outcome = Planner.of(ces).plan(task);
    assertThat(outcome.plan().mix(1)).isZero();
    // Q = (0.5 a^0.8)^(1/0.8), so a = 3 · 0.5^(−1.25).
    assertThat(outcome.plan().cost()).isCloseTo(3 * Math.pow(.5, -1.25), within(1e-12));
    PlanOutcome essential =
        Planner.of(CobbDouglas.of(List.of("a", "b"), 0, .5, .5))
            .plan(PlanTask.of(Question.of(.01, 1, 400)).inWholes(1));
    assertThat(essential.plan().mix(1)).isEqualTo(1);
  }

  @Test
  void noWholeNumberWithinLimits() {
    Technology technology = CobbDouglas.of(List.of("a", "b"), 0, .5, .5);
    PlanTask task = PlanTask.of(Question.of(3, 1, 4).limiting(0, 2.2, 2.8)).inWholes(0);
    PlanOutcome outcome = Planner.of(technology).plan(task);
    assertThat(outcome.state()).isEqualTo(PlanOutcome.State.INFEASIBLE);
    assertThat(outcome.plan().reason()).contains("no whole number between 2.2 and 2.8");
  }

  private static Technology two(RandomTechnologies random, int k) {
    double share = random.between(.2, .8);
    List<String> names = List.of("a", "b");
    return k % 2 == 0
        ? CobbDouglas.of(names, 0, random.between(.2, .8), random.between(.2, .8))
        : Ces.of(
            names,
            new double[] {1, 1},
            0,
            new double[] {share, 1 - share},
            random.between(-.7, 4),
            random.between(.6, 1.4));
  }

  /** The same isoquants with inputs counted in units of which the mix needs a few. */
  private static Technology inSmallUnits(Planted planted, double few) {
    return Rescaled.of(planted.technology(), few);
  }

  private static double[] small(Planted planted, Technology technology) {
    double[] from = planted.technology().base();
    double[] to = technology.base();
    double[] mix = planted.mix().clone();
    for (int i = 0; i < mix.length; i++) {
      mix[i] *= to[i] / from[i];
    }
    return mix;
  }

  /** The question that a mix answers in the long run. */
  private static Question priced(Technology technology, double[] mix, double level) {
    double[] prices = technology.gradient(mix);
    double output = technology.output(mix);
    for (int i = 0; i < prices.length; i++) {
      prices[i] *= 100 * level / output;
    }
    return Question.of(output, prices);
  }
}

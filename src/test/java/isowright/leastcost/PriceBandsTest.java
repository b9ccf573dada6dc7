package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.PriceSchedule.Band;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Prices in bands against every combination of bands, and against a fine walk along isoquants. */
class PriceBandsTest {

  private static final double OPEN = Double.POSITIVE_INFINITY;

  /** Both solve the same questions with single prices, to some 1e-13. */
  private static final double AGREE = 1e-10;

  private static final List<String> LK = List.of("labour", "capital");

  /** Overtime by hand: √(LK), capital at 1; labour at 1 up to 10, beyond at 4. */
  @Test
  void overtimeByHand() {
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    PriceSchedule labour = PriceSchedule.of(List.of(Band.of(10, 1), Band.of(OPEN, 4)));
    // Up to Q = 10 labour stays in the first band: L = K = Q.
    holds(technology, labour, 8, 8, 8, 16);
    // Between, labour stays at 10: K = Q²/10, until λ f_L = K/L reaches 4: K = 40, Q = 20.
    PlanOutcome kink = holds(technology, labour, 15, 10, 22.5, 32.5);
    Multiplier edge =
        kink.multipliers().stream()
            .filter(m -> m.kind() == Multiplier.Kind.BAND)
            .findFirst()
            .orElseThrow();
    // One more hour at the price of 1 replaces K/L = 2.25 units of capital.
    assertThat(edge.value()).isCloseTo(1.25, within(1e-9));
    // Beyond: L = Q/2, K = 2Q; spending 10 + 4 (L − 10) + K.
    holds(technology, labour, 30, 15, 60, 10 + 20 + 60);
  }

  /** A demand charge by hand: the step is avoided until substitution costs more. */
  @Test
  void demandChargeByHand() {
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    PriceSchedule labour = PriceSchedule.of(List.of(Band.of(10, 1), new Band(OPEN, 1, 5, false)));
    // Within: L 10, K Q²/10: 10 + Q²/10. Beyond: 2Q + 5. Equal where Q² − 20Q + 50 = 0: 17.07.
    holds(technology, labour, 17, 10, 28.9, 38.9);
    holds(technology, labour, 17.2, 17.2, 17.2, 39.4);
  }

  /** An all-units discount by hand: more is bought than needed at the higher price. */
  @Test
  void allUnitsDiscountByHand() {
    PriceSchedule schedule = PriceSchedule.of(List.of(Band.of(10, 2), new Band(OPEN, 1, 0, true)));
    assertThat(schedule.spending(8)).isEqualTo(16);
    assertThat(schedule.spending(10)).isEqualTo(10);
    assertThat(schedule.spending(12)).isEqualTo(12);
    assertThat(schedule.convex()).isFalse();
    Technology technology = CobbDouglas.of(LK, 0, .5, .5);
    // At 2 and 1: L = Q/√2. With L = 10 at 1: 10 + Q²/10. For Q = 9: 25.46 against 18.1.
    holds(technology, schedule, 9, 10, 8.1, 18.1);
  }

  private static PlanOutcome holds(
      Technology technology, PriceSchedule labour, double target, double l, double k, double cost) {
    PlanTask task = PlanTask.of(Question.of(target, 1, 1)).banded(0, labour);
    PlanOutcome outcome = Planner.of(technology).plan(task);
    assertThat(outcome.proof().global()).isTrue();
    assertThat(outcome.plan().mix(0)).isCloseTo(l, within(1e-9));
    assertThat(outcome.plan().mix(1)).isCloseTo(k, within(1e-9));
    assertThat(outcome.plan().cost()).isCloseTo(cost, within(1e-9));
    assertThat(task.spending(outcome.plan().mix())).isCloseTo(cost, within(1e-9));
    return outcome;
  }

  @Test
  void againstEveryCombinationOfBands() {
    RandomTechnologies random = new RandomTechnologies(51);
    int divided = 0;
    for (int k = 0; k < 2000; k++) {
      Case drawn = drawn(random, k);
      PlanOutcome outcome = Planner.of(drawn.technology).plan(drawn.task);
      double best = everyCombination(drawn.technology, drawn.task);
      assertThat(outcome.planned()).as("%d %s", k, outcome).isTrue();
      assertThat(outcome.plan().cost())
          .as("%d %s", k, outcome)
          .isCloseTo(best, within(AGREE * best));
      assertThat(drawn.task.spending(outcome.plan().mix()))
          .isCloseTo(outcome.plan().cost(), within(AGREE * best));
      divided += outcome.proof().parts() > 1 ? 1 : 0;
    }
    assertThat(divided).isGreaterThan(200);
  }

  /** Independent of the solver: labour walked along the isoquant, capital from the closed form. */
  @Test
  void nothingCheaperOnTheIsoquant() {
    RandomTechnologies random = new RandomTechnologies(52);
    for (int k = 0; k < 1000; k++) {
      double b = random.between(.2, .8);
      double c = random.between(.2, .8);
      Technology technology = CobbDouglas.of(LK, 0, b, c);
      double target = random.between(2, 20);
      PlanTask task = PlanTask.of(Question.of(target, 1, random.between(.3, 3)));
      task = task.banded(0, schedule(random, random.between(1, 30)));
      PlanOutcome outcome = Planner.of(technology).plan(task);
      double least = Double.POSITIVE_INFINITY;
      for (double z = -4; z < 7; z += .0005) {
        double labour = Math.exp(z);
        double capital = Math.pow(target / Math.pow(labour, b), 1 / c);
        least = Math.min(least, task.spending(new double[] {labour, capital}));
      }
      // The walk misses an end of a band by a step of 5e-4 at most; capital moves b/c as far.
      double missed = .0005 * Math.max(1, b / c);
      assertThat(outcome.plan().cost()).isBetween(least * (1 - missed), least * (1 + AGREE));
    }
  }

  /** Bands, a whole input and a commitment together, against enumeration. */
  @Test
  void bandsAndWholeUnitsTogether() {
    RandomTechnologies random = new RandomTechnologies(53);
    for (int k = 0; k < 1000; k++) {
      Case drawn = drawn(random, 2 * k);
      int whole = drawn.technology.dimension() - 1;
      PlanTask task = drawn.task.inWholes(whole);
      if (k % 2 == 0) {
        task = task.committing(whole, random.between(0, 6));
      }
      PlanOutcome outcome = Planner.of(drawn.technology).plan(task);
      double best = Double.POSITIVE_INFINITY;
      for (int count = 1; count <= 120; count++) {
        double least = Math.max(task.low()[whole], task.committed()[whole]);
        if (count >= least) {
          PlanTask held = drawn.task.limiting(whole, count, count);
          best = Math.min(best, everyCombination(drawn.technology, held));
        }
      }
      double cost = outcome.plan().cost();
      assertThat(cost).as("%d %s", k, outcome).isLessThan(best * (1 + AGREE));
      if (outcome.plan().mix(whole) > 0 && outcome.plan().mix(whole) <= 120) {
        assertThat(cost).isCloseTo(best, within(AGREE * best));
      }
    }
  }

  @Test
  void bandsOutOfOrderAreRefused() {
    assertThatThrownBy(() -> PriceSchedule.of(List.of(Band.of(10, 1), Band.of(9, 2))))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("ends must rise");
    assertThatThrownBy(() -> PriceSchedule.of(List.of(Band.of(10, -1))))
        .isInstanceOf(IllegalArgumentException.class);
  }

  private record Case(Technology technology, PlanTask task) {}

  private static Case drawn(RandomTechnologies random, int k) {
    int n = 2 + k % 2;
    double[] shares = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      shares[i] = random.between(.2, 1);
      sum += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= sum;
    }
    List<String> names = List.of("a", "b", "c").subList(0, n);
    double[] ones = new double[n];
    java.util.Arrays.fill(ones, 1);
    Technology technology =
        k % 3 == 0
            ? CobbDouglas.of(names, 0, shares)
            : Ces.of(names, ones, 0, shares, random.between(-.6, 3), random.between(.7, 1.3));
    double[] prices = new double[n];
    for (int i = 0; i < n; i++) {
      prices[i] = random.between(.5, 3);
    }
    double target = random.between(2, 20);
    PlanTask task = PlanTask.of(Question.of(target, prices));
    for (int i = 0; i < n; i++) {
      if (random.below(3) > 0) {
        task = task.banded(i, schedule(random, random.between(1, 30)));
      }
    }
    return new Case(technology, task);
  }

  /** Up to four bands: rising, falling, with steps, for all units. */
  private static PriceSchedule schedule(RandomTechnologies random, double width) {
    List<Band> bands = new ArrayList<>();
    int size = 2 + random.below(3);
    double end = 0;
    double price = random.between(.5, 3);
    int manner = random.below(4);
    for (int k = 0; k < size; k++) {
      end += width * random.between(.2, 1);
      double to = k == size - 1 ? OPEN : end;
      double step = manner == 2 && k > 0 ? random.between(0, 4) : 0;
      bands.add(new Band(to, price, step, manner == 3 && k > 0));
      price *= manner == 0 ? random.between(1, 1.6) : random.between(.6, 1.1);
    }
    return PriceSchedule.of(bands);
  }

  private static double everyCombination(Technology technology, PlanTask task) {
    int n = task.dimension();
    int combinations = 1;
    for (PriceSchedule schedule : task.schedules()) {
      combinations *= schedule.size();
    }
    double best = Double.POSITIVE_INFINITY;
    for (int c = 0; c < combinations; c++) {
      double[] prices = new double[n];
      double[] low = new double[n];
      double[] high = new double[n];
      double fixed = 0;
      boolean room = true;
      int rest = c;
      for (int i = 0; i < n; i++) {
        PriceSchedule schedule = task.schedules().get(i);
        int band = rest % schedule.size();
        rest /= schedule.size();
        prices[i] = schedule.price(band);
        low[i] = Math.max(task.low()[i], schedule.start(band));
        high[i] = Math.min(task.high()[i], schedule.end(band));
        fixed += schedule.intercept(band);
        room &= low[i] <= high[i];
      }
      if (!room) {
        continue;
      }
      double target = ((Goal.Target) task.goal()).output();
      Plan plan = Minimiser.of(technology).plan(new Question(target, prices, low, high));
      best = plan.answered() ? Math.min(best, plan.cost() + fixed) : best;
    }
    return best;
  }
}

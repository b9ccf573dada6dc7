package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.Plan.Status;
import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Held inputs and limits: conditions with signs, feasibility, what limits are worth. */
class LimitsTest {

  private static final List<String> LK = List.of("labour", "capital");

  /** Rounding of logs of the size of 10, and of the sums in gradients. */
  private static final double ROUNDING = 1e-10;

  private static Question limitedAtRandom(RandomTechnologies random, Planted planted) {
    Question question = planted.question();
    for (int i = 0; i < question.dimension(); i++) {
      double x = planted.mix()[i];
      question =
          switch (random.below(5)) {
            case 0 -> question.limiting(i, 0, x * random.between(.7, 1.4));
            case 1 -> question.limiting(i, x * random.between(.7, 1.4), Double.POSITIVE_INFINITY);
            case 2 -> question.limiting(i, x * random.between(.6, 1), x * random.between(1, 1.5));
            case 3 -> question.holding(i, x * random.between(.8, 1.25));
            default -> question;
          };
    }
    return question;
  }

  @Test
  void everyAnswerMeetsTheConditionsWithTheirSigns() {
    RandomTechnologies random = new RandomTechnologies(21);
    int corners = 0;
    int infeasible = 0;
    for (int k = 0; k < 3000; k++) {
      Planted planted = random.any(k);
      Question question = limitedAtRandom(random, planted);
      Plan plan = Minimiser.of(planted.technology()).plan(question);
      if (plan.status() == Status.INFEASIBLE) {
        infeasible++;
        assertThat(largestOutput(planted.technology(), question)).isLessThan(question.target());
        assertThat(plan.reason()).contains("out of reach");
      } else if (plan.answered()) {
        corners += plan.status() == Status.CORNER ? 1 : 0;
        conditions(planted.technology(), question, plan);
      } else {
        // Only a form that is searched may leave the region where it is regular to double
        // precision.
        assertThat(planted.technology().conditionalDemand()).as(plan.reason()).isEmpty();
        assertThat(plan.reason()).isNotEmpty();
      }
    }
    assertThat(corners).isGreaterThan(1000);
    assertThat(infeasible).isGreaterThan(100);
  }

  /** The largest output within limits, unlimited inputs being a million times the base. */
  private static double largestOutput(Technology technology, Question question) {
    double[] most = question.high();
    for (int i = 0; i < most.length; i++) {
      most[i] = Math.min(most[i], 1e6 * technology.base()[i]);
    }
    return technology.output(most);
  }

  private static void conditions(Technology technology, Question question, Plan plan) {
    double[] mix = plan.mix();
    double[] marginal = technology.gradient(mix);
    double lambda = plan.marginalCost();
    double output = technology.output(mix);
    assertThat(output).isGreaterThan(question.target() * (1 - ROUNDING));
    assertThat(lambda * (output - question.target()))
        .isLessThanOrEqualTo(ROUNDING * lambda * output);
    double cost = 0;
    for (int i = 0; i < mix.length; i++) {
      double price = question.price(i);
      cost += price * mix[i];
      // At λ = 0 nothing is worth anything, marginal products of inputs not used (infinite)
      // included.
      double worth = (lambda == 0 ? 0 : lambda * marginal[i]) - price;
      if (question.held(i)) {
        assertThat(mix[i]).isEqualTo(question.low(i));
      } else if (mix[i] == question.high(i)) {
        assertThat(worth).isGreaterThan(-ROUNDING * price);
      } else if (mix[i] == question.low(i)) {
        assertThat(worth).isLessThan(ROUNDING * price);
      } else {
        assertThat(mix[i]).isBetween(question.low(i), question.high(i));
        assertThat(worth).isCloseTo(0, within(ROUNDING * price));
      }
    }
    assertThat(plan.cost()).isCloseTo(cost, within(1e-14 * cost));
    assertThat(plan.optimality()).isLessThan(ROUNDING);
  }

  /** Whatever else reaches the target within the limits costs no less. */
  @Test
  void noOtherMixIsCheaper() {
    RandomTechnologies random = new RandomTechnologies(22);
    int compared = 0;
    for (int k = 0; k < 1200; k++) {
      Planted planted = random.any(k % 2);
      Question question = limitedAtRandom(random, planted);
      Plan plan = Minimiser.of(planted.technology()).plan(question);
      for (int draw = 0; draw < 30 && plan.answered(); draw++) {
        double[] mix = plan.mix();
        for (int i = 0; i < mix.length; i++) {
          double moved = mix[i] * Math.exp(random.between(-.3, .3));
          mix[i] = Math.min(Math.max(moved, question.low(i)), question.high(i));
        }
        if (planted.technology().output(mix) >= question.target()) {
          compared++;
          double cost = 0;
          for (int i = 0; i < mix.length; i++) {
            cost += question.price(i) * mix[i];
          }
          assertThat(cost).isGreaterThanOrEqualTo(plan.cost() * (1 - 1e-12));
        }
      }
    }
    assertThat(compared).isGreaterThan(5000);
  }

  @Test
  void limitValuesAreWhatAMovedLimitSaves() {
    RandomTechnologies random = new RandomTechnologies(23);
    int compared = 0;
    for (int k = 0; k < 1500; k++) {
      Planted planted = random.any(k);
      Question question = limitedAtRandom(random, planted);
      Minimiser minimiser = Minimiser.of(planted.technology());
      Plan plan = minimiser.plan(question);
      if (!plan.answered()) {
        continue;
      }
      for (int i = 0; i < question.dimension(); i++) {
        double value = plan.limitValues()[i];
        if (Math.abs(value) < 1e-3 * question.price(i)) {
          continue;
        }
        double step = 1e-5 * plan.mix(i);
        double more = minimiser.cost(moved(question, i, plan.mix(i), step));
        double less = minimiser.cost(moved(question, i, plan.mix(i), -step));
        double size = Math.abs(value) + question.price(i);
        // A central difference, step 1e-5: rounding 1e-14/1e-5 of the cost, and truncation 1e-10
        // times the third derivative (up to 1/σ² = 1e4); a kink where another limit begins to bind
        // is met now and then, and is seen by one side being off.
        double slope = (less - more) / (2 * step);
        double tolerance = 1e-4 * size + 1e-13 * plan.cost() / step;
        boolean smooth =
            Math.abs((less - plan.cost()) / step - (plan.cost() - more) / step) < 1e-2 * size;
        if (smooth) {
          compared++;
          assertThat(slope)
              .as("%d, input %d: %s", k, i, planted)
              .isCloseTo(value, within(tolerance));
        }
      }
    }
    assertThat(compared).isGreaterThan(800);
  }

  private static Question moved(Question question, int i, double quantity, double step) {
    double low = question.low(i) == quantity ? quantity + step : question.low(i);
    double high = question.high(i) == quantity ? quantity + step : question.high(i);
    return question.limiting(i, low, high);
  }

  @Test
  void limitsThatDoNotBindChangeNothing() {
    RandomTechnologies random = new RandomTechnologies(24);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      Question question = planted.question();
      for (int i = 0; i < question.dimension(); i++) {
        question = question.limiting(i, planted.mix()[i] * .9, planted.mix()[i] * 1.1);
      }
      Plan limited = Minimiser.of(planted.technology()).plan(question);
      assertThat(limited.status()).isEqualTo(Status.SOLVED);
      double cost = planted.plan().cost();
      assertThat(limited.cost()).isCloseTo(cost, within(1e-12 * cost));
      assertThat(limited.reason()).isEmpty();
    }
  }

  @Test
  void largestFeasibleTargetAndItsLimitsAreNamed() {
    CobbDouglas technology = CobbDouglas.of(LK, 0, .5, .5);
    Question question = Question.of(40, 3, 12).holding(0, 50).limiting(1, 0, 10);
    Plan plan = Minimiser.of(technology).plan(question);
    assertThat(plan.status()).isEqualTo(Status.INFEASIBLE);
    assertThat(plan.reason())
        .isEqualTo(
            "the target 40 is out of reach: with labour held at 50 and capital at most 10 "
                + "output is at most 22.3607");
    assertThat(plan.mix()).isEmpty();
    assertThat(plan.cost()).isNaN();
  }

  /** With σ < 1 a held input bounds output however much is taken of the others. */
  @Test
  void heldInputBoundsOutputUnderPoorSubstitution() {
    Ces technology = Ces.of(LK, new double[] {1, 1}, 0, new double[] {.5, .5}, 1, 1);
    Plan plan = Minimiser.of(technology).plan(Question.of(30, 1, 1).holding(1, 10));
    assertThat(plan.status()).isEqualTo(Status.INFEASIBLE);
    // (½/L + ½/10)⁻¹ tends to 20.
    assertThat(plan.reason()).contains("with capital held at 10 output stays below 20");
    assertThat(Minimiser.of(technology).plan(Question.of(19, 1, 1).holding(1, 10)).answered())
        .isTrue();
  }

  @Test
  void allInputsHeld() {
    CobbDouglas technology = CobbDouglas.of(LK, 0, .5, .5);
    Minimiser minimiser = Minimiser.of(technology);
    Question held = Question.of(40, 3, 12).holding(0, 80).holding(1, 20);
    Plan exact = minimiser.plan(held);
    assertThat(exact.cost()).isEqualTo(480);
    assertThat(exact.marginalCost()).isInfinite();
    assertThat(exact.limitValues()).containsExactly(-3, -12);
    Plan ample = minimiser.plan(held.at(30));
    assertThat(ample.cost()).isEqualTo(480);
    assertThat(ample.marginalCost()).isZero();
    assertThat(ample.reason()).contains("already yields 40");
    assertThat(minimiser.plan(held.at(41)).status()).isEqualTo(Status.INFEASIBLE);
  }

  @Test
  void linearTechnologyFillsTheCheapestFirst() {
    Ces technology = Ces.of(LK, new double[] {1, 1}, Math.log(2), new double[] {.5, .5}, -1, 1);
    Minimiser minimiser = Minimiser.of(technology);
    Plan both = minimiser.plan(Question.of(100, 3, 5).limiting(0, 0, 60));
    assertThat(both.mix()).containsExactly(new double[] {60, 40}, within(1e-12));
    assertThat(both.marginalCost()).isCloseTo(5, within(1e-12));
    assertThat(both.limitValues()[0]).isCloseTo(2, within(1e-12));
    assertThat(both.optimality()).isLessThan(1e-12);
    Plan full = minimiser.plan(Question.of(100, 3, 5).limiting(0, 0, 60).limiting(1, 0, 40));
    assertThat(full.marginalCost()).isInfinite();
    Plan beyond = minimiser.plan(Question.of(100, 3, 5).limiting(0, 0, 60).limiting(1, 0, 30));
    assertThat(beyond.status()).isEqualTo(Status.INFEASIBLE);
    assertThat(beyond.reason()).contains("output is at most 90");
  }

  @Test
  void fixedProportionsLeaveHeldExcessIdle() {
    double[] base = {1 / 4.0, 1 / 7.0};
    double[] even = {.5, .5};
    Minimiser minimiser = Minimiser.of(Ces.of(LK, base, 0, even, Double.POSITIVE_INFINITY, 1));
    Plan idle = minimiser.plan(Question.of(100, 3, 5).holding(1, 20));
    assertThat(idle.cost()).isCloseTo(175, within(1e-10));
    assertThat(idle.marginalCost()).isCloseTo(.75, within(1e-12));
    assertThat(idle.limitValues()[1]).isEqualTo(-5);
    assertThat(idle.reason()).isEqualTo("capital is held at 20, part of it idle");
    assertThat(idle.optimality()).isLessThan(1e-12);
    Plan beyond = minimiser.plan(Question.of(100, 3, 5).limiting(1, 0, 10));
    assertThat(beyond.status()).isEqualTo(Status.INFEASIBLE);
    assertThat(beyond.reason()).contains("with capital at most 10 output is at most 70");
    Plan full = minimiser.plan(Question.of(70, 3, 5).limiting(1, 0, 10));
    assertThat(full.marginalCost()).isInfinite();
  }

  @Test
  void irregularTechnologiesSayWhatIsIrregular() {
    Translog saddle = new Translog(LK, new double[] {1, 1}, 0, new double[] {.5, .5, .6, -.6, .6});
    Plan curved = Minimiser.of(saddle).plan(Question.of(2, 1, 1));
    assertThat(curved.status()).isEqualTo(Status.IRREGULAR);
    assertThat(curved.reason()).contains("convex to the origin");
    CobbDouglas falling = CobbDouglas.of(LK, 0, .9, -.1);
    Plan negative = Minimiser.of(falling).plan(Question.of(2, 1, 1));
    assertThat(negative.status()).isEqualTo(Status.IRREGULAR);
    assertThat(negative.reason()).contains("more of capital ceases to add output");
    assertThat(negative.mix()).isEmpty();
    // ln Q = ln L + ln K − ½ ln²L: labour stops adding output at L = e.
    Translog humped = new Translog(LK, new double[] {1, 1}, 0, new double[] {1, 1, -1, 0, 0});
    Plan stopped = Minimiser.of(humped).plan(Question.of(10, 1, 1).holding(1, 1));
    assertThat(stopped.status()).isEqualTo(Status.IRREGULAR);
    assertThat(stopped.reason()).contains("more of labour ceases to add output");
  }

  /** A filing's translog in raw units is often regular only far from its base of ones. */
  @Test
  void regularRegionFarFromTheBaseIsFound() {
    // The unscaled fit to 27 states, primary metals, 1957; Greene, Econometric Analysis, 5th ed.,
    // Example 6.2: labour's and capital's elasticities at the base of ones are 3.6 and −1.9.
    double[] coefficients = {3.613639, -1.893113, -.964052, .312387, .085295};
    Translog metals = new Translog(LK, new double[] {1, 1}, .944197, coefficients);
    Plan plan = Minimiser.of(metals).plan(Question.of(1000, 1, .5));
    assertThat(plan.status()).as(plan.reason()).isEqualTo(Status.SOLVED);
    conditions(metals, Question.of(1000, 1, .5), plan);
  }

  /** A path from a regular point and a start near by lead to one answer. */
  @Test
  void nearPlansChangeNoAnswer() {
    RandomTechnologies random = new RandomTechnologies(25);
    for (int k = 0; k < 300; k++) {
      Planted planted = random.translog();
      Minimiser minimiser = Minimiser.of(planted.technology());
      Plan cold = minimiser.plan(planted.question());
      double[] prices = planted.question().prices();
      Arrays.setAll(prices, i -> prices[i] * (1 + .1 * i));
      Plan near = minimiser.plan(planted.question().at(prices));
      Plan warm = minimiser.plan(planted.question(), near);
      assertThat(warm.cost()).isCloseTo(cold.cost(), within(1e-11 * cold.cost()));
      SmoothPlans plans = new SmoothPlans(planted.technology(), null);
      Plan far = Answer.none(Status.IRREGULAR, "none");
      Plan without = plans.plan(planted.question(), Optional.of(far));
      assertThat(without.cost()).isCloseTo(cold.cost(), within(1e-11 * cold.cost()));
    }
  }
}

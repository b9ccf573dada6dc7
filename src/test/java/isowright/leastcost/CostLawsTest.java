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
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/** What theory demands of every cost function, on thousands of drawn technologies. */
class CostLawsTest {

  /**
   * Planted mixes are met to the rounding of logs of the size of 10, 1e-15 each, times the
   * substitution (up to 33 here) and, for a translog, the inverse of its curvature.
   */
  private static final double MET = 1e-11;

  /**
   * Step of five-point derivatives in logs. Truncation is h⁴ times a fifth derivative of up to σ⁴ =
   * 33⁴: 1e-16 · 1e6/30 = 3e-12; rounding 1e-14/h = 1e-10 in a mix found by iteration.
   */
  private static final double STEP = 1e-4;

  private static final double DERIVATIVE = 1e-7;

  private static double slope(DoubleUnaryOperator f) {
    return (8 * (f.applyAsDouble(STEP) - f.applyAsDouble(-STEP))
            - (f.applyAsDouble(2 * STEP) - f.applyAsDouble(-2 * STEP)))
        / (12 * STEP);
  }

  private static Question dearer(Question question, int i, double log) {
    double[] prices = question.prices();
    prices[i] *= Math.exp(log);
    return question.at(prices);
  }

  @Test
  void plantedMixesAreFound() {
    RandomTechnologies random = new RandomTechnologies(1);
    for (int k = 0; k < 3000; k++) {
      Planted planted = random.any(k);
      Plan plan = planted.plan();
      assertThat(plan.status()).as("%d: %s %s", k, planted, plan).isEqualTo(Status.SOLVED);
      for (int i = 0; i < planted.mix().length; i++) {
        double x = planted.mix()[i];
        assertThat(plan.mix(i)).as("%d: %s", k, planted).isCloseTo(x, within(MET * x));
      }
      assertThat(plan.optimality()).isLessThan(1e-10);
      // Prices were made 100 · level/Q times marginal products, so λ is that factor.
      double factor = planted.question().price(0) / planted.technology().gradient(planted.mix())[0];
      assertThat(plan.marginalCost()).isCloseTo(factor, within(MET * factor));
    }
  }

  @Test
  void sharesAreDerivativesOfCostInPrices() {
    RandomTechnologies random = new RandomTechnologies(2);
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k);
      Minimiser minimiser = Minimiser.of(planted.technology());
      Question question = planted.question();
      double[] shares = minimiser.plan(question).shares();
      for (int i = 0; i < shares.length; i++) {
        int input = i;
        double derivative = slope(h -> Math.log(minimiser.cost(dearer(question, input, h))));
        assertThat(derivative).as("%d: %s", k, planted).isCloseTo(shares[i], within(DERIVATIVE));
      }
    }
  }

  @Test
  void marginalCostIsTheDerivativeOfCostInOutputAndCostRises() {
    RandomTechnologies random = new RandomTechnologies(3);
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k);
      Minimiser minimiser = Minimiser.of(planted.technology());
      Question question = planted.question();
      Plan plan = minimiser.plan(question);
      double elasticity =
          slope(h -> Math.log(minimiser.cost(question.at(question.target() * Math.exp(h)))));
      double stated = plan.marginalCost() * question.target() / plan.cost();
      assertThat(elasticity).as("%d: %s", k, planted).isCloseTo(stated, within(DERIVATIVE));
      assertThat(minimiser.cost(question.at(question.target() * 1.01))).isGreaterThan(plan.cost());
    }
  }

  @Test
  void costIsHomogeneousOfDegreeOneInPrices() {
    RandomTechnologies random = new RandomTechnologies(4);
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k);
      Minimiser minimiser = Minimiser.of(planted.technology());
      double factor = Math.exp(random.between(-10, 10));
      double[] prices = planted.question().prices();
      Arrays.setAll(prices, i -> prices[i] * factor);
      Plan before = minimiser.plan(planted.question());
      Plan after = minimiser.plan(planted.question().at(prices));
      double cost = before.cost() * factor;
      assertThat(after.cost()).isCloseTo(cost, within(MET * cost));
      for (int i = 0; i < prices.length; i++) {
        assertThat(after.mix(i)).isCloseTo(before.mix(i), within(MET * before.mix(i)));
      }
    }
  }

  @Test
  void demandIsSymmetricAndFallsInItsOwnPrice() {
    RandomTechnologies random = new RandomTechnologies(5);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      Minimiser minimiser = Minimiser.of(planted.technology());
      Question question = planted.question();
      Plan plan = minimiser.plan(question);
      int n = question.dimension();
      // In logs: s_i ∂ln x_i/∂ln w_j = s_j ∂ln x_j/∂ln w_i.
      double[][] response = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          int input = i;
          int price = j;
          response[i][j] =
              plan.shares()[i]
                  * slope(h -> Math.log(minimiser.mix(dearer(question, price, h))[input]));
        }
      }
      for (int i = 0; i < n; i++) {
        assertThat(response[i][i]).isNegative();
        for (int j = 0; j < i; j++) {
          assertThat(response[i][j])
              .as("%d: %s", k, planted)
              .isCloseTo(response[j][i], within(10 * DERIVATIVE));
        }
      }
    }
  }

  @Test
  void shortRunCostsNoLessAndTouchesTheLongRun() {
    RandomTechnologies random = new RandomTechnologies(6);
    int compared = 0;
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k);
      Minimiser minimiser = Minimiser.of(planted.technology());
      Question question = planted.question();
      Plan longRun = minimiser.plan(question);
      int held = random.below(question.dimension());
      Plan tangent = minimiser.plan(question.holding(held, longRun.mix(held)));
      assertThat(tangent.cost()).isCloseTo(longRun.cost(), within(MET * longRun.cost()));
      double marginal = longRun.marginalCost();
      // Where σ is small a mix off by rounding moves marginal cost by 1/σ times as much.
      assertThat(tangent.marginalCost()).isCloseTo(marginal, within(1e-8 * marginal));
      assertThat(tangent.limitValues()[held]).isCloseTo(0, within(1e-8 * question.price(held)));
      Plan away =
          minimiser.plan(question.holding(held, longRun.mix(held) * random.between(.8, 1.25)));
      if (away.answered()) {
        compared++;
        assertThat(away.cost()).isGreaterThanOrEqualTo(longRun.cost() * (1 - 1e-12));
        assertThat(away.optimality()).isLessThan(1e-10);
      }
    }
    assertThat(compared).isGreaterThan(700);
  }

  /** Le Chatelier: what is held makes demand less elastic and marginal cost steeper. */
  @Test
  void demandAnswersLessWhenAnotherInputIsHeld() {
    RandomTechnologies random = new RandomTechnologies(7);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      if (planted.mix().length < 3) {
        continue;
      }
      Minimiser minimiser = Minimiser.of(planted.technology());
      Question question = planted.question();
      Question held = question.holding(2, planted.mix()[2]);
      double longRun = slope(h -> Math.log(minimiser.mix(dearer(question, 0, h))[0]));
      double shortRun = slope(h -> Math.log(minimiser.mix(dearer(held, 0, h))[0]));
      assertThat(shortRun).isNegative();
      assertThat(-shortRun).as("%d: %s", k, planted).isLessThan(-longRun + 10 * DERIVATIVE);
      double target = question.target();
      double steep = slope(h -> minimiser.marginalCost(held.at(target * Math.exp(h))));
      double flat = slope(h -> minimiser.marginalCost(question.at(target * Math.exp(h))));
      double size = minimiser.marginalCost(question);
      assertThat(steep).isGreaterThan(flat - 1e-5 * size);
    }
  }

  @Test
  void unitsOfInputsChangeNoCost() {
    RandomTechnologies random = new RandomTechnologies(8);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      double[] unit = new double[planted.mix().length];
      double[] base = planted.technology().base();
      double[] prices = planted.question().prices();
      for (int i = 0; i < unit.length; i++) {
        unit[i] = Math.exp(random.between(-7, 7));
        base[i] *= unit[i];
        prices[i] /= unit[i];
      }
      Technology rescaled = RandomTechnologies.withBase(planted.technology(), base);
      Plan before = planted.plan();
      Plan after = Minimiser.of(rescaled).plan(planted.question().at(prices));
      assertThat(after.cost()).isCloseTo(before.cost(), within(MET * before.cost()));
      for (int i = 0; i < unit.length; i++) {
        double expected = before.mix(i) * unit[i];
        assertThat(after.mix(i)).isCloseTo(expected, within(MET * expected));
      }
    }
  }

  @Test
  void translogWithoutSecondOrderIsCobbDouglas() {
    RandomTechnologies random = new RandomTechnologies(9);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.cobbDouglas();
      double[] all = planted.technology().parameters();
      int n = planted.mix().length;
      double[] coefficients = Arrays.copyOfRange(all, 1, 1 + n + n * (n + 1) / 2);
      Translog translog =
          new Translog(
              planted.technology().inputs(), planted.technology().base(), all[0], coefficients);
      Plan searched = Minimiser.of(translog).plan(planted.question());
      Plan written = planted.plan();
      assertThat(searched.cost()).isCloseTo(written.cost(), within(MET * written.cost()));
      for (int i = 0; i < n; i++) {
        assertThat(searched.mix(i)).isCloseTo(written.mix(i), within(MET * written.mix(i)));
      }
    }
  }

  @Test
  void constantElasticityApproachesCobbDouglas() {
    RandomTechnologies random = new RandomTechnologies(10);
    for (int k = 0; k < 300; k++) {
      Planted planted = random.ces(k % 2 == 0 ? 1e-9 : -1e-9);
      Ces ces = (Ces) planted.technology();
      double[] coefficients = ces.shares();
      Arrays.setAll(coefficients, i -> coefficients[i] * ces.scale());
      CobbDouglas limit = new CobbDouglas(ces.inputs(), ces.base(), ces.constant(), coefficients);
      double cost = Minimiser.of(limit).cost(planted.question());
      // ln C differs by ρ/2 times the variance of the log mix, at most 1e-9 · 1.5².
      assertThat(planted.plan().cost()).isCloseTo(cost, within(5e-9 * cost));
    }
  }

  /** The closed form against the general search, which is told nothing of the form. */
  @Test
  void searchFindsWhatIsWrittenDown() {
    RandomTechnologies random = new RandomTechnologies(11);
    for (int k = 0; k < 1000; k++) {
      Planted planted = random.any(k % 2 == 0 ? 0 : 1);
      Question question = planted.question();
      int i = random.below(question.dimension());
      Question limited =
          switch (k % 4) {
            case 0 -> question.holding(i, planted.mix()[i] * random.between(.9, 1.2));
            case 1 -> question.limiting(i, 0, planted.mix()[i] * random.between(.9, 1.2));
            default -> question;
          };
      Plan written = Minimiser.of(planted.technology()).plan(limited);
      Plan searched = new SmoothPlans(planted.technology(), null).plan(limited, Optional.empty());
      if (!written.answered()) {
        assertThat(searched.answered()).isFalse();
        continue;
      }
      assertThat(searched.status()).as("%d: %s", k, planted).isEqualTo(written.status());
      assertThat(searched.cost()).isCloseTo(written.cost(), within(1e-10 * written.cost()));
    }
  }
}

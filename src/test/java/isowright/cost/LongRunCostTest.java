package isowright.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.TranslogCost.Term;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** From short to long run: a worked example, and the envelope theorem on random functions. */
class LongRunCostTest {

  private static final int[] CAPITAL = {2};

  /** Q = K^½ L^½ with labour at w: V = w Q²/K. */
  private static TranslogCost worked() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("labour"), List.of("q"), List.of("capital"), false);
    List<Term> terms = CostForm.COBB_DOUGLAS.terms(arguments);
    return new TranslogCost("cobb-douglas-cost", arguments, terms, new double[] {0, 1, 2, -1});
  }

  private static double[] at(double wage, double output, double capital) {
    return new double[] {Math.log(wage), Math.log(output), Math.log(capital)};
  }

  /**
   * Nicholson and Snyder, <i>Microeconomic Theory</i>, in the manner of its cost chapter (recalled
   * from memory, solved again): v = 3, w = 12. 40 units cost 480 with K = 80; with K = 80, 30 units
   * cost 375 against 360 in the long run, 50 units 615 against 600.
   */
  @Test
  void workedExample() {
    double[] low = {Math.log(1)};
    double[] high = {Math.log(10_000)};
    for (double output : new double[] {30, 40, 50}) {
      LongRunCost question =
          new LongRunCost(worked(), at(12, output, 1), CAPITAL, new double[] {3});
      LongRunCost.Best best = question.between(low, high).orElseThrow();
      // the first-order condition holds to 1e-11
      assertThat(best.total()).isCloseTo(12 * output, within(1e-9));
      assertThat(Math.exp(best.logs()[0])).isCloseTo(2 * output, within(1e-8));
    }
    double[] held = {Math.log(80)};
    double[] shortRun = {375, 480, 615};
    for (int k = 0; k < 3; k++) {
      double output = 30 + 10 * k;
      LongRunCost question =
          new LongRunCost(worked(), at(12, output, 1), CAPITAL, new double[] {3});
      assertThat(question.total(held)).isCloseTo(shortRun[k], within(1e-9));
    }
  }

  /** Variable cost that no amount of the fixed input lowers has no long run of this kind. */
  @Test
  void aFixedInputThatSavesNothingHasNoBestQuantity() {
    TranslogCost raises = worked().withParameters(new double[] {0, 1, 2, 0.5});
    Optional<LongRunCost.Best> best =
        new LongRunCost(raises, at(12, 30, 1), CAPITAL, new double[] {3})
            .between(new double[] {-2}, new double[] {8});
    assertThat(best).isEmpty();
  }

  /**
   * Two fixed inputs: long-run marginal cost is ∂V/∂Q at the minimum, and no other k is cheaper.
   */
  @Test
  void envelope() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("a", "b"), List.of("q"), List.of("k", "m"), false);
    List<Term> terms = CostForm.TRANSLOG.terms(arguments);
    Random random = new Random(7);
    int[] places = {3, 4};
    int found = 0;
    for (int draw = 0; draw < 200; draw++) {
      double[] c = new double[terms.size()];
      for (int t = 0; t < c.length; t++) {
        Term term = terms.get(t);
        boolean own = term.secondOrder() && term.first() == term.second();
        c[t] = term.secondOrder() ? (own && term.first() > 2 ? 0.2 : 0.02) : 0;
        c[t] *= term.secondOrder() ? 1 + random.nextGaussian() / 4 : 1;
      }
      System.arraycopy(new double[] {1, 0.6, 0.4, 1.4, -0.4, -0.3}, 0, c, 0, 6);
      TranslogCost cost = new TranslogCost("translog-cost", arguments, terms, c);
      double[] v = {0.1, -0.2, random.nextGaussian() / 2, 0, 0};
      double[] prices = {0.5 + random.nextDouble(), 0.5 + random.nextDouble()};
      double[] low = {-3, -3};
      double[] high = {3, 3};
      LongRunCost question = new LongRunCost(cost, v, places, prices);
      Optional<LongRunCost.Best> best = question.between(low, high);
      if (best.isEmpty()) {
        continue;
      }
      found++;
      double[] logs = best.get().logs();
      double step = 1e-4;
      double[] totals = new double[2];
      for (int side = 0; side < 2; side++) {
        double[] moved = v.clone();
        moved[2] += side == 0 ? step : -step;
        LongRunCost nearby = new LongRunCost(cost, moved, places, prices);
        totals[side] = nearby.total(nearby.near(logs));
      }
      double[] at = {v[0], v[1], v[2], logs[0], logs[1]};
      double[] gradient = new double[5];
      cost.gradient(at, gradient);
      double marginal = gradient[2] * Math.exp(cost.logCost(at));
      // central differences: step² times a third derivative of order ten
      assertThat((totals[0] - totals[1]) / (2 * step))
          .isCloseTo(marginal, within(1e-6 * Math.abs(marginal)));
      for (int other = 0; other < 50; other++) {
        double[] elsewhere = {6 * random.nextDouble() - 3, 6 * random.nextDouble() - 3};
        assertThat(question.total(elsewhere)).isGreaterThanOrEqualTo(best.get().total());
      }
    }
    assertThat(found).isGreaterThan(150);
  }
}

package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.Plan.Status;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Least-cost questions as textbooks and problem sets put them. Where a source printed an answer it
 * is met to the printed digits; all answers were re-solved by hand, and are met to 1e-6 relative,
 * the digits to which they are written here, or to 1e-12 where they are exact.
 */
class WorkedExamplesTest {

  /** Exact numbers pass through logs and back, each costing some 1e-15. */
  private static final double EXACT = 1e-12;

  private static final double WRITTEN = 1e-6;

  private static final List<String> LK = List.of("labour", "capital");

  private static Plan plan(Technology technology, double target, double... prices) {
    return Minimiser.of(technology).plan(Question.of(target, prices));
  }

  private static void holds(
      Plan plan, double tolerance, double cost, double marginalCost, double... mix) {
    assertThat(plan.answered()).as(plan.reason()).isTrue();
    assertThat(plan.cost()).isCloseTo(cost, within(tolerance * cost));
    assertThat(plan.marginalCost()).isCloseTo(marginalCost, within(tolerance * marginalCost));
    for (int i = 0; i < mix.length; i++) {
      assertThat(plan.mix(i)).isCloseTo(mix[i], within(tolerance * mix[i] + 1e-300));
    }
    assertThat(plan.optimality()).isLessThan(EXACT);
  }

  /** Example 1: K L², both prices 13, target 430; open exercise collection, cost printed 185.44. */
  @Test
  void capitalTimesLabourSquared() {
    CobbDouglas technology = CobbDouglas.of(List.of("capital", "labour"), 0, 1, 2);
    Plan plan = plan(technology, 430, 13, 13);
    holds(plan, WRITTEN, 185.438866, .143751, 4.754843, 9.509685);
    assertThat(plan.cost()).isCloseTo(185.44, within(.005));
    assertThat(plan.status()).isEqualTo(Status.SOLVED);
    assertThat(plan.reason()).isEmpty();
  }

  /** Example 2: 20 √(LK), wage 10, rental 40, target 1000; textbook-style question. */
  @Test
  void squareRoots() {
    Plan plan = plan(CobbDouglas.of(LK, Math.log(20), .5, .5), 1000, 10, 40);
    holds(plan, EXACT, 2000, 2, 100, 25);
    assertThat(plan.shares()).containsExactly(new double[] {.5, .5}, within(EXACT));
  }

  /** Example 3: four inputs; textbook-style question. */
  @Test
  void fourInputs() {
    CobbDouglas technology =
        CobbDouglas.of(
            List.of("capital", "labour", "resources", "material"), Math.log(20), .4, .3, .2, .25);
    Plan plan = plan(technology, 900, 10, 6, 15, 3);
    holds(plan, WRITTEN, 766.682060, .740756, 26.667202, 33.334003, 8.889067, 55.556671);
  }

  /** Example 5: √K L, rental 1, wage 3: cost 3.931112 Q^(2/3), printed 3.93; textbook-style. */
  @Test
  void costFunctionOfIncreasingReturns() {
    CobbDouglas technology = CobbDouglas.of(List.of("capital", "labour"), 0, .5, 1);
    for (double target : new double[] {1, 10, 700}) {
      double scaled = plan(technology, target, 1, 3).cost() / Math.pow(target, 2.0 / 3);
      assertThat(scaled).isCloseTo(3.931112, within(5e-7));
      assertThat(scaled).isCloseTo(3.93, within(.005));
    }
  }

  /** Example 6: 2 L^¼ K^¼, w 2, r 32, target 8; MIT OpenCourseWare 14.01, Fall 2010, set 4. */
  @Test
  void decreasingReturns() {
    CobbDouglas technology = CobbDouglas.of(LK, Math.log(2), .25, .25);
    holds(plan(technology, 8, 2, 32), EXACT, 256, 64, 64, 4);
    for (double target : new double[] {3, 8, 50}) {
      double cost = plan(technology, target, 2, 32).cost();
      assertThat(cost).isCloseTo(.5 * target * target * 8, within(EXACT * cost));
    }
  }

  /** Example 8: (√L + √K)², σ = 2, w 2, r 1: two thirds of Q; with K = 9 and Q = 16 cost is 11. */
  @Test
  void constantElasticityOfTwo() {
    Ces technology = Ces.of(LK, new double[] {1, 1}, Math.log(4), new double[] {.5, .5}, -.5, 1);
    holds(plan(technology, 9, 2, 1), EXACT, 6, 2.0 / 3, 1, 4);
    Plan held = Minimiser.of(technology).plan(Question.of(16, 2, 1).holding(1, 9));
    // dC/dQ with K = 9: L = (√Q − 3)², so 2 · 2(√Q − 3)/(2√Q) = 2 · 1/4.
    holds(held, EXACT, 11, .5, 1, 9);
    assertThat(held.status()).isEqualTo(Status.SOLVED);
    assertThat(held.reason()).contains("capital is held at 9");
    // λ f_K − r = ½ √(Q/K) − 1.
    assertThat(held.limitValues()[1]).isCloseTo(.5 * 4 / 3 - 1, within(EXACT));
  }

  /** Example 11: min(4L, 7K), the Leontief limit: Q/4, Q/7 at any prices. */
  @Test
  void fixedProportions() {
    Ces technology =
        Ces.of(
            LK,
            new double[] {1 / 4.0, 1 / 7.0},
            0,
            new double[] {.3, .7},
            Double.POSITIVE_INFINITY,
            1);
    for (double[] prices : new double[][] {{3, 5}, {900, .01}}) {
      double unit = prices[0] / 4 + prices[1] / 7;
      Plan plan = plan(technology, 100, prices);
      holds(plan, EXACT, 100 * unit, unit, 25, 100 / 7.0);
      assertThat(plan.status()).isEqualTo(Status.SOLVED);
    }
  }

  /** Example 12: L + K, the linear limit: only the cheaper, Q min(w, r). */
  @Test
  void perfectSubstitutes() {
    Ces technology = Ces.of(LK, new double[] {1, 1}, Math.log(2), new double[] {.5, .5}, -1, 1);
    Plan labour = plan(technology, 100, 3, 5);
    holds(labour, EXACT, 300, 3, 100, 0);
    assertThat(labour.status()).isEqualTo(Status.CORNER);
    assertThat(labour.reason()).contains("capital is not used");
    holds(plan(technology, 100, 5, 2), EXACT, 200, 2, 0, 100);
    Plan tied = plan(technology, 100, 4, 4);
    assertThat(tied.cost()).isCloseTo(400, within(400 * EXACT));
    assertThat(tied.reason()).contains("labour and capital cost the same");
  }

  /**
   * Example 16: √(KL), v 3, w 12; in the style of Nicholson and Snyder, <i>Microeconomic Theory</i>
   * (from memory). Short run with K = 80.
   */
  @Test
  void shortRunAgainstLongRun() {
    CobbDouglas technology = CobbDouglas.of(List.of("capital", "labour"), 0, .5, .5);
    holds(plan(technology, 40, 3, 12), EXACT, 480, 12, 80, 20);
    double[][] shortRun = {{30, 375, 360, 9}, {40, 480, 480, 12}, {50, 615, 600, 15}};
    for (double[] row : shortRun) {
      Plan held = Minimiser.of(technology).plan(Question.of(row[0], 3, 12).holding(0, 80));
      holds(held, EXACT, row[1], row[3], 80, row[0] * row[0] / 80);
      double longRun = plan(technology, row[0], 3, 12).cost();
      assertThat(longRun).isCloseTo(row[2], within(EXACT * row[2]));
    }
  }

  /**
   * A printed answer that is wrong: with 4 √(LK) at prices 3 and 5 a budget of 200 is said to yield
   * 104.40. It yields 103.2796 (= 4 · 200/(2 √15)); 104.40 would cost 202.17.
   */
  @Test
  void wrongPrintedAnswer() {
    CobbDouglas technology = CobbDouglas.of(LK, Math.log(4), .5, .5);
    double output = 4 * 200 / (2 * Math.sqrt(15));
    assertThat(output).isCloseTo(103.2796, within(5e-5));
    assertThat(plan(technology, output, 3, 5).cost()).isCloseTo(200, within(200 * EXACT));
    assertThat(plan(technology, 104.40, 3, 5).cost()).isCloseTo(202.17, within(.005));
  }
}

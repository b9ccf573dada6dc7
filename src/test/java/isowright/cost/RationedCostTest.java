package isowright.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

/** The short run from a cost function of the long run. */
class RationedCostTest {

  /** Q = K^½ L^½: C = 2 Q √(w v), a worked example of which the short run is known. */
  private static TranslogCost worked() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("labour", "capital"), List.of("q"), List.of(), false);
    return new TranslogCost(
        "cobb-douglas-cost",
        arguments,
        CostForm.COBB_DOUGLAS.terms(arguments),
        new double[] {Math.log(2), 0.5, 0.5, 1});
  }

  /**
   * In the manner of Nicholson and Snyder (recalled from memory, solved again): w = 12, v = 3, K
   * held at 80. Short-run cost is 3·80 + 12 Q²/80, marginal cost 0.3 Q: 375, 480, 615 and 9, 12, 15
   * for 30, 40 and 50 units.
   */
  @Test
  void workedExample() {
    double[] costs = {375, 480, 615};
    for (int k = 0; k < 3; k++) {
      double output = 30 + 10 * k;
      double[] v = {Math.log(12), Math.log(3), Math.log(output)};
      RationedCost short80 =
          new RationedCost(worked(), v, new int[] {1}, new double[] {Math.log(80)});
      double[] at = short80.point().orElseThrow();
      CostElasticities there = CostElasticities.at(worked(), at);
      // held quantities are met to 1e-12
      assertThat(there.cost() * short80.factor(at)).isCloseTo(costs[k], within(1e-9));
      assertThat(there.marginalCost(0, output)).isCloseTo(0.3 * output, within(1e-9));
      assertThat(there.demands()[0]).isCloseTo(output * output / 80, within(1e-9));
      assertThat(there.demands()[1]).isCloseTo(80, within(1e-9));
    }
  }

  /** With fixed proportions demand does not answer to prices, and nothing else can be held. */
  @Test
  void demandThatDoesNotAnswerCannotBeHeldElsewhere() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("labour", "capital"), List.of("q"), List.of(), false);
    CostFunction fixedProportions =
        new LevelledCost(
            new TranslogCost(
                "translog-cost",
                arguments,
                CostForm.TRANSLOG.terms(arguments),
                // H_11 = s(1 − s) at equal prices makes ε_11 = 0 there
                new double[] {0, 0.5, 0.5, 1, 0.25, -0.25, 0, 0.25, 0, 0}),
            0);
    double[] v = {0, 0, 0};
    assertThat(
            new RationedCost(fixedProportions, v, new int[] {0}, new double[] {Math.log(0.9)})
                .point())
        .isEmpty();
  }

  /** Twice the cost at equal prices: twice the inputs, the same shares. */
  @Test
  void levels() {
    double[] v = {0.3, -0.4, 1};
    CostFunction dearer = new LevelledCost(worked(), Math.log(2));
    CostElasticities there = CostElasticities.at(dearer, v);
    CostElasticities here = CostElasticities.at(worked(), v);
    // two roundings of numbers of order ten
    assertThat(there.cost()).isCloseTo(2 * here.cost(), within(1e-13));
    assertThat(there.demands()[0]).isCloseTo(2 * here.demands()[0], within(1e-13));
    assertThat(there.shares()).containsExactly(here.shares());
    assertThat(dearer.withParameters(new double[] {0, 0.5, 0.5, 1}).logCost(v))
        .isCloseTo(here.cost() > 0 ? Math.log(here.cost()) : 0, within(1e-13));
  }
}

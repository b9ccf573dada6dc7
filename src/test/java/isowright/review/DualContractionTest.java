package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostArguments;
import isowright.cost.CostElasticities;
import isowright.cost.CostForm;
import isowright.cost.CostFunction;
import isowright.cost.TranslogCost;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFixtures;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Equations;
import java.io.IOException;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The contraction of a mix seen from the cost function. */
class DualContractionTest {

  /**
   * y = √(LK), prices 4 and 1, seen L 3, K 6, y 3, by its cost function C = 2 y √(w r): the
   * arithmetic of Farrell (1957), technical .707107, mix .942809, costs 18, 12.7279, 12.
   */
  @Test
  void farrellFromTheOtherSide() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("labour", "capital"), List.of("y"), List.of(), false);
    CostFunction cost =
        new TranslogCost(
            "cobb-douglas-cost",
            arguments,
            CostForm.COBB_DOUGLAS.terms(arguments),
            new double[] {Math.log(2), .5, .5, 1});
    double[] v = {Math.log(4), 0, Math.log(3)};
    DualContraction found = DualContraction.of(cost, v, new double[] {3, 6}).orElseThrow();
    // printed to six digits
    assertThat(found.theta()).isCloseTo(.707107, within(5e-7));
    assertThat(18 * found.theta()).isCloseTo(12.7279, within(5e-5));
    double least = Math.exp(cost.logCost(v));
    assertThat(least).isCloseTo(12, within(1e-12));
    assertThat(least / (18 * found.theta())).isCloseTo(.942809, within(5e-7));
  }

  /**
   * On the fitted translog cost system of electricity: a mix that is a multiple of a least-cost mix
   * has that multiple's inverse, and of any mix no prices of a fine search give more than θ.
   */
  @Test
  void isTheMostOverPrices() throws IOException {
    CostData data = CostFixtures.electricity();
    CostFunction cost =
        CostEstimation.fit(
                data,
                new CostSpecification(
                    CostForm.TRANSLOG, Equations.SYSTEM, true, List.of(), false, false, 2, .95))
            .function();
    double[] v = data.point(60);
    double[] best = CostElasticities.at(cost, v).demands();
    double[] twice = {2 * best[0], 2 * best[1], 2 * best[2]};
    // found at the prices themselves: rounding alone
    assertThat(DualContraction.of(cost, v, twice).orElseThrow().theta())
        .isCloseTo(.5, within(1e-12));
    SplittableRandom random = new SplittableRandom(5);
    for (int trial = 0; trial < 50; trial++) {
      double[] mix = new double[3];
      for (int i = 0; i < 3; i++) {
        mix[i] = best[i] * Math.exp(.06 * random.nextDouble() - .03);
      }
      DualContraction found = DualContraction.of(cost, v, mix).orElseThrow();
      double most = 0;
      for (double a = -.3; a <= .3; a += .02) {
        for (double b = -.3; b <= .3; b += .02) {
          double[] u = found.point().clone();
          u[0] += a;
          u[1] += b;
          double spent = 0;
          for (int i = 0; i < 3; i++) {
            spent += Math.exp(u[i]) * mix[i];
          }
          most = Math.max(most, Math.exp(cost.logCost(u)) / spent);
        }
      }
      // the search has the point itself among its places but for rounding of the steps
      assertThat(most).isCloseTo(found.theta(), within(1e-9));
    }
    // with elasticities of .1 to .4 a mix far off is least cost only at prices far out, where the
    // translog is no cost function: then nothing is said
    assertThat(DualContraction.of(cost, v, new double[] {9 * best[0], best[1], best[2]})).isEmpty();
  }
}

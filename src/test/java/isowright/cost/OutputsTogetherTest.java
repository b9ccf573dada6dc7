package isowright.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.GeneralisedCost.PriceTerms;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Economies of scope and complementarity of costs, by hand and by differences. */
class OutputsTogetherTest {

  private static final CostArguments ARGUMENTS =
      CostArguments.ownUnits(List.of("a", "b"), List.of("y", "z"), List.of(), false);

  /**
   * C = w₁ (10 + 2 y + z) + w₂ (6 + y + 3 z) − (w₁ + w₂)/2 · 0.05 y z, by hand at w = (2, 4), y =
   * 5, z = 8: apart 2·20 + 4·11 = 84 and 2·18 + 4·30 = 156, together 2·28 + 4·35 − 6 = 190.
   */
  private static GeneralisedCost worked() {
    double[] p = new double[GeneralisedCost.names(ARGUMENTS).size()];
    GeneralisedCost frame =
        new GeneralisedCost(PriceTerms.MCFADDEN, ARGUMENTS, new double[] {.5, .5}, p);
    p[frame.fixed(0)] = 10;
    p[frame.fixed(1)] = 6;
    p[frame.linear(0, 0)] = 2;
    p[frame.linear(0, 1)] = 1;
    p[frame.linear(1, 0)] = 1;
    p[frame.linear(1, 1)] = 3;
    p[frame.square(0, 1)] = -0.05;
    return frame.withParameters(p);
  }

  @Test
  void byHand() {
    double[] v = ARGUMENTS.point(new double[] {2, 4}, new double[] {5, 8}, new double[0], 0);
    OutputsTogether together = new OutputsTogether(worked(), v);
    assertThat(together.scope(0)).isCloseTo(50 / 190.0, within(1e-12));
    assertThat(together.scope(1)).isCloseTo(50 / 190.0, within(1e-12));
    assertThat(together.allApart()).isCloseTo(50 / 190.0, within(1e-12));
    // marginal cost of y: 2·2 + 4·1 − 3·0.05·8 = 6.8; its slope in z times z: −0.15 · 8
    assertThat(OutputsTogether.complementarity(worked(), v, 0, 1))
        .isCloseTo(-1.2 / 6.8, within(1e-12));
  }

  /** Translog cost tells complementarity as well; held against differences of marginal cost. */
  @Test
  void complementarityIsTheSlopeOfMarginalCost() {
    Random random = new Random(41);
    List<TranslogCost.Term> terms = CostForm.TRANSLOG.terms(ARGUMENTS);
    double[] c = random.doubles(terms.size(), 0.2, 0.4).toArray();
    TranslogCost cost = new TranslogCost("translog-cost", ARGUMENTS, terms, c);
    double[] v = {0.1, -0.2, 0.3, 0.2};
    for (int k = 0; k < 2; k++) {
      for (int l = 0; l < 2; l++) {
        double[] up = v.clone();
        double[] down = v.clone();
        up[2 + l] += 1e-5;
        down[2 + l] -= 1e-5;
        double slope = (logMarginal(cost, up, k) - logMarginal(cost, down, k)) / 2e-5;
        // central differences: third derivatives of order one times 1e-10, rounding 1e-16/1e-5
        assertThat(OutputsTogether.complementarity(cost, v, k, l)).isCloseTo(slope, within(1e-8));
      }
    }
  }

  private static double logMarginal(CostFunction cost, double[] v, int k) {
    return Math.log(CostElasticities.at(cost, v).marginalCost(k, Math.exp(v[2 + k])));
  }
}

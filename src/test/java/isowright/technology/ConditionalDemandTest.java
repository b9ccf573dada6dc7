package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.technology.ConditionalDemand.FixedProportions;
import isowright.technology.ConditionalDemand.PerfectSubstitutes;
import isowright.technology.ConditionalDemand.Reach;
import isowright.technology.ConditionalDemand.Smooth;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Closed forms against the technology's own output and elasticities. */
class ConditionalDemandTest {

  private static final List<String> NAMES = List.of("a", "b", "c");
  private static final double[] BASE = {2, 30, .5};

  private static Smooth smooth(Technology technology) {
    return technology
        .conditionalDemand()
        .orElseThrow()
        .fold(
            form -> form,
            fixed -> {
              throw new AssertionError(fixed);
            },
            perfect -> {
              throw new AssertionError(perfect);
            });
  }

  /** w_i x_i/e_i is the same for all free inputs, and the target is met. */
  @Test
  void freeInputsMeetTheConditionsWhateverIsFixed() {
    SplittableRandom random = new SplittableRandom(71);
    for (int k = 0; k < 4000; k++) {
      double rho = k % 7 == 0 ? 0 : Math.exp(4 * random.nextDouble() - 2.5) - .95;
      double share = .2 + .5 * random.nextDouble();
      double[] shares = {share, .7 * (1 - share), .3 * (1 - share)};
      Technology technology =
          switch (k % 5) {
            case 0 -> new CobbDouglas(NAMES, BASE, 1, shares);
            case 1, 2 -> Ces.of(NAMES, BASE, 1, shares, rho, .8);
            default -> nested(random, shares, rho);
          };
      double[] z = new double[3];
      double[] prices = new double[3];
      boolean[] fixed = new boolean[3];
      for (int i = 0; i < 3; i++) {
        z[i] = Math.log(BASE[i]) + .4 * random.nextDouble() - .2;
        prices[i] = 6 * random.nextDouble() - 3;
        fixed[i] = (k >> i) % 2 == 1 && i != k % 3;
      }
      double target = technology.logOutput(z) + .1 * random.nextDouble() - .05;
      double[] before = z.clone();
      Reach reach = smooth(technology).logMix(target, prices, fixed, z);
      if (reach != Reach.REACHED) {
        for (int i = 0; i < 3; i++) {
          before[i] = fixed[i] ? before[i] : reach == Reach.TOO_LITTLE ? 1e6 : -1e6;
        }
        double extreme = technology.logOutput(before);
        assertThat(reach == Reach.TOO_LITTLE ? target - extreme : extreme - target).isPositive();
        continue;
      }
      assertThat(technology.logOutput(z)).isCloseTo(target, within(1e-12));
      double[] e = new double[3];
      technology.logGradient(z, e);
      double multiplier = Double.NaN;
      for (int i = 0; i < 3; i++) {
        if (fixed[i]) {
          assertThat(z[i]).isEqualTo(before[i]);
          continue;
        }
        double each = prices[i] + z[i] - Math.log(e[i]);
        multiplier = Double.isNaN(multiplier) ? each : multiplier;
        // Rounding of logs of the size of 10, times 1 + ρ (up to 5); in a nest, twice.
        assertThat(each).isCloseTo(multiplier, within(1e-12));
      }
    }
  }

  private static Technology nested(SplittableRandom random, double[] shares, double rho) {
    double[] within = {.3 + .4 * random.nextDouble(), 0};
    within[1] = 1 - within[0];
    return NestedCes.of(
        NAMES,
        BASE,
        List.of(List.of("a", "c"), List.of("b")),
        1,
        new double[][] {within, {1}},
        new double[] {shares[0] + shares[2], shares[1]},
        rho,
        new double[] {Math.exp(4 * random.nextDouble() - 2.5) - .95, 0},
        .8);
  }

  @Test
  void shapeFollowsTheParameters() {
    double[] even = {.2, .3, .5};
    assertThat(Ces.of(NAMES, BASE, 1, even, Double.POSITIVE_INFINITY, 2).conditionalDemand())
        .hasValueSatisfying(demand -> assertThat(demand).isInstanceOf(FixedProportions.class));
    assertThat(Ces.of(NAMES, BASE, 1, even, -1, 2).conditionalDemand())
        .hasValueSatisfying(demand -> assertThat(demand).isInstanceOf(PerfectSubstitutes.class));
    assertThat(CobbDouglas.of(NAMES, 0, .5, 0, .2).conditionalDemand()).isEmpty();
    assertThat(new Translog(NAMES, BASE, 0, new double[9]).conditionalDemand()).isEmpty();
    Technology outside =
        Ces.of(NAMES, BASE, 1, even, -.5, 2).withParameters(new double[] {1, .2, .3, .5, -1.2, 2});
    assertThat(outside.conditionalDemand()).as("ρ under −1").isEmpty();
  }

  /** The limits give back the technology: one unit of need yields one unit of output. */
  @Test
  void limitsDescribeTheTechnology() {
    double[] even = {.2, .3, .5};
    Ces leontief = Ces.of(NAMES, BASE, 1, even, Double.POSITIVE_INFINITY, 2);
    double[] need =
        leontief
            .conditionalDemand()
            .orElseThrow()
            .fold(form -> new double[0], FixedProportions::logNeed, perfect -> new double[0]);
    assertThat(leontief.logOutput(need)).isCloseTo(0, within(1e-14));
    Ces linear = Ces.of(NAMES, BASE, 1, even, -1, 2);
    double[] worth =
        linear
            .conditionalDemand()
            .orElseThrow()
            .fold(form -> new double[0], fixed -> new double[0], PerfectSubstitutes::worth);
    double[] mix = {3, 40, .1};
    double sum = worth[0] * 3 + worth[1] * 40 + worth[2] * .1;
    assertThat(linear.output(mix)).isCloseTo(sum * sum, within(1e-12 * sum * sum));
  }
}

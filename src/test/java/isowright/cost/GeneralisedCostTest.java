package isowright.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.GeneralisedCost.PriceTerms;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Laws of cost functions in levels, on random ones. */
class GeneralisedCostTest {

  private static final CostArguments ARGUMENTS =
      new CostArguments(
          List.of("a", "b", "c"), List.of("y", "z"), List.of(), true, new double[] {2, 3, 1, 5, 7});

  private static final double[] WEIGHTS = {0.3, 0.5, 0.2};

  private static GeneralisedCost random(Random random, PriceTerms prices) {
    double[] p = new double[GeneralisedCost.names(ARGUMENTS).size()];
    for (int k = 0; k < p.length; k++) {
      p[k] = 0.2 * random.nextGaussian();
    }
    GeneralisedCost frame = new GeneralisedCost(prices, ARGUMENTS, WEIGHTS, p);
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 2; k++) {
        p[frame.linear(i, k)] += 3; // so that cost is positive
      }
    }
    return frame.withParameters(p);
  }

  private static double[] point(Random random) {
    double[] v = new double[ARGUMENTS.size()];
    for (int k = 0; k < v.length; k++) {
      v[k] = 1 + 0.5 * random.nextGaussian();
    }
    return v;
  }

  @Test
  void derivativesAreThoseOfTheValue() {
    Random random = new Random(21);
    for (PriceTerms prices : PriceTerms.values()) {
      for (int draw = 0; draw < 100; draw++) {
        GeneralisedCost cost = random(random, prices);
        double[] v = point(random);
        double[] gradient = new double[v.length];
        double[][] hessian = new double[v.length][v.length];
        cost.gradient(v, gradient);
        cost.hessian(v, hessian);
        for (int k = 0; k < v.length; k++) {
          double[] up = v.clone();
          double[] down = v.clone();
          up[k] += 1e-4;
          down[k] -= 1e-4;
          double slope = (cost.logCost(up) - cost.logCost(down)) / 2e-4;
          // third derivatives of order ten times 1e-8, and rounding 1e-15/1e-4
          assertThat(gradient[k]).isCloseTo(slope, within(1e-6));
          double[] above = new double[v.length];
          double[] below = new double[v.length];
          cost.gradient(up, above);
          cost.gradient(down, below);
          for (int l = 0; l < v.length; l++) {
            assertThat(hessian[k][l]).isCloseTo((above[l] - below[l]) / 2e-4, within(1e-6));
          }
        }
      }
    }
  }

  @Test
  void costDoublesWithPricesDemandsAddUpAndAreSymmetric() {
    Random random = new Random(22);
    for (PriceTerms prices : PriceTerms.values()) {
      for (int draw = 0; draw < 300; draw++) {
        GeneralisedCost cost = random(random, prices);
        double[] v = point(random);
        double[] twice = v.clone();
        for (int i = 0; i < 3; i++) {
          twice[i] += Math.log(2);
        }
        assertThat(cost.logCost(twice)).isCloseTo(cost.logCost(v) + Math.log(2), within(1e-12));
        CostElasticities at = CostElasticities.at(cost, v);
        double spent = 0;
        for (int i = 0; i < 3; i++) {
          spent += Math.exp(v[i]) * at.demands()[i];
          double rows = 0;
          for (int j = 0; j < 3; j++) {
            rows += at.demand(i, j) * at.shares()[i];
            double crossed = at.demand(j, i) * at.shares()[j];
            assertThat(at.demand(i, j) * at.shares()[i]).isCloseTo(crossed, within(1e-11));
          }
          assertThat(rows).isCloseTo(0, within(1e-11));
        }
        assertThat(spent / at.cost()).isCloseTo(1, within(1e-12));
      }
    }
  }

  /** McFadden cost with S = −L L′ is concave at every price, however far from the base. */
  @Test
  void negativeSquareIsConcaveEverywhere() {
    Random random = new Random(23);
    for (int draw = 0; draw < 300; draw++) {
      GeneralisedCost cost = random(random, PriceTerms.MCFADDEN);
      double[] p = cost.parameters();
      double a = random.nextGaussian();
      double b = random.nextGaussian();
      double c = draw % 3 == 0 ? 0 : random.nextGaussian(); // of lower rank now and then
      p[GeneralisedCost.pair(3, 0, 1)] = -a * b;
      p[GeneralisedCost.pair(3, 0, 2)] = a * a + a * b;
      p[GeneralisedCost.pair(3, 1, 2)] = a * b + b * b + c * c;
      // linear terms large enough for positive cost where prices differ widely
      for (int i = 0; i < 3; i++) {
        p[cost.fixed(i)] += 500;
      }
      double[] v = point(random);
      for (int i = 0; i < 3; i++) {
        v[i] = 1.5 * random.nextGaussian();
      }
      assertThat(CostElasticities.at(cost.withParameters(p), v).concave()).isTrue();
    }
  }

  /** Generalised Leontief by hand: C = y (2 √(w₁w₂) + w₁ + 3 w₂) at w = (4, 1), y = 10. */
  @Test
  void leontiefByHand() {
    CostArguments arguments =
        CostArguments.ownUnits(List.of("a", "b"), List.of("y"), List.of(), false);
    double[] p = new double[GeneralisedCost.names(arguments).size()];
    GeneralisedCost cost =
        new GeneralisedCost(PriceTerms.LEONTIEF, arguments, new double[] {.5, .5}, p);
    p[0] = 1;
    p[cost.linear(0, 0)] = 1;
    p[cost.linear(1, 0)] = 3;
    double[] v = arguments.point(new double[] {4, 1}, new double[] {10}, new double[0], 0);
    CostElasticities at = CostElasticities.at(cost.withParameters(p), v);
    // 10 (2·2 + 4 + 3); x₁ = 10 (√(1/4) + 1), x₂ = 10 (√4 + 3); ∂x₁/∂w₁ = −½ · 10 · √1 · 4^(−3/2)
    assertThat(at.cost()).isCloseTo(110, within(1e-12));
    assertThat(at.demands()).containsExactly(new double[] {15, 50}, within(1e-12));
    assertThat(at.demand(0, 0)).isCloseTo(-0.625 * 4 / 15, within(1e-12));
    assertThat(at.concave()).isTrue();
  }

  /** A zero output costs nothing but leaves the rest of the function as it is. */
  @Test
  void zeroOutputs() {
    Random random = new Random(24);
    for (PriceTerms prices : PriceTerms.values()) {
      GeneralisedCost cost = random(random, prices);
      double[] v = point(random);
      v[4] = Double.NEGATIVE_INFINITY;
      double[] nearly = v.clone();
      nearly[4] = Math.log(1e-12);
      assertThat(cost.logCost(v)).isCloseTo(cost.logCost(nearly), within(1e-11));
      double[] gradient = new double[v.length];
      cost.gradient(v, gradient);
      assertThat(Arrays.stream(gradient).allMatch(Double::isFinite)).isTrue();
      assertThat(gradient[4]).isZero();
      nearly[4] = Math.log(1e-6);
      // the difference of costs of order 50 over 1e-6 has some eight digits
      double rise = Math.exp(cost.logCost(nearly)) - Math.exp(cost.logCost(v));
      assertThat(cost.marginalCost(v, 1)).isCloseTo(rise / 1e-6, within(1e-5));
    }
  }
}

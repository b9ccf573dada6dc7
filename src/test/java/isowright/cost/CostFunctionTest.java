package isowright.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Laws of cost functions on random translog costs made homogeneous in prices. */
class CostFunctionTest {

  private static final CostArguments ARGUMENTS =
      new CostArguments(
          List.of("a", "b", "c"), List.of("y"), List.of("k"), true, new double[] {2, 3, 1, 50, 7});

  private static TranslogCost random(Random random) {
    List<TranslogCost.Term> terms = CostForm.TRANSLOG.terms(ARGUMENTS);
    PriceHomogeneity rule = PriceHomogeneity.of(ARGUMENTS, terms);
    double[] coefficients = rule.offsets();
    for (int f = 0; f < rule.free().length; f++) {
      double phi = 0.3 + 0.05 * random.nextGaussian();
      for (int t = 0; t < coefficients.length; t++) {
        coefficients[t] += rule.loadings()[t][f] * phi;
      }
    }
    return new TranslogCost("translog-cost", ARGUMENTS, terms, coefficients);
  }

  private static double[] point(Random random) {
    double[] v = new double[ARGUMENTS.size()];
    for (int k = 0; k < v.length; k++) {
      v[k] = random.nextGaussian();
    }
    return v;
  }

  @Test
  void derivativesAreThoseOfTheValue() {
    Random random = new Random(11);
    for (int draw = 0; draw < 200; draw++) {
      TranslogCost cost = random(random);
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
        // ln C is quadratic: central differences are exact but for rounding of 1e-15/1e-4
        assertThat(gradient[k]).isCloseTo(slope, within(1e-9));
        double[] above = new double[v.length];
        cost.gradient(up, above);
        for (int l = 0; l < v.length; l++) {
          assertThat(hessian[k][l]).isCloseTo((above[l] - gradient[l]) / 1e-4, within(1e-9));
        }
      }
    }
  }

  @Test
  void costDoublesWithPricesAndDemandsAddUp() {
    Random random = new Random(12);
    for (int draw = 0; draw < 1000; draw++) {
      TranslogCost cost = random(random);
      double[] v = point(random);
      double[] twice = v.clone();
      for (int i = 0; i < 3; i++) {
        twice[i] += Math.log(2);
      }
      // a dozen terms of order ten
      assertThat(cost.logCost(twice)).isCloseTo(cost.logCost(v) + Math.log(2), within(1e-12));
      CostElasticities at = CostElasticities.at(cost, v);
      double spent = 0;
      for (int i = 0; i < 3; i++) {
        spent += Math.exp(v[i]) * at.demands()[i];
        double rows = 0;
        for (int j = 0; j < 3; j++) {
          rows += at.demand(i, j) * at.shares()[i];
          assertThat(at.allen(i, j))
              .isCloseTo(at.allen(j, i), within(1e-9 * Math.abs(at.allen(i, j))));
        }
        assertThat(rows).isCloseTo(0, within(1e-11));
      }
      assertThat(spent / at.cost()).isCloseTo(1, within(1e-12));
    }
  }
}

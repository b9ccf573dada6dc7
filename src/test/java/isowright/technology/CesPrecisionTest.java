package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Constant elasticity of substitution against decimal arithmetic of 80 digits, for ρ from under −1
 * through 0, where the textbook formula is 0/0, to 10 000, where it overflows.
 */
class CesPrecisionTest {

  /**
   * The accuracy asked for. Powers e^{ρ z} carry the rounding of ρ z, up to 700 units of the last
   * place before they underflow: 700 · 2 · 1.1e−16 = 1.6e−13; all else is a few units.
   */
  private static final double RELATIVE = 1e-12;

  private static final double[] CURVATURES = {
    -1.05, -1, -0.999, -0.5, -0.1, -1e-2, -1e-3, -1e-5, -1e-8, -1e-12, 1e-14, 1e-12, 1e-10, 1e-8,
    1e-7, 1e-6, 1e-5, 1e-4, 1e-3, 1e-2, 0.1, 0.24, 0.26, 0.5, 1, 3, 10, 30, 100, 290, 310, 1e3, 1e4
  };

  private record Case(Ces ces, double[] z, PreciseCes precise) {}

  private interface Check {
    void of(Ces ces, double[] z, PreciseCes precise);
  }

  /** The decimal powers are slow, so they are taken once for all tests. */
  private static final List<Case> CASES = cases();

  private static List<Case> cases() {
    Random random = new Random(1);
    List<Case> cases = new ArrayList<>();
    for (double rho : CURVATURES) {
      for (double spread : new double[] {1e-3, 0.3, 1.5}) {
        for (int k = 0; k < 2; k++) {
          int n = 2 + random.nextInt(3);
          // A base of ones, so that the very same z enters both computations.
          double[] ones = new double[n];
          Arrays.fill(ones, 1);
          double[] shares = RandomTechnologies.shares(random, n);
          Ces ces = new Ces(new InputScale(RandomTechnologies.inputs(n), ones), 0, shares, rho, 1);
          double shift = 3 * random.nextGaussian();
          double[] z = new double[n];
          Arrays.setAll(z, i -> shift + spread * random.nextGaussian());
          cases.add(new Case(ces, z, new PreciseCes(shares, z, -rho)));
        }
      }
    }
    return cases;
  }

  private static void everywhere(Check check) {
    CASES.forEach(each -> check.of(each.ces(), each.z(), each.precise()));
  }

  @Test
  void logOutput() {
    everywhere(
        (ces, z, precise) -> {
          // The mean lies among the z and is as exact as they are, even where it is near zero.
          double size = Arrays.stream(z).map(Math::abs).max().orElseThrow();
          assertThat(ces.logOutput(z)).isCloseTo(precise.logMean(), within(1e-15 * size * 4));
        });
  }

  @Test
  void gradient() {
    everywhere(
        (ces, z, precise) -> {
          double[] e = new double[z.length];
          ces.logGradient(z, e);
          for (int i = 0; i < z.length; i++) {
            assertRelative(e[i], precise.tilted(i));
          }
        });
  }

  @Test
  void hessian() {
    everywhere(
        (ces, z, precise) -> {
          double[][] h = new double[z.length][z.length];
          ces.logHessian(z, h);
          for (int i = 0; i < z.length; i++) {
            for (int j = 0; j < z.length; j++) {
              assertRelative(h[i][j], precise.second(i, j));
            }
          }
        });
  }

  @Test
  void derivativeInCurvature() {
    everywhere(
        (ces, z, precise) -> {
          double[] gradient = new double[z.length + 3];
          ces.parameterGradient(z, gradient);
          assertRelative(gradient[z.length + 1], -precise.orderSlope());
        });
  }

  @Test
  void derivativesInShares() {
    everywhere(
        (ces, z, precise) -> {
          double[] gradient = new double[z.length + 3];
          ces.parameterGradient(z, gradient);
          double largest = 0;
          for (int i = 0; i < z.length; i++) {
            largest = Math.max(largest, Math.abs(precise.shareSlope(i)));
          }
          for (int i = 0; i < z.length; i++) {
            // Slopes pass through zero, so they are held against the largest of them.
            assertThat(gradient[1 + i])
                .isCloseTo(precise.shareSlope(i), within(RELATIVE * largest));
          }
        });
  }

  /** The same through the estimator's door, where rows are taken many at a time. */
  @Test
  void rowsAtOnce() {
    everywhere(
        (ces, z, precise) -> {
          int n = z.length;
          double[] inner = new double[n];
          inner[0] = 1;
          for (int i = 0; i < n - 1; i++) {
            inner[1 + i] = Math.log(ces.shares()[i] / ces.shares()[n - 1]);
          }
          double[][] columns = new double[n][1];
          Arrays.setAll(columns, i -> new double[] {z[i]});
          double[] value = new double[1];
          double[][] derivatives = new double[n + 1][1];
          Ces.FORM.evaluate(columns, 1, inner, new double[] {ces.rho()}, value, derivatives);
          double size = Arrays.stream(z).map(Math::abs).max().orElseThrow();
          // Shares pass through a logarithm here, which costs a few units more.
          assertThat(value[0]).isCloseTo(precise.logMean(), within(1e-14 * size));
          assertRelative(derivatives[n][0], -precise.orderSlope());
        });
  }

  private static void assertRelative(double found, double expected) {
    // Under 1e−290 a double begins to lose digits.
    assertThat(found).isCloseTo(expected, within(RELATIVE * Math.abs(expected) + 1e-290));
  }
}

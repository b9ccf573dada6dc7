package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;

/**
 * What every technology must obey, whatever its form. A form's test extends this class and gives
 * its technologies; the tests are final, so none can be left out.
 */
abstract class TechnologyContract {

  /**
   * How far an exact derivative may lie from the numerical one, relative to the larger of one and
   * its size. The numerical one uses steps of ±h and ±2h, h = 1e−3/(1 + curvature), with error h⁴
   * f⁗/30 + 3 ε |f|/(2h): under 1e−10 for the functions here.
   */
  private static final double NUMERICAL = 1e-9;

  /** Technologies of two to four inputs, with bases that are not one, in the economic region. */
  abstract List<Technology> technologies();

  /** How fast the derivatives of this technology grow with their order. */
  abstract double curvature(Technology technology);

  private interface Case {
    void of(Technology technology, double[] logInputs);
  }

  private void everywhere(Case check) {
    Random random = new Random(20240613);
    assertThat(technologies()).hasSizeGreaterThanOrEqualTo(4);
    for (Technology technology : technologies()) {
      for (int k = 0; k < 25; k++) {
        double[] z = new double[technology.dimension()];
        double[] base = technology.base();
        Arrays.setAll(z, i -> Math.log(base[i]) + 0.6 * random.nextGaussian());
        check.of(technology, z);
      }
    }
  }

  @Test
  final void gradientIsTheDerivativeOfLogOutput() {
    everywhere(
        (technology, z) -> {
          double[] exact = new double[z.length];
          technology.logGradient(z, exact);
          for (int i = 0; i < z.length; i++) {
            double numerical = derivative(technology::logOutput, z, i, step(technology));
            assertClose(exact[i], numerical);
          }
        });
  }

  @Test
  final void hessianIsTheDerivativeOfTheGradientAndSymmetric() {
    everywhere(
        (technology, z) -> {
          int n = z.length;
          double[][] exact = new double[n][n];
          technology.logHessian(z, exact);
          for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
              int which = i;
              ToDoubleFunction<double[]> slope = at -> gradient(technology, at)[which];
              assertClose(exact[i][j], derivative(slope, z, j, step(technology)));
              assertThat(exact[i][j]).isEqualTo(exact[j][i]);
            }
          }
        });
  }

  @Test
  final void parameterGradientIsTheDerivativeInEachParameter() {
    everywhere(
        (technology, z) -> {
          double[] parameters = technology.parameters();
          double[] exact = new double[parameters.length];
          technology.parameterGradient(z, exact);
          ToDoubleFunction<double[]> output = p -> technology.withParameters(p).logOutput(z);
          for (int k = 0; k < parameters.length; k++) {
            assertClose(exact[k], derivative(output, parameters, k, step(technology)));
          }
        });
  }

  @Test
  final void derivativesInInputsFollowFromThoseInLogs() {
    everywhere(
        (technology, z) -> {
          double[] x = Arrays.stream(z).map(Math::exp).toArray();
          double[] gradient = technology.gradient(x);
          double[][] hessian = technology.hessian(x);
          for (int i = 0; i < x.length; i++) {
            double step = step(technology) * x[i];
            double output = technology.output(x);
            // Compared as elasticities, so that one tolerance serves inputs of any size.
            double first = derivative(technology::output, x, i, step);
            assertClose(gradient[i] * x[i] / output, first * x[i] / output);
            for (int j = 0; j < x.length; j++) {
              int which = j;
              double second = derivative(at -> technology.gradient(at)[which], x, i, step);
              double unit = x[i] * x[j] / output;
              assertClose(hessian[i][j] * unit, second * unit);
            }
          }
        });
  }

  @Test
  final void parametersMakeTheTechnologyAgain() {
    everywhere(
        (technology, z) -> {
          Technology again = technology.withParameters(technology.parameters());
          assertThat(again.form()).isEqualTo(technology.form());
          assertThat(again.inputs()).isEqualTo(technology.inputs());
          assertThat(again.base()).containsExactly(technology.base());
          assertThat(technology.parameterNames()).hasSize(technology.parameters().length);
          assertThat(technology.parameterNames()).doesNotHaveDuplicates().startsWith("constant");
          // Dividing shares by a sum of one may move their last bit.
          assertThat(again.logOutput(z)).isCloseTo(technology.logOutput(z), within(1e-14));
        });
  }

  @Test
  final void shiftedAddsToLogOutputAndChangesNothingElse() {
    everywhere(
        (technology, z) -> {
          Technology shifted = technology.shifted(0.37);
          assertThat(shifted.logOutput(z) - technology.logOutput(z)).isCloseTo(0.37, within(1e-14));
          assertThat(gradient(shifted, z)).containsExactly(gradient(technology, z));
          assertThat(shifted.base()).containsExactly(technology.base());
        });
  }

  @Test
  final void arraysAreCopiedInAndOut() {
    everywhere(
        (technology, z) -> {
          double before = technology.logOutput(z);
          double[] parameters = technology.parameters();
          Technology made = technology.withParameters(parameters);
          double ofMade = made.logOutput(z);
          Arrays.fill(parameters, 99);
          Arrays.fill(technology.parameters(), 99);
          Arrays.fill(technology.base(), 99);
          assertThat(technology.logOutput(z)).isEqualTo(before);
          assertThat(made.logOutput(z)).isEqualTo(ofMade);
          double[] kept = z.clone();
          technology.logGradient(z, new double[z.length]);
          technology.logHessian(z, new double[z.length][z.length]);
          technology.parameterGradient(z, new double[technology.parameters().length]);
          assertThat(z).containsExactly(kept);
          assertThatThrownBy(() -> technology.inputs().add("more"))
              .isInstanceOf(UnsupportedOperationException.class);
        });
  }

  @Test
  final void formIsKnownByName() {
    for (Technology technology : technologies()) {
      assertThat(Form.named(technology.form()).name()).isEqualTo(technology.form());
    }
  }

  @Test
  final void wrongNumberOfParametersIsRefusedWithBothNumbers() {
    for (Technology technology : technologies()) {
      int right = technology.parameters().length;
      assertThatThrownBy(() -> technology.withParameters(new double[right + 1]))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessageContaining(String.valueOf(right))
          .hasMessageContaining(String.valueOf(right + 1));
    }
  }

  private double step(Technology technology) {
    return 1e-3 / (1 + curvature(technology));
  }

  private static double[] gradient(Technology technology, double[] z) {
    double[] e = new double[z.length];
    technology.logGradient(z, e);
    return e;
  }

  private static void assertClose(double exact, double numerical) {
    assertThat(exact).isCloseTo(numerical, within(NUMERICAL * Math.max(1, Math.abs(exact))));
  }

  /** The derivative in component k, of fourth order in the step. */
  static double derivative(ToDoubleFunction<double[]> of, double[] at, int k, double step) {
    double[] moved = at.clone();
    double sum = 0;
    int[] places = {-2, -1, 1, 2};
    int[] weights = {1, -8, 8, -1};
    for (int s = 0; s < places.length; s++) {
      moved[k] = at[k] + places[s] * step;
      sum += weights[s] * of.applyAsDouble(moved);
    }
    return sum / (12 * step);
  }
}

package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CesFormTest {

  private static final NonlinearForm FORM = Ces.FORM;

  private static double[] inner(Random random, int n) {
    double[] inner = new double[n];
    inner[0] = 0.5 + random.nextDouble();
    for (int i = 1; i < n; i++) {
      inner[i] = random.nextGaussian();
    }
    return inner;
  }

  @Test
  void innerParametersAreScaleAndLogRatiosOfShares() {
    List<String> inputs = List.of("labour", "machines", "energy");
    assertThat(FORM.innerNames(inputs))
        .containsExactly(
            "scale", "ln(share:labour/share:energy)", "ln(share:machines/share:energy)");
    double[] inner = {1.2, Math.log(0.5 / 0.2), Math.log(0.3 / 0.2)};
    Ces ces = (Ces) FORM.technology(inputs, new double[] {2, 3, 4}, 0.7, inner, new double[] {0.4});
    assertThat(ces.scale()).isEqualTo(1.2);
    assertThat(ces.rho()).isEqualTo(0.4);
    assertThat(ces.base()).containsExactly(2, 3, 4);
    assertThat(ces.shares()[0]).isCloseTo(0.5, within(1e-15));
    assertThat(ces.shares()[1]).isCloseTo(0.3, within(1e-15));
    assertThat(ces.shares()[2]).isCloseTo(0.2, within(1e-15));
    assertThat(FORM.curvatureNames(inputs)).containsExactly("rho");
  }

  /** Rows in blocks give what the technology gives one mix at a time, over more than one block. */
  @Test
  void rowsAtOnceAreTheTechnologyRowByRow() {
    Random random = new Random(8);
    for (double rho :
        new double[] {
          -1.2, -1, -0.3, -1e-9, 0, 1e-120, 1e-5, 0.7, 12, 4e3, Double.POSITIVE_INFINITY
        }) {
      for (int n = 2; n <= 4; n++) {
        int rows = 700;
        double[][] z = RandomTechnologies.columns(random, n, rows, 1);
        double[] inner = inner(random, n);
        double[] value = new double[rows];
        double[][] derivatives = new double[n + 1][rows];
        FORM.evaluate(z, rows, inner, new double[] {rho}, value, derivatives);
        double[] base = new double[n];
        Arrays.fill(base, 1);
        Technology technology =
            FORM.technology(RandomTechnologies.inputs(n), base, 0, inner, new double[] {rho});
        double[] shares = ((Ces) technology).shares();
        double[] gradient = new double[n + 3];
        double[] apart = new double[2];
        for (int r = 0; r < rows; r++) {
          int row = r;
          double[] at = new double[n];
          Arrays.setAll(at, i -> z[i][row]);
          technology.parameterGradient(at, gradient);
          apart[0] = larger(apart[0], value[r] - technology.logOutput(at));
          apart[0] = larger(apart[0], derivatives[0][r] - gradient[n + 2]);
          apart[1] = larger(apart[1], derivatives[n][r] - gradient[n + 1]);
          for (int i = 0; i < n - 1; i++) {
            // ∂δ_j/∂θ_i carried into the gradient in shares, which is orthogonal to the shares.
            apart[1] = larger(apart[1], derivatives[1 + i][r] - shares[i] * gradient[1 + i]);
          }
        }
        // Same formulas, other order of rounding; values and derivatives of order one to ten.
        assertThat(apart[0]).isLessThan(1e-14);
        assertThat(apart[1]).isLessThan(1e-13);
      }
    }
  }

  /** The larger in size; NaN stays, so that it fails. */
  private static double larger(double before, double difference) {
    return Math.max(before, Math.abs(difference));
  }

  @Test
  void derivativesAreThoseOfTheValue() {
    Random random = new Random(9);
    for (int k = 0; k < 300; k++) {
      int n = 2 + random.nextInt(3);
      double rho = -1.05 + 4 * random.nextDouble();
      double[][] z = RandomTechnologies.columns(random, n, 1, 1);
      double[] all = Arrays.copyOf(inner(random, n), n + 1);
      all[n] = rho;
      double[][] derivatives = new double[n + 1][1];
      FORM.evaluate(z, 1, Arrays.copyOf(all, n), new double[] {rho}, new double[1], derivatives);
      for (int p = 0; p <= n; p++) {
        double numerical =
            TechnologyContract.derivative(
                at -> {
                  double[] value = new double[1];
                  FORM.evaluate(
                      z,
                      1,
                      Arrays.copyOf(at, n),
                      new double[] {at[n]},
                      value,
                      new double[n + 1][1]);
                  return value[0];
                },
                all,
                p,
                1e-3);
        // Truncation h⁴ f⁗/30 with f⁗ under a thousand here: the inputs spread over ±3 in logs.
        assertThat(derivatives[p][0]).isCloseTo(numerical, within(1e-10));
      }
    }
  }

  @Test
  void reportedIsTheJacobianOfTheParameters() {
    Random random = new Random(10);
    for (int k = 0; k < 100; k++) {
      int n = 2 + random.nextInt(3);
      double[] inner = inner(random, n);
      double rho = random.nextGaussian();
      double[] all = new double[n + 2];
      all[0] = random.nextGaussian();
      System.arraycopy(inner, 0, all, 1, n);
      all[n + 1] = rho;
      double[][] jacobian = FORM.reported(inner, new double[] {rho});
      double[] base = new double[n];
      Arrays.fill(base, 1);
      for (int row = 0; row < n + 3; row++) {
        int which = row;
        for (int column = 0; column < n + 2; column++) {
          double numerical =
              TechnologyContract.derivative(
                  at ->
                      FORM.technology(
                              RandomTechnologies.inputs(n),
                              base,
                              at[0],
                              Arrays.copyOfRange(at, 1, n + 1),
                              new double[] {at[n + 1]})
                          .parameters()[which],
                  all,
                  column,
                  1e-3);
          assertThat(jacobian[row][column]).isCloseTo(numerical, within(1e-11));
        }
      }
      assertThat(jacobian[n + 2][1]).isEqualTo(1);
    }
  }

  @Test
  void gridReachesBothEndsAndPassesThroughCobbDouglas() {
    double[] grid = FORM.grid();
    assertThat(grid).hasSizeBetween(25, 33).isSorted().doesNotHaveDuplicates();
    assertThat(grid[0]).isEqualTo(-1);
    assertThat(grid[1]).isBetween(-1.0, -0.99);
    assertThat(FORM.substitution(grid[grid.length - 1])).isCloseTo(0.01, within(1e-15));
    assertThat(Arrays.stream(grid).filter(rho -> rho == 0)).hasSize(1);
    for (double rho : grid) {
      assertThat(FORM.curvature(FORM.substitution(rho))).isCloseTo(rho, within(1e-12));
    }
  }

  @Test
  void substitutionAtTheEndsOfTheRegion() {
    assertThat(FORM.region()).containsExactly(-1, Double.POSITIVE_INFINITY);
    assertThat(FORM.substitution(-1)).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(FORM.substitution(Double.POSITIVE_INFINITY)).isZero();
    assertThat(FORM.curvature(Double.POSITIVE_INFINITY)).isEqualTo(-1);
    assertThat(FORM.curvature(0)).isEqualTo(Double.POSITIVE_INFINITY);
  }

  @Test
  void startIsCobbDouglasWherePossibleAndAdmissibleAlways() {
    double[] start = FORM.starts(new double[] {0.6, 0.3, 0.2}).get(0);
    Ces ces =
        (Ces)
            FORM.technology(
                RandomTechnologies.inputs(3), new double[] {1, 1, 1}, 0, start, new double[] {0});
    double[] e = new double[3];
    ces.logGradient(new double[] {1, 2, 3}, e);
    assertThat(e[0]).isCloseTo(0.6, within(1e-15));
    assertThat(e[1]).isCloseTo(0.3, within(1e-15));
    assertThat(e[2]).isCloseTo(0.2, within(1e-15));
    for (double[] odd :
        new double[][] {
          {1.2, -0.3}, {0, 0}, {-1, -2}, {Double.NaN, 0.5}, {1e-9, 1}, {Double.NaN, Double.NaN}
        }) {
      assertThat(FORM.admissible(FORM.starts(odd).get(0))).as(Arrays.toString(odd)).isTrue();
    }
  }

  @Test
  void runawaySharesAndScaleAreNotAdmissible() {
    assertThat(FORM.admissible(new double[] {1, 0.3, -2})).isTrue();
    assertThat(FORM.admissible(new double[] {0, 0.3, -2})).isFalse();
    assertThat(FORM.admissible(new double[] {-1, 0.3, -2})).isFalse();
    assertThat(FORM.admissible(new double[] {1, 0.3, -40})).isFalse();
    assertThat(FORM.admissible(new double[] {1, 900, 0})).isFalse();
    assertThat(FORM.admissible(new double[] {1, Double.NaN, 0})).isFalse();
    assertThat(FORM.admissible(new double[] {Double.NaN, 0, 0})).isFalse();
  }

  @Test
  void allFormsAreOfferedByName() {
    assertThat(Form.names())
        .containsExactly("cobb-douglas", "ces", "nested-ces", "generalised-leontief", "translog");
    assertThat(Form.named("ces")).isSameAs(FORM);
    assertThatThrownBy(() -> Form.named("cobb"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("cobb-douglas, ces, nested-ces, generalised-leontief, translog");
  }
}

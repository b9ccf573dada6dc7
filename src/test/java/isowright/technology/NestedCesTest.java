package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class NestedCesTest extends TechnologyContract {

  private static final List<String> THREE = List.of("labour", "machines", "energy");
  private static final List<List<String>> GROUPS =
      List.of(List.of("labour", "machines"), List.of("energy"));
  private static final double[][] WITHIN = {{0.6, 0.4}, {1}};
  private static final double[] BETWEEN = {0.8, 0.2};
  private static final double[] BASE = {41000, 20500, 1e-3};
  private static final double[] ONES = {1, 1, 1};

  private static NestedCes three(double rho, double nestRho) {
    return NestedCes.of(
        THREE, BASE, GROUPS, 0.3, WITHIN, BETWEEN, rho, new double[] {nestRho, 0}, 1.1);
  }

  @Override
  List<Technology> technologies() {
    return List.of(
        three(0.8, -0.5),
        three(0, 2),
        three(1.5, 0),
        three(1e-6, -1e-7),
        three(-1, 0.4),
        three(0.4, -1),
        three(6, 3),
        RandomTechnologies.nestedCes(new Random(3), 4),
        RandomTechnologies.nestedCes(new Random(4), 4),
        RandomTechnologies.nestedCes(new Random(5), 3));
  }

  @Override
  double curvature(Technology technology) {
    double largest = 0;
    List<String> names = technology.parameterNames();
    for (int k = 0; k < names.size(); k++) {
      if (names.get(k).startsWith("rho")) {
        largest = Math.max(largest, Math.abs(technology.parameters()[k]));
      }
    }
    return largest;
  }

  @Test
  void parametersInOrder() {
    NestedCes nested = three(0.8, -0.5);
    assertThat(nested.parameterNames())
        .containsExactly(
            "constant",
            "nest-share:labour",
            "nest-share:machines",
            "share:labour+machines",
            "share:energy",
            "rho",
            "rho:labour+machines",
            "scale");
    assertThat(nested.parameters()).containsExactly(0.3, 0.6, 0.4, 0.8, 0.2, 0.8, -0.5, 1.1);
  }

  @Test
  void bothKindsOfSharesAreDividedByTheirSums() {
    Technology moved =
        three(0.8, -0.5).withParameters(new double[] {0.3, 0.7, 0.4, 0.8, 0.7, 0.8, -0.5, 1.1});
    double[] found = moved.parameters();
    assertThat(found[1]).isCloseTo(7 / 11.0, within(1e-15));
    assertThat(found[2]).isCloseTo(4 / 11.0, within(1e-15));
    assertThat(found[3]).isCloseTo(8 / 15.0, within(1e-15));
    assertThat(found[4]).isCloseTo(7 / 15.0, within(1e-15));
  }

  /** [0.8 (0.6 L^0.5 + 0.4 K^0.5)^(−0.8/0.5) + 0.2 E^−0.8]^(−1.1/0.8), by powers. */
  @Test
  void twoStagesByTheDefinition() {
    Technology nested =
        NestedCes.of(THREE, ONES, GROUPS, 0, WITHIN, BETWEEN, 0.8, new double[] {-0.5, 0}, 1.1);
    double composite = Math.pow(0.6 * Math.sqrt(2) + 0.4 * Math.sqrt(3), 2);
    double direct =
        Math.pow(0.8 * Math.pow(composite, -0.8) + 0.2 * Math.pow(1.5, -0.8), -1.1 / 0.8);
    assertThat(nested.output(new double[] {2, 3, 1.5})).isCloseTo(direct, within(1e-14 * direct));
  }

  /** Equal curvatures: CES with the products of shares, its limits included. */
  @Test
  void equalCurvaturesAreCes() {
    Random random = new Random(7);
    for (double rho : new double[] {-1, -0.4, -1e-9, 0, 1e-5, 0.7, 12, Double.POSITIVE_INFINITY}) {
      for (int k = 0; k < 50; k++) {
        double[] shares = {0.48, 0.32, 0.2};
        Technology nested = three(rho, rho);
        Technology ces = Ces.of(THREE, BASE, 0.3, shares, rho, 1.1);
        double[] z = RandomTechnologies.logInputs(random, nested, 1);
        assertThat(nested.logOutput(z)).isCloseTo(ces.logOutput(z), within(2e-14));
        double[] e = new double[3];
        double[] expected = new double[3];
        nested.logGradient(z, e);
        ces.logGradient(z, expected);
        double[][] h = new double[3][3];
        double[][] second = new double[3][3];
        nested.logHessian(z, h);
        ces.logHessian(z, second);
        for (int i = 0; i < 3; i++) {
          assertThat(e[i]).isCloseTo(expected[i], within(1e-13));
          for (int j = 0; j < 3; j++) {
            // Powers carry the rounding of ρ z; the two stages round it apart.
            double size = Math.max(1, rho == Double.POSITIVE_INFINITY ? 1 : rho);
            assertThat(h[i][j]).isCloseTo(second[i][j], within(1e-13 * size * size));
          }
        }
      }
    }
  }

  /** Inside a nest the direct elasticity is σ_g at every mix; Allen's is (σ_g − σ)/P_g + σ. */
  @Test
  void elasticitiesInsideAndBetweenNests() {
    Random random = new Random(8);
    for (int k = 0; k < 500; k++) {
      double rho = RandomTechnologies.curvature(random);
      double nestRho = RandomTechnologies.curvature(random);
      NestedCes nested = three(rho, nestRho);
      double[] z = RandomTechnologies.logInputs(random, nested, 0.5);
      Elasticities found = Elasticities.at(nested, z);
      double inside = 1 / (1 + nestRho);
      double outside = 1 / (1 + rho);
      assertThat(found.hicks(0, 1)).isCloseTo(inside, within(1e-9 * inside));
      double group = (found.output(0) + found.output(1)) / found.scale();
      if (found.substitutionExists() && Math.abs(found.allen(0, 1)) < 100) {
        // Sato (1967), section 3: between groups Allen's elasticity is σ, whatever the mix.
        assertThat(found.allen(0, 2)).isCloseTo(outside, within(1e-8 * Math.max(1, outside)));
        assertThat(found.allen(1, 2)).isCloseTo(outside, within(1e-8 * Math.max(1, outside)));
        double expected = outside + (inside - outside) / group;
        assertThat(found.allen(0, 1))
            .isCloseTo(expected, within(1e-8 * Math.max(1, Math.abs(expected))));
      }
    }
  }

  /** A limit in one stage is what the formula tends to, from both sides where there are two. */
  @Test
  void limitsOfEachStageAreApproached() {
    Random random = new Random(9);
    double[] z = RandomTechnologies.logInputs(random, three(0, 0), 1);
    for (double other : new double[] {-0.5, 0, 1.3}) {
      for (double step : new double[] {1e-4, 1e-7, 1e-10}) {
        double near = 3 * step;
        close(three(step, other), three(0, other), z, near);
        close(three(-step, other), three(0, other), z, near);
        close(three(other, step), three(other, 0), z, near);
        close(three(-1 + step, other), three(-1, other), z, near);
        close(three(other, -1 + step), three(other, -1), z, near);
        close(three(1 / step, other), three(Double.POSITIVE_INFINITY, other), z, near);
        close(three(other, 1 / step), three(other, Double.POSITIVE_INFINITY), z, near);
      }
    }
  }

  private static void close(Technology near, Technology limit, double[] z, double tolerance) {
    assertThat(near.logOutput(z)).isCloseTo(limit.logOutput(z), within(tolerance + 1e-13));
    double[] gradient = new double[3];
    double[] limitGradient = new double[3];
    near.logGradient(z, gradient);
    limit.logGradient(z, limitGradient);
    for (int i = 0; i < 3; i++) {
      assertThat(gradient[i]).isCloseTo(limitGradient[i], within(tolerance + 1e-13));
    }
  }

  @Test
  void leontiefBetweenSmoothNestsIsTheScarcestComposite() {
    NestedCes nested = three(Double.POSITIVE_INFINITY, 0);
    double[] z = nested.base();
    Arrays.setAll(z, i -> Math.log(z[i]) + (i == 2 ? 0.5 : -0.1));
    assertThat(nested.logOutput(z)).isCloseTo(0.3 - 0.11, within(1e-13));
    double[] e = new double[3];
    nested.logGradient(z, e);
    assertThat(e[2]).isZero();
    assertThat(e[0]).isCloseTo(0.66, within(1e-13));
  }

  @Test
  void demandExistsWhereEveryStageIsSmoothOrAllAreAlike() {
    assertThat(three(0.8, -0.5).conditionalDemand()).isPresent();
    assertThat(three(Double.POSITIVE_INFINITY, 1).conditionalDemand()).isEmpty();
    assertThat(three(1, -1).conditionalDemand()).isEmpty();
    assertThat(three(-1, -1).conditionalDemand())
        .hasValueSatisfying(
            demand -> assertThat(demand).isInstanceOf(ConditionalDemand.PerfectSubstitutes.class));
  }

  @Test
  void inadmissibleValuesAreRefusedByName() {
    double[] curvature = {0.5, 0};
    refused(GROUPS, WITHIN, new double[] {0.8, 0.3}, 0.5, curvature, "shares of the groups");
    refused(GROUPS, new double[][] {{0.6, 0.5}, {1}}, BETWEEN, 0.5, curvature, "labour+machines");
    refused(GROUPS, WITHIN, BETWEEN, -1.5, curvature, "rho is -1.5");
    refused(GROUPS, WITHIN, BETWEEN, 1, new double[] {-2, 0}, "rho of labour+machines");
    refused(List.of(List.of("labour", "coal")), WITHIN, BETWEEN, 1, curvature, "coal");
    refused(List.of(List.of("labour", "machines")), WITHIN, BETWEEN, 1, curvature, "energy");
    refused(
        List.of(List.of("labour", "machines"), List.of("energy", "labour")),
        WITHIN,
        BETWEEN,
        1,
        curvature,
        "labour stands twice");
  }

  private static void refused(
      List<List<String>> groups,
      double[][] within,
      double[] between,
      double rho,
      double[] nestRho,
      String what) {
    assertThatThrownBy(() -> NestedCes.of(THREE, ONES, groups, 0, within, between, rho, nestRho, 1))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining(what);
  }
}

package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

class DeltaMethodTest {

  private static final double[][] COVARIANCE = {
    {.04, .001, -.002}, {.001, .0025, -.0005}, {-.002, -.0005, .0036}
  };

  private static final EstimatedTechnology ESTIMATED =
      new EstimatedTechnology(
          CobbDouglas.of(List.of("labour", "machines"), .5, .6, .3), COVARIANCE, 20);

  /**
   * For a linear function the delta method is exact: se² = a′Va, here .0025 + .0036 − 2 × .0005.
   */
  @Test
  void sumOfCoefficients() {
    Estimate estimate =
        DeltaMethod.of(ESTIMATED, .95)
            .estimate(t -> t.parameters()[1] + t.parameters()[2], DeltaMethod.Scale.LINEAR);
    assertThat(estimate.value()).isCloseTo(.9, within(1e-15));
    // A fourth-order difference of a linear function is exact but for rounding.
    assertThat(estimate.standardError()).isCloseTo(Math.sqrt(.0051), within(1e-12));
    // Student's t at 20 degrees of freedom, .975: 2.085963 (any table of the t distribution).
    assertThat(estimate.high() - estimate.value())
        .isCloseTo(2.085963 * Math.sqrt(.0051), within(1e-7));
    assertThat(estimate.level()).isEqualTo(.95);
  }

  /** A curved function: g = exp(θ_0 + θ_1), so ∂g/∂θ = g and se = g √(V_00 + V_11 + 2 V_01). */
  @Test
  void exponentialOnTheLogScale() {
    Estimate estimate =
        DeltaMethod.of(ESTIMATED, .95)
            .estimate(t -> Math.exp(t.parameters()[0] + t.parameters()[1]), DeltaMethod.Scale.LOG);
    double g = Math.exp(1.1);
    double se = g * Math.sqrt(.04 + .0025 + 2 * .001);
    // The step is .01 se of a parameter, so the difference is off by about step^4/30 < 1e-11 of g.
    assertThat(estimate.standardError()).isCloseTo(se, within(1e-9));
    assertThat(estimate.low() * estimate.high()).isCloseTo(g * g, within(1e-9));
    assertThat(estimate.low()).isPositive();
  }

  @Test
  void whatCannotBeEvaluatedBesideTheEstimateHasNoInterval() {
    Technology centre = ESTIMATED.technology();
    Estimate estimate =
        DeltaMethod.of(ESTIMATED, .95)
            .estimate(
                t -> t.parameters()[1] > centre.parameters()[1] ? Double.NaN : 1,
                DeltaMethod.Scale.LINEAR);
    assertThat(estimate.value()).isEqualTo(1);
    assertThat(estimate.standardError()).isNaN();
    assertThat(estimate.low()).isNaN();
  }
}

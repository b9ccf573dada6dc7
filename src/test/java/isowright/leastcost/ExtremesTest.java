package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.Plan.Status;
import isowright.technology.Ces;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Constant-elasticity technologies at the ends of the region, with and without limits. */
class ExtremesTest {

  private static final List<String> NAMES = List.of("labour", "machines", "energy");
  private static final double[] BASE = {10, 20, 30};
  private static final double[] SHARES = {.2, .3, .5};
  private static final double CONSTANT = 2;
  private static final double SCALE = 1.1;
  private static final Question QUESTION = Question.of(100, 3, 5, 4);

  private static Technology ces(double rho) {
    return Ces.of(NAMES, BASE, CONSTANT, SHARES, rho, SCALE);
  }

  private static Plan plan(double rho, Question question) {
    return Minimiser.of(ces(rho)).plan(question);
  }

  /** ln C of near-Leontief lies σ ln(share sums) under the limit: less than 3 σ here. */
  @Test
  void costTendsToFixedProportions() {
    for (Question question : List.of(QUESTION, QUESTION.holding(1, 250))) {
      Plan limit = plan(Double.POSITIVE_INFINITY, question);
      assertThat(limit.optimality()).isLessThan(1e-12);
      for (double rho : new double[] {1e2, 1e4, 1e6, 1e8}) {
        Plan near = plan(rho, question);
        assertThat(near.answered()).as(near.reason()).isTrue();
        assertThat(near.cost()).isCloseTo(limit.cost(), within(3 / rho * limit.cost()));
        // Elasticities answer a mix off by rounding (1e-15 in logs of 5) 1 + ρ times as strongly.
        assertThat(near.optimality()).isLessThan(1e-14 * rho + 1e-12);
      }
    }
  }

  /** Near-linear: marginal cost is that of the cheapest input, up to 3 (1 + ρ) in logs. */
  @Test
  void costTendsToPerfectSubstitutes() {
    for (Question question :
        List.of(QUESTION, QUESTION.holding(1, 250), QUESTION.limiting(0, 0, 90))) {
      Plan limit = plan(-1, question);
      assertThat(limit.optimality()).isLessThan(1e-12);
      for (double distance : new double[] {1e-2, 1e-4, 1e-8, 1e-12}) {
        Plan near = plan(-1 + distance, question);
        double tolerance = 10 * distance + 1e-12;
        assertThat(near.cost()).isCloseTo(limit.cost(), within(tolerance * limit.cost()));
        assertThat(near.marginalCost())
            .isCloseTo(limit.marginalCost(), within(tolerance * limit.marginalCost()));
      }
    }
  }

  @Test
  void inputsThatRoundToZeroAreCorners() {
    Plan plan = plan(-1 + 1e-9, QUESTION);
    assertThat(plan.status()).isEqualTo(Status.CORNER);
    assertThat(plan.mix(1)).isZero();
    assertThat(plan.reason()).contains("so little of machines is taken that it rounds to zero");
    assertThat(plan.optimality()).isLessThan(1e-12);
  }

  /** Cost is smooth in ρ through Cobb-Douglas: slopes on both sides agree. */
  @Test
  void costIsSmoothThroughUnitSubstitution() {
    for (Question question : List.of(QUESTION, QUESTION.holding(1, 250))) {
      double at = plan(0, question).cost();
      for (double step : new double[] {1e-3, 1e-5}) {
        double above = plan(step, question).cost() - at;
        double below = at - plan(-step, question).cost();
        // Slopes differ by the second derivative times the step; rounding is 1e-15 C over the step.
        double tolerance = 20 * at * step * step + 1e-13 * at;
        assertThat(above).isCloseTo(below, within(tolerance));
      }
      assertThat(plan(1e-300, question).cost()).isCloseTo(at, within(1e-14 * at));
    }
  }

  /** With σ > 1 a held input may be more than enough on its own. */
  @Test
  void heldInputAloneMayBeEnough() {
    Question question = QUESTION.holding(2, 1e6);
    for (double rho : new double[] {-1, -.5}) {
      Plan plan = plan(rho, question);
      assertThat(plan.status()).isEqualTo(Status.CORNER);
      assertThat(plan.mix()).containsExactly(0, 0, 1e6);
      assertThat(plan.marginalCost()).isZero();
      assertThat(plan.limitValues()[2]).isEqualTo(-4);
      assertThat(plan.reason()).contains("more than the target");
    }
  }

  @Test
  void tiedLinearInputsShareTheLimit() {
    // worth_i ∝ δ_i/base_i = .02, .015, .0167: prices proportional to worth make all alike.
    Question tied = Question.of(100, 2, 1.5, 5.0 / 3);
    Plan plan = plan(-1, tied);
    assertThat(plan.reason()).contains("labour and machines cost the same");
    Plan limited = plan(-1, tied.limiting(0, 0, 1));
    assertThat(limited.cost()).isCloseTo(plan.cost(), within(1e-11 * plan.cost()));
  }
}

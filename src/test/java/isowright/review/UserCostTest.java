package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** User cost by hand arithmetic; tolerances are rounding alone. */
class UserCostTest {

  /** 100 · (6 % + 10 % − 2 %) = 14, after the formula of Jorgenson 1963 without taxes. */
  @Test
  void withoutTax() {
    assertThat(new UserCost(100, .06, .1, .02, UserCost.Tax.NONE).value())
        .isCloseTo(14.0, within(1e-13));
  }

  /**
   * Hall and Jorgenson 1967: (1 − k − t z)/(1 − t). By hand, t .25, k 0, z .6: (1 − .15)/.75 =
   * 1.13333, so 14 becomes 15.866667; a credit of 7 % takes off .07/.75 of 14, 1.306667.
   */
  @Test
  void withTax() {
    assertThat(new UserCost(100, .06, .1, .02, new UserCost.Tax(.25, 0, .6)).value())
        .isCloseTo(14 * .85 / .75, within(1e-13))
        .isCloseTo(15.866667, within(5e-7));
    assertThat(new UserCost(100, .06, .1, .02, new UserCost.Tax(.25, .07, .6)).value())
        .isCloseTo(15.866667 - 1.306667, within(1e-6));
  }

  /** If depreciation could be written off at once (z = 1), tax would not matter. */
  @Test
  void immediateWriteOffMakesTaxNeutral() {
    for (double t = 0; t < .9; t += .1) {
      assertThat(new UserCost(1, .05, .07, 0, new UserCost.Tax(t, 0, 1)).value())
          .isCloseTo(.12, within(1e-14));
    }
  }

  @Test
  void aPriceThatRisesFasterThanItCostsIsNoPrice() {
    assertThat(new UserCost(100, .03, .05, .12, UserCost.Tax.NONE).value()).isNegative();
  }

  /** 60 h · 50 a unit spread over 1,500 units: 2 a unit on top of 14. */
  @Test
  void ownersServicesBelongToCapital() {
    assertThat(UserCost.withOwner(14, 1500, 60, 50)).isEqualTo(16);
  }
}

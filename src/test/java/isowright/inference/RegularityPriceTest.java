package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.technology.Form;
import org.junit.jupiter.api.Test;

/** The price in fit of regularity and the bounds of its p-value. */
class RegularityPriceTest {

  private static Fit metals(Specification.RegularityImposed where) {
    return Estimation.fit(
        PanelFixtures.primaryMetals(),
        new Specification(
                Form.named("translog"),
                Specification.PlantEffects.NONE,
                Specification.Time.NONE,
                true,
                Specification.StandardErrors.CLASSICAL,
                .95)
            .with(where));
  }

  /** D from imposed-regularity.R: (.708511428976 − .679927245035)/(.679927245035/21). */
  @Test
  void thePriceOfThePrimaryMetals() {
    RegularityPrice price =
        RegularityPrice.of(metals(Specification.RegularityImposed.EVERYWHERE)).orElseThrow();
    assertThat(price.distance()).isCloseTo(.88284, within(1e-5));
    // Half of P(χ²_1 ≥ .88284), and halves of P(χ²_4) and P(χ²_5); R 4.2.2, pchisq.
    assertThat(price.low()).isCloseTo(.17371, within(1e-5));
    assertThat(price.high()).isCloseTo(.949230, within(1e-5));
  }

  /**
   * Kodde and Palm (1986), table of upper bounds at 5 %: 2.706, 5.138, 7.045 for one, two and three
   * inequalities (from memory): the halves of two chi-squared laws.
   */
  @Test
  void theMixtureIsThatOfTheTable() {
    double[] table = {2.706, 5.138, 7.045};
    for (int q = 1; q <= 3; q++) {
      // Three decimals of the table move p by less than 0.00005.
      assertThat(RegularityPrice.atMost(q, table[q - 1])).isCloseTo(.05, within(5e-5));
    }
  }

  @Test
  void aFreeFitHasNone() {
    assertThat(RegularityPrice.of(metals(Specification.RegularityImposed.FREE))).isEmpty();
    assertThat(
            RegularityPrice.of(metals(Specification.RegularityImposed.AT_MEAN)).orElseThrow().low())
        .isEqualTo(1);
  }
}

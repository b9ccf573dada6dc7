package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Tests held against published statistics. */
class HypothesesTest {

  private static Verdict verdict(Fit fit, String name) {
    List<Verdict> verdicts = Hypotheses.of(fit, 1, 1);
    return verdicts.stream().filter(v -> v.name().equals(name)).findFirst().orElseThrow();
  }

  private static Fit fit(Panel panel, String form, Specification.PlantEffects effects) {
    return Estimation.fit(
        panel,
        new Specification(
            Form.named(form),
            effects,
            Specification.Time.NONE,
            false,
            Specification.StandardErrors.CLASSICAL,
            0.95));
  }

  /** Greene (2003), example 6.2: F(1, 24) = .1158, p .7366 (printed digits). */
  @Test
  void constantReturnsInPrimaryMetals() {
    Verdict verdict =
        verdict(
            fit(PanelFixtures.primaryMetals(), "cobb-douglas", Specification.PlantEffects.NONE),
            "constant-returns");
    assertThat(verdict.statistic()).isCloseTo(.1158, within(0.5e-4));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(1.0, 24.0);
    assertThat(verdict.p()).isCloseTo(.7366, within(0.5e-4));
    assertThat(verdict.rejects()).isFalse();
    assertThat(verdict.sentence()).contains("do not speak against", "constant", "0.737");
  }

  /** Greene (2003), example 6.2: F(3, 21) = 1.7678, p .1841. */
  @Test
  void cobbDouglasInTranslogOfPrimaryMetals() {
    Verdict verdict =
        verdict(
            fit(PanelFixtures.primaryMetals(), "translog", Specification.PlantEffects.NONE),
            "cobb-douglas-in-translog");
    assertThat(verdict.statistic()).isCloseTo(1.7678, within(0.5e-4));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(3.0, 21.0);
    assertThat(verdict.p()).isCloseTo(.1841, within(0.5e-4));
  }

  /** Baltagi's US states: F(47, 764) = 75.82 (printed to two decimals). */
  @Test
  void plantEffectsInUsStates() {
    Verdict verdict =
        verdict(
            fit(PanelFixtures.usStates(), "cobb-douglas", Specification.PlantEffects.WITHIN),
            "plant-effects");
    assertThat(verdict.statistic()).isCloseTo(75.82, within(0.5e-2));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(47.0, 764.0);
    assertThat(verdict.rejects()).isTrue();
    assertThat(verdict.sentence()).contains("speak against", "p < 0.001");
  }

  /** Cobb and Douglas (1928): constant returns F .1956, p .663 (R 4.2, printed digits). */
  @Test
  void constantReturnsIn1928() {
    Verdict verdict =
        verdict(
            fit(PanelFixtures.manufacturing1899(), "cobb-douglas", Specification.PlantEffects.NONE),
            "constant-returns");
    assertThat(verdict.statistic()).isCloseTo(.1956, within(0.5e-4));
    assertThat(verdict.p()).isCloseTo(.663, within(0.5e-3));
  }

  /**
   * CES 30 points: likelihood ratio of Cobb-Douglas, N ln(5.005275/1.761076) = 31.34 from the sums
   * of squares that R gives (six decimals each, so the ratio is good to 1e-5).
   */
  @Test
  void unitSubstitutionInCesPoints() {
    Verdict verdict =
        verdict(
            fit(PanelFixtures.cesPoints(), "ces", Specification.PlantEffects.NONE),
            "unit-substitution");
    assertThat(verdict.statistic()).isCloseTo(30 * Math.log(5.005275 / 1.761076), within(1e-4));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(1.0);
    assertThat(verdict.rejects()).isTrue();
  }
}

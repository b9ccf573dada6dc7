package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.PanelReference;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Tests of plants, periods and technical change on the US states, against the published table and
 * against R (see {@link PanelReference}).
 */
class PanelHypothesesTest {

  /** R's normal equations and the difference of two covariances leave some eight digits. */
  private static final double RELATIVE = 1e-6;

  private static final List<Panel> PANELS =
      List.of(PanelFixtures.usStates(), PanelFixtures.usStatesWithHoles());

  private static Fit fit(
      Panel panel, String form, PlantEffects effects, Time time, StandardErrors errors) {
    return Estimation.fit(
        panel, new Specification(Form.named(form), effects, time, true, errors, 0.95));
  }

  private static Optional<Verdict> verdict(Fit fit, String name) {
    return Hypotheses.of(fit, 1, 1).stream().filter(v -> v.name().equals(name)).findFirst();
  }

  /** A test by its name in the reference, and the fit in whose findings it stands. */
  private record Case(
      String reference, String name, PlantEffects effects, Time time, StandardErrors errors) {}

  private record On(Case one, String panel, String form) {
    @Override
    public String toString() {
      return one.reference() + ", " + form + ", " + panel;
    }
  }

  static Stream<On> cases() {
    StandardErrors plain = StandardErrors.CLASSICAL;
    StandardErrors byPlant = StandardErrors.CLUSTERED;
    return Stream.of(
            new Case("plant-effects", "plant-effects", PlantEffects.WITHIN, Time.NONE, plain),
            new Case("plant-variance", "plant-variance", PlantEffects.NONE, Time.NONE, plain),
            new Case("plant-variance", "plant-variance", PlantEffects.RANDOM, Time.NONE, plain),
            new Case("plant-means", "plant-means", PlantEffects.RANDOM, Time.NONE, plain),
            new Case("plant-means", "plant-means", PlantEffects.MUNDLAK, Time.NONE, plain),
            new Case(
                "plant-means-clustered", "plant-means", PlantEffects.RANDOM, Time.NONE, byPlant),
            new Case(
                "period-effects", "period-effects", PlantEffects.WITHIN, Time.TWO_WAY, byPlant),
            new Case("poolability-within", "poolability", PlantEffects.WITHIN, Time.NONE, plain),
            new Case("poolability-pooled", "poolability", PlantEffects.NONE, Time.NONE, plain),
            new Case(
                "serial-correlation",
                "serial-correlation",
                PlantEffects.WITHIN,
                Time.NONE,
                byPlant),
            new Case(
                "serial-correlation",
                "serial-correlation",
                PlantEffects.DIFFERENCES,
                Time.NONE,
                plain),
            new Case(
                "neutral-technical-change",
                "neutral-technical-change",
                PlantEffects.WITHIN,
                Time.BIASED_TREND,
                byPlant))
        .flatMap(
            one ->
                Stream.of("whole", "holes")
                    .flatMap(
                        panel ->
                            Stream.of("cobb-douglas", "translog")
                                .map(form -> new On(one, panel, form))));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("cases")
  void agreesWithReference(On on) {
    Case one = on.one();
    double expected = reference(on.panel(), on.form(), one.reference());
    Fit fit =
        fit(
            PANELS.get(on.panel().equals("whole") ? 0 : 1),
            on.form(),
            one.effects(),
            one.time(),
            one.errors());
    Verdict verdict = verdict(fit, one.name()).orElseThrow();
    assertThat(verdict.statistic()).isCloseTo(expected, within(RELATIVE * expected));
  }

  private static double reference(String panel, String form, String test) {
    return PanelReference.of(panel, form, "test").stream()
        .filter(value -> value.name().equals(test))
        .findFirst()
        .orElseThrow()
        .value();
  }

  /** Baltagi's table: 9.5254 (4 df, p .0492), to the digits printed; from either fit. */
  @Test
  void randomAgainstWithin() {
    for (PlantEffects effects : List.of(PlantEffects.RANDOM, PlantEffects.WITHIN)) {
      Fit fit = fit(PANELS.get(0), "cobb-douglas", effects, Time.NONE, StandardErrors.CLUSTERED);
      Verdict verdict = verdict(fit, "random-against-within").orElseThrow();
      assertThat(verdict.statistic()).isCloseTo(9.5254, within(0.5e-4));
      assertThat(verdict.law()).isEqualTo(new Law.ChiSquared(4));
      assertThat(verdict.p()).isCloseTo(.0492, within(0.5e-4));
      assertThat(verdict.sentence()).contains("speak against", "classical");
    }
  }

  /** With holes and for the translog, against R, which takes the plain inverse as well. */
  @ParameterizedTest
  @CsvSource({"whole, cobb-douglas", "holes, cobb-douglas", "whole, translog"})
  void randomAgainstWithinAgreesWithReference(String panel, String form) {
    Fit fit =
        fit(
            PANELS.get(panel.equals("whole") ? 0 : 1),
            form,
            PlantEffects.RANDOM,
            Time.NONE,
            StandardErrors.CLASSICAL);
    double expected = reference(panel, form, "random-against-within");
    assertThat(verdict(fit, "random-against-within").orElseThrow().statistic())
        .isCloseTo(expected, within(RELATIVE * expected));
  }

  /**
   * With holes the translog gives −10.53, of which R prints the absolute value: a negative number
   * is no draw from a chi-squared law, so there is no p-value.
   */
  @Test
  void aNegativeStatisticIsNone() {
    Fit fit =
        fit(PANELS.get(1), "translog", PlantEffects.RANDOM, Time.NONE, StandardErrors.CLASSICAL);
    Verdict verdict = verdict(fit, "random-against-within").orElseThrow();
    assertThat(verdict.statistic()).isNaN();
    assertThat(verdict.p()).isNaN();
    assertThat(verdict.rejects()).isFalse();
    assertThat(verdict.sentence()).contains("could not be made", "gives no statistic");
  }

  /** Baltagi's table: LM 4135, F for plant effects 75.82 (47, 764), to the digits printed. */
  @Test
  void publishedTests() {
    Fit pooled =
        fit(PANELS.get(0), "cobb-douglas", PlantEffects.NONE, Time.NONE, StandardErrors.CLASSICAL);
    assertThat(verdict(pooled, "plant-variance").orElseThrow().statistic())
        .isCloseTo(4135, within(0.5));
    Fit inside =
        fit(
            PANELS.get(0),
            "cobb-douglas",
            PlantEffects.WITHIN,
            Time.NONE,
            StandardErrors.CLASSICAL);
    Verdict effects = verdict(inside, "plant-effects").orElseThrow();
    assertThat(effects.statistic()).isCloseTo(75.82, within(0.5e-2));
    assertThat(effects.law()).isEqualTo(new Law.F(47, 764));
  }

  /**
   * The published 9.5254 itself rests on a difference that is not positive definite (R's smallest
   * eigenvalue in units of the standard errors within states is −0.00034); the verdict says so, and
   * the test of plant means stands beside it.
   */
  @Test
  void aDifferenceThatIsNotPositiveDefiniteIsSaid() {
    Fit fit =
        fit(
            PANELS.get(0),
            "cobb-douglas",
            PlantEffects.WITHIN,
            Time.NONE,
            StandardErrors.CLASSICAL);
    Verdict verdict = verdict(fit, "random-against-within").orElseThrow();
    assertThat(verdict.sentence())
        .contains("not positive definite", "generalised inverse", "plant means");
    assertThat(verdict(fit, "plant-means")).isPresent();
  }

  /** Which tests a fit carries depends on what it does about plants. */
  @Test
  void eachTreatmentHasItsTests() {
    assertThat(names(PlantEffects.NONE))
        .containsExactly("plant-variance", "poolability", "serial-correlation");
    assertThat(names(PlantEffects.WITHIN))
        .containsExactly(
            "plant-effects",
            "random-against-within",
            "plant-means",
            "poolability",
            "serial-correlation");
    assertThat(names(PlantEffects.RANDOM))
        .containsExactly(
            "plant-variance", "random-against-within", "plant-means", "serial-correlation");
    assertThat(names(PlantEffects.MUNDLAK)).containsExactly("plant-means", "serial-correlation");
    assertThat(names(PlantEffects.DIFFERENCES)).containsExactly("serial-correlation");
    assertThat(names(PlantEffects.BETWEEN)).isEmpty();
  }

  private static List<String> names(PlantEffects effects) {
    Fit fit = fit(PANELS.get(0), "cobb-douglas", effects, Time.NONE, StandardErrors.CLASSICAL);
    return Hypotheses.of(fit, 1, 1).stream()
        .map(Verdict::name)
        .filter(name -> !name.equals("constant-returns"))
        .toList();
  }

  /** A cross-section has neither plants nor periods to be tested. */
  @Test
  void aCrossSectionHasNone() {
    Fit fit =
        fit(
            PanelFixtures.primaryMetals(),
            "cobb-douglas",
            PlantEffects.NONE,
            Time.NONE,
            StandardErrors.CLASSICAL);
    assertThat(PanelHypotheses.of(fit)).isEmpty();
  }
}

package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * CES against translog on published points and on the demo's records, held against R ({@code
 * src/test/resources/reference/comparisons.R}).
 */
class FormComparisonTest {

  private static final ReferenceValues REFERENCE = ReferenceValues.of("comparisons.csv");

  private static Fit fit(Panel panel, String form, PlantEffects effects, StandardErrors errors) {
    Specification.Time time =
        panel.periods().size() > 1 ? Specification.Time.TREND : Specification.Time.NONE;
    return Estimation.fit(
        panel, new Specification(Form.named(form), effects, time, true, errors, 0.95));
  }

  private static FormComparison comparison(String name) {
    boolean points = name.equals("points");
    Panel panel = points ? PanelFixtures.cesPoints() : PanelFixtures.glassworks();
    PlantEffects effects = points ? PlantEffects.NONE : PlantEffects.WITHIN;
    StandardErrors errors = points ? StandardErrors.CLASSICAL : StandardErrors.CLUSTERED;
    return FormComparison.of(
            fit(panel, "ces", effects, errors), fit(panel, "translog", effects, errors))
        .orElseThrow();
  }

  @ParameterizedTest
  @CsvSource({"points", "glassworks"})
  void statisticsAgreeWithTheReference(String name) {
    FormComparison comparison = comparison(name);
    assertThat(comparison.verdicts()).extracting(Verdict::name).isEqualTo(FormComparison.NAMES);
    for (Verdict verdict : comparison.verdicts()) {
      double[] reference = REFERENCE.numbers(name, verdict.name());
      // Statistics are not at a minimum: an error of the CES parameters enters once, and both
      // searches stop at steps of some 1e-9 standard errors in a flat valley.
      assertThat(verdict.statistic())
          .as(name + " " + verdict.name())
          .isCloseTo(reference[0], withinPercentage(1e-3));
      // Both p-values of a weighted sum are frequencies: errors .0036 (20,000 draws) and .0012.
      double error = verdict.name().equals("vuong-alike") ? 3 * .0038 : 1e-5;
      assertThat(verdict.p()).as("p of " + verdict.name()).isCloseTo(reference[1], within(error));
    }
  }

  @Test
  void theSumOfWeightsAgrees() {
    for (String name : List.of("points", "glassworks")) {
      Law law = comparison(name).verdicts().get(0).law();
      double sum =
          ((Law.WeightedSum) law).weights().stream().mapToDouble(Double::doubleValue).sum();
      assertThat(sum)
          .as(name)
          .isCloseTo(REFERENCE.numbers(name, "weights")[0], withinPercentage(1e-3));
    }
  }

  /** p .27: the points cannot tell the two forms apart, and the words say so. */
  @Test
  void wordsFollowTheNumbers() {
    assertThat(comparison("points").words())
        .contains("cannot tell ces and translog apart", "neither misses anything");
    assertThat(comparison("glassworks").words()).contains("cannot tell", "neither misses anything");
  }

  @Test
  void aFormIsNotComparedWithOneItContains() {
    Form cobbDouglas = Form.named("cobb-douglas");
    Form ces = Form.named("ces");
    Form translog = Form.named("translog");
    Form nested = Form.named("nested-ces");
    assertThat(FormComparison.contains(translog, cobbDouglas)).isTrue();
    assertThat(FormComparison.contains(ces, cobbDouglas)).isTrue();
    assertThat(FormComparison.contains(nested, ces)).isTrue();
    assertThat(FormComparison.contains(cobbDouglas, translog)).isFalse();
    assertThat(FormComparison.contains(ces, translog)).isFalse();
    assertThat(FormComparison.contains(translog, ces)).isFalse();
    assertThat(FormComparison.contains(Form.named("generalised-leontief"), cobbDouglas)).isFalse();
    Panel panel = PanelFixtures.cesPoints();
    List<Fit> fits =
        List.of(
            fit(panel, "cobb-douglas", PlantEffects.NONE, StandardErrors.CLASSICAL),
            fit(panel, "ces", PlantEffects.NONE, StandardErrors.CLASSICAL),
            fit(panel, "translog", PlantEffects.NONE, StandardErrors.CLASSICAL));
    assertThat(FormComparison.all(fits))
        .singleElement()
        .satisfies(c -> assertThat(c.first() + c.second()).isEqualTo("cestranslog"));
  }

  /** Without an admissible optimum there is nothing to compare. */
  @Test
  void primaryMetalsHaveNoCesToCompare() {
    Panel panel = PanelFixtures.primaryMetals();
    assertThat(
            FormComparison.of(
                fit(panel, "ces", PlantEffects.NONE, StandardErrors.CLASSICAL),
                fit(panel, "translog", PlantEffects.NONE, StandardErrors.CLASSICAL)))
        .isEmpty();
  }
}

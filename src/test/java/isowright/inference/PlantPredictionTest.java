package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.PlantFolds;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Prediction of plants that were not seen, against R and by what must hold. */
class PlantPredictionTest {

  private static final ReferenceValues REFERENCE = ReferenceValues.of("comparisons.csv");

  private static Fit fit(Panel panel, String form, PlantEffects effects, Time time) {
    return Estimation.fit(
        panel,
        new Specification(
            Form.named(form), effects, time, true, Specification.StandardErrors.CLASSICAL, .95));
  }

  /** US states, ten folds (R, by lm with a constant for each state): direct solutions. */
  @ParameterizedTest
  @EnumSource(names = {"NONE", "WITHIN"})
  void errorsAgreeWithTheReference(PlantEffects effects) {
    Panel panel = PanelFixtures.usStates();
    List<PlantPrediction> predictions =
        PlantPrediction.of(
            List.of(
                fit(panel, "cobb-douglas", effects, Time.NONE),
                fit(panel, "translog", effects, Time.NONE)),
            .95);
    assertThat(predictions).hasSize(2);
    for (PlantPrediction prediction : predictions) {
      String name =
          "prediction-"
              + prediction.form()
              + (effects == PlantEffects.NONE ? "-pooled" : "-within");
      assertThat(prediction.ofChanges()).isTrue();
      assertThat(prediction.error())
          .as(name)
          .isCloseTo(REFERENCE.numbers(name, "changes")[0], withinPercentage(1e-6));
      assertThat(prediction.spread())
          .isCloseTo(REFERENCE.numbers("prediction", "spread")[0], withinPercentage(1e-6));
      assertThat(prediction.levelError().isPresent()).isEqualTo(effects == PlantEffects.NONE);
      if (effects == PlantEffects.NONE) {
        assertThat(prediction.levelError().orElseThrow())
            .isCloseTo(REFERENCE.numbers(name, "levels")[0], withinPercentage(1e-6));
      }
      assertThat(prediction.plants()).isEqualTo(48);
      assertThat(prediction.failed()).isZero();
    }
  }

  /** The least error has no difference; the other one's is the difference of the squares. */
  @Test
  void theOtherFormsAreHeldAgainstTheBest() {
    Panel panel = PanelFixtures.glassworks();
    List<PlantPrediction> predictions =
        PlantPrediction.of(
            List.of(
                fit(panel, "cobb-douglas", PlantEffects.WITHIN, Time.TREND),
                fit(panel, "ces", PlantEffects.WITHIN, Time.TREND),
                fit(panel, "translog", PlantEffects.WITHIN, Time.TREND)),
            .95);
    PlantPrediction best =
        predictions.stream().filter(p -> p.difference().isEmpty()).findFirst().orElseThrow();
    for (PlantPrediction prediction : predictions) {
      if (prediction != best) {
        assertThat(prediction.difference().orElseThrow().value())
            .isCloseTo(
                prediction.error() * prediction.error() - best.error() * best.error(),
                within(1e-12));
      }
      assertThat(prediction.error()).isLessThan(prediction.spread());
    }
  }

  /**
   * A plant that is added to the records twice over leaves the errors of the others' folds alone.
   */
  @Test
  void rowsWithoutPlantsAreDealtOutOneByOne() {
    Panel panel = PanelFixtures.primaryMetals();
    List<PlantPrediction> predictions =
        PlantPrediction.of(
            List.of(
                fit(panel, "cobb-douglas", PlantEffects.NONE, Time.NONE),
                fit(panel, "translog", PlantEffects.NONE, Time.NONE)),
            .9);
    assertThat(predictions).hasSize(2).allMatch(p -> !p.ofChanges() && p.levelError().isPresent());
    assertThat(predictions).allMatch(p -> p.error() == p.levelError().orElseThrow());
  }

  @Test
  void aSingleFormIsHeldAgainstNothing() {
    Panel panel = PanelFixtures.primaryMetals();
    Fit one = fit(panel, "cobb-douglas", PlantEffects.NONE, Time.NONE);
    assertThat(PlantFolds.of(one, 10)).isPresent();
    assertThat(PlantPrediction.of(List.of(one), .95)).isEmpty();
  }
}

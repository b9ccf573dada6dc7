package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.VarianceComponents.Method;
import isowright.technology.Form;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** What the records cannot carry is refused with the reason and a remedy. */
class ObstaclesTest {

  private static final Panel DRAWN = RandomPanels.draw(21, 12, 6, 0, 0);

  private static Fit fit(Panel panel, String form, PlantEffects effects, Time time) {
    return Estimation.fit(
        panel,
        new Specification(Form.named(form), effects, time, true, StandardErrors.ROBUST, .95));
  }

  private static String refused(Fit fit) {
    assertThat(fit.state()).isEqualTo(Fit.State.REFUSED);
    assertThat(fit.solution()).isEmpty();
    assertThat(fit.reasons()).hasSize(1);
    return fit.reasons().get(0);
  }

  /** Some rows of the panel. */
  private static Panel rows(java.util.function.IntPredicate keep) {
    int[] kept = IntStream.range(0, DRAWN.rows()).filter(keep).toArray();
    return PanelFixtures.panel(
        Arrays.stream(kept).map(DRAWN::plantOf).toArray(),
        Arrays.stream(kept).map(r -> 2010 + DRAWN.rowPeriods().get(r)).toArray(),
        Arrays.stream(kept).mapToDouble(DRAWN.output()::get).toArray(),
        RandomPanels.INPUTS,
        DRAWN.quantities().stream()
            .map(column -> Arrays.stream(kept).mapToDouble(column::get).toArray())
            .toList(),
        List.of(),
        List.of());
  }

  @ParameterizedTest
  @EnumSource(value = PlantEffects.class, names = "NONE", mode = EnumSource.Mode.EXCLUDE)
  void onePlant(PlantEffects effects) {
    Panel one = rows(r -> DRAWN.plantOf(r) == 0);
    assertThat(refused(fit(one, "cobb-douglas", effects, Time.NONE)))
        .contains("at least two plants", "the records have 1", "Set plant-effects to none");
  }

  @ParameterizedTest
  @EnumSource(value = PlantEffects.class, names = "NONE", mode = EnumSource.Mode.EXCLUDE)
  void onePeriod(PlantEffects effects) {
    Panel one = rows(r -> DRAWN.rowPeriods().get(r) == 0);
    assertThat(refused(fit(one, "cobb-douglas", effects, Time.NONE)))
        .contains("more than one period", "a single row", "add periods");
  }

  @Test
  void timeInOnePeriod() {
    Panel one = rows(r -> DRAWN.rowPeriods().get(r) == 0);
    assertThat(refused(fit(one, "cobb-douglas", PlantEffects.NONE, Time.BIASED_TREND)))
        .contains("single period (2010)", "Set time to none");
    Panel two = rows(r -> DRAWN.rowPeriods().get(r) < 2);
    assertThat(refused(fit(two, "cobb-douglas", PlantEffects.NONE, Time.QUADRATIC_TREND)))
        .contains("three periods", "have 2", "Set time to trend");
  }

  /** Every second period of each plant: nothing to difference, although plants are seen thrice. */
  @Test
  void onlyGaps() {
    Panel gaps = rows(r -> (DRAWN.rowPeriods().get(r) + DRAWN.plantOf(r)) % 2 == 0);
    assertThat(refused(fit(gaps, "cobb-douglas", PlantEffects.DIFFERENCES, Time.NONE)))
        .contains("no difference is taken across a gap", "Set plant-effects to within");
  }

  @Test
  void morePlantsAreNeededBetween() {
    Panel few = rows(r -> DRAWN.plantOf(r) < 5);
    assertThat(refused(fit(few, "translog", PlantEffects.BETWEEN, Time.NONE)))
        .contains("5 plants (one mean each) cannot carry 6 parameters", "within");
    assertThat(refused(fit(few, "translog", PlantEffects.RANDOM, Time.NONE)))
        .contains("5 plants (one mean each)", "wallace-hussain", "within");
    Fit other =
        Estimation.fit(
            few,
            new Specification(
                    Form.named("translog"),
                    PlantEffects.RANDOM,
                    Time.NONE,
                    true,
                    StandardErrors.ROBUST,
                    .95)
                .with(Method.WALLACE_HUSSAIN));
    assertThat(other.state()).as("the remedy is one").isEqualTo(Fit.State.ESTIMATED);
  }

  @Test
  void tooFewDifferences() {
    Panel few = rows(r -> DRAWN.plantOf(r) < 2 && DRAWN.rowPeriods().get(r) < 3);
    assertThat(refused(fit(few, "translog", PlantEffects.DIFFERENCES, Time.NONE)))
        .contains("4 differences of rows cannot carry 5 parameters");
  }

  @Test
  void nothingIsLeftWithinPlants() {
    Panel few = rows(r -> DRAWN.plantOf(r) < 7 && DRAWN.rowPeriods().get(r) < 1 || r < 3);
    assertThat(refused(fit(few, "translog", PlantEffects.RANDOM, Time.NONE)))
        .contains("variance within plants cannot be estimated", "9 rows of 7 plants");
  }

  @Test
  void betweenKnowsNoTime() {
    assertThat(refused(fit(DRAWN, "cobb-douglas", PlantEffects.BETWEEN, Time.TREND)))
        .contains("no change over time is left", "Set time to none");
    assertThat(refused(fit(DRAWN, "cobb-douglas", PlantEffects.RANDOM, Time.TWO_WAY)))
        .contains("plant-effects must be within, not random", "period-effects");
  }

  /** A form that is not linear says so and names what it takes; the rest of a study goes on. */
  @Test
  void aCurvedFormTakesPooledAndWithin() {
    for (PlantEffects effects : PlantEffects.values()) {
      Fit fit = fit(DRAWN, "ces", effects, Time.NONE);
      if (effects.anyForm()) {
        assertThat(fit.state()).isNotEqualTo(Fit.State.REFUSED);
      } else {
        assertThat(refused(fit))
            .contains("ces is not linear", effects.word(), "within or none", "translog");
      }
    }
    assertThat(refused(fit(DRAWN, "ces", PlantEffects.WITHIN, Time.BIASED_TREND)))
        .contains("biased trend", "trend or quadratic-trend");
  }

  /** A control that never varies within a plant: fine for random effects, and said otherwise. */
  @Test
  void aControlThatDoesNotVaryWithinPlants() {
    Panel controlled = withControl(r -> DRAWN.plantOf(r) % 3);
    Fit random = fit(controlled, "cobb-douglas", PlantEffects.RANDOM, Time.NONE);
    assertThat(random.state()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(random.numbers().index("control:site")).isPositive();
    Fit mundlak = fit(controlled, "cobb-douglas", PlantEffects.MUNDLAK, Time.TREND);
    assertThat(mundlak.state()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(mundlak.numbers().treatment().leftOut()).containsExactly("control:site");
    assertThat(mundlak.numbers().names())
        .contains("mean:labour", "mean:machines")
        .doesNotContain("mean:control:site", "mean:trend");
    for (PlantEffects effects : List.of(PlantEffects.WITHIN, PlantEffects.DIFFERENCES)) {
      Fit inside = fit(controlled, "cobb-douglas", effects, Time.NONE);
      assertThat(inside.state()).isEqualTo(Fit.State.RANK_DEFICIENT);
      assertThat(inside.reasons().get(0)).contains("control:site", "the plant effects");
    }
    Fit amemiya = Estimation.fit(controlled, random.specification().with(Method.AMEMIYA));
    assertThat(refused(amemiya)).contains("control:site does not vary", "swamy-arora");
  }

  private static Panel withControl(java.util.function.IntToDoubleFunction control) {
    int rows = DRAWN.rows();
    List<double[]> quantities = new ArrayList<>();
    DRAWN.quantities().forEach(column -> quantities.add(column.toArray()));
    return PanelFixtures.panel(
        IntStream.range(0, rows).map(DRAWN::plantOf).toArray(),
        IntStream.range(0, rows).map(r -> 2010 + DRAWN.rowPeriods().get(r)).toArray(),
        DRAWN.output().toArray(),
        RandomPanels.INPUTS,
        quantities,
        List.of("site"),
        List.of(IntStream.range(0, rows).mapToDouble(control::applyAsDouble).toArray()));
  }

  /** Two-way within is plant effects with period effects, for a curved form too. */
  @Test
  void twoWayIsPlantAndPeriodEffects() {
    for (String form : List.of("cobb-douglas", "ces")) {
      Solution two = fit(DRAWN, form, PlantEffects.WITHIN, Time.TWO_WAY).numbers();
      Solution both = fit(DRAWN, form, PlantEffects.WITHIN, Time.PERIOD_EFFECTS).numbers();
      assertThat(two.names()).isEqualTo(both.names());
      assertThat(two.parameters()).isEqualTo(both.parameters());
    }
  }
}

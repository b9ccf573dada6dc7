package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Form;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Technologies by two-stage least squares: 48 US states against R 4.2.2 with AER 1.2.10 ({@code
 * reference/instrumented-technologies.R}), and what is said where the records cannot carry it.
 */
class InstrumentsTest {

  /** Both solve small well-scaled systems, the translog with a condition number of some 1e4. */
  private static final double AGREEMENT = 1e-7;

  private static final Path REFERENCE =
      Path.of("src/test/resources/reference/instrumented-technologies.csv");

  private static Specification specification(
      String form, PlantEffects effects, Time time, Estimator estimator) {
    return new Specification(Form.named(form), effects, time, false, StandardErrors.CLUSTERED, 0.95)
        .by(estimator);
  }

  private static Estimator.Instruments by(String input, Series... series) {
    return new Estimator.Instruments(Map.of(input, List.of(series)));
  }

  private static final Estimator LAG_OF_EMPLOYMENT = by("emp", Series.lagged("emp", 1));

  private static Fit states(String model) {
    return switch (model) {
      case "pooled" ->
          Estimation.fit(
              PanelFixtures.usStates(),
              specification("cobb-douglas", PlantEffects.NONE, Time.NONE, LAG_OF_EMPLOYMENT));
      case "within-periods" ->
          Estimation.fit(
              PanelFixtures.usStates(),
              specification("cobb-douglas", PlantEffects.WITHIN, Time.TWO_WAY, LAG_OF_EMPLOYMENT));
      case "differences" ->
          Estimation.fit(
              PanelFixtures.usStates(),
              specification(
                  "cobb-douglas", PlantEffects.DIFFERENCES, Time.NONE, LAG_OF_EMPLOYMENT));
      default ->
          Estimation.fit(
              PanelFixtures.usStatesOfTwoInputs(),
              specification("translog", PlantEffects.NONE, Time.NONE, LAG_OF_EMPLOYMENT));
    };
  }

  @ParameterizedTest
  @ValueSource(strings = {"pooled", "within-periods", "translog", "differences"})
  void againstR(String model) throws IOException {
    Fit fit = states(model);
    assertThat(fit.state()).as(fit.reasons().toString()).isEqualTo(Fit.State.ESTIMATED);
    Solution numbers = fit.numbers();
    int compared = 0;
    for (String line : Files.readAllLines(REFERENCE)) {
      String[] parts = line.split(",");
      if (parts[0].equals(model)) {
        int k = numbers.index(parts[1]);
        double value = Double.parseDouble(parts[2]);
        double error = Double.parseDouble(parts[3]);
        assertThat(numbers.parameters()[k])
            .as(parts[1])
            .isCloseTo(value, within(AGREEMENT * Math.abs(value)));
        assertThat(Math.sqrt(numbers.covariance()[k][k]))
            .as("error of " + parts[1])
            .isCloseTo(error, within(AGREEMENT * error));
        compared++;
      }
    }
    assertThat(compared).isGreaterThanOrEqualTo(4);
    assertThat(numbers.residuals()).hasSize(816);
  }

  @Test
  void theFirstPeriodHasNoLagAndStandsAtTheNext() {
    Fit fit = states("within-periods");
    Particulars.OfInstruments particulars = (Particulars.OfInstruments) fit.numbers().particulars();
    assertThat(particulars.rowsUnknown()).isEqualTo(48);
    assertThat(particulars.periodsUnknown()).containsExactly("1970");
    assertThat(particulars.series()).containsExactly("lag ln emp");
    int next = fit.numbers().index("period:1971");
    assertThat(fit.numbers().parameters()[next]).isZero();
    assertThat(fit.numbers().covariance()[next][next]).isZero();
    assertThat(fit.at(0, new Productivity.Typical()).technology().parameters())
        .isEqualTo(fit.at(1, new Productivity.Typical()).technology().parameters());
  }

  @Test
  void everySecondOrderTermOfAnEndogenousInputHasItsInstrument() {
    Fit fit = states("translog");
    Particulars.OfInstruments particulars = (Particulars.OfInstruments) fit.numbers().particulars();
    assertThat(particulars.fit().endogenous()).containsExactly("emp", "pc*emp", "emp*emp");
    assertThat(particulars.fit().instruments())
        .containsExactly("lag emp", "pc*lag emp", "lag emp*lag emp");
    Map<String, List<Series>> both = new LinkedHashMap<>();
    both.put("pc", List.of(Series.lagged("pc", 1), Series.lagged("pc", 2)));
    both.put("emp", List.of(Series.lagged("emp", 1)));
    Fit second =
        Estimation.fit(
            PanelFixtures.usStatesOfTwoInputs(),
            specification(
                "translog", PlantEffects.NONE, Time.TREND, new Estimator.Instruments(both)));
    Particulars.OfInstruments ofBoth = (Particulars.OfInstruments) second.numbers().particulars();
    assertThat(ofBoth.fit().endogenous())
        .containsExactly("pc", "emp", "pc*pc", "pc*emp", "emp*emp");
    assertThat(ofBoth.fit().instruments())
        .containsExactly(
            "lag pc",
            "lag emp",
            "lag pc*lag pc",
            "lag pc*lag emp",
            "lag emp*lag emp",
            "lag 2 pc",
            "lag 2 pc*lag 2 pc",
            "lag 2 pc*lag emp");
  }

  @Test
  void unitsOfInputsDoNotMatter() {
    Fit raw = states("translog");
    Fit scaled =
        Estimation.fit(
            PanelFixtures.usStatesOfTwoInputs(),
            new Specification(
                    Form.named("translog"),
                    PlantEffects.NONE,
                    Time.NONE,
                    true,
                    StandardErrors.CLUSTERED,
                    0.95)
                .by(LAG_OF_EMPLOYMENT));
    double[] at = raw.meanLogInputs();
    double[] first = new double[2];
    double[] other = new double[2];
    raw.typical().technology().logGradient(at, first);
    scaled.typical().technology().logGradient(at, other);
    assertThat(other).containsExactly(first, within(1e-8));
  }

  @Test
  void whatTheRecordsCannotCarryIsSaid() {
    Panel states = PanelFixtures.usStates();
    assertThat(refused(states, PlantEffects.NONE, Time.NONE, by("emp", Series.of("rainfall"))))
        .contains("The records hold no column rainfall")
        .contains("Name a column that they have");
    assertThat(refused(states, PlantEffects.RANDOM, Time.NONE, LAG_OF_EMPLOYMENT))
        .contains("plant-effects: random")
        .contains("Set plant-effects to none, within or differences");
    assertThat(refused(states, PlantEffects.NONE, Time.BIASED_TREND, LAG_OF_EMPLOYMENT))
        .contains("biased trend")
        .contains("Set time to quadratic-trend");
    assertThat(refused(states, PlantEffects.NONE, Time.NONE, by("emp", Series.lagged("emp", 17))))
        .contains("No row has all instruments known (lag 17 ln emp)")
        .contains("Use shorter lags");
    assertThat(
            refused(
                PanelFixtures.primaryMetals(),
                PlantEffects.NONE,
                Time.NONE,
                by("labour", Series.lagged("labour", 1))))
        .contains("the records have a single period (all)");
    // As many instruments as inputs, but both say the same.
    Map<String, List<Series>> same = new LinkedHashMap<>();
    same.put("pc", List.of(Series.lagged("emp", 1)));
    same.put("emp", List.of(Series.lagged("emp", 1)));
    assertThat(refused(states, PlantEffects.NONE, Time.NONE, new Estimator.Instruments(same)))
        .contains("The instruments (lag ln emp) do not move pc, emp apart")
        .contains("Name more instruments");
    // With as many rows as plants a lag leaves one row a plant, and plant effects take it.
    Panel two = PanelFixtures.usStatesIn(List.of("1970", "1971"));
    assertThat(refused(two, PlantEffects.WITHIN, Time.NONE, LAG_OF_EMPLOYMENT))
        .contains("48 rows with all instruments known cannot carry")
        .contains("plant effects among them");
  }

  @Test
  void aFormThatIsNotLinearIsRefused() {
    assertThat(
            Estimation.fit(
                    PanelFixtures.usStates(),
                    specification("ces", PlantEffects.NONE, Time.NONE, LAG_OF_EMPLOYMENT))
                .reasons()
                .get(0))
        .contains("ces")
        .contains("instruments")
        .contains("ask for cobb-douglas or translog");
  }

  @Test
  void logsMayBeDeclinedButNotForced() {
    Panel states = PanelFixtures.usStates();
    Fit plain =
        Estimation.fit(
            states,
            specification(
                "cobb-douglas",
                PlantEffects.NONE,
                Time.NONE,
                by("emp", new Series("emp", 1, Optional.of(false)))));
    // The quantity of an input always enters in logs, as in the technology.
    assertThat(((Particulars.OfInstruments) plain.numbers().particulars()).series())
        .containsExactly("lag ln emp");
  }

  private static String refused(Panel panel, PlantEffects effects, Time time, Estimator estimator) {
    Fit fit = Estimation.fit(panel, specification("cobb-douglas", effects, time, estimator));
    assertThat(fit.state()).isEqualTo(Fit.State.REFUSED);
    return String.join(" ", fit.reasons());
  }
}

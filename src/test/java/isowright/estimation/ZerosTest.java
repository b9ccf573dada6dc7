package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Keep;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Roles;
import isowright.records.Source;
import isowright.technology.Form;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Inputs that some rows do not use, on invented brickyards of which some burn no fuel, against lm
 * of R ({@code src/test/resources/reference/zeros.R}; the head of the file of values names the
 * version): dummies written out by hand, logs of max(x, D).
 */
class ZerosTest {

  private static final Path REFERENCE = Path.of("src/test/resources/reference");

  private static Panel brickyards(boolean keepsZeros) throws RecordsRefused {
    return RecordsReader.read(
            new Source(REFERENCE.resolve("brickyards.csv"), Optional.empty(), Optional.empty()),
            new Roles(
                    Optional.of("plant"),
                    Optional.of("year"),
                    "bricks",
                    Optional.empty(),
                    List.of(
                        input("labour", "hours", "wage", Optional.empty()),
                        input("machines", "machine_hours", "rental", Optional.empty()),
                        new Roles.Input(
                            "fuel",
                            "fuel",
                            Optional.empty(),
                            Optional.of("fuel_cost"),
                            Optional.empty())),
                    List.of(),
                    Optional.empty(),
                    Optional.empty())
                .keepingZeros(keepsZeros),
            Keep.ALL)
        .panel();
  }

  private static Roles.Input input(
      String name, String quantity, String price, Optional<String> spending) {
    return new Roles.Input(name, quantity, Optional.of(price), spending, Optional.empty());
  }

  private static Fit fit(boolean keeps, String form, PlantEffects effects, boolean scaled)
      throws RecordsRefused {
    return Estimation.fit(
        brickyards(keeps),
        new Specification(
            Form.named(form), effects, Time.TREND, scaled, StandardErrors.CLASSICAL, 0.95));
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource({
    "pooled, cobb-douglas, NONE, true, true",
    "within, cobb-douglas, WITHIN, true, true",
    "undivided, cobb-douglas, NONE, false, true",
    "translog, translog, NONE, true, true",
    "drop, cobb-douglas, NONE, true, false"
  })
  void isWhatRegressionByHandGives(
      String name, String form, PlantEffects effects, boolean scaled, boolean keeps)
      throws Exception {
    Fit fit = fit(keeps, form, effects, scaled);
    assertThat(fit.reasons()).isEmpty();
    Solution numbers = fit.numbers();
    int compared = 0;
    for (String line : Files.readAllLines(REFERENCE.resolve("zeros.csv"))) {
      String[] cells = line.split(",");
      if (!cells[0].equals(name)) {
        continue;
      }
      int k = numbers.names().indexOf(cells[1]);
      assertThat(k).as(cells[1] + " among " + numbers.names()).isNotNegative();
      double value = Double.parseDouble(cells[2]);
      double error = Double.parseDouble(cells[3]);
      // 14 digits are written; the largest condition number among the regressors (the undivided
      // logs with their constant) is some 1e3, so that both programs keep twelve of sixteen.
      assertThat(numbers.parameters()[k]).as(line).isCloseTo(value, within(1e-10 * error));
      assertThat(Math.sqrt(numbers.covariance()[k][k])).as(line).isCloseTo(error, within(1e-10));
      compared++;
    }
    assertThat(compared).isGreaterThan(3);
  }

  /**
   * In a Cobb-Douglas technology it makes no difference what takes the place of the log of zero:
   * the dummy takes it up. Dividing inputs or not moves the dummy by β ln g and nothing else.
   */
  @Test
  void theDummyTakesUpWhatTakesThePlaceOfTheLog() throws Exception {
    Fit divided = fit(true, "cobb-douglas", PlantEffects.NONE, true);
    Fit undivided = fit(true, "cobb-douglas", PlantEffects.NONE, false);
    double[] one = divided.numbers().parameters();
    double[] other = undivided.numbers().parameters();
    List<String> names = divided.numbers().names();
    int fuel = names.indexOf("fuel");
    int dummy = names.indexOf("zero:fuel");
    double g = divided.base()[2];
    assertThat(other[dummy] - one[dummy]).isCloseTo(one[fuel] * Math.log(g), within(1e-10));
    for (int k = 1; k < one.length; k++) {
      if (k != dummy) {
        assertThat(other[k]).isCloseTo(one[k], within(1e-12 * 1e2)); // the condition number above
      }
    }
    assertThat(undivided.numbers().linear().ssr())
        .isCloseTo(divided.numbers().linear().ssr(), within(1e-12));
    // A technology of either holds where every input is used: both say the same there.
    double[] mix = {9, 8, 7};
    assertThat(undivided.typical().technology().logOutput(mix))
        .isCloseTo(divided.typical().technology().logOutput(mix), within(1e-10));
  }

  /** Without zeros there is no dummy, and the two policies are the same to the last bit. */
  @ParameterizedTest
  @ValueSource(strings = {"cobb-douglas", "ces", "translog", "generalised-leontief"})
  void withoutZerosBothPoliciesAgree(String form) throws Exception {
    Panel dropped = brickyards(false);
    Panel kept = PanelSample.of(brickyards(true), r -> true);
    Panel without = PanelSample.of(kept, r -> !kept.anyZero(r));
    assertThat(kept.rows()).isEqualTo(60);
    assertThat(without.rows()).isEqualTo(dropped.rows()).isEqualTo(47);
    Specification how =
        new Specification(
            Form.named(form), PlantEffects.NONE, Time.TREND, true, StandardErrors.CLUSTERED, 0.95);
    Fit one = Estimation.fit(dropped, how);
    Fit other = Estimation.fit(without, how);
    assertThat(other.state()).isEqualTo(one.state());
    if (one.state().usable()) {
      assertThat(other.numbers().parameters()).isEqualTo(one.numbers().parameters());
      assertThat(other.numbers().covariance()).isDeepEqualTo(one.numbers().covariance());
      assertThat(other.numbers().names()).noneMatch(name -> name.startsWith("zero:"));
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"ces", "generalised-leontief"})
  void aFormThatSaysWhatIsMadeWithoutAnInputTakesNoDummy(String form) throws Exception {
    Fit fit = fit(true, form, PlantEffects.NONE, true);
    assertThat(fit.state()).isEqualTo(Fit.State.REFUSED);
    assertThat(fit.reasons())
        .singleElement()
        .asString()
        .contains(form, "without fuel", "Set zeros to drop, or ask for cobb-douglas or translog");
  }

  /** Refits without a plant are fits of the other plants, the dummy with them. */
  @ParameterizedTest
  @CsvSource({"NONE", "WITHIN", "RANDOM"})
  void refitsWithoutAPlantAreFitsOfTheOthers(PlantEffects effects) throws Exception {
    Fit fit = fit(true, "cobb-douglas", effects, false);
    Replicas.Technologies without =
        Replication.of(fit, Optional.empty())
            .at(fit.panel().periods().size() - 1, new Productivity.Typical())
            .replicas()
            .withoutPlants();
    for (int p = 0; p < without.count(); p++) {
      int plant = p;
      Panel others = PanelSample.of(fit.panel(), r -> fit.panel().plantOf(r) != plant);
      Fit alone = Estimation.fit(others, fit.specification());
      double[] expected = alone.typical().technology().parameters();
      double[] found = without.get(p).orElseThrow().parameters();
      for (int k = 1; k < found.length; k++) {
        // sums of products add up in another order; the undivided logs have a condition of 1e3
        assertThat(found[k]).as(Arrays.toString(found)).isCloseTo(expected[k], within(1e-9));
      }
    }
  }
}

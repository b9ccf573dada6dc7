package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Specification;
import isowright.inference.InputShifters.Expected;
import isowright.inference.InputShifters.Shifter;
import isowright.inference.InputShifters.State;
import isowright.records.Keep;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Roles;
import isowright.records.Source;
import isowright.technology.Form;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * What is said before fitting, against R ({@code src/test/resources/reference/shifters.R}; the head
 * of the file of values names the version) and on records drawn so that the answer is known.
 */
class InputShiftersTest {

  /** Fourteen digits are written, and the regressions are of a few well-conditioned columns. */
  private static final double DIGITS = 1e-11;

  @TempDir Path folder;

  private static Roles.Input input(String name, String quantity, String price, String spending) {
    return new Roles.Input(
        name,
        quantity,
        price.isEmpty() ? Optional.empty() : Optional.of(price),
        spending.isEmpty() ? Optional.empty() : Optional.of(spending),
        Optional.empty());
  }

  private static Panel panel(Path file, String output, List<Roles.Input> inputs)
      throws RecordsRefused {
    return RecordsReader.read(
            new Source(file, Optional.empty(), Optional.empty()),
            new Roles(
                Optional.of("plant"),
                Optional.of("year"),
                output,
                Optional.empty(),
                inputs,
                List.of(),
                Optional.empty(),
                Optional.empty()),
            Keep.ALL)
        .panel();
  }

  @Test
  void isWhatRGives() throws Exception {
    Panel bricks =
        panel(
            Path.of("src/test/resources/reference/brickyards.csv"),
            "bricks",
            List.of(
                input("labour", "hours", "wage", ""),
                input("machines", "machine_hours", "rental", ""),
                input("fuel", "fuel", "", "fuel_cost")));
    Map<String, Double> r = reference();
    Expected expected = InputShifters.of(bricks, true, 0.95);
    assertThat(expected.free()).isZero();
    assertThat(expected.thinned()).isFalse();
    assertThat(expected.perFree()[0]).isEqualTo(1);
    assertThat(expected.perFree()[1]).isCloseTo(value(r, "within:machines"), within(DIGITS));
    assertThat(expected.perFree()[2]).isCloseTo(value(r, "within:fuel"), within(DIGITS));
    double[] pooled = InputShifters.of(bricks, false, 0.95).perFree();
    assertThat(pooled[1]).isCloseTo(value(r, "pooled:machines"), within(DIGITS));
    assertThat(pooled[2]).isCloseTo(value(r, "pooled:fuel"), within(DIGITS));
    for (Shifter shifter : expected.shifters()) {
      assertThat(shifter.withinShare().orElseThrow())
          .isCloseTo(value(r, "share:" + shifter.input()), within(DIGITS));
    }
    assertThat(expected.shifters())
        .extracting(Shifter::state)
        // the wage is that of the year, the price of fuel never moves
        .containsExactly(State.STILL, State.SILENT, State.STILL);
    Shifter machines = expected.shifters().get(1);
    assertThat(machines.priceSpread().orElseThrow())
        .isCloseTo(value(r, "spread:machines"), within(DIGITS));
    assertThat(machines.priceShare().orElseThrow())
        .isCloseTo(value(r, "left:machines"), within(DIGITS));
    assertThat(machines.correlation().orElseThrow())
        .isCloseTo(value(r, "correlation:machines"), within(DIGITS));
    assertThat(machines.response().orElseThrow().value())
        .isCloseTo(value(r, "response:machines"), within(DIGITS));
    assertThat(machines.response().orElseThrow().standardError())
        .isCloseTo(value(r, "error:machines"), within(DIGITS));
    assertThat(machines.p().orElseThrow()).isCloseTo(value(r, "p:machines"), within(1e-10));
  }

  private static double value(Map<String, Double> values, String name) {
    return Objects.requireNonNull(values.get(name), name);
  }

  private static Map<String, Double> reference() throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line : Files.readAllLines(Path.of("src/test/resources/reference/shifters.csv"))) {
      if (!line.startsWith("#") && !line.startsWith("name,")) {
        String[] cells = line.split(",");
        values.put(cells[0], Double.parseDouble(cells[1]));
      }
    }
    return values;
  }

  /**
   * Labour answers to a good year and to its wage; machines do neither but grow with labour. Least
   * squares is then off as foretold: labour's coefficient upward, machines' by the stated multiple
   * of it. Over 20,000 rows the estimates are near their limits; four standard errors allow for the
   * rest.
   */
  @Test
  void leansAsForetold() throws Exception {
    Random random = new Random(20241);
    StringBuilder rows = new StringBuilder("plant,year,q,hours,units,wage,rental,units_cost\n");
    for (int p = 0; p < 2000; p++) {
      for (int t = 0; t < 10; t++) {
        double omega = 0.2 * random.nextGaussian();
        double wage = 0.1 * random.nextGaussian();
        double machines = 5 + 0.3 * random.nextGaussian();
        double labour = 1 + 0.6 * machines + 1.0 * omega - 0.5 * wage + 0.2 * random.nextGaussian();
        double q = 0.6 * labour + 0.4 * machines + omega;
        rows.append(
            String.format(
                java.util.Locale.ROOT,
                "P%d,%d,%.9f,%.9f,%.9f,%.9f,%.9f,%.9f%n",
                p,
                2000 + t,
                Math.exp(q),
                Math.exp(labour),
                Math.exp(machines),
                30 * Math.exp(wage),
                80 * Math.exp(0.1 * random.nextGaussian()),
                80 * Math.exp(machines)));
      }
    }
    Path file = Files.writeString(folder.resolve("plants.csv"), rows);
    Panel panel =
        panel(
            file,
            "q",
            List.of(
                input("labour", "hours", "wage", ""), input("machines", "units", "rental", "")));
    Expected expected = InputShifters.of(panel, false, 0.95);
    assertThat(expected.shifters())
        .extracting(Shifter::state)
        .containsExactly(State.ANSWERS, State.SILENT);
    assertThat(expected.shifters().get(0).response().orElseThrow().value())
        .isCloseTo(
            -0.5, within(4 * expected.shifters().get(0).response().orElseThrow().standardError()));
    // Var(ω) / Var(labour | machines) = .04 / (.04 + .0025 + .04): what labour gains
    double up = 0.04 / 0.0825;
    double[] found = slopes(panel);
    double labourError = found[0] - 0.6;
    double machinesError = found[1] - 0.4;
    assertThat(labourError).isCloseTo(up, within(0.02)); // four errors of .2/√(20000 · .0825)
    assertThat(expected.free()).isZero();
    assertThat(machinesError).isCloseTo(expected.perFree()[1] * labourError, within(0.02));
  }

  private static double[] slopes(Panel panel) {
    double[] all =
        Estimation.fit(
                panel,
                new Specification(
                    Form.named("cobb-douglas"),
                    Specification.PlantEffects.NONE,
                    Specification.Time.PERIOD_EFFECTS,
                    true,
                    Specification.StandardErrors.ROBUST,
                    0.95))
            .numbers()
            .parameters();
    return new double[] {all[1], all[2]};
  }

  /** A price that is spending over the quantity proves nothing, whatever it correlates with. */
  @Test
  void aPriceWorkedOutOfTheQuantityProvesNothing() throws Exception {
    Panel glass =
        panel(
            Path.of("notebooks-data/glassworks.csv"),
            "tonnes",
            List.of(
                input("labour", "labour_hours", "wage", ""),
                input("machines", "machine_hours", "", "machine_cost"),
                input("energy", "energy_gj", "", "")));
    assertThat(InputShifters.of(glass, true, 0.95).shifters())
        .extracting(Shifter::state)
        .contains(State.DERIVED, State.NO_PRICE);
  }
}

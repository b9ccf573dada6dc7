package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.withinPercentage;

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
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * The CES of three inputs on the demo records against R: Gauss-Newton by lm with plant dummies and
 * R's own derivatives ({@code src/test/resources/reference/ces-within.R}, which names the version
 * that made the values).
 */
class ReferenceCesTest {

  private static Panel glassworks() throws RecordsRefused {
    return RecordsReader.read(
            new Source(
                Path.of("notebooks-data/glassworks.csv"), Optional.empty(), Optional.empty()),
            new Roles(
                Optional.of("plant"),
                Optional.of("year"),
                "tonnes",
                Optional.empty(),
                List.of(
                    input("labour", "labour_hours"),
                    input("machines", "machine_hours"),
                    input("energy", "energy_gj")),
                List.of(new Roles.Control("breakdown_rate", false)),
                Optional.empty(),
                Optional.empty()),
            Keep.ALL)
        .panel();
  }

  private static Roles.Input input(String name, String column) {
    return new Roles.Input(name, column, Optional.empty(), Optional.empty(), Optional.empty());
  }

  @ParameterizedTest
  @EnumSource(
      value = Specification.PlantEffects.class,
      names = {"NONE", "WITHIN"})
  void valuesAndClassicalErrorsAgree(Specification.PlantEffects effects)
      throws RecordsRefused, IOException {
    Fit fit =
        Estimation.fit(
            glassworks(),
            new Specification(
                Form.named("ces"),
                effects,
                Specification.Time.TREND,
                true,
                Specification.StandardErrors.CLASSICAL,
                .95));
    Solution numbers = fit.numbers();
    String model = effects == Specification.PlantEffects.NONE ? "pooled" : "within";
    List<String[]> rows =
        Files.readAllLines(Path.of("src/test/resources/reference/ces-within.csv")).stream()
            .filter(line -> line.startsWith(model + ","))
            .map(line -> line.split(","))
            .toList();
    assertThat(rows).hasSize(7);
    for (String[] row : rows) {
      double value = Double.parseDouble(row[2]);
      if (row[1].equals("ssr")) {
        // A minimum: errors of the parameters enter squared.
        assertThat(numbers.linear().ssr()).isCloseTo(value, withinPercentage(1e-8));
        continue;
      }
      int k = numbers.index(row[1]);
      // Both stop when steps are far below a millionth of a standard error; 1e-6 relative is asked.
      assertThat(numbers.parameters()[k]).as(row[1]).isCloseTo(value, withinPercentage(1e-4));
      assertThat(Math.sqrt(numbers.covariance()[k][k]))
          .as("error of " + row[1])
          .isCloseTo(Double.parseDouble(row[3]), withinPercentage(1e-4));
    }
  }
}

package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Least-cost questions that cannot be answered are refused together, each by its key and line. */
class PlanMistakesTest {

  private static final String HEAD =
      """
      title: Furnaces
      given:
        - {name: design, form: ces, constant: 4.2, shares: {shifts: 0.55, furnaces: 0.45}, rho: 0.6, scale: 1.1}
      least-cost:
      """;

  @TempDir private Path folder;

  private List<String> mistakes(String questions) throws Exception {
    Path file = Files.writeString(folder.resolve("study.yaml"), HEAD + questions);
    StudyRefused refused =
        catchThrowableOfType(
            StudyRefused.class, () -> Pipeline.run(StudyFile.read(file), Progress.SILENT));
    return refused.mistakes().stream()
        .map(mistake -> mistake.line() + " " + mistake.key() + ": " + mistake.message())
        .toList();
  }

  @Test
  void wordsThatContradictAreToldAtOnce() throws Exception {
    List<String> told =
        mistakes(
            """
              - {name: A, target: 900, prices: {shifts: -5, furnaces: 3}}
              - {name: B, target: 900, prices: {shifts: 5, furnaces: 3}, hold: {fuel: 3}}
              - {name: C, target: 900, prices: {shifts: 5, furnaces: 3}, limits: {shifts: [9, 2]}}
              - {name: D, target: 900, prices: {shifts: 5}, price-bands: {furnaces: [{to: 7, price: 3}, {to: 5, price: 4}, {price: 5}]}}
              - {name: E, target: 900, prices: {shifts: 5, furnaces: 3}, across: [{capacity: -4}]}
            """);
    assertThat(told).hasSize(6);
    assertThat(told.get(0))
        .isEqualTo("5 least-cost[1].prices.shifts: expects a number above 0, found -5");
    assertThat(told.get(1)).startsWith("6 least-cost[2].hold.fuel: `fuel` is not an input");
    assertThat(told.get(2)).startsWith("7 least-cost[3].limits.shifts: ").contains("swap them");
    assertThat(told.get(3)).contains("the band ends at 5, not above 7");
    assertThat(told.get(5)).contains("across[1].capacity", "found -4");
  }

  /**
   * With furnaces at most 12 the CES above, inputs complements (ρ = 0.6), stays below e^4.2 · (0.45
   * · 12^−0.6)^(−1.1/0.6) however many shifts are worked.
   */
  @Test
  void whatCannotBeAchievedIsToldWithTheMostAndItsLimit() throws Exception {
    List<String> told =
        mistakes(
            """
              - {name: A, target: 90000, prices: {shifts: 5, furnaces: 3}, limits: {furnaces: [0, 12]}}
              - {name: B, output-price: 9, prices: {shifts: 5, furnaces: 3}, whole: [furnaces]}
              - {name: C, target: 9000, prices: {shifts: 5, furnaces: 3}, across: [{capacity: 40, technology: design}, {capacity: 50, technology: design}]}
            """);
    assertThat(told).hasSize(3);
    double most = Math.exp(4.2) * Math.pow(0.45 * Math.pow(12, -0.6), -1.1 / 0.6);
    assertThat(told.get(0))
        .startsWith("5 least-cost[1].target: ")
        .contains("furnaces at most 12", "stays below " + (int) most);
    assertThat(told.get(1)).startsWith("6 least-cost[2].whole: ").contains("state a target");
    assertThat(told.get(2)).startsWith("7 least-cost[3].target: ").contains("90");
  }
}

package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Unfit;
import isowright.study.Findings.Said;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Random;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Cost forms in levels and concavity, from the study file to the findings. */
class CostFormsStudyTest {

  @TempDir private Path folder;

  private Path electricity(String costs, String estimation) throws Exception {
    Files.copy(
        Path.of("src/test/resources/published/electricity-1970.csv"),
        folder.resolve("electricity-1970.csv"));
    String aggregates =
        IntStream.rangeClosed(124, 158)
            .mapToObj(Integer::toString)
            .collect(Collectors.joining(","));
    return Files.writeString(
        folder.resolve("study.yaml"),
        """
        title: Electricity companies, 1970
        records:
          file: electricity-1970.csv
          plant: observation
          keep: {without-plants: [%s]}
        costs:
          total: cost
          outputs: {power: {column: output}}
          inputs:
            capital: {price: capital, share: capitalshare}
            labour: {price: labor, share: laborshare}
            fuel: {price: fuel, share: fuelshare}
        %s
        estimation: {%s}
        """
            .formatted(aggregates, costs, estimation));
  }

  /** McFadden cost is concave at all 123 companies, Leontief cost is not, and each says so. */
  @Test
  void formsInLevels() throws Exception {
    Path file =
        electricity(
            "  technologies: [generalised-leontief-cost, mcfadden-cost]",
            "standard-errors: classical");
    List<CostFindings.Fitted> fits =
        Pipeline.run(StudyFile.read(file), Progress.SILENT).costs().fits();
    assertThat(fits).allSatisfy(fit -> assertThat(fit.state()).isEqualTo("estimated"));
    assertThat(fits).allSatisfy(fit -> assertThat(fit.how().equations()).isEqualTo("quantities"));
    assertThat(fits.get(0).regularity().orElseThrow().concave()).isLessThan(123);
    assertThat(fits.get(1).regularity().orElseThrow().concave()).isEqualTo(123);
    assertThat(fits.get(1).how().concave().orElseThrow().where()).isEqualTo("everywhere");
    assertThat(fits.get(1).remarks()).extracting(Said::code).contains("concavity-imposed");
    assertThat(fits.get(1).tests())
        .extracting(FitFindings.Tested::name)
        .containsExactly("constant-returns", "no-substitution");
    assertThat(fits.get(1).scale()).hasSize(123);
  }

  /** Everything that forms in levels and concavity cannot be combined with, told in one go. */
  @Test
  void combinationsThatCannotBe() throws Exception {
    Path file =
        electricity(
            """
              technologies: [translog-cost, generalised-leontief-cost]
              restrict: [homothetic, no-substitution]
              concavity: everywhere
            """,
            "plant-effects: within, scaling: none");
    assertThatThrownBy(() -> StudyFile.read(file))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused ->
                assertThat(refused.mistakes())
                    .extracting(Mistake::toString)
                    .satisfiesExactlyInAnyOrder(
                        m -> assertThat(m).contains("cannot be made homothetic"),
                        m -> assertThat(m).contains("translog-cost cannot be made no-substitution"),
                        m -> assertThat(m).contains("fitted as the records have it"),
                        m -> assertThat(m).contains("everywhere and stay flexible"),
                        m -> assertThat(m).contains("fitted without plant effects")));
  }

  /**
   * Invented dairies that make cheese, butter or both: C = w (10 + 2 y + z) + v (6 + y + 3 z), so
   * that apart only the fixed quantities 10 and 6 are bought twice.
   */
  private Path dairies(double leastButter) throws Exception {
    Random random = new Random(51);
    StringBuilder text = new StringBuilder("dairy,cost,wage,milk,cheese,butter,pay,bought\n");
    for (int r = 0; r < 160; r++) {
      double w = Math.exp(0.3 * random.nextGaussian());
      double v = Math.exp(0.3 * random.nextGaussian());
      double y = r % 4 == 0 ? 0 : 2 + 8 * random.nextDouble();
      double z = r % 4 == 1 ? leastButter : 2 + 8 * random.nextDouble();
      double pay = w * (10 + 2 * y + z + 0.3 * random.nextGaussian());
      double bought = v * (6 + y + 3 * z + 0.3 * random.nextGaussian());
      text.append(
          String.format(
              Locale.ROOT,
              "D%d,%.8f,%.8f,%.8f,%.8f,%.8f,%.8f,%.8f%n",
              r,
              pay + bought,
              w,
              v,
              y,
              z,
              pay,
              bought));
    }
    Files.writeString(folder.resolve("dairies.csv"), text);
    return Files.writeString(
        folder.resolve("study.yaml"),
        """
        title: Dairies
        records: {file: dairies.csv, plant: dairy}
        costs:
          total: cost
          outputs: {cheese: {column: cheese}, butter: {column: butter}}
          inputs:
            labour: {price: wage, spending: pay}
            milk: {price: milk, spending: bought}
          technologies: [translog-cost, generalised-leontief-cost]
        estimation: {standard-errors: classical}
        """);
  }

  /**
   * Scope is found where the records hold firms that make one thing alone; translog cost refused.
   */
  @Test
  void economiesOfScopeWithOutputsOfZero() throws Exception {
    List<CostFindings.Fitted> fits =
        Pipeline.run(StudyFile.read(dairies(0)), Progress.SILENT).costs().fits();
    assertThat(fits.get(0).state()).isEqualTo("refused");
    assertThat(fits.get(0).remarks().get(0).message())
        .contains("cheese in 40 of 160 rows, first in row 2", "butter in 40 of 160 rows");
    CostFindings.Fitted levels = fits.get(1);
    Map<String, Double> at = levels.how().base();
    double fixed =
        10 * Objects.requireNonNull(at.get("labour")) + 6 * Objects.requireNonNull(at.get("milk"));
    double cost =
        fixed
            + at.get("labour")
                * (2 * Objects.requireNonNull(at.get("cheese"))
                    + Objects.requireNonNull(at.get("butter")))
            + at.get("milk") * (at.get("cheese") + 3 * at.get("butter"));
    CostFindings.Together together = levels.at().orElseThrow().together().orElseThrow();
    Figure scope = together.scope().orElseThrow();
    double se = scope.uncertainty().orElseThrow().standardError();
    // one draw in 16,000 is further off than four standard errors
    assertThat(scope.value()).isCloseTo(fixed / cost, within(4 * se));
    assertThat(se).isLessThan(0.05);
    assertThat(together.byOutput()).containsOnlyKeys("cheese", "butter");
    assertThat(together.complementarity()).hasSize(4);
    assertThat(together.note()).isEmpty();
  }

  /** Without such firms scope is told, with the note that it lies outside the records. */
  @Test
  void scopeOutsideTheRecordsIsSaidToBe() throws Exception {
    Path file = dairies(0.5);
    Files.writeString(
        folder.resolve("dairies.csv"),
        Files.readString(folder.resolve("dairies.csv")).replace(",0.00000000,", ",0.50000000,"));
    List<CostFindings.Fitted> fits =
        Pipeline.run(StudyFile.read(file), Progress.SILENT).costs().fits();
    CostFindings.Together logs = fits.get(0).at().orElseThrow().together().orElseThrow();
    assertThat(logs.scope()).isEmpty();
    assertThat(logs.note()).contains("logs of outputs");
    assertThat(fits.get(1).at().orElseThrow().together().orElseThrow().note())
        .contains("No row is without cheese, butter");
  }

  @Test
  void negativeOutputsAndIdleRowsAreRefused() throws Exception {
    Path file = dairies(0);
    String text = Files.readString(folder.resolve("dairies.csv"));
    List<String> lines = new ArrayList<>(text.lines().toList());
    String[] cells = lines.get(1).split(",");
    cells[5] = "0";
    lines.set(1, String.join(",", cells));
    cells = lines.get(3).split(",");
    cells[5] = "-1";
    lines.set(3, String.join(",", cells));
    Files.write(folder.resolve("dairies.csv"), lines);
    assertThatThrownBy(() -> Pipeline.run(StudyFile.read(file), Progress.SILENT))
        .isInstanceOfSatisfying(
            Unfit.class,
            unfit ->
                assertThat(unfit.reasons())
                    .anySatisfy(r -> assertThat(r).contains("butter is negative in row 4"))
                    .anySatisfy(r -> assertThat(r).contains("nothing at all", "row 2")));
  }

  /** Capital at the root of the prices of labour and fuel: named, with the rows counted. */
  @Test
  void collinearPricesAreRefusedByName() throws Exception {
    Path file = electricity("  technologies: [translog-cost]", "standard-errors: classical");
    List<String> lines = new ArrayList<>();
    for (String line : Files.readAllLines(folder.resolve("electricity-1970.csv"))) {
      String[] cells = line.split(",");
      if (!lines.isEmpty()) {
        double root = Math.sqrt(Double.parseDouble(cells[4]) * Double.parseDouble(cells[8]));
        cells[6] = String.format(Locale.ROOT, "%.6f", root);
      }
      lines.add(String.join(",", cells));
    }
    Files.write(folder.resolve("electricity-1970.csv"), lines);
    assertThatThrownBy(() -> Pipeline.run(StudyFile.read(file), Progress.SILENT))
        .isInstanceOfSatisfying(
            Unfit.class,
            unfit ->
                assertThat(unfit.reasons())
                    .singleElement()
                    .satisfies(
                        reason ->
                            assertThat(reason)
                                .contains("all 123 rows", "price of labour", "those of capital")));
  }
}

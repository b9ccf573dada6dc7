package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import isowright.study.Findings.Said;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
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
}

package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.tuple;

import isowright.study.MatrixFindings.Cell;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Samples of a specification matrix against the records: what they name, keep and can carry. */
class MatrixSamplesTest {

  private static final Path DEMO = Path.of("notebooks-data", "glassworks-specifications.yaml");

  @TempDir Path folder;

  @BeforeEach
  void records() throws Exception {
    Files.copy(DEMO.resolveSibling("glassworks.csv"), folder.resolve("glassworks.csv"));
  }

  private Findings run(String matrix, String rest) throws Exception {
    String text = Files.readString(DEMO);
    String study = text.substring(0, text.indexOf("matrix:")) + matrix + rest;
    return Pipeline.run(
        StudyFile.read(Files.writeString(folder.resolve("study.yaml"), study)), Progress.SILENT);
  }

  @Test
  void everyMistakenSampleIsToldAtOnceWithItsLine() {
    assertThatThrownBy(
            () ->
                run(
                    """
                    matrix:
                      technologies: [cobb-douglas]
                      samples:
                        all: {}
                        nobody: {without-plants: [GW-99]}
                        before: {periods: [1990, 1995]}
                        wordy: {periods: [first, last]}
                        same: {periods: [2000, 2030]}
                    """,
                    ""))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              assertThat(refused.mistakes())
                  .extracting(Mistake::key, m -> m.message().split(" ")[1])
                  .containsExactly(
                      tuple("matrix.samples.nobody", "records"),
                      tuple("matrix.samples.before", "sample"),
                      tuple("matrix.samples.wordy", "is"),
                      tuple("matrix.samples.wordy", "is"),
                      tuple("matrix.samples.same", "sample"));
              assertThat(refused.mistakes())
                  .extracting(Mistake::message)
                  .anyMatch(m -> m.contains("no plant GW-99; did you mean GW-"))
                  .anyMatch(m -> m.contains("keeps no row") && m.contains("2012 to 2024"))
                  .anyMatch(m -> m.contains("\"first\" is not a period; write an integer"))
                  .anyMatch(m -> m.contains("keeps the same rows as all"));
              assertThat(refused.mistakes()).allMatch(m -> m.line() > 40);
            });
  }

  /** What a sample cannot carry is a state of its combinations, with the reason of the fit. */
  @Test
  void aCombinationThatCannotBeCarriedOutSaysWhy() throws Exception {
    MatrixFindings matrix =
        run(
                """
                matrix:
                  technologies: [cobb-douglas]
                  plant-effects: [within, between]
                  time: [trend]
                  samples:
                    one-year: {periods: [2024, 2024]}
                    early: {half: earlier}
                  choose-by: [bic]
                """,
                """
                least-cost:
                  - {name: Plan, target: 40000, prices: {labour: 34, machines: 74, energy: 10.5}}
                """)
            .specification()
            .matrix()
            .orElseThrow();
    assertThat(matrix.cells()).extracting(Cell::state).contains("refused");
    Cell oneYear = matrix.cells().get(0);
    assertThat(oneYear.reasons())
        .anyMatch(r -> r.contains("plants seen in more than one period"))
        .anyMatch(r -> r.contains("single period"));
    Cell between = matrix.cells().get(3);
    assertThat(between.reasons()).anyMatch(r -> r.contains("no change over time is left"));
    Cell early = matrix.cells().get(1);
    assertThat(early.estimated()).isTrue();
    assertThat(early.without())
        .containsEntry(
            MatrixFindings.LEAST_COST,
            "the sample does not hold 2024, at which the figure is asked");
    assertThat(matrix.chosen()).hasValue(1);
    assertThat(matrix.samples())
        .extracting(MatrixFindings.Sample::words, MatrixFindings.Sample::periods)
        .containsExactly(
            tuple("from 2024 to 2024", 1), tuple("the earlier half of the periods", 6));
  }

  @Test
  void whatIsNotListedIsAsTheStudyEstimates() throws Exception {
    MatrixFindings matrix =
        run("matrix: {technologies: [translog, ces], standard-errors: [robust, clustered]}\n", "")
            .specification()
            .matrix()
            .orElseThrow();
    assertThat(matrix.cells())
        .extracting(Cell::technology, Cell::plantEffects, Cell::time, Cell::standardErrors)
        .containsExactly(
            tuple("translog", "within", "trend", "robust"),
            tuple("translog", "within", "trend", "clustered"),
            tuple("ces", "within", "trend", "robust"),
            tuple("ces", "within", "trend", "clustered"));
    assertThat(matrix.circumstances(matrix.cells().get(1))).isEqualTo("clustered");
    assertThat(matrix.choice()).startsWith("No criteria were laid down");
    assertThat(matrix.cells()).filteredOn(Cell::asAsked).hasSize(1);
  }
}

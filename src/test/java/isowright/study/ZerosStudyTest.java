package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.tuple;

import isowright.records.RecordsRefused;
import isowright.study.MatrixFindings.Cell;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The policy for zeros from the study file to the findings, on invented brickyards. */
class ZerosStudyTest {

  private static final Path RECORDS =
      Path.of("src", "test", "resources", "reference", "brickyards.csv");

  @TempDir Path folder;

  private static final String STUDY =
      """
      title: Brickyards
      records: {file: brickyards.csv, plant: plant, period: year}
      output: {column: bricks}
      inputs:
        labour: {quantity: hours, price: wage}
        machines: {quantity: machine_hours, price: rental}
        fuel: {quantity: fuel, spending: fuel_cost}
      technologies: [cobb-douglas, ces, translog]
      estimation: {time: trend%s}
      least-cost:
        - {name: Plan, target: 6000}
      filing: {periods: [2024, 2024]}
      """;

  private Findings run(String policy, String records) throws Exception {
    Files.writeString(folder.resolve("brickyards.csv"), records);
    return Pipeline.run(
        StudyFile.read(Files.writeString(folder.resolve("study.yaml"), STUDY.formatted(policy))),
        Progress.SILENT);
  }

  @Test
  void bothPoliciesStandSideBySideWhicheverIsInForce() throws Exception {
    String records = Files.readString(RECORDS);
    Findings drop = run("", records);
    Findings dummy = run(", zeros: dummy", records);
    assertThat(drop.run().settings()).containsEntry("estimation.zeros", "drop");
    assertThat(dummy.run().settings())
        .containsEntry("estimation.zeros", "dummy")
        .containsEntry("estimation.missing-values", "drop");
    assertThat(drop.records().orElseThrow().used()).isEqualTo(47);
    assertThat(dummy.records().orElseThrow().used()).isEqualTo(60);
    ZerosFindings one = drop.specification().zeros().orElseThrow();
    ZerosFindings other = dummy.specification().zeros().orElseThrow();
    assertThat(one.policy()).isEqualTo("drop");
    assertThat(other.policy()).isEqualTo("dummy");
    assertThat(one.rows()).containsOnly(java.util.Map.entry("fuel", 13)).isEqualTo(other.rows());
    assertThat(one.cells())
        .extracting(Cell::technology, Cell::sample, Cell::state, Cell::rows, Cell::asAsked)
        .containsExactly(
            tuple("cobb-douglas", "drop", "estimated", 47, true),
            tuple("cobb-douglas", "dummy", "estimated", 60, false),
            tuple("ces", "drop", one.cells().get(2).state(), one.cells().get(2).rows(), true),
            tuple("ces", "dummy", "refused", 0, false),
            tuple("translog", "drop", "estimated", 47, true),
            tuple("translog", "dummy", "estimated", 60, false));
    for (int c = 0; c < one.cells().size(); c++) {
      // the same fits, whichever policy is in force
      assertThat(one.cells().get(c).figure(MatrixFindings.SCALE))
          .isEqualTo(other.cells().get(c).figure(MatrixFindings.SCALE));
    }
    assertThat(one.cells().get(0).figure(MatrixFindings.SCALE).orElseThrow().value())
        .isEqualTo(drop.fits().get(0).returnsToScale().orElseThrow().value());
    assertThat(one.cells().get(1).figure(MatrixFindings.SCALE).orElseThrow().value())
        .isEqualTo(dummy.fits().get(0).returnsToScale().orElseThrow().value());
    assertThat(dummy.fits().get(0).parameters())
        .extracting(FitFindings.Parameter::name)
        .contains("zero:fuel");
    assertThat(dummy.fits().get(0).regularity().orElseThrow().rows()).isEqualTo(47);
    // A filing that uses no fuel has no log of it: it is shown without a least cost.
    assertThat(dummy.reviews())
        .filteredOn(r -> r.plant().equals("P10") && r.technology().equals("cobb-douglas"))
        .singleElement()
        .satisfies(r -> assertThat(r.leastCost()).isEmpty());
  }

  @Test
  void recordsWithoutZerosAreNotComparedAndGiveTheSameDigits() throws Exception {
    StringBuilder positive = new StringBuilder();
    Files.readAllLines(RECORDS).stream()
        .filter(line -> !line.contains(",0,"))
        .forEach(line -> positive.append(line).append('\n'));
    Findings drop = run("", positive.toString());
    Findings dummy = run(", zeros: dummy", positive.toString());
    assertThat(drop.specification().zeros()).isEmpty();
    assertThat(dummy.specification().zeros()).isEmpty();
    for (int f = 0; f < drop.fits().size(); f++) {
      assertThat(dummy.fits().get(f).parameters()).isEqualTo(drop.fits().get(f).parameters());
      assertThat(dummy.fits().get(f).returnsToScale())
          .isEqualTo(drop.fits().get(f).returnsToScale());
    }
    assertThat(dummy.plans())
        .extracting(PlanFindings.Planned::cost)
        .isEqualTo(drop.plans().stream().map(PlanFindings.Planned::cost).toList());
  }

  @Test
  void anInputThatNobodyUsesIsRefused() {
    String records =
        """
        plant,year,bricks,hours,machine_hours,fuel,wage,rental,fuel_cost
        A,2020,10,5,4,0,1,1,0
        A,2021,11,6,4,0,1,1,0
        B,2020,12,7,5,0,1,1,0
        """;
    assertThatThrownBy(() -> run(", zeros: dummy", records))
        .isInstanceOf(RecordsRefused.class)
        .hasMessageContaining("column \"fuel\" (quantity of fuel)")
        .hasMessageContaining("zero in every one of 3 rows used")
        .hasMessageContaining("Take it out of the inputs");
    assertThatThrownBy(() -> run("", records))
        .isInstanceOf(RecordsRefused.class)
        .hasMessageContaining("none of 3 rows can be used")
        .hasMessageContaining("quantity of fuel");
  }
}

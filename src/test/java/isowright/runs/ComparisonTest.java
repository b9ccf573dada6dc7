package isowright.runs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.report.FindingsJson;
import isowright.runs.Comparison.Change;
import isowright.runs.Kilns.Said;
import isowright.study.Pipeline;
import isowright.study.Progress;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What changed between two runs, and where it comes from. */
class ComparisonTest {

  @TempDir private static Path shared;

  /** Runs of both studies in both records: oldNew is the earlier study in the later records. */
  private static Path oldOld;

  private static Path oldNew;
  private static Path newOld;
  private static Path newNew;

  @TempDir private Path folder;

  @BeforeAll
  static void fourRuns() throws IOException {
    Kilns kilns = new Kilns(shared);
    oldOld = kilns.run("s0r0", Kilns.records(), "kilns.csv", 31);
    newNew = kilns.run("s1r1", corrected(), "corrected.csv", 36);
    oldNew = kilns.run("s0r1", corrected(), "corrected.csv", 31);
    newOld = kilns.run("s1r0", Kilns.records(), "kilns.csv", 36);
  }

  /** One row fewer, one more, one cell corrected: 48 rows, 47 of them in both. */
  private static List<String> corrected() {
    List<String> lines = new ArrayList<>(Kilns.records());
    lines.remove(lines.size() - 1);
    lines.add("K9,2020,100.5,120.5,80.5,30.25,75.5");
    lines.set(3, lines.get(3).replaceFirst(",2017,[0-9.]+", ",2017,150.125"));
    return lines;
  }

  private static Comparison compare(Path before, Path after) throws RunRefused {
    List<StoredRun> runs = StoredRun.read(List.of(before, after));
    return Comparer.compare(
        runs.get(0),
        runs.get(1),
        study -> FindingsJson.write(Pipeline.run(study, Progress.SILENT)));
  }

  private static Change cost(Comparison comparison) {
    return comparison.changes().stream()
        .filter(change -> change.kind() == Comparison.Kind.PLAN)
        .filter(change -> change.figure().equals("cost"))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void nothingChangedBetweenTwoRunsOfOneStudy() throws Exception {
    Comparison same = compare(oldOld, oldOld);
    assertThat(same.sameRecords() && same.sameStudy()).isTrue();
    assertThat(same.changed()).isZero();
    assertThat(same.changes()).hasSizeGreaterThan(8);
    assertThat(same.rows()).isEmpty();
  }

  @Test
  void rowsAndCellsAreTold() throws Exception {
    RowChanges rows = compare(oldOld, oldNew).rows().orElseThrow();
    assertThat(rows.added()).singleElement().satisfies(r -> assertThat(r.plant()).isEqualTo("K9"));
    assertThat(rows.removed())
        .singleElement()
        .satisfies(r -> assertThat(r.plant() + r.period()).isEqualTo("K82020"));
    assertThat(rows.corrected())
        .singleElement()
        .satisfies(
            cell -> {
              assertThat(cell.column()).isEqualTo("output");
              assertThat(cell.row().fileRow()).isEqualTo(4); // the heading is row 1
              assertThat(cell.after()).contains(150.125);
            });
    assertThat(rows.same()).isEqualTo(46);
  }

  /** The study files differ in the name of the records alone, so nothing comes from settings. */
  @Test
  void aCorrectedFilingComesFromTheRecordsAlone() throws Exception {
    Change cost = cost(compare(oldOld, oldNew));
    assertThat(cost.difference().orElseThrow()).isNotZero();
    assertThat(cost.fromRecords()).isEqualTo(cost.difference());
    assertThat(cost.fromSettings().orElseThrow()).isZero();
  }

  @Test
  void anotherWageIsASetting() throws Exception {
    Comparison comparison = compare(oldOld, newOld);
    assertThat(comparison.settings())
        .containsExactly(
            new Comparison.Setting(
                "least-cost[1].prices.labour", Optional.of("31"), Optional.of("36")));
    Change cost = cost(comparison);
    assertThat(cost.difference().orElseThrow()).isPositive();
    assertThat(cost.fromRecords().orElseThrow()).isZero();
    assertThat(cost.fromSettings()).isEqualTo(cost.difference());
  }

  /** f(s, r) by four runs of their own, none of them made by the comparison. */
  @Test
  void thePartsAreTheMeansOverBothWays() throws Exception {
    Change cost = cost(compare(oldOld, newNew));
    double records = 0.5 * (value(oldNew) - value(oldOld)) + 0.5 * (value(newNew) - value(newOld));
    // sums and differences of four doubles of the same size
    assertThat(cost.fromRecords().orElseThrow())
        .isCloseTo(records, within(4 * Math.ulp(value(newNew))));
    assertThat(cost.fromRecords().get() + cost.fromSettings().orElseThrow())
        .isCloseTo(cost.difference().orElseThrow(), within(4 * Math.ulp(value(newNew))));
  }

  private static double value(Path run) throws RunRefused {
    return StoredRun.read(List.of(run)).get(0).findings().at("/leastCost/0/cost/value").asDouble();
  }

  @Test
  void recordsThatAreGoneAreSaidAndTheFiguresStillCompared() throws Exception {
    Kilns kilns = new Kilns(folder);
    Path before = kilns.run("one", Kilns.records(), "kilns.csv", 31);
    Path after = kilns.run("two", corrected(), "corrected.csv", 34);
    Files.delete(folder.resolve("kilns.csv"));
    Comparison comparison = compare(before, after);
    assertThat(comparison.rows()).isEmpty();
    assertThat(cost(comparison).fromRecords()).isEmpty();
    assertThat(cost(comparison).difference()).isPresent();
    assertThat(comparison.remarks()).anyMatch(remark -> remark.contains("kilns.csv"));
  }

  @Test
  void theCommandWritesPageAndFile() throws IOException {
    Path before = oldOld;
    Path after = newNew;
    Path into = folder.resolve("changes");
    Said said =
        Kilns.command("compare", before.toString(), after.toString(), "--into", into.toString());
    assertThat(said.code()).as(said.err()).isZero();
    assertThat(said.out()).contains("1 row was added", "least-cost[1].prices.labour");
    assertThat(into).isDirectoryContaining("glob:**/{compare.html,compare.json}");
    assertThat(Files.readString(into.resolve("compare.html")))
        .contains("&lt;b&gt;Kilns", "150.125")
        .doesNotContain("<b>Kilns");
    // a page of this kind may be written again, any other folder may not
    String[] again = {"compare", before.toString(), after.toString(), "--into", "" + into};
    assertThat(Kilns.command(again).code()).isZero();
    again[4] = before.toString();
    assertThat(Kilns.command(again).code()).isEqualTo(2);
  }

  @Test
  void everyFolderThatIsNoRunIsNamed() {
    Said said = Kilns.command("compare", folder + "/x", folder + "/y");
    assertThat(said.code()).isEqualTo(2);
    assertThat(said.err()).contains("/x", "/y", "2 reasons");
  }
}

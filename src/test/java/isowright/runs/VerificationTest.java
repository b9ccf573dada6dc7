package isowright.runs;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.runs.Kilns.Said;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A run that nobody touched verifies; every touch is told, and by name. */
class VerificationTest {

  @TempDir private Path folder;

  private Path run;

  @BeforeEach
  void aRun() throws IOException {
    run = new Kilns(folder).run("kilns", Kilns.records(), "kilns.csv", 31);
  }

  private Said verify(String... more) {
    String[] arguments = new String[2 + more.length];
    arguments[0] = "verify";
    arguments[1] = run.toString();
    System.arraycopy(more, 0, arguments, 2, more.length);
    return Kilns.command(arguments);
  }

  @Test
  void anUntouchedRunVerifiesToTheLastDigit() {
    Said said = verify();
    assertThat(said.code()).as(said.err() + said.out()).isZero();
    assertThat(said.out()).contains("are as they were", "to the last digit");
    assertThat(said.err()).isEmpty();
  }

  @Test
  void aChangedFigureIsToldByItsPlaceAndTheFileByItsName() throws Exception {
    Path findings = run.resolve("findings.json");
    double cost =
        StoredRun.read(java.util.List.of(run))
            .get(0)
            .findings()
            .at("/leastCost/0/cost/value")
            .asDouble();
    String text = Files.readString(findings);
    String shown = "\"value\": " + cost;
    assertThat(text).contains(shown);
    Files.writeString(findings, text.replace(shown, "\"value\": " + cost * 1.25));
    Said said = verify();
    assertThat(said.code()).isEqualTo(4);
    assertThat(said.out())
        .contains("findings.json, written by the run: changed since", "/leastCost/0/cost/value");
    assertThat(said.out()).contains(String.valueOf(cost * 1.25), String.valueOf(cost));
  }

  @Test
  void changedRecordsAreToldAndGiveOtherFigures() throws IOException {
    Path records = folder.resolve("kilns.csv");
    Files.writeString(
        records, Files.readString(records).replaceFirst("K1,2015,[0-9.]+", "K1,2015,999.9"));
    Said said = verify();
    assertThat(said.code()).isEqualTo(4);
    assertThat(said.out())
        .contains("../kilns.csv, read by the run: changed since", "otherwise; the first of them");
  }

  @Test
  void whatIsMissingIsNamedAndAStudyThatMovedIsFound() throws IOException {
    Files.move(folder.resolve("kilns.yaml"), folder.resolve("moved.yaml"));
    Files.delete(run.resolve("report.html"));
    Said said = verify();
    assertThat(said.code()).isEqualTo(4);
    assertThat(said.out()).contains("report.html, written by the run: not there", "--study FILE");
    Said found = verify("--study", folder.resolve("moved.yaml").toString());
    assertThat(found.code()).isEqualTo(4);
    // only the name of the study file differs, which the findings state
    assertThat(found.out()).contains("/study/file").contains("gives 1 of");
  }

  @Test
  void whatIsNoRunIsRefused() {
    Said said = Kilns.command("verify", folder.toString());
    assertThat(said.code()).isEqualTo(2);
    assertThat(said.err()).contains("run-record.json", "Nothing was written");
  }
}

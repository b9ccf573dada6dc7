package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The audit is printed, and nothing else happens. */
class CheckTest {

  @TempDir Path folder;

  @Test
  void theDemoStudy() {
    Invocation check = Invocation.of("check", "notebooks-data/glassworks.yaml");
    assertThat(check.code()).isZero();
    assertThat(check.err()).isEmpty();
    assertThat(check.out())
        .contains(
            "Study    Fourteen glassworks",
            "glassworks.csv",
            "SHA-256 ",
            "Rows     182 in the file, 180 used, 2 set aside",
            "Plants   14, over 13 periods, 2012 to 2024",
            "Set aside",
            "Remarks: ",
            "  warning: ",
            "quantity of labour",
            "price of machines");
  }

  @Test
  void aStudyWithoutRecords() {
    Invocation check = Invocation.of("check", "notebooks-data/given-only.yaml");
    assertThat(check.code()).isZero();
    assertThat(check.out()).contains("there is nothing to audit");
  }

  @Test
  void mistakesOfTheStudyAndOfTheRecords() throws IOException {
    Path study =
        Files.writeString(
            folder.resolve("study.yaml"),
            """
            title: Small
            records: {file: small.csv}
            output: {column: q}
            inputs: {labour: {quantity: l}, machines: {quantity: k}}
            technologies: [ces]
            """);
    Invocation missing = Invocation.of("check", study.toString());
    assertThat(missing.code()).isEqualTo(2);
    assertThat(missing.err()).contains("the records cannot be read as asked", "small.csv");
    Files.writeString(folder.resolve("small.csv"), "q,l,kk\n1,2,3\nx,2,3\n");
    Invocation columns = Invocation.of("check", study.toString());
    assertThat(columns.code()).isEqualTo(2);
    assertThat(columns.err()).contains("kk");
    Files.writeString(study, "title: Small\nrecord: {}\n");
    Invocation mistaken = Invocation.of("check", study.toString());
    assertThat(mistaken.code()).isEqualTo(2);
    assertThat(mistaken.err()).contains("line 2, column 1: record", "the nearest is `records`");
    assertThat(mistaken.out()).isEmpty();
  }
}

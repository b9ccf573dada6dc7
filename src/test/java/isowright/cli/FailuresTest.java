package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Unfit;
import isowright.records.RecordsRefused;
import isowright.records.Remark;
import isowright.study.Mistake;
import isowright.study.StudyRefused;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every failure ends in a message without a stack trace and in its exit code. */
class FailuresTest {

  @TempDir Path folder;

  private final StringWriter text = new StringWriter();

  private ExitCode tell(Throwable failure, Path detailsFolder) {
    PrintWriter err = new PrintWriter(text);
    ExitCode code = Failures.tell(failure, err, detailsFolder);
    err.flush();
    return code;
  }

  @Test
  void aStudyWithMistakes() {
    List<Mistake> mistakes =
        List.of(
            new Mistake(0, 0, "", "of the whole file"),
            new Mistake(3, 7, "inputs.labour", "found this, allowed that"));
    assertThat(tell(new StudyRefused(Path.of("s.yaml"), mistakes), folder))
        .isEqualTo(ExitCode.MISTAKE);
    assertThat(text.toString())
        .isEqualToNormalizingNewlines(
            """
            isowright: s.yaml cannot be used: 2 mistakes.

                of the whole file

              line 3, column 7: inputs.labour
                found this, allowed that

            Nothing was written.
            """);
  }

  @Test
  void recordsThatAreRefused() {
    Remark reason =
        new Remark(Remark.Severity.ERROR, "cell", "r.csv, row 4: not a number", List.of(4));
    assertThat(tell(new RecordsRefused(List.of(reason)), folder)).isEqualTo(ExitCode.MISTAKE);
    assertThat(text.toString())
        .isEqualToNormalizingNewlines(
            """
            isowright: the records cannot be read as asked: 1 reason.
              - r.csv, row 4: not a number
            Nothing was written.
            """);
  }

  @Test
  void recordsThatCannotCarryTheQuestion() {
    assertThat(tell(new Unfit(List.of("too few rows", "no spread")), folder))
        .isEqualTo(ExitCode.UNFIT);
    assertThat(text.toString())
        .isEqualToNormalizingNewlines(
            """
            isowright: the records cannot carry what was asked.
              - too few rows
              - no spread
            Nothing was written.
            """);
  }

  @Test
  void theInsideOfADefectGoesToAFile() throws IOException {
    IllegalStateException defect = new IllegalStateException("wheel is square");
    assertThat(tell(defect, folder)).isEqualTo(ExitCode.DEFECT);
    Path details;
    try (Stream<Path> files = Files.list(folder)) {
      details = files.findFirst().orElseThrow();
    }
    assertThat(details.getFileName().toString()).matches("isowright-defect-[0-9-]+\\.txt");
    assertThat(Files.readString(details))
        .startsWith("isowright ")
        .contains("wheel is square", "at isowright.cli.FailuresTest");
    assertThat(text.toString())
        .contains("a defect of this program", details.toString())
        .doesNotContain("wheel is square", "\tat ");
  }

  @Test
  void aDefectIsToldEvenWhereNoFileCanBeWritten() {
    Path nowhere = folder.resolve("no/such/folder");
    assertThat(tell(new IllegalStateException("wheel is square"), nowhere))
        .isEqualTo(ExitCode.DEFECT);
    assertThat(text.toString()).contains("could not be written").doesNotContain("\tat ");
  }

  @Test
  void wantOfMemoryHasARemedy() {
    assertThat(tell(new OutOfMemoryError(), folder)).isEqualTo(ExitCode.DEFECT);
    assertThat(text.toString()).contains("java -Xmx");
  }

  /** From end to end: a command that fails in a way nobody foresaw. */
  @Test
  void aDefectInACommandIsCaught() {
    StringWriter err = new StringWriter();
    PrintWriter broken =
        new PrintWriter(new StringWriter()) {
          @Override
          public void write(String s, int off, int len) {
            throw new IllegalStateException("pen is dry");
          }
        };
    int code = Main.run(new String[] {"help"}, broken, new PrintWriter(err, true), Terminal.NONE);
    assertThat(code).isEqualTo(ExitCode.DEFECT.number());
    assertThat(err.toString()).contains("a defect of this program").doesNotContain("\tat ");
  }
}

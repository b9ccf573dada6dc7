package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A run writes a whole report or nothing, and says which. */
class RunTest {

  private static final String STUDY =
      """
      title: <b>Kilns</b> & "ovens"
      records: {file: kilns.csv}
      output: {column: bricks, unit: t}
      inputs:
        labour: {quantity: hours, price: wage, unit: h}
        machines: {quantity: kiln_hours, price: rent, unit: h}
      technologies: [cobb-douglas]
      least-cost:
        - {name: ../../Plan <A>, target: 100, curve: {from: 50, to: 150, points: 5}}
      """;

  @TempDir Path folder;

  private Path study;
  private Path into;

  @BeforeEach
  void aSmallStudy() throws IOException {
    study = Files.writeString(folder.resolve("kilns.yaml"), STUDY);
    into = folder.resolve("report");
    records(40);
  }

  /** Forty kilns on an invented technology: elasticities .6 and .4, output in error by some 5 %. */
  private void records(int rows) throws IOException {
    Random random = new Random(20250314);
    StringBuilder text = new StringBuilder("bricks,hours,kiln_hours,wage,rent\n");
    for (int row = 0; row < rows; row++) {
      double hours = 50 + 400 * random.nextDouble();
      double kilnHours = 20 + 200 * random.nextDouble();
      double bricks =
          Math.exp(
              0.6 * Math.log(hours) + 0.4 * Math.log(kilnHours) + 0.05 * random.nextGaussian());
      text.append(
          String.format(
              Locale.ROOT,
              "%.3f,%.1f,%.1f,%.2f,%.2f%n",
              bricks,
              hours,
              kilnHours,
              28 + 6 * random.nextDouble(),
              70 + 20 * random.nextDouble()));
    }
    Files.writeString(folder.resolve("kilns.csv"), text);
  }

  private Invocation run(String... more) {
    String[] arguments =
        Stream.concat(
                Stream.of("run", study.toString(), "--into", into.toString()), Stream.of(more))
            .toArray(String[]::new);
    return Invocation.of(arguments);
  }

  private Map<String, String> report() throws IOException {
    Map<String, String> files = new TreeMap<>();
    try (Stream<Path> all = Files.walk(into)) {
      for (Path file : all.filter(Files::isRegularFile).toList()) {
        byte[] bytes = Files.readAllBytes(file);
        files.put(
            into.relativize(file).toString().replace('\\', '/'),
            new String(bytes, java.nio.charset.StandardCharsets.ISO_8859_1));
      }
    }
    return files;
  }

  @Test
  void theReportAndTheAnswerInBrief() throws IOException {
    Invocation run = run();
    assertThat(run.err()).isEmpty();
    assertThat(run.code()).isZero();
    assertThat(run.out())
        .contains(
            "<b>Kilns</b> & \"ovens\"",
            "40 rows used of 40",
            "cobb-douglas: estimated",
            "returns to scale",
            "at 40 of 40 rows",
            "../../Plan <A>: 100",
            "solved",
            "Remarks: ",
            "Report: " + into.toRealPath().resolve("report.html"));
    Map<String, String> report = report();
    assertThat(report).containsKeys("report.html", "findings.json", "technology.json");
    assertThat(report.keySet())
        .anyMatch(name -> name.matches("charts/[a-z0-9-]+\\.svg"))
        .anyMatch(name -> name.matches("charts/[a-z0-9-]+\\.png"))
        .allMatch(name -> name.matches("[a-z-]+\\.(html|json)|charts/[a-z0-9-]+\\.(svg|png)"));
    assertThat(report.entrySet())
        .filteredOn(file -> file.getKey().endsWith(".png"))
        .isNotEmpty()
        .allMatch(file -> file.getValue().startsWith("\u0089PNG"));
    assertThat(folderEntries()).containsExactly("kilns.csv", "kilns.yaml", "report");
  }

  private List<String> folderEntries() throws IOException {
    try (Stream<Path> all = Files.list(folder)) {
      return all.map(path -> path.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void markupInATitleStaysText() throws IOException {
    run();
    String html = report().get("report.html");
    assertThat(html).contains("&lt;b&gt;Kilns&lt;/b&gt; &amp;").doesNotContain("<b>Kilns</b>");
  }

  @Test
  void theSameStudyGivesTheSameBytes() throws IOException {
    run();
    Map<String, String> first = report();
    run("--quiet");
    Map<String, String> second = report();
    // the record of a run says when it was made; nothing else may
    assertThat(first.remove("run-record.json")).contains("startTime");
    assertThat(second.remove("run-record.json")).contains("startTime");
    assertThat(second).isEqualTo(first);
  }

  @Test
  void furtherFormatsAreWrittenWhereAsked() throws IOException {
    assertThat(run("--also", "docx,xlsx").code()).isZero();
    assertThat(report().get("report.docx")).startsWith("PK");
    assertThat(report().get("workpapers.xlsx")).startsWith("PK");
    Invocation unknown = run("--also", "docs,page");
    assertThat(unknown.code()).isEqualTo(2);
    assertThat(unknown.err())
        .contains("`docs` is not a format; the nearest is `docx`", "`page` is not a format");
  }

  @Test
  void aFailedRunLeavesTheEarlierReportAndNoTraces() throws IOException {
    run();
    Map<String, String> earlier = report();
    Files.writeString(folder.resolve("kilns.csv"), "bricks,hours\nx,1\n");
    Invocation records = run();
    assertThat(records.code()).isEqualTo(2);
    assertThat(records.out()).isEmpty();
    Files.writeString(study, STUDY.replace("cobb-douglas", "cob-douglas"));
    Invocation mistaken = run();
    assertThat(mistaken.code()).isEqualTo(2);
    assertThat(mistaken.err()).contains("line 7", "the nearest is `cobb-douglas`");
    assertThat(report()).isEqualTo(earlier);
    assertThat(folderEntries()).containsExactly("kilns.csv", "kilns.yaml", "report");
  }

  @Test
  void recordsThatCannotCarryTheQuestion() throws IOException {
    records(2);
    Invocation run = run();
    assertThat(run.code()).isEqualTo(3);
    assertThat(run.err()).contains("the records cannot carry what was asked", "  - ");
    assertThat(run.out()).contains("Rows     2 in the file", "Remarks: ");
    assertThat(into).doesNotExist();
  }

  @Test
  void aFolderWithOtherFilesIsRefusedBeforeTheRun() throws IOException {
    Files.createDirectory(into);
    Files.writeString(into.resolve("photo.jpg"), "x");
    Invocation run = run();
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("holds other files and no earlier report");
    assertThat(run.out()).isEmpty();
    assertThat(into.resolve("photo.jpg")).hasContent("x");
  }

  @Test
  void progressIsShownOnATerminalAndWiped() {
    StringWriter err = new StringWriter();
    String[] arguments = {"run", study.toString(), "--into", into.toString()};
    int code =
        Main.run(
            arguments,
            new PrintWriter(new StringWriter()),
            new PrintWriter(err),
            new Terminal(true, false));
    assertThat(code).isZero();
    assertThat(err.toString())
        .contains("1/5 reading the records", "5/5 drawing charts")
        .doesNotContain("\u001b", "\n")
        .endsWith("\r");
  }

  @Test
  void names() {
    assertThat(RunCommand.usualFolder(Path.of("a/b/study.yaml")))
        .isEqualTo(Path.of("reports", "study"));
    assertThat(RunCommand.usualFolder(Path.of("study"))).isEqualTo(Path.of("reports", "study"));
    assertThat(RunCommand.usualFolder(Path.of(".hidden"))).isEqualTo(Path.of("reports", ".hidden"));
    assertThat(RunCommand.fileName("profile-ces")).isEqualTo("profile-ces");
    assertThat(RunCommand.fileName("../../Plan <A>")).isEqualTo("plan-a");
    assertThat(RunCommand.fileName("///")).isEqualTo("chart");
  }
}

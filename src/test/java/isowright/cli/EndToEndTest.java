package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.report.Numbers;
import isowright.study.Figure;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The demo as a newcomer runs it: one command, a finished report whose parts agree with one another
 * and with the files they come from. What is known of the invented plants is held against the
 * findings in {@code DemoFindingsTest}.
 */
class EndToEndTest {

  private static final Path DEMO = Path.of("notebooks-data");

  @TempDir private static Path folder;

  private static Invocation run;
  private static JsonNode findings;
  private static String html;

  @BeforeAll
  static void runTheDemo() throws IOException {
    Path into = folder.resolve("report");
    run = Invocation.of("run", DEMO.resolve("glassworks.yaml").toString(), "--into", "" + into);
    assertThat(run.code()).as(run.err()).isZero();
    findings = new ObjectMapper().readTree(into.resolve("findings.json").toFile());
    html = Files.readString(into.resolve("report.html"));
  }

  @Test
  void everythingPromisedIsWritten() throws IOException {
    assertThat(run.err()).isEmpty();
    Path report = folder.resolve("report");
    assertThat(report).isDirectoryContaining("glob:**/{report.html,findings.json}");
    assertThat(report.resolve("technology.json")).isRegularFile();
    try (Stream<Path> charts = Files.list(report.resolve("charts"))) {
      List<String> names = charts.map(path -> path.getFileName().toString()).sorted().toList();
      List<String> drawn = names.stream().filter(name -> name.endsWith(".svg")).toList();
      assertThat(drawn).hasSizeGreaterThan(10);
      assertThat(names)
          .containsAll(drawn.stream().map(name -> name.replace(".svg", ".png")).toList());
    }
  }

  @Test
  void theRunRecordHoldsTheFingerprintsOfWhatWasRead()
      throws IOException, NoSuchAlgorithmException {
    assertThat(findings.at("/study/sha256").asText()).isEqualTo(sha256("glassworks.yaml"));
    assertThat(findings.at("/records/sha256").asText()).isEqualTo(sha256("glassworks.csv"));
    assertThat(html).contains(sha256("glassworks.yaml"), sha256("glassworks.csv"));
  }

  private static String sha256(String name) throws IOException, NoSuchAlgorithmException {
    byte[] bytes = Files.readAllBytes(DEMO.resolve(name));
    return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
  }

  @Test
  void theAnswerInBriefIsThatOfTheFindings() {
    JsonNode plan = plan("ces");
    assertThat(plan.at("/status").asText()).isEqualTo("solved");
    // The screen rounds by the standard error: here to the nearest thousand.
    String cost =
        String.format(
            Locale.ROOT, "%,d", Math.round(plan.at("/cost/value").asDouble() / 1000) * 1000);
    assertThat(run.out()).contains("Plan 2025, long run: 40,000", cost);
    assertThat(html).contains(cost);
  }

  @Test
  void thePlanKeepsTheConditionsOfLeastCost() {
    for (String technology : List.of("cobb-douglas", "ces", "translog")) {
      JsonNode plan = plan(technology);
      double cost = 0;
      for (String input : List.of("labour", "machines", "energy")) {
        cost +=
            plan.at("/prices/" + input).asDouble() * plan.at("/mix/" + input + "/value").asDouble();
      }
      // a sum of three products of full precision
      assertThat(plan.at("/cost/value").asDouble()).isCloseTo(cost, within(1e-12 * cost));
      // w = λ f_x to the digits a solver working in doubles can be asked for
      assertThat(plan.at("/optimality").asDouble()).isLessThan(1e-9);
    }
  }

  @Test
  void bothBlemishesOfTheRecordsAreFoundAndShown() {
    List<String> codes = findings.at("/records/remarks").findValuesAsText("code");
    assertThat(codes).contains("power-of-ten-slip", "filed-cost-above-parts");
    assertThat(html).contains("14904487", "3718418"); // the cells as they stand in the file
  }

  /**
   * The report that lies in the repository is that of this version: the same files, and every
   * figure the same to 1e-9 (other processors may round the last digits of logs and powers
   * otherwise, and searches end within that).
   */
  @Test
  void theCommittedReportIsCurrent() throws IOException {
    Path committed = Path.of("reports", "glassworks");
    assertThat(names(committed)).isEqualTo(names(folder.resolve("report")));
    JsonNode stored = new ObjectMapper().readTree(committed.resolve("findings.json").toFile());
    assertSame(findings, stored, "");
  }

  private static List<String> names(Path folder) throws IOException {
    try (Stream<Path> all = Files.walk(folder)) {
      return all.filter(Files::isRegularFile)
          .map(file -> folder.relativize(file).toString().replace('\\', '/'))
          .sorted()
          .toList();
    }
  }

  private static void assertSame(JsonNode now, JsonNode stored, String place) {
    assertThat(stored.getNodeType()).as(place).isEqualTo(now.getNodeType());
    if (now.isNumber()) {
      double size = Math.max(1e-6, Math.abs(now.asDouble()));
      assertThat(stored.asDouble()).as(place).isCloseTo(now.asDouble(), within(1e-9 * size));
    } else if (now.isContainerNode()) {
      assertThat(stored).as(place).hasSameSizeAs(now);
      for (int i = 0; i < now.size() && now.isArray(); i++) {
        assertSame(now.get(i), stored.get(i), place + "/" + i);
      }
      now.properties()
          .forEach(
              field ->
                  assertSame(
                      field.getValue(), stored.path(field.getKey()), place + "/" + field.getKey()));
    } else if (!place.startsWith("/isowright")) {
      assertThat(stored.asText()).as(place).isEqualTo(now.asText());
    }
  }

  /** What README.md says the demo finds is what it finds. */
  @Test
  void theTableOfTheReadmeIsCurrent() throws IOException {
    String readme = Files.readString(Path.of("README.md"));
    JsonNode ces = findings.at("/fits/1");
    assertThat(ces.at("/technology").asText()).isEqualTo("ces");
    JsonNode trend =
        StreamSupport.stream(ces.at("/parameters").spliterator(), false)
            .filter(parameter -> parameter.at("/name").asText().equals("trend"))
            .findFirst()
            .orElseThrow();
    Stream.of(
            ces.at("/substitution/0"),
            ces.at("/returnsToScale"),
            ces.at("/outputElasticity/labour"),
            ces.at("/outputElasticity/machines"),
            ces.at("/outputElasticity/energy"),
            trend,
            plan("ces").at("/cost"),
            plan("ces").at("/marginalCost"))
        .forEach(figure -> assertThat(readme).contains("| " + words(figure) + " |"));
  }

  private static String words(JsonNode figure) {
    return Numbers.valueAndInterval(
        Figure.estimated(
            figure.at("/value").asDouble(),
            figure.at("/se").asDouble(),
            figure.at("/low").asDouble(),
            figure.at("/high").asDouble(),
            figure.at("/method").asText()));
  }

  private static JsonNode plan(String technology) {
    for (JsonNode plan : findings.at("/leastCost")) {
      if (plan.at("/technology").asText().equals(technology)
          && plan.at("/question").asText().equals("Plan 2025, long run")) {
        return plan;
      }
    }
    throw new AssertionError("no plan by " + technology);
  }
}

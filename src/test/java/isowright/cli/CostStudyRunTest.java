package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The study of the invented brickworks as a user runs it: page, findings, rows, answer. */
@Tag("slow")
class CostStudyRunTest {

  @TempDir private static Path folder;

  private static Invocation run;

  @BeforeAll
  static void run() {
    run =
        Invocation.of(
            "run",
            "notebooks-data/brickworks-costs.yaml",
            "--into",
            folder.resolve("report").toString(),
            "--quiet");
  }

  private static String file(String name) throws Exception {
    return Files.readString(folder.resolve("report").resolve(name));
  }

  @Test
  void answer() {
    assertThat(run.code()).as(run.err()).isZero();
    assertThat(run.out()).contains("translog-cost: estimated", "efficient scale", "at 360 of 360");
  }

  /** One line a row below the headings; numbers read back as they are in the findings. */
  @Test
  void rows() throws Exception {
    List<String> lines = file("rows-translog-cost.csv").lines().toList();
    assertThat(lines).hasSize(361);
    List<String> headings = Arrays.asList(lines.get(0).split(","));
    assertThat(headings)
        .contains(
            "average cost at mean prices",
            "scale economies low",
            "fitted share of kilns",
            "recorded share of kilns",
            "demand for labour in the price of energy high",
            "Allen-Uzawa labour and kilns");
    assertThat(lines).allSatisfy(line -> assertThat(line.split(",")).hasSameSizeAs(headings));
    JsonNode first = findings().at("/costs/fits/0/scale/0");
    String[] cells = lines.get(1).split(",");
    assertThat(cells[0]).isEqualTo(first.get("row").asText());
    assertThat(Double.parseDouble(cells[headings.indexOf("scale economies")]))
        .isEqualTo(first.get("value").doubleValue());
  }

  @Test
  void findingsHoldBothSides() throws Exception {
    JsonNode costs = findings().get("costs");
    assertThat(costs.get("sides")).hasSize(11);
    JsonNode scale = costs.get("sides").get(0);
    assertThat(scale.get("measure").asText()).isEqualTo("scale");
    assertThat(scale.at("/production/translog/value").isNumber()).isTrue();
    assertThat(scale.at("/cost/translog-cost/value").isNumber()).isTrue();
    JsonNode fit = costs.get("fits").get(0);
    assertThat(fit.get("averageCost")).hasSize(41);
    assertThat(fit.at("/scaleCounts/rows").intValue()).isEqualTo(360);
    assertThat(fit.get("overRows")).hasSize(10);
  }

  @Test
  void page() throws Exception {
    String page = file("report.html");
    assertThat(page)
        .contains(
            "Production and cost side by side",
            "Why the two sides may differ",
            "Scale economies over the rows",
            "Elasticities over the rows",
            "rows-translog-cost.csv",
            "Neary and Roberts 1980",
            "add up to 1.2510")
        // a table of 360 rows would be read by nobody
        .doesNotContain("Scale economies, row by row");
  }

  private static JsonNode findings() throws Exception {
    return new ObjectMapper().readTree(file("findings.json"));
  }
}

package isowright.report;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.RealFindings;
import isowright.study.RealFindings.Study;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The technology file suffices to ask a technology again, and holds none that has no answer. */
class TechnologyJsonTest {

  private static final ObjectMapper STRICT =
      new ObjectMapper().enable(JsonParser.Feature.STRICT_DUPLICATE_DETECTION);

  static Stream<Named<Findings>> all() {
    return RealFindings.withInvented().entrySet().stream()
        .map(entry -> Named.of(entry.getKey(), entry.getValue()));
  }

  private static JsonNode file(Findings findings) throws IOException {
    byte[] bytes = TechnologyJson.write(findings);
    assertThat(new String(bytes, UTF_8)).doesNotContainPattern("\\b(NaN|Infinity|Optional)\\b");
    assertThat(TechnologyJson.write(findings)).isEqualTo(bytes);
    return STRICT.readTree(bytes);
  }

  @ParameterizedTest
  @MethodSource("all")
  void holdsTheUsableFitsAndWhatItTakesToAskThem(Findings findings) throws IOException {
    JsonNode file = file(findings);
    List<Fitted> usable = findings.fits().stream().filter(Fitted::usable).toList();
    assertThat(file.get("technologies")).hasSameSizeAs(usable);
    List<String> inputs = List.copyOf(findings.units().inputs().keySet());
    for (int i = 0; i < usable.size(); i++) {
      Fitted fit = usable.get(i);
      JsonNode written = file.get("technologies").get(i);
      assertThat(written.get("technology").textValue()).isEqualTo(fit.technology());
      assertThat(written.get("inputs")).map(JsonNode::textValue).containsExactlyElementsOf(inputs);
      int parameters = fit.parameters().size();
      assertThat(written.get("parameters")).hasSize(parameters);
      assertThat(written.get("covariance")).hasSize(parameters);
      for (int p = 0; p < parameters; p++) {
        assertThat(written.at("/parameters/" + p + "/name").textValue())
            .isEqualTo(fit.parameters().get(p).name());
        assertThat(written.at("/parameters/" + p + "/value").doubleValue())
            .isEqualTo(fit.parameters().get(p).figure().value());
        for (int q = 0; q < parameters; q++) {
          assertThat(written.get("covariance").get(p).get(q).doubleValue())
              .isEqualTo(fit.covariance()[p][q]);
        }
      }
      fit.how()
          .scaling()
          .forEach(
              (input, mean) ->
                  assertThat(written.at("/scaling/" + input).doubleValue()).isEqualTo(mean));
      assertThat(FindingsContract.names(written.get("plantLevels")))
          .containsExactlyElementsOf(fit.plantLevels().keySet());
      assertThat(written.get("degreesOfFreedom").isNumber()).isTrue();
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void namesWhereItComesFrom(Findings findings) throws IOException {
    JsonNode file = file(findings);
    assertThat(file.at("/isowright/format").intValue()).isEqualTo(1);
    assertThat(file.at("/study/sha256").textValue()).isEqualTo(findings.run().studySha256());
    assertThat(file.get("records").isNull()).isEqualTo(findings.records().isEmpty());
    findings
        .records()
        .ifPresent(
            records ->
                assertThat(file.at("/records/sha256").textValue()).isEqualTo(records.sha256()));
    assertThat(file.get("given")).hasSameSizeAs(findings.given());
  }

  /**
   * Parameters, scaling, plant levels and the first period give back the fitted output of a row of
   * the demo's records.
   */
  @Test
  void aFittedRowIsFoundAgainFromTheFileAlone() throws IOException {
    Findings findings = RealFindings.of(Study.DEMO);
    JsonNode file = file(findings);
    JsonNode fit = file.at("/technologies/0");
    assertThat(fit.get("technology").textValue()).isEqualTo("cobb-douglas");
    // notebooks-data/glassworks.csv, its last row of GW-01
    List<String> lines = Files.readAllLines(Path.of("notebooks-data/glassworks.csv"));
    List<String> heads = List.of(lines.get(0).split(","));
    String[] row = lines.get(13).split(",");
    double log = parameter(fit, "constant") + fit.at("/plantLevels/GW-01").doubleValue();
    List<String> columns = List.of("labour_hours", "machine_hours", "energy_gj");
    List<String> inputs = List.of("labour", "machines", "energy");
    for (int i = 0; i < inputs.size(); i++) {
      double quantity = Double.parseDouble(row[heads.indexOf(columns.get(i))]);
      double scaled = quantity / fit.at("/scaling/" + inputs.get(i)).doubleValue();
      log += parameter(fit, inputs.get(i)) * Math.log(scaled);
    }
    double control = Double.parseDouble(row[heads.indexOf("breakdown_rate")]);
    log += parameter(fit, "control:breakdown_rate") * control;
    int first = Integer.parseInt(file.at("/records/firstPeriod").textValue());
    int period = Integer.parseInt(row[heads.indexOf("year")]);
    log += parameter(fit, "trend") * (period - first);
    // sums of products of doubles of about ten: some units in the last place
    assertThat(log).isCloseTo(findings.fits().get(0).points().get(12).fitted(), within(1e-11));
  }

  private static double parameter(JsonNode fit, String name) {
    for (JsonNode parameter : fit.get("parameters")) {
      if (parameter.get("name").textValue().equals(name)) {
        return parameter.get("value").doubleValue();
      }
    }
    throw new AssertionError("no parameter " + name);
  }
}

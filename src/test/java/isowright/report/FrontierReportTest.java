package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.FrontierFindings;
import isowright.study.Pipeline;
import isowright.study.PlanFindings.Planned;
import isowright.study.Progress;
import isowright.study.RealFindings;
import isowright.study.StudyFile;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A frontier from study file to plans, filings, findings file, charts and report. */
class FrontierReportTest {

  private static final Findings FINDINGS = RealFindings.of(RealFindings.Study.FRONTIER);

  private static Fitted fit() {
    return FINDINGS.fits().get(0);
  }

  private static FrontierFindings frontier() {
    return fit().frontier().orElseThrow();
  }

  /**
   * By a Cobb-Douglas technology with returns ν, output that is e^m as great at the same inputs
   * costs e^(−m/ν) as much.
   */
  @Test
  void planOnTheFrontierCostsWhatMeanInefficiencySays() {
    List<Planned> plans = FINDINGS.plans();
    double typical = plans.get(0).cost().orElseThrow().value();
    double frontier = plans.get(1).cost().orElseThrow().value();
    double mean = frontier().variances().orElseThrow().mean().value();
    double scale = fit().returnsToScale().orElseThrow().value();
    assertThat(Math.log(typical / frontier)).isCloseTo(mean / scale, within(1e-9));
    assertThat(plans.get(1).productivity()).contains("frontier", "no inefficiency", "2024");
  }

  @Test
  void filingsAreHeldAgainstTheFrontier() {
    assertThat(FINDINGS.review().reference()).contains("the frontier (no inefficiency)");
    assertThat(FINDINGS.review().variants())
        .anySatisfy(v -> assertThat(v.choice()).isEqualTo("typical"))
        .anySatisfy(v -> assertThat(v.choice()).isEqualTo("best-quarter"));
    assertThat(FINDINGS.review().remarks())
        .anySatisfy(
            r -> {
              assertThat(r.code()).isEqualTo("against-frontier");
              assertThat(r.message()).contains("not waste");
            });
    assertThat(FINDINGS.run().settings()).containsEntry("filing.against", "frontier");
  }

  @Test
  void findingsFileHoldsIt() throws IOException {
    JsonNode fit = new ObjectMapper().readTree(FindingsJson.write(FINDINGS)).get("fits").get(0);
    JsonNode found = fit.get("frontier");
    assertThat(found.get("state").asText()).isEqualTo("found");
    assertThat(found.get("overTime").asText()).isEqualTo("decay");
    for (String figure :
        List.of("noise", "inefficiency", "ratio", "gamma", "shareOfVariance", "decay")) {
      assertThat(found.get(figure).get("low").doubleValue())
          .isLessThan(found.get(figure).get("high").doubleValue());
    }
    assertThat(found.get("plants")).hasSize(14);
    assertThat(found.get("rows")).hasSize(180);
    JsonNode plant = found.get("plants").get(3);
    assertThat(plant.get("inefficiency").get("method").asText()).isEqualTo("conditional");
    assertThat(plant.get("aboveMean").doubleValue()).isBetween(0.0, 1.0);
    assertThat(plant.get("byEffects").get("se").doubleValue()).isPositive();
    JsonNode technology =
        new ObjectMapper().readTree(TechnologyJson.write(FINDINGS)).get("technologies").get(0);
    assertThat(technology.get("frontier").get("meanInefficiency").doubleValue())
        .isEqualTo(frontier().variances().orElseThrow().mean().value());
  }

  @Test
  void chartAndReportSayWhatItIsNot() {
    List<Chart> charts = Charts.of(FINDINGS);
    Chart chart =
        charts.stream().filter(c -> c.kind() == Chart.Kind.INEFFICIENCY).findFirst().orElseThrow();
    assertThat(chart.rows()).hasSize(14);
    assertThat(chart.caption()).contains("not waste", "given the residuals");
    assertThat(chart.svg().get()).contains("GW-07", "mean inefficiency", "from plant effects");
    String page = HtmlReport.write(FINDINGS, charts);
    assertThat(page)
        .contains(
            "Inefficiency beyond noise: Cobb-Douglas, on average",
            "Inefficiency and noise",
            "It is no measure of waste",
            "Annex: inefficiency, plant by plant",
            "taken for the best",
            "Battese and Coelli 1992",
            "Schmidt and Sickles 1984",
            "Kodde and Palm 1986");
  }

  /** Published rows skewed the other way: said everywhere, with no figure of inefficiency. */
  @Test
  void wrongSkewIsSaidEverywhere(@TempDir Path folder) throws Exception {
    Path records = Path.of("src/test/resources/published/primary-metals-27-states.csv");
    Files.copy(records, folder.resolve("metals.csv"));
    Path study =
        Files.writeString(
            folder.resolve("study.yaml"),
            """
            title: Primary metals
            records: {file: metals.csv}
            output: {column: output}
            inputs:
              labour: {quantity: labor}
              capital: {quantity: capital}
            technologies: [cobb-douglas]
            estimation: {frontier: {inefficiency: exponential}}
            least-cost:
              - {name: Plan, target: 2500, prices: {labour: 2, capital: 1}, productivity: frontier}
            """);
    Findings findings = Pipeline.run(StudyFile.read(study), Progress.SILENT);
    Fitted fit = findings.fits().get(0);
    assertThat(fit.frontier().orElseThrow().state()).isEqualTo("wrong-skew");
    assertThat(fit.remarks()).anyMatch(r -> r.code().equals("wrong-skew"));
    assertThat(findings.plans().get(0).productivity()).contains("no inefficiency was found");
    JsonNode file = new ObjectMapper().readTree(FindingsJson.write(findings));
    FindingsContract.check(file);
    JsonNode frontier = file.get("fits").get(0).get("frontier");
    assertThat(frontier.has("inefficiency")).isFalse();
    assertThat(frontier.get("skewness").doubleValue()).isPositive();
    List<Chart> charts = Charts.of(findings);
    assertThat(charts).noneMatch(c -> c.kind() == Chart.Kind.INEFFICIENCY);
    assertThat(HtmlReport.write(findings, charts))
        .contains("skewed to the right", "cannot be said: Cobb-Douglas")
        .doesNotContain("Inefficiency and noise");
  }
}

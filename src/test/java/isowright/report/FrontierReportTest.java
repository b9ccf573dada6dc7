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
import isowright.study.PlanFindings.Planned;
import isowright.study.RealFindings;
import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;

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
}

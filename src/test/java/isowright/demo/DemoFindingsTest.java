package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.Pipeline;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.Progress;
import isowright.study.StudyFile;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/**
 * The demo from study file to findings, held against the truth behind its records, which is written
 * in {@link GlassworksTruth} without the program's formulas.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class DemoFindingsTest {

  private static final double TARGET = 40_000;
  private static final double[] PRICES = {34, 74, 10.5};
  private static final List<String> INPUTS = List.of("labour", "machines", "energy");

  private Findings findings;

  @BeforeAll
  void run() throws Exception {
    findings =
        Pipeline.run(StudyFile.read(Path.of("notebooks-data", "glassworks.yaml")), Progress.SILENT);
  }

  @Test
  void trueLeastCostLiesInTheIntervalsOfTheCesPlan() {
    double[] truth = GlassworksTruth.leastCostMix(Math.log(TARGET), PRICES, 2024, 0);
    Planned plan = plan("Plan 2025, long run", "ces");
    assertThat(plan.status()).isEqualTo("solved");
    double cost = 0;
    for (int i = 0; i < truth.length; i++) {
      assertCovers(mix(plan, INPUTS.get(i)), truth[i], INPUTS.get(i));
      cost += PRICES[i] * truth[i];
    }
    assertCovers(plan.cost().orElseThrow(), cost, "cost");
  }

  @Test
  void installedMachinesAndTheLabourLimitBindInTheShortRun() {
    Planned plan = plan("Plan 2025, machines as installed", "ces");
    assertThat(plan.status()).isEqualTo("corner");
    double[] truth = {92_000, 42_000, 0};
    assertThat(mix(plan, "labour").value()).isEqualTo(truth[0]);
    assertThat(mix(plan, "machines").value()).isEqualTo(truth[1]);
    // More energy makes up for what machines and labour cannot: output rises in energy, so halving
    // the bracket sixty times finds the only amount that reaches the target.
    double low = 1e5;
    double high = 1e6;
    for (int k = 0; k < 60; k++) {
      truth[2] = (low + high) / 2;
      double reached = GlassworksTruth.logOutput(truth, 2024, 0, GlassworksTruth.USUAL_BREAKDOWN);
      if (reached < Math.log(TARGET)) {
        low = truth[2];
      } else {
        high = truth[2];
      }
    }
    assertCovers(mix(plan, "energy"), truth[2], "energy");
    assertThat(plan.cost().orElseThrow().value())
        .isGreaterThan(plan("Plan 2025, long run", "ces").cost().orElseThrow().value());
  }

  @Test
  void reviewShowsTheOverfiledCostAsUnreconciled() {
    Reviewed overfiled =
        findings.reviews().stream()
            .filter(review -> review.plant().equals(GlassworksBlemishes.OVERFILED_PLANT))
            .findFirst()
            .orElseThrow();
    // The filed cost is rounded to whole EUR in some three million.
    assertThat(overfiled.unreconciled() / overfiled.atPrices())
        .isCloseTo(GlassworksBlemishes.OVERFILED_SHARE, within(1e-6));
  }

  /**
   * A level is a mean of 13 noises of 0.03 (0.008), and takes up an error in returns to scale
   * (0.017) times log size (at most 1 from the middle): three times the root of the sum of squares.
   */
  @Test
  void plantLevelsAreTheTrueProductivities() {
    double tolerance = 3 * Math.hypot(0.008, 0.017);
    Fitted ces =
        findings.fits().stream()
            .filter(fit -> fit.technology().equals("ces"))
            .findFirst()
            .orElseThrow();
    for (GlassworksTruth.Plant plant : GlassworksTruth.PLANTS) {
      assertThat(ces.plantLevels().get(plant.name()))
          .as(plant.name())
          .isCloseTo(plant.productivity(), within(tolerance));
    }
  }

  @Test
  void auditFindsBothBlemishesAndTheMissingCells() {
    Findings.Records records = findings.records().orElseThrow();
    assertThat(records.used()).isEqualTo(records.rows() - 2);
    assertSaid(records, "GW-09", "2017", "machine_cost", "10 times");
    assertSaid(records, "GW-11", "2024", "filed_cost");
  }

  private static void assertSaid(Findings.Records records, String... words) {
    assertThat(records.remarks())
        .anyMatch(said -> List.of(words).stream().allMatch(said.message()::contains));
  }

  private Planned plan(String question, String technology) {
    return findings.plans().stream()
        .filter(p -> p.question().equals(question) && p.technology().equals(technology))
        .findFirst()
        .orElseThrow();
  }

  private static Figure mix(Planned plan, String input) {
    return Optional.ofNullable(plan.mix().get(input)).orElseThrow();
  }

  private static void assertCovers(Figure figure, double truth, String name) {
    Figure.Uncertainty uncertainty = figure.uncertainty().orElseThrow();
    assertThat(truth).as(name).isBetween(uncertainty.low(), uncertainty.high());
  }
}

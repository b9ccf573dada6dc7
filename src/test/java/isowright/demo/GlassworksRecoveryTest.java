package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.technology.Ces;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

/** From the demo's records the truth behind them is found again. */
class GlassworksRecoveryTest {

  private final Panel panel;

  GlassworksRecoveryTest() throws Exception {
    Study study = StudyFile.read(Path.of("notebooks-data", "glassworks.yaml"));
    Study.Records records = study.records().orElseThrow();
    panel = RecordsReader.read(records.source(), records.roles(), records.keep()).panel();
  }

  @Test
  void withinPlantsTheTruthIsFound() {
    Fit fit = fit(PlantEffects.WITHIN);
    assertThat(fit.state()).isEqualTo(Fit.State.ESTIMATED);
    assertFound(fit, "scale", GlassworksTruth.SCALE);
    assertFound(fit, "trend", GlassworksTruth.TREND);
    assertFound(fit, "control:breakdown_rate", GlassworksTruth.BREAKDOWN);
    var profile = fit.profile().orElseThrow();
    assertThat(GlassworksTruth.SUBSTITUTION)
        .isBetween(profile.substitutionLow(), profile.substitutionHigh());
    assertThat(profile.substitutionHigh()).as("and not Cobb-Douglas").isLessThan(1);
  }

  /** Productive plants are larger: without plant effects that is taken for scale. */
  @Test
  void poolingOverstatesReturnsToScale() {
    double pooled = parameter(fit(PlantEffects.NONE), "scale");
    double within = parameter(fit(PlantEffects.WITHIN), "scale");
    assertThat(pooled).isGreaterThan(within).isGreaterThan(GlassworksTruth.SCALE);
  }

  private Fit fit(PlantEffects effects) {
    return Estimation.fit(
        panel,
        new Specification(Ces.FORM, effects, Time.TREND, true, StandardErrors.CLUSTERED, 0.95));
  }

  /** Three standard errors: one draw, and 14 clusters make standard errors themselves uncertain. */
  private static void assertFound(Fit fit, String name, double truth) {
    int k = fit.numbers().index(name);
    double error = Math.sqrt(fit.numbers().covariance()[k][k]);
    assertThat(Math.abs(parameter(fit, name) - truth)).as(name).isLessThan(3 * error);
  }

  private static double parameter(Fit fit, String name) {
    return fit.numbers().parameters()[fit.numbers().index(name)];
  }
}

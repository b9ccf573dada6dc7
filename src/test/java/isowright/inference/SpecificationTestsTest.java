package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Tests of the specification against R ({@code src/test/resources/reference/specification.R}, which
 * names the packages and versions that made the values) on two published data sets.
 */
class SpecificationTestsTest {

  /**
   * Relative, in percent: both sides solve least squares by orthogonal methods on columns with
   * inflation factors up to 3e5, so some ten digits are left.
   */
  private static final double AGREEMENT = 1e-5;

  private static final ReferenceValues REFERENCE = ReferenceValues.of("specification.csv");

  private static Fit fit(
      Panel panel, String form, PlantEffects effects, StandardErrors errors, boolean scaled) {
    return Estimation.fit(
        panel,
        new Specification(
            Form.named(form), effects, Specification.Time.NONE, scaled, errors, 0.95));
  }

  @ParameterizedTest
  @CsvSource({
    "metals-cobb-douglas, cobb-douglas, NONE, CLASSICAL, 4",
    "metals-translog, translog, NONE, CLASSICAL, 4",
    "states-pooled, cobb-douglas, NONE, CLASSICAL, 4",
    "states-pooled-clustered, cobb-douglas, NONE, CLUSTERED, 3",
    "states-within, cobb-douglas, WITHIN, CLASSICAL, 4",
    "states-within-clustered, cobb-douglas, WITHIN, CLUSTERED, 3"
  })
  void statisticsAgreeWithTheReference(
      String name, String form, PlantEffects effects, StandardErrors errors, int tests) {
    Panel panel =
        name.startsWith("metals") ? PanelFixtures.primaryMetals() : PanelFixtures.usStates();
    List<Verdict> verdicts = SpecificationTests.of(fit(panel, form, effects, errors, false));
    assertThat(verdicts).extracting(Verdict::name).isEqualTo(SpecificationTests.NAMES);
    int held = 0;
    for (Verdict verdict : verdicts) {
      double[] reference = REFERENCE.group(name).get(verdict.name());
      if (reference == null) {
        continue; // normality does not depend on the covariance and is held once
      }
      held++;
      assertThat(verdict.statistic())
          .as(name + " " + verdict.name())
          .isCloseTo(reference[0], withinPercentage(AGREEMENT));
      List<Double> degrees = verdict.law().degreesOfFreedom();
      assertThat(degrees.get(0)).isEqualTo(reference[1]);
      assertThat(degrees).hasSize(Double.isNaN(reference[2]) ? 1 : 2);
      assertThat(degrees.get(degrees.size() - 1)).isEqualTo(reference[degrees.size()]);
      // p falls some hundred times as fast as the statistic grows; beyond 1e-12 only its size
      // counts
      assertThat(verdict.p())
          .as("p of " + verdict.name())
          .isCloseTo(reference[3], within(Math.max(1e-12, 1e-4 * reference[3])));
    }
    assertThat(held).isEqualTo(tests);
  }

  @ParameterizedTest
  @CsvSource({
    "metals-cobb-douglas, cobb-douglas, NONE, false",
    "metals-translog, translog, NONE, false",
    "metals-translog-scaled, translog, NONE, true",
    "states-pooled, cobb-douglas, NONE, false",
    "states-within, cobb-douglas, WITHIN, false"
  })
  void inflationAgreesWithTheReference(
      String name, String form, PlantEffects effects, boolean scaled) {
    Panel panel =
        name.startsWith("metals") ? PanelFixtures.primaryMetals() : PanelFixtures.usStates();
    Fit fit = fit(panel, form, effects, StandardErrors.CLASSICAL, scaled);
    var factors = fit.numbers().inflation();
    Map<String, String> words =
        Map.of(
            "ll",
            "labour*labour",
            "lk",
            "labour*capital",
            "kk",
            "capital*capital",
            "unemp",
            "control:unemp");
    int held = 0;
    for (Map.Entry<String, double[]> reference : REFERENCE.group(name).entrySet()) {
      if (reference.getKey().startsWith("inflation:")) {
        String key = reference.getKey().substring("inflation:".length());
        var factor =
            factors.stream()
                .filter(f -> f.column().equals(words.getOrDefault(key, key)))
                .findFirst()
                .orElseThrow();
        assertThat(factor.raw())
            .as("raw " + key)
            .isCloseTo(reference.getValue()[0], withinPercentage(AGREEMENT));
        assertThat(factor.centred())
            .as("centred " + key)
            .isCloseTo(reference.getValue()[1], withinPercentage(AGREEMENT));
        held++;
      }
    }
    assertThat(held).isEqualTo(factors.size());
  }

  /** Skewness 0 and kurtosis 1 of two points: N/6 · (1 − 3)²/4, by hand. */
  @Test
  void jarqueBeraByHand() {
    double[] values = {1, -1, 1, -1, 1, -1};
    assertThat(SpecificationTests.jarqueBera(values, 6)).isCloseTo(1, within(1e-14));
  }

  /**
   * Two rows a plant: residuals are pairs of opposite sign, and nothing can be said of skewness.
   */
  @Test
  void normalityIsNotTestedOnPairs() {
    int rows = 40;
    int[] plant = new int[rows];
    int[] period = new int[rows];
    double[] output = new double[rows];
    double[] labour = new double[rows];
    java.util.SplittableRandom random = new java.util.SplittableRandom(5);
    for (int r = 0; r < rows; r++) {
      plant[r] = r / 2;
      period[r] = r % 2;
      labour[r] = Math.exp(random.nextDouble());
      output[r] = labour[r] * Math.exp(random.nextDouble());
    }
    double[] machines = new double[rows];
    java.util.Arrays.setAll(machines, r -> Math.exp(random.nextDouble()));
    Panel panel =
        PanelFixtures.panel(
            plant,
            period,
            output,
            List.of("labour", "machines"),
            List.of(labour, machines),
            List.of(),
            List.of());
    Fit fit = fit(panel, "cobb-douglas", PlantEffects.WITHIN, StandardErrors.CLASSICAL, true);
    assertThat(SpecificationTests.of(fit))
        .extracting(Verdict::name)
        .containsExactly("reset", "breusch-pagan", "white");
  }

  /** Fourteen clusters cannot carry five terms: the short forms are made, and say so. */
  @Test
  void fewClustersGetTheShortForms() {
    Fit fit =
        fit(
            PanelFixtures.usStates(),
            "translog",
            PlantEffects.WITHIN,
            StandardErrors.CLUSTERED,
            true);
    List<Verdict> verdicts = SpecificationTests.of(fit);
    assertThat(verdicts.get(1).nullHypothesis()).contains("fitted value", "plants being too few");
    assertThat(verdicts.get(1).law().degreesOfFreedom()).containsExactly(1.0, 47.0);
    assertThat(verdicts.get(2).law().degreesOfFreedom()).containsExactly(2.0, 46.0);
  }
}

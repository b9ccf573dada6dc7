package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.offset;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.inference.Hypotheses;
import isowright.inference.Verdict;
import isowright.records.Keep;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Roles;
import isowright.records.Source;
import isowright.technology.Elasticities;
import isowright.technology.Form;
import isowright.technology.Restriction;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Nested CES, generalised Leontief and restricted translogs on the demo records against R ({@code
 * src/test/resources/reference/further-forms.R}, which names the version that made the values): a
 * general optimiser with numerical derivatives, and lm on regressors restricted by hand.
 */
class FurtherFormsTest {

  private static final List<String> INPUTS = List.of("labour", "machines", "energy");
  private static final List<List<String>> NESTS =
      List.of(List.of("labour", "machines"), List.of("energy"));
  private static final Panel RECORDS = glassworks();

  private static Panel glassworks() {
    try {
      return RecordsReader.read(
              new Source(
                  Path.of("notebooks-data/glassworks.csv"), Optional.empty(), Optional.empty()),
              new Roles(
                  Optional.of("plant"),
                  Optional.of("year"),
                  "tonnes",
                  Optional.empty(),
                  List.of(
                      input("labour", "labour_hours"),
                      input("machines", "machine_hours"),
                      input("energy", "energy_gj")),
                  List.of(new Roles.Control("breakdown_rate", false)),
                  Optional.empty(),
                  Optional.empty()),
              Keep.ALL)
          .panel();
    } catch (RecordsRefused refused) {
      throw new IllegalStateException(refused);
    }
  }

  private static Roles.Input input(String name, String column) {
    return new Roles.Input(name, column, Optional.empty(), Optional.empty(), Optional.empty());
  }

  private static Fit fit(Form form, PlantEffects effects) {
    return Estimation.fit(
        RECORDS, new Specification(form, effects, Time.TREND, true, StandardErrors.CLASSICAL, .95));
  }

  private static Map<String, Double> reference(PlantEffects effects, String form) {
    String start = (effects == PlantEffects.NONE ? "pooled," : "within,") + form + ",";
    Map<String, Double> values = new LinkedHashMap<>();
    try {
      for (String line :
          Files.readAllLines(Path.of("src/test/resources/reference/further-forms.csv"))) {
        if (line.startsWith(start)) {
          String[] parts = line.substring(start.length()).split(",");
          values.put(parts[0], Double.parseDouble(parts[1]));
        }
      }
    } catch (IOException missing) {
      throw new UncheckedIOException(missing);
    }
    assertThat(values).containsKey("ssr");
    return values;
  }

  private static void agrees(Fit fit, Map<String, Double> reference) {
    Solution numbers = fit.numbers();
    reference.forEach(
        (name, value) -> {
          if (name.equals("ssr")) {
            // A minimum: errors of the parameters enter squared.
            assertThat(numbers.linear().ssr()).isCloseTo(value, withinPercentage(1e-7));
          } else if (!name.equals("F") && !name.equals("kappa")) {
            boolean error = name.startsWith("se ");
            int k = numbers.index(error ? name.substring(3) : name);
            double found = error ? Math.sqrt(numbers.covariance()[k][k]) : numbers.parameters()[k];
            // The reference steps along numerical derivatives until steps are under 1e-11.
            assertThat(found)
                .as(name)
                .isCloseTo(value, within(2e-6 * Math.max(1, Math.abs(value))));
          }
        });
  }

  @ParameterizedTest
  @EnumSource(names = {"NONE", "WITHIN"})
  void nestedCes(PlantEffects effects) {
    Fit fit = fit(Form.named("nested-ces").nested(NESTS, INPUTS), effects);
    assertThat(fit.state().usable()).as(fit.reasons().toString()).isTrue();
    agrees(fit, reference(effects, "nested-ces"));
    assertThat(fit.profiles())
        .extracting(CurvatureProfile::name)
        .containsExactly("rho", "rho:labour+machines");
    for (CurvatureProfile profile : fit.profiles()) {
      int k = fit.numbers().index(profile.name());
      double sigma = 1 / (1 + fit.numbers().parameters()[k]);
      assertThat(sigma).isBetween(profile.substitutionLow(), profile.substitutionHigh());
      double least =
          profile.points().stream().mapToDouble(CurvatureProfile.Point::ssr).min().orElseThrow();
      assertThat(least).isCloseTo(fit.numbers().linear().ssr(), withinPercentage(1e-7));
    }
    // CES lies inside the form, and the reference of CES is another optimum by another route.
    double ces = fit(Form.named("ces"), effects).numbers().linear().ssr();
    assertThat(fit.numbers().linear().ssr()).isLessThanOrEqualTo(ces);
    Verdict one = verdict(fit, "one-substitution");
    double ratio = RECORDS.rows() * Math.log(ces / fit.numbers().linear().ssr());
    assertThat(one.statistic()).isCloseTo(ratio, offset(1e-6 * Math.max(1, ratio)));
  }

  @ParameterizedTest
  @EnumSource(names = {"NONE", "WITHIN"})
  void generalisedLeontief(PlantEffects effects) {
    Fit fit = fit(Form.named("generalised-leontief"), effects);
    assertThat(fit.state()).as(fit.reasons().toString()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(fit.profiles()).isEmpty();
    agrees(fit, reference(effects, "generalised-leontief"));
  }

  @ParameterizedTest
  @CsvSource({
    "NONE,CONSTANT_RETURNS",
    "WITHIN,CONSTANT_RETURNS",
    "NONE,HOMOGENEOUS",
    "WITHIN,HOMOGENEOUS"
  })
  void linearRestrictions(PlantEffects effects, Restriction restriction) {
    Form translog = Form.named("translog");
    Fit fit = fit(translog.restricted(restriction), effects);
    Map<String, Double> reference = reference(effects, restriction.word());
    agrees(fit, reference);
    // With the classical covariance the Wald test is the F test from the two sums of squares.
    assertThat(verdict(fit(translog, effects), restriction.word()).statistic())
        .isCloseTo(reference.getOrDefault("F", Double.NaN), withinPercentage(1e-5));
    double[] covariance = new double[fit.numbers().parameters().length];
    for (double[] row : translog.restrictions(Restriction.HOMOGENEOUS, INPUTS)) {
      for (int k = 0; k < covariance.length; k++) {
        double sum = 0;
        for (int j = 0; j + 1 < row.length; j++) {
          sum += row[j] * fit.numbers().covariance()[1 + j][k];
        }
        // Singular along the restriction, to rounding of variances of the order of one.
        assertThat(sum).isCloseTo(0, within(1e-12));
      }
    }
    Elasticities away =
        Elasticities.atMix(fit.numbers().technology(), new double[] {9e4, 3e3, 7e5});
    Elasticities base = Elasticities.atBase(fit.numbers().technology());
    assertThat(away.scale()).isCloseTo(base.scale(), within(1e-12));
    if (restriction == Restriction.CONSTANT_RETURNS) {
      assertThat(base.scale()).isCloseTo(1, within(1e-12));
    }
    // The response is ln Q whatever was taken off it.
    assertThat(fit.numbers().statistics().rSquared())
        .isLessThan(fit(translog, effects).numbers().statistics().rSquared())
        .isGreaterThan(.5);
  }

  @ParameterizedTest
  @EnumSource(names = {"NONE", "WITHIN"})
  void homothetic(PlantEffects effects) {
    Fit fit = fit(Form.named("translog").restricted(Restriction.HOMOTHETIC), effects);
    Map<String, Double> reference = reference(effects, "homothetic");
    agrees(fit, reference);
    double[] theta = fit.numbers().technology().parameters();
    double kappa = reference.getOrDefault("kappa", Double.NaN);
    int[][] rows = {{4, 5, 6}, {5, 7, 8}, {6, 8, 9}};
    for (int i = 0; i < 3; i++) {
      double sum = theta[rows[i][0]] + theta[rows[i][1]] + theta[rows[i][2]];
      // The reference's line search is good to the square root of rounding in the sum of squares.
      assertThat(sum).isCloseTo(kappa * theta[1 + i], within(1e-5));
    }
  }

  @ParameterizedTest
  @CsvSource({"ces", "nested-ces", "generalised-leontief", "cobb-douglas"})
  void constantReturnsOfOtherForms(String name) {
    Form form = Form.named(name).nested(NESTS, INPUTS);
    Fit free = fit(form, PlantEffects.WITHIN);
    Fit held = fit(form.restricted(Restriction.CONSTANT_RETURNS), PlantEffects.WITHIN);
    assertThat(held.state().usable()).isTrue();
    assertThat(Elasticities.atBase(held.numbers().technology()).scale())
        .isCloseTo(1, within(1e-12));
    assertThat(held.numbers().linear().ssr()).isGreaterThan(free.numbers().linear().ssr());
    assertThat(Hypotheses.of(held, 1, 1))
        .extracting(Verdict::name)
        .doesNotContain("constant-returns");
  }

  private static Verdict verdict(Fit fit, String name) {
    return Hypotheses.of(fit, 1, 1).stream()
        .filter(v -> v.name().equals(name))
        .findFirst()
        .orElseThrow();
  }
}

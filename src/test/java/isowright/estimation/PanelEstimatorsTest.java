package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.VarianceComponents;
import isowright.regression.VarianceComponents.Method;
import isowright.technology.Form;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every estimator against R, on the US states whole and with holes (unequal lengths, gaps, a state
 * seen once), for Cobb-Douglas and translog: see {@link PanelReference}.
 */
class PanelEstimatorsTest {

  /**
   * R gives twelve digits and solves by normal equations in plm; a translog of means has columns a
   * condition of some 1e4 apart, whose square takes eight of sixteen digits.
   */
  private static final double RELATIVE = 1e-6;

  /** An estimator by its name in the reference. */
  private record Estimator(
      String name, PlantEffects effects, Time time, Method method, StandardErrors errors) {}

  static final List<Panel> PANELS =
      List.of(PanelFixtures.usStates(), PanelFixtures.usStatesWithHoles());

  private static Estimator classical(String name, PlantEffects effects, Time time) {
    return new Estimator(name, effects, time, Method.SWAMY_ARORA, StandardErrors.CLASSICAL);
  }

  private static Estimator random(String name, Method method) {
    return new Estimator(name, PlantEffects.RANDOM, Time.NONE, method, StandardErrors.CLASSICAL);
  }

  private static Estimator clustered(String name, PlantEffects effects, Time time) {
    return new Estimator(name, effects, time, Method.SWAMY_ARORA, StandardErrors.CLUSTERED);
  }

  private record Case(String panel, String form, Estimator estimator) {
    @Override
    public String toString() {
      return estimator.name() + ", " + form + ", " + panel;
    }

    Fit fit() {
      return Estimation.fit(
          PANELS.get(panel.equals("whole") ? 0 : 1),
          new Specification(
                  Form.named(form),
                  estimator.effects(),
                  estimator.time(),
                  true,
                  estimator.errors(),
                  0.95)
              .with(estimator.method()));
    }
  }

  static Stream<Case> cases() {
    List<Estimator> estimators =
        List.of(
            classical("between", PlantEffects.BETWEEN, Time.NONE),
            classical("within", PlantEffects.WITHIN, Time.NONE),
            classical("two-way", PlantEffects.WITHIN, Time.TWO_WAY),
            random("random-swar", Method.SWAMY_ARORA),
            random("random-walhus", Method.WALLACE_HUSSAIN),
            random("random-amemiya", Method.AMEMIYA),
            classical("differences", PlantEffects.DIFFERENCES, Time.NONE),
            clustered("differences-clustered", PlantEffects.DIFFERENCES, Time.NONE),
            classical("differences-trend", PlantEffects.DIFFERENCES, Time.TREND),
            classical("mundlak", PlantEffects.MUNDLAK, Time.NONE),
            clustered("mundlak-clustered", PlantEffects.MUNDLAK, Time.NONE),
            clustered("quadratic-trend", PlantEffects.WITHIN, Time.QUADRATIC_TREND),
            clustered("biased-trend", PlantEffects.WITHIN, Time.BIASED_TREND));
    return estimators.stream()
        .flatMap(
            estimator ->
                Stream.of("whole", "holes")
                    .flatMap(
                        panel ->
                            Stream.of("cobb-douglas", "translog")
                                .map(form -> new Case(panel, form, estimator))));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("cases")
  void agreesWithReference(Case one) {
    Solution numbers = one.fit().numbers();
    for (PanelReference.Value value :
        PanelReference.of(one.panel(), one.form(), one.estimator().name())) {
      switch (value.name()) {
        case "row" -> assertClose("σ²_e", components(numbers).row(), value.value());
        case "plant" -> assertClose("σ²_u", components(numbers).group(), value.value());
        default -> {
          // A difference's constant is the trend of the levels.
          boolean drift =
              one.estimator().name().startsWith("differences") && value.name().equals("constant");
          int at = numbers.index(drift ? "trend" : value.name());
          double error = Math.sqrt(numbers.covariance()[at][at]);
          assertClose("standard error of " + value.name(), error, value.error());
          // in units of its standard error, for a coefficient may lie anywhere near zero
          assertThat((numbers.parameters()[at] - value.value()) / error)
              .as(value.name())
              .isCloseTo(0, within(RELATIVE));
        }
      }
    }
  }

  private static VarianceComponents components(Solution numbers) {
    return numbers.treatment().components().orElseThrow();
  }

  private static void assertClose(String name, double actual, double expected) {
    assertThat(actual).as(name).isCloseTo(expected, within(RELATIVE * Math.abs(expected)));
  }
}

package isowright.estimation;

import static isowright.estimation.Specification.PlantEffects.BETWEEN;
import static isowright.estimation.Specification.PlantEffects.DIFFERENCES;
import static isowright.estimation.Specification.PlantEffects.MUNDLAK;
import static isowright.estimation.Specification.PlantEffects.NONE;
import static isowright.estimation.Specification.PlantEffects.RANDOM;
import static isowright.estimation.Specification.PlantEffects.WITHIN;
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
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * 48 US states, 1970 to 1986, every estimator: Munnell 1990; Baltagi and Pinnoi 1995; Baltagi,
 * <i>Econometric Analysis of Panel Data</i>, table of chapter 2. Values from R 4.2 ({@code lm},
 * {@code plm}), which agree with the printed table to all printed digits; they are written to six
 * decimals, so half a unit of the sixth is what can be asked.
 */
class UsStatesTest {

  private static final double WRITTEN = 0.5e-6;

  private static final List<String> NAMES =
      List.of("constant", "pcap", "pc", "emp", "control:unemp");

  /**
   * One row of the table.
   *
   * @param values constant, pcap, pc, emp, unemp; NaN where the table has none
   * @param errors standard errors likewise
   * @param ssr sum of squared residuals
   */
  private record Published(
      String name,
      PlantEffects effects,
      Time time,
      Method method,
      double[] values,
      double[] errors,
      double ssr) {
    @Override
    public String toString() {
      return name;
    }
  }

  private static final double NA = Double.NaN;

  static Stream<Published> table() {
    double[] none = {NA, NA, NA, NA, NA};
    return Stream.of(
        new Published(
            "pooled",
            NONE,
            Time.NONE,
            Method.SWAMY_ARORA,
            new double[] {1.643302, .155007, .309190, .593935, -.006733},
            new double[] {.057587, .017154, .010272, .013747, .001416},
            6.294154),
        new Published(
            "between",
            BETWEEN,
            Time.NONE,
            Method.SWAMY_ARORA,
            new double[] {1.589444, .179365, .301954, .576127, -.003890},
            new double[] {.232980, .071972, .041821, .056375, .009908},
            .2977008),
        new Published(
            "within",
            WITHIN,
            Time.NONE,
            Method.SWAMY_ARORA,
            new double[] {NA, -.026150, .292007, .768159, -.005298},
            new double[] {NA, .029002, .025120, .030092, .000989},
            1.111189),
        new Published(
            "random, Swamy-Arora",
            RANDOM,
            Time.NONE,
            Method.SWAMY_ARORA,
            new double[] {2.135411, .004439, .310548, .729671, -.006172},
            new double[] {.133461, .023417, .019805, .024920, .000907},
            1.187864),
        new Published(
            "random, Wallace-Hussain",
            RANDOM,
            Time.NONE,
            Method.WALLACE_HUSSAIN,
            new double[] {2.108816, .008605, .312835, .724346, -.006280},
            none,
            NA),
        new Published(
            "random, Amemiya",
            RANDOM,
            Time.NONE,
            Method.AMEMIYA,
            new double[] {2.156399, .001250, .308711, .733785, -.006087},
            none,
            NA),
        new Published(
            "within, two-way",
            WITHIN,
            Time.TWO_WAY,
            Method.SWAMY_ARORA,
            new double[] {NA, -.030176, .168828, .769306, -.004221},
            new double[] {NA, .026937, .027656, .028142, .001139},
            .87944),
        new Published(
            "first differences with a constant, which is a trend in levels",
            DIFFERENCES,
            Time.TREND,
            Method.SWAMY_ARORA,
            new double[] {NA, -.006605, -.032436, .831473, -.005986},
            new double[] {NA, .045938, .023050, .036969, .000761},
            NA));
  }

  static Fit fit(Panel panel, PlantEffects effects, Time time, Method method) {
    return Estimation.fit(
        panel,
        new Specification(
                Form.named("cobb-douglas"), effects, time, false, StandardErrors.CLASSICAL, 0.95)
            .with(method));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("table")
  void meetsTheTable(Published row) {
    Fit fit = fit(PanelFixtures.usStates(), row.effects(), row.time(), row.method());
    Solution numbers = fit.numbers();
    for (int k = 0; k < NAMES.size(); k++) {
      int at = numbers.index(NAMES.get(k));
      if (!Double.isNaN(row.values()[k])) {
        assertThat(numbers.parameters()[at])
            .as(NAMES.get(k))
            .isCloseTo(row.values()[k], within(WRITTEN));
      }
      if (!Double.isNaN(row.errors()[k])) {
        assertThat(Math.sqrt(numbers.covariance()[at][at]))
            .as("standard error of " + NAMES.get(k))
            .isCloseTo(row.errors()[k], within(WRITTEN));
      }
    }
    if (!Double.isNaN(row.ssr())) {
      assertThat(numbers.linear().ssr()).isCloseTo(row.ssr(), within(WRITTEN));
    }
  }

  /** θ .8888, var(e) .001454, var(u) .006838, to the digits of the table. */
  @Test
  void varianceComponentsOfSwamyAndArora() {
    Fit fit = fit(PanelFixtures.usStates(), RANDOM, Time.NONE, Method.SWAMY_ARORA);
    VarianceComponents components = fit.numbers().treatment().components().orElseThrow();
    assertThat(components.share(17)).isCloseTo(.8888, within(0.5e-4));
    assertThat(components.row()).isCloseTo(.001454, within(WRITTEN));
    assertThat(components.group()).isCloseTo(.006838, within(WRITTEN));
    assertThat(components.truncated()).isFalse();
  }

  /**
   * With plant means added, the slopes of random effects are those within plants (Mundlak 1978).
   */
  @Test
  void plantMeansTurnRandomIntoWithin() {
    Panel panel = PanelFixtures.usStates();
    Solution random = fit(panel, MUNDLAK, Time.NONE, Method.SWAMY_ARORA).numbers();
    Solution inside = fit(panel, WITHIN, Time.NONE, Method.SWAMY_ARORA).numbers();
    Solution means = fit(panel, BETWEEN, Time.NONE, Method.SWAMY_ARORA).numbers();
    for (String name : NAMES.subList(1, 5)) {
      double slope = random.parameters()[random.index(name)];
      assertThat(slope).as(name).isCloseTo(inside.parameters()[inside.index(name)], within(1e-10));
      // and slope and mean together those between plants
      assertThat(slope + random.parameters()[random.index("mean:" + name)])
          .as("mean of " + name)
          .isCloseTo(means.parameters()[means.index(name)], within(1e-10));
    }
    assertThat(random.treatment().leftOut()).isEmpty();
  }
}

package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.PanelReference;
import isowright.estimation.Productivity;
import isowright.estimation.RandomPanels;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Rates and biases of technical change against R, against differences, and against the truth. */
class TechnicalChangeTest {

  /** As in the estimators themselves: normal equations in R. */
  private static final double RELATIVE = 1e-6;

  private static Fit fit(Panel panel, String form, PlantEffects effects, Time time) {
    return Estimation.fit(
        panel,
        new Specification(Form.named(form), effects, time, true, StandardErrors.CLUSTERED, .95));
  }

  @ParameterizedTest
  @CsvSource({
    "whole, cobb-douglas, quadratic",
    "holes, cobb-douglas, quadratic",
    "whole, translog, biased",
    "holes, translog, biased",
    "whole, cobb-douglas, biased"
  })
  void ratesAgreeWithReference(String panel, String form, String kind) {
    Fit fit =
        fit(
            panel.equals("whole") ? PanelFixtures.usStates() : PanelFixtures.usStatesWithHoles(),
            form,
            PlantEffects.WITHIN,
            kind.equals("biased") ? Time.BIASED_TREND : Time.QUADRATIC_TREND);
    TechnicalChange change = TechnicalChange.of(fit).orElseThrow();
    assertThat(change.unit()).isEqualTo("year");
    for (PanelReference.Value value : PanelReference.of(panel, form, kind + "-rate")) {
      Estimate percent =
          change.rates().stream()
              .filter(rate -> rate.place().word().equals(value.name()))
              .findFirst()
              .orElseThrow()
              .percent();
      double expected = 100 * Math.expm1(value.value());
      double error = 100 * Math.exp(value.value()) * value.error();
      assertThat(percent.standardError()).isCloseTo(error, within(RELATIVE * error));
      assertThat(percent.value()).isCloseTo(expected, within(RELATIVE * error));
      assertThat(Math.log(percent.high() / 100 + 1) - value.value())
          .as("the interval is that of the rate, carried over")
          .isCloseTo(value.value() - Math.log(percent.low() / 100 + 1), within(1e-10));
    }
  }

  /** The rate is what the technology of a period gains on the one before, at the same mix. */
  @Test
  void rateIsTheGainOfTheTechnologyOverTime() {
    Panel panel = RandomPanels.draw(11, 30, 8, .2, .01);
    for (Time time : List.of(Time.TREND, Time.PERIOD_EFFECTS)) {
      Fit fit = fit(panel, "translog", PlantEffects.WITHIN, time);
      double[] z = fit.meanLogInputs();
      double last = at(fit, 7).logOutput(z);
      TechnicalChange change = TechnicalChange.of(fit).orElseThrow();
      Estimate average = change.rates().get(0).percent();
      Estimate latest = change.rates().get(1).percent();
      assertThat(average.value())
          .isCloseTo(100 * Math.expm1((last - at(fit, 0).logOutput(z)) / 7), within(1e-9));
      assertThat(latest.value())
          .isCloseTo(100 * Math.expm1(last - at(fit, 6).logOutput(z)), within(1e-9));
    }
  }

  private static Technology at(Fit fit, int period) {
    EstimatedTechnology estimated = fit.at(period, new Productivity.Typical());
    return estimated.technology();
  }

  /**
   * The bias is the change of the share e_i/Σe between the technologies of two years on either side
   * of the mean of the records (a share is not linear in time, so the step is small against its
   * curvature: half the difference over a year is good to a few 1e-4 of it), biases sum to zero,
   * and the standard error is that of numerical derivatives in the parameters.
   */
  @Test
  void biasIsTheChangeOfTheShare() {
    Panel panel = RandomPanels.draw(12, 150, 9, 0, .02);
    Fit fit = fit(panel, "translog", PlantEffects.WITHIN, Time.BIASED_TREND);
    List<TechnicalChange.Bias> biases = TechnicalChange.of(fit).orElseThrow().biases();
    double[] z = fit.meanLogInputs();
    double[] before = shares(at(fit, 3), z);
    double[] after = shares(at(fit, 5), z);
    double sum = 0;
    for (int i = 0; i < 2; i++) {
      double points = 100 * (after[i] - before[i]) / 2;
      assertThat(biases.get(i).points().value()).isCloseTo(points, within(1e-2 * Math.abs(points)));
      sum += biases.get(i).points().value();
      assertThat(biases.get(i).points().standardError())
          .isCloseTo(numericalError(fit, i), within(1e-5 * numericalError(fit, i)));
    }
    assertThat(sum).isCloseTo(0, within(1e-12));
    // Machines gain .02 a year in elasticity and labour nothing, so the truth is told apart.
    assertThat(biases.get(0).points().high()).isNegative();
    assertThat(biases.get(1).points().low()).isPositive();
  }

  private static double[] shares(Technology technology, double[] z) {
    double[] e = new double[2];
    technology.logGradient(z, e);
    double sum = e[0] + e[1];
    return new double[] {e[0] / sum, e[1] / sum};
  }

  /** √(g′Vg) with g by central differences of the bias in each parameter of the fit. */
  private static double numericalError(Fit fit, int input) {
    Solution numbers = fit.numbers();
    double[] parameters = numbers.parameters();
    double[] g = new double[parameters.length];
    for (int k = 0; k < g.length; k++) {
      double step = 1e-5;
      double[] up = parameters.clone();
      double[] down = parameters.clone();
      up[k] += step;
      down[k] -= step;
      g[k] = (bias(fit, up, input) - bias(fit, down, input)) / (2 * step);
    }
    double variance = 0;
    for (int k = 0; k < g.length; k++) {
      for (int l = 0; l < g.length; l++) {
        variance += g[k] * numbers.covariance()[k][l] * g[l];
      }
    }
    return Math.sqrt(variance);
  }

  /** The bias at the records' mean, where z = 0 and t = 4, written out for a translog. */
  private static double bias(Fit fit, double[] parameters, int input) {
    Solution numbers = fit.numbers();
    double[] tau = new double[2];
    double[] e = new double[2];
    for (int i = 0; i < 2; i++) {
      String name = RandomPanels.INPUTS.get(i);
      tau[i] = parameters[numbers.index(name + "*trend")];
      e[i] = parameters[numbers.index(name)] + 4 * tau[i];
    }
    double sum = e[0] + e[1];
    return 100 * (tau[input] / sum - e[input] * (tau[0] + tau[1]) / (sum * sum));
  }

  @ParameterizedTest
  @EnumSource(Time.class)
  void thereIsOneWhereTimeWasAsked(Time time) {
    Panel panel = RandomPanels.draw(13, 20, 6, .1, 0);
    Fit fit = fit(panel, "cobb-douglas", PlantEffects.WITHIN, time);
    assertThat(TechnicalChange.of(fit).isPresent()).isEqualTo(time != Time.NONE);
    TechnicalChange.of(fit)
        .ifPresent(
            change -> {
              assertThat(change.rates()).hasSize(2);
              assertThat(change.biases()).hasSize(time == Time.BIASED_TREND ? 2 : 0);
            });
  }

  /** Periods that are no years are called periods. */
  @Test
  void periodsAreNotCalledYears() {
    Panel drawn = RandomPanels.draw(14, 20, 6, 0, 0);
    int[] plants = new int[drawn.rows()];
    int[] periods = new int[drawn.rows()];
    Arrays.setAll(plants, drawn::plantOf);
    Arrays.setAll(periods, r -> 1 + drawn.rowPeriods().get(r));
    Panel counted =
        PanelFixtures.panel(
            plants,
            periods,
            drawn.output().toArray(),
            RandomPanels.INPUTS,
            List.of(drawn.quantities().get(0).toArray(), drawn.quantities().get(1).toArray()),
            List.of(),
            List.of());
    Fit fit = fit(counted, "cobb-douglas", PlantEffects.WITHIN, Time.TREND);
    assertThat(TechnicalChange.of(fit).orElseThrow().unit()).isEqualTo("period");
  }
}

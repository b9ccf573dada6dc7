package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.ComposedFit;
import isowright.regression.OneSidedLaw;
import isowright.technology.Form;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Frontiers from panel to technology: against log-likelihoods written out in R ({@code
 * reference/one-sided-errors.R}), and what belongs to the constant.
 */
class FrontierEstimationTest {

  private static final List<String> STATES = List.of("constant", "pcap", "pc", "emp");

  static Specification specification(
      String form, OneSidedLaw law, OverTime overTime, StandardErrors errors) {
    return new Specification(Form.named(form), PlantEffects.NONE, Time.NONE, false, errors, .95)
        .by(new Estimator.Frontier(law, overTime));
  }

  private static Fit states(OneSidedLaw law, OverTime overTime, StandardErrors errors) {
    return Estimation.fit(
        PanelFixtures.usStates(), specification("cobb-douglas", law, overTime, errors));
  }

  private static double value(Fit fit, String name) {
    return fit.numbers().parameters()[fit.numbers().index(name)];
  }

  private static double error(Fit fit, String name) {
    int k = fit.numbers().index(name);
    return Math.sqrt(fit.numbers().covariance()[k][k]);
  }

  /** R's optimum is good to 1e-8; its standard errors, by differences of differences, to 1e-5. */
  @Test
  void statesAgainstR() throws IOException {
    Map<String, Double> reference = new HashMap<>();
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/one-sided-errors.csv"))) {
      String[] cells = line.split(",");
      if (cells.length == 4 && !cells[0].equals("model")) {
        reference.put(cells[0] + "," + cells[1] + "," + cells[2], Double.parseDouble(cells[3]));
      }
    }
    for (OverTime overTime : List.of(OverTime.CONSTANT, OverTime.DECAY)) {
      Fit fit = states(OneSidedLaw.HALF_NORMAL, overTime, StandardErrors.CLASSICAL);
      String name = "states half-normal " + overTime.word() + ",";
      for (int k = 0; k < 4; k++) {
        double expected = Objects.requireNonNull(reference.get(name + "coefficient," + k));
        double size = Math.max(Math.abs(expected), .01);
        assertThat(value(fit, STATES.get(k))).isCloseTo(expected, within(1e-6 * size));
        double se = Objects.requireNonNull(reference.get(name + "se," + k));
        assertThat(error(fit, STATES.get(k))).isCloseTo(se, within(1e-5 * se));
      }
      double noise = Objects.requireNonNull(reference.get(name + "noise,0"));
      double scale = Objects.requireNonNull(reference.get(name + "scale,0"));
      assertThat(value(fit, "frontier:noise")).isCloseTo(noise, within(1e-6 * noise));
      assertThat(value(fit, "frontier:inefficiency")).isCloseTo(scale, within(1e-6 * scale));
      assertThat(fit.numbers().statistics().logLikelihood())
          .isCloseTo(Objects.requireNonNull(reference.get(name + "logLikelihood,0")), within(1e-6));
      if (overTime == OverTime.DECAY) {
        double decay = Objects.requireNonNull(reference.get(name + "decay,0"));
        assertThat(value(fit, "frontier:decay")).isCloseTo(decay, within(1e-6 * Math.abs(decay)));
      }
    }
  }

  /**
   * Typical lies E u below the frontier, with decay at each period its own; the standard error of
   * its constant is that of the difference, by differences of the parameters here.
   */
  @Test
  void typicalPlantStandsAtMeanInefficiency() {
    Fit fit = states(OneSidedLaw.HALF_NORMAL, OverTime.DECAY, StandardErrors.CLUSTERED);
    double sigma = value(fit, "frontier:inefficiency");
    double eta = value(fit, "frontier:decay");
    for (int period : new int[] {0, 9, 16}) {
      EstimatedTechnology frontier = fit.at(period, new Productivity.Frontier());
      EstimatedTechnology typical = fit.at(period, new Productivity.Typical());
      double share = Math.exp(-eta * (period - 16));
      double mean = Math.sqrt(2 / Math.PI) * sigma * share;
      double apart = frontier.technology().parameters()[0] - typical.technology().parameters()[0];
      assertThat(apart).isCloseTo(mean, within(1e-12));
      double[] slope = new double[fit.numbers().parameters().length];
      slope[0] = 1;
      slope[4] = meanControl(fit.panel());
      slope[5 + 1] = -mean / sigma;
      slope[5 + 2] = mean * (period - 16);
      double variance = 0;
      for (int k = 0; k < slope.length; k++) {
        for (int l = 0; l < slope.length; l++) {
          variance += slope[k] * fit.numbers().covariance()[k][l] * slope[l];
        }
      }
      assertThat(typical.covariance()[0][0]).isCloseTo(variance, within(1e-12));
    }
  }

  private static double meanControl(Panel panel) {
    return Arrays.stream(panel.controls().get(0).toArray()).average().orElseThrow();
  }

  /** Residuals are about the typical plant: their mean is near zero, not near −E u. */
  @Test
  void residualsAreAboutTheTypicalPlant() {
    Fit fit =
        Estimation.fit(
            FrontierPanels.draw(3, 60, 3, OneSidedLaw.HALF_NORMAL, .1, .3, false, 0).panel(),
            specification(
                "translog", OneSidedLaw.HALF_NORMAL, OverTime.EACH_ROW, StandardErrors.ROBUST));
    assertThat(fit.numbers().frontier().orElseThrow().fit().state())
        .isEqualTo(ComposedFit.State.FOUND);
    double mean = Arrays.stream(fit.numbers().residuals()).average().orElseThrow();
    assertThat(mean).isCloseTo(0, within(0.1 * value(fit, "frontier:inefficiency")));
    Fit least = Estimation.fit(fit.panel(), fit.specification().by(new Estimator.LeastSquares()));
    assertThat(fit.numbers().statistics().logLikelihood())
        .isGreaterThan(least.numbers().statistics().logLikelihood());
    assertThat(fit.numbers().linear().ssr()).isGreaterThan(least.numbers().linear().ssr());
    assertThat(fit.numbers().statistics().parameters())
        .isEqualTo(least.numbers().statistics().parameters() + 1);
  }

  /** A plant's own level is the mean of its rows, whatever is called inefficiency. */
  @Test
  void namedPlantStandsAtItsOwnMean() {
    Fit fit = states(OneSidedLaw.HALF_NORMAL, OverTime.CONSTANT, StandardErrors.CLASSICAL);
    Panel panel = fit.panel();
    int plant = 7;
    double mean = 0;
    int rows = panel.plantEnd(plant) - panel.plantStart(plant);
    for (int r = panel.plantStart(plant); r < panel.plantEnd(plant); r++) {
      mean += fit.numbers().residuals()[r] / rows;
    }
    double typical = fit.at(0, new Productivity.Typical()).technology().parameters()[0];
    double own = fit.at(0, new Productivity.Plant(plant)).technology().parameters()[0];
    assertThat(own - typical).isCloseTo(mean, within(1e-10));
  }

  /** Published rows skewed to the right: the answer is least squares, and the frontier with it. */
  @Test
  void wrongSkewIsLeastSquares() {
    Panel metals = PanelFixtures.primaryMetals();
    Specification asked =
        specification(
            "translog", OneSidedLaw.HALF_NORMAL, OverTime.EACH_ROW, StandardErrors.CLASSICAL);
    Fit fit = Estimation.fit(metals, asked);
    Fit least = Estimation.fit(metals, asked.by(new Estimator.LeastSquares()));
    assertThat(fit.state()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(fit.numbers().frontier().orElseThrow().fit().state())
        .isEqualTo(ComposedFit.State.WRONG_SKEW);
    assertThat(fit.numbers().parameters()).isEqualTo(least.numbers().parameters());
    assertThat(fit.numbers().covariance()).isDeepEqualTo(least.numbers().covariance());
    assertThat(fit.numbers().names()).isEqualTo(least.numbers().names());
    assertThat(fit.at(0, new Productivity.Frontier()).technology().parameters())
        .isEqualTo(fit.typical().technology().parameters());
  }

  /** A cross-section of inefficiency alone: the noise goes to zero, and no numbers are given. */
  @Test
  void noiseAtItsBoundIsSaid() {
    Random random = new Random(5);
    int rows = 60;
    double[] labour = new double[rows];
    double[] machines = new double[rows];
    double[] output = new double[rows];
    for (int r = 0; r < rows; r++) {
      labour[r] = Math.exp(random.nextGaussian());
      machines[r] = Math.exp(random.nextGaussian());
      output[r] =
          Math.pow(labour[r], .6)
              * Math.pow(machines[r], .3)
              * Math.exp(-.4 * Math.abs(random.nextGaussian()));
    }
    Fit fit =
        Estimation.fit(
            PanelFixtures.crossSection(output, List.of("labour", "machines"), labour, machines),
            specification(
                "cobb-douglas", OneSidedLaw.HALF_NORMAL, OverTime.EACH_ROW, StandardErrors.ROBUST));
    assertThat(fit.state()).isEqualTo(Fit.State.BOUNDARY);
    assertThat(fit.reasons()).singleElement().asString().contains("gamma at 1", "other law");
  }

  @Test
  void whatTheRecordsCannotCarryIsSaid() {
    Panel metals = PanelFixtures.primaryMetals();
    for (OverTime overTime : List.of(OverTime.CONSTANT, OverTime.DECAY)) {
      Fit fit =
          Estimation.fit(
              metals,
              specification(
                  "cobb-douglas", OneSidedLaw.HALF_NORMAL, overTime, StandardErrors.ROBUST));
      assertThat(fit.state()).isEqualTo(Fit.State.REFUSED);
      assertThat(fit.reasons().get(0))
          .contains(overTime.word(), "single row", "Take over-time out");
    }
    Specification each =
        specification("ces", OneSidedLaw.HALF_NORMAL, OverTime.EACH_ROW, StandardErrors.ROBUST);
    assertThat(Estimation.fit(metals, each).reasons().get(0))
        .contains("ces is not linear", "Take `frontier` out", "cobb-douglas or translog");
    Panel states = PanelFixtures.usStates();
    Specification within =
        specification(
                "cobb-douglas",
                OneSidedLaw.HALF_NORMAL,
                OverTime.CONSTANT,
                StandardErrors.DRISCOLL_KRAAY)
            .with(PlantEffects.WITHIN, Time.NONE, StandardErrors.DRISCOLL_KRAAY);
    assertThat(Estimation.fit(states, within).reasons())
        .anySatisfy(r -> assertThat(r).contains("Set plant-effects to none"))
        .anySatisfy(r -> assertThat(r).contains("classical, robust or clustered"));
    double[] few = {1, 2, 3, 4, 5};
    Fit small =
        Estimation.fit(
            PanelFixtures.crossSection(
                new double[] {1, 3, 2, 5, 4},
                List.of("labour", "machines"),
                few,
                new double[] {2, 1, 5, 3, 9}),
            specification(
                "cobb-douglas",
                OneSidedLaw.EXPONENTIAL,
                OverTime.EACH_ROW,
                StandardErrors.CLASSICAL));
    assertThat(small.state()).isEqualTo(Fit.State.REFUSED);
    assertThat(small.reasons().get(0)).contains("5 rows", "5 parameters", "add records");
  }

  /** A refit from the estimate ends where a search from the beginning does. */
  @Test
  void refitsAreWholeFits() {
    Fit fit = states(OneSidedLaw.HALF_NORMAL, OverTime.CONSTANT, StandardErrors.CLASSICAL);
    Panel without = SelectedPanel.kept(fit.panel(), row -> fit.panel().plantOf(row) != 3);
    Fit cold = Estimation.fit(without, fit.specification());
    double[] warm =
        FrontierEstimation.again(fit, without, fit.specification()).numbers().parameters();
    for (int k = 0; k < warm.length; k++) {
      assertThat(warm[k]).isCloseTo(cold.numbers().parameters()[k], within(1e-6));
    }
  }

  /**
   * Rows on which a likelihood in plain squares loses its digits as the noise goes to zero, and
   * seems to rise there: the maximum is inside, and higher than at any small noise.
   */
  @Test
  void smallNoiseIsNoRise() {
    Panel panel =
        FrontierPanels.draw(71_061, 400, 1, OneSidedLaw.HALF_NORMAL, .15, .3, false, 0).panel();
    Fit fit =
        Estimation.fit(
            panel,
            specification(
                "cobb-douglas",
                OneSidedLaw.HALF_NORMAL,
                OverTime.EACH_ROW,
                StandardErrors.CLASSICAL));
    assertThat(fit.state()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(value(fit, "frontier:noise")).isBetween(.1, .2);
  }
}

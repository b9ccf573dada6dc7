package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Replicas.Technologies;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.ClusterBootstrap;
import isowright.technology.Form;
import isowright.technology.Restriction;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ReplicationTest {

  private static final int PLANTS = 12;
  private static final int PERIODS = 6;

  /** Sums of products against reflections of rows, seen in log output and elasticities. */
  private static final double LINEAR = 1e-9;

  /** Both searches stop within 1e-8 of a standard error or better, some 0.1 here. */
  private static final double SEARCHED = 1e-7;

  private static final List<Productivity> PRODUCTIVITIES =
      List.of(
          new Productivity.Typical(), new Productivity.UpperQuartile(), new Productivity.Plant(3));

  /** Plants of 4 to 6 rows each, a CES of three inputs, plant effects, a trend. */
  private static Panel panel(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    List<int[]> rows = new ArrayList<>();
    for (int p = 0; p < PLANTS; p++) {
      for (int t = 0; t < PERIODS; t++) {
        if ((p + t) % 5 != 0) {
          rows.add(new int[] {p, t});
        }
      }
    }
    int n = rows.size();
    double[] output = new double[n];
    List<double[]> inputs = List.of(new double[n], new double[n], new double[n]);
    double[] size = new double[PLANTS];
    Arrays.setAll(size, p -> random.nextDouble(-1, 1));
    for (int r = 0; r < n; r++) {
      double sum = 0;
      for (int i = 0; i < 3; i++) {
        double z = size[rows.get(r)[0]] + random.nextDouble(-1, 1);
        inputs.get(i)[r] = 100 * Math.exp(z);
        sum += (.5 - .1 * i) / 1.2 * Math.exp(-.6 * z);
      }
      output[r] =
          50
              * Math.exp(
                  -1.05 / .6 * Math.log(sum)
                      + .3 * size[rows.get(r)[0]]
                      + .02 * rows.get(r)[1]
                      + random.nextDouble(-.1, .1));
    }
    return PanelFixtures.panel(
        rows.stream().mapToInt(r -> r[0]).toArray(),
        rows.stream().mapToInt(r -> 2000 + r[1]).toArray(),
        output,
        List.of("labour", "machines", "energy"),
        inputs,
        List.of(),
        List.of());
  }

  private static Fit fit(Panel panel, String form, PlantEffects effects, Time time) {
    Fit fit =
        Estimation.fit(
            panel,
            new Specification(form(form), effects, time, true, StandardErrors.CLUSTERED, .95));
    assertThat(fit.state().usable()).isTrue();
    return fit;
  }

  /** A form by its name, or the translog held to constant returns. */
  private static Form form(String name) {
    return name.equals("restricted")
        ? Form.named("translog").restricted(Restriction.CONSTANT_RETURNS)
        : Form.named(name);
  }

  @ParameterizedTest
  @CsvSource({
    "restricted, NONE, TREND",
    "restricted, WITHIN, TREND",
    "cobb-douglas, NONE, TREND",
    "cobb-douglas, WITHIN, PERIOD_EFFECTS",
    "translog, WITHIN, TREND",
    "translog, NONE, PERIOD_EFFECTS",
    "cobb-douglas, WITHIN, TWO_WAY",
    "cobb-douglas, WITHIN, BIASED_TREND",
    "cobb-douglas, RANDOM, TREND",
    "cobb-douglas, DIFFERENCES, QUADRATIC_TREND",
    "ces, NONE, TREND",
    "ces, WITHIN, TREND",
    "ces, WITHIN, PERIOD_EFFECTS"
  })
  void leavingOutIsARefit(String form, PlantEffects effects, Time time) {
    Panel panel = panel(1);
    Fit fit = fit(panel, form, effects, time);
    double tolerance = form.equals("ces") ? SEARCHED : LINEAR;
    Replication replication = Replication.of(fit, Optional.empty());
    List<Replicas> replicas =
        PRODUCTIVITIES.stream().map(p -> replication.at(4, p).replicas()).toList();
    for (Replicas some : replicas) {
      assertThat(some.drawn().count()).isZero();
      assertThat(some.withoutPlants().count()).isEqualTo(PLANTS);
      assertThat(some.withoutPeriods().count()).isEqualTo(PERIODS);
    }
    for (int p = 0; p < PLANTS; p++) {
      int out = p;
      Panel left = SelectedPanel.kept(panel, row -> panel.plantOf(row) != out);
      Fit again = fit(left, form, effects, time);
      for (int k = 0; k < PRODUCTIVITIES.size(); k++) {
        Optional<Technology> actual = replicas.get(k).withoutPlants().get(p);
        Optional<Productivity> mapped = without(PRODUCTIVITIES.get(k), p);
        assertThat(actual.isPresent()).isEqualTo(mapped.isPresent());
        if (mapped.isPresent()) {
          assertSame(actual.orElseThrow(), again.at(4, mapped.get()).technology(), tolerance);
        }
      }
    }
    boolean struck = time.byPeriod();
    for (int t = 0; t < PERIODS; t++) {
      int out = t;
      Panel left = SelectedPanel.kept(panel, row -> panel.rowPeriods().get(row) != out);
      Panel fitted = struck ? SelectedPanel.withoutPeriod(left, t) : left;
      Fit again = fit(fitted, form, effects, time);
      int period = struck && t < 4 ? 3 : 4;
      for (int k = 0; k < PRODUCTIVITIES.size(); k++) {
        Optional<Technology> actual = replicas.get(k).withoutPeriods().get(t);
        assertThat(actual.isPresent()).isEqualTo(!(struck && t == 4));
        if (actual.isPresent()) {
          assertSame(actual.get(), again.at(period, PRODUCTIVITIES.get(k)).technology(), tolerance);
        }
      }
    }
  }

  /** The same productivity in a panel without a plant. */
  private static Optional<Productivity> without(Productivity productivity, int out) {
    if (productivity instanceof Productivity.Plant plant) {
      return plant.index() == out
          ? Optional.empty()
          : Optional.of(new Productivity.Plant(plant.index() - (out < plant.index() ? 1 : 0)));
    }
    return Optional.of(productivity);
  }

  private static void assertSame(Technology actual, Technology expected, double tolerance) {
    double[] logs = {4.4, 4.9, 4.5};
    assertThat(actual.logOutput(logs)).isCloseTo(expected.logOutput(logs), within(tolerance));
    double[] mine = new double[3];
    double[] theirs = new double[3];
    actual.logGradient(logs, mine);
    expected.logGradient(logs, theirs);
    assertThat(mine).containsExactly(theirs, within(tolerance));
  }

  @ParameterizedTest
  @CsvSource({
    "cobb-douglas, NONE",
    "restricted, WITHIN",
    "translog, WITHIN",
    "ces, NONE",
    "ces, WITHIN",
    "cobb-douglas, WITHIN",
    "cobb-douglas, RANDOM",
    "translog, MUNDLAK"
  })
  void aDrawIsAFitToThePlantsDrawn(String form, PlantEffects effects) {
    Panel panel = panel(2);
    Fit fit = fit(panel, form, effects, Time.TREND);
    Replication replication = Replication.of(fit, Optional.of(new Drawing(12, 7)));
    Technologies drawn = replication.at(4, new Productivity.Typical()).replicas().drawn();
    assertThat(drawn.count()).isEqualTo(12);
    int compared = 0;
    for (int d = 0; d < 12; d++) {
      Panel some = SelectedPanel.counted(panel, ClusterBootstrap.counts(PLANTS, d, 7));
      Fit again =
          Estimation.fit(some, fit.specification(), Estimation.base(panel, fit.specification()));
      if (!again.state().usable()) {
        continue; // a search from the beginning may end at an edge where one from near does not
      }
      compared++;
      Technology expected = again.typical().technology();
      Technology actual = drawn.get(d).orElseThrow();
      double[] logs = {4.4, 4.9, 4.5};
      double[] mine = new double[3];
      double[] theirs = new double[3];
      actual.logGradient(logs, mine);
      expected.logGradient(logs, theirs);
      double tolerance = form.equals("ces") ? SEARCHED : LINEAR;
      assertThat(mine).containsExactly(theirs, within(tolerance));
      if (effects.constant() && effects != PlantEffects.MUNDLAK) {
        Technology same = again.at(4, new Productivity.Typical()).technology();
        assertThat(actual.logOutput(logs)).isCloseTo(same.logOutput(logs), within(tolerance));
      }
    }
    assertThat(compared).isGreaterThanOrEqualTo(10);
    assertThat(replication.drawsThatLostRank()).isZero();
    assertThat(replication.drawing()).hasValue(new Drawing(12, 7));
  }

  /** The long way must give what the short one gives. */
  @Test
  void panelsPutTogetherGiveTheSameAsProducts() {
    Panel panel = panel(3);
    Fit fit = fit(panel, "translog", PlantEffects.NONE, Time.TREND);
    RefittedParameters quick = refitting(fit).drawn(20, 3);
    RefittedParameters slow = new PanelRefitting(fit).drawn(20, 3);
    RefittedParameters quickPeriods = refitting(fit).withoutPeriods().orElseThrow();
    RefittedParameters slowPeriods = new PanelRefitting(fit).withoutPeriods().orElseThrow();
    RefittedParameters quickPlants = refitting(fit).withoutPlants().orElseThrow();
    RefittedParameters slowPlants = new PanelRefitting(fit).withoutPlants().orElseThrow();
    assertSame(quick, slow, 20);
    assertSame(quickPeriods, slowPeriods, PERIODS);
    assertSame(quickPlants, slowPlants, PLANTS);
  }

  private static Refitting refitting(Fit fit) {
    Refitting refitting = Refitting.of(fit).orElseThrow();
    assertThat(refitting).isInstanceOf(LinearRefitting.class);
    return refitting;
  }

  private static void assertSame(RefittedParameters quick, RefittedParameters slow, int count) {
    assertThat(quick.count()).isEqualTo(count);
    assertThat(slow.count()).isEqualTo(count);
    for (int i = 0; i < count; i++) {
      assertThat(quick.fitted(i)).isTrue();
      assertThat(quick.reported(i)).containsExactly(slow.reported(i), within(1e-8));
    }
  }

  /**
   * Within plants the constant speaks of the plants recorded, in draws as in the covariance: over
   * 2,000 draws the standard deviation of log output at the mean agrees with propagation.
   * Propagation is first-order and its covariance has few clusters, so a tenth is allowed; drawing
   * the plants' levels too would make it five times as large.
   */
  @ParameterizedTest
  @CsvSource({
    "0, cobb-douglas, WITHIN",
    "1, cobb-douglas, WITHIN",
    "2, cobb-douglas, WITHIN",
    "2, restricted, WITHIN",
    "1, cobb-douglas, RANDOM"
  })
  void theConstantOfADrawSpeaksOfThePlantsRecorded(int which, String form, PlantEffects effects) {
    Panel panel = panel(4);
    Fit fit = fit(panel, form, effects, Time.TREND);
    Replication replication = Replication.of(fit, Optional.of(new Drawing(2000, 11)));
    EstimatedTechnology estimated = replication.at(2, PRODUCTIVITIES.get(which));
    double[] logs = fit.meanLogInputs();
    int p = estimated.technology().parameters().length;
    double[] gradient = new double[p];
    estimated.technology().parameterGradient(logs, gradient);
    double variance = 0;
    for (int k = 0; k < p; k++) {
      for (int l = 0; l < p; l++) {
        variance += gradient[k] * estimated.covariance()[k][l] * gradient[l];
      }
    }
    Technologies drawn = estimated.replicas().drawn();
    double centre = estimated.technology().logOutput(logs);
    double squares = 0;
    for (int d = 0; d < 2000; d++) {
      squares += Math.pow(drawn.get(d).orElseThrow().logOutput(logs) - centre, 2) / 2000;
    }
    assertThat(Math.sqrt(squares / variance)).isBetween(.9, 1.1);
  }

  @Test
  void digitsDoNotDependOnTheNumberOfThreads() throws ExecutionException, InterruptedException {
    Panel panel = panel(5);
    for (String form : List.of("translog", "ces")) {
      Fit fit = fit(panel, form, PlantEffects.WITHIN, Time.TREND);
      double[][] one = withThreads(1, fit);
      assertThat(withThreads(2, fit)).isDeepEqualTo(one);
      assertThat(withThreads(5, fit)).isDeepEqualTo(one);
    }
  }

  private static double[][] withThreads(int threads, Fit fit)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(
              () -> {
                Technologies drawn =
                    Replication.of(fit, Optional.of(new Drawing(40, 3)))
                        .at(1, new Productivity.UpperQuartile())
                        .replicas()
                        .drawn();
                double[][] parameters = new double[40][];
                for (int d = 0; d < 40; d++) {
                  parameters[d] =
                      drawn.get(d).map(Technology::parameters).orElseGet(() -> new double[0]);
                }
                return parameters;
              })
          .get();
    } finally {
      pool.shutdown();
    }
  }

  /** 30 points in a flat valley (Judge et al. 1988, pp. 514-515): many draws have no optimum. */
  @Test
  void searchesThatEndOutsideTheRegionAreCounted() {
    Fit fit =
        Estimation.fit(
            PanelFixtures.cesPoints(),
            new Specification(
                Form.named("ces"), PlantEffects.NONE, Time.NONE, true, StandardErrors.ROBUST, .95));
    Replication replication = Replication.of(fit, Optional.of(new Drawing(200, 1)));
    Technologies drawn = replication.at(0, new Productivity.Typical()).replicas().drawn();
    int empty = 0;
    for (int d = 0; d < 200; d++) {
      empty += drawn.get(d).isEmpty() ? 1 : 0;
    }
    assertThat(replication.drawsWithoutOptimum() + replication.drawsThatLostRank())
        .isEqualTo(empty)
        .isPositive();
  }
}

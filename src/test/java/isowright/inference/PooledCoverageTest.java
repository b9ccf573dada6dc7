package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Question;
import isowright.records.Panel;
import isowright.technology.CobbDouglas;
import isowright.technology.Elasticities;
import isowright.technology.Form;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do 95 % intervals of pooled fits cover? A thousand panels of 100 plants over five years are drawn
 * from a known Cobb-Douglas technology, the levels of plants having nothing to do with their
 * inputs: without levels, errors classical; and with them, clustered by plant. A share of .95 is
 * then seen with a binomial standard error of .0069; 93 to 97 % is three such errors either way.
 */
@Tag("slow")
class PooledCoverageTest {

  private static final int PANELS = 1000;
  private static final int PLANTS = 100;
  private static final int PERIODS = 5;
  private static final double[] BETA = {.55, .4};
  private static final Question QUESTION = Question.of(50, 20, 35);
  private static final List<String> INPUTS = List.of("labour", "machines");
  private static final String[] NAMES = {"returns to scale", "least cost"};

  @Test
  void intervalsCover() {
    StringBuilder table = new StringBuilder();
    hold("independent rows, classical", 0, StandardErrors.CLASSICAL, table);
    hold("plants differ, clustered", .15, StandardErrors.CLUSTERED, table);
    SimulationTable.write("coverage-pooled", table.toString());
    assertThat(table.toString().lines().filter(line -> line.endsWith("outside"))).isEmpty();
  }

  private static void hold(
      String setting, double spread, StandardErrors errors, StringBuilder table) {
    boolean[][] covered =
        IntStream.range(0, PANELS)
            .parallel()
            .mapToObj(seed -> covered(seed, spread, errors))
            .toArray(boolean[][]::new);
    for (int k = 0; k < NAMES.length; k++) {
      int figure = k;
      double share =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      String verdict = share >= .93 && share <= .97 ? "" : " outside";
      table.append(
          String.format(Locale.ROOT, "%-32s %-20s %.3f%s%n", setting, NAMES[k], share, verdict));
    }
  }

  private static boolean[] covered(int seed, double spread, StandardErrors errors) {
    Fit fit =
        Estimation.fit(
            draw(seed, spread),
            new Specification(
                Form.named("cobb-douglas"),
                PlantEffects.NONE,
                Specification.Time.NONE,
                true,
                errors,
                .95));
    double[] at = fit.meanLogInputs();
    DeltaMethod delta = DeltaMethod.of(fit.typical(), .95);
    Estimate scale = delta.estimate(t -> Elasticities.at(t, at).scale(), DeltaMethod.Scale.LINEAR);
    Estimate cost =
        delta.estimate(t -> Minimiser.of(t).plan(QUESTION).cost(), DeltaMethod.Scale.LOG);
    double truth = Minimiser.of(CobbDouglas.of(INPUTS, 0, BETA)).plan(QUESTION).cost();
    return new boolean[] {holds(scale, BETA[0] + BETA[1]), holds(cost, truth)};
  }

  private static boolean holds(Estimate estimate, double truth) {
    return estimate.low() <= truth && truth <= estimate.high();
  }

  private static Panel draw(int seed, double spread) {
    RandomGenerator random = new SplittableRandom(71_000 + seed);
    int rows = PLANTS * PERIODS;
    int[] plant = new int[rows];
    int[] period = new int[rows];
    double[] output = new double[rows];
    double[][] x = new double[2][rows];
    for (int r = 0, p = 0; p < PLANTS; p++) {
      double level = spread * random.nextGaussian();
      double size = .5 * random.nextGaussian();
      for (int t = 0; t < PERIODS; t++, r++) {
        plant[r] = p;
        period[r] = 2015 + t;
        double log = level + .1 * random.nextGaussian();
        for (int i = 0; i < 2; i++) {
          double z = 3 - i + size + .3 * random.nextGaussian();
          x[i][r] = Math.exp(z);
          log += BETA[i] * z;
        }
        output[r] = Math.exp(log);
      }
    }
    return PanelFixtures.panel(
        plant, period, output, INPUTS, List.of(x[0], x[1]), List.of(), List.of());
  }
}

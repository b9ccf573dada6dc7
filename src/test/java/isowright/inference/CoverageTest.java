package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Question;
import isowright.records.Panel;
import isowright.technology.CobbDouglas;
import isowright.technology.Elasticities;
import isowright.technology.Form;
import isowright.technology.Technology;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do 95 % intervals cover? A thousand panels with plant effects correlated with inputs are drawn
 * from a known Cobb-Douglas technology with a trend; returns to scale and the least cost of a
 * target are estimated within plants, with standard errors clustered by plant, and the truth is
 * looked for in the intervals.
 *
 * <p>With a thousand draws a coverage of .95 is seen as .95 ± .0069 (binomial standard error), so
 * 93 to 97 % is three such errors either way.
 */
@Tag("slow")
class CoverageTest {

  private static final int PANELS = 1000;
  private static final int PLANTS = 60;
  private static final int PERIODS = 6;
  private static final double[] BETA = {.45, .35, .25};
  private static final double TREND = .01;
  private static final Question QUESTION = Question.of(50, 20, 35, 8);
  private static final List<String> INPUTS = List.of("labour", "machines", "energy");

  private record Drawn(Panel panel, Technology truth) {}

  @Test
  void intervalsOfScaleAndLeastCostCover() {
    boolean[][] covered =
        IntStream.range(0, PANELS)
            .parallel()
            .mapToObj(CoverageTest::covered)
            .toArray(boolean[][]::new);
    String[] names = {"returns to scale", "least cost", "marginal cost", "least-cost labour"};
    StringBuilder table = new StringBuilder();
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      table.append(String.format(Locale.ROOT, "%-20s %.3f%n", names[k], coverage));
      assertThat(coverage).as(names[k]).isBetween(.93, .97);
    }
    SimulationTable.write("coverage-within", table.toString());
  }

  private static boolean[] covered(int seed) {
    Drawn drawn = draw(seed);
    Fit fit =
        Estimation.fit(
            drawn.panel(),
            new Specification(
                Form.named("cobb-douglas"),
                Specification.PlantEffects.WITHIN,
                Specification.Time.TREND,
                true,
                Specification.StandardErrors.CLUSTERED,
                .95));
    EstimatedTechnology typical = fit.typical();
    DeltaMethod delta = DeltaMethod.of(typical, .95);
    double[] at = fit.meanLogInputs();
    Estimate scale = delta.estimate(t -> Elasticities.at(t, at).scale(), DeltaMethod.Scale.LINEAR);
    List<Estimate> plan =
        delta.estimates(
            t -> {
              var p = Minimiser.of(t).plan(QUESTION);
              return new double[] {p.cost(), p.marginalCost(), p.mix(0)};
            },
            DeltaMethod.Scale.LOG);
    var truth = Minimiser.of(drawn.truth()).plan(QUESTION);
    return new boolean[] {
      holds(scale, BETA[0] + BETA[1] + BETA[2]),
      holds(plan.get(0), truth.cost()),
      holds(plan.get(1), truth.marginalCost()),
      holds(plan.get(2), truth.mix(0))
    };
  }

  private static boolean holds(Estimate estimate, double truth) {
    return estimate.low() <= truth && truth <= estimate.high();
  }

  /** Plants differ in level; the more productive ones are larger, so pooling would mislead. */
  private static Drawn draw(int seed) {
    SplittableRandom source = new SplittableRandom(7_000 + seed);
    java.util.random.RandomGenerator random = source;
    int rows = PLANTS * PERIODS;
    int[] plant = new int[rows];
    int[] period = new int[rows];
    double[] output = new double[rows];
    double[][] x = new double[3][rows];
    double levels = 0;
    int r = 0;
    for (int p = 0; p < PLANTS; p++) {
      double level = .2 * random.nextGaussian();
      levels += level;
      double size = level + .5 * random.nextGaussian();
      for (int t = 0; t < PERIODS; t++, r++) {
        plant[r] = p;
        period[r] = 2015 + t;
        double ln = level + TREND * t + .1 * random.nextGaussian();
        for (int i = 0; i < 3; i++) {
          double z = 3 + size + .4 * random.nextGaussian();
          x[i][r] = Math.exp(z);
          ln += BETA[i] * z;
        }
        output[r] = Math.exp(ln);
      }
    }
    Panel panel =
        PanelFixtures.panel(
            plant, period, output, INPUTS, List.of(x[0], x[1], x[2]), List.of(), List.of());
    double constant = levels / PLANTS + TREND * (PERIODS - 1);
    return new Drawn(panel, CobbDouglas.of(INPUTS, constant, BETA));
  }
}

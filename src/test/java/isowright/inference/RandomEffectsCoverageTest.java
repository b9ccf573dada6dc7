package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Productivity;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Question;
import isowright.records.Panel;
import isowright.technology.CobbDouglas;
import isowright.technology.Elasticities;
import isowright.technology.Form;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do 95 % intervals of random effects cover? A thousand panels with holes are drawn from a known
 * Cobb-Douglas technology whose plants are random draws; looked for in the intervals are returns to
 * scale, the growth of output at the same inputs, and the least cost of the typical plant (a draw
 * of nothing) and of a named plant (its own draw, which is predicted).
 *
 * <p>With a thousand draws a coverage of .95 is seen as .95 ± .0069 (binomial standard error), so
 * 93 to 97 % is three such errors either way.
 */
@Tag("slow")
class RandomEffectsCoverageTest {

  private static final int PANELS = 1000;
  private static final int PLANTS = 80;
  private static final int PERIODS = 6;
  private static final double HOLES = .2;
  private static final double[] BETA = {.55, .4};
  private static final double TREND = .015;
  private static final Question QUESTION = Question.of(50, 20, 35);
  private static final List<String> INPUTS = List.of("labour", "machines");

  private record Drawn(Panel panel, double levelOfFirst) {}

  @Test
  void intervalsCover() {
    boolean[][] covered =
        IntStream.range(0, PANELS)
            .parallel()
            .mapToObj(RandomEffectsCoverageTest::covered)
            .toArray(boolean[][]::new);
    String[] names = {
      "returns to scale", "technical change", "least cost, typical plant", "least cost, a plant"
    };
    StringBuilder table = new StringBuilder();
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      table.append(String.format(Locale.ROOT, "%-28s %.3f%n", names[k], coverage));
    }
    SimulationTable.write("coverage-random-effects", table.toString());
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      assertThat(coverage).as(names[k]).isBetween(.93, .97);
    }
  }

  private static boolean[] covered(int seed) {
    Drawn drawn = draw(seed);
    Fit fit =
        Estimation.fit(
            drawn.panel(),
            new Specification(
                Form.named("cobb-douglas"),
                PlantEffects.RANDOM,
                Time.TREND,
                true,
                StandardErrors.CLASSICAL,
                .95));
    double[] at = fit.meanLogInputs();
    Estimate scale =
        DeltaMethod.of(fit.typical(), .95)
            .estimate(t -> Elasticities.at(t, at).scale(), DeltaMethod.Scale.LINEAR);
    Estimate change = TechnicalChange.of(fit).orElseThrow().rates().get(0).percent();
    int last = PERIODS - 1;
    return new boolean[] {
      holds(scale, BETA[0] + BETA[1]),
      holds(change, 100 * Math.expm1(TREND)),
      holds(cost(fit.typical()), truth(TREND * last)),
      holds(
          cost(fit.at(last, new Productivity.Plant(0))), truth(TREND * last + drawn.levelOfFirst()))
    };
  }

  private static Estimate cost(EstimatedTechnology technology) {
    return DeltaMethod.of(technology, .95)
        .estimate(t -> Minimiser.of(t).plan(QUESTION).cost(), DeltaMethod.Scale.LOG);
  }

  private static double truth(double constant) {
    return Minimiser.of(CobbDouglas.of(INPUTS, constant, BETA)).plan(QUESTION).cost();
  }

  private static boolean holds(Estimate estimate, double truth) {
    return estimate.low() <= truth && truth <= estimate.high();
  }

  private static Drawn draw(int seed) {
    RandomGenerator random = new SplittableRandom(61_000 + seed);
    List<double[]> rows = new ArrayList<>();
    double first = 0;
    for (int p = 0; p < PLANTS; p++) {
      double level = .15 * random.nextGaussian();
      first = p == 0 ? level : first;
      double size = .5 * random.nextGaussian();
      for (int t = 0; t < PERIODS; t++) {
        double labour = 3 + size + .3 * random.nextGaussian();
        double machines = 2 + size + .3 * random.nextGaussian();
        double output =
            level + TREND * t + BETA[0] * labour + BETA[1] * machines + .1 * random.nextGaussian();
        // Every plant keeps its last row, so that all are there and the last period too.
        if (t == PERIODS - 1 || random.nextDouble() >= HOLES) {
          rows.add(
              new double[] {p, 2015 + t, Math.exp(output), Math.exp(labour), Math.exp(machines)});
        }
      }
    }
    Panel panel =
        PanelFixtures.panel(
            rows.stream().mapToInt(r -> (int) r[0]).toArray(),
            rows.stream().mapToInt(r -> (int) r[1]).toArray(),
            column(rows, 2),
            INPUTS,
            List.of(column(rows, 3), column(rows, 4)),
            List.of(),
            List.of());
    return new Drawn(panel, first);
  }

  private static double[] column(List<double[]> rows, int k) {
    return rows.stream().mapToDouble(r -> r[k]).toArray();
  }
}

package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.inference.Estimate;
import isowright.leastcost.Question;
import isowright.technology.CobbDouglas;
import isowright.technology.Form;
import isowright.technology.Technology;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Do 95 % intervals of a gap and its parts cover? A thousand panels with plant effects are drawn
 * from a known Cobb-Douglas technology; a filing is held against the typical plant of each
 * estimated technology, and the gap against the true one is looked for in the intervals.
 *
 * <p>With a thousand draws a coverage of .95 is seen as .95 ± .0069 (binomial standard error), so
 * 93 to 97 % is three such errors either way. The translog nests the truth, so its intervals must
 * cover too, wider as they are.
 */
@Tag("slow")
class GapCoverageTest {

  private static final int PANELS = 1000;
  private static final int PLANTS = 60;
  private static final int PERIODS = 6;
  private static final double[] BETA = {.45, .35, .25};
  private static final List<String> INPUTS = List.of("labour", "machines", "energy");
  private static final double[] MIX = {30, 16, 22};
  private static final double[] PRICES = {20, 35, 8};
  private static final double FILED = 1500;

  @ParameterizedTest
  @ValueSource(strings = {"cobb-douglas", "translog"})
  void intervalsCover(String form) throws IOException {
    boolean[][] covered =
        IntStream.range(0, PANELS)
            .parallel()
            .mapToObj(seed -> covered(form, seed))
            .toArray(boolean[][]::new);
    String[] names = {"least cost", "gap", "technical", "mix", "ratio"};
    StringBuilder table = new StringBuilder();
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      table.append(String.format(Locale.ROOT, "%-14s %-12s %.3f%n", form, names[k], coverage));
    }
    Files.createDirectories(Path.of("target"));
    Files.writeString(Path.of("target/gap-coverage-" + form + ".txt"), table);
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, PANELS).filter(s -> covered[s][figure]).count() / (double) PANELS;
      assertThat(coverage).as(names[k]).isBetween(.93, .97);
    }
  }

  private static boolean[] covered(String form, int seed) {
    RandomGenerator random = new SplittableRandom(31_000 + seed);
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
        double ln = level + .1 * random.nextGaussian();
        for (int i = 0; i < 3; i++) {
          double z = 3 + size + .4 * random.nextGaussian();
          x[i][r] = Math.exp(z);
          ln += BETA[i] * z;
        }
        output[r] = Math.exp(ln);
      }
    }
    Technology truth = CobbDouglas.of(INPUTS, levels / PLANTS, BETA);
    double target = CobbDouglas.of(INPUTS, -.05, BETA).output(MIX);
    Fit fit =
        Estimation.fit(
            PanelFixtures.panel(
                plant, period, output, INPUTS, List.of(x[0], x[1], x[2]), List.of(), List.of()),
            new Specification(
                Form.named(form),
                Specification.PlantEffects.WITHIN,
                Specification.Time.NONE,
                true,
                Specification.StandardErrors.CLUSTERED,
                .95));
    Question question = Question.of(target, PRICES);
    GapEstimate estimate = GapEstimates.against(fit.typical(), .95).of(MIX, question, FILED);
    Gap known = FiledCost.against(truth).gap(MIX, question, FILED);
    return new boolean[] {
      holds(estimate.leastCost(), known.leastCost()),
      holds(estimate.difference(), known.gap()),
      holds(estimate.technical(), known.technical()),
      holds(estimate.mix(), known.mix()),
      holds(estimate.ratio(), FILED / known.leastCost())
    };
  }

  private static boolean holds(Estimate estimate, double truth) {
    return estimate.low() <= truth && truth <= estimate.high();
  }
}

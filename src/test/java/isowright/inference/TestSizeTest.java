package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do tests at 5 % reject a true null in 5 % of panels? A thousand panels with holes are drawn for
 * each null from a Cobb-Douglas technology, and every test of plants, periods and technical change
 * is made.
 *
 * <p>With a thousand draws a size of .05 is seen as .05 ± .0069 (binomial standard error), so 3 to
 * 7 % is some three such errors either way.
 */
@Tag("slow")
class TestSizeTest {

  private static final int PANELS = 1000;
  private static final int PLANTS = 60;

  /**
   * The test of random effects against within rests on many plants, and so does the one for serial
   * correlation, whose covariance is clustered: with 60 they reject in some 7 to 8 %.
   */
  private static final int MANY_PLANTS = 200;

  private static final int PERIODS = 6;
  private static final double HOLES = .15;
  private static final List<String> INPUTS = List.of("labour", "machines");

  /** A fit under whose null panels are drawn, and the tests looked at. */
  private record Null(
      String name,
      int plants,
      double spread,
      PlantEffects effects,
      Time time,
      StandardErrors errors,
      List<String> tests) {}

  private static final List<Null> NULLS =
      List.of(
          new Null(
              "no plant effects, pooled",
              PLANTS,
              0,
              PlantEffects.NONE,
              Time.NONE,
              StandardErrors.CLASSICAL,
              List.of("plant-variance", "poolability", "serial-correlation")),
          new Null(
              "no plant effects, within",
              PLANTS,
              0,
              PlantEffects.WITHIN,
              Time.NONE,
              StandardErrors.CLASSICAL,
              List.of("plant-effects", "poolability")),
          new Null(
              "random effects",
              MANY_PLANTS,
              .1,
              PlantEffects.RANDOM,
              Time.NONE,
              StandardErrors.CLASSICAL,
              List.of("random-against-within", "plant-means")),
          new Null(
              "plant effects, two-way",
              PLANTS,
              .2,
              PlantEffects.WITHIN,
              Time.TWO_WAY,
              StandardErrors.CLASSICAL,
              List.of("period-effects")),
          new Null(
              "random effects with plant means, clustered",
              PLANTS,
              .2,
              PlantEffects.MUNDLAK,
              Time.NONE,
              StandardErrors.CLUSTERED,
              List.of("plant-means")),
          new Null(
              "differences with a biased trend, clustered",
              PLANTS,
              .2,
              PlantEffects.DIFFERENCES,
              Time.BIASED_TREND,
              StandardErrors.CLUSTERED,
              List.of("neutral-technical-change")),
          new Null(
              "differences, clustered",
              MANY_PLANTS,
              .2,
              PlantEffects.DIFFERENCES,
              Time.NONE,
              StandardErrors.CLUSTERED,
              List.of("serial-correlation")));

  @Test
  void sizesAreNearFivePercent() {
    Map<String, Integer> rejected = new TreeMap<>();
    for (int n = 0; n < NULLS.size(); n++) {
      Null under = NULLS.get(n);
      int first = PANELS * n;
      List<List<String>> rejections =
          IntStream.range(0, PANELS)
              .parallel()
              .mapToObj(s -> rejections(under, first + s))
              .toList();
      for (String test : under.tests()) {
        int count = (int) rejections.stream().filter(r -> r.contains(test)).count();
        rejected.put(under.name() + ": " + test, count);
      }
    }
    StringBuilder table = new StringBuilder();
    rejected.forEach(
        (test, count) ->
            table.append(
                String.format(Locale.ROOT, "%-85s %.3f%n", test, count / (double) PANELS)));
    SimulationTable.write("sizes-panel", table.toString());
    assertThat(rejected)
        .allSatisfy(
            (test, count) -> assertThat(count / (double) PANELS).as(test).isBetween(.03, .07));
  }

  private static List<String> rejections(Null under, int seed) {
    Fit fit =
        Estimation.fit(
            draw(seed, under.plants(), under.spread()),
            new Specification(
                Form.named("cobb-douglas"),
                under.effects(),
                under.time(),
                true,
                under.errors(),
                .95));
    return PanelHypotheses.of(fit).stream().filter(Verdict::rejects).map(Verdict::name).toList();
  }

  /**
   * Plants of unequal length; their levels have nothing to do with their inputs.
   *
   * @param spread the standard deviation of levels; that of a row's error is .1
   */
  static Panel draw(int seed, int plants, double spread) {
    RandomGenerator random = new SplittableRandom(41_000 + seed);
    List<double[]> rows = new ArrayList<>();
    for (int p = 0; p < plants; p++) {
      double level = spread * random.nextGaussian();
      double size = .5 * random.nextGaussian();
      for (int t = 0; t < PERIODS; t++) {
        double labour = 3 + size + .25 * random.nextGaussian();
        double machines = 2 + size + .25 * random.nextGaussian();
        double output = level + .6 * labour + .4 * machines + .1 * random.nextGaussian();
        if (random.nextDouble() >= HOLES) {
          rows.add(
              new double[] {p, 2015 + t, Math.exp(output), Math.exp(labour), Math.exp(machines)});
        }
      }
    }
    return PanelFixtures.panel(
        rows.stream().mapToInt(r -> (int) r[0]).toArray(),
        rows.stream().mapToInt(r -> (int) r[1]).toArray(),
        column(rows, 2),
        INPUTS,
        List.of(column(rows, 3), column(rows, 4)),
        List.of(),
        List.of());
  }

  private static double[] column(List<double[]> rows, int k) {
    return rows.stream().mapToDouble(r -> r[k]).toArray();
  }
}

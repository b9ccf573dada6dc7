package isowright.inference;

import static isowright.inference.FrontierHypothesesTest.frontier;
import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Fit;
import isowright.estimation.FrontierPanels;
import isowright.inference.Inefficiency.Variances;
import isowright.regression.OneSidedLaw;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do 95 % intervals of a frontier cover, and does the one-sided test keep its size? A thousand
 * panels of each kind are drawn from a known frontier; a share of .95 (.05) is then seen with a
 * binomial standard error of .0069, so 93 to 97 % (3 to 7 %) is three such errors either way.
 *
 * <p>With the parameters taken as known the intervals of a row's inefficiency would hold it in .925
 * of the panels with decay.
 */
@Tag("slow")
class FrontierCoverageTest {

  private static final int PANELS = 1000;

  @Test
  void intervalsCoverAndTheTestKeepsItsSize() {
    Map<String, Double> coverage = new TreeMap<>();
    coverage.putAll(shares("rows, half-normal: ", FrontierCoverageTest::rows));
    coverage.putAll(shares("plants, decay: ", FrontierCoverageTest::decaying));
    Map<String, Double> size = shares("size: ", FrontierCoverageTest::without);
    StringBuilder table = new StringBuilder();
    coverage.forEach((name, share) -> table.append(line(name, share)));
    size.forEach((name, share) -> table.append(line(name, share)));
    SimulationTable.write("coverage-frontier", table.toString());
    coverage.forEach((name, share) -> assertThat(share).as(name).isBetween(.93, .97));
    size.forEach((name, share) -> assertThat(share).as(name).isBetween(.03, .07));
  }

  private static String line(String name, double share) {
    return String.format(Locale.ROOT, "%-60s %.3f%n", name, share);
  }

  /** The share of panels in which each statement holds. */
  private static Map<String, Double> shares(
      String before, IntFunction<Map<String, Boolean>> panel) {
    Map<String, Double> shares = new LinkedHashMap<>();
    IntStream.range(0, PANELS)
        .parallel()
        .mapToObj(panel)
        .toList()
        .forEach(
            all ->
                all.forEach(
                    (name, holds) ->
                        shares.merge(before + name, holds ? 1.0 / PANELS : 0, Double::sum)));
    return shares;
  }

  private static Map<String, Boolean> rows(int seed) {
    OneSidedLaw law = OneSidedLaw.HALF_NORMAL;
    FrontierPanels.Drawn drawn = FrontierPanels.draw(71_000 + seed, 400, 1, law, .15, .3, false, 0);
    return covered(frontier(drawn.panel(), law, OverTime.EACH_ROW), drawn, law, .3);
  }

  private static Map<String, Boolean> decaying(int seed) {
    OneSidedLaw law = OneSidedLaw.HALF_NORMAL;
    FrontierPanels.Drawn drawn = FrontierPanels.draw(72_000 + seed, 80, 5, law, .1, .3, true, .1);
    Fit fit = frontier(drawn.panel(), law, OverTime.DECAY);
    Map<String, Boolean> covered = covered(fit, drawn, law, .3);
    Variances v = Inefficiency.of(fit).orElseThrow().variances().orElseThrow();
    covered.put("decay", holds(v.decay().orElseThrow(), .1));
    return covered;
  }

  private static Map<String, Boolean> covered(
      Fit fit, FrontierPanels.Drawn drawn, OneSidedLaw law, double scale) {
    Map<String, Boolean> covered = new LinkedHashMap<>();
    Inefficiency found = Inefficiency.of(fit).orElseThrow();
    covered.put("elasticity of labour", elasticity(fit));
    found
        .variances()
        .ifPresent(
            v -> {
              covered.put("inefficiency", holds(v.inefficiency(), scale));
              covered.put("mean inefficiency", holds(v.mean(), law.mean(scale)));
            });
    int row = drawn.inefficiency().length / 2;
    covered.put("a row's inefficiency", holds(found.ofRow(row, .95), drawn.inefficiency()[row]));
    return covered;
  }

  private static boolean elasticity(Fit fit) {
    double value = fit.numbers().parameters()[1];
    double error = Math.sqrt(fit.numbers().covariance()[1][1]);
    Estimate estimate =
        DeltaMethod.of(fit.typical(), .95).estimate(value, error, DeltaMethod.Scale.LINEAR);
    return holds(estimate, FrontierPanels.LABOUR);
  }

  private static boolean holds(Estimate estimate, double truth) {
    return estimate.low() <= truth && truth <= estimate.high();
  }

  private static Map<String, Boolean> without(int seed) {
    Map<String, Boolean> rejected = new LinkedHashMap<>();
    OneSidedLaw law = OneSidedLaw.HALF_NORMAL;
    FrontierPanels.Drawn rows = FrontierPanels.draw(73_000 + seed, 400, 1, law, .2, 0, false, 0);
    rejected.put("no-inefficiency, each row", rejects(rows, OverTime.EACH_ROW));
    FrontierPanels.Drawn plants = FrontierPanels.draw(74_000 + seed, 100, 4, law, .2, 0, true, 0);
    rejected.put("no-inefficiency, constant", rejects(plants, OverTime.CONSTANT));
    return rejected;
  }

  private static boolean rejects(FrontierPanels.Drawn drawn, OverTime overTime) {
    return FrontierHypotheses.of(frontier(drawn.panel(), OneSidedLaw.HALF_NORMAL, overTime))
        .get(0)
        .rejects();
  }
}

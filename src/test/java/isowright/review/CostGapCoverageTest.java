package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.cost.CostArguments;
import isowright.cost.CostForm;
import isowright.cost.CostFunction;
import isowright.cost.TranslogCost;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.EstimatedCost;
import isowright.estimation.Productivity;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import isowright.regression.Groups;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/**
 * Do 95 % intervals of a gap against an estimated cost function cover, and those of its parts? A
 * thousand samples of 80 rows are drawn from a known Cobb-Douglas cost function with normal chance
 * in ln C; the same filing, its mix off the least-cost one, is held against each estimate.
 *
 * <p>With a thousand samples a coverage of .95 is seen as .95 ± .0069 (binomial standard error), so
 * 93 to 97 % is three such errors either way.
 */
class CostGapCoverageTest {

  private static final int SAMPLES = 1000;
  private static final int ROWS = 80;
  private static final CostArguments ARGUMENTS =
      CostArguments.ownUnits(
          List.of("labour", "machines", "energy"), List.of("glass"), List.of(), false);
  private static final TranslogCost TRUTH =
      new TranslogCost(
          "cobb-douglas-cost",
          ARGUMENTS,
          CostForm.COBB_DOUGLAS.terms(ARGUMENTS),
          new double[] {1, .45, .3, .25, .92});
  private static final double[] POINT = {.3, -.2, .1, 1.2};
  private static final double RECORDED = 1.25 * Math.exp(TRUTH.logCost(POINT));
  private static final double[] SHARES = {.6, .25, .15};

  @Test
  void intervalsCover() {
    CostGap truth = gap(TRUTH, known(TRUTH));
    boolean[][] covered =
        IntStream.range(0, SAMPLES)
            .parallel()
            .mapToObj(seed -> covered(seed, truth))
            .toArray(boolean[][]::new);
    String[] names = {"least cost", "gap", "technical", "mix", "ratio"};
    for (int k = 0; k < names.length; k++) {
      int figure = k;
      double coverage =
          IntStream.range(0, SAMPLES).filter(s -> covered[s][figure]).count() / (double) SAMPLES;
      assertThat(coverage).as(names[k]).isBetween(.93, .97);
    }
  }

  private static boolean[] covered(int seed, CostGap truth) {
    SplittableRandom random = new SplittableRandom(52_000 + seed);
    double[][] points = new double[4][ROWS];
    double[] logCost = new double[ROWS];
    for (int r = 0; r < ROWS; r++) {
      for (double[] column : points) {
        column[r] = .5 * random.nextGaussian();
      }
      double[] v = {points[0][r], points[1][r], points[2][r], points[3][r]};
      logCost[r] = TRUTH.logCost(v) + .15 * random.nextGaussian();
    }
    CostData data =
        new CostData(
            ARGUMENTS,
            points,
            logCost,
            new double[0][],
            new double[0][],
            List.of(),
            Groups.ofSingleRows(ROWS));
    CostFit fit =
        CostEstimation.fit(
            data,
            new CostSpecification(
                CostForm.COBB_DOUGLAS, Equations.COST, true, List.of(), false, false, 2, .95));
    EstimatedCost estimated = EstimatedCost.of(data, fit, new Productivity.Typical());
    CostGap gap =
        gap(
            estimated.function(),
            new Propagation<>(
                estimated.centre(),
                estimated.covariance(),
                fit.degreesOfFreedom(),
                .95,
                estimated::at));
    return new boolean[] {
      holds(gap.leastCost(), truth.leastCost()),
      holds(gap.difference(), truth.difference()),
      holds(gap.parts().orElseThrow().technical(), truth.parts().orElseThrow().technical()),
      holds(gap.parts().orElseThrow().mix(), truth.parts().orElseThrow().mix()),
      holds(gap.ratio(), truth.ratio())
    };
  }

  private static boolean holds(Estimate estimate, Estimate truth) {
    return estimate.low() <= truth.value() && truth.value() <= estimate.high();
  }

  private static CostGap gap(CostFunction function, Propagation<CostFunction> propagation) {
    return CostGaps.against(propagation)
        .of(List.of(new CostGaps.Filed(POINT, 1.1 * RECORDED, RECORDED, SHARES)), function)
        .get(0);
  }

  /** A cost function taken as known: nothing is uncertain. */
  private static Propagation<CostFunction> known(CostFunction function) {
    int p = function.parameters().length;
    return new Propagation<>(
        function.parameters(), new double[p][p], 1, .95, function::withParameters);
  }
}

package isowright.benchmark;

import isowright.cost.CostArguments;
import isowright.cost.CostForm;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostFixtures;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.Groups;
import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/** How long systems of cost and share equations, iterated to maximum likelihood, take. */
final class CostSystemTimes {

  private static final int ROWS = 100_000;
  private static final int WARM_UP = 200;
  private static final int MEASURED = 51;

  private CostSystemTimes() {}

  /** Shares of 25 years and four inputs warm; cost, shares and quantities of 100,000 rows. */
  static void report(Steps steps) throws IOException {
    steps.heading("Systems of cost and share equations, iterated");
    CostData years = CostFixtures.manufacturing();
    CostSpecification shares = specification(CostForm.TRANSLOG, Equations.SHARES, false);
    for (int k = 0; k < WARM_UP; k++) {
      CostEstimation.fit(years, shares);
    }
    double[] times = new double[MEASURED];
    for (int k = 0; k < MEASURED; k++) {
      times[k] = seconds(years, shares);
    }
    Arrays.sort(times);
    steps.line("shares of 25 years, 4 inputs, warm, median", times[MEASURED / 2] * 1000, "ms");
    CostData wide = wide();
    steps.line(
        "translog, cost and 3 shares, 100,000 rows, clustered",
        seconds(wide, specification(CostForm.TRANSLOG, Equations.SYSTEM, true)),
        "s");
    steps.line(
        "McFadden, concave, 4 quantities, 100,000 rows, clustered",
        seconds(wide, specification(CostForm.MCFADDEN, Equations.QUANTITIES, true)),
        "s");
  }

  private static double seconds(CostData data, CostSpecification specification) {
    long start = System.nanoTime();
    CostFit fit = CostEstimation.fit(data, specification);
    double seconds = (System.nanoTime() - start) * 1e-9;
    if (!fit.system().converged()) {
      throw new IllegalStateException(specification.form().word() + " did not converge");
    }
    return seconds;
  }

  private static CostSpecification specification(
      CostForm form, Equations equations, boolean clustered) {
    Concavity concavity = form == CostForm.MCFADDEN ? Concavity.EVERYWHERE : Concavity.FREE;
    return new CostSpecification(
        form, equations, true, List.of(), false, clustered, 3, 0.95, concavity);
  }

  /** 10,000 firms, ten rows each: Cobb-Douglas but for chance, four inputs, one output. */
  private static CostData wide() {
    SplittableRandom random = new SplittableRandom(71);
    double[][] points = new double[5][ROWS];
    double[] cost = new double[ROWS];
    double[][] shares = new double[4][ROWS];
    double[] mean = {.2, .3, .1, .4};
    for (int r = 0; r < ROWS; r++) {
      double sum = 0;
      for (int i = 0; i < 4; i++) {
        points[i][r] = random.nextDouble() - 0.5;
        shares[i][r] = mean[i] * (0.9 + 0.2 * random.nextDouble());
        sum += shares[i][r];
        cost[r] += mean[i] * points[i][r];
      }
      points[4][r] = 4 * random.nextDouble();
      cost[r] += 0.9 * points[4][r] + 0.1 * random.nextDouble();
      for (int i = 0; i < 4; i++) {
        shares[i][r] /= sum;
      }
    }
    int[] starts = new int[ROWS / 10];
    Arrays.setAll(starts, g -> 10 * g);
    double[] base = new double[5];
    Arrays.setAll(base, k -> Math.exp(Arrays.stream(points[k]).average().orElseThrow()));
    return new CostData(
        new CostArguments(List.of("a", "b", "c", "d"), List.of("y"), List.of(), false, base),
        points,
        cost,
        shares,
        new double[0][],
        List.of(),
        Groups.startingAt(ROWS, starts));
  }
}

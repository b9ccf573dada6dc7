package isowright.benchmark;

import isowright.regression.ArrayDesign;
import isowright.regression.ClusterBootstrap;
import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.GroupProducts;
import isowright.regression.Groups;
import isowright.regression.LeastSquares;
import isowright.regression.LeaveOut;
import isowright.regression.LinearFit;
import isowright.regression.Refits;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;

/**
 * How long the cluster bootstrap and leaving out each group take beside the fit itself: three
 * inputs and a trend within groups of ten rows, in memory.
 */
final class ResamplingTimes {

  private static final int DRAWS = 999;
  private static final int ROWS_IN_GROUP = 10;

  private ResamplingTimes() {}

  static void report(Steps steps) throws Exception {
    for (int groups : new int[] {1_000, 10_000, 100_000}) {
      Design design = Effects.within(design(groups));
      steps.heading(
          String.format(
              Locale.ROOT,
              "Refits within groups: %,d rows of %,d groups, four slopes",
              groups * ROWS_IN_GROUP,
              groups));
      LinearFit fit = steps.time("fit", () -> LeastSquares.fit(design));
      GroupProducts products =
          steps.time("products of groups", () -> GroupProducts.of(design, fit));
      Refits draws =
          steps.time(DRAWS + " draws of groups", () -> ClusterBootstrap.draw(products, DRAWS, 1));
      Refits without = steps.time("without each group", () -> LeaveOut.eachGroup(products));
      if (draws.failures() + without.failures() > 0) {
        throw new IllegalStateException("a refit lost rank");
      }
    }
  }

  private static ArrayDesign design(int groups) {
    SplittableRandom random = new SplittableRandom(9);
    int rows = groups * ROWS_IN_GROUP;
    double[][] x = new double[4][rows];
    double[] y = new double[rows];
    int[] starts = new int[groups];
    Arrays.setAll(starts, g -> g * ROWS_IN_GROUP);
    for (int i = 0; i < rows; i++) {
      for (int k = 0; k < 3; k++) {
        x[k][i] = random.nextDouble(-1, 1);
        y[i] += 0.33 * x[k][i];
      }
      x[3][i] = i % ROWS_IN_GROUP;
      y[i] += 0.01 * x[3][i] + random.nextDouble(-0.2, 0.2);
    }
    return ArrayDesign.of(List.of("a", "b", "c", "trend"), x, y, Groups.startingAt(rows, starts));
  }
}

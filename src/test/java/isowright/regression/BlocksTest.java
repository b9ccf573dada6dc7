package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;

class BlocksTest {

  @Test
  void blocksCoverAllRowsAndRespectGroups() {
    SplittableRandom random = new SplittableRandom(11);
    for (int trial = 0; trial < 200; trial++) {
      int rows = 1 + random.nextInt(5000);
      Groups groups =
          trial % 5 == 0
              ? Groups.ofSingleRows(rows)
              : RandomDesigns.groups(random, rows, 1 + random.nextInt(400));
      int most = 1 + random.nextInt(300);
      Blocks blocks = Blocks.of(groups, most);
      assertThat(blocks.start(0)).isZero();
      assertThat(blocks.end(blocks.count() - 1)).isEqualTo(rows);
      for (int b = 0; b < blocks.count(); b++) {
        int from = blocks.start(b);
        int to = blocks.end(b);
        assertThat(to).isGreaterThan(from);
        assertThat(to - from).isLessThanOrEqualTo(blocks.longest());
        assertThat(groups.start(groups.of(from))).isEqualTo(from);
        assertThat(groups.end(groups.of(to - 1))).isEqualTo(to);
        boolean oneGroup = groups.of(from) == groups.of(to - 1);
        assertThat(oneGroup || to - from <= most).isTrue();
      }
    }
  }

  @Test
  void noRowsMakeNoBlocks() {
    assertThat(Blocks.of(Groups.ofSingleRows(0)).count()).isZero();
  }

  @Test
  void digitsDoNotDependOnTheNumberOfThreads() throws ExecutionException, InterruptedException {
    Design design = RandomDesigns.grouped(new SplittableRandom(5), 60_000, 6, 9);
    Design within = Effects.within(design);
    double[] once = everything(within, 1);
    assertThat(Arrays.equals(once, everything(within, 2))).isTrue();
    assertThat(Arrays.equals(once, everything(within, 7))).isTrue();
    assertThat(Arrays.equals(once, numbers(within))).isTrue();
  }

  private static double[] everything(Design design, int threads)
      throws ExecutionException, InterruptedException {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(() -> numbers(design)).get();
    } finally {
      pool.shutdown();
    }
  }

  private static double[] numbers(Design design) {
    LinearFit fit = LeastSquares.fit(design);
    double[] clustered = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED).matrix()[1];
    double[] third = Covariance.estimate(design, fit, Covariance.Kind.HC3).matrix()[2];
    double[] residuals = LeastSquares.residuals(design, fit);
    Influence first = Influence.most(design, fit, 3).get(0);
    double[] all = Arrays.copyOf(fit.coefficients(), 4 * fit.columns().size() + residuals.length);
    int at = fit.columns().size();
    System.arraycopy(clustered, 0, all, at, clustered.length);
    System.arraycopy(third, 0, all, 2 * at, third.length);
    System.arraycopy(residuals, 0, all, 3 * at, residuals.length);
    all[all.length - 1] = first.row();
    all[all.length - 2] = first.cooksDistance();
    all[all.length - 3] = fit.ssr();
    return all;
  }
}

package isowright.regression;

import java.util.stream.IntStream;

/**
 * What would the coefficients be without one group, or without all rows of one time? Exact refits,
 * from sums of products alone.
 *
 * <p>Without group g the fit comes from Σ S − S_g (see {@link GroupProducts}). Without time t it
 * comes from the same sum less what the rows of t contribute; where group means were removed, they
 * move when a row goes: with m of a group's n rows at t, and h the sum of q over these m, the group
 * loses Σ q q′ + h h′/(n − m). (Deviations from the mean of the rows that stay, by the usual
 * updating formula for sums of squares.)
 *
 * <p>Digits: the difference of sums loses what the rows left out carried: where they carried all
 * but a part 1e-10 of some direction, the refit is said to have lost rank. Tested against refits of
 * the rows in {@code LeaveOutTest}.
 */
public final class LeaveOut {

  private static final int CHUNK = 256;

  private LeaveOut() {}

  /** The fit without each group in turn; refit g is that without group g. */
  public static Refits eachGroup(GroupProducts products) {
    return eachGroup(products, Refits.AS_THEY_ARE);
  }

  /** The same, each refit revised before it is kept. */
  public static Refits eachGroup(GroupProducts products, Refits.Revision revision) {
    int groups = products.groups();
    Refits refits = new Refits(groups, products.fit().columns().size(), revision);
    double[] total = products.total();
    int chunks = (groups + CHUNK - 1) / CHUNK;
    IntStream.range(0, chunks)
        .parallel()
        .forEach(
            chunk -> {
              int first = chunk * CHUNK;
              int last = Math.min(groups, first + CHUNK);
              some(products, products.packedProducts(), total, first, last, 0, refits);
            });
    return refits;
  }

  /**
   * The fit without each time in turn; refit t is that without time t.
   *
   * @param design the design that was fitted, in plain rows or in deviations from group means
   * @param timeColumns whether each time has a column of its own that is zero at all others:
   *     without the time its coefficient, or the level against which the others are measured, is
   *     lost, and is left as it was; everything that can be told without it is right
   */
  public static Refits eachTime(
      Design design, GroupProducts products, Times times, boolean timeColumns) {
    return eachTime(design, products, times, timeColumns, Refits.AS_THEY_ARE);
  }

  /** The same, each refit revised before it is kept. */
  public static Refits eachTime(
      Design design,
      GroupProducts products,
      Times times,
      boolean timeColumns,
      Refits.Revision revision) {
    double[] own = timeProducts(design, products, times);
    Refits refits = new Refits(times.count(), products.fit().columns().size(), revision);
    some(products, own, products.total(), 0, times.count(), timeColumns ? 1 : 0, refits);
    return refits;
  }

  private static void some(
      GroupProducts products,
      double[] out,
      double[] total,
      int first,
      int last,
      int mostLost,
      Refits refits) {
    PackedSolver solver = new PackedSolver(products.size() - 1);
    double[] left = new double[total.length];
    for (int i = first; i < last; i++) {
      for (int e = 0; e < left.length; e++) {
        left[e] = total[e] - out[i * left.length + e];
      }
      solver.solve(left);
      refits.set(i, products, solver, solver.lost() <= mostLost);
    }
  }

  /** What the rows of each time contribute, packed, one time after another. */
  private static double[] timeProducts(Design design, GroupProducts products, Times times) {
    if (times.rows() != design.rows()) {
      throw new IllegalArgumentException(
          "there are times of " + times.rows() + " rows, the design has " + design.rows());
    }
    LinearFit fit = products.fit();
    Blocks blocks = Blocks.of(design.groups());
    return blocks.gather(
            fit.columns().size() + 1,
            () -> new TimeGatherer(design, fit, times, blocks.longest()),
            (gatherer, from, to, buffer) ->
                gatherer.take(gatherer.rows.of(design, from, to, buffer), from, to),
            TimeGatherer::add)
        .products;
  }

  private static final class TimeGatherer {
    private final Groups groups;
    private final Times times;
    private final boolean means;
    private final RotatedRows rows;
    private final double[] products;
    private final double[] sum;

    TimeGatherer(Design design, LinearFit fit, Times times, int longest) {
      this.groups = design.groups();
      this.times = times;
      this.means = design.absorbed() > 0;
      this.rows = new RotatedRows(fit, longest);
      int size = fit.rank() + 1;
      this.products = new double[times.count() * (size * (size + 1) / 2)];
      this.sum = new double[size];
    }

    void take(double[][] rotated, int from, int to) {
      for (int start = from; start < to; ) {
        int group = groups.of(start);
        int end = start + 1;
        while (end < groups.end(group) && times.of(end) == times.of(start)) {
          end++;
        }
        int others = groups.end(group) - groups.start(group) - (end - start);
        cell(rotated, start - from, end - from, times.of(start), others);
        start = end;
      }
    }

    private void cell(double[][] rotated, int start, int end, int time, int others) {
      int size = rotated.length;
      for (int p = 0; p < size; p++) {
        sum[p] = 0;
        for (int i = start; i < end; i++) {
          sum[p] += rotated[p][i];
        }
      }
      double share = means && others > 0 ? 1.0 / others : 0;
      int at = time * (size * (size + 1) / 2);
      for (int p = 0; p < size; p++) {
        for (int q = 0; q <= p; q++) {
          products[at++] +=
              OrthogonalDecomposition.product(rotated[p], rotated[q], start, end)
                  + share * sum[p] * sum[q];
        }
      }
    }

    void add(TimeGatherer other) {
      for (int e = 0; e < products.length; e++) {
        products[e] += other.products[e];
      }
    }
  }
}

package isowright.regression;

import java.util.stream.IntStream;

/**
 * How would the coefficients vary, had other groups been sampled? The cluster bootstrap: G groups
 * are drawn from the G groups with replacement, whole, and the model is fitted to them; a group
 * that is drawn twice stands there as two groups.
 *
 * <p>A draw is a multinomial count of each group, and its fit comes from Σ n_g S_g (see {@link
 * GroupProducts}). Draws are made in blocks, so that the contributions of the groups stream through
 * the cache once a block. Draw b has a random stream of its own from the seed and b alone, and its
 * sum runs over the groups in their order, so the digits depend neither on the number of threads
 * nor on how many draws are made.
 *
 * <p>Assumptions: groups are independent of one another and many; within a group anything goes.
 * Source: B. Efron and R. J. Tibshirani, <i>An Introduction to the Bootstrap</i>, 1993, chapter 8;
 * A. C. Cameron, J. B. Gelbach and D. L. Miller 2008, Review of Economics and Statistics 90,
 * 414–427, section III (pairs cluster bootstrap). Tested in {@code ClusterBootstrapTest}.
 */
public final class ClusterBootstrap {

  /** What the random numbers of a draw are for. */
  static final long PURPOSE = 1;

  /** Draws summed together: the inner loop runs over them, long enough for vector instructions. */
  static final int BLOCK = 64;

  /**
   * Groups whose counts are laid out for the inner loop at once: 256 kB, the second-level cache.
   */
  private static final int CHUNK = 512;

  private ClusterBootstrap() {}

  /**
   * Draws and fits, in parallel.
   *
   * @param draws how many, at least 1
   */
  public static Refits draw(GroupProducts products, int draws, long seed) {
    return draw(products, draws, seed, Refits.AS_THEY_ARE);
  }

  /** The same, each refit revised before it is kept. */
  public static Refits draw(
      GroupProducts products, int draws, long seed, Refits.Revision revision) {
    if (draws < 1) {
      throw new IllegalArgumentException("draws is " + draws);
    }
    Refits refits = new Refits(draws, products.fit().columns().size(), revision);
    int blocks = (draws + BLOCK - 1) / BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            block -> {
              int first = block * BLOCK;
              int last = Math.min(draws, first + BLOCK);
              solve(products, sums(products, first, last, seed), first, last, refits);
            });
    return refits;
  }

  /**
   * How often each group stands in a draw; shape G.
   *
   * @param draw the number of the draw, from 0
   */
  public static int[] counts(int groups, int draw, long seed) {
    byte[] counts = new byte[groups];
    new DrawStream(seed, draw, PURPOSE).multinomial(counts);
    int[] wide = new int[groups];
    for (int g = 0; g < groups; g++) {
      wide[g] = counts[g];
    }
    return wide;
  }

  /** Σ_g n_g S_g of some draws: entry e of draw d at {@code e × BLOCK + d − first}. */
  private static double[] sums(GroupProducts products, int first, int last, long seed) {
    int groups = products.groups();
    int packed = products.packed();
    byte[][] counts = new byte[last - first][groups];
    for (int d = first; d < last; d++) {
      new DrawStream(seed, d, PURPOSE).multinomial(counts[d - first]);
    }
    double[] sums = new double[packed * BLOCK];
    double[] laidOut = new double[CHUNK * BLOCK];
    for (int from = 0; from < groups; from += CHUNK) {
      int to = Math.min(groups, from + CHUNK);
      layOut(counts, from, to, laidOut);
      add(products.packedProducts(), packed, from, to, laidOut, sums);
    }
    return sums;
  }

  private static void layOut(byte[][] counts, int from, int to, double[] into) {
    for (int d = 0; d < counts.length; d++) {
      byte[] own = counts[d];
      for (int g = from; g < to; g++) {
        into[(g - from) * BLOCK + d] = own[g];
      }
    }
  }

  /** Adds groups four at a time, so that a sum is fetched and stored once for four. */
  private static void add(
      double[] products, int packed, int from, int to, double[] counts, double[] sums) {
    int g = from;
    for (; g + 3 < to; g += 4) {
      int at = g * packed;
      int row = (g - from) * BLOCK;
      for (int e = 0; e < packed; e++) {
        addFour(
            sums,
            e * BLOCK,
            counts,
            row,
            products[at + e],
            products[at + packed + e],
            products[at + 2 * packed + e],
            products[at + 3 * packed + e]);
      }
    }
    for (; g < to; g++) {
      int row = (g - from) * BLOCK;
      for (int e = 0; e < packed; e++) {
        double weight = products[g * packed + e];
        for (int d = 0; d < BLOCK; d++) {
          sums[e * BLOCK + d] += weight * counts[row + d];
        }
      }
    }
  }

  private static void addFour(
      double[] sums,
      int at,
      double[] counts,
      int row,
      double first,
      double second,
      double third,
      double fourth) {
    for (int d = 0; d < BLOCK; d++) {
      sums[at + d] +=
          first * counts[row + d]
              + second * counts[row + BLOCK + d]
              + third * counts[row + 2 * BLOCK + d]
              + fourth * counts[row + 3 * BLOCK + d];
    }
  }

  private static void solve(
      GroupProducts products, double[] sums, int first, int last, Refits refits) {
    PackedSolver solver = new PackedSolver(products.size() - 1);
    double[] own = new double[products.packed()];
    for (int d = first; d < last; d++) {
      for (int e = 0; e < own.length; e++) {
        own[e] = sums[e * BLOCK + d - first];
      }
      refits.set(d, products, solver, solver.solve(own));
    }
  }
}

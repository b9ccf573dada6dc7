package isowright.review;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** Ranks of plants over many draws: how often each, and between which the middle of them lies. */
public final class RankBands {

  /** Ranks of so many plants are gathered at once: their counts stay in the processor's cache. */
  private static final int TOGETHER = 64;

  private final Band[] bands;
  private final List<List<Double>> probabilities;

  private RankBands(Band[] bands, List<List<Double>> probabilities) {
    this.bands = bands;
    this.probabilities = probabilities;
  }

  /**
   * A band of ranks.
   *
   * @param low the lower
   * @param high the higher
   */
  public record Band(int low, int high) {}

  /**
   * Bands of ranks.
   *
   * @param byDraw the rank of every plant in every draw, [draw][plant]
   */
  static RankBands of(int[][] byDraw, double level) {
    int plants = byDraw.length == 0 ? 0 : byDraw[0].length;
    Band[] bands = new Band[plants];
    boolean all = plants <= Ordering.MOST_PROBABILITIES;
    List<List<Double>> probabilities = new ArrayList<>();
    if (all) {
      IntStream.range(0, plants).forEach(i -> probabilities.add(shares(byDraw, i)));
    }
    IntStream.range(0, (plants + TOGETHER - 1) / TOGETHER)
        .parallel()
        .forEach(block -> bands(byDraw, block * TOGETHER, level, bands));
    return new RankBands(bands, probabilities);
  }

  /** The bands of {@link #TOGETHER} plants from one on: their ranks in order, the ends cut off. */
  private static void bands(int[][] byDraw, int from, double level, Band[] bands) {
    int to = Math.min(from + TOGETHER, bands.length);
    int draws = byDraw.length;
    int[][] own = new int[to - from][draws];
    for (int r = 0; r < draws; r++) {
      for (int i = from; i < to; i++) {
        own[i - from][r] = byDraw[r][i];
      }
    }
    // a share that is whole but for rounding counts as whole
    int cut = (int) Math.floor((1 - level) / 2 * draws + 1e-9);
    int[] counts = new int[bands.length + 2];
    for (int i = from; i < to; i++) {
      for (int rank : own[i - from]) {
        counts[rank]++;
      }
      bands[i] = new Band(at(counts, cut), at(counts, draws - 1 - cut));
      for (int rank : own[i - from]) {
        counts[rank] = 0;
      }
    }
  }

  /** The rank at a place, from 0, of the ranks in order. */
  private static int at(int[] counts, int place) {
    int rank = 0;
    for (int before = 0; before <= place; before += counts[rank]) {
      rank++;
    }
    return rank;
  }

  /** The band of a plant: the ranks between which the middle {@code level} of the draws lies. */
  Band band(int plant) {
    return bands[plant];
  }

  /** The probability of every rank; none of more than so many plants. */
  List<Double> probabilities(int plant) {
    return probabilities.isEmpty() ? List.of() : probabilities.get(plant);
  }

  private static List<Double> shares(int[][] byDraw, int plant) {
    double[] counts = new double[byDraw[0].length];
    for (int[] draw : byDraw) {
      counts[draw[plant] - 1]++;
    }
    List<Double> all = new ArrayList<>();
    for (double count : counts) {
      all.add(count / byDraw.length);
    }
    return all;
  }
}

package isowright.review;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/** Ranks of plants over many draws: how often each, and between which the middle of them lies. */
public final class RankBands {

  private final int[][] ranks;
  private final double level;

  private RankBands(int[][] ranks, double level) {
    this.ranks = ranks;
    this.level = level;
  }

  /**
   * A band of ranks.
   *
   * @param low the lower
   * @param high the higher
   */
  public record Band(int low, int high) {}

  /**
   * Ranks in every draw.
   *
   * @param rows a row for each draw, a value for each plant; the least has rank 1
   */
  static RankBands of(double[][] rows, double level) {
    int plants = rows.length == 0 ? 0 : rows[0].length;
    int[][] byDraw = Arrays.stream(rows).parallel().map(RankBands::ranks).toArray(int[][]::new);
    int[][] byPlant =
        IntStream.range(0, plants)
            .parallel()
            .mapToObj(i -> Arrays.stream(byDraw).mapToInt(row -> row[i]).sorted().toArray())
            .toArray(int[][]::new);
    return new RankBands(byPlant, level);
  }

  private static int[] ranks(double[] row) {
    double[] sorted = row.clone();
    Arrays.sort(sorted);
    int[] ranks = new int[row.length];
    for (int i = 0; i < row.length; i++) {
      ranks[i] = 1 + first(sorted, row[i]);
    }
    return ranks;
  }

  /** The first place of a value that is there; equal values share the rank. */
  private static int first(double[] sorted, double value) {
    int at = Arrays.binarySearch(sorted, value);
    while (at > 0 && sorted[at - 1] == value) {
      at--;
    }
    return at;
  }

  /** The band of a plant: the ranks between which the middle {@code level} of the draws lies. */
  Band band(int plant) {
    int[] own = ranks[plant];
    int cut = (int) Math.floor((1 - level) / 2 * own.length);
    return new Band(own[cut], own[own.length - 1 - cut]);
  }

  /** The probability of every rank. */
  List<Double> probabilities(int plant) {
    double[] counts = new double[ranks.length];
    for (int rank : ranks[plant]) {
      counts[rank - 1]++;
    }
    List<Double> all = new ArrayList<>();
    for (double count : counts) {
      all.add(count / ranks[plant].length);
    }
    return all;
  }
}

package isowright.review;

import isowright.inference.ParameterDraws;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;

/**
 * Which plants of an order can be told apart, all pairs being compared at once.
 *
 * @param critical the value that the studentised difference of a pair must exceed; absent where
 *     nothing was compared
 * @param groups runs of plants, by name, none of which is apart from another of the run; runs may
 *     overlap, and none is part of another
 */
public record ToldApart(OptionalDouble critical, List<List<String>> groups) {

  /** Nothing was compared. */
  static final ToldApart NONE = new ToldApart(OptionalDouble.empty(), List.of());

  /** Ratios that differ by less, in logs, are the same to every printed digit. */
  private static final double SAME = 1e-9;

  /** Copies the groups. */
  public ToldApart {
    groups = groups.stream().map(List::copyOf).toList();
  }

  /**
   * Compares all pairs.
   *
   * @param order the plants in their order
   * @param standardError that of a function of the parameters with this gradient
   * @param year whether the chance of the year is counted
   */
  static ToldApart of(
      List<Entrant> order,
      ToDoubleFunction<double[]> standardError,
      ParameterDraws.Draw[] draws,
      double level,
      boolean year) {
    int n = order.size();
    if (n < 2 || n > Ordering.MOST_GROUPED) {
      return NONE;
    }
    double[][] slopes = order.stream().map(Entrant::slopes).toArray(double[][]::new);
    double[] years = order.stream().mapToDouble(Entrant::yearSpread).toArray();
    double[][] spread = spreads(order, slopes, standardError, year);
    double[] largest =
        Arrays.stream(draws)
            .parallel()
            .mapToDouble(draw -> largest(years, slopes, draw, spread, year))
            .sorted()
            .toArray();
    int at = Math.min(largest.length - 1, (int) Math.ceil(level * largest.length) - 1);
    double critical = largest[at];
    return new ToldApart(OptionalDouble.of(critical), runs(order, spread, critical));
  }

  /** s_ij, symmetric; zero where a pair has no uncertainty. */
  private static double[][] spreads(
      List<Entrant> order,
      double[][] slopes,
      ToDoubleFunction<double[]> standardError,
      boolean year) {
    int n = order.size();
    double[][] spread = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double[] difference = new double[slopes[i].length];
        for (int k = 0; k < difference.length; k++) {
          difference[k] = slopes[i][k] - slopes[j][k];
        }
        double error = standardError.applyAsDouble(difference);
        double chance = year ? Math.hypot(order.get(i).yearSpread(), order.get(j).yearSpread()) : 0;
        spread[i][j] = Math.hypot(error, chance);
        spread[j][i] = spread[i][j];
      }
    }
    return spread;
  }

  /** The largest studentised difference over all pairs in one draw, without any true difference. */
  private static double largest(
      double[] years,
      double[][] slopes,
      ParameterDraws.Draw draw,
      double[][] spread,
      boolean year) {
    double[] moved = new double[years.length];
    for (int i = 0; i < moved.length; i++) {
      moved[i] = draw.along(slopes[i]);
    }
    if (year) {
      Year.add(years, moved, draw);
    }
    double largest = 0;
    for (int i = 0; i < moved.length; i++) {
      for (int j = 0; j < i; j++) {
        if (spread[i][j] > SAME) {
          largest = Math.max(largest, Math.abs(moved[i] - moved[j]) / spread[i][j]);
        }
      }
    }
    return largest;
  }

  private static List<List<String>> runs(List<Entrant> order, double[][] spread, double critical) {
    int n = order.size();
    int[] end = new int[n];
    for (int i = 0; i < n; i++) {
      end[i] = i;
      while (end[i] + 1 < n && nearAll(order, spread, critical, i, end[i] + 1)) {
        end[i]++;
      }
    }
    List<List<String>> runs = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      if (i == 0 || end[i] > end[i - 1]) {
        runs.add(order.subList(i, end[i] + 1).stream().map(Entrant::plant).toList());
      }
    }
    return runs;
  }

  private static boolean nearAll(
      List<Entrant> order, double[][] spread, double critical, int from, int next) {
    return IntStream.range(from, next)
        .allMatch(
            i -> {
              double difference = Math.abs(order.get(next).logRatio() - order.get(i).logRatio());
              return difference <= Math.max(critical * spread[next][i], SAME);
            });
  }

  /** How many groups each plant is in, as numbers from 1 in the order of the groups. */
  public List<Integer> groupsOf(String plant) {
    return IntStream.range(0, groups.size())
        .filter(g -> groups.get(g).contains(plant))
        .mapToObj(g -> g + 1)
        .toList();
  }

  /** The largest number of plants in a group. */
  public int largestGroup() {
    return groups.stream().mapToInt(List::size).max().orElse(0);
  }

  /** Whether every plant is told apart from every other. */
  public boolean all() {
    return Arrays.stream(groups.toArray()).allMatch(g -> ((List<?>) g).size() == 1);
  }
}

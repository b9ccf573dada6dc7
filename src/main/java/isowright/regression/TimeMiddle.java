package isowright.regression;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * The middle of the sandwich in the basis F′x where rows depend on one another along time or across
 * groups. Rows of one group at one time are one cell; its score is u = Σ r_i F′x_i over its rows.
 */
final class TimeMiddle {

  /** A negative eigenvalue below this share of the largest is not rounding. */
  private static final double ROUNDING = 1e-12;

  private final Groups groups;
  private final Times times;
  private final int lag;
  private final double[][] factor;
  private final int[] kept;
  private final double[] coefficients;
  private final Residuals residuals;
  private final int[] cellTimes;
  private final double[][] byCell;
  private final double[][] byGroup;
  private final double[][] neighbours;
  private final double[][] timeSums;
  private long cells;

  private TimeMiddle(Design design, LinearFit fit, Times times, int lag, int longest) {
    this.groups = design.groups();
    this.times = times;
    this.lag = lag;
    this.factor = fit.inverseFactor();
    this.kept = fit.kept();
    this.coefficients = fit.coefficients();
    this.residuals = new Residuals(longest);
    this.cellTimes = new int[longest];
    this.byCell = new double[kept.length][kept.length];
    this.byGroup = new double[kept.length][kept.length];
    this.neighbours = new double[kept.length][kept.length];
    this.timeSums = new double[times.count()][kept.length];
  }

  /**
   * Reads the design once, in parallel.
   *
   * @param lag how many times back cells of a group are paired; 0 where only sums are wanted
   */
  static TimeMiddle of(Design design, LinearFit fit, Times times, int lag) {
    Blocks blocks = Blocks.of(design.groups());
    return blocks.gather(
        fit.columns().size() + 1,
        () -> new TimeMiddle(design, fit, times, lag, blocks.longest()),
        (middle, from, to, buffer) -> {
          design.fill(from, to, buffer);
          middle.visit(buffer, from, to);
        },
        TimeMiddle::add);
  }

  private void visit(double[][] block, int from, int to) {
    int rows = to - from;
    double[] r = residuals.of(block, rows, coefficients);
    Leverage.rotate(block, rows, factor, kept);
    double[][] scores = new double[kept.length][];
    for (int p = 0; p < kept.length; p++) {
      scores[p] = block[kept[p]];
      for (int i = 0; i < rows; i++) {
        scores[p][i] *= r[i];
      }
    }
    for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
      group(scores, groups.start(g) - from, groups.end(g) - from, from);
    }
  }

  /** Takes in the rows of one group, which become cells in their place. */
  private void group(double[][] scores, int start, int end, int from) {
    int last = start - 1;
    for (int i = start; i < end; i++) {
      int time = times.of(from + i);
      if (last >= start && time < cellTimes[last]) {
        throw new IllegalArgumentException(
            "row " + (from + i) + " is earlier than the row of its group before it");
      }
      boolean fresh = last < start || time != cellTimes[last];
      last += fresh ? 1 : 0;
      cellTimes[last] = time;
      for (double[] score : scores) {
        score[last] = fresh ? score[i] : score[last] + score[i];
      }
    }
    int stop = last + 1;
    cells += stop - start;
    double[] sum = new double[scores.length];
    for (int p = 0; p < scores.length; p++) {
      for (int i = start; i < stop; i++) {
        sum[p] += scores[p][i];
        timeSums[cellTimes[i]][p] += scores[p][i];
      }
      for (int q = 0; q <= p; q++) {
        byCell[p][q] += OrthogonalDecomposition.product(scores[p], scores[q], start, stop);
      }
    }
    addSquare(byGroup, sum);
    for (int i = start; lag > 0 && i < stop; i++) {
      for (int j = i - 1; j >= start && cellTimes[i] - cellTimes[j] <= lag; j--) {
        pair(scores, i, j, bartlett(cellTimes[i] - cellTimes[j]));
      }
    }
  }

  private void pair(double[][] scores, int i, int j, double weight) {
    for (int p = 0; p < scores.length; p++) {
      for (int q = 0; q <= p; q++) {
        neighbours[p][q] += weight * (scores[p][i] * scores[q][j] + scores[p][j] * scores[q][i]);
      }
    }
  }

  private double bartlett(int apart) {
    return 1 - apart / (lag + 1.0);
  }

  private static void addSquare(double[][] into, double[] u) {
    for (int p = 0; p < u.length; p++) {
      for (int q = 0; q <= p; q++) {
        into[p][q] += u[p] * u[q];
      }
    }
  }

  private void add(TimeMiddle other) {
    addMatrix(byCell, other.byCell);
    addMatrix(byGroup, other.byGroup);
    addMatrix(neighbours, other.neighbours);
    addMatrix(timeSums, other.timeSums);
    cells += other.cells;
  }

  private static void addMatrix(double[][] into, double[][] other) {
    for (int p = 0; p < into.length; p++) {
      for (int q = 0; q < into[p].length; q++) {
        into[p][q] += other[p][q];
      }
    }
  }

  /** How many cells, that is, pairs of a group and a time, have rows. */
  long cells() {
    return cells;
  }

  /** Σ over cells u u′ and, with Bartlett's weights, over pairs of cells of one group. */
  double[][] alongGroups() {
    double[][] sum = Matrices.copy(byCell);
    addMatrix(sum, neighbours);
    return wide(sum);
  }

  /** Σ_t h_t h_t′ and, with Bartlett's weights, over pairs of times; h_t the sum over all rows. */
  double[][] alongTimes() {
    double[][] sum = new double[kept.length][kept.length];
    for (int t = 0; t < timeSums.length; t++) {
      addSquare(sum, timeSums[t]);
      for (int s = Math.max(0, t - lag); s < t; s++) {
        double weight = bartlett(t - s);
        for (int p = 0; p < kept.length; p++) {
          for (int q = 0; q <= p; q++) {
            sum[p][q] +=
                weight * (timeSums[t][p] * timeSums[s][q] + timeSums[s][p] * timeSums[t][q]);
          }
        }
      }
    }
    return wide(sum);
  }

  /** By groups plus by times less by cells, each with its own factor. */
  double[][] bothWays(double ofGroups, double ofTimes, double ofCells) {
    double[][] times = new double[kept.length][kept.length];
    for (double[] sum : timeSums) {
      addSquare(times, sum);
    }
    double[][] sum = new double[kept.length][kept.length];
    for (int p = 0; p < kept.length; p++) {
      for (int q = 0; q <= p; q++) {
        sum[p][q] = ofGroups * byGroup[p][q] + ofTimes * times[p][q] - ofCells * byCell[p][q];
      }
    }
    return wide(sum);
  }

  /** Spreads the lower triangle over the kept columns to a whole matrix over all columns. */
  private double[][] wide(double[][] triangle) {
    double[][] full = new double[factor.length][factor.length];
    for (int p = 0; p < kept.length; p++) {
      for (int q = 0; q <= p; q++) {
        full[kept[p]][kept[q]] = triangle[p][q];
        full[kept[q]][kept[p]] = triangle[p][q];
      }
    }
    return full;
  }

  /**
   * Replaces negative eigenvalues of a middle matrix by zero, in place.
   *
   * @return how many there were beyond rounding
   */
  static int withoutNegativeParts(double[][] middle) {
    double largest = 0;
    for (double[] row : middle) {
      largest = Math.max(largest, Arrays.stream(row).map(Math::abs).max().orElse(0));
    }
    if (!(largest > 0) || Double.isInfinite(largest)) {
      return 0;
    }
    EigenDecomposition eigen =
        new EigenDecomposition(new Array2DRowRealMatrix(middle, true).scalarMultiply(1 / largest));
    double[] values = eigen.getRealEigenvalues();
    double most = Arrays.stream(values).max().orElse(0);
    int negative = 0;
    for (double value : values) {
      negative += value < -ROUNDING * Math.max(most, 1) ? 1 : 0;
    }
    if (negative == 0) {
      return 0;
    }
    int size = middle.length;
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        double sum = 0;
        for (int k = 0; k < size; k++) {
          double[] vector = eigen.getEigenvector(k).toArray();
          sum += Math.max(values[k], 0) * vector[i] * vector[j];
        }
        middle[i][j] = largest * sum;
      }
    }
    return negative;
  }
}

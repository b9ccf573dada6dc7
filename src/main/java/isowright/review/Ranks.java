package isowright.review;

import java.util.Arrays;

/**
 * The ranks of numbers, in time that grows with how many there are: numbers are dealt to even steps
 * between the least and the greatest, several for each number so that most are alone in theirs, and
 * put in order within each step by insertion. Where many fall into one step it is slower, not
 * wrong. The work space is kept, so one of these serves one thread. Tested in {@code RanksTest}.
 */
final class Ranks {

  /** Steps for each number. */
  private static final int STEPS = 4;

  private final int n;
  private final int[] step;
  private final int[] starts;
  private final int[] order;

  /** For so many numbers. */
  Ranks(int n) {
    this.n = n;
    this.step = new int[n];
    this.starts = new int[STEPS * n + 1];
    this.order = new int[n];
  }

  /**
   * The rank of every value, from 1 for the least; equal values share the lowest of theirs.
   *
   * @param values finite, shape n
   */
  int[] of(double[] values) {
    deal(values);
    for (int k = 1; k < n; k++) {
      insert(values, k);
    }
    int[] ranks = new int[n];
    int rank = 0;
    double before = Double.NaN;
    for (int k = 0; k < n; k++) {
      double value = values[order[k]];
      if (value != before) {
        rank = k + 1;
        before = value;
      }
      ranks[order[k]] = rank;
    }
    return ranks;
  }

  /** Puts the places of values in order by their steps. */
  private void deal(double[] values) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (double value : values) {
      least = Math.min(least, value);
      most = Math.max(most, value);
    }
    int last = STEPS * n - 1;
    double scale = most > least ? last / (most - least) : 0;
    Arrays.fill(starts, 0);
    for (int i = 0; i < n; i++) {
      step[i] = Math.min(last, (int) (scale * (values[i] - least)));
      starts[step[i] + 1]++;
    }
    for (int k = 1; k < starts.length; k++) {
      starts[k] += starts[k - 1];
    }
    for (int i = 0; i < n; i++) {
      order[starts[step[i]]++] = i;
    }
  }

  /** Moves the k-th place to where its value belongs among those before it. */
  private void insert(double[] values, int k) {
    int place = order[k];
    double value = values[place];
    int at = k;
    while (at > 0 && values[order[at - 1]] > value) {
      order[at] = order[at - 1];
      at--;
    }
    order[at] = place;
  }
}

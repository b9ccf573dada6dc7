package isowright.regression;

import java.util.Arrays;
import java.util.List;
import java.util.function.IntPredicate;

/**
 * First differences of a design; see {@link Effects#differences}. The groups are those of the
 * design that have a difference at all. Tested in {@code GroupTransformationsTest}.
 */
public final class Differences implements Design {

  private final Design design;

  /** The row of the design at which each difference ends, ascending. */
  private final int[] ends;

  private final Groups groups;

  private Differences(Design design, int[] ends, Groups groups) {
    this.design = design;
    this.ends = ends;
    this.groups = groups;
  }

  static Differences of(Design design, IntPredicate follows) {
    Groups of = design.groups();
    int[] ends = new int[design.rows()];
    int[] starts = new int[of.count()];
    int count = 0;
    int groups = 0;
    for (int g = 0; g < of.count(); g++) {
      int before = count;
      for (int row = of.start(g) + 1; row < of.end(g); row++) {
        if (follows.test(row)) {
          ends[count++] = row;
        }
      }
      if (count > before) {
        starts[groups++] = before;
      }
    }
    return new Differences(
        design,
        Arrays.copyOf(ends, count),
        Groups.startingAt(count, Arrays.copyOf(starts, groups)));
  }

  /** The row of the design at which a difference ends. */
  public int end(int difference) {
    return ends[difference];
  }

  @Override
  public int rows() {
    return ends.length;
  }

  @Override
  public List<String> columns() {
    return design.columns();
  }

  @Override
  public Groups groups() {
    return groups;
  }

  @Override
  public Design before() {
    return design;
  }

  @Override
  public Design likewise(Design other) {
    return new Differences(other, ends, groups);
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    fill(from, to, into, new double[columns().size() + 1]);
  }

  /** What is left of a column is held against its levels at the ends of the differences. */
  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    Groups of = design.groups();
    int at = from;
    while (at < to) {
      int group = of.of(ends[at]);
      int start = of.start(group);
      int next = at;
      // Groups without a difference are not read: only stretches of neighbours are.
      while (next < to && of.of(ends[next]) - group <= 1) {
        group = of.of(ends[next++]);
      }
      double[][] block = new double[squares.length][of.end(group) - start];
      design.fill(start, of.end(group), block);
      for (int k = 0; k < squares.length; k++) {
        squares[k] += difference(block[k], start, at, next, into[k], from);
      }
      at = next;
    }
  }

  /** Writes differences {@code at} to {@code next − 1} of one column; the squares of its levels. */
  private double difference(double[] levels, int start, int at, int next, double[] into, int from) {
    double squares = 0;
    for (int d = at; d < next; d++) {
      int row = ends[d] - start;
      into[d - from] = levels[row] - levels[row - 1];
      squares += levels[row] * levels[row];
    }
    return squares;
  }
}

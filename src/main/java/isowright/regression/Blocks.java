package isowright.regression;

import java.util.Arrays;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.function.Supplier;
import java.util.stream.IntStream;

/**
 * The rows of a design cut into blocks at group boundaries, and the blocks into segments that run
 * on all cores.
 *
 * <p>Blocks and segments depend on the rows and groups alone, and the segments are merged in their
 * order, so a sum over a design has the same digits whatever the number of threads. Segments run in
 * the fork-join pool of the calling thread, else in the common pool. Tested in {@code BlocksTest}.
 */
final class Blocks {

  /**
   * Rows a block aims at: enough to hide the time of a call, few enough that twenty columns stay in
   * the second-level cache (2,048 × 20 × 8 bytes = 320 kB).
   */
  static final int ROWS = 2048;

  /** Enough segments that several cores finish together, few enough that merging takes no time. */
  private static final int MOST_SEGMENTS = 32;

  private final int[] bounds;
  private final int longest;

  private Blocks(int[] bounds) {
    this.bounds = bounds;
    int most = 0;
    for (int b = 0; b + 1 < bounds.length; b++) {
      most = Math.max(most, bounds[b + 1] - bounds[b]);
    }
    this.longest = most;
  }

  /** Blocks of {@link #ROWS} rows at most, unless one group is longer. */
  static Blocks of(Groups groups) {
    return of(groups, ROWS);
  }

  /** Blocks of {@code most} rows at most, unless one group is longer. */
  static Blocks of(Groups groups, int most) {
    int rows = groups.rows();
    int[] bounds = new int[rows / most + 2];
    int count = 0;
    int at = 0;
    while (at < rows) {
      int next = rows;
      if (rows - at > most) {
        int group = groups.of(at + most);
        next = groups.start(group) > at ? groups.start(group) : groups.end(group);
      }
      if (count + 2 > bounds.length) {
        bounds = Arrays.copyOf(bounds, 2 * bounds.length);
      }
      bounds[++count] = next;
      at = next;
    }
    return new Blocks(Arrays.copyOf(bounds, count + 1));
  }

  int count() {
    return bounds.length - 1;
  }

  int start(int block) {
    return bounds[block];
  }

  int end(int block) {
    return bounds[block + 1];
  }

  /** The rows of the longest block. */
  int longest() {
    return longest;
  }

  /** What is done with the rows of one block. */
  interface Visitor<A> {
    /**
     * Visits rows {@code from} to {@code to − 1}.
     *
     * @param into what the segment gathers
     * @param buffer K + 1 columns for the rows, free to overwrite
     */
    void visit(A into, int from, int to, double[][] buffer);
  }

  /**
   * Visits every block, each segment with its own gatherer, and merges the gatherers in order.
   *
   * @param columns the number of columns of the buffer handed to the visitor
   * @param fresh a new, empty gatherer
   * @param merge adds its second argument to its first
   */
  <A> A gather(int columns, Supplier<A> fresh, Visitor<A> visitor, BiConsumer<A, A> merge) {
    int segments = Math.max(1, Math.min(MOST_SEGMENTS, count()));
    if (segments == 1) {
      return segment(0, 1, columns, fresh, visitor);
    }
    List<A> parts =
        IntStream.range(0, segments)
            .parallel()
            .mapToObj(s -> segment(s, segments, columns, fresh, visitor))
            .toList();
    A all = parts.get(0);
    for (int s = 1; s < segments; s++) {
      merge.accept(all, parts.get(s));
    }
    return all;
  }

  private <A> A segment(
      int segment, int segments, int columns, Supplier<A> fresh, Visitor<A> visitor) {
    A gatherer = fresh.get();
    double[][] buffer = new double[columns][longest];
    int first = (int) ((long) count() * segment / segments);
    int last = (int) ((long) count() * (segment + 1) / segments);
    for (int b = first; b < last; b++) {
      visitor.visit(gatherer, start(b), end(b), buffer);
    }
    return gatherer;
  }
}

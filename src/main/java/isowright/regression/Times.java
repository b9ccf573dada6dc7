package isowright.regression;

/**
 * When was each row observed? For each row the index of its time, so that rows of different groups
 * at one time, and rows of one group at neighbouring times, can be found.
 *
 * <p>Times are counted from 0 without gaps: a lag is a number of recorded times, whatever lies
 * between them. Within a group rows stand in the order of their times; several rows of a group may
 * share one.
 */
public interface Times {

  /** The number of rows, N. */
  int rows();

  /** The number of times, T. */
  int count();

  /** The time of a row, from 0 to T − 1. */
  int of(int row);

  /**
   * Times held in an array.
   *
   * @param count T
   * @param timeOfRow shape N; copied
   * @throws IllegalArgumentException if a time lies outside 0 to T − 1
   */
  static Times of(int count, int... timeOfRow) {
    int[] copy = timeOfRow.clone();
    for (int row = 0; row < copy.length; row++) {
      if (copy[row] < 0 || copy[row] >= count) {
        throw new IllegalArgumentException("row " + row + " has time " + copy[row]);
      }
    }
    return new Times() {
      @Override
      public int rows() {
        return copy.length;
      }

      @Override
      public int count() {
        return count;
      }

      @Override
      public int of(int row) {
        return copy[row];
      }
    };
  }
}

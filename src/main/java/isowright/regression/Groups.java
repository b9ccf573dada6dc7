package isowright.regression;

import java.util.Arrays;

/**
 * Contiguous groups of rows: group g holds rows {@code start(g)} to {@code end(g) − 1}.
 *
 * <p>Immutable. With one group a row nothing is stored.
 */
public final class Groups {

  private final int rows;
  private final int[] starts;
  private final boolean singles;

  private Groups(int rows, int[] starts, boolean singles) {
    this.rows = rows;
    this.starts = starts;
    this.singles = singles;
  }

  /** One group a row. */
  public static Groups ofSingleRows(int rows) {
    return new Groups(rows, new int[0], true);
  }

  /**
   * Groups that begin at these rows.
   *
   * @param rows the number of rows in all
   * @param starts strictly ascending, the first 0; copied
   */
  public static Groups startingAt(int rows, int[] starts) {
    int[] copy = starts.clone();
    for (int g = 0; g < copy.length; g++) {
      int least = g == 0 ? 0 : copy[g - 1] + 1;
      if (copy[g] < least || copy[g] >= rows || (g == 0 && copy[0] != 0)) {
        throw new IllegalArgumentException("group " + g + " begins at row " + copy[g]);
      }
    }
    return new Groups(rows, copy, false);
  }

  /** The number of rows. */
  public int rows() {
    return rows;
  }

  /** The number of groups, G. */
  public int count() {
    return singles ? rows : starts.length;
  }

  /** The first row of group g. */
  public int start(int g) {
    return singles ? g : starts[g];
  }

  /** The row after the last of group g. */
  public int end(int g) {
    if (singles) {
      return g + 1;
    }
    return g + 1 < starts.length ? starts[g + 1] : rows;
  }

  /** The group that holds this row. */
  public int of(int row) {
    if (singles) {
      return row;
    }
    int at = Arrays.binarySearch(starts, row);
    return at >= 0 ? at : -at - 2;
  }
}

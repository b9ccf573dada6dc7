package isowright.regression;

import java.util.Arrays;
import java.util.List;

/** Some rows of a design, in their order; groups without any of them are left out. */
public final class SelectedRows implements Design {

  private final Design design;
  private final int[] rows;
  private final Groups groups;

  private SelectedRows(Design design, int[] rows, Groups groups) {
    this.design = design;
    this.rows = rows;
    this.groups = groups;
  }

  /**
   * Selects.
   *
   * @param rows of the design, ascending, at least one
   */
  public static SelectedRows of(Design design, int[] rows) {
    int[] starts = new int[rows.length];
    int count = 0;
    int last = -1;
    for (int r = 0; r < rows.length; r++) {
      int group = design.groups().of(rows[r]);
      if (group != last) {
        starts[count++] = r;
        last = group;
      }
    }
    Groups groups =
        count == rows.length
            ? Groups.ofSingleRows(count)
            : Groups.startingAt(rows.length, Arrays.copyOf(starts, count));
    return new SelectedRows(design, rows.clone(), groups);
  }

  @Override
  public int rows() {
    return rows.length;
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
  public void fill(int from, int to, double[][] into) {
    if (from == to) {
      return;
    }
    Groups of = design.groups();
    int at = from;
    while (at < to) {
      int group = of.of(rows[at]);
      int start = of.start(group);
      int next = at;
      // Groups without a row are not read: only stretches of neighbours are.
      while (next < to && of.of(rows[next]) - group <= 1) {
        group = of.of(rows[next++]);
      }
      double[][] block = new double[into.length][of.end(group) - start];
      design.fill(start, of.end(group), block);
      for (int k = 0; k < into.length; k++) {
        for (int r = at; r < next; r++) {
          into[k][r - from] = block[k][rows[r] - start];
        }
      }
      at = next;
    }
  }
}

package isowright.estimation;

import isowright.records.Panel;
import java.util.Arrays;

/** Which rows of a panel the rows of a regression on it are. */
public final class RowsUsed {

  /** What one row of the regression is made of. */
  public enum Kind {
    /** One row of the panel. */
    EACH,
    /** The mean of a plant. */
    PLANT_MEANS,
    /** A row less the row of the period before. */
    DIFFERENCES
  }

  private final Kind kind;
  private final int count;
  private final int[] panelRows;

  private RowsUsed(Kind kind, int count, int[] panelRows) {
    this.kind = kind;
    this.count = count;
    this.panelRows = panelRows;
  }

  /** Every row of the panel. */
  static RowsUsed each(int rows) {
    return new RowsUsed(Kind.EACH, rows, new int[0]);
  }

  /** Some rows of the panel, as they are. */
  static RowsUsed some(int[] rows) {
    return new RowsUsed(Kind.EACH, rows.length, rows.clone());
  }

  /** One row a plant. */
  static RowsUsed plantMeans(Panel panel) {
    int[] first = panel.plantStarts().toArray();
    return new RowsUsed(Kind.PLANT_MEANS, first.length, first);
  }

  /** One row a difference. */
  static RowsUsed differences(int[] ends) {
    return new RowsUsed(Kind.DIFFERENCES, ends.length, Arrays.copyOf(ends, ends.length));
  }

  /** What one row of the regression is made of. */
  public Kind kind() {
    return kind;
  }

  /** The number of rows of the regression. */
  public int count() {
    return count;
  }

  /**
   * The row of the panel that a row of the regression is, at which it ends (a difference), or which
   * is the first of its plant (a mean).
   */
  public int panelRow(int row) {
    return panelRows.length == 0 ? row : panelRows[row];
  }
}

package isowright.records;

import isowright.records.PanelColumn.Kind;
import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** Finds columns and rows that are too much alike to have been recorded one by one. */
final class Copies {

  /** Ratios that differ by no more than this share are the same but for the digits written. */
  private static final double SAME = 1e-9;

  /** With fewer rows or columns, being alike is no wonder. */
  private static final int FEWEST_ROWS = 3;

  private static final int FEWEST_COLUMNS = 3;

  private Copies() {}

  static void audit(Panel panel, List<PanelColumn> columns, AuditRemarks remarks) {
    List<PanelColumn> recorded = columns.stream().filter(c -> !c.computed()).toList();
    if (panel.rows() >= FEWEST_ROWS) {
      for (int a = 0; a < recorded.size(); a++) {
        for (int b = a + 1; b < recorded.size(); b++) {
          pair(recorded.get(a), recorded.get(b), remarks);
        }
      }
    }
    if (recorded.size() >= FEWEST_COLUMNS) {
      rows(panel, recorded, remarks);
    }
  }

  private static void pair(PanelColumn a, PanelColumn b, AuditRemarks remarks) {
    boolean oneColumnTwice = a.column().name().equals(b.column().name());
    // Spending is price × quantity: with a price that never varies, which is said elsewhere, the
    // two are proportional for that reason.
    boolean spendingOnIt = a.input() == b.input() && a.input() >= 0 && b.kind() == Kind.SPENDING;
    if (oneColumnTwice || spendingOnIt || !proportional(a.column(), b.column())) {
      return;
    }
    double factor = b.column().get(0) / a.column().get(0);
    boolean equal = Math.abs(factor - 1) <= SAME;
    remarks.add(
        Severity.WARNING,
        equal ? "columns-equal" : "columns-proportional",
        () ->
            "%s and %s are %s in every row; one was probably copied from the other, and their effects cannot be told apart. Check both against their source."
                .formatted(
                    a.words(),
                    b.words(),
                    equal ? "equal" : "proportional (factor " + Shown.value(factor) + ")"));
  }

  private static boolean proportional(Column a, Column b) {
    double ratio = b.get(0) / a.get(0);
    if (Double.isNaN(ratio) || Double.isInfinite(ratio) || ratio == 0) {
      return false;
    }
    boolean varies = false;
    for (int r = 1; r < a.size(); r++) {
      // NaN compares false and so ends the search: unknown values are no evidence.
      if (!(Math.abs(b.get(r) - ratio * a.get(r)) <= SAME * Math.abs(b.get(r)))) {
        return false;
      }
      varies |= Math.abs(a.get(r) - a.get(0)) > SAME * Math.abs(a.get(0));
    }
    return varies;
  }

  private static void rows(Panel panel, List<PanelColumn> columns, AuditRemarks remarks) {
    Column[] values = columns.stream().map(PanelColumn::column).toArray(Column[]::new);
    long[] keyed = new long[panel.rows()];
    for (int r = 0; r < keyed.length; r++) {
      // The row in the low half, so that sorting brings rows with the same hash together.
      keyed[r] = ((long) hash(values, r) << 32) | r;
    }
    Arrays.sort(keyed);
    List<int[]> alike = new ArrayList<>();
    for (int k = 1; k < keyed.length; k++) {
      if (keyed[k] >> 32 == keyed[k - 1] >> 32
          && same(values, (int) keyed[k - 1], (int) keyed[k])) {
        alike.add(new int[] {(int) keyed[k - 1], (int) keyed[k]});
      }
    }
    alike.sort(Comparator.comparingInt((int[] pair) -> pair[0]).thenComparingInt(pair -> pair[1]));
    for (int[] pair : alike) {
      remarks.add(
          Severity.WARNING,
          "identical-rows",
          () ->
              "%s and %s have the same value in all %d columns of numbers; one row was probably copied from the other. Check both against their source."
                  .formatted(remarks.where(pair[0]), remarks.where(pair[1]), values.length),
          pair);
    }
  }

  private static int hash(Column[] columns, int row) {
    long hash = 1;
    for (Column column : columns) {
      hash = 31 * hash + Double.doubleToLongBits(column.get(row));
      hash *= 0x9E3779B97F4A7C15L;
      hash ^= hash >>> 32;
    }
    return (int) hash;
  }

  private static boolean same(Column[] columns, int a, int b) {
    for (Column column : columns) {
      if (Double.doubleToLongBits(column.get(a)) != Double.doubleToLongBits(column.get(b))) {
        return false;
      }
    }
    return true;
  }
}

package isowright.records;

import isowright.records.Remark.Severity;
import java.util.List;

/**
 * Finds rows far from all others: those whose log lies more than {@value #FAR} robust standard
 * deviations from the median log, with 1.4826 times the median absolute deviation as the robust
 * standard deviation. Such rows pull strongly on every estimate.
 */
final class Extremes {

  /** Of a million normal values, about one lies farther out. */
  static final double FAR = 5;

  private static final int FEWEST_ROWS = 10;

  private Extremes() {}

  static void audit(Panel panel, List<PanelColumn> columns, AuditRemarks remarks) {
    for (PanelColumn column : columns) {
      if (column.kind().positive() && !column.computed()) {
        audit(column, remarks);
      }
    }
  }

  private static void audit(PanelColumn column, AuditRemarks remarks) {
    Column logs = column.column().logs();
    double[] known = new double[logs.size()];
    int count = 0;
    for (int r = 0; r < logs.size(); r++) {
      if (!Double.isNaN(logs.get(r))) {
        known[count++] = logs.get(r);
      }
    }
    if (count < FEWEST_ROWS) {
      return;
    }
    double median = Robust.median(known, count);
    for (int k = 0; k < count; k++) {
      known[k] = Math.abs(known[k] - median);
    }
    double deviation = Robust.NORMAL * Robust.median(known, count);
    if (!(deviation > 1e-9)) {
      // More than half of the rows have one value: there is no scale to judge the others by.
      return;
    }
    for (int r = 0; r < logs.size(); r++) {
      double distance = (logs.get(r) - median) / deviation;
      if (Math.abs(distance) > FAR) {
        say(column, r, distance, median, remarks);
      }
    }
  }

  private static void say(
      PanelColumn column, int row, double distance, double median, AuditRemarks remarks) {
    remarks.add(
        Severity.NOTE,
        "extreme-value",
        () ->
            "%s, %s: %s is far from the other rows (median %s; %s robust standard deviations in logs, more than %s), so this row pulls strongly on every estimate. Check it, and compare the results without it."
                .formatted(
                    remarks.where(row),
                    column.words(),
                    Shown.value(column.column().get(row)),
                    Shown.value(Math.exp(median)),
                    Shown.value(Math.rint(10 * Math.abs(distance)) / 10),
                    Shown.value(FAR)),
        row);
  }
}

package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.List;

/** Which plants are seen in which periods. */
final class Attendance {

  private static final int NAMES_LISTED = 10;

  private Attendance() {}

  static void audit(Panel panel, AuditRemarks remarks) {
    if (panel.roles().period().isPresent()) {
      absentPeriods(panel, remarks);
    }
    if (panel.roles().plant().isPresent()) {
      seenOnce(panel, remarks);
      if (panel.roles().period().isPresent()) {
        gaps(panel, remarks);
      }
    }
  }

  /** Integers without any row, where periods are integers one step apart. */
  private static void absentPeriods(Panel panel, AuditRemarks remarks) {
    List<Double> numbers = panel.periodNumbers();
    for (int p = 1; p < numbers.size(); p++) {
      double before = numbers.get(p - 1);
      double after = numbers.get(p);
      boolean integers = before == Math.rint(before) && after == Math.rint(after);
      if (integers && after - before > 1 && oneStepApart(numbers)) {
        int at = p;
        remarks.add(
            Severity.NOTE,
            "period-absent",
            () ->
                "No plant has a row between period %s and period %s; differences and lags across the gap span more than one period. Add the missing periods if they are known."
                    .formatted(panel.periods().get(at - 1), panel.periods().get(at)));
      }
    }
  }

  private static boolean oneStepApart(List<Double> numbers) {
    int single = 0;
    for (int p = 1; p < numbers.size(); p++) {
      single += numbers.get(p) - numbers.get(p - 1) == 1 ? 1 : 0;
    }
    return 2 * single >= numbers.size() - 1;
  }

  private static void seenOnce(Panel panel, AuditRemarks remarks) {
    List<String> names = new ArrayList<>();
    List<Integer> rows = new ArrayList<>();
    int count = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      if (panel.plantEnd(p) - panel.plantStart(p) == 1) {
        count++;
        if (names.size() < NAMES_LISTED) {
          names.add("\"" + Shown.shortened(panel.plants().get(p)) + "\"");
          rows.add(panel.plantStart(p));
        }
      }
    }
    if (count == 0) {
      return;
    }
    int seen = count;
    String list = String.join(", ", names) + (count > names.size() ? ", …" : "");
    remarks.add(
        Severity.NOTE,
        "plants-seen-once",
        () ->
            "%s of %s in one row only (%s, %s); with plant effects such a row says nothing about the inputs. Check that the plant's name is written in the same way throughout."
                .formatted(
                    Shown.count(seen),
                    Shown.count(panel.plants().size(), "plant") + (seen == 1 ? " is" : " are"),
                    list,
                    Shown.rows(rows.stream().map(panel.fileRows()::get).toList(), seen)),
        rows.stream().mapToInt(Integer::intValue).toArray());
  }

  private static void gaps(Panel panel, AuditRemarks remarks) {
    for (int p = 0; p < panel.plants().size(); p++) {
      for (int r = panel.plantStart(p) + 1; r < panel.plantEnd(p); r++) {
        int before = panel.rowPeriods().get(r - 1);
        int missing = panel.rowPeriods().get(r) - before - 1;
        if (missing > 0) {
          int row = r;
          remarks.add(
              Severity.NOTE, "gap-in-periods", () -> gap(panel, remarks, row, before, missing), r);
        }
      }
    }
  }

  private static String gap(Panel panel, AuditRemarks remarks, int row, int before, int missing) {
    String first = panel.periods().get(before + 1);
    String last = panel.periods().get(before + missing);
    return "%s: the plant has no row for %s before it, although other plants have; differences and lags across the gap span more than one period. Add the missing rows if they are known."
        .formatted(
            remarks.where(row),
            missing == 1
                ? "period " + first
                : "the %d periods %s to %s".formatted(missing, first, last));
  }
}

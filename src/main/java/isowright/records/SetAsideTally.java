package isowright.records;

import isowright.records.Reading.SetAside;
import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Counts the rows that are not used, by reason, and keeps the numbers of the first few. */
final class SetAsideTally {

  private static final int ROWS_NAMED = 10;

  private final Map<Reason, Tally> tallies = new LinkedHashMap<>();

  /**
   * Why a row is not used.
   *
   * @param severity how much it matters
   * @param code the code of the remark that says so
   * @param words why
   */
  record Reason(Severity severity, String code, String words) {
    static final Reason PERIOD_NOT_KEPT =
        new Reason(Severity.NOTE, "set-aside-period", "period outside records.keep");
    static final Reason PLANT_NOT_KEPT =
        new Reason(Severity.NOTE, "set-aside-plant", "plant left out by records.keep");

    static Reason blank(Slot slot) {
      return new Reason(Severity.NOTE, "set-aside-blank", slot.words() + " is blank");
    }

    static Reason quantityNotPositive(Slot slot) {
      return new Reason(
          Severity.WARNING,
          "set-aside-quantity-not-positive",
          slot.words() + " is zero or negative, and a quantity must have a logarithm");
    }
  }

  private static final class Tally {
    private int count;
    private final List<Integer> rows = new ArrayList<>();
  }

  void add(Reason reason, int row) {
    Tally tally = tallies.computeIfAbsent(reason, r -> new Tally());
    tally.count++;
    if (tally.rows.size() < ROWS_NAMED) {
      tally.rows.add(row);
    }
  }

  /** Each reason with its rows, in the order in which the reasons were first met. */
  List<SetAside> all() {
    List<SetAside> all = new ArrayList<>();
    tallies.forEach((reason, t) -> all.add(new SetAside(reason.words(), t.count, t.rows)));
    return all;
  }

  /** A remark for each reason. */
  List<Remark> remarks(Place place) {
    List<Remark> remarks = new ArrayList<>();
    tallies.forEach(
        (reason, t) ->
            remarks.add(
                new Remark(
                    reason.severity(),
                    reason.code(),
                    "%s: %s set aside, because %s: %s. Correct the file or the study file if these rows belong in the study."
                        .formatted(
                            place.words(),
                            Shown.count(t.count, "row"),
                            reason.words(),
                            Shown.rows(t.rows, t.count)),
                    t.rows)));
    return remarks;
  }
}

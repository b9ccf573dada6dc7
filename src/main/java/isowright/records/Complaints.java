package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;
import java.util.stream.Collectors;

/**
 * Every error of a file: all are counted, the first are said in full. A file whose every cell is
 * wrong, such as one with another decimal mark than declared, must neither fill the memory nor the
 * screen.
 */
final class Complaints {

  /** More than this nobody reads; what a column gets wrong it gets wrong in its first rows. */
  static final int SAID_IN_FULL = 50;

  private static final int ROWS_NAMED = 10;

  private final List<Remark> said = new ArrayList<>();
  private final Map<String, Integer> unsaid = new LinkedHashMap<>();
  private final List<Integer> unsaidRows = new ArrayList<>();
  private long unsaidCount;

  boolean none() {
    return said.isEmpty();
  }

  /**
   * One more error.
   *
   * @param about what the error is about, by which those not said in full are counted
   * @param row the row
   * @param remark the error in full, asked for only if it will be said
   */
  void add(String about, int row, Supplier<Remark> remark) {
    if (!full()) {
      said.add(remark.get());
      return;
    }
    unsaidCount++;
    unsaid.merge(about, 1, Integer::sum);
    if (unsaidRows.size() < ROWS_NAMED) {
      unsaidRows.add(row);
    }
  }

  /** Whether further errors are only counted. */
  boolean full() {
    return said.size() >= SAID_IN_FULL;
  }

  /** Refuses the records when anything was wrong. */
  void refuseIfAny(Place place) throws RecordsRefused {
    if (!said.isEmpty()) {
      throw new RecordsRefused(all(place));
    }
  }

  private List<Remark> all(Place place) {
    if (unsaidCount == 0) {
      return said;
    }
    List<Remark> all = new ArrayList<>(said);
    String where =
        unsaid.entrySet().stream()
            .map(e -> Shown.count(e.getValue()) + " in " + e.getKey())
            .collect(Collectors.joining(", "));
    all.add(
        new Remark(
            Severity.ERROR,
            "more-errors",
            "%s: and %s more (%s); mend what is listed above in the same way in every row."
                .formatted(place.words(), Shown.count(unsaidCount, "error"), where),
            unsaidRows));
    return all;
  }
}

package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Gathers what an audit finds. Of each kind of finding the first few are said in full and the rest
 * counted, so that a column wrong throughout does not bury the others.
 */
final class AuditRemarks {

  private static final int SAID_IN_FULL = 20;
  private static final int ROWS_NAMED = 10;

  private final Panel panel;
  private final Map<String, Kind> kinds = new LinkedHashMap<>();

  private static final class Kind {
    private final Severity severity;
    private final List<Remark> said = new ArrayList<>();
    private final List<Integer> unsaidRows = new ArrayList<>();
    private int unsaid;

    Kind(Severity severity) {
      this.severity = severity;
    }
  }

  AuditRemarks(Panel panel) {
    this.panel = panel;
  }

  /** What an audit found, in words that are made only if they are said. */
  @FunctionalInterface
  interface Words {
    /** The whole sentence. */
    String message();
  }

  /** A finding about rows of the panel. */
  void add(Severity severity, String code, Words words, int... rows) {
    Kind kind = kinds.computeIfAbsent(code, c -> new Kind(severity));
    List<Integer> fileRows = new ArrayList<>();
    for (int i = 0; i < Math.min(rows.length, ROWS_NAMED); i++) {
      fileRows.add(panel.fileRows().get(rows[i]));
    }
    if (kind.said.size() < SAID_IN_FULL) {
      kind.said.add(new Remark(severity, code, words.message(), fileRows));
      return;
    }
    kind.unsaid++;
    if (kind.unsaidRows.size() < ROWS_NAMED && !fileRows.isEmpty()) {
      kind.unsaidRows.add(fileRows.get(0));
    }
  }

  /** Everything found, kind by kind. */
  List<Remark> all() {
    List<Remark> all = new ArrayList<>();
    kinds.forEach(
        (code, kind) -> {
          all.addAll(kind.said);
          if (kind.unsaid > 0) {
            all.add(
                new Remark(
                    kind.severity,
                    code,
                    "And %s more of the same kind, the first in %s; look at them in the same way."
                        .formatted(
                            Shown.count(kind.unsaid, "finding"),
                            Shown.rows(kind.unsaidRows, kind.unsaidRows.size())),
                    kind.unsaidRows));
          }
        });
    return all;
  }

  /** Plant, period and row in the file of a row of the panel. */
  String where(int row) {
    StringBuilder words = new StringBuilder();
    if (panel.roles().plant().isPresent()) {
      words
          .append("plant \"")
          .append(Shown.shortened(panel.plants().get(panel.plantOf(row))))
          .append("\", ");
    }
    if (panel.roles().period().isPresent()) {
      words.append("period ").append(panel.periods().get(panel.rowPeriods().get(row))).append(", ");
    }
    return words.append("row ").append(panel.fileRows().get(row)).toString();
  }
}

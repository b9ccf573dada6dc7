package isowright.cli;

import isowright.records.Description;
import isowright.records.Panel;
import isowright.records.PanelAudit;
import isowright.records.Reading;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Remark;
import isowright.records.Remark.Severity;
import isowright.report.Numbers;
import isowright.study.CostAudit;
import isowright.study.Costs;
import isowright.study.Findings.Said;
import isowright.study.Study;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/** Prints what the records of a study are, and what is wrong with them. Fits nothing. */
final class AuditText {

  private static final int MOST_ROWS_NAMED = 8;

  private final PrintWriter out;

  AuditText(PrintWriter out) {
    this.out = out;
  }

  /** Prints the audit; the answer says whether the records can be used as they are. */
  boolean print(Study study) throws RecordsRefused {
    out.println("Study    " + study.title() + " (" + study.file().getFileName() + ")");
    Optional<Study.Records> asked = study.records().or(() -> study.costs().map(Costs::records));
    if (asked.isEmpty()) {
      out.println(
          "Records  none: the study asks technologies taken as known, so there is nothing to"
              + " audit");
      return true;
    }
    Study.Records records = asked.get();
    Reading reading = RecordsReader.read(records.source(), records.roles(), records.keep());
    Panel panel = reading.panel();
    List<Remark> remarks = new ArrayList<>(PanelAudit.of(reading));
    remarks.sort(Comparator.comparing(Remark::severity));
    out.println("Records  " + records.source().file());
    out.println("         SHA-256 " + reading.sha256());
    reading.facts().forEach((what, how) -> out.println("         " + what + ": " + how));
    out.println(
        "Rows     "
            + reading.fileRows()
            + " in the file, "
            + panel.rows()
            + " used, "
            + (reading.fileRows() - panel.rows())
            + " set aside");
    out.println("Plants   " + panel.plants().size() + periods(panel));
    setAside(reading);
    List<Said> costs = CostAudit.of(study);
    remarks(remarks, costs);
    columns(PanelAudit.describe(panel));
    return remarks.stream().noneMatch(remark -> remark.severity() == Severity.ERROR)
        && costs.stream().noneMatch(said -> said.severity().equals("error"));
  }

  private static String periods(Panel panel) {
    if (panel.roles().period().isEmpty()) {
      return ", one cross-section";
    }
    List<String> periods = panel.periods();
    return ", over "
        + Failures.count(periods.size(), "period")
        + ", "
        + periods.get(0)
        + " to "
        + periods.get(periods.size() - 1);
  }

  private void setAside(Reading reading) {
    if (reading.setAside().isEmpty()) {
      return;
    }
    out.println();
    out.println("Set aside");
    for (Reading.SetAside set : reading.setAside()) {
      out.println("  " + set.count() + "  " + set.reason() + named(set.rows(), set.count()));
    }
  }

  private static String named(List<Integer> rows, int count) {
    String first =
        rows.stream().limit(MOST_ROWS_NAMED).map(String::valueOf).collect(Collectors.joining(", "));
    boolean more = count > Math.min(rows.size(), MOST_ROWS_NAMED);
    return rows.isEmpty()
        ? ""
        : (count == 1 ? " (row " : " (rows ") + first + (more ? ", …" : "") + ")";
  }

  private void remarks(List<Remark> remarks, List<Said> costs) {
    out.println();
    List<String> severities = new ArrayList<>(costs.stream().map(Said::severity).toList());
    remarks.forEach(remark -> severities.add(remark.severity().word()));
    out.println("Remarks: " + RemarkCounts.words(severities));
    for (Said said : costs) {
      out.println("  " + said.severity() + ": " + said.message());
    }
    for (Remark remark : remarks) {
      out.println("  " + remark.severity().word() + ": " + remark.message());
    }
  }

  private void columns(List<Description> columns) {
    out.println();
    out.println("Columns");
    TextTable table =
        new TextTable(
            3,
            "column",
            "what it is",
            "unit",
            "values",
            "mean",
            "std. dev.",
            "least",
            "most",
            "within plants");
    for (Description column : columns) {
      table.row(
          column.column(),
          column.role(),
          column.unit(),
          String.valueOf(column.count()),
          Numbers.amount(column.mean()),
          Numbers.amount(column.standardDeviation()),
          Numbers.amount(column.least()),
          Numbers.amount(column.most()),
          column.withinShare().map(Numbers::percent).orElse(""));
    }
    table.lines("  ").forEach(out::println);
    out.println(
        "  (within plants: the share of the variance that lies within plants, in logs where all are"
            + " positive)");
  }
}

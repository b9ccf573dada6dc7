package isowright.study;

import isowright.records.Description;
import isowright.records.Panel;
import isowright.records.PanelAudit;
import isowright.records.Reading;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Remark;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads the records of a study and describes them. */
final class RecordsStage {

  private static final Pattern MONEY = Pattern.compile("^money(?: of \\S+)?");

  private RecordsStage() {}

  static Reading read(Study.Records asked) throws RecordsRefused {
    return RecordsReader.read(asked.source(), asked.roles(), asked.keep());
  }

  /**
   * What the records are.
   *
   * @param inForce the same records at the prices in force
   * @param money how money is printed, such as "EUR of 2020"
   */
  static Findings.Records describe(
      Study.Records asked, Reading reading, Panel inForce, String money) {
    Panel panel = reading.panel();
    List<Remark> remarks = new ArrayList<>(reading.remarks());
    remarks.addAll(PanelAudit.of(panel));
    return new Findings.Records(
        String.valueOf(asked.source().file().getFileName()),
        reading.sha256(),
        reading.fileRows(),
        panel.rows(),
        panel.plants().size(),
        panel.periods().size(),
        panel.periods().get(0),
        panel.periods().get(panel.periods().size() - 1),
        reading.facts(),
        PanelAudit.describe(inForce).stream().map(column -> described(column, money)).toList(),
        reading.setAside().stream()
            .map(set -> new Findings.SetAside(set.reason(), set.count(), set.rows()))
            .toList(),
        remarks.stream().map(RecordsStage::said).toList());
  }

  /** The records know no currency: what they call money of some period is that of the study. */
  private static String unit(String unit, String money) {
    Matcher stated = MONEY.matcher(unit);
    return stated.find() ? money + unit.substring(stated.end()) : unit;
  }

  private static Findings.Described described(Description column, String money) {
    return new Findings.Described(
        column.column(),
        column.role(),
        unit(column.unit(), money),
        column.count(),
        column.mean(),
        column.standardDeviation(),
        column.least(),
        column.most(),
        column.withinShare());
  }

  static Said said(Remark remark) {
    return new Said(remark.severity().word(), remark.code(), remark.message(), remark.rows());
  }
}

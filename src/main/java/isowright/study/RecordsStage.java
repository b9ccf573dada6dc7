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

/** Reads the records of a study and describes them. */
final class RecordsStage {

  private RecordsStage() {}

  static Reading read(Study.Records asked) throws RecordsRefused {
    return RecordsReader.read(asked.source(), asked.roles(), asked.keep());
  }

  static Findings.Records describe(Study.Records asked, Reading reading) {
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
        PanelAudit.describe(panel).stream().map(RecordsStage::described).toList(),
        reading.setAside().stream()
            .map(set -> new Findings.SetAside(set.reason(), set.count(), set.rows()))
            .toList(),
        remarks.stream().map(RecordsStage::said).toList());
  }

  private static Findings.Described described(Description column) {
    return new Findings.Described(
        column.column(),
        column.role(),
        column.unit(),
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

package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Column;
import isowright.report.Document.Definitions;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.Findings.Records;
import isowright.study.Findings.Said;
import isowright.study.Findings.SetAside;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Records and provenance: which file, how it was read, what was set aside, what the audit found.
 */
final class RecordsSection {

  static final String ID = "records";

  private RecordsSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    material
        .findings()
        .records()
        .ifPresentOrElse(
            records -> tell(material, records, blocks),
            () ->
                blocks.add(
                    Paragraph.of(
                        "No records were read. Every answer rests on technologies taken as known,"
                            + " so that no figure carries an interval.")));
    return new Section(ID, "Records and provenance", blocks);
  }

  private static void tell(Material material, Records records, List<Block> blocks) {
    List<Entry> entries = new ArrayList<>();
    entries.add(Entry.of("File", records.file()));
    entries.add(new Entry(Text.of("SHA-256"), Text.typed(records.sha256())));
    entries.add(Entry.of("Rows in the file", Numbers.count(records.rows())));
    entries.add(Entry.of("Rows used", Numbers.count(records.used())));
    entries.add(Entry.of("Plants", Numbers.count(records.plants())));
    entries.add(Entry.of("Periods", span(records)));
    records.facts().forEach((name, fact) -> entries.add(Entry.of(Phrases.sentence(name), fact)));
    policies(material.findings().run().settings(), entries);
    blocks.add(new Definitions(entries));
    blocks.add(new Section(ID + "-set-aside", "Rows set aside", setAside(records)));
    blocks.add(new Section(ID + "-audit", "What the audit found", audit(material, records)));
  }

  /** What is done where the records lack something. */
  private static void policies(Map<String, String> settings, List<Entry> entries) {
    if (settings.containsKey("estimation.zeros")) {
      boolean dummy = "dummy".equals(settings.get("estimation.zeros"));
      entries.add(
          Entry.of(
              "Inputs that a row does not use",
              dummy ? "policy dummy: the row is kept" : "policy drop: the row is set aside"));
      entries.add(
          Entry.of("Missing values", "policy drop: the row is set aside, nothing is filled in"));
    }
  }

  /** "2012 to 2024 (13 periods)". */
  static String span(Records records) {
    return records.periods() == 1
        ? records.firstPeriod() + " (one cross-section)"
        : records.firstPeriod()
            + " to "
            + records.lastPeriod()
            + " ("
            + Phrases.count(records.periods(), "period")
            + ")";
  }

  private static List<Block> setAside(Records records) {
    if (records.setAside().isEmpty()) {
      return List.of(Paragraph.of("No row was set aside: every row of the file is used."));
    }
    List<Row> rows = new ArrayList<>();
    for (SetAside aside : records.setAside()) {
      rows.add(
          Row.of(
              aside.reason(),
              List.of(Numbers.count(aside.count()), firstRows(aside.rows(), aside.count()))));
    }
    return List.of(
        new Table(
            "Rows set aside, with the reason",
            "Reason",
            List.of(Column.ofNumbers("Rows", ""), Column.ofWords("Which, as numbered in the file")),
            List.of(Group.of(rows)),
            List.of()));
  }

  private static String firstRows(List<Integer> rows, int count) {
    if (rows.isEmpty()) {
      return "not listed";
    }
    List<String> shown = rows.stream().map(String::valueOf).toList();
    return rows.size() < count ? String.join(", ", shown) + ", …" : Phrases.list(shown);
  }

  private static List<Block> audit(Material material, Records records) {
    List<Said> costs =
        material.findings().costs().remarks().stream().filter(CostsSection::ofRecords).toList();
    if (!costs.isEmpty()) {
      List<Block> all = new ArrayList<>(Material.notices(costs));
      all.addAll(Material.notices(records.remarks()));
      return all;
    }
    if (records.remarks().isEmpty()) {
      return List.of(Paragraph.of("The audit found nothing to remark on."));
    }
    return Material.notices(records.remarks());
  }
}

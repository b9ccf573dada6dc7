package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Definitions;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.runs.Comparison;
import isowright.runs.Comparison.Change;
import isowright.runs.Comparison.Kind;
import isowright.runs.StoredRun;
import isowright.study.Figure;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What changed between two runs, as a page: in brief, the records, the settings, every figure
 * before and after with the parts of its change, and how the parts are found.
 *
 * <p>Tested in {@code ComparisonReportTest}.
 */
public final class ComparisonReport {

  /** Figures of filings shown on the page; the file has all. */
  private static final int MOST_FILINGS = 60;

  private ComparisonReport() {}

  /** The page of a comparison. */
  public static String write(Comparison comparison) {
    return HtmlReport.render(document(comparison));
  }

  static Document document(Comparison comparison) {
    List<Section> sections = new ArrayList<>();
    sections.add(new Section("brief", "What changed", inBrief(comparison)));
    sections.add(ComparedRecords.section(comparison));
    sections.add(settings(comparison));
    for (Kind kind : Kind.values()) {
      figures(comparison, kind).ifPresent(sections::add);
    }
    sections.add(method(comparison));
    return new Document(
        comparison.after().title(),
        "Two runs compared",
        List.of(fact("Earlier run", comparison.before()), fact("Later run", comparison.after())),
        sections);
  }

  private static Entry fact(String term, StoredRun run) {
    return Entry.of(
        term,
        run.folder().toAbsolutePath().normalize().getFileName()
            + ", made "
            + run.record().end().toString().substring(0, 10));
  }

  /** The answer in sentences, for the page and for the screen. */
  public static List<String> brief(Comparison comparison) {
    List<String> lines = new ArrayList<>();
    if (comparison.sameStudy() && comparison.sameRecords()) {
      lines.add("Both runs read the same study and the same records.");
    } else if (comparison.sameStudy()) {
      lines.add("The study is the same; the records changed.");
    } else {
      lines.add(
          comparison.sameRecords()
              ? "The records are the same; the study changed."
              : "Records and study changed.");
    }
    comparison.rows().ifPresent(rows -> lines.add(ComparedRecords.words(rows)));
    if (!comparison.settings().isEmpty()) {
      lines.add(
          "The study files differ in "
              + Phrases.count(comparison.settings().size(), "key")
              + ": "
              + Phrases.list(
                  comparison.settings().stream().limit(6).map(Comparison.Setting::key).toList())
              + (comparison.settings().size() > 6 ? " and others." : "."));
    }
    long changed = comparison.changed();
    lines.add(
        changed == 0
            ? "No headline figure changed."
            : changed
                + " of "
                + Phrases.count(comparison.changes().size(), "headline figure")
                + " changed.");
    outside(comparison).ifPresent(lines::add);
    return lines;
  }

  private static Optional<String> outside(Comparison comparison) {
    List<Change> outside =
        comparison.changes().stream()
            .filter(change -> change.within().isPresent() && !change.within().get())
            .toList();
    if (comparison.changed() == 0) {
      return Optional.empty();
    }
    return Optional.of(
        outside.isEmpty()
            ? "Every later figure lies within the interval of the earlier one."
            : Phrases.count(outside.size(), "later figure lies", "later figures lie")
                + " outside the interval of the earlier one, first "
                + outside.get(0).figure()
                + " ("
                + outside.get(0).of()
                + ").");
  }

  private static List<Block> inBrief(Comparison comparison) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Points(false, brief(comparison).stream().map(Text::of).toList()));
    comparison.remarks().forEach(remark -> blocks.add(new Notice(Weight.WARNING, Text.of(remark))));
    return blocks;
  }

  private static Section settings(Comparison comparison) {
    if (comparison.settings().isEmpty()) {
      return new Section(
          "settings",
          "Settings",
          List.of(Paragraph.of("The study files say the same in every key.")));
    }
    List<Row> rows =
        comparison.settings().stream()
            .map(
                setting ->
                    new Row(
                        Text.typed(setting.key()),
                        List.of(
                            Cell.of(setting.before().orElse("not written")),
                            Cell.of(setting.after().orElse("not written")))))
            .toList();
    return new Section(
        "settings",
        "Settings",
        List.of(
            new Table(
                "Keys of the study files that differ",
                "Key",
                List.of(Column.ofWords("Earlier run"), Column.ofWords("Later run")),
                List.of(Group.of(rows)),
                List.of())));
  }

  private static Optional<Section> figures(Comparison comparison, Kind kind) {
    List<Change> changes =
        comparison.changes().stream()
            .filter(change -> change.kind() == kind)
            .filter(change -> kind != Kind.FILING || change.changed())
            .toList();
    if (changes.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    List<Change> shown = changes;
    if (kind == Kind.FILING && changes.size() > MOST_FILINGS) {
      shown = largest(changes);
      blocks.add(
          Paragraph.of(
              "Of "
                  + Phrases.count(changes.size(), "changed figure")
                  + " the "
                  + MOST_FILINGS
                  + " with the largest relative change are shown; compare.json has all."));
    }
    Map<String, List<Row>> groups = new LinkedHashMap<>();
    shown.forEach(
        change -> groups.computeIfAbsent(change.of(), of -> new ArrayList<>()).add(row(change)));
    blocks.add(
        new Table(
            title(kind),
            "Figure",
            List.of(
                Column.ofNumbers("Earlier run", ""),
                Column.ofNumbers("Later run", ""),
                Column.ofNumbers("Change", ""),
                Column.ofNumbers("from records", ""),
                Column.ofNumbers("from settings", "")),
            groups.entrySet().stream()
                .map(group -> new Group(Optional.of(group.getKey()), group.getValue()))
                .toList(),
            List.of(
                Text.of(
                    "Beneath each figure its interval, as its run states it. A change is not itself"
                        + " an estimate with an interval: both runs rest on much the same"
                        + " rows."))));
    return Optional.of(
        new Section(kind.name().toLowerCase(java.util.Locale.ROOT), title(kind), blocks));
  }

  private static String title(Kind kind) {
    return switch (kind) {
      case TECHNOLOGY -> "Technologies before and after";
      case PLAN -> "Least-cost plans before and after";
      case FILING -> "Filed costs before and after";
    };
  }

  private static List<Change> largest(List<Change> changes) {
    return changes.stream()
        .sorted(Comparator.comparingDouble(ComparisonReport::relative).reversed())
        .limit(MOST_FILINGS)
        .toList();
  }

  private static double relative(Change change) {
    double size = change.before().map(f -> Math.abs(f.value())).orElse(0.0);
    return change.difference().map(d -> Math.abs(d) / Math.max(size, 1e-300)).orElse(0.0);
  }

  private static Row row(Change change) {
    return new Row(
        Text.of(change.figure()),
        List.of(
            cell(change.before()),
            cell(change.after()),
            amount(change.difference()),
            amount(change.fromRecords()),
            amount(change.fromSettings())));
  }

  private static Cell cell(Optional<Figure> figure) {
    return figure
        .map(f -> Cell.of(Numbers.value(f), Numbers.interval(f)))
        .orElse(Cell.of("not in this run"));
  }

  /** Two significant digits, however small: that a figure moved at all is what is asked here. */
  private static Cell amount(Optional<Double> value) {
    return value.map(v -> Cell.of(Numbers.significant(v, 2))).orElse(Cell.none());
  }

  private static Section method(Comparison comparison) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "Figures before and after are those that stand in the two runs. Where records and"
                + " settings both changed, the study of each run is carried out in the records of"
                + " the other as well; the part of the records is the mean of what changing them"
                + " does before and after the settings are changed, the part of the settings is the"
                + " rest. The parts add up and do not depend on an order (Shapley 1953, for two"
                + " players). Where one of the two is the same, the whole change is the other’s."));
    blocks.add(
        new Definitions(
            List.of(
                print(
                    "SHA-256 of the earlier study", comparison.before().record().study().sha256()),
                print("SHA-256 of the later study", comparison.after().record().study().sha256()),
                print(
                    "SHA-256 of the earlier records",
                    comparison.before().record().records().map(e -> e.sha256()).orElse("none")),
                print(
                    "SHA-256 of the later records",
                    comparison.after().record().records().map(e -> e.sha256()).orElse("none")))));
    return new Section("method", "How this was made", blocks);
  }

  private static Entry print(String term, String sha256) {
    return new Entry(Text.of(term), Text.typed(sha256));
  }
}

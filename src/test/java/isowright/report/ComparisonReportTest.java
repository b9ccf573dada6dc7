package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import isowright.runs.Comparison;
import isowright.runs.Comparison.Change;
import isowright.runs.Comparison.Kind;
import isowright.runs.RowChanges;
import isowright.runs.RunRecord;
import isowright.runs.StoredRun;
import isowright.study.Figure;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** The page of a comparison says what the comparison holds, in sentences that follow from it. */
class ComparisonReportTest {

  private static StoredRun run(String name) {
    RunRecord record =
        new RunRecord(
            "1",
            "17",
            "Linux",
            Instant.EPOCH,
            Instant.EPOCH,
            new RunRecord.Entry("../s.yaml", 1, "aa"),
            Optional.of(new RunRecord.Entry("../r.csv", 1, "bb")),
            Map.of(),
            List.of());
    var findings = JsonNodeFactory.instance.objectNode();
    findings.putObject("study").put("title", "Kilns");
    return new StoredRun(Path.of(name), record, findings);
  }

  private static Change change(Kind kind, String of, double before, double after) {
    return new Change(
        kind,
        of,
        "cost",
        Optional.of(Figure.estimated(before, 1, before - 2, before + 2, "delta")),
        Optional.of(Figure.estimated(after, 1, after - 2, after + 2, "delta")),
        Optional.of(after - before),
        Optional.of(0.0));
  }

  private static Comparison comparison(boolean sameRecords, List<Change> changes) {
    Optional<RowChanges> rows =
        sameRecords
            ? Optional.empty()
            : Optional.of(new RowChanges(List.of(), List.of(), List.of(), 0, 12));
    return new Comparison(
        run("a"), run("b"), sameRecords, true, rows, List.of(), changes, List.of("A remark."));
  }

  @Test
  void withoutAnyChangeItSaysSo() {
    List<String> brief =
        ComparisonReport.brief(comparison(true, List.of(change(Kind.PLAN, "p", 5, 5))));
    assertThat(brief)
        .containsExactly(
            "Both runs read the same study and the same records.", "No headline figure changed.");
  }

  @Test
  void figuresOutsideTheEarlierIntervalAreCounted() {
    List<Change> within = List.of(change(Kind.PLAN, "p", 10, 11));
    assertThat(ComparisonReport.brief(comparison(false, within)))
        .contains(
            "Of the rows that both studies use, 12 are the same and 0 corrected; no rows were"
                + " added and 0 removed.",
            "1 of 1 headline figure changed.",
            "Every later figure lies within the interval of the earlier one.");
    List<Change> outside = List.of(change(Kind.PLAN, "p", 10, 13));
    assertThat(ComparisonReport.brief(comparison(false, outside)))
        .contains("1 later figure lies outside the interval of the earlier one, first cost (p).");
  }

  @Test
  void ofManyFilingsTheLargestChangesAreShown() {
    List<Change> changes = new ArrayList<>();
    for (int f = 1; f <= 100; f++) {
      changes.add(change(Kind.FILING, "plant " + f, 100, 100 + f));
    }
    Document page = ComparisonReport.document(comparison(false, changes));
    String html = HtmlReport.render(page);
    assertThat(html).contains("plant 100", "plant 41", "60 with the largest relative change");
    assertThat(html).doesNotContain("plant 40<");
  }
}

package isowright.runs;

import com.fasterxml.jackson.databind.JsonNode;
import isowright.estimation.Unfit;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.runs.Comparison.Change;
import isowright.runs.Comparison.Setting;
import isowright.study.Figure;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * Holds two runs against each other, see {@link Comparison}. The figures before and after are those
 * that stand in the two folders; only the two crossings (settings of one, records of the other) are
 * carried out anew, and only where both changed.
 */
public final class Comparer {

  /** Carries out a study and gives its findings file. */
  public interface Again {
    /** The findings file of a study. */
    byte[] findings(Study study) throws StudyRefused, RecordsRefused, Unfit;
  }

  private final StoredRun before;
  private final StoredRun after;
  private final Again again;
  private final List<String> remarks = new ArrayList<>();

  private Comparer(StoredRun before, StoredRun after, Again again) {
    this.before = before;
    this.after = after;
    this.again = again;
  }

  /** What changed from one run to the other. */
  public static Comparison compare(StoredRun before, StoredRun after, Again again) {
    return new Comparer(before, after, again).comparison();
  }

  private Comparison comparison() {
    boolean sameStudy = before.record().study().sha256().equals(after.record().study().sha256());
    boolean sameRecords = records(before).equals(records(after));
    Optional<Study> earlier = study(before, "earlier");
    Optional<Study> later = study(after, "later");
    Optional<RowChanges> rows = sameRecords ? Optional.empty() : rows(earlier, later);
    Crossed crossed = sameStudy || sameRecords ? Crossed.NONE : crossed(earlier, later);
    if (!before.record().version().equals(after.record().version())) {
      remarks.add(
          "The runs were made by different versions of the program ("
              + before.record().version()
              + " and "
              + after.record().version()
              + "); a change may come from that too.");
    }
    return new Comparison(
        before,
        after,
        sameRecords,
        sameStudy,
        rows,
        sameStudy ? List.of() : settings(),
        changes(sameRecords, sameStudy, crossed),
        remarks);
  }

  private static String records(StoredRun run) {
    return run.record().records().map(RunRecord.Entry::sha256).orElse("");
  }

  /** The study of a run, if it and its records are still the files that were read. */
  private Optional<Study> study(StoredRun run, String which) {
    for (Verification.Checked file : Verification.files(run)) {
      if (file.read() && file.state() != Verification.State.SAME) {
        remarks.add(
            "Of the "
                + which
                + " run, "
                + file.path()
                + " is "
                + file.state().words()
                + ", so its records cannot be read again.");
        return Optional.empty();
      }
    }
    try {
      return Optional.of(StudyFile.read(run.studyFile()));
    } catch (StudyRefused refused) {
      remarks.add("The " + which + " study is not understood by this version of the program.");
      return Optional.empty();
    }
  }

  private Optional<RowChanges> rows(Optional<Study> earlier, Optional<Study> later) {
    Optional<Panel> was = earlier.flatMap(Comparer::panel);
    Optional<Panel> is = later.flatMap(Comparer::panel);
    return was.flatMap(w -> is.map(i -> RowChanges.between(w, i)));
  }

  private static Optional<Panel> panel(Study study) {
    Optional<Study.Records> records = records(study);
    if (records.isEmpty()) {
      return Optional.empty();
    }
    try {
      Study.Records asked = records.get();
      return Optional.of(RecordsReader.read(asked.source(), asked.roles(), asked.keep()).panel());
    } catch (RecordsRefused refused) {
      return Optional.empty();
    }
  }

  private static Optional<Study.Records> records(Study study) {
    return study.records().or(() -> study.costs().map(costs -> costs.records()));
  }

  /** The findings of the earlier settings in the later records, and of the reverse. */
  private record Crossed(
      Optional<Map<Headlines.Key, Figure>> laterRecords,
      Optional<Map<Headlines.Key, Figure>> laterSettings) {
    static final Crossed NONE = new Crossed(Optional.empty(), Optional.empty());
  }

  private Crossed crossed(Optional<Study> earlier, Optional<Study> later) {
    if (earlier.isEmpty() || later.isEmpty()) {
      remarks.add("How much comes from records and how much from settings is therefore not told.");
      return Crossed.NONE;
    }
    Optional<Study.Records> was = records(earlier.get());
    Optional<Study.Records> is = records(later.get());
    if (was.isEmpty() || is.isEmpty()) {
      return Crossed.NONE;
    }
    return new Crossed(
        carriedOut(before.studyFile(), is.get(), "the earlier settings in the later records"),
        carriedOut(after.studyFile(), was.get(), "the later settings in the earlier records"));
  }

  private Optional<Map<Headlines.Key, Figure>> carriedOut(
      Path study, Study.Records records, String what) {
    try {
      byte[] findings = again.findings(StudyFile.readOn(study, records.source()));
      return Optional.of(Headlines.of(StoredRun.tree(findings)));
    } catch (StudyRefused | RecordsRefused | Unfit | IOException refused) {
      remarks.add(
          "It could not be tried what "
              + what
              + " give ("
              + firstLine(refused)
              + "), so the change is not divided.");
      return Optional.empty();
    }
  }

  private static String firstLine(Exception refused) {
    if (refused instanceof StudyRefused study && !study.mistakes().isEmpty()) {
      return study.mistakes().get(0).message();
    }
    if (refused instanceof RecordsRefused records && !records.reasons().isEmpty()) {
      return records.reasons().get(0).message();
    }
    if (refused instanceof Unfit unfit && !unfit.reasons().isEmpty()) {
      return unfit.reasons().get(0);
    }
    return String.valueOf(refused.getMessage());
  }

  private List<Setting> settings() {
    Map<String, String> was = keys(before);
    Map<String, String> is = keys(after);
    Set<String> keys = new LinkedHashSet<>(was.keySet());
    keys.addAll(is.keySet());
    List<Setting> different = new ArrayList<>();
    for (String key : keys) {
      Optional<String> old = Optional.ofNullable(was.get(key));
      Optional<String> now = Optional.ofNullable(is.get(key));
      if (!old.equals(now)) {
        different.add(new Setting(key, old, now));
      }
    }
    return different;
  }

  /** What the study file says; where it is gone, the settings that the run record keeps. */
  private static Map<String, String> keys(StoredRun run) {
    Path file = run.studyFile();
    try {
      boolean same = Fingerprint.of(file).equals(run.record().study().sha256());
      return same ? StudyKeys.of(file) : run.settings();
    } catch (IOException | YamlEngineException gone) {
      return run.settings();
    }
  }

  private List<Change> changes(boolean sameRecords, boolean sameStudy, Crossed crossed) {
    Map<Headlines.Key, Figure> was = headlines(before.findings());
    Map<Headlines.Key, Figure> is = headlines(after.findings());
    Set<Headlines.Key> keys = new LinkedHashSet<>(was.keySet());
    keys.addAll(is.keySet());
    List<Change> changes = new ArrayList<>();
    for (Headlines.Key key : keys) {
      Optional<Figure> old = Optional.ofNullable(was.get(key));
      Optional<Figure> now = Optional.ofNullable(is.get(key));
      Optional<Double> whole = old.flatMap(o -> now.map(n -> n.value() - o.value()));
      Optional<Double> records =
          whole.flatMap(
              w -> {
                if (sameRecords) {
                  return Optional.of(0.0);
                }
                return sameStudy ? Optional.of(w) : part(key, old.get(), now.get(), crossed);
              });
      Optional<Double> settings = whole.flatMap(w -> records.map(r -> w - r));
      changes.add(new Change(key.kind(), key.of(), key.figure(), old, now, records, settings));
    }
    return changes;
  }

  private static Optional<Double> part(Headlines.Key key, Figure was, Figure is, Crossed crossed) {
    Optional<Figure> laterRecords = crossed.laterRecords().map(m -> m.get(key));
    Optional<Figure> laterSettings = crossed.laterSettings().map(m -> m.get(key));
    return laterRecords.flatMap(
        first ->
            laterSettings.map(
                second ->
                    0.5 * (first.value() - was.value()) + 0.5 * (is.value() - second.value())));
  }

  private static Map<Headlines.Key, Figure> headlines(JsonNode findings) {
    return new LinkedHashMap<>(Headlines.of(findings));
  }
}

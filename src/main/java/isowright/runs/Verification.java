package isowright.runs;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;

/**
 * Is a run still what it was, and does its study give the same figures again?
 *
 * <p>Three questions, answered apart: is every file that it wrote as it was written, are study and
 * records the files that it read, and does the study, carried out anew, give every figure to the
 * last digit. The figures are those of the findings file, compared as written: there is no
 * tolerance.
 *
 * <p>Tested in {@code VerificationTest}.
 *
 * @param files every file read or written, with its state
 * @param anew what carrying the study out again gave; absent where the study could not be found
 */
public record Verification(List<Checked> files, Optional<Anew> anew) {

  /** The most differences that are told one by one. */
  private static final int TOLD = 20;

  /** Copies the list. */
  public Verification {
    files = List.copyOf(files);
  }

  /** The state of a file. */
  public enum State {
    /** As it was. */
    SAME("as it was"),
    /** Another content. */
    CHANGED("changed since"),
    /** Not there. */
    MISSING("not there");

    private final String words;

    State(String words) {
      this.words = words;
    }

    /** The state in words. */
    public String words() {
      return words;
    }
  }

  /**
   * A file.
   *
   * @param path its path, relative to the folder of the run
   * @param read whether it was read (study, records) and not written
   * @param state its state
   */
  public record Checked(String path, boolean read, State state) {}

  /**
   * A figure that is not the same.
   *
   * @param place where it stands in the findings file
   * @param before as it was; empty where there was none
   * @param now as it is; empty where there is none
   */
  public record Difference(String place, String before, String now) {}

  /**
   * What carrying the study out again gave.
   *
   * @param figures how many figures and words were compared
   * @param different how many are not the same
   * @param first the first of these
   * @param version the version of the program that carried it out now
   */
  public record Anew(int figures, int different, List<Difference> first, String version) {
    /** Copies the list. */
    public Anew {
      first = List.copyOf(first);
    }
  }

  /** The state of every file of a run. */
  public static List<Checked> files(StoredRun run) {
    List<Checked> checked = new ArrayList<>();
    RunRecord record = run.record();
    checked.add(checked(run.folder(), record.study(), true));
    record.records().ifPresent(entry -> checked.add(checked(run.folder(), entry, true)));
    record.outputs().forEach(entry -> checked.add(checked(run.folder(), entry, false)));
    return checked;
  }

  private static Checked checked(Path folder, RunRecord.Entry entry, boolean read) {
    Path file = folder.resolve(entry.path());
    State state = State.MISSING;
    if (Files.isRegularFile(file)) {
      try {
        state = Fingerprint.of(file).equals(entry.sha256()) ? State.SAME : State.CHANGED;
      } catch (IOException unreadable) {
        state = State.MISSING;
      }
    }
    return new Checked(entry.path(), read, state);
  }

  /**
   * A findings file made anew held against that of a run.
   *
   * @param findingsNow the findings file of the study carried out again
   */
  public static Anew anew(StoredRun run, byte[] findingsNow) {
    JsonNode now;
    try {
      now = StoredRun.tree(findingsNow);
    } catch (IOException impossible) {
      throw new IllegalArgumentException("not a findings file", impossible);
    }
    Map<String, JsonNode> before = StoredRun.leaves(run.findings());
    Map<String, JsonNode> after = StoredRun.leaves(now);
    TreeSet<String> places = new TreeSet<>(before.keySet());
    places.addAll(after.keySet());
    List<Difference> different = new ArrayList<>();
    for (String place : places) {
      if (!place.startsWith("/isowright/")) {
        String was = words(before.get(place));
        String is = words(after.get(place));
        if (!was.equals(is)) {
          different.add(new Difference(place, was, is));
        }
      }
    }
    return new Anew(
        places.size(),
        different.size(),
        different.subList(0, Math.min(TOLD, different.size())),
        now.at("/isowright/version").asText());
  }

  private static String words(@org.jspecify.annotations.Nullable JsonNode leaf) {
    return leaf == null ? "" : leaf.asText();
  }

  /** Whether every file is as it was and every figure came out the same. */
  public boolean holds() {
    return files.stream().allMatch(file -> file.state() == State.SAME)
        && anew.isPresent()
        && anew.get().different() == 0;
  }
}

package isowright.runs;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A run as it lies in its folder: its record and its findings file.
 *
 * @param folder the folder
 * @param record how it was made
 * @param findings what it found, as the file says it
 */
public record StoredRun(Path folder, RunRecord record, JsonNode findings) {

  /** The file that holds every figure. */
  static final String FINDINGS = "findings.json";

  /**
   * The runs in these folders.
   *
   * @throws RunRefused with what is wrong with every one of them
   */
  public static List<StoredRun> read(List<Path> folders) throws RunRefused {
    List<StoredRun> runs = new ArrayList<>();
    List<String> reasons = new ArrayList<>();
    for (Path folder : folders) {
      try {
        runs.add(read(folder));
      } catch (RunRefused refused) {
        reasons.addAll(refused.reasons());
      }
    }
    if (!reasons.isEmpty()) {
      throw new RunRefused(reasons);
    }
    return runs;
  }

  private static StoredRun read(Path folder) throws RunRefused {
    if (!Files.isDirectory(folder)) {
      throw new RunRefused(
          List.of(
              folder
                  + (Files.exists(folder)
                      ? " is a file; name the folder that the run wrote, the one with report.html"
                          + " in it."
                      : ": there is no such folder; name the folder that the run wrote.")));
    }
    RunRecord record = RunRecord.read(folder);
    Path file = folder.resolve(FINDINGS);
    try {
      return new StoredRun(folder, record, tree(Files.readAllBytes(file)));
    } catch (IOException unreadable) {
      throw new RunRefused(
          List.of(
              file
                  + " cannot be read; it was taken away, changed or cut short. Run the study"
                  + " again."));
    }
  }

  static JsonNode tree(byte[] json) throws IOException {
    return new ObjectMapper().readTree(json);
  }

  /** The title of the study. */
  public String title() {
    return findings.at("/study/title").asText();
  }

  /** Where the study file lay, as seen from the folder of the run. */
  public Path studyFile() {
    return folder.resolve(record.study().path()).normalize();
  }

  /** What the settings in force were, by key of the study file. */
  public Map<String, String> settings() {
    return record.settings();
  }

  /** Every number, word and truth value of a findings file by its place in it. */
  static Map<String, JsonNode> leaves(JsonNode root) {
    Map<String, JsonNode> leaves = new LinkedHashMap<>();
    collect(root, "", leaves);
    return leaves;
  }

  private static void collect(JsonNode node, String place, Map<String, JsonNode> into) {
    if (node.isObject()) {
      node.properties()
          .forEach(field -> collect(field.getValue(), place + "/" + field.getKey(), into));
    } else if (node.isArray()) {
      for (int i = 0; i < node.size(); i++) {
        collect(node.get(i), place + "/" + i, into);
      }
    } else {
      into.put(place, node);
    }
  }
}

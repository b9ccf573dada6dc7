package isowright.runs;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.study.Findings;
import isowright.study.Study;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * How was a run made, of what, and what did it write? Enough to find out later whether anything was
 * changed since, and to make the run again.
 *
 * <p>Written as {@code run-record.json}, a metadata document in the form of RO-Crate 1.1: a graph
 * of the folder, the run as a {@code CreateAction} with its program, start and end, and every file
 * read or written with its size and SHA-256. Paths of what was read are relative to the run's
 * folder. The written form is {@link RunRecordJson}.
 *
 * <p>Tested in {@code RunRecordTest}.
 *
 * @param version the version of the program
 * @param java the Java that ran it
 * @param system the operating system
 * @param start when the run began
 * @param end when everything had been computed
 * @param study the study file
 * @param records the records file, where there was one
 * @param settings every setting in force, seeds included, by key of the study file
 * @param outputs what was written, by path within the folder
 */
public record RunRecord(
    String version,
    String java,
    String system,
    Instant start,
    Instant end,
    Entry study,
    Optional<Entry> records,
    Map<String, String> settings,
    List<Entry> outputs) {

  /** The file's name within the folder of a run. */
  public static final String NAME = "run-record.json";

  /** Copies the list. */
  public RunRecord {
    outputs = List.copyOf(outputs);
  }

  /**
   * A file.
   *
   * @param path its path, relative to the folder of the run
   * @param bytes its size
   * @param sha256 its SHA-256
   */
  public record Entry(String path, long bytes, String sha256) {}

  /**
   * The record of a run that has just been made.
   *
   * @param study what was asked
   * @param findings what was found
   * @param folder where it is going to lie
   * @param files what is going to be written, by name
   */
  public static RunRecord of(
      Study study,
      Findings findings,
      Path folder,
      Map<String, byte[]> files,
      Instant start,
      Instant end) {
    List<Entry> outputs = new ArrayList<>();
    files.forEach(
        (name, bytes) -> outputs.add(new Entry(name, bytes.length, Fingerprint.of(bytes))));
    return new RunRecord(
        findings.run().version(),
        Runtime.version().toString(),
        System.getProperty("os.name") + " " + System.getProperty("os.arch"),
        start,
        end,
        entry(folder, study.file(), study.sha256()),
        source(study)
            .flatMap(
                file -> findings.records().map(records -> entry(folder, file, records.sha256()))),
        findings.run().settings(),
        outputs);
  }

  /** The records file of a study, on whichever side it stands. */
  static Optional<Path> source(Study study) {
    return study
        .records()
        .or(() -> study.costs().map(costs -> costs.records()))
        .map(records -> records.source().file());
  }

  private static Entry entry(Path folder, Path file, String sha256) {
    Path from = folder.toAbsolutePath().normalize();
    Path to = file.toAbsolutePath().normalize();
    long bytes;
    try {
      bytes = Files.size(to);
    } catch (IOException gone) {
      bytes = 0; // read a moment ago; its fingerprint is what counts
    }
    return new Entry(relative(from, to), bytes, sha256);
  }

  private static String relative(Path from, Path to) {
    boolean sameRoot = String.valueOf(from.getRoot()).equals(String.valueOf(to.getRoot()));
    Path path = sameRoot ? from.relativize(to) : to;
    return path.toString().replace('\\', '/');
  }

  /** The record as it is written. */
  public byte[] write(String title) {
    return RunRecordJson.write(this, title);
  }

  /**
   * The record of a run's folder.
   *
   * @throws RunRefused if there is none or it cannot be understood
   */
  static RunRecord read(Path folder) throws RunRefused {
    Path file = folder.resolve(NAME);
    if (!Files.isRegularFile(file)) {
      throw new RunRefused(
          List.of(
              folder
                  + " has no "
                  + NAME
                  + ": it is not a run of this program, or of a version before run records; run"
                  + " the study again."));
    }
    try {
      return parsed(new ObjectMapper().readTree(file.toFile()));
    } catch (IOException | IllegalArgumentException unreadable) {
      throw new RunRefused(
          List.of(
              file
                  + " cannot be read as a run record; it was changed or cut short. Run the study"
                  + " again."));
    }
  }

  private static RunRecord parsed(JsonNode root) {
    Map<String, JsonNode> graph = new LinkedHashMap<>();
    root.path("@graph").forEach(node -> graph.put(node.path("@id").asText(), node));
    JsonNode run = needed(graph, RunRecordJson.RUN);
    JsonNode program = needed(graph, RunRecordJson.PROGRAM);
    List<Entry> read = new ArrayList<>();
    run.path("object").forEach(id -> read.add(file(graph, id)));
    List<Entry> outputs = new ArrayList<>();
    run.path("result").forEach(id -> outputs.add(file(graph, id)));
    if (read.isEmpty()) {
      throw new IllegalArgumentException("no study file");
    }
    Map<String, String> settings = new LinkedHashMap<>();
    graph.values().stream()
        .filter(node -> node.path("@type").asText().equals("PropertyValue"))
        .forEach(node -> settings.put(node.path("name").asText(), node.path("value").asText()));
    return new RunRecord(
        program.path("version").asText(),
        program.path("runtimePlatform").asText(),
        program.path("operatingSystem").asText(),
        Instant.parse(run.path("startTime").asText()),
        Instant.parse(run.path("endTime").asText()),
        read.get(0),
        read.size() > 1 ? Optional.of(read.get(1)) : Optional.empty(),
        settings,
        outputs);
  }

  private static JsonNode needed(Map<String, JsonNode> graph, String id) {
    JsonNode node = graph.get(id);
    if (node == null) {
      throw new IllegalArgumentException("no " + id);
    }
    return node;
  }

  private static Entry file(Map<String, JsonNode> graph, JsonNode reference) {
    String id = reference.path("@id").asText();
    JsonNode node = needed(graph, id);
    return new Entry(
        RunRecordJson.path(id), node.path("contentSize").asLong(), node.path("sha256").asText());
  }
}

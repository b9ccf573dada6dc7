package isowright.runs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The record of a run: its form, and that it reads back to what was written. */
class RunRecordTest {

  /** FIPS 180-2, appendix B.1: the SHA-256 of the three letters "abc". */
  private static final String ABC =
      "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";

  @TempDir private Path folder;

  private static RunRecord record() {
    return new RunRecord(
        "1.2.3",
        "17.0.1+12",
        "Linux amd64",
        Instant.parse("2024-05-06T07:08:09.123Z"),
        Instant.parse("2024-05-06T07:08:12Z"),
        new RunRecord.Entry("../a study: first.yaml", 12, ABC),
        Optional.of(new RunRecord.Entry("../plänts & co.csv", 3_000_000_000L, ABC)),
        Map.of("estimation.resampling", "999 draws, seed 7"),
        List.of(new RunRecord.Entry("findings.json", 3, ABC)));
  }

  @Test
  void fingerprintsAreThoseOfTheStandard() throws IOException {
    byte[] abc = "abc".getBytes(StandardCharsets.US_ASCII);
    assertThat(Fingerprint.of(abc)).isEqualTo(ABC);
    Path file = Files.write(folder.resolve("abc"), abc);
    assertThat(Fingerprint.of(file)).isEqualTo(ABC);
  }

  @Test
  void readsBackToWhatWasWritten() throws Exception {
    Files.write(folder.resolve(RunRecord.NAME), record().write("A title"));
    assertThat(RunRecord.read(folder)).isEqualTo(record());
  }

  /**
   * RO-Crate metadata specification 1.1, "Root data entity" and "Metadata file descriptor": a
   * descriptor that conforms to the specification and is about the root, a root of type Dataset
   * whose parts are described in the same flat graph, every reference resolved.
   */
  @Test
  void hasTheFormOfTheSpecification() throws IOException {
    JsonNode root = new ObjectMapper().readTree(record().write("A title"));
    assertThat(root.at("/@context/0").asText()).isEqualTo("https://w3id.org/ro/crate/1.1/context");
    Map<String, JsonNode> graph =
        StreamSupport.stream(root.path("@graph").spliterator(), false)
            .collect(Collectors.toMap(node -> node.path("@id").asText(), node -> node));
    JsonNode descriptor = Objects.requireNonNull(graph.get(RunRecord.NAME));
    assertThat(descriptor.at("/conformsTo/@id").asText())
        .isEqualTo("https://w3id.org/ro/crate/1.1");
    assertThat(descriptor.at("/about/@id").asText()).isEqualTo("./");
    JsonNode dataset = Objects.requireNonNull(graph.get("./"));
    assertThat(dataset.path("@type").asText()).isEqualTo("Dataset");
    assertThat(dataset.path("name").asText()).isEqualTo("A title");
    for (String needed : List.of("description", "datePublished", "license")) {
      assertThat(dataset.path(needed).asText()).as(needed).isNotEmpty();
    }
    Set<String> external =
        Set.of("https://w3id.org/ro/crate/1.1", "http://schema.org/CompletedActionStatus");
    for (JsonNode node : graph.values()) {
      for (JsonNode field : node) {
        List<JsonNode> references = field.isArray() ? list(field) : List.of(field);
        references.stream()
            .filter(reference -> reference.has("@id"))
            .map(reference -> reference.path("@id").asText())
            .filter(id -> !external.contains(id))
            .forEach(id -> assertThat(graph).containsKey(id));
      }
    }
    assertThat(
            Objects.requireNonNull(graph.get("../pl%C3%A4nts%20&%20co.csv"))
                .path("encodingFormat")
                .asText())
        .isEqualTo("text/csv");
  }

  private static List<JsonNode> list(JsonNode array) {
    return StreamSupport.stream(array.spliterator(), false).toList();
  }

  @Test
  void aFolderWithoutARecordIsRefusedWithWhatToDo() {
    assertThatThrownBy(() -> StoredRun.read(List.of(folder, folder.resolve("nowhere"))))
        .isInstanceOfSatisfying(
            RunRefused.class,
            refused -> {
              assertThat(refused.reasons()).hasSize(2);
              assertThat(refused.reasons().get(0)).contains("run-record.json", "run the study");
              assertThat(refused.reasons().get(1)).contains("no such folder");
            });
  }

  @Test
  void aRecordThatWasCutShortIsRefused() throws IOException {
    byte[] whole = record().write("A title");
    Files.write(folder.resolve(RunRecord.NAME), java.util.Arrays.copyOf(whole, whole.length / 2));
    assertThatThrownBy(() -> StoredRun.read(List.of(folder)))
        .isInstanceOf(RunRefused.class)
        .hasMessageContaining("cannot be read as a run record");
    Files.writeString(folder.resolve(RunRecord.NAME), "{\"@graph\": []}");
    assertThatThrownBy(() -> StoredRun.read(List.of(folder)))
        .isInstanceOf(RunRefused.class)
        .hasMessageContaining("cannot be read as a run record");
  }
}

package isowright.runs;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import isowright.runs.RunRecord.Entry;
import java.net.URI;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.time.temporal.ChronoUnit;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * The written form of a run record: RO-Crate 1.1 (Research Object Crate, metadata specification
 * 1.1: root data entity, data entities, "software used to create files" as a {@code CreateAction}).
 * The crate's own name for the metadata file is kept as an alternative name; ours is {@code
 * run-record.json}.
 */
final class RunRecordJson {

  static final String RUN = "#run";
  static final String PROGRAM = "#isowright";

  private static final ObjectMapper MAPPER = new ObjectMapper();

  private static final Map<String, String> MEDIA =
      Map.of(
          "html", "text/html",
          "json", "application/json",
          "svg", "image/svg+xml",
          "png", "image/png",
          "csv", "text/csv",
          "yaml", "application/yaml",
          "pdf", "application/pdf",
          "docx", "application/vnd.openxmlformats-officedocument.wordprocessingml.document",
          "xlsx", "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet");

  private RunRecordJson() {}

  static byte[] write(RunRecord record, String title) {
    ObjectNode root = MAPPER.createObjectNode();
    ArrayNode context = root.putArray("@context");
    context.add("https://w3id.org/ro/crate/1.1/context");
    context
        .addObject()
        .put("sha256", "https://schema.org/sha256")
        .put("runtimePlatform", "https://schema.org/runtimePlatform");
    ArrayNode graph = root.putArray("@graph");
    descriptor(graph.addObject());
    folder(graph.addObject(), record, title);
    run(graph.addObject(), record);
    program(graph.addObject(), record);
    Map<String, Entry> files = new LinkedHashMap<>();
    files.put(record.study().path(), record.study());
    record.records().ifPresent(entry -> files.put(entry.path(), entry));
    record.outputs().forEach(entry -> files.put(entry.path(), entry));
    files.values().forEach(entry -> file(graph.addObject(), entry));
    int number = 0;
    for (Map.Entry<String, String> setting : record.settings().entrySet()) {
      graph
          .addObject()
          .put("@id", "#setting-" + ++number)
          .put("@type", "PropertyValue")
          .put("name", setting.getKey())
          .put("value", setting.getValue());
    }
    try {
      return (MAPPER.writer(printer()).writeValueAsString(root) + "\n")
          .getBytes(StandardCharsets.UTF_8);
    } catch (JsonProcessingException impossible) {
      throw new IllegalStateException("a tree of texts can be written", impossible);
    }
  }

  private static DefaultPrettyPrinter printer() {
    DefaultIndenter lines = new DefaultIndenter("  ", "\n");
    return new DefaultPrettyPrinter().withObjectIndenter(lines).withArrayIndenter(lines);
  }

  private static void descriptor(ObjectNode node) {
    node.put("@id", RunRecord.NAME).put("@type", "CreativeWork");
    node.put("alternateName", "ro-crate-metadata.json");
    node.putObject("conformsTo").put("@id", "https://w3id.org/ro/crate/1.1");
    node.putObject("about").put("@id", "./");
  }

  private static void folder(ObjectNode node, RunRecord record, String title) {
    node.put("@id", "./").put("@type", "Dataset").put("name", title);
    node.put("description", "A study carried out by Isowright: report, figures and charts.");
    node.put("datePublished", record.end().truncatedTo(ChronoUnit.SECONDS).toString());
    node.put("license", "None is granted by this record; the owner of the records decides.");
    ArrayNode parts = node.putArray("hasPart");
    record.outputs().forEach(entry -> parts.addObject().put("@id", id(entry.path())));
    node.putArray("mentions").addObject().put("@id", RUN);
  }

  private static void run(ObjectNode node, RunRecord record) {
    node.put("@id", RUN).put("@type", "CreateAction").put("name", "Run of the study");
    node.put("startTime", record.start().toString());
    node.put("endTime", record.end().toString());
    node.putObject("actionStatus").put("@id", "http://schema.org/CompletedActionStatus");
    node.putObject("instrument").put("@id", PROGRAM);
    ArrayNode read = node.putArray("object");
    read.addObject().put("@id", id(record.study().path()));
    record.records().ifPresent(entry -> read.addObject().put("@id", id(entry.path())));
    ArrayNode written = node.putArray("result");
    record.outputs().forEach(entry -> written.addObject().put("@id", id(entry.path())));
    ArrayNode settings = node.putArray("additionalProperty");
    for (int s = 1; s <= record.settings().size(); s++) {
      settings.addObject().put("@id", "#setting-" + s);
    }
  }

  private static void program(ObjectNode node, RunRecord record) {
    node.put("@id", PROGRAM).put("@type", "SoftwareApplication").put("name", "Isowright");
    node.put("version", record.version());
    node.put("runtimePlatform", record.java());
    node.put("operatingSystem", record.system());
  }

  private static void file(ObjectNode node, Entry entry) {
    node.put("@id", id(entry.path())).put("@type", "File");
    node.put("name", entry.path().substring(entry.path().lastIndexOf('/') + 1));
    node.put("contentSize", Long.toString(entry.bytes()));
    node.put("sha256", entry.sha256());
    String ending = entry.path().substring(entry.path().lastIndexOf('.') + 1);
    if (MEDIA.containsKey(ending)) {
      node.put("encodingFormat", MEDIA.get(ending));
    }
  }

  /** A path as a URI reference: blanks and other characters escaped. */
  static String id(String path) {
    try {
      String relative = path.split("/", 2)[0].contains(":") ? "./" + path : path;
      return new URI(null, null, relative, null).toASCIIString();
    } catch (URISyntaxException strange) {
      return path;
    }
  }

  /** The path behind an identifier. */
  static String path(String id) {
    String path = URI.create(id).getPath();
    return path == null ? id : path.replaceFirst("^\\./", "");
  }
}

package isowright.study;

import isowright.estimation.SavedTechnology;
import isowright.study.Handover.Level;
import isowright.study.Handover.Saved;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * A technology file that {@code run} has written, read again. JSON is a part of YAML 1.2, so it is
 * read by the same means as a study file.
 *
 * @param file where it lies
 * @param sha256 its SHA-256, in hexadecimal
 * @param title the title of the study it comes from
 * @param units the units of figures
 * @param confidence the level of intervals
 * @param recordsFile the name of the records it comes from; empty where there were none
 * @param handover what it takes to ask the technologies
 */
public record TechnologyFile(
    Path file,
    String sha256,
    String title,
    Findings.Units units,
    double confidence,
    String recordsFile,
    Handover handover) {

  /** Levels of plants take room; a file above this size is something else. */
  private static final int LARGEST = 64 << 20;

  /** The inputs, in their order. */
  List<String> inputs() {
    return List.copyOf(units.inputs().keySet());
  }

  /**
   * Reads a technology file.
   *
   * @throws StudyRefused if it is not one, or was damaged
   */
  public static TechnologyFile read(Path file) throws StudyRefused {
    String text;
    try {
      if (!Files.isRegularFile(file)) {
        throw refused(
            file,
            Files.isDirectory(file)
                ? "this is a folder; name the technology.json in it"
                : "there is no such file; `run` writes a technology.json beside each report");
      }
      if (Files.size(file) > LARGEST) {
        throw refused(file, "the file is too large to be a technology.json");
      }
      text = Files.readString(file);
    } catch (IOException unreadable) {
      throw refused(file, "the file cannot be read as text in UTF-8; name a technology.json");
    }
    try {
      LoadSettings settings = LoadSettings.builder().setCodePointLimit(LARGEST).build();
      Part root = new Part("", new Load(settings).loadFromString(text));
      return read(file, StudyFile.sha256(text.getBytes(StandardCharsets.UTF_8)), root);
    } catch (YamlEngineException broken) {
      throw refused(file, "this is not a JSON file as `run` writes it; run the study again");
    } catch (Damaged damaged) {
      throw new StudyRefused(file, List.of(new Mistake(0, 0, damaged.key, damaged.words)));
    }
  }

  private static StudyRefused refused(Path file, String message) {
    return new StudyRefused(file, List.of(new Mistake(0, 0, "", message)));
  }

  /** Something is not there or not what it ought to be. */
  private static final class Damaged extends RuntimeException {
    private static final long serialVersionUID = 1L;
    private final String key;
    private final String words;

    private Damaged(String key, String words) {
      super(words);
      this.key = key;
      this.words = words;
    }
  }

  /** A part of the file and its key. */
  private record Part(String key, @org.jspecify.annotations.Nullable Object value) {

    Damaged damaged(String expected) {
      return new Damaged(key, "expects " + expected + "; run the study again to write the file");
    }

    boolean has(String name) {
      return value instanceof Map<?, ?> map && map.get(name) != null;
    }

    Part at(String name) {
      String path = key.isEmpty() ? name : key + "." + name;
      if (!(value instanceof Map<?, ?> map) || map.get(name) == null) {
        throw new Damaged(
            path,
            name.equals("handover")
                ? "this file was not written by `run`, or by a version that knew no `plan`; run the"
                    + " study again"
                : "is missing; run the study again to write the file");
      }
      return new Part(path, map.get(name));
    }

    Map<String, Part> entries() {
      if (!(value instanceof Map<?, ?> map)) {
        throw damaged("names with values");
      }
      Map<String, Part> parts = new LinkedHashMap<>();
      map.forEach((k, v) -> parts.put(String.valueOf(k), new Part(key + "." + k, v)));
      return parts;
    }

    List<Part> items() {
      if (!(value instanceof List<?> list)) {
        throw damaged("a list");
      }
      List<Part> parts = new ArrayList<>();
      for (Object item : list) {
        parts.add(new Part(key + "[" + (parts.size() + 1) + "]", item));
      }
      return parts;
    }

    double number() {
      if (!(value instanceof Number number)) {
        throw damaged("a number");
      }
      return number.doubleValue();
    }

    boolean truth() {
      if (!(value instanceof Boolean truth)) {
        throw damaged("true or false");
      }
      return truth;
    }

    String text() {
      if (!(value instanceof String text)) {
        throw damaged("text");
      }
      return text;
    }

    List<String> texts() {
      return items().stream().map(Part::text).toList();
    }

    double[] numbers(int size) {
      double[] numbers = items().stream().mapToDouble(Part::number).toArray();
      if (numbers.length != size) {
        throw damaged(size + " numbers");
      }
      return numbers;
    }

    double[][] matrix(int rows, int columns) {
      List<Part> items = items();
      if (items.size() != rows) {
        throw damaged(rows + " rows");
      }
      return items.stream().map(row -> row.numbers(columns)).toArray(double[][]::new);
    }
  }

  private static TechnologyFile read(Path file, String sha256, Part root) {
    Part handover = root.at("handover");
    Part units = root.at("units");
    Map<String, String> inputs = new LinkedHashMap<>();
    units.at("inputs").entries().forEach((name, unit) -> inputs.put(name, unit.text()));
    List<String> names = List.copyOf(inputs.keySet());
    Optional<Recorded> recorded =
        handover.has("records")
            ? Optional.of(recorded(handover.at("records"), names))
            : Optional.empty();
    List<Saved> saved =
        handover.at("technologies").items().stream().map(part -> saved(part, names)).toList();
    return new TechnologyFile(
        file,
        sha256,
        root.at("study").at("title").text(),
        new Findings.Units(units.at("output").text(), inputs, units.at("money").text()),
        root.at("confidence").number(),
        root.has("records") ? root.at("records").at("file").text() : "",
        new Handover(recorded, saved));
  }

  private static Recorded recorded(Part part, List<String> inputs) {
    int n = inputs.size();
    double[] prices = new double[n];
    List<Optional<double[]>> ranges = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      Part stated = part.at("prices");
      boolean known = stated.has(inputs.get(i));
      prices[i] = known ? stated.at(inputs.get(i)).number() : Double.NaN;
      Part range = part.at("priceRanges");
      ranges.add(
          range.has(inputs.get(i))
              ? Optional.of(range.at(inputs.get(i)).numbers(2))
              : Optional.empty());
    }
    Part support = part.at("support");
    return new Recorded(
        part.at("periods").texts(),
        part.at("plants").texts(),
        part.at("plantsRepeat").truth(),
        part.at("leastOutput").number(),
        part.at("mostOutput").number(),
        prices,
        ranges,
        new Recorded.Where(
            support.at("mean").numbers(n),
            support.at("least").numbers(n),
            support.at("most").numbers(n),
            support.at("inverse").matrix(n, n),
            support.at("farthest").number()));
  }

  private static Saved saved(Part part, List<String> inputs) {
    double[] base = inputs.stream().mapToDouble(i -> part.at("base").at(i).number()).toArray();
    List<String> names = part.at("parameterNames").texts();
    int p = names.size();
    boolean fitted = part.at("fitted").truth();
    if (!fitted) {
      return new Saved(
          part.at("name").text(),
          false,
          part.at("form").text(),
          base,
          names,
          part.at("parameters").numbers(p),
          0,
          List.of(),
          List.of(),
          List.of());
    }
    List<Part> byPeriod = part.at("byPeriod").items();
    if (part.at("levels").items().size() < SavedTechnology.COMMON) {
      throw part.at("levels").damaged(SavedTechnology.COMMON + " levels or more");
    }
    List<List<double[][]>> maps =
        part.at("maps").items().stream()
            .map(kind -> kind.at("byPeriod"))
            .map(kind -> maps(kind, byPeriod.size(), p))
            .toList();
    return new Saved(
        part.at("name").text(),
        true,
        part.at("form").text(),
        base,
        names,
        part.at("parameters").numbers(p),
        part.at("degreesOfFreedom").number(),
        byPeriod.stream().map(own -> own.numbers(p)).toList(),
        maps,
        part.at("levels").items().stream()
            .map(level -> level(level, byPeriod.size(), maps))
            .toList());
  }

  private static Level level(Part part, int periods, List<List<double[][]>> maps) {
    double map = part.at("map").number();
    if (!(map >= 0 && map < maps.size()) || periods == 0) {
      throw part.damaged("a level that belongs to its maps");
    }
    int all = maps.get((int) map).get(0)[0].length;
    return new Level(
        (int) map, part.at("constants").numbers(periods), part.at("covariance").matrix(all, all));
  }

  private static List<double[][]> maps(Part part, int periods, int rows) {
    List<double[][]> maps = new ArrayList<>();
    for (Part each : part.items()) {
      int columns =
          each.at("map").items().isEmpty() ? 0 : each.at("map").items().get(0).items().size();
      maps.add(each.at("map").matrix(rows, columns));
    }
    if (maps.size() != periods) {
      throw part.damaged(periods + " periods");
    }
    return maps;
  }
}

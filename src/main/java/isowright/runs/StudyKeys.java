package isowright.runs;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;

/** What a study file says, key by key, so that two can be held side by side. */
final class StudyKeys {

  private StudyKeys() {}

  /** The values of a study file by their place, such as {@code least-cost[1].prices.labour}. */
  static Map<String, String> of(Path file) throws IOException {
    String text = Files.readString(file, StandardCharsets.UTF_8);
    Map<String, String> keys = new LinkedHashMap<>();
    collect(new Load(LoadSettings.builder().build()).loadFromString(text), "", keys);
    return keys;
  }

  private static void collect(Object node, String place, Map<String, String> into) {
    if (node instanceof Map<?, ?> map) {
      map.forEach(
          (key, value) -> collect(value, place.isEmpty() ? "" + key : place + "." + key, into));
    } else if (node instanceof List<?> list && list.stream().anyMatch(StudyKeys::nested)) {
      for (int i = 0; i < list.size(); i++) {
        collect(list.get(i), place + "[" + (i + 1) + "]", into);
      }
    } else {
      into.put(place, String.valueOf(node));
    }
  }

  private static boolean nested(Object item) {
    return item instanceof Map || item instanceof List;
  }
}

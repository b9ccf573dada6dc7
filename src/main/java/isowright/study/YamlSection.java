package isowright.study;

import isowright.records.Nearest;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;

/**
 * The keys and values of one mapping of a study file, in the order of the file. A key that stands
 * twice is a mistake; the first one is read.
 */
final class YamlSection {

  private final Node place;
  private final String path;
  private final Mistakes mistakes;
  private final Map<String, YamlValue> values = new LinkedHashMap<>();
  private final Map<String, Node> keys = new LinkedHashMap<>();

  YamlSection(MappingNode mapping, Node place, String path, Mistakes mistakes) {
    this.place = place;
    this.path = path;
    this.mistakes = mistakes;
    for (NodeTuple tuple : mapping.getValue()) {
      add(tuple.getKeyNode(), tuple.getValueNode());
    }
  }

  private void add(Node keyNode, Node valueNode) {
    if (!(keyNode instanceof ScalarNode scalar)) {
      mistakes.add(keyNode.getStartMark(), path, "a key must be a word, found a list or a mapping");
      return;
    }
    String key = scalar.getValue();
    Node earlier = keys.get(key);
    if (earlier != null) {
      int first = earlier.getStartMark().map(mark -> mark.getLine() + 1).orElse(0);
      mistakes.add(
          keyNode.getStartMark(),
          under(key),
          "`" + YamlValue.quote(key) + "` stands twice; it was set in line " + first + " already");
      return;
    }
    keys.put(key, keyNode);
    values.put(key, new YamlValue(valueNode, keyNode, under(key), mistakes));
  }

  private String under(String key) {
    String shown = YamlValue.quote(key);
    return path.isEmpty() ? shown : path + "." + shown;
  }

  /** The key path of this mapping. */
  String path() {
    return path;
  }

  /** The keys, in the order of the file. */
  List<String> keys() {
    return List.copyOf(values.keySet());
  }

  /** Whether the key is there, whatever its value. */
  boolean has(String key) {
    return values.containsKey(key);
  }

  /** The value of a key. */
  Optional<YamlValue> get(String key) {
    return Optional.ofNullable(values.get(key));
  }

  /** The value of a key that must be there; a mistake with this remedy where it is not. */
  Optional<YamlValue> need(String key, String remedy) {
    if (!has(key)) {
      lacks(key, remedy);
    }
    return get(key);
  }

  /** Adds the mistake that a key is missing. */
  void lacks(String key, String remedy) {
    mistakes.add(place.getStartMark(), under(key), "`" + key + "` is missing: " + remedy);
  }

  /** Adds a mistake about the value of a key, or about the mapping where the key is not there. */
  void refuse(String key, String message) {
    Node at = keys.get(key);
    if (at != null) {
      mistakes.add(at.getStartMark(), under(key), message);
    } else {
      mistakes.add(place.getStartMark(), path, message);
    }
  }

  /** A text under a key that may be left out. */
  Optional<String> text(String key) {
    return get(key).flatMap(YamlValue::text);
  }

  /** A mapping under a key that may be left out. */
  Optional<YamlSection> section(String key) {
    return get(key).flatMap(YamlValue::section);
  }

  /**
   * Adds a mistake for every key that is not allowed.
   *
   * @param where what the keys belong to, in words
   * @param allowed the keys of this version
   * @param later keys of the format that this version does not carry out
   */
  void allow(String where, List<String> allowed, List<String> later) {
    for (String key : values.keySet()) {
      if (later.contains(key)) {
        refuse(key, "`" + key + "` is not carried out by this version; take it out");
      } else if (!allowed.contains(key)) {
        refuse(
            key,
            "`"
                + YamlValue.quote(key)
                + "` is not a key of "
                + where
                + nearest(key, allowed, later)
                + "; allowed: "
                + String.join(", ", allowed));
      }
    }
  }

  /** Adds a mistake for every key that is not the name of an input. */
  void allowInputs(Collection<String> inputs) {
    allowNames(inputs, "input");
  }

  /**
   * Adds a mistake for every key that is not one of some names.
   *
   * @param noun what the names are names of, such as {@code input}; its plural takes an s
   */
  void allowNames(Collection<String> names, String noun) {
    String article = "aeiou".indexOf(noun.charAt(0)) >= 0 ? "an " : "a ";
    for (String key : values.keySet()) {
      if (!names.contains(key)) {
        String remedy =
            key.chars().allMatch(Character::isDigit)
                ? "; was a decimal comma meant? Decimals are written with a point"
                : YamlValue.nearest(key, names);
        refuse(
            key,
            "`"
                + YamlValue.quote(key)
                + "` is not "
                + article
                + noun
                + remedy
                + "; "
                + noun
                + "s: "
                + String.join(", ", names));
      }
    }
  }

  private static String nearest(String key, List<String> allowed, List<String> later) {
    List<String> all = new ArrayList<>(allowed);
    all.addAll(later);
    boolean meansLater = Nearest.word(key, all).filter(later::contains).isPresent();
    return YamlValue.nearest(key, all)
        + (meansLater ? ", which is not carried out by this version" : "");
  }
}

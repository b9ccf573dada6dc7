package isowright.study;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;

/**
 * Where each key of a study file stands, so that a mistake found only against the records can still
 * name its line. A key that is not written (a default) is placed at the nearest key above it.
 */
final class KeyPlaces {

  private final Map<String, Mark> marks = new HashMap<>();

  private KeyPlaces() {}

  /** The places in a file; none where it can no longer be read. */
  static KeyPlaces of(Path file) {
    try {
      return ofText(Files.readString(file, StandardCharsets.UTF_8));
    } catch (IOException unreadable) {
      return new KeyPlaces();
    }
  }

  /** The places in a text. */
  static KeyPlaces ofText(String text) {
    KeyPlaces places = new KeyPlaces();
    try {
      new Compose(LoadSettings.builder().build())
          .composeAllFromString(text)
          .forEach(root -> places.note("", root));
    } catch (YamlEngineException unreadable) {
      return new KeyPlaces();
    }
    return places;
  }

  /** The mistakes with the line and column of their keys. */
  List<Mistake> located(List<Mistake> mistakes) {
    return mistakes.stream().map(this::located).toList();
  }

  private Mistake located(Mistake mistake) {
    String key = mistake.key();
    while (!key.isEmpty()) {
      Mark mark = marks.get(key);
      if (mark != null) {
        return new Mistake(
            mark.getLine() + 1, mark.getColumn() + 1, mistake.key(), mistake.message());
      }
      key = key.substring(0, Math.max(0, Math.max(key.lastIndexOf('.'), key.lastIndexOf('['))));
    }
    return mistake;
  }

  private void note(String path, Node node) {
    if (node instanceof MappingNode mapping) {
      for (NodeTuple entry : mapping.getValue()) {
        if (entry.getKeyNode() instanceof ScalarNode key) {
          String inner = path.isEmpty() ? key.getValue() : path + "." + key.getValue();
          place(inner, key.getStartMark());
          note(inner, entry.getValueNode());
        }
      }
    } else if (node instanceof SequenceNode sequence) {
      for (int item = 0; item < sequence.getValue().size(); item++) {
        String inner = path + "[" + (item + 1) + "]";
        place(inner, sequence.getValue().get(item).getStartMark());
        note(inner, sequence.getValue().get(item));
      }
    }
  }

  private void place(String path, Optional<Mark> mark) {
    mark.ifPresent(at -> marks.put(path, at));
  }
}

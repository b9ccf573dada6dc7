package isowright.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.nodes.Node;

/**
 * Turns the text of a study file into the YAML nodes that carry line and column of every key and
 * value. Nothing is constructed from them (no tags are obeyed, no objects made): the binder reads
 * the nodes themselves, so that it can go on after a mistake and say where each one is.
 */
final class YamlNodes {

  /** More repetitions by reference than any study needs; beyond, a short text means a huge one. */
  private static final int MOST_ALIASES = 50;

  private YamlNodes() {}

  /**
   * The root of the only document of the text; absent, with a mistake added, where there is none.
   */
  static Optional<YamlValue> root(String text, Mistakes mistakes) {
    LoadSettings settings =
        LoadSettings.builder()
            .setLabel("study file")
            .setMaxAliasesForCollections(MOST_ALIASES)
            .build();
    List<Node> documents = new ArrayList<>();
    try {
      new Compose(settings).composeAllFromString(text).forEach(documents::add);
    } catch (MarkedYamlEngineException syntax) {
      mistakes.add(syntax.getProblemMark(), "", sentence(syntax));
      return Optional.empty();
    } catch (YamlEngineException unreadable) {
      mistakes.add(
          Optional.empty(),
          "",
          "this is not a YAML 1.2 file: " + firstLine(String.valueOf(unreadable.getMessage())));
      return Optional.empty();
    } catch (StackOverflowError deep) {
      // The parser descends once a level; only a file made to be deep gets it here.
      mistakes.add(0, 0, "keys and lists are nested too deeply for a study file");
      return Optional.empty();
    }
    if (documents.isEmpty()) {
      mistakes.add(
          0, 0, "the file holds no setting, only blank lines or comments; begin with `title:`");
      return Optional.empty();
    }
    if (documents.size() > 1) {
      mistakes.add(
          documents.get(1).getStartMark(),
          "",
          "a second document begins here (after `---`); a study file holds one");
    }
    return Optional.of(new YamlValue(documents.get(0), documents.get(0), "", mistakes));
  }

  private static String sentence(MarkedYamlEngineException syntax) {
    String problem = firstLine(syntax.getProblem());
    String remedy =
        problem.contains("TAB")
            ? "YAML is indented with spaces, not tabs"
            : "check indentation, colons, quotes and brackets at and just before this place";
    return "this is not YAML 1.2: " + problem + "; " + remedy;
  }

  private static String firstLine(String text) {
    return text.lines().findFirst().orElse("").strip();
  }
}

package isowright.study;

import isowright.records.Nearest;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.regex.Pattern;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;

/**
 * One value of a study file with its place and its key path. Each reader below answers with the
 * value, or adds a mistake (what was found, what is allowed) and answers empty, so that reading
 * goes on to the next mistake.
 *
 * <p>Words and numbers follow the core schema of YAML 1.2: {@code no}, {@code yes}, {@code 010} and
 * dates stay text; a number in quotes is text.
 */
final class YamlValue {

  private static final Pattern NUMBER =
      Pattern.compile("[-+]?(\\.[0-9]+|[0-9]+(\\.[0-9]*)?)([eE][-+]?[0-9]+)?");
  private static final Pattern INFINITE = Pattern.compile("[-+]?\\.(inf|Inf|INF)");
  private static final Pattern NOTHING = Pattern.compile("~|null|Null|NULL|");
  private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");
  private static final Pattern MARKED_NUMBER = Pattern.compile("[-+]?[0-9][0-9.,_' ]*");

  /** Longest piece of a value repeated in a message. */
  private static final int LONGEST_QUOTE = 60;

  private final Node node;
  private final Node place;
  private final String path;
  private final Mistakes mistakes;

  /** A value; {@code place} is the node to point at when the whole of it is wrong. */
  YamlValue(Node node, Node place, String path, Mistakes mistakes) {
    this.node = node;
    this.place = place;
    this.path = path;
    this.mistakes = mistakes;
  }

  /** The key path, such as {@code inputs.labour.price}. */
  String path() {
    return path;
  }

  /** Adds a mistake about this value. */
  void refuse(String message) {
    mistakes.add(mark(), path, message);
  }

  private Optional<Mark> mark() {
    return node instanceof ScalarNode ? node.getStartMark() : place.getStartMark();
  }

  /** Any scalar that is not blank, as it is written: one line without control characters. */
  Optional<String> text() {
    if (node instanceof ScalarNode scalar && !isNothing() && !scalar.getValue().isBlank()) {
      String written = scalar.getValue().strip();
      if (CONTROL.matcher(written).find()) {
        refuse("expects one line of text without control characters, found " + found());
        return Optional.empty();
      }
      return Optional.of(written);
    }
    refuse("expects text, found " + found());
    return Optional.empty();
  }

  /** Any scalar exactly as it is written, blanks included; absent, without a mistake, otherwise. */
  Optional<String> raw() {
    return node instanceof ScalarNode scalar ? Optional.of(scalar.getValue()) : Optional.empty();
  }

  /** A finite number. */
  OptionalDouble number() {
    OptionalDouble value = anyNumber("a number");
    if (value.isPresent() && Double.isInfinite(value.getAsDouble())) {
      refuse("expects a finite number, found " + found());
      return OptionalDouble.empty();
    }
    return value;
  }

  /** A number above zero. */
  OptionalDouble positive() {
    OptionalDouble value = number();
    if (value.isPresent() && value.getAsDouble() <= 0) {
      refuse("expects a number above 0, found " + found());
      return OptionalDouble.empty();
    }
    return value;
  }

  /** A number, or {@code .inf}. */
  OptionalDouble numberOrInfinity() {
    return anyNumber("a number or .inf");
  }

  private OptionalDouble anyNumber(String expected) {
    if (node instanceof ScalarNode scalar && scalar.isPlain()) {
      String written = scalar.getValue();
      if (NUMBER.matcher(written).matches()) {
        return OptionalDouble.of(Double.parseDouble(written));
      }
      if (INFINITE.matcher(written).matches()) {
        return OptionalDouble.of(
            written.startsWith("-") ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY);
      }
    }
    refuse("expects " + expected + ", found " + found() + numberRemedy());
    return OptionalDouble.empty();
  }

  private String numberRemedy() {
    if (!(node instanceof ScalarNode scalar)) {
      return "";
    }
    String written = scalar.getValue().strip();
    if (!scalar.isPlain() && NUMBER.matcher(written).matches()) {
      return "; take the quotes away: " + written;
    }
    if (MARKED_NUMBER.matcher(written).matches()) {
      return "; decimals are written with a point, and thousands without a mark";
    }
    return "";
  }

  /** A whole number between two bounds, both included. */
  OptionalInt whole(int least, int most) {
    OptionalDouble value = number();
    if (value.isEmpty()) {
      return OptionalInt.empty();
    }
    double number = value.getAsDouble();
    if (number != Math.rint(number) || number < least || number > most) {
      refuse(
          String.format(
              Locale.ROOT, "expects a whole number from %d to %d, found %s", least, most, found()));
      return OptionalInt.empty();
    }
    return OptionalInt.of((int) number);
  }

  /** {@code true} or {@code false}. */
  Optional<Boolean> flag() {
    if (node instanceof ScalarNode scalar && scalar.isPlain()) {
      String written = scalar.getValue().toLowerCase(Locale.ROOT);
      if (written.equals("true") || written.equals("false")) {
        return Optional.of(written.equals("true"));
      }
    }
    refuse("expects true or false, found " + found());
    return Optional.empty();
  }

  /**
   * One of the allowed words.
   *
   * @param later words of the format that this version does not carry out
   */
  Optional<String> word(Collection<String> allowed, Collection<String> later) {
    Optional<String> written = text();
    if (written.isEmpty() || allowed.contains(written.get())) {
      return written;
    }
    String word = written.get();
    String choices = "allowed: " + String.join(", ", allowed);
    if (later.contains(word)) {
      refuse("`" + word + "` is not carried out by this version; " + choices);
    } else {
      refuse(
          "found `"
              + quote(word)
              + "`, which is not a word here"
              + nearest(word, allowed)
              + "; "
              + choices);
    }
    return Optional.empty();
  }

  /** "; the nearest is `x`", or nothing where no allowed word is near. */
  static String nearest(String word, Collection<String> allowed) {
    return Nearest.word(word, allowed).map(near -> "; the nearest is `" + near + "`").orElse("");
  }

  /** The keys and values of a mapping. */
  Optional<YamlSection> section() {
    if (node instanceof MappingNode mapping) {
      return Optional.of(new YamlSection(mapping, place, path, mistakes));
    }
    refuse("expects keys and values, found " + found());
    return Optional.empty();
  }

  /** The items of a list. */
  Optional<List<YamlValue>> list() {
    if (!isList()) {
      refuse("expects a list such as [a, b], found " + found());
      return Optional.empty();
    }
    List<YamlValue> items = new ArrayList<>();
    for (Node item : ((SequenceNode) node).getValue()) {
      Node at = item instanceof MappingNode mapping ? firstOf(mapping) : item;
      items.add(new YamlValue(item, at, path + "[" + (items.size() + 1) + "]", mistakes));
    }
    return Optional.of(List.copyOf(items));
  }

  /** Text items of a list, none twice. */
  List<String> texts() {
    List<String> all = new ArrayList<>();
    for (YamlValue item : list().orElse(List.of())) {
      item.text()
          .ifPresent(
              written -> {
                if (all.contains(written)) {
                  item.refuse("`" + written + "` stands twice in this list; once is enough");
                } else {
                  all.add(written);
                }
              });
    }
    return all;
  }

  /** Two text items, such as a first and a last period. */
  Optional<List<String>> pair(String what) {
    Optional<List<YamlValue>> items = list();
    if (items.isEmpty()) {
      return Optional.empty();
    }
    if (items.get().size() != 2) {
      refuse("expects two items, " + what + ", found " + items.get().size());
      return Optional.empty();
    }
    Optional<String> first = items.get().get(0).text();
    Optional<String> last = items.get().get(1).text();
    return first.isPresent() && last.isPresent()
        ? Optional.of(List.of(first.get(), last.get()))
        : Optional.empty();
  }

  /** Whether a number stands there, not in quotes. */
  boolean isNumber() {
    return node instanceof ScalarNode scalar
        && scalar.isPlain()
        && (NUMBER.matcher(scalar.getValue()).matches()
            || INFINITE.matcher(scalar.getValue()).matches());
  }

  boolean isList() {
    return node instanceof SequenceNode;
  }

  boolean isMapping() {
    return node instanceof MappingNode;
  }

  private boolean isNothing() {
    return node instanceof ScalarNode scalar
        && scalar.isPlain()
        && NOTHING.matcher(scalar.getValue()).matches();
  }

  /** What stands there, in words. */
  String found() {
    if (node instanceof SequenceNode) {
      return "a list";
    }
    if (node instanceof MappingNode) {
      return "keys and values";
    }
    String written = ((ScalarNode) node).getValue();
    if (isNothing() || written.isBlank()) {
      return "nothing";
    }
    boolean number = ((ScalarNode) node).isPlain() && NUMBER.matcher(written).matches();
    return number ? written : "the text \"" + quote(written) + "\"";
  }

  /** A piece of the file fit for one line of a message. */
  static String quote(String written) {
    String line = written.replaceAll("[\\p{Cntrl}]+", " ");
    return line.length() <= LONGEST_QUOTE ? line : line.substring(0, LONGEST_QUOTE) + "…";
  }

  private static Node firstOf(MappingNode mapping) {
    List<NodeTuple> tuples = mapping.getValue();
    return tuples.isEmpty() ? mapping : tuples.get(0).getKeyNode();
  }
}

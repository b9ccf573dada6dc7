package isowright.study;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * Reads mappings from the names of inputs to numbers, such as prices, with a mistake for every name
 * that is no input and, where all are needed, for every input that is left out.
 */
final class InputNumbers {

  private final List<String> inputs;
  private final String noun;

  InputNumbers(List<String> inputs) {
    this(inputs, "input");
  }

  /**
   * For other names than those of inputs.
   *
   * @param noun what a name is the name of
   */
  InputNumbers(List<String> names, String noun) {
    this.inputs = List.copyOf(names);
    this.noun = noun;
  }

  /** A finite number for every input, in the order of the inputs. */
  Optional<double[]> any(YamlSection section, String key) {
    return all(section, key, YamlValue::number);
  }

  /** A number above zero for every input, in the order of the inputs. */
  Optional<double[]> positive(YamlSection section, String key) {
    return all(section, key, YamlValue::positive);
  }

  private Optional<double[]> all(
      YamlSection section, String key, Function<YamlValue, OptionalDouble> reader) {
    Optional<Map<String, Double>> read = read(section, key, reader);
    if (read.isEmpty()) {
      return Optional.empty();
    }
    List<String> there = section.section(key).map(YamlSection::keys).orElse(List.of());
    List<String> missing = inputs.stream().filter(name -> !there.contains(name)).toList();
    if (!missing.isEmpty()) {
      section.refuse(
          key,
          "one number for every " + noun + " is needed; missing: " + String.join(", ", missing));
    }
    if (read.get().size() < inputs.size() || there.size() > inputs.size()) {
      return Optional.empty();
    }
    return Optional.of(inputs.stream().mapToDouble(read.get()::get).toArray());
  }

  /** Numbers above zero for some inputs. */
  Map<String, Double> some(YamlSection section, String key) {
    return read(section, key, YamlValue::positive).orElse(Map.of());
  }

  /** Finite numbers in the order of the names, zero for those left out. */
  Optional<double[]> orZero(YamlSection section, String key) {
    return read(section, key, YamlValue::number)
        .filter(found -> found.size() == section.section(key).map(s -> s.keys().size()).orElse(0))
        .map(found -> inputs.stream().mapToDouble(name -> found.getOrDefault(name, 0.0)).toArray());
  }

  private Optional<Map<String, Double>> read(
      YamlSection section, String key, Function<YamlValue, OptionalDouble> reader) {
    Optional<YamlSection> numbers = section.section(key);
    if (numbers.isEmpty() || inputs.isEmpty()) {
      return Optional.empty(); // without inputs every name would be wrong, and that is told already
    }
    numbers.get().allowNames(inputs, noun);
    Map<String, Double> values = new LinkedHashMap<>();
    for (String name : inputs) {
      numbers
          .get()
          .get(name)
          .map(reader)
          .ifPresent(value -> value.ifPresent(number -> values.put(name, number)));
    }
    return Optional.of(values);
  }
}

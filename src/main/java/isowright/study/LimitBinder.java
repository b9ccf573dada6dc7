package isowright.study;

import isowright.study.Study.Limit;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads held inputs and limits, of a question or of one plant, and holds one against the other. */
final class LimitBinder {

  private final List<String> inputs;
  private final InputNumbers numbers;

  LimitBinder(List<String> inputs) {
    this.inputs = List.copyOf(inputs);
    this.numbers = new InputNumbers(inputs);
  }

  /** The inputs under {@code hold}. */
  Map<String, Double> hold(YamlSection section) {
    return section.has("hold") ? numbers.some(section, "hold") : Map.of();
  }

  /** The inputs under {@code limits}. */
  Map<String, Limit> limits(YamlSection section) {
    Map<String, Limit> all = new LinkedHashMap<>();
    Optional<YamlSection> limits = section.section("limits");
    if (limits.isEmpty() || inputs.isEmpty()) {
      return all;
    }
    limits.get().allowInputs(inputs);
    for (String name : inputs) {
      limits.get().get(name).flatMap(LimitBinder::limit).ifPresent(limit -> all.put(name, limit));
    }
    return all;
  }

  private static Optional<Limit> limit(YamlValue value) {
    Optional<List<YamlValue>> items = value.list();
    if (items.isEmpty()) {
      return Optional.empty();
    }
    if (items.get().size() != 2) {
      value.refuse("expects a least and a most, such as [0, 60000], found " + items.get().size());
      return Optional.empty();
    }
    OptionalDouble low = items.get().get(0).number();
    OptionalDouble high = items.get().get(1).numberOrInfinity();
    if (low.isEmpty() || high.isEmpty()) {
      return Optional.empty();
    }
    if (low.getAsDouble() < 0) {
      value.refuse("the least of an input cannot be below 0");
    } else if (high.getAsDouble() <= 0) {
      value.refuse("the most of an input must be above 0");
    } else if (low.getAsDouble() > high.getAsDouble()) {
      value.refuse(
          String.format(
              Locale.ROOT,
              "the least, %s, is above the most, %s; swap them",
              items.get().get(0).found(),
              items.get().get(1).found()));
    } else {
      return Optional.of(new Limit(low.getAsDouble(), high.getAsDouble()));
    }
    return Optional.empty();
  }

  /** Refuses what is held outside its limits, and a question in which nothing is left to choose. */
  void check(YamlSection section, Map<String, Double> hold, Map<String, Limit> limits) {
    for (Map.Entry<String, Double> held : hold.entrySet()) {
      Limit limit = limits.get(held.getKey());
      if (limit != null && (held.getValue() < limit.low() || held.getValue() > limit.high())) {
        section.refuse(
            "hold",
            String.format(
                Locale.ROOT,
                "`%s` is held at %s, outside its limits [%s, %s]",
                held.getKey(),
                held.getValue(),
                limit.low(),
                limit.high()));
      }
    }
    if (!hold.isEmpty() && hold.size() == inputs.size()) {
      section.refuse("hold", "every input is held, so nothing is left to choose");
    }
  }
}

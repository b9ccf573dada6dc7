package isowright.study;

import isowright.study.Study.Curve;
import isowright.study.Study.LeastCostQuestion;
import isowright.study.Study.Limit;
import isowright.study.Study.Productivity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads the least-cost questions of a study file and holds each against what is declared. */
final class PlanBinder {

  /** As in the example of the format; fine enough to draw a smooth curve. */
  private static final int USUAL_POINTS = 61;

  private static final int MOST_POINTS = 2001;

  private static final List<String> KEYS =
      List.of(
          "name",
          "technology",
          "target",
          "prices",
          "productivity",
          "period",
          "hold",
          "limits",
          "curve");
  private static final List<String> LATER =
      List.of("whole", "price-bands", "take-at-least", "budget", "output-price", "across");

  private final Declared declared;
  private final List<String> technologies;
  private final InputNumbers numbers;
  private final List<String> names = new ArrayList<>();

  /**
   * A reader of questions.
   *
   * @param declared what is declared of the records, with the names of the inputs
   * @param technologies the names of all technologies, fitted and given
   */
  PlanBinder(Declared declared, List<String> technologies) {
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
    this.numbers = new InputNumbers(declared.inputs());
  }

  /** The questions under {@code least-cost}. */
  List<LeastCostQuestion> bind(YamlSection root) {
    List<LeastCostQuestion> all = new ArrayList<>();
    for (YamlValue item : root.get("least-cost").flatMap(YamlValue::list).orElse(List.of())) {
      item.section().flatMap(this::question).ifPresent(all::add);
    }
    return all;
  }

  private Optional<LeastCostQuestion> question(YamlSection section) {
    section.allow("a least-cost question", KEYS, LATER);
    Optional<String> name =
        section
            .need("name", "what the question is called, such as `name: Plan 2025`")
            .flatMap(YamlValue::text);
    name.ifPresent(
        written -> {
          if (names.contains(written)) {
            section.refuse("name", "two questions are called `" + YamlValue.quote(written) + "`");
          }
          names.add(written);
        });
    Optional<OptionalDouble> target = target(section);
    List<String> wanted = technologies(section);
    Map<String, Double> prices = prices(section);
    Productivity productivity = productivity(section);
    Optional<String> period = section.text("period");
    if (section.has("period") && !declared.period()) {
      section.refuse("period", "a period is named, but `records.period` names no column");
    }
    Map<String, Double> hold = section.has("hold") ? numbers.some(section, "hold") : Map.of();
    Map<String, Limit> limits = limits(section);
    checkHeld(section, hold, limits);
    Optional<Curve> curve = section.section("curve").flatMap(PlanBinder::curve);
    if (name.isEmpty() || target.isEmpty() || target.get().isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new LeastCostQuestion(
            name.get(),
            wanted,
            target.get().getAsDouble(),
            prices,
            productivity,
            period,
            hold,
            limits,
            curve));
  }

  private static Optional<OptionalDouble> target(YamlSection section) {
    if (!section.has("target") && (section.has("budget") || section.has("output-price"))) {
      return Optional.empty(); // the refusal of the other key says enough
    }
    return section
        .need("target", "the output to be reached, such as `target: 52000`")
        .map(YamlValue::positive);
  }

  private List<String> technologies(YamlSection section) {
    Optional<YamlValue> value = section.get("technology");
    if (value.isEmpty()) {
      return List.of();
    }
    List<String> wanted =
        value.get().isList() ? value.get().texts() : value.get().text().stream().toList();
    for (String name : wanted) {
      if (!technologies.contains(name)) {
        section.refuse(
            "technology",
            "`"
                + YamlValue.quote(name)
                + "` is neither fitted nor given"
                + YamlValue.nearest(name, technologies)
                + "; technologies of this study: "
                + String.join(", ", technologies));
      }
    }
    if (value.get().isList() && wanted.isEmpty()) {
      section.refuse("technology", "the list is empty; take it out to ask all technologies");
    }
    return wanted;
  }

  private Map<String, Double> prices(YamlSection section) {
    if (section.has("prices")) {
      Optional<double[]> all = numbers.positive(section, "prices");
      Map<String, Double> prices = new LinkedHashMap<>();
      for (int i = 0; all.isPresent() && i < declared.inputs().size(); i++) {
        prices.put(declared.inputs().get(i), all.get()[i]);
      }
      return prices;
    }
    if (!declared.present()) {
      section.lacks(
          "prices", "there are no records to take them from, so name one for every input");
    } else if (!declared.unpriced().isEmpty()) {
      section.lacks(
          "prices",
          "the records have neither price nor spending of "
              + String.join(", ", declared.unpriced())
              + "; name a price for every input here, or a column there");
    }
    return Map.of();
  }

  private Productivity productivity(YamlSection section) {
    Optional<YamlValue> value = section.get("productivity");
    if (value.isEmpty()) {
      return Productivity.TYPICAL;
    }
    Productivity read = ProductivityWords.read(value.get(), true);
    if (read.kind() == Productivity.Kind.PLANT && !declared.plant()) {
      section.refuse("productivity", "a plant is named, but `records.plant` names no column");
    } else if (read.kind() == Productivity.Kind.BEST_QUARTER && !declared.present()) {
      section.refuse("productivity", "there are no records in which to find the best quarter");
    }
    return read;
  }

  private Map<String, Limit> limits(YamlSection section) {
    Map<String, Limit> all = new LinkedHashMap<>();
    Optional<YamlSection> limits = section.section("limits");
    if (limits.isEmpty() || declared.inputs().isEmpty()) {
      return all;
    }
    limits.get().allowInputs(declared.inputs());
    for (String name : declared.inputs()) {
      limits.get().get(name).flatMap(PlanBinder::limit).ifPresent(limit -> all.put(name, limit));
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

  private void checkHeld(YamlSection section, Map<String, Double> hold, Map<String, Limit> limits) {
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
    if (!hold.isEmpty() && hold.size() == declared.inputs().size()) {
      section.refuse("hold", "every input is held, so nothing is left to choose");
    }
  }

  private static Optional<Curve> curve(YamlSection section) {
    section.allow("`curve`", List.of("from", "to", "points"), List.of());
    OptionalDouble from =
        section
            .need("from", "the lowest target of the curve")
            .map(YamlValue::positive)
            .orElse(OptionalDouble.empty());
    OptionalDouble to =
        section
            .need("to", "the highest target of the curve")
            .map(YamlValue::positive)
            .orElse(OptionalDouble.empty());
    int points =
        section
            .get("points")
            .map(value -> value.whole(2, MOST_POINTS).orElse(USUAL_POINTS))
            .orElse(USUAL_POINTS);
    if (from.isEmpty() || to.isEmpty()) {
      return Optional.empty();
    }
    if (from.getAsDouble() >= to.getAsDouble()) {
      section.refuse("from", "the curve must rise: `from` must be below `to`");
      return Optional.empty();
    }
    return Optional.of(new Curve(from.getAsDouble(), to.getAsDouble(), points));
  }
}

package isowright.study;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads the plants over which a target is split ({@code across}). */
final class AcrossBinder {

  private static final List<String> KEYS =
      List.of(
          "name", "plant", "technology", "capacity", "running-cost", "prices", "hold", "limits");

  /** What is said of one plant, not of the question, where a target is split. */
  private static final List<String> OF_ONE_PLANT =
      List.of("hold", "limits", "whole", "price-bands", "take-at-least", "productivity");

  private static final int MOST_PLANTS = 200;

  private final Declared declared;
  private final List<String> technologies;
  private final InputNumbers numbers;
  private final LimitBinder limits;

  AcrossBinder(Declared declared, List<String> technologies) {
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
    this.numbers = new InputNumbers(declared.inputs());
    this.limits = new LimitBinder(declared.inputs());
  }

  /** The plants under {@code across}; none where the key is not there. */
  List<PlanTerms.Plant> bind(YamlSection question) {
    Optional<List<YamlValue>> items = question.get("across").flatMap(YamlValue::list);
    if (items.isEmpty()) {
      return List.of();
    }
    for (String key : OF_ONE_PLANT) {
      if (question.has(key)) {
        boolean perPlant = KEYS.contains(key) || key.equals("productivity");
        question.refuse(
            key,
            "the target is split over plants, so `"
                + key
                + "` cannot be said of all of them; "
                + (perPlant
                    ? "say it of each plant under `across`"
                        + (key.equals("productivity") ? " with `plant`" : "")
                    : "take it out"));
      }
    }
    if (items.get().size() < 2 || items.get().size() > MOST_PLANTS) {
      question.refuse(
          "across",
          "a target is split over 2 to " + MOST_PLANTS + " plants, found " + items.get().size());
    }
    List<PlanTerms.Plant> plants = new ArrayList<>();
    for (YamlValue item : items.get()) {
      item.section().ifPresent(section -> plants.add(plant(section, plants, question)));
    }
    return plants;
  }

  private PlanTerms.Plant plant(
      YamlSection section, List<PlanTerms.Plant> before, YamlSection question) {
    section.allow("a plant under `across`", KEYS, List.of());
    Optional<String> plant = section.text("plant");
    if (section.has("plant") && !declared.plant()) {
      section.refuse("plant", "a plant is named, but `records.plant` names no column");
    }
    Optional<String> technology = technology(section);
    Map<String, Double> hold = limits.hold(section);
    Map<String, Study.Limit> limited = limits.limits(section);
    limits.check(section, hold, limited);
    OptionalDouble capacity =
        section.get("capacity").map(YamlValue::positive).orElse(OptionalDouble.empty());
    OptionalDouble running =
        section.get("running-cost").map(PurchaseBinder::notNegative).orElse(OptionalDouble.empty());
    return new PlanTerms.Plant(
        name(section, plant, technology, before),
        plant,
        technology,
        capacity.orElse(Double.POSITIVE_INFINITY),
        running.orElse(0),
        prices(section, question),
        hold,
        limited);
  }

  private Optional<String> technology(YamlSection section) {
    Optional<String> name = section.text("technology");
    name.filter(written -> !technologies.contains(written))
        .ifPresent(
            written ->
                section.refuse(
                    "technology",
                    "`"
                        + YamlValue.quote(written)
                        + "` is neither fitted nor given"
                        + YamlValue.nearest(written, technologies)
                        + "; technologies of this study: "
                        + String.join(", ", technologies)));
    return name;
  }

  private static String name(
      YamlSection section,
      Optional<String> plant,
      Optional<String> technology,
      List<PlanTerms.Plant> before) {
    String wanted =
        section
            .text("name")
            .or(() -> plant)
            .or(() -> technology)
            .orElse("plant " + (before.size() + 1));
    List<String> taken = before.stream().map(PlanTerms.Plant::name).toList();
    if (taken.contains(wanted) && (section.has("name") || section.has("plant"))) {
      section.refuse(
          section.has("name") ? "name" : "plant",
          "`" + YamlValue.quote(wanted) + "` stands twice under `across`; give each a `name`");
    }
    String name = wanted;
    for (int other = 2; taken.contains(name); other++) {
      name = wanted + " (" + other + ")";
    }
    return name;
  }

  private Map<String, Double> prices(YamlSection section, YamlSection question) {
    if (section.has("prices")) {
      Map<String, Double> prices = new LinkedHashMap<>();
      numbers
          .positive(section, "prices")
          .ifPresent(
              all -> {
                for (int i = 0; i < all.length; i++) {
                  prices.put(declared.inputs().get(i), all[i]);
                }
              });
      return prices;
    }
    if (!question.has("prices") && !declared.present()) {
      section.lacks(
          "prices", "there are no records to take them from, so name one for every input");
    }
    return Map.of();
  }
}

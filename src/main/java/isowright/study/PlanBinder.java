package isowright.study;

import isowright.leastcost.Goal;
import isowright.leastcost.PriceSchedule;
import isowright.study.Study.Curve;
import isowright.study.Study.LeastCostQuestion;
import isowright.study.Study.Limit;
import isowright.study.Study.Productivity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads the least-cost questions of a study file and holds each against what is declared. */
final class PlanBinder {

  /** As in the example of the format; fine enough to draw a smooth curve. */
  private static final int USUAL_POINTS = 61;

  private static final int MOST_POINTS = 2001;

  /** More targets than a table of answers can hold. */
  private static final int MOST_TARGETS = 50;

  private static final List<String> KEYS =
      List.of(
          "name",
          "technology",
          "target",
          "budget",
          "output-price",
          "prices",
          "price-bands",
          "productivity",
          "period",
          "hold",
          "limits",
          "take-at-least",
          "whole",
          "across",
          "curve");

  private static final List<String> GOALS = List.of("target", "budget", "output-price");

  private final Declared declared;
  private final List<String> technologies;
  private final InputNumbers numbers;
  private final List<String> further;
  private final LimitBinder limits;
  private final PurchaseBinder purchases;
  private final AcrossBinder across;
  private final List<String> names = new ArrayList<>();
  private int place;
  private boolean frontier;

  /**
   * A reader of questions.
   *
   * @param declared what is declared of the records, with the names of the inputs
   * @param technologies the names of all technologies, fitted and given
   */
  PlanBinder(Declared declared, List<String> technologies) {
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
    this.further = declared.costs().map(costs -> costs.others(declared.inputs())).orElse(List.of());
    List<String> names = new ArrayList<>(declared.inputs());
    names.addAll(further);
    this.numbers = new InputNumbers(names);
    this.limits = new LimitBinder(names);
    this.purchases = new PurchaseBinder(declared.inputs());
    this.across = new AcrossBinder(declared, technologies);
  }

  /** The same of technologies of which some have a frontier. */
  PlanBinder besideFrontier(boolean there) {
    frontier = there;
    return this;
  }

  /** The questions under {@code least-cost}; one for each target. */
  List<LeastCostQuestion> bind(YamlSection root) {
    List<LeastCostQuestion> all = new ArrayList<>();
    frontier |= FrontierBinder.asked(root);
    for (YamlValue item : root.get("least-cost").flatMap(YamlValue::list).orElse(List.of())) {
      place++;
      item.section().map(this::questions).ifPresent(all::addAll);
    }
    return all;
  }

  private List<LeastCostQuestion> questions(YamlSection section) {
    section.allow("a least-cost question", KEYS, List.of());
    Optional<String> name =
        section
            .need("name", "what the question is called, such as `name: Plan 2025`")
            .flatMap(YamlValue::text);
    name.ifPresent(written -> claim(section, written));
    List<Goal> goals = goals(section);
    List<String> wanted = technologies(section);
    Map<String, Double> hold = limits.hold(section);
    Map<String, Limit> limited = limits.limits(section);
    limits.check(section, hold, limited);
    Map<String, PriceSchedule> bands = purchases.bands(section);
    Map<String, Double> take = purchases.takeAtLeast(section, hold, limited, bands);
    List<String> whole = purchases.whole(section, hold, limited);
    List<PlanTerms.Plant> plants = across.bind(section);
    Map<String, Double> prices = prices(section, plants);
    Productivity productivity = productivity(section);
    Optional<String> period = section.text("period");
    if (section.has("period") && !declared.period()) {
      section.refuse("period", "a period is named, but `records.period` names no column");
    }
    Optional<YamlSection> curved = section.section("curve");
    Optional<Curve> curve = curved.flatMap(PlanBinder::curve);
    List<String> shortRun = curved.map(c -> shortRun(c, hold)).orElse(List.of());
    List<LeastCostQuestion> questions = new ArrayList<>();
    for (Goal goal : name.isPresent() ? goals : List.<Goal>of()) {
      PlanTerms terms =
          new PlanTerms(place, name.get(), goal, bands, take, whole, plants, shortRun);
      questions.add(
          new LeastCostQuestion(
              goals.size() == 1 ? name.get() : name.get() + ", " + target(goal),
              wanted,
              goal.fold(Goal.Target::output, budget -> Double.NaN, profit -> Double.NaN),
              prices,
              productivity,
              period,
              hold,
              limited,
              curve,
              terms));
    }
    return questions;
  }

  private void claim(YamlSection section, String name) {
    if (names.contains(name)) {
      section.refuse("name", "two questions are called `" + YamlValue.quote(name) + "`");
    }
    names.add(name);
  }

  private String target(Goal goal) {
    double output = goal.fold(Goal.Target::output, b -> Double.NaN, p -> Double.NaN);
    return PlanWords.number(output, declared.outputUnit().orElse(""));
  }

  /** The targets, or the budget, or the price of output; none where that cannot be told. */
  private static List<Goal> goals(YamlSection section) {
    List<String> there = GOALS.stream().filter(section::has).toList();
    if (there.isEmpty()) {
      section.lacks(
          "target",
          "the output to be reached, such as `target: 52000`; or `budget` for the most output, or"
              + " `output-price` for the most profit");
      return List.of();
    }
    for (String more : there.subList(1, there.size())) {
      section.refuse(
          more,
          "`"
              + there.get(0)
              + "` and `"
              + more
              + "` are two goals; one question has one of "
              + String.join(", ", GOALS));
    }
    if (section.has("across") && !section.has("target")) {
      section.refuse("across", "only a `target` can be split over plants");
    }
    YamlValue value = section.get(there.get(0)).orElseThrow();
    if (value.isList() && there.get(0).equals("target")) {
      return targets(value);
    }
    OptionalDouble number = value.positive();
    if (number.isEmpty()) {
      return List.of();
    }
    double goal = number.getAsDouble();
    return List.of(
        switch (there.get(0)) {
          case "budget" -> new Goal.Budget(goal);
          case "output-price" -> new Goal.Profit(goal);
          default -> new Goal.Target(goal);
        });
  }

  private static List<Goal> targets(YamlValue value) {
    List<Goal> targets = new ArrayList<>();
    List<YamlValue> items = value.list().orElse(List.of());
    if (items.isEmpty() || items.size() > MOST_TARGETS) {
      value.refuse("expects 1 to " + MOST_TARGETS + " targets, found " + items.size());
      return targets;
    }
    for (YamlValue item : items) {
      OptionalDouble number = item.positive();
      if (number.isPresent()) {
        Goal goal = new Goal.Target(number.getAsDouble());
        if (targets.contains(goal)) {
          item.refuse("the target " + item.found() + " stands twice; once is enough");
        } else {
          targets.add(goal);
        }
      }
    }
    return targets;
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

  /** Prices of the inputs that have none in bands. */
  private Map<String, Double> prices(YamlSection section, List<PlanTerms.Plant> plants) {
    List<String> banded =
        section
            .get("price-bands")
            .filter(YamlValue::isMapping)
            .flatMap(YamlValue::section)
            .map(YamlSection::keys)
            .orElse(List.of());
    List<String> needed =
        declared.inputs().stream().filter(name -> !banded.contains(name)).toList();
    if (section.has("prices")) {
      Map<String, Double> prices = new LinkedHashMap<>();
      if (banded.isEmpty() && further.isEmpty()) {
        Optional<double[]> all = numbers.positive(section, "prices");
        for (int i = 0; all.isPresent() && i < declared.inputs().size(); i++) {
          prices.put(declared.inputs().get(i), all.get()[i]);
        }
        return prices;
      }
      prices.putAll(numbers.some(section, "prices"));
      List<String> written = section.section("prices").map(YamlSection::keys).orElse(List.of());
      List<String> missing = needed.stream().filter(name -> !written.contains(name)).toList();
      if (!missing.isEmpty()) {
        section.refuse(
            "prices",
            "every input needs a price here or bands under `price-bands`; missing: "
                + String.join(", ", missing));
      }
      return prices;
    }
    if (!plants.isEmpty() && plants.stream().noneMatch(plant -> plant.prices().isEmpty())) {
      return Map.of();
    }
    List<String> unpriced = declared.unpriced().stream().filter(needed::contains).toList();
    if (!declared.present() && !needed.isEmpty()) {
      section.lacks(
          "prices", "there are no records to take them from, so name one for every input");
    } else if (!unpriced.isEmpty()) {
      section.lacks(
          "prices",
          "the records have neither price nor spending of "
              + String.join(", ", unpriced)
              + "; name a price for every input here, or a column there");
    }
    return Map.of();
  }

  private Productivity productivity(YamlSection section) {
    Optional<YamlValue> value = section.get("productivity");
    if (value.isEmpty()) {
      return Productivity.TYPICAL;
    }
    Productivity read = ProductivityWords.read(value.get(), true, frontier);
    if (read.kind() == Productivity.Kind.PLANT && !declared.plant()) {
      section.refuse("productivity", "a plant is named, but `records.plant` names no column");
    } else if (read.kind() == Productivity.Kind.BEST_QUARTER && !declared.present()) {
      section.refuse("productivity", "there are no records in which to find the best quarter");
    }
    return read;
  }

  /** The inputs that a short-run curve holds at the plan. */
  private List<String> shortRun(YamlSection curve, Map<String, Double> hold) {
    List<String> names = curve.get("short-run").map(YamlValue::texts).orElse(List.of());
    for (String name : names) {
      if (!declared.inputs().contains(name) && !further.contains(name)) {
        curve.refuse(
            "short-run",
            "`"
                + YamlValue.quote(name)
                + "` is not an input"
                + YamlValue.nearest(name, declared.inputs())
                + "; inputs: "
                + String.join(", ", declared.inputs()));
      }
    }
    if (!names.isEmpty() && !hold.isEmpty()) {
      curve.refuse("short-run", "the question holds inputs already, so its curve is the short run");
    } else if (!names.isEmpty() && names.size() >= declared.inputs().size()) {
      curve.refuse("short-run", "one input at least must be free to change");
    }
    return names;
  }

  private static Optional<Curve> curve(YamlSection section) {
    section.allow("`curve`", List.of("from", "to", "points", "short-run"), List.of());
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

package isowright.study;

import isowright.leastcost.PriceSchedule;
import isowright.leastcost.PriceSchedule.Band;
import isowright.study.Study.Limit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reads how inputs can be bought: prices in bands, whole units, quantities paid for whether used or
 * not.
 */
final class PurchaseBinder {

  private static final List<String> BAND_KEYS = List.of("to", "price", "step", "all-units");

  /** More bands than any tariff has; the search divides over their combinations. */
  private static final int MOST_BANDS = 50;

  private final List<String> inputs;
  private final InputNumbers numbers;

  PurchaseBinder(List<String> inputs) {
    this.inputs = List.copyOf(inputs);
    this.numbers = new InputNumbers(inputs);
  }

  /** The inputs under {@code price-bands}. */
  Map<String, PriceSchedule> bands(YamlSection section) {
    Map<String, PriceSchedule> all = new LinkedHashMap<>();
    Optional<YamlSection> banded = section.section("price-bands");
    if (banded.isEmpty() || inputs.isEmpty()) {
      return all;
    }
    banded.get().allowInputs(inputs);
    Optional<YamlSection> prices =
        section.get("prices").filter(YamlValue::isMapping).flatMap(YamlValue::section);
    for (String name : inputs) {
      Optional<YamlValue> value = banded.get().get(name);
      value.flatMap(PurchaseBinder::schedule).ifPresent(schedule -> all.put(name, schedule));
      if (value.isPresent() && prices.map(p -> p.has(name)).orElse(false)) {
        banded
            .get()
            .refuse(name, "`" + name + "` has a price under `prices` too; keep one of the two");
      }
    }
    return all;
  }

  private static Optional<PriceSchedule> schedule(YamlValue value) {
    Optional<List<YamlValue>> items = value.list();
    if (items.isEmpty()) {
      return Optional.empty();
    }
    int size = items.get().size();
    if (size == 0 || size > MOST_BANDS) {
      value.refuse(
          "expects 1 to "
              + MOST_BANDS
              + " bands such as [{to: 40000, price: 31.5}, {price: 47.25}], found "
              + size);
      return Optional.empty();
    }
    List<Band> bands = new ArrayList<>();
    double before = 0;
    for (int k = 0; k < size; k++) {
      Optional<Band> band = items.get().get(k).section().flatMap(PurchaseBinder::band);
      if (band.isEmpty()) {
        continue;
      }
      boolean last = k == size - 1;
      if (!last && Double.isInfinite(band.get().to())) {
        items.get().get(k).refuse("`to` is missing: only the last band has no end");
      } else if (band.get().to() <= before) {
        items
            .get()
            .get(k)
            .refuse(
                String.format(
                    Locale.ROOT,
                    "the band ends at %s, not above %s where the one before it ends; bands stand"
                        + " in rising order",
                    PlanWords.plain(band.get().to()),
                    PlanWords.plain(before)));
      } else {
        before = band.get().to();
        bands.add(band.get());
      }
    }
    return bands.size() == size ? Optional.of(PriceSchedule.of(bands)) : Optional.empty();
  }

  private static Optional<Band> band(YamlSection section) {
    section.allow("a price band", BAND_KEYS, List.of());
    OptionalDouble price =
        section
            .need("price", "money per unit in this band")
            .map(YamlValue::positive)
            .orElse(OptionalDouble.empty());
    OptionalDouble to =
        section
            .get("to")
            .map(YamlValue::positive)
            .orElse(OptionalDouble.of(Double.POSITIVE_INFINITY));
    OptionalDouble step =
        section.get("step").map(PurchaseBinder::notNegative).orElse(OptionalDouble.of(0));
    boolean allUnits = section.get("all-units").flatMap(YamlValue::flag).orElse(false);
    return price.isPresent() && to.isPresent() && step.isPresent()
        ? Optional.of(new Band(to.getAsDouble(), price.getAsDouble(), step.getAsDouble(), allUnits))
        : Optional.empty();
  }

  /** A number of zero or more. */
  static OptionalDouble notNegative(YamlValue value) {
    OptionalDouble number = value.number();
    if (number.isPresent() && number.getAsDouble() < 0) {
      value.refuse("expects 0 or more, found " + value.found());
      return OptionalDouble.empty();
    }
    return number;
  }

  /** The inputs under {@code take-at-least}, held against what can be had of them. */
  Map<String, Double> takeAtLeast(
      YamlSection section,
      Map<String, Double> hold,
      Map<String, Limit> limits,
      Map<String, PriceSchedule> bands) {
    if (!section.has("take-at-least")) {
      return Map.of();
    }
    Map<String, Double> take = numbers.some(section, "take-at-least");
    YamlSection written = section.section("take-at-least").orElse(section);
    take.forEach(
        (name, least) -> {
          double most =
              Math.min(
                  limits.containsKey(name) ? limits.get(name).high() : Double.POSITIVE_INFINITY,
                  bands.containsKey(name) ? bands.get(name).most() : Double.POSITIVE_INFINITY);
          if (hold.containsKey(name) && hold.get(name) < least) {
            written.refuse(
                name,
                String.format(
                    Locale.ROOT,
                    "at least %s of `%s` must be taken, but it is held at %s",
                    PlanWords.plain(least),
                    name,
                    PlanWords.plain(hold.get(name))));
          } else if (least > most) {
            written.refuse(
                name,
                String.format(
                    Locale.ROOT,
                    "at least %s of `%s` must be taken, but at most %s can be had",
                    PlanWords.plain(least),
                    name,
                    PlanWords.plain(most)));
          }
        });
    return take;
  }

  /** The inputs under {@code whole}. */
  List<String> whole(YamlSection section, Map<String, Double> hold, Map<String, Limit> limits) {
    if (!section.has("whole")) {
      return List.of();
    }
    List<String> whole = new ArrayList<>();
    for (String name : section.get("whole").map(YamlValue::texts).orElse(List.of())) {
      if (!inputs.contains(name)) {
        section.refuse(
            "whole",
            "`"
                + YamlValue.quote(name)
                + "` is not an input"
                + YamlValue.nearest(name, inputs)
                + "; inputs: "
                + String.join(", ", inputs));
        continue;
      }
      whole.add(name);
      Double held = hold.get(name);
      Limit limit = limits.get(name);
      if (held != null && held != Math.rint(held)) {
        section.refuse(
            "whole",
            "`" + name + "` comes in whole units, but is held at " + PlanWords.plain(held));
      } else if (limit != null && Math.ceil(limit.low()) > Math.floor(limit.high())) {
        section.refuse(
            "whole",
            String.format(
                Locale.ROOT,
                "`%s` comes in whole units, but there is no whole number from %s to %s",
                name,
                PlanWords.plain(limit.low()),
                PlanWords.plain(limit.high())));
      }
    }
    return whole;
  }
}

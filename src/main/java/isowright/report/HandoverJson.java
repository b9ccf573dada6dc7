package isowright.report;

import isowright.study.Handover;
import isowright.study.Handover.Saved;
import isowright.study.Recorded;
import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The part of the technology file that the command {@code plan} reads: technologies with their
 * covariance at every period and level, and what a plan must know of the records. No row of the
 * records is in it.
 */
final class HandoverJson {

  private HandoverJson() {}

  static void write(JsonFile file, Handover handover, List<String> inputs) throws IOException {
    file.object(
        "handover",
        () -> {
          if (handover.recorded().isPresent()) {
            Recorded recorded = handover.recorded().get();
            file.object("records", () -> recorded(file, recorded, inputs));
          }
          file.list(
              "technologies", handover.technologies(), false, saved -> saved(file, saved, inputs));
        });
  }

  private static void recorded(JsonFile file, Recorded recorded, List<String> inputs)
      throws IOException {
    file.texts("periods", recorded.periods());
    file.texts("plants", recorded.plants());
    file.truth("plantsRepeat", recorded.repeated());
    file.number("leastOutput", recorded.leastOutput());
    file.number("mostOutput", recorded.mostOutput());
    Map<String, Double> prices = new LinkedHashMap<>();
    for (int i = 0; i < inputs.size(); i++) {
      if (Double.isFinite(recorded.prices()[i])) {
        prices.put(inputs.get(i), recorded.prices()[i]);
      }
    }
    file.numbersByName("prices", prices);
    file.object(
        "priceRanges",
        () -> {
          for (int i = 0; i < inputs.size(); i++) {
            if (recorded.priceRanges().get(i).isPresent()) {
              file.numbers(inputs.get(i), recorded.priceRanges().get(i).get());
            }
          }
        });
    file.object(
        "support",
        () -> {
          file.numbers("mean", recorded.support().mean());
          file.numbers("least", recorded.support().least());
          file.numbers("most", recorded.support().most());
          file.matrix("inverse", recorded.support().inverse());
          file.number("farthest", recorded.support().farthest());
        });
  }

  private static void saved(JsonFile file, Saved saved, List<String> inputs) throws IOException {
    file.text("name", saved.name());
    file.truth("fitted", saved.fitted());
    file.text("form", saved.form());
    Map<String, Double> base = new LinkedHashMap<>();
    for (int i = 0; i < inputs.size(); i++) {
      base.put(inputs.get(i), saved.base()[i]);
    }
    file.numbersByName("base", base);
    file.texts("parameterNames", saved.parameterNames());
    file.numbers("parameters", saved.parameters());
    if (!saved.fitted()) {
      return;
    }
    file.number("degreesOfFreedom", saved.degreesOfFreedom());
    file.matrix("byPeriod", saved.byPeriod().toArray(new double[0][]));
    file.list(
        "maps",
        saved.maps(),
        false,
        kind -> file.list("byPeriod", kind, true, map -> file.matrix("map", map)));
    file.list(
        "levels",
        saved.levels(),
        true,
        level -> {
          file.whole("map", level.map());
          file.numbers("constants", level.constants());
          file.matrix("covariance", level.covariance());
        });
  }
}

package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.RegularityImposed;
import isowright.estimation.Specification.StandardErrors;
import isowright.regression.OneSidedLaw;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Reads {@code frontier} under {@code estimation} and holds it against the columns declared, the
 * forms asked and the other words of the section.
 */
final class FrontierBinder {

  private static final String KEY = "frontier";

  private static final Set<StandardErrors> ERRORS =
      Set.of(StandardErrors.CLASSICAL, StandardErrors.ROBUST, StandardErrors.CLUSTERED);

  private final YamlSection estimation;
  private final Declared declared;
  private final List<String> technologies;

  FrontierBinder(YamlSection estimation, Declared declared, List<String> technologies) {
    this.estimation = estimation;
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
  }

  /** Whether a study asks for a frontier. */
  static boolean asked(YamlSection root) {
    return root.get("estimation")
        .filter(YamlValue::isMapping)
        .flatMap(YamlValue::section)
        .map(section -> section.has(KEY))
        .orElse(false);
  }

  Optional<Estimator> bind(PlantEffects plants, Optional<StandardErrors> errors) {
    if (!estimation.has(KEY)) {
      return Optional.empty();
    }
    forms();
    together(plants, errors);
    return estimation.section(KEY).flatMap(this::frontier);
  }

  private Optional<Estimator> frontier(YamlSection section) {
    section.allow("`frontier`", List.of("inefficiency", "over-time"), List.of());
    Optional<OneSidedLaw> law =
        section
            .need("inefficiency", "the law of inefficiency, half-normal or exponential")
            .flatMap(value -> value.word(List.of("half-normal", "exponential"), List.of()))
            .map(
                word ->
                    word.equals("half-normal") ? OneSidedLaw.HALF_NORMAL : OneSidedLaw.EXPONENTIAL);
    OverTime overTime =
        section
            .get("over-time")
            .flatMap(value -> value.word(List.of("constant", "decay"), List.of()))
            .map(word -> word.equals("decay") ? OverTime.DECAY : OverTime.CONSTANT)
            .orElse(OverTime.EACH_ROW);
    if (overTime != OverTime.EACH_ROW && !declared.plant()) {
      section.refuse(
          "over-time",
          "`"
              + overTime.word()
              + "` speaks of a plant over several periods, but `records.plant` names no column;"
              + " take this out, and every row has its own inefficiency");
    } else if (overTime == OverTime.DECAY && !declared.period()) {
      section.refuse(
          "over-time",
          "`decay` needs periods, but `records.period` names no column; set this to constant, or"
              + " take it out");
    }
    return law.map(l -> new Estimator.Frontier(l, overTime));
  }

  private void forms() {
    if (technologies.isEmpty()) {
      estimation.refuse(
          KEY,
          "a frontier is fitted to a technology, but `technologies` names none; add cobb-douglas or"
              + " translog, or take this out");
    } else if (technologies.stream().noneMatch(name -> Form.named(name) instanceof LinearForm)) {
      estimation.refuse(
          KEY,
          "a frontier is carried out for forms linear in their parameters, and none of the"
              + " technologies asked is ("
              + String.join(", ", technologies)
              + "); add cobb-douglas or translog, or take this out");
    }
  }

  private void together(PlantEffects plants, Optional<StandardErrors> errors) {
    if (plants != PlantEffects.NONE) {
      estimation.refuse(
          estimation.has("plant-effects") ? "plant-effects" : "time",
          "`"
              + plants.word()
              + "` takes what lasts in a plant for its level, and a frontier takes it for"
              + " inefficiency; set plant-effects to none and write `frontier: {…, over-time:"
              + " constant}`, which has one inefficiency a plant (that from plant effects is shown"
              + " beside it), or take `frontier` out");
    }
    for (String other : List.of("instruments", "proxy")) {
      if (estimation.has(other)) {
        estimation.refuse(
            other,
            "`"
                + other
                + "` and `frontier` are two principles of estimation and cannot be joined; take one"
                + " of them out");
      }
    }
    if (estimation.get("zeros").flatMap(YamlValue::text).equals(Optional.of("dummy"))) {
      estimation.refuse(
          "zeros",
          "`dummy` is carried out for least squares and not for a frontier; set this to drop, or"
              + " take `frontier` out");
    }
    errors
        .filter(kind -> !ERRORS.contains(kind))
        .ifPresent(
            kind ->
                estimation.refuse(
                    "standard-errors",
                    "`"
                        + kind.word()
                        + "` is not carried out for the likelihood of a frontier; set this to"
                        + " classical, robust or clustered"));
    if (estimation.has("regularity")
        && !RegularityImposed.FREE
            .word()
            .equals(estimation.get("regularity").flatMap(YamlValue::text).orElse("free"))) {
      estimation.refuse(
          "regularity",
          "regularity is not imposed on a frontier; set this to free (it is tested afterwards), or"
              + " take `frontier` out");
    }
  }
}

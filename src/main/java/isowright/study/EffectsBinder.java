package isowright.study;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.Time;
import isowright.regression.VarianceComponents;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import java.util.List;

/**
 * Reads what is to be done about plants and about time, and holds the words against one another,
 * against the columns declared and against the forms asked.
 */
final class EffectsBinder {

  private final YamlSection section;
  private final Declared declared;
  private final List<String> technologies;

  EffectsBinder(YamlSection section, Declared declared, List<String> technologies) {
    this.section = section;
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
  }

  /**
   * What is to be done.
   *
   * @param plants about plants
   * @param time about time
   * @param components how variances of random effects are estimated
   */
  record Effects(PlantEffects plants, Time time, VarianceComponents.Method components) {}

  Effects bind() {
    Time time = StudyBinder.choice(section, "time", Time.values(), Time::word).orElse(Time.NONE);
    PlantEffects plants =
        StudyBinder.choice(section, "plant-effects", PlantEffects.values(), PlantEffects::word)
            // Two-way names plant effects itself, so they need not be asked for twice.
            .orElse(time == Time.TWO_WAY ? PlantEffects.WITHIN : PlantEffects.NONE);
    VarianceComponents.Method components =
        StudyBinder.choice(
                section,
                "variance-components",
                VarianceComponents.Method.values(),
                VarianceComponents.Method::word)
            .orElse(VarianceComponents.Method.SWAMY_ARORA);
    columns(plants, time);
    together(plants, time, components);
    forms(plants, time);
    return new Effects(plants, time, components);
  }

  private void columns(PlantEffects plants, Time time) {
    if (plants != PlantEffects.NONE && !declared.plant()) {
      section.refuse(
          section.has("plant-effects") ? "plant-effects" : "time",
          "`"
              + (section.has("plant-effects") ? plants.word() : time.word())
              + "` needs plants, but `records.plant` names no column");
    }
    if (time != Time.NONE && !declared.period()) {
      section.refuse(
          "time", "`" + time.word() + "` needs periods, but `records.period` names no column");
    } else if (plants == PlantEffects.DIFFERENCES && !declared.period()) {
      section.refuse(
          "plant-effects", "`differences` needs periods, but `records.period` names no column");
    }
  }

  private void together(PlantEffects plants, Time time, VarianceComponents.Method components) {
    if (time == Time.TWO_WAY && plants != PlantEffects.WITHIN) {
      section.refuse(
          "time",
          "`two-way` means plant and period effects, which `plant-effects: "
              + plants.word()
              + "` contradicts; set plant-effects to within, or time to period-effects");
    }
    if (plants == PlantEffects.BETWEEN && time != Time.NONE) {
      section.refuse(
          "time",
          "`between` uses the mean of each plant over its periods, in which no change over time is"
              + " left; set time to none, or plant-effects to random or within");
    }
    if (section.has("variance-components") && !plants.random()) {
      section.refuse(
          "variance-components",
          "variances of random effects are asked for, but plant-effects is "
              + plants.word()
              + "; set it to random or mundlak, or take this out");
    } else if (plants == PlantEffects.MUNDLAK && components == VarianceComponents.Method.AMEMIYA) {
      section.refuse(
          "variance-components",
          "`amemiya` rests on what varies within plants, which plant means do not; set it to"
              + " swamy-arora or wallace-hussain");
    }
  }

  /** A form that cannot be fitted as asked is refused by itself; here it is when all cannot. */
  private void forms(PlantEffects plants, Time time) {
    boolean none =
        !technologies.isEmpty()
            && technologies.stream().noneMatch(name -> Form.named(name) instanceof LinearForm);
    String remedy =
        ", and none of the technologies asked is ("
            + String.join(", ", technologies)
            + "); add cobb-douglas or translog, or set this to ";
    if (none && !plants.anyForm()) {
      section.refuse(
          "plant-effects",
          "`"
              + plants.word()
              + "` is defined here for forms linear in their parameters"
              + remedy
              + "within or none");
    }
    if (none && time == Time.BIASED_TREND) {
      section.refuse(
          "time",
          "`biased-trend` is defined here for forms linear in their parameters"
              + remedy
              + "trend or quadratic-trend");
    }
  }
}

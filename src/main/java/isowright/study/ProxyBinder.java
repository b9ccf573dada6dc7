package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Series;
import isowright.estimation.Specification.PlantEffects;
import isowright.records.Roles;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code proxy} of {@code estimation}, a control function. */
final class ProxyBinder {

  /** Of both polynomials of a control function: common practice. */
  private static final int USUAL_DEGREE = 3;

  private static final Drawing USUAL_DRAWING = new Drawing(199, 1);

  private final YamlSection section;
  private final Declared declared;

  ProxyBinder(YamlSection section, Declared declared) {
    this.section = section;
    this.declared = declared;
  }

  /**
   * The control function asked for.
   *
   * @param resampling how plants are drawn, where the study says so
   */
  Optional<Estimator> bind(EffectsBinder.Effects effects, Optional<Drawing> resampling) {
    Optional<YamlSection> written = section.section("proxy");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection proxy = written.get();
    proxy.allow("`proxy`", List.of("column", "state", "log", "degree", "process"), List.of());
    Optional<YamlValue> column =
        proxy.need(
            "column",
            "what rises with productivity, an input such as energy or another column such as"
                + " investment");
    Optional<String> name = column.flatMap(YamlValue::text);
    boolean sound = name.isPresent() && proxyColumn(column.get(), name.get());
    Optional<Boolean> log = proxy.get("log").flatMap(YamlValue::flag);
    int degree = proxy.get("degree").map(v -> v.whole(1, 4).orElse(1)).orElse(USUAL_DEGREE);
    int process = proxy.get("process").map(v -> v.whole(1, 4).orElse(1)).orElse(USUAL_DEGREE);
    List<String> states = states(proxy, name);
    periods();
    if (effects.plants() != PlantEffects.NONE) {
      section.refuse(
          "proxy",
          "a control function lets productivity move from period to period, and is not carried out"
              + " with `plant-effects: "
              + effects.plants().word()
              + "`; set plant-effects to none");
    }
    if (section.has("standard-errors")) {
      section
          .get("standard-errors")
          .flatMap(YamlValue::raw)
          .filter(word -> !word.equals("clustered"))
          .ifPresent(
              word ->
                  section.refuse(
                      "standard-errors",
                      "errors of a control function are the spread over draws of whole plants; set"
                          + " this to clustered, or take it out"));
    }
    EndogenousBinder.biased(section, "proxy", effects);
    return sound && !states.isEmpty()
        ? Optional.of(
            new Estimator.Proxy(
                new Series(name.get(), 0, log),
                states,
                degree,
                process,
                resampling.orElse(USUAL_DRAWING)))
        : Optional.empty();
  }

  private List<String> states(YamlSection proxy, Optional<String> column) {
    List<String> states = new ArrayList<>();
    Optional<YamlValue> written =
        proxy.need(
            "state",
            "the inputs that are fixed before productivity of the period is known, such as `state:"
                + " [machines]`; the others are free");
    for (YamlValue item : written.flatMap(YamlValue::list).orElse(List.of())) {
      Optional<String> input = item.word(declared.inputs(), List.of());
      if (input.isPresent() && input.equals(column)) {
        item.refuse(
            "`"
                + input.get()
                + "` is the proxy, which moves with productivity of the same period and is no"
                + " state; take it out here");
      } else if (input.isPresent() && states.contains(input.get())) {
        item.refuse("`" + input.get() + "` stands twice in this list; once is enough");
      } else {
        input.ifPresent(states::add);
      }
    }
    if (written.isPresent()
        && written.get().isList()
        && written.get().list().orElse(List.of()).isEmpty()) {
      written.get().refuse("the list is empty; name an input that is fixed beforehand");
    }
    if (!declared.inputs().isEmpty() && states.containsAll(declared.inputs())) {
      proxy.refuse(
          "state",
          "every input is a state, so none is chosen knowing productivity; leave the free ones"
              + " out");
    }
    return states;
  }

  private void periods() {
    if (!declared.plant() || !declared.period()) {
      section.refuse(
          "proxy",
          "a control function follows each plant from period to period, but "
              + (declared.plant() ? "`records.period`" : "`records.plant`")
              + " names no column");
    }
  }

  private boolean proxyColumn(YamlValue value, String name) {
    if (declared.records().isEmpty() || declared.inputs().contains(name)) {
      return true;
    }
    Roles roles = declared.records().get().roles();
    for (Roles.Input input : roles.inputs()) {
      if (input.quantity().equals(name)) {
        value.refuse(
            "`"
                + YamlValue.quote(name)
                + "` is the quantity of "
                + input.name()
                + "; write the input's name");
        return false;
      }
    }
    if (roles.output().equals(name)) {
      value.refuse(
          "`"
              + YamlValue.quote(name)
              + "` is output, which cannot be its own proxy; name what the plant chooses knowing"
              + " its productivity, such as a material or investment");
      return false;
    }
    Optional<String> refusal = EndogenousBinder.refusal(name, roles);
    refusal.ifPresent(reason -> value.refuse("`" + YamlValue.quote(name) + "` " + reason));
    return refusal.isEmpty();
  }
}

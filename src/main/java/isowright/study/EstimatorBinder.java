package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Estimator.Inefficiency;
import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Series;
import isowright.estimation.Specification.PlantEffects;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Reads by which principle technologies are fitted: {@code instruments}, {@code proxy} and {@code
 * frontier} under {@code estimation}. None of them: least squares.
 */
final class EstimatorBinder {

  static final List<String> KEYS = List.of("instruments", "proxy", "frontier");

  private static final int HIGHEST_DEGREE = 3;

  private final YamlSection section;
  private final Declared declared;
  private final PlantEffects effects;
  private final SeriesReader series;

  EstimatorBinder(YamlSection section, Declared declared, PlantEffects effects) {
    this.section = section;
    this.declared = declared;
    this.effects = effects;
    this.series = new SeriesReader(declared);
  }

  /**
   * The principles asked for, the one that the technologies rest on first.
   *
   * @param fitted the forms to be fitted
   */
  List<Estimator> bind(List<String> fitted) {
    List<Estimator> asked = new ArrayList<>();
    section.get("frontier").flatMap(this::frontier).ifPresent(asked::add);
    section.get("proxy").flatMap(this::proxy).ifPresent(asked::add);
    section.get("instruments").flatMap(this::instruments).ifPresent(asked::add);
    KEYS.stream().filter(section::has).forEach(key -> suits(key, fitted));
    if (section.has("frontier") && (section.has("proxy") || section.has("instruments"))) {
      section.refuse(
          "frontier",
          "a frontier takes inputs to be unrelated to noise and inefficiency, which `"
              + (section.has("proxy") ? "proxy" : "instruments")
              + "` denies; take one of them out, and run the study twice to compare");
    }
    return asked;
  }

  /** Columns of the records that are needed for this and have no other role. */
  List<String> further() {
    return series.further();
  }

  private void suits(String key, List<String> fitted) {
    if (!declared.present()) {
      section.refuse(
          key,
          "this is a way to fit technologies to records, but there is no `records`; take it out");
      return;
    }
    List<String> others = fitted.stream().filter(name -> !linear(name)).toList();
    if (!others.isEmpty()) {
      section.refuse(
          key,
          "`"
              + key
              + "` is carried out for forms that are linear in their parameters ("
              + String.join(", ", Form.names().stream().filter(EstimatorBinder::linear).toList())
              + "); take "
              + String.join(", ", others)
              + " out of `technologies`, or fit it in a study of its own");
    }
  }

  private static boolean linear(String form) {
    return Form.named(form) instanceof LinearForm;
  }

  private Optional<Estimator> instruments(YamlValue value) {
    Optional<YamlSection> written = value.section();
    if (written.isEmpty()) {
      return Optional.empty();
    }
    written.get().allowInputs(declared.inputs());
    Map<String, List<Series>> byInput = new LinkedHashMap<>();
    for (String input : declared.inputs()) {
      written
          .get()
          .get(input)
          .ifPresent(
              listed -> {
                List<Series> all = instrumentsOf(listed);
                if (!all.isEmpty()) {
                  byInput.put(input, all);
                }
              });
    }
    if (written.get().keys().isEmpty()) {
      value.refuse(
          "name the inputs that are chosen knowing productivity, each with what shifts it, such as"
              + " `labour: [wage, lag labour]`");
    }
    Set<Series> distinct = new LinkedHashSet<>();
    byInput.values().forEach(distinct::addAll);
    if (!byInput.isEmpty() && distinct.size() < byInput.size()) {
      value.refuse(
          distinct.size()
              + (distinct.size() == 1 ? " instrument" : " instruments")
              + " cannot stand in for "
              + byInput.size()
              + " inputs ("
              + String.join(", ", byInput.keySet())
              + "): name at least as many different instruments as inputs");
    }
    return byInput.isEmpty() ? Optional.empty() : Optional.of(new Estimator.Instruments(byInput));
  }

  private List<Series> instrumentsOf(YamlValue listed) {
    List<Series> all = new ArrayList<>();
    List<YamlValue> items = listed.isList() ? listed.list().orElse(List.of()) : List.of(listed);
    for (YamlValue item : items) {
      Optional<Series> read = series.read(item);
      if (read.isEmpty()) {
        continue;
      }
      Series one = read.get();
      if (one.lag() == 0 && declared.inputs().contains(one.name())) {
        item.refuse(
            "the input `"
                + one.name()
                + "` stands in the technology already; an instrument must not, such as a price or"
                + " `lag "
                + one.name()
                + "`");
      } else if (all.contains(one)) {
        item.refuse("`" + one.word() + "` stands twice in this list; once is enough");
      } else {
        needsPanel(item, one);
        all.add(one);
      }
    }
    if (items.isEmpty()) {
      listed.refuse("the list is empty; name what shifts this input, such as its price");
    }
    return all;
  }

  private void needsPanel(YamlValue item, Series one) {
    if (one.lag() > 0 && !(declared.plant() && declared.period())) {
      item.refuse(
          "`"
              + one.word()
              + "` needs plants and periods, but `records."
              + (declared.plant() ? "period" : "plant")
              + "` names no column");
    }
  }

  private Optional<Estimator> proxy(YamlValue value) {
    Optional<YamlSection> written = value.section();
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection proxy = written.get();
    proxy.allow("`proxy`", List.of("column", "state", "degree"), List.of());
    proxy.need("column", "a column that rises with productivity, such as `column: energy`");
    proxy.need(
        "state", "the inputs fixed before productivity is known, such as `state: [machines]`");
    if (!(declared.plant() && declared.period())) {
      section.refuse(
          "proxy",
          "a control function follows plants over periods, but `records."
              + (declared.plant() ? "period" : "plant")
              + "` names no column");
    }
    if (effects != PlantEffects.NONE) {
      section.refuse(
          "plant-effects",
          "`"
              + effects.word()
              + "` and `proxy` are two answers to one question: the control function stands for"
              + " lasting differences too; set plant-effects to none");
    }
    Optional<Series> column = proxy.get("column").flatMap(this::proxyColumn);
    List<String> state = state(proxy);
    int degree =
        proxy
            .get("degree")
            .map(v -> v.whole(1, HIGHEST_DEGREE))
            .orElse(OptionalInt.of(Estimator.ControlFunction.USUAL_DEGREE))
            .orElse(Estimator.ControlFunction.USUAL_DEGREE);
    return column.map(
        c ->
            new Estimator.ControlFunction(
                c,
                state,
                degree,
                Estimator.ControlFunction.USUAL_DRAWS,
                Estimator.ControlFunction.USUAL_SEED));
  }

  private Optional<Series> proxyColumn(YamlValue value) {
    Optional<Series> read = series.read(value);
    if (read.isPresent() && declared.inputs().contains(read.get().name())) {
      value.refuse(
          "the proxy is the input `"
              + read.get().name()
              + "`: its own coefficient cannot be told from the productivity that it stands for. Name"
              + " a column that is no input of the technology, or take this input out of `inputs` and"
              + " read output as made in a fixed proportion to it");
      return Optional.empty();
    }
    return read;
  }

  private List<String> state(YamlSection proxy) {
    List<String> state = proxy.get("state").map(YamlValue::texts).orElse(List.of());
    for (String input : state) {
      if (!declared.inputs().contains(input)) {
        proxy.refuse(
            "state",
            "`"
                + YamlValue.quote(input)
                + "` is not an input"
                + YamlValue.nearest(input, declared.inputs())
                + "; inputs: "
                + String.join(", ", declared.inputs()));
      }
    }
    if (proxy.has("state") && state.isEmpty()) {
      proxy.refuse("state", "the list is empty; name at least one input that is fixed beforehand");
    } else if (!declared.inputs().isEmpty() && state.containsAll(declared.inputs())) {
      proxy.refuse(
          "state",
          "every input is named, so that none is free and nothing is to be corrected; leave the free"
              + " inputs out, or take `proxy` out");
    }
    return state;
  }

  private Optional<Estimator> frontier(YamlValue value) {
    Optional<YamlSection> written = value.section();
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection frontier = written.get();
    frontier.allow("`frontier`", List.of("inefficiency", "over-time"), List.of());
    List<String> laws = Stream.of(Inefficiency.values()).map(Inefficiency::word).toList();
    List<String> times = Stream.of(OverTime.values()).map(OverTime::word).toList();
    frontier.need("inefficiency", "its law, half-normal or exponential");
    Optional<String> law = frontier.get("inefficiency").flatMap(v -> v.word(laws, List.of()));
    Optional<OverTime> overTime =
        frontier
            .get("over-time")
            .flatMap(v -> v.word(times, List.of()))
            .map(word -> OverTime.values()[times.indexOf(word)]);
    overTime.ifPresent(when -> columnsFor(frontier, when));
    if (effects != PlantEffects.NONE) {
      section.refuse(
          "plant-effects",
          "`"
              + effects.word()
              + "` takes lasting differences between plants away, which a frontier is to explain as"
              + " inefficiency; set plant-effects to none");
    }
    return law.map(
        word ->
            new Estimator.Frontier(
                Inefficiency.values()[laws.indexOf(word)], overTime.orElse(OverTime.EACH_ROW)));
  }

  private void columnsFor(YamlSection frontier, OverTime when) {
    if (when != OverTime.EACH_ROW && !declared.plant()) {
      frontier.refuse(
          "over-time", "`" + when.word() + "` needs plants, but `records.plant` names no column");
    } else if (when == OverTime.DECAY && !declared.period()) {
      frontier.refuse("over-time", "`decay` needs periods, but `records.period` names no column");
    }
  }
}

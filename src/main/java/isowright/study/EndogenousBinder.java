package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Series;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.RegularityImposed;
import isowright.estimation.Specification.Time;
import isowright.records.Roles;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads what is to be done about inputs that are chosen knowing productivity: {@code instruments}
 * and {@code proxy} of {@code estimation}, held against the columns declared, the forms asked and
 * the treatment of plants and time.
 */
final class EndogenousBinder {

  private static final Pattern LAGGED = Pattern.compile("lag\\s+(?:([0-9]{1,3})\\s+)?(\\S.*)");

  private static final int MOST_PERIODS_BACK = 99;

  private final YamlSection section;
  private final Declared declared;
  private final List<String> technologies;

  EndogenousBinder(YamlSection section, Declared declared, List<String> technologies) {
    this.section = section;
    this.declared = declared;
    this.technologies = List.copyOf(technologies);
  }

  /**
   * The principles asked for, in the order in which they are taken; none: least squares.
   *
   * @param resampling how plants are drawn, where the study says so
   */
  List<Estimator> bind(
      EffectsBinder.Effects effects, Study.Held held, Optional<Drawing> resampling) {
    List<Estimator> all = new ArrayList<>();
    instruments(effects).ifPresent(all::add);
    if (section.has("instruments")) {
      forms("instruments", held);
    }
    new ProxyBinder(section, declared).bind(effects, resampling).ifPresent(all::add);
    if (section.has("proxy")) {
      forms("proxy", held);
    }
    return all;
  }

  /** The columns that some principles look at and that have no other role. */
  static List<String> further(List<Estimator> estimators, Declared declared) {
    Set<String> names = new LinkedHashSet<>();
    for (Estimator estimator : estimators) {
      if (estimator instanceof Estimator.Instruments instruments) {
        instruments.byInput().values().forEach(all -> all.forEach(s -> names.add(s.name())));
      } else if (estimator instanceof Estimator.Proxy proxy) {
        names.add(proxy.column().name());
      }
    }
    names.removeAll(declared.inputs());
    declared
        .records()
        .ifPresent(
            r -> {
              Roles roles = r.roles();
              for (Roles.Input input : roles.inputs()) {
                input.price().ifPresent(names::remove);
                input.spending().ifPresent(names::remove);
              }
              roles.filedCost().ifPresent(names::remove);
              roles.further().forEach(f -> names.remove(f.column()));
            });
    return List.copyOf(names);
  }

  /** The settings in force, by key of the study file. */
  static Map<String, String> settings(List<Estimator> estimators) {
    Map<String, String> settings = new LinkedHashMap<>();
    for (Estimator estimator : estimators) {
      if (estimator instanceof Estimator.Instruments instruments) {
        instruments
            .byInput()
            .forEach(
                (input, series) ->
                    settings.put(
                        "estimation.instruments." + input,
                        String.join(", ", series.stream().map(Series::word).toList())));
      } else if (estimator instanceof Estimator.Proxy proxy) {
        settings.put("estimation.proxy.column", proxy.column().name());
        settings.put("estimation.proxy.state", String.join(", ", proxy.states()));
        settings.put("estimation.proxy.degree", Integer.toString(proxy.degree()));
        settings.put("estimation.proxy.process", Integer.toString(proxy.process()));
        settings.put("estimation.proxy.draws", Integer.toString(proxy.drawing().draws()));
        settings.put("estimation.proxy.seed", Long.toString(proxy.drawing().seed()));
      }
    }
    return settings;
  }

  private Optional<Estimator> instruments(EffectsBinder.Effects effects) {
    Optional<YamlSection> written = section.section("instruments");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection instruments = written.get();
    instruments.allowInputs(declared.inputs());
    Map<String, List<Series>> byInput = new LinkedHashMap<>();
    Set<Series> distinct = new LinkedHashSet<>();
    for (String input : declared.inputs()) {
      instruments
          .get(input)
          .ifPresent(
              value -> {
                List<Series> series = series(value);
                byInput.put(input, series);
                distinct.addAll(series);
              });
    }
    if (instruments.keys().isEmpty()) {
      section.refuse(
          "instruments",
          "no input is named; write such as `instruments: {labour: [wage, lag labour]}`, or take"
              + " this out");
      return Optional.empty();
    }
    enough(byInput, distinct);
    together(effects);
    return Optional.of(new Estimator.Instruments(byInput));
  }

  private void enough(Map<String, List<Series>> byInput, Set<Series> distinct) {
    boolean each = byInput.values().stream().noneMatch(List::isEmpty);
    if (each && distinct.size() < byInput.size()) {
      section.refuse(
          "instruments",
          "instruments are fewer than the inputs that they stand in for: "
              + distinct.size()
              + (distinct.size() == 1 ? " column" : " columns")
              + " for "
              + String.join(", ", byInput.keySet())
              + "; every such input needs a column of its own that shifts it. Name more, or fewer"
              + " inputs");
    }
  }

  private List<Series> series(YamlValue value) {
    List<Series> all = new ArrayList<>();
    List<YamlValue> items = value.list().orElse(List.of());
    if (value.isList() && items.isEmpty()) {
      value.refuse("the list is empty; name a column that shifts this input, or take the key out");
    }
    for (YamlValue item : items) {
      Optional<Series> one = item.isMapping() ? longForm(item) : shortForm(item);
      if (one.isPresent() && all.contains(one.get())) {
        item.refuse("`" + one.get().word() + "` stands twice in this list; once is enough");
      } else {
        one.filter(series -> sound(item, series)).ifPresent(all::add);
      }
    }
    return all;
  }

  /** {@code wage}, {@code lag wage}, {@code lag 2 wage}. */
  private static Optional<Series> shortForm(YamlValue item) {
    Optional<String> written = item.text();
    if (written.isEmpty()) {
      return Optional.empty();
    }
    Matcher lagged = LAGGED.matcher(written.get());
    if (!lagged.matches()) {
      return Optional.of(Series.of(written.get()));
    }
    int lag = lagged.group(1) == null ? 1 : Integer.parseInt(lagged.group(1));
    if (lag < 1 || lag > MOST_PERIODS_BACK) {
      item.refuse(
          "expects a lag of 1 to "
              + MOST_PERIODS_BACK
              + " periods, such as `lag 2 wage`, found "
              + item.found());
      return Optional.empty();
    }
    return Optional.of(Series.lagged(lagged.group(2), lag));
  }

  /** {@code {column: wage, lag: 1, log: false}}. */
  private static Optional<Series> longForm(YamlValue item) {
    YamlSection written = item.section().orElseThrow();
    written.allow("an instrument", List.of("column", "lag", "log"), List.of());
    Optional<String> column =
        written
            .need("column", "an input or the column that shifts it, such as `column: wage`")
            .flatMap(YamlValue::text);
    int lag =
        written.get("lag").map(value -> value.whole(0, MOST_PERIODS_BACK).orElse(0)).orElse(0);
    Optional<Boolean> log = written.get("log").flatMap(YamlValue::flag);
    return column.map(name -> new Series(name, lag, log));
  }

  private boolean sound(YamlValue item, Series series) {
    String shown = "`" + YamlValue.quote(series.word()) + "`";
    if (series.lag() > 0 && !(declared.period() && declared.plant())) {
      item.refuse(
          shown
              + " looks at an earlier period of the same plant, but "
              + (declared.period() ? "`records.plant`" : "`records.period`")
              + " names no column");
      return false;
    }
    return declared.records().map(r -> role(item, series, r.roles())).orElse(true);
  }

  /** Whether the column may serve. */
  private boolean role(YamlValue item, Series series, Roles roles) {
    String name = series.name();
    String shown = "`" + YamlValue.quote(name) + "`";
    if (declared.inputs().contains(name)) {
      if (series.lag() == 0) {
        item.refuse(
            shown
                + " is itself an input: it stands in the technology already and shifts nothing"
                + " beside it; a lag of it can serve, `lag "
                + name
                + "`");
      }
      return series.lag() > 0;
    }
    for (Roles.Input input : roles.inputs()) {
      if (input.quantity().equals(name)) {
        item.refuse(
            shown
                + " is the quantity of "
                + input.name()
                + "; write the input's name, `lag "
                + input.name()
                + "`, which enters in logs");
        return false;
      }
    }
    Optional<String> refusal = refusal(name, roles);
    refusal.ifPresent(reason -> item.refuse(shown + " " + reason));
    return refusal.isEmpty();
  }

  /** Why a column of that role can neither be an instrument nor a proxy, if so. */
  static Optional<String> refusal(String name, Roles roles) {
    if (roles.output().equals(name)) {
      return Optional.of(
          "is output, and carries the very productivity that an instrument must not know; name a"
              + " column that shifts the input for other reasons");
    }
    if (roles.controls().stream().anyMatch(control -> control.column().equals(name))) {
      return Optional.of(
          "is a control and stands in the technology already; take it out here or under"
              + " `controls`");
    }
    if (roles.plant().equals(Optional.of(name)) || roles.period().equals(Optional.of(name))) {
      return Optional.of(
          "names plants or periods; for what differs between them set `plant-effects` or `time`");
    }
    if (roles.deflator().map(Roles.Deflator::column).equals(Optional.of(name))) {
      return Optional.of(
          "is the deflator, by which prices are divided already; name the price itself");
    }
    return Optional.empty();
  }

  private void together(EffectsBinder.Effects effects) {
    PlantEffects plants = effects.plants();
    if (plants != PlantEffects.NONE
        && plants != PlantEffects.WITHIN
        && plants != PlantEffects.DIFFERENCES) {
      section.refuse(
          "instruments",
          "instruments are not carried out with `plant-effects: "
              + plants.word()
              + "`; set plant-effects to none, within or differences");
    }
    biased(section, "instruments", effects);
  }

  /** Adds the mistake that a biased trend stands beside. */
  static void biased(YamlSection section, String key, EffectsBinder.Effects effects) {
    if (effects.time() == Time.BIASED_TREND) {
      section.refuse(
          key,
          "a biased trend makes products of inputs and time, which are not treated here; set time"
              + " to quadratic-trend");
    }
  }

  private void forms(String key, Study.Held held) {
    if (section.has("frontier")) {
      section.refuse(
          key, "this cannot stand beside `frontier`, which takes inputs as they are; take one out");
    }
    if (!technologies.isEmpty()
        && technologies.stream().noneMatch(name -> Form.named(name) instanceof LinearForm)) {
      section.refuse(
          key,
          "this is carried out for forms linear in their parameters, and none of the technologies"
              + " asked is ("
              + String.join(", ", technologies)
              + "); add cobb-douglas or translog, or take this out");
    }
    if (technologies.isEmpty()) {
      section.refuse(key, "technologies are fitted so, but there are no `technologies`; name some");
    }
    if (held.restrict().isPresent()) {
      section.refuse(
          key,
          "this cannot stand beside `restrict`, which is imposed in least squares; take one out");
    }
    if (held.regularity() != RegularityImposed.FREE) {
      section.refuse(
          key,
          "this cannot stand beside `regularity: "
              + held.regularity().word()
              + "`, which is imposed in least squares; set that to free, or take this out");
    }
  }
}

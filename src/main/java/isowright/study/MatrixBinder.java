package isowright.study;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.RegularityImposed;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Keep;
import isowright.study.Matrix.Criterion;
import isowright.study.Matrix.Half;
import isowright.study.Matrix.Sample;
import isowright.technology.Form;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** Reads the specification matrix of a study file: {@code matrix}. */
final class MatrixBinder {

  /** Of more combinations nobody reads the table. */
  private static final int MOST_CELLS = 500;

  private static final List<String> KEYS =
      List.of("technologies", "plant-effects", "time", "standard-errors", "samples", "choose-by");

  private static final String USUAL_WORD = "default";

  private final YamlSection root;
  private final Declared declared;
  private final Study.Estimation estimation;

  MatrixBinder(YamlSection root, Declared declared, Study.Estimation estimation) {
    this.root = root;
    this.declared = declared;
    this.estimation = estimation;
  }

  Optional<Matrix> bind() {
    Optional<YamlValue> value = root.get("matrix");
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (!declared.present() || declared.costs().isPresent()) {
      root.refuse(
          "matrix",
          "a specification matrix fits technologies to records of output and inputs, which this"
              + " study does not have; add `records`, `output` and `inputs`, or take this out");
      return Optional.empty();
    }
    if (value.get().raw().isPresent()) {
      return value.get().word(List.of(USUAL_WORD), List.of()).map(word -> usual());
    }
    Optional<YamlSection> section = value.get().section();
    return section.map(s -> s.keys().isEmpty() ? usual() : written(s));
  }

  /**
   * The usual grid: three forms, with and without plant effects, with and without a trend, on all
   * rows and on the later half of the periods, 24 in all; what needs plants or periods that are not
   * declared is left out.
   */
  private Matrix usual() {
    List<Sample> samples = new ArrayList<>(List.of(all()));
    if (declared.period()) {
      samples.add(new Sample("later-half", Keep.ALL, Optional.of(Half.LATER)));
    }
    return new Matrix(
        List.of("cobb-douglas", "ces", "translog"),
        declared.plant()
            ? List.of(PlantEffects.NONE, PlantEffects.WITHIN)
            : List.of(PlantEffects.NONE),
        declared.period() ? List.of(Time.NONE, Time.TREND) : List.of(Time.NONE),
        List.of(),
        samples,
        List.of(Criterion.REGULAR_EVERYWHERE, Criterion.BIC),
        true);
  }

  private static Sample all() {
    return new Sample("all", Keep.ALL, Optional.empty());
  }

  private Matrix written(YamlSection section) {
    section.allow("`matrix`", KEYS, List.of());
    List<String> forms = technologies(section);
    List<PlantEffects> effects =
        listed(section, "plant-effects", PlantEffects.values(), PlantEffects::word);
    List<Time> times = listed(section, "time", Time.values(), Time::word);
    List<StandardErrors> errors =
        listed(section, "standard-errors", StandardErrors.values(), StandardErrors::word);
    columns(section, effects, times, errors);
    if (effects.isEmpty()) {
      effects = List.of(estimation.plantEffects());
    }
    if (times.isEmpty()) {
      times = List.of(estimation.time());
    }
    together(section, effects, times);
    Matrix matrix =
        new Matrix(
            forms,
            effects,
            times,
            errors,
            samples(section),
            listed(section, "choose-by", Criterion.values(), Criterion::word),
            false);
    if (matrix.size() > MOST_CELLS) {
      root.refuse(
          "matrix",
          "this asks for "
              + matrix.size()
              + " combinations, and at most "
              + MOST_CELLS
              + " are set side by side; shorten a list");
    }
    return matrix;
  }

  private List<String> technologies(YamlSection section) {
    Optional<YamlValue> value =
        section.need(
            "technologies", "the forms to be fitted, such as `technologies: [cobb-douglas, ces]`");
    List<String> forms = new ArrayList<>();
    for (YamlValue item : value.flatMap(YamlValue::list).orElse(List.of())) {
      item.word(Form.names(), List.of()).ifPresent(word -> once(item, word, forms));
    }
    value.filter(v -> v.isList() && forms.isEmpty()).ifPresent(MatrixBinder::empty);
    boolean nests = !estimation.held().nests().isEmpty();
    boolean grouped = root.section("estimation").map(e -> e.has("nests")).orElse(false);
    if (!nests && !grouped) {
      value.ifPresent(v -> HeldBinder.needNests(v, forms));
    }
    return forms;
  }

  private static void empty(YamlValue value) {
    if (value.list().orElse(List.of()).isEmpty()) {
      value.refuse("the list is empty; name something, or take the key out");
    }
  }

  private static <T> void once(YamlValue item, T word, List<T> all) {
    if (all.contains(word)) {
      item.refuse("`" + item.raw().orElse("") + "` stands twice in this list; once is enough");
    } else {
      all.add(word);
    }
  }

  private static <T> List<T> listed(
      YamlSection section, String key, T[] values, Function<T, String> word) {
    List<String> words = Arrays.stream(values).map(word).toList();
    List<T> all = new ArrayList<>();
    Optional<YamlValue> value = section.get(key);
    for (YamlValue item : value.flatMap(YamlValue::list).orElse(List.of())) {
      item.word(words, List.of())
          .ifPresent(written -> once(item, values[words.indexOf(written)], all));
    }
    value.filter(YamlValue::isList).ifPresent(MatrixBinder::empty);
    return all;
  }

  private void columns(
      YamlSection section,
      List<PlantEffects> effects,
      List<Time> times,
      List<StandardErrors> errors) {
    boolean plants =
        effects.stream().anyMatch(e -> e != PlantEffects.NONE) || times.contains(Time.TWO_WAY);
    if (plants && !declared.plant()) {
      section.refuse(
          effects.isEmpty() ? "time" : "plant-effects",
          "plant effects need plants, but `records.plant` names no column");
    }
    if (effects.contains(PlantEffects.DIFFERENCES) && !declared.period()) {
      section.refuse(
          "plant-effects", "`differences` needs periods, but `records.period` names no column");
    }
    if (times.stream().anyMatch(t -> t != Time.NONE) && !declared.period()) {
      section.refuse(
          "time", "change over time needs periods, but `records.period` names no column");
    }
    for (StandardErrors kind : errors) {
      if (kind.needsPlants() && !declared.plant()) {
        section.refuse(
            "standard-errors",
            "`" + kind.word() + "` needs plants, but `records.plant` names no column");
      }
      if (kind.needsPeriods() && !declared.period()) {
        section.refuse(
            "standard-errors",
            "`" + kind.word() + "` needs periods, but `records.period` names no column");
      }
    }
  }

  /** What no combination of the lists could carry out; single combinations say so themselves. */
  private void together(YamlSection section, List<PlantEffects> effects, List<Time> times) {
    if (times.contains(Time.TWO_WAY) && !effects.contains(PlantEffects.WITHIN)) {
      section.refuse(
          "time",
          "`two-way` means plant and period effects, and `within` is not among the plant effects of"
              + " the matrix; add it, or write period-effects");
    }
    boolean held =
        estimation.held().restrict().isPresent()
            || estimation.held().regularity() != RegularityImposed.FREE;
    if (times.contains(Time.BIASED_TREND) && held) {
      section.refuse(
          "time",
          "a biased trend moves the elasticities with time, which `estimation.restrict` or"
              + " `estimation.regularity` would hold; take it out of the list");
    }
  }

  private List<Sample> samples(YamlSection section) {
    Optional<YamlValue> value = section.get("samples");
    Optional<YamlSection> named = value.flatMap(YamlValue::section);
    if (named.isEmpty()) {
      return List.of(all());
    }
    List<Sample> samples = new ArrayList<>();
    Set<Object> seen = new LinkedHashSet<>();
    for (String name : named.get().keys()) {
      named
          .get()
          .section(name)
          .ifPresent(
              s -> {
                Sample sample = sample(name, s);
                if (!seen.add(List.of(sample.keep(), sample.half()))) {
                  named
                      .get()
                      .refuse(
                          name,
                          "this sample keeps the same rows as one above; take one of them out");
                }
                samples.add(sample);
              });
    }
    if (named.get().keys().isEmpty()) {
      section.refuse(
          "samples", "no sample is named; write `samples: {all: {}}`, or take the key out");
    }
    return samples;
  }

  private Sample sample(String name, YamlSection section) {
    section.allow("a sample", List.of("periods", "without-plants", "half"), List.of());
    for (String key : List.of("periods", "half")) {
      if (section.has(key) && !declared.period()) {
        section.refuse(key, "periods are chosen, but `records.period` names no column");
      }
    }
    if (section.has("without-plants") && !declared.plant()) {
      section.refuse("without-plants", "plants are left out, but `records.plant` names no column");
    }
    if (section.has("periods") && section.has("half")) {
      section.refuse("half", "`periods` and `half` both choose periods; take one of them out");
    }
    Optional<List<String>> span = RecordsBinder.periods(section);
    List<String> without = section.get("without-plants").map(YamlValue::texts).orElse(List.of());
    return new Sample(
        name,
        new Keep(span.map(s -> s.get(0)), span.map(s -> s.get(1)), without),
        StudyBinder.choice(section, "half", Half.values(), Half::word));
  }
}

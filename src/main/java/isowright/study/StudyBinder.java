package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Source;
import isowright.study.Study.Estimation;
import isowright.study.Study.Filing;
import isowright.study.Study.Given;
import isowright.study.Study.Questions;
import isowright.technology.Form;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * Reads a whole study from the root of its YAML: the top level and what is small enough to be read
 * here; records, given technologies and least-cost questions have readers of their own.
 */
final class StudyBinder {

  private static final double USUAL_CONFIDENCE = 0.95;

  private static final List<String> KEYS =
      List.of(
          "title",
          "records",
          "output",
          "inputs",
          "money",
          "controls",
          "technologies",
          "given",
          "estimation",
          "questions",
          "least-cost",
          "filing",
          "capital",
          "owner",
          "expect",
          "decisions",
          "costs",
          "matrix");
  private static final List<String> LATER = List.of();

  private static final List<String> ESTIMATION_KEYS =
      List.of(
          "plant-effects",
          "time",
          "variance-components",
          "scaling",
          "standard-errors",
          "confidence",
          "resampling",
          "restrict",
          "zeros",
          "missing-values",
          "instruments",
          "proxy",
          "nests",
          "regularity",
          "frontier");
  private static final List<String> ESTIMATION_LATER = List.of();

  private final Path file;
  private final Optional<Source> recordsInstead;
  private final String sha256;

  StudyBinder(Path file, String sha256, Optional<Source> recordsInstead) {
    this.file = file;
    this.recordsInstead = recordsInstead;
    this.sha256 = sha256;
  }

  /** The study; whether it is free of mistakes is for the caller to see. */
  Optional<Study> bind(YamlSection root) {
    root.allow("a study file", KEYS, LATER);
    Optional<String> title =
        root.need("title", "the title of the report, such as `title: Glassworks, 2024`")
            .flatMap(YamlValue::text);
    Optional<String> filedCost = FilingBinder.costColumn(root);
    CapitalBinder capitalBinder = new CapitalBinder(root);
    Capital capital = capitalBinder.bind();
    Declared declared =
        new RecordsBinder(file, root, recordsInstead)
            .bind(filedCost, capital, capitalBinder.further());
    capitalBinder.check(declared);
    needRecordsOrGiven(root, declared);
    GivenBinder givenBinder = new GivenBinder(root, declared.inputs());
    List<Given> given = givenBinder.bind();
    if (declared.inputs().isEmpty()) {
      declared = declared.withInputs(givenBinder.inputs());
    }
    Optional<Costs> costs = declared.costs();
    if (declared.inputs().isEmpty() && costs.isPresent()) {
      declared = declared.withInputs(costs.get().inputNames());
    }
    List<String> fitted = technologies(root, declared);
    List<String> names = new ArrayList<>(fitted);
    names.addAll(givenBinder.names());
    costs.ifPresent(c -> c.forms().forEach(form -> names.add(form.word())));
    Estimation estimation = estimation(root, declared, fitted);
    checkCosts(root, declared, estimation);
    if (GapsBinder.keepsZeros(root, declared)) {
      declared = declared.keepingZeros();
    }
    declared = declared.withFurther(EndogenousBinder.further(estimation.estimators(), declared));
    Questions questions = questions(root.section("questions"));
    var leastCost = new PlanBinder(declared, names).bind(root);
    Optional<Filing> filing = new FilingBinder(declared).bind(root);
    Protocol protocol = new ProtocolBinder(root, declared, !fitted.isEmpty(), estimation).bind();
    return Optional.of(
        new Study(
            file,
            sha256,
            title.orElse(""),
            declared.records(),
            declared.money(),
            declared.outputUnit().or(() -> costs.flatMap(Costs::outputUnit)),
            declared.inputs(),
            declared.units(),
            fitted,
            given,
            estimation,
            questions,
            leastCost,
            filing,
            protocol,
            declared.costs(),
            capital));
  }

  private static void needRecordsOrGiven(YamlSection root, Declared declared) {
    if (!declared.present() && !root.has("given")) {
      root.lacks(
          "records",
          "name the records file (`records: {file: plants.csv}`), or technologies taken as known"
              + " (`given`)");
    }
  }

  private static List<String> technologies(YamlSection root, Declared declared) {
    Optional<YamlValue> value = root.get("technologies");
    if (value.isEmpty()) {
      if (declared.present() && !root.has("given") && !root.has("costs")) {
        root.lacks(
            "technologies",
            "the forms to be fitted, such as `technologies: ["
                + Form.all().stream()
                    .filter(form -> !form.needsNests())
                    .map(Form::name)
                    .collect(Collectors.joining(", "))
                + "]`");
      }
      return List.of();
    }
    List<String> fitted = new ArrayList<>();
    for (YamlValue item : value.get().list().orElse(List.of())) {
      Optional<String> word = item.word(Form.names(), List.of());
      if (word.isPresent() && fitted.contains(word.get())) {
        item.refuse("`" + word.get() + "` stands twice in this list; once is enough");
      } else {
        word.ifPresent(fitted::add);
      }
    }
    if (value.get().isList()
        && value.get().list().orElse(List.of()).isEmpty()
        && !root.has("given")) {
      root.refuse("technologies", "the list is empty; allowed: " + String.join(", ", Form.names()));
    }
    if (!fitted.isEmpty() && !declared.present()) {
      root.refuse(
          "technologies",
          "technologies are fitted to records, but there is no `records`; add it or take this out");
    }
    return fitted;
  }

  private static Estimation estimation(
      YamlSection root, Declared declared, List<String> technologies) {
    Optional<YamlSection> written = root.section("estimation");
    if (written.isEmpty()) {
      root.get("technologies").ifPresent(value -> HeldBinder.needNests(value, technologies));
      return new Estimation(PlantEffects.NONE, Time.NONE, true, Optional.empty(), USUAL_CONFIDENCE);
    }
    YamlSection section = written.get();
    section.allow("`estimation`", ESTIMATION_KEYS, ESTIMATION_LATER);
    EffectsBinder.Effects effects = new EffectsBinder(section, declared, technologies).bind();
    Optional<StandardErrors> errors =
        choice(section, "standard-errors", StandardErrors.values(), StandardErrors::word);
    boolean scaled =
        section
            .get("scaling")
            .flatMap(value -> value.word(List.of("geometric-mean", "none"), List.of()))
            .map(word -> word.equals("geometric-mean"))
            .orElse(true);
    errors.ifPresent(kind -> checkColumns(section, kind, declared));
    if (effects.plants() == PlantEffects.BETWEEN
        && errors.map(StandardErrors::needsPeriods).orElse(false)) {
      section.refuse(
          "standard-errors",
          "`"
              + errors.get().word()
              + "` needs rows of several periods, and `plant-effects: between` leaves one row a"
              + " plant; set this to robust");
    }
    Study.Held held = new HeldBinder(section, root, declared.inputs(), technologies).bind(effects);
    List<Estimator> estimators = new ArrayList<>();
    new FrontierBinder(section, declared, technologies)
        .bind(effects.plants(), errors)
        .ifPresent(estimators::add);
    var resampling = ResamplingBinder.read(section, !technologies.isEmpty());
    estimators.addAll(
        new EndogenousBinder(section, declared, technologies).bind(effects, held, resampling));
    return new Estimation(
        effects.plants(),
        effects.time(),
        effects.components(),
        scaled,
        errors,
        confidence(section),
        estimators,
        held,
        resampling);
  }

  private static void checkColumns(YamlSection section, StandardErrors kind, Declared declared) {
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

  private static double confidence(YamlSection section) {
    Optional<YamlValue> value = section.get("confidence");
    if (value.isEmpty()) {
      return USUAL_CONFIDENCE;
    }
    OptionalDouble number = value.get().number();
    if (number.isPresent() && !(number.getAsDouble() > 0 && number.getAsDouble() < 1)) {
      double percent = number.getAsDouble();
      String remedy = percent > 1 && percent < 100 ? "; was " + percent / 100 + " meant?" : "";
      value.get().refuse("expects a number between 0 and 1, found " + value.get().found() + remedy);
    }
    return number.orElse(USUAL_CONFIDENCE);
  }

  /** One of the values of a setting, by its word. */
  static <T> Optional<T> choice(
      YamlSection section, String key, T[] values, Function<T, String> word) {
    List<String> words = Arrays.stream(values).map(word).toList();
    return section
        .get(key)
        .flatMap(value -> value.word(words, List.of()))
        .map(written -> values[words.indexOf(written)]);
  }

  /** Cost functions know fewer treatments of plants and time than production functions. */
  private static void checkCosts(YamlSection root, Declared declared, Estimation estimation) {
    if (declared.costs().isEmpty()) {
      return;
    }
    root.section("estimation")
        .ifPresent(
            section -> {
              if (estimation.time() != Time.NONE && estimation.time() != Time.TREND) {
                section.refuse(
                    "time", "cost functions are fitted with `none` or `trend`; write one of them");
              }
              if (estimation.plantEffects() != PlantEffects.NONE
                  && estimation.plantEffects() != PlantEffects.WITHIN) {
                section.refuse(
                    "plant-effects",
                    "cost functions are fitted with `none` or `within`; write one of them");
              }
              CostFormRules.estimation(
                  section, declared.costs().get(), estimation.plantEffects(), estimation.scaled());
            });
  }

  private static Questions questions(Optional<YamlSection> written) {
    written.ifPresent(
        section ->
            section.allow("`questions`", List.of("returns-to-scale", "substitution"), List.of()));
    return new Questions(tested(written, "returns-to-scale"), tested(written, "substitution"));
  }

  private static double tested(Optional<YamlSection> questions, String key) {
    return questions
        .flatMap(section -> section.get(key))
        .map(value -> value.positive().orElse(1))
        .orElse(1.0);
  }
}

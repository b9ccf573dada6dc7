package isowright.study;

import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Form;
import isowright.technology.GeneralisedLeontief;
import isowright.technology.NestedCes;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reads the technologies taken as known ({@code given}). Each form has its own keys, so this is the
 * one place outside the package {@code technology} that tells forms apart: a new form is one method
 * here and one entry in {@link #readers}.
 *
 * <p>The names of the inputs come from {@code inputs} where the study has it, otherwise from the
 * first given technology; all must agree.
 */
final class GivenBinder {

  /** How far shares may be from summing to 1: printed shares are exact decimals, not roundings. */
  private static final double SHARE_TOLERANCE = 1e-9;

  private final YamlSection root;
  private List<String> inputs;
  private final List<Study.Given> all = new ArrayList<>();
  private final List<String> names = new ArrayList<>();

  /** Reads one form from its section. */
  @FunctionalInterface
  private interface Reader {
    Optional<Technology> read(YamlSection section);
  }

  GivenBinder(YamlSection root, List<String> inputs) {
    this.root = root;
    this.inputs = List.copyOf(inputs);
  }

  /** The names of the inputs; empty where nothing names them. */
  List<String> inputs() {
    return inputs;
  }

  /** The names under which technologies are given, also of those that hold a mistake. */
  List<String> names() {
    return List.copyOf(names);
  }

  private Map<String, Reader> readers() {
    Map<String, Reader> readers = new LinkedHashMap<>();
    readers.put(CobbDouglas.FORM.name(), this::cobbDouglas);
    readers.put(Ces.FORM.name(), this::ces);
    readers.put(NestedCes.FORM.name(), this::nestedCes);
    readers.put(GeneralisedLeontief.FORM.name(), this::generalisedLeontief);
    readers.put(Translog.FORM.name(), this::translog);
    return readers;
  }

  /** The technologies without a mistake. */
  List<Study.Given> bind() {
    List<YamlValue> items = root.get("given").flatMap(YamlValue::list).orElse(List.of());
    Map<String, Reader> readers = readers();
    for (YamlValue item : items) {
      item.section().ifPresent(section -> read(section, readers));
    }
    if (root.has("given") && root.get("given").get().isList() && items.isEmpty()) {
      root.refuse("given", "the list is empty; name a technology or take `given` out");
    }
    return List.copyOf(all);
  }

  private void read(YamlSection section, Map<String, Reader> readers) {
    Optional<String> name =
        section
            .need("name", "what this technology is called, such as `name: filed`")
            .flatMap(YamlValue::text);
    name.ifPresent(written -> claim(section, written));
    Optional<String> form =
        section
            .need("form", "one of " + String.join(", ", readers.keySet()))
            .flatMap(value -> value.word(readers.keySet(), List.of()));
    if (form.isEmpty()) {
      return;
    }
    Optional<Technology> technology =
        Optional.ofNullable(readers.get(form.get())).flatMap(reader -> reader.read(section));
    if (name.isPresent() && technology.isPresent()) {
      all.add(new Study.Given(name.get(), technology.get()));
    }
  }

  private void claim(YamlSection section, String name) {
    if (Form.names().contains(name)) {
      section.refuse(
          "name",
          "`"
              + name
              + "` is the name of a form that is fitted; call it otherwise, such as `given-"
              + name
              + "`");
    } else if (names.contains(name)) {
      section.refuse("name", "two given technologies are called `" + YamlValue.quote(name) + "`");
    }
    names.add(name);
  }

  private Optional<Technology> cobbDouglas(YamlSection section) {
    section.allow(
        "a given Cobb-Douglas technology",
        List.of("name", "form", "constant", "coefficients", "scaling"),
        List.of());
    OptionalDouble constant = constant(section);
    Optional<double[]> coefficients = perInput(section, "coefficients", "an output elasticity");
    Optional<double[]> base = base(section);
    if (constant.isEmpty() || coefficients.isEmpty() || base.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new CobbDouglas(inputs, base.get(), constant.getAsDouble(), coefficients.get()));
  }

  private Optional<Technology> ces(YamlSection section) {
    section.allow(
        "a given CES technology",
        List.of("name", "form", "constant", "shares", "rho", "scale", "scaling"),
        List.of());
    OptionalDouble constant = constant(section);
    Optional<double[]> shares =
        perInput(section, "shares", "a share").filter(s -> sound(section, s));
    OptionalDouble rho = rho(section);
    OptionalDouble scale = scale(section);
    Optional<double[]> base = base(section);
    if (constant.isEmpty()
        || shares.isEmpty()
        || rho.isEmpty()
        || scale.isEmpty()
        || base.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        Ces.of(
            inputs,
            base.get(),
            constant.getAsDouble(),
            shares.get(),
            rho.getAsDouble(),
            scale.getAsDouble()));
  }

  private static boolean sound(YamlSection section, double[] shares) {
    if (Arrays.stream(shares).anyMatch(share -> !(share > 0))) {
      section.refuse("shares", "every share must be above 0");
      return false;
    }
    double sum = Arrays.stream(shares).sum();
    if (Math.abs(sum - 1) > SHARE_TOLERANCE) {
      section.refuse(
          "shares", String.format(Locale.ROOT, "shares must sum to 1; these sum to %.10g", sum));
      return false;
    }
    return true;
  }

  private static OptionalDouble scale(YamlSection section) {
    return section
        .need("scale", "the degree of homogeneity, such as `scale: 1`")
        .map(YamlValue::positive)
        .orElse(OptionalDouble.empty());
  }

  private static OptionalDouble rho(YamlSection section) {
    Optional<YamlValue> value =
        section.need("rho", "the substitution parameter, σ = 1/(1 + rho), such as `rho: 0.5`");
    return value.map(GivenBinder::curvature).orElse(OptionalDouble.empty());
  }

  /** A curvature ρ in the economic region. */
  static OptionalDouble curvature(YamlValue value) {
    OptionalDouble rho = value.numberOrInfinity();
    if (rho.isPresent() && rho.getAsDouble() < -1) {
      value.refuse(
          "expects -1 (straight isoquants) or more, up to .inf (fixed proportions), found "
              + value.found());
      return OptionalDouble.empty();
    }
    return rho;
  }

  private Optional<Technology> nestedCes(YamlSection section) {
    GivenGroups reader = new GivenGroups(section, inputs);
    OptionalDouble constant = constant(section);
    OptionalDouble rho = rho(section);
    OptionalDouble scale = scale(section);
    Optional<GivenGroups.Groups> groups = reader.read();
    inputs = reader.inputs();
    Optional<double[]> base = base(section);
    if (constant.isEmpty()
        || groups.isEmpty()
        || rho.isEmpty()
        || scale.isEmpty()
        || base.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        NestedCes.of(
            inputs,
            base.get(),
            groups.get().names(),
            constant.getAsDouble(),
            groups.get().within(),
            groups.get().between(),
            rho.getAsDouble(),
            groups.get().rho(),
            scale.getAsDouble()));
  }

  /** Weights of inputs and of pairs of inputs; pairs count twice in their sum, which is 1. */
  private Optional<Technology> generalisedLeontief(YamlSection section) {
    section.allow(
        "a given generalised Leontief technology",
        List.of("name", "form", "constant", "weights", "scale", "scaling"),
        List.of());
    OptionalDouble constant = constant(section);
    OptionalDouble scale = scale(section);
    Optional<YamlSection> written =
        section
            .need(
                "weights", "a weight for every input and for pairs, such as `labour*machines: 0.1`")
            .flatMap(YamlValue::section);
    if (inputs.isEmpty() && written.isPresent()) {
      inputs = written.get().keys().stream().filter(key -> !key.contains("*")).toList();
      inputs.forEach(name -> InputNames.check(written.get(), name));
    }
    List<String> names =
        GeneralisedLeontief.weightNames(inputs).stream()
            .map(name -> name.substring(name.indexOf(':') + 1))
            .toList();
    Optional<double[]> weights = new InputNumbers(names, "weight").orZero(section, "weights");
    Optional<double[]> base = base(section);
    if (constant.isEmpty() || scale.isEmpty() || weights.isEmpty() || base.isEmpty()) {
      return Optional.empty();
    }
    double sum = GeneralisedLeontief.sum(inputs.size(), weights.get());
    if (Math.abs(sum - 1) > SHARE_TOLERANCE) {
      section.refuse(
          "weights",
          String.format(
              Locale.ROOT,
              "weights must sum to 1, those of pairs counted twice; these sum to %.10g",
              sum));
      return Optional.empty();
    }
    return Optional.of(
        GeneralisedLeontief.of(
            inputs, base.get(), constant.getAsDouble(), weights.get(), scale.getAsDouble()));
  }

  private Optional<Technology> translog(YamlSection section) {
    section.allow(
        "a given translog technology",
        List.of("name", "form", "constant", "coefficients", "second-order", "scaling"),
        List.of());
    OptionalDouble constant = constant(section);
    Optional<double[]> first =
        perInput(section, "coefficients", "an output elasticity at the scaling point");
    Optional<double[]> base = base(section);
    int n = inputs.size();
    double[] coefficients = new double[n + n * (n + 1) / 2];
    boolean sound = secondOrder(section, coefficients);
    if (constant.isEmpty() || first.isEmpty() || base.isEmpty() || !sound) {
      return Optional.empty();
    }
    System.arraycopy(first.get(), 0, coefficients, 0, n);
    return Optional.of(new Translog(inputs, base.get(), constant.getAsDouble(), coefficients));
  }

  /** Second-order coefficients into their places; pairs that are left out are 0. */
  private boolean secondOrder(YamlSection section, double[] coefficients) {
    Optional<YamlSection> pairs =
        section
            .need("second-order", "the second-order coefficients; `{}` where all are 0")
            .flatMap(YamlValue::section);
    if (pairs.isEmpty() || inputs.isEmpty()) {
      return false;
    }
    boolean sound = true;
    Map<Integer, String> seen = new LinkedHashMap<>();
    for (String key : pairs.get().keys()) {
      String[] both = key.split("\\*", -1);
      int i = both.length == 2 ? inputs.indexOf(both[0].strip()) : -1;
      int j = both.length == 2 ? inputs.indexOf(both[1].strip()) : -1;
      OptionalDouble value = pairs.get().get(key).orElseThrow().number();
      if (i < 0 || j < 0) {
        pairs
            .get()
            .refuse(
                key,
                "`"
                    + YamlValue.quote(key)
                    + "` is not a pair of inputs"
                    + YamlValue.nearest(key, pairNames())
                    + "; pairs: "
                    + String.join(", ", pairNames()));
        sound = false;
        continue;
      }
      int place = Translog.place(inputs.size(), i, j);
      String earlier = seen.putIfAbsent(place, key);
      if (earlier != null) {
        pairs.get().refuse(key, "the pair stands here already as `" + earlier + "`");
        sound = false;
      } else if (value.isPresent()) {
        coefficients[place] = value.getAsDouble();
      } else {
        sound = false;
      }
    }
    return sound;
  }

  private List<String> pairNames() {
    return Translog.FORM.coefficientNames(inputs).stream()
        .filter(name -> name.contains("*"))
        .toList();
  }

  private static OptionalDouble constant(YamlSection section) {
    return section
        .need("constant", "ln A, the log of output where every scaled input is 1")
        .map(YamlValue::number)
        .orElse(OptionalDouble.empty());
  }

  /** What inputs are divided by before logs; ones where not stated. */
  private Optional<double[]> base(YamlSection section) {
    if (!section.has("scaling")) {
      double[] ones = new double[inputs.size()];
      Arrays.fill(ones, 1);
      return Optional.of(ones);
    }
    return new InputNumbers(inputs).positive(section, "scaling");
  }

  /** One number for every input; the first such mapping of a study may name the inputs. */
  private Optional<double[]> perInput(YamlSection section, String key, String what) {
    Optional<YamlSection> numbers =
        section.need(key, what + " for every input").flatMap(YamlValue::section);
    if (numbers.isEmpty()) {
      return Optional.empty();
    }
    if (inputs.isEmpty()) {
      List<String> keys = numbers.get().keys();
      keys.forEach(name -> InputNames.check(numbers.get(), name));
      if (keys.size() < 2) {
        section.refuse(key, "two inputs or more are needed, found " + keys.size());
        return Optional.empty();
      }
      inputs = keys;
    }
    return new InputNumbers(inputs).any(section, key);
  }
}

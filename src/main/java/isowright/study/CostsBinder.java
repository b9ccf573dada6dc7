package isowright.study;

import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import isowright.records.Keep;
import isowright.records.Roles;
import isowright.records.Roles.Control;
import isowright.records.Roles.Further;
import isowright.records.Roles.Measure;
import isowright.records.Source;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Reads {@code costs}: what the cost side of a study is. */
final class CostsBinder {

  private static final List<String> KEYS =
      List.of(
          "total",
          "variable",
          "inputs",
          "outputs",
          "fixed-inputs",
          "technologies",
          "system",
          "restrict",
          "concavity");

  private final YamlSection root;
  private final Optional<Source> source;
  private final Keep keep;
  private final Optional<String> plant;
  private final Optional<String> period;
  private final List<Control> controls;
  private final ColumnUses uses = new ColumnUses();

  /**
   * A reader.
   *
   * @param source the records; absent where there are none, or not without a mistake
   * @param controls what else moves cost
   */
  CostsBinder(
      YamlSection root,
      Optional<Source> source,
      Keep keep,
      Optional<String> plant,
      Optional<String> period,
      List<Control> controls) {
    this.root = root;
    this.source = source;
    this.keep = keep;
    this.plant = plant;
    this.period = period;
    this.controls = controls;
  }

  Optional<Costs> bind() {
    Optional<YamlSection> written = root.section("costs");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection section = written.get();
    section.allow("`costs`", KEYS, List.of());
    if (!root.has("records")) {
      root.refuse("costs", "costs stand in records, but there is no `records`; add it");
    }
    Optional<String> cost = cost(section);
    List<Costs.Input> inputs = inputs(section);
    List<Costs.Quantity> outputs = quantities(section, "outputs", "an output");
    List<Costs.Quantity> fixed = quantities(section, "fixed-inputs", "a fixed input");
    distinct(section, inputs, outputs, fixed);
    List<CostForm> forms = forms(section);
    Equations equations = equations(section, inputs);
    if (equations != Equations.SHARES && outputs.isEmpty() && section.has("inputs")) {
      section.lacks(
          "outputs",
          "the output or outputs that cost is of, such as `outputs: {glass: {column: tonnes}}`;"
              + " only share equations alone (`system: shares`) do without");
    }
    List<Restriction> restrictions = restrictions(section);
    Optional<Concavity> concavity =
        StudyBinder.choice(section, "concavity", Concavity.values(), Concavity::word);
    CostFormRules rules = new CostFormRules(section, forms);
    rules.quantities(inputs, !outputs.isEmpty(), !controls.isEmpty());
    rules.restrictions(restrictions);
    rules.concavity(concavity);
    // forms in levels carry outputs of zero; where there are several, they are read as they stand
    boolean asTheyStand = outputs.size() > 1 && !CostFormRules.inLevels(forms).isEmpty();
    if (source.isEmpty() || cost.isEmpty() || inputs.size() < 2 || forms.isEmpty()) {
      return Optional.empty();
    }
    Roles roles =
        Roles.ofCosts(
            plant,
            period,
            cost.get(),
            arguments(inputs, outputs, !asTheyStand, fixed),
            further(inputs, cost.get()));
    return Optional.of(
        new Costs(
            new Study.Records(source.get(), roles, keep),
            section.has("variable"),
            inputs,
            outputs,
            fixed,
            controls.stream().map(Control::column).toList(),
            forms,
            equations,
            restrictions,
            concavity,
            asTheyStand));
  }

  private Optional<String> cost(YamlSection section) {
    boolean total = section.has("total");
    boolean variable = section.has("variable");
    if (total && variable) {
      section.refuse("variable", "cost is either `total` or `variable`; take one of them out");
    } else if (!total && !variable) {
      section.lacks("total", "the column of cost, such as `total: cost`");
    }
    if (variable && !section.has("fixed-inputs")) {
      section.lacks(
          "fixed-inputs",
          "variable cost is cost at given fixed inputs; name them, such as `fixed-inputs: {furnace:"
              + " {column: furnace_value}}`");
    }
    if (total && section.has("fixed-inputs")) {
      section.refuse(
          "fixed-inputs",
          "inputs are fixed where cost is `variable`; write that in place of `total`");
    }
    return column(section, total ? "total" : "variable");
  }

  private Optional<String> column(YamlSection section, String key) {
    Optional<String> column = section.text(key);
    column.ifPresent(name -> uses.claim(section, key, name));
    return column;
  }

  private List<Costs.Input> inputs(YamlSection section) {
    List<Costs.Input> all = new ArrayList<>();
    section.need("inputs", "two inputs or more with their prices");
    Optional<YamlSection> written = section.section("inputs");
    if (written.isEmpty()) {
      return all;
    }
    for (String name : written.get().keys()) {
      InputNames.check(written.get(), name);
      Optional<YamlSection> input = written.get().section(name);
      if (input.isPresent()) {
        input.get().allow("an input of `costs`", List.of("price", "share", "spending"), List.of());
        input.get().need("price", "the column of its price, such as `price: wage`");
        if (input.get().has("share") && input.get().has("spending")) {
          input.get().refuse("spending", "name the share or the spending, one of them");
        }
        all.add(
            new Costs.Input(
                name,
                column(input.get(), "price").orElse(""),
                column(input.get(), "share"),
                column(input.get(), "spending")));
      }
    }
    if (written.get().keys().size() < 2) {
      section.refuse(
          "inputs",
          "a cost function homogeneous in prices needs two prices or more, found "
              + written.get().keys().size());
    }
    return all;
  }

  private List<Costs.Quantity> quantities(YamlSection section, String key, String what) {
    List<Costs.Quantity> all = new ArrayList<>();
    Optional<YamlSection> written = section.section(key);
    if (written.isEmpty()) {
      return all;
    }
    for (String name : written.get().keys()) {
      InputNames.check(written.get(), name);
      Optional<YamlSection> one = written.get().section(name);
      if (one.isPresent()) {
        one.get().allow(what, List.of("column", "unit"), List.of());
        one.get().need("column", "the column of its quantity, such as `column: tonnes`");
        all.add(
            new Costs.Quantity(
                name, column(one.get(), "column").orElse(""), one.get().text("unit").orElse("")));
      }
    }
    return all;
  }

  private static void distinct(
      YamlSection section,
      List<Costs.Input> inputs,
      List<Costs.Quantity> outputs,
      List<Costs.Quantity> fixed) {
    List<String> names = new ArrayList<>();
    inputs.forEach(i -> names.add(i.name()));
    outputs.forEach(q -> names.add(q.name()));
    fixed.forEach(q -> names.add(q.name()));
    names.stream()
        .filter(name -> names.indexOf(name) != names.lastIndexOf(name))
        .distinct()
        .forEach(
            name ->
                section.refuse(
                    "inputs",
                    "`"
                        + YamlValue.quote(name)
                        + "` is the name of two things under `costs`; parameters are named after"
                        + " them, so each needs its own"));
  }

  private static List<CostForm> forms(YamlSection section) {
    List<String> words = Arrays.stream(CostForm.values()).map(CostForm::word).toList();
    Optional<YamlValue> value =
        section.need(
            "technologies", "the cost functions to be fitted: " + String.join(", ", words));
    List<CostForm> forms = new ArrayList<>();
    for (YamlValue item : value.flatMap(YamlValue::list).orElse(List.of())) {
      item.word(words, List.of())
          .ifPresent(word -> forms.add(CostForm.values()[words.indexOf(word)]));
    }
    return forms;
  }

  private static Equations equations(YamlSection section, List<Costs.Input> inputs) {
    Optional<String> word =
        section.get("system").flatMap(v -> v.word(List.of("true", "false", "shares"), List.of()));
    List<String> without =
        inputs.stream()
            .filter(i -> i.share().isEmpty() && i.spending().isEmpty())
            .map(Costs.Input::name)
            .toList();
    Equations equations =
        switch (word.orElse(without.isEmpty() ? "true" : "false")) {
          case "false" -> Equations.COST;
          case "shares" -> Equations.SHARES;
          default -> Equations.SYSTEM;
        };
    if (equations != Equations.COST && !without.isEmpty()) {
      section.refuse(
          "system",
          "share equations need a share or the spending of every input; there is neither of "
              + String.join(", ", without));
    }
    return equations;
  }

  private static List<Restriction> restrictions(YamlSection section) {
    List<String> words = Arrays.stream(Restriction.values()).map(Restriction::word).toList();
    List<Restriction> imposed = new ArrayList<>();
    for (YamlValue item : section.get("restrict").flatMap(YamlValue::list).orElse(List.of())) {
      item.word(words, List.of())
          .ifPresent(word -> imposed.add(Restriction.values()[words.indexOf(word)]));
    }
    return imposed;
  }

  /** Shares, then the filed cost where it is another column than the one explained. */
  private List<Further> further(List<Costs.Input> inputs, String cost) {
    List<Further> all = shares(inputs);
    FilingBinder.costColumn(root)
        .filter(filed -> !filed.equals(cost))
        .ifPresent(filed -> all.add(new Further(filed, CostFilings.ROLE, Measure.NUMBER)));
    return all;
  }

  private static List<Further> shares(List<Costs.Input> inputs) {
    List<Further> all = new ArrayList<>();
    for (Costs.Input input : inputs) {
      input
          .share()
          .ifPresent(c -> all.add(new Further(c, "share of " + input.name(), Measure.NUMBER)));
      input
          .spending()
          .ifPresent(c -> all.add(new Further(c, "spending on " + input.name(), Measure.NUMBER)));
    }
    return all;
  }

  private List<Control> arguments(
      List<Costs.Input> inputs,
      List<Costs.Quantity> outputs,
      boolean logged,
      List<Costs.Quantity> fixed) {
    List<Control> arguments = new ArrayList<>();
    inputs.forEach(i -> arguments.add(new Control(i.price(), true, "price of " + i.name())));
    outputs.forEach(q -> arguments.add(new Control(q.column(), logged, "output " + q.name())));
    fixed.forEach(
        q ->
            arguments.add(
                new Control(q.column(), true, "quantity of the fixed input " + q.name())));
    arguments.addAll(controls);
    return arguments;
  }
}

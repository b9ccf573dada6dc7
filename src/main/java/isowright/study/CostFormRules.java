package isowright.study;

import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Restriction;
import isowright.estimation.Specification.PlantEffects;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** What the cost forms asked for can be combined with, told as mistakes where they cannot. */
final class CostFormRules {

  /** Restrictions that a sum in levels can obey by leaving terms out. */
  private static final Set<Restriction> IN_LEVELS =
      Set.of(Restriction.CONSTANT_RETURNS, Restriction.NEUTRAL_CHANGE, Restriction.NO_SUBSTITUTION);

  private final YamlSection section;
  private final List<CostForm> forms;

  CostFormRules(YamlSection section, List<CostForm> forms) {
    this.section = section;
    this.forms = forms;
  }

  static List<CostForm> inLevels(List<CostForm> forms) {
    return forms.stream().filter(form -> form.inLevels().isPresent()).toList();
  }

  private static String words(List<CostForm> forms) {
    return forms.stream().map(CostForm::word).collect(Collectors.joining(", "));
  }

  /** Forms in levels are fitted to input quantities, spending over price. */
  void quantities(List<Costs.Input> inputs, boolean outputs, boolean controls) {
    List<CostForm> levels = inLevels(forms);
    if (levels.isEmpty()) {
      return;
    }
    List<String> without =
        inputs.stream()
            .filter(i -> i.share().isEmpty() && i.spending().isEmpty())
            .map(Costs.Input::name)
            .toList();
    if (!without.isEmpty()) {
      section.refuse(
          "technologies",
          words(levels)
              + " is fitted to input quantities, spending over price; there is neither share nor"
              + " spending of "
              + String.join(", ", without)
              + ": add them, or ask for forms in logs");
    }
    if (!outputs) {
      section.refuse(
          "technologies",
          words(levels)
              + " is fitted to input quantities over output; name the output or outputs under"
              + " `outputs`");
    }
    if (section.has("variable")) {
      section.refuse(
          "technologies",
          words(levels)
              + " takes no fixed inputs; ask for translog-cost, or write `total` cost in place of"
              + " `variable`");
    }
    if (controls) {
      section.refuse(
          "technologies",
          words(levels) + " takes no controls; take out `controls`, or ask for forms in logs");
    }
  }

  /** Restrictions that every form asked for can obey. */
  void restrictions(List<Restriction> imposed) {
    for (Restriction restriction : imposed) {
      List<CostForm> cannot =
          forms.stream()
              .filter(
                  form ->
                      form.inLevels().isPresent()
                          ? !IN_LEVELS.contains(restriction)
                          : restriction == Restriction.NO_SUBSTITUTION)
              .toList();
      if (!cannot.isEmpty()) {
        section.refuse(
            "restrict",
            words(cannot)
                + " cannot be made "
                + restriction.word()
                + (restriction == Restriction.NO_SUBSTITUTION
                    ? "; only forms in levels can"
                    : "; forms in levels know constant-returns, neutral-change and"
                        + " no-substitution")
                + ": take the restriction out, or these forms");
      }
    }
  }

  /** Concavity that every form asked for can be given. */
  void concavity(Optional<Concavity> asked) {
    if (asked.isEmpty() || asked.get() == Concavity.FREE) {
      return;
    }
    if (forms.contains(CostForm.GENERALISED_LEONTIEF)) {
      section.refuse(
          "concavity",
          "generalised-leontief-cost is fitted as the records have it; concavity is imposed on"
              + " mcfadden-cost (everywhere) and on translog-cost (at-mean)");
    }
    if (asked.get() == Concavity.EVERYWHERE && forms.contains(CostForm.TRANSLOG)) {
      section.refuse(
          "concavity",
          "translog-cost cannot be made concave everywhere and stay flexible; write `at-mean`, or"
              + " ask for mcfadden-cost in its place");
    }
  }

  /** What is under `estimation` has to suit as well. */
  static void estimation(
      YamlSection estimation, Costs costs, PlantEffects effects, boolean scaled) {
    List<CostForm> levels = inLevels(costs.forms());
    if (!levels.isEmpty() && effects != PlantEffects.NONE) {
      estimation.refuse(
          "plant-effects",
          words(levels)
              + " is fitted without plant effects; write `none`, or ask for forms in logs");
    }
    boolean atMean = costs.concavity().filter(Concavity.AT_MEAN::equals).isPresent();
    if (atMean && !scaled) {
      estimation.refuse(
          "scaling",
          "`costs` asks for concavity at the mean, which is the point that logs are taken from"
              + " under `geometric-mean`; write that, or leave `scaling` out");
    }
  }
}

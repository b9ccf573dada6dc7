package isowright.report;

import isowright.study.Figure;
import isowright.study.PlanDetail;
import isowright.study.PlanDetail.PlantPart;
import isowright.study.PlanDetail.Worth;
import isowright.study.PlanFindings.Planned;
import java.util.List;
import java.util.Optional;

/**
 * What a least-cost question asks and what answers it, in words: least cost for a target, most
 * output for a budget, most profit at a price of output.
 */
public final class PlanWording {

  private PlanWording() {}

  /** The name of the question in the study file; several targets share it. */
  static String asked(Planned plan) {
    return plan.detail().asked().isEmpty() ? plan.question() : plan.detail().asked();
  }

  /** "40,000 t at least cost", "most output for 9,000,000 EUR", "most profit at 300 EUR per t". */
  public static String sought(Planned plan, String money, String outputUnit) {
    String stated = plan.detail().stated().map(Numbers::amount).orElse("");
    return switch (plan.detail().goal()) {
      case "budget" -> "most output for " + Numbers.unit(stated, money);
      case "profit" ->
          "most profit at "
              + Numbers.unit(stated, money)
              + " per "
              + (outputUnit.isEmpty() ? "unit of output" : outputUnit);
      default -> Numbers.unit(Numbers.amount(plan.target()), outputUnit) + " at least cost";
    };
  }

  /** The question as a sentence, without its mark. */
  static String question(Material material, List<Planned> plans) {
    Planned plan = plans.get(0);
    String inputs = Phrases.list(PlansSection.inputs(material, plans));
    String sought = sought(plan, material.money(), material.outputUnit());
    if (!plan.detail().across().isEmpty()) {
      List<String> plants = plan.detail().across().stream().map(PlantPart::plant).toList();
      return "How do " + Phrases.list(plants) + " together make " + sought;
    }
    return switch (plan.detail().goal()) {
      case "budget" -> "What mix of " + inputs + " yields the " + sought;
      case "profit" -> "What output, made with what mix of " + inputs + ", yields the " + sought;
      default -> "What mix of " + inputs + " makes " + targets(material, plans) + " at least cost";
    };
  }

  /** All targets of a question: "35,000 t and 45,000 t". */
  static String targets(Material material, List<Planned> plans) {
    return Phrases.list(
        plans.stream()
            .map(plan -> Numbers.unit(Numbers.amount(plan.target()), material.outputUnit()))
            .distinct()
            .toList());
  }

  /** What the goal is called and how it was stated. */
  static Document.Entry goal(Material material, List<Planned> plans) {
    Planned plan = plans.get(0);
    String stated = plan.detail().stated().map(Numbers::amount).orElse("");
    return switch (plan.detail().goal()) {
      case "budget" -> Document.Entry.of("Budget", Numbers.unit(stated, material.money()));
      case "profit" ->
          Document.Entry.of("Price of output", Numbers.unit(stated, material.moneyPerOutput()));
      default -> Document.Entry.of("Target", targets(material, plans));
    };
  }

  /** "Least cost", "Most output", "Most profit". */
  static String best(Planned plan) {
    return switch (plan.detail().goal()) {
      case "budget" -> "Most output";
      case "profit" -> "Most profit";
      default -> "Least cost";
    };
  }

  /** The figure that answers the question. */
  public static Optional<Figure> answer(Planned plan) {
    return switch (plan.detail().goal()) {
      case "budget" -> plan.detail().output();
      case "profit" -> plan.detail().profit();
      default -> plan.cost();
    };
  }

  /** The unit of that figure. */
  static String answerUnit(Material material, Planned plan) {
    return plan.detail().goal().equals("budget") ? material.outputUnit() : material.money();
  }

  /** The technology, with the target where the question has several. */
  static String column(Material material, Planned plan, boolean several) {
    String technology = Terms.technology(plan.technology());
    return several
        ? technology + ", " + Numbers.unit(Numbers.amount(plan.target()), material.outputUnit())
        : technology;
  }

  /** What constraints are worth, with intervals; the target's own is marginal cost, told before. */
  static List<Text> worths(Material material, List<Planned> plans, boolean several) {
    List<Text> texts = new java.util.ArrayList<>();
    boolean named = plans.stream().filter(Planned::answered).count() > 1;
    for (Planned plan : plans) {
      for (Worth worth : plan.detail().multipliers()) {
        if (worth.kind().equals("target")) {
          continue;
        }
        String sure = worth.value().map(f -> Phrases.sure(f, material.confidence())).orElse("");
        String said = Phrases.sentence(worth.words().strip());
        String words =
            sure.isEmpty() ? said : said.substring(0, said.length() - 1) + " (" + sure + ").";
        texts.add(
            named
                ? Text.strong(column(material, plan, several) + ". ").then(words)
                : Text.of(words));
      }
    }
    return texts;
  }

  /** How far it is proved that nothing is better, once for technologies of which the same holds. */
  static Optional<String> proof(List<Planned> plans) {
    List<Planned> proved =
        plans.stream().filter(plan -> plan.detail().proof().isPresent()).toList();
    List<String> global =
        proved.stream()
            .filter(PlanWording::global)
            .map(PlanWording::technology)
            .distinct()
            .toList();
    List<String> local =
        proved.stream()
            .filter(plan -> !global(plan))
            .map(PlanWording::technology)
            .distinct()
            .toList();
    if (proved.isEmpty()) {
      return Optional.empty();
    }
    if (local.isEmpty()) {
      return Optional.of("Proved: no other mix that meets the question is better.");
    }
    return Optional.of(
        (global.isEmpty()
                ? ""
                : "Proved for "
                    + Phrases.list(global)
                    + ": no other mix that meets the question is better. ")
            + "For "
            + Phrases.list(local)
            + " only that no mix nearby is better; see the notes.");
  }

  private static boolean global(Planned plan) {
    return plan.detail().proof().map(PlanDetail.Proved::scope).orElse("").equals("global");
  }

  private static String technology(Planned plan) {
    return Terms.technology(plan.technology());
  }
}

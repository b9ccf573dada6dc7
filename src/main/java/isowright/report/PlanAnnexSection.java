package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Section;
import isowright.study.PlanDetail;
import isowright.study.PlanDetail.Unanswered;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The annex on least-cost plans: how each was checked, where average cost is least, how cost and
 * mix answer to prices, and the curves; what a reader needs who wants to follow a plan or oppose
 * it.
 */
final class PlanAnnexSection {

  static final String ID = "plans-annex";

  private PlanAnnexSection() {}

  /** The annex; absent where no question has an answer. */
  static Optional<Section> of(Material material) {
    if (!exists(material)) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    PlanAnnexTables.checks(material).ifPresent(blocks::add);
    PlanAnnexTables.costElasticities(material).ifPresent(blocks::add);
    PlanAnnexTables.efficientScale(material).ifPresent(blocks::add);
    blocks.addAll(material.drawings(Chart.Kind.EFFICIENT_SCALE));
    int number = 1;
    for (List<Planned> asked : PlansSection.asked(material)) {
      List<Block> inside = question(material, asked);
      if (!inside.isEmpty()) {
        blocks.add(new Section(ID + "-" + number, PlanWording.asked(asked.get(0)), inside));
      }
      number++;
    }
    return Optional.of(new Section(ID, "Annex: least-cost plans", blocks));
  }

  /** Whether there is anything to annex. */
  static boolean exists(Material material) {
    return material.findings().plans().stream()
        .anyMatch(plan -> plan.answered() && (checked(plan) || !plan.curve().isEmpty()));
  }

  private static List<Block> question(Material material, List<Planned> plans) {
    List<Block> blocks = new ArrayList<>();
    PlanAnnexTables.plants(material, plans).ifPresent(blocks::add);
    PlanAnnexTables.changes(material, plans).ifPresent(blocks::add);
    PlanAnnexTables.demandElasticities(material, plans).ifPresent(blocks::add);
    for (Planned plan : plans) {
      String subject = plan.question() + ", " + plan.technology();
      blocks.addAll(material.drawings(Chart.Kind.DEMAND, subject));
    }
    for (Planned plan : firsts(plans)) {
      String subject = plan.question() + ", " + plan.technology();
      blocks.addAll(material.drawings(Chart.Kind.EXPANSION_PATH, subject));
      if (!plan.curve().isEmpty()) {
        blocks.add(PlanAnnexTables.curve(material, plan));
      }
      blocks.addAll(without(material, plan));
    }
    return blocks;
  }

  /** The first target of each technology: several targets share the curve. */
  static List<Planned> firsts(List<Planned> plans) {
    Map<String, Planned> firsts = new LinkedHashMap<>();
    plans.forEach(plan -> firsts.putIfAbsent(plan.technology(), plan));
    return List.copyOf(firsts.values());
  }

  /** Stretches of the curve without a plan, each with its reason once. */
  private static List<Block> without(Material material, Planned plan) {
    List<Text> points = new ArrayList<>();
    List<Unanswered> all = plan.detail().withoutPlan();
    for (int i = 0; i < all.size(); i++) {
      int from = i;
      while (i + 1 < all.size() && all.get(i + 1).status().equals(all.get(from).status())) {
        i++;
      }
      String first = Numbers.amount(all.get(from).target());
      String last = Numbers.unit(Numbers.amount(all.get(i).target()), material.outputUnit());
      points.add(
          Text.of(
              (from == i ? last : first + " to " + last)
                  + ": "
                  + Terms.status(all.get(from).status()).replace("no plan: ", "")
                  + (all.get(from).reason().isEmpty() ? "" : "; " + all.get(from).reason())
                  + "."));
    }
    return points.isEmpty()
        ? List.of()
        : List.of(
            Paragraph.of(
                "Targets of the curve at which "
                    + Terms.technology(plan.technology())
                    + " has no plan:"),
            new Points(false, points));
  }

  /** Whether a plan was checked. */
  static boolean checked(Planned plan) {
    return plan.detail().checks().isPresent() || plan.detail().proof().isPresent();
  }

  /** The plan's own word for where average cost goes. */
  static String course(PlanDetail.EfficientScale scale) {
    return switch (scale.course()) {
      case "interior" -> "least inside";
      case "falling" -> "falls throughout";
      case "rising" -> "rises throughout";
      case "level" -> "the same throughout";
      default -> "no answer";
    };
  }
}

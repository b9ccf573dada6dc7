package isowright.report;

import isowright.report.Phrases.Relation;
import isowright.study.Figure;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Regular;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * What the records support and what they do not, each point from a rule about figures or states.
 */
final class BriefSupport {

  private BriefSupport() {}

  /** What can be stated. */
  static List<Text> supported(Material material) {
    List<Text> points = new ArrayList<>();
    told(material, points, Relation.ABOVE, "Increasing returns to scale", Fitted::returnsToScale);
    told(material, points, Relation.BELOW, "Decreasing returns to scale", Fitted::returnsToScale);
    told(
        material,
        points,
        Relation.BELOW,
        "An elasticity of substitution below one",
        BriefSupport::single);
    told(
        material,
        points,
        Relation.ABOVE,
        "An elasticity of substitution above one",
        BriefSupport::single);
    List<String> regular =
        material.usable().stream()
            .filter(fit -> fit.regularity().map(BriefSupport::everywhere).orElse(false))
            .map(fit -> Terms.technology(fit.technology()))
            .toList();
    if (!regular.isEmpty()) {
      points.add(
          Text.of(
              Phrases.sentence(Phrases.list(regular))
                  + (regular.size() == 1 ? " makes" : " make")
                  + " economic sense at every row of the records."));
    }
    FrontierSection.supported(material, points);
    CostsSection.supported(material, points);
    List<String> inside =
        material.findings().plans().stream()
            .filter(plan -> material.findings().records().isPresent())
            .filter(plan -> plan.answered() && !Terms.cautionary(plan.status()))
            .map(BriefSupport::named)
            .toList();
    if (!inside.isEmpty()) {
      points.add(Text.of("A plan inside what was seen: " + String.join("; ", inside) + "."));
    }
    return points;
  }

  /** What cannot be stated. */
  static List<Text> unsupported(Material material) {
    List<Text> points = new ArrayList<>();
    told(
        material,
        points,
        Relation.NOT_TOLD_APART,
        "Increasing, constant and decreasing returns to scale cannot be told apart",
        Fitted::returnsToScale);
    told(
        material,
        points,
        Relation.NOT_TOLD_APART,
        "Whether inputs replace one another more or less readily than in a Cobb-Douglas technology"
            + " cannot be said",
        BriefSupport::single);
    for (Fitted fit : material.findings().fits()) {
      if (!fit.state().equals("estimated")) {
        points.add(
            Text.of(
                Terms.technology(fit.technology())
                    + " is "
                    + Terms.state(fit.state())
                    + (fit.usable() ? "" : " and gives no result")
                    + "."));
      }
    }
    for (Fitted fit : material.usable()) {
      fit.regularity()
          .filter(regular -> !everywhere(regular))
          .ifPresent(
              regular ->
                  points.add(
                      Text.of(
                          Terms.technology(fit.technology())
                              + " is "
                              + lower(Phrases.regularity(regular)))));
    }
    FrontierSection.unsupported(material, points);
    CostsSection.unsupported(material, points);
    for (Planned plan : material.findings().plans()) {
      if (Terms.cautionary(plan.status())) {
        points.add(Text.of(named(plan) + ": " + Terms.status(plan.status()) + "."));
      }
    }
    for (Said remark : material.findings().remarks()) {
      if (!remark.severity().equals("note")) {
        points.add(Text.of(remark.message()));
      }
    }
    return points;
  }

  /** One point that names every fit whose figure has that relation to one. */
  private static void told(
      Material material,
      List<Text> points,
      Relation relation,
      String words,
      Function<Fitted, Optional<Figure>> figure) {
    List<String> by = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      figure
          .apply(fit)
          .filter(f -> Phrases.relation(f, 1) == relation)
          .ifPresent(
              f -> by.add(Terms.technology(fit.technology()) + " " + Numbers.valueAndInterval(f)));
    }
    if (!by.isEmpty()) {
      points.add(Text.of(words + ", by " + Phrases.list(by) + "."));
    }
  }

  /** The elasticity of substitution of a fit that has one for all pairs and estimates it. */
  private static Optional<Figure> single(Fitted fit) {
    List<Figure> estimated =
        fit.substitution().stream()
            .filter(pair -> pair.measure().equals("hicks"))
            .map(pair -> pair.figure())
            .filter(f -> f.uncertainty().isPresent())
            .distinct()
            .toList();
    return estimated.size() == 1 ? Optional.of(estimated.get(0)) : Optional.empty();
  }

  private static boolean everywhere(Regular regular) {
    return regular.rows() > 0 && regular.both() == regular.rows();
  }

  private static String named(Planned plan) {
    return plan.question() + ", " + Terms.technology(plan.technology());
  }

  private static String lower(String words) {
    return words.substring(0, 1).toLowerCase(java.util.Locale.ROOT) + words.substring(1);
  }
}

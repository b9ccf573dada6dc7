package isowright.report;

import isowright.report.Document.Answer;
import isowright.report.Document.Answers;
import isowright.report.Document.Block;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Section;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Question and answer in brief: the page for a reader who reads one page. What was asked, the least
 * cost with its interval, the gap, what the records support and what they do not, and how sure all
 * that is.
 */
final class BriefSection {

  static final String ID = "brief";

  private BriefSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(Paragraph.of(rests(material)));
    if (material.handedOver()) {
      blocks.addAll(Material.notices(material.findings().remarks()));
    }
    Map<String, Double> before = Map.of();
    for (List<Planned> plans : PlansSection.asked(material)) {
      Planned first = plans.get(0);
      boolean several = PlansSection.several(plans);
      blocks.add(asked(material, plans, first.prices().equals(before)));
      blocks.add(new Answers(plans.stream().map(plan -> answer(material, plan, several)).toList()));
      before = first.prices();
    }
    gap(material, blocks);
    blocks.add(
        new Section(
            ID + "-support",
            "What the records support",
            List.of(points(BriefSupport.supported(material), "Nothing that could be stated."))));
    blocks.add(
        new Section(
            ID + "-not",
            "What they do not support",
            List.of(points(BriefSupport.unsupported(material), "Nothing further."))));
    blocks.add(
        new Section(ID + "-sure", "How sure this is", List.of(Paragraph.of(sure(material)))));
    return new Section(ID, "Question and answer in brief", blocks);
  }

  private static Block points(List<Text> points, String otherwise) {
    return points.isEmpty() ? Paragraph.of(otherwise) : new Points(false, points);
  }

  private static String rests(Material material) {
    return material
        .findings()
        .records()
        .map(
            records ->
                "This rests on "
                    + Phrases.count(records.used(), "row")
                    + " of "
                    + Phrases.count(records.plants(), "plant")
                    + ", "
                    + RecordsSection.span(records)
                    + "; "
                    + Phrases.count(records.rows() - records.used(), "row")
                    + (records.rows() - records.used() == 1 ? " was" : " were")
                    + " set aside.")
        .orElseGet(
            () ->
                material.handedOver()
                    ? "This rests on technologies that were estimated elsewhere and handed over;"
                        + " the records themselves were not read."
                    : TAKEN);
  }

  private static final String TAKEN =
      "This rests on technologies taken as known; no records were read, and no figure carries an"
          + " interval.";

  private static Paragraph asked(Material material, List<Planned> plans, boolean samePrices) {
    Planned plan = plans.get(0);
    List<String> limits = PlansSection.limits(plans);
    return new Paragraph(
        Text.strong(PlanWording.asked(plan) + ". ")
            .then(
                PlanWording.question(material, plans)
                    + (samePrices ? " at the same prices" : "")
                    + "? "
                    + (samePrices || plan.prices().isEmpty()
                        ? ""
                        : "Prices, " + PlansSection.prices(material, plan) + ". ")
                    + (limits.isEmpty() ? "" : "Limits: " + Phrases.list(limits) + ". ")
                    + "Productivity: "
                    + plan.productivity()
                    + "."));
  }

  private static Answer answer(Material material, Planned plan, boolean several) {
    String technology =
        PlanWording.best(plan) + " by " + PlanWording.column(material, plan, several);
    String status = Phrases.sentence(Terms.status(plan.status()));
    Optional<Figure> answer = PlanWording.answer(plan);
    if (answer.isEmpty() || !plan.answered()) {
      String why = Phrases.sentence(Terms.status(plan.status()).replace("no plan: ", ""));
      return new Answer(technology, "No plan", "", "", "", why);
    }
    List<String> mix = new ArrayList<>();
    if (plan.detail().goal().equals("profit")) {
      plan.detail()
          .output()
          .ifPresent(
              output ->
                  mix.add("output " + Numbers.unit(Numbers.value(output), material.outputUnit())));
    }
    plan.mix()
        .forEach(
            (input, figure) ->
                mix.add(input + " " + Numbers.unit(Numbers.value(figure), material.unit(input))));
    String sure = Phrases.sure(answer.get(), material.confidence());
    return new Answer(
        technology,
        Numbers.value(answer.get()),
        PlanWording.answerUnit(material, plan),
        sure.isEmpty() ? "Taken as known: no interval" : sure,
        Phrases.sentence(Phrases.list(mix)),
        plan.status().equals("solved") ? "" : status);
  }

  private static void gap(Material material, List<Block> blocks) {
    for (String technology : FilingSection.technologies(material)) {
      List<Reviewed> reviews = FilingSection.by(material, technology);
      StringBuilder words = new StringBuilder("Held against the least cost by ");
      words.append(Terms.technology(technology)).append(": ");
      if (reviews.size() == 1) {
        words.append(one(material, reviews.get(0)));
      } else {
        String counts = FilingSection.counts(reviews);
        words.append(counts.substring(0, 1).toLowerCase(java.util.Locale.ROOT));
        words.append(counts.substring(1));
        largest(reviews).ifPresent(r -> words.append(largest(material, r)));
      }
      blocks.add(Paragraph.of(words.toString()));
    }
  }

  private static String one(Material material, Reviewed review) {
    return review.plant()
        + ", "
        + review.period()
        + ": "
        + review
            .gap()
            .map(gap -> Phrases.gap(gap, material.money(), material.confidence()))
            .orElse("no answer, " + Terms.status(review.status()))
        + ".";
  }

  private static Optional<Reviewed> largest(List<Reviewed> reviews) {
    return reviews.stream()
        .filter(review -> FilingSection.relation(review) == Phrases.Relation.ABOVE)
        .max(Comparator.comparingDouble(review -> review.gap().orElseThrow().value()));
  }

  private static String largest(Material material, Reviewed review) {
    return " The largest gap is that of "
        + review.plant()
        + " in "
        + review.period()
        + ": "
        + Phrases.figure(review.gap().orElseThrow(), material.confidence())
        + ", in "
        + material.money()
        + ".";
  }

  private static String sure(Material material) {
    Findings findings = material.findings();
    if (findings.fits().isEmpty() && findings.costs().fits().isEmpty() && !material.handedOver()) {
      return "The figures are exact for the technologies as stated. How far those are from the"
          + " truth is not known from this study.";
    }
    return "Intervals are "
        + Numbers.level(material.confidence())
        + " intervals. They cover what sampling of plants explains; they do not cover a wrong form,"
        + " a wrong column, or inputs chosen knowing productivity. Where technologies differ by"
        + " more than their intervals, the form matters as much as the records. Unexplained cost is"
        + " not waste, and safe staffing, law, agreements and licensed practice come before any"
        + " figure here.";
  }
}

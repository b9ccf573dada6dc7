package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Section;
import isowright.study.Findings.Records;
import isowright.study.FitFindings.Fitted;
import java.util.ArrayList;
import java.util.List;

/** Assumptions, limits and cautions: what must hold for the figures to mean what they say. */
final class CautionsSection {

  static final String ID = "cautions";

  /** Below this number of plants, clustered standard errors tend to be too small. */
  private static final int FEW_PLANTS = 30;

  private CautionsSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Section(ID + "-use", "Limits of use", use()));
    blocks.add(new Section(ID + "-assumptions", "What is assumed", assumptions()));
    if (!material.findings().fits().isEmpty()) {
      blocks.add(
          new Section(ID + "-estimation", "What estimation cannot see", estimation(material)));
    }
    return new Section(ID, "Assumptions, limits, cautions", blocks);
  }

  private static List<Block> use() {
    return List.of(
        new Points(
            false,
            List.of(
                Text.strong("Safe staffing, law, agreements and licensed practice come first. ")
                    .then(
                        "A least-cost mix knows none of them unless they stand in the study as limits. No"
                            + " figure here is a reason to staff below what they demand."),
                Text.strong("Unexplained cost is not waste. ")
                    .then(
                        "A gap holds whatever the records leave out: quality, site, age, service,"
                            + " obligations, errors of measurement, luck. It says where to look and not"
                            + " what will be found."),
                Text.strong("Outside the records is a guess. ")
                    .then(
                        "A target or mix outside the ranges seen rests on the form of the technology"
                            + " alone. Such figures are marked wherever they stand."),
                Text.strong("Association is not cause. ")
                    .then(
                        "The technology describes how output and inputs went together in these plants."
                            + " That a plant which changes its inputs will move along it is an"
                            + " assumption, not a finding."),
                Text.strong("The decision rests with the reader ")
                    .then(
                        "and with the rules that apply; this report is evidence and not a ruling."))));
  }

  private static List<Block> assumptions() {
    return List.of(
        new Points(
            false,
            List.of(
                Text.of(
                    "Each input is one homogeneous thing: an hour of labour is an hour of labour in every"
                        + " plant and period."),
                Text.of(
                    "Prices are taken as given: a plant cannot move them by buying more or less."),
                Text.of(
                    "The services of owners and managers, where they are not an input of their own, are"
                        + " part of the cost of capital."),
                Text.of("All plants share one technology up to their level of productivity."))));
  }

  private static List<Block> estimation(Material material) {
    List<Text> points = new ArrayList<>();
    points.add(
        Text.strong("Inputs are chosen knowing productivity. ")
            .then(
                "A plant that expects a good period takes on more of the inputs it can change at once."
                    + " Least squares then credits those inputs with the productivity behind them: the"
                    + " expected sign of this transmission bias is upward for inputs that can be changed"
                    + " at once, and mostly downward for inputs fixed beforehand (Marschak and Andrews"
                    + " 1944)."
                    + effects(material)));
    points.add(
        Text.strong("Intervals cover sampling alone. ")
            .then(
                "They say how far figures would move had other plants of the same kind been drawn. They"
                    + " do not cover a wrong form, a wrong column, or what was left out."));
    if (material.findings().records().map(Records::plants).orElse(FEW_PLANTS) < FEW_PLANTS
        && clustered(material)) {
      points.add(
          Text.strong("Few plants. ")
              .then(
                  "Standard errors are clustered by plant over "
                      + Phrases.count(
                          material.findings().records().map(Records::plants).orElse(0), "plant")
                      + ". Below "
                      + FEW_PLANTS
                      + " they tend to be too small and intervals too narrow."));
    }
    points.add(
        Text.strong("From logs back to output. ")
            .then(
                "The technology is fitted in logs. A target is read as the output of the stated"
                    + " productivity, not as a mean over good and bad periods."));
    return List.of(
        Paragraph.of("What no statistic of this report would show:"), new Points(false, points));
  }

  private static String effects(Material material) {
    List<String> words =
        material.findings().fits().stream()
            .map(fit -> fit.how().plantEffects())
            .distinct()
            .toList();
    if (words.contains("random")) {
      return " Random effects assume that lasting differences between plants have nothing to do with"
          + " inputs; the tests say whether the records speak against it.";
    }
    if (words.contains("between")) {
      return " The regression between plants keeps what lasts and nothing else, so the bias from lasting"
          + " differences is at its greatest.";
    }
    boolean removed =
        words.contains("within") || words.contains("differences") || words.contains("mundlak");
    return removed
        ? " Plant effects remove the part that lasts; what changes from period to period remains."
        : " No plant effects were removed, so that lasting differences between plants remain in it.";
  }

  private static boolean clustered(Material material) {
    return material.findings().fits().stream()
        .map(Fitted::how)
        .anyMatch(how -> how.standardErrors().equals("clustered"));
  }
}

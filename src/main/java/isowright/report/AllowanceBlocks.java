package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.ReviewFindings;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Year;
import isowright.study.Study;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** From gap to allowance, every line of the arithmetic, year by year. */
final class AllowanceBlocks {

  /** So many plants are printed for each technology; the findings file has them all. */
  private static final int LONGEST = 30;

  private AllowanceBlocks() {}

  /** The section; absent where no allowance was asked. */
  static Optional<Section> section(Material material) {
    ReviewFindings review = material.findings().review();
    if (review.terms().isEmpty()) {
      return Optional.empty();
    }
    Study.Allowance terms = review.terms().get();
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        new Notice(
            Weight.WARNING,
            Text.of(
                "This is arithmetic, not advice. Safe staffing, law, collective agreements and"
                    + " licensed practice come first, and the controllable share, the quantile, the"
                    + " years, the frontier shift and the index are choices of whoever decides.")));
    blocks.add(Paragraph.of(terms(terms)));
    for (String technology :
        review.allowances().stream().map(Allowed::technology).distinct().toList()) {
      List<Allowed> own =
          review.allowances().stream().filter(a -> a.technology().equals(technology)).toList();
      blocks.addAll(material.drawings(Chart.Kind.ALLOWANCE_PATH, technology));
      blocks.add(table(material, technology, own));
    }
    return Optional.of(new Section("filing-allowance", "From gap to allowance", blocks));
  }

  private static String terms(Study.Allowance terms) {
    return "Of each gap the "
        + Numbers.percent(terms.quantile())
        + " quantile of its sampling distribution is used; what lies between it and the estimate is"
        + " the margin for error. Of that, the controllable share, "
        + Numbers.percent(terms.controllable())
        + ", is removed in equal steps over "
        + Phrases.count(terms.years(), "year")
        + "; a quantile below zero removes nothing. Kept apart from it: a frontier shift of "
        + Numbers.percent(terms.frontierShift())
        + " a year on what can be influenced, and an index of "
        + Numbers.percent(terms.index())
        + " a year on everything. Allowance = rest + controllable + shift + index.";
  }

  private static Table table(Material material, String technology, List<Allowed> allowed) {
    List<Group> groups = new ArrayList<>();
    allowed.stream().filter(a -> a.plant().isEmpty()).forEach(a -> groups.add(group(a)));
    allowed.stream()
        .filter(a -> !a.plant().isEmpty())
        .limit(LONGEST)
        .forEach(a -> groups.add(group(a)));
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Year 0 is as filed; the index is laid on top of the money of year 0. The sum adds up"
                + " the plants; the sum of quantiles is not the quantile of the sum."));
    if (allowed.size() - 1 > LONGEST) {
      notes.add(
          Text.of(
              LONGEST
                  + " of "
                  + Phrases.count(allowed.size() - 1L, "plant")
                  + "; the findings file has them all."));
    }
    return new Table(
        "Allowance by " + Terms.technology(technology) + ", in " + material.money(),
        "Year",
        List.of(
            Column.ofNumbers("Rest", ""),
            Column.ofNumbers("Gap removed", ""),
            Column.ofNumbers("Controllable", ""),
            Column.ofNumbers("Frontier shift", ""),
            Column.ofNumbers("Index", ""),
            Column.ofNumbers("Allowance", "")),
        groups,
        notes);
  }

  private static Group group(Allowed allowed) {
    String heading =
        (allowed.plant().isEmpty() ? "All plants" : allowed.plant())
            + ": filed "
            + Numbers.whole(allowed.filed())
            + ", gap "
            + Numbers.whole(allowed.gap())
            + ", used "
            + Numbers.whole(allowed.gapUsed())
            + ", margin "
            + Numbers.whole(allowed.margin())
            + ", removed over the years "
            + Numbers.whole(allowed.controllableGap());
    return new Group(Optional.of(heading), allowed.years().stream().map(y -> row(y)).toList());
  }

  private static Row row(Year year) {
    return new Row(
        Text.of(Integer.toString(year.year())),
        List.of(
            Cell.of(Numbers.whole(year.rest())),
            Cell.of(Numbers.whole(year.removed())),
            Cell.of(Numbers.whole(year.controllable())),
            Cell.of(Numbers.whole(year.shift())),
            Cell.of(Numbers.whole(year.index())),
            Cell.of(Numbers.whole(year.allowance()))));
  }
}

package isowright.handover;

import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Tested;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Year;
import isowright.study.Study;
import java.util.Locale;
import java.util.Optional;

/** The sheets that are lists: rows set aside, tests, filed costs, allowances. */
final class ListPapers {

  private static final int FIRST = 4;

  private ListPapers() {}

  static void setAside(Paper paper, Findings.Records records) {
    heads(paper, "reason", "how many", "the first rows, as numbered in the file");
    int row = FIRST;
    for (Findings.SetAside set : records.setAside()) {
      paper.text(row, 0, set.reason());
      paper.stated(row, 1, set.count());
      paper.text(row, 2, set.rows().toString().replaceAll("[\\[\\]]", ""));
      row++;
    }
    paper.width(0, 80);
    paper.verdict();
  }

  private static void heads(Paper paper, String... heads) {
    for (int c = 0; c < heads.length; c++) {
      paper.head(FIRST - 1, c, heads[c]);
    }
    paper.freeze(FIRST, 0);
  }

  /** Every test: its probability live from its statistic. */
  static void tests(Paper paper, Findings findings) {
    heads(
        paper,
        "technology",
        "test",
        "null hypothesis",
        "statistic",
        "law",
        "degrees of freedom",
        "and",
        "p, live",
        "p, stated",
        "same");
    int row = FIRST;
    for (Fitted fit : findings.fits()) {
      for (Tested test : fit.tests()) {
        Optional<String> p = probability(test, row);
        paper.text(row, 0, fit.technology());
        paper.text(row, 1, test.name());
        paper.text(row, 2, test.nullHypothesis());
        paper.input(row, 3, test.statistic());
        paper.text(row, 4, test.distribution());
        for (int d = 0; d < Math.min(2, test.degreesOfFreedom().size()); d++) {
          paper.input(row, 5 + d, test.degreesOfFreedom().get(d));
        }
        paper.stated(row, 8, test.p());
        if (p.isPresent() && Double.isFinite(test.p())) {
          paper.live(row, 7, p.get());
          paper.check(row, 9, Paper.at(row, 7), Paper.at(row, 8));
        }
        row++;
      }
    }
    paper.width(2, 40);
    paper.verdict();
  }

  /** Only laws whose degrees of freedom are whole: a workbook cuts the others off. */
  private static Optional<String> probability(Tested test, int row) {
    boolean whole = test.degreesOfFreedom().stream().allMatch(d -> d == Math.rint(d));
    String statistic = Paper.at(row, 3);
    if (!whole || !Double.isFinite(test.statistic())) {
      return Optional.empty();
    }
    return switch (test.distribution()) {
      case "F" ->
          Optional.of("FDIST(" + statistic + "," + Paper.at(row, 5) + "," + Paper.at(row, 6) + ")");
      case "chi-squared" -> Optional.of("CHIDIST(" + statistic + "," + Paper.at(row, 5) + ")");
      case "t" -> Optional.of("TDIST(ABS(" + statistic + ")," + Paper.at(row, 5) + ",2)");
      case "normal" -> Optional.of("2*(1-NORMSDIST(ABS(" + statistic + ")))");
      default -> Optional.empty();
    };
  }

  /** Filed less least cost, and the parts, which must add up to it. */
  static void review(Paper paper, Findings findings) {
    heads(
        paper,
        "plant",
        "period",
        "technology",
        "filed",
        "least cost",
        "gap, live",
        "gap, stated",
        "same",
        "unreconciled",
        "technical",
        "mix",
        "remainder",
        "parts together",
        "add up");
    int row = FIRST;
    for (Reviewed filing : findings.reviews()) {
      if (filing.leastCost().isEmpty() || filing.gap().isEmpty()) {
        continue;
      }
      paper.text(row, 0, filing.plant());
      paper.text(row, 1, filing.period());
      paper.text(row, 2, filing.technology());
      paper.input(row, 3, filing.filed());
      paper.input(row, 4, filing.leastCost().get().value());
      paper.live(row, 5, Paper.at(row, 3) + "-" + Paper.at(row, 4));
      paper.stated(row, 6, filing.gap().get().value());
      paper.check(row, 7, Paper.at(row, 5), Paper.at(row, 6));
      if (filing.technical().isPresent() && filing.mix().isPresent()) {
        paper.input(row, 8, filing.unreconciled());
        paper.input(row, 9, filing.technical().get().value());
        paper.input(row, 10, filing.mix().get().value());
        paper.input(row, 11, filing.detail().map(d -> d.remainder().value()).orElse(0.0));
        paper.live(row, 12, "SUM(" + Paper.at(row, 8) + ":" + Paper.at(row, 11) + ")");
        paper.check(row, 13, Paper.at(row, 12), Paper.at(row, 6));
      }
      row++;
    }
    paper.verdict();
  }

  /** The path of each allowance from the terms, line by line. */
  static void allowances(Paper paper, Findings findings, Study.Allowance terms) {
    String[] names = {"controllable share", "years", "frontier shift a year", "index a year"};
    double[] values = {terms.controllable(), terms.years(), terms.frontierShift(), terms.index()};
    for (int t = 0; t < names.length; t++) {
      paper.text(2 + t, 0, names[t]);
      paper.input(2 + t, 1, values[t]);
    }
    String[] heads = {
      "plant",
      "technology",
      "year",
      "filed",
      "gap used",
      "rest",
      "controllable",
      "shift",
      "index",
      "allowance, live",
      "allowance, stated",
      "same"
    };
    int top = 7;
    for (int c = 0; c < heads.length; c++) {
      paper.head(top, c, heads[c]);
    }
    paper.freeze(top + 1, 0);
    int row = top + 1;
    for (Allowed allowed : findings.review().allowances()) {
      for (Year year : allowed.years()) {
        year(paper, row++, allowed, year);
      }
    }
    paper.verdict();
  }

  private static void year(Paper paper, int row, Allowed allowed, Year year) {
    paper.text(row, 0, allowed.plant());
    paper.text(row, 1, allowed.technology());
    paper.input(row, 2, year.year());
    paper.input(row, 3, allowed.filed());
    paper.input(row, 4, allowed.gapUsed());
    String filed = Paper.at(row, 3);
    String t = Paper.at(row, 2);
    paper.live(row, 5, "(1-$B$3)*" + filed);
    paper.live(
        row,
        6,
        String.format(Locale.ROOT, "$B$3*%s-%s/$B$4*$B$3*MAX(%s,0)", filed, t, Paper.at(row, 4)));
    paper.live(row, 7, "-" + Paper.at(row, 6) + "*(1-(1-$B$5)^" + t + ")");
    paper.live(
        row,
        8,
        "("
            + Paper.at(row, 5)
            + "+"
            + Paper.at(row, 6)
            + "+"
            + Paper.at(row, 7)
            + ")*((1+$B$6)^"
            + t
            + "-1)");
    paper.live(row, 9, "SUM(" + Paper.at(row, 5) + ":" + Paper.at(row, 8) + ")");
    paper.stated(row, 10, year.allowance());
    paper.check(row, 11, Paper.at(row, 9), Paper.at(row, 10));
  }
}

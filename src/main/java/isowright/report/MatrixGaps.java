package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.MatrixFindings;
import isowright.study.ReviewFindings.Spread;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** How far the gap of each filing rests on what was chosen: in the review, and in the fit. */
final class MatrixGaps {

  /** So many filings are printed; the findings file has them all. */
  private static final int LONGEST = 60;

  private MatrixGaps() {}

  /** The table; absent where no costs were reviewed. */
  static Optional<Block> of(Material material, MatrixFindings matrix) {
    if (matrix.gaps().isEmpty()) {
      return Optional.empty();
    }
    List<Row> rows = new ArrayList<>();
    for (Spread gap : matrix.gaps().stream().limit(LONGEST).toList()) {
      Optional<Spread> review = review(material, gap);
      List<Cell> cells = new ArrayList<>();
      cells.add(range(gap));
      cells.add(Cell.of(Terms.specification(gap.lowBy()), Terms.specification(gap.highBy())));
      cells.add(review.map(MatrixGaps::range).orElse(Cell.none()));
      cells.add(Cell.of(sign(gap, review)));
      rows.add(new Row(Text.of(gap.plant()), cells));
    }
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Gaps as shares of what was filed, in "
                + matrix.gaps().get(0).period()
                + ": the lowest and the highest. Choices of the review are reference, money, price"
                + " of capital and each plant left out of the estimation, one at a time, with the"
                + " technologies of the study; where a choice was not open it is not among them. A"
                + " sign that holds throughout is not thereby a sign of waste."));
    if (matrix.gaps().size() > LONGEST) {
      notes.add(
          Text.of(
              "The first "
                  + LONGEST
                  + " of "
                  + Numbers.count(matrix.gaps().size())
                  + " filings; the findings file has them all."));
    }
    return Optional.of(
        new Table(
            "The gap of each filing under other choices",
            "Plant",
            List.of(
                Column.ofNumbers("Over specifications", "lowest to highest"),
                Column.ofWords("Lowest by, highest by"),
                Column.ofNumbers("Over choices of the review", "lowest to highest"),
                Column.ofWords("Filed against least cost")),
            List.of(Group.of(rows)),
            notes));
  }

  private static Optional<Spread> review(Material material, Spread gap) {
    return material.findings().review().spreads().stream()
        .filter(s -> s.plant().equals(gap.plant()) && s.period().equals(gap.period()))
        .findFirst();
  }

  private static Cell range(Spread gap) {
    return Cell.of(Numbers.percent(gap.low()) + " to " + Numbers.percent(gap.high()));
  }

  private static String sign(Spread gap, Optional<Spread> review) {
    double low = Math.min(gap.low(), review.map(Spread::low).orElse(gap.low()));
    double high = Math.max(gap.high(), review.map(Spread::high).orElse(gap.high()));
    if (low > 0) {
      return "above throughout";
    }
    return high < 0 ? "below throughout" : "depends on what was chosen";
  }
}

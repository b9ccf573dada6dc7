package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Tested;
import isowright.study.SpecificationFindings;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Tests: the null, the statistic, the p-value as a number, and the verdict in words. */
final class TestsSection {

  static final String ID = "tests";

  private TestsSection() {}

  static Section of(Material material) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : material.findings().fits()) {
      List<Row> rows = new ArrayList<>();
      for (Tested test : fit.tests()) {
        if (!SpecificationFindings.TESTS.contains(test.name())) {
          rows.add(new Row(Text.of(Terms.test(test.name())), cells(test, material)));
        }
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "A null that is not rejected is not thereby true: the records may be too few to tell. A null"
                + " that is rejected may still be close to the truth."));
    blocks.add(
        new Table(
            "Tests, technology by technology",
            "Question",
            List.of(
                Column.ofWords("Null"),
                Column.ofNumbers("Statistic", ""),
                Column.ofNumbers("p-value", ""),
                Column.ofWords("At " + material.significance()),
                Column.ofWords("In words")),
            groups,
            List.of()));
    return new Section(ID, "Tests", blocks);
  }

  static List<Cell> cells(Tested test, Material material) {
    return List.of(
        Cell.of(test.nullHypothesis()),
        Cell.of(Phrases.statistic(test)),
        Cell.of(Numbers.p(test.p(), Phrases.level(material.confidence()))),
        Cell.of(Phrases.outcome(test, material.confidence())),
        Cell.of(test.verdict()));
  }
}

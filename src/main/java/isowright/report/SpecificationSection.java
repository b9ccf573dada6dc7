package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Tested;
import isowright.study.SpecificationFindings;
import isowright.study.SpecificationFindings.Inflation;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The annex on the specification: whether the forms are rich enough, what the errors look like, and
 * how far regressors stand in one another's way.
 */
final class SpecificationSection {

  static final String ID = "specification";

  /** Above this factor, collinearity is usually remarked upon: common practice. */
  private static final double HIGH = 10;

  private SpecificationSection() {}

  /** The annex; absent where nothing was fitted. */
  static Optional<Section> of(Material material) {
    List<Group> tests = tests(material);
    if (tests.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "These tests ask whether a fit describes its rows as it claims. They make the assumption"
                + " about errors that the fit’s standard errors make."));
    blocks.add(
        new Table(
            "Tests of the specification, technology by technology",
            "Question",
            List.of(
                Column.ofWords("Null"),
                Column.ofNumbers("Statistic", ""),
                Column.ofNumbers("p-value", ""),
                Column.ofWords("At " + material.significance())),
            tests,
            List.of()));
    blocks.add(new Points(false, meanings()));
    inflation(material).ifPresent(blocks::add);
    blocks.addAll(FormsBlocks.annex(material));
    blocks.add(Paragraph.of(CRITERIA));
    return Optional.of(new Section(ID, "Annex: specification", blocks));
  }

  private static final String CRITERIA =
      "AIC = −2 ln L + 2p and BIC = −2 ln L + p ln N, as they stand in the table of technologies,"
          + " with the log-likelihood of normal errors at its maximum; p counts the error variance"
          + " and every plant effect. They compare fits of the same rows and the same output; lower"
          + " is better.";

  private static List<Group> tests(Material material) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : material.findings().fits()) {
      List<Row> rows = new ArrayList<>();
      for (Tested test : fit.tests()) {
        if (SpecificationFindings.TESTS.contains(test.name())) {
          rows.add(
              new Row(
                  Text.of(Terms.test(test.name())),
                  TestsSection.cells(test, material).subList(0, 4)));
        }
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    return groups;
  }

  private static List<Text> meanings() {
    return List.of(
        Text.strong("RESET. ")
            .then(
                "A rejection says that output bends in the inputs in a way the form cannot follow;"
                    + " a richer form, or a missing control, is the first thing to try."),
        Text.strong("Equal variance. ")
            .then(
                "A rejection leaves the coefficients as they are and concerns classical standard"
                    + " errors alone; robust and clustered ones allow for it."),
        Text.strong("Normal errors. ")
            .then(
                "A rejection matters for small samples; estimates and intervals rest on averages"
                    + " over many rows otherwise. Single wild rows are a common cause."));
  }

  private static Optional<Block> inflation(Material material) {
    List<Inflation> all = material.findings().specification().inflation();
    if (all.isEmpty()) {
      return Optional.empty();
    }
    Map<String, List<Row>> byFit = new LinkedHashMap<>();
    boolean products = false;
    for (Inflation factor : all) {
      products |= factor.parameter().contains("*") && factor.centred() > HIGH;
      byFit
          .computeIfAbsent(factor.technology(), t -> new ArrayList<>())
          .add(
              new Row(
                  Text.of(Terms.parameter(factor.parameter())),
                  List.of(
                      Cell.of(Numbers.significant(factor.centred(), 3)),
                      Cell.of(Numbers.significant(factor.raw(), 3)))));
    }
    List<Group> groups = new ArrayList<>();
    byFit.forEach((fit, rows) -> groups.add(new Group(Optional.of(Terms.technology(fit)), rows)));
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "By what factor the other regressors inflate the variance of the coefficient. Centred:"
                + " about the mean, or about the means of plants where those were removed. Raw: about"
                + " zero, with constant and plant effects among the other regressors."));
    if (products) {
      notes.add(
          Text.of(
              "High factors of second-order terms are expected: squares and products of the same logs"
                  + " move together by construction. They widen the interval of a single coefficient;"
                  + " elasticities at stated points combine the coefficients, and their intervals"
                  + " already hold what this costs."));
    }
    return Optional.of(
        new Table(
            "Variance inflation of the coefficients",
            "Parameter",
            List.of(Column.ofNumbers("Centred", ""), Column.ofNumbers("Raw", "")),
            groups,
            notes));
  }
}

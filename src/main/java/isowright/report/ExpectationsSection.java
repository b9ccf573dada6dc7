package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.SpecificationFindings.Agreement;
import isowright.study.SpecificationFindings.Expected;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What was expected before fitting beside what was found. */
final class ExpectationsSection {

  static final String ID = "expectations";

  private ExpectationsSection() {}

  /** The section; absent where nothing was expected. */
  static Optional<Section> of(Material material) {
    List<Expected> expectations = material.findings().specification().expectations();
    if (expectations.isEmpty()) {
      return Optional.empty();
    }
    Map<String, List<Row>> byFit = new LinkedHashMap<>();
    for (Expected expected : expectations) {
      byFit.computeIfAbsent(expected.technology(), t -> new ArrayList<>()).add(row(expected));
    }
    List<Group> groups = new ArrayList<>();
    byFit.forEach((fit, rows) -> groups.add(new Group(Optional.of(Terms.technology(fit)), rows)));
    List<Block> blocks = new ArrayList<>();
    blocks.add(Paragraph.of(counts(expectations)));
    blocks.add(
        new Table(
            "Expected and found",
            "Figure",
            List.of(
                Column.ofNumbers("Expected", ""),
                Column.ofNumbers("Found", ""),
                Column.ofWords("Verdict")),
            groups,
            List.of(
                Text.of(
                    "Inside: the whole interval lies in the range expected. Outside: no part of it"
                        + " does. A result that was not expected is a question to the records, the"
                        + " form and the expectation alike."))));
    return Optional.of(new Section(ID, "Expected and found", blocks));
  }

  private static Row row(Expected expected) {
    return new Row(
        Text.of(name(expected)),
        List.of(
            Cell.of(range(expected.low(), expected.high())),
            Cells.figure(expected.found()),
            Cell.of(expected.agreement().word())));
  }

  private static String range(double low, double high) {
    if (Double.isInfinite(low) && Double.isInfinite(high)) {
      return "any value";
    }
    if (Double.isInfinite(low)) {
      return Numbers.amount(high) + " or less";
    }
    return Double.isInfinite(high)
        ? Numbers.amount(low) + " or more"
        : Numbers.amount(low) + " to " + Numbers.amount(high);
  }

  private static String name(Expected expected) {
    String of = Phrases.list(expected.of());
    return switch (expected.figure()) {
      case "output-elasticity" -> "Output elasticity of " + of;
      case "substitution" -> "Substitution" + (of.isEmpty() ? "" : " of " + of);
      default -> Phrases.sentence(expected.figure().replace('-', ' '));
    };
  }

  private static String counts(List<Expected> expectations) {
    List<String> parts = new ArrayList<>();
    for (Agreement agreement : Agreement.values()) {
      long count = expectations.stream().filter(e -> e.agreement() == agreement).count();
      if (count > 0) {
        parts.add(Numbers.count(count) + " " + words(agreement));
      }
    }
    return "The study file states what was expected before anything was fitted. Of "
        + Phrases.count(expectations.size(), "figure")
        + ", "
        + Phrases.list(parts)
        + ".";
  }

  private static String words(Agreement agreement) {
    return switch (agreement) {
      case INSIDE -> "inside the range expected";
      case OVERLAPS -> "with an interval that overlaps it";
      case OUTSIDE -> "outside it";
      case UNKNOWN -> "without a figure";
    };
  }
}

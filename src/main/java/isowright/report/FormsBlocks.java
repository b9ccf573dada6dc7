package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Tested;
import isowright.study.SpecificationFindings;
import isowright.study.SpecificationFindings.Comparison;
import isowright.study.SpecificationFindings.Predicted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Forms held against one another: by likelihood, by the J test, by predicting unseen plants. */
final class FormsBlocks {

  private FormsBlocks() {}

  /** What follows, in a few sentences. */
  static List<Block> brief(Material material) {
    SpecificationFindings found = material.findings().specification();
    List<Block> blocks = new ArrayList<>();
    found.comparisons().forEach(c -> blocks.add(Paragraph.of(c.words())));
    found.predictions().stream()
        .filter(p -> p.difference().isEmpty())
        .findFirst()
        .ifPresent(best -> blocks.add(Paragraph.of(predicted(found.predictions(), best))));
    return blocks;
  }

  private static String predicted(List<Predicted> predictions, Predicted best) {
    List<String> worse = new ArrayList<>();
    List<String> alike = new ArrayList<>();
    for (Predicted predicted : predictions) {
      if (predicted != best) {
        boolean clearly = predicted.verdict().startsWith("worse");
        (clearly ? worse : alike).add(Terms.technology(predicted.technology()));
      }
    }
    StringBuilder words = new StringBuilder();
    words.append(
        best.judged().equals("changes")
            ? "Changes within plants that were left out of the fit are predicted best by "
            : "Plants that were left out of the fit are predicted best by ");
    words.append(Terms.technology(best.technology()));
    words.append(" (error ").append(Numbers.significant(best.error(), 3)).append(" in ln output)");
    if (!alike.isEmpty()) {
      words.append("; from it cannot be told apart ").append(Phrases.list(alike));
    }
    if (!worse.isEmpty()) {
      words.append("; worse predict ").append(Phrases.list(worse));
    }
    return words.append(". The annex on specification has the figures.").toString();
  }

  /** The figures. */
  static List<Block> annex(Material material) {
    SpecificationFindings found = material.findings().specification();
    List<Block> blocks = new ArrayList<>();
    comparisons(material, found.comparisons()).ifPresent(blocks::add);
    predictions(found.predictions()).ifPresent(blocks::add);
    return blocks;
  }

  private static Optional<Block> comparisons(Material material, List<Comparison> comparisons) {
    if (comparisons.isEmpty()) {
      return Optional.empty();
    }
    List<Group> groups = new ArrayList<>();
    for (Comparison comparison : comparisons) {
      List<Row> rows = new ArrayList<>();
      for (Tested test : comparison.tests()) {
        rows.add(
            new Row(
                Text.of(Terms.test(test.name())),
                TestsSection.cells(test, material).subList(0, 4)));
      }
      groups.add(
          new Group(
              Optional.of(
                  Terms.technology(comparison.first())
                      + " and "
                      + Terms.technology(comparison.second())),
              rows));
    }
    return Optional.of(
        new Table(
            "Forms of which neither contains the other",
            "Question",
            List.of(
                Column.ofWords("Null"),
                Column.ofNumbers("Statistic", ""),
                Column.ofNumbers("p-value", ""),
                Column.ofWords("At " + material.significance())),
            groups,
            List.of(
                Text.of(
                    "Above zero the first form is nearer. If the two describe every row alike, the"
                        + " question which is nearer has no meaning. Where standard errors are"
                        + " clustered or plant effects removed, plants are the units: rows of a plant"
                        + " may depend on one another, and its likelihood is taken as the product of"
                        + " those of its rows."))));
  }

  private static Optional<Block> predictions(List<Predicted> predictions) {
    if (predictions.isEmpty()) {
      return Optional.empty();
    }
    Predicted first = predictions.get(0);
    boolean changes = first.judged().equals("changes");
    List<Row> rows = new ArrayList<>();
    for (Predicted p : predictions) {
      rows.add(
          new Row(
              Text.of(Terms.technology(p.technology())),
              List.of(
                  Cell.of(Numbers.significant(p.error(), 3)),
                  Cells.figure(p.difference()),
                  p.levelError().map(e -> Cell.of(Numbers.significant(e, 3))).orElse(Cell.none()),
                  Cell.of(p.verdict()))));
    }
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Root mean squared errors in ln output of "
                + Phrases.count(first.plants(), "plant")
                + ", each predicted by a fit without the fold it is in ("
                + Phrases.count(first.folds(), "fold")
                + (first.failed() > 0
                    ? ", of which " + first.failed() + " could not be fitted"
                    : "")
                + "). "
                + (changes
                    ? "A plant that was not seen has no level of its own: judged are its changes about"
                        + " its own mean. With no change foreseen at all the error would be "
                        + first.spread().map(s -> Numbers.significant(s, 3)).orElse("unknown")
                        + "."
                    : "Every row is a plant of its own: judged are levels.")));
    return Optional.of(
        new Table(
            "Prediction of plants left out",
            "Technology",
            List.of(
                Column.ofNumbers(changes ? "Error of changes" : "Error of levels", ""),
                Column.ofNumbers("Mean square above the least", ""),
                Column.ofNumbers("Error of levels", ""),
                Column.ofWords("Verdict")),
            List.of(Group.of(rows)),
            notes));
  }
}

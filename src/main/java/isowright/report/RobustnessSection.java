package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.Figure;
import isowright.study.Figure.Without;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Influential;
import isowright.study.RobustnessFindings.Beyond;
import isowright.study.RobustnessFindings.Compared;
import isowright.study.RobustnessFindings.Huber;
import isowright.study.RobustnessFindings.Resampling;
import isowright.study.RobustnessFindings.Wild;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Annex: how far the figures stand. What they are without a plant or a period, over plants drawn
 * anew, and where large residuals count for less; tests with few plants in mind; rows that weigh
 * much.
 */
final class RobustnessSection {

  static final String ID = "robustness";

  /** So many filed costs are printed; the findings file has them all. */
  private static final int LONGEST = 40;

  private RobustnessSection() {}

  /** The annex; absent where no technology was fitted. */
  static Optional<Section> of(Material material) {
    List<Block> blocks = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      List<Block> inside = new ArrayList<>();
      Map<String, Figure> figures = RefittedFigures.of(material, fit, LONGEST);
      fit.robustness().resampling().ifPresent(r -> inside.add(drawn(r)));
      drawn(fit, figures).ifPresent(inside::add);
      leftOut(fit, figures).ifPresent(inside::add);
      wild(fit, material).ifPresent(inside::add);
      influence(fit).ifPresent(inside::add);
      fit.robustness().huber().ifPresent(huber -> inside.add(huber(fit, huber)));
      if (!inside.isEmpty()) {
        blocks.add(
            new Section(ID + "-" + fit.technology(), Terms.technology(fit.technology()), inside));
      }
    }
    return blocks.isEmpty()
        ? Optional.empty()
        : Optional.of(new Section(ID, "Annex: how far the figures stand", blocks));
  }

  /** What the tables of a technology come to, in one line of the main text. */
  static Optional<Text> line(Fitted fit) {
    Optional<Figure> scale = fit.returnsToScale();
    if (scale.isEmpty() || scale.get().refits().none()) {
      return Optional.empty();
    }
    Figure.Refits refits = scale.get().refits();
    List<String> parts = new ArrayList<>();
    refits
        .withoutPlant()
        .ifPresent(
            w ->
                parts.add(
                    Numbers.significant(w.value(), 4)
                        + " without "
                        + w.name()
                        + ", the plant that moves them most"));
    refits
        .withoutPeriod()
        .ifPresent(w -> parts.add(Numbers.significant(w.value(), 4) + " without " + w.name()));
    String moved = parts.isEmpty() ? "" : " would be " + Phrases.list(parts);
    String drawn =
        refits
            .drawn()
            .map(
                d ->
                    (parts.isEmpty() ? " have the standard error " : "; their standard error is ")
                        + Numbers.small(d.standardError())
                        + " over "
                        + Numbers.count(d.draws())
                        + " draws of plants")
            .orElse("");
    return Optional.of(
        Text.strong(Terms.technology(fit.technology()) + ": ")
            .then("returns to scale, " + Numbers.significant(scale.get().value(), 4) + ",")
            .then(moved + drawn + " ")
            .thenReference("(annex)", ID + "-" + fit.technology())
            .then("."));
  }

  private static Paragraph drawn(Resampling r) {
    List<String> lost = new ArrayList<>();
    if (r.lostRank() > 0) {
      lost.add(Phrases.count(r.lostRank(), "draw") + " could not tell the parameters apart");
    }
    if (r.withoutOptimum() > 0) {
      lost.add(
          "in "
              + Phrases.count(r.withoutOptimum(), "draw")
              + " the search found no optimum inside the economic region");
    }
    return Paragraph.of(
        Numbers.count(r.count())
            + " "
            + r.units()
            + " were drawn from "
            + Numbers.count(r.count())
            + ", with replacement and whole, "
            + Numbers.count(r.draws())
            + " times, from seed "
            + r.seed()
            + (lost.isEmpty()
                ? "; every draw gave an estimate."
                : "; " + Phrases.list(lost) + "."));
  }

  private static Optional<Block> drawn(Fitted fit, Map<String, Figure> figures) {
    List<Row> rows = new ArrayList<>();
    figures.forEach(
        (name, figure) ->
            figure
                .refits()
                .drawn()
                .ifPresent(drawn -> rows.add(RefittedFigures.row(name, figure, drawn))));
    return rows.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Figures over draws, " + Terms.technology(fit.technology()),
                "Figure",
                List.of(
                    Column.ofNumbers("Value", ""),
                    Column.ofNumbers("Standard error", "draws; propagation beneath"),
                    Column.ofNumbers("Percentiles", ""),
                    Column.ofNumbers("Bias-corrected", ""),
                    Column.ofNumbers("and accelerated", ""),
                    Column.ofNumbers("By propagation", ""),
                    Column.ofNumbers("Without value", "draws")),
                List.of(Group.of(rows)),
                List.of()));
  }

  private static Optional<Block> leftOut(Fitted fit, Map<String, Figure> figures) {
    List<Row> rows = new ArrayList<>();
    figures.forEach(
        (name, figure) -> {
          Figure.Refits refits = figure.refits();
          if (refits.withoutPlant().isPresent() || refits.withoutPeriod().isPresent()) {
            rows.add(
                new Row(
                    Text.of(name),
                    List.of(
                        Cell.of(Numbers.value(figure), Numbers.interval(figure)),
                        without(figure, refits.withoutPlant()),
                        without(figure, refits.withoutPeriod()))));
          }
        });
    return rows.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Figures without the plant or period that moves them most, "
                    + Terms.technology(fit.technology()),
                "Figure",
                List.of(
                    Column.ofNumbers("Value", ""),
                    Column.ofNumbers("Without a plant", ""),
                    Column.ofNumbers("Without a period", "")),
                List.of(Group.of(rows)),
                List.of(
                    Text.of(
                        "The technology is fitted again without it. A figure far from its own"
                            + " interval then rests on one plant or one period."))));
  }

  private static Cell without(Figure figure, Optional<Without> without) {
    return without
        .map(
            w ->
                Cell.of(
                    RefittedFigures.like(figure, w.value()),
                    w.lost() == 0
                        ? w.name()
                        : w.name() + "; " + Numbers.count(w.lost()) + " cannot be left out"))
        .orElse(Cell.none());
  }

  private static Optional<Block> wild(Fitted fit, Material material) {
    List<Row> rows = new ArrayList<>();
    for (Wild wild : fit.robustness().wild()) {
      rows.add(
          Row.of(
              Terms.test(wild.name()),
              List.of(
                  wild.nullHypothesis(),
                  Numbers.statistic(wild.statistic()),
                  Double.isNaN(wild.p())
                      ? "—"
                      : Numbers.p(wild.p(), Phrases.level(material.confidence())),
                  wild.weights().equals("webb") ? "six points" : "two points",
                  wild.verdict())));
    }
    return rows.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Tests by the wild cluster bootstrap, " + Terms.technology(fit.technology()),
                "Question",
                List.of(
                    Column.ofWords("Null"),
                    Column.ofNumbers("Statistic", "Wald’s, F form"),
                    Column.ofNumbers("p-value", ""),
                    Column.ofWords("Weights"),
                    Column.ofWords("In words")),
                List.of(Group.of(rows)),
                List.of(
                    Text.of(
                        "Residuals of each plant are multiplied by a random weight under the null, so"
                            + " that the law of the statistic with so few plants is seen and not"
                            + " assumed."))));
  }

  private static Optional<Block> influence(Fitted fit) {
    if (fit.influence().isEmpty() || fit.robustness().influence().isEmpty()) {
      return Optional.empty();
    }
    Beyond beyond = fit.robustness().influence().get();
    List<Row> rows = new ArrayList<>();
    for (Influential row : fit.influence()) {
      rows.add(
          Row.of(
              String.valueOf(row.row()),
              List.of(
                  row.plant(),
                  row.period(),
                  Numbers.significant(row.leverage(), 2),
                  Numbers.significant(row.deletedResidual(), 3),
                  Numbers.significant(row.dffits(), 2),
                  Numbers.significant(row.dfbetas(), 2) + ", " + Terms.parameter(row.parameter()),
                  Numbers.significant(row.covarianceRatio(), 3),
                  String.valueOf(row.beyond()))));
    }
    return Optional.of(
        new Table(
            "Measures of influence, " + Terms.technology(fit.technology()),
            "Row in the file",
            List.of(
                Column.ofWords("Plant"),
                Column.ofWords("Period"),
                Column.ofNumbers("Leverage", cut(beyond.leverage())),
                Column.ofNumbers("Studentised residual", cut(beyond.deletedResidual())),
                Column.ofNumbers("DFFITS", cut(beyond.dffits())),
                Column.ofNumbers("Largest DFBETAS", cut(beyond.dfbetas())),
                Column.ofNumbers(
                    "Covariance ratio", "1 ± " + Numbers.significant(beyond.covarianceRatio(), 2)),
                Column.ofNumbers("Beyond", "of five")),
            List.of(Group.of(rows)),
            List.of(
                Text.of(
                    "Largest Cook’s distance first; cut-offs in the headings. "
                        + Phrases.sentence(Phrases.count(beyond.rows(), "row"))
                        + (beyond.rows() == 1 ? " lies" : " lie")
                        + " beyond at least "
                        + beyond.several()
                        + " of the five."))));
  }

  private static String cut(double cutoff) {
    return "above " + Numbers.significant(cutoff, 2);
  }

  private static Block huber(Fitted fit, Huber huber) {
    List<Row> rows = new ArrayList<>();
    for (Compared compared : huber.compared()) {
      rows.add(
          Row.of(
              Phrases.sentence(compared.figure()),
              List.of(
                  Numbers.significant(compared.value(), 4),
                  Numbers.significant(compared.huber(), 4),
                  Double.isNaN(compared.apart())
                      ? "—"
                      : Numbers.significant(compared.apart(), 2))));
    }
    return new Table(
        "Large residuals counting for less, " + Terms.technology(fit.technology()),
        "Figure",
        List.of(
            Column.ofNumbers("Least squares", ""),
            Column.ofNumbers("Huber", ""),
            Column.ofNumbers("Apart", "standard errors")),
        List.of(Group.of(rows)),
        List.of(
            Text.of(
                Phrases.sentence(Phrases.count(huber.lessened(), "row"))
                    + " of "
                    + Numbers.count(huber.rows())
                    + (huber.lessened() == 1 ? " counts" : " count")
                    + " for less; the scale of residuals is "
                    + Numbers.significant(huber.scale(), 3)
                    + " in logs.")));
  }
}

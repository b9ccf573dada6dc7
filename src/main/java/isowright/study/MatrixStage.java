package isowright.study;

import isowright.estimation.PanelSample;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.KeptPart;
import isowright.records.Panel;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Headline;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/**
 * Fits every combination of a specification matrix, both cores at work, on records that all
 * combinations of a sample share; puts them in order and marks the one that the criteria choose.
 */
final class MatrixStage {

  private final Study study;
  private final Matrix matrix;
  private final Panel panel;

  private MatrixStage(Study study, Matrix matrix, Panel panel) {
    this.study = study;
    this.matrix = matrix;
    this.panel = panel;
  }

  /** What a study's matrix found; nothing where it asks for none. */
  static Optional<MatrixFindings> findings(Study study, Optional<Panel> panel) {
    return study.protocol().matrix().isPresent() && panel.isPresent()
        ? Optional.of(
            new MatrixStage(study, study.protocol().matrix().get(), panel.get()).findings())
        : Optional.empty();
  }

  /** The rows of a sample. */
  static IntPredicate rows(Matrix.Sample sample, Panel panel) {
    KeptPart part = KeptPart.of(panel, sample.keep());
    int middle = panel.periods().size() / 2;
    return row -> {
      boolean later = panel.rowPeriods().get(row) >= middle;
      return part.row(row)
          && sample.half().map(half -> (half == Matrix.Half.LATER) == later).orElse(true);
    };
  }

  private MatrixFindings findings() {
    Map<Matrix.Sample, Panel> panels = new LinkedHashMap<>();
    for (Matrix.Sample sample : matrix.samples()) {
      Panel rows = PanelSample.of(panel, rows(sample, panel));
      if (!(matrix.usual() && panels.containsValue(rows))) { // a half of one period is the whole
        panels.put(sample, rows);
      }
    }
    List<MatrixCell> cells = cells(panels);
    MatrixHeadlines headlines = new MatrixHeadlines(study, panel);
    MatrixCell.Found[] found = new MatrixCell.Found[cells.size()];
    IntStream.range(0, cells.size())
        .boxed()
        .sorted(Comparator.comparing(c -> !cells.get(c).searched(study)))
        .toList()
        .parallelStream()
        .forEach(c -> found[c] = cells.get(c).found(study, headlines, matrix.chooseBy()));
    MatrixChoice choice = MatrixChoice.of(matrix.chooseBy(), List.of(found));
    MatrixFindings all =
        new MatrixFindings(
            panels.entrySet().stream().map(e -> described(e.getKey(), e.getValue())).toList(),
            matrix.chooseBy().stream().map(Matrix.Criterion::word).toList(),
            headlines(study, headlines, choice.cells()),
            choice.cells(),
            choice.chosen(),
            choice.words(),
            List.of());
    return all.with(gaps(all, List.of(found), headlines.filings()));
  }

  /** Filing by filing, the lowest and the highest gap of any combination. */
  private List<ReviewFindings.Spread> gaps(
      MatrixFindings all, List<MatrixCell.Found> found, int[] filings) {
    GapSpread spread = new GapSpread();
    for (MatrixCell.Found one : found) {
      if (!one.gaps().isEmpty()) {
        spread.note(
            one.cell().technology(),
            all.circumstances(one.cell()),
            filings,
            one.gaps().stream().mapToDouble(Double::doubleValue).toArray());
      }
    }
    return spread.spreads(panel);
  }

  private List<MatrixCell> cells(Map<Matrix.Sample, Panel> panels) {
    StandardErrors own = FitStage.standardErrors(study);
    List<StandardErrors> errors =
        matrix.standardErrors().isEmpty() ? List.of(own) : matrix.standardErrors();
    List<MatrixCell> cells = new ArrayList<>();
    for (String technology : matrix.technologies()) {
      for (PlantEffects effects : matrix.plantEffects()) {
        for (Time time : matrix.times()) {
          for (StandardErrors kind : errors) {
            panels.forEach(
                (sample, rows) ->
                    cells.add(
                        new MatrixCell(
                            technology,
                            effects,
                            time,
                            kind,
                            sample.name(),
                            rows,
                            study.technologies().contains(technology)
                                && effects == study.estimation().plantEffects()
                                && time == study.estimation().time()
                                && kind == own
                                && rows == panel)));
          }
        }
      }
    }
    return cells;
  }

  private static MatrixFindings.Sample described(Matrix.Sample sample, Panel rows) {
    List<String> parts = new ArrayList<>();
    sample
        .keep()
        .firstPeriod()
        .ifPresent(
            first -> parts.add("from " + first + " to " + sample.keep().lastPeriod().orElse("")));
    sample.half().ifPresent(half -> parts.add("the " + half.word() + " half of the periods"));
    if (!sample.keep().withoutPlants().isEmpty()) {
      parts.add("without " + String.join(", ", sample.keep().withoutPlants()));
    }
    return new MatrixFindings.Sample(
        sample.name(),
        parts.isEmpty() ? "all rows" : String.join(", ", parts),
        rows.rows(),
        rows.plants().size(),
        rows.periods().size());
  }

  /** The headline figures of combinations, each in order. */
  static List<Headline> headlines(Study study, MatrixHeadlines asked, List<Cell> cells) {
    List<Headline> all = new ArrayList<>();
    all.add(headline(MatrixFindings.SCALE, "returns to scale", "", cells));
    all.add(
        headline(
            MatrixFindings.SUBSTITUTION,
            study.inputs().size() == 2
                ? "elasticity of substitution (Hicks)"
                : "mean elasticity of substitution (Morishima, all pairs)",
            "",
            cells));
    asked
        .costWords()
        .ifPresent(
            words -> all.add(headline(MatrixFindings.LEAST_COST, words, asked.costUnit(), cells)));
    asked.gapWords().ifPresent(words -> all.add(headline(MatrixFindings.GAP, words, "", cells)));
    return all;
  }

  /** Equal figures stay in the order of the study file. */
  private static Headline headline(String name, String words, String unit, List<Cell> cells) {
    List<Integer> order =
        IntStream.range(0, cells.size())
            .filter(
                c -> cells.get(c).figure(name).filter(f -> Double.isFinite(f.value())).isPresent())
            .boxed()
            .sorted(
                Comparator.comparingDouble(c -> cells.get(c).figure(name).orElseThrow().value()))
            .toList();
    return new Headline(name, words, unit, order);
  }
}

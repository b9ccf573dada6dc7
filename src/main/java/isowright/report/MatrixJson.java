package isowright.report;

import isowright.study.Figure;
import isowright.study.MatrixFindings;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Headline;
import isowright.study.ZerosFindings;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The specification matrix as it stands in the findings file; cells are numbered from 0. */
final class MatrixJson {

  private MatrixJson() {}

  static void write(JsonFile file, MatrixFindings found) throws IOException {
    file.list(
        "samples",
        found.samples(),
        true,
        sample -> {
          file.text("name", sample.name());
          file.text("words", sample.words());
          file.whole("rows", sample.rows());
          file.whole("plants", sample.plants());
          file.whole("periods", sample.periods());
        });
    file.texts("chooseBy", found.chooseBy());
    if (found.chosen().isPresent()) {
      file.whole("chosen", found.chosen().getAsInt());
    }
    file.text("choice", found.choice());
    file.list("headlines", found.headlines(), false, headline -> headline(file, headline));
    file.list("cells", found.cells(), false, cell -> cell(file, found.headlines(), cell));
    file.list(
        "gaps",
        found.gaps(),
        true,
        gap -> {
          file.text("plant", gap.plant());
          file.text("period", gap.period());
          file.whole("specifications", gap.choices());
          file.number("low", gap.low());
          file.text("lowBy", gap.lowBy());
          file.number("high", gap.high());
          file.text("highBy", gap.highBy());
        });
    file.remarks("remarks", List.of());
  }

  /** Both policies for zeros; the sample of a cell is the policy. */
  static void zeros(JsonFile file, ZerosFindings found) throws IOException {
    file.text("policy", found.policy());
    file.object(
        "rows",
        () -> {
          for (Map.Entry<String, Integer> rows : found.rows().entrySet()) {
            file.whole(rows.getKey(), rows.getValue());
          }
        });
    file.list("headlines", found.headlines(), false, headline -> headline(file, headline));
    file.list("cells", found.cells(), false, cell -> cell(file, found.headlines(), cell));
    file.remarks("remarks", List.of());
  }

  private static void headline(JsonFile file, Headline headline) throws IOException {
    file.text("figure", headline.name());
    file.text("words", headline.words());
    file.text("unit", headline.unit());
    file.wholes("order", headline.order());
  }

  private static void cell(JsonFile file, List<Headline> headlines, Cell cell) throws IOException {
    file.text("technology", cell.technology());
    file.text("plantEffects", cell.plantEffects());
    file.text("time", cell.time());
    file.text("standardErrors", cell.standardErrors());
    file.text("sample", cell.sample());
    file.text("state", cell.state());
    file.truth("asAsked", cell.asAsked());
    file.text("standing", cell.standing());
    file.texts("reasons", cell.reasons());
    if (cell.criteria().isPresent()) {
      MatrixFindings.Criteria criteria = cell.criteria().get();
      file.whole("rows", cell.rows());
      file.line(
          "summary",
          () -> {
            file.text("likelihoodOf", criteria.of());
            file.whole("parameters", criteria.parameters());
            file.number("logLikelihood", criteria.logLikelihood());
            file.number("aic", criteria.aic());
            file.number("bic", criteria.bic());
          });
    }
    if (cell.regular().isPresent()) {
      file.line(
          "regularity",
          () -> {
            file.whole("rows", cell.regular().get().rows());
            file.whole("monotone", cell.regular().get().monotone());
            file.whole("quasiConcave", cell.regular().get().quasiConcave());
            file.whole("both", cell.regular().get().both());
          });
    }
    for (Headline headline : headlines) {
      Optional<Figure> figure =
          cell.figure(headline.name()).filter(f -> Double.isFinite(f.value()));
      if (figure.isPresent()) {
        file.figure(key(headline.name()), figure);
      }
    }
    if (!cell.without().isEmpty()) {
      file.textsByName("without", cell.without());
    }
  }

  /** The keys that the findings file has for the same figures elsewhere. */
  private static String key(String headline) {
    return switch (headline) {
      case MatrixFindings.SCALE -> "returnsToScale";
      case MatrixFindings.LEAST_COST -> "leastCost";
      default -> headline;
    };
  }
}

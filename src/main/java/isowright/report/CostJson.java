package isowright.report;

import isowright.study.CostFindings;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows;
import java.io.IOException;
import java.util.Optional;

/** Cost functions, as they stand in the findings file under {@code costs}. */
final class CostJson {

  private CostJson() {}

  /** Writes nothing where no cost side was asked for. */
  static void write(JsonFile file, CostFindings costs) throws IOException {
    if (costs.fits().isEmpty() && costs.remarks().isEmpty()) {
      return;
    }
    file.object(
        "costs",
        () -> {
          file.list("fits", costs.fits(), false, fit -> fit(file, fit));
          file.list(
              "sides",
              costs.sides(),
              false,
              side -> {
                file.text("measure", side.measure());
                file.text("of", side.of());
                file.figures("production", side.production());
                file.figures("cost", side.cost());
                file.truth("apart", side.apart());
              });
          file.remarks("remarks", costs.remarks());
        });
  }

  private static void fit(JsonFile file, Fitted fit) throws IOException {
    file.text("technology", fit.technology());
    file.text("equations", fit.how().equations());
    file.texts("restrictions", fit.how().restrictions());
    file.text("plantEffects", fit.how().plantEffects());
    if (!fit.state().equals("refused")) {
      file.text("covarianceWords", fit.how().covarianceWords());
      file.number("degreesOfFreedom", fit.how().degreesOfFreedom());
    }
    file.numbersByName("scaling", fit.how().base());
    file.whole("rows", fit.how().rows());
    file.whole("plants", fit.how().plants());
    file.truth("converged", fit.usable());
    file.text("state", fit.state());
    if (!fit.state().equals("refused")) {
      file.number("logLikelihood", fit.how().logLikelihood());
      file.whole("iterations", fit.how().iterations());
    }
    if (fit.how().concave().isPresent()) {
      CostFindings.Concave concave = fit.how().concave().get();
      file.line(
          "concavity",
          () -> {
            file.text("where", concave.where());
            file.number("logLikelihoodFree", concave.logLikelihoodFree());
            file.truth("edge", concave.edge());
          });
    }
    FitJson.parameters(file, fit.parameters());
    file.matrix("covariance", fit.covariance());
    if (fit.at().isPresent()) {
      atMean(file, fit.at().get());
    }
    if (fit.efficient().isPresent()) {
      file.object(
          "efficientScale",
          () -> {
            file.figure("output", fit.efficient().map(CostFindings.Efficient::output));
            file.number("shareBelow", fit.efficient().get().below());
          });
    }
    if (fit.regularity().isPresent()) {
      CostFindings.Regular regular = fit.regularity().get();
      file.line(
          "regularity",
          () -> {
            file.whole("rows", regular.rows());
            file.whole("monotone", regular.monotone());
            file.whole("concave", regular.concave());
            file.whole("both", regular.both());
          });
    }
    file.list(
        "scale",
        fit.scale(),
        true,
        row -> {
          file.whole("row", row.row());
          file.text("plant", row.plant());
          file.text("period", row.period());
          file.number("output", row.output());
          file.uncertain("scale economies of row " + row.row(), row.economies());
        });
    rows(file, fit.rows());
    FitJson.tests(file, fit.tests());
    file.remarks("remarks", fit.remarks());
  }

  private static void rows(JsonFile file, CostRows rows) throws IOException {
    CostRows.Told told = rows.told();
    if (told.known() > 0) {
      file.line(
          "scaleCounts",
          () -> {
            file.whole("rows", told.known());
            file.whole("economies", told.economies());
            file.whole("above", told.above());
            file.whole("unclear", told.unclear());
            file.whole("below", told.below());
          });
    }
    if (!rows.average().isEmpty()) {
      file.list(
          "averageCost",
          rows.average(),
          true,
          point -> {
            file.number("output", point.output());
            file.figure("cost", Optional.of(point.cost()));
          });
    }
    if (!rows.spreads().isEmpty()) {
      file.list(
          "overRows",
          rows.spreads(),
          true,
          spread -> {
            file.text("measure", spread.measure());
            file.text("of", spread.of());
            file.number("least", spread.least());
            file.number("tenth", spread.tenth());
            file.number("quarter", spread.quarter());
            file.number("median", spread.median());
            file.number("threeQuarters", spread.threeQuarters());
            file.number("nineTenths", spread.nineTenths());
            file.number("most", spread.most());
          });
    }
  }

  private static void atMean(JsonFile file, AtMean at) throws IOException {
    file.figures("shares", at.shares());
    file.figures("costElasticity", at.costElasticity());
    if (at.scaleEconomies().isPresent()) {
      file.figure("scaleEconomies", at.scaleEconomies());
    }
    if (at.technicalChange().isPresent()) {
      file.figure("technicalChange", at.technicalChange());
    }
    FitJson.pairs(file, "substitution", at.substitution());
    FitJson.pairs(file, "demandElasticity", at.demand());
    file.figures("bias", at.bias());
    if (at.together().isPresent()) {
      CostFindings.Together together = at.together().get();
      file.object(
          "together",
          () -> {
            if (together.scope().isPresent()) {
              file.figure("scope", together.scope());
              file.figures("scopeByOutput", together.byOutput());
            }
            FitJson.pairs(file, "complementarity", together.complementarity());
            if (!together.note().isEmpty()) {
              file.text("note", together.note());
            }
          });
    }
  }
}

package isowright.study;

import isowright.estimation.Fit;
import isowright.inference.FormComparison;
import isowright.inference.PlantPrediction;
import isowright.records.Panel;
import isowright.records.Reading;
import isowright.study.FitFindings.Fitted;
import isowright.study.SpecificationFindings.Comparison;
import isowright.study.SpecificationFindings.Inflation;
import isowright.study.SpecificationFindings.Predicted;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Gathers what is found of the specification as a whole. */
final class SpecificationStage {

  private SpecificationStage() {}

  static SpecificationFindings findings(
      Study study,
      Optional<Reading> reading,
      Optional<Panel> panel,
      List<Fit> fits,
      List<Fitted> fitted) {
    return new SpecificationFindings(
        inflation(fits),
        comparisons(fits),
        predictions(fits, study.estimation().confidence()),
        ExpectationStage.held(study.protocol().expectations(), fitted),
        study.protocol().decisions(),
        MatrixStage.findings(study, panel),
        ZerosStage.findings(study, reading, panel),
        SimultaneityStage.findings(study, panel));
  }

  private static List<Inflation> inflation(List<Fit> fits) {
    List<Inflation> all = new ArrayList<>();
    for (Fit fit : fits) {
      if (fit.state().usable() && fit.specification().form() instanceof LinearForm linear) {
        fit.examined()
            .numbers()
            .inflation()
            .forEach(f -> all.add(new Inflation(linear.name(), f.column(), f.raw(), f.centred())));
      }
    }
    return all;
  }

  private static List<Comparison> comparisons(List<Fit> fits) {
    return FormComparison.all(fits.stream().map(Fit::examined).toList()).stream()
        .map(
            c ->
                new Comparison(
                    c.first(),
                    c.second(),
                    c.verdicts().stream()
                        .map(v -> FitStage.tested(v, fits.get(0).specification().confidence()))
                        .toList(),
                    c.words()))
        .toList();
  }

  private static List<Predicted> predictions(List<Fit> fits, double confidence) {
    List<PlantPrediction> all = PlantPrediction.of(fits, confidence);
    return all.stream().map(SpecificationStage::predicted).toList();
  }

  private static Predicted predicted(PlantPrediction prediction) {
    String verdict =
        prediction
            .difference()
            .map(d -> d.low() > 0 ? "worse than the best" : "cannot be told apart from the best")
            .orElse("least error");
    return new Predicted(
        prediction.form(),
        prediction.ofChanges() ? "changes" : "levels",
        prediction.error(),
        prediction.levelError(),
        prediction.ofChanges() ? Optional.of(prediction.spread()) : Optional.empty(),
        prediction.difference().map(FitStage::figure),
        prediction.plants(),
        prediction.folds(),
        prediction.failed(),
        verdict);
  }
}

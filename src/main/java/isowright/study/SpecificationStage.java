package isowright.study;

import isowright.estimation.Fit;
import isowright.study.FitFindings.Fitted;
import isowright.study.SpecificationFindings.Inflation;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;

/** Gathers what is found of the specification as a whole. */
final class SpecificationStage {

  private SpecificationStage() {}

  static SpecificationFindings findings(Study study, List<Fit> fits, List<Fitted> fitted) {
    return new SpecificationFindings(
        inflation(fits),
        ExpectationStage.held(study.protocol().expectations(), fitted),
        study.protocol().decisions());
  }

  private static List<Inflation> inflation(List<Fit> fits) {
    List<Inflation> all = new ArrayList<>();
    for (Fit fit : fits) {
      if (fit.state().usable() && fit.specification().form() instanceof LinearForm linear) {
        fit.numbers()
            .inflation()
            .forEach(f -> all.add(new Inflation(linear.name(), f.column(), f.raw(), f.centred())));
      }
    }
    return all;
  }
}

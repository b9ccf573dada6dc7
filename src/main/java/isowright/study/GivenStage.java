package isowright.study;

import isowright.study.Findings.Said;
import isowright.study.FitFindings.Pair;
import isowright.technology.Elasticities;
import isowright.technology.Regularity;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Describes the technologies that a study takes as known. */
final class GivenStage {

  private GivenStage() {}

  static FitFindings.Given describe(Study.Given given) {
    Technology technology = given.technology();
    List<String> inputs = technology.inputs();
    double[] at = Arrays.stream(technology.base()).map(Math::log).toArray();
    Elasticities elasticity = Elasticities.atBase(technology);
    double[] output = elasticity.output();
    Map<String, Double> elasticities = new LinkedHashMap<>();
    for (int i = 0; i < inputs.size(); i++) {
      elasticities.put(inputs.get(i), output[i]);
    }
    Map<String, Double> parameters = new LinkedHashMap<>();
    for (int k = 0; k < technology.parameters().length; k++) {
      parameters.put(technology.parameterNames().get(k), technology.parameters()[k]);
    }
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < inputs.size(); i++) {
      for (int j = i + 1; j < inputs.size(); j++) {
        pairs.add(
            new Pair(inputs.get(i), inputs.get(j), "hicks", Figure.exact(elasticity.hicks(i, j))));
      }
    }
    List<Said> remarks = new ArrayList<>();
    remarks.add(
        Said.of(
            "note",
            "given",
            "Taken as known from the study file: no uncertainty is known, so its figures carry none."));
    Regularity regularity = Regularity.at(technology, at);
    if (!regularity.regular()) {
      remarks.add(
          Said.of(
              "warning",
              "irregular-given",
              "At its base point this technology is not regular ("
                  + (regularity.monotone() ? "" : "an input lowers output")
                  + (regularity.monotone() || regularity.quasiConcave() ? "" : "; ")
                  + (regularity.quasiConcave() ? "" : "isoquants are not convex")
                  + "): elasticities and plans there mean nothing."));
    }
    return new FitFindings.Given(
        given.name(),
        technology.form(),
        parameters,
        elasticities,
        elasticity.scale(),
        pairs,
        remarks);
  }
}

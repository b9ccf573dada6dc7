package isowright.study;

import isowright.estimation.Fit;
import isowright.records.Panel;
import isowright.technology.Regularity;
import isowright.technology.Technology;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** At how many rows of the records a fitted technology is regular. */
final class RegularityFindings {

  private RegularityFindings() {}

  static FitFindings.Regular of(Fit fit) {
    Panel panel = fit.panel();
    Technology technology = fit.numbers().technology();
    int n = panel.inputs().size();
    double[] z = new double[n];
    int monotone = 0;
    int quasiConcave = 0;
    int both = 0;
    int[] nonMonotone = new int[n];
    for (int r = 0; r < panel.rows(); r++) {
      for (int i = 0; i < n; i++) {
        z[i] = panel.logQuantities().get(i).get(r);
      }
      Regularity here = Regularity.at(technology, z);
      monotone += here.monotone() ? 1 : 0;
      quasiConcave += here.quasiConcave() ? 1 : 0;
      both += here.regular() ? 1 : 0;
      for (int i = 0; i < n; i++) {
        nonMonotone[i] += here.monotone(i) ? 0 : 1;
      }
    }
    Map<String, Integer> named = new LinkedHashMap<>();
    for (int i = 0; i < n; i++) {
      if (nonMonotone[i] > 0) {
        named.put(panel.inputs().get(i), nonMonotone[i]);
      }
    }
    return new FitFindings.Regular(panel.rows(), monotone, quasiConcave, both, named);
  }

  /** What irregular rows mean. */
  static String words(FitFindings.Regular regular) {
    List<String> parts = new java.util.ArrayList<>();
    regular
        .nonMonotoneBy()
        .forEach(
            (input, rows) ->
                parts.add(
                    "more "
                        + input
                        + " would lower output at "
                        + rows
                        + (rows == 1 ? " row" : " rows")));
    int bent = regular.rows() - regular.quasiConcave();
    if (bent > 0) {
      parts.add("isoquants are not convex at " + bent + (bent == 1 ? " row" : " rows"));
    }
    return "The technology is not regular at "
        + (regular.rows() - regular.both())
        + " of "
        + regular.rows()
        + " rows ("
        + String.join("; ", parts)
        + "). Elasticities, plans and scores at those points mean nothing.";
  }
}

package isowright.study;

import isowright.estimation.Fit;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.technology.Regularity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** At how many rows of the records a fitted technology is regular. */
final class RegularityFindings {

  private RegularityFindings() {}

  static FitFindings.Regular of(Fit fit) {
    Panel panel = fit.panel();
    double[][] logs = panel.logQuantities().stream().map(Column::toArray).toArray(double[][]::new);
    Regularity.Count count = Regularity.count(fit.numbers().technology(), logs, panel.rows());
    Map<String, Integer> named = new LinkedHashMap<>();
    for (int i = 0; i < logs.length; i++) {
      if (count.nonMonotoneBy()[i] > 0) {
        named.put(panel.inputs().get(i), count.nonMonotoneBy()[i]);
      }
    }
    return new FitFindings.Regular(
        count.rows(), count.monotone(), count.quasiConcave(), count.both(), named);
  }

  /** What irregular rows mean. */
  static String words(FitFindings.Regular regular) {
    List<String> parts = new ArrayList<>();
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

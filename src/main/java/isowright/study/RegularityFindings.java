package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Specification;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.technology.Regularity;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;

/**
 * At how many rows of the records a fitted technology is regular; rows that do without an input
 * have no log of it and are not looked at.
 */
final class RegularityFindings {

  private RegularityFindings() {}

  static FitFindings.Regular of(Fit fit) {
    Panel panel = fit.panel();
    double[][] logs = panel.logQuantities().stream().map(Column::toArray).toArray(double[][]::new);
    if (fit.specification().time() == Specification.Time.BIASED_TREND) {
      return byPeriod(fit, logs);
    }
    if (panel.roles().keepsZeros()) {
      int[] rows = IntStream.range(0, panel.rows()).filter(r -> !panel.anyZero(r)).toArray();
      return named(
          panel,
          List.of(Regularity.count(fit.numbers().technology(), some(logs, rows), rows.length)));
    }
    return named(panel, List.of(Regularity.count(fit.numbers().technology(), logs, panel.rows())));
  }

  /** Where the technology itself changes with time, each row is examined at its own period. */
  private static FitFindings.Regular byPeriod(Fit fit, double[][] logs) {
    Panel panel = fit.panel();
    int[] periods = panel.rowPeriods().toArray();
    List<Regularity.Count> counts = new ArrayList<>();
    for (int p = 0; p < panel.periods().size(); p++) {
      int period = p;
      int[] rows =
          IntStream.range(0, periods.length)
              .filter(r -> periods[r] == period && !panel.anyZero(r))
              .toArray();
      counts.add(
          Regularity.count(
              fit.at(period, new Productivity.Typical()).technology(),
              some(logs, rows),
              rows.length));
    }
    return named(panel, counts);
  }

  private static double[][] some(double[][] logs, int[] rows) {
    return Arrays.stream(logs)
        .map(column -> Arrays.stream(rows).mapToDouble(r -> column[r]).toArray())
        .toArray(double[][]::new);
  }

  private static FitFindings.Regular named(Panel panel, List<Regularity.Count> counts) {
    Map<String, Integer> named = new LinkedHashMap<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      int input = i;
      int rows = counts.stream().mapToInt(count -> count.nonMonotoneBy()[input]).sum();
      if (rows > 0) {
        named.put(panel.inputs().get(i), rows);
      }
    }
    return new FitFindings.Regular(
        counts.stream().mapToInt(Regularity.Count::rows).sum(),
        counts.stream().mapToInt(Regularity.Count::monotone).sum(),
        counts.stream().mapToInt(Regularity.Count::quasiConcave).sum(),
        counts.stream().mapToInt(Regularity.Count::both).sum(),
        named);
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

package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.estimation.Productivity;
import isowright.estimation.Specification;
import isowright.inference.DeltaMethod;
import isowright.inference.RegularityPrice;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.study.Findings.Said;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.Regularity;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
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
          fit,
          List.of(Regularity.count(fit.numbers().technology(), some(logs, rows), rows.length)));
    }
    return named(fit, List.of(Regularity.count(fit.numbers().technology(), logs, panel.rows())));
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
    return named(fit, counts);
  }

  private static double[][] some(double[][] logs, int[] rows) {
    return Arrays.stream(logs)
        .map(column -> Arrays.stream(rows).mapToDouble(r -> column[r]).toArray())
        .toArray(double[][]::new);
  }

  private static FitFindings.Regular named(Fit fit, List<Regularity.Count> counts) {
    Panel panel = fit.panel();
    Map<String, Integer> named = new LinkedHashMap<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      int input = i;
      int rows = counts.stream().mapToInt(count -> count.nonMonotoneBy()[input]).sum();
      if (rows > 0) {
        named.put(panel.inputs().get(i), rows);
      }
    }
    Form form = fit.specification().form();
    return new FitFindings.Regular(
        counts.stream().mapToInt(Regularity.Count::rows).sum(),
        counts.stream().mapToInt(Regularity.Count::monotone).sum(),
        counts.stream().mapToInt(Regularity.Count::quasiConcave).sum(),
        counts.stream().mapToInt(Regularity.Count::both).sum(),
        named,
        imposed(fit),
        form instanceof LinearForm && !form.regularByForm());
  }

  private static Optional<RegularityImposed> imposed(Fit fit) {
    Optional<RegularityPrice> price = RegularityPrice.of(fit);
    if (price.isEmpty()) {
      return Optional.empty();
    }
    var held = (Particulars.OfRegularity) fit.numbers().particulars();
    Fit free = held.free();
    Map<String, Figure> parameters = new LinkedHashMap<>();
    DeltaMethod delta = DeltaMethod.of(free.typical(), fit.specification().confidence());
    for (int k = 0; k < free.numbers().names().size(); k++) {
      double error = Math.sqrt(Math.max(0, free.numbers().covariance()[k][k]));
      parameters.put(
          free.numbers().names().get(k),
          FitStage.figure(
              delta.estimate(free.numbers().parameters()[k], error, DeltaMethod.Scale.LINEAR)));
    }
    return Optional.of(
        new RegularityImposed(
            held.where().word(),
            held.held(),
            held.binding(),
            held.withoutProduct(),
            held.straight(),
            price.get().free(),
            price.get().held(),
            price.get().distance(),
            price.get().low(),
            price.get().high(),
            held.starts(),
            held.agreeing(),
            parameters));
  }

  /** What must be said of a fit's regularity. */
  static List<Said> remarks(Fit fit, FitFindings.Regular regular) {
    List<Said> remarks = new ArrayList<>();
    regular.imposed().ifPresent(imposed -> remarks.add(imposed(imposed)));
    boolean asked = fit.specification().regularity() != Specification.RegularityImposed.FREE;
    if (asked && fit.specification().form().regularByForm()) {
      remarks.add(
          Said.of(
              "note",
              "regular-by-form",
              "Every technology of this form is regular, so nothing had to be imposed on it."));
    }
    if (regular.both() < regular.rows()) {
      remarks.add(Said.of("warning", "irregular-rows", words(regular) + remedy(regular)));
    }
    return remarks;
  }

  private static Said imposed(RegularityImposed imposed) {
    String where =
        imposed.where().equals("everywhere") ? "every row" : "the geometric mean of the inputs";
    if (imposed.idle()) {
      return Said.of(
          "note",
          "regularity-not-binding",
          "Regularity at "
              + where
              + " was to be imposed; the free estimate has it, so the fit is the free one.");
    }
    return Said.of(
        "warning",
        "regularity-imposed",
        String.format(
            Locale.ROOT,
            "The fit is held to be regular at %s. The sum of squared residuals rises by %.3g %%,"
                + " which is %.4g times the residual variance of the free fit; were the technology"
                + " regular, a rise so large would have a probability between %.2g and %.2g"
                + " (independent rows of equal variance; the law is a mixture whose weights are not"
                + " known). Something binds at %d of %d. Standard errors take what binds as known,"
                + " and estimates at a bound are not normal: intervals are a guide. Tests and"
                + " influence are those of the free fit.",
            where,
            100 * imposed.rise(),
            imposed.distance(),
            imposed.pLow(),
            imposed.pHigh(),
            imposed.binding(),
            imposed.held()));
  }

  private static String remedy(FitFindings.Regular regular) {
    return regular.imposable()
        ? " With `estimation: {regularity: everywhere}` the form is fitted held to be regular at"
            + " every row, and the price in fit is stated."
        : "";
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

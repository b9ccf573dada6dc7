package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.How;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Summary;
import isowright.study.PanelFindings;
import isowright.study.PanelFindings.Components;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/**
 * The fits side by side: one column a technology, standard errors in parentheses beneath the
 * parameters, then fit statistics and how each was obtained. A fit that is not usable shows its
 * state and no figure.
 */
final class FitTable {

  private FitTable() {}

  static Table of(Material material) {
    List<Fitted> fits = material.findings().fits();
    List<Column> columns = new ArrayList<>();
    for (Fitted fit : fits) {
      columns.add(Column.ofNumbers(Terms.technology(fit.technology()), Terms.state(fit.state())));
    }
    List<Group> groups = new ArrayList<>();
    groups.add(new Group(Optional.of("Parameters"), parameters(fits)));
    groups.add(new Group(Optional.of("Fit"), statistics(fits)));
    if (fits.stream().anyMatch(fit -> fit.panel().components().isPresent())) {
      groups.add(new Group(Optional.of("Random effects"), components(fits)));
    }
    groups.add(new Group(Optional.of("How it was obtained"), how(fits)));
    return new Table(
        "Technologies fitted to the records", "Parameter", columns, groups, notes(fits));
  }

  private static List<Row> parameters(List<Fitted> fits) {
    Set<String> names = new LinkedHashSet<>();
    fits.forEach(fit -> fit.parameters().forEach(parameter -> names.add(parameter.name())));
    List<Row> rows = new ArrayList<>();
    for (String name : inReadingOrder(names)) {
      rows.add(
          new Row(
              Text.of(Terms.parameter(name)),
              fits.stream().map(fit -> parameter(fit, name)).toList()));
    }
    return rows;
  }

  /** The constant first, controls and effects of time last, the rest as they come. */
  private static List<String> inReadingOrder(Set<String> names) {
    List<String> first = new ArrayList<>();
    List<String> last = new ArrayList<>();
    for (String name : names) {
      if (!elsewhere(name)) {
        boolean aside = name.startsWith("control:") || name.endsWith("trend");
        (aside ? last : first).add(name);
      }
    }
    first.addAll(last);
    return first;
  }

  /** Effects of periods and plant means are many and stand in the table of intervals only. */
  private static boolean elsewhere(String name) {
    return name.startsWith("period:") || name.startsWith("mean:");
  }

  private static Cell parameter(Fitted fit, String name) {
    if (!fit.usable()) {
      return Cell.none();
    }
    Optional<Parameter> parameter =
        fit.parameters().stream().filter(p -> p.name().equals(name)).findFirst();
    return parameter
        .map(p -> Cell.of(Numbers.value(p.figure()), "(" + Numbers.standardError(p.figure()) + ")"))
        .orElse(Cell.none());
  }

  private static List<Row> statistics(List<Fitted> fits) {
    Map<String, Function<Summary, String>> rows = new LinkedHashMap<>();
    rows.put("R²", s -> Numbers.share(s.rSquared()));
    rows.put("Residual standard error", s -> Numbers.significant(s.residualStandardError(), 4));
    rows.put("Sum of squared residuals", s -> Numbers.significant(s.ssr(), 5));
    rows.put("Log-likelihood", s -> Numbers.fixed(s.logLikelihood(), 2));
    rows.put("AIC", s -> Numbers.fixed(s.aic(), 1));
    rows.put("BIC", s -> Numbers.fixed(s.bic(), 1));
    rows.put("Residual degrees of freedom", s -> Numbers.degrees(s.degreesOfFreedom()));
    List<Row> all = new ArrayList<>();
    rows.forEach(
        (name, print) ->
            all.add(
                new Row(
                    Text.of(name),
                    fits.stream()
                        .map(
                            fit ->
                                fit.usable()
                                    ? fit.summary()
                                        .map(s -> Cell.of(print.apply(s)))
                                        .orElse(Cell.none())
                                    : Cell.none())
                        .toList())));
    return all;
  }

  private static List<Row> components(List<Fitted> fits) {
    Map<String, Function<Components, String>> rows = new LinkedHashMap<>();
    rows.put(
        "Share θ of a plant’s mean taken off",
        c ->
            c.leastShare() == c.mostShare()
                ? Numbers.significant(c.mostShare(), 4)
                : Numbers.significant(c.leastShare(), 4)
                    + " to "
                    + Numbers.significant(c.mostShare(), 4));
    rows.put("Variance between plants, σ²_u", c -> Numbers.significant(c.plant(), 4));
    rows.put("Variance of a row’s error, σ²_e", c -> Numbers.significant(c.row(), 4));
    rows.put("Variances after", c -> Terms.components(c.method()));
    List<Row> all = new ArrayList<>();
    rows.forEach(
        (name, print) ->
            all.add(
                new Row(
                    Text.of(name),
                    fits.stream()
                        .map(
                            fit ->
                                fit.panel()
                                    .components()
                                    .map(c -> Cell.of(print.apply(c)))
                                    .orElse(Cell.none()))
                        .toList())));
    return all;
  }

  private static List<Row> how(List<Fitted> fits) {
    Map<String, Function<How, String>> rows = new LinkedHashMap<>();
    rows.put("Rows", h -> Numbers.count(h.rows()));
    rows.put("Plants", h -> Numbers.count(h.plants()));
    rows.put("Plant effects", How::plantEffects);
    rows.put("Time", How::time);
    rows.put("Standard errors", How::standardErrors);
    List<Row> all = new ArrayList<>();
    if (fits.stream().anyMatch(fit -> !fit.panel().observed().equals("rows"))) {
      all.add(
          new Row(
              Text.of("Observations"),
              fits.stream().map(fit -> Cell.of(observed(fit.panel()))).toList()));
    }
    rows.forEach(
        (name, print) ->
            all.add(
                new Row(
                    Text.of(name),
                    fits.stream().map(fit -> Cell.of(print.apply(fit.how()))).toList())));
    return all;
  }

  private static String observed(PanelFindings panel) {
    return Numbers.count(panel.observations()) + " " + panel.observed().replace('-', ' ');
  }

  private static List<Text> notes(List<Fitted> fits) {
    List<Text> notes = new ArrayList<>();
    Set<String> covariances = new LinkedHashSet<>();
    Set<Map<String, Double>> scalings = new LinkedHashSet<>();
    for (Fitted fit : fits) {
      covariances.add(fit.how().covarianceWords());
      scalings.add(fit.how().scaling());
    }
    covariances.forEach(words -> notes.add(Text.of("Standard errors: " + closed(words))));
    for (Map<String, Double> scaling : scalings) {
      notes.add(Text.of(scaling(scaling)));
    }
    if (fits.stream().anyMatch(fit -> fit.technology().equals("translog"))) {
      notes.add(
          Text.of(
              "A second-order coefficient of the translog is a second derivative (the sum carries a"
                  + " factor ½); a first-order coefficient is an output elasticity only at the point"
                  + " by which inputs are divided."));
    }
    notes.add(Text.of("AIC and BIC count the error variance and every plant effect."));
    boolean more =
        fits.stream().anyMatch(f -> f.parameters().stream().anyMatch(p -> elsewhere(p.name())));
    if (more) {
      notes.add(
          Text.of("Effects of periods and plant means stand in the table of parameters below."));
    }
    return notes;
  }

  private static String scaling(Map<String, Double> scaling) {
    if (scaling.isEmpty()) {
      return "Inputs enter in their own units.";
    }
    List<String> parts = new ArrayList<>();
    scaling.forEach((input, mean) -> parts.add(input + " by " + Numbers.amount(mean)));
    return "Inputs are divided by their geometric means before logs: " + Phrases.list(parts) + ".";
  }

  private static String closed(String words) {
    return words.endsWith(".") ? words : words + ".";
  }
}

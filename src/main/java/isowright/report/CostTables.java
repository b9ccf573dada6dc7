package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Fitted;
import isowright.study.Figure;
import isowright.study.FitFindings.Pair;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Tested;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** The tables of the cost side. */
final class CostTables {

  private static final int MOST_ROWS = 40;

  private CostTables() {}

  private static String parameter(String name) {
    return switch (name) {
      case "constant" -> "Constant";
      case "trend" -> "Trend per period";
      default -> Terms.parameter(name);
    };
  }

  private static String equations(String word) {
    return switch (word) {
      case "cost" -> "cost alone";
      case "system" -> "cost and shares";
      case "shares" -> "shares alone";
      default -> word;
    };
  }

  private static List<Column> columns(List<Fitted> fits) {
    return fits.stream()
        .map(f -> Column.ofNumbers(Terms.technology(f.technology()), Terms.state(f.state())))
        .toList();
  }

  static Table parameters(List<Fitted> fits) {
    Set<String> names = new LinkedHashSet<>();
    fits.forEach(fit -> fit.parameters().forEach(p -> names.add(p.name())));
    List<Row> rows = new ArrayList<>();
    for (String name : names) {
      rows.add(
          new Row(
              Text.of(parameter(name)), fits.stream().map(fit -> parameter(fit, name)).toList()));
    }
    List<Row> how = new ArrayList<>();
    how.add(row("Equations", fits, fit -> Cell.of(equations(fit.how().equations()))));
    how.add(row("Rows", fits, fit -> Cell.of(Numbers.count(fit.how().rows()))));
    how.add(
        row("Log-likelihood", fits, fit -> Cell.of(Numbers.fixed(fit.how().logLikelihood(), 2))));
    List<Text> notes = new ArrayList<>();
    fits.stream()
        .map(fit -> fit.how().covarianceWords())
        .distinct()
        .forEach(words -> notes.add(Text.of(words)));
    notes.add(
        Text.of(
            "A second-order coefficient is a second derivative (the sum carries a factor ½). A"
                + " parameter that homogeneity or a restriction fixes has no standard error."));
    return new Table(
        "Cost functions",
        "Parameter",
        columns(fits),
        List.of(
            new Group(Optional.of("Parameters"), rows),
            new Group(Optional.of("How it was obtained"), how)),
        notes);
  }

  private static Cell parameter(Fitted fit, String name) {
    return fit.parameters().stream()
        .filter(p -> p.name().equals(name))
        .map(Parameter::figure)
        .map(
            figure ->
                figure.uncertainty().isPresent()
                    ? Cell.of(Numbers.value(figure), "(" + Numbers.standardError(figure) + ")")
                    : Cell.of(Numbers.amount(figure.value())))
        .findFirst()
        .orElse(Cell.none());
  }

  private static Row row(String name, List<Fitted> fits, Function<Fitted, Cell> cell) {
    return new Row(Text.of(name), fits.stream().map(cell).toList());
  }

  static Table figures(List<Fitted> fits) {
    List<Group> groups = new ArrayList<>();
    groups.add(named("Share in cost", fits, AtMean::shares));
    groups.add(
        named("Per cent more cost for a per cent more output", fits, AtMean::costElasticity));
    List<Row> scale = new ArrayList<>();
    scale.add(
        row(
            "Scale economies",
            fits,
            fit -> Cells.figure(fit.at().flatMap(AtMean::scaleEconomies))));
    boolean change =
        fits.stream().anyMatch(f -> f.at().flatMap(AtMean::technicalChange).isPresent());
    if (change) {
      scale.add(
          row(
              "Technical change a period",
              fits,
              fit -> Cells.figure(fit.at().flatMap(AtMean::technicalChange))));
    }
    boolean outputs =
        fits.stream().anyMatch(f -> f.at().flatMap(AtMean::scaleEconomies).isPresent());
    if (outputs || change) {
      groups.add(new Group(Optional.of(change ? "Scale and time" : "Scale"), scale));
    }
    groups.add(named("Change of the share in cost a period", fits, AtMean::bias));
    groups.add(
        pairs("Allen-Uzawa elasticity of substitution", "allen", fits, AtMean::substitution));
    groups.add(
        pairs("Morishima elasticity of substitution", "morishima", fits, AtMean::substitution));
    groups.add(pairs("Price elasticity of demand", "demand", fits, AtMean::demand));
    return new Table(
        "What the cost functions say, at the mean of the records",
        "Figure",
        columns(fits),
        groups.stream().filter(group -> !group.rows().isEmpty()).toList(),
        List.of(
            Text.of(
                "Intervals beneath. Morishima and demand: the price of the second input moves, the"
                    + " first answers.")));
  }

  private static Group named(
      String title, List<Fitted> fits, Function<AtMean, Map<String, Figure>> figures) {
    Set<String> names = new LinkedHashSet<>();
    fits.forEach(fit -> fit.at().ifPresent(at -> names.addAll(figures.apply(at).keySet())));
    List<Row> rows = new ArrayList<>();
    for (String name : names) {
      rows.add(
          row(
              name,
              fits,
              fit ->
                  Cells.figure(
                      fit.at().flatMap(at -> Optional.ofNullable(figures.apply(at).get(name))))));
    }
    return new Group(Optional.of(title), rows);
  }

  private static Group pairs(
      String title, String measure, List<Fitted> fits, Function<AtMean, List<Pair>> figures) {
    Set<String> names = new LinkedHashSet<>();
    fits.forEach(
        fit ->
            fit.at()
                .ifPresent(
                    at ->
                        figures.apply(at).stream()
                            .filter(pair -> pair.measure().equals(measure))
                            .forEach(pair -> names.add(words(pair)))));
    List<Row> rows = new ArrayList<>();
    for (String name : names) {
      rows.add(
          row(
              name,
              fits,
              fit ->
                  Cells.figure(
                      fit.at()
                          .flatMap(
                              at ->
                                  figures.apply(at).stream()
                                      .filter(pair -> pair.measure().equals(measure))
                                      .filter(pair -> words(pair).equals(name))
                                      .map(Pair::figure)
                                      .findFirst()))));
    }
    return new Group(Optional.of(title), rows);
  }

  private static String words(Pair pair) {
    return pair.measure().equals("allen")
        ? pair.first() + " and " + pair.second()
        : pair.first() + " as the price of " + pair.second() + " moves";
  }

  static Table regularity(List<Fitted> fits) {
    List<Row> rows = new ArrayList<>();
    for (Fitted fit : fits) {
      fit.regularity()
          .ifPresent(
              r ->
                  rows.add(
                      new Row(
                          Text.of(Terms.technology(fit.technology())),
                          List.of(
                              Cell.of(Numbers.count(r.rows())),
                              Cell.of(Numbers.count(r.monotone())),
                              Cell.of(Numbers.count(r.concave())),
                              Cell.of(Numbers.count(r.both()))))));
    }
    return new Table(
        "Rows at which each is a cost function",
        "Technology",
        List.of(
            Column.ofNumbers("Rows examined", ""),
            Column.ofNumbers("Rising in prices and outputs", ""),
            Column.ofNumbers("Concave in prices", ""),
            Column.ofNumbers("Both", "")),
        List.of(Group.of(rows)),
        List.of());
  }

  static Optional<Table> tests(List<Fitted> fits, Material material) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : fits) {
      List<Row> rows = new ArrayList<>();
      for (Tested test : fit.tests()) {
        rows.add(
            new Row(
                Text.of(test.nullHypothesis()),
                List.of(
                    Cell.of(Phrases.statistic(test)),
                    Cell.of(Numbers.p(test.p(), Phrases.level(material.confidence()))),
                    Cell.of(Phrases.outcome(test, material.confidence())))));
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    if (groups.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            "Tests of the cost functions",
            "Null",
            List.of(
                Column.ofNumbers("Statistic", ""),
                Column.ofNumbers("p-value", ""),
                Column.ofWords("At " + material.significance())),
            groups,
            List.of(
                Text.of(
                    "Where standard errors are clustered, Wald tests with the clustered covariance"
                        + " of the wider fit (F; one with more restrictions than plants less one is"
                        + " left out). Elsewhere systems by their likelihoods, a cost equation"
                        + " alone by sums of squares, which take errors as alike and independent"
                        + " over rows."))));
  }

  /** Scale economies row by row, where the rows are few enough to be read. */
  static Optional<Table> scale(List<Fitted> fits, Material material) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : fits) {
      List<Row> rows = new ArrayList<>();
      int shown = fit.scale().size() <= MOST_ROWS ? fit.scale().size() : 0;
      for (var row : fit.scale().subList(0, shown)) {
        rows.add(
            new Row(
                Text.of(row.plant()),
                List.of(
                    Cell.of(row.period()),
                    Cell.of(Numbers.amount(row.output())),
                    Cells.figure(row.economies()))));
      }
      if (!rows.isEmpty()) {
        groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
      }
    }
    if (groups.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            "Scale economies, row by row",
            "Plant",
            List.of(
                Column.ofWords("Period"),
                Column.ofNumbers("Output", material.findings().units().output()),
                Column.ofNumbers("Scale economies", "")),
            groups,
            List.of(
                Text.of("Above one: a per cent more output costs less than a per cent more."))));
  }
}

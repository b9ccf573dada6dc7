package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Row;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Output elasticities with intervals, input by input across technologies, with a line at zero; and
 * returns to scale across technologies, with a line at one.
 */
final class ElasticityCharts {

  private static final int ROW_HEIGHT = 27;
  private static final int FRAME_HEIGHT = 92;

  /** A row: whose figure it is. */
  record Item(String group, String technology, Figure figure) {}

  private ElasticityCharts() {}

  /** The two charts; each only if there is something in it. */
  static List<Chart> of(Findings findings, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    List<Item> elasticities = elasticities(findings);
    if (!elasticities.isEmpty()) {
      charts.add(elasticityChart(elasticities, without(findings), setting));
    }
    List<Item> scales = scales(findings);
    if (!scales.isEmpty()) {
      charts.add(scaleChart(scales, without(findings), setting));
    }
    return charts;
  }

  private static List<Item> elasticities(Findings findings) {
    Map<String, List<Item>> byInput = new LinkedHashMap<>();
    for (Fitted fit : findings.fits()) {
      fit.outputElasticity()
          .forEach((input, figure) -> add(byInput, input, fit.technology(), figure));
    }
    for (Given given : findings.given()) {
      given
          .outputElasticity()
          .forEach((input, value) -> add(byInput, input, given.name(), Figure.exact(value)));
    }
    return byInput.values().stream().flatMap(List::stream).toList();
  }

  private static void add(
      Map<String, List<Item>> byInput, String input, String technology, Figure figure) {
    if (Double.isFinite(figure.value())) {
      byInput
          .computeIfAbsent(input, i -> new ArrayList<>())
          .add(new Item(input, technology, figure));
    }
  }

  private static List<Item> scales(Findings findings) {
    List<Item> scales = new ArrayList<>();
    for (Fitted fit : findings.fits()) {
      fit.returnsToScale()
          .filter(f -> Double.isFinite(f.value()))
          .ifPresent(f -> scales.add(new Item("", fit.technology(), f)));
    }
    for (Given given : findings.given()) {
      if (Double.isFinite(given.returnsToScale())) {
        scales.add(new Item("", given.name(), Figure.exact(given.returnsToScale())));
      }
    }
    return scales;
  }

  /** What is said of fits that have no elasticities. */
  private static String without(Findings findings) {
    StringBuilder words = new StringBuilder();
    for (Fitted fit : findings.fits()) {
      if (fit.outputElasticity().isEmpty()) {
        words.append(' ').append(Words.sentence(Words.technology(fit.technology())));
        words.append(" has none: its state is ").append(fit.state().replace('-', ' ')).append('.');
      }
    }
    return words.toString();
  }

  private static Chart elasticityChart(List<Item> items, String without, Setting setting) {
    List<String> parts = new ArrayList<>();
    for (String input : items.stream().map(Item::group).distinct().toList()) {
      parts.add(input + " " + span(items.stream().filter(i -> i.group().equals(input)).toList()));
    }
    String title = "Output elasticities: " + Words.list(parts);
    List<String> reaching =
        items.stream()
            .filter(i -> covers(i.figure(), 0))
            .map(i -> i.group() + " in " + Words.technology(i.technology()))
            .toList();
    String caption =
        "By how many per cent output grows with one per cent more of an input, at the geometric"
            + " mean of the records."
            + intervals(items, setting)
            + (reaching.isEmpty()
                ? ""
                : " Intervals that reach zero: " + Words.list(reaching) + ".")
            + without;
    return Drawn.chart(
        Chart.Kind.ELASTICITIES,
        new Said(
            "",
            setting.names().of("output elasticities"),
            title,
            caption,
            alternative(title, items)),
        table(items, "output elasticity", setting),
        () -> plot(items, "output elasticity", 0));
  }

  private static Chart scaleChart(List<Item> items, String without, Setting setting) {
    String title = "Returns to scale " + span(items) + verdict(items);
    String caption =
        "By how many per cent output grows with one per cent more of every input, at the geometric"
            + " mean of the records; the line marks constant returns, one."
            + intervals(items, setting)
            + without;
    return Drawn.chart(
        Chart.Kind.ELASTICITIES,
        new Said(
            "", setting.names().of("returns to scale"), title, caption, alternative(title, items)),
        table(items, "returns to scale", setting),
        () -> plot(items, "returns to scale", 1));
  }

  private static String intervals(List<Item> items, Setting setting) {
    boolean any = items.stream().anyMatch(i -> i.figure().uncertainty().isPresent());
    boolean all = items.stream().allMatch(i -> i.figure().uncertainty().isPresent());
    return (any ? " Bars are " + setting.level() + " intervals." : "")
        + (all ? "" : " Diamonds are taken as known.");
  }

  /** "0.42", or "0.42 to 0.437". */
  private static String span(List<Item> items) {
    double[] values = items.stream().mapToDouble(i -> i.figure().value()).toArray();
    return Numbers.span(Curves.least(values), Curves.most(values));
  }

  /** Where the intervals lie against one; nothing for figures without intervals. */
  static String verdict(Map<String, Figure> byTechnology) {
    List<Item> items = new ArrayList<>();
    byTechnology.forEach((technology, figure) -> items.add(new Item("", technology, figure)));
    return verdict(items);
  }

  private static String verdict(List<Item> items) {
    List<Item> uncertain =
        items.stream().filter(i -> i.figure().uncertainty().isPresent()).toList();
    List<String> clauses = new ArrayList<>();
    clause(clauses, uncertain, "covers", f -> covers(f, 1));
    clause(
        clauses,
        uncertain,
        "lies above",
        f -> f.uncertainty().filter(u -> u.low() > 1).isPresent());
    clause(
        clauses,
        uncertain,
        "lies below",
        f -> f.uncertainty().filter(u -> u.high() < 1).isPresent());
    return clauses.isEmpty() ? "" : ": the interval " + Words.list(clauses);
  }

  private static void clause(
      List<String> clauses,
      List<Item> uncertain,
      String verb,
      java.util.function.Predicate<Figure> belongs) {
    List<String> names =
        uncertain.stream()
            .filter(i -> belongs.test(i.figure()))
            .map(i -> Words.technology(i.technology()))
            .toList();
    if (!names.isEmpty()) {
      clauses.add(verb + " one in " + Words.list(names));
    }
  }

  static boolean covers(Figure figure, double value) {
    return figure.uncertainty().filter(u -> u.low() <= value && value <= u.high()).isPresent();
  }

  static String alternative(String title, List<Item> items) {
    List<String> parts = new ArrayList<>();
    for (Item item : items) {
      parts.add(
          (item.group().isEmpty() ? "" : item.group() + ", ")
              + Words.technology(item.technology())
              + " "
              + Words.interval(item.figure()));
    }
    return title + ". " + Words.sentence(String.join("; ", parts)) + ".";
  }

  static Table table(List<Item> items, String what, Setting setting) {
    Table table =
        Table.of("input", "technology", what, setting.level() + " low", setting.level() + " high");
    for (Item item : items) {
      List<String> row = new ArrayList<>();
      row.add(item.group().isEmpty() ? "all" : item.group());
      row.add(Words.technology(item.technology()));
      row.addAll(Words.cells(item.figure()));
      table.row(row);
    }
    return table;
  }

  static Plot plot(List<Item> items, String what, double reference) {
    List<Row> rows = new ArrayList<>();
    List<Optional<Item>> figures = new ArrayList<>();
    String group = "";
    for (Item item : items) {
      if (!item.group().equals(group)) {
        group = item.group();
        rows.add(new Row(group, true, ""));
        figures.add(Optional.empty());
      }
      rows.add(new Row(Words.technology(item.technology()), false, Words.interval(item.figure())));
      figures.add(Optional.of(item));
    }
    Plot plot =
        new Plot(
            extent(items, what, reference),
            Axis.between("", 0, rows.size()),
            Style.WIDTH,
            FRAME_HEIGHT + ROW_HEIGHT * rows.size());
    plot.rows(rows).vertical("reference", reference, Pen.REFERENCE);
    for (int i = 0; i < rows.size(); i++) {
      double at = Plot.rowAt(i, rows.size());
      figures.get(i).ifPresent(item -> add(plot, item, at));
    }
    return plot;
  }

  private static void add(Plot plot, Item item, double at) {
    double[] y = {at};
    double[] x = {item.figure().value()};
    item.figure()
        .uncertainty()
        .filter(u -> Double.isFinite(u.low()) && Double.isFinite(u.high()))
        .ifPresent(
            u ->
                plot.intervals(
                    "interval", new double[] {u.low()}, new double[] {u.high()}, y, Pen.INTERVAL));
    boolean exact = item.figure().uncertainty().isEmpty();
    plot.dots("estimate", x, y, exact ? Dot.EXACT : Dot.ESTIMATE);
  }

  /** From the least to the greatest end, the line of reference included. */
  private static Axis extent(List<Item> items, String what, double reference) {
    double least = reference;
    double most = reference;
    for (Item item : items) {
      double value = item.figure().value();
      Figure.Uncertainty u =
          item.figure()
              .uncertainty()
              .filter(v -> Double.isFinite(v.low()) && Double.isFinite(v.high()))
              .orElse(new Figure.Uncertainty(0, value, value, ""));
      least = Math.min(least, u.low());
      most = Math.max(most, u.high());
    }
    return Axis.around(what, least, most);
  }
}

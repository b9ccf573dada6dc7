package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.ElasticityCharts.Item;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Fitted;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/**
 * Own price elasticities of demand with a line at zero, and elasticities of substitution with a
 * line at one, of all cost functions of a study.
 */
final class CostElasticityCharts {

  private CostElasticityCharts() {}

  /** The two charts; each only if there is something in it. */
  static List<Chart> of(Findings findings, Setting setting) {
    List<Fitted> fits = findings.costs().fits();
    List<Chart> charts = new ArrayList<>();
    List<Item> demand = items(fits, AtMean::demand, "demand", true);
    if (!demand.isEmpty()) {
      charts.add(demand(demand, setting));
    }
    List<Item> allen = items(fits, AtMean::substitution, "allen", false);
    if (!allen.isEmpty()) {
      charts.add(substitution(allen, setting));
    }
    return charts;
  }

  private static List<Item> items(
      List<Fitted> fits, Function<AtMean, List<Pair>> pairs, String measure, boolean own) {
    Map<String, List<Item>> grouped = new LinkedHashMap<>();
    for (Fitted fit : fits) {
      for (Pair pair : fit.at().map(pairs).orElse(List.of())) {
        boolean wanted =
            pair.measure().equals(measure) && own == pair.first().equals(pair.second());
        // what a form fixes is no finding
        if (wanted
            && Double.isFinite(pair.figure().value())
            && pair.figure().uncertainty().filter(u -> u.standardError() > 0).isPresent()) {
          String group = own ? pair.first() : pair.first() + " and " + pair.second();
          grouped
              .computeIfAbsent(group, g -> new ArrayList<>())
              .add(new Item(group, fit.technology(), pair.figure()));
        }
      }
    }
    return grouped.values().stream().flatMap(List::stream).toList();
  }

  private static Chart demand(List<Item> items, Setting setting) {
    List<String> rising = named(items, figure -> figure.value() > 0);
    List<String> reaching =
        named(items, figure -> figure.value() <= 0 && ElasticityCharts.covers(figure, 0));
    String title =
        rising.isEmpty()
            ? "Demand for "
                + Words.list(items.stream().map(Item::group).distinct().toList())
                + " falls as the own price rises, by "
                + span(items)
                + " per cent with a per cent"
            : "Demand rises with its own price, as no demand does: " + Words.list(rising);
    String caption =
        "Own price elasticities at given output, at the mean of the records. Bars are "
            + setting.level()
            + " intervals."
            + (reaching.isEmpty()
                ? ""
                : " Intervals that reach zero: " + Words.list(reaching) + ".");
    return chart(
        Chart.Kind.PRICE_ELASTICITIES, "own price elasticities", title, caption, items, setting, 0);
  }

  private static Chart substitution(List<Item> items, Setting setting) {
    List<String> complements = named(items, figure -> figure.value() < 0);
    List<String> one = named(items, figure -> ElasticityCharts.covers(figure, 1));
    String title =
        complements.isEmpty()
            ? "All inputs are substitutes, with elasticities of " + span(items)
            : "Complements, whose demand falls together: " + Words.list(complements);
    String caption =
        "Allen-Uzawa elasticities of substitution at the mean of the records; the line marks one,"
            + " that of Cobb-Douglas. Bars are "
            + setting.level()
            + " intervals."
            + (one.isEmpty() ? "" : " Intervals that hold one: " + Words.list(one) + ".");
    return chart(
        Chart.Kind.PRICE_ELASTICITIES, "allen elasticities", title, caption, items, setting, 1);
  }

  private static String span(List<Item> items) {
    double[] sizes = items.stream().mapToDouble(i -> Math.abs(i.figure().value())).toArray();
    return Numbers.span(Curves.least(sizes), Curves.most(sizes));
  }

  private static List<String> named(List<Item> items, java.util.function.Predicate<Figure> which) {
    return items.stream()
        .filter(item -> which.test(item.figure()))
        .map(item -> item.group() + " in " + Words.technology(item.technology()))
        .toList();
  }

  private static Chart chart(
      Chart.Kind kind,
      String name,
      String title,
      String caption,
      List<Item> items,
      Setting setting,
      double reference) {
    String what = reference == 0 ? "own price elasticity of demand" : "elasticity of substitution";
    return Drawn.chart(
        kind,
        new Said(
            "",
            setting.names().of(name),
            title,
            caption,
            ElasticityCharts.alternative(title, items)),
        ElasticityCharts.table(items, what, setting),
        () -> ElasticityCharts.plot(items, what, reference));
  }
}

package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Needed;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings;
import isowright.study.ReviewFindings.Band;
import isowright.study.ReviewFindings.Groups;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Placed;
import isowright.study.ReviewFindings.Variant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * What follows from filed costs: the order of plants, what would have to be true, and how far the
 * gap depends on what was chosen.
 */
final class ReviewBlocks {

  /** So many plants are printed; the findings file has them all. */
  private static final int LONGEST = 60;

  private ReviewBlocks() {}

  /** The order of plants by one technology, period by period. */
  static List<Block> orders(Material material, String technology) {
    List<Block> blocks = new ArrayList<>(material.drawings(Chart.Kind.ORDERED_RATIOS, technology));
    for (Order order : material.findings().review().orders()) {
      if (order.technology().equals(technology)) {
        blocks.add(order(order));
        blocks.add(Paragraph.of(apart(order)));
      }
    }
    return blocks;
  }

  private static Table order(Order order) {
    boolean year = order.groupsWithYear().isPresent();
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofNumbers("Rank", ""));
    columns.add(Column.ofNumbers("Filed / least cost", ""));
    columns.add(Column.ofNumbers("Ranks", "technology alone"));
    if (year) {
      columns.add(Column.ofNumbers("Ranks", "with the year's chance"));
    }
    columns.add(Column.ofNumbers("Probability of its rank", ""));
    List<Row> rows = new ArrayList<>();
    for (Placed placed : order.plants().stream().limit(LONGEST).toList()) {
      List<Cell> cells = new ArrayList<>();
      cells.add(Cell.of(Integer.toString(placed.rank())));
      cells.add(Cells.figure(placed.ratio()));
      cells.add(Cell.of(band(placed.band())));
      if (year) {
        cells.add(placed.bandWithYear().map(b -> Cell.of(band(b))).orElse(Cell.none()));
      }
      cells.add(
          placed.probabilities().isEmpty()
              ? Cell.none()
              : Cell.of(Numbers.percent(placed.probabilities().get(placed.rank() - 1))));
      rows.add(new Row(Text.of(placed.plant()), cells));
    }
    String drawn =
        Numbers.count(order.draws())
            + " draws of the technology's parameters, seed "
            + order.seed()
            + "; "
            + order.simulation()
            + (order.without() > 0
                ? "; " + order.without() + " draws left out, a plant having no answer"
                : "")
            + ". Rank 1 is nearest to or furthest below least cost.";
    return new Table(
        "Plants in order, " + order.period() + ", by " + Terms.technology(order.technology()),
        "Plant",
        columns,
        List.of(Group.of(rows)),
        List.of(Text.of(drawn)));
  }

  private static String band(Band band) {
    return band.low() == band.high()
        ? Integer.toString(band.low())
        : band.low() + " to " + band.high();
  }

  /** Which plants cannot be told apart, in words. */
  private static String apart(Order order) {
    Groups groups = order.groupsWithYear().orElse(order.groups());
    if (groups.critical().isEmpty()) {
      return "Pairs were not compared: there are too few plants, or more than can be read.";
    }
    List<String> several =
        groups.plants().stream().filter(group -> group.size() > 1).map(Phrases::list).toList();
    String method =
        " All pairs are compared at once: a pair is told apart where its studentised difference"
            + " exceeds "
            + Numbers.fixed(groups.critical().get(), 2)
            + ", found from the largest difference in each draw (Hothorn, Bretz and Westfall 2008)"
            + (order.groupsWithYear().isPresent()
                ? ", the chance of a single year being counted."
                : ".");
    return (several.isEmpty()
            ? "Every plant is told apart from every other."
            : "Cannot be told apart: " + String.join("; ", several) + ".")
        + method;
  }

  /** What would have to be true, for the largest gaps of a technology. */
  static List<Block> needed(Material material, String technology, List<Reviewed> reviews) {
    List<Reviewed> asked =
        reviews.stream()
            .filter(r -> r.detail().filter(d -> !d.needed().isEmpty()).isPresent())
            .limit(LONGEST)
            .toList();
    if (asked.isEmpty()) {
      return List.of();
    }
    List<Needed> first = asked.get(0).detail().map(Detail::needed).orElse(List.of());
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofWords("Period"));
    for (Needed needed : first) {
      columns.add(Column.ofNumbers(what(needed), unit(material, needed)));
    }
    List<Row> rows = new ArrayList<>();
    for (Reviewed review : asked) {
      List<Cell> cells = new ArrayList<>(List.of(Cell.of(review.period())));
      review.detail().map(Detail::needed).orElse(List.of()).forEach(n -> cells.add(cell(n)));
      rows.add(new Row(Text.of(review.plant()), cells));
    }
    return List.of(
        new Table(
            "What would have to be true for the filed cost to be least cost, by "
                + Terms.technology(technology),
            "Plant",
            columns,
            List.of(Group.of(rows)),
            List.of(
                Text.of(
                    "One thing at a time, all else as recorded and estimated. Beneath: what it is."
                        + " Prices and productivity are sought from a hundredth to a hundred times"
                        + " what they are, substitution from 0.01 to 100; \u201cno value\u201d"
                        + " means that none in these bounds makes the filed cost least cost."))));
  }

  private static String what(Needed needed) {
    return switch (needed.kind()) {
      case "price" -> "Price of " + needed.input();
      case "productivity" -> "Productivity";
      default -> "Substitution";
    };
  }

  private static String unit(Material material, Needed needed) {
    return needed.kind().equals("price") ? material.moneyPer(needed.input()) : "";
  }

  private static Cell cell(Needed needed) {
    return Cell.of(
        needed.value().map(Numbers::value).orElse("no value"),
        "is " + Numbers.amount(needed.asIs()));
  }

  /** How far the gap depends on what was chosen. */
  static Optional<Section> sensitivity(Material material) {
    ReviewFindings review = material.findings().review();
    if (review.variants().isEmpty()) {
      return Optional.empty();
    }
    List<Group> groups = new ArrayList<>();
    review.variants().stream()
        .collect(
            Collectors.groupingBy(
                v -> v.technology() + "\0" + v.period(),
                java.util.LinkedHashMap::new,
                Collectors.toList()))
        .forEach(
            (key, variants) ->
                groups.add(
                    new Group(
                        Optional.of(
                            Phrases.sentence(Terms.technology(variants.get(0).technology()))
                                + ", "
                                + variants.get(0).period()),
                        variants.stream().map(ReviewBlocks::variant).toList())));
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        new Table(
            "The total gap under other choices",
            "Choice",
            List.of(
                Column.ofNumbers("Filings", ""),
                Column.ofNumbers("Filed", ""),
                Column.ofNumbers("Least cost", ""),
                Column.ofNumbers("Gap", ""),
                Column.ofNumbers("Gap / filed", ""),
                Column.ofWords("Money")),
            groups,
            List.of(
                Text.of(
                    Phrases.sentence(material.interval())
                        + "s beneath. Dividing all money of a filing by one deflator changes filed"
                        + " and least cost alike, so that within a period the ratio stays."))));
    omissions(review).ifPresent(blocks::add);
    return Optional.of(
        new Section("filing-sensitivity", "How far the gap depends on what was chosen", blocks));
  }

  private static Row variant(Variant variant) {
    return new Row(
        Text.of(Phrases.sentence(variant.words())),
        List.of(
            Cell.of(Numbers.count(variant.filings())),
            Cell.of(Numbers.whole(variant.filed())),
            Cells.figure(variant.leastCost()),
            Cells.figure(variant.gap()),
            Cells.figure(variant.share()),
            Cell.of(variant.money())));
  }

  private static Optional<Block> omissions(ReviewFindings review) {
    List<String> parts = new ArrayList<>();
    for (String technology :
        review.omissions().stream().map(o -> o.technology()).distinct().toList()) {
      var own = review.omissions().stream().filter(o -> o.technology().equals(technology)).toList();
      var least =
          own.stream().min(java.util.Comparator.comparingDouble(o -> o.share())).orElseThrow();
      var most =
          own.stream().max(java.util.Comparator.comparingDouble(o -> o.share())).orElseThrow();
      parts.add(
          String.format(
              Locale.ROOT,
              "%s from %s of filed cost (without %s, %s) to %s (without %s, %s)",
              Terms.technology(technology),
              Numbers.percent(least.share()),
              least.plant(),
              least.period(),
              Numbers.percent(most.share()),
              most.plant(),
              most.period()));
    }
    return parts.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Notice(
                Weight.NOTE,
                Text.of(
                    "With each plant in turn left out of the estimation, the total gap runs: "
                        + String.join("; ", parts)
                        + ".")));
  }
}

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
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/** Filed costs held against least cost, plant by plant, with the gap in parts that add up. */
final class FilingSection {

  static final String ID = "filing";

  /** So many plants are printed for each technology; the findings file has them all. */
  private static final int LONGEST = 120;

  private static final int LONGEST_REMARKS = 12;

  private FilingSection() {}

  static Section of(Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "The gap is filed cost less least cost of the same output at the same prices. Its parts"
                + " add up: what the filing does not reconcile with price times quantity, what a"
                + " proportional cut of all inputs would save (technical), and what another mix"
                + " would save (mix)."));
    blocks.add(
        new Notice(
            Weight.WARNING,
            Text.of(
                "Unexplained cost is not waste. Product, site, age of plant, service and what the"
                    + " records leave out stand in the gap beside anything that could be saved."
                    + " Safe staffing, law, collective agreements and licensed practice come"
                    + " first.")));
    if (!material.findings().review().reference().isEmpty()) {
      blocks.add(
          Paragraph.of(
              "Held against "
                  + material.findings().review().reference()
                  + ". Intervals hold the uncertainty of the technology; the filing, its quantities"
                  + " and its prices are taken as they stand. A single year's chance in a plant's"
                  + " own output is part of its gap."));
    }
    blocks.addAll(Material.notices(material.findings().review().remarks()));
    for (String technology : technologies(material)) {
      blocks.add(technology(material, technology));
    }
    ReviewBlocks.sensitivity(material).ifPresent(blocks::add);
    AllowanceBlocks.section(material).ifPresent(blocks::add);
    return new Section(ID, "Filed cost and least cost", blocks);
  }

  /** The technologies that filed costs were held against, in order. */
  static List<String> technologies(Material material) {
    return material.findings().reviews().stream().map(Reviewed::technology).distinct().toList();
  }

  /** The reviews by one technology. */
  static List<Reviewed> by(Material material, String technology) {
    return material.findings().reviews().stream()
        .filter(review -> review.technology().equals(technology))
        .toList();
  }

  private static Section technology(Material material, String technology) {
    List<Reviewed> reviews = new ArrayList<>(by(material, technology));
    List<Block> blocks = new ArrayList<>();
    blocks.add(Paragraph.of(counts(reviews)));
    blocks.addAll(material.drawings(Chart.Kind.FILING, technology));
    blocks.addAll(material.drawings(Chart.Kind.GAP_PARTS, technology));
    reviews.sort(Comparator.comparingDouble(FilingSection::size).reversed());
    int shown = Math.min(LONGEST, reviews.size());
    blocks.add(table(material, technology, reviews.subList(0, shown), reviews.size()));
    EfficiencyBlocks.table(material, technology, reviews.subList(0, shown)).ifPresent(blocks::add);
    blocks.addAll(ReviewBlocks.orders(material, technology));
    blocks.addAll(ReviewBlocks.needed(material, technology, reviews));
    reviews.stream()
        .filter(review -> !own(review).isEmpty())
        .limit(LONGEST_REMARKS)
        .forEach(review -> blocks.addAll(Material.notices(named(review), own(review))));
    return new Section(ID + "-" + technology, "Against " + Terms.technology(technology), blocks);
  }

  /** What is said of this filing alone. */
  private static List<Said> own(Reviewed review) {
    return review.remarks().stream()
        .filter(said -> !said.code().equals(ReviewFindings.UNDIVIDED))
        .toList();
  }

  private static double size(Reviewed review) {
    return review.gap().map(gap -> gap.value()).orElse(Double.NEGATIVE_INFINITY);
  }

  private static String named(Reviewed review) {
    return review.plant() + ", " + review.period();
  }

  /** How many filed costs lie above, below, or cannot be told apart. */
  static String counts(List<Reviewed> reviews) {
    Map<Phrases.Relation, Integer> counts = new EnumMap<>(Phrases.Relation.class);
    for (Reviewed review : reviews) {
      counts.merge(relation(review), 1, Integer::sum);
    }
    List<String> parts = new ArrayList<>();
    for (Phrases.Relation relation :
        List.of(
            Phrases.Relation.ABOVE,
            Phrases.Relation.NOT_TOLD_APART,
            Phrases.Relation.BELOW,
            Phrases.Relation.UNKNOWN)) {
      int count = counts.getOrDefault(relation, 0);
      if (count > 0) {
        parts.add(Numbers.count(count) + " " + inWords(relation, count));
      }
    }
    return "Of " + Phrases.count(reviews.size(), "filed cost") + ", " + Phrases.list(parts) + ".";
  }

  private static String inWords(Phrases.Relation relation, int count) {
    return switch (relation) {
      case ABOVE -> (count == 1 ? "lies" : "lie") + " above least cost with the whole interval";
      case BELOW -> (count == 1 ? "lies" : "lie") + " below it with the whole interval";
      case NOT_TOLD_APART -> "cannot be told apart from least cost";
      case UNKNOWN -> (count == 1 ? "has" : "have") + " no answer";
    };
  }

  /** Where the filed cost of a review lies. */
  static Phrases.Relation relation(Reviewed review) {
    return review.gap().map(gap -> Phrases.relation(gap, 0)).orElse(Phrases.Relation.UNKNOWN);
  }

  private static Table table(
      Material material, String technology, List<Reviewed> reviews, int all) {
    boolean undivided = reviews.stream().anyMatch(FilingSection::undivided);
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofWords("Period"));
    for (String head :
        List.of(
            "Filed", "Price × quantity", "Least cost", "Gap", "Unreconciled", "Technical", "Mix")) {
      columns.add(Column.ofNumbers(head, ""));
    }
    if (undivided) {
      columns.add(Column.ofNumbers("Remainder", "undivided"));
    }
    columns.add(Column.ofWords("Filed cost is"));
    columns.add(Column.ofWords("Least cost"));
    List<Row> rows = new ArrayList<>();
    for (Reviewed review : reviews) {
      rows.add(new Row(Text.of(review.plant()), cells(review, undivided)));
    }
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Largest gap first. "
                + Phrases.sentence(material.interval())
                + "s beneath. Gap = filed − least cost = unreconciled + technical + mix"
                + (undivided ? " + remainder." : ".")));
    if (reviews.size() < all) {
      notes.add(
          Text.of(
              Numbers.count(reviews.size())
                  + " of "
                  + Phrases.count(all, "filed cost")
                  + "; the findings file has them all."));
    }
    return new Table(
        "Filed cost and least cost by " + Terms.technology(technology) + ", in " + material.money(),
        "Plant",
        columns,
        List.of(Group.of(rows)),
        notes);
  }

  private static boolean undivided(Reviewed review) {
    return review.detail().filter(d -> d.remainder().value() != 0).isPresent();
  }

  private static List<Cell> cells(Reviewed review, boolean undivided) {
    List<Cell> cells = new ArrayList<>();
    cells.add(Cell.of(review.period()));
    cells.add(Cell.of(Numbers.whole(review.filed())));
    cells.add(Cell.of(Numbers.whole(review.atPrices())));
    cells.add(Cells.figure(review.leastCost()));
    cells.add(Cells.figure(review.gap()));
    cells.add(Cell.of(Numbers.whole(review.unreconciled())));
    cells.add(Cells.figure(review.technical()));
    cells.add(Cells.figure(review.mix()));
    if (undivided) {
      cells.add(Cells.figure(review.detail().map(Detail::remainder)));
    }
    cells.add(Cell.of(Phrases.gapWord(relation(review))));
    cells.add(Cell.of(Terms.status(review.status())));
    return cells;
  }
}

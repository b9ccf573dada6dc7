package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.FrontierFindings;
import isowright.study.FrontierFindings.Plant;
import isowright.study.FrontierFindings.Variances;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Frontiers: how much inefficiency there is and where; in an annex, plant by plant. */
final class FrontierSection {

  static final String ID = "inefficiency";
  static final String ANNEX = "inefficiency-of-plants";

  /** Rows of the table of plants; the findings file has all. */
  private static final int MOST_PLANTS = 100;

  private FrontierSection() {}

  private static List<Fitted> fits(Material material) {
    return material.usable().stream().filter(fit -> fit.frontier().isPresent()).toList();
  }

  /** The section; absent where no frontier was fitted. */
  static Optional<Section> of(Material material) {
    List<Fitted> fits = fits(material);
    if (fits.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : fits) {
      String name = Terms.technology(fit.technology());
      FrontierFindings found = fit.frontier().orElseThrow();
      blocks.add(Paragraph.of(name + ". " + found.words()));
      found
          .variances()
          .ifPresent(v -> groups.add(new Group(Optional.of(name), brief(v, found.overTime()))));
    }
    if (!groups.isEmpty()) {
      blocks.add(
          new Table(
              "Inefficiency and noise",
              "Figure",
              List.of(Column.ofNumbers("Value", material.interval() + " beneath")),
              groups,
              List.of(
                  Text.of(
                      "In ln output: 0.1 is about 10 % of output. Standard deviations and the test"
                          + " stand in the annex and among the tests."))));
    }
    for (Fitted fit : fits) {
      blocks.addAll(material.drawings(Chart.Kind.INEFFICIENCY, fit.technology()));
    }
    blocks.add(
        Paragraph.of(
            "Inefficiency measured here includes what the records do not hold: quality, site, age,"
                + " safe staffing, law and agreements, duties of supply. How it is told from noise"
                + " rests on a law that was assumed. It is no measure of waste, and no ground for a"
                + " judgement about a plant without looking at the plant."));
    return Optional.of(new Section(ID, "Inefficiency", blocks));
  }

  /** Adds to what the records support. */
  static void supported(Material material, List<Text> points) {
    List<String> told =
        fits(material).stream()
            .filter(fit -> told(fit, material))
            .map(
                fit ->
                    Terms.technology(fit.technology())
                        + ", on average "
                        + Numbers.valueAndInterval(
                            fit.frontier().orElseThrow().variances().orElseThrow().mean())
                        + " in ln output")
            .toList();
    if (!told.isEmpty()) {
      points.add(Text.of("Inefficiency beyond noise: " + String.join("; ", told) + "."));
    }
  }

  /** Adds to what they do not. */
  static void unsupported(Material material, List<Text> points) {
    List<String> not =
        fits(material).stream()
            .filter(fit -> !told(fit, material))
            .map(fit -> Terms.technology(fit.technology()))
            .toList();
    if (!not.isEmpty()) {
      points.add(
          Text.of(
              "Whether plants differ in inefficiency or by noise alone cannot be said: "
                  + Phrases.list(not)
                  + "."));
    }
  }

  /** Whether inefficiency was found and the test speaks against there being none. */
  private static boolean told(Fitted fit, Material material) {
    return fit.frontier().map(FrontierFindings::found).orElse(false)
        && fit.tests().stream()
            .filter(test -> test.name().equals("no-inefficiency"))
            .anyMatch(test -> Phrases.outcome(test, material.confidence()).equals("rejected"));
  }

  private static List<Row> brief(Variances v, String overTime) {
    List<Row> rows = new ArrayList<>();
    String when = overTime.equals("decay") ? " in the last period" : "";
    rows.add(row("Mean inefficiency" + when, v.mean()));
    rows.add(row("Share of inefficiency in the variance of both", v.share()));
    v.decay().ifPresent(d -> rows.add(row("Decay of inefficiency a period, η", d)));
    return rows;
  }

  private static Row row(String name, isowright.study.Figure figure) {
    return new Row(Text.of(name), List.of(Cells.figure(figure)));
  }

  /** The annex; absent where no inefficiency was found. */
  static Optional<Section> annex(Material material) {
    List<Block> blocks = new ArrayList<>();
    for (Fitted fit : fits(material)) {
      FrontierFindings found = fit.frontier().orElseThrow();
      found.variances().ifPresent(v -> annex(material, fit, found, v, blocks));
    }
    return blocks.isEmpty()
        ? Optional.empty()
        : Optional.of(new Section(ANNEX, "Annex: inefficiency, plant by plant", blocks));
  }

  private static void annex(
      Material material, Fitted fit, FrontierFindings found, Variances v, List<Block> blocks) {
    String name = Terms.technology(fit.technology());
    blocks.add(
        new Table(
            name + ": standard deviations and what is made of them",
            "Figure",
            List.of(Column.ofNumbers("Value", material.interval() + " beneath")),
            List.of(
                new Group(
                    Optional.empty(),
                    List.of(
                        row("Noise, σ_v", v.noise()),
                        row("Inefficiency, σ_u", v.inefficiency()),
                        row("Ratio λ = σ_u/σ_v", v.ratio()),
                        row("γ = σ_u²/(σ_u² + σ_v²)", v.gamma())))),
            List.of(
                Text.of(
                    found.law().equals("half-normal")
                        ? "γ is not the share of variance under the half-normal law, whose variance"
                            + " is (1 − 2/π) σ_u²; that share stands in the main text."
                        : "Under the exponential law γ is the share of variance."))));
    boolean effects = found.bestByEffects().isPresent();
    List<Column> columns =
        new ArrayList<>(
            List.of(
                Column.ofNumbers("Inefficiency", material.interval() + " beneath"),
                Column.ofNumbers("Share of the frontier reached", material.interval() + " beneath"),
                Column.ofNumbers("Probability above the mean", "")));
    if (effects) {
      columns.add(Column.ofNumbers("From plant effects", material.interval() + " beneath"));
    }
    List<Row> rows =
        found.plants().stream()
            .sorted(Comparator.comparingDouble((Plant p) -> p.last().inefficiency().value()))
            .limit(MOST_PLANTS)
            .map(plant -> plant(plant, effects))
            .toList();
    blocks.add(
        new Table(
            name + ": plants in order of inefficiency",
            "Plant",
            columns,
            List.of(new Group(Optional.empty(), rows)),
            notes(found)));
  }

  private static Row plant(Plant plant, boolean effects) {
    List<Cell> cells =
        new ArrayList<>(
            List.of(
                Cells.figure(plant.last().inefficiency()),
                Cells.figure(plant.last().efficiency()),
                Cell.of(probability(plant.last().aboveMean()))));
    if (effects) {
      cells.add(Cells.figure(plant.byEffects()));
    }
    return new Row(Text.of(plant.last().plant()), cells);
  }

  private static String probability(double value) {
    if (value < 0.001) {
      return "below 0.001";
    }
    return value > 0.999 ? "above 0.999" : Numbers.fixed(value, 3);
  }

  private static List<Text> notes(FrontierFindings found) {
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Intervals are those of the law of inefficiency given a plant’s residuals, widened by"
                + " the uncertainty of the parameters to first order. That of the frontier’s height"
                + " is common to all plants, moves them together, and leaves their order as it is."
                + (found.overTime().equals("constant") ? "" : " Each plant at its last period.")));
    if (found.plants().size() > MOST_PLANTS) {
      notes.add(
          Text.of(
              "The first "
                  + MOST_PLANTS
                  + " of "
                  + Numbers.count(found.plants().size())
                  + "; the findings file has all."));
    }
    found
        .bestByEffects()
        .ifPresent(
            best ->
                notes.add(
                    Text.of(
                        "From plant effects: the greatest level within plants less the plant’s own,"
                            + " without any law. "
                            + best
                            + " has zero because it is taken for the best, not because it was found"
                            + " to have none; the greatest of many levels is too great by chance,"
                            + " and so are the distances from it.")));
    return notes;
  }
}

package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Section;
import isowright.report.Document.Weight;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Fitted;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The cost side: cost functions, what they say of scale and substitution, and whether to trust
 * them.
 */
final class CostsSection {

  static final String ID = "costs";

  private CostsSection() {}

  /** Whether the study asks of costs and prices alone. */
  static boolean alone(Findings findings) {
    return !findings.costs().fits().isEmpty()
        && findings.fits().isEmpty()
        && findings.given().isEmpty();
  }

  static Optional<Section> of(Material material) {
    List<Fitted> fits = material.findings().costs().fits();
    if (fits.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "A cost function says what output costs at given prices when inputs are mixed at least"
                + " cost; the share of an input in cost is its derivative. Homogeneity in prices is"
                + " imposed. Plants are taken to face the prices as given and to mix inputs at"
                + " least cost up to chance."));
    material.findings().costs().remarks().stream()
        .filter(said -> !said.code().equals("sides-differ"))
        .forEach(said -> blocks.add(notice("", said)));
    for (Fitted fit : fits) {
      fit.remarks().forEach(said -> blocks.add(notice(title(fit.technology()) + ". ", said)));
      inWords(fit, material, blocks);
    }
    CostSidesBlocks.add(material, blocks);
    List<Fitted> usable = fits.stream().filter(Fitted::usable).toList();
    if (!usable.isEmpty()) {
      blocks.add(CostTables.parameters(usable));
      blocks.add(CostTables.figures(usable));
      blocks.add(CostTables.regularity(usable));
      CostTables.tests(usable, material).ifPresent(blocks::add);
      CostTables.scale(usable, material).ifPresent(blocks::add);
    }
    return Optional.of(new Section(ID, "The cost side", blocks));
  }

  private static String title(String word) {
    return Terms.technology(word);
  }

  /** What can be stated of the cost side. */
  static void supported(Material material, List<Text> points) {
    for (Fitted fit : material.findings().costs().fits()) {
      fit.at()
          .flatMap(AtMean::scaleEconomies)
          .filter(figure -> side(figure) != 0)
          .ifPresent(
              figure ->
                  points.add(
                      Text.of(
                          (side(figure) > 0 ? "Economies" : "Diseconomies")
                              + " of scale at the mean of the records, by "
                              + title(fit.technology())
                              + " "
                              + Numbers.valueAndInterval(figure)
                              + ".")));
    }
  }

  /** What cannot be stated of the cost side. */
  static void unsupported(Material material, List<Text> points) {
    for (Fitted fit : material.findings().costs().fits()) {
      if (!fit.usable()) {
        points.add(
            Text.of(
                title(fit.technology())
                    + " is "
                    + Terms.state(fit.state())
                    + " and gives no result."));
      }
      fit.at()
          .flatMap(AtMean::scaleEconomies)
          .filter(figure -> side(figure) == 0)
          .ifPresent(
              figure ->
                  points.add(
                      Text.of(
                          "Economies and diseconomies of scale cannot be told apart at the mean of"
                              + " the records, by "
                              + title(fit.technology())
                              + " "
                              + Numbers.valueAndInterval(figure)
                              + ".")));
      fit.regularity()
          .filter(regular -> regular.both() < regular.rows())
          .ifPresent(
              regular ->
                  points.add(
                      Text.of(
                          title(fit.technology())
                              + " is no cost function at "
                              + Numbers.count(regular.rows() - regular.both())
                              + " of "
                              + Phrases.count(regular.rows(), "row")
                              + ".")));
    }
  }

  /** Above one, below one, or zero where the interval holds one. */
  private static int side(Figure figure) {
    double low = figure.uncertainty().map(Figure.Uncertainty::low).orElse(figure.value());
    double high = figure.uncertainty().map(Figure.Uncertainty::high).orElse(figure.value());
    return low > 1 ? 1 : high < 1 ? -1 : 0;
  }

  /** Economies where the whole interval lies above one, and so on. */
  private static String economies(Figure figure) {
    return switch (side(figure)) {
      case 1 -> "a per cent more output costs less than a per cent more";
      case -1 -> "a per cent more output costs more than a per cent more";
      default ->
          "whether a per cent more output costs more or less than a per cent more cannot be said";
    };
  }

  private static Notice notice(String who, Said said) {
    Weight weight = said.severity().equals("note") ? Weight.NOTE : Weight.WARNING;
    return new Notice(weight, Text.strong(who).then(said.message()));
  }

  private static void inWords(Fitted fit, Material material, List<Block> blocks) {
    String name = title(fit.technology());
    fit.at()
        .flatMap(AtMean::scaleEconomies)
        .ifPresent(
            figure ->
                blocks.add(
                    Paragraph.of(
                        name
                            + ": "
                            + economies(figure)
                            + " ("
                            + Numbers.valueAndInterval(figure)
                            + " at the mean of the records).")));
    fit.efficient()
        .ifPresent(
            efficient ->
                blocks.add(
                    Paragraph.of(
                        name
                            + ": average cost is least at an output of "
                            + Numbers.unit(
                                Numbers.valueAndInterval(efficient.output()),
                                material.findings().units().output())
                            + ", other things at their means; "
                            + Numbers.percent(efficient.below())
                            + " of the rows produce less.")));
  }
}

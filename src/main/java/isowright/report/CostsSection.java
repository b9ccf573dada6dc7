package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Section;
import isowright.report.Document.Weight;
import isowright.study.CostFindings;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Pair;
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
    List<Fitted> usable = fits.stream().filter(Fitted::usable).toList();
    usable.forEach(fit -> blocks.add(Paragraph.of(inWords(fit, material))));
    if (!material.findings().costs().sides().isEmpty()) {
      blocks.add(Paragraph.of(CostSidesBlocks.inWords(material.findings().costs().sides())));
    }
    material.findings().costs().remarks().stream()
        .filter(said -> !ofRecords(said) && !said.code().equals("sides-differ"))
        .forEach(said -> blocks.add(notice("", said)));
    for (Fitted fit : fits) {
      fit.remarks().forEach(said -> blocks.add(notice(title(fit.technology()) + ". ", said)));
    }
    blocks.add(
        Paragraph.of(
            "A cost function says what output costs at given prices when inputs are mixed at least"
                + " cost; the share of an input in cost is its derivative. Homogeneity in prices is"
                + " imposed. Plants are taken to face the prices as given and to mix inputs at"
                + " least cost up to chance."));
    if (!usable.isEmpty()) {
      scale(usable, material).ifPresent(blocks::add);
      ScopeTable.of(usable).ifPresent(blocks::add);
      blocks.add(substitution(usable, material));
      shares(usable, material).ifPresent(blocks::add);
      CostSidesBlocks.section(material).ifPresent(blocks::add);
      blocks.add(trust(usable, material));
    }
    return Optional.of(new Section(ID, "The cost side", blocks));
  }

  private static Optional<Section> scale(List<Fitted> usable, Material material) {
    List<Block> blocks = new ArrayList<>();
    for (Fitted fit : usable) {
      blocks.addAll(material.drawings(Chart.Kind.AVERAGE_COST, fit.technology()));
      blocks.addAll(material.drawings(Chart.Kind.SCALE_ECONOMIES, fit.technology()));
    }
    CostSpreads.scale(usable, material).ifPresent(blocks::add);
    CostTables.scale(usable, material).ifPresent(blocks::add);
    return blocks.isEmpty()
        ? Optional.empty()
        : Optional.of(new Section(ID + "-scale", "Scale", blocks));
  }

  private static Section substitution(List<Fitted> usable, Material material) {
    List<Block> blocks = new ArrayList<>(material.drawings(Chart.Kind.PRICE_ELASTICITIES));
    blocks.add(CostTables.figures(usable));
    CostSpreads.elasticities(usable).ifPresent(blocks::add);
    blocks.add(
        Paragraph.of(
            "The elasticities of "
                + (usable.stream().allMatch(f -> f.rows().rows().size() == f.rows().all())
                    ? "every row"
                    : "an even sample of the rows")
                + ", each with its interval, stand beside this report in "
                + Phrases.list(usable.stream().map(CostRowsCsv::name).toList())
                + "."));
    return new Section(ID + "-substitution", "Substitution and demand", blocks);
  }

  private static Optional<Section> shares(List<Fitted> usable, Material material) {
    List<Block> blocks = new ArrayList<>();
    for (Fitted fit : usable) {
      blocks.addAll(material.drawings(Chart.Kind.COST_SHARES, fit.technology()));
    }
    return blocks.isEmpty()
        ? Optional.empty()
        : Optional.of(new Section(ID + "-shares", "Recorded and fitted shares", blocks));
  }

  private static Section trust(List<Fitted> usable, Material material) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(CostTables.regularity(usable));
    CostTables.tests(usable, material).ifPresent(blocks::add);
    blocks.add(CostTables.parameters(usable));
    return new Section(ID + "-trust", "Regularity, tests, parameters", blocks);
  }

  /** Whether a remark is one of the audit, told where the records are. */
  static boolean ofRecords(Said said) {
    return said.code().equals("shares-not-one");
  }

  private static String title(String word) {
    return Terms.technology(word);
  }

  /** What can be stated of the cost side. */
  static void supported(Material material, List<Text> points) {
    List<CostFindings.Side> sides = material.findings().costs().sides();
    if (!sides.isEmpty() && sides.stream().noneMatch(CostFindings.Side::apart)) {
      points.add(Text.of(CostSidesBlocks.inWords(sides)));
    }
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
      efficient(fit, material, points);
    }
  }

  private static void efficient(Fitted fit, Material material, List<Text> points) {
    fit.efficient()
        .ifPresent(
            efficient ->
                points.add(
                    Text.of(
                        "Average cost is least at "
                            + Numbers.unit(
                                Numbers.valueAndInterval(efficient.output()),
                                material.findings().units().output())
                            + ", by "
                            + title(fit.technology())
                            + "; "
                            + Numbers.percent(efficient.below())
                            + " of the rows produce less.")));
  }

  /** What cannot be stated of the cost side. */
  static void unsupported(Material material, List<Text> points) {
    List<CostFindings.Side> sides = material.findings().costs().sides();
    if (sides.stream().anyMatch(CostFindings.Side::apart)) {
      points.add(Text.of(CostSidesBlocks.inWords(sides)));
    }
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

  /** What one cost function answers, in a paragraph. */
  private static String inWords(Fitted fit, Material material) {
    StringBuilder words = new StringBuilder(title(fit.technology())).append(": ");
    Optional<Figure> scale = fit.at().flatMap(AtMean::scaleEconomies);
    scale.ifPresent(
        figure ->
            words
                .append(economies(figure))
                .append(
                    fit.rows().fixed().isEmpty()
                        ? ""
                        : " where " + Phrases.list(fit.rows().fixed()) + " grows with it")
                .append(" (scale economies ")
                .append(Numbers.valueAndInterval(figure))
                .append(" at the mean of the records). "));
    fit.efficient()
        .ifPresent(
            efficient ->
                words
                    .append("Average cost is least at an output of ")
                    .append(
                        Numbers.unit(
                            Numbers.valueAndInterval(efficient.output()),
                            material.findings().units().output()))
                    .append(", other things at their means; ")
                    .append(Numbers.percent(efficient.below()))
                    .append(" of the rows produce less. "));
    CostRows.Told told = fit.rows().told();
    if (told.known() > 0 && fit.efficient().isPresent()) {
      words
          .append("In ")
          .append(Numbers.count(told.above()))
          .append(" of ")
          .append(Phrases.count(told.known(), "row"))
          .append(" the whole interval of scale economies lies above one, in ")
          .append(Numbers.count(told.below()))
          .append(" below; in ")
          .append(Numbers.count(told.unclear()))
          .append(" it cannot be told. ");
    }
    boolean unit = unitSubstitution(fit);
    words.append(scale.isPresent() ? "The" : "the");
    words.append(unit ? " elasticity of substitution is one by its form." : demand(fit));
    fit.at().flatMap(AtMean::technicalChange).ifPresent(figure -> words.append(change(figure)));
    return words.toString();
  }

  /** Whether the form, not the records, says what replaces what. */
  private static boolean unitSubstitution(Fitted fit) {
    return fit.at().map(AtMean::substitution).orElse(List.of()).stream()
        .allMatch(
            pair ->
                Math.abs(pair.figure().value() - 1) < 1e-9
                    && pair.figure().uncertainty().filter(u -> u.standardError() > 1e-9).isEmpty());
  }

  /** Which inputs answer to their own price, and which go together. */
  private static String demand(Fitted fit) {
    List<Pair> own =
        fit.at().map(AtMean::demand).orElse(List.of()).stream()
            .filter(pair -> pair.first().equals(pair.second()))
            .toList();
    List<Pair> complements =
        fit.at().map(AtMean::substitution).orElse(List.of()).stream()
            .filter(pair -> pair.measure().equals("allen") && pair.figure().value() < 0)
            .toList();
    return " own price elasticity of demand is "
        + Phrases.list(
            own.stream()
                .map(pair -> Numbers.value(pair.figure()) + " for " + pair.first())
                .toList())
        + (complements.isEmpty()
            ? "; all inputs are substitutes."
            : "; complements, the demand for which falls together, are "
                + Phrases.list(
                    complements.stream()
                        .map(pair -> pair.first() + " and " + pair.second())
                        .toList())
                + ".");
  }

  private static String change(Figure figure) {
    return " Cost falls by "
        + Numbers.valueAndInterval(figure)
        + " of itself a period at unchanged prices and output.";
  }
}

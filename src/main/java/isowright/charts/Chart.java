package isowright.charts;

import java.util.List;
import java.util.function.Supplier;

/**
 * A chart: a picture and everything that a reader who cannot see it needs.
 *
 * @param kind what kind of chart it is
 * @param subject what it is about: a technology, or "question, technology"; empty for the whole
 *     study
 * @param name its file name without ending: lower-case letters, digits and hyphens, unique in the
 *     study
 * @param title the finding, in a sentence
 * @param caption what to look at, in a sentence
 * @param alternative the text alternative
 * @param header the headings of the data table, units included
 * @param rows the data table, ready to print
 * @param svg draws the chart as SVG (with title, desc, role="img" and viewBox; scales to its
 *     container)
 * @param png draws the chart as PNG at twice its size
 * @param figure draws the chart as SVG without the visible title, for a page that prints the title
 *     as the figure's heading
 */
public record Chart(
    Kind kind,
    String subject,
    String name,
    String title,
    String caption,
    String alternative,
    List<String> header,
    List<List<String>> rows,
    Supplier<String> svg,
    Supplier<byte[]> png,
    Supplier<String> figure) {

  /** What kind of chart it is. */
  public enum Kind {
    /** The isoquant of a target with the isocost line and the plants' mixes. */
    ISOQUANT,
    /** The least-cost mix as the target grows. */
    EXPANSION_PATH,
    /** Average and marginal cost with bands. */
    COST_CURVES,
    /** Output elasticities with intervals across technologies. */
    ELASTICITIES,
    /** Average cost along output, by a cost function, with the rows about it. */
    AVERAGE_COST,
    /** Scale economies of all rows in ascending order. */
    SCALE_ECONOMIES,
    /** Recorded against fitted cost shares. */
    COST_SHARES,
    /** Price elasticities of demand and elasticities of substitution by cost functions. */
    PRICE_ELASTICITIES,
    /** The sum of squares along a curvature parameter. */
    PROFILE,
    /** Inefficiency of plants in order. */
    INEFFICIENCY,
    /** Residuals against fitted values. */
    RESIDUALS,
    /** Actual against predicted output. */
    ACTUAL_PREDICTED,
    /** Average cost in the short run beside that in the long run. */
    ENVELOPE,
    /** What an input is demanded at each of its prices. */
    DEMAND,
    /** What other prices, goals and productivity change. */
    CHANGES,
    /** What each plant makes of a target that is split. */
    SPLIT,
    /** Where average cost is least, answer by answer. */
    EFFICIENT_SCALE,
    /** Filed against least cost. */
    FILING,
    /** The gap between them in parts. */
    GAP_PARTS,
    /** Plants in order of filed over least cost. */
    ORDERED_RATIOS,
    /** An allowance year by year. */
    ALLOWANCE_PATH,
    /** A figure across the combinations of a specification matrix. */
    SPECIFICATIONS
  }

  /** Copies the tables. */
  public Chart {
    header = List.copyOf(header);
    rows = rows.stream().map(List::copyOf).toList();
  }

  /** A chart whose picture is the same on a page as standing alone. */
  public Chart(
      Kind kind,
      String subject,
      String name,
      String title,
      String caption,
      String alternative,
      List<String> header,
      List<List<String>> rows,
      Supplier<String> svg,
      Supplier<byte[]> png) {
    this(kind, subject, name, title, caption, alternative, header, rows, svg, png, svg);
  }
}

package isowright.study;

import isowright.study.FitFindings.Pair;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a cost function says over the records: row by row, along output, and in the whole.
 *
 * @param all how many rows there are
 * @param rows the rows, evenly thinned where there are very many
 * @param average average cost along output, other things at their means; empty unless there is one
 *     output and cost is known
 * @param spreads how figures spread over all rows
 * @param fixed the fixed inputs; where there are any, cost is variable cost
 */
public record CostRows(
    int all, List<Row> rows, List<AveragePoint> average, List<Spread> spreads, List<String> fixed) {

  /** Nothing is known. */
  public static final CostRows NONE = new CostRows(0, List.of(), List.of(), List.of(), List.of());

  /** Copies the lists. */
  public CostRows {
    rows = List.copyOf(rows);
    average = List.copyOf(average);
    spreads = List.copyOf(spreads);
    fixed = List.copyOf(fixed);
  }

  /**
   * One row.
   *
   * @param row its number in the file
   * @param plant the plant
   * @param period the period
   * @param output output; NaN where there is not exactly one
   * @param averageCost recorded cost over output, carried by the cost function to mean prices and
   *     to the means of whatever else moves cost; NaN where cost or output is not known
   * @param scale scale economies
   * @param fitted fitted shares by input
   * @param seen recorded shares by input; empty where not known
   * @param elasticities price elasticities of demand ({@code demand}) and Allen-Uzawa elasticities
   *     of substitution ({@code allen}, each pair once)
   * @param monotone whether shares and marginal cost are positive there
   * @param concave whether cost is concave in prices there
   */
  public record Row(
      int row,
      String plant,
      String period,
      double output,
      double averageCost,
      Optional<Figure> scale,
      Map<String, Double> fitted,
      Map<String, Double> seen,
      List<Pair> elasticities,
      boolean monotone,
      boolean concave) {

    /** Copies, keeping the order. */
    public Row {
      fitted = Collections.unmodifiableMap(new LinkedHashMap<>(fitted));
      seen = Collections.unmodifiableMap(new LinkedHashMap<>(seen));
      elasticities = List.copyOf(elasticities);
    }
  }

  /**
   * Average cost at an output.
   *
   * @param output the output
   * @param cost average cost of the typical plant there
   */
  public record AveragePoint(double output, Figure cost) {}

  /**
   * How a figure spreads over the rows.
   *
   * @param measure {@code scale}, {@code share}, {@code demand} or {@code allen}
   * @param of the input or the two inputs it concerns; empty for scale
   * @param least the least
   * @param tenth the value that a tenth of the rows stay below
   * @param quarter a quarter
   * @param median half
   * @param threeQuarters three quarters
   * @param nineTenths nine tenths
   * @param most the greatest
   */
  public record Spread(
      String measure,
      String of,
      double least,
      double tenth,
      double quarter,
      double median,
      double threeQuarters,
      double nineTenths,
      double most) {}

  /** Rows by what their whole interval of scale economies says of one. */
  public Told told() {
    int above = 0;
    int below = 0;
    int known = 0;
    int economies = 0;
    for (Row row : rows) {
      if (row.scale().isPresent()) {
        Figure scale = row.scale().get();
        double low = scale.uncertainty().map(Figure.Uncertainty::low).orElse(scale.value());
        double high = scale.uncertainty().map(Figure.Uncertainty::high).orElse(scale.value());
        known++;
        economies += scale.value() > 1 ? 1 : 0;
        above += low > 1 ? 1 : 0;
        below += high < 1 ? 1 : 0;
      }
    }
    return new Told(known, economies, above, below);
  }

  /**
   * Rows by their scale economies.
   *
   * @param known rows of which scale economies are known
   * @param economies rows in which they exceed one
   * @param above rows in which the whole interval does
   * @param below rows in which the whole interval lies below one
   */
  public record Told(int known, int economies, int above, int below) {

    /** Rows in which it cannot be told. */
    public int unclear() {
      return known - above - below;
    }
  }
}

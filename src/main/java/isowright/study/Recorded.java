package isowright.study;

import isowright.inference.Support;
import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a plan must know of the records: their periods and plants, where mixes and output lie, and
 * what prices were.
 *
 * @param periods in order
 * @param plants in the order of the records
 * @param repeated whether plants are met in several rows
 * @param leastOutput the least output
 * @param mostOutput the greatest
 * @param prices the mean price of each input in its last recorded period; NaN where none is known
 * @param priceRanges the least and the greatest price of each input, where they differ
 * @param support where the mixes lie
 */
public record Recorded(
    List<String> periods,
    List<String> plants,
    boolean repeated,
    double leastOutput,
    double mostOutput,
    double[] prices,
    List<Optional<double[]>> priceRanges,
    Where support) {

  /**
   * Where the mixes lie, in logs; see {@link Support.Parts}.
   *
   * @param mean by input
   * @param least by input
   * @param most by input
   * @param inverse of their covariance
   * @param farthest the greatest squared distance of a record
   */
  public record Where(
      double[] mean, double[] least, double[] most, double[][] inverse, double farthest) {

    private static Where of(Support.Parts parts) {
      return new Where(
          parts.mean(), parts.least(), parts.most(), parts.inverse(), parts.farthest());
    }
  }

  /** Copies the lists. */
  public Recorded {
    periods = List.copyOf(periods);
    plants = List.copyOf(plants);
    priceRanges = List.copyOf(priceRanges);
  }

  /** What the records say. */
  static Recorded of(Panel panel) {
    int n = panel.inputs().size();
    double[] prices = new double[n];
    List<Optional<double[]>> ranges = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      boolean priced = panel.prices().get(i).isPresent();
      prices[i] = priced ? Demands.meanPrice(panel, i) : Double.NaN;
      ranges.add(panel.prices().get(i).flatMap(Recorded::range));
    }
    double[] output = panel.output().toArray();
    return new Recorded(
        panel.periods(),
        panel.plants(),
        panel.plants().size() < panel.rows(),
        Arrays.stream(output).min().orElse(0),
        Arrays.stream(output).max().orElse(Double.POSITIVE_INFINITY),
        prices,
        ranges,
        Where.of(Support.of(panel).parts()));
  }

  private static Optional<double[]> range(Column column) {
    double[] known =
        Arrays.stream(column.toArray()).filter(v -> Double.isFinite(v) && v > 0).toArray();
    OptionalDouble least = Arrays.stream(known).min();
    return ChangeFigures.range(least, Arrays.stream(known).max());
  }

  /** Where the mixes lie. */
  Support support(List<String> inputs) {
    return Support.of(
        inputs,
        new Support.Parts(
            support.mean, support.least, support.most, support.inverse, support.farthest));
  }

  /** The least and greatest output, where they differ. */
  Optional<double[]> outputRange() {
    return mostOutput > leastOutput
        ? Optional.of(new double[] {leastOutput, mostOutput})
        : Optional.empty();
  }
}

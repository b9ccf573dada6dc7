package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * What a fit found about plants and time beside its parameters.
 *
 * @param observations how many rows the regression has
 * @param observed what one of them is: {@code rows}, {@code plant-means} or {@code differences}
 * @param components the variances of random effects, where plants are random draws
 * @param change technical change, where anything about time was estimated
 */
public record PanelFindings(
    int observations, String observed, Optional<Components> components, Optional<Change> change) {

  /** Every row used as it is, and nothing about plants or time. */
  public static PanelFindings of(int rows) {
    return new PanelFindings(rows, "rows", Optional.empty(), Optional.empty());
  }

  /**
   * Variances of random effects.
   *
   * @param method how they were estimated
   * @param row σ²_e, the variance of the error of a row
   * @param plant σ²_u, the variance between plants
   * @param leastShare the least θ, the share of its mean that is taken off a plant
   * @param mostShare the greatest θ; the same as the least where all plants have as many rows
   * @param truncated whether the estimate between plants was negative and set to zero
   */
  public record Components(
      String method,
      double row,
      double plant,
      double leastShare,
      double mostShare,
      boolean truncated) {}

  /**
   * Technical change.
   *
   * @param unit {@code year} or {@code period}
   * @param rates percent a year (or period)
   * @param biases by input, where the trend is biased
   * @param words what it says, in sentences
   */
  public record Change(String unit, List<Rate> rates, List<Bias> biases, String words) {
    /** Copies the lists. */
    public Change {
      rates = List.copyOf(rates);
      biases = List.copyOf(biases);
    }
  }

  /**
   * A rate of technical change.
   *
   * @param place {@code mean}, {@code last}, {@code average} or {@code latest}
   * @param when the place in words
   * @param percent percent a year (or period)
   */
  public record Rate(String place, String when, Figure percent) {}

  /**
   * What technical change does to an input's share in cost at given inputs.
   *
   * @param input the input
   * @param points percentage points a year (or period)
   * @param verdict {@code uses}, {@code saves} or {@code not-told-apart}
   */
  public record Bias(String input, Figure points, String verdict) {}
}

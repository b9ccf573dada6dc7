package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * What is expected of least squares before anything is fitted: which way coefficients lean because
 * inputs are chosen knowing productivity, and whether anything in the records shifts an input for
 * reasons of its own.
 *
 * @param free the input taken to be chosen knowing productivity: the one that moves most
 * @param expectation the expectation in words
 * @param treatment what the study does about it, in words
 * @param inputs input by input
 */
public record SimultaneityFindings(
    String free, String expectation, String treatment, List<Input> inputs) {

  /** Copies the list. */
  public SimultaneityFindings {
    inputs = List.copyOf(inputs);
  }

  /**
   * An input.
   *
   * @param name its name
   * @param direction {@code upward}, {@code downward} or {@code none}: where its coefficient leans
   * @param perFree the error of its coefficient for an error of one in that of the free input;
   *     absent where inputs cannot be told apart
   * @param withinShare the share of the variance of its log within plants
   * @param shifted {@code yes}, {@code no} or {@code unknown}: whether its own price shifts it
   * @param words why so
   * @param priceSpread the standard deviation of the log of its price, plants and periods taken out
   * @param priceShare the share of that log's variance which is left then
   * @param correlation of quantity and price, likewise
   * @param response of the quantity to the price, in per cent for one per cent
   * @param p of the null of no response
   */
  public record Input(
      String name,
      String direction,
      Optional<Double> perFree,
      Optional<Double> withinShare,
      String shifted,
      String words,
      Optional<Double> priceSpread,
      Optional<Double> priceShare,
      Optional<Double> correlation,
      Optional<Figure> response,
      Optional<Double> p) {}
}

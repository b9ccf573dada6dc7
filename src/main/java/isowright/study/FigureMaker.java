package isowright.study;

import isowright.inference.DeltaMethod;
import isowright.inference.Intervals;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * Numbers of a technology as figures: with their uncertainty where the technology was estimated,
 * exact where it is taken as known.
 */
final class FigureMaker {

  private final Optional<Intervals> headline;
  private final Optional<DeltaMethod> delta;

  /**
   * A maker of figures.
   *
   * @param headline for the figures that matter most, from refits where there are any
   * @param delta for all others, which are many
   */
  FigureMaker(Optional<Intervals> headline, Optional<DeltaMethod> delta) {
    this.headline = headline;
    this.delta = delta;
  }

  /** Whether the technology was estimated. */
  boolean estimated() {
    return delta.isPresent();
  }

  /** The figures that matter most. */
  List<Figure> headline(
      Technology technology, Function<Technology, double[]> numbers, DeltaMethod.Scale scale) {
    return figures(headline, technology, numbers, scale);
  }

  /** The figures of several numbers that share the work of finding them. */
  List<Figure> figures(
      Technology technology, Function<Technology, double[]> numbers, DeltaMethod.Scale scale) {
    return figures(delta, technology, numbers, scale);
  }

  private static List<Figure> figures(
      Optional<? extends Intervals> by,
      Technology technology,
      Function<Technology, double[]> numbers,
      DeltaMethod.Scale scale) {
    if (by.isEmpty()) {
      return Arrays.stream(numbers.apply(technology)).mapToObj(Figure::exact).toList();
    }
    return by.get().estimates(numbers, scale).stream().map(EstimatedFigures::of).toList();
  }

  /** A number without an interval: exact for a known technology, of unknown error otherwise. */
  Figure bare(double value) {
    return delta.isEmpty()
        ? Figure.exact(value)
        : Figure.estimated(value, Double.NaN, Double.NaN, Double.NaN, "");
  }

  /** Several numbers that could not be had. */
  static double[] missing(int count) {
    double[] missing = new double[count];
    Arrays.fill(missing, Double.NaN);
    return missing;
  }

  /** A figure whose value is a number; none otherwise. */
  static Optional<Figure> finite(Figure figure) {
    return Double.isFinite(figure.value()) ? Optional.of(figure) : Optional.empty();
  }
}

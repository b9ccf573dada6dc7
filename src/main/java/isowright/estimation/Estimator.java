package isowright.estimation;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** By which principle a technology is fitted. */
public sealed interface Estimator {

  /** The word for it: {@code least-squares} or the key of the study file that asks for it. */
  String word();

  /** Least squares: inputs are taken to be unrelated to what the technology leaves unexplained. */
  record LeastSquares() implements Estimator {
    @Override
    public String word() {
      return "least-squares";
    }
  }

  /**
   * Two-stage least squares: some inputs are chosen knowing what the technology leaves unexplained,
   * and what shifts them without entering the technology stands in for them.
   *
   * @param byInput the instruments of each such input, in the order of the inputs
   */
  record Instruments(Map<String, List<Series>> byInput) implements Estimator {
    /** Copies the map, in its order. */
    public Instruments {
      Map<String, List<Series>> copy = new LinkedHashMap<>();
      byInput.forEach((input, series) -> copy.put(input, List.copyOf(series)));
      byInput = java.util.Collections.unmodifiableMap(copy);
    }

    @Override
    public String word() {
      return "instruments";
    }
  }
}

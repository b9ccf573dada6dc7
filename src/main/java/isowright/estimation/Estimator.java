package isowright.estimation;

import isowright.regression.OneSidedLaw;
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

  /**
   * Maximum likelihood of a frontier: output lies below what the technology makes possible by an
   * inefficiency that is never negative, and about that by noise of both signs.
   *
   * @param law of the inefficiency
   * @param overTime how the rows of a plant share it
   */
  record Frontier(OneSidedLaw law, OverTime overTime) implements Estimator {
    @Override
    public String word() {
      return "frontier";
    }

    /** The word for the law. */
    public String lawWord() {
      return law == OneSidedLaw.HALF_NORMAL ? "half-normal" : "exponential";
    }
  }

  /**
   * A control function: productivity is read off a column that rises with it, and its innovations
   * are unrelated to inputs fixed beforehand and to the free inputs of the period before.
   *
   * @param column the proxy, an input or another column, in logs where it can be
   * @param states the inputs fixed before productivity of the period is known; all others are free
   * @param degree of the polynomial in inputs and proxy that smooths output
   * @param process the degree of the polynomial in last period's productivity
   * @param drawing how plants are drawn for standard errors
   */
  record Proxy(
      Series column, List<String> states, int degree, int process, Replication.Drawing drawing)
      implements Estimator {
    /** Copies the list. */
    public Proxy {
      states = List.copyOf(states);
    }

    @Override
    public String word() {
      return "proxy";
    }
  }

  /** How the rows of a plant share its inefficiency. */
  enum OverTime {
    /** Every row has its own. */
    EACH_ROW("each-row"),
    /** All rows of a plant have the same. */
    CONSTANT("constant"),
    /** That of the last period of the records, times e^(−η (t − T)). */
    DECAY("decay");

    private final String word;

    OverTime(String word) {
      this.word = word;
    }

    /** The word used in files. */
    public String word() {
      return word;
    }
  }
}

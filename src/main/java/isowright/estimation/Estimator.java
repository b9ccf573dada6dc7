package isowright.estimation;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
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
   * A control function: an observed demand that rises with productivity stands in for it.
   *
   * @param proxy the column of that demand
   * @param state the inputs that are fixed before the productivity of a period is known; the others
   *     are free
   * @param degree of the polynomial of the first stage, 1 to 3
   * @param draws of whole plants for the standard errors
   * @param seed of the draws
   */
  record ControlFunction(Series proxy, List<String> state, int degree, int draws, long seed)
      implements Estimator {

    /** The degree of the polynomial of the first stage where none is stated. */
    public static final int USUAL_DEGREE = 2;

    /** The number of draws where none is stated: enough for two digits of a standard error. */
    public static final int USUAL_DRAWS = 399;

    /** The seed of the draws where none is stated. */
    public static final long USUAL_SEED = 20240613;

    /** Copies the list. */
    public ControlFunction {
      state = List.copyOf(state);
    }

    @Override
    public String word() {
      return "proxy";
    }
  }

  /**
   * A frontier: output falls short of the technology by an inefficiency of one sign, beside noise
   * of both signs.
   *
   * @param inefficiency its law
   * @param overTime whose it is and how it changes
   */
  record Frontier(Inefficiency inefficiency, OverTime overTime) implements Estimator {
    @Override
    public String word() {
      return "frontier";
    }
  }

  /** The law of inefficiency. */
  enum Inefficiency {
    /** The absolute value of a normal variable. */
    HALF_NORMAL,
    /** Exponential. */
    EXPONENTIAL;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  /** Whose inefficiency is, and how it changes. */
  enum OverTime {
    /** Every row has its own, drawn anew. */
    EACH_ROW,
    /** A plant keeps its own for ever. */
    CONSTANT,
    /** A plant's own changes by the same factor e^−η every period for all plants. */
    DECAY;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  private static String words(Enum<?> value) {
    return value.name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}

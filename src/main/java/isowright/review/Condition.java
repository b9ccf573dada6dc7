package isowright.review;

import isowright.inference.Estimate;
import java.util.Optional;

/**
 * What would have to be true, one thing at a time, for a filed cost to be the least cost of its
 * output.
 *
 * @param kind what would have to differ
 * @param input the input whose price it is; empty for the others
 * @param asIs what it is: the price paid, productivity one, the technology's own elasticity
 * @param value what it would have to be; absent where no value within the bounds does
 * @param low the lower bound of the search
 * @param high the upper bound
 * @param costAtEnd where there is no value: least cost at the last value tried
 * @param end that value
 * @param regular where there is no value: whether the bound was reached, rather than the end of
 *     what the technology can answer
 */
public record Condition(
    Kind kind,
    String input,
    double asIs,
    Optional<Estimate> value,
    double low,
    double high,
    double costAtEnd,
    double end,
    boolean regular) {

  /** What would have to differ. */
  public enum Kind {
    /** The price of an input. */
    PRICE("price"),
    /** Productivity: output at every mix, as a multiple of the reference technology's. */
    PRODUCTIVITY("productivity"),
    /** The elasticity of substitution, the base point being kept. */
    SUBSTITUTION("substitution");

    private final String word;

    Kind(String word) {
      this.word = word;
    }

    /** The word used in files. */
    public String word() {
      return word;
    }
  }
}

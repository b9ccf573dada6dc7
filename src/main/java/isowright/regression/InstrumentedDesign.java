package isowright.regression;

import java.util.List;
import java.util.stream.IntStream;

/**
 * A design of which some regressors may move together with the error, and with columns that move
 * them but are no regressors.
 *
 * <p>Notation: X the K regressors, K₂ of them endogenous; Z the instruments, that is the exogenous
 * regressors and the outside columns.
 *
 * @param design its columns are the K regressors and, after them, the outside instruments
 * @param endogenous true where a regressor may move with the error; shape K
 */
public record InstrumentedDesign(Design design, boolean[] endogenous) {

  /** Copies the array. */
  public InstrumentedDesign {
    endogenous = endogenous.clone();
    if (endogenous.length > design.columns().size()) {
      throw new IllegalArgumentException(
          endogenous.length + " regressors among " + design.columns().size() + " columns");
    }
  }

  @Override
  public boolean[] endogenous() {
    return endogenous.clone();
  }

  /** The number of regressors, K. */
  public int regressors() {
    return endogenous.length;
  }

  /** The number of outside instruments. */
  public int outside() {
    return design.columns().size() - endogenous.length;
  }

  /** The endogenous regressors, ascending. */
  int[] endogenousColumns() {
    return IntStream.range(0, endogenous.length).filter(k -> endogenous[k]).toArray();
  }

  /** The columns of Z: exogenous regressors first, so that an outside one gives way to them. */
  int[] instrumentColumns() {
    return IntStream.concat(
            IntStream.range(0, endogenous.length).filter(k -> !endogenous[k]),
            IntStream.range(endogenous.length, design.columns().size()))
        .toArray();
  }

  /** The names of the regressors. */
  List<String> regressorNames() {
    return design.columns().subList(0, endogenous.length);
  }
}

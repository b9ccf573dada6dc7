package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.VarianceComponents;
import java.util.List;
import java.util.Optional;

/**
 * What was done about lasting differences between plants, as far as the specification leaves it to
 * the records.
 *
 * @param levels the rows in levels, before anything is removed, with every column that is estimated
 *     (linearised where the form is not linear)
 * @param rows which rows of the panel the rows of the regression are
 * @param components the variances of random effects, where plants are random draws
 * @param plantMeans over all rows, the mean of each column of plant means that was added; these are
 *     the last parameters of the fit
 * @param leftOut columns whose plant means were not added because the records cannot tell them from
 *     other columns
 */
public record Treatment(
    Design levels,
    RowsUsed rows,
    Optional<VarianceComponents> components,
    double[] plantMeans,
    List<String> leftOut) {

  /** Copies the list. */
  public Treatment {
    leftOut = List.copyOf(leftOut);
  }

  /** Every row is used as it is, and nothing is added. */
  static Treatment none(Design levels) {
    return new Treatment(
        levels, RowsUsed.each(levels.rows()), Optional.empty(), new double[0], List.of());
  }
}

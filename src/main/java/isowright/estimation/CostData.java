package isowright.estimation;

import isowright.cost.CostArguments;
import isowright.regression.Groups;
import java.util.List;

/**
 * Costs as records: in each row the arguments of a cost function, the cost, and the shares of the
 * inputs in it.
 *
 * @param arguments what the cost function depends on, with the base by which it is divided
 * @param points the natural logs of prices, outputs and fixed quantities, then the period where
 *     time is an argument; {@code points[k][row]}, A × N; not modified by anyone
 * @param logCost ln C, shape N; empty where costs are not known, so that only shares can be fitted
 * @param shares the share of each input in cost, {@code shares[i][row]}, n × N; empty where they
 *     are not known
 * @param controls what else moves the log of cost, {@code controls[c][row]}
 * @param controlNames their names
 * @param groups rows of the same firm, contiguous
 */
public record CostData(
    CostArguments arguments,
    double[][] points,
    double[] logCost,
    double[][] shares,
    double[][] controls,
    List<String> controlNames,
    Groups groups) {

  /** Checks that all columns have as many rows. */
  public CostData {
    controlNames = List.copyOf(controlNames);
    int rows = groups.rows();
    boolean agree = points.length == arguments.size() && controls.length == controlNames.size();
    for (double[][] columns : new double[][][] {points, shares, controls}) {
      for (double[] column : columns) {
        agree &= column.length == rows;
      }
    }
    agree &= logCost.length == 0 || logCost.length == rows;
    agree &= shares.length == 0 || shares.length == arguments.inputs().size();
    if (!agree) {
      throw new IllegalArgumentException("columns of cost records of unequal length");
    }
  }

  /** The number of rows, N. */
  public int rows() {
    return groups.rows();
  }

  /** The arguments of one row. */
  public double[] point(int row) {
    double[] v = new double[points.length];
    for (int k = 0; k < v.length; k++) {
      v[k] = points[k][row];
    }
    return v;
  }
}

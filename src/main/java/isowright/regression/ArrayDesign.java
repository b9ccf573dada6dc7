package isowright.regression;

import java.util.List;

/** A design whose columns are held in arrays. */
public final class ArrayDesign implements Design {

  private final List<String> columns;
  private final double[][] regressors;
  private final double[] response;
  private final Groups groups;

  private ArrayDesign(
      List<String> columns, double[][] regressors, double[] response, Groups groups) {
    this.columns = List.copyOf(columns);
    this.regressors = Matrices.copy(regressors);
    this.response = response.clone();
    this.groups = groups;
    if (regressors.length != columns.size()) {
      throw new IllegalArgumentException(
          columns.size() + " names for " + regressors.length + " regressors");
    }
    for (int k = 0; k < regressors.length; k++) {
      if (regressors[k].length != response.length) {
        throw new IllegalArgumentException(
            "column "
                + columns.get(k)
                + " has "
                + regressors[k].length
                + " rows, the response "
                + response.length);
      }
    }
    if (groups.rows() != response.length) {
      throw new IllegalArgumentException(
          "the groups have " + groups.rows() + " rows, the response " + response.length);
    }
  }

  /**
   * A design of independent rows.
   *
   * @param columns the names of the K regressors
   * @param regressors K arrays of N values; copied
   * @param response N values; copied
   */
  public static ArrayDesign of(List<String> columns, double[][] regressors, double[] response) {
    return new ArrayDesign(columns, regressors, response, Groups.ofSingleRows(response.length));
  }

  /** A design of rows in groups; as {@link #of(List, double[][], double[])} otherwise. */
  public static ArrayDesign of(
      List<String> columns, double[][] regressors, double[] response, Groups groups) {
    return new ArrayDesign(columns, regressors, response, groups);
  }

  @Override
  public int rows() {
    return response.length;
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return groups;
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    for (int k = 0; k < regressors.length; k++) {
      System.arraycopy(regressors[k], from, into[k], 0, to - from);
    }
    System.arraycopy(response, from, into[regressors.length], 0, to - from);
  }
}

package isowright.regression;

import java.util.Arrays;
import java.util.List;

/**
 * Some columns of a design in an order of their own, with any of them, or the response, to explain.
 */
final class ChosenColumns implements Design {

  private final Design design;
  private final int[] regressors;
  private final int response;
  private final List<String> columns;

  /**
   * @param regressors the columns that explain, by index
   * @param response the column explained, by index; K for the response of the design
   */
  ChosenColumns(Design design, int[] regressors, int response) {
    this.design = design;
    this.regressors = regressors.clone();
    this.response = response;
    this.columns = Arrays.stream(regressors).mapToObj(design.columns()::get).toList();
  }

  @Override
  public int rows() {
    return design.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return design.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    design.fill(from, to, wide(into, to - from));
  }

  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    double[] all = new double[design.columns().size() + 1];
    design.fill(from, to, wide(into, to - from), all);
    for (int k = 0; k < regressors.length; k++) {
      squares[k] += all[regressors[k]];
    }
    squares[regressors.length] += all[response];
  }

  /** All columns of the design, those not chosen in room of their own. */
  private double[][] wide(double[][] into, int rows) {
    double[][] wide = new double[design.columns().size() + 1][];
    for (int k = 0; k < regressors.length; k++) {
      wide[regressors[k]] = into[k];
    }
    wide[response] = into[regressors.length];
    for (int k = 0; k < wide.length; k++) {
      if (wide[k] == null) {
        wide[k] = new double[rows];
      }
    }
    return wide;
  }

  @Override
  public int absorbed() {
    return design.absorbed();
  }

  @Override
  public double absorbedLeverage(int row) {
    return design.absorbedLeverage(row);
  }
}

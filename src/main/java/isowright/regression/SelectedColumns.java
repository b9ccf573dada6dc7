package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/** A design with some of its columns left out. */
final class SelectedColumns implements Design {

  private final Design design;
  private final boolean[] out;
  private final List<String> columns;

  /**
   * @param out true where a column is left out; shape K
   */
  SelectedColumns(Design design, boolean[] out) {
    this.design = design;
    this.out = out;
    List<String> left = new ArrayList<>();
    for (int k = 0; k < out.length; k++) {
      if (!out[k]) {
        left.add(design.columns().get(k));
      }
    }
    this.columns = List.copyOf(left);
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
    double[] all = new double[out.length + 1];
    design.fill(from, to, wide(into, to - from), all);
    int at = 0;
    for (int k = 0; k <= out.length; k++) {
      if (k == out.length || !out[k]) {
        squares[at++] += all[k];
      }
    }
  }

  /** All columns of the design, those left out in room of their own. */
  private double[][] wide(double[][] into, int rows) {
    double[][] wide = new double[out.length + 1][];
    int at = 0;
    for (int k = 0; k <= out.length; k++) {
      wide[k] = k < out.length && out[k] ? new double[rows] : into[at++];
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

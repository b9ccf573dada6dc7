package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/**
 * The regressors of an instrumented design and, after them, the first-stage residual X − X̂ of each
 * endogenous one; the response as it is.
 */
final class AugmentedDesign implements Design {

  private final InstrumentedDesign instrumented;
  private final double[][] firstStages;
  private final int[] endogenous;
  private final int[] instruments;
  private final List<String> columns;

  AugmentedDesign(InstrumentedFit fit) {
    this.instrumented = fit.of();
    this.firstStages =
        fit.firstStages().stream().map(LinearFit::coefficients).toArray(double[][]::new);
    this.endogenous = instrumented.endogenousColumns();
    this.instruments = instrumented.instrumentColumns();
    List<String> names = new ArrayList<>(instrumented.regressorNames());
    for (String name : fit.endogenous()) {
      names.add("first-stage residual of " + name);
    }
    this.columns = List.copyOf(names);
  }

  /** The columns that are first-stage residuals. */
  boolean[] residualColumns() {
    boolean[] residual = new boolean[columns.size()];
    for (int e = 0; e < endogenous.length; e++) {
      residual[instrumented.regressors() + e] = true;
    }
    return residual;
  }

  @Override
  public int rows() {
    return instrumented.design().rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return instrumented.design().groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    double[][] wide = wide(into, to - from);
    instrumented.design().fill(from, to, wide);
    residuals(wide, into, to - from);
  }

  /** A residual is held against the regressor that it is left of. */
  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    double[][] wide = wide(into, to - from);
    double[] all = new double[wide.length];
    instrumented.design().fill(from, to, wide, all);
    residuals(wide, into, to - from);
    int regressors = instrumented.regressors();
    for (int k = 0; k < regressors; k++) {
      squares[k] += all[k];
    }
    for (int e = 0; e < endogenous.length; e++) {
      squares[regressors + e] += all[endogenous[e]];
    }
    squares[columns.size()] += all[wide.length - 1];
  }

  private void residuals(double[][] wide, double[][] into, int rows) {
    for (int e = 0; e < endogenous.length; e++) {
      double[] residual = into[instrumented.regressors() + e];
      System.arraycopy(wide[endogenous[e]], 0, residual, 0, rows);
      for (int l = 0; l < instruments.length; l++) {
        double weight = firstStages[e][l];
        double[] instrument = wide[instruments[l]];
        for (int r = 0; weight != 0 && r < rows; r++) {
          residual[r] -= weight * instrument[r];
        }
      }
    }
  }

  private double[][] wide(double[][] into, int rows) {
    double[][] wide = new double[instrumented.design().columns().size() + 1][];
    for (int k = 0; k < wide.length - 1; k++) {
      wide[k] = k < instrumented.regressors() ? into[k] : new double[rows];
    }
    wide[wide.length - 1] = into[columns.size()];
    return wide;
  }

  @Override
  public int absorbed() {
    return instrumented.design().absorbed();
  }

  @Override
  public double absorbedLeverage(int row) {
    return instrumented.design().absorbedLeverage(row);
  }
}

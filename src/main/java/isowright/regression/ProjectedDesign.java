package isowright.regression;

import java.util.List;

/**
 * The regressors of an instrumented design with the endogenous ones replaced by what the
 * instruments say of them, X̂ = Z Π, and the response y − (X − X̂) β for given β.
 *
 * <p>Where β is the two-stage estimate, X̂′(X − X̂) = 0 makes it the least-squares coefficients of
 * this design, and the residuals are y − Xβ. So the covariance estimators of least squares, applied
 * to this design, are those of two-stage least squares.
 */
final class ProjectedDesign implements Design {

  private final InstrumentedDesign instrumented;
  private final double[][] firstStages;
  private final double[] coefficients;
  private final int[] endogenous;
  private final int[] instruments;

  /**
   * @param firstStages Π, one row an endogenous regressor, over the instruments
   * @param coefficients β, shape K; zeros leave the response as it is, but for the endogenous part
   */
  ProjectedDesign(InstrumentedDesign instrumented, double[][] firstStages, double[] coefficients) {
    this.instrumented = instrumented;
    this.firstStages = Matrices.copy(firstStages);
    this.coefficients = coefficients.clone();
    this.endogenous = instrumented.endogenousColumns();
    this.instruments = instrumented.instrumentColumns();
  }

  @Override
  public int rows() {
    return instrumented.design().rows();
  }

  @Override
  public List<String> columns() {
    return instrumented.regressorNames();
  }

  @Override
  public Groups groups() {
    return instrumented.design().groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    double[][] wide = wide(into, to - from);
    instrumented.design().fill(from, to, wide);
    project(wide, to - from);
  }

  /** A projection is held against the regressor that it stands for. */
  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    double[][] wide = wide(into, to - from);
    double[] all = new double[wide.length];
    instrumented.design().fill(from, to, wide, all);
    project(wide, to - from);
    int regressors = instrumented.regressors();
    for (int k = 0; k < regressors; k++) {
      squares[k] += all[k];
    }
    squares[regressors] += all[wide.length - 1];
  }

  private void project(double[][] wide, int rows) {
    double[] response = wide[wide.length - 1];
    double[] projected = new double[rows];
    for (int e = 0; e < endogenous.length; e++) {
      double[] column = wide[endogenous[e]];
      java.util.Arrays.fill(projected, 0);
      for (int l = 0; l < instruments.length; l++) {
        double weight = firstStages[e][l];
        double[] instrument = wide[instruments[l]];
        for (int r = 0; weight != 0 && r < rows; r++) {
          projected[r] += weight * instrument[r];
        }
      }
      double slope = coefficients[endogenous[e]];
      for (int r = 0; r < rows; r++) {
        response[r] -= slope * (column[r] - projected[r]);
        column[r] = projected[r];
      }
    }
  }

  private double[][] wide(double[][] into, int rows) {
    int regressors = instrumented.regressors();
    double[][] wide = new double[instrumented.design().columns().size() + 1][];
    for (int k = 0; k < wide.length - 1; k++) {
      wide[k] = k < regressors ? into[k] : new double[rows];
    }
    wide[wide.length - 1] = into[regressors];
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

package isowright.regression;

import java.util.List;

/** A design of instruments with y − Xβ in place of the response. */
final class ResidualResponse implements Design {
  private final Design instruments;
  private final InstrumentedDesign of;
  private final double[] coefficients;

  /**
   * @param coefficients of the regressors of {@code of}; what is left of the response is explained
   */
  ResidualResponse(Design instruments, InstrumentedDesign of, double[] coefficients) {
    this.instruments = instruments;
    this.of = of;
    this.coefficients = coefficients;
  }

  /** The instruments of a design, with what these coefficients leave of its response. */
  static ResidualResponse of(InstrumentedDesign of, double[] coefficients) {
    int response = of.design().columns().size();
    return new ResidualResponse(
        new ChosenColumns(of.design(), of.instrumentColumns(), response), of, coefficients);
  }

  @Override
  public int rows() {
    return instruments.rows();
  }

  @Override
  public List<String> columns() {
    return instruments.columns();
  }

  @Override
  public Groups groups() {
    return instruments.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int columns = of.design().columns().size();
    int[] chosen = of.instrumentColumns();
    double[][] wide = new double[columns + 1][];
    for (int l = 0; l < chosen.length; l++) {
      wide[chosen[l]] = into[l];
    }
    wide[columns] = into[chosen.length];
    for (int k = 0; k < columns; k++) {
      if (wide[k] == null) {
        wide[k] = new double[to - from];
      }
    }
    of.design().fill(from, to, wide);
    double[] residuals = new Residuals(to - from).of(regressors(wide), to - from, coefficients);
    System.arraycopy(residuals, 0, into[chosen.length], 0, to - from);
  }

  private double[][] regressors(double[][] wide) {
    double[][] block = new double[coefficients.length + 1][];
    System.arraycopy(wide, 0, block, 0, coefficients.length);
    block[coefficients.length] = wide[wide.length - 1];
    return block;
  }

  @Override
  public int absorbed() {
    return instruments.absorbed();
  }

  @Override
  public double absorbedLeverage(int row) {
    return instruments.absorbedLeverage(row);
  }
}

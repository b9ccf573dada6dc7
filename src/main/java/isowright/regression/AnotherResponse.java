package isowright.regression;

import java.util.List;
import java.util.function.IntToDoubleFunction;

/** The regressors of a design with a response of its own, such as squared residuals. */
public final class AnotherResponse implements Design {

  private final Design design;
  private final IntToDoubleFunction response;

  private AnotherResponse(Design design, IntToDoubleFunction response) {
    this.design = design;
    this.response = response;
  }

  /**
   * The design with this response in place of its own.
   *
   * @param design nothing may have been removed from its rows, for it is not removed from the
   *     response; see {@link Design#likewise}
   * @param response the response by row; it must give the same numbers each time
   */
  public static Design of(Design design, IntToDoubleFunction response) {
    return new AnotherResponse(design, response);
  }

  @Override
  public int rows() {
    return design.rows();
  }

  @Override
  public List<String> columns() {
    return design.columns();
  }

  @Override
  public Groups groups() {
    return design.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    design.fill(from, to, into);
    double[] column = into[design.columns().size()];
    for (int r = from; r < to; r++) {
      column[r - from] = response.applyAsDouble(r);
    }
  }
}

package isowright.regression;

import java.util.List;

/**
 * Effects removed from a design before it is fitted.
 *
 * <p>A constant for every group of rows need not be estimated: by the theorem of Frisch, Waugh and
 * Lovell, least squares on deviations from group means gives the same slopes, the same residuals
 * and the same sum of squares as least squares with one constant a group. It holds for the
 * linearisation of a nonlinear model as well, so such a model gets group effects by removing means
 * from its linearisation.
 *
 * <p>Sources: R. Frisch and F. V. Waugh 1933, Econometrica 1, 387–401; M. C. Lovell 1963, Journal
 * of the American Statistical Association 58, 993–1010. Tested against dummy variables in {@code
 * EffectsTest}.
 */
public final class Effects {

  private Effects() {}

  /**
   * The design in deviations from the means of its groups, regressors and response, computed as it
   * is read. One parameter a group is absorbed, and adds 1 / (size of the group) to the leverage of
   * a row. A column that does not vary within groups becomes exactly or nearly zero and is reported
   * as collinear with the group effects by {@link LeastSquares}.
   */
  public static Design within(Design design) {
    return design instanceof Within ? design : new Within(design);
  }

  /** Deviations from group means. */
  private static final class Within implements Design {
    private final Design design;
    private final Groups groups;

    Within(Design design) {
      this.design = design;
      this.groups = design.groups();
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
      return groups;
    }

    @Override
    public void fill(int from, int to, double[][] into) {
      design.fill(from, to, into);
      remove(from, to, into);
    }

    @Override
    public void fill(int from, int to, double[][] into, double[] squares) {
      design.fill(from, to, into, squares);
      remove(from, to, into);
    }

    private void remove(int from, int to, double[][] into) {
      int columns = design.columns().size() + 1;
      int end;
      for (int start = from, g = from < to ? groups.of(from) : 0; start < to; start = end, g++) {
        end = groups.end(g);
        for (int k = 0; k < columns; k++) {
          center(into[k], start - from, end - from);
        }
      }
    }

    /**
     * Subtracts the first value, then the mean: a column that is constant in the group becomes
     * exactly zero, and a large level loses no digits.
     */
    private static void center(double[] values, int from, int to) {
      double level = values[from];
      double sum = 0;
      for (int i = from; i < to; i++) {
        double deviation = values[i] - level;
        values[i] = deviation;
        sum += deviation;
      }
      double mean = sum / (to - from);
      for (int i = from; i < to; i++) {
        values[i] -= mean;
      }
    }

    @Override
    public int absorbed() {
      return design.absorbed() + groups.count();
    }

    @Override
    public double absorbedLeverage(int row) {
      int g = groups.of(row);
      return design.absorbedLeverage(row) + 1.0 / (groups.end(g) - groups.start(g));
    }
  }
}

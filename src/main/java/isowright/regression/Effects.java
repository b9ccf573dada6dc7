package isowright.regression;

import java.util.List;
import java.util.function.IntPredicate;

/**
 * What is done to a design about lasting differences between its groups before it is fitted: means
 * removed whole ({@link #within}) or in part ({@link #partlyWithin}), means alone ({@link
 * #between}), means beside the rows ({@link #withGroupMeans}), differences of successive rows
 * ({@link #differences}). Each is computed as it is read; nothing of the size of the data is
 * copied.
 *
 * <p>A constant for every group of rows need not be estimated: by the theorem of Frisch, Waugh and
 * Lovell, least squares on deviations from group means gives the same slopes, the same residuals
 * and the same sum of squares as least squares with one constant a group. It holds for the
 * linearisation of a nonlinear model as well, so such a model gets group effects by removing means
 * from its linearisation.
 *
 * <p>Sources: R. Frisch and F. V. Waugh 1933, Econometrica 1, 387–401; M. C. Lovell 1963, Journal
 * of the American Statistical Association 58, 993–1010. Tested against dummy variables in {@code
 * EffectsTest}, the others in {@code GroupTransformationsTest}.
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

  /**
   * One row a group: the means of regressors and response over its rows, each group counting once
   * however many rows it has. The rows of the result are groups of their own.
   */
  public static Design between(Design design) {
    return new BetweenGroups(design, false);
  }

  /**
   * The same with each row multiplied by the root of the number of rows it stands for, so that its
   * sum of squared residuals is Σ_g T_g (mean residual of g)².
   */
  static Design betweenByRows(Design design) {
    return new BetweenGroups(design, true);
  }

  /**
   * The design less a share of the means of its groups, x_it − θ_g x̄_g: least squares on it is
   * generalised least squares with one random effect a group (W. A. Fuller and G. E. Battese 1974,
   * Journal of Econometrics 2, 67–78). Nothing is absorbed.
   *
   * @param shares θ_g, one a group, each from 0 to 1
   */
  public static Design partlyWithin(Design design, double[] shares) {
    return new PartlyWithin(design, shares);
  }

  /**
   * The design with group means of some of its regressors as further columns, after the others.
   *
   * @param which the columns whose means are added
   * @param prefix put before a column's name to name its mean
   */
  public static Design withGroupMeans(Design design, List<String> which, String prefix) {
    return new WithGroupMeans(design, which, prefix);
  }

  /**
   * First differences, x_r − x_{r−1}, regressors and response, of the rows that follow the row
   * before them in the same group. A group without such a row is left out.
   *
   * @param follows whether a row (never the first of its group) is one step after the row before
   */
  public static Differences differences(Design design, IntPredicate follows) {
    return Differences.of(design, follows);
  }

  /**
   * Subtracts the first value, then the mean: a column that is constant in the group becomes
   * exactly zero, and a large level loses no digits.
   */
  static void center(double[] values, int from, int to) {
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

    @Override
    public Design before() {
      return design.before();
    }

    @Override
    public Design likewise(Design other) {
      return within(design.likewise(other));
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

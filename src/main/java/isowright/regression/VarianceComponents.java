package isowright.regression;

import java.util.Locale;

/**
 * How much of the error lasts? The variances of y_it = x_it′β + u_g + e_it, u a random effect of
 * the group, e an error of the row, both independent of the regressors.
 *
 * <p>Notation: N rows in G groups of T_g, K columns with the constant, Q and P the projections off
 * and on the groups, Z their indicators, K_Q and K_P the ranks of QX and PX.
 *
 * <ul>
 *   <li>Swamy-Arora: σ²_e = SSR of the regression within groups / (N − G − K_Q); with SSR_P that of
 *       the regression between groups (each mean counting by its rows), σ²_u = [SSR_P − (G − K_P)
 *       σ²_e] / [N − tr{(X′PX)⁻¹X′ZZ′X}]. P. A. V. B. Swamy and S. S. Arora 1972, Econometrica 40,
 *       261–275; groups of unequal size: B. H. Baltagi and Y.-J. Chang 1994, Journal of
 *       Econometrics 62, 67–89.
 *   <li>Wallace-Hussain, from the residuals û of ordinary least squares. Groups of equal size T:
 *       σ²_e = û′Qû / (G(T − 1)), T σ²_u + σ²_e = û′Pû / G. T. D. Wallace and A. Hussain 1969,
 *       Econometrica 37, 55–72. Unequal size: û′Qû and û′Pû set equal to their expectations
 *       (Baltagi and Chang 1994).
 *   <li>Amemiya, from the residuals of the regression within groups, with the mean of all rows
 *       taken off but not those of the groups. Equal size: as above. T. Amemiya 1971, International
 *       Economic Review 12, 1–13. Unequal size: σ²_e as Swamy-Arora, and û′Pû set equal to its
 *       expectation (Baltagi and Chang 1994).
 * </ul>
 *
 * <p>The classical sources make no allowance for the K columns with groups of equal size, and
 * published tables follow them; so does this. A negative σ²_u is set to zero and said to be so.
 * Tested in {@code VarianceComponentsTest}.
 *
 * @param method the estimator
 * @param row σ²_e; NaN where the rows leave no degrees of freedom
 * @param group σ²_u, not below 0
 * @param truncated whether the estimate of σ²_u was negative
 */
public record VarianceComponents(Method method, double row, double group, boolean truncated) {

  /** How the variances are estimated. */
  public enum Method {
    /** From the regressions within and between groups. */
    SWAMY_ARORA,
    /** From the residuals of ordinary least squares. */
    WALLACE_HUSSAIN,
    /** From the residuals of the regression within groups. */
    AMEMIYA;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /**
   * Estimates the variances; reads the design a few times, in parallel.
   *
   * @param design in levels, with a constant
   */
  public static VarianceComponents estimate(Design design, Method method) {
    return switch (method) {
      case SWAMY_ARORA -> swamyArora(design);
      case WALLACE_HUSSAIN -> wallaceHussain(design);
      case AMEMIYA -> amemiya(design);
    };
  }

  /** θ = 1 − √(σ²_e / (σ²_e + T σ²_u)): the share of its mean taken off a group of T rows. */
  public double share(int size) {
    return 1 - Math.sqrt(row / (row + size * group));
  }

  /** T σ²_u / (σ²_e + T σ²_u): how much of a group's mean residual is its effect, as predicted. */
  public double shrinkage(int size) {
    return size * group / (row + size * group);
  }

  /** θ of every group. */
  public double[] shares(Groups groups) {
    double[] shares = new double[groups.count()];
    for (int g = 0; g < shares.length; g++) {
      shares[g] = share(groups.end(g) - groups.start(g));
    }
    return shares;
  }

  private static VarianceComponents swamyArora(Design design) {
    double rows = withinVariance(LeastSquares.fit(Effects.within(design)));
    Design means = Effects.betweenByRows(design);
    LinearFit between = LeastSquares.fit(means);
    if (between.rows() <= between.rank()) {
      return of(Method.SWAMY_ARORA, rows, Double.NaN);
    }
    double trace = GroupMoments.of(design, between, between.coefficients()).traceOfTwice();
    double group =
        (between.ssr() - (between.rows() - between.rank()) * rows) / (design.rows() - trace);
    return of(Method.SWAMY_ARORA, rows, group);
  }

  private static VarianceComponents wallaceHussain(Design design) {
    LinearFit all = LeastSquares.fit(design);
    GroupMoments moments = GroupMoments.of(design, all, all.coefficients());
    double rows = design.rows();
    double groups = design.groups().count();
    int size = commonSize(design.groups());
    if (size > 0) {
      return ofEqualSize(
          Method.WALLACE_HUSSAIN, moments.within(), moments.between(), (int) groups, size);
    }
    double trace = moments.trace();
    double product = moments.traceOfProduct();
    double twice = moments.traceOfTwice();
    double withinByGroup = twice - product;
    double withinByRow = rows - groups - all.rank() + trace;
    double betweenByGroup = rows - 2 * twice + product;
    double betweenByRow = groups - trace;
    double determinant = withinByGroup * betweenByRow - withinByRow * betweenByGroup;
    double group =
        (moments.within() * betweenByRow - moments.between() * withinByRow) / determinant;
    double row =
        (withinByGroup * moments.between() - betweenByGroup * moments.within()) / determinant;
    if (group < 0) {
      // Without effects the residuals are those of ordinary least squares, and so is the variance.
      return new VarianceComponents(Method.WALLACE_HUSSAIN, all.residualVariance(), 0, true);
    }
    return of(Method.WALLACE_HUSSAIN, row, group);
  }

  private static VarianceComponents amemiya(Design design) {
    LinearFit within = LeastSquares.fit(Effects.within(design));
    GroupMoments moments = GroupMoments.of(design, within, within.coefficients());
    Groups groups = design.groups();
    int rows = design.rows();
    double between = moments.betweenAboutMean(rows);
    int size = commonSize(groups);
    if (size > 0) {
      return ofEqualSize(Method.AMEMIYA, within.ssr(), between, groups.count(), size);
    }
    double squares = 0;
    for (int g = 0; g < groups.count(); g++) {
      double own = groups.end(g) - groups.start(g);
      squares += own * own;
    }
    double row = withinVariance(within);
    double group =
        (between - (groups.count() - 1 + moments.traceAboutMean(rows)) * row)
            / (rows - squares / rows);
    return of(Method.AMEMIYA, row, group);
  }

  private static VarianceComponents ofEqualSize(
      Method method, double within, double between, int groups, int size) {
    double row = size > 1 ? within / (groups * (size - 1.0)) : Double.NaN;
    return of(method, row, (between / groups - row) / size);
  }

  private static VarianceComponents of(Method method, double row, double group) {
    return new VarianceComponents(
        method, row, Double.isNaN(group) ? group : Math.max(0, group), group < 0);
  }

  private static double withinVariance(LinearFit within) {
    int left = within.residualDegreesOfFreedom();
    return left > 0 ? within.ssr() / left : Double.NaN;
  }

  /** The number of rows that every group has; 0 where they differ. */
  private static int commonSize(Groups groups) {
    int size = groups.end(0) - groups.start(0);
    for (int g = 1; g < groups.count(); g++) {
      if (groups.end(g) - groups.start(g) != size) {
        return 0;
      }
    }
    return size;
  }
}

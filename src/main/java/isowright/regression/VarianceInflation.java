package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/**
 * By what factor do the other regressors inflate the variance of a coefficient?
 *
 * <p>With c_k the k-th diagonal entry of (X′X)⁻¹, X as it was fitted: centred VIF_k = c_k Σ (x_ik −
 * m_k)² = 1/(1 − R²_k), R²_k that of column k on the others, and m_k what a constant explains of
 * it, where there is one; raw VIF_k = c_k Σ x_ik² with the column as it was before anything was
 * removed from it, so that a constant or effects which the column resembles count as well. Where
 * group means were removed, "centred" means about those.
 *
 * <p>Sources: D. W. Marquardt 1970, Technometrics 12, 591–612; D. A. Belsley, E. Kuh and R. E.
 * Welsch 1980, <i>Regression Diagnostics</i>, section 3.2, on the raw form. Tested in {@code
 * VarianceInflationTest} against R.
 *
 * @param column the regressor
 * @param raw the raw factor
 * @param centred the centred factor
 */
public record VarianceInflation(String column, double raw, double centred) {

  /**
   * The factors of the regressors of a fit, constants left out; empty where columns were dropped.
   *
   * @param design the design that was fitted
   */
  public static List<VarianceInflation> of(Design design, LinearFit fit) {
    if (!fit.fullRank() || fit.rank() < fit.columns().size()) {
      return List.of();
    }
    int columns = fit.columns().size();
    boolean[] constant = constants(design.before());
    int one = 0;
    while (one < columns && !constant[one]) {
      one++;
    }
    double[] explained = one < columns ? slopesOn(design, one) : new double[columns];
    double[] centred = squaresAbout(design, one, explained);
    double[] before = squaresBefore(design);
    double[][] inverse = fit.inverseCrossProduct();
    List<VarianceInflation> all = new ArrayList<>();
    for (int k = 0; k < columns; k++) {
      if (!constant[k]) {
        double c = inverse[k][k];
        all.add(new VarianceInflation(fit.columns().get(k), c * before[k], c * centred[k]));
      }
    }
    return List.copyOf(all);
  }

  private static boolean[] constants(Design design) {
    double[] spreads = ColumnMoments.of(design).spreads();
    boolean[] constant = new boolean[spreads.length - 1];
    for (int k = 0; k < constant.length; k++) {
      constant[k] = spreads[k] == 0;
    }
    return constant;
  }

  /** Σ x_k c / Σ c² for the column c. */
  private static double[] slopesOn(Design design, int c) {
    double[] products =
        summed(
            design,
            (into, block, rows) -> {
              for (int k = 0; k < into.length; k++) {
                into[k] += OrthogonalDecomposition.product(block[k], block[c], 0, rows);
              }
            });
    double squares = products[c];
    for (int k = 0; k < products.length; k++) {
      products[k] /= squares;
    }
    return products;
  }

  /** Σ (x_k − m_k c)². */
  private static double[] squaresAbout(Design design, int c, double[] slopes) {
    return summed(
        design,
        (into, block, rows) -> {
          for (int k = 0; k < into.length; k++) {
            double sum = 0;
            for (int i = 0; i < rows; i++) {
              double left = block[k][i] - (slopes[k] == 0 ? 0 : slopes[k] * block[c][i]);
              sum += left * left;
            }
            into[k] += sum;
          }
        });
  }

  private static double[] squaresBefore(Design design) {
    int size = design.columns().size() + 1;
    return Blocks.of(design.groups())
        .gather(
            size,
            () -> new double[size],
            (into, from, to, buffer) -> design.fill(from, to, buffer, into),
            VarianceInflation::add);
  }

  /** What is added up of a block. */
  private interface Term {
    void add(double[] into, double[][] block, int rows);
  }

  private static double[] summed(Design design, Term term) {
    int columns = design.columns().size();
    return Blocks.of(design.groups())
        .gather(
            columns + 1,
            () -> new double[columns],
            (into, from, to, buffer) -> {
              design.fill(from, to, buffer);
              term.add(into, buffer, to - from);
            },
            VarianceInflation::add);
  }

  private static void add(double[] a, double[] b) {
    for (int k = 0; k < a.length; k++) {
      a[k] += b[k];
    }
  }
}

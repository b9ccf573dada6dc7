package isowright.regression;

import java.util.Arrays;
import java.util.List;

/**
 * A linear least-squares fit: the coefficients β that make Σ (y − Xβ)² least, and what their
 * uncertainty is made from.
 *
 * <p>Notation: N rows, K columns, of which {@code rank} are estimated. A column that is not
 * estimated (dropped as collinear, or held by the caller) has coefficient 0 and zero rows and
 * columns in every matrix. Arrays are copied in and out.
 *
 * @param columns the names of the K columns
 * @param coefficients β, shape K
 * @param estimated which columns were estimated, shape K
 * @param inverseFactor F = R⁻¹, upper triangular over the estimated columns, K × K: (X′X)⁻¹ = F F′
 *     and the leverage of a row x is ‖F′x‖²
 * @param ssr the sum of squared residuals
 * @param totalSumOfSquares the sum of squares of the response about its mean
 * @param rows N
 * @param absorbed how many parameters were removed beforehand (group effects)
 * @param rank how many columns are estimated
 * @param collinearities the columns dropped, each with those it is a combination of
 * @param rankRule the rule by which they were dropped
 * @param pivots the relative pivot of each column, shape K; see {@link RankRule}
 */
public record LinearFit(
    List<String> columns,
    double[] coefficients,
    boolean[] estimated,
    double[][] inverseFactor,
    double ssr,
    double totalSumOfSquares,
    int rows,
    int absorbed,
    int rank,
    List<Collinearity> collinearities,
    RankRule rankRule,
    double[] pivots) {

  /** Copies the arrays. */
  public LinearFit {
    columns = List.copyOf(columns);
    coefficients = coefficients.clone();
    estimated = estimated.clone();
    inverseFactor = Matrices.copy(inverseFactor);
    collinearities = List.copyOf(collinearities);
    pivots = pivots.clone();
  }

  @Override
  public double[] coefficients() {
    return coefficients.clone();
  }

  @Override
  public boolean[] estimated() {
    return estimated.clone();
  }

  @Override
  public double[][] inverseFactor() {
    return Matrices.copy(inverseFactor);
  }

  @Override
  public double[] pivots() {
    return pivots.clone();
  }

  /** The columns estimated, ascending; shape rank. */
  int[] kept() {
    int[] kept = new int[rank];
    int count = 0;
    for (int k = 0; k < estimated.length; k++) {
      if (estimated[k]) {
        kept[count++] = k;
      }
    }
    return kept;
  }

  /** (X′X)⁻¹, K × K, with zero rows and columns where nothing was estimated. */
  public double[][] inverseCrossProduct() {
    return Matrices.timesTranspose(inverseFactor);
  }

  /**
   * The coefficient of a column.
   *
   * @throws IllegalArgumentException if there is no such column
   */
  public double coefficient(String column) {
    int at = columns.indexOf(column);
    if (at < 0) {
      throw new IllegalArgumentException("no column \"" + column + "\" among " + columns);
    }
    return coefficients[at];
  }

  /** N − rank − absorbed; zero or less where the rows carry no more than the parameters. */
  public int residualDegreesOfFreedom() {
    return rows - rank - absorbed;
  }

  /** SSR / (N − rank − absorbed); NaN where no degrees of freedom are left. */
  public double residualVariance() {
    int left = residualDegreesOfFreedom();
    return left > 0 ? ssr / left : Double.NaN;
  }

  /** True where no column was dropped as collinear. */
  public boolean fullRank() {
    return collinearities.isEmpty();
  }

  /**
   * The same fit over more columns, of which those held were not part of it: coefficient and
   * matrices are zero there.
   *
   * @param held true where a column is added; as many false as this fit has columns
   */
  LinearFit widened(List<String> all, boolean[] held) {
    int count = all.size();
    int[] from = new int[columns.size()];
    int at = 0;
    for (int k = 0; k < count; k++) {
      if (!held[k]) {
        from[at++] = k;
      }
    }
    double[] wideCoefficients = new double[count];
    boolean[] wideEstimated = new boolean[count];
    double[] widePivots = new double[count];
    double[][] wideFactor = new double[count][count];
    for (int i = 0; i < from.length; i++) {
      wideCoefficients[from[i]] = coefficients[i];
      wideEstimated[from[i]] = estimated[i];
      widePivots[from[i]] = pivots[i];
      for (int j = 0; j < from.length; j++) {
        wideFactor[from[i]][from[j]] = inverseFactor[i][j];
      }
    }
    return new LinearFit(
        all,
        wideCoefficients,
        wideEstimated,
        wideFactor,
        ssr,
        totalSumOfSquares,
        rows,
        absorbed,
        rank,
        collinearities,
        rankRule,
        widePivots);
  }

  @Override
  public String toString() {
    return "LinearFit[columns="
        + columns
        + ", coefficients="
        + Arrays.toString(coefficients)
        + ", ssr="
        + ssr
        + ", rows="
        + rows
        + ", absorbed="
        + absorbed
        + ", rank="
        + rank
        + ", collinearities="
        + collinearities
        + "]";
  }
}

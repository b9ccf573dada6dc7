package isowright.regression;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Would further columns help a regression, when rows of the same group may depend on one another?
 * Each group gives one vector v_g = Σ_{i∈g} z̃_i û_i: û the residuals without the further columns,
 * z̃ what is left of these columns after the others are taken out. If the columns are not needed,
 * the v_g are independent with mean zero, whatever goes on inside groups, and Hotelling's
 *
 * <pre>  T² = G v̄′ S⁻¹ v̄,   F = T² (G − q) / (q (G − 1)) </pre>
 *
 * follows F(q, G − q), for G groups and q columns, exactly where the v_g are normal, and in large
 * samples. This is the generalised score test. A test from coefficients and a clustered covariance
 * says the same in large samples, but rejects true nulls far too often where a few groups have much
 * leverage, as they have in powers of a regressor: heavy tails make T² cautious instead.
 *
 * <p>Sources: D. D. Boos 1992, The American Statistician 46, 327–333 (from memory); H. Hotelling
 * 1931, Annals of Mathematical Statistics 2, 360–378. Tested in {@code SpecificationTestsTest}
 * against R and, for size, in {@code SpecificationSizeTest}.
 *
 * @param statistic F; NaN where the groups cannot carry the test
 * @param columns q
 * @param groups G
 */
public record GroupScores(double statistic, int columns, int groups) {

  /** G − q. */
  public int denominator() {
    return groups - columns;
  }

  /**
   * The test that the last columns of a design are not needed; those that were dropped as collinear
   * are left out.
   *
   * @param wide the design with the further columns last
   * @param fit its fit
   * @param first the first of the further columns
   * @param residuals û, of the regression without them; shape N
   */
  public static GroupScores of(Design wide, LinearFit fit, int first, double[] residuals) {
    return of(wide, wide.groups(), fit, first, residuals);
  }

  /** The same with every row a group of its own. */
  public static GroupScores byRows(Design wide, LinearFit fit, int first, double[] residuals) {
    return of(wide, Groups.ofSingleRows(wide.rows()), fit, first, residuals);
  }

  private static GroupScores of(
      Design wide, Groups groups, LinearFit fit, int first, double[] residuals) {
    int[] tested = tested(fit, first);
    int q = tested.length;
    int count = groups.count();
    if (q == 0 || count <= q) {
      return new GroupScores(Double.NaN, q, count);
    }
    double[][] weights = weights(fit, tested);
    Blocks blocks = Blocks.of(wide.groups());
    Sums sums =
        blocks.gather(
            fit.columns().size() + 1,
            () -> new Sums(q, fit.columns().size()),
            (into, from, to, buffer) -> {
              wide.fill(from, to, buffer);
              int g = groups.of(from);
              while (g < count && groups.start(g) < to) {
                into.add(
                    buffer, groups.start(g) - from, groups.end(g) - from, from, residuals, weights);
                g++;
              }
            },
            Sums::add);
    return new GroupScores(sums.statistic(count), q, count);
  }

  private static int[] tested(LinearFit fit, int first) {
    boolean[] estimated = fit.estimated();
    int count = 0;
    int[] tested = new int[estimated.length];
    for (int k = first; k < estimated.length; k++) {
      if (estimated[k]) {
        tested[count++] = k;
      }
    }
    return java.util.Arrays.copyOf(tested, count);
  }

  /**
   * The rows of (W′W)⁻¹ that belong to the tested columns: times Σ w_i û_i they give v_g, up to a
   * linear map that is the same for all groups and leaves T² as it is. Each is scaled to length
   * one.
   */
  private static double[][] weights(LinearFit fit, int[] tested) {
    double[][] inverse = fit.inverseCrossProduct();
    double[][] weights = new double[tested.length][];
    for (int j = 0; j < tested.length; j++) {
      double own = Math.sqrt(inverse[tested[j]][tested[j]]);
      weights[j] = inverse[tested[j]].clone();
      for (int k = 0; k < weights[j].length; k++) {
        weights[j][k] /= own;
      }
    }
    return weights;
  }

  /** Σ v and Σ v v′ over groups. */
  private static final class Sums {
    private final double[] first;
    private final double[][] second;
    private final double[] products;
    private final double[] v;

    Sums(int q, int columns) {
      first = new double[q];
      second = new double[q][q];
      products = new double[columns];
      v = new double[q];
    }

    void add(
        double[][] block, int start, int end, int offset, double[] residuals, double[][] weights) {
      for (int k = 0; k < products.length; k++) {
        double sum = 0;
        for (int i = start; i < end; i++) {
          sum += block[k][i] * residuals[offset + i];
        }
        products[k] = sum;
      }
      for (int j = 0; j < v.length; j++) {
        v[j] = Matrices.dot(weights[j], products);
        first[j] += v[j];
        for (int k = 0; k <= j; k++) {
          second[j][k] += v[j] * v[k];
        }
      }
    }

    void add(Sums other) {
      for (int j = 0; j < first.length; j++) {
        first[j] += other.first[j];
        for (int k = 0; k <= j; k++) {
          second[j][k] += other.second[j][k];
        }
      }
    }

    /** F for G groups. */
    double statistic(int groups) {
      int q = first.length;
      double[][] covariance = new double[q][q];
      for (int j = 0; j < q; j++) {
        for (int k = 0; k <= j; k++) {
          covariance[j][k] = (second[j][k] - first[j] * first[k] / groups) / (groups - 1);
          covariance[k][j] = covariance[j][k];
        }
      }
      SingularValueDecomposition decomposition =
          new SingularValueDecomposition(new Array2DRowRealMatrix(covariance, false));
      if (decomposition.getRank() < q) {
        return Double.NaN;
      }
      double[] solved =
          decomposition.getSolver().solve(new ArrayRealVector(first, false)).toArray();
      double square = Matrices.dot(first, solved) / groups;
      return square * (groups - q) / ((double) q * (groups - 1));
    }
  }
}

package isowright.regression;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Do the rows speak against q linear restrictions R β = r, where groups are few? The wild cluster
 * bootstrap with the null imposed.
 *
 * <p>The statistic is that of Wald in its F form, W = (Rb − r)′ (R V R′)⁻¹ (Rb − r)/q, with V the
 * covariance clustered by group (CR1). Its law with few groups is not known, so it is simulated:
 * the restricted fit b̃ with residuals ũ is taken for the truth, the residuals of each group are
 * multiplied by one random weight v_g, and W is computed for y* = X b̃ + v_g ũ. Then p = (1 +
 * number of W* ≥ W)/(1 + draws), which has the right size even for few draws (A. C. Davison and D.
 * V. Hinkley, <i>Bootstrap Methods and their Application</i>, 1997, section 4.2). Weights are −1 or
 * 1 with equal chances (Rademacher); with fewer than twelve groups, where these give fewer than
 * 2,048 different samples, they are ±√½, ±1, ±√(3/2) (Webb).
 *
 * <p>All of it comes from the contributions of groups (see {@link GroupProducts}) in a basis where
 * X′X is the identity: with s_g = Σ q r over the rows of g and A_g = Σ q q′, the restricted scores
 * are s̃_g = s_g − A_g d̃, a draw moves the coefficients by δ = Σ v_g s̃_g, and its scores are v_g
 * s̃_g − A_g δ.
 *
 * <p>Sources: A. C. Cameron, J. B. Gelbach and D. L. Miller 2008, Review of Economics and
 * Statistics 90, 414–427, section III and appendix B; M. D. Webb 2023, Canadian Journal of
 * Economics 56, 839–858. Tested in {@code WildBootstrapTest}, its size by simulation.
 *
 * @param statistic W; NaN where R V R′ is singular
 * @param p the share of draws at least as extreme; NaN where W is
 * @param draws how many draws had a statistic
 * @param sixPoint whether Webb's six weights were used
 */
public record WildBootstrap(double statistic, double p, int draws, boolean sixPoint) {

  /** What the random numbers of a draw are for. */
  private static final long PURPOSE = 2;

  /** From so many groups on, two weights make samples enough. */
  private static final int TWO_POINTS_FROM = 12;

  /** Statistics this near to one another are the same up to rounding, and count as at least. */
  private static final double SAME = 1e-9;

  private static final double[] SIX = {
    -Math.sqrt(1.5), -1, -Math.sqrt(0.5), Math.sqrt(0.5), 1, Math.sqrt(1.5)
  };

  /**
   * Tests restrictions, in parallel over the draws.
   *
   * @param restrictions R, q × K over all columns of the fit; its rows independent
   * @param values r, shape q
   * @param draws how many, at least 1
   */
  public static WildBootstrap test(
      GroupProducts products, double[][] restrictions, double[] values, int draws, long seed) {
    boolean six = products.groups() < TWO_POINTS_FROM;
    Restricted restricted = Restricted.of(products, restrictions, values);
    double[] statistics =
        IntStream.range(0, draws)
            .parallel()
            .mapToDouble(d -> restricted.drawn(new DrawStream(seed, d, PURPOSE), six))
            .toArray();
    double statistic = restricted.observed();
    double[] had = Arrays.stream(statistics).filter(w -> !Double.isNaN(w)).toArray();
    long extreme = Arrays.stream(had).filter(w -> w >= statistic * (1 - SAME)).count();
    double p =
        Double.isNaN(statistic) || had.length == 0
            ? Double.NaN
            : (1.0 + extreme) / (1.0 + had.length);
    return new WildBootstrap(statistic, p, had.length, six);
  }

  /** The problem in the basis, with the restrictions as rows P of unit length at right angles. */
  private static final class Restricted {

    /** P of shape q × k. */
    private final double[][] rows;

    /** z = P d̃, shape q: how far the restricted fit is from the free one. */
    private final double[] distance;

    /** s̃_g, shape G × k. */
    private final double[][] scores;

    /** P A_g, shape G × (q k). */
    private final double[][] projected;

    private final double factor;
    private final boolean sound;

    private Restricted(
        double[][] rows,
        double[] distance,
        double[][] scores,
        double[][] projected,
        double factor,
        boolean sound) {
      this.rows = rows;
      this.distance = distance;
      this.scores = scores;
      this.projected = projected;
      this.factor = factor;
      this.sound = sound;
    }

    static Restricted of(GroupProducts products, double[][] restrictions, double[] values) {
      LinearFit fit = products.fit();
      int[] kept = fit.kept();
      double[][] inverseFactor = fit.inverseFactor();
      double[] b = fit.coefficients();
      int q = restrictions.length;
      double[][] inBasis = new double[q][kept.length];
      double[] gap = new double[q];
      for (int i = 0; i < q; i++) {
        gap[i] = values[i];
        for (int k = 0; k < b.length; k++) {
          gap[i] -= restrictions[i][k] * b[k];
        }
        for (int p = 0; p < kept.length; p++) {
          for (int k = 0; k <= kept[p]; k++) {
            inBasis[i][p] += restrictions[i][k] * inverseFactor[k][kept[p]];
          }
        }
        gap[i] /= products.scale();
      }
      boolean sound = orthonormal(inBasis, gap);
      int groups = products.groups();
      double[][] scores = new double[groups][];
      double[][] projected = new double[groups][];
      for (int g = 0; g < groups; g++) {
        double[][] own = square(products, g);
        projected[g] = new double[q * kept.length];
        scores[g] = own[kept.length].clone();
        for (int i = 0; i < q; i++) {
          for (int p = 0; p < kept.length; p++) {
            double sum = Matrices.dot(inBasis[i], own[p]);
            projected[g][i * kept.length + p] = sum;
            scores[g][p] -= gap[i] * sum;
          }
        }
      }
      double rowsInAll = fit.rows();
      double factor =
          Covariance.ratio(groups, groups - 1.0)
              * Covariance.ratio(rowsInAll - 1, rowsInAll - fit.rank());
      return new Restricted(inBasis, gap, scores, projected, factor, sound);
    }

    /** A_g in its first k rows, s_g in the last; k columns. */
    private static double[][] square(GroupProducts products, int group) {
      int columns = products.size() - 1;
      int at = group * products.packed();
      double[][] own = new double[columns + 1][columns];
      for (int i = 0; i <= columns; i++) {
        for (int j = 0; j <= Math.min(i, columns - 1); j++) {
          double entry = products.packedProducts()[GroupProducts.place(at, i, j)];
          own[i][j] = entry;
          if (i < columns) {
            own[j][i] = entry;
          }
        }
      }
      return own;
    }

    /**
     * Gram and Schmidt, twice for good measure; the values follow. False where rows depend on one
     * another.
     */
    private static boolean orthonormal(double[][] rows, double[] values) {
      boolean sound = true;
      for (int i = 0; i < rows.length; i++) {
        double before = Math.sqrt(Matrices.dot(rows[i], rows[i]));
        for (int pass = 0; pass < 2; pass++) {
          for (int j = 0; j < i; j++) {
            double part = Matrices.dot(rows[i], rows[j]);
            values[i] -= part * values[j];
            for (int p = 0; p < rows[i].length; p++) {
              rows[i][p] -= part * rows[j][p];
            }
          }
        }
        double length = Math.sqrt(Matrices.dot(rows[i], rows[i]));
        sound &= length > 1e-10 * before;
        values[i] /= length;
        for (int p = 0; p < rows[i].length; p++) {
          rows[i][p] /= length;
        }
      }
      return sound;
    }

    /** W of the rows themselves: its scores are those of the free fit. */
    double observed() {
      int q = rows.length;
      int k = rows[0].length;
      double[][] middle = new double[q][q];
      double[] own = new double[q];
      for (int g = 0; g < scores.length; g++) {
        for (int i = 0; i < q; i++) {
          own[i] = Matrices.dot(rows[i], scores[g]);
          for (int j = 0; j < q; j++) {
            // s_g = s̃_g + A_g d̃ with d̃ = P′ z
            double product = 0;
            for (int p = 0; p < k; p++) {
              product += projected[g][i * k + p] * rows[j][p];
            }
            own[i] += product * distance[j];
          }
        }
        addSquare(middle, own);
      }
      return wald(distance, middle);
    }

    /** W of one draw. */
    double drawn(DrawStream stream, boolean six) {
      int q = rows.length;
      int k = rows[0].length;
      double[] weights = new double[scores.length];
      double[] move = new double[k];
      for (int g = 0; g < weights.length; g++) {
        weights[g] = six ? SIX[stream.below(6)] : 2 * stream.below(2) - 1;
        for (int p = 0; p < k; p++) {
          move[p] += weights[g] * scores[g][p];
        }
      }
      double[][] middle = new double[q][q];
      double[] own = new double[q];
      for (int g = 0; g < weights.length; g++) {
        for (int i = 0; i < q; i++) {
          double sum = weights[g] * Matrices.dot(rows[i], scores[g]);
          for (int p = 0; p < k; p++) {
            sum -= projected[g][i * k + p] * move[p];
          }
          own[i] = sum;
        }
        addSquare(middle, own);
      }
      double[] departure = new double[q];
      for (int i = 0; i < q; i++) {
        departure[i] = Matrices.dot(rows[i], move);
      }
      return wald(departure, middle);
    }

    private static void addSquare(double[][] into, double[] u) {
      for (int i = 0; i < u.length; i++) {
        for (int j = 0; j < u.length; j++) {
          into[i][j] += u[i] * u[j];
        }
      }
    }

    private double wald(double[] departure, double[][] middle) {
      int q = departure.length;
      if (!sound || Double.isNaN(factor)) {
        return Double.NaN;
      }
      if (q == 1) {
        return middle[0][0] > 0
            ? departure[0] * departure[0] / (factor * middle[0][0])
            : Double.NaN;
      }
      RealMatrix matrix = new Array2DRowRealMatrix(middle, false);
      SingularValueDecomposition decomposition = new SingularValueDecomposition(matrix);
      if (decomposition.getRank() < q) {
        return Double.NaN;
      }
      double[] solved =
          decomposition
              .getSolver()
              .solve(new org.apache.commons.math3.linear.ArrayRealVector(departure, false))
              .toArray();
      return Matrices.dot(departure, solved) / (factor * q);
    }
  }
}

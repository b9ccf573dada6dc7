package isowright.estimation;

import isowright.regression.ParameterMap;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * A cost function made concave by writing a matrix as the negative of a square, −L L′ with L lower
 * triangular, so that no restriction has to be watched.
 *
 * <p>Of the coefficients θ those of products of prices, r (r + 1)/2 of them for n = r + 1 inputs,
 * give way to the entries of L; the others stay:
 *
 * <pre>
 *   McFadden   S = −L L′ over all prices but the last; rows of S sum to zero, so a_in = Σ_j (L L′)_ij:
 *             concave at all prices
 *  translog   b_ij = −(L L′)_ij + [i = j] s_i − s_i s_j  with s the shares at the point meant,
 *             linear in the other coefficients: concave at that point </pre>
 *
 * By homogeneity the last input follows, so that the whole matrix is negative semidefinite where
 * this part is. Where the records would have it indefinite, L loses columns: the fit is then at the
 * edge, and standard errors are those given the edge.
 *
 * <p>Sources: Diewert, W. E. and Wales, T. J. (1987), Flexible functional forms and global
 * curvature conditions, <i>Econometrica</i> 55, 43–68; Ryan, D. L. and Wales, T. J. (2000),
 * Imposing local concavity in the translog and generalized Leontief cost functions, <i>Economics
 * Letters</i> 67, 253–260. Tested in {@code CurvatureTest}.
 */
final class Curvature implements ParameterMap {

  /** Eigenvalues below this share of the largest start from here: L must not begin at zero. */
  private static final double FLOOR = 1e-3;

  private final List<String> names;
  private final int order;
  private final int[][] places;
  private final int[] last;
  private final double[][] shares;

  private Curvature(List<String> names, int order, int[][] places, int[] last, double[][] shares) {
    this.names = names;
    this.order = order;
    this.places = places;
    this.last = last;
    this.shares = shares;
  }

  /** Of McFadden cost, the pairs a_ij being the first of the coefficients. */
  static Curvature ofPairs(List<String> coefficients, int inputs) {
    int r = inputs - 1;
    int[][] places = new int[r][r];
    int[] last = new int[r];
    int next = 0;
    for (int i = 0; i < r; i++) {
      places[i][i] = -1;
      for (int j = i + 1; j < inputs; j++, next++) {
        if (j < r) {
          places[i][j] = next;
          places[j][i] = next;
        } else {
          last[i] = next;
        }
      }
    }
    return new Curvature(coefficients, r, places, last, new double[0][]);
  }

  /**
   * Of translog cost.
   *
   * @param places where b_ij stands among the coefficients, r × r, symmetric
   * @param shares the shares at the point, r × K: s_i = Σ_k shares[i][k] θ_k
   */
  static Curvature atPoint(List<String> coefficients, int[][] places, double[][] shares) {
    return new Curvature(coefficients, places.length, places, new int[0], shares);
  }

  private boolean pairs() {
    return last.length > 0;
  }

  /**
   * Where entry (i, j) of L, j ≤ i, stands among φ: in the places that products of prices leave.
   */
  private int entry(int i, int j) {
    if (pairs()) {
      return i * (i + 1) / 2 + j;
    }
    return places[i][j];
  }

  @Override
  public List<String> names() {
    List<String> all = new ArrayList<>(names);
    for (int i = 0; i < order; i++) {
      for (int j = 0; j <= i; j++) {
        all.set(entry(i, j), "factor " + (i + 1) + "," + (j + 1));
      }
    }
    return all;
  }

  private double[] sharesAt(double[] theta) {
    double[] s = new double[order];
    for (int i = 0; i < shares.length; i++) {
      for (int k = 0; k < theta.length; k++) {
        s[i] += shares[i][k] * theta[k];
      }
    }
    return s;
  }

  /** L L′ as θ has it. */
  private double[][] square(double[] theta) {
    double[][] square = new double[order][order];
    double[] s = sharesAt(theta);
    for (int i = 0; i < order; i++) {
      for (int j = 0; j < order; j++) {
        if (!pairs()) {
          square[i][j] = -theta[places[i][j]] + (i == j ? s[i] : 0) - s[i] * s[j];
        } else if (i != j) {
          square[i][j] = -theta[places[i][j]];
          square[i][i] += theta[places[i][j]];
        }
      }
      if (pairs()) {
        square[i][i] += theta[last[i]];
      }
    }
    return square;
  }

  @Override
  public double[] start(double[] theta) {
    double[][] l = factor(square(theta));
    double[] phi = theta.clone();
    for (int i = 0; i < order; i++) {
      for (int j = 0; j <= i; j++) {
        phi[entry(i, j)] = l[i][j];
      }
    }
    return phi;
  }

  /** The factor of the nearest matrix that is safely positive definite. */
  private static double[][] factor(double[][] square) {
    EigenDecomposition eigen = new EigenDecomposition(new Array2DRowRealMatrix(square));
    double[] values = eigen.getRealEigenvalues();
    double most = Arrays.stream(values).map(Math::abs).max().orElse(1);
    int r = square.length;
    double[][] raised = new double[r][r];
    for (int e = 0; e < r; e++) {
      double value = Math.max(values[e], FLOOR * most + Double.MIN_NORMAL);
      double[] u = eigen.getEigenvector(e).toArray();
      for (int i = 0; i < r; i++) {
        for (int j = 0; j <= i; j++) {
          raised[i][j] += value * u[i] * u[j];
          raised[j][i] = raised[i][j];
        }
      }
    }
    return new CholeskyDecomposition(new Array2DRowRealMatrix(raised, false), 1e-8, 0)
        .getL()
        .getData();
  }

  private double[][] l(double[] phi) {
    double[][] l = new double[order][order];
    for (int i = 0; i < order; i++) {
      for (int j = 0; j <= i; j++) {
        l[i][j] = phi[entry(i, j)];
      }
    }
    return l;
  }

  @Override
  public double[] parameters(double[] phi) {
    double[][] l = l(phi);
    double[] theta = phi.clone();
    double[] s = sharesAt(phi);
    double[] sums = new double[order];
    for (int i = 0; i < order; i++) {
      for (int j = 0; j <= i; j++) {
        double square = 0;
        for (int c = 0; c <= j; c++) {
          square += l[i][c] * l[j][c];
        }
        sums[i] += square;
        sums[j] += i == j ? 0 : square;
        if (!pairs()) {
          theta[places[i][j]] = -square + (i == j ? s[i] : 0) - s[i] * s[j];
        } else if (i != j) {
          theta[places[i][j]] = -square;
        }
      }
    }
    for (int i = 0; i < last.length; i++) {
      theta[last[i]] = sums[i];
    }
    return theta;
  }

  @Override
  public double[][] jacobian(double[] phi) {
    int k = phi.length;
    double[][] l = l(phi);
    double[] s = sharesAt(phi);
    boolean[] own = new boolean[k];
    double[][] jacobian = new double[k][k];
    for (int a = 0; a < order; a++) {
      for (int b = 0; b <= a; b++) {
        int column = entry(a, b);
        own[column] = true;
        // ∂(L L′)_aj/∂L_ab = L_jb, twice that on the diagonal
        for (int j = b; j < order; j++) {
          double slope = (j == a ? 2 : 1) * l[j][b];
          if (!pairs() || j != a) {
            jacobian[places[a][j]][column] -= slope;
          }
          if (pairs()) {
            jacobian[last[a]][column] += slope;
            jacobian[last[j]][column] += j == a ? 0 : slope;
          }
        }
      }
    }
    for (int q = 0; q < k; q++) {
      if (!own[q]) {
        jacobian[q][q] = 1;
        for (int i = 0; i < shares.length; i++) {
          for (int j = 0; j <= i; j++) {
            jacobian[places[i][j]][q] +=
                (i == j ? shares[i][q] : 0) - shares[i][q] * s[j] - s[i] * shares[j][q];
          }
        }
      }
    }
    return jacobian;
  }

  @Override
  public double[][] curvature(double[] phi, double[] g) {
    int k = phi.length;
    // Σ_k g_k θ_k = −Σ_ij Γ_ij (L L′)_ij + …, Γ symmetric
    double[][] gamma = new double[order][order];
    for (int i = 0; i < order; i++) {
      for (int j = 0; j < order; j++) {
        if (!pairs()) {
          gamma[i][j] = g[places[i][j]] * (i == j ? 1 : 0.5);
        } else {
          gamma[i][j] = (i == j ? 0 : 0.5 * g[places[i][j]]) - 0.5 * (g[last[i]] + g[last[j]]);
        }
      }
    }
    double[][] curvature = new double[k][k];
    for (int c = 0; c < order; c++) {
      for (int a = c; a < order; a++) {
        for (int b = c; b < order; b++) {
          curvature[entry(a, c)][entry(b, c)] -= 2 * gamma[a][b];
        }
      }
    }
    for (int i = 0; i < shares.length; i++) {
      for (int j = 0; j < shares.length; j++) {
        for (int p = 0; p < k; p++) {
          for (int q = 0; q < k && shares[i][p] != 0; q++) {
            curvature[p][q] -= 2 * gamma[i][j] * shares[i][p] * shares[j][q];
          }
        }
      }
    }
    return curvature;
  }
}

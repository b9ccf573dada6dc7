package isowright.technology;

/**
 * By how much a technology is regular at a mix, and how that changes when the technology does: what
 * a fit that is held to regularity needs.
 *
 * <p>The margins are the output elasticities e_i, which have to be positive, and the n − 1
 * curvatures of the isoquant: the eigenvalues λ_j of C = H − diag(e) on the plane Σ e_i v_i = 0 (v
 * in logs, of length one), which must not be positive (see {@link Regularity}).
 *
 * <p>With v the direction that belongs to λ and κ = 2 e′Cv/e′e the multiplier of the plane, a
 * change of the technology that changes gradient and Hessian of ln f in logs by ė and Ḣ changes a
 * curvature that is no double one by
 *
 * <pre>  λ̇ = v′Ḣ v − Σ_i ė_i v_i² − κ ė′v. </pre>
 *
 * (Lagrange's conditions of max v′Cv on v′v = 1, e′v = 0, and the envelope theorem.) Where two
 * curvatures are equal they have no slope of their own; the one given then is that of the direction
 * found.
 *
 * <p>An object belongs to one thread and is asked about the mix of the last {@link #at}. Tested in
 * {@code RegularityMarginsTest}.
 */
public final class RegularityMargins {

  private static final int SWEEPS = 60;

  private final int n;
  private final double[] gradient;
  private final double[][] form;
  private final double[][] axes;
  private final double[][] plane;
  private final double[][] turns;
  private final double[] mirror;
  private double mirrored;
  private double squaredLength;

  /** Room for n inputs. */
  public RegularityMargins(int inputs) {
    this.n = inputs;
    this.gradient = new double[n];
    this.form = new double[n][n];
    this.axes = new double[n - 1][n];
    this.plane = new double[n - 1][n - 1];
    this.turns = new double[n - 1][n - 1];
    this.mirror = new double[n];
  }

  /** Looks at ln x (shape n, not modified). */
  public void at(Technology technology, double[] logInputs) {
    technology.logGradient(logInputs, gradient);
    technology.logHessian(logInputs, form);
    look();
  }

  /** Looks at a gradient e and a Hessian H of ln f in logs; neither is modified. */
  public void at(double[] elasticities, double[][] hessian) {
    System.arraycopy(elasticities, 0, gradient, 0, n);
    for (int i = 0; i < n; i++) {
      System.arraycopy(hessian[i], 0, form[i], 0, n);
    }
    look();
  }

  private void look() {
    squaredLength = 0;
    for (int i = 0; i < n; i++) {
      form[i][i] -= gradient[i];
      squaredLength += gradient[i] * gradient[i];
    }
    basis();
    reduce();
    rotate();
  }

  /** e_i. */
  public double elasticity(int i) {
    return gradient[i];
  }

  /** How many curvatures there are, n − 1. */
  public int curvatures() {
    return n - 1;
  }

  /** λ_j, in no particular order. */
  public double curvature(int j) {
    return plane[j][j];
  }

  /** The largest λ; not positive where the isoquant is convex to the origin. */
  public double largestCurvature() {
    double largest = plane[0][0];
    for (int j = 1; j < n - 1; j++) {
      largest = Math.max(largest, plane[j][j]);
    }
    return largest;
  }

  /** The direction v of λ_j in logs, of length one. */
  public double[] direction(int j) {
    double[] v = new double[n];
    for (int a = 0; a < n - 1; a++) {
      for (int i = 0; i < n; i++) {
        v[i] += turns[a][j] * axes[a][i];
      }
    }
    return v;
  }

  /** κ of a direction. */
  public double multiplier(double[] v) {
    double sum = 0;
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        sum += gradient[i] * form[i][k] * v[k];
      }
    }
    return squaredLength > 0 ? 2 * sum / squaredLength : 0;
  }

  /** λ̇ for changes of gradient and Hessian, with v and κ of a curvature. */
  public static double slope(
      double[] v, double kappa, double[] gradientChange, double[][] hessianChange) {
    double sum = 0;
    for (int i = 0; i < v.length; i++) {
      sum -= gradientChange[i] * v[i] * (v[i] + kappa);
      for (int k = 0; k < v.length; k++) {
        sum += v[i] * hessianChange[i][k] * v[k];
      }
    }
    return sum;
  }

  /**
   * An orthonormal basis of the plane: all axes but the first, reflected as the gradient is onto
   * the first.
   */
  private void basis() {
    double length = Math.sqrt(squaredLength);
    System.arraycopy(gradient, 0, mirror, 0, n);
    mirror[0] += gradient[0] >= 0 ? length : -length;
    mirrored = 0;
    for (double each : mirror) {
      mirrored += each * each;
    }
    for (int a = 0; a < n - 1; a++) {
      for (int i = 0; i < n; i++) {
        double unit = i == a + 1 ? 1 : 0;
        axes[a][i] = mirrored > 0 ? unit - 2 * mirror[a + 1] * mirror[i] / mirrored : unit;
      }
    }
  }

  private void reduce() {
    for (int a = 0; a < n - 1; a++) {
      for (int b = 0; b <= a; b++) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
          for (int k = 0; k < n; k++) {
            sum += axes[a][i] * form[i][k] * axes[b][k];
          }
        }
        plane[a][b] = sum;
        plane[b][a] = sum;
      }
    }
  }

  /** Jacobi's rotations. */
  private void rotate() {
    for (int a = 0; a < n - 1; a++) {
      for (int b = 0; b < n - 1; b++) {
        turns[a][b] = a == b ? 1 : 0;
      }
    }
    for (int sweep = 0; sweep < SWEEPS && apart(); sweep++) {
      for (int p = 0; p < n - 1; p++) {
        for (int q = p + 1; q < n - 1; q++) {
          rotate(p, q);
        }
      }
    }
  }

  private boolean apart() {
    double off = 0;
    double size = 0;
    for (int i = 0; i < n - 1; i++) {
      for (int j = 0; j < n - 1; j++) {
        double square = plane[i][j] * plane[i][j];
        size += square;
        off += i == j ? 0 : square;
      }
    }
    return off > 1e-30 * size;
  }

  private void rotate(int p, int q) {
    if (plane[p][q] == 0) {
      return;
    }
    double theta = (plane[q][q] - plane[p][p]) / (2 * plane[p][q]);
    double t = theta == 0 ? 1 : Math.signum(theta) / (Math.abs(theta) + Math.hypot(theta, 1));
    double c = 1 / Math.hypot(t, 1);
    double s = t * c;
    for (int k = 0; k < n - 1; k++) {
      double first = plane[k][p];
      double second = plane[k][q];
      plane[k][p] = c * first - s * second;
      plane[k][q] = s * first + c * second;
      first = turns[k][p];
      second = turns[k][q];
      turns[k][p] = c * first - s * second;
      turns[k][q] = s * first + c * second;
    }
    for (int k = 0; k < n - 1; k++) {
      double first = plane[p][k];
      double second = plane[q][k];
      plane[p][k] = c * first - s * second;
      plane[q][k] = s * first + c * second;
    }
  }
}

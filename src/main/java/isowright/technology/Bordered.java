package isowright.technology;

/**
 * The bordered Hessian of a technology at a mix, restated in logs and scaled so that inputs of any
 * size, from 1e−6 to 1e9 and beyond, give entries of order one.
 *
 * <p>With f_i = f e_i/x_i and f_ij = f/(x_i x_j) (H_ij + e_i e_j − [i = j] e_i), H the Hessian of
 * ln f in ln x, the textbook matrix is
 *
 * <pre>  F = [0 f_iᵀ; f_i f_ij] = f D B D,   D = diag(1, 1/x_1, …, 1/x_n),
 *  B = [0 eᵀ; e H + e eᵀ − diag(e)] </pre>
 *
 * so that all units and the level of output leave through D and f. Adding a multiple of e eᵀ to the
 * lower block changes neither the inverse's lower block nor the quadratic form on the plane e·v =
 * 0, because the first row forces e·v = 0; hence
 *
 * <pre>  B̃ = [0 eᵀ; e C],   C = H − diag(e) </pre>
 *
 * serves as well and cancels less. Finally input i is scaled by d_i = (|e_i| + |H_ii|)^{−½}, and
 * the border to a largest entry of one, which keeps digits where one output elasticity is far
 * smaller than another. An object belongs to one thread; {@link #load} overwrites it and allocates
 * nothing.
 */
final class Bordered {

  private final int n;
  private final double[] gradient;
  private final double[][] hessian;
  private final double[] factor;
  private final double[] border;
  private final double[][] block;

  /** Room for n inputs. */
  Bordered(int n) {
    this.n = n;
    this.gradient = new double[n];
    this.hessian = new double[n][n];
    this.factor = new double[n];
    this.border = new double[n];
    this.block = new double[n][n];
  }

  /** Takes gradient and Hessian of ln f at ln x and scales them. */
  void load(Technology technology, double[] logInputs) {
    technology.logGradient(logInputs, gradient);
    technology.logHessian(logInputs, hessian);
    double longest = 0;
    for (int i = 0; i < n; i++) {
      double size = Math.abs(gradient[i]) + Math.abs(hessian[i][i]);
      factor[i] = size > 0 ? 1 / Math.sqrt(size) : 1;
      border[i] = gradient[i] * factor[i];
      longest = Math.max(longest, Math.abs(border[i]));
    }
    for (int i = 0; i < n; i++) {
      border[i] /= longest;
      for (int j = 0; j < n; j++) {
        double entry = hessian[i][j] - (i == j ? gradient[i] : 0);
        block[i][j] = entry * factor[i] * factor[j];
      }
    }
  }

  /** The number of inputs. */
  int size() {
    return n;
  }

  /** e, shape n; the array itself. */
  double[] gradient() {
    return gradient;
  }

  /** H, n × n; the array itself. */
  double[][] hessian() {
    return hessian;
  }

  /** d, shape n; the array itself. */
  double[] factor() {
    return factor;
  }

  /** d_i e_i divided by the largest of them in size; NaN where every e_i is zero. */
  double[] border() {
    return border;
  }

  /** d_i d_j C_ij, n × n; the array itself. */
  double[][] block() {
    return block;
  }
}

package isowright.cost;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * What a cost function says at a point: shares and demands, elasticities of substitution and of
 * demand, scale economies, technical change, and whether it is a cost function there.
 *
 * <p>Notation: n inputs with prices w; s_i = ∂ln C/∂ln w_i, H the Hessian of ln C in ln w.
 *
 * <pre>  Shephard       x_i = s_i C/w_i
 *  Allen-Uzawa    A_ij = (H_ij + s_i s_j − [i = j] s_i)/(s_i s_j)
 *  demand         ε_ij = ∂ln x_i/∂ln w_j = s_j A_ij
 *  Morishima      M_ij = ε_ij − ε_jj   (the price of j moves, the ratio x_i/x_j answers)
 *  scale          1 / Σ_k ∂ln C/∂ln y_k, and (1 − Σ_f ∂ln C/∂ln fixed_f) times that where inputs
 *                 are fixed </pre>
 *
 * It is regular where all shares are positive, marginal costs are positive and C is concave in
 * prices: the matrix H + s s′ − diag(s), which is C_ij w_i w_j/C, has no positive eigenvalue. A
 * fixed input may not raise variable cost where it is free to be left idle; that is reported apart.
 *
 * <p>Sources: Uzawa, H. (1962), <i>Review of Economic Studies</i> 29, 291–299; Blackorby, C. and
 * Russell, R. R. (1989), <i>American Economic Review</i> 79, 882–888; Caves, D. W., Christensen, L.
 * R. and Swanson, J. A. (1981), <i>American Economic Review</i> 71, 994–1002 (scale with fixed
 * inputs). Tested in {@code CostFunctionTest} and, on published estimates, in {@code
 * PublishedCostsTest}.
 */
public final class CostElasticities {

  /**
   * Eigenvalues of order one carry rounding errors of some 1e-16 each; homogeneity gives a zero.
   */
  private static final double ROUNDING = 1e-10;

  private final CostArguments arguments;
  private final double cost;
  private final double[] prices;
  private final double[] gradient;
  private final double[][] hessian;
  private final double[] rises;

  private CostElasticities(CostFunction function, double[] v) {
    this.arguments = function.arguments();
    this.cost = Math.exp(function.logCost(v));
    int n = arguments.inputs().size();
    this.prices = new double[n];
    for (int i = 0; i < n; i++) {
      prices[i] = Math.exp(v[i]);
    }
    this.gradient = new double[arguments.size()];
    this.hessian = new double[arguments.size()][arguments.size()];
    function.gradient(v, gradient);
    function.hessian(v, hessian);
    this.rises = gradient.clone();
    for (int k = n; k < v.length && function instanceof GeneralisedCost; k++) {
      // an output of zero has no part in cost, but a marginal cost it has
      boolean zero = v[k] == Double.NEGATIVE_INFINITY && arguments.output(k);
      rises[k] = zero ? ((GeneralisedCost) function).marginalCost(v, k - n) : gradient[k];
    }
  }

  /** The elasticities at a point. */
  public static CostElasticities at(CostFunction function, double[] v) {
    return new CostElasticities(function, v);
  }

  /** C. */
  public double cost() {
    return cost;
  }

  /** s_i, shape n. */
  public double[] shares() {
    return Arrays.copyOf(gradient, prices.length);
  }

  /** x_i = s_i C/w_i, shape n. */
  public double[] demands() {
    double[] x = shares();
    for (int i = 0; i < x.length; i++) {
      x[i] *= cost / prices[i];
    }
    return x;
  }

  /** A_ij. */
  public double allen(int i, int j) {
    double si = gradient[i];
    double sj = gradient[j];
    return (hessian[i][j] + si * sj - (i == j ? si : 0)) / (si * sj);
  }

  /** ε_ij = s_j A_ij. */
  public double demand(int i, int j) {
    return hessian[i][j] / gradient[i] + gradient[j] - (i == j ? 1 : 0);
  }

  /** M_ij = ε_ij − ε_jj. */
  public double morishima(int i, int j) {
    return demand(i, j) - demand(j, j);
  }

  /** ∂ln C/∂ln y_k: the elasticity of cost in output k. */
  public double costElasticity(int k) {
    return gradient[arguments.inputs().size() + k];
  }

  /** Marginal cost of output k at quantity y. */
  public double marginalCost(int k, double quantity) {
    return costElasticity(k) * cost / quantity;
  }

  /** Scale economies: above one, a per cent more of all outputs costs less than a per cent more. */
  public double scaleEconomies() {
    double outputs = 0;
    double held = 0;
    for (int k = 0; k < arguments.size(); k++) {
      outputs += arguments.output(k) ? gradient[k] : 0;
      held += arguments.fixedInput(k) ? gradient[k] : 0;
    }
    return (1 - held) / outputs;
  }

  /** −∂ln C/∂t: by how much cost falls a period; NaN where time is no argument. */
  public double technicalChange() {
    return arguments.time() ? -gradient[gradient.length - 1] : Double.NaN;
  }

  /** ∂s_i/∂t: above zero, technical change uses input i; NaN where time is no argument. */
  public double bias(int i) {
    return arguments.time() ? hessian[i][hessian.length - 1] : Double.NaN;
  }

  /** Whether all shares and all marginal costs are positive. */
  public boolean monotone() {
    for (int k = 0; k < arguments.size(); k++) {
      if ((arguments.price(k) || arguments.output(k)) && !(rises[k] > 0)) {
        return false;
      }
    }
    return true;
  }

  /** Whether cost is concave in prices. */
  public boolean concave() {
    if (!(cost > 0)) {
      return false;
    }
    double[] eigenvalues = eigenvalues();
    double largest = Arrays.stream(eigenvalues).map(Math::abs).max().orElse(0);
    return Arrays.stream(eigenvalues).allMatch(e -> e <= ROUNDING * Math.max(1, largest));
  }

  /** The eigenvalues of C_ij w_i w_j/C, shape n; one is zero by homogeneity. */
  public double[] eigenvalues() {
    int n = prices.length;
    double[][] matrix = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        matrix[i][j] = hessian[i][j] + gradient[i] * gradient[j] - (i == j ? gradient[i] : 0);
      }
    }
    return new EigenDecomposition(new Array2DRowRealMatrix(matrix)).getRealEigenvalues();
  }
}

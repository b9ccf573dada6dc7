package isowright.cost;

import java.util.ArrayList;
import java.util.List;

/**
 * Cost as a sum in levels, so that outputs may be zero: generalised Leontief and symmetric
 * generalised McFadden cost.
 *
 * <p>With prices w, outputs y and fixed weights θ of the inputs (w and y divided by their base), h
 * = Σ_k y_k, and t time where it is an argument,
 *
 * <pre>  C = h q(w) + Σ_i Σ_k c_ik w_i y_k + Σ_i b_i w_i + h t Σ_i τ_i w_i
 *      + θ′w (β t + β₂ t² h + Σ_{k≤l} d_kl y_k y_l)
 *
 *  Leontief   q = 2 Σ_{i&lt;j} a_ij √(w_i w_j)
 *  McFadden   q = w′Sw / (2 θ′w),  S symmetric with off-diagonal a_ij and rows that sum to zero
 * </pre>
 *
 * For one output this is equation by equation the generalised Leontief and the symmetric
 * generalised McFadden cost of Diewert and Wales, with their weights α = β = γ = θ; b_i lets
 * returns to scale vary, so that b = 0, β = 0, d = 0 is constant returns. For several outputs it is
 * quadratic in outputs with costs that are fixed, b, as in Baumol, Panzar and Willig; of the
 * several-output McFadden cost of Kumbhakar it is the case in which all outputs (over their base)
 * weigh alike in h. It is homogeneous of degree one in prices whatever the parameters; McFadden
 * cost is concave at all prices where S is negative semidefinite, Leontief cost where no a_ij is
 * negative.
 *
 * <p>Parameters: {@code i*j} for a_ij, {@code i*k} for c_ik, {@code i} for b_i, {@code i*trend} for
 * τ_i, {@code trend} and {@code trend*trend} for β and β₂, {@code k*l} for d_kl (no ½).
 *
 * <p>Sources: Diewert, W. E. (1971), An application of the Shephard duality theorem: a generalized
 * Leontief production function, <i>Journal of Political Economy</i> 79, 481–507; Diewert, W. E. and
 * Wales, T. J. (1987), Flexible functional forms and global curvature conditions,
 * <i>Econometrica</i> 55, 43–68; Kumbhakar, S. C. (1994), A multiproduct symmetric generalized
 * McFadden cost function, <i>Journal of Productivity Analysis</i> 5, 349–357; Baumol, W. J.,
 * Panzar, J. C. and Willig, R. D. (1982), <i>Contestable Markets and the Theory of Industry
 * Structure</i>. Tested in {@code GeneralisedCostTest}.
 *
 * @param prices which price function q
 * @param arguments prices, outputs and, maybe, time; no fixed inputs
 * @param weights θ, shape n, not negative; copied
 * @param coefficients the parameters in the order above; copied
 */
public record GeneralisedCost(
    PriceTerms prices, CostArguments arguments, double[] weights, double[] coefficients)
    implements CostFunction {

  /** Copies and checks. */
  public GeneralisedCost {
    weights = weights.clone();
    coefficients = coefficients.clone();
    if (!arguments.fixed().isEmpty()
        || weights.length != arguments.inputs().size()
        || coefficients.length != names(arguments).size()) {
      throw new IllegalArgumentException(
          coefficients.length + " coefficients for " + names(arguments));
    }
  }

  /** The price function q. */
  public enum PriceTerms {
    /** 2 Σ_{i&lt;j} a_ij √(w_i w_j). */
    LEONTIEF("generalised-leontief-cost"),
    /** w′Sw / (2 θ′w). */
    MCFADDEN("mcfadden-cost");

    private final String word;

    PriceTerms(String word) {
      this.word = word;
    }
  }

  /** The names of the parameters over these arguments. */
  public static List<String> names(CostArguments arguments) {
    List<String> inputs = arguments.inputs();
    List<String> outputs = arguments.outputs();
    List<String> names = new ArrayList<>();
    for (int i = 0; i < inputs.size(); i++) {
      for (int j = i + 1; j < inputs.size(); j++) {
        names.add(inputs.get(i) + "*" + inputs.get(j));
      }
    }
    inputs.forEach(i -> outputs.forEach(k -> names.add(i + "*" + k)));
    names.addAll(inputs);
    if (arguments.time()) {
      inputs.forEach(i -> names.add(i + "*" + CostArguments.TREND));
      names.add(CostArguments.TREND);
      names.add(CostArguments.TREND + "*" + CostArguments.TREND);
    }
    for (int k = 0; k < outputs.size(); k++) {
      for (int l = k; l < outputs.size(); l++) {
        names.add(outputs.get(k) + "*" + outputs.get(l));
      }
    }
    return List.copyOf(names);
  }

  /** Where the parameters stand: the place of a_ij. */
  public static int pair(int inputs, int i, int j) {
    int low = Math.min(i, j);
    return low * (2 * inputs - low - 1) / 2 + Math.abs(i - j) - 1;
  }

  private int n() {
    return arguments.inputs().size();
  }

  private int m() {
    return arguments.outputs().size();
  }

  /** The place of c_ik. */
  public int linear(int i, int k) {
    return n() * (n() - 1) / 2 + i * m() + k;
  }

  /** The place of b_i. */
  public int fixed(int i) {
    return linear(n(), 0) + i;
  }

  /** The place of τ_i; that of β at i = n, of β₂ at n + 1. */
  public int trend(int i) {
    return fixed(n()) + i;
  }

  /** The place of d_kl. */
  public int square(int k, int l) {
    int low = Math.min(k, l);
    int first = arguments.time() ? trend(n() + 2) : fixed(n());
    return first + low * (2 * m() - low + 1) / 2 + Math.abs(k - l);
  }

  @Override
  public String form() {
    return prices.word;
  }

  @Override
  public double[] weights() {
    return weights.clone();
  }

  @Override
  public double[] coefficients() {
    return coefficients.clone();
  }

  @Override
  public List<String> parameterNames() {
    return names(arguments);
  }

  @Override
  public double[] parameters() {
    return coefficients.clone();
  }

  @Override
  public GeneralisedCost withParameters(double[] parameters) {
    return new GeneralisedCost(prices, arguments, weights, parameters);
  }

  /** Cost and its derivatives in scaled levels at a point; computed once, read by all. */
  private GeneralisedCostPoint at(double[] v) {
    return new GeneralisedCostPoint(this, v);
  }

  @Override
  public double logCost(double[] v) {
    return Math.log(at(v).cost());
  }

  /** ∂C/∂y_k in the units of cost and output; known at a zero output too. */
  public double marginalCost(double[] v, int k) {
    return at(v).slope()[n() + k] / arguments.base()[n() + k];
  }

  /** ∂²C/∂y_k∂y_l in the units of cost and outputs: below zero, one makes the other cheaper. */
  public double complementarity(double[] v, int k, int l) {
    double[] base = arguments.base();
    return at(v).bend()[n() + k][n() + l] / base[n() + k] / base[n() + l];
  }

  @Override
  public void gradient(double[] v, double[] into) {
    GeneralisedCostPoint at = at(v);
    for (int k = 0; k < into.length; k++) {
      into[k] = at.slope()[k] * at.unit(k) / at.cost();
    }
  }

  @Override
  public void hessian(double[] v, double[][] into) {
    GeneralisedCostPoint at = at(v);
    double[] g = new double[into.length];
    gradient(v, g);
    boolean time = arguments.time();
    for (int k = 0; k < g.length; k++) {
      for (int l = 0; l < g.length; l++) {
        into[k][l] = at.bend()[k][l] * at.unit(k) * at.unit(l) / at.cost() - g[k] * g[l];
      }
      // the level of a logged argument is its own derivative
      into[k][k] += time && k == g.length - 1 ? 0 : g[k];
    }
  }
}

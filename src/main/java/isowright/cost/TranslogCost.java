package isowright.cost;

import java.util.ArrayList;
import java.util.List;

/**
 * Translog cost and its special cases: ln C = a_0 + Σ_k a_k z_k + ½ Σ_k Σ_l b_kl z_k z_l over all
 * arguments (prices, outputs, fixed inputs, time), with whichever of these terms the form has.
 *
 * <p>Mind the ½: a second-order coefficient is a second derivative. Cobb-Douglas cost has no
 * second-order terms; Cobb-Douglas cost with squared output has those of outputs alone.
 *
 * <p>Parameters: {@code constant}, one named after each argument, {@code k*l} for second-order
 * terms, in the order of the terms. Homogeneity in prices (Σ a_i = 1 over prices, Σ_i b_ik = 0 for
 * every argument k) is a matter of the numbers; see {@link PriceHomogeneity}.
 *
 * <p>Sources: Christensen, L. R. and Greene, W. H. (1976), Economies of Scale in U.S. Electric
 * Power Generation, <i>Journal of Political Economy</i> 84, 655–676; Berndt, E. R. and Wood, D. O.
 * (1975), Technology, Prices, and the Derived Demand for Energy, <i>Review of Economics and
 * Statistics</i> 57, 259–268. Tested in {@code CostFunctionTest}.
 *
 * @param form the form's name
 * @param arguments what the function depends on
 * @param terms which terms it has
 * @param coefficients one a term; copied
 */
public record TranslogCost(
    String form, CostArguments arguments, List<Term> terms, double[] coefficients)
    implements CostFunction {

  /** Stands for no argument in a {@link Term}. */
  public static final int NONE = -1;

  /**
   * A term: the constant (both {@link #NONE}), first order (second {@link #NONE}) or second order.
   *
   * @param first an argument's place, or {@link #NONE}
   * @param second an argument's place, at least {@code first}, or {@link #NONE}
   */
  public record Term(int first, int second) {

    /** Whether it is the constant. */
    public boolean constant() {
      return first == NONE;
    }

    /** Whether it is of second order. */
    public boolean secondOrder() {
      return second != NONE;
    }

    /** The term's name, for arguments of these names. */
    String name(List<String> names) {
      if (constant()) {
        return "constant";
      }
      return secondOrder() ? names.get(first) + "*" + names.get(second) : names.get(first);
    }

    /** Its value at z: 1, z_k, z_k z_l or ½ z_k². */
    double at(double[] z) {
      if (constant()) {
        return 1;
      }
      if (!secondOrder()) {
        return z[first];
      }
      return (first == second ? 0.5 : 1) * z[first] * z[second];
    }
  }

  /** Copies and checks. */
  public TranslogCost {
    terms = List.copyOf(terms);
    coefficients = coefficients.clone();
    if (terms.size() != coefficients.length) {
      throw new IllegalArgumentException(
          coefficients.length + " coefficients for " + terms.size() + " terms");
    }
  }

  @Override
  public double[] coefficients() {
    return coefficients.clone();
  }

  @Override
  public List<String> parameterNames() {
    List<String> names = new ArrayList<>();
    List<String> all = arguments.names();
    terms.forEach(term -> names.add(term.name(all)));
    return List.copyOf(names);
  }

  @Override
  public double[] parameters() {
    return coefficients.clone();
  }

  @Override
  public TranslogCost withParameters(double[] parameters) {
    return new TranslogCost(form, arguments, terms, parameters);
  }

  @Override
  public double logCost(double[] v) {
    double[] z = arguments.scaled(v);
    double sum = 0;
    for (int t = 0; t < coefficients.length; t++) {
      sum += coefficients[t] * terms.get(t).at(z);
    }
    return sum;
  }

  @Override
  public void gradient(double[] v, double[] into) {
    double[] z = arguments.scaled(v);
    java.util.Arrays.fill(into, 0);
    for (int t = 0; t < coefficients.length; t++) {
      Term term = terms.get(t);
      if (term.constant()) {
        continue;
      }
      if (!term.secondOrder()) {
        into[term.first()] += coefficients[t];
      } else if (term.first() == term.second()) {
        into[term.first()] += coefficients[t] * z[term.first()];
      } else {
        into[term.first()] += coefficients[t] * z[term.second()];
        into[term.second()] += coefficients[t] * z[term.first()];
      }
    }
  }

  @Override
  public void hessian(double[] v, double[][] into) {
    for (double[] row : into) {
      java.util.Arrays.fill(row, 0);
    }
    for (int t = 0; t < coefficients.length; t++) {
      Term term = terms.get(t);
      if (term.secondOrder()) {
        into[term.first()][term.second()] = coefficients[t];
        into[term.second()][term.first()] = coefficients[t];
      }
    }
  }
}

package isowright.technology;

import java.util.List;
import java.util.Optional;

/**
 * A production technology: what output Q a mix of inputs x = (x_1, …, x_n) yields.
 *
 * <p>Every form is written in logs, because that is where all of them stay finite and well scaled:
 *
 * <pre>  ln Q = constant + g(z),   z_i = ln x_i − ln base_i </pre>
 *
 * where {@code base} is the point by which inputs are divided (the geometric mean of the records,
 * or ones). An implementation gives ln f, its gradient and its Hessian in ln x, and its gradient in
 * the parameters; value, gradient and Hessian in x, and every economic quantity ({@link
 * Elasticities}, {@link Regularity}), follow from those and are written once for all forms.
 *
 * <p>Implementations are immutable and safe to share between threads. Arrays are copied in and out.
 *
 * <p>Notation: n inputs, p parameters; all logs natural. Log inputs have shape n.
 */
public sealed interface Technology
    permits CobbDouglas, Ces, NestedCes, GeneralisedLeontief, Translog {

  /** The form's name in study files, such as {@code cobb-douglas}. */
  String form();

  /** The names of the inputs, in the order used everywhere. */
  List<String> inputs();

  /** What each input is divided by before logs; shape n, all positive, ones where nothing is. */
  double[] base();

  /**
   * The names of the parameters: {@code constant} first, then the form's own (see the form).
   * Parallel to {@link #parameters()}.
   */
  List<String> parameterNames();

  /** The parameters, shape p. */
  double[] parameters();

  /**
   * The same form with other parameters (shape p). Parameters bound by an adding-up rule are
   * normalised to obey it, so that a single one may be moved in a numerical derivative.
   */
  Technology withParameters(double[] parameters);

  /** The technology whose output is exp(shift) times this one's at every mix. */
  Technology shifted(double logShift);

  /** ln f at ln x. */
  double logOutput(double[] logInputs);

  /**
   * ∂ln f/∂ln x_i at ln x: the output elasticities e_i.
   *
   * @param into shape n, overwritten
   */
  void logGradient(double[] logInputs, double[] into);

  /**
   * ∂²ln f/∂ln x_i∂ln x_j at ln x.
   *
   * @param into n × n, overwritten (both triangles)
   */
  void logHessian(double[] logInputs, double[][] into);

  /**
   * ∂ln f/∂θ_k at ln x, for every parameter.
   *
   * @param into shape p, overwritten
   */
  void parameterGradient(double[] logInputs, double[] into);

  /**
   * The least-cost mix as far as this form, at these parameters, can write it down; empty where it
   * has to be searched for, or where the parameters lie outside the economic region.
   */
  default Optional<ConditionalDemand> conditionalDemand() {
    return Optional.empty();
  }

  /**
   * Whether the technology is known to be regular at every mix, so that a mix which meets the
   * first-order conditions is the cheapest of all. A form that can write its demand down is; others
   * say so themselves where their parameters make it certain.
   */
  default boolean regularThroughout() {
    return conditionalDemand().isPresent();
  }

  /**
   * The same technology with another elasticity of substitution between every pair of inputs, at
   * every mix, with the same output and output elasticities at the base; empty where the form has
   * no such elasticity as a parameter of its own.
   *
   * @param elasticity σ, positive
   */
  default Optional<Technology> withSubstitution(double elasticity) {
    return Optional.empty();
  }

  /** The number of inputs, n. */
  default int dimension() {
    return inputs().size();
  }

  /** Output f(x) at inputs in their own units (all positive). */
  default double output(double[] inputs) {
    return Math.exp(logOutput(logs(inputs)));
  }

  /** Marginal products f_i = f e_i / x_i at inputs in their own units; a new array, shape n. */
  default double[] gradient(double[] inputs) {
    double[] z = logs(inputs);
    double f = Math.exp(logOutput(z));
    double[] e = new double[z.length];
    logGradient(z, e);
    for (int i = 0; i < e.length; i++) {
      e[i] *= f / inputs[i];
    }
    return e;
  }

  /**
   * Second derivatives f_ij = f/(x_i x_j) · (∂²ln f/∂ln x_i∂ln x_j + e_i e_j − [i = j] e_i); a new
   * array, n × n.
   */
  default double[][] hessian(double[] inputs) {
    double[] z = logs(inputs);
    int n = z.length;
    double f = Math.exp(logOutput(z));
    double[] e = new double[n];
    double[][] h = new double[n][n];
    logGradient(z, e);
    logHessian(z, h);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double inLogs = h[i][j] + e[i] * e[j] - (i == j ? e[i] : 0);
        h[i][j] = f / (inputs[i] * inputs[j]) * inLogs;
      }
    }
    return h;
  }

  private static double[] logs(double[] inputs) {
    double[] z = new double[inputs.length];
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(inputs[i]);
    }
    return z;
  }
}

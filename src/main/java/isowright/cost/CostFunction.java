package isowright.cost;

import java.util.List;

/**
 * The least cost C of outputs y at prices w, given fixed inputs and time: the other side of a
 * technology.
 *
 * <p>Written in logs at a point v of its {@link CostArguments}: ln C, its gradient and its Hessian
 * in v. By Shephard's lemma the gradient in the log of a price is the share of that input in cost.
 *
 * <p>Implementations are immutable. Arrays are copied in and out.
 *
 * <p>Source: Shephard, R. W. (1953), <i>Cost and Production Functions</i>; Diewert, W. E. (1982),
 * Duality approaches to microeconomic theory, in Arrow and Intriligator (eds), <i>Handbook of
 * Mathematical Economics</i> II, 535–599.
 */
public interface CostFunction {

  /** The form's name in study files, such as {@code translog-cost}. */
  String form();

  /** What the function depends on. */
  CostArguments arguments();

  /** The names of the parameters, parallel to {@link #parameters()}. */
  List<String> parameterNames();

  /** The parameters, shape p. */
  double[] parameters();

  /** The same form with other parameters (shape p). */
  CostFunction withParameters(double[] parameters);

  /** ln C at v. */
  double logCost(double[] v);

  /**
   * ∂ln C/∂v_k.
   *
   * @param into shape A, overwritten
   */
  void gradient(double[] v, double[] into);

  /**
   * ∂²ln C/∂v_k∂v_l.
   *
   * @param into A × A, overwritten (both triangles)
   */
  void hessian(double[] v, double[][] into);
}

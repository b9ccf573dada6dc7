package isowright.technology;

import java.util.List;

/**
 * A form with one curvature parameter ρ that is profiled, because the sum of squares is flat or has
 * false minima along it: ln Q = constant + h(z; θ, ρ), z the logged inputs divided by the base.
 *
 * <p>The inner parameters θ are free of any adding-up rule (shape m, see {@link #innerNames}), so
 * that a least-squares routine can move each of them alone.
 */
public non-sealed interface ProfiledForm extends Form {

  /** The names of the m inner parameters for these inputs, without {@code constant} and ρ. */
  List<String> innerNames(List<String> inputs);

  /** The linear form to which this one tends as ρ → 0; its coefficients are the start. */
  LinearForm limit();

  /** A start for the inner parameters from the coefficients of {@link #limit()} (shape n). */
  double[] start(double[] limitCoefficients);

  /**
   * The grid over which ρ is profiled, ascending, spread evenly in the elasticity of substitution.
   */
  double[] grid();

  /** The economic region of ρ: lowest and highest admissible value (either may be the limit). */
  double[] region();

  /** The elasticity of substitution that belongs to ρ. */
  double substitution(double curvature);

  /** The curvature ρ at which the elasticity of substitution has this value. */
  double curvature(double substitution);

  /**
   * h and its derivatives for many rows at once.
   *
   * @param z {@code z[i][row]}, the logged inputs divided by the base; not modified
   * @param inner the inner parameters, shape m
   * @param curvature ρ; any value of the region, and slightly outside where the formula allows
   * @param value {@code value[row]}, overwritten with h
   * @param derivatives {@code derivatives[k][row]}, overwritten: k &lt; m the derivatives in the
   *     inner parameters, k = m the derivative in ρ
   */
  void evaluate(
      double[][] z,
      int rows,
      double[] inner,
      double curvature,
      double[] value,
      double[][] derivatives);

  /**
   * True where the inner parameters lie in the economic region (shares positive, scale positive).
   */
  boolean admissible(double[] inner);

  /** The technology with these parameters. */
  Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double curvature);

  /**
   * The Jacobian of {@link Technology#parameters()} in (constant, inner…, ρ): p rows, m + 2
   * columns. It carries the covariance of the free parameters to the reported ones.
   */
  double[][] reported(double[] inner, double curvature);

  /** The index in (constant, inner…, ρ) of the parameter that is the degree of homogeneity. */
  int scaleIndex();
}

package isowright.technology;

import java.util.List;

/**
 * A form that is not linear in its parameters: ln Q = constant + h(z; θ, ρ), z the logged inputs
 * divided by the base.
 *
 * <p>ρ holds the form's curvatures: none (generalised Leontief), one (CES) or several (nested CES).
 * They are profiled, because the sum of squares is flat or has false minima along them. Every
 * curvature is measured alike, by ρ with the elasticity of substitution σ = 1/(1 + ρ).
 *
 * <p>The inner parameters θ are free of any adding-up rule (shape m, see {@link #innerNames}), so
 * that a least-squares routine can move each of them alone.
 */
public non-sealed interface NonlinearForm extends Form {

  /** The names of the m inner parameters for these inputs, without {@code constant} and ρ. */
  List<String> innerNames(List<String> inputs);

  /**
   * The names of the K curvatures for these inputs: those that {@link Technology#parameterNames()}
   * gives them.
   */
  List<String> curvatureNames(List<String> inputs);

  /** The form with one curvature in place of several; this form where there are not several. */
  default NonlinearForm withOneCurvature() {
    return this;
  }

  /** The linear form to which this one tends as ρ → 0; its coefficients are the start. */
  LinearForm limit();

  /**
   * Starts for the inner parameters from the coefficients of {@link #limit()} (shape n): one where
   * the curvatures are walked over a grid, several where there is no curvature and a search may end
   * in a false minimum.
   */
  List<double[]> starts(double[] limitCoefficients);

  /**
   * The grid over which each curvature is profiled, ascending, spread evenly in the elasticity of
   * substitution; empty for a form without curvatures.
   */
  double[] grid();

  /** The economic region of ρ: lowest and highest admissible value (either may be the limit). */
  default double[] region() {
    return new double[] {-1, Double.POSITIVE_INFINITY};
  }

  /** The elasticity of substitution that belongs to ρ: σ = 1/(1 + ρ). */
  default double substitution(double curvature) {
    return 1 / (1 + curvature);
  }

  /** The curvature ρ at which the elasticity of substitution has this value. */
  default double curvature(double substitution) {
    return 1 / substitution - 1;
  }

  /**
   * h and its derivatives for many rows at once.
   *
   * @param z {@code z[i][row]}, the logged inputs divided by the base; not modified
   * @param inner the inner parameters, shape m
   * @param curvatures ρ, shape K; any values of the region, and slightly outside where the formula
   *     allows
   * @param value {@code value[row]}, overwritten with h; NaN where the form has no value
   * @param derivatives {@code derivatives[k][row]}, overwritten: k &lt; m the derivatives in the
   *     inner parameters, then those in ρ (shape m + K)
   */
  void evaluate(
      double[][] z,
      int rows,
      double[] inner,
      double[] curvatures,
      double[] value,
      double[][] derivatives);

  /**
   * True where the inner parameters lie in the economic region (shares positive, scale positive).
   */
  boolean admissible(double[] inner);

  /** The technology with these parameters. */
  Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures);

  /**
   * The Jacobian of {@link Technology#parameters()} in (constant, inner…, ρ…): p rows, 1 + m + K
   * columns. It carries the covariance of the free parameters to the reported ones.
   */
  double[][] reported(double[] inner, double[] curvatures);
}

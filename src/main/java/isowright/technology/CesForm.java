package isowright.technology;

import java.util.ArrayList;
import java.util.List;

/**
 * How constant elasticity of substitution presents itself to an estimator.
 *
 * <p>Inner parameters: the scale ν, then the log ratios θ_i = ln(δ_i/δ_n), i &lt; n. With δ =
 * softmax(θ, 0) the shares are positive and sum to one whatever step is taken, the model is smooth
 * in θ everywhere, and θ has no unit; a share that wants to be zero or negative shows as a θ
 * without bound, which {@link #admissible} reports. With z, w, E as in {@link PowerMean} and t =
 * −ρ:
 *
 * <pre>  h = ν M(t),   ∂h/∂θ_i = ν (p_i − δ_i)/t = ν δ_i (e^{x_i} − 1 − w)/(E t),
 *  ∂h/∂ν = M(t),   ∂h/∂ρ = −ν M′(t) </pre>
 *
 * <p>Tested in {@code CesFormTest}.
 */
final class CesForm implements NonlinearForm {

  /** A share under this says that the input adds nothing: the log ratio has run away. */
  private static final double SMALLEST_SHARE = 1e-6;

  /** The least part of the summed coefficients that a start gives to an input. */
  private static final double SMALLEST_START = 0.02;

  @Override
  public String name() {
    return "ces";
  }

  @Override
  public List<String> innerNames(List<String> inputs) {
    int last = inputs.size() - 1;
    List<String> names = new ArrayList<>(List.of("scale"));
    for (String input : inputs.subList(0, last)) {
      names.add("ln(share:" + input + "/share:" + inputs.get(last) + ")");
    }
    return List.copyOf(names);
  }

  @Override
  public List<String> curvatureNames(List<String> inputs) {
    return List.of("rho");
  }

  @Override
  public LinearForm limit() {
    return CobbDouglas.FORM;
  }

  /**
   * The Cobb-Douglas limit: shares in proportion to the coefficients, scale their sum. Coefficients
   * that are not positive count as a small positive part of the others, since no share can be.
   */
  @Override
  public List<double[]> starts(double[] cobbDouglasCoefficients) {
    return List.of(start(cobbDouglasCoefficients));
  }

  static double[] start(double[] cobbDouglasCoefficients) {
    int n = cobbDouglasCoefficients.length;
    double positive = 0;
    for (double coefficient : cobbDouglasCoefficients) {
      positive += coefficient > 0 ? coefficient : 0;
    }
    if (!(positive > 0) || Double.isInfinite(positive)) {
      double[] even = new double[n];
      even[0] = 1;
      return even;
    }
    double[] raised = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      double coefficient = cobbDouglasCoefficients[i];
      double floor = SMALLEST_START * positive;
      raised[i] = coefficient > floor ? coefficient : floor;
      sum += raised[i];
    }
    double[] inner = new double[n];
    inner[0] = sum;
    for (int i = 0; i < n - 1; i++) {
      inner[1 + i] = Math.log(raised[i] / raised[n - 1]);
    }
    return inner;
  }

  /**
   * ρ at elasticities of substitution of 0.1, 0.2, …, 2, and beyond on both sides: down to 0.01,
   * where isoquants are all but corners, up to 1000, and the straight isoquant at ρ = −1 itself, so
   * that a sum of squares still falling at a bound is seen to do so. Thirty-three values.
   */
  @Override
  public double[] grid() {
    double[] few = {0.01, 0.02, 0.05};
    double[] many = {2.5, 3, 4, 5, 7, 10, 20, 100, 1000, Double.POSITIVE_INFINITY};
    double[] ascending = new double[few.length + 20 + many.length];
    int k = ascending.length;
    for (double substitution : few) {
      ascending[--k] = curvature(substitution);
    }
    for (int tenth = 1; tenth <= 20; tenth++) {
      ascending[--k] = curvature(tenth / 10.0);
    }
    for (double substitution : many) {
      ascending[--k] = curvature(substitution);
    }
    return ascending;
  }

  @Override
  public void evaluate(
      double[][] z,
      int rows,
      double[] inner,
      double[] curvatures,
      double[] value,
      double[][] derivatives) {
    CesRows block = new CesRows(z, shares(inner), inner[0], -curvatures[0], value, derivatives);
    for (int from = 0; from < rows; from += CesRows.BLOCK) {
      block.evaluate(from, Math.min(CesRows.BLOCK, rows - from));
    }
  }

  @Override
  public boolean admissible(double[] inner) {
    double scale = inner[0];
    if (!(scale > 0) || Double.isInfinite(scale)) {
      return false;
    }
    for (double share : shares(inner)) {
      if (!(share >= SMALLEST_SHARE)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures) {
    return new Ces(new InputScale(inputs, base), constant, shares(inner), curvatures[0], inner[0]);
  }

  /** ∂δ_j/∂θ_i = δ_j ([i = j] − δ_i); constant, ρ and scale are carried over as they are. */
  @Override
  public double[][] reported(double[] inner, double[] curvatures) {
    int n = inner.length;
    double[] shares = shares(inner);
    double[][] jacobian = new double[n + 3][n + 2];
    jacobian[0][0] = 1;
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n - 1; i++) {
        jacobian[1 + j][2 + i] = shares[j] * ((i == j ? 1 : 0) - shares[i]);
      }
    }
    jacobian[n + 1][n + 1] = 1;
    jacobian[n + 2][1] = 1;
    return jacobian;
  }

  /**
   * softmax(θ_1, …, θ_{n−1}, 0) of (ν, θ_1, …), relative to the largest so that nothing overflows.
   */
  private static double[] shares(double[] inner) {
    int n = inner.length;
    double largest = 0;
    for (int i = 1; i < n; i++) {
      largest = Math.max(largest, inner[i]);
    }
    double[] shares = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      shares[i] = Math.exp((i < n - 1 ? inner[1 + i] : 0) - largest);
      sum += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= sum;
    }
    return shares;
  }
}

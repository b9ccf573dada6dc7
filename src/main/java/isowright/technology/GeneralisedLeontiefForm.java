package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * How the generalised Leontief form presents itself to an estimator, which fits it in logs so that
 * its errors are those of the other forms.
 *
 * <p>Inner parameters: the scale ν (unless returns are held constant), then every weight but the
 * first, b_11 = 1 − Σ c_k b_k with c_k = 2 for cross terms and 1 else. With r_k = √(u_i u_j):
 *
 * <pre>  h = ν ln S,   ∂h/∂ν = ln S,   ∂h/∂b_k = ν c_k (r_k − r_1)/S </pre>
 *
 * No curvature. The starts have the output elasticities of Cobb-Douglas at the base and cross terms
 * b_ij = κ s_i s_j with κ from little to much substitution; none makes S negative anywhere.
 *
 * <p>Tested in {@code GeneralisedLeontiefTest}.
 */
final class GeneralisedLeontiefForm implements NonlinearForm {

  private static final double[] CROSS = {0.1, 0.6, 1};

  private final boolean constantReturns;

  /**
   * @param constantReturns whether ν is held at one
   */
  GeneralisedLeontiefForm(boolean constantReturns) {
    this.constantReturns = constantReturns;
  }

  @Override
  public String name() {
    return "generalised-leontief";
  }

  @Override
  public Form restricted(Restriction restriction) {
    return restriction == Restriction.CONSTANT_RETURNS ? new GeneralisedLeontiefForm(true) : this;
  }

  @Override
  public boolean obeys(Restriction restriction) {
    return restriction != Restriction.CONSTANT_RETURNS || constantReturns;
  }

  /** The number of inner parameters before the weights. */
  private int first() {
    return constantReturns ? 0 : 1;
  }

  @Override
  public double[][] restrictions(Restriction restriction, List<String> inputs) {
    return Form.lastIsOne(
        restriction, constantReturns, inputs.size() * (inputs.size() + 1) / 2 + 2);
  }

  @Override
  public List<String> innerNames(List<String> inputs) {
    List<String> weights = GeneralisedLeontief.weightNames(inputs);
    List<String> names = new ArrayList<>();
    if (!constantReturns) {
      names.add("scale");
    }
    names.addAll(weights.subList(1, weights.size()));
    return List.copyOf(names);
  }

  @Override
  public List<String> curvatureNames(List<String> inputs) {
    return List.of();
  }

  @Override
  public LinearForm limit() {
    return CobbDouglas.FORM;
  }

  @Override
  public List<double[]> starts(double[] cobbDouglasCoefficients) {
    double[] whole = CesForm.start(cobbDouglasCoefficients);
    int n = whole.length;
    double[] s = LogRatios.shares(whole, 1, n);
    List<double[]> starts = new ArrayList<>();
    for (double cross : CROSS) {
      double[] inner = new double[first() + n * (n + 1) / 2 - 1];
      if (!constantReturns) {
        inner[0] = whole[0];
      }
      for (int i = 0; i < n; i++) {
        for (int j = i; j < n; j++) {
          int k = GeneralisedLeontief.place(n, i, j);
          if (k > 0) {
            double own = s[i] * (1 - cross * (1 - s[i]));
            inner[first() + k - 1] = i == j ? own : cross * s[i] * s[j];
          }
        }
      }
      starts.add(inner);
    }
    return starts;
  }

  @Override
  public double[] grid() {
    return new double[0];
  }

  @Override
  public void evaluate(
      double[][] z,
      int rows,
      double[] inner,
      double[] curvatures,
      double[] value,
      double[][] derivatives) {
    int n = z.length;
    double[] weights = weights(n, inner);
    double scale = constantReturns ? 1 : inner[0];
    double[] half = new double[n];
    double[] roots = new double[weights.length];
    for (int r = 0; r < rows; r++) {
      double largest = z[0][r];
      for (int i = 1; i < n; i++) {
        largest = Math.max(largest, z[i][r]);
      }
      for (int i = 0; i < n; i++) {
        half[i] = Math.exp((z[i][r] - largest) / 2);
      }
      double sum = 0;
      int k = 0;
      for (int i = 0; i < n; i++) {
        for (int j = i; j < n; j++, k++) {
          roots[k] = (i == j ? 1 : 2) * half[i] * half[j];
          sum += weights[k] * roots[k];
        }
      }
      double log = sum > 0 ? largest + Math.log(sum) : Double.NaN;
      value[r] = scale * log;
      if (!constantReturns) {
        derivatives[0][r] = log;
      }
      slopes(n, r, roots, scale / sum, derivatives);
    }
  }

  /** ∂h/∂b_k = ν (c_k r_k − c_k r_1)/S. */
  private void slopes(int n, int row, double[] roots, double factor, double[][] derivatives) {
    int k = 0;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++, k++) {
        if (k > 0) {
          double less = (i == j ? 1 : 2) * roots[0];
          derivatives[first() + k - 1][row] = factor * (roots[k] - less);
        }
      }
    }
  }

  /** All weights b_ij, i ≤ j, from the free ones. */
  private double[] weights(int n, double[] inner) {
    double[] weights = new double[n * (n + 1) / 2];
    weights[0] = 1;
    int k = 0;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++, k++) {
        if (k > 0) {
          weights[k] = inner[first() + k - 1];
          weights[0] -= (i == j ? 1 : 2) * weights[k];
        }
      }
    }
    return weights;
  }

  @Override
  public boolean admissible(double[] inner) {
    double scale = constantReturns ? 1 : inner[0];
    return scale > 0 && Arrays.stream(inner).allMatch(Double::isFinite);
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures) {
    return new GeneralisedLeontief(
        new InputScale(inputs, base),
        constant,
        weights(inputs.size(), inner),
        constantReturns ? 1 : inner[0]);
  }

  @Override
  public double[][] reported(double[] inner, double[] curvatures) {
    int count = inner.length - first() + 1;
    int columns = 1 + inner.length;
    int n = (int) Math.round((Math.sqrt(8.0 * count + 1) - 1) / 2);
    double[][] jacobian = new double[count + 2][columns];
    jacobian[0][0] = 1;
    int k = 0;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++, k++) {
        if (k > 0) {
          jacobian[1 + k][first() + k] = 1;
          jacobian[1][first() + k] = i == j ? -1 : -2;
        }
      }
    }
    if (!constantReturns) {
      jacobian[count + 1][1] = 1;
    }
    return jacobian;
  }
}

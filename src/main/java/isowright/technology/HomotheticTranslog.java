package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The translog that is homothetic to the second order: Σ_j β_ij = κ β_i for every i, κ one number.
 *
 * <p>Along the ray through the base point, the marginal rates of substitution then do not change
 * with scale: e_i there is β_i (1 + κ λ) at λ logs from the base. Away from that ray this holds to
 * the first order only; exactly, at every mix, a translog is homothetic only if κ = 0 (it is then
 * homogeneous) or if it is a function of a Cobb-Douglas. The base point is therefore part of the
 * restriction. With β_ii = κ β_i − Σ_{j≠i} β_ij put in,
 *
 * <pre>  h = Σ_i β_i (z_i + ½ κ z_i²) − ½ Σ_{i&lt;j} β_ij (z_i − z_j)² </pre>
 *
 * which is linear for given κ: n + n(n − 1)/2 + 1 parameters in place of n + n(n + 1)/2.
 *
 * <p>Inner parameters: β_i, β_ij for i &lt; j, κ. No curvature.
 *
 * <p>Sources: Christensen, Jorgenson and Lau (1973), <i>Review of Economics and Statistics</i> 55,
 * 28–45 (restrictions of the translog); the condition in this form for production: Boisvert, R. N.
 * (1982), <i>The Translog Production Function: Its Properties, Its Several Interpretations and
 * Estimation Problems</i>, Cornell University, section on homotheticity (from memory); that it is
 * exact at the point of expansion only: Denny, M. and Fuss, M. (1977), The Use of Approximation
 * Analysis to Test for Separability and the Existence of Consistent Aggregates, <i>American
 * Economic Review</i> 67, 404–418. Tested in {@code FurtherFormsTest}.
 */
final class HomotheticTranslog implements NonlinearForm {

  /** Values of κ to start from, in units of one over the scale elasticity. */
  private static final double[] STARTS = {0, 0.5, -0.5};

  @Override
  public String name() {
    return Translog.FORM.name();
  }

  @Override
  public Form restricted(Restriction restriction) {
    return obeys(restriction) ? this : Translog.FORM.restricted(restriction);
  }

  @Override
  public boolean obeys(Restriction restriction) {
    return restriction == Restriction.HOMOTHETIC;
  }

  /**
   * κ = 0 where Σ_i Σ_j β_ij = κ Σ_i β_i is zero; with Σ_i β_i = 1 besides returns are constant.
   */
  @Override
  public double[][] restrictions(Restriction restriction, List<String> inputs) {
    int n = inputs.size();
    int k = n + n * (n + 1) / 2;
    double[] sum = new double[k + 1];
    double[] curvature = new double[k + 1];
    Arrays.fill(sum, 0, n, 1);
    sum[k] = 1;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        curvature[Translog.place(n, i, j)] += 1;
      }
    }
    return switch (restriction) {
      case HOMOTHETIC -> new double[0][];
      case HOMOGENEOUS -> new double[][] {curvature};
      case CONSTANT_RETURNS -> new double[][] {sum, curvature};
    };
  }

  /** r_i β_p − r_p β_i for i ≠ p of any translog, p the input of the largest |β|. */
  static Departure departure(int n, double[] parameters) {
    int pivot = 1;
    for (int i = 2; i <= n; i++) {
      pivot = Math.abs(parameters[i]) > Math.abs(parameters[pivot]) ? i : pivot;
    }
    double[] sums = new double[n + 1];
    for (int i = 1; i <= n; i++) {
      for (int j = 1; j <= n; j++) {
        sums[i] += parameters[1 + Translog.place(n, i - 1, j - 1)];
      }
    }
    double[] value = new double[n - 1];
    double[][] jacobian = new double[n - 1][parameters.length];
    for (int i = 1, row = 0; i <= n; i++) {
      if (i == pivot) {
        continue;
      }
      value[row] = sums[i] * parameters[pivot] - sums[pivot] * parameters[i];
      jacobian[row][pivot] = sums[i];
      jacobian[row][i] = -sums[pivot];
      for (int j = 1; j <= n; j++) {
        jacobian[row][1 + Translog.place(n, i - 1, j - 1)] += parameters[pivot];
        jacobian[row][1 + Translog.place(n, pivot - 1, j - 1)] -= parameters[i];
      }
      row++;
    }
    return new Departure(value, jacobian);
  }

  @Override
  public List<String> innerNames(List<String> inputs) {
    List<String> names = new ArrayList<>(inputs);
    for (int i = 0; i < inputs.size(); i++) {
      for (int j = i + 1; j < inputs.size(); j++) {
        names.add(inputs.get(i) + "*" + inputs.get(j));
      }
    }
    names.add("change of scale elasticity");
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
    int n = cobbDouglasCoefficients.length;
    double sum = 0;
    for (double coefficient : cobbDouglasCoefficients) {
      sum += Math.abs(coefficient);
    }
    List<double[]> starts = new ArrayList<>();
    for (double relative : STARTS) {
      double[] inner = new double[n + n * (n - 1) / 2 + 1];
      System.arraycopy(cobbDouglasCoefficients, 0, inner, 0, n);
      inner[inner.length - 1] = relative / Math.max(sum, 1);
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
    int last = inner.length - 1;
    double kappa = inner[last];
    for (int r = 0; r < rows; r++) {
      double sum = 0;
      double slope = 0;
      int k = n;
      for (int i = 0; i < n; i++) {
        double zi = z[i][r];
        double half = 0.5 * zi * zi;
        derivatives[i][r] = zi + kappa * half;
        sum += inner[i] * derivatives[i][r];
        slope += inner[i] * half;
        for (int j = i + 1; j < n; j++, k++) {
          double apart = zi - z[j][r];
          derivatives[k][r] = -0.5 * apart * apart;
          sum += inner[k] * derivatives[k][r];
        }
      }
      value[r] = sum;
      derivatives[last][r] = slope;
    }
  }

  @Override
  public boolean admissible(double[] inner) {
    return true;
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures) {
    int n = inputs.size();
    double[] coefficients = new double[n + n * (n + 1) / 2];
    double kappa = inner[inner.length - 1];
    int k = n;
    for (int i = 0; i < n; i++) {
      coefficients[i] = inner[i];
      coefficients[Translog.place(n, i, i)] += kappa * inner[i];
      for (int j = i + 1; j < n; j++, k++) {
        coefficients[Translog.place(n, i, j)] = inner[k];
        coefficients[Translog.place(n, i, i)] -= inner[k];
        coefficients[Translog.place(n, j, j)] -= inner[k];
      }
    }
    return new Translog(inputs, base, constant, coefficients);
  }

  @Override
  public double[][] reported(double[] inner, double[] curvatures) {
    int n = 1;
    while (n + n * (n - 1) / 2 + 1 < inner.length) {
      n++;
    }
    int last = inner.length - 1;
    double[][] jacobian = new double[1 + n + n * (n + 1) / 2][1 + inner.length];
    jacobian[0][0] = 1;
    int k = n;
    for (int i = 0; i < n; i++) {
      double[] own = jacobian[1 + Translog.place(n, i, i)];
      jacobian[1 + i][1 + i] = 1;
      own[1 + i] = inner[last];
      own[1 + last] = inner[i];
      for (int j = i + 1; j < n; j++, k++) {
        jacobian[1 + Translog.place(n, i, j)][1 + k] = 1;
        own[1 + k] = -1;
        jacobian[1 + Translog.place(n, j, j)][1 + k] = -1;
      }
    }
    return jacobian;
  }
}

package isowright.regression;

import java.util.Arrays;
import java.util.Locale;

/**
 * How uncertain are the parameters of a system when rows of a group may depend on one another and
 * the covariance of the equations may differ between rows? The sandwich
 *
 * <pre>  H (Σ_g u_g u_g′) H · G/(G − 1) · (N − 1)/(N − K/M),   u_g = Σ_{i∈g} X_i′ Σ̂⁻¹ e_i </pre>
 *
 * with H the covariance under equal errors, X_i the M × K derivatives of a row's residuals, and K/M
 * the parameters an equation (group constants nested in the groups are not counted).
 *
 * <p>Source: K.-Y. Liang and S. L. Zeger 1986, Biometrika 73, 13–22; the factor is that of the
 * single equation, common practice. Tested in {@code SystemCovarianceTest}.
 *
 * @param matrix K × K
 * @param clusters the number of groups, G
 * @param words one sentence: estimator, factor, degrees of freedom
 */
public record SystemCovariance(double[][] matrix, int clusters, String words) {

  /** Reads the design once, in parallel. */
  public static SystemCovariance clustered(Design design, SystemFit fit) {
    EquationSystem system = fit.system();
    Blocks blocks = Blocks.of(design.groups());
    Scores scores =
        blocks.gather(
            design.columns().size() + 1,
            () -> new Scores(fit),
            (into, from, to, buffer) -> {
              design.fill(from, to, buffer);
              into.add(buffer, from, to, design.groups());
            },
            Scores::add);
    int groups = design.groups().count();
    double each = (double) fit.rank() / system.size();
    double factor = groups / (groups - 1.0) * (fit.rows() - 1) / (fit.rows() - each);
    double[][] matrix = Matrices.sandwich(fit.covariance(), scores.sum);
    for (double[] row : matrix) {
      for (int k = 0; k < row.length; k++) {
        row[k] *= factor;
      }
    }
    String words =
        String.format(
            Locale.ROOT,
            "Covariance of the system clustered by group: factor G/(G − 1) · (N − 1)/(N − K/M) ="
                + " %d/%d · %d/%.4g = %.6g; t with %d degrees of freedom.",
            groups,
            groups - 1,
            fit.rows() - 1,
            fit.rows() - each,
            factor,
            groups - 1);
    return new SystemCovariance(matrix, groups, words);
  }

  /** Σ_g u_g u_g′. */
  private static final class Scores {
    private final EquationSystem system;
    private final double[] theta;
    private final double[][] weights;
    private final double[][] constants;
    private final int[] free;
    private final double[][] sum;

    Scores(SystemFit fit) {
      this.system = fit.system();
      this.theta = fit.coefficients();
      double[][] sigma = fit.residualCovariance();
      this.weights = SeeminglyUnrelated.inverse(sigma);
      int m = system.size();
      this.free =
          java.util.stream.IntStream.range(0, m)
              .filter(i -> !system.equations().get(i).effects())
              .toArray();
      this.constants =
          free.length == 0 || free.length == m
              ? new double[m][0]
              : SeeminglyUnrelated.regressionOn(sigma, free);
      this.sum = new double[theta.length][theta.length];
    }

    void add(double[][] block, int from, int to, Groups groups) {
      double[][] net = netLoads();
      for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
        int start = groups.start(g) - from;
        int end = groups.end(g) - from;
        double[][] e = residuals(block, net, start, end);
        removeConstants(e);
        addOuter(score(block, e, start, end));
      }
    }

    /** o − Dθ, one a column, M × (C + 1). */
    private double[][] netLoads() {
      double[][] net = new double[system.size()][];
      for (int m = 0; m < net.length; m++) {
        EquationSystem.Equation equation = system.equations().get(m);
        net[m] = equation.offsets();
        double[][] loads = equation.loadings();
        for (int j = 0; j < net[m].length; j++) {
          net[m][j] -= Matrices.dot(loads[j], theta);
        }
      }
      return net;
    }

    private static double[][] residuals(double[][] block, double[][] net, int start, int end) {
      double[][] e = new double[net.length][end - start];
      for (int m = 0; m < net.length; m++) {
        for (int j = 0; j < block.length; j++) {
          double weight = net[m][j];
          if (weight != 0) {
            for (int i = start; i < end; i++) {
              e[m][i - start] += weight * block[j][i];
            }
          }
        }
      }
      return e;
    }

    private void removeConstants(double[][] e) {
      if (free.length == e.length) {
        return;
      }
      double[] means = new double[e.length];
      Arrays.setAll(means, m -> Arrays.stream(e[m]).average().orElse(0));
      for (int m = 0; m < e.length; m++) {
        if (Arrays.binarySearch(free, m) < 0) {
          double constant = means[m];
          for (int f = 0; f < free.length; f++) {
            constant -= constants[m][f] * means[free[f]];
          }
          for (int i = 0; i < e[m].length; i++) {
            e[m][i] -= constant;
          }
        }
      }
    }

    /** Σ_i X_i′ Σ⁻¹ e_i: the loads of an equation times the columns weighted by its residuals. */
    private double[] score(double[][] block, double[][] e, int start, int end) {
      double[] u = new double[theta.length];
      for (int m = 0; m < e.length; m++) {
        double[] weighted = new double[end - start];
        for (int l = 0; l < e.length; l++) {
          for (int i = 0; i < weighted.length; i++) {
            weighted[i] += weights[m][l] * e[l][i];
          }
        }
        double[][] loads = system.equations().get(m).loadings();
        for (int j = 0; j < block.length; j++) {
          double product = 0;
          for (int i = 0; i < weighted.length; i++) {
            product += block[j][start + i] * weighted[i];
          }
          for (int k = 0; k < u.length; k++) {
            u[k] += loads[j][k] * product;
          }
        }
      }
      return u;
    }

    private void addOuter(double[] u) {
      for (int k = 0; k < u.length; k++) {
        for (int l = 0; l < u.length; l++) {
          sum[k][l] += u[k] * u[l];
        }
      }
    }

    void add(Scores other) {
      for (int k = 0; k < sum.length; k++) {
        for (int l = 0; l < sum.length; l++) {
          sum[k][l] += other.sum[k][l];
        }
      }
    }
  }
}

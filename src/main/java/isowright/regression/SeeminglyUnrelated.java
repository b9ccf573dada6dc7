package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;

/**
 * Equations whose errors go together within a row: generalised least squares with the covariance of
 * the errors estimated from the residuals, renewed until it no longer moves, which is maximum
 * likelihood under the normal law.
 *
 * <p>The rows are read once and reduced to the triangular factor R of all columns ({@link
 * OrthogonalDecomposition}). Since an orthogonal change of basis over rows leaves every sum of
 * products of residuals as it is, R stands for the rows from then on: every renewal is a least
 * squares problem of M (C + 1) rows whatever N is, solved by orthogonal decomposition in its turn,
 * so that the condition of the columns is never squared. No stacked system, no matrix of N × N.
 *
 * <p>Where an equation has a constant for each group, the constant that makes the weighted sum of
 * squares least is ᾱ_A = ē_A − Σ_AF Σ_FF⁻¹ ē_F (A the equations with group constants, F those
 * without, bars means over the group). What is left is the deviations from group means in all
 * equations, weighted by Σ⁻¹, and the group means of F, weighted by Σ_FF⁻¹; so two factors stand
 * for the rows, one of deviations, one of means.
 *
 * <p>Where the explained columns add up to one (shares), one equation is left out; at convergence
 * it does not matter which.
 *
 * <p>Sources: A. Zellner 1962, Journal of the American Statistical Association 57, 348–368; W.
 * Oberhofer and J. Kmenta 1974, Econometrica 42, 579–590 (the iteration converges to maximum
 * likelihood); A. P. Barten 1969, European Economic Review 1, 7–73 (the equation left out). Tested
 * in {@code SeeminglyUnrelatedTest}.
 */
public final class SeeminglyUnrelated {

  /** Renewals end when no parameter moves by more than this share of its standard error. */
  private static final double STILL = 1e-9;

  /** Far more than a well-posed system takes; a flat one is said not to have converged. */
  private static final int MOST_RENEWALS = 2000;

  private final EquationSystem system;
  private final int rows;
  private final List<Part> parts;
  private final int absorbed;

  /** Rows reduced to a factor, and which equations are asked of it. */
  private record Part(double[][] factor, int[] equations, double[][] offsets, double[][][] loads) {}

  private SeeminglyUnrelated(EquationSystem system, int rows, List<Part> parts, int absorbed) {
    this.system = system;
    this.rows = rows;
    this.parts = parts;
    this.absorbed = absorbed;
  }

  /** Iterates to maximum likelihood. */
  public static SystemFit fit(Design design, EquationSystem system) {
    return fit(design, system, MOST_RENEWALS);
  }

  /**
   * Fits with at most so many renewals of Σ̂ (1 gives Zellner's two-step estimate, which depends on
   * the equation left out).
   */
  public static SystemFit fit(Design design, EquationSystem system, int renewals) {
    return prepared(design, system).search(renewals);
  }

  /**
   * Iterates to maximum likelihood over φ, of which the parameters of the system are a function.
   *
   * <p>For weights that are given, the sum of squares is quadratic in θ about its own least θ̂ with
   * V⁻¹; so each renewal fits freely and then looks for the nearest θ(φ) in that metric ({@link
   * NearestParameters}). The fit is that of the equations made linear in φ at the solution, so that
   * its covariances are those of φ.
   */
  public static MappedFit fit(Design design, EquationSystem system, ParameterMap map) {
    SeeminglyUnrelated prepared = prepared(design, system);
    SystemFit free = prepared.search(MOST_RENEWALS);
    if (!free.converged() || free.rank() < system.parameters().size()) {
      return MappedFit.unfitted(free);
    }
    return prepared.search(free, map);
  }

  private MappedFit search(SystemFit free, ParameterMap map) {
    double[][] sigma = free.residualCovariance();
    double[] phi = map.start(free.coefficients());
    double[] theta = map.parameters(phi);
    int done = 0;
    boolean still = false;
    LinearFit fit = weighted(sigma);
    while (done < MOST_RENEWALS && !still) {
      double[][] metric = inverse(fit.inverseCrossProduct());
      NearestParameters.Found found =
          new NearestParameters(map, fit.coefficients(), metric).from(map.start(theta));
      double[] next = map.parameters(found.phi());
      still = found.still() && still(theta, next, fit.inverseCrossProduct());
      phi = found.phi();
      theta = next;
      done++;
      sigma = residualCovariance(theta, sigma);
      if (!definite(sigma)) {
        break;
      }
      fit = weighted(sigma);
    }
    double[][] jacobian = map.jacobian(phi);
    double[][] metric0 = inverse(fit.inverseCrossProduct());
    double[][] information = NearestParameters.information(jacobian, metric0);
    boolean[] kept = MappedFit.kept(information);
    SystemFit mapped =
        new SystemFit(
            MappedFit.linear(system, map.names(), theta, jacobian, phi),
            phi,
            kept,
            MappedFit.inverse(information, kept),
            sigma,
            logLikelihood(sigma),
            rows,
            absorbed,
            done,
            still && MappedFit.any(kept),
            List.of());
    return new MappedFit(mapped, theta, jacobian, free);
  }

  private static SeeminglyUnrelated prepared(Design design, EquationSystem system) {
    int m = system.size();
    int[] all = new int[m];
    Arrays.setAll(all, i -> i);
    int[] free = Arrays.stream(all).filter(i -> !system.equations().get(i).effects()).toArray();
    if (free.length == m) {
      double[][] factor = OrthogonalDecomposition.of(design).factor();
      return new SeeminglyUnrelated(system, design.rows(), List.of(part(factor, system, all)), 0);
    }
    List<Part> parts = new ArrayList<>();
    parts.add(part(OrthogonalDecomposition.of(Effects.within(design)).factor(), system, all));
    if (free.length > 0) {
      double[][] means = OrthogonalDecomposition.of(new GroupMeanDesign(design)).factor();
      parts.add(part(means, system, free));
    }
    int groups = design.groups().count();
    return new SeeminglyUnrelated(system, design.rows(), parts, groups * (m - free.length));
  }

  private static Part part(double[][] factor, EquationSystem system, int[] equations) {
    int q = factor.length;
    int k = system.parameters().size();
    double[][] offsets = new double[equations.length][q];
    double[][][] loads = new double[equations.length][q][k];
    for (int e = 0; e < equations.length; e++) {
      EquationSystem.Equation equation = system.equations().get(equations[e]);
      double[] o = equation.offsets();
      double[][] d = equation.loadings();
      for (int i = 0; i < q; i++) {
        for (int j = i; j < q; j++) {
          offsets[e][i] += factor[i][j] * o[j];
          for (int p = 0; p < k; p++) {
            loads[e][i][p] += factor[i][j] * d[j][p];
          }
        }
      }
    }
    return new Part(factor, equations, offsets, loads);
  }

  private SystemFit search(int renewals) {
    int m = system.size();
    double[][] sigma = new double[m][m];
    for (int i = 0; i < m; i++) {
      sigma[i][i] = 1;
    }
    LinearFit fit = weighted(sigma);
    int done = 0;
    boolean still = false;
    while (done < renewals && !still) {
      sigma = residualCovariance(fit.coefficients(), sigma);
      if (!definite(sigma)) {
        break;
      }
      LinearFit next = weighted(sigma);
      done++;
      still = still(fit, next);
      fit = next;
    }
    double[][] last = residualCovariance(fit.coefficients(), sigma);
    return new SystemFit(
        system,
        fit.coefficients(),
        fit.estimated(),
        fit.inverseCrossProduct(),
        last,
        logLikelihood(last),
        rows,
        absorbed,
        done,
        still,
        fit.collinearities());
  }

  private static boolean still(LinearFit before, LinearFit after) {
    return still(before.coefficients(), after.coefficients(), after.inverseCrossProduct());
  }

  private static boolean still(double[] a, double[] b, double[][] v) {
    for (int k = 0; k < a.length; k++) {
      if (Math.abs(a[k] - b[k]) > STILL * Math.sqrt(v[k][k])) {
        return false;
      }
    }
    return true;
  }

  /** Least squares of all equations, whitened by the inverse root of Σ. */
  private LinearFit weighted(double[][] sigma) {
    int k = system.parameters().size();
    int count = 0;
    for (Part part : parts) {
      count += part.equations().length * part.factor().length;
    }
    double[][] columns = new double[k][count];
    double[] response = new double[count];
    int at = 0;
    for (Part part : parts) {
      double[][] whitening = whitening(block(sigma, part.equations(), part.equations()));
      at = stack(part, whitening, columns, response, at);
    }
    return LeastSquares.fit(ArrayDesign.of(system.parameters(), columns, response));
  }

  private static int stack(
      Part part, double[][] whitening, double[][] columns, double[] response, int from) {
    int at = from;
    int q = part.factor().length;
    for (int e = 0; e < whitening.length; e++) {
      for (int i = 0; i < q; i++, at++) {
        for (int l = 0; l <= e; l++) {
          double u = whitening[e][l];
          response[at] += u * part.offsets()[l][i];
          double[] load = part.loads()[l][i];
          for (int p = 0; p < columns.length; p++) {
            columns[p][at] += u * load[p];
          }
        }
      }
    }
    return at;
  }

  /** E′E/N at θ, group constants at their best for the weights Σ. */
  private double[][] residualCovariance(double[] theta, double[][] sigma) {
    int m = system.size();
    double[][] sum = new double[m][m];
    for (Part part : parts) {
      double[][] e = residuals(part, theta);
      double[][] full = e;
      if (part.equations().length < m) {
        full = withBestConstants(e, part.equations(), sigma);
      }
      for (int i = 0; i < m; i++) {
        for (int j = 0; j <= i; j++) {
          sum[i][j] += Matrices.dot(full[i], full[j]) / rows;
          sum[j][i] = sum[i][j];
        }
      }
    }
    return sum;
  }

  private static double[][] residuals(Part part, double[] theta) {
    double[][] e = new double[part.equations().length][];
    for (int l = 0; l < e.length; l++) {
      e[l] = part.offsets()[l].clone();
      for (int i = 0; i < e[l].length; i++) {
        e[l][i] -= Matrices.dot(part.loads()[l][i], theta);
      }
    }
    return e;
  }

  /** Group means of all residuals: Σ_AF Σ_FF⁻¹ ē_F where there are group constants. */
  private double[][] withBestConstants(double[][] free, int[] places, double[][] sigma) {
    int m = system.size();
    double[][] slopes = regressionOn(sigma, places);
    double[][] full = new double[m][];
    for (int i = 0; i < m; i++) {
      int own = Arrays.binarySearch(places, i);
      if (own >= 0) {
        full[i] = free[own];
        continue;
      }
      full[i] = new double[free[0].length];
      for (int f = 0; f < places.length; f++) {
        for (int r = 0; r < full[i].length; r++) {
          full[i][r] += slopes[i][f] * free[f][r];
        }
      }
    }
    return full;
  }

  /** Σ_·F Σ_FF⁻¹, M × F. */
  static double[][] regressionOn(double[][] sigma, int[] places) {
    int m = sigma.length;
    int[] all = new int[m];
    Arrays.setAll(all, i -> i);
    double[][] inverse = inverse(block(sigma, places, places));
    double[][] cross = block(sigma, all, places);
    double[][] slopes = new double[m][places.length];
    for (int i = 0; i < m; i++) {
      for (int f = 0; f < places.length; f++) {
        slopes[i][f] = Matrices.dot(cross[i], inverse[f]);
      }
    }
    return slopes;
  }

  /** The inverse of a small symmetric positive definite matrix, whatever its units. */
  static double[][] inverse(double[][] matrix) {
    int n = matrix.length;
    double[][] scaled = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        scaled[i][j] = matrix[i][j] / Math.sqrt(matrix[i][i]) / Math.sqrt(matrix[j][j]);
      }
    }
    double[][] inverse =
        new CholeskyDecomposition(new Array2DRowRealMatrix(scaled, false), 1e-10, 0)
            .getSolver()
            .getInverse()
            .getData();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        inverse[i][j] /= Math.sqrt(matrix[i][i]) * Math.sqrt(matrix[j][j]);
      }
    }
    return inverse;
  }

  private static double[][] block(double[][] matrix, int[] rows, int[] columns) {
    double[][] block = new double[rows.length][columns.length];
    for (int i = 0; i < rows.length; i++) {
      for (int j = 0; j < columns.length; j++) {
        block[i][j] = matrix[rows[i]][columns[j]];
      }
    }
    return block;
  }

  /** U, lower triangular, with U Σ U′ = 1. */
  private static double[][] whitening(double[][] sigma) {
    double[][] l =
        new CholeskyDecomposition(new Array2DRowRealMatrix(sigma), 1e-10, 0).getL().getData();
    int m = l.length;
    double[][] u = new double[m][m];
    for (int j = 0; j < m; j++) {
      u[j][j] = 1 / l[j][j];
      for (int i = j + 1; i < m; i++) {
        double sum = 0;
        for (int k = j; k < i; k++) {
          sum += l[i][k] * u[k][j];
        }
        u[i][j] = -sum / l[i][i];
      }
    }
    return u;
  }

  private static boolean definite(double[][] sigma) {
    try {
      double[][] l =
          new CholeskyDecomposition(new Array2DRowRealMatrix(sigma), 1e-10, 0).getL().getData();
      for (int i = 0; i < l.length; i++) {
        // An equation that the others determine leaves rounding of its own size.
        if (!(l[i][i] > 1e-10 * Math.sqrt(sigma[i][i]))) {
          return false;
        }
      }
      return true;
    } catch (NonPositiveDefiniteMatrixException singular) {
      return false;
    }
  }

  private double logLikelihood(double[][] sigma) {
    if (!definite(sigma)) {
      return Double.NaN;
    }
    double[][] l =
        new CholeskyDecomposition(new Array2DRowRealMatrix(sigma), 1e-10, 0).getL().getData();
    double logDeterminant = 0;
    for (int i = 0; i < l.length; i++) {
      logDeterminant += 2 * Math.log(l[i][i]);
    }
    return -0.5 * rows * (l.length * (1 + Math.log(2 * Math.PI)) + logDeterminant);
  }
}

package isowright.technology;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * What a technology says of the economy of inputs at one mix: output and scale elasticities, rates
 * of substitution, elasticities of substitution, and how the demand for inputs at given output
 * answers to prices. Written once for all forms, from the gradient e and the Hessian H of ln f in
 * ln x alone.
 *
 * <p>Notation: n inputs x_i, prices w_i; e_i = ∂ln f/∂ln x_i; s_i = e_i/Σ e_k, which is the share
 * of input i in cost where the mix is the cheapest for its output (w_i = λ f_i gives w_i x_i ∝ f_i
 * x_i ∝ e_i). Let X be the lower n × n block of the inverse of B̃ = [0 eᵀ; e H − diag(e)], the
 * bordered Hessian in logs. Since the textbook's bordered Hessian is F = f D B D with D = diag(1,
 * 1/x) (see {@code Bordered}), its inverse has F_ij/|F| = x_i x_j X_ij/f, and the textbook's
 * formulas become free of units:
 *
 * <pre>  Allen-Uzawa   A_ij = Σ x_k f_k/(x_i x_j) · F_ij/|F|                     = Σ e_k · X_ij
 *  demand        ε_ij = s_j A_ij  (∂ln x_i/∂ln w_j at given output)      = e_j X_ij
 *  Morishima     M_ij = (f_j/x_i) F_ij/|F| − (f_j/x_j) F_jj/|F|          = ε_ij − ε_jj
 *  Hicks, direct σ_ij = e_i e_j (e_i + e_j)
 *                       / [e_i e_j (e_i + e_j) + 2 e_i e_j H_ij − e_i² H_jj − e_j² H_ii] </pre>
 *
 * Hicks' measure holds the other inputs fixed and follows from f_i f_j (x_i f_i + x_j f_j)/[x_i x_j
 * (2 f_i f_j f_ij − f_i² f_jj − f_j² f_ii)] by putting in f_i and f_ij; the others let them adjust.
 * Morishima's M_ij is for a move of the price of j and the answer of the ratio x_i/x_j, and is not
 * symmetric.
 *
 * <p>Assumptions: the measures that speak of prices hold where the mix is the least-cost one for
 * the prices in question, so where the technology is regular ({@link Regularity}); elsewhere they
 * are numbers without that meaning.
 *
 * <p><b>Not a number</b> stands for an elasticity that does not exist: where the bordered Hessian
 * is singular (straight isoquants, such as the linear technology, whose σ is infinite; the corner
 * of a Leontief isoquant; a mix at which no input adds anything) every Allen, Morishima and demand
 * elasticity is NaN, and a Hicks elasticity is NaN where its denominator vanishes to rounding.
 * Never an exception.
 *
 * <p>Sources: Hicks, J. R. (1932), <i>The Theory of Wages</i>; Allen, R. G. D. (1938),
 * <i>Mathematical Analysis for Economists</i>, 503–509; Uzawa, H. (1962), <i>Review of Economic
 * Studies</i> 29, 291–299; Blackorby, C. and Russell, R. R. (1989), Will the Real Elasticity of
 * Substitution Please Stand Up?, <i>American Economic Review</i> 79, 882–888.
 */
public final class Elasticities {

  /**
   * A pivot of the scaled bordered Hessian under this counts as zero: its entries are of order one
   * and carry rounding errors of some 1e−15, so a smaller pivot has no correct digit to speak of.
   */
  private static final double SINGULAR = 1e-13;

  private final double[] logInputs;
  private final double[] output;
  private final double scale;
  private final double[][] hessian;

  /** X; NaN throughout where the bordered Hessian is singular. */
  private final double[][] inverse;

  private Elasticities(double[] logInputs, Bordered bordered) {
    this.logInputs = logInputs.clone();
    this.output = bordered.gradient();
    this.hessian = bordered.hessian();
    this.inverse = inverse(bordered);
    double sum = 0;
    for (double each : output) {
      sum += each;
    }
    this.scale = sum;
  }

  /** The elasticities at ln x (shape n; natural logs of inputs in their own units). */
  public static Elasticities at(Technology technology, double[] logInputs) {
    Bordered bordered = new Bordered(logInputs.length);
    bordered.load(technology, logInputs);
    return new Elasticities(logInputs, bordered);
  }

  /** The elasticities at a mix x (shape n, positive, in the inputs' own units). */
  public static Elasticities atMix(Technology technology, double[] mix) {
    double[] logs = new double[mix.length];
    Arrays.setAll(logs, i -> Math.log(mix[i]));
    return at(technology, logs);
  }

  /** The elasticities at the technology's base. */
  public static Elasticities atBase(Technology technology) {
    return atMix(technology, technology.base());
  }

  /** The output elasticities e, shape n. */
  public double[] output() {
    return output.clone();
  }

  /** The output elasticity e_i = ∂ln f/∂ln x_i: per cent more output for a per cent more of i. */
  public double output(int i) {
    return output[i];
  }

  /** The scale elasticity Σ e_i: returns to scale are increasing above 1, constant at 1. */
  public double scale() {
    return scale;
  }

  /** s_i = e_i/Σ e_k: the share of input i in cost where this mix is the cheapest. */
  public double share(int i) {
    return output[i] / scale;
  }

  /**
   * The marginal rate of technical substitution f_i/f_j = (e_i/e_j)(x_j/x_i): how many units of
   * input j one more unit of input i replaces at the same output.
   */
  public double marginalRate(int i, int j) {
    return output[i] / output[j] * Math.exp(logInputs[j] - logInputs[i]);
  }

  /** Hicks' direct elasticity of substitution between i and j, i ≠ j; symmetric. */
  public double hicks(int i, int j) {
    if (i == j) {
      return Double.NaN;
    }
    // Divided through by e_i e_j, so that the smallest elasticities do not underflow.
    double sum = output[i] + output[j];
    double cross = 2 * hessian[i][j];
    double first = output[i] / output[j] * hessian[j][j];
    double second = output[j] / output[i] * hessian[i][i];
    double denominator = sum + cross - (first + second);
    double largest =
        Math.max(
            Math.max(Math.abs(sum), Math.abs(cross)), Math.max(Math.abs(first), Math.abs(second)));
    return Math.abs(denominator) > SINGULAR * largest ? sum / denominator : Double.NaN;
  }

  /** The Allen-Uzawa elasticity A_ij; symmetric, own ones (i = j) included. */
  public double allen(int i, int j) {
    return scale * inverse[i][j];
  }

  /** All Allen-Uzawa elasticities, n × n. */
  public double[][] allen() {
    return table(this::allen);
  }

  /** The Morishima elasticity M_ij: the price of j moves, the ratio x_i/x_j answers; 0 at i = j. */
  public double morishima(int i, int j) {
    return output[j] * (inverse[i][j] - inverse[j][j]);
  }

  /** All Morishima elasticities, n × n: row i the quantity that answers, column j the price. */
  public double[][] morishima() {
    return table(this::morishima);
  }

  /** The price elasticity of demand at given output, ε_ij = ∂ln x_i/∂ln w_j. */
  public double demand(int i, int j) {
    return output[j] * inverse[i][j];
  }

  /** All price elasticities of demand at given output, n × n; every row sums to zero. */
  public double[][] demand() {
    return table(this::demand);
  }

  /** Whether the bordered Hessian can be inverted, so that elasticities of substitution exist. */
  public boolean substitutionExists() {
    return !Double.isNaN(inverse[0][0]);
  }

  /** A figure for an ordered pair of inputs. */
  private interface ForPair {
    double of(int i, int j);
  }

  private double[][] table(ForPair figure) {
    int n = output.length;
    double[][] table = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        table[i][j] = figure.of(i, j);
      }
    }
    return table;
  }

  private static double[][] inverse(Bordered bordered) {
    int n = bordered.size();
    double[] border = bordered.border();
    double[] d = bordered.factor();
    double[][] matrix = new double[n + 1][n + 1];
    boolean finite = true;
    for (int i = 0; i < n; i++) {
      matrix[0][i + 1] = border[i];
      matrix[i + 1][0] = border[i];
      finite &= Double.isFinite(border[i]);
      for (int j = 0; j < n; j++) {
        matrix[i + 1][j + 1] = bordered.block()[i][j];
        finite &= Double.isFinite(matrix[i + 1][j + 1]);
      }
    }
    return finite ? inverse(matrix, d) : unknown(n);
  }

  private static double[][] inverse(double[][] scaledBordered, double[] d) {
    int n = d.length;
    DecompositionSolver solver =
        new LUDecomposition(new Array2DRowRealMatrix(scaledBordered, false), SINGULAR).getSolver();
    if (!solver.isNonSingular()) {
      return unknown(n);
    }
    RealMatrix scaled = solver.getInverse();
    double[][] inverse = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        inverse[i][j] = d[i] * d[j] * scaled.getEntry(i + 1, j + 1);
      }
    }
    return inverse;
  }

  private static double[][] unknown(int n) {
    double[][] table = new double[n][n];
    for (double[] row : table) {
      Arrays.fill(row, Double.NaN);
    }
    return table;
  }
}

package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/**
 * Generalised Leontief production function, homogeneous of degree ν:
 *
 * <pre>  ln Q = constant + ν ln S,   S = Σ_i Σ_j b_ij √(u_i u_j),   u_i = x_i/base_i,
 *  b_ij = b_ji,   Σ_i Σ_j b_ij = 1 </pre>
 *
 * Diewert's function has ν = 1. Without cross terms it is linear in the inputs; with b_ij = δ_i δ_j
 * it is {@link Ces} with σ = 2; a negative b_ij lets i and j replace each other less than one for
 * one. With r_ij = √(u_i u_j) and s_i = Σ_j b_ij r_ij/S:
 *
 * <pre>  e_i = ν s_i,    ∂²ln f/∂ln x_i∂ln x_j = ν (½ b_ij r_ij/S − s_i s_j)   i ≠ j </pre>
 *
 * and rows of the Hessian sum to zero. With no b_ij negative it is monotone and quasi-concave
 * everywhere; otherwise where {@link Regularity} finds it so. Where S is not positive there is no
 * output: the logs are not numbers, and the mix is not regular.
 *
 * <p><b>Parameters</b>, in this order: {@code constant} (ln Q at the base), {@code weight:<input>}
 * (b_ii) and {@code weight:<input>*<input>} (b_ij, i &lt; j, which counts twice in S) row by row,
 * {@code scale} (ν). The weights are bound by their sum, so {@link #withParameters} divides them by
 * it; what {@link Ces} says of its shares holds here.
 *
 * <p>Source: Diewert, W. E. (1971), An Application of the Shephard Duality Theorem: A Generalized
 * Leontief Production Function, <i>Journal of Political Economy</i> 79, 481–507.
 *
 * <p>Tested in {@code GeneralisedLeontiefTest}.
 */
public final class GeneralisedLeontief implements Technology {

  /** How the form presents itself to an estimator. */
  public static final NonlinearForm FORM = new GeneralisedLeontiefForm(false);

  private static final double SUM_TOLERANCE = 1e-9;

  private final InputScale scaling;
  private final double constant;

  /** b_ij for i ≤ j, row by row. */
  private final double[] weights;

  private final double scale;

  /** Unchecked; the weights must sum to one. */
  GeneralisedLeontief(InputScale scaling, double constant, double[] weights, double scale) {
    this.scaling = scaling;
    this.constant = constant;
    this.weights = weights.clone();
    this.scale = scale;
  }

  /**
   * A technology with these parameters, checked.
   *
   * @param base what each input is divided by, shape n, positive
   * @param weights b_ij for i ≤ j row by row, shape n(n + 1)/2; those with i &lt; j count twice in
   *     the sum, which must be one (to 1e-9; the rest is divided away)
   * @param scale ν, positive
   * @throws IllegalArgumentException saying which value is not admissible, and what is
   */
  public static GeneralisedLeontief of(
      List<String> inputs, double[] base, double constant, double[] weights, double scale) {
    InputScale scaling = new InputScale(inputs, base);
    int n = scaling.size();
    scaling.require(weights, n * (n + 1) / 2, "weights");
    double sum = sum(n, weights);
    demand(Math.abs(sum - 1) <= SUM_TOLERANCE, "sum of the weights", sum, "let them sum to 1");
    demand(scale > 0 && scale < Double.POSITIVE_INFINITY, "scale", scale, "give a positive number");
    demand(Double.isFinite(constant), "constant", constant, "give a finite number");
    return new GeneralisedLeontief(scaling, constant, divided(weights, sum), scale);
  }

  private static void demand(boolean met, String what, double value, String remedy) {
    if (!met) {
      throw new IllegalArgumentException(
          String.format(Locale.ROOT, "generalised Leontief: %s is %s; %s", what, value, remedy));
    }
  }

  /** The place of b_ij (either order) among the weights of n inputs. */
  public static int place(int n, int i, int j) {
    return Translog.place(n, i, j) - n;
  }

  /** Σ_i Σ_j b_ij of weights in the order of the parameters: pairs count twice. */
  public static double sum(int n, double[] weights) {
    double sum = 0;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        sum += (i == j ? 1 : 2) * weights[place(n, i, j)];
      }
    }
    return sum;
  }

  private static double[] divided(double[] weights, double by) {
    double[] divided = weights.clone();
    for (int k = 0; k < divided.length; k++) {
      divided[k] /= by;
    }
    return divided;
  }

  @Override
  public String form() {
    return FORM.name();
  }

  @Override
  public List<String> inputs() {
    return scaling.names();
  }

  @Override
  public double[] base() {
    return scaling.base();
  }

  @Override
  public List<String> parameterNames() {
    List<String> names = new ArrayList<>(List.of("constant"));
    names.addAll(weightNames(scaling.names()));
    names.add("scale");
    return List.copyOf(names);
  }

  /** The names of the weights of these inputs, in the order of the parameters. */
  public static List<String> weightNames(List<String> inputs) {
    List<String> names = new ArrayList<>();
    for (int i = 0; i < inputs.size(); i++) {
      names.add("weight:" + inputs.get(i));
      for (int j = i + 1; j < inputs.size(); j++) {
        names.add("weight:" + inputs.get(i) + "*" + inputs.get(j));
      }
    }
    return names;
  }

  @Override
  public double[] parameters() {
    double[] all = new double[weights.length + 2];
    all[0] = constant;
    System.arraycopy(weights, 0, all, 1, weights.length);
    all[weights.length + 1] = scale;
    return all;
  }

  @Override
  public GeneralisedLeontief withParameters(double[] parameters) {
    scaling.require(parameters, weights.length + 2, "parameters");
    double[] raw = Arrays.copyOfRange(parameters, 1, 1 + weights.length);
    return new GeneralisedLeontief(
        scaling,
        parameters[0],
        divided(raw, sum(scaling.size(), raw)),
        parameters[weights.length + 1]);
  }

  @Override
  public GeneralisedLeontief shifted(double logShift) {
    return new GeneralisedLeontief(scaling, constant + logShift, weights, scale);
  }

  @Override
  public double logOutput(double[] logInputs) {
    Terms terms = new Terms(logInputs);
    return constant + scale * terms.logSum();
  }

  @Override
  public void logGradient(double[] logInputs, double[] into) {
    Terms terms = new Terms(logInputs);
    for (int i = 0; i < into.length; i++) {
      into[i] = scale * terms.share(i);
    }
  }

  @Override
  public void logHessian(double[] logInputs, double[][] into) {
    int n = scaling.size();
    Terms terms = new Terms(logInputs);
    for (int i = 0; i < n; i++) {
      into[i][i] = 0;
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double own = 0.5 * terms.product(i, j) / terms.sum;
        double entry = scale * (own - terms.share(i) * terms.share(j));
        into[i][j] = entry;
        into[j][i] = entry;
        into[i][i] -= entry;
        into[j][j] -= entry;
      }
    }
  }

  @Override
  public void parameterGradient(double[] logInputs, double[] into) {
    int n = scaling.size();
    Terms terms = new Terms(logInputs);
    into[0] = 1;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        double times = i == j ? 1 : 2;
        into[1 + place(n, i, j)] = scale * times * (terms.root(i, j) / terms.sum - 1);
      }
    }
    into[weights.length + 1] = terms.logSum();
  }

  /** S at a mix, everything relative to the largest input so that nothing overflows. */
  private final class Terms {

    private final double[] half;
    private final double largest;

    private final double[] shares;
    private final double sum;

    Terms(double[] logInputs) {
      int n = scaling.size();
      double top = Double.NEGATIVE_INFINITY;
      half = new double[n];
      for (int i = 0; i < n; i++) {
        half[i] = logInputs[i] - scaling.logBase()[i];
        top = Math.max(top, half[i]);
      }
      largest = top;
      for (int i = 0; i < n; i++) {
        half[i] = Math.exp((half[i] - top) / 2);
      }
      shares = new double[n];
      double all = 0;
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          shares[i] += product(i, j);
        }
        all += shares[i];
      }
      sum = all;
    }

    /** √(u_i u_j) relative to the largest input. */
    double root(int i, int j) {
      return half[i] * half[j];
    }

    double product(int i, int j) {
      return weights[place(half.length, i, j)] * root(i, j);
    }

    double share(int i) {
      return sum > 0 ? shares[i] / sum : Double.NaN;
    }

    double logSum() {
      return sum > 0 ? largest + Math.log(sum) : Double.NaN;
    }
  }
}

package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Translog: ln Q = constant + Σ_i β_i z_i + ½ Σ_i Σ_j β_ij z_i z_j, β_ij = β_ji, z_i = ln x_i − ln
 * base_i.
 *
 * <p>Mind the ½: a second-order coefficient is a second derivative. The first-order coefficients
 * are output elasticities only at the base. Parameters: {@code constant}, one named after each
 * input, then for i ≤ j {@code i*j} in the order (1,1), (1,2), …, (1,n), (2,2), …
 *
 * <p>Source: Christensen, L. R., Jorgenson, D. W. and Lau, L. J. (1973), Transcendental Logarithmic
 * Production Frontiers, <i>Review of Economics and Statistics</i> 55, 28–45.
 *
 * <p>Tested in {@code TranslogTest} and {@code PublishedTechnologiesTest}.
 */
public final class Translog implements Technology {

  /** How the form presents itself to an estimator. */
  public static final LinearForm FORM = new Description();

  private final InputScale scaling;
  private final double constant;

  /** β, then β_ij for i ≤ j. */
  private final double[] coefficients;

  /**
   * With inputs divided by a base.
   *
   * @param base shape n, positive
   * @param coefficients β (n), then β_ij for i ≤ j row by row (n(n + 1)/2)
   */
  public Translog(List<String> inputs, double[] base, double constant, double[] coefficients) {
    this(new InputScale(inputs, base), constant, coefficients);
  }

  private Translog(InputScale scaling, double constant, double[] coefficients) {
    int n = scaling.size();
    scaling.require(coefficients, n + n * (n + 1) / 2, "coefficients");
    this.scaling = scaling;
    this.constant = constant;
    this.coefficients = coefficients.clone();
  }

  /** The place of β_ij (either order) among the coefficients of a translog with n inputs. */
  public static int place(int n, int i, int j) {
    int a = Math.min(i, j);
    int b = Math.max(i, j);
    return n + a * n - a * (a - 1) / 2 + (b - a);
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
    names.addAll(FORM.coefficientNames(scaling.names()));
    return List.copyOf(names);
  }

  @Override
  public double[] parameters() {
    double[] all = new double[1 + coefficients.length];
    all[0] = constant;
    System.arraycopy(coefficients, 0, all, 1, coefficients.length);
    return all;
  }

  @Override
  public Translog withParameters(double[] parameters) {
    scaling.require(parameters, 1 + coefficients.length, "parameters");
    return new Translog(
        scaling, parameters[0], Arrays.copyOfRange(parameters, 1, parameters.length));
  }

  @Override
  public Translog shifted(double logShift) {
    return new Translog(scaling, constant + logShift, coefficients);
  }

  @Override
  public double logOutput(double[] logInputs) {
    double[] logBase = scaling.logBase();
    int n = logBase.length;
    double sum = constant;
    int k = n;
    for (int i = 0; i < n; i++) {
      double zi = logInputs[i] - logBase[i];
      double slope = coefficients[i] + 0.5 * coefficients[k++] * zi;
      for (int j = i + 1; j < n; j++) {
        slope += coefficients[k++] * (logInputs[j] - logBase[j]);
      }
      sum += slope * zi;
    }
    return sum;
  }

  @Override
  public void logGradient(double[] logInputs, double[] into) {
    double[] logBase = scaling.logBase();
    int n = logBase.length;
    System.arraycopy(coefficients, 0, into, 0, n);
    int k = n;
    for (int i = 0; i < n; i++) {
      double zi = logInputs[i] - logBase[i];
      into[i] += coefficients[k++] * zi;
      for (int j = i + 1; j < n; j++) {
        double b = coefficients[k++];
        into[i] += b * (logInputs[j] - logBase[j]);
        into[j] += b * zi;
      }
    }
  }

  @Override
  public void logHessian(double[] logInputs, double[][] into) {
    int n = scaling.size();
    int k = n;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        double b = coefficients[k++];
        into[i][j] = b;
        into[j][i] = b;
      }
    }
  }

  @Override
  public void parameterGradient(double[] logInputs, double[] into) {
    double[] logBase = scaling.logBase();
    int n = logBase.length;
    into[0] = 1;
    int k = n + 1;
    for (int i = 0; i < n; i++) {
      double zi = logInputs[i] - logBase[i];
      into[i + 1] = zi;
      into[k++] = 0.5 * zi * zi;
      for (int j = i + 1; j < n; j++) {
        into[k++] = zi * (logInputs[j] - logBase[j]);
      }
    }
  }

  private static final class Description implements LinearForm {

    @Override
    public String name() {
      return "translog";
    }

    @Override
    public List<String> coefficientNames(List<String> inputs) {
      List<String> names = new ArrayList<>(inputs);
      for (int i = 0; i < inputs.size(); i++) {
        for (int j = i; j < inputs.size(); j++) {
          names.add(inputs.get(i) + "*" + inputs.get(j));
        }
      }
      return List.copyOf(names);
    }

    @Override
    public void regressors(double[][] z, int rows, double[][] into, int offset) {
      int k = offset + z.length;
      for (int i = 0; i < z.length; i++) {
        double[] zi = z[i];
        System.arraycopy(zi, 0, into[offset + i], 0, rows);
        for (int j = i; j < z.length; j++) {
          double[] zj = z[j];
          double[] product = into[k++];
          double factor = i == j ? 0.5 : 1;
          for (int r = 0; r < rows; r++) {
            product[r] = factor * zi[r] * zj[r];
          }
        }
      }
    }

    @Override
    public int[] firstOrder(int inputs) {
      int[] places = new int[inputs];
      Arrays.setAll(places, i -> i);
      return places;
    }

    @Override
    public Technology technology(
        List<String> inputs, double[] base, double constant, double[] coefficients) {
      return new Translog(inputs, base, constant, coefficients);
    }

    /**
     * Σ_j β_ij = 0 for every i: the scale elasticity is Σ β_i at every mix; with Σ_i β_i = 1
     * besides returns are constant. That the cheapest proportions do not depend on scale
     * (homothetic) is not linear: {@link HomotheticTranslog}.
     */
    @Override
    public double[][] restrictions(Restriction restriction, List<String> inputs) {
      int n = inputs.size();
      if (restriction == Restriction.HOMOTHETIC) {
        return new double[0][];
      }
      int k = n + n * (n + 1) / 2;
      double[][] rows = new double[n + 1][k + 1];
      Arrays.fill(rows[0], 0, n, 1);
      rows[0][k] = 1;
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          rows[i + 1][place(n, i, j)] = 1;
        }
      }
      return restriction == Restriction.CONSTANT_RETURNS
          ? rows
          : Arrays.copyOfRange(rows, 1, n + 1);
    }

    /**
     * For homotheticity: r_i β_p − r_p β_i for i ≠ p, r_i = Σ_j β_ij, p the input of the largest
     * |β|.
     */
    @Override
    public Departure departure(Restriction restriction, List<String> inputs, double[] parameters) {
      return restriction == Restriction.HOMOTHETIC
          ? HomotheticTranslog.departure(inputs.size(), parameters)
          : LinearForm.super.departure(restriction, inputs, parameters);
    }

    @Override
    public Form restricted(Restriction restriction) {
      return restriction == Restriction.HOMOTHETIC
          ? new HomotheticTranslog()
          : new RestrictedLinearForm(this, restriction);
    }

    @Override
    public boolean obeys(Restriction restriction) {
      return false;
    }

    @Override
    public int[] secondOrder(int n) {
      int[] places = new int[n * (n + 1) / 2];
      Arrays.setAll(places, p -> n + p);
      return places;
    }
  }
}

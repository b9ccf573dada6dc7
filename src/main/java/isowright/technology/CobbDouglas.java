package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Cobb-Douglas: ln Q = constant + Σ_i β_i z_i, z_i = ln x_i − ln base_i.
 *
 * <p>Output elasticities are the constants β_i, the scale elasticity their sum, every elasticity of
 * substitution 1. Parameters: {@code constant}, then one named after each input.
 *
 * <p>Source: Cobb, C. W. and Douglas, P. H. (1928), A Theory of Production, <i>American Economic
 * Review</i> 18 (supplement), 139–165.
 *
 * <p>Tested in {@code CobbDouglasTest}.
 */
public final class CobbDouglas implements Technology {

  /** How the form presents itself to an estimator. */
  public static final LinearForm FORM = new Description();

  private final InputScale scaling;
  private final double constant;
  private final double[] coefficients;

  /**
   * With inputs in their own units (base of ones).
   *
   * @param coefficients β, shape n
   */
  public static CobbDouglas of(List<String> inputs, double constant, double... coefficients) {
    return new CobbDouglas(InputScale.ownUnits(inputs), constant, coefficients);
  }

  /**
   * With inputs divided by a base.
   *
   * @param base shape n, positive
   * @param coefficients β, shape n
   */
  public CobbDouglas(List<String> inputs, double[] base, double constant, double[] coefficients) {
    this(new InputScale(inputs, base), constant, coefficients);
  }

  private CobbDouglas(InputScale scaling, double constant, double[] coefficients) {
    scaling.require(coefficients, scaling.size(), "coefficients");
    this.scaling = scaling;
    this.constant = constant;
    this.coefficients = coefficients.clone();
  }

  /** The output elasticities β, shape n. */
  public double[] coefficients() {
    return coefficients.clone();
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
    names.addAll(scaling.names());
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
  public CobbDouglas withParameters(double[] parameters) {
    scaling.require(parameters, 1 + coefficients.length, "parameters");
    return new CobbDouglas(
        scaling, parameters[0], Arrays.copyOfRange(parameters, 1, parameters.length));
  }

  @Override
  public CobbDouglas shifted(double logShift) {
    return new CobbDouglas(scaling, constant + logShift, coefficients);
  }

  @Override
  public double logOutput(double[] logInputs) {
    double[] logBase = scaling.logBase();
    double sum = constant;
    for (int i = 0; i < coefficients.length; i++) {
      sum += coefficients[i] * (logInputs[i] - logBase[i]);
    }
    return sum;
  }

  @Override
  public void logGradient(double[] logInputs, double[] into) {
    System.arraycopy(coefficients, 0, into, 0, coefficients.length);
  }

  @Override
  public void logHessian(double[] logInputs, double[][] into) {
    for (int i = 0; i < coefficients.length; i++) {
      Arrays.fill(into[i], 0, coefficients.length, 0);
    }
  }

  @Override
  public void parameterGradient(double[] logInputs, double[] into) {
    double[] logBase = scaling.logBase();
    into[0] = 1;
    for (int i = 0; i < coefficients.length; i++) {
      into[i + 1] = logInputs[i] - logBase[i];
    }
  }

  /** The closed form, where every output elasticity is positive. */
  @Override
  public Optional<ConditionalDemand> conditionalDemand() {
    for (double coefficient : coefficients) {
      if (!(coefficient > 0)) {
        return Optional.empty();
      }
    }
    return Optional.of(new CobbDouglasDemand(scaling.logBase(), constant, coefficients));
  }

  private static final class Description implements LinearForm {

    @Override
    public String name() {
      return "cobb-douglas";
    }

    @Override
    public List<String> coefficientNames(List<String> inputs) {
      return List.copyOf(inputs);
    }

    @Override
    public void regressors(double[][] z, int rows, double[][] into, int offset) {
      for (int i = 0; i < z.length; i++) {
        System.arraycopy(z[i], 0, into[offset + i], 0, rows);
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
      return new CobbDouglas(inputs, base, constant, coefficients);
    }

    /** Σ_i β_i = 1 for constant returns; the weaker restrictions always hold. */
    @Override
    public double[][] restrictions(Restriction restriction, List<String> inputs) {
      if (restriction != Restriction.CONSTANT_RETURNS) {
        return new double[0][];
      }
      double[] row = new double[inputs.size() + 1];
      Arrays.fill(row, 1);
      return new double[][] {row};
    }

    @Override
    public Form restricted(Restriction restriction) {
      return obeys(restriction) ? this : new RestrictedLinearForm(this, restriction);
    }

    @Override
    public boolean obeys(Restriction restriction) {
      return restriction != Restriction.CONSTANT_RETURNS;
    }

    @Override
    public int[] secondOrder(int inputs) {
      return new int[0];
    }
  }
}

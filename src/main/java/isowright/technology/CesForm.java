package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * How constant elasticity of substitution presents itself to an estimator.
 *
 * <p>Inner parameters: the scale ν (unless returns are held constant), then the log ratios θ_i =
 * ln(δ_i/δ_n), i &lt; n ({@link LogRatios}). The model is smooth in θ everywhere, and θ has no
 * unit; a share that wants to be zero or negative shows as a θ without bound, which {@link
 * #admissible} reports. With z, w, E as in {@link PowerMean} and t = −ρ:
 *
 * <pre>  h = ν M(t),   ∂h/∂θ_i = ν (p_i − δ_i)/t = ν δ_i (e^{x_i} − 1 − w)/(E t),
 *  ∂h/∂ν = M(t),   ∂h/∂ρ = −ν M′(t) </pre>
 *
 * <p>Tested in {@code CesFormTest}.
 */
final class CesForm implements NonlinearForm {

  /** The least part of the summed coefficients that a start gives to an input. */
  private static final double SMALLEST_START = 0.02;

  private final boolean constantReturns;

  /**
   * @param constantReturns whether ν is held at one
   */
  CesForm(boolean constantReturns) {
    this.constantReturns = constantReturns;
  }

  @Override
  public String name() {
    return "ces";
  }

  @Override
  public Form restricted(Restriction restriction) {
    return restriction == Restriction.CONSTANT_RETURNS ? new CesForm(true) : this;
  }

  @Override
  public boolean regularByForm() {
    return true;
  }

  @Override
  public boolean obeys(Restriction restriction) {
    return restriction != Restriction.CONSTANT_RETURNS || constantReturns;
  }

  @Override
  public double[][] restrictions(Restriction restriction, List<String> inputs) {
    return Form.lastIsOne(restriction, constantReturns, inputs.size() + 3);
  }

  @Override
  public List<String> innerNames(List<String> inputs) {
    List<String> names = new ArrayList<>();
    if (!constantReturns) {
      names.add("scale");
    }
    names.addAll(LogRatios.names(inputs));
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
    double[] start = start(cobbDouglasCoefficients);
    return List.of(constantReturns ? Arrays.copyOfRange(start, 1, start.length) : start);
  }

  /** The scale and the log ratios. */
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
    double[][] all = derivatives;
    if (constantReturns) {
      all = new double[derivatives.length + 1][];
      all[0] = new double[rows];
      System.arraycopy(derivatives, 0, all, 1, derivatives.length);
    }
    CesRows block = new CesRows(z, shares(inner), scale(inner), -curvatures[0], value, all);
    for (int from = 0; from < rows; from += CesRows.BLOCK) {
      block.evaluate(from, Math.min(CesRows.BLOCK, rows - from));
    }
  }

  @Override
  public boolean admissible(double[] inner) {
    double scale = scale(inner);
    return scale > 0 && scale < Double.POSITIVE_INFINITY && LogRatios.admissible(shares(inner));
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures) {
    return new Ces(
        new InputScale(inputs, base), constant, shares(inner), curvatures[0], scale(inner));
  }

  /** The shares follow from the ratios; constant, ρ and scale are carried over as they are. */
  @Override
  public double[][] reported(double[] inner, double[] curvatures) {
    int columns = inner.length + 2;
    List<double[]> rows = new ArrayList<>();
    rows.add(unit(columns, 0));
    rows.addAll(LogRatios.slopes(shares(inner), columns, constantReturns ? 1 : 2));
    rows.add(unit(columns, columns - 1));
    rows.add(constantReturns ? new double[columns] : unit(columns, 1));
    return rows.toArray(double[][]::new);
  }

  /** A row with a one. */
  static double[] unit(int size, int at) {
    double[] unit = new double[size];
    unit[at] = 1;
    return unit;
  }

  private double scale(double[] inner) {
    return constantReturns ? 1 : inner[0];
  }

  private double[] shares(double[] inner) {
    int first = constantReturns ? 0 : 1;
    return LogRatios.shares(inner, first, inner.length - first + 1);
  }
}

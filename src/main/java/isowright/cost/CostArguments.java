package isowright.cost;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What a cost function depends on, in the order used everywhere: prices of the variable inputs,
 * outputs, quantities of fixed inputs, and time.
 *
 * <p>A point v holds the natural logs of prices, outputs and fixed quantities, then the period
 * itself where time is among the arguments; shape A = n + m + f (+ 1). What is divided out before
 * logs is the base, so z = v − ln base, and z = t for time.
 *
 * @param inputs the n variable inputs, whose prices are arguments
 * @param outputs the m outputs
 * @param fixed the f fixed inputs
 * @param time whether the period is an argument
 * @param base what each is divided by before logs, shape n + m + f, positive; copied
 */
public record CostArguments(
    List<String> inputs, List<String> outputs, List<String> fixed, boolean time, double[] base) {

  /** The name of time among the arguments. */
  public static final String TREND = "trend";

  /** Copies and checks. */
  public CostArguments {
    inputs = List.copyOf(inputs);
    outputs = List.copyOf(outputs);
    fixed = List.copyOf(fixed);
    base = base.clone();
    if (inputs.isEmpty() || base.length != inputs.size() + outputs.size() + fixed.size()) {
      throw new IllegalArgumentException(
          "base has " + base.length + " values for " + inputs + ", " + outputs + ", " + fixed);
    }
    for (double each : base) {
      if (!(each > 0) || Double.isInfinite(each)) {
        throw new IllegalArgumentException("base is " + each + "; it must be positive");
      }
    }
  }

  /** Arguments in their own units. */
  public static CostArguments ownUnits(
      List<String> inputs, List<String> outputs, List<String> fixed, boolean time) {
    double[] ones = new double[inputs.size() + outputs.size() + fixed.size()];
    Arrays.fill(ones, 1);
    return new CostArguments(inputs, outputs, fixed, time, ones);
  }

  @Override
  public double[] base() {
    return base.clone();
  }

  /** The number of arguments, A. */
  public int size() {
    return base.length + (time ? 1 : 0);
  }

  /** The names of the arguments, in order. */
  public List<String> names() {
    List<String> names = new ArrayList<>(inputs);
    names.addAll(outputs);
    names.addAll(fixed);
    if (time) {
      names.add(TREND);
    }
    return List.copyOf(names);
  }

  /** Whether argument k is a price. */
  public boolean price(int k) {
    return k >= 0 && k < inputs.size();
  }

  /** Whether argument k is an output. */
  public boolean output(int k) {
    return k >= inputs.size() && k < inputs.size() + outputs.size();
  }

  /** Whether argument k is a fixed input. */
  public boolean fixedInput(int k) {
    return k >= inputs.size() + outputs.size() && k < base.length;
  }

  /** z = v − ln base; a new array. */
  public double[] scaled(double[] v) {
    double[] z = v.clone();
    for (int k = 0; k < base.length; k++) {
      z[k] -= Math.log(base[k]);
    }
    return z;
  }

  /**
   * The point of these prices, outputs and fixed quantities (in their own units) and this period.
   */
  public double[] point(double[] prices, double[] produced, double[] held, double period) {
    double[] v = new double[size()];
    for (int i = 0; i < prices.length; i++) {
      v[i] = Math.log(prices[i]);
    }
    for (int i = 0; i < produced.length; i++) {
      v[inputs.size() + i] = Math.log(produced[i]);
    }
    for (int i = 0; i < held.length; i++) {
      v[inputs.size() + outputs.size() + i] = Math.log(held[i]);
    }
    if (time) {
      v[v.length - 1] = period;
    }
    return v;
  }
}

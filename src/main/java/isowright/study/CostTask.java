package isowright.study;

import isowright.cost.CostArguments;
import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.cost.LongRunCost;
import isowright.cost.RationedCost;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * A least-cost question as it is put to a cost function: where prices and targets are, which
 * quantities are held, and which fixed inputs may be chosen because they have a price.
 *
 * <p>Quantities are told in one order: the n variable inputs, then the fixed ones. Held variable
 * inputs are answered by virtual prices ({@link RationedCost}), fixed inputs that have a price and
 * are not held by what they save of variable cost ({@link LongRunCost}).
 *
 * @param arguments what the cost function depends on
 * @param v the point, target included; fixed inputs at what they are where nothing else is said
 * @param fixedPrices prices of the fixed inputs; NaN where not stated
 * @param low the least of each quantity, shape n + f; equal to the most where it is held
 * @param high the most of each quantity
 * @param from the logs from which on a fixed input is looked for, shape f
 * @param to the logs up to which it is looked for
 */
record CostTask(
    CostArguments arguments,
    double[] v,
    double[] fixedPrices,
    double[] low,
    double[] high,
    double[] from,
    double[] to) {

  /**
   * How a question is settled: which quantities are bound, and where.
   *
   * @param v the point at the prices paid, free fixed inputs as chosen
   * @param at the point at virtual prices; v where no variable input is bound
   * @param bound the quantities that are bound, NaN for the others
   * @param limited whether a limit binds beside what is held
   * @param departure how far free fixed inputs are from first-order conditions, relatively
   * @param reason why there is no answer; empty where there is one
   */
  record Settled(
      double[] v,
      double[] at,
      double[] bound,
      boolean limited,
      double departure,
      Optional<String> reason) {}

  int inputs() {
    return arguments.inputs().size();
  }

  /** The place of the output. */
  int output() {
    return inputs();
  }

  private int fixedPlace(int f) {
    return inputs() + arguments.outputs().size() + f;
  }

  /** The names of the quantities. */
  List<String> names() {
    List<String> names = new ArrayList<>(arguments.inputs());
    names.addAll(arguments.fixed());
    return names;
  }

  /** The same with nothing held or limited that could be chosen. */
  CostTask free() {
    double[] least = low.clone();
    double[] most = high.clone();
    for (int q = 0; q < low.length; q++) {
      boolean chosen = q < inputs() || !Double.isNaN(fixedPrices[q - inputs()]);
      if (chosen && low[q] == high[q]) {
        least[q] = 0;
        most[q] = Double.POSITIVE_INFINITY;
      }
    }
    return new CostTask(arguments, v, fixedPrices, least, most, from, to);
  }

  /** The same with a quantity held. */
  CostTask holding(int q, double quantity) {
    double[] least = low.clone();
    double[] most = high.clone();
    least[q] = quantity;
    most[q] = quantity;
    return new CostTask(arguments, v, fixedPrices, least, most, from, to);
  }

  /** Whether a quantity is held. */
  boolean held(int q) {
    return low[q] == high[q];
  }

  /** The answer of a cost function for a target. */
  Settled settle(CostFunction f, double target) {
    double[] bound = new double[low.length];
    for (int q = 0; q < bound.length; q++) {
      bound[q] = held(q) ? low[q] : Double.NaN;
    }
    boolean limited = false;
    for (int round = 0; round <= bound.length; round++) {
      Settled settled = solve(f, target, bound, limited);
      if (settled.reason().isPresent()) {
        return settled;
      }
      double[] quantities = quantities(f, settled.v(), settled.at());
      int worst = -1;
      double most = 1e-9; // rounding of the quantities, relative
      for (int q = 0; q < bound.length; q++) {
        double off = Math.max(quantities[q] / high[q] - 1, 1 - quantities[q] / low[q]);
        if (Double.isNaN(bound[q]) && off > most) {
          worst = q;
          most = off;
        }
      }
      if (worst < 0) {
        return settled;
      }
      bound[worst] = quantities[worst] > high[worst] ? high[worst] : low[worst];
      limited = true;
    }
    return lost(target, bound, "the limits could not be settled");
  }

  private double[] at(double target) {
    double[] point = v.clone();
    point[output()] = Math.log(target);
    return point;
  }

  private Settled lost(double target, double[] bound, String reason) {
    double[] point = at(target);
    return new Settled(point, point, bound, false, Double.NaN, Optional.of(reason));
  }

  private Settled solve(CostFunction f, double target, double[] bound, boolean limited) {
    double[] point = at(target);
    double departure = 0;
    int[] free = freeFixed(bound);
    int[] held = IntStream.range(0, inputs()).filter(q -> !Double.isNaN(bound[q])).toArray();
    for (int k = 0; k < arguments.fixed().size(); k++) {
      if (!Double.isNaN(bound[inputs() + k])) {
        point[fixedPlace(k)] = Math.log(bound[inputs() + k]);
      }
    }
    if (free.length > 0 && held.length > 0) {
      return lost(
          target,
          bound,
          "a fixed input is to be chosen while a variable one is held or limited, which is not"
              + " answered; hold the fixed one");
    }
    if (free.length > 0) {
      Optional<LongRunCost.Best> best =
          longRun(f, point, free).between(pick(from, free), pick(to, free));
      if (best.isEmpty()) {
        return lost(
            target, bound, "total cost has no least in " + named(free) + " near what is recorded");
      }
      put(point, free, best.get().logs());
      departure = best.get().departure();
    }
    double there = departure;
    return virtual(f, point, bound, held)
        .map(at -> new Settled(point, at, bound.clone(), limited, there, Optional.empty()))
        .orElseGet(() -> lost(target, bound, "no prices lead to the quantities held or limited"));
  }

  private String named(int[] free) {
    return String.join(", ", Arrays.stream(free).mapToObj(k -> arguments.fixed().get(k)).toList());
  }

  private int[] freeFixed(double[] bound) {
    return IntStream.range(0, arguments.fixed().size())
        .filter(k -> Double.isNaN(bound[inputs() + k]) && !Double.isNaN(fixedPrices[k]))
        .toArray();
  }

  private LongRunCost longRun(CostFunction f, double[] point, int[] free) {
    int[] places = Arrays.stream(free).map(this::fixedPlace).toArray();
    return new LongRunCost(f, point, places, pick(fixedPrices, free));
  }

  private void put(double[] point, int[] free, double[] logs) {
    for (int k = 0; k < free.length; k++) {
      point[fixedPlace(free[k])] = logs[k];
    }
  }

  private static double[] pick(double[] values, int[] places) {
    return Arrays.stream(places).mapToDouble(k -> values[k]).toArray();
  }

  private static Optional<double[]> virtual(
      CostFunction f, double[] point, double[] bound, int[] held) {
    if (held.length == 0) {
      return Optional.of(point);
    }
    double[] logs = Arrays.stream(held).mapToDouble(q -> Math.log(bound[q])).toArray();
    return new RationedCost(f, point, held, logs).point();
  }

  private double[] quantities(CostFunction f, double[] point, double[] at) {
    double[] all = Arrays.copyOf(CostElasticities.at(f, at).demands(), low.length);
    for (int k = 0; k < arguments.fixed().size(); k++) {
      all[inputs() + k] = Math.exp(point[fixedPlace(k)]);
    }
    return all;
  }

  /** Cost, marginal cost, average cost, quantities: of a cost function near the one settled. */
  double[] numbers(CostFunction f, Settled settled) {
    double[] point = settled.v().clone();
    int[] free = freeFixed(settled.bound());
    if (free.length > 0) {
      double[] start = Arrays.stream(free).mapToDouble(k -> point[fixedPlace(k)]).toArray();
      put(point, free, longRun(f, point, free).near(start));
    }
    double[] missing = new double[3 + low.length];
    Arrays.fill(missing, Double.NaN);
    int[] held =
        IntStream.range(0, inputs()).filter(q -> !Double.isNaN(settled.bound()[q])).toArray();
    return virtual(f, point, settled.bound(), held)
        .map(at -> numbers(f, point, at, held))
        .orElse(missing);
  }

  private double[] numbers(CostFunction f, double[] point, double[] at, int[] held) {
    double[] quantities = quantities(f, point, at);
    double target = Math.exp(point[output()]);
    CostElasticities there = CostElasticities.at(f, at);
    double cost = there.cost();
    for (int h : held) {
      cost += (Math.exp(point[h]) - Math.exp(at[h])) * quantities[h];
    }
    for (int k = 0; k < fixedPrices.length; k++) {
      cost += Double.isNaN(fixedPrices[k]) ? 0 : fixedPrices[k] * quantities[inputs() + k];
    }
    double[] all = new double[3 + quantities.length];
    all[0] = cost;
    all[1] = there.marginalCost(0, target);
    all[2] = cost / target;
    System.arraycopy(quantities, 0, all, 3, quantities.length);
    return all;
  }
}

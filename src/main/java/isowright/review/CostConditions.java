package isowright.review;

import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What would have to be true for a filed cost F to be the cost that a cost function says? One thing
 * at a time: the root of ln C(v) − ln F in the log of one price, or, where there is one output, in
 * that of productivity A with C(w, y/A). As in {@link Conditions} the search goes from a hundredth
 * to a hundred times what is, but only as far as the function is a cost function (shares and
 * marginal cost positive, concave in prices).
 *
 * <p>Uncertainty by the implicit function: se(ln v) = se(ln C)/|∂ln C/∂ln v| at the root. Tested in
 * {@code CostGapsTest}.
 */
public final class CostConditions {

  private final CostFunction function;
  private final Propagation<CostFunction> propagation;

  private CostConditions(CostFunction function, Propagation<CostFunction> propagation) {
    this.function = function;
    this.propagation = propagation;
  }

  /** Conditions on this cost function, whose parameters are this sure. */
  public static CostConditions on(CostFunction function, Propagation<CostFunction> propagation) {
    return new CostConditions(function, propagation);
  }

  /**
   * Every price in turn, then productivity.
   *
   * @param point the arguments of the cost function
   * @param filed F
   */
  public List<Condition> of(double[] point, double filed) {
    List<Condition> all = new ArrayList<>();
    int n = function.arguments().inputs().size();
    for (int i = 0; i < n; i++) {
      String input = function.arguments().inputs().get(i);
      all.add(along(Condition.Kind.PRICE, input, point, i, 1, Math.exp(point[i]), filed));
    }
    if (function.arguments().outputs().size() == 1) {
      all.add(along(Condition.Kind.PRODUCTIVITY, "", point, n, -1, 1, filed));
    }
    return all;
  }

  /** Along one argument; sign −1 where the thing asked for divides it. */
  private Condition along(
      Condition.Kind kind,
      String input,
      double[] point,
      int argument,
      int sign,
      double asIs,
      double filed) {
    double target = Math.log(filed);
    double now = function.logCost(point);
    boolean up = (target > now) == (sign > 0);
    double factor = Math.log(Conditions.FACTOR);
    LogRoot root =
        LogRoot.from(
            by -> logCost(moved(point, argument, sign * by)) - target, 0, up ? factor : -factor);
    double value = asIs * Math.exp(root.at());
    Optional<Estimate> estimate = Optional.empty();
    if (root.state() == LogRoot.State.FOUND) {
      double[] there = moved(point, argument, sign * root.at());
      double[] gradient = new double[there.length];
      function.gradient(there, gradient);
      double error =
          propagation.standardError(propagation.gradients(f -> new double[] {f.logCost(there)})[0]);
      estimate =
          Optional.of(
              propagation.estimate(value, value * error / Math.abs(gradient[argument]), Scale.LOG));
    }
    return new Condition(
        kind,
        input,
        asIs,
        estimate,
        asIs / Conditions.FACTOR,
        asIs * Conditions.FACTOR,
        Math.exp(root.value()) * filed,
        value,
        root.state() != LogRoot.State.NO_VALUE);
  }

  /** ln C where the function is a cost function; NaN elsewhere. */
  private double logCost(double[] v) {
    CostElasticities at = CostElasticities.at(function, v);
    return at.monotone() && at.concave() ? function.logCost(v) : Double.NaN;
  }

  private static double[] moved(double[] point, int argument, double by) {
    double[] moved = point.clone();
    moved[argument] += by;
    return moved;
  }
}

package isowright.leastcost;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/**
 * What does least cost do as the target grows? The plans of one question over a span of targets;
 * its mixes are the expansion path. With held inputs it is the short-run curve.
 *
 * <p>Shapes: m targets, ascending, and as many plans; a target without an answer has a plan that
 * says why.
 *
 * @param targets the outputs Q
 * @param plans the plan of each
 */
public record CostCurve(double[] targets, List<Plan> plans) {

  /** Copies the array and the list. */
  public CostCurve {
    targets = targets.clone();
    plans = List.copyOf(plans);
    if (targets.length != plans.size()) {
      throw new IllegalArgumentException(
          targets.length + " targets and " + plans.size() + " plans: there must be one plan each");
    }
  }

  /**
   * The curve over a span.
   *
   * @param question prices, limits and held inputs; its target is not used
   * @param from the first target, positive
   * @param to the last target, above the first
   * @param points how many, evenly spaced; two or more
   */
  public static CostCurve of(
      LeastCost leastCost, Question question, double from, double to, int points) {
    if (!(from > 0) || !(to > from) || Double.isInfinite(to) || points < 2) {
      throw new IllegalArgumentException(
          "curve from "
              + from
              + " to "
              + to
              + " in "
              + points
              + " points: give a positive first target, a larger last one and two points or more");
    }
    double[] targets = new double[points];
    for (int k = 0; k < points; k++) {
      targets[k] = k == points - 1 ? to : from + (to - from) * k / (points - 1);
    }
    return at(leastCost, question, targets);
  }

  /**
   * The curve at given targets, ascending.
   *
   * @param question prices, limits and held inputs; its target is not used
   */
  public static CostCurve at(LeastCost leastCost, Question question, double... targets) {
    List<Plan> plans = new ArrayList<>(targets.length);
    for (int k = 0; k < targets.length; k++) {
      Question here = question.at(targets[k]);
      plans.add(k == 0 ? leastCost.plan(here) : leastCost.plan(here, plans.get(k - 1)));
    }
    return new CostCurve(targets, plans);
  }

  @Override
  public double[] targets() {
    return targets.clone();
  }

  /** The number of targets. */
  public int size() {
    return targets.length;
  }

  /** Target k. */
  public double target(int k) {
    return targets[k];
  }

  /** The plan of target k. */
  public Plan plan(int k) {
    return plans.get(k);
  }

  /** Average cost C/Q at target k; NaN where there is no answer. */
  public double averageCost(int k) {
    return plans.get(k).cost() / targets[k];
  }

  /** Where average cost is least among the targets with an answer; empty where none has one. */
  public OptionalInt leastAverageCost() {
    int least = -1;
    for (int k = 0; k < targets.length; k++) {
      if (plans.get(k).answered() && (least < 0 || averageCost(k) < averageCost(least))) {
        least = k;
      }
    }
    return least < 0 ? OptionalInt.empty() : OptionalInt.of(least);
  }
}

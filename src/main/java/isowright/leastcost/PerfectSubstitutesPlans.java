package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.ConditionalDemand.PerfectSubstitutes;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Plans for perfect substitutes, Q = (Σ a_i x_i)^ν: the target needs Y = Σ a_i x_i = Q^{1/ν}, and
 * what is cheapest per unit of Y is taken first, up to its limit, then the next. Marginal cost is
 * the price per unit of Y of the input that more output would take, times dY/dQ = Y/(ν Q).
 */
final class PerfectSubstitutesPlans implements Plans {

  /** Prices per unit of Y this close are the same to rounding: the mix is then one of many. */
  private static final double SAME = 1e-12;

  /** The quantity at which the marginal product of an unused input is taken, by share of cost. */
  private static final double TRACE = 1e-9;

  private final Technology technology;
  private final double[] worth;
  private final double scale;

  PerfectSubstitutesPlans(Technology technology, PerfectSubstitutes demand) {
    this.technology = technology;
    this.worth = demand.worth();
    this.scale = demand.scale();
  }

  @Override
  public Plan plan(Question question, Optional<Plan> near) {
    int n = worth.length;
    double needed = Math.pow(question.target(), 1 / scale);
    double most = 0;
    double left = needed;
    double[] mix = question.low();
    Integer[] order = new Integer[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
      most += worth[i] * question.high(i);
      left -= worth[i] * mix[i];
    }
    if (most < needed * (1 - Feasibility.EXACT)) {
      LogQuestion asked = new LogQuestion(question);
      String reason =
          Feasibility.outOfReach(technology.inputs(), asked, scale * Math.log(most), true);
      return Answer.none(Status.INFEASIBLE, reason);
    }
    if (left < -Feasibility.EXACT * needed) {
      double[] z = new LogQuestion(question).logLow;
      byte[] low = new byte[n];
      Arrays.fill(low, ActiveLimits.LOW);
      return new Answer(technology, question, Math.log(question.target()), z, low).slack();
    }
    Arrays.sort(order, Comparator.comparingDouble(i -> question.price(i) / worth[i]));
    for (int i : order) {
      double taken = Math.min(Math.max(left, 0) / worth[i], question.high(i) - mix[i]);
      mix[i] = taken == question.high(i) - mix[i] ? question.high(i) : mix[i] + taken;
      left -= worth[i] * taken;
    }
    return answer(question, mix, order, needed);
  }

  private Plan answer(Question question, double[] mix, Integer[] order, double needed) {
    int n = worth.length;
    double marginal = Double.POSITIVE_INFINITY;
    for (int k = n - 1; k >= 0; k--) {
      int i = order[k];
      if (mix[i] < question.high(i)) {
        marginal = question.price(i) / worth[i];
      }
    }
    double value = Double.isInfinite(marginal) ? dearest(question, mix) : marginal;
    double cost = 0;
    double[] shares = new double[n];
    double[] values = new double[n];
    for (int i = 0; i < n; i++) {
      shares[i] = question.price(i) * mix[i];
      cost += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= cost;
      boolean inside = mix[i] > question.low(i) && mix[i] < question.high(i);
      values[i] = inside ? 0 : value * worth[i] - question.price(i);
    }
    double perOutput = needed / (scale * question.target());
    double marginalCost = marginal * perOutput;
    double departure = departure(question, mix, cost, marginalCost);
    boolean interior = true;
    for (int i = 0; i < n; i++) {
      interior &= question.held(i) || (mix[i] > question.low(i) && mix[i] < question.high(i));
    }
    return new Plan(
        interior ? Status.SOLVED : Status.CORNER,
        mix,
        cost,
        marginalCost,
        shares,
        values,
        departure,
        reason(question, mix));
  }

  /** What a unit of Y is worth where no input can give more: the dearest that could be reduced. */
  private double dearest(Question question, double[] mix) {
    double dearest = 0;
    for (int i = 0; i < worth.length; i++) {
      if (mix[i] > question.low(i)) {
        dearest = Math.max(dearest, question.price(i) / worth[i]);
      }
    }
    return dearest;
  }

  /** The largest departure from the conditions, by the technology's own output and gradient. */
  private double departure(Question question, double[] mix, double cost, double marginalCost) {
    double[] traced = mix.clone();
    for (int i = 0; i < traced.length; i++) {
      traced[i] = traced[i] > 0 ? traced[i] : TRACE * cost / question.price(i);
    }
    double departure = Math.abs(technology.output(mix) / question.target() - 1);
    double[] gradient = technology.gradient(traced);
    double atMix = technology.output(mix) / technology.output(traced);
    for (int i = 0; i < mix.length && !Double.isInfinite(marginalCost); i++) {
      // With Σ a x moved from Y to Y' by the traces, f_i moves by (Y'/Y)^(ν−1).
      double moved = Math.pow(atMix, 1 - 1 / scale);
      double ratio = question.price(i) / (marginalCost * gradient[i] * moved) - 1;
      boolean low = mix[i] == question.low(i);
      boolean high = mix[i] == question.high(i);
      double breach = low && high ? 0 : low ? -ratio : high ? ratio : Math.abs(ratio);
      departure = Math.max(departure, breach);
    }
    return departure;
  }

  private String reason(Question question, double[] mix) {
    List<String> inputs = technology.inputs();
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < mix.length; i++) {
      if (question.held(i)) {
        parts.add(inputs.get(i) + " is held at " + Wording.number(mix[i]));
      } else if (mix[i] == 0) {
        parts.add(inputs.get(i) + " is not used: another input does the same for less");
      } else if (mix[i] == question.low(i)) {
        parts.add(inputs.get(i) + " is at its lower limit " + Wording.number(mix[i]));
      } else if (mix[i] == question.high(i)) {
        parts.add(inputs.get(i) + " is at its upper limit " + Wording.number(mix[i]));
      }
    }
    for (int i = 0; i < mix.length; i++) {
      for (int j = i + 1; j < mix.length; j++) {
        double a = question.price(i) / worth[i];
        double b = question.price(j) / worth[j];
        boolean movable =
            mix[i] > question.low(i) && mix[j] < question.high(j)
                || mix[j] > question.low(j) && mix[i] < question.high(i);
        if (movable && Math.abs(a - b) <= SAME * a) {
          parts.add(
              inputs.get(i)
                  + " and "
                  + inputs.get(j)
                  + " cost the same for what they yield: other mixes of them cost no more");
        }
      }
    }
    return String.join("; ", parts);
  }
}

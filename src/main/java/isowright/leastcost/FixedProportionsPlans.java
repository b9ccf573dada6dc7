package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.ConditionalDemand.FixedProportions;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Plans for fixed proportions, Q = min_i (x_i/need_i)^ν: the target needs need_i Q^{1/ν} of every
 * input, whatever the prices; where a lower limit or a held quantity is more, the rest is idle.
 * Marginal cost is Σ w_i x_i/(ν Q) over the inputs that more output would take more of.
 */
final class FixedProportionsPlans implements Plans {

  /** The step in logs by which outputs are compared to see which inputs are scarce. */
  private static final double PROBE = 1e-3;

  private final Technology technology;
  private final double[] logNeed;
  private final double scale;

  FixedProportionsPlans(Technology technology, FixedProportions demand) {
    this.technology = technology;
    this.logNeed = demand.logNeed();
    this.scale = demand.scale();
  }

  @Override
  public Plan plan(Question question, Optional<Plan> near) {
    LogQuestion asked = new LogQuestion(question);
    int n = asked.n;
    double[] z = new double[n];
    double largest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < n; i++) {
      z[i] = logNeed[i] + asked.logTarget / scale;
      largest = Math.min(largest, scale * (asked.logHigh[i] - logNeed[i]));
    }
    if (largest < asked.logTarget - Feasibility.EXACT) {
      String reason = Feasibility.outOfReach(technology.inputs(), asked, largest, true);
      return Answer.none(Status.INFEASIBLE, reason);
    }
    return answer(asked, z);
  }

  private Plan answer(LogQuestion asked, double[] need) {
    Question question = asked.asked;
    int n = asked.n;
    double[] mix = new double[n];
    double[] shares = new double[n];
    double[] values = new double[n];
    double cost = 0;
    double marginal = 0;
    boolean corner = false;
    boolean stuck = false;
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      double excess = asked.logLow[i] - need[i];
      double ceiling = asked.logHigh[i] - need[i];
      boolean idle = excess > Feasibility.EXACT;
      boolean full = ceiling <= Feasibility.EXACT;
      mix[i] = idle ? question.low(i) : full ? question.high(i) : Math.exp(need[i]);
      shares[i] = question.price(i) * mix[i];
      cost += shares[i];
      marginal += idle ? 0 : shares[i] / (scale * question.target());
      stuck |= full && !idle;
      corner |= (idle || full) && !question.held(i);
      values[i] = idle || question.held(i) ? -question.price(i) : 0;
      describe(question, i, idle, full, parts);
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= cost;
    }
    return new Plan(
        corner ? Status.CORNER : Status.SOLVED,
        mix,
        cost,
        stuck ? Double.POSITIVE_INFINITY : marginal,
        shares,
        values,
        departure(asked, mix),
        String.join("; ", parts));
  }

  private void describe(Question question, int i, boolean idle, boolean full, List<String> parts) {
    String name = technology.inputs().get(i);
    String quantity = Wording.number(idle ? question.low(i) : question.high(i));
    if (question.held(i)) {
      parts.add(name + " is held at " + quantity + (idle ? ", part of it idle" : ""));
    } else if (idle) {
      parts.add(name + " is at its lower limit " + quantity + ", part of it idle");
    } else if (full) {
      parts.add(name + " is at its upper limit " + quantity);
    }
  }

  /**
   * The largest departure from least cost, by outputs of the technology alone: the target met, and
   * less of any input above its lower limit at once less output.
   */
  private double departure(LogQuestion asked, double[] mix) {
    int n = mix.length;
    double[] z = new double[n];
    for (int i = 0; i < n; i++) {
      z[i] = Math.log(mix[i]);
    }
    double here = technology.logOutput(z);
    boolean spare = true;
    double departure = Math.abs(Math.expm1(Math.min(0, here - asked.logTarget)));
    double[] probe = z.clone();
    for (int i = 0; i < n; i++) {
      probe[i] = z[i] - PROBE;
    }
    double all = here - technology.logOutput(probe);
    for (int i = 0; i < n; i++) {
      if (mix[i] > asked.asked.low(i)) {
        spare = false;
        System.arraycopy(z, 0, probe, 0, n);
        probe[i] -= PROBE;
        double fall = here - technology.logOutput(probe);
        departure = Math.max(departure, PROBE * (1 - fall / all));
      }
    }
    return spare ? departure : Math.max(departure, Math.abs(Math.expm1(here - asked.logTarget)));
  }
}

package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.ConditionalDemand;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * Plans for a technology with smooth isoquants: written down where the form can, searched for where
 * it cannot, limits and held inputs by {@link ActiveLimits}.
 */
final class SmoothPlans implements Plans {

  private final Technology technology;
  private final ConditionalDemand.@Nullable Smooth demand;
  private final boolean[] noneFixed;
  private final byte[] allFree;
  private final double[] logBase;
  private final double[] baseElasticities;
  private final double baseOutput;

  SmoothPlans(Technology technology, ConditionalDemand.@Nullable Smooth demand) {
    this.technology = technology;
    this.demand = demand;
    int n = technology.dimension();
    noneFixed = new boolean[n];
    allFree = new byte[n];
    logBase = technology.base();
    for (int i = 0; i < n; i++) {
      logBase[i] = Math.log(logBase[i]);
    }
    baseElasticities = new double[n];
    technology.logGradient(logBase, baseElasticities);
    baseOutput = technology.logOutput(logBase);
  }

  @Override
  public Plan plan(Question question, Optional<Plan> near) {
    if (demand != null) {
      Plan written = written(demand, question);
      if (written != null) {
        return written;
      }
    }
    LogQuestion asked = new LogQuestion(question);
    Optional<Plan> idle = withoutOutput(asked);
    if (idle.isPresent()) {
      return idle.get();
    }
    return LogQuestion.limited(question)
        ? edge(asked).orElseGet(() -> searched(asked, near))
        : searched(asked, near);
  }

  /**
   * Where inputs are held at zero: the plan that says so if the form has no output without them.
   */
  private Optional<Plan> withoutOutput(LogQuestion asked) {
    double[] z = logBase.clone();
    boolean zero = false;
    for (int i = 0; i < asked.n; i++) {
      if (asked.asked.high(i) == 0) {
        z[i] = Double.NEGATIVE_INFINITY;
        zero = true;
      }
    }
    if (!zero || Double.isFinite(technology.logOutput(z))) {
      return Optional.empty();
    }
    List<String> missing = new ArrayList<>();
    for (int i = 0; i < asked.n; i++) {
      if (asked.asked.high(i) == 0) {
        missing.add(technology.inputs().get(i));
      }
    }
    String reason = "nothing can be made without " + Wording.list(missing);
    return Optional.of(Answer.none(Status.INFEASIBLE, reason));
  }

  /** The closed form; null where a limit stands in its way. */
  private @Nullable Plan written(ConditionalDemand.Smooth form, Question question) {
    int n = allFree.length;
    double[] logPrice = new double[n];
    for (int i = 0; i < n; i++) {
      logPrice[i] = Math.log(question.price(i));
    }
    double[] z = new double[n];
    double logTarget = Math.log(question.target());
    form.logMix(logTarget, logPrice, noneFixed, z);
    Answer answer = new Answer(technology, question, logTarget, z, allFree);
    return answer.within() ? answer.plan(answer.freeMultiplier()) : null;
  }

  /** The plans that need no search: the target out of reach, or over-reached by the least taken. */
  private Optional<Plan> edge(LogQuestion asked) {
    boolean known = demand != null || asked.allHeld();
    if (known || (asked.allCapped() && Feasibility.monotone(technology, asked.logHigh))) {
      double largest = technology.logOutput(asked.logHigh);
      if (largest < asked.logTarget - Feasibility.EXACT) {
        return Optional.of(outOfReach(asked, largest));
      }
    }
    if (known || (asked.allFloored() && Feasibility.monotone(technology, asked.logLow))) {
      double least = technology.logOutput(asked.logLow);
      if (least > asked.logTarget + Feasibility.EXACT) {
        byte[] low = new byte[asked.n];
        Arrays.fill(low, ActiveLimits.LOW);
        Answer answer = new Answer(technology, asked.asked, asked.logTarget, asked.logLow, low);
        return Optional.of(answer.slack());
      }
    }
    return Optional.empty();
  }

  private Plan searched(LogQuestion asked, Optional<Plan> near) {
    FreeMix inner = demand != null ? new WrittenMix(demand) : new SearchedMix(technology);
    ActiveLimits limits = new ActiveLimits(technology, asked, inner, start(asked, near));
    FreeMix.Outcome outcome = limits.search();
    if (outcome != FreeMix.Outcome.FOUND) {
      return unanswered(asked, outcome, inner);
    }
    if (demand == null) {
      String complaint = Regular.complaint(technology, limits.z);
      if (!complaint.isEmpty()) {
        return Answer.none(Status.IRREGULAR, complaint);
      }
    }
    Answer answer = new Answer(technology, asked.asked, asked.logTarget, limits.z, limits.at);
    return answer.plan(Math.exp(limits.logMultiplier));
  }

  private Plan unanswered(LogQuestion asked, FreeMix.Outcome outcome, FreeMix inner) {
    if (outcome == FreeMix.Outcome.TOO_LITTLE && demand != null) {
      return outOfReach(asked, technology.logOutput(asked.logHigh));
    }
    String ended = inner.ended();
    String why = ended.isEmpty() ? "no mix meets the first-order conditions" : ended;
    return Answer.none(
        Status.IRREGULAR,
        "no least-cost mix for the target "
            + Wording.number(asked.asked.target())
            + " where the technology is regular: "
            + why);
  }

  private Plan outOfReach(LogQuestion asked, double logLargest) {
    return Answer.none(
        Status.INFEASIBLE,
        Feasibility.outOfReach(technology.inputs(), asked, logLargest, asked.allCapped()));
  }

  /**
   * Where to begin: at the mix of a similar plan, or at the mix that would be least cost if output
   * elasticities were everywhere what they are at the base, drawn towards the base until they are
   * positive.
   */
  private double[] start(LogQuestion asked, Optional<Plan> near) {
    int n = allFree.length;
    double[] z = logBase.clone();
    if (near.isPresent() && near.get().answered()) {
      for (int i = 0; i < n; i++) {
        double quantity = near.get().mix(i);
        z[i] = quantity > 0 ? Math.log(quantity) : z[i];
      }
      return z;
    }
    double left = asked.logTarget - baseOutput;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      if (!(baseElasticities[i] > 0)) {
        return z;
      }
      z[i] = Math.log(baseElasticities[i]) - asked.logPrice[i];
      left -= baseElasticities[i] * (z[i] - logBase[i]);
      sum += baseElasticities[i];
    }
    for (int i = 0; i < n; i++) {
      z[i] += left / sum;
    }
    for (int halving = 0; halving < 8 && !Feasibility.monotone(technology, z); halving++) {
      for (int i = 0; i < n; i++) {
        z[i] = (z[i] + logBase[i]) / 2;
      }
    }
    return z;
  }
}

package isowright.review;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Elasticities;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleFunction;

/**
 * What would have to be true for a filed cost F to be least cost? One thing at a time, all else as
 * recorded and estimated, the root is sought of
 *
 * <pre>
 *   ln C(w with w_i = v, Q) − ln F = 0          the price of input i
 *   ln C(w, Q; A · f) − ln F = 0                productivity A, one being the reference
 *   ln C(w, Q; σ) − ln F = 0                    substitution, at the base point of the technology
 * </pre>
 *
 * <p>Least cost rises in every price, and falls in productivity and (at a kept base point) in
 * substitution, so there is one root or none. Prices and productivity are searched from a hundredth
 * of what they are to a hundred times it, substitution from 0.01 to 100. Least cost need not reach
 * F: with σ above one a dear input is given up, with σ below one a cheap one saves only its own
 * spending. Then there is no value, and that is the answer.
 *
 * <p>Uncertainty by the implicit function: se(ln v) = se(ln C)/|∂ln C/∂ln v| at the root, where ∂ln
 * C/∂ln w_i is the share of input i (Shephard's lemma) and ∂ln C/∂ln A = −1/e.
 *
 * <p>Sources: Shephard, R. W. (1953), <i>Cost and Production Functions</i>; that output at every
 * other mix rises with σ when the base point is kept: de La Grandville, O. (1989), In Quest of the
 * Slutsky Diamond, <i>American Economic Review</i> 79, 468–481. Tested in {@code ConditionsTest}.
 */
public final class Conditions {

  /** Prices and productivity are searched within this factor of what they are. */
  public static final double FACTOR = 100;

  /** The least elasticity of substitution tried. */
  public static final double LEAST_SUBSTITUTION = 0.01;

  /** The greatest elasticity of substitution tried. */
  public static final double MOST_SUBSTITUTION = 100;

  /** Step in ln σ for the slope of least cost. */
  private static final double STEP = 1e-4;

  private final Technology technology;
  private final LeastCost leastCost;
  private final CostSlopes slopes;
  private final DeltaMethod delta;

  private Conditions(EstimatedTechnology reference, double level) {
    this.technology = reference.technology();
    this.leastCost = Minimiser.of(technology);
    this.slopes = new CostSlopes(technology);
    this.delta = DeltaMethod.of(reference, level);
  }

  /** Conditions on this reference technology, with intervals at a level such as 0.95. */
  public static Conditions on(EstimatedTechnology reference, double level) {
    return new Conditions(reference, level);
  }

  /**
   * Every condition that can be asked of this technology: each price, productivity, and the
   * elasticity of substitution where the technology has one of its own.
   *
   * @param question output and the prices paid
   * @param plan its least-cost plan, answered
   * @param filed F
   */
  public List<Condition> of(Question question, Plan plan, double filed) {
    List<Condition> all = new ArrayList<>();
    for (int i = 0; i < question.dimension(); i++) {
      all.add(price(i, question, plan, filed));
    }
    all.add(productivity(question, plan, filed));
    if (technology.withSubstitution(1).isPresent()) {
      all.add(substitution(question, plan, filed));
    }
    return List.copyOf(all);
  }

  private Condition price(int i, Question question, Plan plan, double filed) {
    double paid = question.price(i);
    DoubleFunction<Plan> at = v -> leastCost.plan(priced(question, i, v), plan);
    double target = Math.log(filed);
    LogRoot root =
        LogRoot.from(
            v -> Math.log(at.apply(Math.exp(v)).cost()) - target,
            Math.log(paid),
            Math.log(filed > plan.cost() ? paid * FACTOR : paid / FACTOR));
    double value = Math.exp(root.at());
    Optional<Estimate> estimate = Optional.empty();
    if (root.state() == LogRoot.State.FOUND) {
      Plan there = at.apply(value);
      double error = delta.standardError(slopes.ofCost(priced(question, i, value), there));
      estimate = Optional.of(delta.estimate(value, error / there.mix(i), Scale.LOG));
    }
    return condition(
        Condition.Kind.PRICE, technology.inputs().get(i), paid, estimate, paid, root, filed);
  }

  private static Question priced(Question question, int i, double price) {
    double[] prices = question.prices();
    prices[i] = price;
    return question.at(prices);
  }

  /** Output A · f at every mix: least cost at target Q is that of target Q/A without A. */
  private Condition productivity(Question question, Plan plan, double filed) {
    DoubleFunction<Question> at = a -> question.at(question.target() / a);
    double target = Math.log(filed);
    LogRoot root =
        LogRoot.from(
            a -> Math.log(leastCost.plan(at.apply(Math.exp(a)), plan).cost()) - target,
            0,
            filed > plan.cost() ? -Math.log(FACTOR) : Math.log(FACTOR));
    double value = Math.exp(root.at());
    Optional<Estimate> estimate = Optional.empty();
    if (root.state() == LogRoot.State.FOUND) {
      Question asked = at.apply(value);
      Plan there = leastCost.plan(asked, plan);
      double error = delta.standardError(slopes.ofCost(asked, there));
      double worth = there.marginalCost() * asked.target();
      estimate = Optional.of(delta.estimate(value, value * error / worth, Scale.LOG));
    }
    return condition(Condition.Kind.PRODUCTIVITY, "", 1, estimate, 1, root, filed);
  }

  private Condition substitution(Question question, Plan plan, double filed) {
    double[] z = new double[question.dimension()];
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(plan.mix(i));
    }
    double own = Elasticities.at(technology, z).allen(0, 1);
    double start = Math.min(MOST_SUBSTITUTION, Math.max(LEAST_SUBSTITUTION, own));
    double target = Math.log(filed);
    LogRoot root =
        LogRoot.from(
            s -> logCost(technology, question, Math.exp(s)) - target,
            Math.log(start),
            Math.log(filed > plan.cost() ? LEAST_SUBSTITUTION : MOST_SUBSTITUTION));
    double value = Math.exp(root.at());
    Optional<Estimate> estimate = Optional.empty();
    if (root.state() == LogRoot.State.FOUND) {
      double slope =
          (logCost(technology, question, value * Math.exp(STEP))
                  - logCost(technology, question, value * Math.exp(-STEP)))
              / (2 * STEP);
      Estimate cost = delta.estimate(t -> logCost(t, question, value), Scale.LINEAR);
      double error = value * cost.standardError() / Math.abs(slope);
      estimate = Optional.of(delta.estimate(value, error, Scale.LOG));
    }
    double costAtEnd = Math.exp(root.value()) * filed;
    return new Condition(
        Condition.Kind.SUBSTITUTION,
        "",
        own,
        estimate,
        LEAST_SUBSTITUTION,
        MOST_SUBSTITUTION,
        costAtEnd,
        value,
        root.state() != LogRoot.State.NO_VALUE);
  }

  private static double logCost(Technology technology, Question question, double substitution) {
    return technology
        .withSubstitution(substitution)
        .map(t -> Math.log(Minimiser.of(t).cost(question)))
        .orElse(Double.NaN);
  }

  private static Condition condition(
      Condition.Kind kind,
      String input,
      double asIs,
      Optional<Estimate> estimate,
      double centre,
      LogRoot root,
      double filed) {
    return new Condition(
        kind,
        input,
        asIs,
        estimate,
        centre / FACTOR,
        centre * FACTOR,
        Math.exp(root.value()) * filed,
        Math.exp(root.at()),
        root.state() != LogRoot.State.NO_VALUE);
  }
}

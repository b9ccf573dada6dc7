package isowright.leastcost;

import isowright.technology.Technology;
import java.util.List;
import java.util.Optional;

/**
 * What mix of inputs yields a target at least cost, for a production technology?
 *
 * <pre>  min Σ w_i x_i   subject to   f(x) ≥ Q,   low_i ≤ x_i ≤ high_i </pre>
 *
 * <p>The Lagrangian Σ w_i x_i + λ (Q − f(x)) gives w_i = λ f_i for every input within its limits,
 * w_i ≤ λ f_i at an upper and w_i ≥ λ f_i at a lower one; λ is marginal cost. Everything is done in
 * ln x. Forms that can write their answer down do so ({@link
 * isowright.technology.ConditionalDemand}); for the others the conditions are solved by a
 * safeguarded Newton method, with limits and held inputs as active constraints, and if need be by
 * following the least-cost mix along a path from a regular point.
 *
 * <p>Every answer is checked against the technology's own output and elasticities, and the largest
 * relative departure is part of the plan. The answer is a stationary point at which the technology
 * is regular; for a technology regular throughout it is the only one and the global least cost. A
 * technology that is not (a translog far from its records) may have cheaper mixes outside its
 * regular region, which mean nothing and are not looked for.
 *
 * <p>Source: Shephard, R. W. (1953), <i>Cost and Production Functions</i>, Princeton; Varian, H. R.
 * (1992), <i>Microeconomic Analysis</i>, 3rd ed., chapters 4–5. Tested in {@code
 * WorkedExamplesTest}, {@code CostLawsTest}, {@code LimitsTest}, {@code IndependentOptimiserTest}.
 */
public final class Minimiser implements LeastCost {

  private final List<String> inputs;
  private final Plans plans;

  private Minimiser(List<String> inputs, Plans plans) {
    this.inputs = inputs;
    this.plans = plans;
  }

  /** Least cost by this technology. */
  public static Minimiser of(Technology technology) {
    Plans plans =
        technology
            .conditionalDemand()
            .<Plans>map(
                demand ->
                    demand.fold(
                        smooth -> new SmoothPlans(technology, smooth),
                        fixed -> new FixedProportionsPlans(technology, fixed),
                        perfect -> new PerfectSubstitutesPlans(technology, perfect)))
            .orElseGet(() -> new SmoothPlans(technology, null));
    return new Minimiser(technology.inputs(), plans);
  }

  @Override
  public List<String> inputs() {
    return inputs;
  }

  @Override
  public Plan plan(Question question) {
    return plans.plan(fitting(question), Optional.empty());
  }

  @Override
  public Plan plan(Question question, Plan near) {
    return plans.plan(fitting(question), Optional.of(near));
  }

  private Question fitting(Question question) {
    if (question.dimension() != inputs.size()) {
      throw new IllegalArgumentException(
          "the question has "
              + question.dimension()
              + " prices for the "
              + inputs.size()
              + " inputs "
              + inputs);
    }
    return question;
  }
}

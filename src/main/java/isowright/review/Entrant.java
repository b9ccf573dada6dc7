package isowright.review;

import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import java.util.Optional;

/**
 * A plant in an ordering.
 *
 * @param plant its name
 * @param filed the filed cost
 * @param leastCost least cost C
 * @param slopes ∂ln C/∂θ_k, shape p
 * @param yearSpread the standard deviation of ln C from the chance of a single year; zero where
 *     none is known
 * @param asked what was asked of a technology of inputs, so that it can be asked again; absent
 *     where least cost comes from a cost function
 */
public record Entrant(
    String plant,
    double filed,
    double leastCost,
    double[] slopes,
    double yearSpread,
    Optional<Asked> asked) {

  /**
   * A question and its answer.
   *
   * @param question output and prices
   * @param plan the least-cost plan, answered
   */
  public record Asked(Question question, Plan plan) {}

  /** Copies the slopes. */
  public Entrant {
    slopes = slopes.clone();
  }

  /** The entrant of a gap estimate; its year's spread is s λ Q / C, s that of residuals in ln Q. */
  public static Entrant of(
      String plant, Question question, GapEstimate estimate, double residualStandardError) {
    Plan plan = estimate.plan();
    double spread = residualStandardError * plan.marginalCost() * question.target() / plan.cost();
    return new Entrant(
        plant,
        estimate.gap().filed(),
        plan.cost(),
        estimate.slopes(),
        spread,
        Optional.of(new Asked(question, plan)));
  }

  @Override
  public double[] slopes() {
    return slopes.clone();
  }

  /** ln of filed over least cost. */
  double logRatio() {
    return Math.log(filed / leastCost);
  }
}

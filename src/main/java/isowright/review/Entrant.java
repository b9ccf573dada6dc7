package isowright.review;

import isowright.leastcost.Plan;
import isowright.leastcost.Question;

/**
 * A plant in an ordering.
 *
 * @param plant its name
 * @param filed the filed cost
 * @param question its output and prices
 * @param plan its least-cost plan, answered
 * @param slopes ∂ln C/∂θ_k, shape p
 * @param yearSpread the standard deviation of ln C from the chance of a single year: s λ Q / C with
 *     s that of the fit's residuals in ln Q; zero where none is known
 */
public record Entrant(
    String plant, double filed, Question question, Plan plan, double[] slopes, double yearSpread) {

  /** Copies the slopes. */
  public Entrant {
    slopes = slopes.clone();
  }

  /** The entrant of a gap estimate. */
  public static Entrant of(
      String plant, Question question, GapEstimate estimate, double residualStandardError) {
    Plan plan = estimate.plan();
    double spread = residualStandardError * plan.marginalCost() * question.target() / plan.cost();
    return new Entrant(plant, estimate.gap().filed(), question, plan, estimate.slopes(), spread);
  }

  @Override
  public double[] slopes() {
    return slopes.clone();
  }

  /** ln of filed over least cost. */
  double logRatio() {
    return Math.log(filed / plan.cost());
  }
}

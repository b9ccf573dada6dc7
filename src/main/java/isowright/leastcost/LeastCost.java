package isowright.leastcost;

import java.util.List;

/**
 * Whoever can say what a target costs at least: cost, mix and marginal cost at prices and target
 * through one interface, whether a production technology is solved ({@link Minimiser}) or a cost
 * function is evaluated (Shephard's lemma: x_i = ∂C/∂w_i).
 *
 * <p>Implementations are immutable and safe to share between threads. A question that has no answer
 * is answered by a {@link Plan} that says why, never by an exception.
 */
public interface LeastCost {

  /** The names of the inputs, in the order used everywhere. */
  List<String> inputs();

  /**
   * The least-cost plan.
   *
   * @throws IllegalArgumentException where the question has another number of inputs
   */
  Plan plan(Question question);

  /**
   * The same answer, found sooner where the answer to a similar question is at hand.
   *
   * @param near the plan of a similar question; may be one without an answer
   */
  default Plan plan(Question question, Plan near) {
    return plan(question);
  }

  /** Least cost C; NaN where there is no answer. */
  default double cost(Question question) {
    return plan(question).cost();
  }

  /** The least-cost mix x, shape n; empty where there is no answer. */
  default double[] mix(Question question) {
    return plan(question).mix();
  }

  /** Marginal cost ∂C/∂Q; NaN where there is no answer. */
  default double marginalCost(Question question) {
    return plan(question).marginalCost();
  }
}

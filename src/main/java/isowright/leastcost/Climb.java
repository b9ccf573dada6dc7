package isowright.leastcost;

import java.util.Optional;

/**
 * Least cost asked at one output after another, each search beginning at the last answer. Holds
 * where it is; not shared between threads.
 */
final class Climb {

  /**
   * Where the usual output has no answer others are looked for, first closely (a translog may be
   * regular over a narrow span of outputs only), then to a factor of e^8.
   */
  private static final int CLOSE = 15;

  private static final int FAR = 13;
  private static final double CLOSE_STEP = 0.1;
  private static final double FAR_STEP = 0.5;

  private final LeastCost leastCost;
  private final Question question;
  private Optional<Plan> near;

  /** ln Q. */
  double u;

  /** The plan there. */
  Plan plan;

  Climb(LeastCost leastCost, Question question, Optional<Plan> near) {
    this.leastCost = leastCost;
    this.question = question;
    this.near = near;
    this.u = Double.NaN;
    this.plan = Answer.none(Plan.Status.IRREGULAR, "");
  }

  /** Goes to an output. */
  void at(double logOutput) {
    u = logOutput;
    Question here = question.at(Math.exp(u));
    plan = near.map(n -> leastCost.plan(here, n)).orElseGet(() -> leastCost.plan(here));
    if (plan.answered()) {
      near = Optional.of(plan);
    } else if (near.isPresent()) {
      // A start that led nowhere is no reason to give up: once more from scratch.
      plan = leastCost.plan(here);
    }
  }

  /** Goes to the output nearest a given one that has an answer; false where none is found. */
  boolean begin(double logOutput) {
    at(logOutput);
    Plan first = plan;
    for (int k = 1; k <= CLOSE + FAR && !plan.answered(); k++) {
      double away = Math.min(k, CLOSE) * CLOSE_STEP + Math.max(0, k - CLOSE) * FAR_STEP;
      at(logOutput - away);
      if (!plan.answered()) {
        at(logOutput + away);
      }
    }
    if (!plan.answered()) {
      plan = first;
    }
    return plan.answered();
  }
}

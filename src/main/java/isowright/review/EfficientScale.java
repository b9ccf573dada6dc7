package isowright.review;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/**
 * How far is an output from the efficient scale, at which a unit costs least, and what is that
 * worth? With e the scale elasticity at the least-cost mix,
 *
 * <pre>
 *   ∂ln C/∂ln Q = 1/e,   average cost is least where e(Q*) = 1 and e falls,
 *   scale = C(w, Q) − Q · C(w, Q*)/Q*
 * </pre>
 *
 * what the same output would cost less if it were made at Q*. For information alone: output is what
 * the plant is asked for, so this is no part of a gap.
 *
 * <p>A homogeneous technology has the same e at every output, so it has no efficient scale: average
 * cost falls for ever, rises for ever, or is the same throughout. Q* is sought from Q on, within
 * the outputs of the records; beyond them it would be a guess.
 *
 * <p>Uncertainty: ∂C/∂θ in closed form ({@link CostSlopes}); for the scale part Q* may be held, as
 * average cost is flat there (envelope theorem). For e and Q* the mixed derivative ∂²ln C/∂θ ∂ln Q
 * is the difference of ∂ln C/∂θ over a small step in ln Q, which is second-order exact.
 *
 * <p>Sources: Christensen, L. R. and Greene, W. H. (1976), Economies of Scale in U.S. Electric
 * Power Generation, <i>Journal of Political Economy</i> 84, 655–676 (efficient scale from a cost
 * function); Hanoch, G. (1975), The Elasticity of Scale and the Shape of Average Costs, <i>American
 * Economic Review</i> 65, 492–497 (e along the expansion path). Tested in {@code
 * EfficientScaleTest}.
 */
public final class EfficientScale {

  /** Step in ln Q for the slopes of e; its square times third derivatives is lost. */
  private static final double STEP = 1e-3;

  /** Scale elasticities that agree to this over a doubling of output are the same. */
  private static final double SAME = 1e-9;

  private static final double LN2 = Math.log(2);

  /** The search for the efficient scale takes no longer step in ln Q, so as to pass nothing by. */
  private static final double LONGEST_STEP = 0.8;

  /** What was found. */
  public enum State {
    /** There is an efficient scale within the records' outputs. */
    FOUND("found"),
    /** Returns to scale are the same at every output. */
    SAME_RETURNS("same-returns"),
    /** Average cost still falls at the largest output of the records. */
    STILL_FALLING("still-falling"),
    /** Average cost falls towards the smallest output of the records. */
    STILL_RISING("still-rising"),
    /** Average cost is greatest, not least, where returns to scale are constant. */
    MOST_COSTLY("most-costly"),
    /** The technology has no answer on the way. */
    NO_ANSWER("no-answer");

    private final String word;

    State(String word) {
      this.word = word;
    }

    /** The word used in files. */
    public String word() {
      return word;
    }
  }

  /**
   * An output and the efficient scale.
   *
   * @param state what was found
   * @param elasticity e at the output itself
   * @param output Q*; present where found
   * @param part C(w, Q) − Q C(w, Q*)/Q*; present where found
   */
  public record Found(
      State state, Estimate elasticity, Optional<Estimate> output, Optional<Estimate> part) {}

  private final LeastCost leastCost;
  private final CostSlopes slopes;
  private final DeltaMethod delta;
  private final double smallest;
  private final double largest;

  private EfficientScale(
      EstimatedTechnology reference, double level, double smallest, double largest) {
    this.leastCost = Minimiser.of(reference.technology());
    this.slopes = new CostSlopes(reference.technology());
    this.delta = DeltaMethod.of(reference, level);
    this.smallest = smallest;
    this.largest = largest;
  }

  /**
   * For a reference technology.
   *
   * @param level the level of intervals
   * @param smallest the smallest output of the records
   * @param largest the largest
   */
  public static EfficientScale of(
      EstimatedTechnology reference, double level, double smallest, double largest) {
    return new EfficientScale(reference, level, smallest, largest);
  }

  /**
   * Where an output stands.
   *
   * @param question output and prices
   * @param plan its least-cost plan, answered
   */
  public Found at(Question question, Plan plan) {
    double q = question.target();
    double here = logElasticity(question, plan);
    Estimate elasticity = elasticity(question, plan);
    double up = logElasticity(question, Math.log(q) + LN2 / 2, plan);
    double down = logElasticity(question, Math.log(q) - LN2 / 2, plan);
    if (Math.abs(up - here) <= SAME && Math.abs(down - here) <= SAME) {
      return none(State.SAME_RETURNS, elasticity);
    }
    double bound = Math.log(here > 0 ? Math.max(largest, q) : Math.min(smallest, q));
    LogRoot root =
        LogRoot.from(
            new Nearby(question, plan), Math.log(q), here, bound, reach(here, (up - down) / LN2));
    if (root.state() == LogRoot.State.NO_VALUE) {
      return none(State.NO_ANSWER, elasticity);
    }
    if (root.state() == LogRoot.State.BOUND) {
      return none(here > 0 ? State.STILL_FALLING : State.STILL_RISING, elasticity);
    }
    return found(question, plan, elasticity, root.at());
  }

  /** A little further than where ln e would be nought if it went on as it does here. */
  private static double reach(double here, double slope) {
    double distance = 1.02 * Math.abs(here / slope);
    return Double.isFinite(distance) ? Math.min(distance, LONGEST_STEP) : 0;
  }

  /** ln e at other outputs, each plan sought from the one before. */
  private final class Nearby implements DoubleUnaryOperator {
    private final Question question;
    private Plan near;

    Nearby(Question question, Plan near) {
      this.question = question;
      this.near = near;
    }

    @Override
    public double applyAsDouble(double logOutput) {
      Question asked = question.at(Math.exp(logOutput));
      Plan plan = leastCost.plan(asked, near);
      near = plan.answered() ? plan : near;
      return logElasticity(asked, plan);
    }
  }

  private Found found(Question question, Plan plan, Estimate elasticity, double logOutput) {
    Around around = around(question, logOutput, plan);
    double curvature = (around.above.inverse() - around.below.inverse()) / (2 * STEP);
    if (!(curvature > 0)) {
      return none(State.MOST_COSTLY, elasticity);
    }
    double q = question.target();
    double output = Math.exp(logOutput);
    Plan there = leastCost.plan(question.at(output), plan);
    double[] here = slopes.ofCost(question, plan);
    double[] best = slopes.ofCost(question.at(output), there);
    double[] mixed = around.mixed();
    double[] part = new double[here.length];
    for (int k = 0; k < part.length; k++) {
      part[k] = here[k] - q / output * best[k];
      mixed[k] /= curvature;
    }
    double value = plan.cost() - q / output * there.cost();
    return new Found(
        State.FOUND,
        elasticity,
        Optional.of(delta.estimate(output, output * delta.standardError(mixed), Scale.LOG)),
        Optional.of(delta.estimate(value, delta.standardError(part), Scale.LINEAR)));
  }

  private static Found none(State state, Estimate elasticity) {
    return new Found(state, elasticity, Optional.empty(), Optional.empty());
  }

  /** e with its interval: 1/e = ∂ln C/∂ln Q, so its slopes are the mixed derivatives. */
  private Estimate elasticity(Question question, Plan plan) {
    double e = Math.exp(logElasticity(question, plan));
    double[] mixed = around(question, Math.log(question.target()), plan).mixed();
    return delta.estimate(e, e * e * delta.standardError(mixed), Scale.LOG);
  }

  /** ln e = ln(C / (λ Q)); NaN without an answer. */
  private double logElasticity(Question question, double logOutput, Plan near) {
    Question asked = question.at(Math.exp(logOutput));
    return logElasticity(asked, leastCost.plan(asked, near));
  }

  private static double logElasticity(Question question, Plan plan) {
    return Math.log(plan.cost() / (plan.marginalCost() * question.target()));
  }

  private Around around(Question question, double logOutput, Plan near) {
    return new Around(
        side(question, logOutput + STEP, near), side(question, logOutput - STEP, near));
  }

  private Side side(Question question, double logOutput, Plan near) {
    Question asked = question.at(Math.exp(logOutput));
    Plan plan = leastCost.plan(asked, near);
    double[] inLogs = slopes.ofCost(asked, plan);
    for (int k = 0; k < inLogs.length; k++) {
      inLogs[k] /= plan.cost();
    }
    return new Side(Math.exp(-logElasticity(asked, plan)), inLogs);
  }

  /**
   * One side of an output.
   *
   * @param inverse 1/e
   * @param slopes ∂ln C/∂θ
   */
  private record Side(double inverse, double[] slopes) {}

  /**
   * Both sides, one step away.
   *
   * @param above a step above
   * @param below a step below
   */
  private record Around(Side above, Side below) {

    /** ∂²ln C/∂θ ∂ln Q, shape p. */
    double[] mixed() {
      double[] mixed = new double[above.slopes.length];
      for (int k = 0; k < mixed.length; k++) {
        mixed[k] = (above.slopes[k] - below.slopes[k]) / (2 * STEP);
      }
      return mixed;
    }
  }
}

package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.Technology;
import java.util.Optional;

/**
 * The most profit at a price p of output: p Q − C(Q) over Q, where marginal cost λ(Q) rises through
 * p.
 *
 * <p>Returns to scale decide. Where marginal cost falls or stays level there is no best output; it
 * may also fall first and rise later. So ln Q is walked in steps from the usual output in both
 * directions, as far as least cost has answers; every passage of λ through p from below is a local
 * best, and the largest profit is kept. Where λ is still below p at the largest output within the
 * limits, that output is best (capacity binds); where the walk ends with λ below p and nothing in
 * the way, profit has no bound that matters.
 *
 * <p>Source: Varian, H. R. (1992), <i>Microeconomic Analysis</i>, 3rd ed., chapters 2–3. Tested in
 * {@code ProfitTest}.
 */
final class ProfitPursuit implements Pursuit {

  /** The walk's step in ln Q: marginal cost of the usual forms does not turn twice within it. */
  private static final double STEP = 0.25;

  /** The walk ends a factor of e^40 from the usual output: no plant is that large or small. */
  private static final double FARTHEST = 40;

  /** How far from a known best output the search for a new one begins, in logs. */
  private static final double CLOSE = 0.01;

  /** At a capacity itself marginal cost is beyond measure; it is asked this far short, in logs. */
  private static final double BESIDE = 1e-9;

  private static final double NARROW = 1e-15;
  private static final int ITERATIONS = 200;

  private final LeastCost leastCost;
  private final double price;
  private final double usual;
  private double bestOutput;
  private double bestProfit;
  private Optional<Plan> best = Optional.empty();

  ProfitPursuit(Technology technology, LeastCost leastCost, double price) {
    this.leastCost = leastCost;
    this.price = price;
    this.usual = Outputs.usual(technology);
  }

  @Override
  public Found pursue(Question question, double fixedMoney, Optional<Plan> near) {
    best = Optional.empty();
    bestProfit = Double.NEGATIVE_INFINITY;
    Climb climb = new Climb(leastCost, question, near);
    if (!climb.begin(usual)) {
      return Found.none(climb.plan);
    }
    double start = climb.u;
    Plan startPlan = climb.plan;
    Found end = upwards(question, climb);
    if (end.state() != State.FOUND) {
      return end;
    }
    downwards(question, start, startPlan);
    if (best.isEmpty()) {
      String reason =
          "at every output marginal cost exceeds the price of output of " + Wording.number(price);
      Plan none = Answer.none(Status.INFEASIBLE, reason);
      return new Found(State.NOTHING, none, Double.NaN, Double.NaN);
    }
    return new Found(State.FOUND, best.get(), bestOutput, fixedMoney - bestProfit);
  }

  /**
   * The best output near one that was best by a technology nearby; empty where marginal cost does
   * not pass the price there, as at a capacity.
   */
  Optional<Found> near(Question question, double fixedMoney, double output, Plan plan) {
    best = Optional.empty();
    bestProfit = Double.NEGATIVE_INFINITY;
    double middle = Math.log(output);
    for (double width = CLOSE; width < 1 && best.isEmpty(); width *= 4) {
      Climb climb = new Climb(leastCost, question, Optional.of(plan));
      climb.at(middle - width);
      Plan below = climb.plan;
      climb.at(middle + width);
      if (below.answered() && climb.plan.answered()) {
        passage(question, middle - width, below, middle + width, climb.plan);
      }
    }
    return best.map(found -> new Found(State.FOUND, found, bestOutput, fixedMoney - bestProfit));
  }

  /** Walks to larger outputs; the state says whether the walk ended where a best output can be. */
  private Found upwards(Question question, Climb climb) {
    Found going = new Found(State.FOUND, climb.plan, Double.NaN, Double.NaN);
    while (climb.u < usual + FARTHEST) {
      double from = climb.u;
      Plan fromPlan = climb.plan;
      climb.at(from + STEP);
      if (!climb.plan.answered()) {
        return edge(question, from, fromPlan, climb.u, climb.plan);
      }
      passage(question, from, fromPlan, climb.u, climb.plan);
    }
    if (climb.plan.marginalCost() < price) {
      String reason =
          "no output is best: marginal cost does not rise to the price of output of "
              + Wording.number(price)
              + ", so returns to scale do not decrease enough for profit to have a maximum";
      Plan plan = Answer.none(Status.INFEASIBLE, reason);
      return new Found(State.UNBOUNDED, plan, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY);
    }
    return going;
  }

  private void downwards(Question question, double start, Plan startPlan) {
    Climb climb = new Climb(leastCost, question, Optional.of(startPlan));
    climb.u = start;
    climb.plan = startPlan;
    while (climb.u > usual - FARTHEST) {
      double from = climb.u;
      Plan fromPlan = climb.plan;
      climb.at(from - STEP);
      if (!climb.plan.answered()) {
        return;
      }
      passage(question, climb.u, climb.plan, from, fromPlan);
    }
  }

  /** Keeps the best output between two, where marginal cost rises through the price. */
  private void passage(Question question, double low, Plan below, double high, Plan above) {
    if (!(below.marginalCost() < price) || above.marginalCost() < price) {
      return;
    }
    Climb climb = new Climb(leastCost, question, Optional.of(below));
    double u = 0.5 * (low + high);
    double width = high - low;
    Plan kept = below;
    double keptAt = low;
    for (int k = 0; k < ITERATIONS && width > NARROW * Math.max(1, Math.abs(u)); k++) {
      climb.at(u);
      double excess = Math.log(climb.plan.marginalCost() / price);
      kept = climb.plan;
      keptAt = u;
      if (excess == 0 || !climb.plan.answered()) {
        break;
      }
      if (excess < 0) {
        low = u;
        below = climb.plan;
      } else {
        high = u;
        above = climb.plan;
      }
      width = high - low;
      double secant = secant(low, below, high, above);
      u = k % 3 != 2 && secant > low && secant < high ? secant : 0.5 * (low + high);
    }
    keep(keptAt, kept);
  }

  private double secant(double low, Plan below, double high, Plan above) {
    double a = Math.log(below.marginalCost() / price);
    double b = Math.log(above.marginalCost() / price);
    return low - a * (high - low) / (b - a);
  }

  /** Beyond an output there is no answer: capacity, or the technology is no longer regular. */
  private Found edge(Question question, double low, Plan below, double high, Plan beyond) {
    if (below.marginalCost() >= price) {
      return new Found(State.FOUND, below, Math.exp(low), Double.NaN); // nothing better beyond
    }
    Climb climb = new Climb(leastCost, question, Optional.of(below));
    double from = low;
    Plan fromPlan = below;
    while (high - from > NARROW * Math.max(1, Math.abs(from))) {
      double middle = 0.5 * (from + high);
      if (middle <= from || middle >= high) {
        break;
      }
      climb.at(middle);
      if (climb.plan.answered()) {
        from = middle;
        fromPlan = climb.plan;
      } else {
        high = middle;
        beyond = climb.plan;
      }
    }
    climb.at(Math.max(low, from - BESIDE));
    if (!(climb.plan.marginalCost() < price)) {
      passage(question, low, below, from, fromPlan);
    } else if (beyond.status() == Status.IRREGULAR) {
      String reason = "profit still rises where an answer ends: " + beyond.reason();
      return Found.none(Answer.none(Status.IRREGULAR, reason));
    } else {
      keep(from, fromPlan.because("output is the largest that the limits allow"));
    }
    return new Found(State.FOUND, fromPlan, Math.exp(from), Double.NaN);
  }

  private void keep(double u, Plan plan) {
    double output = Math.exp(u);
    double profit = price * output - plan.cost();
    if (plan.answered() && profit > bestProfit) {
      bestProfit = profit;
      bestOutput = output;
      best = Optional.of(plan);
    }
  }
}

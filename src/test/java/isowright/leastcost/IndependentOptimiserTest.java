package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Technology;
import isowright.technology.Translog;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.optim.InitialGuess;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.SimpleBounds;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.nonlinear.scalar.ObjectiveFunction;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.BOBYQAOptimizer;
import org.junit.jupiter.api.Test;

/**
 * Least cost against an optimiser that knows no derivatives: BOBYQA of Commons Math (Powell 2009)
 * on the problem with the last input eliminated through f(x) = Q by Brent's method.
 */
class IndependentOptimiserTest {

  /**
   * At a minimum ln C is flat: BOBYQA, whose steps end at 1e-7 in logs, ends within 1e-13 of it
   * times the curvature (up to 50); where it stops early on a narrow valley it stays above. So it
   * may not be lower by more than rounding, nor higher by more than this.
   */
  private static final double HIGHER = 1e-8;

  private static final double LOWER = 1e-11;

  /** How far from the plan, in logs, inputs are searched. */
  private static final double BOX = 1.2;

  /** The same for a translog, which is regular only around its base. */
  private static final double REGULAR_BOX = .25;

  /** How far the last input may have to move to make up for the others. */
  private static final double REACH = 12;

  /** The same for a translog, whose output falls again far out. */
  private static final double REGULAR_REACH = 1.5;

  @Test
  void nothingCheaperIsFoundAndTheSameIsFound() {
    RandomTechnologies random = new RandomTechnologies(31);
    int compared = 0;
    int limited = 0;
    for (int k = 0; k < 1_700; k++) {
      Planted planted = random.any(k);
      int n = planted.mix().length;
      if (n < 3) {
        continue;
      }
      Question question = planted.question();
      boolean limits = k % 2 == 0;
      if (limits) {
        int i = random.below(n - 1);
        double x = planted.mix()[i];
        question = question.limiting(i, x * random.between(.7, 1.3), x * random.between(1.35, 2));
      }
      Plan plan = Minimiser.of(planted.technology()).plan(question);
      if (!plan.answered()) {
        continue;
      }
      double found = search(planted.technology(), plan, question);
      compared++;
      limited += plan.status() == Plan.Status.CORNER ? 1 : 0;
      assertThat(plan.cost()).as("%d: %s", k, planted).isLessThan(found * (1 + LOWER));
      assertThat(plan.cost()).as("%d: %s", k, planted).isGreaterThan(found * (1 - HIGHER));
    }
    assertThat(compared).isGreaterThanOrEqualTo(1_000);
    assertThat(limited).isGreaterThan(20);
  }

  private static double search(Technology technology, Plan plan, Question question) {
    int n = question.dimension();
    double box = box(technology);
    double[] low = new double[n - 1];
    double[] high = new double[n - 1];
    double[] start = new double[n - 1];
    for (int i = 0; i < n - 1; i++) {
      double planned = Math.log(plan.mix(i));
      low[i] = Math.max(Math.log(question.low(i)), planned - box);
      high[i] = Math.min(Math.log(question.high(i)), planned + box);
      start[i] = low[i] + .45 * (high[i] - low[i]);
    }
    double last = Math.log(plan.mix(n - 1));
    BOBYQAOptimizer optimiser = new BOBYQAOptimizer(2 * n - 1, .05, 1e-7);
    double value =
        optimiser
            .optimize(
                new MaxEval(20_000),
                GoalType.MINIMIZE,
                new ObjectiveFunction(z -> logCost(technology, question, z, last)),
                new InitialGuess(start),
                new SimpleBounds(low, high))
            .getValue();
    return Math.exp(value);
  }

  private static double box(Technology technology) {
    double rho = 0;
    for (int k = 0; k < technology.parameterNames().size(); k++) {
      if (technology.parameterNames().get(k).startsWith("rho")) {
        rho = Math.max(rho, technology.parameters()[k]);
      }
    }
    if (rho > 0) {
      // Further out the target is beyond reach of the last input alone, a cliff for the optimiser.
      return Math.min(BOX, .15 / rho);
    }
    return technology instanceof Translog ? REGULAR_BOX : BOX;
  }

  /** ln of the cost when the last input makes up the target; a wall where it cannot. */
  private static double logCost(Technology technology, Question question, double[] z, double last) {
    int n = z.length + 1;
    double[] mix = new double[n];
    double cost = 0;
    for (int i = 0; i < n - 1; i++) {
      mix[i] = Math.exp(z[i]);
      cost += question.price(i) * mix[i];
    }
    double reach = technology instanceof Translog ? REGULAR_REACH : REACH;
    BrentSolver solver = new BrentSolver(1e-15, 1e-14, 1e-16);
    try {
      double root =
          solver.solve(
              300,
              candidate -> {
                mix[n - 1] = Math.exp(candidate);
                return Math.log(technology.output(mix) / question.target());
              },
              last - reach,
              last + reach);
      return Math.log(cost + question.price(n - 1) * Math.exp(root));
    } catch (MathIllegalStateException
        | org.apache.commons.math3.exception.NoBracketingException e) {
      return Math.log(cost) + 20;
    }
  }
}

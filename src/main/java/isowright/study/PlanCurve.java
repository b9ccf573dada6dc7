package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.leastcost.CostCurve;
import isowright.leastcost.Goal;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.Planner;
import isowright.leastcost.Question;
import isowright.study.PlanDetail.Unanswered;
import isowright.study.PlanFindings.CurvePoint;
import isowright.technology.Regularity;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;

/**
 * The cost curve and expansion path of a question. Every target that was tried is accounted for: it
 * has a point, marked inside or outside the records and regular or not, or the reason why not.
 */
final class PlanCurve {

  /** Halvings of the way from a target with a plan to one without: to a part in some thousands. */
  private static final int HALVINGS = 12;

  private final PlanAnswer answer;
  private final Predicate<double[]> inside;
  private final Regularity.Checker checker;

  /**
   * A curve.
   *
   * @param points the targets that have a plan
   * @param without those that have none
   */
  record Found(List<CurvePoint> points, List<Unanswered> without) {}

  PlanCurve(PlanAnswer answer, Predicate<double[]> inside) {
    this.answer = answer;
    this.inside = inside;
    this.checker = new Regularity.Checker(answer.technology());
  }

  /** The curve over these targets, ascending. */
  Found over(double[] targets) {
    return answer.smooth() ? smooth(targets) : jumping(targets);
  }

  private Found smooth(double[] targets) {
    Question question = PlanFigures.question(answer.task());
    CostCurve whole = CostCurve.at(Minimiser.of(answer.technology()), question, targets);
    List<Plan> plans = new ArrayList<>();
    List<Double> answered = new ArrayList<>();
    List<Unanswered> without = new ArrayList<>();
    for (int k = 0; k < targets.length; k++) {
      Plan plan = whole.plans().get(k);
      if (plan.answered() && Double.isFinite(plan.marginalCost())) {
        plans.add(plan);
        answered.add(targets[k]);
      } else {
        without.add(without(targets[k], plan));
      }
    }
    return new Found(points(question, answered, plans), without);
  }

  private static Unanswered without(double target, Plan plan) {
    return plan.answered()
        ? new Unanswered(target, "infeasible", "no input is free to grow")
        : new Unanswered(target, plan.status().name().toLowerCase(Locale.ROOT), plan.reason());
  }

  private List<CurvePoint> points(Question question, List<Double> answered, List<Plan> plans) {
    List<Figure> all =
        answer
            .figures()
            .figures(
                answer.technology(),
                t -> {
                  LeastCost leastCost = Minimiser.of(t);
                  double[] rows = new double[plans.size() * 3];
                  for (int k = 0; k < plans.size(); k++) {
                    Plan plan = leastCost.plan(question.at(answered.get(k)), plans.get(k));
                    rows[3 * k] = plan.cost();
                    rows[3 * k + 1] = plan.marginalCost();
                    rows[3 * k + 2] = plan.cost() / answered.get(k);
                  }
                  return rows;
                },
                Scale.LOG);
    List<CurvePoint> points = new ArrayList<>();
    for (int k = 0; k < plans.size(); k++) {
      points.add(point(answered.get(k), all.subList(3 * k, 3 * k + 3), plans.get(k).mix()));
    }
    return points;
  }

  /** With whole units and bands the curve is drawn without intervals. */
  private Found jumping(double[] targets) {
    Planner planner = Planner.of(answer.technology());
    List<CurvePoint> points = new ArrayList<>();
    List<Unanswered> without = new ArrayList<>();
    for (double target : targets) {
      PlanOutcome outcome = planner.plan(answer.task().towards(new Goal.Target(target)));
      Plan plan = outcome.plan();
      if (!outcome.planned()) {
        String status = outcome.state().name().toLowerCase(Locale.ROOT);
        without.add(new Unanswered(target, status, plan.reason()));
      } else if (Double.isFinite(plan.marginalCost())) {
        List<Figure> figures =
            List.of(
                answer.figures().bare(plan.cost()),
                answer.figures().bare(plan.marginalCost()),
                answer.figures().bare(plan.cost() / target));
        points.add(point(target, figures, plan.mix()));
      } else {
        without.add(without(target, plan));
      }
    }
    return new Found(points, without);
  }

  private CurvePoint point(double target, List<Figure> figures, double[] quantities) {
    Map<String, Double> mix = new LinkedHashMap<>();
    for (int i = 0; i < quantities.length; i++) {
      mix.put(answer.inputs().get(i), quantities[i]);
    }
    return new CurvePoint(
        target,
        figures.get(0),
        figures.get(1),
        figures.get(2),
        mix,
        inside.test(quantities),
        regular(quantities));
  }

  /** Checked again at the mix; at the edge, where an input is not used, the search has checked. */
  private boolean regular(double[] quantities) {
    double[] logs = new double[quantities.length];
    for (int i = 0; i < logs.length; i++) {
      if (!(quantities[i] > 0)) {
        return true;
      }
      logs[i] = Math.log(quantities[i]);
    }
    checker.check(logs);
    return checker.regular();
  }

  /**
   * Where the target has no plan because the technology is irregular there: the nearest target that
   * has one, looked for from the nearest point of the curve.
   */
  Optional<CurvePoint> nearest(List<CurvePoint> points) {
    double target = answer.asked().target();
    boolean asked = answer.outcome().state() == PlanOutcome.State.IRREGULAR && target > 0;
    if (!asked || !answer.smooth() || points.isEmpty()) {
      return Optional.empty();
    }
    Question question = PlanFigures.question(answer.task());
    LeastCost leastCost = Minimiser.of(answer.technology());
    double with = points.get(0).target();
    for (CurvePoint point : points) {
      if (apart(point.target(), target) < apart(with, target)) {
        with = point.target();
      }
    }
    Plan plan = leastCost.plan(question.at(with));
    double without = target;
    for (int k = 0; k < HALVINGS; k++) {
      double between = Math.sqrt(with * without);
      Plan there = leastCost.plan(question.at(between), plan);
      if (there.answered() && Double.isFinite(there.marginalCost())) {
        with = between;
        plan = there;
      } else {
        without = between;
      }
    }
    return points(question, List.of(with), List.of(plan)).stream().findFirst();
  }

  private static double apart(double one, double other) {
    return Math.abs(Math.log(one / other));
  }
}

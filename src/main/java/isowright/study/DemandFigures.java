package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.study.PlanDetail.Demand;
import isowright.study.PlanDetail.DemandPoint;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;

/**
 * How the mix of a plan answers to prices at the same target: demand against each price, and
 * elasticities. Own-price demand never rises (the substitution matrix is negative semidefinite).
 */
final class DemandFigures {

  /** Prices from half to twice the plan's, evenly spaced in logs. */
  private static final int POINTS = 11;

  private static final double SPAN = Math.log(2);

  /** The step of the fourth-order differences, in logs. */
  private static final double STEP = 1e-3;

  private final PlanAnswer answer;
  private final int n;

  DemandFigures(PlanAnswer answer) {
    this.answer = answer;
    this.n = answer.inputs().size();
  }

  /** Demand against the price of each input. */
  List<Demand> demands(Predicate<double[]> inside) {
    List<Demand> demands = new ArrayList<>();
    for (int j = 0; j < n; j++) {
      demands.add(demand(j, inside));
    }
    return demands;
  }

  private Demand demand(int j, Predicate<double[]> inside) {
    Question question = answer.settled();
    List<Question> asked = new ArrayList<>();
    List<Plan> plans = new ArrayList<>();
    LeastCost leastCost = Minimiser.of(answer.technology());
    for (int k = 0; k < POINTS; k++) {
      double[] prices = question.prices();
      prices[j] *= Math.exp(SPAN * (2.0 * k / (POINTS - 1) - 1));
      Plan plan = leastCost.plan(question.at(prices));
      if (plan.answered()) {
        asked.add(question.at(prices));
        plans.add(plan);
      }
    }
    List<Figure> all =
        answer.figures().figures(answer.technology(), t -> mixes(t, asked, plans), Scale.LOG);
    List<DemandPoint> points = new ArrayList<>();
    for (int k = 0; k < plans.size(); k++) {
      List<Figure> row = all.subList(k * (n + 1), (k + 1) * (n + 1));
      points.add(
          new DemandPoint(
              asked.get(k).price(j),
              answer.named(row.subList(0, n)),
              row.get(n),
              inside.test(plans.get(k).mix())));
    }
    return new Demand(answer.inputs().get(j), points);
  }

  private double[] mixes(Technology technology, List<Question> asked, List<Plan> plans) {
    LeastCost leastCost = Minimiser.of(technology);
    double[] rows = new double[plans.size() * (n + 1)];
    for (int k = 0; k < plans.size(); k++) {
      Plan plan = leastCost.plan(asked.get(k), plans.get(k));
      double[] mix = plan.answered() ? plan.mix() : FigureMaker.missing(n);
      System.arraycopy(mix, 0, rows, k * (n + 1), n);
      rows[k * (n + 1) + n] = plan.cost();
    }
    return rows;
  }

  /** By how many per cent cost rises with each price, with output, and with productivity. */
  Map<String, Figure> costElasticities() {
    List<Figure> figures =
        answer
            .figures()
            .figures(
                answer.technology(),
                t -> {
                  Question question = answer.settled();
                  Plan plan = answer.near(t, question);
                  if (!plan.answered()) {
                    return FigureMaker.missing(n + 2);
                  }
                  double[] row = new double[n + 2];
                  System.arraycopy(plan.shares(), 0, row, 0, n);
                  row[n] = plan.marginalCost() * question.target() / plan.cost();
                  row[n + 1] = -row[n];
                  return row;
                },
                Scale.LINEAR);
    Map<String, Figure> named = new LinkedHashMap<>(answer.named(figures.subList(0, n)));
    named.put("output", figures.get(n));
    named.put("productivity", figures.get(n + 1));
    named.values().removeIf(figure -> !Double.isFinite(figure.value()));
    return named;
  }

  /** ∂ln x_i/∂ln w_j at the same target and limits, row i the input that answers. */
  Map<String, Map<String, Figure>> demandElasticities() {
    List<Figure> figures =
        answer.figures().figures(answer.technology(), this::slopes, Scale.LINEAR);
    Map<String, Map<String, Figure>> rows = new LinkedHashMap<>();
    for (int i = 0; i < n; i++) {
      rows.put(answer.inputs().get(i), answer.named(figures.subList(i * n, (i + 1) * n)));
    }
    return figures.stream().allMatch(f -> Double.isFinite(f.value())) ? rows : Map.of();
  }

  private double[] slopes(Technology technology) {
    LeastCost leastCost = Minimiser.of(technology);
    Question question = answer.settled();
    double[] slopes = new double[n * n];
    for (int j = 0; j < n; j++) {
      for (int step : new int[] {-2, -1, 1, 2}) {
        double[] prices = question.prices();
        prices[j] *= Math.exp(step * STEP);
        Plan plan = leastCost.plan(question.at(prices), answer.plan());
        if (!plan.answered()) {
          return FigureMaker.missing(n * n);
        }
        double weight = (Math.abs(step) == 1 ? 8 : -1) * Math.signum(step) / (12 * STEP);
        for (int i = 0; i < n; i++) {
          slopes[i * n + j] += weight * Math.log(plan.mix(i));
        }
      }
    }
    return slopes;
  }
}

package isowright.study;

import isowright.inference.DeltaMethod;
import isowright.inference.Intervals;
import isowright.leastcost.CostCurve;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.CurvePoint;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.Predicate;
import java.util.stream.Stream;

/**
 * The figures of a plan with their uncertainty: money and quantities on the log scale (they are
 * positive), shares on their own. Of a technology taken as known all figures are exact.
 */
final class PlanFigures {

  /** A plan's figures. */
  record Answer(
      Map<String, Figure> mix,
      Optional<Figure> cost,
      Optional<Figure> marginalCost,
      Optional<Figure> averageCost,
      Map<String, Figure> shares,
      List<Said> remarks) {

    static final Answer NONE =
        new Answer(
            Map.of(), Optional.empty(), Optional.empty(), Optional.empty(), Map.of(), List.of());
  }

  private final List<String> inputs;
  private final Optional<Intervals> intervals;
  private final Optional<Intervals> curveIntervals;

  /**
   * @param intervals for the figures of the plan; absent where they are exact
   * @param curveIntervals for the points of its cost curve, which are many
   */
  PlanFigures(
      List<String> inputs, Optional<Intervals> intervals, Optional<Intervals> curveIntervals) {
    this.inputs = inputs;
    this.intervals = intervals;
    this.curveIntervals = curveIntervals;
  }

  Answer answer(Technology technology, Question question, Plan plan) {
    if (!plan.answered()) {
      return Answer.NONE;
    }
    int n = inputs.size();
    List<Figure> positive =
        figures(
            intervals,
            technology,
            t -> money(Minimiser.of(t), question, plan),
            DeltaMethod.Scale.LOG);
    List<Figure> shares =
        figures(
            intervals,
            technology,
            t -> {
              Plan p = Minimiser.of(t).plan(question, plan);
              return p.answered() ? p.shares() : missing(n);
            },
            DeltaMethod.Scale.LINEAR);
    List<Said> remarks = new ArrayList<>();
    boolean unsure =
        positive.stream()
            .filter(f -> !EstimatedFigures.resampled(f))
            .anyMatch(f -> f.uncertainty().map(u -> Double.isNaN(u.standardError())).orElse(false));
    ResamplingWords.failed(Stream.concat(positive.stream(), shares.stream()))
        .ifPresent(remarks::add);
    if (unsure) {
      remarks.add(
          Said.of(
              "warning",
              "no-interval",
              "Beside the estimate, within a small part of a standard error, the question has no"
                  + " regular answer, so some figures have no interval."));
    }
    if (Double.isInfinite(plan.marginalCost())) {
      remarks.add(
          Said.of(
              "note",
              "no-marginal-cost",
              "No input is free to grow, so marginal cost is beyond measure."));
    }
    return new Answer(
        named(positive.subList(3, 3 + n)),
        Optional.of(positive.get(0)),
        finite(positive.get(1)),
        Optional.of(positive.get(2)),
        named(shares),
        remarks);
  }

  /** The cost curve over those targets that have an answer. */
  List<CurvePoint> curve(
      Technology technology, Question question, double[] targets, Predicate<double[]> inside) {
    CostCurve whole = CostCurve.at(Minimiser.of(technology), question, targets);
    List<Plan> plans = new ArrayList<>();
    List<Double> answered = new ArrayList<>();
    for (int k = 0; k < targets.length; k++) {
      Plan plan = whole.plans().get(k);
      if (plan.answered() && Double.isFinite(plan.marginalCost())) {
        plans.add(plan);
        answered.add(targets[k]);
      }
    }
    int width = 3 + inputs.size();
    List<Figure> all =
        figures(
            curveIntervals,
            technology,
            t -> {
              LeastCost leastCost = Minimiser.of(t);
              double[] rows = new double[plans.size() * width];
              for (int k = 0; k < plans.size(); k++) {
                double[] row = money(leastCost, question.at(answered.get(k)), plans.get(k));
                System.arraycopy(row, 0, rows, k * width, width);
              }
              return rows;
            },
            DeltaMethod.Scale.LOG);
    List<CurvePoint> points = new ArrayList<>();
    for (int k = 0; k < plans.size(); k++) {
      List<Figure> figures = all.subList(k * width, (k + 1) * width);
      Map<String, Double> mix = new LinkedHashMap<>();
      for (int i = 0; i < inputs.size(); i++) {
        mix.put(inputs.get(i), plans.get(k).mix(i));
      }
      points.add(
          new CurvePoint(
              answered.get(k),
              figures.get(0),
              figures.get(1),
              figures.get(2),
              mix,
              inside.test(plans.get(k).mix())));
    }
    return points;
  }

  /** Cost, marginal cost, average cost, mix; NaN where there is no answer. */
  private double[] money(LeastCost leastCost, Question question, Plan near) {
    int n = inputs.size();
    Plan plan = leastCost.plan(question, near);
    if (!plan.answered()) {
      return missing(3 + n);
    }
    double[] row = new double[3 + n];
    row[0] = plan.cost();
    row[1] = plan.marginalCost();
    row[2] = plan.cost() / question.target();
    System.arraycopy(plan.mix(), 0, row, 3, n);
    return row;
  }

  private static List<Figure> figures(
      Optional<Intervals> by,
      Technology technology,
      Function<Technology, double[]> functions,
      DeltaMethod.Scale scale) {
    if (by.isEmpty()) {
      List<Figure> exact = new ArrayList<>();
      for (double value : functions.apply(technology)) {
        exact.add(Figure.exact(value));
      }
      return exact;
    }
    return by.get().estimates(functions, scale).stream().map(EstimatedFigures::of).toList();
  }

  private static Optional<Figure> finite(Figure figure) {
    return Double.isFinite(figure.value()) ? Optional.of(figure) : Optional.empty();
  }

  private Map<String, Figure> named(List<Figure> figures) {
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < figures.size(); i++) {
      named.put(inputs.get(i), figures.get(i));
    }
    return named;
  }

  private static double[] missing(int count) {
    double[] missing = new double[count];
    Arrays.fill(missing, Double.NaN);
    return missing;
  }
}

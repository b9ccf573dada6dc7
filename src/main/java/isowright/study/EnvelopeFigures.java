package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.leastcost.EfficientScale;
import isowright.leastcost.EnvelopeTouch;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.study.PlanDetail.Envelope;
import isowright.study.PlanDetail.EnvelopePoint;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;

/** Short-run beside long-run cost, and where average cost is least. */
final class EnvelopeFigures {

  /** The efficient scale is looked for as far beyond the curve and the records as this factor. */
  private static final double BEYOND = 10;

  private final PlanAnswer answer;

  EnvelopeFigures(PlanAnswer answer) {
    this.answer = answer;
  }

  /** The envelope; none where nothing is held and no short run is asked. */
  Optional<Envelope> envelope(double[] targets, Predicate<double[]> inside) {
    Map<String, Double> held = held();
    if (held.isEmpty()) {
      return Optional.empty();
    }
    Question base = PlanFigures.question(answer.task());
    Question longRun = base;
    Question shortRun = base;
    for (Map.Entry<String, Double> entry : held.entrySet()) {
      int i = answer.inputs().indexOf(entry.getKey());
      Study.Limit limit = answer.asked().limits().get(entry.getKey());
      longRun =
          limit == null
              ? longRun.limiting(i, 0, Double.POSITIVE_INFINITY)
              : longRun.limiting(i, limit.low(), limit.high());
      shortRun = shortRun.holding(i, entry.getValue());
    }
    List<EnvelopePoint> points = points(targets, shortRun, longRun, inside);
    return points.isEmpty()
        ? Optional.empty()
        : Optional.of(new Envelope(held, points, touch(held, longRun)));
  }

  /** What the short run holds: what the question holds, or what it asks to be held at the plan. */
  private Map<String, Double> held() {
    Map<String, Double> held = new LinkedHashMap<>();
    for (String input : answer.inputs()) {
      Double quantity = answer.asked().hold().get(input);
      if (quantity != null) {
        held.put(input, quantity);
      } else if (answer.asked().terms().shortRun().contains(input)) {
        held.put(input, answer.plan().mix(answer.inputs().indexOf(input)));
      }
    }
    return held;
  }

  private List<EnvelopePoint> points(
      double[] targets, Question shortRun, Question longRun, Predicate<double[]> inside) {
    LeastCost leastCost = Minimiser.of(answer.technology());
    List<Double> answered = new ArrayList<>();
    List<Plan> shortPlans = new ArrayList<>();
    List<Plan> longPlans = new ArrayList<>();
    for (double target : targets) {
      Plan held = leastCost.plan(shortRun.at(target));
      Plan free = leastCost.plan(longRun.at(target));
      boolean both = held.answered() && free.answered() && Double.isFinite(held.marginalCost());
      if (both) {
        answered.add(target);
        shortPlans.add(held);
        longPlans.add(free);
      }
    }
    List<Figure> all =
        answer
            .figures()
            .figures(
                answer.technology(),
                t -> {
                  LeastCost by = Minimiser.of(t);
                  double[] rows = new double[4 * answered.size()];
                  for (int k = 0; k < answered.size(); k++) {
                    Plan held = by.plan(shortRun.at(answered.get(k)), shortPlans.get(k));
                    Plan free = by.plan(longRun.at(answered.get(k)), longPlans.get(k));
                    rows[4 * k] = held.cost();
                    rows[4 * k + 1] = held.marginalCost();
                    rows[4 * k + 2] = free.cost();
                    rows[4 * k + 3] = free.marginalCost();
                  }
                  return rows;
                },
                Scale.LOG);
    List<EnvelopePoint> points = new ArrayList<>();
    for (int k = 0; k < answered.size(); k++) {
      List<Figure> row = all.subList(4 * k, 4 * k + 4);
      points.add(
          new EnvelopePoint(
              answered.get(k),
              row.get(0),
              row.get(1),
              row.get(2),
              row.get(3),
              inside.test(shortPlans.get(k).mix()),
              inside.test(longPlans.get(k).mix())));
    }
    return points;
  }

  /**
   * Where short and long run touch: one held input has one such output, several in general none.
   */
  private Optional<Figure> touch(Map<String, Double> held, Question longRun) {
    if (held.size() != 1) {
      return Optional.empty();
    }
    String input = held.keySet().iterator().next();
    int i = answer.inputs().indexOf(input);
    double quantity = held.getOrDefault(input, Double.NaN);
    double start = answer.outcome().output();
    double here =
        EnvelopeTouch.near(Minimiser.of(answer.technology()), longRun, i, quantity, start);
    if (Double.isNaN(here)) {
      return Optional.empty();
    }
    if (answer.asked().hold().isEmpty()) {
      return Optional.of(Figure.exact(start)); // held at the plan, so they touch at its output
    }
    return Optional.of(
        answer
            .figures()
            .figures(
                answer.technology(),
                t -> new double[] {EnvelopeTouch.near(Minimiser.of(t), longRun, i, quantity, here)},
                Scale.LOG)
            .get(0));
  }

  /** Where average cost is least, looked for around the curve and the recorded outputs. */
  PlanDetail.EfficientScale efficientScale(
      double from, double to, Predicate<double[]> inside, Predicate<Double> recorded) {
    Technology technology = answer.technology();
    Question question = PlanFigures.question(answer.task());
    EfficientScale found =
        EfficientScale.between(Minimiser.of(technology), question, from / BEYOND, to * BEYOND);
    String course = found.course().name().toLowerCase(java.util.Locale.ROOT);
    if (found.plan().isEmpty()) {
      return new PlanDetail.EfficientScale(
          course, found.from(), found.to(), Optional.empty(), Optional.empty(), false);
    }
    List<Figure> figures =
        answer
            .figures()
            .figures(
                technology,
                t -> {
                  LeastCost by = Minimiser.of(t);
                  double output = EfficientScale.near(by, question, found.output());
                  double cost = Double.isNaN(output) ? output : by.cost(question.at(output));
                  return new double[] {output, cost / output};
                },
                Scale.LOG);
    boolean seen = inside.test(found.plan().get().mix()) && recorded.test(found.output());
    return new PlanDetail.EfficientScale(
        course,
        found.from(),
        found.to(),
        Optional.of(figures.get(0)),
        Optional.of(figures.get(1)),
        seen);
  }
}

package isowright.study;

import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.inference.DeltaMethod;
import isowright.study.CostTask.Settled;
import isowright.study.PlanDetail.Checks;
import isowright.study.PlanDetail.Envelope;
import isowright.study.PlanDetail.EnvelopePoint;
import isowright.study.Study.LeastCostQuestion;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.Predicate;

/** What the answer of a cost function says beside mix and cost. */
final class CostPlanDetail {

  /** Numbers of a cost function as figures. */
  interface Figures {
    /** The figures of several numbers that share the work of finding them. */
    List<Figure> of(Function<CostFunction, double[]> numbers, DeltaMethod.Scale scale);
  }

  /** Relative step of central differences: errors of 1e-8 and of rounding are alike. */
  private static final double STEP = 1e-4;

  /** Short and long run are held to touch within so many times the target, up and down. */
  private static final double TOUCH_WITHIN = 1000;

  private final CostTask task;
  private final Settled settled;
  private final Figures figures;
  private final Predicate<double[]> inside;

  CostPlanDetail(CostTask task, Settled settled, Figures figures, Predicate<double[]> inside) {
    this.task = task;
    this.settled = settled;
    this.figures = figures;
    this.inside = inside;
  }

  /** The question's name, and nothing else. */
  static PlanDetail bare(LeastCostQuestion question) {
    return of(question, Optional.empty(), Optional.empty(), Map.of(), Map.of());
  }

  private static PlanDetail of(
      LeastCostQuestion question,
      Optional<Checks> checks,
      Optional<Envelope> envelope,
      Map<String, Figure> costElasticities,
      Map<String, Map<String, Figure>> demandElasticities) {
    PlanDetail none = PlanDetail.NONE;
    return new PlanDetail(
        question.terms().asked(),
        none.goal(),
        none.stated(),
        none.output(),
        none.profit(),
        none.multipliers(),
        checks,
        none.proof(),
        envelope,
        none.efficientScale(),
        none.demands(),
        none.changes(),
        costElasticities,
        demandElasticities,
        none.across(),
        none.withoutPlan(),
        none.nearest());
  }

  PlanDetail detail(LeastCostQuestion question, double[] targets, CostFunction function) {
    boolean plain = task.names().size() == task.inputs() && bound() == 0;
    return of(
        question,
        Optional.of(checks(function, question.target())),
        envelope(question, targets, function),
        plain ? costElasticities() : Map.of(),
        plain ? demandElasticities() : Map.of());
  }

  private long bound() {
    return java.util.Arrays.stream(settled.bound()).filter(b -> !Double.isNaN(b)).count();
  }

  private Map<String, Figure> costElasticities() {
    List<Figure> all =
        figures.of(
            f -> {
              CostElasticities at = CostElasticities.at(f, settled.at());
              double[] row = java.util.Arrays.copyOf(at.shares(), task.inputs() + 1);
              row[task.inputs()] = at.costElasticity(0);
              return row;
            },
            DeltaMethod.Scale.LINEAR);
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < task.inputs(); i++) {
      named.put(task.names().get(i), all.get(i));
    }
    named.put("output", all.get(task.inputs()));
    return named;
  }

  private Map<String, Map<String, Figure>> demandElasticities() {
    int n = task.inputs();
    List<Figure> all =
        figures.of(
            f -> {
              CostElasticities at = CostElasticities.at(f, settled.at());
              double[] rows = new double[n * n];
              for (int k = 0; k < rows.length; k++) {
                rows[k] = at.demand(k / n, k % n);
              }
              return rows;
            },
            DeltaMethod.Scale.LINEAR);
    Map<String, Map<String, Figure>> rows = new LinkedHashMap<>();
    for (int i = 0; i < n; i++) {
      Map<String, Figure> row = new LinkedHashMap<>();
      for (int j = 0; j < n; j++) {
        row.put(task.names().get(j), all.get(i * n + j));
      }
      rows.put(task.names().get(i), row);
    }
    return rows;
  }

  /** Shephard's lemma, homogeneity and marginal cost found again by differences of least cost. */
  private Checks checks(CostFunction function, double target) {
    double[] here = task.numbers(function, settled);
    double shephard = 0;
    for (int i = 0; i < task.inputs(); i++) {
      double slope = (logCost(function, target, i, STEP) - logCost(function, target, i, -STEP));
      double share = Math.exp(task.v()[i]) * here[3 + i] / here[0];
      shephard = Math.max(shephard, Math.abs(slope / (2 * STEP) - share));
    }
    double up = target * Math.exp(STEP);
    double down = target * Math.exp(-STEP);
    double slope = (cost(function, task, up) - cost(function, task, down)) / (up - down);
    double twice = cost(function, dearer(-1, Math.log(2)), target);
    return new Checks(
        0,
        settled.departure(),
        Double.NaN,
        shephard,
        Math.abs(twice / (2 * here[0]) - 1),
        Math.abs(slope / here[1] - 1));
  }

  private double logCost(CostFunction function, double target, int price, double by) {
    return Math.log(cost(function, dearer(price, by), target));
  }

  private double cost(CostFunction function, CostTask other, double target) {
    Settled there = other.settle(function, target);
    return there.reason().isPresent() ? Double.NaN : other.numbers(function, there)[0];
  }

  /** The same question with one price e^by times as high; all of them where none is named. */
  private CostTask dearer(int price, double by) {
    double[] v = task.v().clone();
    double[] fixed = task.fixedPrices().clone();
    for (int i = 0; i < task.inputs(); i++) {
      v[i] += price < 0 || price == i ? by : 0;
    }
    for (int f = 0; f < fixed.length; f++) {
      fixed[f] *= price < 0 ? Math.exp(by) : 1;
    }
    return new CostTask(
        task.arguments(), v, fixed, task.low(), task.high(), task.from(), task.to());
  }

  /** Short run beside long run; none where nothing is held that could be chosen. */
  private Optional<Envelope> envelope(
      LeastCostQuestion question, double[] targets, CostFunction function) {
    Map<String, Double> held = new LinkedHashMap<>();
    CostTask shortRun = task;
    double[] here = task.numbers(function, settled);
    for (int q = 0; q < task.names().size(); q++) {
      String name = task.names().get(q);
      boolean priced = q < task.inputs() || !Double.isNaN(task.fixedPrices()[q - task.inputs()]);
      boolean stated = question.hold().containsKey(name);
      if (priced && (stated || question.terms().shortRun().contains(name))) {
        double quantity = stated ? task.low()[q] : here[3 + q];
        held.put(name, quantity);
        shortRun = shortRun.holding(q, quantity);
      }
    }
    if (held.isEmpty()) {
      return Optional.empty();
    }
    CostTask longRun = task.free();
    List<EnvelopePoint> points = points(shortRun, longRun, targets, function);
    return points.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Envelope(held, points, touch(held, longRun, question.target(), function)));
  }

  private List<EnvelopePoint> points(
      CostTask shortRun, CostTask longRun, double[] targets, CostFunction function) {
    List<Double> answered = new ArrayList<>();
    List<Settled> held = new ArrayList<>();
    List<Settled> free = new ArrayList<>();
    for (double target : targets) {
      Settled before = shortRun.settle(function, target);
      Settled after = longRun.settle(function, target);
      if (before.reason().isEmpty()
          && after.reason().isEmpty()
          && CostElasticities.at(function, before.at()).monotone()
          && CostElasticities.at(function, after.at()).monotone()) {
        answered.add(target);
        held.add(before);
        free.add(after);
      }
    }
    List<Figure> all =
        figures.of(
            f -> {
              double[] rows = new double[4 * answered.size()];
              for (int k = 0; k < answered.size(); k++) {
                System.arraycopy(shortRun.numbers(f, held.get(k)), 0, rows, 4 * k, 2);
                System.arraycopy(longRun.numbers(f, free.get(k)), 0, rows, 4 * k + 2, 2);
              }
              return rows;
            },
            DeltaMethod.Scale.LOG);
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
              inside.test(held.get(k).at()),
              inside.test(free.get(k).at())));
    }
    return points;
  }

  /** The target of which what is held would be the long-run quantity; for one held input. */
  private Optional<Figure> touch(
      Map<String, Double> held, CostTask longRun, double target, CostFunction function) {
    if (held.size() != 1) {
      return Optional.empty();
    }
    Map.Entry<String, Double> only = held.entrySet().iterator().next();
    int q = task.names().indexOf(only.getKey());
    double quantity = only.getValue();
    double low = Math.log(target / TOUCH_WITHIN);
    double high = Math.log(target * TOUCH_WITHIN);
    double here = touch(longRun, function, q, quantity, low, high);
    if (Double.isNaN(here)) {
      return Optional.empty();
    }
    double log = Math.log(here);
    double slope =
        (excess(longRun, function, q, quantity, log + STEP)
                - excess(longRun, function, q, quantity, log - STEP))
            / (2 * STEP);
    Settled there = longRun.settle(function, here);
    // To first order another function touches where its excess, over the slope here, leads.
    return Optional.of(
        figures
            .of(
                f -> {
                  double excess = Math.log(longRun.numbers(f, there)[3 + q] / quantity);
                  return new double[] {Math.exp(log - excess / slope)};
                },
                DeltaMethod.Scale.LOG)
            .get(0));
  }

  /** By halving the interval of logs; NaN where the quantity does not pass the one held in it. */
  private static double touch(
      CostTask longRun, CostFunction f, int q, double quantity, double low, double high) {
    double from = low;
    double to = high;
    double left = excess(longRun, f, q, quantity, from);
    double right = excess(longRun, f, q, quantity, to);
    for (int narrow = 0; narrow < 20 && (Double.isNaN(left) || Double.isNaN(right)); narrow++) {
      double middle = (low + high) / 2;
      from = Double.isNaN(left) ? (from + middle) / 2 : from;
      to = Double.isNaN(right) ? (to + middle) / 2 : to;
      left = excess(longRun, f, q, quantity, from);
      right = excess(longRun, f, q, quantity, to);
    }
    if (!(left * right <= 0)) {
      return Double.NaN;
    }
    for (int halving = 0; halving < 80 && to - from > 1e-13; halving++) {
      double middle = (from + to) / 2;
      double there = excess(longRun, f, q, quantity, middle);
      if (Double.isNaN(there)) {
        return Double.NaN;
      }
      boolean upper = left * there <= 0;
      to = upper ? middle : to;
      from = upper ? from : middle;
      left = upper ? left : there;
    }
    return Math.exp((from + to) / 2);
  }

  private static double excess(
      CostTask longRun, CostFunction f, int q, double quantity, double logTarget) {
    Settled there = longRun.settle(f, Math.exp(logTarget));
    return there.reason().isPresent()
        ? Double.NaN
        : Math.log(longRun.numbers(f, there)[3 + q] / quantity);
  }
}

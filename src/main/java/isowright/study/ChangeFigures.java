package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.leastcost.Goal;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlanTask;
import isowright.leastcost.Planner;
import isowright.study.PlanDetail.Change;
import isowright.study.PlanDetail.End;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What if a price, the goal or productivity were otherwise? Each is moved down and up by ten per
 * cent, and over the range that the records hold, everything else staying as asked; the whole
 * question is answered anew each time.
 */
final class ChangeFigures {

  private static final double TENTH = 0.1;

  /** What the records hold of each thing that is moved; without records nothing. */
  record Observed(
      List<Optional<double[]>> prices,
      Optional<double[]> output,
      Optional<double[]> productivity) {}

  private final PlanAnswer answer;
  private final Observed observed;

  /** One end of one change: the task and the shift of ln output by which productivity moves. */
  private record Scenario(PlanTask task, double shift, PlanOutcome outcome) {}

  /** A change with its two scenarios. */
  private record Pair(
      String what,
      String input,
      String span,
      double lowAt,
      double highAt,
      Scenario low,
      Scenario high) {}

  ChangeFigures(PlanAnswer answer, Observed observed) {
    this.answer = answer;
    this.observed = observed;
  }

  /** All changes, prices first. */
  List<Change> changes() {
    List<Pair> pairs = pairs();
    List<Scenario> ends = new ArrayList<>();
    for (Pair pair : pairs) {
      ends.add(pair.low);
      ends.add(pair.high);
    }
    List<Figure> results = results(ends);
    List<Figure> relative = relative(ends);
    List<Change> changes = new ArrayList<>();
    for (int k = 0; k < pairs.size(); k++) {
      Pair pair = pairs.get(k);
      changes.add(
          new Change(
              pair.what,
              pair.input,
              pair.span,
              end(pair.lowAt, results.get(2 * k), relative.get(2 * k)),
              end(pair.highAt, results.get(2 * k + 1), relative.get(2 * k + 1))));
    }
    return changes;
  }

  private static End end(double at, Figure result, Figure relative) {
    return new End(at, FigureMaker.finite(result), FigureMaker.finite(relative));
  }

  /** Whether intervals are worth their price: not where every end is a search of its own. */
  private boolean propagated() {
    boolean profit = answer.task().goal().fold(t -> false, b -> false, p -> true);
    return answer.smooth() && !profit;
  }

  private List<Figure> results(List<Scenario> ends) {
    if (!propagated()) {
      return ends.stream().map(e -> answer.figures().bare(result(e.outcome))).toList();
    }
    return answer.figures().figures(answer.technology(), t -> all(t, ends, false), Scale.LOG);
  }

  private List<Figure> relative(List<Scenario> ends) {
    if (!propagated()) {
      double base = result(answer.outcome());
      return ends.stream().map(e -> answer.figures().bare(result(e.outcome) / base - 1)).toList();
    }
    return answer.figures().figures(answer.technology(), t -> all(t, ends, true), Scale.LINEAR);
  }

  private double[] all(Technology technology, List<Scenario> ends, boolean relative) {
    boolean same = technology == answer.technology();
    double base =
        same
            ? result(answer.outcome())
            : result(Planner.of(technology).again(answer.task(), answer.outcome()));
    double[] numbers = new double[ends.size()];
    for (int k = 0; k < numbers.length; k++) {
      Scenario end = ends.get(k);
      double there = Double.NaN;
      if (end.outcome.planned()) {
        there =
            same
                ? result(end.outcome)
                : result(Planner.of(technology.shifted(end.shift)).again(end.task, end.outcome));
      }
      numbers[k] = relative ? there / base - 1 : there;
    }
    return numbers;
  }

  private double result(PlanOutcome outcome) {
    if (!outcome.planned()) {
      return Double.NaN;
    }
    return answer
        .task()
        .goal()
        .fold(t -> outcome.plan().cost(), b -> outcome.output(), p -> outcome.profit());
  }

  private List<Pair> pairs() {
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < answer.inputs().size(); i++) {
      int input = i;
      double price = answer.task().schedules().get(i).price(0);
      add(pairs, "price", i, price, observed.prices().get(i), at -> price(input, at / price));
    }
    add(
        pairs,
        goalWord(),
        -1,
        goalNumber(),
        goalWord().equals("target") ? observed.output() : Optional.empty(),
        this::goal);
    add(pairs, "productivity", -1, 1, observed.productivity(), this::productivity);
    return pairs;
  }

  private interface Mover {
    Scenario to(double at);
  }

  private void add(
      List<Pair> pairs, String what, int i, double now, Optional<double[]> range, Mover mover) {
    String input = i < 0 ? "" : answer.inputs().get(i);
    double low = now * (1 - TENTH);
    double high = now * (1 + TENTH);
    pairs.add(new Pair(what, input, "ten-per-cent", low, high, mover.to(low), mover.to(high)));
    range.ifPresent(
        seen ->
            pairs.add(
                new Pair(
                    what,
                    input,
                    "observed",
                    seen[0],
                    seen[1],
                    mover.to(seen[0]),
                    mover.to(seen[1]))));
  }

  private Scenario price(int i, double factor) {
    PlanTask task = answer.task().scaling(i, factor);
    return new Scenario(task, 0, Planner.of(answer.technology()).plan(task));
  }

  private Scenario goal(double at) {
    Goal goal =
        answer
            .task()
            .goal()
            .fold(t -> new Goal.Target(at), b -> new Goal.Budget(at), p -> new Goal.Profit(at));
    PlanTask task = answer.task().towards(goal);
    return new Scenario(task, 0, Planner.of(answer.technology()).plan(task));
  }

  private Scenario productivity(double factor) {
    double shift = Math.log(factor);
    Technology shifted = answer.technology().shifted(shift);
    return new Scenario(answer.task(), shift, Planner.of(shifted).plan(answer.task()));
  }

  private String goalWord() {
    return answer.task().goal().fold(t -> "target", b -> "budget", p -> "output-price");
  }

  private double goalNumber() {
    return answer.task().goal().fold(Goal.Target::output, Goal.Budget::money, Goal.Profit::price);
  }

  /** The least and the greatest of some numbers; absent where they do not differ. */
  static Optional<double[]> range(OptionalDouble least, OptionalDouble most) {
    return least.isPresent() && most.isPresent() && most.getAsDouble() > least.getAsDouble()
        ? Optional.of(new double[] {least.getAsDouble(), most.getAsDouble()})
        : Optional.empty();
  }
}

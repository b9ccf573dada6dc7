package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Simulation;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlanTask;
import isowright.leastcost.Planner;
import isowright.leastcost.Question;
import isowright.study.Findings.Said;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The figures of a plan with their uncertainty: money and quantities on the log scale (they are
 * positive), shares and profit on their own. Where the plan jumps with the technology (whole units,
 * bands) the uncertainty comes from drawn technologies.
 */
final class PlanFigures {

  /** Enough for the ends of a 95 % interval to be known to a tenth of its width or so. */
  private static final int DRAWS = 400;

  private static final long SEED = 20240613;

  /** Costs this near a budget, relative, are the budget. */
  private static final double USED_UP = 1e-9;

  /** A part of the draws without a plan that must be said. */
  private static final double MOSTLY = 0.99;

  /**
   * A plan's figures.
   *
   * @param mix by input
   * @param shares by input
   */
  record Main(
      Map<String, Figure> mix,
      Optional<Figure> cost,
      Optional<Figure> marginalCost,
      Optional<Figure> averageCost,
      Optional<Figure> output,
      Optional<Figure> profit,
      Map<String, Figure> shares,
      List<Said> remarks) {

    static final Main NONE =
        new Main(
            Map.of(),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            Map.of(),
            List.of());
  }

  private final PlanAnswer answer;
  private final int n;
  private final double confidence;

  PlanFigures(PlanAnswer answer, double confidence) {
    this.answer = answer;
    this.n = answer.inputs().size();
    this.confidence = confidence;
  }

  Main main() {
    if (!answer.outcome().planned()) {
      return Main.NONE;
    }
    return answer.smooth() || !answer.figures().estimated() ? smooth() : jumping();
  }

  /** Cost, marginal cost, average cost, output, mix. */
  private double[] money(PlanOutcome outcome) {
    if (!outcome.planned()) {
      return FigureMaker.missing(4 + n);
    }
    double[] row = new double[4 + n];
    row[0] = outcome.plan().cost();
    row[1] = outcome.plan().marginalCost();
    row[2] = outcome.plan().cost() / outcome.output();
    row[3] = outcome.output();
    System.arraycopy(outcome.plan().mix(), 0, row, 4, n);
    return row;
  }

  /** Shares of cost, profit. */
  private double[] rest(PlanOutcome outcome) {
    if (!outcome.planned()) {
      return FigureMaker.missing(n + 1);
    }
    double[] row = new double[n + 1];
    System.arraycopy(outcome.plan().shares(), 0, row, 0, n);
    // A profit that is not asked must not make a row look as if it could not be had.
    row[n] = Double.isNaN(outcome.profit()) ? 0 : outcome.profit();
    return row;
  }

  private PlanOutcome again(Technology technology) {
    return technology == answer.technology()
        ? answer.outcome()
        : Planner.of(technology).again(answer.task(), answer.outcome());
  }

  private Main smooth() {
    List<Figure> money =
        answer.figures().headline(answer.technology(), t -> money(again(t)), Scale.LOG);
    List<Figure> rest =
        answer.figures().headline(answer.technology(), t -> rest(again(t)), Scale.LINEAR);
    List<Said> remarks = new ArrayList<>();
    ResamplingWords.failed(Stream.concat(money.stream(), rest.stream())).ifPresent(remarks::add);
    boolean unsure =
        money.stream()
            .filter(f -> !EstimatedFigures.resampled(f))
            .anyMatch(f -> f.uncertainty().map(u -> Double.isNaN(u.standardError())).orElse(false));
    if (unsure && !Double.isInfinite(answer.plan().marginalCost())) {
      remarks.add(
          Said.of(
              "warning",
              "no-interval",
              "Beside the estimate, within a small part of a standard error, the question has no"
                  + " regular answer, so some figures have no interval."));
    }
    return main(money, rest, remarks);
  }

  private Main jumping() {
    double[] values = joined(money(answer.outcome()), rest(answer.outcome()));
    Simulation.Simulated simulated =
        Simulation.of(answer.estimated(), confidence, DRAWS, SEED)
            .estimates(
                values,
                t -> {
                  PlanOutcome drawn = Planner.of(t).plan(answer.task());
                  double[] numbers = joined(money(drawn), rest(drawn));
                  numbers[1] = 0; // marginal cost jumps with whole units; it is found without draws
                  return numbers;
                });
    List<Figure> all =
        new ArrayList<>(simulated.estimates().stream().map(FitStage::figure).toList());
    all.set(1, marginalCost());
    List<Said> remarks = new ArrayList<>();
    remarks.add(
        Said.of(
            "note",
            "simulated",
            String.format(
                Locale.ROOT,
                "Whole units and price bands make the plan jump, so its intervals come from %d"
                    + " technologies drawn from their estimated law (seed %d); the interval of"
                    + " marginal cost holds while units and bands stay as planned; the curve and"
                    + " the changes carry none.",
                DRAWS,
                SEED)));
    if (simulated.answered() < MOSTLY) {
      remarks.add(
          Said.of(
              "warning",
              "draws-without-plan",
              String.format(
                  Locale.ROOT,
                  "For %.0f of 100 drawn technologies there is no plan; the intervals rest on the"
                      + " others.",
                  100 * (1 - simulated.answered()))));
    }
    return main(all.subList(0, 4 + n), all.subList(4 + n, 5 + 2 * n), remarks);
  }

  /** Marginal cost while whole units and bands stay as planned. */
  private Figure marginalCost() {
    double value = answer.plan().marginalCost();
    if (!(value > 0) || Double.isInfinite(value)) {
      return answer.figures().bare(value);
    }
    return answer
        .figures()
        .figures(answer.technology(), t -> new double[] {again(t).plan().marginalCost()}, Scale.LOG)
        .get(0);
  }

  private Main main(List<Figure> money, List<Figure> rest, List<Said> remarks) {
    if (Double.isInfinite(answer.plan().marginalCost())) {
      remarks.add(
          Said.of(
              "note",
              "no-marginal-cost",
              "No input is free to grow, so marginal cost is beyond measure."));
    }
    boolean profit = !Double.isNaN(answer.outcome().profit());
    boolean target = answer.asked().terms().goal().fold(t -> true, b -> false, p -> false);
    return new Main(
        answer.named(money.subList(4, 4 + n)),
        Optional.of(spent().map(Figure::exact).orElse(money.get(0))),
        FigureMaker.finite(money.get(1)),
        Optional.of(money.get(2)),
        Optional.of(target ? Figure.exact(answer.outcome().output()) : money.get(3)),
        profit ? Optional.of(rest.get(n)) : Optional.empty(),
        answer.named(rest.subList(0, n)),
        remarks);
  }

  /** A budget that is used up is spent for certain, whatever the technology. */
  private Optional<Double> spent() {
    Optional<Double> budget =
        answer
            .task()
            .goal()
            .fold(t -> Optional.empty(), b -> Optional.of(b.money()), p -> Optional.empty());
    return budget.filter(money -> Math.abs(answer.plan().cost() / money - 1) < USED_UP);
  }

  private static double[] joined(double[] first, double[] second) {
    double[] both = new double[first.length + second.length];
    System.arraycopy(first, 0, both, 0, first.length);
    System.arraycopy(second, 0, both, first.length, second.length);
    return both;
  }

  /** The prices and limits of a task with single prices, as a question about any target. */
  static Question question(PlanTask task) {
    int size = task.dimension();
    double[] prices = new double[size];
    double[] low = task.low();
    for (int i = 0; i < size; i++) {
      prices[i] = task.schedules().get(i).price(0);
      low[i] = Math.max(low[i], task.committed()[i]);
    }
    return new Question(1, prices, low, task.high());
  }
}

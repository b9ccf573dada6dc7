package isowright.study;

import isowright.inference.DeltaMethod.Scale;
import isowright.leastcost.Multiplier;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.Planner;
import isowright.study.PlanDetail.Worth;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What one more unit of each constraint is worth, with its uncertainty and in words. */
final class WorthWords {

  /** A limit worth less than this part of the price of its input is worth nothing. */
  private static final double NOTHING = 1e-9;

  private static final MathContext THREE = new MathContext(3);

  private final Findings.Units units;
  private final PlanAnswer answer;

  WorthWords(Findings.Units units, PlanAnswer answer) {
    this.units = units;
    this.answer = answer;
  }

  List<Worth> all() {
    List<Multiplier> multipliers = answer.outcome().multipliers();
    double[] values = values(answer.outcome());
    List<Figure> figures =
        answer
            .figures()
            .figures(
                answer.technology(),
                t ->
                    t == answer.technology()
                        ? values
                        : values(Planner.of(t).again(answer.task(), answer.outcome())),
                Scale.LINEAR);
    List<Worth> all = new ArrayList<>();
    for (int k = 0; k < multipliers.size(); k++) {
      Multiplier multiplier = multipliers.get(k);
      String of = multiplier.input() < 0 ? "" : answer.inputs().get(multiplier.input());
      all.add(
          new Worth(
              multiplier.word(),
              of,
              multiplier.bound(),
              FigureMaker.finite(figures.get(k)),
              words(multiplier, of)));
    }
    return all;
  }

  /** The values in the order of the answer's multipliers; NaN where a constraint ceases to bind. */
  private double[] values(PlanOutcome outcome) {
    List<Multiplier> wanted = answer.outcome().multipliers();
    double[] values = FigureMaker.missing(wanted.size());
    for (int k = 0; k < values.length; k++) {
      for (Multiplier found : outcome.multipliers()) {
        if (found.kind() == wanted.get(k).kind() && found.input() == wanted.get(k).input()) {
          values[k] = found.value();
        }
      }
    }
    return values;
  }

  private String words(Multiplier multiplier, String of) {
    double value = multiplier.value();
    String output = units.output().isEmpty() ? "unit of output" : units.output();
    return switch (multiplier.kind()) {
      case TARGET ->
          Double.isInfinite(value)
              ? "More output cannot be had: no input is free to grow."
              : value == 0
                  ? "More output costs nothing at first: what is taken yields more than the target."
                  : "One more " + output + " costs " + number(value) + " " + units.money() + ".";
      case BUDGET ->
          "One more "
              + (units.money().equals("money") ? "unit of money" : units.money())
              + " yields "
              + withUnit(value)
              + " more output.";
      default -> limit(multiplier, of);
    };
  }

  private String limit(Multiplier multiplier, String of) {
    String unit = units.inputs().getOrDefault(of, "");
    String where =
        switch (multiplier.kind()) {
          case HELD -> "held at ";
          case UPPER -> "at its upper limit of ";
          case LOWER -> "at its lower limit of ";
          case COMMITMENT -> "paid for up to ";
          default -> "at the end of a price band, ";
        };
    String start = of + " " + where + PlanWords.number(multiplier.bound(), unit) + ": ";
    double value = multiplier.value();
    int i = multiplier.input();
    if (Math.abs(value) <= NOTHING * answer.settled().price(i)) {
      return start + "it would be so without.";
    }
    String more = "one more " + (unit.isEmpty() ? "unit" : unit) + " of " + of;
    String less = "one " + (unit.isEmpty() ? "unit" : unit) + " of " + of + " less";
    if (multiplier.kind() == Multiplier.Kind.BAND) {
      more += " at the price before";
    }
    String verb = value > 0 ? more : less;
    return start + verb + " would " + gain(Math.abs(value)) + ".";
  }

  /** An estimate to three digits: more of them its interval does not bear out. */
  private String number(double value) {
    return answer.figures().estimated()
        ? PlanWords.number(new BigDecimal(value).round(THREE).doubleValue())
        : PlanWords.number(value);
  }

  private String withUnit(double value) {
    return units.output().isEmpty() ? number(value) : number(value) + " " + units.output();
  }

  /** What is gained: cost lowered, output added or profit added. */
  private String gain(double value) {
    return answer
        .asked()
        .terms()
        .goal()
        .fold(
            target -> "lower cost by " + number(value) + " " + units.money(),
            budget -> "add " + withUnit(value) + " of output",
            profit -> "add " + number(value) + " " + units.money() + " of profit");
  }

  /** What whole units cost, against the same task without them; none where none are asked. */
  static Optional<Worth> whole(PlanAnswer answer, Findings.Units units) {
    List<String> names = answer.asked().terms().whole();
    if (names.isEmpty()) {
      return Optional.empty();
    }
    isowright.leastcost.PlanTask task = answer.task();
    isowright.leastcost.PlanTask free =
        new isowright.leastcost.PlanTask(
            task.goal(),
            task.schedules(),
            task.low(),
            task.high(),
            task.committed(),
            new boolean[task.dimension()]);
    PlanOutcome relaxed = Planner.of(answer.technology()).plan(free);
    if (!relaxed.planned()) {
      return Optional.empty();
    }
    double value =
        task.goal()
            .fold(
                target -> answer.plan().cost() - relaxed.plan().cost(),
                budget -> relaxed.output() - answer.outcome().output(),
                profit -> relaxed.profit() - answer.outcome().profit());
    String what =
        task.goal()
            .fold(
                target -> "cost %s " + units.money() + " less",
                budget -> "yield %s more output",
                profit -> "earn %s " + units.money() + " more");
    String words =
        String.format(
            Locale.ROOT,
            "%s in whole units: without that the plan would " + what + ".",
            String.join(", ", names),
            PlanWords.number(Math.max(0, value)));
    return Optional.of(
        new Worth(
            "whole",
            String.join(", ", names),
            Double.NaN,
            Optional.of(answer.figures().bare(value)),
            words));
  }
}

package isowright.leastcost;

import isowright.leastcost.PlanOutcome.State;
import isowright.technology.Technology;
import java.util.Locale;

/**
 * Is it worth making anything at all? The best profit is held against that of making nothing, which
 * loses what is spent on inputs that are held or must be taken.
 */
record ShutDown(Technology technology, PlanTask task, double price) {

  PlanOutcome compared(PlanOutcome outcome) {
    double sunk = 0;
    for (int i = 0; i < task.dimension(); i++) {
      sunk += task.schedules().get(i).spending(task.least(i));
    }
    if (outcome.state() == State.NOTHING) {
      return Planner.none(State.NOTHING, outcome.plan().reason() + "; " + nothing(sunk));
    }
    if (outcome.planned() && outcome.profit() < -sunk) {
      String reason =
          String.format(
              Locale.ROOT,
              "the best output of %s at the price of %s would lose %s; %s",
              Wording.number(outcome.output()),
              Wording.number(price),
              Wording.number(-outcome.profit()),
              nothing(sunk));
      return Planner.none(State.NOTHING, reason);
    }
    return outcome;
  }

  private static String nothing(double sunk) {
    return sunk == 0
        ? "to make nothing loses nothing"
        : "to make nothing loses " + Wording.number(sunk) + ", spent on what cannot change";
  }
}

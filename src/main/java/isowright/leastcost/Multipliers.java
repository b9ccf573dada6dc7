package isowright.leastcost;

import isowright.leastcost.Multiplier.Kind;
import isowright.leastcost.Pursuit.Found;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What one more unit of each constraint is worth, from the settled question of a plan: for a limit
 * on input i at a target λ f_i − w_i in money; for a budget that divided by λ, in output; for
 * profit λ is the price of output.
 */
final class Multipliers {

  private final Technology technology;
  private final PlanTask task;
  private final Question settled;
  private final Found found;

  Multipliers(Technology technology, PlanTask task, Question settled, Found found) {
    this.technology = technology;
    this.task = task;
    this.settled = settled;
    this.found = found;
  }

  List<Multiplier> all() {
    List<Multiplier> all = new ArrayList<>();
    double lambda = found.plan().marginalCost();
    task.goal()
        .fold(
            target -> all.add(new Multiplier(Kind.TARGET, -1, target.output(), lambda)),
            budget -> all.add(new Multiplier(Kind.BUDGET, -1, budget.money(), 1 / lambda)),
            profit -> true);
    for (int i = 0; i < task.dimension(); i++) {
      limit(i).ifPresent(all::add);
    }
    return all;
  }

  private Optional<Multiplier> limit(int i) {
    double x = found.plan().mix(i);
    boolean low = x == settled.low(i);
    boolean high = x == settled.high(i);
    if ((!low && !high) || x == 0 || task.whole()[i]) {
      return Optional.empty();
    }
    double money = found.plan().limitValues()[i];
    Kind kind = kind(i, low, high);
    if (kind == Kind.BAND && low && !high) {
      // The same edge seen from the band before it.
      PriceSchedule schedule = task.schedules().get(i);
      int band = schedule.band(x);
      double before = schedule.price(band > 0 && schedule.start(band) == x ? band - 1 : band);
      money += settled.price(i) - before;
    }
    double worth = money;
    double value =
        task.goal()
            .fold(
                target -> worth,
                budget -> worth / found.plan().marginalCost(),
                profit -> ofProfit(i, worth, profit.price()));
    return Optional.of(new Multiplier(kind, i, x, value));
  }

  /** λ f_i − w_i with λ the price of output, where marginal cost itself is beyond measure. */
  private double ofProfit(int i, double money, double price) {
    Plan plan = found.plan();
    if (Double.isFinite(plan.marginalCost())) {
      return money;
    }
    return price * technology.gradient(plan.mix())[i] - settled.price(i);
  }

  private Kind kind(int i, boolean low, boolean high) {
    double x = found.plan().mix(i);
    if (task.held(i)) {
      return Kind.HELD;
    }
    if (high && x == task.high()[i] || high && x == task.schedules().get(i).most()) {
      return Kind.UPPER;
    }
    if (low && x == task.committed()[i]) {
      return Kind.COMMITMENT;
    }
    return low && x == task.low()[i] ? Kind.LOWER : Kind.BAND;
  }
}

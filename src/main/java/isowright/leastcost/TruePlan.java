package isowright.leastcost;

import isowright.leastcost.BranchAndBound.Settled;

/** The plan of a settled question with what is truly spent: steps and cheaper bands included. */
record TruePlan(PlanTask task, Settled settled) {

  Plan plan() {
    Plan plan = settled.found().plan();
    if (task.plain()) {
      return plan;
    }
    double[] mix = plan.mix();
    double cost = plan.cost() + settled.fixedMoney();
    double[] shares = new double[mix.length];
    for (int i = 0; i < mix.length; i++) {
      shares[i] = task.schedules().get(i).spending(mix[i]) / cost;
    }
    return new Plan(
        plan.status(),
        mix,
        cost,
        plan.marginalCost(),
        shares,
        plan.limitValues(),
        plan.optimality(),
        held() ? "" : plan.reason());
  }

  /** What binds by way of whole units or bands is said by the multipliers, not by the reason. */
  private boolean held() {
    for (int i = 0; i < task.dimension(); i++) {
      if (task.whole()[i] || task.schedules().get(i).size() > 1) {
        return true;
      }
    }
    return false;
  }
}

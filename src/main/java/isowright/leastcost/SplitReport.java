package isowright.leastcost;

import isowright.leastcost.PlanOutcome.State;
import isowright.leastcost.SplitOutcome.Share;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleFunction;

/** What is said of a split that was found, or of a target that no split reaches. */
record SplitReport(List<PlantOption> plants, List<CostTable> tables, double target) {

  /** An output this near the most a plant can make is at capacity. */
  private static final double AT = 1e-9;

  /** The same split with outputs and technologies moved a little. */
  static SplitOutcome again(
      List<PlantOption> plants,
      List<DoubleFunction<CostTable.Point>> costs,
      double[] outputs,
      SplitOutcome near) {
    List<Share> shares = new ArrayList<>();
    double total = 0;
    double lambda = Double.POSITIVE_INFINITY;
    for (int p = 0; p < plants.size(); p++) {
      Share before = near.shares().get(p);
      if (!before.runs()) {
        shares.add(before);
        total += before.cost();
        continue;
      }
      CostTable.Point point = costs.get(p).apply(outputs[p]);
      double cost = point.cost() + plants.get(p).runningCost();
      total += cost;
      shares.add(new Share(outputs[p], cost, point.plan(), before.atCapacity(), point.marginal()));
      lambda = before.atCapacity() ? lambda : Math.min(lambda, point.marginal());
    }
    List<Share> valued = new ArrayList<>();
    for (Share share : shares) {
      double value =
          share.runs() && share.atCapacity() && Double.isFinite(lambda)
              ? lambda - share.capacityValue()
              : 0;
      valued.add(new Share(share.output(), share.cost(), share.plan(), share.atCapacity(), value));
    }
    return new SplitOutcome(near.state(), valued, total, lambda, near.proof(), near.reason());
  }

  SplitOutcome outOfReach(double most) {
    List<String> ends = new ArrayList<>();
    boolean irregular = false;
    for (int p = 0; p < plants.size(); p++) {
      CostTable table = tables.get(p);
      double can = table.empty() ? 0 : table.most;
      if (can < target) {
        String why =
            table.end.isEmpty() && plants.get(p).capacity() <= can ? "its capacity" : table.end;
        ends.add(plants.get(p).name() + " at most " + Wording.number(can) + " (" + why + ")");
        irregular |= table.partly;
      }
    }
    String reason =
        "the target "
            + Wording.number(target)
            + " is out of reach: the plants together make at most "
            + Wording.number(most)
            + "; "
            + String.join("; ", ends);
    State state = irregular ? State.IRREGULAR : State.INFEASIBLE;
    return new SplitOutcome(state, List.of(), Double.NaN, Double.NaN, Proof.GLOBAL, reason);
  }

  SplitOutcome report(double[] outputs, int parts, double gap) {
    double lambda = lambda(outputs);
    List<Share> shares = new ArrayList<>();
    double cost = 0;
    for (int p = 0; p < plants.size(); p++) {
      Share share = share(p, outputs[p], lambda);
      shares.add(share);
      cost += share.cost();
    }
    return new SplitOutcome(State.PLANNED, shares, cost, lambda, proof(parts, gap), "");
  }

  private Share share(int p, double output, double lambda) {
    PlantOption plant = plants.get(p);
    if (!(output > 0)) {
      Plan idle = Answer.none(Plan.Status.CORNER, "it does not run");
      return new Share(0, plant.idle(), idle, false, 0);
    }
    CostTable.Point point = tables.get(p).at(output);
    boolean full = output >= Math.min(plant.capacity(), tables.get(p).most) * (1 - AT);
    boolean capacity = full && plant.capacity() <= output * (1 + AT);
    double value = capacity && Double.isFinite(lambda) ? lambda - point.marginal() : 0;
    return new Share(output, point.cost() + plant.runningCost(), point.plan(), capacity, value);
  }

  /** The least marginal cost among running plants that can make more. */
  private double lambda(double[] outputs) {
    double least = Double.POSITIVE_INFINITY;
    for (int p = 0; p < plants.size(); p++) {
      if (outputs[p] > 0) {
        boolean room =
            outputs[p] < plants.get(p).capacity() * (1 - AT)
                && (outputs[p] < tables.get(p).most * (1 - AT) || tables.get(p).end.isEmpty());
        double marginal = tables.get(p).at(outputs[p]).marginal();
        least = room ? Math.min(least, marginal) : least;
      }
    }
    return least;
  }

  private Proof proof(int parts, double gap) {
    List<String> reasons = new ArrayList<>();
    boolean regular = true;
    for (int p = 0; p < plants.size(); p++) {
      regular &= plants.get(p).technology().regularThroughout();
      if (tables.get(p).partly && !tables.get(p).empty()) {
        reasons.add(
            plants.get(p).name()
                + " is examined from "
                + Wording.number(tables.get(p).least)
                + " to "
                + Wording.number(tables.get(p).most)
                + ", where its technology is regular");
      } else if (tables.get(p).empty()) {
        reasons.add(plants.get(p).name() + " is left out: " + tables.get(p).end);
      }
    }
    if (!regular) {
      reasons.add("a technology is regular here but not at every mix");
    }
    if (gap > PlantSplit.PROVED) {
      reasons.add(
          "the search was ended after "
              + parts
              + " parts; a split cheaper by "
              + Wording.number(100 * gap)
              + " % may exist");
    }
    return new Proof(reasons.isEmpty(), gap, parts, String.join("; ", reasons));
  }
}

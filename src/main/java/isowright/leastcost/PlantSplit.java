package isowright.leastcost;

import isowright.leastcost.SplitBound.Range;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;
import java.util.function.DoubleFunction;

/**
 * How is a target split over plants at least cost, Σ q_p = Q, with own technologies, prices,
 * capacities and running costs?
 *
 * <p>Where every plant's cost is convex, marginal costs are equal in all plants that run below
 * capacity, and that is the answer. With increasing returns or running costs equal marginal costs
 * mark a maximum as well as a minimum, so the best split is found by branch and bound: each plant's
 * cost is bounded from below by the convex hull of what is known of it ({@link CostTable}), the
 * split that is cheapest by the hulls bounds the cost, and the part is divided at the plant that
 * this split leaves in the middle of an edge of its hull: to run or not, to make less or more.
 * Every split met is improved by Newton's method and the best kept. What is left between it and the
 * bound is the gap of the proof.
 *
 * <p>Source: Falk, J. E. and Soland, R. M. (1969), An Algorithm for Separable Nonconvex Programming
 * Problems, <i>Management Science</i> 15, 550–569; equal marginal cost: Patinkin, D. (1947),
 * Multiple-Plant Firms, Cartels, and Imperfect Competition, <i>Quarterly Journal of Economics</i>
 * 61, 173–205. Tested in {@code PlantSplitTest}.
 */
public final class PlantSplit {

  /** The gap at which a split counts as proved. */
  static final double PROVED = 1e-9;

  private static final int MOST_PARTS = 20_000;

  /** Points are added to the hulls of one part this often before it is divided. */
  private static final int ROUNDS = 4;

  private final List<PlantOption> plants;
  private final List<CostTable> tables = new ArrayList<>();
  private final List<DoubleFunction<CostTable.Point>> costs = new ArrayList<>();
  private final double target;
  private final int n;
  private double[] best = {};
  private double bestCost = Double.POSITIVE_INFINITY;

  private record Part(List<Range> ranges, SplitBound bound) {}

  private PlantSplit(List<PlantOption> plants, double target) {
    this.plants = List.copyOf(plants);
    this.target = target;
    n = plants.size();
    for (PlantOption plant : plants) {
      CostTable table = new CostTable(plant, target);
      tables.add(table);
      costs.add(table::examined);
    }
  }

  /**
   * The best split.
   *
   * @param target Q, positive
   */
  public static SplitOutcome of(List<PlantOption> plants, double target) {
    if (!(target > 0) || Double.isInfinite(target) || plants.isEmpty()) {
      throw new IllegalArgumentException(
          "a target of " + target + " for " + plants.size() + " plants");
    }
    return new PlantSplit(plants, target).split();
  }

  /**
   * The split by plants whose technologies differ a little from those of a split at hand, the same
   * plants running and the same at capacity. Where marginal costs do not fix the split (constant
   * returns), outputs stay as they were, which changes cost only to second order.
   *
   * @param near the split at hand
   */
  public static SplitOutcome again(List<PlantOption> plants, SplitOutcome near) {
    int n = plants.size();
    double[] outputs = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    List<DoubleFunction<CostTable.Point>> costs = new ArrayList<>();
    int moving = 0;
    for (int p = 0; p < n; p++) {
      SplitOutcome.Share share = near.shares().get(p);
      PlantOption plant = plants.get(p);
      LeastCost leastCost = Minimiser.of(plant.technology());
      costs.add(q -> CostTable.point(q, leastCost.plan(plant.question().at(q), share.plan())));
      outputs[p] = share.output();
      boolean free = share.runs() && !share.atCapacity();
      low[p] = free ? 0 : share.output();
      high[p] = free ? plant.capacity() : share.output();
      moving += free ? 1 : 0;
    }
    if (moving > 1) {
      SplitPolish polish = new SplitPolish(costs, outputs, low, high);
      outputs = polish.converge() && stillRun(near, polish.outputs) ? polish.outputs : outputs;
    }
    return SplitReport.again(plants, costs, outputs, near);
  }

  /** Whether every plant that ran still makes something. */
  private static boolean stillRun(SplitOutcome near, double[] outputs) {
    for (int p = 0; p < outputs.length; p++) {
      if (near.shares().get(p).runs() && !(outputs[p] > 0)) {
        return false;
      }
    }
    return true;
  }

  private SplitOutcome split() {
    double most = 0;
    List<Range> all = new ArrayList<>();
    for (CostTable table : tables) {
      most += table.empty() ? 0 : table.most;
      all.add(new Range(true, !table.empty(), table.least, table.most));
    }
    if (most < target * (1 - Feasibility.EXACT)) {
      return new SplitReport(plants, tables, target).outOfReach(most);
    }
    PriorityQueue<Part> open =
        new PriorityQueue<>(Comparator.comparingDouble(part -> part.bound.cost()));
    int parts = 0;
    Part root = bounded(all);
    open.add(root);
    double lowest = root.bound.cost();
    while (!open.isEmpty() && parts < MOST_PARTS) {
      Part part = open.poll();
      lowest = part.bound.cost();
      parts++;
      if (settled(lowest)) {
        break;
      }
      divide(part, open);
      lowest = open.isEmpty() ? bestCost : open.peek().bound.cost();
    }
    if (best.length == 0) {
      return new SplitReport(plants, tables, target).outOfReach(most);
    }
    double gap = Math.max(0, (bestCost - Math.min(lowest, bestCost)) / bestCost);
    return new SplitReport(plants, tables, target).report(best, parts, gap);
  }

  private boolean settled(double bound) {
    return bound >= bestCost * (1 - PROVED);
  }

  /** The bound of a part, drawn tighter where splits met on the way show how. */
  private Part bounded(List<Range> ranges) {
    SplitBound bound = SplitBound.of(plants, tables, ranges, target);
    for (int round = 0; round < ROUNDS && Double.isFinite(bound.cost()); round++) {
      if (settled(bound.cost())) {
        break;
      }
      meet(bound);
      SplitBound tighter = SplitBound.of(plants, tables, ranges, target);
      boolean better = tighter.cost() > bound.cost() * (1 + PROVED / 10);
      bound = tighter;
      if (!better) {
        break;
      }
    }
    return new Part(ranges, bound);
  }

  /** Examines the split of a bound and the one that Newton's method makes of it. */
  private void meet(SplitBound bound) {
    double[] outputs = bound.outputs().clone();
    double[] low = new double[n];
    double[] high = new double[n];
    for (int p = 0; p < n; p++) {
      if (outputs[p] > 0) {
        CostTable table = tables.get(p);
        outputs[p] = Math.min(Math.max(outputs[p], table.least), table.most);
        boolean examined = table.at(outputs[p]).plan().answered();
        if (!examined) {
          return;
        }
        low[p] = Math.max(table.least, 1e-9 * table.most);
        high[p] = table.most;
      }
    }
    keep(outputs);
    SplitPolish polish = new SplitPolish(costs, outputs, low, high);
    polish.polish();
    for (int p = 0; p < n; p++) {
      if (polish.outputs[p] > 0) {
        tables.get(p).at(polish.outputs[p]);
      }
    }
    keep(polish.outputs);
  }

  private void keep(double[] outputs) {
    double sum = 0;
    double cost = 0;
    for (int p = 0; p < n; p++) {
      sum += outputs[p];
      cost +=
          outputs[p] > 0
              ? tables.get(p).at(outputs[p]).cost() + plants.get(p).runningCost()
              : plants.get(p).idle();
    }
    if (Math.abs(sum - target) <= 1e-10 * target && cost < bestCost) {
      bestCost = cost;
      best = Arrays.copyOf(outputs, n);
    }
  }

  /** Divides a part at the plant that its bound leaves between two corners of its hull. */
  private void divide(Part part, PriorityQueue<Part> open) {
    SplitBound bound = part.bound;
    int p = bound.marginal() >= 0 ? bound.marginal() : farthest(part);
    if (p < 0) {
      return;
    }
    Range range = part.ranges.get(p);
    double at = bound.outputs()[p];
    if (range.idle() && range.runs() && (bound.left() == 0 || at == 0 || range.low() > 0)) {
      child(part, p, new Range(true, false, 0, 0), open);
      child(part, p, new Range(false, true, range.low(), range.high()), open);
      return;
    }
    double middle = at > range.low() && at < range.high() ? at : 0.5 * (range.low() + range.high());
    tables.get(p).at(middle);
    child(part, p, new Range(range.idle(), true, range.low(), middle), open);
    child(part, p, new Range(false, true, middle, range.high()), open);
  }

  /** The plant whose cost at the bound lies farthest above its hull; −1 where all are on it. */
  private int farthest(Part part) {
    int farthest = -1;
    double most = 1e-13 * bestCost;
    double[] outputs = part.bound.outputs();
    for (int p = 0; p < n; p++) {
      Range range = part.ranges.get(p);
      if (outputs[p] > 0 && range.high() > range.low() * (1 + 1e-12)) {
        double cost = tables.get(p).at(outputs[p]).cost();
        List<Range> alone = List.of(range);
        SplitBound hull =
            SplitBound.of(List.of(plants.get(p)), List.of(tables.get(p)), alone, outputs[p]);
        double over = cost + plants.get(p).runningCost() - hull.cost();
        if (over > most) {
          most = over;
          farthest = p;
        }
      }
    }
    return farthest;
  }

  private void child(Part part, int p, Range range, PriorityQueue<Part> open) {
    List<Range> ranges = new ArrayList<>(part.ranges);
    ranges.set(p, range);
    Part child = bounded(ranges);
    if (Double.isFinite(child.bound.cost()) && !settled(child.bound.cost())) {
      open.add(child);
    }
  }
}

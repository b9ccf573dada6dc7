package isowright.leastcost;

import isowright.leastcost.Pursuit.Found;
import isowright.leastcost.Pursuit.State;
import java.util.Comparator;
import java.util.Optional;
import java.util.PriorityQueue;

/**
 * Plans with whole units and prices in bands, by branch and bound.
 *
 * <p>A part of the problem has a range of bands and of quantities for every input. Its bound is the
 * answer with spending replaced by straight lines nowhere above it ({@link PriceSchedule#below})
 * and whole units by any quantity: a question with single prices and limits. Where that answer lies
 * in whole units and on the true spending it is the best of its part; otherwise the part is
 * divided, at the band or the whole number nearest the answer. The part with the best bound is
 * divided next, and parts whose bound does not beat the best plan found are dropped. So the plan
 * returned is the best of all as far as the questions with single prices are answered by their
 * global best.
 *
 * <p>Source: Land, A. H. and Doig, A. G. (1960), An Automatic Method of Solving Discrete
 * Programming Problems, <i>Econometrica</i> 28, 497–520; Falk, J. E. and Soland, R. M. (1969), An
 * Algorithm for Separable Nonconvex Programming Problems, <i>Management Science</i> 15, 550–569.
 * Tested against enumeration in {@code WholeUnitsTest} and {@code PriceBandsTest}.
 */
final class BranchAndBound {

  /** Plans this close, relative, are the same: a cost is a sum of rounded exponentials. */
  private static final double SAME = 1e-11;

  /** A quantity this near a whole number, relative, is that number up to its logs. */
  private static final double NEARLY = 1e-7;

  /** The parts examined at most; the gap that is left is then said. */
  static final int MOST_PARTS = 50_000;

  private final PlanTask task;
  private final Pursuit pursuit;
  private final int n;
  private final PriorityQueue<Part> open =
      new PriorityQueue<>(Comparator.comparingDouble(part -> part.found().objective()));
  private Optional<Settled> best = Optional.empty();
  private int parts;
  private boolean doubtful;

  /** A range of bands and of quantities for every input, and the answer to its bound. */
  private record Part(int[] first, int[] last, double[] low, double[] high, Bound bound) {
    Found found() {
      return bound.found;
    }
  }

  /** The answer with spending replaced by lines (intercept, price), one for each input. */
  private record Bound(double[][] lines, Found found) {}

  /**
   * A plan with the question it settles: single prices and limits that hold around it.
   *
   * @param question prices of the bands, limits of the bands, whole units held
   * @param fixedMoney what spending is more than price times quantity
   * @param found the answer to that question
   */
  record Settled(Question question, double fixedMoney, Found found) {}

  /**
   * What the search came to.
   *
   * @param best the best plan; empty where there is none
   * @param root the answer to the whole problem's bound; says why where there is no plan
   * @param gap the relative distance of the best plan from the bound of what was not examined
   * @param parts how many parts were examined
   * @param doubtful whether a part was dropped because the technology is not regular in it
   */
  record Ended(Optional<Settled> best, Found root, double gap, int parts, boolean doubtful) {}

  BranchAndBound(PlanTask task, Pursuit pursuit) {
    this.task = task;
    this.pursuit = pursuit;
    this.n = task.dimension();
  }

  Ended search() {
    Part root = root();
    add(root);
    while (!open.isEmpty() && parts < MOST_PARTS) {
      Part part = open.poll();
      if (beaten(part.found().objective())) {
        open.clear();
        break;
      }
      examine(part);
    }
    double gap = 0;
    if (!open.isEmpty() && best.isPresent()) {
      double objective = best.get().found().objective();
      double bound = Math.min(objective, open.peek().found().objective());
      gap = (objective - bound) / Math.abs(objective);
    }
    return new Ended(best, root.found(), gap, parts, doubtful);
  }

  private Part root() {
    int[] first = new int[n];
    int[] last = new int[n];
    double[] low = new double[n];
    double[] high = new double[n];
    for (int i = 0; i < n; i++) {
      last[i] = task.schedules().get(i).size() - 1;
      low[i] = task.least(i);
      high[i] = task.most(i);
      narrow(i, first, last, low[i], high[i]);
    }
    return bounded(first, last, low, high, Optional.empty());
  }

  /** Drops the bands that the limits of an input leave no room for. */
  private void narrow(int i, int[] first, int[] last, double low, double high) {
    PriceSchedule schedule = task.schedules().get(i);
    while (first[i] < last[i] && schedule.end(first[i]) < low) {
      first[i]++;
    }
    while (first[i] < last[i] && schedule.start(last[i]) > high) {
      last[i]--;
    }
  }

  private void add(Part part) {
    parts++;
    if (part.found().state() == State.FOUND) {
      if (!beaten(part.found().objective())) {
        open.add(part);
      }
    } else {
      doubtful |= part.found().plan().status() == Plan.Status.IRREGULAR;
    }
  }

  private boolean beaten(double bound) {
    if (best.isEmpty()) {
      return false;
    }
    Found found = best.get().found();
    double size = Math.max(Math.abs(found.objective()), SAME * found.plan().cost());
    return bound >= found.objective() - SAME * size;
  }

  /** The answer to the bound of a part; lines are drawn anew where the answer lies elsewhere. */
  private Part bounded(int[] first, int[] last, double[] low, double[] high, Optional<Plan> near) {
    double[] reference = new double[n];
    for (int i = 0; i < n; i++) {
      double planned = near.map(Plan::mix).orElse(low)[i];
      reference[i] = Math.min(Math.max(planned, low[i]), high[i]);
    }
    Bound bound = relaxed(first, last, low, high, reference, near);
    if (bound.found.state() == State.UNBOUNDED) {
      bound = relaxed(first, last, low, high, high, near);
    }
    for (int again = 0; again < 2 && bound.found.state() == State.FOUND; again++) {
      Plan plan = bound.found.plan();
      Bound other = relaxed(first, last, low, high, plan.mix(), Optional.of(plan));
      boolean tighter =
          other.found.state() == State.FOUND && other.found.objective() > bound.found.objective();
      if (!tighter) {
        break;
      }
      bound = other;
    }
    return new Part(first, last, low, high, bound);
  }

  private Bound relaxed(
      int[] first,
      int[] last,
      double[] low,
      double[] high,
      double[] reference,
      Optional<Plan> near) {
    double[][] lines = new double[n][];
    double[] prices = new double[n];
    double fixedMoney = 0;
    for (int i = 0; i < n; i++) {
      lines[i] = task.schedules().get(i).below(first[i], last[i], low[i], high[i], reference[i]);
      fixedMoney += high[i] == 0 ? 0 : lines[i][0];
      prices[i] = lines[i][1];
    }
    Question question = new Question(1, prices, low, high);
    return new Bound(lines, pursuit.pursue(question, fixedMoney, near));
  }

  /** Keeps the plan of a part that needs no division, or divides it. */
  private void examine(Part part) {
    double[] mix = part.found().plan().mix();
    int whole = mostFractional(mix);
    if (whole >= 0) {
      splitWhole(part, whole, mix[whole]);
      return;
    }
    int banded = farthestFromSpending(part, mix);
    if (banded >= 0) {
      splitBands(part, banded, mix[banded]);
      return;
    }
    settle(mix, part).ifPresent(this::keep);
    if (!beaten(part.found().objective())) {
      int loose = looseWhole(part);
      if (loose >= 0) {
        splitAround(part, loose, Math.rint(mix[loose]));
      }
    }
  }

  private void keep(Settled settled) {
    if (best.isEmpty() || settled.found().objective() < best.get().found().objective()) {
      best = Optional.of(settled);
    }
  }

  /** The plan with whole units as they are in a mix, in the bands where the mix costs least. */
  private Optional<Settled> settle(double[] mix, Part part) {
    double[] low = new double[n];
    double[] high = new double[n];
    double[] prices = new double[n];
    double fixedMoney = 0;
    for (int i = 0; i < n; i++) {
      double quantity = task.whole()[i] ? Math.rint(mix[i]) : mix[i];
      PriceSchedule schedule = task.schedules().get(i);
      int band = schedule.band(Math.min(Math.max(quantity, task.least(i)), schedule.most()));
      low[i] = task.whole()[i] ? quantity : Math.max(task.least(i), schedule.start(band));
      high[i] = task.whole()[i] ? quantity : Math.min(task.most(i), schedule.end(band));
      prices[i] = schedule.price(band);
      fixedMoney += quantity == 0 ? 0 : schedule.intercept(band);
    }
    Question question = new Question(1, prices, low, high);
    Found found = pursuit.pursue(question, fixedMoney, Optional.of(part.found().plan()));
    return found.state() == State.FOUND
        ? Optional.of(new Settled(question, fixedMoney, found))
        : Optional.empty();
  }

  private int mostFractional(double[] mix) {
    int most = -1;
    double farthest = 0;
    for (int i = 0; i < n; i++) {
      double away = Math.abs(mix[i] - Math.rint(mix[i]));
      if (task.whole()[i] && away > NEARLY * Math.max(1, mix[i]) && away > farthest) {
        farthest = away;
        most = i;
      }
    }
    return most;
  }

  /** The first input in whole units that a part does not hold at one number. */
  private int looseWhole(Part part) {
    for (int i = 0; i < n; i++) {
      if (task.whole()[i] && part.low[i] < part.high[i]) {
        return i;
      }
    }
    return -1;
  }

  /** The banded input whose true spending exceeds the line most; none where none does. */
  private int farthestFromSpending(Part part, double[] mix) {
    int farthest = -1;
    double most = SAME * part.found().plan().cost();
    for (int i = 0; i < n; i++) {
      if (part.first[i] == part.last[i]) {
        continue;
      }
      double[] line = part.bound.lines[i];
      double over = task.schedules().get(i).spending(mix[i]) - line[0] - line[1] * mix[i];
      if (over > most) {
        most = over;
        farthest = i;
      }
    }
    return farthest;
  }

  private void splitWhole(Part part, int i, double quantity) {
    child(part, i, part.low[i], Math.floor(quantity));
    child(part, i, Math.ceil(quantity), part.high[i]);
  }

  private void splitAround(Part part, int i, double number) {
    child(part, i, number, number);
    child(part, i, part.low[i], number - 1);
    child(part, i, number + 1, part.high[i]);
  }

  private void splitBands(Part part, int i, double quantity) {
    PriceSchedule schedule = task.schedules().get(i);
    int band = part.first[i];
    while (band + 1 < part.last[i] && schedule.end(band) < quantity) {
      band++;
    }
    double end = schedule.end(band);
    child(part, i, part.first[i], band, part.low[i], Math.min(part.high[i], end));
    child(part, i, band + 1, part.last[i], Math.max(part.low[i], end), part.high[i]);
  }

  private void child(Part part, int i, double low, double high) {
    child(part, i, part.first[i], part.last[i], low, high);
  }

  private void child(Part part, int i, int first, int last, double low, double high) {
    double least = task.whole()[i] ? Math.ceil(low) : low;
    double most = task.whole()[i] ? Math.floor(high) : high;
    if (!(least <= most)) {
      return;
    }
    int[] newFirst = part.first.clone();
    int[] newLast = part.last.clone();
    double[] newLow = part.low.clone();
    double[] newHigh = part.high.clone();
    newFirst[i] = first;
    newLast[i] = last;
    newLow[i] = least;
    newHigh[i] = most;
    narrow(i, newFirst, newLast, least, most);
    add(bounded(newFirst, newLast, newLow, newHigh, Optional.of(part.found().plan())));
  }
}

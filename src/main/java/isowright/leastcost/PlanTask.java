package isowright.leastcost;

import java.util.List;
import java.util.Optional;

/**
 * What is to be planned: a goal, what inputs cost, between which quantities they lie, and which can
 * only be taken in whole units.
 *
 * <p>Shapes: n, the inputs of the technology in its order. What must be taken at least and is paid
 * for whether used or not raises the least of its input: with inputs that never lower output it is
 * then used as well.
 *
 * @param goal what is to be achieved
 * @param schedules what a quantity of each input costs
 * @param low the least of each input
 * @param high the most of each input; {@code +∞} where there is no limit
 * @param committed what must be paid for of each input; 0 where nothing
 * @param whole which inputs come in whole units
 */
public record PlanTask(
    Goal goal,
    List<PriceSchedule> schedules,
    double[] low,
    double[] high,
    double[] committed,
    boolean[] whole) {

  /** Copies and checks. */
  public PlanTask {
    schedules = List.copyOf(schedules);
    low = low.clone();
    high = high.clone();
    committed = committed.clone();
    whole = whole.clone();
    int n = schedules.size();
    if (low.length != n || high.length != n || committed.length != n || whole.length != n) {
      throw new IllegalArgumentException("prices, limits and whole units differ in length");
    }
  }

  /** A goal with the prices and limits of a question, whose target is not used. */
  public static PlanTask of(Goal goal, Question question) {
    int n = question.dimension();
    List<PriceSchedule> schedules =
        java.util.stream.IntStream.range(0, n)
            .mapToObj(i -> PriceSchedule.single(question.price(i)))
            .toList();
    return new PlanTask(
        goal, schedules, question.low(), question.high(), new double[n], new boolean[n]);
  }

  /** A question as a task: its target at least cost. */
  public static PlanTask of(Question question) {
    return of(new Goal.Target(question.target()), question);
  }

  /** The same for another goal. */
  public PlanTask towards(Goal other) {
    return new PlanTask(other, schedules, low, high, committed, whole);
  }

  /** The same with other schedules. */
  public PlanTask at(List<PriceSchedule> others) {
    return new PlanTask(goal, others, low, high, committed, whole);
  }

  /** The same with the price of every unit of input i multiplied. */
  public PlanTask scaling(int i, double factor) {
    List<PriceSchedule> others = new java.util.ArrayList<>(schedules);
    others.set(i, schedules.get(i).times(factor));
    return at(others);
  }

  /** The same with input i in bands. */
  public PlanTask banded(int i, PriceSchedule schedule) {
    List<PriceSchedule> others = new java.util.ArrayList<>(schedules);
    others.set(i, schedule);
    return at(others);
  }

  /** The same with input i in whole units. */
  public PlanTask inWholes(int i) {
    boolean[] wholes = whole.clone();
    wholes[i] = true;
    return new PlanTask(goal, schedules, low, high, committed, wholes);
  }

  /** The same with input i paid for up to a quantity whether used or not. */
  public PlanTask committing(int i, double quantity) {
    double[] all = committed.clone();
    all[i] = quantity;
    return new PlanTask(goal, schedules, low, high, all, whole);
  }

  /** The same with input i between two quantities. */
  public PlanTask limiting(int i, double least, double most) {
    double[] newLow = low.clone();
    double[] newHigh = high.clone();
    newLow[i] = least;
    newHigh[i] = most;
    return new PlanTask(goal, schedules, newLow, newHigh, committed, whole);
  }

  @Override
  public double[] low() {
    return low.clone();
  }

  @Override
  public double[] high() {
    return high.clone();
  }

  @Override
  public double[] committed() {
    return committed.clone();
  }

  @Override
  public boolean[] whole() {
    return whole.clone();
  }

  /** The number of inputs. */
  public int dimension() {
    return schedules.size();
  }

  /** The least of input i that is paid for. */
  double least(int i) {
    double least = Math.max(low[i], committed[i]);
    return whole[i] ? Math.ceil(least) : least;
  }

  /** The most of input i that can be had. */
  double most(int i) {
    double most = Math.min(high[i], schedules.get(i).most());
    return whole[i] ? Math.floor(most) : most;
  }

  /** Whether input i is held at one quantity. */
  public boolean held(int i) {
    return low[i] == high[i];
  }

  /** Whether nothing but single prices and limits stands between goal and mix. */
  public boolean plain() {
    for (int i = 0; i < dimension(); i++) {
      if (whole[i] || !schedules.get(i).plain()) {
        return false;
      }
    }
    return true;
  }

  /** Total spending on a mix. */
  public double spending(double[] mix) {
    double sum = 0;
    for (int i = 0; i < mix.length; i++) {
      sum += schedules.get(i).spending(Math.max(mix[i], committed[i]));
    }
    return sum;
  }

  /** The input whose limits leave no quantity; empty where every input has one. */
  Optional<Integer> crossed() {
    for (int i = 0; i < dimension(); i++) {
      if (!(least(i) <= most(i))) {
        return Optional.of(i);
      }
    }
    return Optional.empty();
  }
}

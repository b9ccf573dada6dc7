package isowright.leastcost;

import java.util.List;

/**
 * How a target is split over plants.
 *
 * @param state {@link PlanOutcome.State#PLANNED}, or why there is no split
 * @param shares what each plant makes, in the order of the plants; empty where there is no split
 * @param cost the cost of all plants together, running costs and idle plants included
 * @param marginalCost what one more unit of the target costs; +∞ where no plant can make more
 * @param proof how far it is proved that no split costs less
 * @param reason in words: why there is no split, or what bounds it; may be empty
 */
public record SplitOutcome(
    PlanOutcome.State state,
    List<Share> shares,
    double cost,
    double marginalCost,
    Proof proof,
    String reason) {

  /** Copies the list. */
  public SplitOutcome {
    shares = List.copyOf(shares);
  }

  /**
   * The part of one plant.
   *
   * @param output what it makes; 0 where it does not run
   * @param cost its cost, the running cost included
   * @param plan its plan; one without a mix where it does not run
   * @param atCapacity whether it makes all it can
   * @param capacityValue what one more unit of its capacity would save; 0 where it has some left
   */
  public record Share(
      double output, double cost, Plan plan, boolean atCapacity, double capacityValue) {
    /** Whether the plant makes anything. */
    public boolean runs() {
      return output > 0;
    }
  }

  /** Whether there is a split. */
  public boolean planned() {
    return state == PlanOutcome.State.PLANNED;
  }
}

package isowright.leastcost;

import java.util.List;

/**
 * The answer to a {@link PlanTask}.
 *
 * <p>Where there is no plan, {@code plan} has no mix and says why; {@code output} and {@code
 * objective} are then NaN and {@code multipliers} is empty.
 *
 * @param state what kind of answer this is
 * @param plan the plan: cost is all that is spent, steps included
 * @param output the output of the plan
 * @param profit price of output times output less cost; NaN unless profit was the goal
 * @param settled the question with single prices that the plan answers too: the bands it lies in,
 *     whole units held; what varies smoothly with the technology is found from it
 * @param fixedMoney what spending is more than price times quantity in that question
 * @param multipliers what one more unit of each constraint that binds is worth
 * @param proof how far it is proved that nothing is better
 */
public record PlanOutcome(
    State state,
    Plan plan,
    double output,
    double profit,
    Question settled,
    double fixedMoney,
    List<Multiplier> multipliers,
    Proof proof) {

  /** What kind of answer an outcome is. */
  public enum State {
    /** There is a plan. */
    PLANNED,
    /** No mix within the limits achieves the goal. */
    INFEASIBLE,
    /** The technology is not regular where the plan would lie. */
    IRREGULAR,
    /** The goal can be pursued without end. */
    UNBOUNDED,
    /** It is best to make nothing. */
    NOTHING
  }

  /** Copies the list. */
  public PlanOutcome {
    multipliers = List.copyOf(multipliers);
  }

  /** Whether there is a mix. */
  public boolean planned() {
    return state == State.PLANNED;
  }
}

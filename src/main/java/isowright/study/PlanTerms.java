package isowright.study;

import isowright.leastcost.Goal;
import isowright.leastcost.PriceSchedule;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a least-cost question asks beside prices, limits and held inputs.
 *
 * @param place the question's place in the study file, from 1; several targets share it
 * @param asked the name in the study file; that of the question adds the target where there are
 *     several
 * @param goal a target, a budget or a price of output
 * @param bands prices in bands, by input
 * @param takeAtLeast what must be paid for whether used or not, by input
 * @param whole the inputs that come in whole units
 * @param across the plants over which the target is split; empty where it is not
 * @param shortRun the inputs held at the plan for a short-run curve; empty for none
 */
public record PlanTerms(
    int place,
    String asked,
    Goal goal,
    Map<String, PriceSchedule> bands,
    Map<String, Double> takeAtLeast,
    List<String> whole,
    List<Plant> across,
    List<String> shortRun) {

  /** Copies the collections, keeping their order. */
  public PlanTerms {
    bands = new LinkedHashMap<>(bands);
    takeAtLeast = new LinkedHashMap<>(takeAtLeast);
    whole = List.copyOf(whole);
    across = List.copyOf(across);
    shortRun = List.copyOf(shortRun);
  }

  /**
   * A plant over which a target is split.
   *
   * @param name what it is called
   * @param plant the plant of the records whose level it has; the question's productivity if absent
   * @param technology its technology; that of the answer if absent
   * @param capacity the most it can make; {@code +∞} where not stated
   * @param runningCost money due if it makes anything
   * @param prices by input; the question's if empty
   * @param hold quantities of inputs that cannot change
   * @param limits lowest and highest quantity by input
   */
  public record Plant(
      String name,
      Optional<String> plant,
      Optional<String> technology,
      double capacity,
      double runningCost,
      Map<String, Double> prices,
      Map<String, Double> hold,
      Map<String, Study.Limit> limits) {

    /** Copies the maps. */
    public Plant {
      prices = new LinkedHashMap<>(prices);
      hold = new LinkedHashMap<>(hold);
      limits = new LinkedHashMap<>(limits);
    }
  }

  /** The same for another goal and name. */
  PlanTerms towards(Goal other) {
    return new PlanTerms(place, asked, other, bands, takeAtLeast, whole, across, shortRun);
  }

  /** Whether prices, whole units or commitments make more of the question than limits do. */
  boolean jumps() {
    return !whole.isEmpty() || !bands.isEmpty();
  }
}

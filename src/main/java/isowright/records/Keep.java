package isowright.records;

import java.util.List;
import java.util.Optional;

/**
 * Which rows are kept; the others are set aside, counted and listed.
 *
 * @param firstPeriod rows before it are set aside (as written in the file)
 * @param lastPeriod rows after it are set aside
 * @param withoutPlants rows of these plants are set aside
 */
public record Keep(
    Optional<String> firstPeriod, Optional<String> lastPeriod, List<String> withoutPlants) {

  /** Every row. */
  public static final Keep ALL = new Keep(Optional.empty(), Optional.empty(), List.of());

  /** Copies the list. */
  public Keep {
    withoutPlants = List.copyOf(withoutPlants);
  }
}

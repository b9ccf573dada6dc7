package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Which rows the study keeps, ready to be asked for each row. */
final class KeptRows {

  private final boolean everyPeriod;
  private final long first;
  private final long last;
  private final Set<String> without;

  private KeptRows(boolean everyPeriod, long first, long last, Set<String> without) {
    this.everyPeriod = everyPeriod;
    this.first = first;
    this.last = last;
    this.without = without;
  }

  /**
   * Reads what is kept.
   *
   * @throws RecordsRefused where a bound is not a period, or bounds contradict the roles
   */
  static KeptRows of(Place place, Keep keep, Roles roles) throws RecordsRefused {
    List<Remark> errors = new ArrayList<>();
    boolean bounded = keep.firstPeriod().isPresent() || keep.lastPeriod().isPresent();
    if (bounded && roles.period().isEmpty()) {
      errors.add(
          error(
              place,
              "records.keep names periods, but no period column is declared. Declare records.period or remove records.keep.periods."));
    }
    if (!keep.withoutPlants().isEmpty() && roles.plant().isEmpty()) {
      errors.add(
          error(
              place,
              "records.keep names plants, but no plant column is declared. Declare records.plant or remove records.keep.without-plants."));
    }
    long first = bound(place, keep.firstPeriod(), -999_999_999L, errors);
    long last = bound(place, keep.lastPeriod(), 999_999_999L, errors);
    if (errors.isEmpty() && bounded && Periods.firstDay(first) > Periods.firstDay(last)) {
      errors.add(
          error(
              place,
              "records.keep.periods runs from %s to %s, which is backwards. Write the first period first."
                  .formatted(Periods.text(first), Periods.text(last))));
    }
    if (!errors.isEmpty()) {
      throw new RecordsRefused(errors);
    }
    return new KeptRows(!bounded, first, last, new HashSet<>(keep.withoutPlants()));
  }

  private static long bound(
      Place place, Optional<String> written, long ifAbsent, List<Remark> errors) {
    if (written.isEmpty()) {
      return 4 * ifAbsent + Periods.INTEGER;
    }
    long key = Periods.parse(written.get().strip());
    if (key == Periods.NONE) {
      errors.add(
          error(
              place,
              "records.keep.periods holds \"%s\", which is not a period. Write an integer or a date such as 2024, 2024-05 or 2024-05-31."
                  .formatted(Shown.shortened(written.get()))));
    }
    return key;
  }

  private static Remark error(Place place, String what) {
    return new Remark(Severity.ERROR, "keep", place.words() + ": " + what, List.of());
  }

  boolean period(long key) {
    return everyPeriod || Periods.within(key, first, last);
  }

  boolean plant(String name) {
    return without.isEmpty() || !without.contains(name);
  }

  /** Plants to be left out that the file does not have: names mistyped in the study file. */
  List<Remark> unknownPlants(Place place, List<String> plants) {
    List<Remark> errors = new ArrayList<>();
    Set<String> known = new HashSet<>(plants);
    without.stream()
        .sorted()
        .filter(name -> !known.contains(name))
        .forEach(
            name ->
                errors.add(
                    new Remark(
                        Severity.ERROR,
                        "unknown-plant",
                        "%s: records.keep.without-plants names \"%s\", and no row has this plant.%s Correct the name or remove it."
                            .formatted(
                                place.words(),
                                Shown.shortened(name),
                                Nearest.word(name, plants)
                                    .map(n -> " The nearest plant is \"" + n + "\".")
                                    .orElse("")),
                        List.of())));
    return errors;
  }
}

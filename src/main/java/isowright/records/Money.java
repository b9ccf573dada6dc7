package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * The money of which period is used.
 *
 * @param base the base period, as written and as a key; absent where no deflator is declared
 */
record Money(Optional<Base> base) {

  private static final int PERIODS_LISTED = 30;

  /**
   * The base period.
   *
   * @param written as declared
   * @param key as a key, see {@link Periods}
   */
  record Base(String written, long key) {}

  /**
   * Reads what the roles declare.
   *
   * @throws RecordsRefused where the base is no period, or there is no period column
   */
  static Money of(Place place, Roles roles) throws RecordsRefused {
    if (roles.deflator().isEmpty()) {
      return new Money(Optional.empty());
    }
    Roles.Deflator deflator = roles.deflator().get();
    if (roles.period().isEmpty()) {
      throw Refusals.of(
          "deflator-without-period",
          "%s: money.deflator names the column \"%s\", but no period column is declared, so there is no base period. Declare records.period or remove money.deflator."
              .formatted(place.words(), deflator.column()));
    }
    long key = Periods.parse(deflator.base().strip());
    if (key == Periods.NONE) {
      throw Refusals.of(
          "base-period",
          "%s: money.base is \"%s\", which is not a period. Write an integer or a date such as 2024, 2024-05 or 2024-05-31."
              .formatted(place.words(), Shown.shortened(deflator.base())));
    }
    return new Money(Optional.of(new Base(deflator.base().strip(), key)));
  }

  /**
   * The deflator of the base period.
   *
   * @throws RecordsRefused where no row of the base period has one
   */
  Optional<Double> baseDeflator(
      Place place, Slots slots, DeflatorByPeriod deflator, List<Remark> remarks)
      throws RecordsRefused {
    if (base.isEmpty()) {
      return Optional.empty();
    }
    String written = base.get().written();
    DeflatorByPeriod.Base found = deflator.base(base.get().key());
    Slot slot = slots.get(slots.deflator().orElseThrow());
    if (Double.isNaN(found.mean())) {
      throw Refusals.of(
          "base-period",
          "%s: no row of the base period %s has a value in %s. Periods with a deflator: %s. Set money.base to one of them."
              .formatted(place.words(), written, slot.words(), list(deflator.periods())));
    }
    // Equal deflators may differ in the last digits they were written with.
    if (found.most() > found.least() * (1 + 1e-9)) {
      remarks.add(
          new Remark(
              Severity.NOTE,
              "deflator-varies-in-base",
              "%s: in the base period %s, %s runs from %s to %s over the rows; money is brought to their mean, %s. Give every row of a period the same deflator unless plants have their own."
                  .formatted(
                      place.words(),
                      written,
                      slot.words(),
                      Shown.value(found.least()),
                      Shown.value(found.most()),
                      Shown.value(found.mean())),
              List.of()));
    }
    return Optional.of(found.mean());
  }

  private static String list(long[] periods) {
    List<String> texts = new ArrayList<>();
    Arrays.stream(periods).limit(PERIODS_LISTED).forEach(p -> texts.add(Periods.text(p)));
    String more =
        periods.length > PERIODS_LISTED
            ? " and " + (periods.length - PERIODS_LISTED) + " more"
            : "";
    return texts.isEmpty() ? "none" : texts.stream().collect(Collectors.joining(", ")) + more;
  }
}

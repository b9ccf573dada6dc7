package isowright.records;

import isowright.records.Remark.Severity;
import isowright.records.Row.Fault;
import isowright.records.Row.Found;
import isowright.records.SetAsideTally.Reason;
import isowright.records.Slot.Kind;
import java.util.List;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;

/**
 * Decides what becomes of each row: kept, set aside with a reason, or an error.
 *
 * <p>In this order: a row outside {@link Keep} is set aside and its other cells are not judged (so
 * that rows known to be wrong can be left out by the study file); a cell that is not what its
 * column must hold is an error, and so is an output that is not positive; a row with a blank where
 * every row needs a value, or with a quantity of an input that is not positive (zero is let pass
 * where the roles keep zeros, and so is spending of zero beside it), is set aside; in the rows that
 * remain a price, a deflator, a filed cost or a logged control that is not positive is an error.
 */
final class RowRules {

  /** Numbers that may be negative, or whose sign is judged elsewhere. */
  private static final Set<Kind> ANY_SIGN = Set.of(Kind.CONTROL, Kind.QUANTITY, Kind.FURTHER);

  /** No such column is declared. */
  private static final int NONE = -1;

  private final Place place;
  private final Slots slots;
  private final KeptRows keep;
  private final TextCodes plants = new TextCodes();
  private final RowStore store;
  private final DeflatorByPeriod deflator;
  private final Complaints complaints;
  private final SetAsideTally setAside = new SetAsideTally();
  private final Kind[] kinds;
  private final int[] needed;
  private final int[] quantities;
  private final int[] positive;
  private final boolean[] givesPrice;
  private final int[] quantityOf;
  private final boolean keepsZeros;
  private final int period;
  private final int plant;
  private final int deflated;
  private final Reason[] blank;
  private final Reason[] notPositive;
  private int rows;

  RowRules(Place place, Slots slots, KeptRows keep) {
    this.place = place;
    this.slots = slots;
    this.keep = keep;
    this.store = new RowStore(slots);
    this.deflator = new DeflatorByPeriod();
    this.complaints = new Complaints();
    this.kinds = slots.kinds();
    this.needed = where(Kind::neededInEveryRow);
    this.quantities = where(k -> k == Kind.QUANTITY);
    this.positive = where(k -> k.numeric() && !ANY_SIGN.contains(k));
    this.givesPrice = new boolean[kinds.length];
    this.quantityOf = new int[kinds.length];
    this.keepsZeros = slots.keepsZeros();
    this.period = slots.period().orElse(NONE);
    this.plant = slots.plant().orElse(NONE);
    this.deflated = slots.deflator().orElse(NONE);
    this.blank = new Reason[slots.size()];
    this.notPositive = new Reason[slots.size()];
    for (int s = 0; s < slots.size(); s++) {
      givesPrice[s] = slots.givesPrice(s);
      quantityOf[s] = slots.quantityBoughtBy(s).orElse(NONE);
      blank[s] = Reason.blank(slots.get(s));
      notPositive[s] = Reason.quantityNotPositive(slots.get(s));
    }
  }

  private int[] where(Predicate<Kind> condition) {
    return IntStream.range(0, kinds.length).filter(s -> condition.test(kinds[s])).toArray();
  }

  /** A row whose number of cells is not that of the headings. */
  void ragged(Row row, int cells, int columns) {
    rows++;
    complaints.add(
        "rows of another length",
        row.number(),
        () ->
            new Remark(
                Severity.ERROR,
                "ragged-row",
                "%s: found %s where the headings are %d. Put a cell that holds the delimiter (such as a decimal comma) in double quotes, or add the missing delimiters."
                    .formatted(place.row(row.number()), Shown.count(cells, "cell"), columns),
                List.of(row.number())));
  }

  /** A row with every cell typed. */
  void endRow(Row row) {
    rows++;
    boolean periodKnown = period == NONE || row.present(period);
    boolean plantKnown = plant == NONE || row.present(plant);
    if (periodKnown) {
      noteDeflator(row);
    }
    if (leftOut(row, periodKnown, plantKnown)) {
      return;
    }
    if (!faults(row)) {
      Reason reason = missing(row);
      if (reason != null) {
        setAside.add(reason, row.number());
        return;
      }
      outOfRange(row);
    }
    if (periodKnown && plantKnown) {
      // A wrong row is stored too, so that duplicates are found in the same reading.
      store.add(row);
    }
  }

  private void noteDeflator(Row row) {
    if (deflated != NONE && row.value(deflated) > 0) {
      deflator.add(row.period(), row.value(deflated));
    }
  }

  private boolean leftOut(Row row, boolean periodKnown, boolean plantKnown) {
    if (period != NONE && periodKnown && !keep.period(row.period())) {
      setAside.add(Reason.PERIOD_NOT_KEPT, row.number());
      return true;
    }
    if (plant != NONE && plantKnown && !keep.plant(plants.text(row.plant()))) {
      setAside.add(Reason.PLANT_NOT_KEPT, row.number());
      return true;
    }
    return false;
  }

  private boolean faults(Row row) {
    boolean any = false;
    if (row.anyFault()) {
      for (int s = 0; s < slots.size(); s++) {
        Fault fault = row.fault(s);
        if (fault != null) {
          complain(row, s, fault);
          any = true;
        }
      }
    }
    int output = slots.output();
    if (row.present(output) && !(row.value(output) > 0)) {
      complainOfValue(row, output);
      any = true;
    }
    return any;
  }

  /** Why the row cannot be used though nothing in it is wrong. */
  private @Nullable Reason missing(Row row) {
    for (int s : needed) {
      if (row.blank(s)) {
        return blank[s];
      }
    }
    for (int s : quantities) {
      boolean zero = keepsZeros && row.value(s) == 0;
      if (!(row.value(s) > 0 || zero)) {
        return notPositive[s];
      }
    }
    return null;
  }

  private void outOfRange(Row row) {
    for (int s : positive) {
      if (row.present(s) && !inRange(row.value(s), s) && !nothingBought(row, s)) {
        complainOfValue(row, s);
      }
    }
  }

  /** Zero spent on a quantity of zero. */
  private boolean nothingBought(Row row, int slot) {
    return keepsZeros
        && quantityOf[slot] != NONE
        && row.value(slot) == 0
        && row.value(quantityOf[slot]) == 0;
  }

  private boolean inRange(double value, int slot) {
    return value > 0
        || (value == 0
            && (kinds[slot] == Kind.AMOUNT || (kinds[slot] == Kind.SPENDING && !givesPrice[slot])));
  }

  private void complainOfValue(Row row, int slot) {
    complain(
        row,
        slot,
        () -> new Found(Shown.value(row.value(slot)), CellFault.notPositive(slots.get(slot))));
  }

  private void complain(Row row, int slot, Fault fault) {
    Slot declared = slots.get(slot);
    complaints.add(
        declared.words(),
        row.number(),
        () -> {
          Found found = fault.found();
          return new Remark(
              Severity.ERROR,
              found.fault().code(),
              "%s, %s: found \"%s\"; %s. %s"
                  .formatted(
                      place.row(row.number()),
                      declared.words(),
                      Shown.shortened(found.value()),
                      found.fault().rule(),
                      found.fault().remedy()),
              List.of(row.number()));
        });
  }

  /** The plants met so far; a plant is given its code as its cell is read. */
  TextCodes plants() {
    return plants;
  }

  /** Whether further faults are only counted, so that their text need not be kept. */
  boolean full() {
    return complaints.full();
  }

  /** The rows with any cell. */
  int rows() {
    return rows;
  }

  KeptRows kept() {
    return keep;
  }

  RowStore store() {
    return store;
  }

  DeflatorByPeriod deflator() {
    return deflator;
  }

  Complaints complaints() {
    return complaints;
  }

  SetAsideTally setAside() {
    return setAside;
  }
}

package isowright.records;

import isowright.records.Slot.Kind;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.OptionalInt;
import java.util.Set;

/** Every declared use of a column, in one order, and where each role stands in it. */
final class Slots {

  private final List<Slot> all = new ArrayList<>();
  private final OptionalInt plant;
  private final OptionalInt period;
  private final int output;
  private final int[] quantities;
  private final OptionalInt[] prices;
  private final OptionalInt[] spending;
  private final int[] controls;
  private final OptionalInt deflator;
  private final OptionalInt filedCost;
  private final int[] further;
  private final boolean keepsZeros;

  /** The slots that these roles declare. */
  Slots(Roles roles) {
    keepsZeros = roles.keepsZeros();
    plant = roles.plant().map(c -> add(c, Kind.PLANT, "plant")).orElse(OptionalInt.empty());
    period = roles.period().map(c -> add(c, Kind.PERIOD, "period")).orElse(OptionalInt.empty());
    output = add(roles.output(), Kind.OUTPUT, roles.explained()).getAsInt();
    int n = roles.inputs().size();
    quantities = new int[n];
    prices = new OptionalInt[n];
    spending = new OptionalInt[n];
    for (int i = 0; i < n; i++) {
      Roles.Input input = roles.inputs().get(i);
      String of = " of " + input.name();
      quantities[i] = add(input.quantity(), Kind.QUANTITY, "quantity" + of).getAsInt();
      prices[i] =
          input.price().map(c -> add(c, Kind.PRICE, "price" + of)).orElse(OptionalInt.empty());
      spending[i] =
          input
              .spending()
              .map(c -> add(c, Kind.SPENDING, "spending on " + input.name()))
              .orElse(OptionalInt.empty());
    }
    controls = new int[roles.controls().size()];
    for (int k = 0; k < controls.length; k++) {
      Roles.Control control = roles.controls().get(k);
      Kind kind = control.log() ? Kind.LOGGED_CONTROL : Kind.CONTROL;
      controls[k] = add(control.column(), kind, control.role()).getAsInt();
    }
    deflator =
        roles
            .deflator()
            .map(d -> add(d.column(), Kind.DEFLATOR, "deflator"))
            .orElse(OptionalInt.empty());
    filedCost =
        roles
            .filedCost()
            .map(c -> add(c, Kind.FILED_COST, "filed cost"))
            .orElse(OptionalInt.empty());
    further =
        roles.further().stream()
            .mapToInt(f -> add(f.column(), kind(f.measure()), f.role()).getAsInt())
            .toArray();
  }

  private OptionalInt add(String heading, Kind kind, String role) {
    all.add(new Slot(heading, kind, role));
    return OptionalInt.of(all.size() - 1);
  }

  /** How many there are. */
  int size() {
    return all.size();
  }

  Slot get(int slot) {
    return all.get(slot);
  }

  /** The kind of each slot, in an array of its own for the loops over cells. */
  Kind[] kinds() {
    return all.stream().map(Slot::kind).toArray(Kind[]::new);
  }

  /** The distinct headings that are declared. */
  Set<String> headings() {
    Set<String> headings = new LinkedHashSet<>();
    all.forEach(s -> headings.add(s.heading()));
    return headings;
  }

  OptionalInt plant() {
    return plant;
  }

  OptionalInt period() {
    return period;
  }

  int output() {
    return output;
  }

  int quantity(int input) {
    return quantities[input];
  }

  OptionalInt price(int input) {
    return prices[input];
  }

  OptionalInt spending(int input) {
    return spending[input];
  }

  /** Whether a column of spending also gives an input its price. */
  boolean givesPrice(int slot) {
    for (int i = 0; i < spending.length; i++) {
      if (prices[i].isEmpty() && spending[i].isPresent() && spending[i].getAsInt() == slot) {
        return true;
      }
    }
    return false;
  }

  /** The quantity on which a column of spending says what was spent. */
  OptionalInt quantityBoughtBy(int slot) {
    for (int i = 0; i < spending.length; i++) {
      if (spending[i].isPresent() && spending[i].getAsInt() == slot) {
        return OptionalInt.of(quantities[i]);
      }
    }
    return OptionalInt.empty();
  }

  /** Whether rows with a quantity of zero are kept. */
  boolean keepsZeros() {
    return keepsZeros;
  }

  int control(int k) {
    return controls[k];
  }

  OptionalInt deflator() {
    return deflator;
  }

  OptionalInt filedCost() {
    return filedCost;
  }

  int further(int k) {
    return further[k];
  }

  private static Kind kind(Roles.Measure measure) {
    return switch (measure) {
      case PRICE -> Kind.PRICE;
      case AMOUNT -> Kind.AMOUNT;
      case RATE, NUMBER -> Kind.FURTHER;
    };
  }
}

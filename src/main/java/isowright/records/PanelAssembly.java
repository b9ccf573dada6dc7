package isowright.records;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * Makes the panel out of the rows that were kept: sorts them by plant and period, finds rows that
 * stand for the same plant and period, works prices out of spending, and brings money to the money
 * of the base period.
 */
final class PanelAssembly {

  private final Roles roles;
  private final Slots slots;
  private final RowStore store;
  private final int rows;
  private final int[] order;
  private final long[] periodKeys;
  private final int[] rowPeriods;
  private final int[] plantStarts;
  private final int[] plantCodes;

  /** Sorts the rows of a store by plant, in the order of first appearance, and then by period. */
  PanelAssembly(Roles roles, Slots slots, RowStore store) {
    this.roles = roles;
    this.slots = slots;
    this.store = store;
    this.rows = store.rows();
    LongCodes codes = new LongCodes();
    int[] periodOf = new int[rows];
    for (int r = 0; r < rows; r++) {
      periodOf[r] = codes.codeOf(store.period(r));
    }
    periodKeys = new long[codes.size()];
    for (int p = 0; p < periodKeys.length; p++) {
      periodKeys[p] = codes.key(p);
    }
    sortByTime(periodKeys);
    int[] rank = new int[periodKeys.length];
    for (int p = 0; p < rank.length; p++) {
      rank[codes.codeOf(periodKeys[p])] = p;
    }
    int plants = 0;
    for (int r = 0; r < rows; r++) {
      periodOf[r] = rank[periodOf[r]];
      plants = Math.max(plants, store.plant(r) + 1);
    }
    order = sorted(periodOf, plants);
    rowPeriods = new int[rows];
    int[] starts = new int[rows];
    int[] names = new int[rows];
    int count = 0;
    for (int r = 0; r < rows; r++) {
      rowPeriods[r] = periodOf[order[r]];
      if (r == 0 || store.plant(order[r]) != store.plant(order[r - 1])) {
        starts[count] = r;
        names[count++] = store.plant(order[r]);
      }
    }
    plantStarts = Arrays.copyOf(starts, count);
    plantCodes = Arrays.copyOf(names, count);
  }

  private static void sortByTime(long[] keys) {
    // Keys of one kind ascend with time; a file that mixes kinds is refused by the reader.
    Arrays.sort(keys);
  }

  /**
   * Two stable counting sorts, by period and then by plant, in time proportional to the rows.
   *
   * @param periodOf for each stored row the rank of its period
   * @return the stored rows in their order in the panel
   */
  private int[] sorted(int[] periodOf, int plants) {
    int[] identity = new int[rows];
    int[] plantOf = new int[rows];
    for (int r = 0; r < rows; r++) {
      identity[r] = r;
      plantOf[r] = store.plant(r);
    }
    return countingSort(countingSort(identity, periodOf, periodKeys.length), plantOf, plants);
  }

  private static int[] countingSort(int[] rows, int[] keyOf, int keys) {
    int[] at = new int[keys + 1];
    for (int row : rows) {
      at[keyOf[row] + 1]++;
    }
    for (int k = 0; k < keys; k++) {
      at[k + 1] += at[k];
    }
    int[] sorted = new int[rows.length];
    for (int row : rows) {
      sorted[at[keyOf[row]]++] = row;
    }
    return sorted;
  }

  /** The periods as keys, ascending. */
  long[] periodKeys() {
    return periodKeys.clone();
  }

  /** The number in the file of a row of the panel. */
  int fileRow(int row) {
    return store.fileRow(order[row]);
  }

  long period(int row) {
    return periodKeys[rowPeriods[row]];
  }

  int plantCode(int row) {
    return store.plant(order[row]);
  }

  /** Runs of panel rows with the same plant and period: first row and the row after the last. */
  List<int[]> duplicates() {
    List<int[]> runs = new ArrayList<>();
    for (int r = 1; r < rows; r++) {
      int from = r - 1;
      while (r < rows && plantCode(r) == plantCode(from) && rowPeriods[r] == rowPeriods[from]) {
        r++;
      }
      if (r - from > 1) {
        runs.add(new int[] {from, r});
      }
    }
    return runs;
  }

  /**
   * The panel.
   *
   * @param plantNames the text of each plant's code; unused without a plant column
   * @param baseDeflator the deflator of the base period, where money is deflated
   */
  Panel panel(List<String> plantNames, Optional<Double> baseDeflator) {
    double[] output = gather(slots.output());
    double[] factor = baseDeflator.map(this::factors).orElseGet(() -> new double[0]);
    List<Column> quantities = new ArrayList<>();
    List<Column> logQuantities = new ArrayList<>();
    List<Optional<Column>> prices = new ArrayList<>();
    List<Optional<Column>> spending = new ArrayList<>();
    for (int i = 0; i < roles.inputs().size(); i++) {
      Column quantity = column(slots.quantity(i));
      quantities.add(quantity);
      logQuantities.add(roles.keepsZeros() ? quantity.logsWithZeros() : quantity.logs());
      Optional<Column> spent = money(slots.spending(i), factor);
      spending.add(spent);
      prices.add(money(slots.price(i), factor).or(() -> spent.map(s -> ratio(s, quantity))));
    }
    Column outputColumn = Column.takingOver(roles.output(), output);
    return new Panel(
        roles,
        plants(plantNames),
        Panel.Rows.takingOver(plantStarts.clone()),
        periods(),
        periodNumbers(),
        Panel.Rows.takingOver(rowPeriods.clone()),
        fileRows(),
        outputColumn,
        outputColumn.logs(),
        quantities,
        logQuantities,
        prices,
        spending,
        controls(),
        money(slots.filedCost(), factor),
        further(factor),
        factor.length == 0
            ? Optional.empty()
            : Optional.of(Column.takingOver("money factor", factor)));
  }

  private double[] gather(int slot) {
    double[] values = new double[rows];
    for (int r = 0; r < rows; r++) {
      values[r] = store.number(slot, order[r]);
    }
    return values;
  }

  private Column column(int slot) {
    return Column.takingOver(slots.get(slot).heading(), gather(slot));
  }

  private double[] factors(double base) {
    double[] factor = gather(slots.deflator().orElseThrow());
    for (int r = 0; r < rows; r++) {
      factor[r] = base / factor[r];
    }
    return factor;
  }

  private Optional<Column> money(OptionalInt slot, double[] factor) {
    if (slot.isEmpty()) {
      return Optional.empty();
    }
    double[] values = gather(slot.getAsInt());
    if (factor.length > 0) {
      for (int r = 0; r < rows; r++) {
        values[r] *= factor[r];
      }
    }
    return Optional.of(Column.takingOver(slots.get(slot.getAsInt()).heading(), values));
  }

  private static Column ratio(Column spent, Column quantity) {
    double[] price = new double[spent.size()];
    for (int r = 0; r < price.length; r++) {
      price[r] = spent.get(r) / quantity.get(r);
    }
    return Column.takingOver(spent.name() + " / " + quantity.name(), price);
  }

  private List<Column> controls() {
    List<Column> controls = new ArrayList<>();
    for (int k = 0; k < roles.controls().size(); k++) {
      Column control = column(slots.control(k));
      controls.add(roles.controls().get(k).log() ? control.logs() : control);
    }
    return controls;
  }

  private List<Column> further(double[] factor) {
    List<Column> further = new ArrayList<>();
    for (int k = 0; k < roles.further().size(); k++) {
      int slot = slots.further(k);
      boolean price = roles.further().get(k).measure() == Roles.Measure.PRICE;
      further.add(price ? money(OptionalInt.of(slot), factor).orElseThrow() : column(slot));
    }
    return further;
  }

  private List<String> plants(List<String> plantNames) {
    List<String> plants = new ArrayList<>(plantCodes.length);
    for (int p = 0; p < plantCodes.length; p++) {
      plants.add(
          roles.plant().isPresent()
              ? plantNames.get(plantCodes[p])
              : "row " + store.fileRow(order[p]));
    }
    return plants;
  }

  private List<String> periods() {
    if (roles.period().isEmpty()) {
      return List.of("all");
    }
    return Arrays.stream(periodKeys).mapToObj(Periods::text).toList();
  }

  private List<Double> periodNumbers() {
    return Arrays.stream(periodKeys).mapToObj(Periods::number).toList();
  }

  private Panel.Rows fileRows() {
    int[] numbers = new int[rows];
    for (int r = 0; r < rows; r++) {
      numbers[r] = fileRow(r);
    }
    return Panel.Rows.takingOver(numbers);
  }
}

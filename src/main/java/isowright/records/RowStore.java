package isowright.records;

import java.util.stream.IntStream;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.IntColumn;
import tech.tablesaw.api.LongColumn;

/**
 * The rows that were not set aside, in the order of the file, as typed Tablesaw columns: one of
 * doubles for each numeric slot, and the plant's code, the period's key and the row's number in the
 * file.
 *
 * <p>The columns are used without a Tablesaw table: creating the first table costs more time than
 * reading a million rows.
 */
final class RowStore {

  private final boolean hasPlant;
  private final boolean hasPeriod;
  private final int[] numeric;
  private final DoubleColumn[] numbers;
  private final IntColumn plants = IntColumn.create("plant");
  private final LongColumn periods = LongColumn.create("period");
  private final IntColumn fileRows = IntColumn.create("row");
  private final int[] blanks;
  private final int[] firstBlankRows;

  RowStore(Slots slots) {
    hasPlant = slots.plant().isPresent();
    hasPeriod = slots.period().isPresent();
    Slot.Kind[] kinds = slots.kinds();
    numeric = IntStream.range(0, kinds.length).filter(s -> kinds[s].numeric()).toArray();
    numbers = new DoubleColumn[slots.size()];
    for (int s = 0; s < numbers.length; s++) {
      numbers[s] = DoubleColumn.create(slots.get(s).heading());
    }
    blanks = new int[slots.size()];
    firstBlankRows = new int[slots.size()];
  }

  void add(Row row) {
    fileRows.append(row.number());
    if (hasPlant) {
      plants.append(row.plant());
    }
    if (hasPeriod) {
      periods.append(row.period());
    }
    for (int s : numeric) {
      numbers[s].append(row.value(s));
      if (row.blank(s) && blanks[s]++ == 0) {
        firstBlankRows[s] = row.number();
      }
    }
  }

  int rows() {
    return fileRows.size();
  }

  double number(int slot, int row) {
    return numbers[slot].getDouble(row);
  }

  /** The plant's code; without a plant column every row is its own plant. */
  int plant(int row) {
    return hasPlant ? plants.getInt(row) : row;
  }

  /** The period's key; without a period column all rows are in one period. */
  long period(int row) {
    return hasPeriod ? periods.getLong(row) : Periods.INTEGER;
  }

  int fileRow(int row) {
    return fileRows.getInt(row);
  }

  /** The rows in which a value may be and is blank. */
  int blanks(int slot) {
    return blanks[slot];
  }

  /** The first of them, as in the file. */
  int firstBlankRow(int slot) {
    return firstBlankRows[slot];
  }
}

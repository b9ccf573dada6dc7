package isowright.records;

import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/**
 * The row that is being read: for each slot a value, a blank or a fault. One object serves all
 * rows, so that a million rows make no objects.
 */
final class Row {

  /** What stands in a cell. */
  private static final byte BLANK = 0;

  private static final byte PRESENT = 1;
  private static final byte FAULTY = 2;

  private final byte[] states;
  private final double[] values;
  private final @Nullable Fault[] faults;
  private boolean anyFault;

  /** Its number in the file. */
  private int number;

  /** The code of its plant, meaningful where the plant is present. */
  private int plant;

  /** The key of its period, see {@link Periods}; meaningful where the period is present. */
  private long period;

  /** Why a cell cannot be used, worked out only if it will be said. */
  @FunctionalInterface
  interface Fault {
    /** The fault and the value found. */
    Found found();
  }

  /**
   * A fault with the value that has it.
   *
   * @param value as it stands in the file
   * @param fault what is wrong with it
   */
  record Found(String value, CellFault fault) {}

  Row(int slots) {
    states = new byte[slots];
    values = new double[slots];
    faults = new Fault[slots];
  }

  void begin(int fileRow) {
    number = fileRow;
    Arrays.fill(states, BLANK);
    if (anyFault) {
      Arrays.fill(faults, null);
      anyFault = false;
    }
  }

  int number() {
    return number;
  }

  void put(int slot, double value) {
    values[slot] = value;
    states[slot] = PRESENT;
  }

  void putPlant(int slot, int code) {
    plant = code;
    states[slot] = PRESENT;
  }

  void putPeriod(int slot, long key) {
    period = key;
    states[slot] = PRESENT;
  }

  void fault(int slot, Fault fault) {
    faults[slot] = fault;
    states[slot] = FAULTY;
    anyFault = true;
  }

  boolean anyFault() {
    return anyFault;
  }

  @Nullable Fault fault(int slot) {
    return faults[slot];
  }

  boolean present(int slot) {
    return states[slot] == PRESENT;
  }

  boolean blank(int slot) {
    return states[slot] == BLANK;
  }

  /** The value of a numeric slot, NaN where there is none. */
  double value(int slot) {
    return states[slot] == PRESENT ? values[slot] : Double.NaN;
  }

  int plant() {
    return plant;
  }

  long period() {
    return period;
  }
}

package isowright.records;

import java.util.List;
import java.util.Optional;

/**
 * Records of plants over periods: columns of numbers, sorted by plant (in order of first
 * appearance) and within a plant by period, so that a plant's rows are contiguous. Immutable; made
 * by {@link RecordsReader}.
 *
 * <p>Every row is usable: output and all input quantities are finite and positive (rows that were
 * not are set aside by the reader, which says so). Where the roles keep zeros a quantity may be
 * zero; the mean of the logs of the others then stands in the place of its log. Money columns are
 * in the money of the base period where a deflator was declared.
 *
 * @param roles what the columns are
 * @param plants the plants' names in order
 * @param plantStarts the first row of each plant; shape as {@code plants}
 * @param periods the distinct periods, ascending; one, called "all", where there is no period
 *     column
 * @param periodNumbers each period as a number on a common scale: integers as they are, dates as
 *     years and fractions of years; shape as {@code periods}
 * @param rowPeriods for each row the index of its period
 * @param fileRows for each row its number in the file as the user sees it
 * @param output output Q
 * @param logOutput ln Q
 * @param quantities quantity of each input, in the order of the roles
 * @param logQuantities natural logs of the quantities; see above for those of zero
 * @param prices price of each input; absent where neither price nor spending was declared
 * @param spending money spent on each input; absent where not declared
 * @param controls each control as it enters (logged where declared)
 * @param filedCost filed cost
 * @param further further columns that only a later stage looks at, in the order of the roles,
 *     prices in the money of the base; NaN where blank
 * @param moneyFactor what the money of each row was multiplied by; absent without a deflator
 */
public record Panel(
    Roles roles,
    List<String> plants,
    Rows plantStarts,
    List<String> periods,
    List<Double> periodNumbers,
    Rows rowPeriods,
    Rows fileRows,
    Column output,
    Column logOutput,
    List<Column> quantities,
    List<Column> logQuantities,
    List<Optional<Column>> prices,
    List<Optional<Column>> spending,
    List<Column> controls,
    Optional<Column> filedCost,
    List<Column> further,
    Optional<Column> moneyFactor) {

  /** Copies the lists. */
  public Panel {
    plants = List.copyOf(plants);
    periods = List.copyOf(periods);
    periodNumbers = List.copyOf(periodNumbers);
    quantities = List.copyOf(quantities);
    logQuantities = List.copyOf(logQuantities);
    prices = List.copyOf(prices);
    spending = List.copyOf(spending);
    controls = List.copyOf(controls);
    further = List.copyOf(further);
  }

  /** A panel without further columns, whose money is as it was written. */
  public Panel(
      Roles roles,
      List<String> plants,
      Rows plantStarts,
      List<String> periods,
      List<Double> periodNumbers,
      Rows rowPeriods,
      Rows fileRows,
      Column output,
      Column logOutput,
      List<Column> quantities,
      List<Column> logQuantities,
      List<Optional<Column>> prices,
      List<Optional<Column>> spending,
      List<Column> controls,
      Optional<Column> filedCost) {
    this(
        roles,
        plants,
        plantStarts,
        periods,
        periodNumbers,
        rowPeriods,
        fileRows,
        output,
        logOutput,
        quantities,
        logQuantities,
        prices,
        spending,
        controls,
        filedCost,
        List.of(),
        Optional.empty());
  }

  /** The same records at other prices. */
  public Panel withPrices(List<Optional<Column>> otherPrices) {
    return new Panel(
        roles,
        plants,
        plantStarts,
        periods,
        periodNumbers,
        rowPeriods,
        fileRows,
        output,
        logOutput,
        quantities,
        logQuantities,
        otherPrices,
        spending,
        controls,
        filedCost,
        further,
        moneyFactor);
  }

  /** The number of rows, N. */
  public int rows() {
    return output.size();
  }

  /** The names of the inputs, in order. */
  public List<String> inputs() {
    return roles.inputNames();
  }

  /** The first row of plant p. */
  public int plantStart(int p) {
    return plantStarts.get(p);
  }

  /** The row after the last of plant p. */
  public int plantEnd(int p) {
    return p + 1 < plants.size() ? plantStarts.get(p + 1) : rows();
  }

  /** The index of the plant to which a row belongs. */
  public int plantOf(int row) {
    return plantStarts.floor(row);
  }

  /** Whether any plant is seen in more than one row. */
  public boolean repeats() {
    return plants.size() < rows();
  }

  /** Whether no quantity of an input was used in a row; never where the roles keep no zeros. */
  public boolean zero(int input, int row) {
    return roles.keepsZeros() && quantities.get(input).get(row) == 0;
  }

  /** In how many rows no quantity of an input was used. */
  public int zeros(int input) {
    int count = 0;
    for (int row = 0; roles.keepsZeros() && row < rows(); row++) {
      count += zero(input, row) ? 1 : 0;
    }
    return count;
  }

  /** Whether any quantity in a row is zero. */
  public boolean anyZero(int row) {
    for (int i = 0; roles.keepsZeros() && i < quantities.size(); i++) {
      if (zero(i, row)) {
        return true;
      }
    }
    return false;
  }

  /** The geometric mean of each input over all rows in which it is positive, shape n. */
  public double[] geometricMeans() {
    double[] means = new double[logQuantities.size()];
    for (int i = 0; i < means.length; i++) {
      Column logs = logQuantities.get(i);
      double sum = 0;
      int positive = 0;
      for (int r = 0; r < logs.size(); r++) {
        if (!zero(i, r)) {
          sum += logs.get(r);
          positive++;
        }
      }
      means[i] = Math.exp(sum / positive);
    }
    return means;
  }

  /** Immutable whole numbers, such as one for each row. */
  public static final class Rows {
    private final int[] values;

    private Rows(int[] values) {
      this.values = values;
    }

    /** Over a copy of these values. */
    public static Rows of(int[] values) {
      return new Rows(values.clone());
    }

    /** Over an array which its maker does not keep. */
    static Rows takingOver(int[] values) {
      return new Rows(values);
    }

    /** How many there are. */
    public int size() {
      return values.length;
    }

    /** The value at an index. */
    public int get(int index) {
      return values[index];
    }

    /** A copy of all values. */
    public int[] toArray() {
      return values.clone();
    }

    /** For ascending values: the index of the last one not above {@code value}. */
    int floor(int value) {
      int at = java.util.Arrays.binarySearch(values, value);
      return at >= 0 ? at : -at - 2;
    }
  }
}

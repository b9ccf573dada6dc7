package isowright.records;

/** An immutable column of numbers, one for each row of a {@link Panel}. */
public final class Column {

  private final String name;
  private final double[] values;

  /** A column over a copy of these values. */
  public static Column of(String name, double[] values) {
    return new Column(name, values.clone());
  }

  /** A column that takes over an array which its maker does not keep. */
  static Column takingOver(String name, double[] values) {
    return new Column(name, values);
  }

  private Column(String name, double[] values) {
    this.name = name;
    this.values = values;
  }

  /** The column's heading in the file, or the name of what was computed. */
  public String name() {
    return name;
  }

  /** The number of rows. */
  public int size() {
    return values.length;
  }

  /** The value at a row. */
  public double get(int row) {
    return values[row];
  }

  /** Copies rows {@code from} to {@code to − 1} into an array from its beginning. */
  public void copy(int from, int to, double[] into) {
    System.arraycopy(values, from, into, 0, to - from);
  }

  /** A copy of all values. */
  public double[] toArray() {
    return values.clone();
  }

  /** The natural logs of this column, with the mean of the others in the place of those of zero. */
  Column logsWithZeros() {
    double[] logs = logs().toArray();
    double sum = 0;
    int positive = 0;
    for (int r = 0; r < logs.length; r++) {
      if (values[r] > 0) {
        sum += logs[r];
        positive++;
      }
    }
    for (int r = 0; r < logs.length; r++) {
      if (values[r] == 0) {
        logs[r] = sum / positive;
      }
    }
    return new Column("ln " + name, logs);
  }

  /** The same column without its zeros: NaN in their place. */
  Column positive() {
    double[] positive = values.clone();
    for (int r = 0; r < positive.length; r++) {
      if (positive[r] == 0) {
        positive[r] = Double.NaN;
      }
    }
    return new Column(name, positive);
  }

  /** The natural logs of this column (NaN where a value is not positive). */
  public Column logs() {
    double[] logs = new double[values.length];
    for (int r = 0; r < logs.length; r++) {
      logs[r] = values[r] > 0 ? Math.log(values[r]) : Double.NaN;
    }
    return new Column("ln " + name, logs);
  }
}

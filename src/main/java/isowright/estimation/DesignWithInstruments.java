package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.Groups;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The design of a form with its instruments after it; columns of periods that no row tells apart
 * are held at zero.
 */
final class DesignWithInstruments implements Design {

  private final LinearDesign own;
  private final PanelRows rows;
  private final FormInstruments instruments;
  private final boolean[] held;
  private final List<String> columns;

  /**
   * @param held true for a column of {@code own} that is held at zero
   */
  DesignWithInstruments(
      LinearDesign own, PanelRows rows, FormInstruments instruments, boolean[] held) {
    this.own = own;
    this.rows = rows;
    this.instruments = instruments;
    this.held = held.clone();
    List<String> names = new ArrayList<>(own.columns());
    names.addAll(instruments.names());
    this.columns = List.copyOf(names);
  }

  @Override
  public int rows() {
    return own.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return own.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int count = held.length;
    double[][] first = Arrays.copyOf(into, count + 1);
    first[count] = into[columns.size()];
    own.fill(from, to, first);
    for (int k = 0; k < count; k++) {
      if (held[k]) {
        Arrays.fill(into[k], 0, to - from, 0);
      }
    }
    instruments.fill(from, to, rows.logInputs(from, to), into, count);
  }
}

package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import isowright.regression.Groups;
import isowright.regression.Times;

/**
 * The rows of a panel as an estimator sees them: logged inputs divided by a base, logged output,
 * and the plants as groups. Nothing is copied but the block at hand.
 */
final class PanelRows {

  private final Panel panel;
  private final double[] logBase;
  private final Groups groups;
  private final boolean zeros;

  private PanelRows(Panel panel, double[] logBase, Groups groups) {
    this.panel = panel;
    this.logBase = logBase;
    this.groups = groups;
    this.zeros = panel.roles().keepsZeros();
  }

  static PanelRows of(Panel panel, double[] base) {
    double[] logBase = new double[base.length];
    for (int i = 0; i < base.length; i++) {
      logBase[i] = Math.log(base[i]);
    }
    Groups groups =
        panel.repeats()
            ? Groups.startingAt(panel.rows(), panel.plantStarts().toArray())
            : Groups.ofSingleRows(panel.rows());
    return new PanelRows(panel, logBase, groups);
  }

  int count() {
    return panel.rows();
  }

  int inputs() {
    return logBase.length;
  }

  Groups groups() {
    return groups;
  }

  /** The periods of the rows. */
  Times times() {
    return times(RowsUsed.each(panel.rows()));
  }

  /** The periods of the rows of a regression; of a difference, that of its later row. */
  Times times(RowsUsed used) {
    return new Times() {
      @Override
      public int rows() {
        return used.count();
      }

      @Override
      public int count() {
        return panel.periods().size();
      }

      @Override
      public int of(int row) {
        return panel.rowPeriods().get(used.panelRow(row));
      }
    };
  }

  /** A block's logged inputs divided by the base; {@code z[i][row − from]}, freshly made. */
  double[][] logInputs(int from, int to) {
    double[][] z = new double[logBase.length][to - from];
    for (int i = 0; i < logBase.length; i++) {
      Column logs = panel.logQuantities().get(i);
      double[] column = z[i];
      logs.copy(from, to, column);
      double shift = logBase[i];
      for (int r = 0; r < column.length; r++) {
        column[r] -= shift;
      }
      for (int r = 0; zeros && r < column.length; r++) {
        column[r] = panel.zero(i, from + r) ? 0 : column[r];
      }
    }
    return z;
  }

  /** The log of a quantity, undivided; of none, that of the base, as in {@link #logInputs}. */
  double logQuantity(int input, int row) {
    return panel.zero(input, row) ? logBase[input] : panel.logQuantities().get(input).get(row);
  }

  /** Copies a block of logged output. */
  void logOutput(int from, int to, double[] into) {
    panel.logOutput().copy(from, to, into);
  }
}

package isowright.estimation;

import isowright.records.Panel;
import java.util.function.IntPredicate;

/**
 * Some rows of a panel as records of their own: plants and periods of which no row is left are
 * gone, so that a fit of the sample is the fit of a file that holds these rows alone.
 *
 * <p>Tested in {@code MatrixTest}, against runs of the whole pipeline on the rows.
 */
public final class PanelSample {

  private PanelSample() {}

  /** The rows that are to be kept, at least one; the panel itself where all are. */
  public static Panel of(Panel panel, IntPredicate keep) {
    Panel sample = SelectedPanel.kept(panel, keep);
    if (sample.rows() == panel.rows()) {
      return panel;
    }
    boolean[] seen = new boolean[panel.periods().size()];
    for (int row = 0; row < sample.rows(); row++) {
      seen[sample.rowPeriods().get(row)] = true;
    }
    for (int period = seen.length - 1; period >= 0; period--) {
      if (!seen[period]) {
        sample = SelectedPanel.withoutPeriod(sample, period);
      }
    }
    return sample;
  }
}

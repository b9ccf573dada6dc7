package isowright.estimation;

import isowright.records.Panel;
import java.util.List;
import java.util.Locale;

/**
 * Which rows follow one another without a gap.
 *
 * <p>One step is the least distance between two successive periods of the records, on the scale on
 * which periods are numbers (integers, or years of dates). A row follows the row before it in its
 * plant if it lies less than one and a half steps after it: months and quarters differ in length by
 * some days, a missing period is a step more.
 */
public final class PeriodSteps {

  private static final double MOST = 1.5;

  private final Panel panel;
  private final double step;

  private PeriodSteps(Panel panel, double step) {
    this.panel = panel;
    this.step = step;
  }

  /** The steps of a panel. */
  public static PeriodSteps of(Panel panel) {
    List<Double> numbers = panel.periodNumbers();
    double least = Double.POSITIVE_INFINITY;
    for (int p = 1; p < numbers.size(); p++) {
      least = Math.min(least, numbers.get(p) - numbers.get(p - 1));
    }
    return new PeriodSteps(panel, least);
  }

  /** Whether a row, not the first of its plant, comes one step after the row before it. */
  public boolean follows(int row) {
    double here = panel.periodNumbers().get(panel.rowPeriods().get(row));
    double before = panel.periodNumbers().get(panel.rowPeriods().get(row - 1));
    return here - before < MOST * step && here > before;
  }

  /** How many rows follow the row before them in their plant. */
  public int count() {
    int count = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      for (int r = panel.plantStart(p) + 1; r < panel.plantEnd(p); r++) {
        count += follows(r) ? 1 : 0;
      }
    }
    return count;
  }

  /** The length of a step in words. */
  String words() {
    return step == Math.rint(step)
        ? String.format(Locale.ROOT, "%.0f", step)
        : String.format(Locale.ROOT, "%.4g years", step);
  }
}

package isowright.records;

import isowright.records.Remark.Severity;
import java.util.List;

/**
 * Finds values that are ten, a hundred or a thousand times too large or too small for the plant's
 * own history: a digit slipped, or a unit changed.
 *
 * <p>With l the decimal log of a plant's values in the order of periods, each step l(t+1) − l(t),
 * less the plant's usual step, is held against ±1, ±2 and ±3. The usual step is the plant's median
 * step (so that steady growth, however fast, is no finding), zero where fewer than {@value
 * #OWN_STEPS} steps are known. How much steps scatter is their median absolute deviation, of the
 * plant where it has enough steps, else of all plants. A step counts when it is within tolerance of
 * a power of ten; a plant that scatters by more than {@value #UNSTEADY} (a factor of about 1.26) is
 * too unsteady to tell, and nothing is said of it.
 *
 * <p>Two steps that undo each other bound a slip; a step after the first or before the last value
 * is a slip of that value; any other step is a break from there on.
 */
final class PowersOfTen {

  /** Fewer steps give no reliable median of their own. */
  static final int OWN_STEPS = 5;

  /**
   * At this scatter the widest tolerance still lies five robust standard deviations from an
   * ordinary step: (1 − 0.3) / (1.4826 · 0.1) = 4.7.
   */
  static final double UNSTEADY = 0.1;

  /** A slip multiplies an ordinary change by ten: a factor of 1.4 either way is ordinary. */
  private static final double LEAST_TOLERANCE = 0.15;

  private static final double MOST_TOLERANCE = 0.3;

  /** Tolerance in units of the scatter: 4 · 0.6745 = 2.7 robust standard deviations. */
  private static final double SCATTERS = 4;

  private static final int GREATEST_POWER = 3;
  private static final int FEWEST_VALUES = 3;

  private final Panel panel;
  private final AuditRemarks remarks;
  private final PanelColumn column;
  private final double[] logs;
  private final int[] rows;
  private final double[] steps;
  private final double[] scratch;
  private final double scatterOfAll;
  private int known;

  private PowersOfTen(Panel panel, PanelColumn column, AuditRemarks remarks) {
    this.panel = panel;
    this.column = column;
    this.remarks = remarks;
    int longest = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      longest = Math.max(longest, panel.plantEnd(p) - panel.plantStart(p));
    }
    logs = new double[longest];
    rows = new int[longest];
    steps = new double[longest];
    scratch = new double[longest];
    scatterOfAll = scatterOfAll();
  }

  /** Looks at every column of positive values; prices worked out are judged by their parts. */
  static void audit(Panel panel, List<PanelColumn> columns, AuditRemarks remarks) {
    if (!panel.repeats() || panel.roles().period().isEmpty()) {
      return;
    }
    for (PanelColumn column : columns) {
      if (column.kind().positive() && !column.computed()) {
        new PowersOfTen(panel, column, remarks).audit();
      }
    }
  }

  private double scatterOfAll() {
    double[] all = new double[panel.rows()];
    int count = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      load(p);
      for (int t = 0; t + 1 < known; t++) {
        all[count++] = Math.abs(steps[t]);
      }
    }
    return Robust.median(all, count);
  }

  private void load(int plant) {
    known = 0;
    for (int r = panel.plantStart(plant); r < panel.plantEnd(plant); r++) {
      double value = column.column().get(r);
      if (value > 0) {
        logs[known] = Math.log10(value);
        rows[known++] = r;
      }
    }
    for (int t = 0; t + 1 < known; t++) {
      steps[t] = logs[t + 1] - logs[t];
    }
  }

  private void audit() {
    for (int p = 0; p < panel.plants().size(); p++) {
      load(p);
      if (known >= FEWEST_VALUES) {
        auditPlant();
      }
    }
  }

  private void auditPlant() {
    int count = known - 1;
    double usual = 0;
    double scatter = scatterOfAll;
    if (count >= OWN_STEPS) {
      System.arraycopy(steps, 0, scratch, 0, count);
      usual = Robust.median(scratch, count);
      for (int t = 0; t < count; t++) {
        scratch[t] = Math.abs(steps[t] - usual);
      }
      scatter = Robust.median(scratch, count);
    }
    if (!(scatter <= UNSTEADY)) {
      return;
    }
    double tolerance = Math.min(Math.max(LEAST_TOLERANCE, SCATTERS * scatter), MOST_TOLERANCE);
    for (int t = 0; t < count; t++) {
      int power = power(steps[t] - usual, tolerance);
      if (power != 0) {
        t = found(t, power, usual, tolerance);
      }
    }
  }

  /** The power of ten that a step is, 0 where it is none. */
  private static int power(double step, double tolerance) {
    int nearest = (int) Math.rint(Math.abs(step));
    boolean near = nearest >= 1 && nearest <= GREATEST_POWER;
    if (!near || Math.abs(Math.abs(step) - nearest) > tolerance) {
      return 0;
    }
    return step > 0 ? nearest : -nearest;
  }

  /** Says what the step after value {@code t} means; the last step that belongs to it. */
  private int found(int t, int power, double usual, double tolerance) {
    int count = known - 1;
    for (int back = t + 1; back < count && back - t <= known / 3; back++) {
      if (power(steps[back] - usual, tolerance) == -power) {
        for (int v = t + 1; v <= back; v++) {
          slip(v, power, logs[t] + (v - t) * usual);
        }
        return back;
      }
    }
    if (t == 0) {
      slip(0, -power, logs[1] - usual);
    } else if (t == count - 1) {
      slip(known - 1, power, logs[t] + usual);
    } else {
      breakFrom(t + 1, power);
    }
    return t;
  }

  private void slip(int value, int power, double expected) {
    int row = rows[value];
    remarks.add(
        Severity.WARNING,
        "power-of-ten-slip",
        () ->
            "%s, %s: %s is about %s what the plant's other periods suggest, about %s; a slipped digit or another unit looks like this, and one such row can move every estimate. Compare it with its source and correct it, or leave the cell blank."
                .formatted(
                    remarks.where(row),
                    column.words(),
                    Shown.value(column.column().get(row)),
                    times(power),
                    Shown.value(rounded(Math.pow(10, expected)))),
        row);
  }

  private void breakFrom(int value, int power) {
    int row = rows[value];
    int before = rows[value - 1];
    remarks.add(
        Severity.WARNING,
        "power-of-ten-break",
        () ->
            "%s, %s: from here on the plant's values are about %s those before (%s after %s); a unit that changed looks like this. Bring all periods to one unit."
                .formatted(
                    remarks.where(row),
                    column.words(),
                    times(power),
                    Shown.value(column.column().get(row)),
                    Shown.value(column.column().get(before))),
        row);
  }

  /** To three significant digits: an expectation is no measurement. */
  private static double rounded(double value) {
    return new java.math.BigDecimal(value)
        .round(new java.math.MathContext(3, java.math.RoundingMode.HALF_EVEN))
        .doubleValue();
  }

  private static String times(int power) {
    String factor = Shown.count(Math.round(Math.pow(10, Math.abs(power))));
    return power > 0 ? factor + " times" : "a " + factor + "th of";
  }
}

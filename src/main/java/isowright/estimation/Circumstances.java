package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What besides inputs moves output in a panel: controls, a trend, or a constant for each period.
 * All enter ln Q additively.
 *
 * <p>The trend counts from the first period of the records: t = period − first period. Period
 * effects are measured against the first period.
 */
final class Circumstances {

  private final Panel panel;
  private final Specification.Time time;
  private final List<String> names;
  private final double[] controlMeans;

  private Circumstances(
      Panel panel, Specification.Time time, List<String> names, double[] controlMeans) {
    this.panel = panel;
    this.time = time;
    this.names = names;
    this.controlMeans = controlMeans;
  }

  static Circumstances of(Panel panel, Specification.Time time) {
    List<String> names = new ArrayList<>();
    double[] means = new double[panel.controls().size()];
    for (int c = 0; c < means.length; c++) {
      Column control = panel.controls().get(c);
      names.add("control:" + control.name());
      double sum = 0;
      for (int r = 0; r < control.size(); r++) {
        sum += control.get(r);
      }
      means[c] = sum / control.size();
    }
    if (time == Specification.Time.TREND) {
      names.add("trend");
    } else if (time == Specification.Time.PERIOD_EFFECTS) {
      panel.periods().stream().skip(1).forEach(period -> names.add("period:" + period));
    }
    return new Circumstances(panel, time, List.copyOf(names), means);
  }

  /** The names of the parameters that belong to the columns. */
  List<String> names() {
    return names;
  }

  int count() {
    return names.size();
  }

  /** Writes the columns for rows {@code from} to {@code to − 1}. */
  void fill(int from, int to, double[][] into, int offset) {
    int k = offset;
    for (Column control : panel.controls()) {
      control.copy(from, to, into[k++]);
    }
    switch (time) {
      case NONE -> {}
      case TREND -> {
        double[] column = into[k];
        for (int r = from; r < to; r++) {
          column[r - from] = since(panel.rowPeriods().get(r));
        }
      }
      case PERIOD_EFFECTS -> {
        for (int p = 1; p < panel.periods().size(); p++) {
          Arrays.fill(into[k + p - 1], 0, to - from, 0);
        }
        for (int r = from; r < to; r++) {
          int p = panel.rowPeriods().get(r);
          if (p > 0) {
            into[k + p - 1][r - from] = 1;
          }
        }
      }
    }
  }

  /** The values of the columns at a period, with controls at their means over the records. */
  double[] at(int period) {
    double[] values = Arrays.copyOf(controlMeans, names.size());
    if (time == Specification.Time.TREND) {
      values[controlMeans.length] = since(period);
    } else if (time == Specification.Time.PERIOD_EFFECTS && period > 0) {
      values[controlMeans.length + period - 1] = 1;
    }
    return values;
  }

  private double since(int period) {
    return panel.periodNumbers().get(period) - panel.periodNumbers().get(0);
  }
}

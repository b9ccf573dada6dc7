package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What besides inputs moves output in a panel: controls, that an input is not used at all,
 * technical change, or a constant for each period.
 *
 * <p>Where the records keep zeros, an input x_i that some rows do not use enters as ln max(x_i,
 * D_i), D_i being one where x_i is zero, and D_i is a regressor of its own: Battese, G. E. (1997),
 * <i>Journal of Agricultural Economics</i> 48, 250–252. With inputs divided by a base, it is the
 * quotient that takes the place of x_i. Tested in {@code ZerosTest}.
 *
 * <p>With t = period − first period of the records and z_i the logged, divided inputs, what time
 * adds to ln Q is τ t (trend), τ t + ½ τ₂ t² (quadratic trend), τ t + ½ τ₂ t² + Σ_i τ_i z_i t
 * (biased trend: it changes the output elasticities too), or γ_t, measured against the first period
 * (period effects and two-way). Source of the biased trend: Christensen, L. R., Jorgenson, D. W.
 * and Lau, L. J. (1973), <i>Review of Economics and Statistics</i> 55, 28–45.
 */
final class Circumstances {

  /** The parameter of t. */
  static final String TREND = "trend";

  /** Begins the parameter of D_i, which is one where input i is not used. */
  static final String ZERO = "zero:";

  /** The parameter of ½ t². */
  static final String TREND_SQUARED = "trend*trend";

  private final Panel panel;
  private final Specification.Time time;
  private final List<String> names;
  private final double[] controlMeans;
  private final List<Integer> unused;

  private Circumstances(
      Panel panel,
      Specification.Time time,
      List<String> names,
      double[] controlMeans,
      List<Integer> unused) {
    this.panel = panel;
    this.time = time;
    this.names = names;
    this.controlMeans = controlMeans;
    this.unused = List.copyOf(unused);
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
    List<Integer> unused = new ArrayList<>();
    for (int i = 0; i < panel.quantities().size(); i++) {
      if (panel.zeros(i) > 0) {
        unused.add(i);
        names.add(ZERO + panel.inputs().get(i));
      }
    }
    if (time.trending()) {
      names.add(TREND);
    }
    if (time.quadratic()) {
      names.add(TREND_SQUARED);
    }
    if (time == Specification.Time.BIASED_TREND) {
      panel.inputs().forEach(input -> names.add(biasOf(input)));
    }
    if (time.byPeriod()) {
      panel.periods().stream().skip(1).forEach(period -> names.add("period:" + period));
    }
    return new Circumstances(panel, time, List.copyOf(names), means, unused);
  }

  /** The parameter of z_i t. */
  static String biasOf(String input) {
    return input + "*" + TREND;
  }

  /** The names of the parameters that belong to the columns. */
  List<String> names() {
    return names;
  }

  int count() {
    return names.size();
  }

  /**
   * Writes the columns for rows {@code from} to {@code to − 1}.
   *
   * @param z the logged, divided inputs of those rows
   */
  void fill(int from, int to, double[][] z, double[][] into, int offset) {
    int k = offset;
    for (Column control : panel.controls()) {
      control.copy(from, to, into[k++]);
    }
    for (int input : unused) {
      double[] dummy = into[k++];
      for (int r = from; r < to; r++) {
        dummy[r - from] = panel.zero(input, r) ? 1 : 0;
      }
    }
    if (time.byPeriod()) {
      periods(from, to, into, k);
    } else if (time.trending()) {
      trend(from, to, z, into, k);
    }
  }

  private void trend(int from, int to, double[][] z, double[][] into, int first) {
    double[] t = into[first];
    for (int r = from; r < to; r++) {
      t[r - from] = since(panel.rowPeriods().get(r));
    }
    int k = first + 1;
    if (time.quadratic()) {
      double[] square = into[k++];
      for (int r = 0; r < to - from; r++) {
        square[r] = 0.5 * t[r] * t[r];
      }
    }
    if (time == Specification.Time.BIASED_TREND) {
      for (double[] input : z) {
        double[] product = into[k++];
        for (int r = 0; r < to - from; r++) {
          product[r] = input[r] * t[r];
        }
      }
    }
  }

  private void periods(int from, int to, double[][] into, int first) {
    for (int p = 1; p < panel.periods().size(); p++) {
      Arrays.fill(into[first + p - 1], 0, to - from, 0);
    }
    for (int r = from; r < to; r++) {
      int p = panel.rowPeriods().get(r);
      if (p > 0) {
        into[first + p - 1][r - from] = 1;
      }
    }
  }

  /**
   * What a unit of each parameter adds to ln Q at a period whatever the mix, controls at their
   * means over the records and every input in use; zero for parameters that work through an input.
   */
  double[] at(int period) {
    double[] values = Arrays.copyOf(controlMeans, names.size());
    int k = controlMeans.length + unused.size();
    if (time.byPeriod() && period > 0) {
      values[k + period - 1] = 1;
    } else if (time.trending()) {
      double t = since(period);
      values[k] = t;
      if (time.quadratic()) {
        values[k + 1] = 0.5 * t * t;
      }
    }
    return values;
  }

  /** The place of the parameter through which time works on input i; −1 where there is none. */
  int bias(int input) {
    return time == Specification.Time.BIASED_TREND
        ? controlMeans.length + unused.size() + 2 + input
        : -1;
  }

  /** t: the distance of a period from the first one, in the unit of the periods. */
  double since(int period) {
    return panel.periodNumbers().get(period) - panel.periodNumbers().get(0);
  }
}

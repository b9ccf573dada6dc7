package isowright.study;

import isowright.cost.CostArguments;
import isowright.estimation.CostData;
import isowright.estimation.CostSpecification.Equations;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.regression.Groups;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Turns the panel of a cost side into what cost functions are fitted to, and checks its shares. */
final class CostRecords {

  /** Shares are printed to four or five decimals; a sum off by more than this is no rounding. */
  private static final double ROUNDING = 5e-4;

  private static final int NAMED = 10;

  private final Costs asked;
  private final Panel panel;
  private final boolean time;
  private final boolean scaled;

  CostRecords(Costs asked, Panel panel, boolean time, boolean scaled) {
    this.asked = asked;
    this.panel = panel;
    this.time = time;
    this.scaled = scaled;
  }

  CostData data() {
    int arguments = asked.inputs().size() + asked.outputs().size() + asked.fixed().size();
    double[][] points = new double[arguments + (time ? 1 : 0)][];
    double[] base = new double[arguments];
    for (int k = 0; k < arguments; k++) {
      points[k] = panel.controls().get(k).toArray();
      if (asked.outputsAsTheyStand() && output(k)) {
        points[k] = Arrays.stream(points[k]).map(Math::log).toArray();
      }
      base[k] = scaled ? Math.exp(mean(points[k])) : 1;
    }
    if (time) {
      points[arguments] = periods();
    }
    double[][] controls = new double[asked.controls().size()][];
    for (int c = 0; c < controls.length; c++) {
      controls[c] = panel.controls().get(arguments + c).toArray();
    }
    CostArguments names =
        new CostArguments(
            asked.inputNames(),
            asked.outputs().stream().map(Costs.Quantity::name).toList(),
            asked.fixed().stream().map(Costs.Quantity::name).toList(),
            time,
            base);
    return new CostData(
        names,
        points,
        panel.logOutput().toArray(),
        shares(),
        controls,
        asked.controls(),
        Groups.startingAt(panel.rows(), panel.plantStarts().toArray()));
  }

  private boolean output(int argument) {
    int first = asked.inputs().size();
    return argument >= first && argument < first + asked.outputs().size();
  }

  /** The mean of logs, those of zeros left out. */
  static double mean(double[] logs) {
    return Arrays.stream(logs).filter(Double::isFinite).average().orElse(0);
  }

  /** Outputs that a cost function in levels cannot be fitted with, told with their rows. */
  List<String> impossibleOutputs(CostData data) {
    List<String> reasons = new ArrayList<>();
    int first = asked.inputs().size();
    List<Integer> without = new ArrayList<>();
    for (int r = 0; r < data.rows() && asked.outputsAsTheyStand(); r++) {
      boolean any = false;
      for (int k = 0; k < asked.outputs().size(); k++) {
        double log = data.points()[first + k][r];
        any |= Double.isFinite(log);
        if (Double.isNaN(log)) {
          reasons.add(
              "costs: the output "
                  + asked.outputs().get(k).name()
                  + " is negative in row "
                  + panel.fileRows().get(r)
                  + ": correct it, or set the row aside.");
        }
      }
      if (!any) {
        without.add(panel.fileRows().get(r));
      }
    }
    if (!without.isEmpty()) {
      reasons.add(
          "costs: nothing at all was produced in "
              + without.size()
              + " rows (first in row "
              + without.get(0)
              + "): set them aside.");
    }
    return reasons;
  }

  /**
   * The outputs that are zero in some rows, with the first of these rows; logs cannot take them.
   */
  Optional<String> zeros(CostData data) {
    List<String> found = new ArrayList<>();
    int first = asked.inputs().size();
    for (int k = 0; k < asked.outputs().size(); k++) {
      double[] logs = data.points()[first + k];
      int count = 0;
      int row = -1;
      for (int r = logs.length - 1; r >= 0; r--) {
        if (Double.isInfinite(logs[r])) {
          count++;
          row = r;
        }
      }
      if (count > 0) {
        found.add(
            asked.outputs().get(k).name()
                + " in "
                + count
                + " of "
                + logs.length
                + " rows, first in row "
                + panel.fileRows().get(row));
      }
    }
    return found.isEmpty() ? Optional.empty() : Optional.of(String.join("; ", found));
  }

  /** Periods counted from the first. */
  private double[] periods() {
    double first = panel.periodNumbers().get(0);
    double[] t = new double[panel.rows()];
    for (int r = 0; r < t.length; r++) {
      t[r] = panel.periodNumbers().get(panel.rowPeriods().get(r)) - first;
    }
    return t;
  }

  /** Shares as recorded, or spending over cost; empty where neither is known of every input. */
  private double[][] shares() {
    if (asked.equations() == Equations.COST && CostFormRules.inLevels(asked.forms()).isEmpty()) {
      return new double[0][];
    }
    double[][] shares = new double[asked.inputs().size()][];
    for (int i = 0; i < shares.length; i++) {
      Column column = panel.further().get(i);
      shares[i] = column.toArray();
      if (asked.inputs().get(i).share().isEmpty()) {
        for (int r = 0; r < shares[i].length; r++) {
          shares[i][r] /= panel.output().get(r);
        }
      }
    }
    return shares;
  }

  /** The rows whose shares do not add up to one, named; nothing is rescaled. */
  List<Said> addingUp(CostData data) {
    List<Integer> rows = new ArrayList<>();
    int worst = -1;
    double most = ROUNDING;
    for (int r = 0; r < data.rows() && data.shares().length > 0; r++) {
      double off = Math.abs(sum(data, r) - 1);
      if (!(off <= ROUNDING)) {
        rows.add(panel.fileRows().get(r));
        if (!(off <= most)) {
          worst = r;
          most = off;
        }
      }
    }
    if (rows.isEmpty()) {
      return List.of();
    }
    String plant =
        panel.plants().get(panel.plantOf(worst))
            + (panel.periods().size() > 1
                ? ", " + panel.periods().get(panel.rowPeriods().get(worst))
                : "");
    String message =
        String.format(
            Locale.ROOT,
            "The shares of the inputs do not add up to one, to within %.4f, in %d of %d rows;"
                + " furthest in row %d (%s), where they add up to %.4f. Nothing was rescaled."
                + " Correct the shares of these rows, or set the rows aside.",
            ROUNDING,
            rows.size(),
            data.rows(),
            panel.fileRows().get(worst),
            plant,
            sum(data, worst));
    return List.of(
        new Said(
            "warning", "shares-not-one", message, rows.subList(0, Math.min(NAMED, rows.size()))));
  }

  private static double sum(CostData data, int row) {
    double sum = 0;
    for (double[] share : data.shares()) {
      sum += share[row];
    }
    return sum;
  }

  /** The rows in which a share is not known, named; a system cannot be fitted with them. */
  List<Integer> withoutShare(CostData data) {
    List<Integer> rows = new ArrayList<>();
    for (int r = 0; r < data.rows() && data.shares().length > 0; r++) {
      if (Double.isNaN(sum(data, r))) {
        rows.add(panel.fileRows().get(r));
      }
    }
    return rows;
  }

  /** The prices that never vary against one another: nothing can be learnt from them. */
  List<String> withoutVariation(CostData data) {
    List<String> still = new ArrayList<>();
    int last = data.arguments().inputs().size() - 1;
    for (int i = 0; i < last; i++) {
      double first = data.points()[i][0] - data.points()[last][0];
      boolean varies = false;
      for (int r = 1; r < data.rows() && !varies; r++) {
        // logs of prices of six digits differ by more than this unless they are the same
        varies = Math.abs(data.points()[i][r] - data.points()[last][r] - first) > 1e-9;
      }
      if (!varies) {
        still.add(data.arguments().inputs().get(i));
      }
    }
    return still;
  }

  /**
   * The first price that, over the last one, is a combination of those before it: the one, then
   * those. Nothing can be learnt of their substitution apart.
   */
  List<String> collinear(CostData data) {
    int last = data.arguments().inputs().size() - 1;
    List<double[]> basis = new ArrayList<>();
    for (int i = 0; i < last; i++) {
      double[] price = new double[data.rows()];
      for (int r = 0; r < price.length; r++) {
        price[r] = data.points()[i][r] - data.points()[last][r];
      }
      double mean = Arrays.stream(price).average().orElse(0);
      Arrays.setAll(price, r -> price[r] - mean);
      double whole = length(price);
      for (double[] other : basis) {
        double along = 0;
        for (int r = 0; r < price.length; r++) {
          along += other[r] * price[r];
        }
        for (int r = 0; r < price.length; r++) {
          price[r] -= along * other[r];
        }
      }
      double left = length(price);
      // prices are written with six digits or so; what is left beyond that is rounding
      if (!(left > 1e-5 * whole)) {
        List<String> names = new ArrayList<>(List.of(data.arguments().inputs().get(i)));
        names.addAll(data.arguments().inputs().subList(0, i));
        return names;
      }
      Arrays.setAll(price, r -> price[r] / left);
      basis.add(price);
    }
    return List.of();
  }

  private static double length(double[] values) {
    double sum = 0;
    for (double value : values) {
      sum += value * value;
    }
    return Math.sqrt(sum);
  }
}

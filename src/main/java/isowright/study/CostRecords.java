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
      base[k] = scaled ? Math.exp(Arrays.stream(points[k]).average().orElse(0)) : 1;
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
    if (asked.equations() == Equations.COST) {
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
            "The shares of the inputs do not add up to one, to within %.4f, in %d of %d rows; furthest"
                + " in row %d (%s), where they add up to %.4f. Nothing was rescaled. Correct the"
                + " shares of these rows, or set the rows aside.",
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
}

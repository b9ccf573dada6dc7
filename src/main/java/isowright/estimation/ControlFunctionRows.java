package isowright.estimation;

import isowright.records.Panel;
import isowright.records.PeriodSteps;
import isowright.regression.ArrayDesign;
import isowright.regression.Groups;
import isowright.regression.InnovationMoments;
import isowright.regression.LeastSquares;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * The rows of a panel as a control function sees them: the form's columns, controls and time, the
 * rows that have the row of the period before, and what is computed on both.
 */
final class ControlFunctionRows {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final Estimator.Proxy how;
  private final LinearDesign own;
  private final int columns;
  private final int slopes;
  private final double[][] block;
  private final List<Integer> later = new ArrayList<>();
  private final List<Integer> earlier = new ArrayList<>();

  ControlFunctionRows(
      Panel panel,
      Specification specification,
      double[] base,
      LinearForm form,
      Estimator.Proxy how) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.how = how;
    this.own =
        new LinearDesign(
            PanelRows.of(panel, base),
            form,
            panel.inputs(),
            Circumstances.of(panel, specification.time()),
            true);
    this.columns = own.columns().size();
    this.slopes = form.coefficientNames(panel.inputs()).size() + panel.controls().size();
    this.block = new double[columns + 1][panel.rows()];
    own.fill(0, panel.rows(), block);
    pair();
  }

  /** Constant, form, controls, time. */
  LinearDesign own() {
    return own;
  }

  /** The columns of {@link #own}, and ln Q after them. */
  double[][] block() {
    return block;
  }

  /** How many columns the second step has: form and controls. */
  int slopes() {
    return slopes;
  }

  /** How many rows have the row of the period before. */
  int pairs() {
    return later.size();
  }

  private void pair() {
    PeriodSteps steps = PeriodSteps.of(panel);
    for (int row = 0; row < panel.rows(); row++) {
      int before = steps.before(row, 1);
      if (before >= 0) {
        later.add(row);
        earlier.add(before);
      }
    }
  }

  /** How many columns speak of time. */
  int time() {
    return columns - 1 - slopes;
  }

  /** The columns that smooth output. */
  double[][] basis(SeriesColumn proxy) {
    int rows = panel.rows();
    List<double[]> variables =
        new ArrayList<>(Arrays.asList(PanelRows.of(panel, base).logInputs(0, rows)));
    if (!panel.inputs().contains(how.column().name())) {
      variables.add(proxy.values());
    }
    List<double[]> all = Smoothing.powers(variables, how.degree());
    for (int k = columns - time() - panel.controls().size(); k < columns; k++) {
      all.add(block[k]);
    }
    return Smoothing.orthonormal(all, rows);
  }

  /** The form's columns with every free input of the period before, then controls; by pair. */
  private double[][] instruments() {
    int n = later.size();
    double[][] z = PanelRows.of(panel, base).logInputs(0, panel.rows());
    double[][] moved = new double[z.length][n];
    for (int i = 0; i < z.length; i++) {
      List<Integer> from = how.states().contains(panel.inputs().get(i)) ? later : earlier;
      for (int r = 0; r < n; r++) {
        moved[i][r] = z[i][from.get(r)];
      }
    }
    double[][] into = new double[slopes][n];
    form.regressors(moved, n, into, 0);
    int first = slopes - panel.controls().size();
    for (int c = first; c < slopes; c++) {
      for (int r = 0; r < n; r++) {
        into[c][r] = block[1 + c][later.get(r)];
      }
    }
    return into;
  }

  /** The moments of innovations. */
  InnovationMoments moments(double[][] basis) {
    int n = later.size();
    double[][] ownOfProcess = new double[time()][n];
    for (int s = 0; s < ownOfProcess.length; s++) {
      for (int r = 0; r < n; r++) {
        ownOfProcess[s][r] = block[1 + slopes + s][later.get(r)];
      }
    }
    if (specification.time().byPeriod()) {
      ownOfProcess = told(ownOfProcess, n);
    }
    int[] group = new int[panel.rows()];
    for (int r = 0; r < group.length; r++) {
      group[r] = panel.plantOf(r);
    }
    return new InnovationMoments(
        basis,
        block[columns],
        Arrays.copyOfRange(block, 1, 1 + slopes),
        instruments(),
        ownOfProcess,
        later.stream().mapToInt(Integer::intValue).toArray(),
        earlier.stream().mapToInt(Integer::intValue).toArray(),
        group,
        how.process());
  }

  /** Periods that pairs can tell apart: the first that has a pair stands for the constant. */
  private static double[][] told(double[][] periods, int pairs) {
    List<double[]> kept = new ArrayList<>();
    int covered = 0;
    for (double[] period : periods) {
      int rows = (int) Arrays.stream(period).filter(v -> v != 0).count();
      covered += rows;
      if (rows > 0) {
        kept.add(period);
      }
    }
    return (covered == pairs ? kept.subList(1, kept.size()) : kept).toArray(double[][]::new);
  }

  /** Constant and coefficients of time are those of ln Q − Xβ; all columns in their order. */
  double[] coefficients(double[] theta, double[] weights) {
    int beside = 1 + time();
    double[][] normal = new double[beside][beside];
    double[] right = new double[beside];
    int[] places = new int[beside];
    for (int s = 1; s < beside; s++) {
      places[s] = slopes + s;
    }
    for (int r = 0; r < panel.rows(); r++) {
      double w = weights[panel.plantOf(r)];
      if (w == 0) {
        continue;
      }
      double left = block[columns][r];
      for (int k = 0; k < slopes; k++) {
        left -= theta[k] * block[1 + k][r];
      }
      for (int a = 0; a < beside; a++) {
        right[a] += w * block[places[a]][r] * left;
        for (int b = 0; b < beside; b++) {
          normal[a][b] += w * block[places[a]][r] * block[places[b]][r];
        }
      }
    }
    double[] level = Matrices.solve(normal, right);
    double[] all = new double[columns];
    System.arraycopy(theta, 0, all, 1, slopes);
    for (int a = 0; a < beside; a++) {
      all[places[a]] = level[a];
    }
    return all;
  }

  /** Plants without any pair. */
  List<String> singletons() {
    boolean[] seen = new boolean[panel.plants().size()];
    later.forEach(row -> seen[panel.plantOf(row)] = true);
    return IntStream.range(0, seen.length)
        .filter(p -> !seen[p])
        .mapToObj(panel.plants()::get)
        .toList();
  }

  /** Productivity by least squares on the proxy and the inputs other than it. */
  double proxySlope(SeriesColumn proxy, double[] smoothed, double[] theta) {
    List<String> names = new ArrayList<>(List.of("constant", "proxy"));
    List<double[]> regressors = new ArrayList<>();
    double[] ones = new double[panel.rows()];
    Arrays.fill(ones, 1);
    regressors.add(ones);
    regressors.add(proxy.values());
    double[][] z = PanelRows.of(panel, base).logInputs(0, panel.rows());
    for (int i = 0; i < z.length; i++) {
      if (!panel.inputs().get(i).equals(how.column().name())) {
        names.add(panel.inputs().get(i));
        regressors.add(z[i]);
      }
    }
    double[] omega = smoothed.clone();
    for (int r = 0; r < omega.length; r++) {
      for (int k = 0; k < slopes; k++) {
        omega[r] -= theta[k] * block[1 + k][r];
      }
    }
    return LeastSquares.fit(
            ArrayDesign.of(
                names,
                regressors.toArray(double[][]::new),
                omega,
                Groups.ofSingleRows(omega.length)))
        .coefficients()[1];
  }
}

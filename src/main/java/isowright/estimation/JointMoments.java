package isowright.estimation;

import isowright.records.Panel;
import isowright.records.PeriodSteps;
import isowright.regression.ArrayDesign;
import isowright.regression.Covariance;
import isowright.regression.Groups;
import isowright.regression.InstrumentedDesign;
import isowright.regression.InstrumentedFit;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.Times;
import isowright.regression.TwoStageLeastSquares;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The cross-check of a control function: the second of the two equations of Wooldridge, J. M.
 * (2009), <i>Economics Letters</i> 104, 112–114 (eq. 2.8 with instruments 2.10), by two-stage least
 * squares, which needs no search.
 *
 * <p>ln Q_t = Xβ + controls and time + h(states, proxy of the period before) + error, h a
 * polynomial; columns in which a free input stands have those of the period before as instruments
 * (a proxy that is itself an input: of two periods before, since h holds the other). It takes the
 * proxy to move with states and productivity alone. Errors are clustered by plant. Tested in {@code
 * ControlFunctionTest} against R.
 */
final class JointMoments {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final Estimator.Proxy how;

  JointMoments(
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
  }

  private boolean proxyIsInput() {
    return panel.inputs().contains(how.column().name());
  }

  Fit fit() {
    int rows = panel.rows();
    LinearDesign own =
        new LinearDesign(
            PanelRows.of(panel, base),
            form,
            panel.inputs(),
            Circumstances.of(panel, specification.time()),
            true);
    int columns = own.columns().size();
    double[][] block = new double[columns + 1][rows];
    own.fill(0, rows, block);
    PeriodSteps steps = PeriodSteps.of(panel);
    int[] used =
        IntStream.range(0, rows)
            .filter(r -> steps.before(r, 1) >= 0)
            .filter(r -> !proxyIsInput() || steps.before(r, 2) >= 0)
            .toArray();
    List<String> names = new ArrayList<>(own.columns());
    List<double[]> regressors = new ArrayList<>();
    for (int k = 0; k < columns; k++) {
      regressors.add(at(block[k], used));
    }
    double[][] process = process(used, steps);
    for (int s = 1; s < process.length; s++) {
      names.add("process " + s);
      regressors.add(process[s]);
    }
    FormInstruments instruments = new FormInstruments(form, panel.inputs(), lagged(used, steps));
    int outside = instruments.names().size();
    if (used.length <= names.size() + outside) {
      return Estimation.without(
          panel,
          specification,
          base,
          Fit.State.REFUSED,
          List.of(
              used.length
                  + " rows with the periods before cannot carry "
                  + (names.size() + outside)
                  + " columns."));
    }
    boolean[] endogenous = new boolean[names.size()];
    System.arraycopy(instruments.endogenous(), 0, endogenous, 1, instruments.endogenous().length);
    double[][] z = PanelRows.of(panel, base).logInputs(0, rows);
    double[][] current = Arrays.stream(z).map(c -> at(c, used)).toArray(double[][]::new);
    double[][] beside = new double[outside][used.length];
    instruments.fill(0, used.length, current, beside, 0);
    names.addAll(instruments.names());
    regressors.addAll(List.of(beside));
    ArrayDesign design =
        ArrayDesign.of(
            names, regressors.toArray(double[][]::new), at(block[columns], used), groups(used));
    return fit(own, block, new InstrumentedDesign(design, endogenous), times(used));
  }

  private Fit fit(LinearDesign own, double[][] block, InstrumentedDesign design, Times times) {
    InstrumentedFit fit = TwoStageLeastSquares.fit(design);
    int columns = own.columns().size();
    int ofForm = form.coefficientNames(panel.inputs()).size();
    boolean[] estimated = fit.fit().estimated();
    for (int k = 1; k <= ofForm; k++) {
      if (!estimated[k]) {
        return Estimation.without(
            panel,
            specification,
            base,
            Fit.State.RANK_DEFICIENT,
            List.of(
                "What stands in for the free inputs does not move "
                    + own.columns().get(k)
                    + " apart from the states and the proxy of the period before."));
      }
    }
    Covariance whole =
        Covariance.estimate(fit.secondStage(), fit.fit(), Covariance.Kind.CLUSTERED, times);
    double[] coefficients = Arrays.copyOf(fit.fit().coefficients(), columns);
    double[][] matrix = new double[columns][columns];
    for (int i = 1; i < columns; i++) {
      System.arraycopy(whole.matrix()[i], 1, matrix[i], 1, columns - 1);
    }
    double sum = 0;
    double squares = 0;
    double[] left = block[columns].clone();
    for (int r = 0; r < left.length; r++) {
      for (int k = 1; k < columns; k++) {
        left[r] -= coefficients[k] * block[k][r];
      }
      sum += left[r];
      squares += left[r] * left[r];
    }
    coefficients[0] = sum / left.length;
    LinearFit least = LeastSquares.fit(own);
    LinearFit replaced =
        Replaced.coefficients(
            least, coefficients, squares - left.length * coefficients[0] * coefficients[0]);
    return new LinearEstimation(panel, specification, base, form)
        .solved(
            new PlantTreatment(own, Treatment.none(own), List.of()),
            replaced,
            new Particulars.None(),
            new Covariance(
                whole.kind(),
                matrix,
                whole.factor(),
                whole.degreesOfFreedom(),
                whole.clusters(),
                whole.words()));
  }

  /** h's columns; the first is the constant. */
  private double[][] process(int[] used, PeriodSteps steps) {
    int[] before = Arrays.stream(used).map(r -> steps.before(r, 1)).toArray();
    double[][] z = PanelRows.of(panel, base).logInputs(0, panel.rows());
    List<double[]> variables = new ArrayList<>();
    for (String state : how.states()) {
      variables.add(at(z[panel.inputs().indexOf(state)], before));
    }
    SeriesColumn proxy = SeriesColumn.of(panel, how.column(), new ArrayList<>()).orElseThrow();
    variables.add(at(proxy.values(), before));
    return Smoothing.orthonormal(Smoothing.powers(variables, how.degree()), used.length);
  }

  private Map<Integer, List<SeriesColumn>> lagged(int[] used, PeriodSteps steps) {
    Map<Integer, List<SeriesColumn>> byInput = new LinkedHashMap<>();
    for (String input : panel.inputs()) {
      if (!how.states().contains(input)) {
        int lag = input.equals(how.column().name()) ? 2 : 1;
        Series series = new Series(input, lag, Optional.empty());
        double[] logs =
            PanelRows.of(panel, base).logInputs(0, panel.rows())[panel.inputs().indexOf(input)];
        int[] before = Arrays.stream(used).map(r -> steps.before(r, lag)).toArray();
        byInput.put(
            panel.inputs().indexOf(input),
            List.of(new SeriesColumn(series.word(), series.entering(true), at(logs, before))));
      }
    }
    return byInput;
  }

  private Groups groups(int[] used) {
    List<Integer> starts = new ArrayList<>();
    int last = -1;
    for (int r = 0; r < used.length; r++) {
      int plant = panel.plantOf(used[r]);
      if (plant != last) {
        starts.add(r);
        last = plant;
      }
    }
    return Groups.startingAt(used.length, starts.stream().mapToInt(Integer::intValue).toArray());
  }

  private Times times(int[] used) {
    return Times.of(
        panel.periods().size(), Arrays.stream(used).map(r -> panel.rowPeriods().get(r)).toArray());
  }

  private static double[] at(double[] column, int[] rows) {
    return Arrays.stream(rows).mapToDouble(r -> column[r]).toArray();
  }
}

package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.ClusterBootstrap;
import isowright.regression.Covariance;
import isowright.regression.InnovationMoments;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/**
 * Fits a form that is linear in its parameters by a control function: Ackerberg, D. A., Caves, K.
 * and Frazer, G. (2015), <i>Econometrica</i> 83, 2411–2451, section 4.3.
 *
 * <p>ln Q = Xβ + ω + ε. First, ln Q on a polynomial in the logs of all inputs and of the proxy,
 * with controls and time beside it, leaves Φ = Xβ + ω, free of ε. Second, ω(β) = Φ − Xβ follows ω_t
 * = g(ω_{t−1}) + time + ξ_t, and ξ_t(β) is unrelated to the form's columns in which every free
 * input is replaced by that of the period before, and to controls: as many moments as coefficients.
 * Change over time belongs to productivity; the constant and the coefficients of time reported are
 * those of ln Q − Xβ. The search begins from the joint moments in their one-step form and from
 * least squares; of several solutions the one nearest to the joint moments is taken.
 *
 * <p>Standard errors are the spread over draws of whole plants, both steps repeated in each. Tested
 * in {@code ControlFunctionTest} against R.
 */
final class ControlFunctionEstimation {

  /** Solutions closer than this, in every coefficient, are the same. */
  private static final double SAME = 1e-5;

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final Estimator.Proxy how;
  private final ControlFunctionRows rows;

  ControlFunctionEstimation(
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
    this.rows = new ControlFunctionRows(panel, specification, base, form, how);
  }

  Fit fit() {
    List<String> lacking = new ArrayList<>();
    Optional<SeriesColumn> proxy = SeriesColumn.of(panel, how.column(), lacking);
    proxy.ifPresent(p -> unfitProxy(p, lacking));
    if (!lacking.isEmpty()) {
      return refused(lacking);
    }
    double[][] basis = rows.basis(proxy.orElseThrow());
    tooFew(basis.length, lacking);
    if (!lacking.isEmpty()) {
      return refused(lacking);
    }
    Fit jointly = new JointMoments(panel, specification, base, form, how).fit();
    InnovationMoments moments = rows.moments(basis);
    double[] ones = new double[panel.plants().size()];
    Arrays.fill(ones, 1);
    LinearFit least = LeastSquares.fit(rows.own());
    if (!least.fullRank()) {
      return LinearEstimation.lacking(panel, specification, base, least, RowsUsed.Kind.EACH)
          .orElseThrow();
    }
    List<InnovationMoments.Solution> found = solutions(moments, ones, least, jointly);
    if (found.isEmpty()) {
      return Estimation.without(
          panel, specification, base, Fit.State.NOT_CONVERGED, List.of(noSolution()));
    }
    return solved(proxy.orElseThrow(), basis, moments, found, least, jointly, ones);
  }

  private Fit refused(List<String> reasons) {
    return Estimation.without(panel, specification, base, Fit.State.REFUSED, reasons);
  }

  private static String noSolution() {
    return "No coefficients were found at which the innovations of productivity are unrelated to"
        + " the instruments: neither from the joint moments nor from least squares did the"
        + " search come to rest. The records may not identify them; ask for cobb-douglas, a"
        + " lower `degree` or `process`, or another proxy.";
  }

  private void unfitProxy(SeriesColumn proxy, List<String> lacking) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    int unknown = 0;
    for (double value : proxy.values()) {
      if (Double.isFinite(value)) {
        least = Math.min(least, value);
        most = Math.max(most, value);
      } else {
        unknown++;
      }
    }
    if (unknown > 0) {
      lacking.add(
          "The proxy "
              + how.column().name()
              + " is blank in "
              + unknown
              + " of "
              + panel.rows()
              + " rows. Fill them, set those plants or periods aside with `keep`, or name"
              + " another.");
    } else if (!(most > least)) {
      lacking.add(
          "The proxy "
              + how.column().name()
              + " is the same in every row, so no productivity can be read off it. Name a column"
              + " that moves.");
    }
  }

  private void tooFew(int basis, List<String> lacking) {
    if (panel.periods().size() < 2) {
      lacking.add(
          "A control function follows productivity from one period to the next; the records have"
              + " one period ("
              + panel.periods().get(0)
              + "). Add periods, or take `proxy` out.");
      return;
    }
    int needed = rows.slopes() + 1 + how.process() + rows.time();
    if (rows.pairs() <= needed || panel.rows() <= basis) {
      lacking.add(
          String.format(
              Locale.ROOT,
              "%d rows, %d of them with the row of the period before, cannot carry %d columns of"
                  + " the first step and %d coefficients of the second. Lower `degree`, ask for a"
                  + " form with fewer parameters, or add records.",
              panel.rows(),
              rows.pairs(),
              basis,
              needed));
    }
  }

  private List<InnovationMoments.Solution> solutions(
      InnovationMoments moments, double[] ones, LinearFit least, Fit jointly) {
    double[] smoothed = moments.smoothed(ones);
    double[] fromLeast = Arrays.copyOfRange(least.coefficients(), 1, 1 + rows.slopes());
    List<double[]> starts = new ArrayList<>();
    if (jointly.state().usable()) {
      starts.add(
          Arrays.copyOfRange(jointly.numbers().linear().coefficients(), 1, 1 + rows.slopes()));
    }
    starts.add(fromLeast);
    for (double share : new double[] {0.75, 0.5, 1.25}) {
      starts.add(Arrays.stream(fromLeast).map(b -> share * b).toArray());
    }
    moments.scaleAt(smoothed, starts.get(0));
    List<InnovationMoments.Solution> found = new ArrayList<>();
    for (double[] start : starts) {
      InnovationMoments.Solution one = moments.solve(ones, start);
      if (one.solved() && found.stream().noneMatch(other -> same(one, other))) {
        found.add(one);
      }
    }
    found.sort(
        (a, b) -> Double.compare(apart(a.theta(), starts.get(0)), apart(b.theta(), starts.get(0))));
    if (!found.isEmpty()) {
      moments.scaleAt(smoothed, found.get(0).theta());
    }
    return found;
  }

  private static boolean same(InnovationMoments.Solution a, InnovationMoments.Solution b) {
    return apart(a.theta(), b.theta()) < SAME;
  }

  private static double apart(double[] a, double[] b) {
    double most = 0;
    for (int k = 0; k < a.length; k++) {
      most = Math.max(most, Math.abs(a[k] - b[k]));
    }
    return most;
  }

  private Fit solved(
      SeriesColumn proxy,
      double[][] basis,
      InnovationMoments moments,
      List<InnovationMoments.Solution> found,
      LinearFit least,
      Fit jointly,
      double[] ones) {
    double[] theta = found.get(0).theta();
    List<double[]> drawn = drawn(moments, theta);
    int failed = how.drawing().draws() - drawn.size();
    if (drawn.size() < 2 || failed > how.drawing().draws() / 2) {
      return Estimation.without(
          panel,
          specification,
          base,
          Fit.State.NOT_CONVERGED,
          List.of(
              failed
                  + " of "
                  + how.drawing().draws()
                  + " draws of plants have no solution, so no standard error can be had: the"
                  + " records hardly identify the coefficients. Ask for cobb-douglas, a lower"
                  + " `degree` or `process`, or another proxy."));
    }
    double[] coefficients = rows.coefficients(theta, ones);
    double ssr = 0;
    double smoothing = 0;
    double[] smoothed = found.get(0).smoothed();
    double[][] block = rows.block();
    int columns = block.length - 1;
    double[] y = block[columns];
    for (int r = 0; r < y.length; r++) {
      double left = y[r];
      for (int k = 0; k < columns; k++) {
        left -= coefficients[k] * block[k][r];
      }
      ssr += left * left;
      smoothing += (y[r] - smoothed[r]) * (y[r] - smoothed[r]);
    }
    LinearFit fit = Replaced.coefficients(least, coefficients, ssr);
    Particulars.OfProxy particulars =
        new Particulars.OfProxy(
            proxy.entering(),
            panel.inputs().stream().filter(input -> !how.states().contains(input)).toList(),
            basis.length,
            1 - smoothing / least.totalSumOfSquares(),
            rows.pairs(),
            panel.rows() - rows.pairs(),
            rows.singletons(),
            found.get(0).slope(),
            found.size() - 1,
            failed,
            rows.proxySlope(proxy, smoothed, theta),
            drawn,
            jointly);
    return new LinearEstimation(panel, specification, base, form)
        .solved(
            new PlantTreatment(rows.own(), Treatment.none(rows.own()), List.of()),
            fit,
            particulars,
            covariance(drawn, failed));
  }

  /** The coefficients in every draw of plants that has a solution, in the order of the draws. */
  private List<double[]> drawn(InnovationMoments moments, double[] theta) {
    int plants = panel.plants().size();
    return IntStream.range(0, how.drawing().draws())
        .parallel()
        .mapToObj(
            draw -> {
              int[] counts = ClusterBootstrap.counts(plants, draw, how.drawing().seed());
              double[] weights = Arrays.stream(counts).asDoubleStream().toArray();
              InnovationMoments.Solution one = moments.solve(weights, theta);
              return one.solved() ? rows.coefficients(one.theta(), weights) : new double[0];
            })
        .toList()
        .stream()
        .filter(one -> one.length > 0 && Arrays.stream(one).allMatch(Double::isFinite))
        .toList();
  }

  private Covariance covariance(List<double[]> drawn, int failed) {
    int columns = rows.own().columns().size();
    double[] mean = new double[columns];
    drawn.forEach(
        one -> {
          for (int k = 0; k < columns; k++) {
            mean[k] += one[k] / drawn.size();
          }
        });
    double[][] matrix = new double[columns][columns];
    for (double[] one : drawn) {
      for (int i = 0; i < columns; i++) {
        for (int j = 0; j < columns; j++) {
          matrix[i][j] += (one[i] - mean[i]) * (one[j] - mean[j]) / (drawn.size() - 1);
        }
      }
    }
    int plants = panel.plants().size();
    String words =
        String.format(
            Locale.ROOT,
            "The spread over %d draws of whole plants (seed %d), both steps repeated in each; %d"
                + " without a solution; Student's law with %d degrees of freedom, plants less one.",
            how.drawing().draws(),
            how.drawing().seed(),
            failed,
            plants - 1);
    return new Covariance(
        Covariance.Kind.CLUSTERED, matrix, 1, plants - 1, OptionalInt.of(plants), words);
  }
}

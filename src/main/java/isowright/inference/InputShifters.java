package isowright.inference;

import isowright.records.Column;
import isowright.records.Panel;
import isowright.regression.ArrayDesign;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.Groups;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * Before anything is fitted: in which direction is least squares expected to err, and does anything
 * in the records shift an input for reasons of its own?
 *
 * <p>Inputs are chosen knowing productivity ω, which least squares does not see (Marschak, J. and
 * Andrews, W. H. 1944, <i>Econometrica</i> 12, 143–205). If ω moves input f alone, the coefficients
 * of a Cobb-Douglas regression are off by b_f = Cov(x_f, ω | others) / Var(x_f | others) &gt; 0 for
 * f and by −γ_j b_f for every other input j, γ_j being the coefficient of ln x_j in the regression
 * of ln x_f on the other inputs: the arithmetic of an omitted variable. So the records themselves
 * tell the other directions.
 *
 * <p>An input is shifted by its price where the price moves on its own, once what is lasting in the
 * plant and common to the period is taken out, and the quantity answers with the opposite sign. A
 * price that is spending divided by the quantity itself proves nothing: an error in the quantity
 * moves the two against each other.
 *
 * <p>Tested in {@code InputShiftersTest}, against R.
 */
public final class InputShifters {

  /** Of more rows every k-th plant, whole, tells as much. */
  private static final int MOST_ROWS = 50_000;

  /** A part of the variance of a log that is left only by rounding. */
  private static final double ROUNDING = 1e-9;

  /** A price that moves by less than a hundredth of a per cent moves by how it is written. */
  private static final double LEAST_SPREAD = 1e-4;

  /** What is known of what shifts an input. */
  public enum State {
    /** Its price is not in the records. */
    NO_PRICE,
    /** Its price does not move apart from what is lasting or common to the period. */
    STILL,
    /** Its price is spending divided by the quantity. */
    DERIVED,
    /** Its price moves, and the quantity answers with the opposite sign. */
    ANSWERS,
    /** Its price moves, and the quantity is not seen to answer. */
    SILENT
  }

  /**
   * What the records say of one input.
   *
   * @param input its name
   * @param withinShare the share of the variance of its log that lies within plants; absent without
   *     repeated plants
   * @param state what is known of what shifts it
   * @param priceSpread the standard deviation of the log of its price, plants and periods taken out
   * @param priceShare the share of the variance of that log which is left then
   * @param correlation of quantity and price in logs, plants and periods taken out
   * @param response by how many per cent the quantity moves with one per cent of the price
   * @param p of the null that it does not
   */
  public record Shifter(
      String input,
      Optional<Double> withinShare,
      State state,
      Optional<Double> priceSpread,
      Optional<Double> priceShare,
      Optional<Double> correlation,
      Optional<Estimate> response,
      Optional<Double> p) {}

  /**
   * What is expected.
   *
   * @param free the index of the input that moves most within plants (or in all, without repeated
   *     plants), which is taken to be the one that is chosen knowing productivity
   * @param perFree for each input, the error of its coefficient for an error of one in that of the
   *     free input: 1 for itself, −γ_j for the others
   * @param shifters input by input
   * @param thinned whether every k-th plant was looked at
   */
  public record Expected(int free, double[] perFree, List<Shifter> shifters, boolean thinned) {
    /** Copies. */
    public Expected {
      perFree = perFree.clone();
      shifters = List.copyOf(shifters);
    }

    @Override
    public double[] perFree() {
      return perFree.clone();
    }
  }

  private final Panel panel;
  private final double confidence;
  private final int every;

  private InputShifters(Panel panel, double confidence) {
    this.panel = panel;
    this.confidence = confidence;
    this.every = Math.max(1, panel.rows() / MOST_ROWS);
  }

  /**
   * What is expected of least squares on a panel.
   *
   * @param within whether plants have constants of their own in the fits that it is expected of
   * @param confidence the level of intervals
   */
  public static Expected of(Panel panel, boolean within, double confidence) {
    InputShifters of = new InputShifters(panel, confidence);
    List<Shifter> shifters = new ArrayList<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      shifters.add(of.shifter(i));
    }
    int free = of.freest();
    return new Expected(free, of.perFree(free, within), shifters, of.every > 1);
  }

  private double[] logs(int[] rows, Column column) {
    return Arrays.stream(rows).mapToDouble(column::get).toArray();
  }

  private int[] rows(IntPredicate usable) {
    int[] rows = new int[panel.rows()];
    int count = 0;
    for (int p = 0; p < panel.plants().size(); p += every) {
      for (int row = panel.plantStart(p); row < panel.plantEnd(p); row++) {
        if (usable.test(row) && !panel.anyZero(row)) {
          rows[count++] = row;
        }
      }
    }
    return Arrays.copyOf(rows, count);
  }

  /** Rows with what is lasting and what is common to a period beside other regressors. */
  private Design design(
      int[] rows,
      List<String> names,
      List<double[]> regressors,
      double[] response,
      boolean within) {
    List<String> columns = new ArrayList<>(names);
    List<double[]> values = new ArrayList<>(regressors);
    boolean effects = within && panel.repeats();
    if (!effects) {
      columns.add("constant");
      double[] ones = new double[rows.length];
      Arrays.fill(ones, 1);
      values.add(ones);
    }
    int[] seen =
        Arrays.stream(rows).map(row -> panel.rowPeriods().get(row)).distinct().sorted().toArray();
    for (int k = 1; k < seen.length; k++) {
      int here = seen[k];
      columns.add("period:" + panel.periods().get(here));
      values.add(
          Arrays.stream(rows)
              .mapToDouble(row -> panel.rowPeriods().get(row) == here ? 1 : 0)
              .toArray());
    }
    Design raw = ArrayDesign.of(columns, values.toArray(double[][]::new), response, groups(rows));
    return effects ? Effects.within(raw) : raw;
  }

  private Groups groups(int[] rows) {
    if (!panel.repeats()) {
      return Groups.ofSingleRows(rows.length);
    }
    int[] starts = new int[rows.length];
    int count = 0;
    for (int r = 0; r < rows.length; r++) {
      if (r == 0 || panel.plantOf(rows[r]) != panel.plantOf(rows[r - 1])) {
        starts[count++] = r;
      }
    }
    return Groups.startingAt(rows.length, Arrays.copyOf(starts, count));
  }

  private Shifter shifter(int input) {
    int[] all = rows(row -> true);
    Optional<Double> share =
        panel.repeats() ? Optional.of(withinShare(all, input)) : Optional.empty();
    Optional<Column> price = panel.prices().get(input);
    int[] rows = price.map(c -> rows(row -> c.get(row) > 0)).orElse(new int[0]);
    String name = panel.inputs().get(input);
    if (price.isEmpty() || rows.length == 0) {
      return bare(name, share, State.NO_PRICE);
    }
    double[] w = logs(rows, price.get().logs());
    double[] x = logs(rows, panel.logQuantities().get(input));
    LinearFit ofPrice = LeastSquares.fit(design(rows, List.of(), List.of(), w, true));
    double left = ofPrice.ssr() / about(w);
    boolean moves = left > ROUNDING && ofPrice.residualDegreesOfFreedom() > 1;
    if (!moves || Math.sqrt(ofPrice.residualVariance()) < LEAST_SPREAD) {
      return bare(name, share, State.STILL);
    }
    Design with = design(rows, List.of("price"), List.of(w), x, true);
    LinearFit fit = LeastSquares.fit(with);
    double rest = LeastSquares.fit(design(rows, List.of(), List.of(), x, true)).ssr();
    if (!fit.columns().contains("price") || !fit.fullRank()) {
      return bare(name, share, State.STILL);
    }
    int at = fit.columns().indexOf("price");
    double slope = fit.coefficients()[at];
    boolean clustered = panel.repeats() && with.groups().count() > 1;
    Covariance covariance =
        Covariance.estimate(with, fit, clustered ? Covariance.Kind.CLUSTERED : Covariance.Kind.HC1);
    double error = Math.sqrt(covariance.matrix()[at][at]);
    Law.Student law = new Law.Student(covariance.degreesOfFreedom());
    double p = law.p(slope / error);
    double half =
        TDistribution.of(covariance.degreesOfFreedom())
                .inverseCumulativeProbability((1 + confidence) / 2)
            * error;
    return new Shifter(
        name,
        share,
        state(input, slope, p),
        Optional.of(Math.sqrt(ofPrice.residualVariance())),
        Optional.of(left),
        Optional.of(Math.signum(slope) * Math.sqrt(Math.max(0, 1 - fit.ssr() / rest))),
        Optional.of(
            new Estimate(
                slope, error, slope - half, slope + half, confidence, Estimate.Method.DELTA)),
        Optional.of(p));
  }

  private State state(int input, double slope, double p) {
    if (panel.roles().inputs().get(input).price().isEmpty()
        && panel.roles().inputs().get(input).spending().isPresent()) {
      return State.DERIVED;
    }
    return slope < 0 && p < 1 - confidence ? State.ANSWERS : State.SILENT;
  }

  private static Shifter bare(String name, Optional<Double> share, State state) {
    return new Shifter(
        name,
        share,
        state,
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty());
  }

  /** The sum of squares about the mean. */
  private static double about(double[] values) {
    double mean = Arrays.stream(values).sum() / values.length;
    return Arrays.stream(values).map(v -> (v - mean) * (v - mean)).sum();
  }

  private double withinShare(int[] rows, int input) {
    double[] x = logs(rows, panel.logQuantities().get(input));
    Groups groups = groups(rows);
    double within = 0;
    for (int g = 0; g < groups.count(); g++) {
      within += about(Arrays.copyOfRange(x, groups.start(g), groups.end(g)));
    }
    return within / about(x);
  }

  /** The input whose log moves most: within plants where they are seen repeatedly. */
  private int freest() {
    int[] rows = rows(row -> true);
    int free = 0;
    double most = -1;
    for (int i = 0; i < panel.inputs().size(); i++) {
      double[] x = logs(rows, panel.logQuantities().get(i));
      double spread = panel.repeats() ? withinShare(rows, i) : about(x);
      if (spread > most) {
        most = spread;
        free = i;
      }
    }
    return free;
  }

  private double[] perFree(int free, boolean within) {
    int[] rows = rows(row -> true);
    List<String> names = new ArrayList<>();
    List<double[]> others = new ArrayList<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      if (i != free) {
        names.add(panel.inputs().get(i));
        others.add(logs(rows, panel.logQuantities().get(i)));
      }
    }
    LinearFit fit =
        LeastSquares.fit(
            design(rows, names, others, logs(rows, panel.logQuantities().get(free)), within));
    double[] per = new double[panel.inputs().size()];
    for (int i = 0; i < per.length; i++) {
      int at = fit.columns().indexOf(panel.inputs().get(i));
      per[i] = i == free ? 1 : at < 0 ? Double.NaN : -fit.coefficients()[at];
    }
    return per;
  }
}

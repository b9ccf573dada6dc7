package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * How fast does output grow at the same inputs, and which input does the change use or save?
 *
 * <p>With t the distance from the first period and z_i the logged, divided inputs, the rate is ∂ln
 * Q/∂t = τ + τ₂ t + Σ_i τ_i z_i for a trend (of which a plain one is τ alone), and (γ_t − γ_s)/(t −
 * s) between two periods that have effects of their own. It is stated as percent a year, 100
 * (exp(rate) − 1), and its interval carried over from that of the rate. Where periods are neither
 * dates nor years it is percent a period.
 *
 * <p>A biased trend changes the output elasticities e_i by τ_i a year at a given mix. At least cost
 * an input's share in cost is s_i = e_i/Σ_j e_j, so technical change at given inputs moves it by
 *
 * <pre>  ∂s_i/∂t = (τ_i − s_i Σ_j τ_j) / Σ_j e_j, </pre>
 *
 * the bias in Hicks's sense: above zero the change uses the input, below zero it saves it. Sources:
 * Hicks, J. R. (1932), <i>The Theory of Wages</i>; Binswanger, H. P. (1974), <i>American Economic
 * Review</i> 64, 964–976 (bias as the change of a share); Christensen, Jorgenson and Lau (1973).
 * Tested in {@code TechnicalChangeTest}.
 *
 * @param unit {@code year} or {@code period}
 * @param rates the rates, at one place or more
 * @param biases by input, at the records' mean; empty without a biased trend
 */
public record TechnicalChange(String unit, List<Rate> rates, List<Bias> biases) {

  /** Numbers of periods from here to there are read as years. */
  private static final double FIRST_YEAR = 1500;

  private static final double LAST_YEAR = 2500;

  /** Copies the lists. */
  public TechnicalChange {
    rates = List.copyOf(rates);
    biases = List.copyOf(biases);
  }

  /** Where a rate holds. */
  public enum Place {
    /** At the means of logged inputs and of the period over all rows. */
    MEAN,
    /** At the last period, with the means of logged inputs of that period. */
    LAST,
    /** On average from the first period to the last. */
    AVERAGE,
    /** From the period before the last to the last. */
    LATEST;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /**
   * A rate of technical change.
   *
   * @param place where it holds
   * @param percent percent a year (or period)
   */
  public record Rate(Place place, Estimate percent) {}

  /**
   * What technical change does to one input's share in cost at given inputs.
   *
   * @param input the input
   * @param points percentage points a year (or period)
   */
  public record Bias(String input, Estimate points) {}

  /** The technical change of a usable fit; absent where nothing about time was estimated. */
  public static Optional<TechnicalChange> of(Fit fit) {
    Time time = fit.specification().time();
    if (time == Time.NONE) {
      return Optional.empty();
    }
    Reckoning reckoning = new Reckoning(fit);
    List<Rate> rates = time.byPeriod() ? reckoning.betweenPeriods() : reckoning.alongTrend();
    List<Bias> biases = time == Time.BIASED_TREND ? reckoning.biases() : List.of();
    return Optional.of(new TechnicalChange(unit(fit.panel()), rates, biases));
  }

  private static String unit(Panel panel) {
    boolean dates = panel.periodNumbers().stream().anyMatch(n -> n != Math.rint(n));
    boolean years = panel.periodNumbers().stream().allMatch(n -> n >= FIRST_YEAR && n <= LAST_YEAR);
    return dates || years ? "year" : "period";
  }

  /** The sums behind the figures of one fit. */
  private static final class Reckoning {
    private final Fit fit;
    private final Panel panel;
    private final Solution numbers;
    private final DeltaMethod delta;

    Reckoning(Fit fit) {
      this.fit = fit;
      this.panel = fit.panel();
      this.numbers = fit.numbers();
      this.delta =
          DeltaMethod.of(
              new EstimatedTechnology(
                  numbers.technology(),
                  numbers.covariance(),
                  numbers.covarianceSource().degreesOfFreedom()),
              fit.specification().confidence());
    }

    List<Rate> alongTrend() {
      int last = panel.periods().size() - 1;
      return List.of(
          rate(Place.MEAN, along(means(-1), meanTime())),
          rate(Place.LAST, along(means(last), since(last))));
    }

    List<Rate> betweenPeriods() {
      int last = panel.periods().size() - 1;
      return List.of(
          rate(Place.AVERAGE, between(0, last)), rate(Place.LATEST, between(last - 1, last)));
    }

    /** The weights of the parameters in the rate at a mix and time. */
    private double[] along(double[] z, double t) {
      double[] weights = new double[numbers.parameters().length];
      weights[numbers.index("trend")] = 1;
      add(weights, "trend*trend", t);
      for (int i = 0; i < z.length; i++) {
        add(weights, panel.inputs().get(i) + "*trend", z[i]);
      }
      return weights;
    }

    private double[] between(int from, int to) {
      double[] weights = new double[numbers.parameters().length];
      double distance = since(to) - since(from);
      add(weights, "period:" + panel.periods().get(to), 1 / distance);
      add(weights, "period:" + panel.periods().get(from), -1 / distance);
      return weights;
    }

    private void add(double[] weights, String name, double weight) {
      int at = numbers.index(name);
      if (at >= 0) {
        weights[at] += weight;
      }
    }

    private Rate rate(Place place, double[] weights) {
      double value = 0;
      for (int k = 0; k < weights.length; k++) {
        value += weights[k] * numbers.parameters()[k];
      }
      Estimate rate = delta.estimate(value, error(weights), DeltaMethod.Scale.LINEAR);
      return new Rate(
          place,
          new Estimate(
              percent(rate.value()),
              100 * Math.exp(rate.value()) * rate.standardError(),
              percent(rate.low()),
              percent(rate.high()),
              rate.level(),
              rate.method()));
    }

    private static double percent(double rate) {
      return 100 * Math.expm1(rate);
    }

    private double error(double[] weights) {
      double[][] covariance = numbers.covariance();
      double variance = 0;
      for (int k = 0; k < weights.length; k++) {
        for (int l = 0; l < weights.length; l++) {
          if (weights[k] != 0 && weights[l] != 0) {
            variance += weights[k] * covariance[k][l] * weights[l];
          }
        }
      }
      return Math.sqrt(Math.max(0, variance));
    }

    /** ∂s_i/∂t at the records' mean, in percentage points. */
    List<Bias> biases() {
      int n = panel.inputs().size();
      double[] at = Arrays.stream(panel.geometricMeans()).map(Math::log).toArray();
      double[] tau = new double[n];
      for (int i = 0; i < n; i++) {
        tau[i] = numbers.parameters()[numbers.index(panel.inputs().get(i) + "*trend")];
      }
      double t = meanTime();
      double[] e = elasticities(numbers.technology(), at);
      for (int i = 0; i < n; i++) {
        e[i] += t * tau[i];
      }
      // Output elasticities are linear in the parameters of these forms, so a unit step is exact.
      double[][] slopes = slopes(at);
      double sum = Arrays.stream(e).sum();
      double drift = Arrays.stream(tau).sum();
      List<Bias> biases = new ArrayList<>();
      for (int i = 0; i < n; i++) {
        double share = e[i] / sum;
        double bias = (tau[i] - share * drift) / sum;
        double[] weights = new double[numbers.parameters().length];
        for (int j = 0; j < n; j++) {
          double own = i == j ? 1 : 0;
          // ∂(τ_i/e − e_i τ/e²)/∂e_j and /∂τ_j
          double byElasticity = (-tau[i] - own * drift + 2 * share * drift) / (sum * sum);
          double byTrend = (own - share) / sum;
          for (int k = 0; k < slopes.length; k++) {
            weights[k] += byElasticity * slopes[k][j];
          }
          weights[numbers.index(panel.inputs().get(j) + "*trend")] += byTrend + byElasticity * t;
        }
        biases.add(
            new Bias(
                panel.inputs().get(i),
                delta.estimate(100 * bias, 100 * error(weights), DeltaMethod.Scale.LINEAR)));
      }
      return biases;
    }

    /** ∂e_j/∂θ_k over the technology's own parameters. */
    private double[][] slopes(double[] at) {
      Technology technology = numbers.technology();
      double[] parameters = technology.parameters();
      double[] here = elasticities(technology, at);
      double[][] slopes = new double[parameters.length][];
      for (int k = 0; k < parameters.length; k++) {
        double[] moved = parameters.clone();
        moved[k] += 1;
        double[] there = elasticities(technology.withParameters(moved), at);
        Arrays.setAll(there, j -> there[j] - here[j]);
        slopes[k] = there;
      }
      return slopes;
    }

    private static double[] elasticities(Technology technology, double[] at) {
      double[] e = new double[at.length];
      technology.logGradient(at, e);
      return e;
    }

    /** The means of the logged, divided inputs, over one period or (−1) all rows. */
    private double[] means(int period) {
      double[] sums = new double[panel.inputs().size()];
      int count = 0;
      for (int r = 0; r < panel.rows(); r++) {
        if (period < 0 || panel.rowPeriods().get(r) == period) {
          for (int i = 0; i < sums.length; i++) {
            sums[i] += panel.logQuantities().get(i).get(r);
          }
          count++;
        }
      }
      for (int i = 0; i < sums.length; i++) {
        sums[i] = sums[i] / count - Math.log(fit.base()[i]);
      }
      return sums;
    }

    private double meanTime() {
      double sum = 0;
      for (int r = 0; r < panel.rows(); r++) {
        sum += since(panel.rowPeriods().get(r));
      }
      return sum / panel.rows();
    }

    private double since(int period) {
      return panel.periodNumbers().get(period) - panel.periodNumbers().get(0);
    }
  }
}

package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Replicas;
import isowright.estimation.Replicas.Technologies;
import isowright.inference.LeftOut.Most;
import isowright.inference.Resampled.Interval;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.Supplier;
import java.util.stream.IntStream;

/**
 * Numbers computed from a technology and from its refits: how they scatter over plants drawn anew,
 * and how they move without a plant or a period.
 *
 * <p>Where plants were drawn, the standard error is the standard deviation over draws and the
 * interval the percentile interval; bias-corrected ones stand beside it ({@link Resampled}). Else
 * both are those of the {@link DeltaMethod}. A figure that no parameter moves stays as it is.
 *
 * <p>Leaving out is exact for every plant where there are at most {@link #EXACT} of them; of more,
 * those {@link #SCREENED} are refitted of which the gradient of the figure says that they move it
 * most (a move by one of so many plants is small, so the gradient is right to a small part of it).
 * Tested in {@code ReplicatedIntervalsTest}.
 */
public final class ReplicatedIntervals implements Intervals {

  /** Up to so many plants or periods every one is left out for every figure. */
  public static final int EXACT = 200;

  /** Of more, so many are. */
  public static final int SCREENED = 20;

  /** A standard error below this part of the value is rounding of a figure that nothing moves. */
  private static final double ROUNDING = 1e-9;

  private final Replicas replicas;
  private final Without withoutPlants;
  private final Without withoutPeriods;
  private final DeltaMethod delta;
  private final double level;

  ReplicatedIntervals(EstimatedTechnology estimated, DeltaMethod delta, double level) {
    this.replicas = estimated.replicas();
    this.withoutPlants = Without.of(replicas.withoutPlants(), estimated.technology());
    this.withoutPeriods = Without.of(replicas.withoutPeriods(), estimated.technology());
    this.delta = delta;
    this.level = level;
  }

  /** For an estimated technology; absent where it was fitted once. */
  public static Optional<ReplicatedIntervals> of(EstimatedTechnology estimated, double level) {
    return any(estimated.replicas())
        ? Optional.of(new ReplicatedIntervals(estimated, DeltaMethod.of(estimated, level), level))
        : Optional.empty();
  }

  private static boolean any(Replicas replicas) {
    return replicas.drawn().count() > 0
        || replicas.withoutPlants().count() > 0
        || replicas.withoutPeriods().count() > 0;
  }

  @Override
  public Estimate estimate(double value, double standardError, DeltaMethod.Scale scale) {
    return delta.estimate(value, standardError, scale);
  }

  @Override
  public List<Estimate> estimates(
      Function<Technology, double[]> functions, DeltaMethod.Scale scale) {
    return refitted(delta.estimates(functions, scale), functions);
  }

  /**
   * The same for functions whose estimates by propagation are known.
   *
   * @param analytic those estimates, one a function
   */
  public List<Estimate> refitted(
      List<Estimate> analytic, Function<Technology, double[]> functions) {
    return refitted(analytic, functions, () -> delta.gradients(functions));
  }

  /**
   * The same where the gradients are known, too.
   *
   * @param gradients in the technology's parameters, [function][parameter]; asked for where there
   *     are more than {@link #EXACT} to leave out
   */
  public List<Estimate> refitted(
      List<Estimate> analytic,
      Function<Technology, double[]> functions,
      Supplier<double[][]> gradients) {
    double[][] drawn = values(replicas.drawn(), functions, analytic.size());
    Moves plants = moves(withoutPlants, functions, analytic, gradients);
    Moves periods = moves(withoutPeriods, functions, analytic, gradients);
    List<Estimate> all = new ArrayList<>();
    for (int f = 0; f < analytic.size(); f++) {
      Estimate own = analytic.get(f);
      if (own.standardError() <= ROUNDING * Math.abs(own.value())) {
        all.add(own);
        continue;
      }
      LeftOut leftOut = new LeftOut(plants.most(f, own.value()), periods.most(f, own.value()));
      all.add(
          drawn.length == 0
              ? own.with(leftOut)
              : resampled(own, drawn, f, plants.acceleration(f)).with(leftOut));
    }
    return all;
  }

  private Estimate resampled(Estimate own, double[][] drawn, int f, double acceleration) {
    double[] had = Arrays.stream(drawn).mapToDouble(v -> v[f]).filter(Double::isFinite).toArray();
    int failed = drawn.length - had.length;
    Interval analytic = new Interval(own.low(), own.high());
    double mean = Arrays.stream(had).sum() / had.length;
    if (failed > Resampled.MOST_FAILED * drawn.length || !Double.isFinite(own.value())) {
      return estimate(
          own,
          new Resampled(
              drawn.length,
              failed,
              mean,
              Double.NaN,
              Interval.NONE,
              Interval.NONE,
              Interval.NONE,
              own.standardError(),
              analytic));
    }
    double squares = 0;
    for (double value : had) {
      squares += (value - mean) * (value - mean);
    }
    BootstrapIntervals intervals = new BootstrapIntervals(had, own.value(), level);
    return estimate(
        own,
        new Resampled(
            drawn.length,
            failed,
            mean,
            Math.sqrt(squares / (had.length - 1)),
            intervals.percentile(),
            intervals.corrected(),
            Double.isNaN(acceleration) ? Interval.NONE : intervals.accelerated(acceleration),
            own.standardError(),
            analytic));
  }

  private Estimate estimate(Estimate own, Resampled resampled) {
    return new Estimate(
        own.value(),
        resampled.standardError(),
        resampled.percentile().low(),
        resampled.percentile().high(),
        level,
        Estimate.Method.RESAMPLING,
        Optional.of(resampled),
        LeftOut.NOTHING);
  }

  /** The functions of every technology, NaN where there is none; [i][f]. */
  private static double[][] values(
      Technologies technologies, Function<Technology, double[]> functions, int count) {
    return IntStream.range(0, technologies.count())
        .parallel()
        .mapToObj(i -> technologies.get(i).map(functions).orElseGet(() -> missing(count)))
        .toArray(double[][]::new);
  }

  private static double[] missing(int count) {
    double[] missing = new double[count];
    Arrays.fill(missing, Double.NaN);
    return missing;
  }

  private Moves moves(
      Without without,
      Function<Technology, double[]> functions,
      List<Estimate> analytic,
      Supplier<double[][]> gradients) {
    int count = without.refits().count();
    boolean[] exact = new boolean[count];
    if (count <= EXACT) {
      Arrays.fill(exact, true);
      return new Moves(
          without.refits(), values(without.refits(), functions, analytic.size()), exact);
    }
    double[][] near = without.linear(gradients.get(), analytic);
    for (int f = 0; f < analytic.size(); f++) {
      furthest(near, f, analytic.get(f).value(), exact);
    }
    IntStream.range(0, count)
        .parallel()
        .filter(i -> exact[i])
        .forEach(
            i ->
                near[i] =
                    without
                        .refits()
                        .get(i)
                        .map(functions)
                        .orElseGet(() -> missing(analytic.size())));
    return new Moves(without.refits(), near, exact);
  }

  /** Marks the {@link #SCREENED} refits that move figure f most; of equals the earlier. */
  private static void furthest(double[][] near, int f, double centre, boolean[] marked) {
    int[] kept = new int[SCREENED];
    double[] sizes = new double[SCREENED];
    int count = 0;
    for (int i = 0; i < near.length; i++) {
      double size = size(near[i][f], centre);
      if (Double.isNaN(size) || (count == SCREENED && size <= sizes[count - 1])) {
        continue;
      }
      int at = count < SCREENED ? count++ : count - 1;
      while (at > 0 && sizes[at - 1] < size) {
        sizes[at] = sizes[at - 1];
        kept[at] = kept[at - 1];
        at--;
      }
      sizes[at] = size;
      kept[at] = i;
    }
    for (int k = 0; k < count; k++) {
      marked[kept[k]] = true;
    }
  }

  private static double size(double value, double centre) {
    return Math.abs(value - centre);
  }

  /**
   * Refits, and how far their parameters lie from the estimate's.
   *
   * @param refits the refits
   * @param departures by refit; empty where there is none, or where all are refitted anyway
   */
  private record Without(Technologies refits, double[][] departures) {

    static Without of(Technologies refits, Technology technology) {
      double[] centre = technology.parameters();
      int screened = refits.count() > EXACT ? refits.count() : 0;
      return new Without(
          refits,
          IntStream.range(0, screened)
              .mapToObj(i -> refits.get(i).map(t -> less(t.parameters(), centre)))
              .map(departure -> departure.orElse(new double[0]))
              .toArray(double[][]::new));
    }

    private static double[] less(double[] parameters, double[] centre) {
      double[] departure = new double[centre.length];
      for (int k = 0; k < departure.length; k++) {
        departure[k] = parameters[k] - centre[k];
      }
      return departure;
    }

    /** The functions without each plant by their gradients. */
    double[][] linear(double[][] gradients, List<Estimate> analytic) {
      int count = analytic.size();
      double[][] values = new double[departures.length][];
      for (int i = 0; i < values.length; i++) {
        double[] departure = departures[i];
        double[] own = missing(count);
        for (int f = 0; f < count && departure.length > 0; f++) {
          own[f] = analytic.get(f).value();
          for (int k = 0; k < departure.length; k++) {
            own[f] += gradients[f][k] * departure[k];
          }
        }
        values[i] = own;
      }
      return values;
    }
  }

  /** The figures without each plant or period, and which of them were refitted. */
  private record Moves(Technologies without, double[][] values, boolean[] exact) {

    Optional<Most> most(int f, double centre) {
      int most = -1;
      int lost = 0;
      for (int i = 0; i < values.length; i++) {
        boolean had = Double.isFinite(values[i][f]);
        lost += had ? 0 : 1;
        boolean further = most < 0 || size(values[i][f], centre) > size(values[most][f], centre);
        if (had && exact[i] && further) {
          most = i;
        }
      }
      return most < 0 || Double.isNaN(centre)
          ? Optional.empty()
          : Optional.of(new Most(without.name(most), values[most][f], lost));
    }

    double acceleration(int f) {
      return values.length < 3
          ? Double.NaN
          : BootstrapIntervals.acceleration(Arrays.stream(values).mapToDouble(v -> v[f]).toArray());
    }
  }
}

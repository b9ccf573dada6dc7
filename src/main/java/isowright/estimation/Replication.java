package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.Replicas.Technologies;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.regression.DrawStream;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.IntFunction;
import java.util.function.IntPredicate;
import java.util.function.ToDoubleFunction;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * A fit estimated again: on plants drawn with replacement, without each plant, without each period.
 *
 * <p>What is re-estimated is the technology; what it is asked about stays: the base of inputs, the
 * point at which elasticities are taken, mean controls.
 *
 * <p>Where the constant is a mean of plants' levels (plant effects, a named plant, the upper
 * quartile), a draw keeps the plants of the records and their weights, as the covariance of a
 * {@link Fit} does: the constant is Σ ω_i (ȳ_i − h̄_i(θ*)), to which the plants' own mean error is
 * added, normal with variance s² Σ ω_i²/T_i. The interval so speaks of these plants and not of a
 * wider population of them. Leaving out a plant or a period is a refit through and through:
 * weights, quartile and levels are those of the rows that stay.
 *
 * <p>Linear forms are refitted from sums of products (see {@link
 * isowright.regression.GroupProducts}), forms that are searched for from the estimate on, other
 * estimators from the beginning. Tested in {@code ReplicationTest}.
 */
public final class Replication {

  /** How plants are drawn: how many draws, and from which seed. */
  public record Drawing(int draws, long seed) {}

  /**
   * Rows looked at in all, above which a quartile of levels is not taken anew without each plant.
   */
  private static final long MOST_ROWS_RANKED = 50_000_000;

  /** The first of the purposes of random numbers that belong to levels. */
  private static final long LEVELS = 16;

  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  private final Fit fit;
  private final Optional<Drawing> drawing;
  private final RefittedParameters drawn;
  private final RefittedParameters withoutPlants;
  private final RefittedParameters withoutPeriods;
  private final Optional<RawSums> sums;

  private Replication(
      Fit fit,
      Optional<Drawing> drawing,
      RefittedParameters drawn,
      RefittedParameters withoutPlants,
      RefittedParameters withoutPeriods,
      Optional<RawSums> sums) {
    this.fit = fit;
    this.drawing = drawing;
    this.drawn = drawn;
    this.withoutPlants = withoutPlants;
    this.withoutPeriods = withoutPeriods;
    this.sums = sums;
  }

  /**
   * Repeats a usable fit, in parallel.
   *
   * @param drawing how plants are drawn; none are where it is absent
   */
  public static Replication of(Fit fit, Optional<Drawing> drawing) {
    Optional<Refitting> way = Refitting.of(fit);
    RefittedParameters none = new RefittedParameters(java.util.List.of());
    RefittedParameters drawn =
        way.isPresent() && drawing.isPresent()
            ? way.get().drawn(drawing.get().draws(), drawing.get().seed())
            : none;
    boolean sums =
        way.isPresent()
            && way.get() instanceof LinearRefitting
            && fit.levelsGiveTheConstant(new Productivity.Typical());
    return new Replication(
        fit,
        way.isPresent() ? drawing : Optional.empty(),
        drawn,
        way.flatMap(Refitting::withoutPlants).orElse(none),
        way.flatMap(Refitting::withoutPeriods).orElse(none),
        sums
            ? Optional.of(RawSums.of(fit, (LinearForm) fit.specification().form()))
            : Optional.empty());
  }

  /** How plants were drawn; absent where they were not. */
  public Optional<Drawing> drawing() {
    return drawing;
  }

  /** How many draws could not tell the parameters apart. */
  public int drawsThatLostRank() {
    return drawn.count(Outcome.LOST_RANK);
  }

  /** In how many draws the search found no optimum inside the economic region. */
  public int drawsWithoutOptimum() {
    return drawn.count(Outcome.NOT_FOUND);
  }

  /** The technology at a period for a productivity, as {@link Fit#at}, with its refits. */
  public EstimatedTechnology at(int period, Productivity productivity) {
    boolean levels = fit.levelsGiveTheConstant(productivity);
    Function<double[], Technology> build = fit.technologies(period, productivity);
    RowLevels rows = new RowLevels(fit);
    Technologies plants =
        technologies(
            ranked(productivity, withoutPlants),
            fit.panel().plants()::get,
            (p, reported) ->
                levels ? withoutPlant(rows, p, reported, productivity) : Optional.of(reported[0]),
            build);
    Technologies periods =
        technologies(
            ranked(productivity, withoutPeriods),
            fit.panel().periods()::get,
            (t, reported) -> {
              if (fit.specification().time().byPeriod() && t == period) {
                return Optional.empty();
              }
              return levels
                  ? withoutPeriod(rows, t, reported, productivity)
                  : Optional.of(reported[0]);
            },
            build);
    return fit.at(period, productivity)
        .with(
            new Replicas(
                drawnAnew(productivity, levels, build),
                whole(withoutPlants, plants, period, productivity),
                whole(withoutPeriods, periods, period, productivity)));
  }

  private Technologies drawnAnew(
      Productivity productivity, boolean levels, Function<double[], Technology> build) {
    if (drawn.count() == 0 || !levels) {
      return technologies(
          drawn, Integer::toString, (i, reported) -> Optional.of(reported[0]), build);
    }
    if (!levelsKnown()) {
      return Technologies.NONE;
    }
    ToDoubleFunction<double[]> level = drawnLevel(productivity);
    double own = ownDeviation(productivity);
    return technologies(
        drawn,
        Integer::toString,
        (i, reported) -> Optional.of(level.applyAsDouble(reported) + own * noise(i, productivity)),
        build);
  }

  /** Technologies asked of whole refits, where those were kept; else the ones put together. */
  private Technologies whole(
      RefittedParameters refits, Technologies otherwise, int period, Productivity productivity) {
    return new Technologies() {
      @Override
      public int count() {
        return otherwise.count();
      }

      @Override
      public Optional<Technology> get(int i) {
        return refits.whole(i).isPresent()
            ? ask(refits.whole(i).get(), period, productivity)
            : otherwise.get(i);
      }

      @Override
      public String name(int i) {
        return otherwise.name(i);
      }
    };
  }

  /** The technology of a refit on other rows, at the controls of this fit. */
  private Optional<Technology> ask(Fit refit, int period, Productivity productivity) {
    Panel panel = fit.panel();
    int then = refit.panel().periods().indexOf(panel.periods().get(period));
    Productivity whose = productivity;
    if (productivity instanceof Productivity.Plant plant) {
      int there = refit.panel().plants().indexOf(panel.plants().get(plant.index()));
      if (there < 0) {
        return Optional.empty();
      }
      whose = new Productivity.Plant(there);
    }
    if (then < 0) {
      return Optional.empty();
    }
    double shift = 0;
    for (int c = 0; c < panel.controls().size(); c++) {
      int place = refit.numbers().technology().parameters().length + c;
      double apart = mean(panel.controls().get(c)) - mean(refit.panel().controls().get(c));
      shift += refit.numbers().parameters()[place] * apart;
    }
    return Optional.of(refit.technology(then, whose).shifted(shift));
  }

  private static double mean(Column column) {
    double sum = 0;
    for (int r = 0; r < column.size(); r++) {
      sum += column.get(r);
    }
    return sum / column.size();
  }

  /** The constant of refit i with these parameters; empty where there is none. */
  @FunctionalInterface
  private interface Constant {
    Optional<Double> of(int i, double[] reported);
  }

  private static Technologies technologies(
      RefittedParameters refits,
      IntFunction<String> names,
      Constant constant,
      Function<double[], Technology> build) {
    return new Technologies() {
      @Override
      public String name(int i) {
        return names.apply(i);
      }

      @Override
      public int count() {
        return refits.count();
      }

      @Override
      public Optional<Technology> get(int i) {
        if (!refits.fitted(i)) {
          return Optional.empty();
        }
        double[] reported = refits.reported(i);
        return constant
            .of(i, reported)
            .filter(Double::isFinite)
            .map(c -> build.apply(reported).shifted(c - reported[0]));
      }
    };
  }

  /** None where a quartile would have to be taken of too many levels too often. */
  private RefittedParameters ranked(Productivity productivity, RefittedParameters refits) {
    boolean tooMany =
        productivity instanceof Productivity.UpperQuartile
            && (long) refits.count() * fit.panel().rows() > MOST_ROWS_RANKED;
    return tooMany ? new RefittedParameters(java.util.List.of()) : refits;
  }

  /** c_ω under other parameters, with the weights of the estimate. */
  private ToDoubleFunction<double[]> drawnLevel(Productivity productivity) {
    Solution numbers = fit.numbers();
    double[] weights = numbers.levels().weights(productivity);
    if (fit.specification().form() instanceof LinearForm form) {
      double[] direction =
          form.unrestricted() == form
              ? numbers.levels().direction(weights)
              : slopeMeans(form, weights);
      double[] centre = numbers.parameters();
      int first = centre.length - numbers.lawOfErrors() - direction.length;
      double constant = centre[0] + numbers.levels().shift(weights);
      return reported -> {
        double moved = constant;
        for (int k = 0; k < direction.length; k++) {
          moved += direction[k] * (reported[first + k] - centre[first + k]);
        }
        return moved;
      };
    }
    RowLevels rows = new RowLevels(fit);
    return reported -> rows.weighted(reported, weights);
  }

  /**
   * Less the weighted means of the columns of the form without restriction, where plants' levels
   * are their own means.
   */
  private double[] slopeMeans(LinearForm form, double[] weights) {
    LinearDesign whole =
        new LinearDesign(
            PanelRows.of(fit.panel(), fit.base()),
            form.unrestricted(),
            fit.panel().inputs(),
            Circumstances.of(fit.panel(), fit.specification().time()),
            false);
    double[] means = GroupMeans.of(whole, new double[whole.columns().size()]).regressors(weights);
    for (int k = 0; k < means.length; k++) {
      means[k] = -means[k];
    }
    return means;
  }

  /** Whether draws can be carried to a level: not to random ones under a restricted form. */
  private boolean levelsKnown() {
    return !fit.specification().plantEffects().random()
        || !(fit.specification().form() instanceof LinearForm form)
        || form.unrestricted() == form;
  }

  private double ownDeviation(Productivity productivity) {
    PlantLevels levels = fit.numbers().levels();
    return Math.sqrt(levels.ownVariance(levels.weights(productivity)));
  }

  /** A normal number that belongs to a draw and a productivity, the same at every period. */
  private double noise(int draw, Productivity productivity) {
    long which = LEVELS;
    if (productivity instanceof Productivity.UpperQuartile) {
      which++;
    } else if (productivity instanceof Productivity.Plant plant) {
      which += 2 + plant.index();
    }
    long seed = drawing.map(Drawing::seed).orElse(0L);
    return NORMAL.inverseCumulativeProbability(new DrawStream(seed, draw, which).uniform());
  }

  private Optional<Double> withoutPlant(
      RowLevels rows, int out, double[] reported, Productivity productivity) {
    if (productivity instanceof Productivity.Plant plant && plant.index() == out) {
      return Optional.empty();
    }
    if (sums.isPresent() && productivity instanceof Productivity.Typical) {
      return Optional.of(sums.get().withoutPlant(reported, out));
    }
    return Optional.of(
        without(rows, reported, productivity, row -> fit.panel().plantOf(row) != out));
  }

  private Optional<Double> withoutPeriod(
      RowLevels rows, int out, double[] reported, Productivity productivity) {
    if (sums.isPresent() && productivity instanceof Productivity.Typical) {
      return Optional.of(sums.get().withoutPeriod(reported, out));
    }
    return Optional.of(
        without(rows, reported, productivity, row -> fit.panel().rowPeriods().get(row) != out));
  }

  private static double without(
      RowLevels rows, double[] reported, Productivity productivity, IntPredicate keep) {
    if (productivity instanceof Productivity.Plant plant) {
      return rows.ofPlant(reported, plant.index(), keep);
    }
    if (productivity instanceof Productivity.UpperQuartile) {
      double[] levels =
          Arrays.stream(rows.ofPlants(reported, keep)).filter(c -> !Double.isNaN(c)).toArray();
      return PlantLevels.upperQuartile(levels);
    }
    return rows.ofAll(reported, keep);
  }
}

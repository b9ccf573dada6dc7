package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Inequalities;
import isowright.regression.InequalityLeastSquares;
import isowright.regression.InequalityLeastSquares.Found;
import isowright.regression.LinearFit;
import isowright.regression.Refits;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.TreeSet;
import java.util.stream.IntStream;

/**
 * Least squares of a form linear in its parameters, held to be regular at the geometric mean of the
 * inputs or at every row: the least sum of squares among the technologies that are monotone and
 * quasi-concave there.
 *
 * <p>Monotonicity is linear in the coefficients, quasi-concavity is not: the technologies that have
 * it are no convex set, so a local optimum need not be the best. The search is therefore made from
 * several starts (the free estimate; the Cobb-Douglas technology nearest to it with positive
 * elasticities, which is regular everywhere, so that a technology that meets everything always
 * exists; points between and around), the best is kept, and how many came to it is reported.
 *
 * <p>Rows are taken under watch as they are missed, so that the cost hardly depends on their
 * number.
 *
 * <p>Sources: constrained least squares under inequalities: Judge, G. G. and Takayama, T. (1966),
 * Inequality Restrictions in Regression Analysis, <i>Journal of the American Statistical
 * Association</i> 61, 166–181; curvature imposed on a flexible form at data points: Gallant, A. R.
 * and Golub, G. H. (1984), Imposing Curvature Restrictions on Flexible Functional Forms, <i>Journal
 * of Econometrics</i> 26, 295–321 (from memory). Tested in {@code RegularityImposedTest}.
 */
final class ImposedRegularity {

  /** The smallest elasticity of the Cobb-Douglas technology from which a search starts. */
  private static final double LEAST_ELASTICITY = 0.02;

  private static final int STARTS_AROUND = 6;

  /** Of random starts; any would do, it is fixed so that runs repeat. */
  private static final long SEED = 19_840_401;

  private static final int MOST_ROUNDS = 200;

  /** Two optima whose distances differ by no more than this are one. */
  private static final double SAME = 1e-6;

  private final RegularMixes mixes;
  private final int columns;

  /**
   * The best that was found.
   *
   * @param found the coefficients, and which inequalities bind
   * @param starts from how many starts
   * @param agreeing how many came to the best
   */
  record Best(Found found, int starts, int agreeing) {}

  private ImposedRegularity(RegularMixes mixes, int columns) {
    this.mixes = mixes;
    this.columns = columns;
  }

  /**
   * @param columns columns of the regression
   */
  static ImposedRegularity of(
      Panel panel, Specification specification, double[] base, LinearForm form, int columns) {
    double[][] logs =
        switch (specification.regularity()) {
          case AT_MEAN -> {
            double[] means = panel.geometricMeans();
            yield Arrays.stream(means)
                .mapToObj(mean -> new double[] {Math.log(mean)})
                .toArray(double[][]::new);
          }
          case EVERYWHERE -> withAllInputs(panel);
          case FREE -> throw new IllegalArgumentException("no regularity is asked for");
        };
    int first = specification.plantEffects().constant() ? 1 : 0;
    RegularMixes mixes = new RegularMixes(form, panel.inputs(), base, logs, first);
    return new ImposedRegularity(mixes, columns);
  }

  /** Logs of inputs; rows that do without an input have no log of it and are not held. */
  private static double[][] withAllInputs(Panel panel) {
    int[] rows = IntStream.range(0, panel.rows()).filter(row -> !panel.anyZero(row)).toArray();
    return panel.logQuantities().stream()
        .map(column -> Arrays.stream(rows).mapToDouble(column::get).toArray())
        .toArray(double[][]::new);
  }

  /** How refits of a fit held to be regular are held: at the same mixes, from the estimate on. */
  static Refits.Revision revision(Fit fit, LinearForm form) {
    double[] estimate = fit.numbers().linear().coefficients();
    ImposedRegularity imposed =
        of(fit.panel(), fit.specification(), fit.base(), form, estimate.length);
    imposed.mixes.watch(((Particulars.OfRegularity) fit.numbers().particulars()).watched());
    return (centre, factor) ->
        new ImposedRegularity(imposed.mixes.again(), centre.length)
            .refitted(centre, factor, estimate);
  }

  private Optional<double[]> refitted(double[] centre, double[][] factor, double[] estimate) {
    if (mixes.missed(centre).isEmpty()) {
      return Optional.of(centre);
    }
    double[] start = estimate.clone();
    for (int i = start.length - 1; i >= 0; i--) {
      start[i] -= centre[i];
      for (int k = i + 1; k < start.length; k++) {
        start[i] -= factor[i][k] * start[k];
      }
      start[i] /= factor[i][i];
    }
    return cut(centre, factor, start)
        .or(() -> cut(centre, factor, new double[columns]))
        .map(Found::coefficients);
  }

  RegularMixes mixes() {
    return mixes;
  }

  /** The best coefficients; empty where no start came to an optimum. */
  Optional<Best> best(LinearFit free) {
    double[] centre = free.coefficients();
    double[][] factor = InequalityLeastSquares.scaledFactor(free);
    mixes.watch(mixes.missed(centre));
    List<Found> all = new ArrayList<>();
    List<double[]> starts =
        mixes.watched().isEmpty() ? List.of(new double[columns]) : starts(centre, factor);
    for (double[] start : starts) {
      cut(centre, factor, start).ifPresent(all::add);
    }
    Optional<Found> best = all.stream().min((a, b) -> Double.compare(a.distance(), b.distance()));
    return best.map(
        one ->
            new Best(
                one,
                starts.size(),
                (int)
                    all.stream()
                        .filter(o -> o.distance() <= one.distance() * (1 + SAME) + SAME)
                        .count()));
  }

  /**
   * The optimum reached from one start, all rows looked at.
   *
   * @param factor s F of the rows
   */
  Optional<Found> cut(double[] centre, double[][] factor, double[] start) {
    double[] from = start;
    for (int round = 0; round < MOST_ROUNDS; round++) {
      Optional<Found> found = new InequalityLeastSquares(centre, factor, mixes).from(from);
      if (found.isEmpty()) {
        return Optional.empty();
      }
      TreeSet<Integer> missed = mixes.missed(found.get().coefficients());
      mixes.watched().forEach(missed::remove);
      if (missed.isEmpty()) {
        return found;
      }
      mixes.watch(missed);
      from = found.get().move();
    }
    return Optional.empty();
  }

  private List<double[]> starts(double[] centre, double[][] factor) {
    List<double[]> starts = new ArrayList<>();
    starts.add(new double[columns]);
    Optional<double[]> plain = cobbDouglas(centre, factor);
    plain.ifPresent(
        point -> {
          starts.add(point);
          starts.add(Arrays.stream(point).map(v -> v / 2).toArray());
          SplittableRandom random = new SplittableRandom(SEED);
          double size = 0;
          for (double v : point) {
            size += v * v / columns;
          }
          for (int i = 0; i < STARTS_AROUND; i++) {
            double reach = Math.sqrt(size) * (i % 2 == 0 ? 0.5 : 1.5);
            starts.add(
                Arrays.stream(point)
                    .map(v -> v + reach * Math.sqrt(12) * (random.nextDouble() - 0.5))
                    .toArray());
          }
        });
    return starts;
  }

  /** The nearest technology without second-order terms whose elasticities are positive. */
  private Optional<double[]> cobbDouglas(double[] centre, double[][] factor) {
    int[] bending = mixes.bending();
    RegularMixes at = mixes;
    Inequalities plain =
        new Inequalities() {
          @Override
          public int count() {
            return 2 * bending.length + at.inputs();
          }

          @Override
          public void at(double[] coefficients, double[] values, double[][] gradients) {
            for (int b = 0; b < bending.length; b++) {
              values[2 * b] = coefficients[bending[b]];
              gradients[2 * b][bending[b]] = 1;
              values[2 * b + 1] = -coefficients[bending[b]];
              gradients[2 * b + 1][bending[b]] = -1;
            }
            at.products(LEAST_ELASTICITY, coefficients, values, gradients, 2 * bending.length);
          }
        };
    return new InequalityLeastSquares(centre, factor, plain)
        .from(new double[columns])
        .map(Found::move);
  }
}

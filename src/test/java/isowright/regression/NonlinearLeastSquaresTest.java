package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.NonlinearFit.Stop;
import isowright.regression.NonlinearLeastSquares.Settings;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class NonlinearLeastSquaresTest {

  /** y = b1 + b2 exp(−b3 x), in groups. */
  private static final class Decay implements NonlinearModel {
    private final double[] x;
    private final double[] y;
    private final Groups groups;
    private final boolean within;

    Decay(double[] x, double[] y, Groups groups, boolean within) {
      this.x = x;
      this.y = y;
      this.groups = groups;
      this.within = within;
    }

    static Decay of(SplittableRandom random, int rows, double noise, boolean within) {
      Groups groups = RandomDesigns.groups(random, rows, 6);
      double[] x = new double[rows];
      double[] y = new double[rows];
      for (int i = 0; i < rows; i++) {
        x[i] = random.nextDouble(0, 4);
        y[i] =
            Math.sin(groups.of(i)) + 3 * Math.exp(-0.7 * x[i]) + noise * random.nextDouble(-1, 1);
      }
      return new Decay(x, y, groups, within);
    }

    Decay asWithin() {
      return new Decay(x, y, groups, true);
    }

    @Override
    public List<String> parameters() {
      return List.of("b1", "b2", "b3");
    }

    @Override
    public Design linearisedAt(double[] b) {
      double[][] jacobian = new double[3][x.length];
      double[] residual = new double[x.length];
      for (int i = 0; i < x.length; i++) {
        double e = Math.exp(-b[2] * x[i]);
        residual[i] = y[i] - b[0] - b[1] * e;
        jacobian[0][i] = 1;
        jacobian[1][i] = e;
        jacobian[2][i] = -b[1] * x[i] * e;
      }
      Design design = ArrayDesign.of(parameters(), jacobian, residual, groups);
      return within ? Effects.within(design) : design;
    }

    /** The same with one constant a group, b1 and further on, as parameters of their own. */
    NonlinearModel withDummies() {
      int count = groups.count();
      return new NonlinearModel() {
        @Override
        public List<String> parameters() {
          return IntStream.range(0, count + 2).mapToObj(k -> "p" + k).toList();
        }

        @Override
        public Design linearisedAt(double[] p) {
          double[][] jacobian = new double[count + 2][x.length];
          double[] residual = new double[x.length];
          for (int i = 0; i < x.length; i++) {
            double e = Math.exp(-p[count + 1] * x[i]);
            jacobian[groups.of(i)][i] = 1;
            jacobian[count][i] = e;
            jacobian[count + 1][i] = -p[count] * x[i] * e;
            residual[i] = y[i] - p[groups.of(i)] - p[count] * e;
          }
          return ArrayDesign.of(parameters(), jacobian, residual, groups);
        }
      };
    }
  }

  @Test
  void groupEffectsAreDummies() {
    SplittableRandom random = new SplittableRandom(71);
    for (int trial = 0; trial < 5; trial++) {
      Decay model = Decay.of(random, 120, 0.3, true);
      NonlinearFit mine = NonlinearLeastSquares.fit(model, new double[] {0, 1, 1});
      int groups = model.groups.count();
      double[] start = new double[groups + 2];
      start[groups] = 1;
      start[groups + 1] = 1;
      NonlinearFit theirs = NonlinearLeastSquares.fit(model.withDummies(), start);
      assertThat(mine.stop()).isEqualTo(Stop.CONVERGED);
      assertThat(theirs.stop()).isEqualTo(Stop.CONVERGED);
      // Both are right to about 1e-8 of a standard error, which is a tenth at most here.
      assertThat(mine.parameters()[1]).isCloseTo(theirs.parameters()[groups], within(1e-7));
      assertThat(mine.parameters()[2]).isCloseTo(theirs.parameters()[groups + 1], within(1e-7));
      assertThat(mine.ssr()).isCloseTo(theirs.ssr(), within(1e-10 * theirs.ssr()));
      assertThat(mine.linearisation().residualDegreesOfFreedom())
          .isEqualTo(theirs.linearisation().residualDegreesOfFreedom());
      for (Covariance.Kind kind : List.of(Covariance.Kind.CLASSICAL, Covariance.Kind.HC3)) {
        double error =
            Covariance.estimate(model.linearisedAt(mine.parameters()), mine.linearisation(), kind)
                .standardError(2);
        double other =
            Covariance.estimate(
                    model.withDummies().linearisedAt(theirs.parameters()),
                    theirs.linearisation(),
                    kind)
                .standardError(groups + 1);
        assertThat(error).isCloseTo(other, within(1e-6 * other));
      }
    }
  }

  @Test
  void manyRowsGiveTheSameDigitsOnAnyNumberOfThreads()
      throws ExecutionException, InterruptedException {
    Decay model = Decay.of(new SplittableRandom(72), 30_000, 0.5, false);
    double[] start = {0, 1, 1};
    NonlinearFit here = NonlinearLeastSquares.fit(model, start);
    ForkJoinPool one = new ForkJoinPool(1);
    try {
      NonlinearFit there = one.submit(() -> NonlinearLeastSquares.fit(model, start)).get();
      assertThat(Arrays.equals(here.parameters(), there.parameters())).isTrue();
    } finally {
      one.shutdown();
    }
    assertThat(here.converged()).isTrue();
    assertThat(here.evaluations()).isLessThan(25);
    assertThat(start).containsExactly(0, 1, 1);
  }

  @Test
  void heldParametersStayAndAreNotEstimated() {
    Decay model = Decay.of(new SplittableRandom(73), 400, 0.2, false);
    NonlinearFit fit =
        NonlinearLeastSquares.fit(
            model, new double[] {0, 1, 0.7}, Settings.STANDARD.holding(false, false, true));
    assertThat(fit.parameters()[2]).isEqualTo(0.7);
    assertThat(fit.converged()).isTrue();
    LinearFit linearisation = fit.linearisation();
    assertThat(linearisation.columns()).isEqualTo(model.parameters());
    assertThat(linearisation.rank()).isEqualTo(2);
    assertThat(linearisation.fullRank()).isTrue();
    Design there = model.linearisedAt(fit.parameters());
    Covariance covariance = Covariance.estimate(there, linearisation, Covariance.Kind.HC1);
    assertThat(covariance.matrix()[2]).containsOnly(0);

    // With b3 held the model is linear in b1 and b2.
    double[][] rows = RandomDesigns.rows(there);
    LinearFit direct =
        LeastSquares.fit(
            ArrayDesign.of(List.of("b1", "b2"), new double[][] {rows[0], rows[1]}, model.y));
    assertThat(fit.parameters()[0]).isCloseTo(direct.coefficient("b1"), within(1e-9));
    assertThat(fit.parameters()[1]).isCloseTo(direct.coefficient("b2"), within(1e-9));
    assertThat(fit.ssr()).isCloseTo(direct.ssr(), within(1e-11 * direct.ssr()));
    assertThat(covariance.standardError(1))
        .isCloseTo(
            Covariance.estimate(
                    ArrayDesign.of(List.of("b1", "b2"), new double[][] {rows[0], rows[1]}, model.y),
                    direct,
                    Covariance.Kind.HC1)
                .standardError(1),
            within(1e-9));
  }

  @Test
  void allHeldIsAnEvaluation() {
    Decay model = Decay.of(new SplittableRandom(74), 50, 0.2, false);
    NonlinearFit fit =
        NonlinearLeastSquares.fit(
            model, new double[] {0, 3, 0.7}, Settings.STANDARD.holding(true, true, true));
    assertThat(fit.parameters()).containsExactly(0, 3, 0.7);
    assertThat(fit.linearisation().rank()).isZero();
    assertThat(fit.evaluations()).isEqualTo(1);
  }

  @Test
  void aLimitIsSaidAndTheBestPointKept() {
    NistSet set = NistSet.read("Misra1a");
    NonlinearModel model = NistModels.model(set);
    NonlinearFit fit =
        NonlinearLeastSquares.fit(model, set.starts()[0], Settings.STANDARD.withMostEvaluations(8));
    assertThat(fit.stop()).isEqualTo(Stop.LIMIT);
    assertThat(fit.evaluations()).isLessThanOrEqualTo(8);
    NonlinearFit atStart =
        NonlinearLeastSquares.fit(model, set.starts()[0], Settings.STANDARD.holding(true, true));
    assertThat(fit.ssr()).isLessThan(atStart.ssr());
  }

  @Test
  void aStartWithoutAValueIsSaid() {
    Decay model = Decay.of(new SplittableRandom(75), 50, 0.2, false);
    NonlinearFit fit = NonlinearLeastSquares.fit(model, new double[] {0, 1, Double.NaN});
    assertThat(fit.stop()).isEqualTo(Stop.NOT_FINITE);
    assertThat(fit.ssr()).isNaN();
    assertThat(fit.linearisation().rank()).isZero();
  }

  @Test
  void theSearchStepsBackFromWhereTheModelHasNoValue() {
    // y = b1 ln(x − b2) is defined for b2 below the least x = 1 only; the truth is close to it.
    double[] x = new double[40];
    double[] y = new double[40];
    SplittableRandom random = new SplittableRandom(76);
    for (int i = 0; i < 40; i++) {
      x[i] = 1 + 0.1 * i;
      y[i] = 2 * Math.log(x[i] - 0.99) + 0.01 * random.nextDouble();
    }
    NonlinearModel model =
        new NonlinearModel() {
          @Override
          public List<String> parameters() {
            return List.of("b1", "b2");
          }

          @Override
          public Design linearisedAt(double[] b) {
            double[][] jacobian = new double[2][40];
            double[] residual = new double[40];
            for (int i = 0; i < 40; i++) {
              jacobian[0][i] = Math.log(x[i] - b[1]);
              jacobian[1][i] = -b[0] / (x[i] - b[1]);
              residual[i] = y[i] - b[0] * jacobian[0][i];
            }
            return ArrayDesign.of(parameters(), jacobian, residual);
          }
        };
    NonlinearFit fit = NonlinearLeastSquares.fit(model, new double[] {5, -3});
    assertThat(fit.stop()).isEqualTo(Stop.CONVERGED);
    assertThat(fit.parameters()[1]).isCloseTo(0.99, within(1e-3));
  }

  @Test
  void aParameterWithoutEffectIsNotCalledConverged() {
    NistSet set = NistSet.read("BoxBOD");
    // b2 so large that the curve is flat at every x: the mean fits best and b2 does nothing.
    NonlinearFit flat = NonlinearLeastSquares.fit(NistModels.model(set), new double[] {100, 1e4});
    assertThat(flat.stop()).isEqualTo(Stop.UNIDENTIFIED);
    assertThat(flat.linearisation().collinearities())
        .containsExactly(new Collinearity("b2", List.of()));

    // In y = b1 b2 + b3 exp(−x) only the product of b1 and b2 can be known.
    Decay decay = Decay.of(new SplittableRandom(79), 60, 0.2, false);
    NonlinearModel product =
        new NonlinearModel() {
          @Override
          public List<String> parameters() {
            return List.of("b1", "b2", "b3");
          }

          @Override
          public Design linearisedAt(double[] b) {
            double[][] rows =
                RandomDesigns.rows(decay.linearisedAt(new double[] {b[0] * b[1], b[2], 1}));
            double[] first = Arrays.stream(rows[0]).map(one -> one * b[1]).toArray();
            double[] second = Arrays.stream(rows[0]).map(one -> one * b[0]).toArray();
            return ArrayDesign.of(parameters(), new double[][] {first, second, rows[1]}, rows[3]);
          }
        };
    NonlinearFit twins = NonlinearLeastSquares.fit(product, new double[] {1, 2, 1});
    assertThat(twins.stop()).isEqualTo(Stop.UNIDENTIFIED);
    assertThat(twins.linearisation().collinearities())
        .containsExactly(new Collinearity("b2", List.of("b1")));
    assertThat(twins.linearisation().fullRank()).isFalse();
  }

  @Test
  void convergenceIsNeverClaimedFalsely() {
    SplittableRandom random = new SplittableRandom(77);
    int converged = 0;
    for (String name : List.of("Misra1a", "BoxBOD", "Rat43", "MGH09", "MGH17", "Eckerle4")) {
      NistSet set = NistSet.read(name);
      NonlinearModel model = NistModels.model(set);
      for (int trial = 0; trial < 10; trial++) {
        double[] start = set.certified().clone();
        for (int k = 0; k < start.length; k++) {
          start[k] *= Math.exp(random.nextDouble(-3, 3));
        }
        NonlinearFit fit =
            NonlinearLeastSquares.fit(model, start, Settings.STANDARD.withMostEvaluations(100));
        if (fit.stop() == Stop.NOT_FINITE) {
          continue;
        }
        // No point lies below the certified minimum, printed to eleven digits.
        assertThat(fit.ssr()).isGreaterThan(set.spread() * (1 - 1e-10));
        if (fit.converged()) {
          converged++;
          assertThat(steepest(model, fit.parameters())).isLessThan(1e-6);
        }
      }
    }
    assertThat(converged).isGreaterThan(20);
  }

  @Test
  void sizesMustAgree() {
    Decay model = Decay.of(new SplittableRandom(78), 20, 0.2, false);
    assertThatThrownBy(() -> NonlinearLeastSquares.fit(model, new double[] {1}))
        .hasMessageContaining("the model has 3 parameters, the start 1");
    assertThat(model.asWithin().linearisedAt(new double[] {0, 1, 1}).absorbed())
        .isEqualTo(model.groups.count());
  }

  /** The largest cosine between the residual and a Jacobian column, computed densely. */
  private static double steepest(NonlinearModel model, double[] parameters) {
    double[][] rows = RandomDesigns.rows(model.linearisedAt(parameters));
    double[] residual = rows[rows.length - 1];
    double largest = 0;
    for (int k = 0; k < rows.length - 1; k++) {
      double inner = 0;
      double length = 0;
      double ssr = 0;
      for (int i = 0; i < residual.length; i++) {
        inner += rows[k][i] * residual[i];
        length += rows[k][i] * rows[k][i];
        ssr += residual[i] * residual[i];
      }
      largest = Math.max(largest, Math.abs(inner) / Math.sqrt(length * ssr));
    }
    return largest;
  }
}

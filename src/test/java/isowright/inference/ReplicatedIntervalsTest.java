package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Productivity;
import isowright.estimation.Replicas;
import isowright.estimation.Replicas.Technologies;
import isowright.estimation.Replication;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Specification;
import isowright.technology.CobbDouglas;
import isowright.technology.Elasticities;
import isowright.technology.Form;
import isowright.technology.Technology;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;

class ReplicatedIntervalsTest {

  private static final CobbDouglas CENTRE = technology(.6, .5);

  private static final Function<Technology, double[]> FIGURES =
      t -> {
        double[] e = Elasticities.atBase(t).output();
        // The third is fixed by the form, the fourth has no value where the first is large.
        return new double[] {e[0], e[0] * e[1], 1, e[0] > .69 ? Double.NaN : e[1]};
      };

  private static CobbDouglas technology(double first, double second) {
    return new CobbDouglas(
        List.of("labour", "machines"), new double[] {1, 1}, 0, new double[] {first, second});
  }

  private static Technologies technologies(int count, IntFunction<Optional<Technology>> of) {
    return new Technologies() {
      @Override
      public int count() {
        return count;
      }

      @Override
      public Optional<Technology> get(int i) {
        return of.apply(i);
      }

      @Override
      public String name(int i) {
        return "number " + i;
      }
    };
  }

  private static EstimatedTechnology estimated(Replicas replicas) {
    double[][] covariance = {{0, 0, 0}, {0, .0025, 0}, {0, 0, .0016}};
    return new EstimatedTechnology(CENTRE, covariance, 20).with(replicas);
  }

  /**
   * 999 draws whose first elasticity runs evenly from .5 to .7: the 25th and 975th are the ends.
   */
  private static final Technologies EVEN =
      technologies(999, i -> Optional.of(technology(.5 + i * .2 / 998, .5)));

  @Test
  void drawsGiveErrorAndInterval() {
    Intervals intervals =
        Intervals.of(estimated(new Replicas(EVEN, Technologies.NONE, Technologies.NONE)), .95);
    Estimate first = intervals.estimates(FIGURES, DeltaMethod.Scale.LINEAR).get(0);
    assertThat(first.method()).isEqualTo(Estimate.Method.RESAMPLING);
    assertThat(first.value()).isEqualTo(.6);
    assertThat(first.low()).isCloseTo(.5 + 24 * .2 / 998, within(1e-14));
    assertThat(first.high()).isCloseTo(.5 + 974 * .2 / 998, within(1e-14));
    // That of an even law, √((n² − 1)/12 · n/(n − 1)) steps.
    assertThat(first.standardError())
        .isCloseTo(.2 / 998 * Math.sqrt((999.0 * 999 - 1) / 12 * 999 / 998), within(1e-14));
    Resampled resampled = first.resampled().orElseThrow();
    assertThat(resampled.failed()).isZero();
    assertThat(resampled.mean()).isCloseTo(.6, within(1e-12));
    assertThat(resampled.analytic()).isCloseTo(.05, within(1e-9));
    assertThat(resampled.accelerated()).isEqualTo(Resampled.Interval.NONE);
    assertThat(first.leftOut()).isEqualTo(LeftOut.NOTHING);
  }

  @Test
  void whatTheFormFixesStaysExact() {
    Intervals intervals =
        Intervals.of(estimated(new Replicas(EVEN, Technologies.NONE, Technologies.NONE)), .95);
    Estimate fixed = intervals.estimates(FIGURES, DeltaMethod.Scale.LINEAR).get(2);
    assertThat(fixed.standardError()).isZero();
    assertThat(fixed.resampled()).isEmpty();
  }

  /** Above .69 lie 49 of 999 draws: under a tenth, so there is an interval; with 200 lost not. */
  @Test
  void tooManyDrawsWithoutValueMeanNoInterval() {
    Replicas few = new Replicas(EVEN, Technologies.NONE, Technologies.NONE);
    Estimate sure =
        Intervals.of(estimated(few), .95)
            .estimates(
                t -> new double[] {FIGURES.apply(t)[3] + .1 * FIGURES.apply(t)[0]},
                DeltaMethod.Scale.LINEAR)
            .get(0);
    assertThat(sure.resampled().orElseThrow().failed()).isEqualTo(50);
    assertThat(sure.resampled().orElseThrow().enough()).isTrue();
    assertThat(sure.low()).isNotNaN();
    Technologies lossy = technologies(999, i -> i % 5 == 0 ? Optional.empty() : EVEN.get(i));
    Estimate lost =
        Intervals.of(estimated(new Replicas(lossy, Technologies.NONE, Technologies.NONE)), .95)
            .estimates(FIGURES, DeltaMethod.Scale.LINEAR)
            .get(0);
    assertThat(lost.resampled().orElseThrow().failed()).isEqualTo(200);
    assertThat(lost.resampled().orElseThrow().enough()).isFalse();
    assertThat(lost.method()).isEqualTo(Estimate.Method.RESAMPLING);
    assertThat(List.of(lost.standardError(), lost.low(), lost.high())).containsOnly(Double.NaN);
    assertThat(lost.resampled().orElseThrow().analytic()).isCloseTo(.05, within(1e-9));
  }

  @Test
  void withoutDrawsTheIntervalIsThatOfPropagationAndTheMostMovingIsNamed() {
    Technologies plants =
        technologies(
            7, i -> i == 5 ? Optional.empty() : Optional.of(technology(.6 + .01 * i * i, .5)));
    Technologies periods = technologies(3, i -> Optional.of(technology(.58 + .01 * i, .5)));
    EstimatedTechnology with = estimated(new Replicas(Technologies.NONE, plants, periods));
    Estimate first = Intervals.of(with, .95).estimates(FIGURES, DeltaMethod.Scale.LINEAR).get(0);
    Estimate delta = DeltaMethod.of(with, .95).estimates(FIGURES, DeltaMethod.Scale.LINEAR).get(0);
    assertThat(first.with(LeftOut.NOTHING)).isEqualTo(delta);
    LeftOut.Most plant = first.leftOut().plant().orElseThrow();
    assertThat(plant.name()).isEqualTo("number 6");
    assertThat(plant.value()).isCloseTo(.96, within(1e-15));
    assertThat(plant.lost()).isEqualTo(1);
    assertThat(first.leftOut().period().orElseThrow().name()).isEqualTo("number 0");
  }

  /**
   * Of many plants those with the largest gradients are refitted, and the largest among them is
   * found.
   */
  @Test
  void ofManyPlantsTheMostMovingIsFoundAndExact() {
    int many = 5_000;
    Technologies plants =
        technologies(
            many,
            i -> Optional.of(technology(.6 + 1e-5 * Math.sin(i), .5 + 2e-5 * Math.cos(3 * i))));
    Estimate product =
        Intervals.of(estimated(new Replicas(Technologies.NONE, plants, Technologies.NONE)), .95)
            .estimates(FIGURES, DeltaMethod.Scale.LINEAR)
            .get(1);
    int most = 0;
    double furthest = 0;
    for (int i = 0; i < many; i++) {
      double value = FIGURES.apply(plants.get(i).orElseThrow())[1];
      if (Math.abs(value - .3) > furthest) {
        furthest = Math.abs(value - .3);
        most = i;
      }
    }
    LeftOut.Most found = product.leftOut().plant().orElseThrow();
    assertThat(found.name()).isEqualTo("number " + most);
    assertThat(found.value()).isEqualTo(FIGURES.apply(plants.get(most).orElseThrow())[1]);
    assertThat(found.lost()).isZero();
  }

  /**
   * 48 US states, pooled (see {@link isowright.estimation.PublishedFitsTest}): returns to scale and
   * a cost, whole way through. Percentile and corrected intervals differ by less than a standard
   * error; both hold the estimate.
   */
  @Test
  void theWholeWayOnTheStates() {
    Fit fit =
        Estimation.fit(
            PanelFixtures.usStates(),
            new Specification(
                Form.named("cobb-douglas"),
                Specification.PlantEffects.NONE,
                Specification.Time.NONE,
                true,
                Specification.StandardErrors.CLUSTERED,
                .95));
    EstimatedTechnology typical =
        Replication.of(fit, Optional.of(new Drawing(999, 4))).at(16, new Productivity.Typical());
    double[] mean = fit.meanLogInputs();
    Estimate scale =
        Intervals.of(typical, .95)
            .estimates(
                t -> new double[] {Elasticities.at(t, mean).scale()}, DeltaMethod.Scale.LINEAR)
            .get(0);
    Resampled resampled = scale.resampled().orElseThrow();
    double error = scale.standardError();
    assertThat(scale.low()).isLessThan(scale.value());
    assertThat(scale.high()).isGreaterThan(scale.value());
    // Between the sandwich and the jackknife over states, and three Monte-Carlo errors beyond: see
    // ClusterBootstrapTest.
    double monteCarlo = 3 / Math.sqrt(2 * 999);
    assertThat(error / resampled.analytic())
        .isBetween(
            1 - monteCarlo,
            jackknife(typical.replicas().withoutPlants(), mean) / resampled.analytic()
                + monteCarlo);
    assertThat(resampled.corrected().low()).isCloseTo(resampled.percentile().low(), within(error));
    assertThat(resampled.accelerated().low()).isNotNaN();
    assertThat(scale.leftOut().plant()).isPresent();
    assertThat(fit.panel().plants()).contains(scale.leftOut().plant().orElseThrow().name());
    assertThat(fit.panel().periods()).contains(scale.leftOut().period().orElseThrow().name());
  }

  private static double jackknife(Technologies without, double[] mean) {
    int count = without.count();
    double[] values = new double[count];
    double centre = 0;
    for (int i = 0; i < count; i++) {
      values[i] = Elasticities.at(without.get(i).orElseThrow(), mean).scale();
      centre += values[i] / count;
    }
    double squares = 0;
    for (double value : values) {
      squares += (value - centre) * (value - centre);
    }
    return Math.sqrt(squares * (count - 1) / count);
  }
}

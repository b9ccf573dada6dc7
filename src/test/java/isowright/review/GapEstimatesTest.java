package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.leastcost.Question;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Closed derivatives of a gap and its parts against differences, form by form. */
class GapEstimatesTest {

  /**
   * The difference of fourth order is good to about 1e-9 of a standard error; the search for the
   * translog's plan ends within 1e-13 of the cost, which over a step of a hundredth of a standard
   * error leaves 1e-8 or so.
   */
  private static final double AGREEMENT = 1e-6;

  @Test
  void standardErrorsAreThoseOfDifferences() {
    SplittableRandom random = new SplittableRandom(11);
    int compared = 0;
    for (Technology technology : Glass.all()) {
      EstimatedTechnology estimated = Glass.estimated(technology, .02, 5);
      GapEstimates estimates = GapEstimates.against(estimated, .95);
      DeltaMethod delta = DeltaMethod.of(estimated, .95);
      for (int k = 0; k < 30; k++) {
        double[] mix = new double[3];
        for (int i = 0; i < 3; i++) {
          mix[i] = Glass.BASE[i] * Math.exp(.6 * random.nextDouble() - .3);
        }
        double output = technology.output(mix) * Math.exp(.3 * random.nextDouble() - .15);
        Question question = Question.of(output, Glass.PRICES);
        GapEstimate estimate = estimates.of(mix, question, 9e6);
        List<Estimate> differences =
            delta.estimates(
                t -> {
                  Gap moved = FiledCost.against(t).gap(mix, question, 9e6);
                  return new double[] {
                    moved.leastCost(), moved.gap(), moved.technical(), moved.mix()
                  };
                },
                DeltaMethod.Scale.LINEAR);
        List<Estimate> closed =
            List.of(
                estimate.leastCost(), estimate.difference(), estimate.technical(), estimate.mix());
        for (int f = 0; f < 4; f++) {
          assertThat(closed.get(f).value()).isEqualTo(differences.get(f).value());
          double se = differences.get(f).standardError();
          assertThat(closed.get(f).standardError())
              .as(technology.form() + " " + f)
              .isCloseTo(se, within(AGREEMENT * differences.get(0).standardError()));
          compared++;
        }
      }
    }
    assertThat(compared).isEqualTo(360);
  }

  /**
   * The closed gradients of least cost, gap, technical and mix part are those of central
   * differences. A step of 1e-5 loses its square times third derivatives (1e-10 of the figure) and
   * rounding of 1e-13 over the step: 1e-7 of cost leaves room for both.
   */
  @Test
  void gradientsAreThoseOfDifferences() {
    double[] mix = {105_000, 39_000, 260_000};
    Question question = Question.of(29_000, Glass.PRICES);
    for (Technology technology : Glass.all()) {
      GapEstimates estimates = GapEstimates.against(Glass.estimated(technology, .02, 5), .95);
      GapEstimate estimate = estimates.of(mix, question, 9e6);
      double[][] closed = estimates.gradients(mix, estimate);
      double[] centre = technology.parameters();
      for (int k = 0; k < centre.length; k++) {
        double[] above = moved(technology, k, 1e-5, mix, question, estimate);
        double[] below = moved(technology, k, -1e-5, mix, question, estimate);
        for (int f = 0; f < 4; f++) {
          assertThat(closed[f][k])
              .as(technology.form() + " " + technology.parameterNames().get(k) + " " + f)
              .isCloseTo((above[f] - below[f]) / 2e-5, within(1e-7 * estimate.gap().leastCost()));
        }
      }
    }
  }

  private static double[] moved(
      Technology technology,
      int k,
      double by,
      double[] mix,
      Question question,
      GapEstimate estimate) {
    double[] parameters = technology.parameters();
    parameters[k] += by;
    return FiledCost.against(technology.withParameters(parameters))
        .parts(mix, question, 9e6, estimate.plan());
  }

  /** Least cost alone is that of the whole estimate, and so is its total. */
  @Test
  void leastCostAloneIsTheSame() {
    for (Technology technology : Glass.all()) {
      GapEstimates estimates = GapEstimates.against(Glass.estimated(technology, .02, 5), .95);
      Question question = Question.of(29_000, Glass.PRICES);
      GapEstimate whole = estimates.of(Glass.BASE, question, 9e6);
      GapEstimates.Least least =
          estimates.least(question, 9e6, java.util.Optional.of(whole.plan())).orElseThrow();
      // a plan sought from itself ends within 1e-13 of the cost
      double cost = whole.gap().leastCost();
      assertThat(least.leastCost()).isCloseTo(cost, within(1e-12 * cost));
      GapEstimates.Total total = estimates.total(List.of(least, least));
      assertThat(total.leastCost().value()).isCloseTo(2 * cost, within(1e-11 * cost));
      assertThat(total.gap().standardError())
          .isCloseTo(
              2 * whole.leastCost().standardError(),
              within(1e-8 * whole.leastCost().standardError()));
    }
  }

  @Test
  void intervalsHangTogether() {
    GapEstimates estimates = GapEstimates.against(Glass.estimated(Glass.ces(), .02, 5), .95);
    Question question = Question.of(29_000, Glass.PRICES);
    GapEstimate estimate = estimates.of(Glass.BASE, question, 7e6);
    double filed = estimate.gap().filed();
    assertThat(estimate.difference().low()).isEqualTo(filed - estimate.leastCost().high());
    assertThat(estimate.difference().high()).isEqualTo(filed - estimate.leastCost().low());
    // filed / low is the same number as ratio · factor up to rounding.
    assertThat(estimate.ratio().high())
        .isCloseTo(filed / estimate.leastCost().low(), within(1e-12));
    assertThat(estimate.remainder().value()).isZero();
    assertThat(estimate.remainder().standardError()).isZero();
    assertThat(estimates.quantile(estimate, .5)).isCloseTo(estimate.gap().gap(), within(1e-7));
    assertThat(estimates.quantile(estimate, .025))
        .isCloseTo(estimate.difference().low(), within(1e-7));
    assertThat(estimates.quantile(estimate, .25)).isLessThan(estimate.gap().gap());
  }

  /** Parallel isoquants: direction does not matter; without them it does, and is said. */
  @Test
  void onlyAHomotheticSplitIsTheSameInEveryDirection() {
    for (Technology technology : Glass.all()) {
      Gap gap =
          FiledCost.against(technology)
              .gap(new double[] {110_000, 30_000, 230_000}, 27_000, Glass.PRICES, 9e6);
      assertThat(gap.complete()).isTrue();
      assertThat(gap.splitDependsOnDirection())
          .as(technology.form())
          .isEqualTo(technology instanceof Translog);
    }
  }

  /** Without a contraction the remainder takes up what cannot be split, and the sum is exact. */
  @Test
  void remainderIsWhatCannotBeSplit() {
    // ln Q = ½ Σ z − ½ Σ z²: along the ray output never exceeds its value at e^½ of the base.
    Translog humped =
        new Translog(
            List.of("labour", "capital"), new double[] {1, 1}, 0, new double[] {.5, .5, -1, 0, -1});
    Gap gap = FiledCost.against(humped).gap(new double[] {1, 8}, Question.of(.9, 1, 1), 12);
    assertThat(gap.contraction()).isNaN();
    assertThat(gap.answered()).isTrue();
    assertThat(gap.complete()).isFalse();
    assertThat(gap.unreconciled() + gap.remainder()).isEqualTo(gap.gap());
    assertThat(gap.gap()).isCloseTo(gap.filed() - gap.leastCost(), within(1e-12));
  }
}

package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * The efficient scale against a search over average cost, and its intervals against differences.
 */
class EfficientScaleTest {

  private static EfficientScale.Found at(EstimatedTechnology estimated, double output) {
    Question question = Question.of(output, Glass.PRICES);
    Plan plan = Minimiser.of(estimated.technology()).plan(question);
    return EfficientScale.of(estimated, .95, 5_000, 400_000).at(question, plan);
  }

  /** Golden section over ln Q: average cost at the efficient scale is the least there is. */
  @Test
  void averageCostIsLeastThere() {
    EstimatedTechnology estimated = Glass.estimated(Glass.translog(), .01, 3);
    LeastCost leastCost = Minimiser.of(estimated.technology());
    EfficientScale.Found found = at(estimated, 30_000);
    assertThat(found.state()).isEqualTo(EfficientScale.State.FOUND);
    double best = searched(leastCost);
    // Average cost is flat at its least, so a search of it finds the place to √(1e-16) ≈ 1e-7.
    assertThat(found.output().orElseThrow().value()).isCloseTo(best, within(1e-6 * best));
    Question question = Question.of(30_000, Glass.PRICES);
    double worth = leastCost.cost(question) - 30_000 / best * leastCost.cost(question.at(best));
    assertThat(found.part().orElseThrow().value()).isCloseTo(worth, within(1e-3));
    assertThat(worth).isPositive();
  }

  private static double searched(LeastCost leastCost) {
    double low = Math.log(6_000);
    double high = Math.log(390_000);
    double golden = (Math.sqrt(5) - 1) / 2;
    while (high - low > 1e-9) {
      double left = high - golden * (high - low);
      double right = low + golden * (high - low);
      if (average(leastCost, left) < average(leastCost, right)) {
        high = right;
      } else {
        low = left;
      }
    }
    return Math.exp((low + high) / 2);
  }

  private static double average(LeastCost leastCost, double logOutput) {
    double output = Math.exp(logOutput);
    return leastCost.cost(Question.of(output, Glass.PRICES)) / output;
  }

  @Test
  void intervalsAreThoseOfDifferences() {
    EstimatedTechnology estimated = Glass.estimated(Glass.translog(), .005, 3);
    EfficientScale.Found found = at(estimated, 30_000);
    List<Estimate> differences =
        DeltaMethod.of(estimated, .95)
            .estimates(
                t -> {
                  EfficientScale.Found moved = at(known(t), 30_000);
                  return new double[] {
                    moved.elasticity().value(),
                    moved.output().orElseThrow().value(),
                    moved.part().orElseThrow().value()
                  };
                },
                DeltaMethod.Scale.LINEAR);
    List<Estimate> closed =
        List.of(found.elasticity(), found.output().orElseThrow(), found.part().orElseThrow());
    for (int f = 0; f < 3; f++) {
      double se = differences.get(f).standardError();
      assertThat(se).isPositive();
      // The step of 1e-3 in ln Q loses its square times third derivatives.
      assertThat(closed.get(f).standardError()).isCloseTo(se, within(1e-4 * se));
    }
  }

  private static EstimatedTechnology known(Technology technology) {
    int p = technology.parameters().length;
    return new EstimatedTechnology(technology, new double[p][p], 1);
  }

  @Test
  void homogeneousTechnologiesHaveNone() {
    for (Technology technology : List.of(Glass.cobbDouglas(), Glass.ces())) {
      EfficientScale.Found found = at(Glass.estimated(technology, .01, 3), 30_000);
      assertThat(found.state()).isEqualTo(EfficientScale.State.SAME_RETURNS);
      assertThat(found.output()).isEmpty();
      // The scale elasticity is 1.05 for both by construction, known to the step's square.
      assertThat(found.elasticity().value()).isCloseTo(1.05, within(1e-9));
    }
    assertThat(at(Glass.estimated(Glass.ces(), .01, 3), 30_000).elasticity().standardError())
        .as("the standard error of the scale elasticity is that of its parameter")
        .isCloseTo(scaleError(), within(1e-6 * scaleError()));
  }

  private static double scaleError() {
    EstimatedTechnology estimated = Glass.estimated(Glass.ces(), .01, 3);
    int at = estimated.technology().parameterNames().indexOf("scale");
    return Math.sqrt(estimated.covariance()[at][at]);
  }

  /** Returns rise with output: where they are constant average cost is greatest, not least. */
  @Test
  void aMaximumIsNotAnEfficientScale() {
    double[] rising = {.33, .29, .26, -.1, .05, .07, -.1, .07, -.1};
    Translog translog = new Translog(Glass.INPUTS, Glass.BASE, Glass.LOG_OUTPUT, rising);
    Question question = Question.of(25_000, Glass.PRICES);
    Plan plan = Minimiser.of(translog).plan(question);
    EfficientScale.Found found = EfficientScale.of(known(translog), .95, 1, 1e9).at(question, plan);
    assertThat(found.elasticity().value()).isLessThan(1);
    assertThat(found.state()).isNotEqualTo(EfficientScale.State.FOUND);
    assertThat(found.part()).isEmpty();
  }

  @Test
  void beyondTheRecordsItIsNotSought() {
    EstimatedTechnology estimated = Glass.estimated(Glass.translog(), .01, 3);
    Question question = Question.of(30_000, Glass.PRICES);
    Plan plan = Minimiser.of(estimated.technology()).plan(question);
    EfficientScale.Found found =
        EfficientScale.of(estimated, .95, 10_000, 33_000).at(question, plan);
    assertThat(found.state()).isEqualTo(EfficientScale.State.STILL_FALLING);
  }
}

package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.junit.jupiter.api.Test;

/** What would have to be true: closed forms, checks by putting the value back, and no value. */
class ConditionsTest {

  private static final List<String> LK = List.of("labour", "capital");

  private static List<Condition> conditions(
      EstimatedTechnology estimated, Question question, double filed) {
    Plan plan = Minimiser.of(estimated.technology()).plan(question);
    return Conditions.on(estimated, .95).of(question, plan, filed);
  }

  private static EstimatedTechnology known(Technology technology) {
    int p = technology.parameters().length;
    return new EstimatedTechnology(technology, new double[p][p], 1);
  }

  /**
   * y = √(LK): C = 2 y √(w r). At y 3, w 4, r 1 it is 12; 18 needs w or r times (18/12)² = 2.25, or
   * productivity 12/18. Substitution is not a parameter of Cobb-Douglas.
   */
  @Test
  void cobbDouglasByHand() {
    List<Condition> found =
        conditions(known(CobbDouglas.of(LK, 0, .5, .5)), Question.of(3, 4, 1), 18);
    assertThat(found).hasSize(3);
    // The root is known to 1e-12 in logs.
    assertThat(found.get(0).value().orElseThrow().value()).isCloseTo(9, within(1e-10));
    assertThat(found.get(1).value().orElseThrow().value()).isCloseTo(2.25, within(1e-10));
    assertThat(found.get(2).value().orElseThrow().value()).isCloseTo(2 / 3.0, within(1e-11));
    assertThat(found.get(2).kind()).isEqualTo(Condition.Kind.PRODUCTIVITY);
  }

  /** A filed cost below least cost asks for a lower price or a better technology. */
  @Test
  void belowLeastCostTheSearchGoesDown() {
    List<Condition> found =
        conditions(known(CobbDouglas.of(LK, 0, .5, .5)), Question.of(3, 4, 1), 9);
    assertThat(found.get(0).value().orElseThrow().value()).isCloseTo(2.25, within(1e-10));
    assertThat(found.get(2).value().orElseThrow().value()).isCloseTo(4 / 3.0, within(1e-10));
  }

  /** Every value that is found, put back, makes the filed cost the least cost. */
  @Test
  void whatIsFoundMakesTheFiledCostLeast() {
    int found = 0;
    for (Technology technology : Glass.all()) {
      Question question = Question.of(29_000, Glass.PRICES);
      double least = Minimiser.of(technology).cost(question);
      for (double factor : new double[] {.97, 1.03, 1.2}) {
        double filed = least * factor;
        for (Condition condition : conditions(known(technology), question, filed)) {
          if (condition.value().isEmpty()) {
            continue;
          }
          double value = condition.value().get().value();
          double cost =
              switch (condition.kind()) {
                case PRICE -> {
                  double[] prices = Glass.PRICES.clone();
                  prices[Glass.INPUTS.indexOf(condition.input())] = value;
                  yield Minimiser.of(technology).cost(question.at(prices));
                }
                case PRODUCTIVITY ->
                    Minimiser.of(technology.shifted(Math.log(value))).cost(question);
                case SUBSTITUTION ->
                    Minimiser.of(technology.withSubstitution(value).orElseThrow()).cost(question);
              };
          assertThat(cost)
              .as(technology.form() + " " + condition.kind() + " " + factor)
              .isCloseTo(filed, within(1e-8 * filed));
          found++;
        }
      }
    }
    assertThat(found).isGreaterThan(30);
  }

  /**
   * With σ = 2 and two inputs C = Q/(√..): y = (√L + √K)², C = y w r/(w + r) (Shephard's dual of
   * the CES). However dear labour becomes, C stays below y r = 3: a filed cost of 3.5 has no wage.
   */
  @Test
  void noWageMakesItLeastWhereAnotherInputTakesOver() {
    Ces ces = Ces.of(LK, new double[] {1, 1}, Math.log(4), new double[] {.5, .5}, -.5, 1);
    List<Condition> found = conditions(known(ces), Question.of(3, 2, 1), 3.5);
    Condition wage = found.get(0);
    assertThat(wage.value()).isEmpty();
    assertThat(wage.regular()).isTrue();
    assertThat(wage.end()).isCloseTo(200, within(1e-9));
    assertThat(wage.costAtEnd()).isCloseTo(3 * 200 / 201.0, within(1e-9));
    // Capital: y w r/(w + r) = 3.5 with w = 2 asks for r = 3.5 · 2/(6 − 3.5).
    assertThat(found.get(1).value().orElseThrow().value()).isCloseTo(2.8, within(1e-9));
    // Substitution: even where inputs are used in fixed proportions y costs at most y (w + r)/4.
    Condition substitution = found.get(3);
    assertThat(substitution.value()).isEmpty();
    assertThat(substitution.end()).isCloseTo(Conditions.LEAST_SUBSTITUTION, within(1e-12));
    assertThat(substitution.costAtEnd()).isLessThan(3.5);
  }

  /** The implicit function against the delta method on the root itself. */
  @Test
  void intervalsAreThoseOfTheRoot() {
    for (Technology technology : Glass.all()) {
      EstimatedTechnology estimated = Glass.estimated(technology, .01, 9);
      Question question = Question.of(29_000, Glass.PRICES);
      Plan plan = Minimiser.of(technology).plan(question);
      double filed = 1.1 * plan.cost();
      List<Condition> found = Conditions.on(estimated, .95).of(question, plan, filed);
      for (int c = 0; c < found.size(); c++) {
        Condition condition = found.get(c);
        if (condition.value().isEmpty()) {
          continue;
        }
        int index = c;
        Estimate direct =
            DeltaMethod.of(estimated, .95)
                .estimate(
                    t ->
                        conditions(known(t), question, filed)
                            .get(index)
                            .value()
                            .map(Estimate::value)
                            .orElse(Double.NaN),
                    DeltaMethod.Scale.LOG);
        // Roots are known to 1e-12 in logs; over a step of a hundredth of a standard error of about
        // one percent that is 1e-8 of it, and the step in ln σ adds its square.
        assertThat(condition.value().get().standardError())
            .as(technology.form() + " " + condition.kind() + condition.input())
            .isCloseTo(direct.standardError(), within(1e-5 * direct.standardError()));
      }
    }
  }
}

package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Translog;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Cost curves: known shapes, the envelope, and warm starts that change no answer. */
class CostCurveTest {

  private static final List<String> KL = List.of("capital", "labour");

  /** √(KL) at 3 and 12: C = 12 Q in the long run; with K = 80, C = 240 + 12 Q²/80. */
  @Test
  void shortRunCurveTouchesTheLongRunOnce() {
    Minimiser minimiser = Minimiser.of(CobbDouglas.of(KL, 0, .5, .5));
    Question question = Question.of(1, 3, 12);
    CostCurve longRun = CostCurve.of(minimiser, question, 20, 60, 41);
    CostCurve shortRun = CostCurve.of(minimiser, question.holding(0, 80), 20, 60, 41);
    for (int k = 0; k < longRun.size(); k++) {
      double q = longRun.target(k);
      assertThat(q).isCloseTo(20 + k, within(1e-12 * q));
      assertThat(longRun.plan(k).cost()).isCloseTo(12 * q, within(1e-11 * q));
      double held = 240 + 12 * q * q / 80;
      assertThat(shortRun.plan(k).cost()).isCloseTo(held, within(1e-12 * held));
      assertThat(shortRun.plan(k).cost() >= longRun.plan(k).cost() * (1 - 1e-14)).isTrue();
      assertThat(shortRun.averageCost(k)).isCloseTo(held / q, within(1e-11));
    }
    // Average cost 240/Q + 0.15 Q is least at Q = 40.
    assertThat(shortRun.leastAverageCost()).hasValue(20);
  }

  /** Homothetic technologies expand along a ray: proportions do not change. */
  @Test
  void homotheticExpansionPathIsARay() {
    Ces ces = Ces.of(KL, new double[] {2, 3}, 1, new double[] {.4, .6}, .8, 1.2);
    CostCurve curve = CostCurve.of(Minimiser.of(ces), Question.of(1, 2, 5), 1, 1000, 30);
    double proportion = curve.plan(0).mix(0) / curve.plan(0).mix(1);
    for (Plan plan : curve.plans()) {
      assertThat(plan.mix(0) / plan.mix(1)).isCloseTo(proportion, within(1e-12 * proportion));
    }
  }

  @Test
  void warmStartsChangeNoAnswer() {
    RandomTechnologies random = new RandomTechnologies(51);
    for (int k = 0; k < 60; k++) {
      Planted planted = random.translog();
      Minimiser minimiser = Minimiser.of(planted.technology());
      double target = planted.question().target();
      CostCurve curve = CostCurve.of(minimiser, planted.question(), target * .8, target * 1.1, 13);
      for (int point = 0; point < curve.size(); point++) {
        Plan cold = minimiser.plan(planted.question().at(curve.target(point)));
        if (cold.answered()) {
          double cost = curve.plan(point).cost();
          assertThat(cost).isCloseTo(cold.cost(), within(1e-11 * cold.cost()));
        }
      }
    }
  }

  /** ln Q = ln L + ln K − ½ ln²L, K held at 1: labour reaches no more than Q = √e. */
  @Test
  void targetsWithoutAnswerSaySo() {
    Translog humped =
        new Translog(
            List.of("labour", "capital"), new double[] {1, 1}, 0, new double[] {1, 1, -1, 0, 0});
    Question held = Question.of(1, 1, 1).holding(1, 1);
    CostCurve curve = CostCurve.at(Minimiser.of(humped), held, .8, 1.2, 1.6, 1.7, 2);
    assertThat(curve.plans().stream().map(Plan::answered))
        .containsExactly(true, true, true, false, false);
    assertThat(curve.averageCost(4)).isNaN();
    assertThat(curve.plan(4).reason()).isNotEmpty();
    assertThat(curve.leastAverageCost()).isPresent();
  }

  @Test
  void impossibleSpansAreRefused() {
    Minimiser minimiser = Minimiser.of(CobbDouglas.of(KL, 0, .5, .5));
    Question question = Question.of(1, 3, 12);
    assertThatThrownBy(() -> CostCurve.of(minimiser, question, 0, 5, 3))
        .hasMessageContaining("positive first target");
    assertThatThrownBy(() -> CostCurve.of(minimiser, question, 5, 5, 3))
        .hasMessageContaining("larger last one");
    assertThatThrownBy(() -> minimiser.plan(Question.of(1, 1, 1, 1)))
        .hasMessageContaining("3 prices for the 2 inputs");
    assertThatThrownBy(() -> new CostCurve(new double[] {1}, List.of()))
        .hasMessageContaining("one plan each");
  }
}

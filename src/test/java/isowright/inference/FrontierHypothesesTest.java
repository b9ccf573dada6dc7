package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.OneSidedLaw;
import isowright.technology.Form;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Tests of inefficiency: the mixed law against print and R, the ratios against the likelihoods. */
class FrontierHypothesesTest {

  static Fit frontier(Panel panel, OneSidedLaw law, OverTime overTime) {
    return Estimation.fit(
        panel,
        new Specification(
                Form.named("cobb-douglas"),
                PlantEffects.NONE,
                Time.NONE,
                false,
                StandardErrors.CLASSICAL,
                .95)
            .by(new Estimator.Frontier(law, overTime)));
  }

  private static Verdict verdict(Fit fit, String name) {
    return Hypotheses.of(fit, 1, 1).stream()
        .filter(v -> v.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  /**
   * Critical values of D. A. Kodde and F. C. Palm 1986, Econometrica 54, table 1 (recalled from
   * memory, to the three decimals printed), and the same by R's own chi-squared to 1e-12.
   */
  @Test
  void criticalValues() {
    double[][] printed = {{1.642, 2.706, 5.412}, {3.808, 5.138, 8.273}};
    double[] levels = {.1, .05, .01};
    String[] names = {"0.1", "0.05", "0.01"};
    ReferenceValues reference = ReferenceValues.of("frontier-effects.csv");
    for (int f = 0; f < 2; f++) {
      Law law = new Law.MixedChiSquared(f);
      for (int k = 0; k < 3; k++) {
        assertThat(law.p(printed[f][k] - 5e-4)).isGreaterThan(levels[k]);
        assertThat(law.p(printed[f][k] + 5e-4)).isLessThan(levels[k]);
        double exact = reference.numbers("mixed", f + " at " + names[k])[0];
        assertThat(law.p(exact)).isCloseTo(levels[k], within(1e-12));
      }
      assertThat(law.p(0)).isEqualTo(1);
      assertThat(law.p(Double.NaN)).isNaN();
      assertThat(law.degreesOfFreedom()).isEqualTo(List.of((double) f, f + 1.0));
    }
  }

  @Test
  void ratiosAreThoseOfTheLikelihoods() {
    Panel states = PanelFixtures.usStates();
    Fit constant = frontier(states, OneSidedLaw.HALF_NORMAL, OverTime.CONSTANT);
    Fit decay = frontier(states, OneSidedLaw.HALF_NORMAL, OverTime.DECAY);
    Fit least = Estimation.fit(states, constant.specification().by(new Estimator.LeastSquares()));
    double none = least.numbers().statistics().logLikelihood();
    double same = constant.numbers().statistics().logLikelihood();
    double moving = decay.numbers().statistics().logLikelihood();
    Verdict first = verdict(constant, "no-inefficiency");
    assertThat(first.statistic()).isCloseTo(2 * (same - none), within(1e-6));
    assertThat(first.law()).isEqualTo(new Law.MixedChiSquared(0));
    Verdict second = verdict(decay, "no-inefficiency");
    assertThat(second.statistic()).isCloseTo(2 * (moving - none), within(1e-6));
    assertThat(second.law()).isEqualTo(new Law.MixedChiSquared(1));
    assertThat(second.sentence()).contains("approximation");
    assertThat(verdict(decay, "no-decay").statistic()).isCloseTo(2 * (moving - same), within(1e-6));
    assertThat(Hypotheses.of(constant, 1, 1)).noneMatch(v -> v.name().equals("no-decay"));
    assertThat(Hypotheses.of(least, 1, 1)).noneMatch(v -> v.name().equals("no-inefficiency"));
  }

  /** With residuals skewed to the right the ratio is zero and speaks against nothing. */
  @Test
  void wrongSkewSpeaksAgainstNothing() {
    Fit fit = frontier(PanelFixtures.primaryMetals(), OneSidedLaw.EXPONENTIAL, OverTime.EACH_ROW);
    Verdict verdict = verdict(fit, "no-inefficiency");
    assertThat(verdict.statistic()).isZero();
    assertThat(verdict.p()).isEqualTo(1);
  }
}
